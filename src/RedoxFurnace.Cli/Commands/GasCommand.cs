using System.Collections.Immutable;
using System.CommandLine;
using System.Text.Json;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>gas ANALYSIS --at T</c>: what a furnace gas does, and what every instrument should read.</summary>
internal static class GasCommand
{
    private static readonly string[] Used = ["O2", "CO", "CO2", "H2", "H2O", "C", "CH4", "NH3", "N2"];

    public static Command Create(Screen screen, CommonOptions common)
    {
        Argument<string?> analysis = new("ANALYSIS") { Description = "such as \"H2 30%, Ar 70%, frost -45C\"; with --as only what differs", Arity = ArgumentArity.ZeroOrOne };
        Option<string> at = new("--at") { Description = "temperatures; a range may run downwards: 880C..400C/20C", Required = true, HelpName = "T" };
        Option<string> preset = new("--as") { Description = "start from a generator gas: forming-gas, dissociated-ammonia, endothermic, exothermic-lean, exothermic-rich, dry-hydrogen, ...", HelpName = "GAS" };
        Option<string> frost = new("--frost") { Description = "frost point over ice, such as -45C or \"-45C at 6bara\"", HelpName = "T" };
        Option<string> dew = new("--dew") { Description = "dew point over (supercooled) water", HelpName = "T" };
        Option<string> moisture = new("--moisture") { Description = "a moisture reading whose scale is not known", HelpName = "READING" };
        Option<string> pressure = new("--pressure") { Description = "total pressure in the furnace (1 atm)", HelpName = "P" };
        Option<string> line = new("--line-pressure") { Description = "pressure of the sampling line, where a reading may have been taken", HelpName = "P" };
        Option<string> over = new("--over") { Description = "parts: activities Cr=0.13,Fe or mass percents Cr=18%,Ni=9%,Fe", HelpName = "LIST" };
        Option<string> coefficient = new("--coefficient") { Description = "activity coefficients beside mass percents: Cr=1.2", HelpName = "LIST" };
        Option<string> steel = new("--steel") { Description = "a steel whose carbon is asked about: C=0.35%,Mn=0.8%", HelpName = "LIST" };
        Option<string> probe = new("--probe-temperature") { Description = "temperature of the oxygen probe (furnace temperature)", HelpName = "T" };
        Command command = new("gas", "what a furnace gas does: equilibrium, readings, parts, carbon, soot") { analysis, at, preset, frost, dew, moisture, pressure, line, over, coefficient, steel, probe };
        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            TemperatureSeries series = TemperatureSeries.Parse(parsed.GetValue(at)!, "--at", mayFall: true);
            GeneratorGas? from = parsed.GetValue(preset) is { } name ? GeneratorGas.Get(name, database) : null;
            Pressure total = parsed.GetValue(pressure) is { } text ? Pressure.Parse(text, "--pressure") : from?.TotalPressure ?? Pressure.FromBar(PhysicalConstants.AtmosphereInBar);
            Pressure? sampling = parsed.GetValue(line) is { } place ? WaterReading.LinePressure(place, "--line-pressure") : null;
            string own = string.Join(", ", new[]
            {
                parsed.GetValue(analysis),
                parsed.GetValue(frost) is { } ice ? "frost " + ice : null,
                parsed.GetValue(dew) is { } liquid ? "dew " + liquid : null,
                parsed.GetValue(moisture) is { } open ? "moisture " + open : null,
            }.Where(part => !string.IsNullOrWhiteSpace(part)));
            if (from is null && own.Length == 0)
            {
                throw new RequestException("'gas' needs an analysis, such as \"H2 30%, Ar 70%, frost -45C\", or --as with a generator gas");
            }

            GasRequest request = new(GasAnalysis.Merge([.. new[] { from?.Analysis, own.Length > 0 ? own : null }.OfType<string>()], total, sampling), series.Points, total)
            {
                Preset = from,
                Following = from?.FollowsWaterGas == true ? Follower(own) : null,
                Parts = parsed.GetValue(over) is { } parts ? Alloy.Parse(parts, parsed.GetValue(coefficient), database) : null,
                Steel = parsed.GetValue(steel) is { } alloy ? SteelComposition.Parse(alloy) : null,
                ProbeAt = parsed.GetValue(probe) is { } own2 ? Temperature.Parse(own2, "--probe-temperature") : null,
            };
            GasResult result = GasReckoning.Of(request, database);
            return screen.Show(Present(result, series.Unit, common.UsUnits(parsed), database), common.Form(parsed));
        });
        return command;
    }

    /// <summary>Which of CO2 and H2O was left out of what the user gave: a moisture reading fixes CO2, a CO2 figure fixes the water.</summary>
    private static GasSpecies? Follower(string own)
    {
        bool water = own.Contains("frost", StringComparison.Ordinal) || own.Contains("dew", StringComparison.Ordinal) || own.Contains("moisture", StringComparison.Ordinal) || own.Contains("H2O", StringComparison.Ordinal);
        bool dioxide = own.Contains("CO2", StringComparison.Ordinal);
        return (water, dioxide) switch { (true, true) => null, (_, true) => GasSpecies.H2O, _ => GasSpecies.CO2 };
    }

    private static Answer Present(GasResult result, TemperatureUnit unit, bool us, SubstanceDatabase database)
    {
        GasMixture mixture = result.Points[0].Answer.Mixture;
        HazardNote[] hazards = [.. SafetyRules.Of(database).For(HazardContextBuilder.Build(new HazardWork
        {
            Gases = [.. Enum.GetValues<GasSpecies>().Where(species => mixture[species] > 1e-4).Select(species => species.ToString())],
            Products = result.Request.Parts is { } parts ? [.. parts.Elements.Select(element => element.Symbol)] : [],
            LowestKelvin = result.Points.Min(point => point.At.Kelvin),
            HighestKelvin = result.Points.Max(point => point.At.Kelvin),
            Vacuum = result.Request.Total.Bar < 0.1,
        }))];
        string[] sources = [.. Citations.Of(Used.Select(database.Get), database)];
        bool several = result.Points.Select(point => point.Meaning).Distinct().Count() > 1;
        return new Answer
        {
            Headline = result.Headline,
            Tables = [Gas(result, unit, us, several), Composition(result), .. result.Request.Parts is null ? Array.Empty<AnswerTable>() : [Metals(result, unit)], .. result.Request.Steel is null ? Array.Empty<AnswerTable>() : [Steel(result, unit, us)]],
            Notes = result.Notes,
            Ask = result.Ask,
            Assumptions = result.Assumptions,
            Hazards = hazards,
            Sources = sources,
            Json = writer => GasJson.Write(writer, result, hazards, sources),
        };
    }

    private static AnswerTable Gas(GasResult result, TemperatureUnit unit, bool us, bool several)
    {
        TemperatureColumns temperatures = new(unit, us);
        return new AnswerTable(
            null,
            [
                .. several ? [new Column("reading meant as", "meaning", false)] : Array.Empty<Column>(),
                .. temperatures.Columns,
                new Column("log10 pO2\nbar", "log10_pO2_bar"), new Column("log10 pO2\natm", "log10_pO2_atm"), new Column("probe\nmV", "probe_mV"),
                new Column("frost\nC", "frost_point_C"), new Column("dew\nC", "dew_point_C"), .. us ? [new Column("frost\nF", "frost_point_F"), new Column("dew\nF", "dew_point_F")] : Array.Empty<Column>(),
                new Column("H2O\nppm", "water_ppm"), new Column("H2/H2O", "h2_to_h2o"), new Column("CO/CO2", "co_to_co2"), new Column("carbon\nactivity", "carbon_activity"),
                new Column("at equilibrium\nlog10 pO2", "equilibrium_log10_pO2_bar"), new Column("carbon\nactivity", "equilibrium_carbon_activity"), new Column("soot\nmol/mol", "soot_mol_per_mol_gas"),
            ],
            [.. result.Points.Select(point => (IReadOnlyList<Cell>)[
                .. several ? [Cell.Word(point.Meaning)] : Array.Empty<Cell>(),
                .. temperatures.Cells(point.At),
                Cell.Of(point.Answer.AsAnalysed.Log10Oxygen, 2),
                Cell.Of(point.Answer.AsAnalysed.Log10Oxygen - Math.Log10(PhysicalConstants.AtmosphereInBar), 2),
                Cell.Of(point.ProbeMillivolts, 0),
                Cell.Of(Celsius(point.Water?.FrostPointKelvin), 1),
                Cell.Of(Celsius(point.Water?.DewPointKelvin), 1),
                .. us ? [Cell.Of(Fahrenheit(point.Water?.FrostPointKelvin), 1), Cell.Of(Fahrenheit(point.Water?.DewPointKelvin), 1)] : Array.Empty<Cell>(),
                Cell.Significant(point.Water?.Ppm),
                Cell.Significant(GasJson.Ratio(point.Answer.AsAnalysed, GasSpecies.H2, GasSpecies.H2O)),
                Cell.Significant(GasJson.Ratio(point.Answer.AsAnalysed, GasSpecies.CO, GasSpecies.CO2)),
                Cell.Significant(point.Answer.AsAnalysed.CarbonActivity),
                Cell.Of(point.Answer.AtEquilibrium.Log10Oxygen, 2),
                Cell.Significant(point.Answer.Homogeneous.CarbonActivity),
                Cell.Significant(point.Answer.AtEquilibrium.GraphiteMoles is > 0 and var soot ? soot : null),
            ])]);
    }

    private static AnswerTable Composition(GasResult result)
    {
        GasPoint point = result.Points[0];
        return new AnswerTable(
            $"Composition at {point.At}, % by volume",
            [new Column("gas", "species", false), new Column("analysis", "analysis_percent"), new Column("as analysed,\nshifted", "as_analysed_percent"), new Column("at\nequilibrium", "equilibrium_percent")],
            [.. Enum.GetValues<GasSpecies>().Where(species => point.Answer.Mixture[species] > 0 || point.Answer.AtEquilibrium.Fraction(species) > 1e-12).Select(species => (IReadOnlyList<Cell>)[
                Cell.Word(species.ToString()),
                Cell.Significant(100 * point.Answer.Mixture[species], 4),
                Cell.Significant(100 * point.Answer.AsAnalysed.Fraction(species), 4),
                Cell.Significant(100 * point.Answer.AtEquilibrium.Fraction(species), 4),
            ])]);
    }

    private static AnswerTable Metals(GasResult result, TemperatureUnit unit) => new(
        "Parts in the gas as analysed, most demanding first",
        [
            new Column("T " + Temperature.Symbol(unit), "temperature_" + Temperature.Symbol(unit)), new Column("metal", "metal", false), new Column("activity", "activity"), new Column("first oxide", "oxide", false),
            new Column("margin\nkJ/mol O2", "margin_kJ_per_mol_O2"), new Column("±", "uncertainty_kJ_per_mol_O2"), new Column("verdict", "verdict", false), new Column("limit\nlog10 pO2", "limit_log10_pO2_bar"),
            new Column("frost limit\nC", "limit_frost_point_C"), new Column("oxidises\nbelow C", "oxidises_below_C"), new Column("bright\nabove C", "bright_above_C"), new Column("nitride", "nitride", false), new Column("carbide", "carbide", false),
        ],
        [.. result.Points.SelectMany(point => point.Metals.Select(metal => (IReadOnlyList<Cell>)[
            Cell.Of(point.At.In(unit), 0),
            Cell.Word(metal.Element.Symbol),
            Cell.Significant(metal.Element.Activity),
            Cell.Word(metal.Oxide),
            Cell.Of(metal.Margin / 1000, 1),
            Cell.Of(metal.Uncertainty / 1000, 1),
            Cell.Word(GasReckoning.Word(metal.Verdict)),
            Cell.Of(metal.LimitLogOxygen / Math.Log(10), 2),
            Cell.Of(Celsius(metal.LimitWater?.FrostPointKelvin ?? metal.LimitWater?.DewPointKelvin), 1),
            Cell.Of(Celsius(metal.OxidisesBelowKelvin), 0),
            Cell.Of(Celsius(metal.BrightAboveKelvin), 0),
            Cell.Word(Compound(metal.Nitride)),
            Cell.Word(Compound(metal.Carbide)),
        ]))]);

    private static string? Compound(CompoundInGas? compound) => compound is null ? null : compound.Formula + (compound.Forms switch { true => " forms", false => " no", null => " may form" });

    private static AnswerTable Steel(GasResult result, TemperatureUnit unit, bool us)
    {
        TemperatureColumns temperatures = new(unit, us);
        return new AnswerTable(
            "Carbon: what the gas gives the steel, and neutral set-points for its own carbon (with the alloy terms, and without)",
            [
                .. temperatures.Columns, new Column("carbon\npotential %", "carbon_potential_percent"), new Column("steel\n% C", "carbon_percent"), new Column("±", "uncertainty_percent"),
                new Column("neutral\ndew C", "neutral_dew_point_C"), new Column("% CO2", "neutral_co2_percent"), new Column("probe\nmV", "neutral_probe_mV"),
                new Column("no alloy\ndew C", "plain_dew_point_C"), new Column("% CO2", "plain_co2_percent"), new Column("probe\nmV", "plain_probe_mV"), new Column("remark", "reason", false) { IsProse = true },
            ],
            [.. result.Points.Where(point => point.Steel is not null).Select(point => (IReadOnlyList<Cell>)[
                .. temperatures.Cells(point.At),
                Cell.Of(point.Steel!.CarbonPotential, 2),
                Cell.Of(point.Steel.Carbon, 2),
                Cell.Of(point.Steel.Uncertainty, 2),
                Cell.Of(Celsius(point.Steel.Neutral?.Water?.DewPointKelvin), 1),
                Cell.Of(point.Steel.Neutral?.DioxideShare * 100, 2),
                Cell.Of(point.Steel.Neutral?.ProbeMillivolts, 0),
                Cell.Of(Celsius(point.Steel.NeutralWithoutAlloy?.Water?.DewPointKelvin), 1),
                Cell.Of(point.Steel.NeutralWithoutAlloy?.DioxideShare * 100, 2),
                Cell.Of(point.Steel.NeutralWithoutAlloy?.ProbeMillivolts, 0),
                Cell.Word(point.Steel.Reason),
            ])]);
    }

    private static double? Celsius(double? kelvin) => kelvin - PhysicalConstants.ZeroCelsiusInKelvin;

    private static double? Fahrenheit(double? kelvin) => kelvin is { } value ? ((value - PhysicalConstants.ZeroCelsiusInKelvin) * 1.8) + 32 : null;
}
