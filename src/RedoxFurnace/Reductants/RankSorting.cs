using System.Collections.Immutable;

namespace RedoxFurnace.Reductants;

/// <summary>The order of the rows: jobs that work before those that do not, then the criterion asked for. CO that soots stays below graphite.</summary>
internal static class RankSorting
{
    public static ImmutableArray<RankedReductant> Sort(ImmutableArray<RankedReductant> rows, RankOrder order)
    {
        List<RankedReductant> sorted = [.. rows.OrderBy(Group).ThenBy(row => Key(row, order)).ThenBy(row => -(row.Margin ?? double.NegativeInfinity))];
        int monoxide = sorted.FindIndex(row => row.Reductant.Id == "CO" && row.CarbonActivity > 1);
        int graphite = sorted.FindIndex(row => row.Reductant.Kind == ReductantKind.Graphite);
        if (monoxide >= 0 && graphite > monoxide)
        {
            RankedReductant soots = sorted[monoxide];
            sorted.RemoveAt(monoxide);
            sorted.Insert(graphite, soots);
        }

        return [.. sorted];
    }

    private static int Group(RankedReductant row) => row.Verdict == Verdict.NoData ? 9 : ((int)row.Job * 3) + (int)row.Verdict;

    private static double Key(RankedReductant row, RankOrder order) => order switch
    {
        RankOrder.Crossover => row.Crossovers is { Bands.Length: > 0 } crossovers ? crossovers.Bands[0].Low : double.PositiveInfinity,
        RankOrder.Mass => row.KgPerKgOxide ?? double.PositiveInfinity,
        RankOrder.Heat => row.HeatJoulesPerKgOxide ?? double.PositiveInfinity,
        _ => -(row.Margin ?? double.NegativeInfinity),
    };
}
