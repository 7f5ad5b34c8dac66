namespace RedoxFurnace.Charts.Plans;

/// <summary>A place in the coordinates of the axes (kelvin and kJ per mole of O2, say). Never a place on the page.</summary>
/// <param name="X">Along the horizontal axis.</param>
/// <param name="Y">Along the vertical axis.</param>
public readonly record struct DataPoint(double X, double Y);
