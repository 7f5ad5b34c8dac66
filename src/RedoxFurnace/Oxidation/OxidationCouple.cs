using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>Two neighbours of a ladder and the reaction between them, always for one mole of O2.</summary>
public sealed class OxidationCouple
{
    private readonly Substance _oxygen;
    private Reaction? _formation;

    internal OxidationCouple(Assemblage reduced, Assemblage oxidised, Substance oxygen)
    {
        Reduced = reduced;
        Oxidised = oxidised;
        UnitsPerMoleO2 = 2 / (oxidised.Oxygen - reduced.Oxygen);
        _oxygen = oxygen;
    }

    /// <summary>The side with less oxygen.</summary>
    public Assemblage Reduced { get; }

    /// <summary>The side with more oxygen.</summary>
    public Assemblage Oxidised { get; }

    /// <summary>Units of the system (moles of metal, for one metal) per mole of O2.</summary>
    public double UnitsPerMoleO2 { get; }

    /// <summary>reduced + O2 = oxidised.</summary>
    public Reaction Formation => _formation ??= Reaction.Of(
        Reduced.Parts.Select(part => (part.Substance, -part.Amount * UnitsPerMoleO2))
            .Append((_oxygen, -1.0))
            .Concat(Oxidised.Parts.Select(part => (part.Substance, part.Amount * UnitsPerMoleO2))));

    /// <summary>Name of the couple, for example <c>Fe/wustite</c>.</summary>
    public string Name => $"{Reduced.PhaseNames}/{Oxidised.PhaseNames}";

    /// <summary>Standard Gibbs energy of oxidation at unit activities.</summary>
    /// <param name="kelvin">Inside the data.</param>
    /// <returns>J per mole of O2.</returns>
    /// <exception cref="OutsideDataException">A partner has no data.</exception>
    public double StandardGibbs(double kelvin) => Formation.StandardGibbs(kelvin);

    /// <summary>Oxygen potential at which both sides coexist: dG0 + RT ln(product of a_oxidised) - RT ln(product of a_reduced).</summary>
    /// <param name="kelvin">Inside the data.</param>
    /// <param name="activities">Of condensed phases.</param>
    /// <param name="vapourLogPressure">ln(p/bar) of a metal vapour on the reduced side.</param>
    /// <returns>J per mole of O2, relative to O2 at 1 bar.</returns>
    /// <remarks>THEORY.md, equation 4.</remarks>
    public double OxygenPotential(double kelvin, Activities activities, double vapourLogPressure = 0)
    {
        double mixing = 0;
        foreach ((Substance substance, double number) in Formation.Terms)
        {
            if (substance.Formula.Text != "O2")
            {
                mixing += number * (substance.IsGas ? vapourLogPressure : activities.NaturalLog(substance));
            }
        }

        return Formation.StandardGibbs(kelvin) + (PhysicalConstants.GasConstant * kelvin * mixing);
    }
}
