using System.Text.Json;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Safety;

namespace RedoxFurnace.Cli;

/// <summary>The gas answer for machines.</summary>
internal static class GasJson
{
    public static void Write(Utf8JsonWriter writer, GasResult result, IReadOnlyList<HazardNote> hazards, IReadOnlyList<string> sources)
    {
        if (result.Points.Length == 1)
        {
            Point(writer, result, result.Points[0], hazards, sources);
            return;
        }

        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/gas-set/1");
        writer.WriteStartArray("results");
        foreach (GasPoint point in result.Points)
        {
            Point(writer, result, point, hazards, sources);
        }

        writer.WriteEndArray();
        writer.WriteEndObject();
    }

    /// <summary>Ratio of two species, or null where either is missing.</summary>
    public static double? Ratio(GasState gas, GasSpecies reducing, GasSpecies oxidised)
    {
        double log = gas.NaturalLogPressure(reducing) - gas.NaturalLogPressure(oxidised);
        return double.IsFinite(log) ? Math.Exp(log) : null;
    }

    private static void Point(Utf8JsonWriter writer, GasResult result, GasPoint point, IReadOnlyList<HazardNote> hazards, IReadOnlyList<string> sources)
    {
        GasState stable = point.Answer.AtEquilibrium;
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/gas/1");
        writer.WriteString("headline", result.Headline);
        writer.WriteString("meaning", point.Meaning);
        writer.WriteBoolean("explosive_mixture", result.IsExplosive);
        writer.WriteNumber("temperature_K", point.At.Kelvin);
        writer.WriteNumber("pressure_bar", result.Request.Total.Bar);
        Species(writer, "analysis", species => point.Answer.Mixture[species]);
        Species(writer, "species", point.Answer.Homogeneous.Fraction);
        writer.Number("log10_pO2_bar", stable.Log10Oxygen);
        writer.Number("carbon_activity", point.Answer.Homogeneous.CarbonActivity);
        writer.Number("soot_mol_per_mol_gas", stable.GraphiteMoles);
        writer.Number("frost_point_C", Celsius(point.Water?.FrostPointKelvin));
        writer.Number("dew_point_C", Celsius(point.Water?.DewPointKelvin));
        writer.Number("water_ppm", point.Water?.Ppm);
        writer.Number("probe_mV", point.ProbeMillivolts);
        writer.WriteStartObject("as_analysed");
        GasState gas = point.Answer.AsAnalysed;
        Species(writer, "species", gas.Fraction);
        writer.Number("log10_pO2_bar", gas.Log10Oxygen);
        writer.Number("carbon_activity", gas.CarbonActivity);
        writer.Number("h2_to_h2o", Ratio(gas, GasSpecies.H2, GasSpecies.H2O));
        writer.Number("co_to_co2", Ratio(gas, GasSpecies.CO, GasSpecies.CO2));
        writer.WriteEndObject();
        Steel(writer, point.Steel);
        Metals(writer, point);
        writer.WriteStartArray("soot_ranges_K");
        foreach (CarbonRange range in result.Soot)
        {
            writer.WriteStartArray();
            writer.WriteNumberValue(range.LowKelvin);
            writer.WriteNumberValue(range.HighKelvin);
            writer.WriteEndArray();
        }

        writer.WriteEndArray();
        writer.WriteNumber("largest_imbalance", stable.LargestImbalance);
        writer.Common(result.Assumptions, sources, (GasEquilibrium.LowestKelvin, GasEquilibrium.HighestKelvin), result.Notes, result.Ask, hazards);
        writer.WriteEndObject();
    }

    private static void Steel(Utf8JsonWriter writer, SteelInGas? steel)
    {
        if (steel is null)
        {
            writer.WriteNull("steel");
            return;
        }

        writer.WriteStartObject("steel");
        writer.Number("carbon_potential_percent", steel.CarbonPotential);
        writer.Number("carbon_percent", steel.Carbon);
        writer.Number("uncertainty_percent", steel.Uncertainty);
        writer.WriteString("reason", steel.Reason);
        Neutral(writer, "neutral", steel.Neutral);
        Neutral(writer, "neutral_without_alloy", steel.NeutralWithoutAlloy);
        writer.WriteEndObject();
    }

    private static void Neutral(Utf8JsonWriter writer, string key, NeutralSetPoint? point)
    {
        if (point is null)
        {
            writer.WriteNull(key);
            return;
        }

        writer.WriteStartObject(key);
        writer.WriteNumber("carbon_potential_percent", point.CarbonPotential);
        writer.Number("dew_point_C", Celsius(point.Water?.DewPointKelvin));
        writer.WriteNumber("co2_percent", 100 * point.DioxideShare);
        writer.WriteNumber("probe_mV", point.ProbeMillivolts);
        writer.WriteNumber("log10_pO2_bar", point.NaturalLogOxygen / Math.Log(10));
        writer.WriteEndObject();
    }

    private static void Metals(Utf8JsonWriter writer, GasPoint point)
    {
        writer.WriteStartArray("metals");
        foreach (MetalInGas metal in point.Metals)
        {
            writer.WriteStartObject();
            writer.WriteString("metal", metal.Element.Symbol);
            writer.WriteString("oxide", metal.Oxide);
            writer.WriteNumber("activity", metal.Element.Activity);
            writer.Number("margin_kJ_per_mol_O2", metal.Margin / 1000);
            writer.Number("uncertainty_kJ_per_mol_O2", metal.Uncertainty / 1000);
            writer.WriteString("verdict", GasReckoning.Word(metal.Verdict));
            writer.Number("limit_log10_pO2_bar", metal.LimitLogOxygen / Math.Log(10));
            writer.Number("limit_frost_point_C", Celsius(metal.LimitWater?.FrostPointKelvin));
            writer.Number("limit_water_ppm", metal.LimitWater?.Ppm);
            writer.Number("oxidises_below_K", metal.OxidisesBelowKelvin);
            writer.Number("bright_above_K", metal.BrightAboveKelvin);
            Compound(writer, "nitride", metal.Nitride);
            Compound(writer, "carbide", metal.Carbide);
            writer.Texts("notes", metal.Notes);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
    }

    private static void Compound(Utf8JsonWriter writer, string key, CompoundInGas? compound)
    {
        if (compound is null)
        {
            writer.WriteNull(key);
            return;
        }

        writer.WriteStartObject(key);
        writer.WriteString("formula", compound.Formula);
        writer.WriteNumber("driving_kJ_per_mol", compound.Driving / 1000);
        writer.WriteNumber("uncertainty_kJ_per_mol", compound.Uncertainty / 1000);
        writer.WriteString("forms", compound.Forms switch { true => "yes", false => "no", null => "may" });
        writer.WriteEndObject();
    }

    private static void Species(Utf8JsonWriter writer, string key, Func<GasSpecies, double> fraction)
    {
        writer.WriteStartArray(key);
        foreach (GasSpecies species in Enum.GetValues<GasSpecies>().Where(species => fraction(species) > 0))
        {
            writer.WriteStartObject();
            writer.WriteString("formula", species.ToString());
            writer.WriteNumber("fraction", fraction(species));
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
    }

    private static double? Celsius(double? kelvin) => kelvin - PhysicalConstants.ZeroCelsiusInKelvin;
}
