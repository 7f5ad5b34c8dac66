using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>Sentences of a ranking; the words of verdicts are those of machine-readable output too.</summary>
public static class RankWords
{
    /// <summary><c>reduces</c>, <c>borderline</c>, <c>does-not-reduce</c>, <c>no-data</c>.</summary>
    /// <param name="verdict">The verdict.</param>
    /// <returns>The word.</returns>
    public static string Of(Verdict verdict) => verdict switch
    {
        Verdict.Reduces => "reduces",
        Verdict.Borderline => "borderline",
        Verdict.DoesNotReduce => "does-not-reduce",
        _ => "no-data",
    };

    /// <summary><c>works</c>, <c>works-if</c>, <c>does-not-work</c>, <c>not-decidable</c>.</summary>
    /// <param name="verdict">The verdict.</param>
    /// <returns>The word.</returns>
    public static string Of(JobVerdict verdict) => verdict switch
    {
        JobVerdict.Works => "works",
        JobVerdict.WorksIf => "works-if",
        JobVerdict.DoesNotWork => "does-not-work",
        _ => "not-decidable",
    };

    /// <summary><c>above</c>, <c>below</c>, <c>bands</c>, <c>always</c>, <c>never</c>.</summary>
    /// <param name="range">The range.</param>
    /// <returns>The word.</returns>
    public static string Of(WorkingRange range) => range switch
    {
        WorkingRange.Above => "above",
        WorkingRange.Below => "below",
        WorkingRange.Bands => "bands",
        WorkingRange.Always => "always",
        _ => "never",
    };

    /// <summary>Where a reduction works, in words with Celsius.</summary>
    /// <param name="crossovers">The crossovers.</param>
    /// <returns>A phrase.</returns>
    public static string RangeWords(Crossovers crossovers) => crossovers.Range switch
    {
        WorkingRange.Above => $"from {Celsius(crossovers.Bands[0].Low)} C up",
        WorkingRange.Below => $"up to {Celsius(crossovers.Bands[0].High)} C",
        WorkingRange.Always => $"at every temperature searched ({Celsius(crossovers.LowestKelvin)} to {Celsius(crossovers.HighestKelvin)} C)",
        WorkingRange.Never => $"at no temperature searched ({Celsius(crossovers.LowestKelvin)} to {Celsius(crossovers.HighestKelvin)} C)",
        _ => "from " + string.Join(" and from ", crossovers.Bands.Select(band => $"{Celsius(band.Low)} to {Celsius(band.High)} C")),
    };

    internal static string MarginWords(RankedReductant row)
        => row.Margin is { } margin ? $"{Printed.Fixed(margin / 1000, 0)} ± {Printed.Fixed(row.ExpandedUncertainty!.Value / 1000, 0)} kJ/mol O2" : "not known";

    internal static string RatioName(RankedReductant row) => row.Reductant.Id == "H2" ? "H2/H2O" : "CO/CO2";

    internal static string Percent(double share) => (share * 100).ToString("G2", System.Globalization.CultureInfo.InvariantCulture) + " %";

    /// <summary>A water vapour pressure as a frost point over ice, or a dew point over liquid from 0.01 C up.</summary>
    /// <param name="logPressure">ln(pH2O/bar).</param>
    /// <returns>A phrase.</returns>
    public static string WaterWords(double logPressure)
    {
        if (WaterVapour.DewPointOverLiquid(logPressure) is { } dew && dew >= WaterVapour.TriplePointKelvin)
        {
            return $"dew point {Signed(dew)} C";
        }

        return WaterVapour.FrostPointOverIce(logPressure) is { } frost ? $"frost point {Signed(frost)} C" : "a frost point below any instrument";
    }

    internal static string Headline(string oxide, string metal, Temperature at, ImmutableArray<RankedReductant> rows)
    {
        string place = $"{oxide} at {at.ToString(TemperatureUnit.Celsius)}";
        int works = rows.Count(row => row.Job == JobVerdict.Works);
        RankedReductant best = rows[0];
        string count = rows.Length == 1 ? string.Empty : $" {works} of {rows.Length} reductants work.";
        return best.Job switch
        {
            JobVerdict.Works => $"{best.Reductant.Id} takes the oxygen off {place}: margin {MarginWords(best)}, {RangeWords(best.Crossovers!)}.{count}",
            JobVerdict.WorksIf => $"{place}: works if - {best.Reductant.Id}, margin {MarginWords(best)}: {best.Reason}.{count}",
            JobVerdict.DoesNotWork => $"{place}: no reductant asked for gives {metal}. Nearest is {best.Reductant.Id}, margin {MarginWords(best)}: {best.Reason}.{Helps(best)}",
            _ => $"{place}: not decidable. {best.Reductant.Id}: {best.Reason}.",
        };
    }

    internal static ImmutableArray<string> Assumptions(RankConditions conditions, OxideDescent descent, Temperature at)
    {
        List<string> all = [FormattableString.Invariant($"temperature {at.Kelvin:0.##} K ({at.Celsius:0.#} C); every partner at this temperature")];
        all.Add(conditions.Total is { } total
            ? $"total pressure {total}, shared by the gases of each reaction by stoichiometry"
            : "no total pressure given: CO + CO2 over graphite together at 1 bar, each other gas and metal vapour at 1 bar");
        if (conditions.Monoxide is { } monoxide)
        {
            all.Add($"CO over graphite held at {monoxide}");
        }

        all.Add(conditions.HydrogenRatioOfFrost is { } frost
            ? $"H2/H2O {Printed.Brief(frost)} from the frost point given; CO/CO2 {Printed.Brief(conditions.GasRatio)}"
            : $"H2 and CO judged at H2/H2O and CO/CO2 {Printed.Brief(conditions.GasRatio)}");
        all.Add(conditions.Activities.Describe());
        if (conditions.Nitrogen is { } nitrogen)
        {
            all.Add($"nitrogen at {nitrogen}");
        }

        all.Add($"ladder of the charge here: {string.Join(" | ", descent.Ladder.Rungs.Select(rung => rung.Name))}; judged by its hardest step");
        all.Add("uncertainties are expanded (k = 2); heat is positive where it must be supplied");
        all.Add("left out: kinetics, solution of reductant and product in the metal, slag. Equilibrium says that it can go, not how fast");
        return [.. all];
    }

    internal static ImmutableArray<string> Notes(OxidePath charge, OxideDescent descent, ImmutableArray<Reductant> reductants, ImmutableArray<string> overlay)
    {
        List<string> notes = [];
        if (!descent.OxideIsStable)
        {
            notes.Add($"{charge.Oxide.Id} is not stable at this temperature: it falls apart into its neighbours on the ladder, and is judged by their steps");
        }

        notes.AddRange(descent.Steps.Select(step => step.Gap).OfType<string>());
        if (reductants.Any(reductant => reductant.Metal == "Si" || reductant.Id == "SiC"))
        {
            notes.Add("silicides have no data: silicon taken up by the metal is not counted");
        }

        if (!overlay.IsEmpty)
        {
            notes.Add($"from your own folder: {string.Join(", ", overlay)}");
        }

        return [.. notes];
    }

    private static string Helps(RankedReductant row) => row.Help is { } help ? $" What would help: {help}." : string.Empty;

    private static string Celsius(double kelvin) => Printed.Fixed(kelvin - PhysicalConstants.ZeroCelsiusInKelvin, 0);

    private static string Signed(double kelvin)
    {
        double celsius = kelvin - PhysicalConstants.ZeroCelsiusInKelvin;
        return (celsius > 0 ? "+" : string.Empty) + Printed.Fixed(celsius, 0);
    }
}
