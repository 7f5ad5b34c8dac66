using System.Collections.Immutable;
using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charts.Kinds;

/// <summary>The stability chart: oxygen potential per mole of O2 against temperature (Ellingham 1944), couples and reductants.</summary>
public static class StabilityChart
{
    private const double JoulesPerKilocalorie = 4184;
    private const int MostCrossings = 40;
    private const int MostNamesInTitle = 12;

    private static readonly ImmutableArray<(StabilityMarkKind Kind, MarkShape Shape, string Text)> Marks =
    [
        (StabilityMarkKind.MetalMelts, MarkShape.Up, "metal melts"),
        (StabilityMarkKind.MetalBoils, MarkShape.Down, "metal boils at 1 bar"),
        (StabilityMarkKind.OxideMelts, MarkShape.OpenUp, "oxide melts"),
        (StabilityMarkKind.MetalTransition, MarkShape.Disc, "metal changes its crystal form"),
        (StabilityMarkKind.OxideTransition, MarkShape.Ring, "oxide changes its crystal form"),
        (StabilityMarkKind.LadderChange, MarkShape.Cross, "an oxide joins or leaves: the couple begins or ends"),
        (StabilityMarkKind.DataEnd, MarkShape.Bar, "the data end"),
    ];

    /// <summary>The plan of a stability chart.</summary>
    /// <param name="result">The lines.</param>
    /// <param name="options">Choices.</param>
    /// <param name="database">For the gas reactions of the side scales.</param>
    /// <returns>The plan.</returns>
    /// <exception cref="RequestException">Nothing to highlight under that name, or an unknown scale.</exception>
    public static ChartPlan Plan(StabilityResult result, StabilityChartOptions options, SubstanceDatabase database)
    {
        double perJoule = options.Kilocalories ? 1 / JoulesPerKilocalorie : 1e-3;
        StabilityRequest request = result.Request;
        bool scales = !options.Scales.IsEmpty || options.Frost is not null;
        double low = scales ? 0 : request.Low.Kelvin;
        double high = request.High.Kelvin;
        (double bottom, double top) = Extent(result, perJoule, scales);
        GasReactions gases = new(database);
        ImmutableArray<SeriesPlan> series = Series(result, options, perJoule);
        StabilityMarkKind[] used = [.. result.Lines.SelectMany(line => line.Marks).Select(mark => mark.Kind).Distinct()];
        ImmutableArray<StabilityCrossing> crossings = options.Crossovers ? [.. result.Crossings.Take(MostCrossings)] : [];
        string unit = options.Kilocalories ? "kcal" : "kJ";
        bool pure = request.Activities.AreAllOne;
        return new ChartPlan
        {
            Title = RichText.OfChemistry(options.Title ?? Title(request)),
            Description = Describe(result, options),
            X = TemperatureAxis.Of(options.Unit, low, high),
            Top = TemperatureAxis.Beside(options.Unit, low, high),
            Y = AxisPlan.Round(RichText.Of(pure ? $"Δ_{{f}}G° = RT ln p(O_{{2}}), {unit} per mol O_{{2}}" : $"RT ln p(O_{{2}}) at the activities given, {unit} per mol O_{{2}}"), bottom, top),
            Series = series,
            Windows = [.. TemperatureAxis.Window(options)],
            Rulers = [.. options.Scales.Select(name => SideScales.Of(name, gases, request.Low.Kelvin, high, perJoule)), .. options.Frost is { } frost ? [SideScales.Frost(frost.HydrogenShare, frost.Total, gases, request.Low.Kelvin, high, perJoule)] : Array.Empty<RulerPlan>()],
            Crossings = [.. crossings.Select(crossing => new PlanCrossing(new DataPoint(crossing.Kelvin, crossing.OxygenPotential * perJoule), Listed(crossing, options.Unit)))],
            Key = [.. Marks.Where(mark => used.Contains(mark.Kind)).Select(mark => new KeyEntry(mark.Shape, mark.Text))],
            Frame = Frame(result, options),
            Page = options.Page,
            ValueNames = ("temperature_K", options.Kilocalories ? "kcal_per_mol_O2" : "kJ_per_mol_O2"),
            Information = options.Document.Information(),
        };
    }

    private static string Title(StabilityRequest request)
        => (request.Of.Length > MostNamesInTitle ? FormattableString.Invariant($"Stability of oxides of {request.Of.Length} metals") : "Stability of oxides: " + string.Join(", ", request.Of)) + (request.With.IsEmpty ? "" : " with " + string.Join(", ", request.With));

    private static (double Bottom, double Top) Extent(StabilityResult result, double perJoule, bool toZero)
    {
        double[] values = [.. result.Lines.SelectMany(line => line.Points).Select(point => point.OxygenPotential * perJoule)];
        (double low, double high) = (values.Min(), values.Max());
        double step = (high - low) > 400 * 1000 * perJoule ? 100_000 * perJoule : (high - low) > 80_000 * perJoule ? 20_000 * perJoule : 5_000 * perJoule;
        return (Math.Floor((low / step) - 0.02) * step, toZero ? Math.Max(0, Math.Ceiling((high / step) + 0.02) * step) : Math.Ceiling((high / step) + 0.02) * step);
    }

