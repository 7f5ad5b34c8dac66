namespace RedoxFurnace.Reductants;

/// <summary>One step of the charge against a reductant.</summary>
/// <param name="Reaction">Per mole of O2 handed over.</param>
/// <param name="Margin">J per mole of O2; null where the data do not reach.</param>
/// <param name="ExpandedUncertainty">k = 2, J per mole of O2.</param>
/// <param name="Verdict">Whether this step goes.</param>
/// <param name="Note">Why there is no value, or null.</param>
public sealed record RankedStep(string Reaction, double? Margin, double? ExpandedUncertainty, Verdict Verdict, string? Note);
