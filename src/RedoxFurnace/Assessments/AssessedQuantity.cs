namespace RedoxFurnace.Assessments;

/// <summary>One enthalpy or entropy at 298.15 K in an adjustment; kJ/mol or J/(mol K).</summary>
/// <param name="Substance">Formula.</param>
/// <param name="IsEntropy">Entropy; otherwise enthalpy.</param>
/// <param name="Raw">As its source has it.</param>
/// <param name="InDatabase">As the database uses it.</param>
/// <param name="Assessed">What the least squares find; the database value where it is held.</param>
/// <param name="StandardError">Of the least squares (k = 1), null where it is held.</param>
/// <param name="Published">Calorimetric value, or null.</param>
/// <param name="PublishedError">Expanded (k = 2), or null.</param>
/// <param name="IsFree">Whether it was adjusted.</param>
/// <param name="Treatment">In words.</param>
public sealed record AssessedQuantity(
    string Substance,
    bool IsEntropy,
    double Raw,
    double InDatabase,
    double Assessed,
    double? StandardError,
    double? Published,
    double? PublishedError,
    bool IsFree,
    string Treatment)
{
    /// <summary>What the least squares differ by from the database.</summary>
    public double OffDatabase => Assessed - InDatabase;
}
