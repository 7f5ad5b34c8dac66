namespace RedoxFurnace.Substances;

/// <summary>Molar properties of a phase at one temperature, apparent values: an element in its reference state has H = 0 at 298.15 K.</summary>
/// <param name="Enthalpy">H(T), J/mol.</param>
/// <param name="Entropy">S(T), J/(mol K).</param>
/// <param name="HeatCapacity">Cp(T), J/(mol K).</param>
/// <param name="Kelvin">The temperature, K.</param>
public readonly record struct ThermalState(double Enthalpy, double Entropy, double HeatCapacity, double Kelvin)
{
    /// <summary>Apparent Gibbs energy H - T S, J/mol.</summary>
    public double Gibbs => Enthalpy - (Kelvin * Entropy);
}
