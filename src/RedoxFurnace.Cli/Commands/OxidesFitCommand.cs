using System.Collections.Immutable;
using System.CommandLine;
using System.Globalization;
using System.Text.Json;
using RedoxFurnace.Assessments;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>oxides fit DATA.csv --couple EQUATION</c>: a user's measured points to a line and to heats and entropies.</summary>
internal static class OxidesFitCommand
{
    private const string Error = "error";
    private static readonly string[] Temperatures = ["temperature_C", "temperature_K"];
    private static readonly string[] Readings = ["emf_mV", "pO2_bar", "log10_pO2_bar", "co_to_co2", "h2_to_h2o", "K", "log10_K"];

    public static Command Create(Screen screen, CommonOptions common)
    {
        Argument<string> data = new("DATA") { Description = "CSV: temperature_C or temperature_K; one of " + string.Join(", ", Readings) + " (emf against air); error (k = 2, same unit) if known" };
        Option<string> couple = new("--couple") { Description = "the couple measured, such as \"2 Ni + O2 = 2 NiO\"", Required = true, HelpName = "EQUATION" };
        Command command = new("fit", "your own measured points to a line, to heats and entropies, and to an entry ready to paste") { data, couple };
        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            Reaction written = ReactionBalance.Of(ReactionEquation.Parse(parsed.GetValue(couple)!), database).Reaction;
            double oxygen = -written.NumberOf(database.Get("O2"));
            if (oxygen <= 0)
            {
                throw new RequestException($"--couple '{parsed.GetValue(couple)}' has no O2 on its left; write such as \"2 Ni + O2 = 2 NiO\"");
            }

            string file = parsed.GetValue(data)!;
            ImmutableArray<MeasuredPotential> points = Read(file, new GasReactions(database), oxygen);
            CoupleFitResult result = CoupleFit.Of(written.Times(1 / oxygen), points);
            return screen.Show(Present(result, Path.GetFileName(file), database), common.Form(parsed));
        });
        return command;
    }

    private static ImmutableArray<MeasuredPotential> Read(string file, GasReactions gases, double oxygen)
    {
        if (!File.Exists(file))
        {
            throw new RequestException($"'{file}' does not exist; give a CSV file with a heading such as temperature_C,emf_mV");
        }

        string name = Path.GetFileName(file);
        (string Text, int Number)[] lines = [.. File.ReadLines(file).Select((text, i) => (text.Trim(), i + 1)).Where(line => line.Item1.Length > 0 && !line.Item1.StartsWith('#'))];
        if (lines.Length == 0)
        {
            throw new RequestException($"'{file}' is empty; the first line names the columns, such as temperature_C,emf_mV");
        }

        string[] heading = lines[0].Text.Split(',', StringSplitOptions.TrimEntries);
        foreach (string column in heading.Where(column => !Temperatures.Contains(column) && !Readings.Contains(column) && column != Error))
        {
            throw new RequestException($"{name}:{lines[0].Number.ToString(CultureInfo.InvariantCulture)}: {RequestException.UnknownWord("column", column, [.. Temperatures, .. Readings, Error]).Message}");
        }

        int temperature = Array.FindIndex(heading, Temperatures.Contains);
        int[] readings = [.. Enumerable.Range(0, heading.Length).Where(i => Readings.Contains(heading[i]))];
        if (temperature < 0 || readings.Length != 1 || heading.Distinct().Count() != heading.Length || heading.Count(Temperatures.Contains) != 1)
        {
            throw new RequestException($"{name}:{lines[0].Number.ToString(CultureInfo.InvariantCulture)}: the heading '{lines[0].Text}' needs one of {string.Join(", ", Temperatures)} and one of {string.Join(", ", Readings)}");
        }

        int error = Array.IndexOf(heading, Error);
        return [.. lines.Skip(1).Select(line => Point(line, $"{name}:{line.Number.ToString(CultureInfo.InvariantCulture)}", heading, temperature, readings[0], error, gases, oxygen))];
    }

    private static MeasuredPotential Point((string Text, int Number) line, string where, string[] heading, int temperature, int reading, int error, GasReactions gases, double oxygen)
    {
        string[] cells = line.Text.Split(',', StringSplitOptions.TrimEntries);
        if (cells.Length != heading.Length)
        {
            throw new RequestException($"{where}: {cells.Length.ToString(CultureInfo.InvariantCulture)} cells, the heading has {heading.Length.ToString(CultureInfo.InvariantCulture)}");
        }

        double Number(int column) => double.TryParse(cells[column], NumberStyles.Float, CultureInfo.InvariantCulture, out double value) && double.IsFinite(value)
            ? value
            : throw new RequestException($"{where}: {heading[column]} '{cells[column]}' is no number; write it with a decimal point");

        double kelvin = Number(temperature) + (heading[temperature] == "temperature_C" ? PhysicalConstants.ZeroCelsiusInKelvin : 0);
        double value = Number(reading);
        string kind = heading[reading];
        if (!(kelvin > 0) || (kind is not ("emf_mV" or "log10_pO2_bar" or "log10_K") && value <= 0))
        {
            throw new RequestException($"{where}: {(kelvin > 0 ? kind : heading[temperature])} '{(kelvin > 0 ? cells[reading] : cells[temperature])}' is out of range; above {(kelvin > 0 ? "0" : "absolute zero")}");
        }

        double? spread = null;
        if (error >= 0)
        {
            double half = Number(error) / 2;
            if (half <= 0)
            {
                throw new RequestException($"{where}: error '{cells[error]}' must be above 0 (k = 2); a point without error would outweigh all others; leave the column out where none is known");
            }

            double step = Math.Min(half, kind is "emf_mV" or "log10_pO2_bar" or "log10_K" ? half : value / 2);
            spread = Math.Abs(Potential(kind, value + step, kelvin, gases, oxygen) - Potential(kind, value, kelvin, gases, oxygen)) * half / step;
        }

        return new MeasuredPotential($"line {line.Number.ToString(CultureInfo.InvariantCulture)}", kelvin, Potential(kind, value, kelvin, gases, oxygen), spread);
    }

    /// <summary>RT ln pO2; ratios are reducing over oxidised gas, K is that of the couple as written.</summary>
    private static double Potential(string kind, double value, double kelvin, GasReactions gases, double oxygen)
    {
        double rt = PhysicalConstants.GasConstant * kelvin;
        return kind switch
        {
            "emf_mV" => (rt * Math.Log(PhysicalConstants.OxygenInAir * PhysicalConstants.AtmosphereInBar)) - (4 * PhysicalConstants.Faraday * value / 1000),
            "pO2_bar" => rt * Math.Log(value),
            "log10_pO2_bar" => rt * value * Math.Log(10),
            "co_to_co2" => GasReactions.PotentialOfRatio(gases.CarbonMonoxideOxidation, kelvin, Math.Log(value)),
            "h2_to_h2o" => GasReactions.PotentialOfRatio(gases.HydrogenOxidation, kelvin, Math.Log(value)),
            "K" => -rt * Math.Log(value) / oxygen,
            _ => -rt * value * Math.Log(10) / oxygen,
        };
    }

    private static Answer Present(CoupleFitResult result, string file, SubstanceDatabase database)
    {
        string headline = FormattableString.Invariant(
            $"{result.Formation.Text}: dG0 = {result.Constant.Value / 1000:0.0} {(result.Slope.Value < 0 ? "-" : "+")} {Math.Abs(result.Slope.Value) / 1000:0.00000} T kJ/mol O2, within {result.LineLimit / 1000:0.0} (95 %) from {result.Points.Min(point => point.Point.Kelvin):0} to {result.Points.Max(point => point.Point.Kelvin):0} K.");
        string entry = Entry(result, file);
        string[] notes = [.. Notes(result), "entry for a folder of your own: " + entry, "and its sources.yaml: " + OwnSource(file)];
        string[] assumptions =
        [
            "condensed partners pure; limits are 95 % confidence (Student's t) of scatter and stated errors, not of faults common to all points",
            "second and third law use the database's heat capacities, the third its entropies as well",
        ];
        string[] sources = [$"your measurements in {file}", .. Citations.Of(result.Formation.Terms.Select(term => term.Substance), database)];
        return new Answer
        {
            Headline = headline,
            CallsForSafety = false,
            Tables =
            [
                new AnswerTable(
                    null,
                    [new Column("value", "value", false), new Column("unit", "unit", false), new Column("fitted", "fitted"), new Column("± 95 %", "limit_95"), new Column("database", "database")],
                    [.. Values(result).Select(row => (IReadOnlyList<Cell>)[Cell.Word(row.Name), Cell.Word(row.Unit), Cell.Of(row.Value?.Value, 3), Cell.Of(row.Value?.Limit, 3), Cell.Of(row.Database, 3)])]),
                new AnswerTable(
                    "Points",
                    [new Column("point", "point", false), new Column("T K", "temperature_K"), new Column("measured\nkJ/mol O2", "potential_kJ_per_mol_O2"), new Column("less line", "residual_kJ_per_mol_O2"), new Column("pull", "pull"), new Column("less database", "off_database_kJ_per_mol_O2"), new Column("", "mark", false)],
                    [.. result.Points.Select(point => (IReadOnlyList<Cell>)[
                        Cell.Word(point.Point.Label), Cell.Of(point.Point.Kelvin, 2), Cell.Of(point.Point.Joules / 1000, 2), Cell.Of(point.Residual / 1000, 2), Cell.Of(point.Pull, 1), Cell.Of(point.OffDatabase / 1000, 2), Cell.Word(point.IsOutlier ? "outlier" : null),
                    ])]),
            ],
            Notes = notes,
            Assumptions = assumptions,
            Sources = sources,
            Json = writer => Write(writer, result, headline, entry, OwnSource(file), notes, assumptions, sources),
        };
    }

    private static IEnumerable<(string Name, string Key, string Unit, FittedValue? Value, double? Database)> Values(CoupleFitResult result)
    {
        FittedValue? Kilo(FittedValue? value) => value is null ? null : new FittedValue(value.Value / 1000, value.Limit / 1000);
        yield return ("line, A", "line_constant", "kJ/mol O2", Kilo(result.Constant), null);
        yield return ("line, B", "line_slope", "J/(K mol O2)", result.Slope, null);
        yield return ("second law, dH298", "second_law_dH298", "kJ/mol O2", Kilo(result.SecondLawEnthalpy), result.DatabaseEnthalpy / 1000);
        yield return ("second law, dS298", "second_law_dS298", "J/(K mol O2)", result.SecondLawEntropy, result.DatabaseEntropy);
        yield return ("third law, dH298", "third_law_dH298", "kJ/mol O2", Kilo(result.ThirdLawEnthalpy), result.DatabaseEnthalpy / 1000);
        yield return ("third law, trend", "third_law_trend", "J/(K mol O2)", result.ThirdLawTrend, null);
    }

    private static IEnumerable<string> Notes(CoupleFitResult result)
    {
        foreach (FittedPoint outlier in result.Points.Where(point => point.IsOutlier).OrderByDescending(point => Math.Abs(point.Pull!.Value)))
        {
            yield return FormattableString.Invariant($"{outlier.Point.Label} ({outlier.Point.Kelvin:0.##} K) is an outlier: pull {outlier.Pull:+0.0;-0.0} against the line of the others; it is kept in the fit, look at it and drop it if it is wrong");
        }

        if (result.ThirdLawTrend is { } trend && Math.Abs(trend.Value) > trend.Limit)
        {
            yield return FormattableString.Invariant($"third-law enthalpies drift by {trend.Value:0.0} ± {trend.Limit:0.0} J/K: the measurement and the database's entropies disagree");
        }

        foreach (string note in result.Notes)
        {
            yield return note;
        }
    }

    /// <summary>The entry in one line of flow YAML, so that it survives being copied from a terminal of any width.</summary>
    private static string Entry(CoupleFitResult result, string file)
    {
        Substance product = result.Formation.Terms.Where(term => term.Number > 0).MaxBy(term => term.Substance.Formula.Of("O")).Substance;
        double middle = result.Points.Average(point => point.Point.Kelvin);
        string state = (product.PhaseAt(middle)?.State ?? MatterState.Solid).ToString().ToLowerInvariant();
        string kind = product.Class == SubstanceClass.CompoundOxide ? "compound-oxide" : product.Class.ToString().ToLowerInvariant();
        string reaction = string.Join(" = ", new[] { -1, 1 }.Select(sign => string.Join(" + ", result.Formation.Terms.Where(term => term.Number * sign > 0).Select(term => FormattableString.Invariant($"{Math.Abs(term.Number):0.##########} {term.Substance.Id}")))));
        double low = result.Points.Min(point => point.Point.Kelvin), high = result.Points.Max(point => point.Point.Kelvin);
        return FormattableString.Invariant(
            $"{{ substances: [ {{ formula: {product.Id}, class: {kind}, phases: [ {{ label: {state}, state: {state}, model: line, source: own-measurement, provenance: retrieved, note: \"fitted to {result.Points.Length} points of {file.Replace('"', ' ').Replace('\\', ' ')}\", pieces: [ {{ range_k: [{low:0.##}, {high:0.##}], reaction: \"{reaction}\", gibbs_j: [{result.Constant.Value:0}, {result.Slope.Value:0.###}], uncertainty_kj: {Math.Max(result.LineLimit / 1000, 0.01):0.##} }} ] }} ] }} ] }}");
    }

    private static string OwnSource(string file)
        => $"{{ sources: [ {{ key: own-measurement, citation: \"Own measurement, {file.Replace('"', ' ').Replace('\\', ' ')}\", licence: \"own data\", taken: \"points of one couple\", provenance: retrieved }} ] }}";

    private static void Write(Utf8JsonWriter writer, CoupleFitResult result, string headline, string entry, string entrySource, string[] notes, string[] assumptions, string[] sources)
    {
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/fit/1");
        writer.WriteString("headline", headline);
        writer.WriteString("couple", result.Formation.Text);
        writer.WriteStartArray("values");
        foreach ((string _, string key, string unit, FittedValue? value, double? known) in Values(result))
        {
            writer.WriteStartObject();
            writer.WriteString("name", key);
            writer.WriteString("unit", unit);
            writer.Number("fitted", value?.Value);
            writer.Number("limit_95", value?.Limit);
            writer.Number("database", known);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Number("line_limit_95_kJ_per_mol_O2", result.LineLimit / 1000);
        writer.WriteStartArray("points");
        foreach (FittedPoint point in result.Points)
        {
            writer.WriteStartObject();
            writer.WriteString("point", point.Point.Label);
            writer.WriteNumber("temperature_K", point.Point.Kelvin);
            writer.Number("potential_kJ_per_mol_O2", point.Point.Joules / 1000);
            writer.Number("residual_kJ_per_mol_O2", point.Residual / 1000);
            writer.Number("pull", point.Pull);
            writer.WriteBoolean("outlier", point.IsOutlier);
            writer.Number("off_database_kJ_per_mol_O2", point.OffDatabase / 1000);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteString("entry", entry);
        writer.WriteString("entry_source", entrySource);
        writer.Common(assumptions, sources, (result.Points.Min(point => point.Point.Kelvin), result.Points.Max(point => point.Point.Kelvin)), notes, [], []);
        writer.WriteEndObject();
    }
}
