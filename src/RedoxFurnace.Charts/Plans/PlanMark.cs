using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Plans;

/// <summary>A mark at a place of the plot.</summary>
/// <param name="At">Where.</param>
/// <param name="Shape">Shape; the key says what it means.</param>
public readonly record struct PlanMark(DataPoint At, MarkShape Shape);
