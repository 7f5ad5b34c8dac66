using System.CommandLine;
using System.Text.Json;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>reading</c>: what instruments say, in every unit and meaning, and whether they can be of one gas.</summary>
internal static class ReadingCommand
{
    private static readonly string[] Used = ["O2", "CO", "CO2", "H2", "H2O", "C"];

    public static Command Create(Screen screen, CommonOptions common)
    {
        Options options = new();
        Command command = new("reading", "what instruments say: conversions, every meaning of an unclear reading, several readings held against one another");
        foreach (Option option in options.All)
        {
            command.Options.Add(option);
        }

        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            ReadingResult result = ReadingReckoning.Of(options.Request(parsed), database);
            return screen.Show(Present(result, common.UsUnits(parsed), database), common.Form(parsed));
        });
        return command;
    }

    private sealed class Options
    {
        private readonly Option<string> _frost = new("--frost") { Description = "frost point over ice: -57C, or \"-57C at 6bara\"", HelpName = "T" };
        private readonly Option<string> _dew = new("--dew") { Description = "dew point over (supercooled) water", HelpName = "T" };
        private readonly Option<string> _moisture = new("--moisture") { Description = "a moisture reading whose scale is not known, such as -60C", HelpName = "READING" };
        private readonly Option<string> _water = new("--water") { Description = "water as 200ppm, 1.2%, 5g/Nm3, 0.5mbar or 0.4Torr", HelpName = "READING" };
        private readonly Option<string> _probe = new("--probe") { Description = "oxygen probe against air, such as 1120mV; needs --probe-temperature", HelpName = "mV" };
        private readonly Option<string> _probeAt = new("--probe-temperature") { Description = "temperature of the probe", HelpName = "T" };
        private readonly Option<string> _reference = new("--reference-air") { Description = "oxygen of the reference air (20.95%)", HelpName = "SHARE" };
        private readonly Option<string> _dioxide = new("--co2") { Description = "CO2 beside the CO of --gas, such as 0.4%", HelpName = "SHARE" };
        private readonly Option<string> _ratio = new("--co-to-co2") { Description = "CO/CO2", HelpName = "RATIO" };
        private readonly Option<string> _oxygen = new("--log-po2") { Description = "log10 of pO2 with bar or atm, such as -20.5bar", HelpName = "LOG" };
        private readonly Option<string> _free = new("--free-oxygen") { Description = "free oxygen of a trace analyser, such as 5ppm", HelpName = "SHARE" };
        private readonly Option<string> _gas = new("--gas") { Description = "what is known of the gas, such as \"CO 20%, H2 40%\"", HelpName = "ANALYSIS" };
        private readonly Option<string> _at = new("--at") { Description = "furnace temperature (the probe's)", HelpName = "T" };
        private readonly Option<string> _place = new("--at-pressure") { Description = "absolute pressure at which the moisture was read: 6bara, 5barg", HelpName = "P" };
        private readonly Option<string> _furnace = new("--to-pressure") { Description = "pressure in the furnace (1 atm)", HelpName = "P" };
        private readonly Option<string> _line = new("--line-pressure") { Description = "pressure of a line in which the moisture may have been read", HelpName = "P" };

        public IEnumerable<Option> All => [_frost, _dew, _moisture, _water, _probe, _probeAt, _reference, _dioxide, _ratio, _oxygen, _free, _gas, _at, _place, _furnace, _line];

        public ReadingRequest Request(ParseResult parsed)
        {
            Pressure furnace = parsed.GetValue(_furnace) is { } text ? WaterReading.LinePressure(text, "--to-pressure") : Pressure.FromBar(PhysicalConstants.AtmosphereInBar);
            FurnaceReading[] readings = [.. Readings(parsed)];
            if (readings.Length == 0)
            {
                throw new RequestException("'reading' needs at least one reading: --frost, --dew, --moisture, --water, --probe, --co2, --co-to-co2, --log-po2 or --free-oxygen");
            }

            GasAnalysis? gas = parsed.GetValue(_gas) is { } analysis ? GasAnalysis.Parse(analysis, furnace) : null;
            if (gas is not null && parsed.GetValue(_dioxide) is null && parsed.GetValue(_ratio) is null && parsed.GetValue(_probe) is not null && gas.Meanings[0].Mixture[GasSpecies.CO2] > 0 && gas.Meanings[0].Mixture[GasSpecies.CO] > 0)
            {
                // The CO2 of the analysis is a reading too: it stands against the probe.
                readings = [.. readings, FurnaceReading.OfDioxide(gas.Meanings[0].Mixture[GasSpecies.CO2])];
            }

            return new ReadingRequest([.. readings], gas, furnace)
            {
                Line = parsed.GetValue(_line) is { } line ? WaterReading.LinePressure(line, "--line-pressure") : null,
                At = parsed.GetValue(_at) is { } at ? Temperature.Parse(at, "--at") : null,
            };
        }

        private IEnumerable<FurnaceReading> Readings(ParseResult parsed)
        {
            string place = parsed.GetValue(_place) is { } pressure ? " at " + pressure : "";
            foreach ((string name, Option<string> option) in new[] { ("frost", _frost), ("dew", _dew), ("moisture", _moisture), ("H2O", _water) })
            {
                if (parsed.GetValue(option) is { } value)
                {
                    yield return FurnaceReading.OfWater(WaterReading.Parse(name, value.Contains(" at ", StringComparison.Ordinal) ? value : value + place));
                }
            }

            if (parsed.GetValue(_probe) is { } probe)
            {
                string at = parsed.GetValue(_probeAt) ?? throw new RequestException("--probe needs --probe-temperature: millivolts mean nothing without the temperature of the cell");
                double air = parsed.GetValue(_reference) is { } share ? Share.Parse(share, "--reference-air") : PhysicalConstants.OxygenInAir;
                (double value, string unit) = NumberWithUnit.Parse(probe, "--probe", "a voltage, such as 1120mV");
                double millivolts = unit switch { "mV" => value, "V" => value * 1000, _ => throw new RequestException($"--probe '{probe}' has the unit '{unit}'; write mV or V") };
                yield return FurnaceReading.OfProbe(millivolts, new OxygenProbe(Temperature.Parse(at, "--probe-temperature"), air));
            }

            if (parsed.GetValue(_dioxide) is { } dioxide)
            {
                yield return FurnaceReading.OfDioxide(Share.Parse(dioxide, "--co2"));
            }

            if (parsed.GetValue(_ratio) is { } ratio)
            {
                double number = NumberWithUnit.ParsePlain(ratio, "--co-to-co2");
                yield return number > 0 ? FurnaceReading.OfMonoxideRatio(number) : throw new RequestException($"--co-to-co2 '{ratio}' is out of range; a ratio must be above 0");
            }

            if (parsed.GetValue(_oxygen) is { } oxygen)
            {
                (double value, string unit) = NumberWithUnit.Parse(oxygen, "--log-po2", "a logarithm with bar or atm, such as -20.5bar");
                yield return FurnaceReading.OfLogOxygen(unit switch
                {
                    "bar" => value,
                    "atm" => value + Math.Log10(PhysicalConstants.AtmosphereInBar),
                    _ => throw new RequestException($"--log-po2 '{oxygen}' has the unit '{unit}'; write bar or atm"),
                });
            }

            if (parsed.GetValue(_free) is { } free)
            {
                yield return FurnaceReading.OfFreeOxygen(Share.Parse(free, "--free-oxygen"));
            }
        }
    }

    private static Answer Present(ReadingResult result, bool us, SubstanceDatabase database)
    {
        GasMixture? mixture = result.Request.Gas?.Meanings[0].Mixture;
        HazardNote[] hazards = mixture is null ? [] : [.. SafetyRules.Of(database).For(HazardContextBuilder.Build(new HazardWork
        {
            Gases = [.. Enum.GetValues<GasSpecies>().Where(species => mixture[species] > 1e-4).Select(species => species.ToString())],
            HighestKelvin = result.At?.Kelvin,
        }))];
        string[] sources = [.. Citations.Of(Used.Select(database.Get), database)];
        return new Answer
        {
            Headline = result.Headline,
            Tables = result.Waters.Length > 0 ? [Waters(result, us), Implied(result)] : [Implied(result)],
            Notes = result.Notes,
            Ask = result.Ask,
            Assumptions = result.Assumptions,
            Hazards = hazards,
            Sources = sources,
            CallsForSafety = hazards.Length > 0,
            Json = writer => Write(writer, result, hazards, sources),
        };
    }

    private static AnswerTable Waters(ReadingResult result, bool us) => new(
        $"Water at {result.Request.Furnace}",
        [
            new Column("reading", "reading", false), new Column("meant as", "meaning", false), new Column("frost\nC", "frost_point_C"), new Column("dew\nC", "dew_point_C"), new Column("frost\nF", "frost_point_F"), new Column("dew\nF", "dew_point_F"),
            new Column("ppm", "water_ppm"), new Column("%", "water_percent"), new Column("g/Nm3", "water_g_per_Nm3"), new Column("mbar", "water_mbar"), new Column("Torr", "water_Torr"), new Column("where read:\nfrost C", "place_frost_point_C"), new Column("bar", "place_bar"),
        ],
        [.. result.Waters.Select(water => (IReadOnlyList<Cell>)[
            Cell.Word(water.Reading),
            Cell.Word(water.Meaning.Length > 0 ? water.Meaning : "as written"),
            Cell.Of(Celsius(water.AtFurnace.FrostPointKelvin), 1),
            Cell.Of(Celsius(water.AtFurnace.DewPointKelvin), 1),
            Cell.Of(Fahrenheit(water.AtFurnace.FrostPointKelvin), 1),
            Cell.Of(Fahrenheit(water.AtFurnace.DewPointKelvin), 1),
            Cell.Significant(water.AtFurnace.Ppm),
            Cell.Significant(water.AtFurnace.Share * 100),
            Cell.Significant(water.AtFurnace.GramsPerNm3),
            Cell.Significant(water.AtFurnace.Millibar),
            Cell.Significant(water.AtFurnace.Torr),
            Cell.Of(Celsius(water.AtPlace?.FrostPointKelvin), 1),
            Cell.Significant(water.AtPlace is { } place ? Math.Exp(place.NaturalLogTotalBar) : null, 4),
        ])]);

    private static AnswerTable Implied(ReadingResult result)
    {
        bool several = result.Comparisons.Length > 1;
        return new AnswerTable(
            result.At is { } at ? $"What each reading says about the oxygen pressure at {at}" : null,
            [
                .. several ? [new Column("meant as", "meaning", false)] : Array.Empty<Column>(),
                new Column("reading", "reading", false), new Column("log10 pO2\nbar", "log10_pO2_bar"), new Column("±", "tolerance_log10"), new Column("log10 pO2\natm", "log10_pO2_atm"), new Column("probe\nmV", "probe_mV"), new Column("carbon\nactivity", "carbon_activity"), new Column("verdict", "verdict", false), new Column("how", "note", false) { IsProse = true },
            ],
            [.. result.Comparisons.SelectMany(comparison => comparison.Implied.Select(one => (IReadOnlyList<Cell>)[
                .. several ? [Cell.Word(comparison.Meaning)] : Array.Empty<Cell>(),
                Cell.Word(one.Reading.Text),
                Cell.Of(one.Log10Bar, 2),
                Cell.Of(one.Log10Bar is null ? null : one.Tolerance, 2),
                Cell.Of(one.Log10Bar - Math.Log10(PhysicalConstants.AtmosphereInBar), 2),
                Cell.Of(one.Log10Bar is { } log ? new OxygenProbe(result.At!.Value).Millivolts(log * Math.Log(10)) : null, 0),
                Cell.Significant(one.CarbonActivity),
                Cell.Word(comparison.Apart.Contains(one) ? "stands apart" : ReadingReckoning.Word(comparison.Verdict)),
                Cell.Word(one.Note),
            ]))]);
    }

    private static void Write(Utf8JsonWriter writer, ReadingResult result, HazardNote[] hazards, string[] sources)
    {
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/reading/1");
        writer.WriteString("headline", result.Headline);
        writer.WriteBoolean("decided", result.Decided);
        writer.WriteNumber("furnace_bar", result.Request.Furnace.Bar);
        writer.Number("temperature_K", result.At?.Kelvin);
        writer.WriteStartArray("water");
        foreach (WaterConversion water in result.Waters)
        {
            writer.WriteStartObject();
            writer.WriteString("reading", water.Reading);
            writer.WriteString("meaning", water.Meaning);
            writer.Number("frost_point_C", Celsius(water.AtFurnace.FrostPointKelvin));
            writer.Number("dew_point_C", Celsius(water.AtFurnace.DewPointKelvin));
            writer.Number("water_ppm", water.AtFurnace.Ppm);
            writer.Number("water_g_per_Nm3", water.AtFurnace.GramsPerNm3);
            writer.Number("water_mbar", water.AtFurnace.Millibar);
            writer.Number("water_Torr", water.AtFurnace.Torr);
            writer.Number("place_bar", water.AtPlace is { } place ? Math.Exp(place.NaturalLogTotalBar) : null);
            writer.Number("place_frost_point_C", Celsius(water.AtPlace?.FrostPointKelvin));
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteStartArray("comparisons");
        foreach (ReadingComparison comparison in result.Comparisons)
        {
            writer.WriteStartObject();
            writer.WriteString("meaning", comparison.Meaning);
            writer.WriteString("verdict", ReadingReckoning.Word(comparison.Verdict));
            writer.Number("log10_pO2_bar", comparison.Log10Oxygen);
            writer.Number("largest_gap_log10", comparison.LargestGap);
            writer.WriteString("cause", comparison.Cause);
            writer.WriteString("next", comparison.Next);
            writer.WriteStartArray("readings");
            foreach (ImpliedOxygen one in comparison.Implied)
            {
                writer.WriteStartObject();
                writer.WriteString("reading", one.Reading.Text);
                writer.Number("log10_pO2_bar", one.Log10Bar);
                writer.Number("tolerance_log10", one.Tolerance);
                writer.Number("carbon_activity", one.CarbonActivity);
                writer.WriteBoolean("stands_apart", comparison.Apart.Contains(one));
                writer.WriteString("note", one.Note);
                writer.WriteEndObject();
            }

            writer.WriteEndArray();
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Common(result.Assumptions, sources, null, result.Notes, result.Ask, hazards);
        writer.WriteEndObject();
    }

    private static double? Celsius(double? kelvin) => kelvin - PhysicalConstants.ZeroCelsiusInKelvin;

    private static double? Fahrenheit(double? kelvin) => kelvin is { } value ? ((value - PhysicalConstants.ZeroCelsiusInKelvin) * 1.8) + 32 : null;
}
