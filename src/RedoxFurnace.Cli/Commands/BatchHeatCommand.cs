using System.CommandLine;
using System.Text.Json;
using RedoxFurnace.Charges;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>batch-heat CHARGE</c>: heat of a batch and its adiabatic temperature.</summary>
internal static class BatchHeatCommand
{
    public static Command Create(Screen screen, CommonOptions common)
    {
        Argument<string> charge = new("CHARGE") { Description = "everything in the batch: \"Fe2O3 320kg, Al 108kg, CaO 20kg\"" };
        Option<string> from = new("--from") { Description = "temperature the batch starts from (25C)", HelpName = "T" };
        Option<string> moisture = new("--moisture") { Description = "free water of the charge, mass share such as 0.05%", HelpName = "SHARE" };
        Option<string> pressure = new("--pressure") { Description = "total pressure (1 atm)", HelpName = "P" };
        Option<string> reach = new("--reach") { Description = "a temperature the batch is to reach: the start it needs is told", HelpName = "T" };
        Command command = new("batch-heat", "heat of a batch, adiabatic temperature, gas and vapour, moisture") { charge, from, moisture, pressure, reach };
        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            BatchHeatRequest request = new(
                ChargeText.Parse(parsed.GetValue(charge)!, database),
                parsed.GetValue(from) is { } start ? Temperature.Parse(start, "--from") : Temperature.FromKelvin(PhysicalConstants.ReferenceKelvin),
                parsed.GetValue(moisture) is { } share ? Share.Parse(share, "--moisture") : null,
                parsed.GetValue(pressure) is { } total ? Pressure.Parse(total, "--pressure") : Pressure.FromBar(PhysicalConstants.AtmosphereInBar),
                parsed.GetValue(reach) is { } wanted ? Temperature.Parse(wanted, "--reach") : null);
            BatchHeatResult result = BatchHeat.Of(request, database);
            return screen.Show(Present(result, database), common.Form(parsed));
        });
        return command;
    }

    private static Answer Present(BatchHeatResult result, SubstanceDatabase database)
    {
        string[] names = [.. result.Request.Charge.Select(item => item.Substance.Id)];
        HazardNote[] hazards = [.. SafetyRules.Of(database).For(HazardContextBuilder.Build(new HazardWork
        {
            Charge = names,
            Reductants = [.. result.Request.Charge.Where(item => item.Substance.Formula.Of("O") <= 0).Select(item => item.Substance.Id)],
            Products = [.. result.State?.Condensed.Select(phase => phase.Substance.Id) ?? []],
            HighestKelvin = result.Adiabatic?.Kelvin,
            LowestKelvin = result.Request.Start.Kelvin,
            Tags = result.Request.Moisture is null ? [HazardTags.MoistureUnknown] : [],
        }))];
        string[] sources = [.. Citations.Of(result.Request.Charge.Select(item => item.Substance).Concat(result.State?.Condensed.Select(phase => phase.Substance) ?? []), database)];
        return new Answer
        {
            Headline = result.Headline,
            Tables = [Figures(result), Products(result)],
            Notes = result.Notes,
            Ask = result.Ask,
            Assumptions =
            [
                $"start {result.Request.Start}, total pressure {result.Request.Total}, charge {Printed.Brief(result.Kilograms)} kg dry",
                "adiabatic and at full equilibrium: ideal gas, pure condensed phases; + is heat that must be supplied",
            ],
            Hazards = hazards,
            Sources = sources,
            Json = writer => Write(writer, result, hazards, sources),
        };
    }

    private static AnswerTable Figures(BatchHeatResult result)
    {
        double? perMetal = result.MetalKilograms > 0 ? result.HeatAtReference / result.MetalKilograms / 1000 : null;
        return new AnswerTable(
            null,
            [new Column("what", "what", false), new Column("value", "value"), new Column("unit", "unit", false)],
            [
                Row("heat at 25 C per kg of charge", result.HeatAtReference / result.Kilograms / 1000, 0, "kJ/kg"),
                Row("heat at 25 C per kg of charge", result.HeatAtReference / result.Kilograms / 4184, 1, "kcal/kg"),
                Row("heat at 25 C per kg of metal", perMetal, 0, "kJ/kg"),
                Row("adiabatic temperature", result.Adiabatic?.Celsius, 0, "C"),
                Row("adiabatic temperature", result.Adiabatic?.Kelvin, 0, "K"),
                Row("share of the mass that is gas", 100 * result.VapourShare, 2, "%"),
                Row("gas evolved at 0 C, 1 atm", result.Adiabatic is null ? null : result.GasMoles * PhysicalConstants.NormalCubicMetrePerMole / result.Kilograms * 1000, 1, "L per kg of charge"),
                Row("steam from free water at 0 C, 1 atm", result.WaterLitresPerKilogram, 2, "L per kg of charge"),
                Row("hydrogen if the metal takes its oxygen", result.HydrogenLitresPerKilogram, 2, "L per kg of charge"),
                .. result.Request.Reach is { } wanted ? [Row($"start needed to reach {wanted}", result.Preheat?.Celsius, 0, "C")] : Array.Empty<IReadOnlyList<Cell>>(),
            ]);
    }

    private static IReadOnlyList<Cell> Row(string what, double? value, int decimals, string unit) => [Cell.Word(what), Cell.Of(value, decimals), Cell.Word(unit)];

    private static AnswerTable Products(BatchHeatResult result) => new(
        "Products at the adiabatic temperature",
        [new Column("phase", "phase", false), new Column("state", "state", false), new Column("kg", "kg"), new Column("mol", "mol")],
        result.State is not { } state ? [] :
        [
            .. state.Condensed.Select(phase => (IReadOnlyList<Cell>)[Cell.Word(phase.Name), Cell.Word(phase.Substance.PhaseAt(state.At.Kelvin)?.State.ToString().ToLowerInvariant()), Cell.Significant(phase.Kilograms, 4), Cell.Significant(phase.Moles, 4)]),
            .. state.Gas.Where(share => share.Fraction > 1e-3).Take(8).Select(share => (IReadOnlyList<Cell>)[Cell.Word(share.Substance.Id), Cell.Word("gas"), Cell.Significant(share.Fraction * state.GasMoles * share.Substance.Formula.MolarMass / 1000, 4), Cell.Significant(share.Fraction * state.GasMoles, 4)]),
        ]);

    private static void Write(Utf8JsonWriter writer, BatchHeatResult result, HazardNote[] hazards, string[] sources)
    {
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/batch-heat/1");
        writer.WriteString("headline", result.Headline);
        writer.WriteString("verdict", result.Verdict);
        writer.WriteNumber("start_K", result.Request.Start.Kelvin);
        writer.WriteNumber("pressure_bar", result.Request.Total.Bar);
        writer.WriteNumber("charge_kg", result.Kilograms);
        writer.WriteNumber("metal_kg", result.MetalKilograms);
        writer.WriteNumber("heat_at_25C_kJ", result.HeatAtReference / 1000);
        writer.Number("adiabatic_K", result.Adiabatic?.Kelvin);
        writer.WriteString("plateau", result.Plateau);
        writer.WriteNumber("vapour_share", result.VapourShare);
        writer.Number("preheat_K", result.Preheat?.Kelvin);
        writer.Number("steam_L_per_kg", result.WaterLitresPerKilogram);
        writer.Number("hydrogen_L_per_kg", result.HydrogenLitresPerKilogram);
        writer.WriteStartArray("products");
        foreach (ChargePhase phase in result.State?.Condensed ?? [])
        {
            writer.WriteStartObject();
            writer.WriteString("formula", phase.Substance.Id);
            writer.WriteNumber("mol", phase.Moles);
            writer.WriteNumber("kg", phase.Kilograms);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Common([], sources, null, result.Notes, result.Ask, hazards);
        writer.WriteEndObject();
    }
}
