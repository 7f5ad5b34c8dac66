using System.Collections.Immutable;
using System.CommandLine;
using System.Globalization;
using System.Text;
using System.Text.Json;
using RedoxFurnace.Assessments;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>oxides against --tables FOLDER</c>: differences between the database and published figures.</summary>
internal static class OxidesAgainstCommand
{
    public const string Begin = "<!-- against: generated, do not edit; redoxfurnace oxides against --tables tests/RedoxFurnace.Tests/Published --to oxides/README.md --force -->";
    public const string End = "<!-- against: end -->";

    private const string FormationFile = "janaf-formation.csv";
    private const string ReasonsFile = "janaf-tolerances.csv";

    public static Command Create(Screen screen, CommonOptions common)
    {
        Option<string> tables = new("--tables") { Description = $"folder with {FormationFile} (formula,T_K,dGf_kJ_per_mol) and {ReasonsFile}", HelpName = "FOLDER" };
        Option<string> to = new("--to") { Description = "text file whose part between the two 'against' marks is to be replaced", HelpName = "FILE" };
        Option<bool> force = new("--force") { Description = "replace an existing file" };
        Command command = new("against", "how far the database stands from published tables and from measurements kept out") { tables, to, force };
        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            ImmutableArray<PublishedDifference> all = [.. Formation(parsed.GetValue(tables), database), .. PublishedComparison.KeptOut(OxideAssessment.Of(MeasurementTable.Of(database), database))];
            if (parsed.GetValue(to) is { } target)
            {
                OutputFile.Write(target, Encoding.UTF8.GetBytes(Replaced(target, all)), parsed.GetValue(force));
            }

            return screen.Show(Present(all), common.Form(parsed));
        });
        return command;
    }

    private static ImmutableArray<PublishedDifference> Formation(string? folder, SubstanceDatabase database)
    {
        if (folder is null)
        {
            return [];
        }

        foreach (string file in new[] { FormationFile, ReasonsFile }.Where(file => !File.Exists(Path.Combine(folder, file))))
        {
            throw new RequestException($"--tables '{folder}' holds no {file}; give the folder with both files");
        }

        string[][] reasons = Rows(folder, ReasonsFile, "formula,t_min_K,t_max_K,tolerance_kJ_per_mol,reason");
        return PublishedComparison.Formation(
            Rows(folder, FormationFile, "formula,T_K,dGf_kJ_per_mol").Select(cells => (cells[0], Number(cells[1], FormationFile), Number(cells[2], FormationFile))),
            (formula, kelvin) => reasons.FirstOrDefault(cells => cells[0] == formula && Number(cells[1], ReasonsFile) <= kelvin && kelvin <= Number(cells[2], ReasonsFile))?[4].Trim('"'),
            "NIST-JANAF 1998",
            database);
    }

    /// <summary>Rows below the heading; only the last column may hold commas.</summary>
    private static string[][] Rows(string folder, string file, string heading)
    {
        string[] lines = [.. File.ReadAllLines(Path.Combine(folder, file)).Where(line => line.Length > 0 && !line.StartsWith('#'))];
        if (lines.Length == 0 || !lines[0].StartsWith(heading, StringComparison.Ordinal))
        {
            throw new RequestException($"{file} starts with '{(lines.Length == 0 ? string.Empty : lines[0])}'; its heading is {heading}");
        }

        int columns = lines[0].Split(',').Length;
        return [.. lines.Skip(1).Select(line => line.Split(',', columns)).Select(cells => cells.Length == columns ? cells : throw new RequestException($"{file}: '{string.Join(",", cells)}' has {cells.Length.ToString(CultureInfo.InvariantCulture)} cells, the heading {columns.ToString(CultureInfo.InvariantCulture)}"))];
    }

    private static double Number(string text, string file) => double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out double value) ? value : throw new RequestException($"{file}: '{text}' is no number");

    private static string Replaced(string file, ImmutableArray<PublishedDifference> all)
    {
        string text = File.Exists(file) ? File.ReadAllText(file) : throw new RequestException($"--to '{file}' does not exist; give a text file with the two 'against' marks");
        int begin = text.IndexOf(Begin, StringComparison.Ordinal);
        int end = text.IndexOf(End, StringComparison.Ordinal);
        return begin >= 0 && end > begin
            ? text[..(begin + Begin.Length)] + "\n" + Markdown(all) + text[end..]
            : throw new RequestException($"--to '{file}' lacks the marks '{Begin}' and '{End}'; add them where the table belongs");
    }

    /// <summary>The table as it stands in oxides/README.md.</summary>
    private static string Markdown(ImmutableArray<PublishedDifference> all)
    {
        StringBuilder text = new("\n| what | against | points | largest | at K | stated | reason where it exceeds |\n| --- | --- | ---: | ---: | ---: | ---: | --- |\n");
        foreach (PublishedDifference row in all)
        {
            text.Append(CultureInfo.InvariantCulture, $"| {row.Name} | {row.Published} | {row.Points} | {Printed.Fixed(row.LargestKilojoules, 1)} | {Printed.Fixed(row.Kelvin, 0)} | {Printed.Fixed(row.StatedKilojoules, 1)} | {row.Reason?.Replace('|', '/')} |\n");
        }

        return text.Append('\n').ToString();
    }

    private static Answer Present(ImmutableArray<PublishedDifference> all)
    {
        int beyond = all.Count(row => row.Exceeds);
        string headline = FormattableString.Invariant($"{all.Length - beyond} of {all.Length} published figures lie within their stated error over their whole range; {beyond} exceed it somewhere.");
        string[] assumptions = ["database less published; kJ per mol of formula for Gibbs energies of formation, kJ/mol O2 for couples", "stated error (k = 2): of the database for a formation energy, of the measurement for a couple", "measurements that were weighed are no evidence and are left out"];
        return new Answer
        {
            Headline = headline,
            CallsForSafety = false,
            Tables =
            [
                new AnswerTable(
                    null,
                    [new Column("what", "name", false), new Column("against", "published", false), new Column("points", "points"), new Column("largest\nkJ", "largest_kJ"), new Column("at K", "temperature_K"), new Column("stated\nkJ", "stated_kJ"), new Column("reason where it exceeds", "reason", false) { IsProse = true }],
                    [.. all.Select(row => (IReadOnlyList<Cell>)[Cell.Word(row.Name), Cell.Word(row.Published), Cell.Of(row.Points, 0), Cell.Of(row.LargestKilojoules, 1), Cell.Of(row.Kelvin, 0), Cell.Of(row.StatedKilojoules, 1), Cell.Word(row.Reason)])]),
            ],
            Assumptions = assumptions,
            Json = writer => Write(writer, all, headline, assumptions),
        };
    }

    private static void Write(Utf8JsonWriter writer, ImmutableArray<PublishedDifference> all, string headline, string[] assumptions)
    {
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/against/1");
        writer.WriteString("headline", headline);
        writer.WriteStartArray("differences");
        foreach (PublishedDifference row in all)
        {
            writer.WriteStartObject();
            writer.WriteString("name", row.Name);
            writer.WriteString("published", row.Published);
            writer.WriteNumber("points", row.Points);
            writer.Number("largest_kJ", row.LargestKilojoules);
            writer.WriteNumber("temperature_K", row.Kelvin);
            writer.Number("stated_kJ", row.StatedKilojoules);
            writer.WriteBoolean("exceeds", row.Exceeds);
            writer.WriteString("reason", row.Reason);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Common(assumptions, [], null, [], [], []);
        writer.WriteEndObject();
    }
}
