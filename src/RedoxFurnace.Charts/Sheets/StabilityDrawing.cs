using System.Collections.Immutable;
using RedoxFurnace.Charts.Kinds;
using RedoxFurnace.Charts.Layout;
using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charts.Sheets;

/// <summary>Settings to stability chart.</summary>
internal static class StabilityDrawing
{
    private static readonly (Temperature Low, Temperature High) UsualRange = (Temperature.FromCelsius(25), Temperature.FromCelsius(1800));

    public static DrawnChart Draw(ChartSettings settings, SubstanceDatabase database, string version)
    {
        StabilityRequest request = Request(settings, database, UsualRange);
        StabilityResult result = StabilityLines.Of(request, database);
        ImmutableArray<HazardNote> hazards = Hazards(result, database);
        StabilityChartOptions options = ChartDrawing.Common(
            new StabilityChartOptions
            {
                Kilocalories = settings.Word("energy", "kJ", "kcal") == "kcal",
                Bands = settings.Truth("bands"),
                Highlight = settings.Text("highlight"),
                Crossovers = settings.Truth("crossovers", absent: true),
                Scales = [.. settings.List("scales")],
                Frost = settings.Read<(double, Pressure)?>("frost", (text, what) => (Share.Parse(text, what), settings.Read("pressure", Pressure.Parse, Pressure.Standard)), null),
            },
            settings,
            hazards,
            version);
        (ImmutableArray<Charts.Scenes.Scene> scenes, string? split) = Pages(result, options, database);
        return new DrawnChart(
            scenes,
            Headline(result),
            [.. result.Notes, .. split is null ? Array.Empty<string>() : [split]],
            hazards,
            result.Sources);
    }

    /// <summary>The lines asked for.</summary>
    internal static StabilityRequest Request(ChartSettings settings, SubstanceDatabase database, (Temperature Low, Temperature High) usual)
    {
        (Temperature low, Temperature high) = settings.Read("range", ChartDrawing.Range, usual);
        string[] of = settings.Read<string[]>("of", (text, _) => [.. Names(text).Select(name => Known(name, database))], []);
        string[] with = settings.Read<string[]>("with", (text, _) => [.. Names(text).Select(name => ReductantCatalogue.Of(database).Get(name).Id)], []);
        return new StabilityRequest([.. of], [.. with], low, high)
        {
            Direct = settings.Truth("direct"),
            Monoxide = settings.Read<ImmutableArray<Pressure>>("pco", (text, what) => [.. PressureSeries.Parse(text, what).Points], []),
            GasRatios = ChartDrawing.Ratios(settings),
            Activities = ChartDrawing.ReadActivities(settings, database),
        };
    }

    /// <summary>What the lines drawn call for.</summary>
    internal static ImmutableArray<HazardNote> Hazards(StabilityResult result, SubstanceDatabase database) => ChartDrawing.Hazards(database, new HazardWork
    {
        Charge = [.. result.Lines.Where(line => !line.IsReductant).SelectMany(line => line.Substances.Where(substance => substance.Formula.Of("O") > 0 && substance.Formula.Atoms.Count > 1)).Select(substance => substance.Id).Distinct()],
        Reductants = result.Request.With,
        LowestKelvin = result.Request.Low.Kelvin,
        HighestKelvin = result.Request.High.Kelvin,
    });

    private static string[] Names(string text) => text.Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries);

    private static string Known(string name, SubstanceDatabase database) => AtomicWeights.Has(name) ? name : database.Get(name).Id;

    /// <summary>More lines than a page can label are spread over several pages, reductants on each.</summary>
    private static (ImmutableArray<Charts.Scenes.Scene> Scenes, string? Note) Pages(StabilityResult result, StabilityChartOptions options, SubstanceDatabase database)
    {
        ChartPlan whole = StabilityChart.Plan(result, options, database);
        int fit = ChartLayout.LinesThatFit(whole);
        if (result.Lines.Length <= fit)
        {
            return ([ChartLayout.Lay(whole)], null);
        }

        ImmutableArray<StabilityLine> reductants = [.. result.Lines.Where(line => line.IsReductant)];
        int couples = result.Lines.Length - reductants.Length;
        for (int pages = 2; pages <= couples; pages++)
        {
            ChartPlan[] plans = [.. Parts(result, reductants, pages, database).Select((part, i) => Part(part, whole.Title.Plain, i + 1, pages, options, database))];
            if (plans.All(plan => plan.Series.Length <= ChartLayout.LinesThatFit(plan)))
            {
                return (
                    [.. plans.Select(ChartLayout.Lay)],
                    FormattableString.Invariant($"{result.Lines.Length} lines are more than one page of this size can label ({fit}): spread over {pages} pages; a larger --size or fewer names keep them together"));
            }
        }

        // No way of spreading them helps: the layout says what is missing, or crowds a single couple with its reductants.
        return ([ChartLayout.Lay(whole)], null);
    }

    /// <summary>Couples shared out evenly, every reductant on each page, and of the sources those of the page.</summary>
    private static IEnumerable<StabilityResult> Parts(StabilityResult result, ImmutableArray<StabilityLine> reductants, int pages, SubstanceDatabase database)
    {
        StabilityLine[] couples = [.. result.Lines.Where(line => !line.IsReductant)];
        for (int page = 0; page < pages; page++)
        {
            ImmutableArray<StabilityLine> own = [.. couples[(page * couples.Length / pages)..((page + 1) * couples.Length / pages)]];
            HashSet<string> ids = [.. own.Select(line => line.Id)];
            ImmutableArray<StabilityLine> lines = [.. own, .. reductants];
            yield return result with { Lines = lines, Crossings = [.. result.Crossings.Where(crossing => ids.Contains(crossing.Couple))], Sources = StabilityLines.SourcesOf(lines, database) };
        }
    }

    private static ChartPlan Part(StabilityResult part, string title, int page, int pages, StabilityChartOptions options, SubstanceDatabase database)
        => StabilityChart.Plan(
            part,
            options with
            {
                Title = FormattableString.Invariant($"{title} (part {page} of {pages})"),
                Highlight = part.Lines.Any(line => options.Highlight is { } name && StabilityChart.IsLifted(line, name)) ? options.Highlight : null,
            },
            database);

    private static string Headline(StabilityResult result)
    {
        string lines = FormattableString.Invariant($"{result.Lines.Length} lines from {ChartDrawing.Celsius(result.Request.Low.Kelvin)} to {ChartDrawing.Celsius(result.Request.High.Kelvin)}");
        return result.Crossings.IsEmpty
            ? lines + (result.Lines.Any(line => line.IsReductant) ? "; no reductant's line meets a couple's in this range" : "")
            : $"{lines}; crossovers: " + string.Join("; ", result.Crossings.Take(6).Select(crossing => $"{crossing.Reductant} reduces {crossing.Couple} {(crossing.ReducesAbove ? "above" : "below")} {ChartDrawing.Celsius(crossing.Kelvin)}"))
                + (result.Crossings.Length > 6 ? FormattableString.Invariant($" and {result.Crossings.Length - 6} more") : "");
    }
}
