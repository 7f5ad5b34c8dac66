using System.Collections.Immutable;

namespace RedoxFurnace.Assessments;

/// <summary>A measurement with its differences.</summary>
/// <param name="Measurement">The measurement.</param>
/// <param name="Points">One for each temperature.</param>
/// <param name="StandardErrorJoules">Half the stated error, J/mol O2.</param>
public sealed record AssessedMeasurement(Measurement Measurement, ImmutableArray<AssessedPoint> Points, double StandardErrorJoules)
{
    /// <summary>Mean difference (measured less calculated) over the standard error: positive where the measurement would raise the oxygen potential.</summary>
    public double Pull => -Points.Average(point => point.AfterJoules) / StandardErrorJoules;

    /// <summary>Largest difference after the adjustment, signed, J/mol O2.</summary>
    public double LargestAfterJoules => Points.MaxBy(point => Math.Abs(point.AfterJoules))!.AfterJoules;
}
