namespace RedoxFurnace.Safety;

/// <summary>One safety note that a piece of work calls for.</summary>
/// <param name="Id">Stable name of the rule, lower case with hyphens.</param>
/// <param name="Severity">How grave it is.</param>
/// <param name="Text">What to do, then the limits with their authorities, strictest first.</param>
/// <param name="Source">Where the rule comes from; says so where it is recalled or common practice.</param>
public sealed record HazardNote(string Id, HazardSeverity Severity, string Text, string Source);
