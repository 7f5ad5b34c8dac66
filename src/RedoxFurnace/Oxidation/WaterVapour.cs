namespace RedoxFurnace.Oxidation;

/// <summary>
/// Saturation pressure of water over liquid, ice and supercooled water, and the temperatures that belong to a pressure.
/// Pressures are carried as natural logarithms of bar; temperatures are kelvin. No enhancement factor: the water of a dry gas
/// at furnace pressure is taken as ideal.
/// </summary>
/// <remarks>
/// Over liquid: Wagner and Pruss 1993, J. Phys. Chem. Ref. Data 22, 783-787, the IAPWS saturation equation. Over ice: IAPWS R14-08(2011),
/// sublimation equation. Over supercooled water: Murphy and Koop 2005, Q. J. R. Meteorol. Soc. 131, 1539-1565, equation 10.
/// Coefficients from memory, held against published check values by the tests.
/// </remarks>
public static class WaterVapour
{
    /// <summary>Triple point of water, 273.16 K.</summary>
    public const double TriplePointKelvin = 273.16;

    /// <summary>Critical temperature of water, 647.096 K: the end of the liquid line.</summary>
    public const double CriticalKelvin = 647.096;

    /// <summary>Lowest temperature of the ice line, 50 K.</summary>
    public const double IceLowestKelvin = 50;

    /// <summary>Lowest temperature of the supercooled line, 123 K.</summary>
    public const double SupercooledLowestKelvin = 123;

    /// <summary>Highest temperature of the supercooled line, 332 K; above the triple point it describes stable liquid.</summary>
    public const double SupercooledHighestKelvin = 332;

    private const double CriticalPressureBar = 220.64;
    private const double TriplePressureBar = 611.657e-5;
    private const double PascalPerBar = 1e5;

    private static readonly double LogCriticalBar = Math.Log(CriticalPressureBar);
    private static readonly double LogTripleBar = Math.Log(TriplePressureBar);
    private static readonly double LogPascalPerBar = Math.Log(PascalPerBar);

    /// <summary>ln(p/bar) over liquid water, 273.16 to 647.096 K.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The temperature lies outside that range.</exception>
    public static double LogSaturationPressureOverLiquid(double kelvin)
    {
        CheckRange(kelvin, TriplePointKelvin, CriticalKelvin);

        // t is the distance from the critical point, 1 - T/Tc, as in the source.
        double t = 1 - (kelvin / CriticalKelvin);
        double root = Math.Sqrt(t);
        double t3 = t * t * t;
        double sum = (-7.85951783 * t) + (1.84408259 * t * root) + (-11.7866497 * t3) + (22.6807411 * t3 * root)
            + (-15.9618719 * t3 * t) + (1.80122502 * t3 * t3 * t * root);
        return LogCriticalBar + (CriticalKelvin / kelvin * sum);
    }

    /// <summary>ln(p/bar) over ice, 50 to 273.16 K.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The temperature lies outside that range.</exception>
    public static double LogSaturationPressureOverIce(double kelvin)
    {
        CheckRange(kelvin, IceLowestKelvin, TriplePointKelvin);

        // q is T over the triple point, theta of the source.
        double q = kelvin / TriplePointKelvin;
        double sum = (-21.2144006 * Math.Pow(q, 0.00333333333)) + (27.3203819 * Math.Pow(q, 1.20666667)) + (-6.10598130 * Math.Pow(q, 1.70333333));
        return LogTripleBar + (sum / q);
    }

    /// <summary>ln(p/bar) over liquid water that may be supercooled, 123 to 332 K.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The temperature lies outside that range.</exception>
    public static double LogSaturationPressureOverSupercooled(double kelvin)
    {
        CheckRange(kelvin, SupercooledLowestKelvin, SupercooledHighestKelvin);
        double ln = Math.Log(kelvin);
        double blend = Math.Tanh(0.0415 * (kelvin - 218.8));
        double logPascal = 54.842763 - (6763.22 / kelvin) - (4.210 * ln) + (0.000367 * kelvin)
            + (blend * (53.878 - (1331.22 / kelvin) - (9.44523 * ln) + (0.014025 * kelvin)));
        return logPascal - LogPascalPerBar;
    }

    /// <summary>Temperature in K at which ice is in equilibrium with this water pressure.</summary>
    /// <param name="logBar">ln(p/bar) of the water vapour.</param>
    /// <returns>50 to 273.16 K; null where the pressure belongs to no ice in that range.</returns>
    public static double? FrostPointOverIce(double logBar) =>
        Invert(LogSaturationPressureOverIce, logBar, IceLowestKelvin, TriplePointKelvin);

    /// <summary>Temperature in K at which liquid water is in equilibrium with this water pressure.</summary>
    /// <param name="logBar">ln(p/bar) of the water vapour.</param>
    /// <returns>273.16 to 647.096 K; null outside. Whether the total pressure allows it is the caller's to judge.</returns>
    public static double? DewPointOverLiquid(double logBar) =>
        Invert(LogSaturationPressureOverLiquid, logBar, TriplePointKelvin, CriticalKelvin);

    /// <summary>Temperature in K at which water kept from freezing is in equilibrium with this water pressure.</summary>
    /// <param name="logBar">ln(p/bar) of the water vapour.</param>
    /// <returns>123 to 332 K; null outside.</returns>
    public static double? DewPointOverSupercooled(double logBar) =>
        Invert(LogSaturationPressureOverSupercooled, logBar, SupercooledLowestKelvin, SupercooledHighestKelvin);

    // All three lines rise throughout, so one root at most. Secant steps in 1/T, where they are nearly straight,
    // kept inside a bracket that halves whenever a step would leave it.
    private static double? Invert(Func<double, double> logPressureAt, double logBar, double lowest, double highest)
    {
        const double rounding = 1e-12;
        if (double.IsNaN(logBar) || logBar < logPressureAt(lowest) - rounding || logBar > logPressureAt(highest) + rounding)
        {
            return null;
        }

        double low = 1 / highest, high = 1 / lowest;
        double atLow = Math.Max(0, logPressureAt(highest) - logBar), atHigh = Math.Min(0, logPressureAt(lowest) - logBar);
        for (int step = 0; step < 200 && high - low > 1e-15 * high; step++)
        {
            double guess = step % 3 == 2 ? 0.5 * (low + high) : low + ((high - low) * atLow / (atLow - atHigh));
            double at = logPressureAt(Math.Clamp(1 / guess, lowest, highest)) - logBar;
            if (at == 0)
            {
                return 1 / guess;
            }

            (low, atLow, high, atHigh) = at > 0 ? (guess, at, high, atHigh) : (low, atLow, guess, at);
        }

        return Math.Clamp(2 / (low + high), lowest, highest);
    }

    private static void CheckRange(double kelvin, double lowest, double highest)
    {
        if (!(kelvin >= lowest && kelvin <= highest))
        {
            throw new ArgumentOutOfRangeException(
                nameof(kelvin), kelvin, FormattableString.Invariant($"The water vapour line holds from {lowest} to {highest} K."));
        }
    }
}
