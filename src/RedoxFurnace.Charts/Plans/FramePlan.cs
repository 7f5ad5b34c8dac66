using System.Collections.Immutable;

namespace RedoxFurnace.Charts.Plans;

/// <summary>What stands round the plot.</summary>
/// <param name="Kind">How much of it.</param>
/// <param name="Caption">Lines below the plot: basis, uncertainty, sources.</param>
/// <param name="Safety">The safety line; empty for none.</param>
/// <param name="Block">Fields of the title block in order: name and text.</param>
public sealed record FramePlan(FrameKind Kind, ImmutableArray<string> Caption, string Safety, ImmutableArray<(string Name, string Text)> Block)
{
    /// <summary>Nothing round the plot.</summary>
    public static FramePlan None { get; } = new(FrameKind.None, [], "", []);
}
