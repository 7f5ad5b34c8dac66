using System.Collections.Immutable;
using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Plans;

/// <summary>A shaded field of the plot with a name in it.</summary>
/// <param name="Name">Name of its group in the file.</param>
/// <param name="Label">Written inside; empty for none.</param>
/// <param name="Outline">Corners in order.</param>
/// <param name="Fill">Colour.</param>
/// <param name="LabelAt">Middle of the label.</param>
public sealed record FieldPlan(string Name, RichText Label, ImmutableArray<DataPoint> Outline, Ink Fill, DataPoint LabelAt);
