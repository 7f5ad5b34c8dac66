namespace RedoxFurnace.Reductants;

/// <summary>One point of a stability line.</summary>
/// <param name="Kelvin">K.</param>
/// <param name="OxygenPotential">dG0 of the couple with the activities given, J per mole of O2.</param>
/// <param name="ExpandedUncertainty">k = 2, J per mole of O2.</param>
public readonly record struct StabilityPoint(double Kelvin, double OxygenPotential, double ExpandedUncertainty);
