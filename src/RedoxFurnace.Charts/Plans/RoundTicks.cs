using System.Collections.Immutable;
using System.Globalization;

namespace RedoxFurnace.Charts.Plans;

/// <summary>Round numbers along an axis: steps of 1, 2 or 5 times a power of ten.</summary>
internal static class RoundTicks
{
    public static ImmutableArray<AxisTick> Between(double a, double b, int about, Func<double, double> place)
    {
        (double low, double high) = (Math.Min(a, b), Math.Max(a, b));
        double step = Step((high - low) / about);
        ImmutableArray<AxisTick>.Builder ticks = ImmutableArray.CreateBuilder<AxisTick>();
        long first = (long)Math.Ceiling((low / step) - 1e-9);
        for (long i = first; i * step <= high + (1e-9 * step); i++)
        {
            ticks.Add(new AxisTick(place(i * step), Number(i * step, step)));
        }

        return ticks.ToImmutable();
    }

    /// <summary>A number with as many decimals as its step needs, and a true minus sign.</summary>
    public static string Number(double value, double step)
    {
        int decimals = Math.Max(0, (int)Math.Ceiling(-Math.Log10(step) - 1e-9));
        string text = Math.Abs(Math.Round(value, decimals)).ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        return value < 0 && text.Any(c => c is not ('0' or '.')) ? "\u2212" + text : text;
    }

    private static double Step(double rough)
    {
        double power = Math.Pow(10, Math.Floor(Math.Log10(rough)));
        double mantissa = rough / power;
        return power * (mantissa <= 1.0001 ? 1 : mantissa <= 2.0001 ? 2 : mantissa <= 5.0001 ? 5 : 10);
    }
}
