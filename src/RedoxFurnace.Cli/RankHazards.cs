using System.Collections.Immutable;
using RedoxFurnace.Reductants;
using RedoxFurnace.Safety;

namespace RedoxFurnace.Cli;

/// <summary>The safety notes a ranking calls for: those of the charge and of every reductant that would be used.</summary>
internal static class RankHazards
{
    private const double Vacuum = 0.1;

    public static IReadOnlyList<HazardNote> For(ImmutableArray<RankResult> results, SafetyRules rules)
    {
        bool named = results.SelectMany(result => result.Rows).Select(row => row.Reductant.Id).Distinct().Count() <= 4;
        HashSet<string> seen = [];
        List<HazardNote> notes = [];
        foreach (RankResult result in results)
        {
            RankedReductant[] used = [.. result.Rows.Where(row => named || row.Verdict is Verdict.Reduces or Verdict.Borderline)];
            HazardWork work = new()
            {
                Charge = [result.Oxide],
                Reductants = [.. used.Select(row => row.Reductant.Id)],
                Products = [result.Metal, .. used.SelectMany(row => row.SideProducts.Select(product => product.Formula)), .. used.Select(row => row.FurthestProduct).OfType<string>()],
                LowestKelvin = result.At.Kelvin,
                HighestKelvin = result.At.Kelvin,
                Vacuum = result.Conditions.Total is { } total && total.Bar < Vacuum,
            };
            notes.AddRange(rules.For(HazardContextBuilder.Build(work)).Where(note => seen.Add(note.Id)));
        }

        return [.. notes.OrderBy(note => note.Severity).ThenBy(note => note.Id, StringComparer.Ordinal)];
    }
}
