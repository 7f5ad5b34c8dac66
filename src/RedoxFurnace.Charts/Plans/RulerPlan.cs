using System.Collections.Immutable;
using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Plans;

/// <summary>A nomographic side scale: a straight edge laid from the pivot through a point of the plot reads the value on the scale.</summary>
/// <param name="Name">Name of its group in the file.</param>
/// <param name="Label">Quantity, above the scale.</param>
/// <param name="PivotLabel">Letter at the pivot.</param>
/// <param name="Pivot">Where every reading starts, coordinates of the plot.</param>
/// <param name="Slopes">Value as written, with the slope of its ray (units of y per unit of x); a text left empty is a small tick.</param>
public sealed record RulerPlan(string Name, RichText Label, string PivotLabel, DataPoint Pivot, ImmutableArray<(RichText Text, double Slope)> Slopes);
