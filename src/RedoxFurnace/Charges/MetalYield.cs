namespace RedoxFurnace.Charges;

/// <summary>Where a metal of the charge went, shares of 1.</summary>
/// <param name="Metal">Its symbol.</param>
/// <param name="AsMetal">Condensed element.</param>
/// <param name="AsCarbide">Carbides.</param>
/// <param name="AsNitride">Nitrides.</param>
/// <param name="AsOxide">Oxides and double oxides.</param>
/// <param name="AsGas">Vapour and volatile compounds.</param>
public sealed record MetalYield(string Metal, double AsMetal, double AsCarbide, double AsNitride, double AsOxide, double AsGas);
