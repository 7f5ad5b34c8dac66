namespace RedoxFurnace.Charts.Plans;

/// <summary>A marked place of an axis.</summary>
/// <param name="At">In the coordinates of the plot.</param>
/// <param name="Text">What stands beside it; empty for a small tick.</param>
public readonly record struct AxisTick(double At, string Text);
