using System.CommandLine;
using System.Diagnostics;
using System.Text;
using RedoxFurnace.Campaigns;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Charts.Sheets;
using RedoxFurnace.Charts.Writing;
using RedoxFurnace.Cli.Plans;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>plan SHEET</c>: one sheet in, the answer a furnace team can act on out.</summary>
internal static class PlanCommand
{
    private const int ChartDpi = 120;
    private const double QuietSeconds = 0.5;
    private const string Prefix = "campaign/";

    /// <summary>Sections whose tables stand on the first screen: stages, product, consumption, linings, alternatives, what moves the verdict.</summary>
    private static readonly int[] FirstScreen = [2, 5, 6, 8, 9, 12];

    public static Command Create(Screen screen, CommonOptions common)
    {
        Argument<string?> sheet = new("SHEET") { Description = "a campaign sheet (charts/campaigns holds some)", Arity = ArgumentArity.ZeroOrOne };
        Option<string> to = new("--to") { Description = "folder for the report (the sheet's name with -plan); with --new the file to write", HelpName = "PATH" };
        Option<bool> force = new("--force") { Description = "replace an earlier plan there" };
        Option<string> date = new("--date") { Description = "date to print, in place of the sheet's", HelpName = "TEXT" };
        Option<string> kind = new("--new") { Description = "write a commented starting sheet: " + string.Join(", ", Kinds), HelpName = "KIND" };
        Command command = new("plan", "plan a furnace campaign from one sheet: verdict, set-points, stages, consumption, linings, hazards, report and charts") { sheet, to, force, date, kind };
        command.SetAction(parsed =>
        {
            if (parsed.GetValue(kind) is { } wanted)
            {
                return WriteNew(screen, common, parsed, wanted, parsed.GetValue(to), parsed.GetValue(force));
            }

            string file = parsed.GetValue(sheet) ?? throw new RequestException("'plan' needs a campaign sheet; copy one from charts/campaigns, or write one with 'plan --new KIND'");
            SubstanceDatabase database = common.Database(parsed);
            string yaml = Read(file);
            string folder = parsed.GetValue(to) ?? Path.GetFileNameWithoutExtension(file) + "-plan";
            PlanFolder.Check(folder, parsed.GetValue(force));
            Progress progress = new(screen.Error);
            CampaignPlan plan = CampaignPlanning.Of(yaml, Path.GetFileName(file), database, ChartCommand.Version, parsed.GetValue(date), progress.Say);
            IReadOnlyList<PlanSection> sections = PlanDocument.Of(plan);
            (IReadOnlyList<(string Name, byte[] Content)> files, string[] failed) = Files(plan, sections, database, progress);
            PlanFolder.Write(folder, files, parsed.GetValue(force));
            return screen.Show(Present(plan, sections, folder, files, failed), common.Form(parsed));
        });
        return command;
    }

    /// <summary>The kinds of starting sheet.</summary>
    private static IEnumerable<string> Kinds => typeof(PlanCommand).Assembly.GetManifestResourceNames().Where(name => name.StartsWith(Prefix, StringComparison.Ordinal)).Select(name => Path.GetFileNameWithoutExtension(name[Prefix.Length..])).Order(StringComparer.Ordinal);

    private static int WriteNew(Screen screen, CommonOptions common, ParseResult parsed, string kind, string? to, bool force)
    {
        if (!Kinds.Contains(kind))
        {
            throw RequestException.UnknownWord("--new", kind, [.. Kinds]);
        }

        string target = to ?? kind + ".yaml";
        using Stream stream = typeof(PlanCommand).Assembly.GetManifestResourceStream(Prefix + kind + ".yaml")!;
        using MemoryStream content = new();
        stream.CopyTo(content);
        OutputFile.Write(target, content.ToArray(), force);
        return screen.Show(new Answer
        {
            Headline = $"Wrote {target}: change what differs, then run 'redoxfurnace plan {target}'.",
            Tables = [],
            CallsForSafety = false,
            Json = writer =>
            {
                writer.WriteStartObject();
                writer.WriteString("schema", "redoxfurnace/plan-sheet/1");
                writer.WriteString("file", target);
                writer.Common([], [], null, [], [], []);
                writer.WriteEndObject();
            },
        }, common.Form(parsed));
    }

    private static string Read(string file)
    {
        if (!File.Exists(file))
        {
            throw new RequestException($"the campaign sheet '{file}' does not exist; charts/campaigns holds some, and 'plan --new KIND' writes one");
        }

        return new FileInfo(file).Length <= 4 * CampaignSheetReader.MostCharacters
            ? File.ReadAllText(file)
            : throw new RequestException($"the campaign sheet '{file}' is larger than {4 * CampaignSheetReader.MostCharacters} bytes; that is no campaign sheet");
    }

