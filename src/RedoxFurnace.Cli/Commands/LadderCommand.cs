using System.Collections.Immutable;
using System.CommandLine;
using System.Text.Json;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>ladder METAL --at T</c>: stable oxides in order, the steps between them, the temperatures at which they change.</summary>
internal static class LadderCommand
{
    public static Command Create(Screen screen, CommonOptions common)
    {
        Argument<string> metal = new("METAL") { Description = "element symbol, such as Fe" };
        Option<string> at = new("--at") { Description = "temperatures: 1000C, 700C,800C or 800C..1200C/50C", Required = true, HelpName = "T" };
        Option<string> activity = new("--activity") { Description = "activities, such as Cr=0.2,Cr2O3=0.5", HelpName = "LIST" };
        Option<string> pressure = new("--pressure") { Description = "pressure of metal vapour (1 bar)", HelpName = "P" };
        Command command = new("ladder", "which oxides of a metal are stable, in order, and the steps between them") { metal, at, activity, pressure };
        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            TemperatureSeries series = TemperatureSeries.Parse(parsed.GetValue(at)!, "--at");
            Pressure vapour = parsed.GetValue(pressure) is { } text ? Pressure.Parse(text, "--pressure") : Pressure.Standard;
            LadderReport report = LadderReport.Of(parsed.GetValue(metal)!, series, Activities.Parse(parsed.GetValue(activity), database), vapour, database);
            return screen.Show(Present(report, new TemperatureColumns(series.Unit, common.UsUnits(parsed))), common.Form(parsed));
        });
        return command;
    }

    private static Answer Present(LadderReport report, TemperatureColumns temperatures) => new()
    {
        Headline = Headline(report),
        Tables =
        [
            Steps(report, temperatures),
            new AnswerTable(
                "Where the ladder changes",
                [new Column("T C", "temperature_C"), new Column("T K", "temperature_K"), new Column("change", "change", false), new Column("reaction, towards rising temperature", "reaction", false) { IsProse = true }],
                [.. report.Invariants.Select(change => (IReadOnlyList<Cell>)[Cell.Of(change.Kelvin - PhysicalConstants.ZeroCelsiusInKelvin, 2), Cell.Of(change.Kelvin, 2), Cell.Word(Word(change.Change)), Cell.Word(change.Reaction)])]),
        ],
        Notes = report.Notes,
        Assumptions = report.Assumptions,
        Sources = report.Sources,
        CallsForSafety = false,
        Json = writer => Write(writer, report),
    };

    private static AnswerTable Steps(LadderReport report, TemperatureColumns temperatures)
    {
        List<IReadOnlyList<Cell>> rows = [];
        foreach (OxideLadder ladder in report.Ladders)
        {
            foreach (LadderStep step in ladder.Steps)
            {
                rows.Add([
                    .. temperatures.Cells(Temperature.FromKelvin(ladder.Kelvin)),
                    Cell.Word(step.Couple.Name),
                    Cell.Word(step.Couple.Formation.Text),
                    Cell.Of(step.Gap is null ? step.StandardGibbs / 1000 : null, 1),
                    Cell.Of(report.Expanded(step, ladder.Kelvin) / 1000, 1),
                    Cell.Of(step.OxygenPotential is { } potential ? OxygenPotentialReadings.Log10Bar(potential, ladder.Kelvin) : null, 2),
                ]);
            }
        }

        return new AnswerTable(
            null,
            [.. temperatures.Columns, new Column("couple", "couple", false), new Column("step, per mol O2", "reaction", false), new Column("dG0 kJ/mol O2", "dG_kJ_per_mol_O2"), new Column("±", "uncertainty_kJ_per_mol_O2"), new Column("log10 pO2 bar", "log10_pO2_bar")],
            rows);
    }

    private static string Headline(LadderReport report)
    {
        OxideLadder first = report.Ladders[0];
        string names = string.Join(", ", first.Rungs.Select(rung => rung.Name));
        string place = Temperature.FromKelvin(first.Kelvin).ToString();
        return report.Ladders.Length == 1
            ? $"{report.Metal} at {place}: {names}, from the metal upwards."
            : $"{report.Metal} from {place} to {Temperature.FromKelvin(report.Ladders[^1].Kelvin)}: {names} at the start; the ladder changes {report.Invariants.Length} time{(report.Invariants.Length == 1 ? string.Empty : "s")} in between.";
    }

    private static string Word(LadderChange change) => change switch
    {
        LadderChange.Invariant => "invariant",
        LadderChange.DataEnd => "data end",
        _ => "boiling",
    };

    private static void Write(Utf8JsonWriter writer, LadderReport report)
    {
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/ladder/1");
        writer.WriteString("metal", report.Metal);
        writer.WriteStartArray("rows");
        foreach (OxideLadder ladder in report.Ladders)
        {
            WriteRow(writer, report, ladder);
        }

        writer.WriteEndArray();
        writer.WriteStartArray("invariants");
        foreach (LadderInvariant change in report.Invariants)
        {
            writer.WriteStartObject();
            writer.WriteNumber("temperature_K", change.Kelvin);
            writer.WriteString("change", Word(change.Change));
            writer.WriteString("phase", change.Phase);
            writer.WriteString("reaction", change.Reaction);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Common(report.Assumptions, report.Sources, report.DataRange, report.Notes, [], []);
        writer.WriteEndObject();
    }

    private static void WriteRow(Utf8JsonWriter writer, LadderReport report, OxideLadder ladder)
    {
        writer.WriteStartObject();
        writer.WriteNumber("temperature_K", ladder.Kelvin);
        writer.Texts("stable", ladder.Rungs.Select(rung => rung.Name));
        writer.Texts("unstable", ladder.Unstable.Select(oxide => oxide.Id));
        writer.WriteStartArray("steps");
        foreach (LadderStep step in ladder.Steps)
        {
            writer.WriteStartObject();
            writer.WriteString("couple", step.Couple.Name);
            writer.WriteString("reaction", step.Couple.Formation.Text);
            writer.Number("dG_kJ_per_mol_O2", step.Gap is null ? step.StandardGibbs / 1000 : null);
            writer.Number("uncertainty_kJ_per_mol_O2", report.Expanded(step, ladder.Kelvin) / 1000);
            writer.Number("log10_pO2_bar", step.OxygenPotential is { } potential ? OxygenPotentialReadings.Log10Bar(potential, ladder.Kelvin) : null);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteStartArray("phases_of_variable_composition");
        foreach (LadderRung rung in ladder.Rungs.Where(rung => rung.Lowest.Parts[0].Substance.Group is not null))
        {
            writer.WriteStartObject();
            writer.WriteString("phase", rung.Name);
            writer.WriteNumber("iron_per_oxygen_low", 1 / rung.Highest.Oxygen);
            writer.WriteNumber("iron_per_oxygen_high", 1 / rung.Lowest.Oxygen);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteEndObject();
    }
}
