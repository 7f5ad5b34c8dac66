using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>A zirconia probe: its temperature and the oxygen of its reference air.</summary>
/// <remarks>E = RT/4F ln(pO2 reference / pO2), positive for reducing gas. THEORY.md, 'Readings'.</remarks>
public sealed record OxygenProbe
{
    /// <summary>A probe.</summary>
    /// <param name="at">Temperature of the cell.</param>
    /// <param name="referenceOxygenShare">Share of O2 in the reference gas, above 0, at most 1; dry air holds 0.2095.</param>
    /// <param name="referencePressure">Pressure of the reference gas; 1 atm unless told.</param>
    public OxygenProbe(Temperature at, double referenceOxygenShare = PhysicalConstants.OxygenInAir, Pressure? referencePressure = null)
    {
        if (!(referenceOxygenShare is > 0 and <= 1))
        {
            throw RequestException.OutOfRange("reference air", Printed.Brief(referenceOxygenShare * 100) + " % O2", "above 0 to 100% is allowed");
        }

        At = at;
        ReferenceOxygenShare = referenceOxygenShare;
        ReferenceLogBar = Math.Log(referenceOxygenShare) + (referencePressure?.NaturalLogBar ?? Math.Log(PhysicalConstants.AtmosphereInBar));
    }

    /// <summary>Temperature of the cell.</summary>
    public Temperature At { get; }

    /// <summary>Share of O2 in the reference gas.</summary>
    public double ReferenceOxygenShare { get; }

    /// <summary>ln of its oxygen pressure in bar.</summary>
    public double ReferenceLogBar { get; }

    /// <summary>Cell voltage in a gas.</summary>
    /// <param name="naturalLogOxygen">ln(pO2/bar) at the cell.</param>
    /// <returns>mV.</returns>
    public double Millivolts(double naturalLogOxygen)
        => 1000 * PhysicalConstants.GasConstant * At.Kelvin / (4 * PhysicalConstants.Faraday) * (ReferenceLogBar - naturalLogOxygen);

    /// <summary>Oxygen pressure at the cell for a voltage.</summary>
    /// <param name="millivolts">mV, positive for reducing gas.</param>
    /// <returns>ln(pO2/bar).</returns>
    public double NaturalLogOxygen(double millivolts)
        => ReferenceLogBar - (millivolts / 1000 * 4 * PhysicalConstants.Faraday / (PhysicalConstants.GasConstant * At.Kelvin));
}
