using System.Collections.Immutable;
using System.CommandLine;
using System.Text.Json;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>overview --at T</c>: margins of many oxides against many reductants.</summary>
internal static class OverviewCommand
{
    public static Command Create(Screen screen, CommonOptions common)
    {
        Option<string> at = new("--at") { Description = "one temperature, such as 1200C", Required = true, HelpName = "T" };
        Option<string> of = new("--of") { Description = "oxides, such as Cr2O3,FeO,MnO (every simple oxide with data)", HelpName = "LIST" };
        Option<string> with = new("--with") { Description = "reductants (all of the list)", HelpName = "LIST" };
        Option<string> ratio = new("--gas-ratio") { Description = "pH2/pH2O and pCO/pCO2 (100)", HelpName = "RATIO" };
        Command command = new("overview", "margins of many oxides against many reductants at one temperature") { at, of, with, ratio };
        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            Temperature temperature = Temperature.Parse(parsed.GetValue(at)!, "--at");
            double share = parsed.GetValue(ratio) is { } text ? NumberWithUnit.ParsePlain(text, "--gas-ratio") : RankConditions.UsualGasRatio;
            if (!(share > 0))
            {
                throw new RequestException($"--gas-ratio '{parsed.GetValue(ratio)}' is out of range; a ratio must be above 0");
            }

            ImmutableArray<string> oxides = parsed.GetValue(of) is { } list ? [.. Names(list).Select(name => Simple(name, database))] : [.. SimpleOxides(database)];
            ImmutableArray<string> reductants = parsed.GetValue(with) is { } wanted
                ? [.. Names(wanted).Select(name => ReductantCatalogue.Of(database).Get(name).Id)]
                : [.. ReductantCatalogue.Of(database).Listed.Select(reductant => reductant.Id)];
            MarginTable table = MarginTable.Of(oxides, reductants, [temperature], new RankConditions { GasRatio = share }, database);
            return screen.Show(Present(table), common.Form(parsed));
        });
        return command;
    }

    /// <summary>Every condensed oxide of one metal.</summary>
    public static IEnumerable<string> SimpleOxides(SubstanceDatabase database)
        => database.All.Where(IsSimple).Where(oxide => database.Metal(oxide.Formula.Atoms.Keys.First(element => element != "O")) is not null).Select(oxide => oxide.Id).Order(StringComparer.Ordinal);

    private static bool IsSimple(Substance substance) => !substance.IsGas && substance.Formula.Atoms.Count == 2 && substance.Formula.Of("O") > 0 && substance.Formula.Of("H") <= 0 && substance.Formula.Of("C") <= 0 && substance.Formula.Of("N") <= 0;

    private static string[] Names(string list) => list.Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries);

    private static string Simple(string name, SubstanceDatabase database)
    {
        Substance oxide = database.Get(name);
        return IsSimple(oxide) ? oxide.Id : throw new RequestException($"--of '{name}' is not a simple condensed oxide; give one such as Cr2O3");
    }

    private static Answer Present(MarginTable table)
    {
        (string Name, int Works)[] counts = [.. table.Reductants.Select((name, r) => (name, Enumerable.Range(0, table.Oxides.Length).Count(o => table.Margin(o, r, 0) > 0)))];
        string words = string.Join("; ", counts.OrderByDescending(count => count.Works).Take(4).Select(count => $"{count.Name} takes the oxygen off {count.Works}"));
        return new Answer
        {
            Headline = $"At {table.At[0]}, of {table.Oxides.Length} oxides, {words}.",
            Tables =
            [
                new AnswerTable(
                    "Margin, kJ/mol O2: positive reduces, by the hardest step",
                    [new Column("oxide", "oxide", false), .. table.Reductants.Select(name => new Column(name, name + "_kJ_per_mol_O2"))],
                    [.. table.Oxides.Select((oxide, o) => (IReadOnlyList<Cell>)[Cell.Word(oxide), .. table.Reductants.Select((_, r) => Cell.Of(table.Margin(o, r, 0) / 1000, 0))])]),
            ],
            Assumptions = ["activities 1, each gas at 1 bar, graphite with CO and CO2 at 1 bar together", "no uncertainty here: 'rank' gives it, with crossovers, masses and what else forms", "equilibrium, not rate"],
            Json = writer => Write(writer, table),
        };
    }

    private static void Write(Utf8JsonWriter writer, MarginTable table)
    {
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/overview/1");
        writer.WriteNumber("temperature_K", table.At[0].Kelvin);
        writer.Texts("reductants", table.Reductants);
        writer.WriteStartArray("rows");
        for (int o = 0; o < table.Oxides.Length; o++)
        {
            writer.WriteStartObject();
            writer.WriteString("oxide", table.Oxides[o]);
            writer.WriteStartArray("margins_kJ_per_mol_O2");
            for (int r = 0; r < table.Reductants.Length; r++)
            {
                if (table.Margin(o, r, 0) is { } margin)
                {
                    writer.WriteNumberValue(margin / 1000);
                }
                else
                {
                    writer.WriteNullValue();
                }
            }

            writer.WriteEndArray();
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Common(["activities 1, each gas at 1 bar"], [], null, ["null: no data at this temperature, or an oxide against its own metal"], [], []);
        writer.WriteEndObject();
    }
}
