namespace RedoxFurnace.Reductants;

/// <summary>The hardest step of a charge.</summary>
/// <param name="Reaction">Formation, per mole of O2.</param>
/// <param name="StandardGibbs">J per mole of O2.</param>
/// <param name="OxygenPotential">With activities and vapour pressure, J per mole of O2.</param>
/// <param name="ExpandedUncertainty">k = 2, J per mole of O2.</param>
public sealed record HardestStep(string Reaction, double StandardGibbs, double OxygenPotential, double ExpandedUncertainty);
