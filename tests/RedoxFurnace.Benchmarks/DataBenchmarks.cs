using RedoxFurnace.Quantities;
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
