namespace RedoxFurnace.Assessments;

/// <summary>How one enthalpy or entropy at 298.15 K enters the adjustment.</summary>
/// <param name="Substance">Formula.</param>
/// <param name="IsEntropy">Entropy in J/(mol K); otherwise enthalpy in kJ/mol.</param>
/// <param name="Value">Published value, or null where there is none.</param>
/// <param name="ExpandedError">k = 2, or null.</param>
/// <param name="Source">Citation, or null.</param>
/// <param name="IsFree">Whether the adjustment may move it; otherwise it is held.</param>
/// <param name="Treatment">In words.</param>
public sealed record MeasurementPrior(string Substance, bool IsEntropy, double? Value, double? ExpandedError, string? Source, bool IsFree, string Treatment);
