using System.Collections.Immutable;

namespace RedoxFurnace.Atmospheres;

/// <summary>The gas that stands in balance with one couple at one temperature; drier or more reducing gas takes the oxygen off, wetter gas oxidises.</summary>
/// <param name="Kelvin">K.</param>
/// <param name="Couple">Name of the couple.</param>
/// <param name="Reaction">Per mole of O2.</param>
/// <param name="IsHardest">Whether this step decides for the whole oxide.</param>
/// <param name="StandardGibbs">dG0 at unit activities, J per mole of O2; null where the data do not reach.</param>
/// <param name="ExpandedUncertainty">k = 2, J per mole of O2.</param>
/// <param name="OxygenPotential">RT ln pO2 with activities, J per mole of O2.</param>
/// <param name="Log10OxygenBar">log10(pO2/bar).</param>
/// <param name="Log10OxygenUncertainty">k = 2.</param>
/// <param name="Log10MonoxideRatio">log10 of the least pCO/pCO2.</param>
/// <param name="Log10HydrogenRatio">log10 of the least pH2/pH2O.</param>
/// <param name="Log10HydrogenRatioUncertainty">k = 2, the gas reaction's own included.</param>
/// <param name="FrostKelvin">Highest frost point (over ice below 0.01 C) or dew point (over liquid above), K; null past boiling or below every formula.</param>
/// <param name="FrostUncertaintyKelvin">k = 2, K.</param>
/// <param name="DewOverSupercooledKelvin">Dew point over supercooled water where the frost point is below 0.01 C, K.</param>
/// <param name="WaterPpm">Highest water content, ppm by volume; null past the total pressure.</param>
/// <param name="ProbeMillivolts">Least reading of a zirconia probe at the same temperature.</param>
/// <param name="ProbeUncertaintyMillivolts">k = 2.</param>
/// <param name="DecompositionVolts">-dG0/4F.</param>
public sealed record AtmosphereRow(
    double Kelvin,
    string Couple,
    string Reaction,
    bool IsHardest,
    double? StandardGibbs,
    double? ExpandedUncertainty,
    double? OxygenPotential,
    double? Log10OxygenBar,
    double? Log10OxygenUncertainty,
    double? Log10MonoxideRatio,
    double? Log10HydrogenRatio,
    double? Log10HydrogenRatioUncertainty,
    double? FrostKelvin,
    double? FrostUncertaintyKelvin,
    double? DewOverSupercooledKelvin,
    double? WaterPpm,
    double? ProbeMillivolts,
    double? ProbeUncertaintyMillivolts,
    double? DecompositionVolts)
{
    /// <summary>5th, 50th and 95th percentile of log10(pO2/bar) from sampled errors; empty unless asked for.</summary>
    public ImmutableArray<double> Log10OxygenPercentiles { get; init; } = [];

    /// <summary>5th, 50th and 95th percentile of the highest frost or dew point, K, from sampled errors; empty unless asked for or where there is none.</summary>
    public ImmutableArray<double> FrostPercentiles { get; init; } = [];
}
