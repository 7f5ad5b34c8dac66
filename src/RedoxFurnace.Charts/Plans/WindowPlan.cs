using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Plans;

/// <summary>A range of the horizontal axis tinted from top to bottom.</summary>
/// <param name="Low">From.</param>
/// <param name="High">To.</param>
/// <param name="Label">Written at its head.</param>
/// <param name="Narrow">Written there instead where the range is too narrow for the label.</param>
public sealed record WindowPlan(double Low, double High, RichText Label, RichText Narrow);
