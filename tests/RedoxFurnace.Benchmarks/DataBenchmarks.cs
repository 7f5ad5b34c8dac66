using System.Collections.Immutable;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Benchmarks;

/// <summary>G(T) of a substance against the bare polynomial.</summary>
internal static class DataBenchmarks
{
    private const int Points = 1000;

    public static IEnumerable<BenchmarkRow> Run()
    {
        Substance nickel = SubstanceDatabase.Bundled.Get("NiO");
        double low = nickel.LowestKelvin;
        double step = (nickel.HighestKelvin - low) / Points;
        double sum = 0;
        double ours = Stopwatches.Median(() =>
        {
            for (int i = 0; i < Points; i++)
            {
                nickel.TryGibbs(low + (i * step), out double gibbs);
                sum += gibbs;
            }
        }) / Points;
        double bare = BareSeconds();
        GC.KeepAlive(sum);
        yield return new BenchmarkRow("G(T) of a substance of several phases", ours, "bare nine-coefficient polynomial", bare, "at most 3 times");
    }

    /// <summary>Every simple oxide against every listed reductant at 100 temperatures, against as many bare evaluations as there are margins.</summary>
    public static IEnumerable<BenchmarkRow> Ranking()
    {
        SubstanceDatabase database = SubstanceDatabase.Bundled;
        ImmutableArray<string> oxides = [.. database.All
            .Where(substance => !substance.IsGas && substance.Formula.Atoms.Count == 2 && substance.Formula.Of("O") > 0)
            .Where(oxide => oxide.Formula.Atoms.Keys.All(element => element is not ("H" or "C" or "N")) && database.Metal(oxide.Formula.Atoms.Keys.First(element => element != "O")) is not null)
            .Select(oxide => oxide.Id)];
        ImmutableArray<string> reductants = [.. ReductantCatalogue.Of(database).Listed.Select(reductant => reductant.Id)];
        ImmutableArray<Temperature> at = [.. Enumerable.Range(0, 100).Select(i => Temperature.FromKelvin(500 + (15 * i)))];
        double seconds = Stopwatches.Median(() => MarginTable.Of(oxides, reductants, at, new RankConditions(), database));
        long margins = (long)oxides.Length * reductants.Length * at.Length;
        yield return new BenchmarkRow($"margins of {oxides.Length} oxides against {reductants.Length} reductants at {at.Length} temperatures", seconds, $"{margins} bare polynomial evaluations", margins * BareSeconds(), "at most 10 times");
        RankRequest request = new("Cr2O3", null, Temperature.FromCelsius(1400), [], new RankConditions(), default);
        yield return new BenchmarkRow("whole ranking of Cr2O3, crossovers, masses and side products too", Stopwatches.Median(() => ReductantRanking.Rank(request, database)), "", null, "");
    }

    /// <summary>Time of one bare evaluation of a nine-coefficient polynomial.</summary>
    public static double BareSeconds()
    {
        double[] a = [805108.405, -13398.42819, 82.7350729, -0.2075857041, 0.0002008764131, 1e-9, 1e-13, 61823.5795, -455.997166];
        double sum = 0;
        double seconds = Stopwatches.Median(() =>
        {
            for (int i = 0; i < Points; i++)
            {
                sum += Bare(300 + i, a);
            }
        }) / Points;
        GC.KeepAlive(sum);
        return seconds;
    }

    private static double Bare(double t, double[] a)
    {
        double log = Math.Log(t);
        double enthalpy = (-a[0] / (t * t)) + (a[1] * log / t) + a[2] + (a[3] * t / 2) + (a[4] * t * t / 3) + (a[5] * t * t * t / 4) + (a[6] * t * t * t * t / 5) + (a[7] / t);
        double entropy = (-a[0] / (2 * t * t)) - (a[1] / t) + (a[2] * log) + (a[3] * t) + (a[4] * t * t / 2) + (a[5] * t * t * t / 3) + (a[6] * t * t * t * t / 4) + a[8];
        return PhysicalConstants.GasConstant * t * (enthalpy - entropy);
    }
}
