namespace RedoxFurnace.Substances;

/// <summary>One finding of the database examiner.</summary>
/// <param name="Id">Stable id of the rule, kebab-case.</param>
/// <param name="Severity">How grave.</param>
/// <param name="At">Where.</param>
/// <param name="Message">One line: what was found, what is allowed.</param>
public sealed record DatabaseFinding(string Id, FindingSeverity Severity, SourceMark At, string Message);
