using System.Collections.Immutable;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>One line of a stability chart: a couple of a ladder, or a reductant.</summary>
/// <param name="Id">Stable name, such as <c>Fe/wustite</c> or <c>C at 1 bar</c>.</param>
/// <param name="Label">What the chart writes beside it, formulas in plain letters.</param>
/// <param name="Element">The metal of a couple; the name of a reductant.</param>
/// <param name="IsReductant">Whether it is drawn as a reductant.</param>
/// <param name="Reaction">Per mole of O2, as it stands in the middle of the line.</param>
/// <param name="Points">By rising temperature, in one piece.</param>
/// <param name="Marks">Phase changes and ends.</param>
/// <param name="Substances">Those whose data it rests on.</param>
public sealed record StabilityLine(
    string Id,
    string Label,
    string Element,
    bool IsReductant,
    string Reaction,
    ImmutableArray<StabilityPoint> Points,
    ImmutableArray<StabilityMark> Marks,
    ImmutableArray<Substance> Substances)
{
    /// <summary>Value between the points, by straight line; null outside.</summary>
    /// <param name="kelvin">K.</param>
    /// <returns>J per mole of O2.</returns>
    public double? At(double kelvin)
    {
        int low = 0;
        int high = Points.Length - 1;
        if (kelvin < Points[low].Kelvin || kelvin > Points[high].Kelvin)
        {
            return null;
        }

        while (high - low > 1)
        {
            int middle = (low + high) / 2;
            (low, high) = Points[middle].Kelvin <= kelvin ? (middle, high) : (low, middle);
        }

        (StabilityPoint a, StabilityPoint b) = (Points[low], Points[high]);
        return b.Kelvin > a.Kelvin ? a.OxygenPotential + ((b.OxygenPotential - a.OxygenPotential) * (kelvin - a.Kelvin) / (b.Kelvin - a.Kelvin)) : a.OxygenPotential;
    }
}
