using System.Collections.Immutable;
using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Plans;

/// <summary>One axis: its ends in the coordinates of the plot, and what is written along it.</summary>
/// <param name="Label">Quantity and unit.</param>
/// <param name="Low">Left or lower end.</param>
/// <param name="High">Right or upper end.</param>
/// <param name="Ticks">Marked places, in the unit of the label; their texts may hold marks as <see cref="RichText.Of"/> reads them.</param>
public sealed record AxisPlan(RichText Label, double Low, double High, ImmutableArray<AxisTick> Ticks)
{
    private const int UsualTicks = 8;

    /// <summary>Whether the ticks name things (rows of bars) instead of measuring: then no grid goes through them.</summary>
    public bool IsNames { get; init; }

    /// <summary>An axis with round numbers in a unit of its own: shown = factor x coordinate + shift.</summary>
    /// <param name="label">Quantity and unit.</param>
    /// <param name="low">Lower end, coordinates of the plot.</param>
    /// <param name="high">Upper end.</param>
    /// <param name="factor">Unit shown per unit of the plot, not 0.</param>
    /// <param name="shift">Added after the factor.</param>
    /// <param name="about">About how many numbers.</param>
    /// <returns>The axis.</returns>
    public static AxisPlan Round(RichText label, double low, double high, double factor = 1, double shift = 0, int about = UsualTicks)
        => new(label, low, high, RoundTicks.Between((low * factor) + shift, (high * factor) + shift, about, shown => (shown - shift) / factor));
}
