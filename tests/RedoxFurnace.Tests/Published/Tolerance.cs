using System.Text.RegularExpressions;

namespace RedoxFurnace.Tests.Published;

/// <summary>Reads the tolerances of the published tables: <c>±3%</c>, <c>±0.1 …</c>, <c>x/÷2</c>, <c>exact</c>.</summary>
internal static partial class Tolerance
{
    public static (double Low, double High) Band(double value, string tolerance)
    {
        if (tolerance.StartsWith("x/÷", StringComparison.Ordinal))
        {
            double factor = PublishedTable.Number(Leading().Match(tolerance[3..]).Value);
            return (value / factor, value * factor);
        }

        Match match = PlusMinus().Match(tolerance);
        if (!match.Success)
        {
            throw new InvalidDataException($"no tolerance in '{tolerance}'");
        }

        double width = PublishedTable.Number(match.Groups[1].Value);
        double half = match.Groups[2].Success ? Math.Abs(value) * width / 100 : width;
        return (value - half, value + half);
    }

    public static void AssertWithin(double published, string tolerance, double found)
    {
        (double low, double high) = Band(published, tolerance);
        Assert.InRange(found, low, high);
    }

    [GeneratedRegex(@"^±([0-9.]+)(%)?")]
    private static partial Regex PlusMinus();

    [GeneratedRegex(@"^[0-9.]+")]
    private static partial Regex Leading();
}
