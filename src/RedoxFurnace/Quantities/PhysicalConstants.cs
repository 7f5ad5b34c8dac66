namespace RedoxFurnace.Quantities;

/// <summary>The constants every formula shares, each with its edition.</summary>
public static class PhysicalConstants
{
    /// <summary>Molar gas constant, J/(mol K). CODATA 2018 (exact since the 2019 SI).</summary>
    public const double GasConstant = 8.314462618;

    /// <summary>Faraday constant, C/mol. CODATA 2018 (exact since the 2019 SI).</summary>
    public const double Faraday = 96485.33212;

    /// <summary>Standard atmosphere in bar. SI Brochure, 9th edition.</summary>
    public const double AtmosphereInBar = 1.01325;

    /// <summary>Share of oxygen in dry air by volume, as taken for probe reference air.</summary>
    public const double OxygenInAir = 0.2095;

    /// <summary>Reference temperature of enthalpies and entropies, K (25 C).</summary>
    public const double ReferenceKelvin = 298.15;

    /// <summary>0 C in kelvin.</summary>
    public const double ZeroCelsiusInKelvin = 273.15;

    /// <summary>Volume of one mole of ideal gas at 0 C and 101325 Pa, Nm3/mol.</summary>
    public const double NormalCubicMetrePerMole = GasConstant * ZeroCelsiusInKelvin / 101325.0;
}
