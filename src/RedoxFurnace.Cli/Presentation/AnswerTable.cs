namespace RedoxFurnace.Cli.Presentation;

/// <summary>A table of an answer.</summary>
/// <param name="Title">Line above it, or null.</param>
/// <param name="Columns">Columns.</param>
/// <param name="Rows">Rows of as many cells.</param>
internal sealed record AnswerTable(string? Title, IReadOnlyList<Column> Columns, IReadOnlyList<IReadOnlyList<Cell>> Rows);
