using System.Collections.Immutable;

namespace RedoxFurnace.Reductants;

/// <summary>The temperatures at which a margin changes sign, and the bands in which it is positive.</summary>
/// <param name="LowestKelvin">Where the search began, K.</param>
/// <param name="HighestKelvin">Where it ended, K.</param>
/// <param name="Kelvin">Crossovers, rising, K.</param>
/// <param name="Range">Where it works.</param>
/// <param name="Bands">Where the margin is positive, K.</param>
public sealed record Crossovers(double LowestKelvin, double HighestKelvin, ImmutableArray<double> Kelvin, WorkingRange Range, ImmutableArray<(double Low, double High)> Bands)
{
    private const double ScanKelvin = 12.5;
    private const double FoundWithin = 1e-3;

    /// <summary>Scans a margin over a range of temperature, breaks of the data included, and bisects every change of sign.</summary>
    /// <param name="margin">Margin at a temperature, null without data.</param>
    /// <param name="low">K.</param>
    /// <param name="high">K.</param>
    /// <param name="breaks">Temperatures to look at on both sides, K.</param>
    /// <returns>The crossovers.</returns>
    internal static Crossovers Find(Func<double, double?> margin, double low, double high, IEnumerable<double> breaks)
    {
        if (!(high > low))
        {
            return new Crossovers(low, high, [], WorkingRange.Never, []);
        }

        List<double> found = [];
        List<(double Low, double High)> bands = [];
        double? bandStart = null;
        double previous = 0;
        double? before = null;
        foreach (double kelvin in Grid(low, high, breaks))
        {
            double? here = margin(kelvin);
            if (here is { } value && before is { } last && (value > 0) != (last > 0))
            {
                double crossing = Bisect(margin, previous, kelvin, last > 0);
                found.Add(crossing);
                if (value > 0)
                {
                    bandStart = crossing;
                }
                else
                {
                    bands.Add((bandStart ?? low, crossing));
                    bandStart = null;
                }
            }
            else if (here > 0 && before is null)
            {
                bandStart = kelvin;
            }
            else if (here is null && before > 0)
            {
                bands.Add((bandStart ?? previous, previous));
                bandStart = null;
            }

            (previous, before) = (kelvin, here);
        }

        if (bandStart is { } open)
        {
            bands.Add((open, high));
        }

        return new Crossovers(low, high, [.. found], Classify(bands, found.Count, low, high), [.. bands]);
    }

    private static WorkingRange Classify(List<(double Low, double High)> bands, int crossings, double low, double high)
    {
        if (bands.Count == 0)
        {
            return WorkingRange.Never;
        }

        if (crossings == 0)
        {
            return WorkingRange.Always;
        }

        return bands.Count > 1 ? WorkingRange.Bands
            : bands[0].High >= high && bands[0].Low > low ? WorkingRange.Above
            : bands[0].Low <= low && bands[0].High < high ? WorkingRange.Below
            : WorkingRange.Bands;
    }

    private static SortedSet<double> Grid(double low, double high, IEnumerable<double> breaks)
    {
        SortedSet<double> grid = [low, high];
        for (double kelvin = low + ScanKelvin; kelvin < high; kelvin += ScanKelvin)
        {
            grid.Add(kelvin);
        }

        foreach (double kelvin in breaks.Where(kelvin => kelvin > low && kelvin < high))
        {
            grid.Add(kelvin);
        }

        return grid;
    }

    private static double Bisect(Func<double, double?> margin, double low, double high, bool positiveBelow)
    {
        while (high - low > FoundWithin)
        {
            double middle = (low + high) / 2;
            if (margin(middle) is { } value && (value > 0) == positiveBelow)
            {
                low = middle;
            }
            else
            {
                high = middle;
            }
        }

        return (low + high) / 2;
    }
}
