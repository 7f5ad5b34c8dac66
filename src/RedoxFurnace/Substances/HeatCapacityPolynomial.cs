using RedoxFurnace.Quantities;

namespace RedoxFurnace.Substances;

/// <summary>H and S at 298.15 K with Cp = a + bT + cT^-2 + dT^-1/2 + eT^2 (Maier-Kelley form with two further terms), J, mol, K.</summary>
/// <remarks>THEORY.md, section 2.</remarks>
internal sealed class HeatCapacityPolynomial : PhaseModel
{
    private readonly double _a;
    private readonly double _b;
    private readonly double _c;
    private readonly double _d;
    private readonly double _e;
    private readonly double _enthalpyConstant;
    private readonly double _entropyConstant;

    public HeatCapacityPolynomial(TemperatureRange range, double enthalpy298, double entropy298, double a, double b, double c, double d, double e)
        : base(range)
    {
        (_a, _b, _c, _d, _e) = (a, b, c, d, e);
        const double t0 = PhysicalConstants.ReferenceKelvin;
        _enthalpyConstant = enthalpy298 - EnthalpyIntegral(t0);
        _entropyConstant = entropy298 - EntropyIntegral(t0, Math.Log(t0));
    }

    public override double Gibbs(double kelvin) => EnthalpyIntegral(kelvin) + _enthalpyConstant - (kelvin * (EntropyIntegral(kelvin, Math.Log(kelvin)) + _entropyConstant));

    public override ThermalState At(double kelvin) => new(
        EnthalpyIntegral(kelvin) + _enthalpyConstant,
        EntropyIntegral(kelvin, Math.Log(kelvin)) + _entropyConstant,
        _a + (_b * kelvin) + (_c / (kelvin * kelvin)) + (_d / Math.Sqrt(kelvin)) + (_e * kelvin * kelvin),
        kelvin);

    private double EnthalpyIntegral(double t)
        => (_a * t) + (_b * t * t / 2) - (_c / t) + (2 * _d * Math.Sqrt(t)) + (_e * t * t * t / 3);

    private double EntropyIntegral(double t, double log)
        => (_a * log) + (_b * t) - (_c / (2 * t * t)) - (2 * _d / Math.Sqrt(t)) + (_e * t * t / 2);
}
