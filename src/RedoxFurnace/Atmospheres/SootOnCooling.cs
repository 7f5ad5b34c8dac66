using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>Where a gas, carried down as it is, passes carbon activity 1: soot, and in the middle of that range metal dusting.</summary>
public static class SootOnCooling
{
    /// <summary>Below this, carbon no longer comes out at a rate that matters: common practice, no source.</summary>
    public const double DustingLowKelvin = 430 + PhysicalConstants.ZeroCelsiusInKelvin;

    /// <summary>Above this, alloys are attacked less: common practice, no source.</summary>
    public const double DustingHighKelvin = 650 + PhysicalConstants.ZeroCelsiusInKelvin;

    private const double ScanKelvin = 10;
    private const double FoundWithin = 0.01;

    /// <summary>The ranges in which the gas as analysed (CO, CO2, H2, H2O, O2 shift; methane and ammonia do not) would deposit carbon.</summary>
    /// <param name="mixture">The gas.</param>
    /// <param name="total">Total pressure.</param>
    /// <param name="equilibrium">Solver.</param>
    /// <param name="lowKelvin">Not below 300 K.</param>
    /// <param name="highKelvin">Not above 2500 K.</param>
    /// <returns>By rising temperature; none where the activity stays below 1 or is not fixed.</returns>
    public static ImmutableArray<CarbonRange> Ranges(GasMixture mixture, Pressure total, GasEquilibrium equilibrium, double lowKelvin, double highKelvin)
    {
        List<CarbonRange> ranges = [];
        double? start = Exceeds(lowKelvin) ? lowKelvin : null;
        bool startIsOpen = start is not null;
        double last = lowKelvin;
        while (last < highKelvin)
        {
            double next = Math.Min(highKelvin, last + ScanKelvin);
            bool now = Exceeds(next);
            if (now != start is not null)
            {
                double edge = Edge(last, next, !now);
                if (start is { } from)
                {
                    ranges.Add(new CarbonRange(from, edge, startIsOpen, false));
                    start = null;
                }
                else
                {
                    start = edge;
                    startIsOpen = false;
                }
            }

            last = next;
        }

        if (start is { } open)
        {
            ranges.Add(new CarbonRange(open, highKelvin, startIsOpen, true));
        }

        return [.. ranges];

        bool Exceeds(double kelvin) => equilibrium.AsAnalysed(mixture, Temperature.FromKelvin(kelvin), total).NaturalLogCarbonActivity > 0;

        double Edge(double low, double high, bool lowExceeds)
        {
            while (high - low > FoundWithin)
            {
                double middle = 0.5 * (low + high);
                if (Exceeds(middle) == lowExceeds)
                {
                    low = middle;
                }
                else
                {
                    high = middle;
                }
            }

            return 0.5 * (low + high);
        }
    }

    /// <summary>The part of a range in which metal dusting is usual, 430 to 650 C; null where they do not meet.</summary>
    /// <param name="range">A range of carbon activity above 1.</param>
    /// <returns>The overlap or null.</returns>
    public static CarbonRange? Dusting(CarbonRange range)
    {
        double low = Math.Max(range.LowKelvin, DustingLowKelvin);
        double high = Math.Min(range.HighKelvin, DustingHighKelvin);
        return high > low ? new CarbonRange(low, high, false, false) : null;
    }
}
