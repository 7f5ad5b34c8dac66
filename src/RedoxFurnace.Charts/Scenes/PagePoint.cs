namespace RedoxFurnace.Charts.Scenes;

/// <summary>A place on the page: mm from its left and from its top edge. Never a data value, never a pixel.</summary>
/// <param name="X">mm from the left.</param>
/// <param name="Y">mm from the top.</param>
public readonly record struct PagePoint(double X, double Y);
