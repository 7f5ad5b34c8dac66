using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Plans;

/// <summary>A numbered place of the plot, listed below it.</summary>
/// <param name="At">Where.</param>
/// <param name="Text">What the list says.</param>
public sealed record PlanCrossing(DataPoint At, RichText Text);
