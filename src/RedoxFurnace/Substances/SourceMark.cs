namespace RedoxFurnace.Substances;

/// <summary>A place in a text file.</summary>
/// <param name="File">File name as the user knows it.</param>
/// <param name="Line">From 1.</param>
/// <param name="Column">From 1.</param>
public readonly record struct SourceMark(string File, long Line, long Column)
{
    /// <inheritdoc/>
    public override string ToString() => FormattableString.Invariant($"{File}:{Line}:{Column}");
}
