using RedoxFurnace.Substances;

namespace RedoxFurnace.Charges;

/// <summary>A species of the gas over a charge.</summary>
/// <param name="Substance">The species.</param>
/// <param name="NaturalLogFraction">ln of its mole fraction; traces far below the smallest double are kept.</param>
public sealed record GasShare(Substance Substance, double NaturalLogFraction)
{
    /// <summary>Mole fraction, 0 where it leaves the range of a double.</summary>
    public double Fraction => Math.Exp(NaturalLogFraction);
}
