using RedoxFurnace.Substances;

namespace RedoxFurnace.Charges;

/// <summary>A condensed phase of a charge at equilibrium.</summary>
/// <param name="Substance">What it is; a member of wustite counts as wustite.</param>
/// <param name="Moles">Above 0.</param>
public sealed record ChargePhase(Substance Substance, double Moles)
{
    /// <summary>Mass, kg.</summary>
    public double Kilograms => Moles * Substance.Formula.MolarMass / 1000;

    /// <summary>Name in tables: the formula, or wustite for its members.</summary>
    public string Name => Substance.Group ?? Substance.Id;
}
