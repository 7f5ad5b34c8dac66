using RedoxFurnace.Atmospheres;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Benchmarks;

/// <summary>Gas equilibrium: the mean over gases of every kind, warm.</summary>
internal static class GasBenchmarks
{
    private const int Count = 2000;
    private const ulong Start = 20250;

    public static IEnumerable<BenchmarkRow> Run()
    {
        GasEquilibrium equilibrium = new(SubstanceDatabase.Bundled);
        (GasMixture Gas, Temperature At, Pressure Total)[] any = [.. Samples()];
        Temperature soak = Temperature.FromCelsius(860);
        GasMixture endothermic = GasMixture.Of((GasSpecies.CO, 0.2), (GasSpecies.H2, 0.4), (GasSpecies.H2O, 0.01), (GasSpecies.CO2, 0.005), (GasSpecies.CH4, 0.003), (GasSpecies.N2, 0.382));
        double bare = DataBenchmarks.BareSeconds();
        yield return new BenchmarkRow("gas equilibrium, mean of random gases", Mean(sample => equilibrium.AtEquilibrium(sample.Gas, sample.At, sample.Total)), "bare polynomial", bare, "mean under 20 us");
        yield return new BenchmarkRow("gas as analysed, mean of random gases", Mean(sample => equilibrium.AsAnalysed(sample.Gas, sample.At, sample.Total)), "bare polynomial", bare, "less than the equilibrium");
        yield return new BenchmarkRow("endothermic gas, both answers", Stopwatches.Median(() => equilibrium.Of(endothermic, soak, Pressure.Standard)), "bare polynomial", bare, "under 20 us");

        double Mean(Func<(GasMixture Gas, Temperature At, Pressure Total), GasState> ask)
        {
            double sum = 0;
            double seconds = Stopwatches.Median(() =>
            {
                foreach ((GasMixture, Temperature, Pressure) sample in any)
                {
                    sum += ask(sample).Moles;
                }
            }) / Count;
            GC.KeepAlive(sum);
            return seconds;
        }
    }

    /// <summary>Every gas absent, ordinary or a trace down to 1e-15, over the whole range of temperature and pressure; the same in every run.</summary>
    private static IEnumerable<(GasMixture Gas, Temperature At, Pressure Total)> Samples()
    {
        ulong state = Start;
        for (int i = 0; i < Count; i++)
        {
            double[] moles = [.. Enumerable.Range(0, GasMixture.SpeciesCount).Select(_ => Next() switch
            {
                < 0.5 => 0,
                < 0.67 => Math.Pow(10, -15 * Next()),
                _ => Next(),
            })];
            moles[(int)GasSpecies.N2] += moles.Sum() > 0 ? 0 : 1;
            yield return (GasMixture.OfAmounts(moles), Temperature.FromKelvin(300 + (2200 * Next())), Pressure.FromBar(Math.Pow(10, -9 + (11 * Next()))));
        }

        double Next()
        {
            // Knuth's 64-bit linear congruential generator (The Art of Computer Programming 2, 3.3.4; constants from memory).
            state = unchecked((6364136223846793005UL * state) + 1442695040888963407UL);
            return (state >> 11) * (1.0 / (1UL << 53));
        }
    }
}
