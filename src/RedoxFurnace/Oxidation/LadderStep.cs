namespace RedoxFurnace.Oxidation;

/// <summary>The step between two neighbouring rungs.</summary>
/// <param name="Couple">Lower rung's oxygen-rich end to upper rung's metal-rich end, per mole of O2.</param>
/// <param name="StandardGibbs">dG0 at unit activities, J per mole of O2.</param>
/// <param name="OxygenPotential">RT ln pO2 (bar) of coexistence at the given activities and vapour pressure, J per mole of O2; null where the data do not reach (<see cref="Gap"/>).</param>
/// <param name="Gap">Why there is no value, or null.</param>
public sealed record LadderStep(OxidationCouple Couple, double StandardGibbs, double? OxygenPotential, string? Gap);