    private static ImmutableArray<SeriesPlan> Series(StabilityResult result, StabilityChartOptions options, double perJoule)
    {
        string[] elements = [.. result.Lines.Where(line => !line.IsReductant).Select(line => line.Element).Distinct()];
        Dictionary<string, int> seen = [];
        int reductants = 0;
        if (options.Highlight is { } wanted && !result.Lines.Any(line => IsLifted(line, wanted)))
        {
            throw new RequestException($"--highlight '{wanted}' is no line of this chart; its lines are {string.Join(", ", result.Lines.Select(line => line.Id).Distinct())}");
        }

        ImmutableArray<SeriesPlan>.Builder series = ImmutableArray.CreateBuilder<SeriesPlan>();
        foreach (StabilityLine line in result.Lines)
        {
            bool lifted = options.Highlight is { } name && IsLifted(line, name);
            Stroke stroke;
            MarkShape? symbol = null;
            if (line.IsReductant)
            {
                int index = reductants++;
                stroke = new Stroke(ChartInks.Reductants[index % ChartInks.Reductants.Length], lifted ? 0.8 : 0.55, ChartInks.Dashes[index / ChartInks.Reductants.Length % ChartInks.Dashes.Length]);
                symbol = ChartInks.Symbols[index % ChartInks.Symbols.Length];
            }
            else
            {
                int colour = Array.IndexOf(elements, line.Element);
                int within = seen[line.Element] = seen.GetValueOrDefault(line.Element, -1) + 1;
                stroke = new Stroke(ChartInks.Couples[colour % ChartInks.Couples.Length], lifted ? 0.75 : 0.32, ChartInks.Dashes[(within + (colour / ChartInks.Couples.Length)) % ChartInks.Dashes.Length]);
            }

            series.Add(new SeriesPlan
            {
                Name = line.Id,
                Label = RichText.OfChemistry(line.Label),
                Points = [.. line.Points.Select(point => new DataPoint(point.Kelvin, point.OxygenPotential * perJoule))],
                Stroke = stroke,
                Symbol = symbol,
                Band = options.Bands ? [.. line.Points.Select(point => ((point.OxygenPotential - point.ExpandedUncertainty) * perJoule, (point.OxygenPotential + point.ExpandedUncertainty) * perJoule))] : [],
                Marks = [.. line.Marks.Select(mark => new PlanMark(new DataPoint(mark.Kelvin, mark.OxygenPotential * perJoule), Marks.First(known => known.Kind == mark.Kind).Shape))],
                Uncertainty = [.. line.Points.Select(point => point.ExpandedUncertainty * perJoule)],
            });
        }

        return series.ToImmutable();
    }

    /// <summary>Whether a name means a line: its own, its metal's, or one side of the couple.</summary>
    internal static bool IsLifted(StabilityLine line, string name) => line.Id == name || line.Element == name || line.Id.Split('/').Contains(name);

    private static RichText Listed(StabilityCrossing crossing, TemperatureUnit unit)
        => RichText.OfChemistry($"{crossing.Couple} and {crossing.Reductant}: {TemperatureAxis.Text(crossing.Kelvin, unit)}, reduces {(crossing.ReducesAbove ? "above" : "below")}");

    private static string Describe(StabilityResult result, StabilityChartOptions options)
    {
        string crossings = result.Crossings.IsEmpty
            ? ""
            : " Crossovers: " + string.Join("; ", result.Crossings.Select(crossing => $"{crossing.Couple} and {crossing.Reductant} at {TemperatureAxis.Text(crossing.Kelvin, options.Unit)}")) + ".";
        return $"Oxygen potential against temperature from {TemperatureAxis.Text(result.Request.Low.Kelvin, options.Unit)} to {TemperatureAxis.Text(result.Request.High.Kelvin, options.Unit)}. "
            + $"Lower lines hold oxygen more firmly. Lines: {string.Join(", ", result.Lines.Select(line => line.Id).Distinct())}.{crossings}";
    }

    private static FramePlan Frame(StabilityResult result, StabilityChartOptions options)
    {
        StabilityRequest request = result.Request;
        IEnumerable<string> caption =
        [
            $"Basis: per mole of O2, standard pressure 1 bar, metal vapour at 1 bar, {request.Activities.Describe()}; {(request.Direct ? "metal to one oxide" : "couples of the oxide ladder")}. Uncertainty: expanded, k = 2"
                + (options.Bands ? ", shown as bands." : $", {Range(result)} kJ per mol O2 for the lines drawn."),
            .. TemperatureAxis.WindowWords(options),
            "Equilibrium of pure phases, not rate: a line below another can take its oxygen, it need not do so soon.",
            .. result.Notes.Select(note => "Note: " + note + "."),
            "Sources: " + string.Join("; ", result.Sources) + ".",
            .. options.Frame == FrameKind.Document ? Array.Empty<string>() : [$"Database {result.DatabaseHash[..Math.Min(12, result.DatabaseHash.Length)]}, RedoxFurnace {options.Version}."],
        ];
        return new FramePlan(options.Frame, [.. caption], options.Safety, options.Document.Fields(result.DatabaseHash, options.Version));
    }

    private static string Range(StabilityResult result)
    {
        double[] all = [.. result.Lines.SelectMany(line => line.Points).Select(point => point.ExpandedUncertainty / 1000)];
        return $"{Printed.Fixed(all.Min(), 1)} to {Printed.Fixed(all.Max(), 1)}";
    }
}
