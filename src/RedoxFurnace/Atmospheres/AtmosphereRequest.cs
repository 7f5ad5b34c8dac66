using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>An atmosphere asked for one oxide.</summary>
/// <param name="Oxide">Formula or name.</param>
/// <param name="Metal">The metal to be kept or made; needed for oxides of several.</param>
/// <param name="At">Temperatures.</param>
/// <param name="Activities">Of condensed phases.</param>
/// <param name="HydrogenShare">Share of hydrogen in the gas, above 0, at most 1.</param>
/// <param name="Total">Total pressure.</param>
public sealed record AtmosphereRequest(string Oxide, string? Metal, TemperatureSeries At, Activities Activities, double HydrogenShare, Pressure Total)
{
    /// <summary>Draws of the errors of the data for percentiles; null for none.</summary>
    public int? Draws { get; init; }
}
