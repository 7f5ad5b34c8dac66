using System.Text.Encodings.Web;
using Fluid;
using RedoxFurnace.Campaigns;
using RedoxFurnace.Cli.Presentation;

namespace RedoxFurnace.Cli.Plans;

/// <summary>The plan as one HTML file that opens offline. The template escapes every text; only the charts, our own SVG, go in as they are.</summary>
internal static class PlanHtml
{
    public static string Write(CampaignPlan plan, IReadOnlyList<PlanSection> sections, IReadOnlyList<string> svgs)
    {
        FluidParser parser = new();
        using StreamReader reader = new(typeof(PlanHtml).Assembly.GetManifestResourceStream("plan.liquid")!);
        IFluidTemplate template = parser.Parse(reader.ReadToEnd());
        TemplateContext context = new(new TemplateOptions());
        CampaignDocument block = plan.Sheet.Document;
        context.SetValue("title", plan.Sheet.Title);
        context.SetValue("headline", plan.Headline);
        context.SetValue("verdict", CampaignJudge.Word(plan.Judgement.Verdict));
        context.SetValue("origin", $"RedoxFurnace {plan.Version} · database {plan.DatabaseHash[..16]} · sheet {plan.SheetHash[..16]} · equilibrium, not rate · site rules, local codes and licensed practitioners come first");
        context.SetValue("block", new[] { ("document no.", block.Number), ("revision", block.Revision), ("date", plan.Date), ("prepared", block.Prepared), ("checked", block.Checked), ("approved", block.Approved), ("purpose", block.Purpose) }
            .Select(field => Map(("name", field.Item1), ("text", field.Item2))).ToList());
        context.SetValue("sections", sections.Where(section => !section.IsEmpty).Select(Section).ToList());
        context.SetValue("charts", svgs.Select(svg => Map(("svg", svg))).ToList());
        return template.Render(context, HtmlEncoder.Default).ReplaceLineEndings("\n");
    }

    private static Dictionary<string, object> Section(PlanSection section)
    {
        Dictionary<string, object> map = Map(
            ("number", section.Number),
            ("title", section.Title),
            ("paragraphs", section.Paragraphs.Select(paragraph => Map(("number", paragraph.Number), ("text", paragraph.Text), ("trail", paragraph.Trail))).ToList()));
        if (section.Table is { Rows.Count: > 0 } table)
        {
            map["columns"] = table.Columns.Select(column => Map(("heading", column.Heading), ("number", column.IsNumber))).ToList();
            map["rows"] = table.Rows.Select(row => Map(("cells", row.Select((cell, i) => Map(("text", cell.Text), ("number", table.Columns[i].IsNumber))).ToList()))).ToList();
        }

        return map;
    }

    private static Dictionary<string, object> Map(params (string Key, object Value)[] entries) => entries.ToDictionary(entry => entry.Key, entry => entry.Value);
}
