namespace RedoxFurnace.Oxidation;

/// <summary>A temperature at which the driving force of a reaction changes sign.</summary>
/// <param name="Kelvin">K.</param>
/// <param name="IsFloor">The reaction goes to the right above it; otherwise below it.</param>
/// <param name="Uncertainty">Expanded (k = 2), K, from the uncertainty of the Gibbs energy over its slope.</param>
public sealed record TurningTemperature(double Kelvin, bool IsFloor, double? Uncertainty);
