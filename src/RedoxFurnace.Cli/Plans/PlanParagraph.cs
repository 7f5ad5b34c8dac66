namespace RedoxFurnace.Cli.Plans;

/// <summary>A paragraph an auditor can cite.</summary>
/// <param name="Number">Section and place in it, such as <c>3.2</c>.</param>
/// <param name="Text">What it says.</param>
/// <param name="Trail">Equation, entry, source, uncertainty; empty where the text needs none.</param>
internal sealed record PlanParagraph(string Number, string Text, string Trail = "");
