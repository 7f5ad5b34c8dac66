using RedoxFurnace.Quantities;

namespace RedoxFurnace.Substances;

/// <summary>Nine-coefficient polynomial of NASA/TP-2002-211556: Cp/R = a1 T^-2 + a2 T^-1 + a3 + a4 T + a5 T^2 + a6 T^3 + a7 T^4 with integration constants b1, b2.</summary>
/// <remarks>THEORY.md, section 2. The shifts of an assessment are folded into b1 and b2, so evaluation costs nothing extra.</remarks>
internal sealed class NasaPolynomial : PhaseModel
{
    private readonly double _a1;
    private readonly double _a2;
    private readonly double _a3;
    private readonly double _a4;
    private readonly double _a5;
    private readonly double _a6;
    private readonly double _a7;
    private readonly double _b1;
    private readonly double _b2;

    public NasaPolynomial(TemperatureRange range, double[] a, double[] b, double enthalpyShift, double entropyShift)
        : base(range)
    {
        (_a1, _a2, _a3, _a4, _a5, _a6, _a7) = (a[0], a[1], a[2], a[3], a[4], a[5], a[6]);
        _b1 = b[0] + (enthalpyShift / PhysicalConstants.GasConstant);
        _b2 = b[1] + (entropyShift / PhysicalConstants.GasConstant);
    }

    /// <summary>G/RT = H/RT - S/R with the terms gathered, so that one logarithm and one division serve.</summary>
    public override double Gibbs(double kelvin)
    {
        double t = kelvin;
        double inverse = 1 / t;
        double log = Math.Log(t);
        double dimensionless = (-0.5 * _a1 * inverse * inverse)
            + (((_a2 * (log + 1)) + _b1) * inverse)
            + (_a3 * (1 - log)) - _b2
            - (t * ((0.5 * _a4) + (t * ((_a5 / 6) + (t * ((_a6 / 12) + (t * _a7 / 20)))))));
        return PhysicalConstants.GasConstant * t * dimensionless;
    }

    public override ThermalState At(double kelvin)
    {
        double t = kelvin;
        double inverse = 1 / t;
        double log = Math.Log(t);
        double enthalpy = (-_a1 * inverse * inverse) + (((_a2 * log) + _b1) * inverse) + _a3
            + (t * ((_a4 / 2) + (t * ((_a5 / 3) + (t * ((_a6 / 4) + (t * _a7 / 5)))))));
        double entropy = (-0.5 * _a1 * inverse * inverse) - (_a2 * inverse) + (_a3 * log) + _b2
            + (t * (_a4 + (t * ((_a5 / 2) + (t * ((_a6 / 3) + (t * _a7 / 4)))))));
        double heatCapacity = (_a1 * inverse * inverse) + (_a2 * inverse) + _a3
            + (t * (_a4 + (t * (_a5 + (t * (_a6 + (t * _a7)))))));
        const double r = PhysicalConstants.GasConstant;
        return new ThermalState(r * t * enthalpy, r * entropy, r * heatCapacity, t);
    }
}
