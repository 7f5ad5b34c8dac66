using System.Globalization;

namespace RedoxFurnace.Quantities;

/// <summary>Numbers as they are printed in sentences: invariant culture, no more digits than help.</summary>
public static class Printed
{
    /// <summary>Up to four significant digits, exponent only where the number is very small or large.</summary>
    /// <param name="value">Any number.</param>
    /// <returns>The text.</returns>
    public static string Brief(double value) => value.ToString("G4", CultureInfo.InvariantCulture);

    /// <summary>A fixed number of decimals.</summary>
    /// <param name="value">Any number.</param>
    /// <param name="decimals">0 to 12.</param>
    /// <returns>The text; minus zero is printed as zero.</returns>
    public static string Fixed(double value, int decimals)
    {
        double rounded = Math.Round(value, decimals, MidpointRounding.AwayFromZero);
        return (rounded == 0 ? 0 : rounded).ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
    }

    /// <summary>The shortest text that reads back to the same number.</summary>
    /// <param name="value">Any number.</param>
    /// <returns>The text.</returns>
    public static string Exact(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}
