namespace RedoxFurnace.Assessments;

/// <summary>A measured point beside the line through all points.</summary>
/// <param name="Point">As measured.</param>
/// <param name="Residual">Measured less line, J per mole of O2.</param>
/// <param name="Pull">Distance from the line through the other points over its standard error; null where fewer than two degrees of freedom are left.</param>
/// <param name="IsOutlier">Whether the pull lies beyond what chance gives once in twenty sets of this size.</param>
/// <param name="OffDatabase">Measured less database, J per mole of O2, or null without data.</param>
public sealed record FittedPoint(MeasuredPotential Point, double Residual, double? Pull, bool IsOutlier, double? OffDatabase);
