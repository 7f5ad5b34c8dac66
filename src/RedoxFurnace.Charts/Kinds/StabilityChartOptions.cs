using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Charts.Kinds;

/// <summary>Choices of the stability chart.</summary>
public sealed record StabilityChartOptions : ChartOptions
{
    /// <summary>kcal instead of kJ.</summary>
    public bool Kilocalories { get; init; }

    /// <summary>Bands of expanded uncertainty.</summary>
    public bool Bands { get; init; }

    /// <summary>Name or element of the line to be lifted out; null for none.</summary>
    public string? Highlight { get; init; }

    /// <summary>Crossovers marked and listed.</summary>
    public bool Crossovers { get; init; } = true;

    /// <summary>Side scales: <c>pO2</c>, <c>CO/CO2</c>, <c>H2/H2O</c>.</summary>
    public ImmutableArray<string> Scales { get; init; } = [];

    /// <summary>A frost-point scale for this share of hydrogen (0 to 1) and total pressure; null for none.</summary>
    public (double HydrogenShare, Pressure Total)? Frost { get; init; }
}
