namespace RedoxFurnace.Atmospheres;

/// <summary>Carbon of plain iron in austenite against carbon activity.</summary>
/// <remarks>
/// Ellis T., Davidson I.M., Bodsworth C. 1963, J. Iron Steel Inst. 201, 582: log10 aC = 2300/T - 2.21 + 0.15 %C + log10 %C, against graphite; from memory.
/// Expanded uncertainty taken here: 8 % of the carbon, and 0.03 % C at least, because the equation and the alloy terms are recalled and published lines differ by as much.
/// </remarks>
public static class AusteniteCarbon
{
    /// <summary>Lowest temperature answered, K: below 727 C there is no austenite of plain carbon steel.</summary>
    public const double LowestKelvin = 1000.15;

    /// <summary>Highest temperature answered, K.</summary>
    public const double HighestKelvin = 1473.15;

    /// <summary>Highest carbon answered, mass percent.</summary>
    public const double MostPercent = 2.1;

    /// <summary>ln of carbon activity of plain iron.</summary>
    /// <param name="kelvin">K.</param>
    /// <param name="percent">Mass percent carbon, above 0.</param>
    /// <returns>Natural logarithm, against graphite.</returns>
    public static double NaturalLogActivity(double kelvin, double percent)
        => Math.Log(10) * ((2300 / kelvin) - 2.21 + (0.15 * percent) + Math.Log10(percent));

    /// <summary>Carbon of plain iron at a carbon activity: the carbon potential of the gas.</summary>
    /// <param name="kelvin">K.</param>
    /// <param name="naturalLogActivity">ln of carbon activity.</param>
    /// <returns>Mass percent; null below 727 C, above 1200 C, or where it would pass 2.1 %.</returns>
    public static double? CarbonPotential(double kelvin, double naturalLogActivity)
    {
        if (kelvin < LowestKelvin || kelvin > HighestKelvin || naturalLogActivity > NaturalLogActivity(kelvin, MostPercent))
        {
            return null;
        }

        // In ln %C the equation is convex and rises with a slope of at least 1, so Newton from above falls to the root without overshooting.
        double x = Math.Log(MostPercent);
        for (int step = 0; step < 100; step++)
        {
            double percent = Math.Exp(x);
            double change = (NaturalLogActivity(kelvin, percent) - naturalLogActivity) / (1 + (0.15 * Math.Log(10) * percent));
            x -= change;
            if (Math.Abs(change) < 1e-15 * Math.Max(1, Math.Abs(x)))
            {
                break;
            }
        }

        return Math.Exp(x);
    }

    /// <summary>Expanded uncertainty (k = 2) of a carbon content found through these equations.</summary>
    /// <param name="percent">Mass percent.</param>
    /// <returns>Mass percent.</returns>
    public static double ExpandedUncertainty(double percent) => Math.Max(0.03, 0.08 * percent);
}
