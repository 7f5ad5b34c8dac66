using System.Collections.Immutable;
using System.Text.Json;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Reductants;
using RedoxFurnace.Safety;

namespace RedoxFurnace.Cli;

/// <summary>JSON of a ranking, one point or a set.</summary>
internal static class RankJson
{
    public static void Write(Utf8JsonWriter writer, ImmutableArray<RankResult> results, IReadOnlyList<HazardNote> hazards)
    {
        if (results.Length == 1)
        {
            WriteOne(writer, results[0], hazards);
            return;
        }

        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/rank-set/1");
        writer.WriteStartArray("results");
        foreach (RankResult result in results)
        {
            WriteOne(writer, result, hazards);
        }

        writer.WriteEndArray();
        writer.WriteEndObject();
    }

    private static void WriteOne(Utf8JsonWriter writer, RankResult result, IReadOnlyList<HazardNote> hazards)
    {
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/rank/1");
        writer.WriteString("headline", result.Headline);
        writer.WriteString("oxide", result.Oxide);
        writer.WriteString("metal", result.Metal);
        writer.WriteNumber("temperature_K", result.At.Kelvin);
        writer.Number("pressure_bar", result.Conditions.Total?.Bar);
        writer.WriteStartObject("hardest_step");
        writer.WriteString("reaction", result.Hardest.Reaction);
        writer.Number("dG_kJ_per_mol_O2", result.Hardest.StandardGibbs / 1000);
        writer.Number("uncertainty_kJ_per_mol_O2", result.Hardest.ExpandedUncertainty / 1000);
        writer.Number("log10_pO2_bar", OxygenPotentialReadings.Log10Bar(result.Hardest.OxygenPotential, result.At.Kelvin));
        writer.WriteEndObject();
        writer.WriteStartArray("reductants");
        foreach (RankedReductant row in result.Rows)
        {
            WriteRow(writer, row);
        }

        writer.WriteEndArray();
        writer.Common(result.Assumptions, result.Sources, result.DataRange, result.Notes, result.Ask, hazards);
        writer.WriteEndObject();
    }

    private static void WriteRow(Utf8JsonWriter writer, RankedReductant row)
    {
        writer.WriteStartObject();
        writer.WriteString("reductant", row.Reductant.Id);
        writer.WriteString("product", row.Product);
        writer.WriteString("reaction", row.Reaction);
        writer.Number("margin_kJ_per_mol_O2", row.Margin / 1000);
        writer.Number("uncertainty_kJ_per_mol_O2", row.ExpandedUncertainty / 1000);
        writer.WriteString("verdict", RankWords.Of(row.Verdict));
        writer.Number("probability_reduces", row.ProbabilityReduces);
        writer.WriteStartArray("first_crossover_percentiles_K");
        foreach (double kelvin in row.CrossoverPercentiles)
        {
            writer.WriteNumberValue(kelvin);
        }

        writer.WriteEndArray();
        WriteCrossovers(writer, row.Crossovers);
        writer.WriteString("balance_reaction", row.BalanceReaction);
        writer.WriteString("furthest_product", row.FurthestProduct);
        writer.Number("reductant_kg_per_kg_oxide", row.KgPerKgOxide);
        writer.Number("reductant_kg_per_kg_metal", row.KgPerKgMetal);
        writer.Number("heat_kJ_per_kg_oxide", row.HeatJoulesPerKgOxide / 1000);
        writer.Number("duty_from_25C_kJ_per_kg_oxide", row.DutyJoulesPerKgOxide / 1000);
        writer.Number("gas_ratio_assumed", row.GasRatioAssumed);
        writer.Number("gas_ratio_min", row.GasRatioLeast);
        writer.Number("usable_share", row.UsableShare);
        writer.Number("gas_Nm3_per_kg_oxide", row.NormalCubicMetresPerKgOxide);
        writer.Number("carbon_activity", row.CarbonActivity);
        writer.Number("metal_vapour_bar", row.MetalVapourLogPressure is { } log ? Math.Exp(log) : null);
        WriteCarbide(writer, row.Carbide);
        WriteSideProducts(writer, row.SideProducts);
        writer.WriteString("job_verdict", RankWords.Of(row.Job));
        writer.WriteString("reason", row.Reason);
        writer.WriteString("help", row.Help);
        writer.WriteStartArray("steps");
        foreach (RankedStep step in row.Steps)
        {
            writer.WriteStartObject();
            writer.WriteString("reaction", step.Reaction);
            writer.Number("margin_kJ_per_mol_O2", step.Margin / 1000);
            writer.Number("uncertainty_kJ_per_mol_O2", step.ExpandedUncertainty / 1000);
            writer.WriteString("verdict", RankWords.Of(step.Verdict));
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Texts("notes", row.Notes.Concat(row.Steps.Select(step => step.Note).OfType<string>()));
        writer.WriteEndObject();
    }

    private static void WriteCrossovers(Utf8JsonWriter writer, Crossovers? crossovers)
    {
        writer.WriteStartArray("crossovers_K");
        foreach (double kelvin in crossovers?.Kelvin ?? [])
        {
            writer.WriteNumberValue(kelvin);
        }

        writer.WriteEndArray();
        writer.WriteString("works", crossovers is null ? null : RankWords.Of(crossovers.Range));
        writer.WriteStartArray("works_bands_K");
        foreach ((double low, double high) in crossovers?.Bands ?? [])
        {
            writer.WriteStartArray();
            writer.WriteNumberValue(low);
            writer.WriteNumberValue(high);
            writer.WriteEndArray();
        }

        writer.WriteEndArray();
        writer.Range("searched_K", crossovers is null ? null : (crossovers.LowestKelvin, crossovers.HighestKelvin));
    }

    private static void WriteCarbide(Utf8JsonWriter writer, CarbideCheck? carbide)
    {
        if (carbide is null)
        {
            writer.WriteNull("carbide");
            return;
        }

        writer.WriteStartObject("carbide");
        writer.WriteString("first", carbide.First);
        writer.WriteString("last", carbide.Last);
        writer.Number("carbide_from_K", carbide.CarbideFloorKelvin);
        writer.Number("metal_from_K", carbide.MetalFloorKelvin);
        writer.WriteEndObject();
    }

    private static void WriteSideProducts(Utf8JsonWriter writer, ImmutableArray<SideProduct> products)
    {
        writer.WriteStartArray("side_products");
        foreach (SideProduct product in products)
        {
            writer.WriteStartObject();
            writer.WriteString("formula", product.Formula);
            writer.WriteString("kind", product.Kind);
            writer.Number("driving_kJ_per_mol_C_or_N2", product.DrivingKilojoules);
            writer.Number("pressure_bar", product.PressureBar);
            writer.WriteString("text", product.Text);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
    }
}
