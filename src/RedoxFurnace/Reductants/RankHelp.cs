using RedoxFurnace.Quantities;

namespace RedoxFurnace.Reductants;

/// <summary>What would turn a no into a yes: another temperature, a lower pressure, a drier or richer gas.</summary>
internal static class RankHelp
{
    private const double LowestPressureBar = 1e-9;

    public static string? For(RankedReductant row, ReductionPair pair, double kelvin, RankConditions conditions)
    {
        if (row.Verdict == Verdict.Reduces && row.Carbide is not { MetalMargin: < 0 })
        {
            return null;
        }

        List<string> ways = [];
        AddTemperature(row, kelvin, ways);
        AddPressure(row, pair, kelvin, conditions, ways);
        if (row.GasRatioLeast is { } least && row.Margin < 0)
        {
            ways.Add(row.Reductant.Id == "H2"
                ? $"drier: H2/H2O above {Printed.Brief(least)} ({RankWords.WaterWords((conditions.Total?.NaturalLogBar ?? 0) - Math.Log(1 + least))})"
                : $"richer: CO/CO2 above {Printed.Brief(least)}");
        }

        return ways.Count > 0 ? string.Join("; ", ways) : "another reductant";
    }

    private static void AddTemperature(RankedReductant row, double kelvin, List<string> ways)
    {
        if (row.Carbide is { MetalFloorKelvin: { } metalFloor } && metalFloor > kelvin)
        {
            ways.Add($"hotter: metal from {Celsius(metalFloor)} C");
            return;
        }

        foreach ((double low, double high) in row.Crossovers!.Bands)
        {
            if (low > kelvin)
            {
                ways.Add($"hotter: from {Celsius(low)} C");
                return;
            }

            if (high < kelvin)
            {
                ways.Add($"cooler: below {Celsius(high)} C");
            }
        }
    }

    private static void AddPressure(RankedReductant row, ReductionPair pair, double kelvin, RankConditions conditions, List<string> ways)
    {
        // H2 and CO stand at a ratio: lowering the total pressure only matters where the metal leaves as vapour.
        bool helps = row.MetalVapourLogPressure is not null || (row.Reductant.Kind != ReductantKind.Gas && (pair.Reductant.FeelsPressure || pair.Charge.HasVapour));
        if (row.Margin >= 0 || !helps || conditions.Monoxide is not null)
        {
            return;
        }

        double high = conditions.Total?.NaturalLogBar ?? 0;
        double low = Math.Log(LowestPressureBar);
        if (Margin(pair, kelvin, low) is not > 0)
        {
            return;
        }

        while (high - low > 1e-3)
        {
            double middle = (low + high) / 2;
            (low, high) = Margin(pair, kelvin, middle) > 0 ? (middle, high) : (low, middle);
        }

        ways.Add($"lower total pressure: below {Pressure.FromNaturalLogBar(low)}");
    }

    private static double? Margin(ReductionPair pair, double kelvin, double totalLogPressure)
    {
        try
        {
            return pair.At(kelvin, totalLogPressure).Margin;
        }
        catch (NoAnswerException)
        {
            return null;
        }
    }

    private static string Celsius(double kelvin) => Printed.Fixed(kelvin - PhysicalConstants.ZeroCelsiusInKelvin, 0);
}
