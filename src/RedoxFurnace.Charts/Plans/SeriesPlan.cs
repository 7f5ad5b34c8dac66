using System.Collections.Immutable;
using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Plans;

/// <summary>One line of the plot.</summary>
public sealed record SeriesPlan
{
    /// <summary>Name of its group in the file.</summary>
    public required string Name { get; init; }

    /// <summary>What is written at its end; empty for none.</summary>
    public required RichText Label { get; init; }

    /// <summary>Points in one piece; empty for marks alone.</summary>
    public required ImmutableArray<DataPoint> Points { get; init; }

    /// <summary>How it is drawn.</summary>
    public required Stroke Stroke { get; init; }

    /// <summary>Upper and lower edge of its band, one pair for each point; empty for none.</summary>
    public ImmutableArray<(double Low, double High)> Band { get; init; } = [];

    /// <summary>Marks on it.</summary>
    public ImmutableArray<PlanMark> Marks { get; init; } = [];

    /// <summary>A shape repeated along the line, so that it is told apart without colour; null for none.</summary>
    public MarkShape? Symbol { get; init; }

    /// <summary>Further columns of the value table beside x and y; one row for each point, or empty.</summary>
    public ImmutableArray<double> Uncertainty { get; init; } = [];

    /// <summary>Whether it only guides the eye (a line of equal gas ratio): its label is small and gives way to the others.</summary>
    public bool IsGuide { get; init; }

    /// <summary>Where the label starts, in the coordinates of the plot, for charts that know its place (bars); null lets the layout find one.</summary>
    public DataPoint? LabelStart { get; init; }
}
