namespace RedoxFurnace.Charts.Kinds;

/// <summary>A measured equilibrium constant.</summary>
/// <param name="Kelvin">K.</param>
/// <param name="NaturalLog">ln K.</param>
public readonly record struct MeasuredPoint(double Kelvin, double NaturalLog);
