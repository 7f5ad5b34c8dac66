using System.CommandLine;
using System.Text.Json;
using RedoxFurnace.Charges;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>charge "Cr2O3 1000kg, C 237kg" --at T</c>: what the charge really becomes.</summary>
internal static class ChargeCommand
{

    public static Command Create(Screen screen, CommonOptions common)
    {
        Argument<string> charge = new("CHARGE") { Description = "substances and amounts: \"Cr2O3 1000kg, C 237kg\"" };
        Option<string> at = new("--at") { Description = "temperatures: 1400C, 700C,800C or 800C..1200C/50C", Required = true, HelpName = "T" };
        Option<string> pressure = new("--pressure") { Description = "total pressures: 1bar (usual), 1bar,1mbar or 10Pa..10kPa", HelpName = "P" };
        Option<string> gas = new("--gas") { Description = "gas by amount: \"H2 20Nm3, frost -50C\"", HelpName = "GAS" };
        Option<string> sweep = new("--sweep") { Description = "an inert gas swept through, by amount: \"Ar 5Nm3\"", HelpName = "GAS" };
        Command command = new("charge", "what a charge becomes: phases, gas, heat, yields, at temperatures and pressures") { charge, at, pressure, gas, sweep };
        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            TemperatureSeries series = TemperatureSeries.Parse(parsed.GetValue(at)!, "--at");
            Pressure[] totals = parsed.GetValue(pressure) is { } text ? [.. PressureSeries.Parse(text, "--pressure").Points] : [Pressure.Standard];
            List<(Substance, double)> gases = [];
            foreach (string? written in new[] { parsed.GetValue(gas), parsed.GetValue(sweep) })
            {
                if (written is not null)
                {
                    gases.AddRange(ChargeText.ParseGas(written, totals[0], database));
                }
            }

            ChargeRequest request = new(ChargeText.Parse(parsed.GetValue(charge)!, database), [.. gases], series.Points, [.. totals]);
            ChargeResult result = ChargeReckoning.Of(request, database);
            return screen.Show(Present(result, series.Unit, common.UsUnits(parsed), database), common.Form(parsed));
        });
        return command;
    }

    private static Answer Present(ChargeResult result, TemperatureUnit unit, bool us, SubstanceDatabase database)
    {
        ChargeRequest request = result.Request;
        HazardNote[] hazards = [.. SafetyRules.Of(database).For(HazardContextBuilder.Build(new HazardWork
        {
            Charge = [.. request.Charge.Select(item => item.Substance.Id)],
            Reductants = [.. request.Charge.Concat(request.Gas).Where(item => item.Substance.Formula.Of("O") <= 0).Select(item => item.Substance.Id)],
            Products = [.. result.Points.SelectMany(point => point.State.Condensed.Select(phase => phase.Substance.Id).Concat(point.State.Gas.Where(share => share.Fraction > 1e-3).Select(share => share.Substance.Id))).Distinct()],
            Gases = [.. request.Gas.Select(item => item.Substance.Id)],
            LowestKelvin = request.At.Min().Kelvin,
            HighestKelvin = request.At.Max().Kelvin,
            Vacuum = request.Totals.Min().Bar < 0.1,
        }))];
        return new Answer
        {
            Headline = result.Headline,
            Tables = [Phases(result, unit, us), Yields(result, unit), Onsets(result)],
            Notes = result.Notes,
            Assumptions = result.Assumptions,
            Hazards = hazards,
            Sources = result.Sources,
            Json = writer => Write(writer, result, hazards),
        };
    }

    private static AnswerTable Phases(ChargeResult result, TemperatureUnit unit, bool us)
    {
        TemperatureColumns temperatures = new(unit, us);
        string[] names = [.. result.Points.SelectMany(point => point.State.Condensed).Select(phase => phase.Name).Distinct().Order(StringComparer.Ordinal)];
        return new AnswerTable(
            "Condensed phases, kg; gas; certificate",
            [
                new Column("pressure", "pressure", false), .. temperatures.Columns, .. names.Select(name => new Column(name, name + "_kg")),
                new Column("gas\nNm3", "gas_Nm3"), .. us ? [new Column("gas\nscf", "gas_scf")] : Array.Empty<Column>(), new Column("gas, % by volume", "gas", false), new Column("log10 pO2\nbar", "log10_pO2_bar"), new Column("heat from\n25 C, MJ", "heat_MJ"),
                new Column("imbalance", "largest_imbalance"), new Column("violation\nRT", "largest_violation"),
            ],
            [.. result.Points.Select(point => (IReadOnlyList<Cell>)[
                Cell.Word(point.State.Total.ToString()),
                .. temperatures.Cells(point.State.At),
                .. names.Select(name => point.State.Condensed.Where(phase => phase.Name == name).Sum(phase => phase.Kilograms) is > 0 and var mass ? Cell.Significant(mass, 4) : Cell.Word(null)),
                Cell.Significant(point.State.NormalCubicMetres > 0 ? point.State.NormalCubicMetres : null, 4),
                .. us ? [Cell.Significant(point.State.NormalCubicMetres > 0 ? point.State.NormalCubicMetres / 0.0267901 : null, 4)] : Array.Empty<Cell>(),
                Cell.Word(point.State.GasMoles > 0 ? string.Join(", ", point.State.Gas.Where(share => share.Fraction > 0.002).Take(4).Select(share => $"{share.Substance.Id} {Printed.Fixed(share.Fraction * 100, 1)}")) : null),
                Cell.Of(point.State.Log10Oxygen, 2),
                Cell.Significant(point.HeatJoules / 1e6, 4),
                Cell.Significant(point.State.LargestImbalance, 1),
                Cell.Significant(point.State.LargestViolation, 1),
            ])]);
    }

    private static AnswerTable Yields(ChargeResult result, TemperatureUnit unit) => new(
        "Where each metal went, %",
        [
            new Column("pressure", "pressure", false), new Column("T " + Temperature.Symbol(unit), "temperature_" + Temperature.Symbol(unit)), new Column("metal", "metal", false), new Column("as metal", "metal_percent"), new Column("carbide", "carbide_percent"),
            new Column("nitride", "nitride_percent"), new Column("oxide", "oxide_percent"), new Column("gas", "gas_percent"),
        ],
        [.. result.Points.SelectMany(point => point.Yields.Select(yield => (IReadOnlyList<Cell>)[
            Cell.Word(point.State.Total.ToString()), Cell.Of(point.State.At.In(unit), 0), Cell.Word(yield.Metal), Cell.Of(100 * yield.AsMetal, 1), Cell.Of(100 * yield.AsCarbide, 1), Cell.Of(100 * yield.AsNitride, 1), Cell.Of(100 * yield.AsOxide, 1), Cell.Of(100 * yield.AsGas, 1),
        ]))]);

    private static AnswerTable Onsets(ChargeResult result) => new(
        "Where each product first stands, to 1 K, and the highest pressure at which it still does at the hottest temperature asked",
        [new Column("product", "product", false), new Column("at pressure", "pressure", false), new Column("from C", "from_C"), new Column("from K", "from_K"), new Column("up to, bar", "up_to_bar")],
        [.. result.Onsets.Select(onset => (IReadOnlyList<Cell>)[
            Cell.Word(onset.Product), Cell.Word(Pressure.FromBar(onset.TotalBar).ToString()), Cell.Of(onset.FromKelvin - PhysicalConstants.ZeroCelsiusInKelvin, 0), Cell.Of(onset.FromKelvin, 0), Cell.Significant(onset.UpToBar, 3),
        ])]);

    private static void Write(Utf8JsonWriter writer, ChargeResult result, HazardNote[] hazards)
    {
        if (result.Points.Length == 1)
        {
            Point(writer, result, result.Points[0], hazards);
            return;
        }

        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/charge-set/1");
        writer.WriteStartArray("results");
        foreach (ChargePoint point in result.Points)
        {
            Point(writer, result, point, hazards);
        }

        writer.WriteEndArray();
        writer.WriteEndObject();
    }

    private static void Point(Utf8JsonWriter writer, ChargeResult result, ChargePoint point, HazardNote[] hazards)
    {
        ChargeState state = point.State;
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/charge/1");
        writer.WriteString("headline", result.Headline);
        writer.WriteNumber("temperature_K", state.At.Kelvin);
        writer.WriteNumber("pressure_bar", state.Total.Bar);
        writer.WriteStartArray("condensed");
        foreach (ChargePhase phase in state.Condensed)
        {
            writer.WriteStartObject();
            writer.WriteString("formula", phase.Substance.Id);
            writer.WriteString("phase", phase.Substance.Group ?? phase.Substance.PhaseAt(state.At.Kelvin)?.Label ?? "");
            writer.WriteNumber("mol", phase.Moles);
            writer.WriteNumber("kg", phase.Kilograms);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteStartArray("gas");
        foreach (GasShare share in state.Gas.Where(share => share.Fraction > 0))
        {
            writer.WriteStartObject();
            writer.WriteString("formula", share.Substance.Id);
            writer.WriteNumber("mol", share.Fraction * state.GasMoles);
            writer.WriteNumber("fraction", share.Fraction);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteNumber("gas_Nm3", state.NormalCubicMetres);
        writer.Number("log10_pO2_bar", state.Log10Oxygen);
        writer.Number("heat_kJ", point.HeatJoules / 1000);
        writer.WriteNumber("largest_imbalance", state.LargestImbalance);
        writer.WriteNumber("largest_violation", state.LargestViolation);
        writer.WriteStartArray("yields");
        foreach (MetalYield yield in point.Yields)
        {
            writer.WriteStartObject();
            writer.WriteString("metal", yield.Metal);
            writer.WriteNumber("as_metal", yield.AsMetal);
            writer.WriteNumber("as_carbide", yield.AsCarbide);
            writer.WriteNumber("as_nitride", yield.AsNitride);
            writer.WriteNumber("as_oxide", yield.AsOxide);
            writer.WriteNumber("as_gas", yield.AsGas);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteStartArray("onsets");
        foreach (ProductOnset onset in result.Onsets.Where(onset => onset.TotalBar == state.Total.Bar))
        {
            writer.WriteStartObject();
            writer.WriteString("product", onset.Product);
            writer.Number("from_K", onset.FromKelvin);
            writer.Number("up_to_bar", onset.UpToBar);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Texts("without_data", state.WithoutData);
        writer.Common(result.Assumptions, result.Sources, null, result.Notes, [], hazards);
        writer.WriteEndObject();
    }
}
