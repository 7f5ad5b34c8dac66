using RedoxFurnace.Cli.Presentation;

namespace RedoxFurnace.Cli.Plans;

/// <summary>A section of a plan, the same in every form: terminal, Markdown, HTML, CSV.</summary>
/// <param name="Number">Fixed for its matter.</param>
/// <param name="Title">Heading.</param>
/// <param name="Paragraphs">Numbered.</param>
/// <param name="Table">Or null.</param>
/// <param name="Name">File name of the table without its ending.</param>
internal sealed record PlanSection(int Number, string Title, IReadOnlyList<PlanParagraph> Paragraphs, AnswerTable? Table, string Name)
{
    public bool IsEmpty => Paragraphs.Count == 0 && (Table is null || Table.Rows.Count == 0);
}
