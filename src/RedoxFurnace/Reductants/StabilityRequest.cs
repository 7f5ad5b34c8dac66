using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Reductants;

/// <summary>Which lines a stability chart is to hold.</summary>
/// <param name="Of">Metals (every couple of the ladder) and oxides (the couples that oxide takes part in).</param>
/// <param name="With">Reductants by name.</param>
/// <param name="Low">Lowest temperature.</param>
/// <param name="High">Highest temperature, above the lowest.</param>
public sealed record StabilityRequest(ImmutableArray<string> Of, ImmutableArray<string> With, Temperature Low, Temperature High)
{
    /// <summary>Metal to one oxide instead of the couples of the ladder.</summary>
    public bool Direct { get; init; }

    /// <summary>Pressures of CO over graphite, one line each; empty for graphite in balance with CO and CO2 at 1 bar together.</summary>
    public ImmutableArray<Pressure> Monoxide { get; init; } = [];

    /// <summary>pH2/pH2O and pCO/pCO2, one line each.</summary>
    public ImmutableArray<double> GasRatios { get; init; } = [RankConditions.UsualGasRatio];

    /// <summary>Activities of condensed phases.</summary>
    public Activities Activities { get; init; } = Activities.AllOne;
}
