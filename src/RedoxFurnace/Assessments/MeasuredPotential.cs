namespace RedoxFurnace.Assessments;

/// <summary>One measured point of a couple.</summary>
/// <param name="Label">How a message names it, such as <c>line 4</c>.</param>
/// <param name="Kelvin">K.</param>
/// <param name="Joules">RT ln pO2 of the couple, J per mole of O2.</param>
/// <param name="StandardError">k = 1, J per mole of O2, or null where none is given.</param>
public sealed record MeasuredPotential(string Label, double Kelvin, double Joules, double? StandardError);
