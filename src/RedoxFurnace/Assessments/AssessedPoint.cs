namespace RedoxFurnace.Assessments;

/// <summary>A measurement at one temperature against the database; differences are calculated less measured.</summary>
/// <param name="Kelvin">K.</param>
/// <param name="IsFit">Whether it was weighed.</param>
/// <param name="BeforeJoules">With the raw enthalpies, J/mol O2, or null where raw data do not describe the couple.</param>
/// <param name="AfterJoules">With the assessed enthalpies, J/mol O2.</param>
/// <param name="SigmaJoules">Standard error (k = 1) the point is weighed with, J/mol O2.</param>
public sealed record AssessedPoint(double Kelvin, bool IsFit, double? BeforeJoules, double AfterJoules, double SigmaJoules);
