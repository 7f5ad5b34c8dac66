using RedoxFurnace.Atmospheres;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Campaigns;

/// <summary>The gas of a campaign or of one of its stages.</summary>
/// <param name="Analysis">Every gas it can mean.</param>
/// <param name="Preset">The generator gas it started from, or null.</param>
/// <param name="Text">As written.</param>
internal sealed record StageGas(GasAnalysis Analysis, GeneratorGas? Preset, string Text)
{
    /// <summary>Reads an analysis, a preset, or a preset with what differs: <c>endothermic, dew +2C</c>.</summary>
    public static StageGas Parse(string text, SubstanceDatabase database, Pressure total)
    {
        string first = text.Split(',', 2)[0].Trim();
        GeneratorGas? preset = GeneratorGas.All(database).FirstOrDefault(gas => gas.Id == first || gas.OtherNames.Contains(first));
        if (preset is null)
        {
            return new StageGas(GasAnalysis.Parse(text, total), null, text);
        }

        string rest = text[first.Length..].TrimStart(' ', ',');
        return new StageGas(GasAnalysis.Merge(rest.Length > 0 ? [preset.Analysis, rest] : [preset.Analysis], total), preset, text);
    }

    /// <summary>The campaign's gas, its own moisture readings of the inlet counted where the analysis gives none.</summary>
    public static StageGas? Of(GasSheet? sheet, SubstanceDatabase database, Pressure total)
    {
        if (sheet is null)
        {
            return null;
        }

        GeneratorGas? preset = sheet.Preset is { } name ? GeneratorGas.Get(name, database) : null;
        string[] texts = [.. new[] { preset?.Analysis, sheet.Analysis }.OfType<string>()];
        return new StageGas(GasAnalysis.Merge(texts, total), preset, string.Join(", ", new[] { sheet.Preset, sheet.Analysis }.OfType<string>()));
    }

    /// <summary>The gases in question, each completed through the water-gas reaction where the preset follows it and a figure was left out.</summary>
    public IEnumerable<(string Meaning, GasMixture Mixture)> Mixtures(Temperature hottest, GasReactions reactions)
    {
        bool water = Text.Contains("frost", StringComparison.Ordinal) || Text.Contains("dew", StringComparison.Ordinal) || Text.Contains("moisture", StringComparison.Ordinal) || Text.Contains("H2O", StringComparison.Ordinal);
        bool dioxide = Text.Contains("CO2", StringComparison.Ordinal);
        return Analysis.Meanings.Select(meaning => (meaning.Meaning, (Preset?.FollowsWaterGas == true, water, dioxide) switch
        {
            (true, true, false) or (true, false, false) => WaterGasShift.DioxideFromWater(meaning.Mixture, hottest, reactions),
            (true, false, true) => WaterGasShift.WaterFromDioxide(meaning.Mixture, hottest, reactions),
            _ => meaning.Mixture,
        }));
    }
}
