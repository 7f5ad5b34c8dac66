using RedoxFurnace.Quantities;

namespace RedoxFurnace.Oxidation;

/// <summary>An oxygen potential in the units of instruments.</summary>
/// <remarks>THEORY.md, section 6. All take the potential RT ln pO2 in J per mole of O2.</remarks>
public static class OxygenPotentialReadings
{
    /// <summary>log10 of pO2 in bar.</summary>
    /// <param name="oxygenPotential">J per mole of O2.</param>
    /// <param name="kelvin">K.</param>
    /// <returns>log10(pO2/bar).</returns>
    public static double Log10Bar(double oxygenPotential, double kelvin)
        => oxygenPotential / (PhysicalConstants.GasConstant * kelvin * Math.Log(10));

    /// <summary>Cell voltage of a zirconia probe against air at 1 atm, positive for reducing gas: E = RT/4F ln(pO2 of air / pO2).</summary>
    /// <param name="oxygenPotential">J per mole of O2.</param>
    /// <param name="kelvin">Probe temperature, K.</param>
    /// <returns>mV.</returns>
    public static double ProbeMillivolts(double oxygenPotential, double kelvin)
    {
        double air = PhysicalConstants.GasConstant * kelvin * Math.Log(PhysicalConstants.OxygenInAir * PhysicalConstants.AtmosphereInBar);
        return 1000 * (air - oxygenPotential) / (4 * PhysicalConstants.Faraday);
    }

    /// <summary>Oxygen potential of a gas that shows a cell voltage against air at 1 atm.</summary>
    /// <param name="millivolts">mV, positive for reducing gas.</param>
    /// <param name="kelvin">Probe temperature, K.</param>
    /// <returns>J per mole of O2.</returns>
    public static double OfProbe(double millivolts, double kelvin)
    {
        double air = PhysicalConstants.GasConstant * kelvin * Math.Log(PhysicalConstants.OxygenInAir * PhysicalConstants.AtmosphereInBar);
        return air - (4 * PhysicalConstants.Faraday * millivolts / 1000);
    }

    /// <summary>Decomposition voltage of an oxide: -dG/4F.</summary>
    /// <param name="gibbsPerMoleO2">J per mole of O2.</param>
    /// <returns>V.</returns>
    public static double DecompositionVolts(double gibbsPerMoleO2) => -gibbsPerMoleO2 / (4 * PhysicalConstants.Faraday);
}
