using System.CommandLine;
using System.Text.Json;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>atmosphere OXIDE --at T</c>: what a gas must be to take the oxygen off.</summary>
internal static class AtmosphereCommand
{
    public static Command Create(Screen screen, CommonOptions common)
    {
        Argument<string> oxide = new("OXIDE") { Description = "the oxide, such as Cr2O3" };
        Option<string> at = new("--at") { Description = "temperatures: 1000C, 700C,800C or 600C..1300C/50C", Required = true, HelpName = "T" };
        Option<string> activity = new("--activity") { Description = "activities, such as Cr=0.2", HelpName = "LIST" };
        Option<string> hydrogen = new("--hydrogen") { Description = "share of hydrogen in the gas (100%)", HelpName = "SHARE" };
        Option<string> pressure = new("--pressure") { Description = "total pressure (1 bar)", HelpName = "P" };
        Option<string> metal = new("--metal") { Description = "the metal meant in an oxide of several", HelpName = "ELEMENT" };
        Option<string> uncertainty = new("--uncertainty") { Description = "sample=10000: percentiles from errors drawn with their covariance", HelpName = "sample=N" };
        Command command = new("atmosphere", "the gas in balance with an oxide: pO2, CO/CO2, H2/H2O, frost point, probe millivolts") { oxide, at, activity, hydrogen, pressure, metal, uncertainty };
        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            AtmosphereRequest request = new(
                parsed.GetValue(oxide)!,
                parsed.GetValue(metal),
                TemperatureSeries.Parse(parsed.GetValue(at)!, "--at"),
                Activities.Parse(parsed.GetValue(activity), database),
                parsed.GetValue(hydrogen) is { } share ? Share.Parse(share, "--hydrogen") : 1,
                parsed.GetValue(pressure) is { } total ? Pressure.Parse(total, "--pressure") : Pressure.Standard)
            {
                Draws = parsed.GetValue(uncertainty) is { } draws ? Reductants.RankSampling.Parse(draws) : null,
            };
            AtmosphereResult result = AtmosphereWindow.Of(request, database);
            return screen.Show(Present(result, common.UsUnits(parsed), database), common.Form(parsed));
        });
        return command;
    }

    private static Answer Present(AtmosphereResult result, bool us, SubstanceDatabase database)
    {
        HazardNote[] hazards = [.. SafetyRules.Of(database).For(HazardContextBuilder.Build(new HazardWork
        {
            Charge = [result.Oxide],
            Reductants = ["H2"],
            Products = [result.Metal],
            LowestKelvin = result.Rows.Min(row => row.Kelvin),
            HighestKelvin = result.Rows.Max(row => row.Kelvin),
        }))];
        string[] sources = [.. Citations.Of(result.Used, database)];
        return new Answer
        {
            Headline = char.ToUpperInvariant(result.Headline[0]) + result.Headline[1..],
            Tables = [Table(result, us), .. result.Request.Draws is null ? Array.Empty<AnswerTable>() : [Percentiles(result)]],
            Notes = result.Notes,
            Assumptions = result.Assumptions,
            Hazards = hazards,
            Sources = sources,
            Json = writer => Write(writer, result, hazards, sources),
        };
    }

    private static AnswerTable Table(AtmosphereResult result, bool us)
    {
        TemperatureColumns temperatures = new(result.Request.At.Unit, us);
        return new AnswerTable(
            null,
            [
                .. temperatures.Columns, new Column("couple", "couple", false), new Column("dG0\nkJ/mol O2", "dG_kJ_per_mol_O2"), new Column("±", "uncertainty_kJ_per_mol_O2"),
                new Column("log10 pO2\nbar", "log10_pO2_bar"), new Column("±", "log10_pO2_uncertainty"), new Column("CO/CO2\nat least", "co_to_co2_min"), new Column("H2/H2O\nat least", "h2_to_h2o_min"),
                new Column("frost or dew\nat most C", "frost_point_C_max"), new Column("±", "frost_point_uncertainty_C"), .. us ? [new Column("at most F", "frost_point_F_max")] : Array.Empty<Column>(),
                new Column("supercooled\ndew C", "dew_point_supercooled_C_max"), new Column("H2O\nppm", "water_ppm_max"), new Column("probe\nmV", "probe_mV"), new Column("±", "probe_uncertainty_mV"), new Column("decomposition\nV", "decomposition_V"),
            ],
            [.. result.Rows.Select(row => (IReadOnlyList<Cell>)[
                .. temperatures.Cells(Temperature.FromKelvin(row.Kelvin)),
                Cell.Word(row.Couple),
                Cell.Of(row.StandardGibbs / 1000, 1),
                Cell.Of(row.ExpandedUncertainty / 1000, 1),
                Cell.Of(row.Log10OxygenBar, 2),
                Cell.Of(row.Log10OxygenUncertainty, 2),
                Cell.Significant(Power(row.Log10MonoxideRatio)),
                Cell.Significant(Power(row.Log10HydrogenRatio)),
                Cell.Of(Celsius(row.FrostKelvin), 1),
                Cell.Of(row.FrostUncertaintyKelvin, 1),
                .. us ? [Cell.Of((Celsius(row.FrostKelvin) * 1.8) + 32, 1)] : Array.Empty<Cell>(),
                Cell.Of(Celsius(row.DewOverSupercooledKelvin), 1),
                Cell.Significant(row.WaterPpm),
                Cell.Of(row.ProbeMillivolts, 0),
                Cell.Of(row.ProbeUncertaintyMillivolts, 0),
                Cell.Of(row.DecompositionVolts, 3),
            ])]);
    }

    private static AnswerTable Percentiles(AtmosphereResult result) => new(
        "From sampled errors of the data: 5, 50 and 95 %",
        [
            new Column("T C", "temperature_C"), new Column("couple", "couple", false), new Column("log10 pO2\n5 %", "log10_pO2_p05"), new Column("50 %", "log10_pO2_p50"), new Column("95 %", "log10_pO2_p95"),
            new Column("frost or dew C\n5 %", "frost_p05_C"), new Column("50 %", "frost_p50_C"), new Column("95 %", "frost_p95_C"),
        ],
        [.. result.Rows.Where(row => !row.Log10OxygenPercentiles.IsEmpty).Select(row => (IReadOnlyList<Cell>)[
            Cell.Of(row.Kelvin - PhysicalConstants.ZeroCelsiusInKelvin, 1), Cell.Word(row.Couple),
            .. row.Log10OxygenPercentiles.Select(value => Cell.Of(value, 2)),
            .. Enumerable.Range(0, 3).Select(i => Cell.Of(row.FrostPercentiles.Length > i ? Celsius(row.FrostPercentiles[i]) : null, 1)),
        ])]);

    private static double? Power(double? log10) => log10 is { } value ? Math.Pow(10, value) : null;

    private static double? Celsius(double? kelvin) => kelvin - PhysicalConstants.ZeroCelsiusInKelvin;

    private static void Write(Utf8JsonWriter writer, AtmosphereResult result, HazardNote[] hazards, string[] sources)
    {
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/atmosphere/1");
        writer.WriteString("headline", result.Headline);
        writer.WriteString("oxide", result.Oxide);
        writer.WriteString("metal", result.Metal);
        writer.WriteNumber("hydrogen_share", result.Request.HydrogenShare);
        writer.WriteNumber("pressure_bar", result.Request.Total.Bar);
        writer.WriteStartArray("rows");
        foreach (AtmosphereRow row in result.Rows)
        {
            writer.WriteStartObject();
            writer.WriteNumber("temperature_K", row.Kelvin);
            writer.WriteString("couple", row.Couple);
            writer.WriteString("reaction", row.Reaction);
            writer.WriteBoolean("hardest", row.IsHardest);
            writer.Number("dG_kJ_per_mol_O2", row.StandardGibbs / 1000);
            writer.Number("uncertainty_kJ_per_mol_O2", row.ExpandedUncertainty / 1000);
            writer.Number("oxygen_potential_kJ_per_mol_O2", row.OxygenPotential / 1000);
            writer.Number("log10_pO2_bar", row.Log10OxygenBar);
            writer.Number("log10_pO2_uncertainty", row.Log10OxygenUncertainty);
            writer.Number("co_to_co2_min", Power(row.Log10MonoxideRatio));
            writer.Number("h2_to_h2o_min", Power(row.Log10HydrogenRatio));
            writer.Number("log10_h2_to_h2o_uncertainty", row.Log10HydrogenRatioUncertainty);
            writer.Number("frost_point_C_max", Celsius(row.FrostKelvin));
            writer.Number("frost_point_uncertainty_C", row.FrostUncertaintyKelvin);
            writer.Number("dew_point_supercooled_C_max", Celsius(row.DewOverSupercooledKelvin));
            writer.Number("water_ppm_max", row.WaterPpm);
            writer.Number("probe_mV", row.ProbeMillivolts);
            writer.Number("probe_uncertainty_mV", row.ProbeUncertaintyMillivolts);
            writer.Number("decomposition_V", row.DecompositionVolts);
            Numbers(writer, "log10_pO2_percentiles", row.Log10OxygenPercentiles);
            Numbers(writer, "frost_point_percentiles_C", row.FrostPercentiles.Select(kelvin => kelvin - PhysicalConstants.ZeroCelsiusInKelvin));
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Common(result.Assumptions, sources, result.DataRange, result.Notes, [], hazards);
        writer.WriteEndObject();
    }

    private static void Numbers(Utf8JsonWriter writer, string key, IEnumerable<double> values)
    {
        writer.WriteStartArray(key);
        foreach (double value in values)
        {
            writer.WriteNumberValue(value);
        }

        writer.WriteEndArray();
    }
}