    private static (IReadOnlyList<(string Name, byte[] Content)> Files, string[] Failed) Files(CampaignPlan plan, IReadOnlyList<PlanSection> sections, SubstanceDatabase database, Progress progress)
    {
        List<(string Name, byte[] Content)> files = [];
        List<string> svgs = [];
        List<string> charts = [];
        List<string> failed = [];
        foreach ((string name, System.Collections.Immutable.ImmutableArray<(string Key, string Text)> settings) in plan.Charts)
        {
            progress.Say("drawing " + name);
            try
            {
                Scene scene = ChartDrawing.Draw(ChartSettings.Of([.. settings.Select(setting => (setting.Key, (string?)setting.Text)), ("date", plan.Date.Length > 0 ? plan.Date : null)]), database, plan.Version).Scenes[0];
                svgs.Add(SvgWriter.Inline(scene));
                charts.Add(name);
                files.Add(($"charts/{name}.svg", SvgWriter.Write(scene)));
                files.Add(($"charts/{name}.png", PngWriter.Write(scene, ChartDpi)));
            }
            catch (Exception fault) when (fault is NoAnswerException or RequestException)
            {
                failed.Add($"no {name} chart: {fault.Message}");
            }
        }

        progress.Say("writing the report");
        foreach (PlanSection section in sections.Where(section => section.Table is { Rows.Count: > 0 }))
        {
            files.Add(($"tables/{section.Name}.csv", Encoding.UTF8.GetBytes(Screen.ToCsv(section.Table!))));
        }

        files.Add(("plan.md", Encoding.UTF8.GetBytes(PlanMarkdown.Write(plan, sections, charts))));
        files.Add(("plan.html", Encoding.UTF8.GetBytes(PlanHtml.Write(plan, sections, svgs))));
        string[] names = [.. files.Select(file => file.Name).Append("plan.json").Order(StringComparer.Ordinal)];
        files.Add(("plan.json", Encoding.UTF8.GetBytes(Screen.ToJson(writer => PlanJson.Write(writer, plan, names)) + "\n")));
        return (files, [.. failed]);
    }

    /// <summary>The first screen: what the report says, without the passages only a file has room for.</summary>
    private static Answer Present(CampaignPlan plan, IReadOnlyList<PlanSection> sections, string folder, IReadOnlyList<(string Name, byte[] Content)> files, string[] failed)
    {
        PlanSection Section(int number) => sections.First(section => section.Number == number);
        AnswerTable[] tables =
        [
            .. FirstScreen.Select(Section).Where(section => section.Table is { Rows.Count: > 0 }).Select(section => section.Table! with { Title = FormattableString.Invariant($"{section.Number}. {section.Title}") }),
        ];
        AnswerTable points = new(
            "3. Set-points and limits",
            [new Column("no.", "paragraph", false), new Column("what", "what", false), new Column("value", "value", false) { IsProse = true }],
            [.. plan.SetPoints.Select((point, i) => (IReadOnlyList<Cell>)[Cell.Word(FormattableString.Invariant($"3.{i + 1}")), Cell.Word(point.What), Cell.Word(point.Value)])]);
        return new Answer
        {
            Headline = plan.Headline,
            Tables = [.. tables.Take(1), points, .. tables.Skip(1)],
            Ask = plan.Ask,
            Notes =
            [
                .. plan.NextMeasurement.Length > 0 ? ["measure next: " + plan.NextMeasurement] : Array.Empty<string>(),
                .. plan.Traps.Select(trap => $"trap {trap.Id}: {trap.Text}"),
                .. plan.Oxygen?.AgainstReadings ?? [],
                .. plan.Notes,
                .. failed,
                $"report in {folder}: plan.html, plan.md, plan.json, {files.Count(file => file.Name.StartsWith("tables/", StringComparison.Ordinal))} tables, {files.Count(file => file.Name.StartsWith("charts/", StringComparison.Ordinal))} chart files",
            ],
            Assumptions = plan.Assumptions,
            Hazards = plan.Hazards,
            Sources = plan.Sources,
            Json = writer => PlanJson.Write(writer, plan, [.. files.Select(file => file.Name).Order(StringComparer.Ordinal)]),
        };
    }

    /// <summary>Says the stage at work once the work has taken longer than a reader waits without wondering.</summary>
    private sealed class Progress(TextWriter error)
    {
        private readonly long _start = Stopwatch.GetTimestamp();

        public void Say(string stage)
        {
            if (Stopwatch.GetElapsedTime(_start).TotalSeconds > QuietSeconds)
            {
                error.WriteLine($"redoxfurnace: {stage} ...");
            }
        }
    }
}
