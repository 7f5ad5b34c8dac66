namespace RedoxFurnace.Atmospheres;

/// <summary>A point of a gas-ratio chart.</summary>
/// <param name="Kelvin">K.</param>
/// <param name="Share">CO in CO + CO2, or H2 in H2 + H2O: 0 to 1.</param>
/// <param name="NaturalLogRatio">ln(pCO/pCO2) or ln(pH2/pH2O): keeps its digits where the share is within rounding of 0 or 1.</param>
/// <param name="ExpandedUncertainty">Of <paramref name="NaturalLogRatio"/>, k = 2.</param>
public readonly record struct GasRatioPoint(double Kelvin, double Share, double NaturalLogRatio, double ExpandedUncertainty);
