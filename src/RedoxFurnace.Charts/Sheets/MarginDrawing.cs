using System.Collections.Immutable;
using RedoxFurnace.Charts.Kinds;
using RedoxFurnace.Charts.Layout;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charts.Sheets;

/// <summary>Settings to margin bars: one page for each metal of the oxide.</summary>
internal static class MarginDrawing
{
    public static DrawnChart Draw(ChartSettings settings, SubstanceDatabase database, string version)
    {
        string[] of = settings.List("of");
        if (of.Length != 1)
        {
            throw new RequestException("the margins chart takes one oxide; write --of Cr2O3 (or of: Cr2O3)");
        }

        Temperature at = settings.Text("at") is null
            ? throw new RequestException("the margins chart needs a temperature; write --at 1400C (or at: 1400C)")
            : settings.Read("at", Temperature.Parse, default);
        double[] ratios = [.. ChartDrawing.Ratios(settings)];
        RankConditions conditions = new()
        {
            Total = settings.Read<Pressure?>("pressure", (text, what) => Pressure.Parse(text, what), null),
            Monoxide = settings.Read<Pressure?>("pco", (text, what) => Pressure.Parse(text, what), null),
            GasRatio = ratios.Length == 1 ? ratios[0] : throw new RequestException("the margins chart takes one gas-ratio"),
            Activities = ChartDrawing.ReadActivities(settings, database),
        };
        ImmutableArray<RankResult> results = settings.Read("of", (text, _) => ReductantRanking.Rank(new RankRequest(text, null, at, [.. settings.List("with")], conditions, RankOrder.Margin), database), []);
        ImmutableArray<HazardNote> hazards = ChartDrawing.Hazards(database, new HazardWork
        {
            Charge = [results[0].Oxide],
            Reductants = [.. results[0].Rows.Where(row => row.Verdict is Verdict.Reduces or Verdict.Borderline).Select(row => row.Reductant.Id)],
            Products = [.. results.Select(result => result.Metal)],
            LowestKelvin = at.Kelvin,
            HighestKelvin = at.Kelvin,
        });
        ChartOptions options = ChartDrawing.Common(new ChartOptions(), settings, hazards, version);
        return new DrawnChart(
            [.. results.Select(result => ChartLayout.Lay(MarginChart.Plan(result, options, database.Hash)))],
            string.Join(" ", results.Select(result => result.Headline)).TrimEnd('.'),
            [.. results.SelectMany(result => result.Notes).Distinct()],
            hazards,
            [.. results.SelectMany(result => result.Sources).Distinct()]);
    }
}
