using System.Collections.Immutable;
using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;

namespace RedoxFurnace.Charts.Kinds;

/// <summary>Margins of a ranking as bars with their uncertainty: right of zero the reductant takes the oxygen.</summary>
public static class MarginChart
{
    private const double HalfBar = 0.27;
    private const double HalfCap = 0.14;

    private static readonly Ink Reduces = Ink.Of("#44AA99");
    private static readonly Ink Refuses = Ink.Of("#BBBBBB");
    private static readonly Ink Undecided = Ink.Of("#DDCC77");

    /// <summary>The plan.</summary>
    /// <param name="result">A ranking.</param>
    /// <param name="options">Choices.</param>
    /// <param name="databaseHash">SHA-256 of the database.</param>
    /// <returns>The plan.</returns>
    /// <exception cref="NoAnswerException">No reductant has a margin.</exception>
    public static ChartPlan Plan(RankResult result, ChartOptions options, string databaseHash)
    {
        RankedReductant[] rows = [.. result.Rows.Where(row => row.Margin is not null).OrderByDescending(row => row.Margin)];
        if (rows.Length == 0)
        {
            throw new NoAnswerException($"no reductant has a margin against {result.Oxide} at {result.At}; choose another temperature");
        }

        (double left, double right) = Extent(rows);
        return new ChartPlan
        {
            Title = RichText.OfChemistry(options.Title ?? $"Which reductant takes the oxygen off {result.Oxide} at {TemperatureAxis.Text(result.At.Kelvin, options.Unit)}"),
            Description = $"Margins in kJ per mole of O2 against {result.Oxide} at {TemperatureAxis.Text(result.At.Kelvin, options.Unit)}, expanded uncertainty k = 2: "
                + string.Join("; ", rows.Select(row => $"{row.Reductant.Id} {Printed.Fixed(row.Margin!.Value / 1000, 1)} ± {Printed.Fixed(row.ExpandedUncertainty!.Value / 1000, 1)}, {Word(row)}")) + ".",
            X = AxisPlan.Round(RichText.Of("margin, kJ per mol O_{2} (positive: reduces)"), left, right, about: 9),
            Y = new AxisPlan(RichText.Of("reductant"), 0.4 - rows.Length, 0.6, [.. rows.Select((row, i) => new AxisTick(-i, Named(row.Reductant)))]) { IsNames = true },
            Fields = [.. rows.Select((row, i) => Bar(row, i))],
            Series = [Zero(rows.Length), .. rows.Select((row, i) => Whisker(row, i))],
            Frame = new FramePlan(options.Frame, Caption(result, options, databaseHash), options.Safety, options.Document.Fields(databaseHash, options.Version)),
            Page = options.Page,
            ValueNames = ("margin_kJ_per_mol_O2", "place"),
            Information = options.Document.Information(),
        };
    }

    /// <summary>Room for a word beside the longest bar on either side.</summary>
    private static (double Left, double Right) Extent(RankedReductant[] rows)
    {
        double least = Math.Min(0, rows.Min(row => (row.Margin!.Value - row.ExpandedUncertainty!.Value) / 1000));
        double most = Math.Max(0, rows.Max(row => (row.Margin!.Value + row.ExpandedUncertainty!.Value) / 1000));
        double span = Math.Max(most - least, 20);
        double step = span > 400 ? 50 : span > 100 ? 20 : 5;
        return (Math.Floor(((least - (least < 0 ? 0.02 * span : 0)) / step) - 1e-9) * step, Math.Ceiling(((most + (0.3 * span)) / step) + 1e-9) * step);
    }

    private static FieldPlan Bar(RankedReductant row, int place)
    {
        double margin = row.Margin!.Value / 1000;
        Ink fill = row.Verdict switch { Verdict.Reduces => Reduces, Verdict.Borderline => Undecided, _ => Refuses };
        return new FieldPlan(
            "bar of " + row.Reductant.Id,
            RichText.Of(""),
            [new(Math.Min(0, margin), -place - HalfBar), new(Math.Max(0, margin), -place - HalfBar), new(Math.Max(0, margin), -place + HalfBar), new(Math.Min(0, margin), -place + HalfBar)],
            fill,
            new DataPoint(margin, -place));
    }

    private static SeriesPlan Zero(int rows) => new()
    {
        Name = "zero",
        Label = RichText.Of(""),
        Points = [new(0, 0.6), new(0, 0.4 - rows)],
        Stroke = new Stroke(Ink.Black, 0.25),
    };

    /// <summary>The uncertainty as a line with caps through the end of the bar, the verdict in words at its right.</summary>
    private static SeriesPlan Whisker(RankedReductant row, int place)
    {
        double margin = row.Margin!.Value / 1000;
        double expanded = row.ExpandedUncertainty!.Value / 1000;
        double step = expanded < 9.95 ? 0.1 : 1;
        (double low, double high) = (margin - expanded, margin + expanded);
        return new SeriesPlan
        {
            Name = row.Reductant.Id,
            Label = RichText.Of($"{RoundTicks.Number(margin, step)} ± {RoundTicks.Number(expanded, step)}  {Word(row)}"),
            Points =
            [
                new(low, -place - HalfCap), new(low, -place + HalfCap), new(low, -place), new(high, -place), new(high, -place + HalfCap), new(high, -place - HalfCap), new(high, -place),
            ],
            Stroke = new Stroke(Ink.Black, 0.25),
            LabelStart = new DataPoint(Math.Max(high, 0), -place),
        };
    }

    /// <summary>Formulas with lowered figures; a grade such as FeSi75 is a name, not a formula.</summary>
    private static string Named(Reductant reductant)
        => reductant.Kind == ReductantKind.Metal
            ? reductant.Id
            : string.Concat(RichText.OfChemistry(reductant.Id).Runs.Select(run => run.Level < 0 ? $"_{{{run.Text}}}" : run.Text));

    private static string Word(RankedReductant row) => RankWords.Of(row.Verdict).Replace('-', ' ');

    private static ImmutableArray<string> Caption(RankResult result, ChartOptions options, string databaseHash) =>
    [
        $"Margin: oxygen potential of the hardest step ({result.Hardest.Reaction}) less that of the reductant, kJ per mole of O2. Whiskers: expanded uncertainty, k = 2; borderline where the margin is smaller.",
        "Assumed: " + string.Join("; ", result.Assumptions) + ".",
        .. result.Rows.Where(row => row.Margin is null).Select(row => row.Reductant.Id).ToArray() is { Length: > 0 } missing ? [$"No data: {string.Join(", ", missing)}."] : Array.Empty<string>(),
        "Sources: " + string.Join("; ", result.Sources) + ".",
        .. options.Frame == FrameKind.Document ? Array.Empty<string>() : [$"Database {databaseHash[..Math.Min(12, databaseHash.Length)]}, RedoxFurnace {options.Version}."],
    ];
}
