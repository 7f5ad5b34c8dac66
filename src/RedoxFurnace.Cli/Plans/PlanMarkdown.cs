using System.Text;
using RedoxFurnace.Campaigns;
using RedoxFurnace.Cli.Presentation;

namespace RedoxFurnace.Cli.Plans;

/// <summary>The plan as Markdown.</summary>
internal static class PlanMarkdown
{
    public static string Write(CampaignPlan plan, IReadOnlyList<PlanSection> sections, IReadOnlyList<string> charts)
    {
        StringBuilder text = new();
        text.Append("# ").Append(Safe(plan.Sheet.Title)).Append("\n\n");
        text.Append("| number | revision | date | prepared | checked | approved | purpose |\n| --- | --- | --- | --- | --- | --- | --- |\n");
        CampaignDocument block = plan.Sheet.Document;
        text.Append("| ").AppendJoin(" | ", new[] { block.Number, block.Revision, plan.Date, block.Prepared, block.Checked, block.Approved, block.Purpose }.Select(Safe)).Append(" |\n\n");
        foreach (PlanSection section in sections.Where(section => !section.IsEmpty))
        {
            text.Append("## ").Append(FormattableString.Invariant($"{section.Number}. ")).Append(Safe(section.Title)).Append("\n\n");
            foreach (PlanParagraph paragraph in section.Paragraphs)
            {
                text.Append("**").Append(paragraph.Number).Append("** ").Append(Safe(paragraph.Text));
                text.Append(paragraph.Trail.Length > 0 ? $" *({Safe(paragraph.Trail)})*\n\n" : "\n\n");
            }

            if (section.Table is { Rows.Count: > 0 } table)
            {
                text.Append("| ").AppendJoin(" | ", table.Columns.Select(column => Safe(column.Heading))).Append(" |\n");
                text.Append("| ").AppendJoin(" | ", table.Columns.Select(column => column.IsNumber ? "---:" : "---")).Append(" |\n");
                foreach (IReadOnlyList<Cell> row in table.Rows)
                {
                    text.Append("| ").AppendJoin(" | ", row.Select(cell => Safe(cell.Text))).Append(" |\n");
                }

                text.Append('\n');
            }
        }

        foreach (string chart in charts)
        {
            text.Append($"![{chart}](charts/{chart}.svg)\n\n");
        }

        return text.ToString();
    }

    /// <summary>What a sheet says must not become markup.</summary>
    private static string Safe(string text)
    {
        StringBuilder safe = new();
        foreach (char letter in text.ReplaceLineEndings(" "))
        {
            if (letter is '|' or '<' or '>' or '*' or '_' or '`' or '[' or ']' or '\\' or '#')
            {
                safe.Append('\\');
            }

            safe.Append(letter);
        }

        return safe.ToString();
    }
}
