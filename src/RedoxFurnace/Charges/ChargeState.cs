using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Charges;

/// <summary>A charge at equilibrium, with its certificate.</summary>
/// <param name="At">Temperature.</param>
/// <param name="Total">Total pressure.</param>
/// <param name="Condensed">Condensed phases, heaviest first.</param>
/// <param name="Gas">Species of the gas, largest share first; empty without gas.</param>
/// <param name="GasMoles">Moles of gas, 0 without.</param>
/// <param name="Log10Oxygen">log10(pO2/bar), or null.</param>
/// <param name="NoOxygenReason">Why there is no oxygen pressure, or null.</param>
/// <param name="LargestImbalance">Of an element, as a share of it.</param>
/// <param name="LargestViolation">Of an optimality condition, in RT per mole of atoms: no absent phase wants to form by more than this.</param>
/// <param name="WithoutData">Substances of these elements left out for want of data at the temperature.</param>
public sealed record ChargeState(
    Temperature At,
    Pressure Total,
    ImmutableArray<ChargePhase> Condensed,
    ImmutableArray<GasShare> Gas,
    double GasMoles,
    double? Log10Oxygen,
    string? NoOxygenReason,
    double LargestImbalance,
    double LargestViolation,
    ImmutableArray<string> WithoutData)
{
    /// <summary>Gas at 0 C and 101325 Pa, Nm3.</summary>
    public double NormalCubicMetres => GasMoles * PhysicalConstants.NormalCubicMetrePerMole;

    /// <summary>Moles of a substance, condensed or gas.</summary>
    /// <param name="id">Formula.</param>
    /// <returns>0 where it is absent.</returns>
    public double MolesOf(string id)
        => Condensed.Where(phase => phase.Substance.Id == id).Sum(phase => phase.Moles) + Gas.Where(share => share.Substance.Id == id).Sum(share => share.Fraction * GasMoles);

    /// <summary>Whether a condensed phase stands.</summary>
    /// <param name="name">Formula, or wustite.</param>
    /// <returns>True if present.</returns>
    public bool Has(string name) => Condensed.Any(phase => phase.Name == name || phase.Substance.Id == name);
}
