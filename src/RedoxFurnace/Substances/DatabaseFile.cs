namespace RedoxFurnace.Substances;

/// <summary>One database file: its name and its text.</summary>
/// <param name="Name">Such as <c>Cr.yaml</c>.</param>
/// <param name="Text">YAML.</param>
public sealed record DatabaseFile(string Name, string Text);
