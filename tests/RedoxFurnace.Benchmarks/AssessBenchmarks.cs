using RedoxFurnace.Assessments;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Benchmarks;

/// <summary>The uncertainty of a couple with the full covariance against independent errors, and the whole adjustment against reading its measurements.</summary>
internal static class AssessBenchmarks
{
    private const int Calls = 1000;

    public static IEnumerable<BenchmarkRow> Run()
    {
        SubstanceDatabase database = SubstanceDatabase.Bundled;
        Reaction couple = Reaction.Of([(database.Get("Fe3O4"), -4), (database.Get("O2"), -1), (database.Get("Fe2O3"), 6)]);
        yield return new BenchmarkRow(
            "uncertainty of a couple, full covariance", Seconds(couple, database.Covariance), "the same, independent errors", Seconds(couple, null), "");

        MeasurementTable table = MeasurementTable.Of(database);
        yield return new BenchmarkRow(
            "adjustment of the oxides",
            Stopwatches.Median(() => GC.KeepAlive(OxideAssessment.Of(table, database))),
            "reading measurements.yaml",
            Stopwatches.Median(() => GC.KeepAlive(MeasurementTable.Of(database))),
            "");
    }

    private static double Seconds(Reaction couple, EnthalpyCovariance? covariance)
    {
        double sum = 0;
        double seconds = Stopwatches.Median(() =>
        {
            for (int i = 0; i < Calls; i++)
            {
                sum += ReactionUncertainty.OfGibbs(couple, 1000 + (i * 0.1), covariance);
            }
        }) / Calls;
        GC.KeepAlive(sum);
        return seconds;
    }
}
