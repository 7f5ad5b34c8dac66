using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Charts.Kinds;

/// <summary>Choices of the oxygen-pressure chart.</summary>
public sealed record OxygenPressureOptions : ChartOptions
{
    /// <summary>1/T along the horizontal axis, hot at the left.</summary>
    public bool Inverse { get; init; }

    /// <summary>Bands of expanded uncertainty.</summary>
    public bool Bands { get; init; }

    /// <summary>Name or element of the line to be lifted out; null for none.</summary>
    public string? Highlight { get; init; }

    /// <summary>Lines of equal ratio: <c>CO/CO2</c>, <c>H2/H2O</c>.</summary>
    public ImmutableArray<string> Ratios { get; init; } = [];

    /// <summary>Lines of equal frost point for this share of hydrogen (0 to 1) at a total pressure; null for none.</summary>
    public (double HydrogenShare, Pressure Total)? Frost { get; init; }
}
