namespace RedoxFurnace.Assessments;

/// <summary>A fitted value with its 95 % confidence limit (Student's t).</summary>
/// <param name="Value">In its unit.</param>
/// <param name="Limit">Half the width of the interval.</param>
public sealed record FittedValue(double Value, double Limit);
