using System.Collections.Immutable;
using System.CommandLine;
using System.Globalization;
using System.Text.Json;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>oxides check</c>: the database's own examiner. Exit code 1 when a finding is an error.</summary>
internal static class OxidesCheckCommand
{
    public static Command Create(Screen screen, CommonOptions common)
    {
        Command command = new("check", "examine every entry: ranges, continuity, heat capacities, sources, uncertainties");
        command.SetAction(parsed =>
        {
            ImmutableArray<DatabaseFinding> findings = common.OverlayFiles(parsed) is { } files
                ? DatabaseExaminer.ExamineOverlay(files)
                : DatabaseExaminer.Examine(SubstanceDatabase.Bundled);
            screen.Show(Present(findings), common.Form(parsed));
            return findings.Any(finding => finding.Severity == FindingSeverity.Error) ? CommandLine.Failed : CommandLine.Done;
        });
        return command;
    }

    private static Answer Present(ImmutableArray<DatabaseFinding> findings)
    {
        int errors = findings.Count(finding => finding.Severity == FindingSeverity.Error);
        int warnings = findings.Count(finding => finding.Severity == FindingSeverity.Warning);
        return new Answer
        {
            Headline = $"{(errors == 0 ? "The database is sound" : "The database has faults")}: {errors} errors, {warnings} warnings, {findings.Length - errors - warnings} notices.",
            CallsForSafety = false,
            Tables =
            [
                new AnswerTable(
                    null,
                    [new Column("severity", "severity", false), new Column("rule", "id", false), new Column("where", "where", false), new Column("finding", "message", false) { IsProse = true }],
                    [.. findings.Select(finding => (IReadOnlyList<Cell>)[Cell.Word(Word(finding)), Cell.Word(finding.Id), Cell.Word($"{finding.At.File}:{finding.At.Line.ToString(CultureInfo.InvariantCulture)}"), Cell.Word(finding.Message)])]),
            ],
            Json = writer => Write(writer, findings, errors, warnings),
        };
    }

    private static string Word(DatabaseFinding finding) => finding.Severity.ToString().ToLowerInvariant();

    private static void Write(Utf8JsonWriter writer, ImmutableArray<DatabaseFinding> findings, int errors, int warnings)
    {
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/database-check/1");
        writer.WriteNumber("errors", errors);
        writer.WriteNumber("warnings", warnings);
        writer.WriteStartArray("findings");
        foreach (DatabaseFinding finding in findings)
        {
            writer.WriteStartObject();
            writer.WriteString("id", finding.Id);
            writer.WriteString("severity", Word(finding));
            writer.WriteString("file", finding.At.File);
            writer.WriteNumber("line", finding.At.Line);
            writer.WriteString("message", finding.Message);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Common([], [], null, [], [], []);
        writer.WriteEndObject();
    }
}
