namespace RedoxFurnace.Oxidation;

/// <summary>A reaction at one temperature; J for the reaction as written, uncertainties expanded (k = 2).</summary>
/// <param name="Kelvin">K.</param>
/// <param name="Gibbs">Standard Gibbs energy, or null without data.</param>
/// <param name="GibbsUncertainty">Of it.</param>
/// <param name="Enthalpy">Standard enthalpy.</param>
/// <param name="EnthalpyUncertainty">Of it.</param>
/// <param name="Entropy">Standard entropy, J/K.</param>
/// <param name="EntropyUncertainty">Of it, J/K.</param>
/// <param name="Log10K">log10 of the equilibrium constant.</param>
/// <param name="Log10KUncertainty">Of it.</param>
/// <param name="Log10Q">log10 of the quotient at the given activities and pressures.</param>
/// <param name="Driving">RT ln(K/Q): positive drives the reaction to the right.</param>
/// <param name="Log10KFromMeasured">From a measured K at another temperature, or null.</param>
/// <param name="WhyNot">Why there are no values, or null.</param>
public sealed record ConstantRow(
    double Kelvin,
    double? Gibbs,
    double? GibbsUncertainty,
    double? Enthalpy,
    double? EnthalpyUncertainty,
    double? Entropy,
    double? EntropyUncertainty,
    double? Log10K,
    double? Log10KUncertainty,
    double Log10Q,
    double? Driving,
    double? Log10KFromMeasured,
    string? WhyNot);
