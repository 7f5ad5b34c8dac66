namespace RedoxFurnace.Safety;

/// <summary>One safety note that a piece of work calls for.</summary>
/// <param name="Id">Stable name of the rule, lower case with hyphens.</param>
/// <param name="Severity">How grave it is.</param>
/// <param name="Advice">What to do.</param>
/// <param name="Figures">The limits with their authorities, strictest first; may be empty.</param>
/// <param name="Source">Where the rule comes from; says so where it is recalled or common practice.</param>
public sealed record HazardNote(string Id, HazardSeverity Severity, string Advice, IReadOnlyList<string> Figures, string Source)
{
    private const int FiguresInBrief = 2;

    /// <summary>The whole note: advice, then every figure with a word on its edition.</summary>
    public string Text => Figures.Count == 0 ? Advice : $"{Advice} Figures, strictest first: {string.Join("; ", Figures)}. Check the current editions.";

    /// <summary>The advice with the strictest figures; says how many more there are.</summary>
    public string Brief => Figures.Count <= FiguresInBrief + 1
        ? Text
        : $"{Advice} Strictest: {string.Join("; ", Figures.Take(FiguresInBrief))}; {Figures.Count - FiguresInBrief} more figures with --json. Check the current editions.";
}
