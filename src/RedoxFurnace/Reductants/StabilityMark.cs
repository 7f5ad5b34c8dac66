namespace RedoxFurnace.Reductants;

/// <summary>A marked point of a stability line.</summary>
/// <param name="Kelvin">K.</param>
/// <param name="OxygenPotential">J per mole of O2.</param>
/// <param name="Kind">What happens there.</param>
/// <param name="Substance">Formula of what changes; empty for ends.</param>
public sealed record StabilityMark(double Kelvin, double OxygenPotential, StabilityMarkKind Kind, string Substance);
