namespace RedoxFurnace.Cli.Presentation;

/// <summary>A column of a table.</summary>
/// <param name="Heading">With its unit, for people.</param>
/// <param name="Key">Snake case with its unit, for CSV.</param>
/// <param name="IsNumber">Numbers stand to the right.</param>
internal sealed record Column(string Heading, string Key, bool IsNumber = true)
{
    /// <summary>Sentences may break over lines; names and numbers may not.</summary>
    public bool IsProse { get; init; }
}
