using System.Collections.Immutable;
using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Plans;

/// <summary>
/// What a chart is to hold, before anything has a place on the page. Every kind of chart makes one of these;
/// <see cref="Layout.ChartLayout"/> turns it into a <see cref="Scene"/>.
/// </summary>
public sealed record ChartPlan
{
    /// <summary>Above the plot.</summary>
    public required RichText Title { get; init; }

    /// <summary>Smaller, below the title; null for none.</summary>
    public RichText? Subtitle { get; init; }

    /// <summary>What it shows, in words.</summary>
    public required string Description { get; init; }

    /// <summary>Below the plot.</summary>
    public required AxisPlan X { get; init; }

    /// <summary>Left of the plot.</summary>
    public required AxisPlan Y { get; init; }

    /// <summary>The horizontal axis once more in another unit, above the plot; null for none.</summary>
    public AxisPlan? Top { get; init; }

    /// <summary>Lines, drawn in this order.</summary>
    public ImmutableArray<SeriesPlan> Series { get; init; } = [];

    /// <summary>Shaded fields, behind the lines.</summary>
    public ImmutableArray<FieldPlan> Fields { get; init; } = [];

    /// <summary>Tinted ranges, behind everything.</summary>
    public ImmutableArray<WindowPlan> Windows { get; init; } = [];

    /// <summary>Side scales, right of the plot.</summary>
    public ImmutableArray<RulerPlan> Rulers { get; init; } = [];

    /// <summary>Numbered places, listed below.</summary>
    public ImmutableArray<PlanCrossing> Crossings { get; init; } = [];

    /// <summary>What the marks mean.</summary>
    public ImmutableArray<KeyEntry> Key { get; init; } = [];

    /// <summary>What stands round the plot.</summary>
    public FramePlan Frame { get; init; } = FramePlan.None;

    /// <summary>The page.</summary>
    public PageSize Page { get; init; } = PageSize.A4;

    /// <summary>Names of the columns x and y in the value table.</summary>
    public (string X, string Y) ValueNames { get; init; } = ("x", "y");

    /// <summary>For the file's own record.</summary>
    public ImmutableSortedDictionary<string, string> Information { get; init; } = ImmutableSortedDictionary<string, string>.Empty;
}
