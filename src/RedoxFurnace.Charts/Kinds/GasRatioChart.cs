using System.Collections.Immutable;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Charts.Kinds;

/// <summary>Which solid of a metal stands in which CO/CO2 or H2/H2O gas against temperature (Baur and Glaessner 1903 for iron), with the graphite line.</summary>
/// <remarks>THEORY.md, section 9, 'Gas-ratio diagram'.</remarks>
public static class GasRatioChart
{
    private const double BesideInvariant = 0.02;
    private const double HalfLabel = 0.05;
    private const double LeastClearance = 0.025;
    private const double EdgePercent = 1;
    private const int MostCrossings = 12;

    private static readonly ImmutableArray<double> SecondGasDashes = [2.4, 0.9];

    /// <summary>The plan.</summary>
    /// <param name="diagram">The boundaries.</param>
    /// <param name="activities">In words, for the caption.</param>
    /// <param name="options">Choices.</param>
    /// <param name="sources">Citations in full.</param>
    /// <param name="databaseHash">SHA-256 of the database.</param>
    /// <returns>The plan.</returns>
    public static ChartPlan Plan(GasRatioDiagram diagram, string activities, GasRatioOptions options, ImmutableArray<string> sources, string databaseHash)
    {
        bool both = options.Gases.Length > 1;
        ImmutableArray<GasRatioBoundary> first = Of(diagram, options.Gases[0]);
        string[] couples = [.. diagram.Monoxide.Select(line => line.Couple).Distinct()];
        ImmutableArray<SeriesPlan> series =
        [
            .. options.Gases.SelectMany((gas, i) => Of(diagram, gas).Select(line => Line(line, gas, Array.IndexOf(couples, line.Couple), i > 0, both, diagram, options))),
            .. options.Gases.Contains("CO") ? diagram.Graphite.Select((line, i) => Graphite(line, i, options)) : [],
        ];
        (double low, double high) = Extent(series, options);
        (double cold, double hot) = (first.SelectMany(line => line.Points).Min(point => point.Kelvin), first.SelectMany(line => line.Points).Max(point => point.Kelvin));
        ImmutableArray<PlanCrossing> crossings = options.Gases.Contains("CO") ? Crossings(diagram, options) : [];
        ImmutableArray<FieldPlan> fields = Fields(diagram, first, series, (cold, hot), (low, high), options);
        return new ChartPlan
        {
            Title = RichText.OfChemistry(options.Title ?? $"{diagram.Element} and its oxides in {string.Join(" and ", options.Gases.Select(Mixture))}"),
            Description = Describe(diagram, options, fields, crossings, cold, hot),
            X = TemperatureAxis.Of(options.Unit, cold, hot),
            Top = TemperatureAxis.Beside(options.Unit, cold, hot),
            Y = AxisPlan.Round(AxisLabel(options), low, high, about: 10),
            Series = series,
            Fields = fields,
            Windows = [.. TemperatureAxis.Window(options)],
            Crossings = crossings,
            Key = series.Any(line => !line.Marks.IsEmpty) ? [new KeyEntry(MarkShape.Cross, "a phase joins or leaves: the boundary begins or ends")] : [],
            Frame = new FramePlan(options.Frame, [.. Caption(diagram, activities, series, options, sources, databaseHash)], options.Safety, options.Document.Fields(databaseHash, options.Version)),
            Page = options.Page,
            ValueNames = ("temperature_K", options.Logarithmic ? "log10_ratio" : "share_percent"),
            Information = options.Document.Information(),
        };
    }

    private static ImmutableArray<GasRatioBoundary> Of(GasRatioDiagram diagram, string gas) => gas == "CO" ? diagram.Monoxide : diagram.Hydrogen;

    private static string Mixture(string gas) => gas == "CO" ? "CO + CO2" : "H2 + H2O";

    private static RichText AxisLabel(GasRatioOptions options) => RichText.Of(string.Join(" or ", options.Gases.Select(gas => (gas, options.Logarithmic) switch
    {
        ("CO", false) => "CO in CO + CO_{2}",
        ("CO", true) => "log_{10} p(CO)/p(CO_{2})",
        (_, false) => "H_{2} in H_{2} + H_{2}O",
        _ => "log_{10} p(H_{2})/p(H_{2}O)",
    })) + (options.Logarithmic ? "" : ", %"));

    private static bool IsAtEdge(double percent) => percent is < EdgePercent or > 100 - EdgePercent;

    private static double Height(double logRatio, bool logarithmic) => logarithmic ? logRatio / Math.Log(10) : 100 / (1 + Math.Exp(-logRatio));

    private static (double Low, double High) Extent(ImmutableArray<SeriesPlan> series, GasRatioOptions options)
    {
        if (!options.Logarithmic)
        {
            return (0, 100);
        }

        double[] all = [.. series.SelectMany(line => line.Points).Select(point => point.Y)];
        return (Math.Floor(all.Min() - 0.6), Math.Ceiling(all.Max() + 0.6));
    }

    private static SeriesPlan Line(GasRatioBoundary boundary, string gas, int colour, bool second, bool both, GasRatioDiagram diagram, GasRatioOptions options)
        => Series(
            both ? $"{boundary.Couple} in {Mixture(gas)}" : boundary.Couple,
            RichText.OfChemistry(!options.Logarithmic && boundary.Points.All(point => IsAtEdge(100 * point.Share)) ? "" : both ? $"{boundary.Couple}, {gas}" : boundary.Couple),
            boundary.Points,
            new Stroke(ChartInks.Couples[colour % ChartInks.Couples.Length], 0.42, second ? SecondGasDashes : []),
            options) with
        {
            Marks = [.. new[] { boundary.Points[0], boundary.Points[^1] }
                .Where(point => diagram.Invariants.Any(invariant => Math.Abs(invariant.Kelvin - point.Kelvin) < BesideInvariant))
                .Select(point => new PlanMark(new DataPoint(point.Kelvin, Height(point.NaturalLogRatio, options.Logarithmic)), MarkShape.Cross))],
        };

    private static SeriesPlan Graphite(GraphiteBoundary boundary, int index, GasRatioOptions options)
        => Series(
            $"graphite at {boundary.MonoxideAndDioxide}",
            RichText.Of($"graphite, {boundary.MonoxideAndDioxide}"),
            boundary.Points,
            new Stroke(ChartInks.Reductants[index % ChartInks.Reductants.Length], 0.5),
            options) with
        {
            Symbol = ChartInks.Symbols[index % ChartInks.Symbols.Length],
        };

    private static SeriesPlan Series(string name, RichText label, ImmutableArray<GasRatioPoint> points, Stroke stroke, GasRatioOptions options)
    {
        (double Low, double High)[] band = [.. points.Select(point => (Height(point.NaturalLogRatio - point.ExpandedUncertainty, options.Logarithmic), Height(point.NaturalLogRatio + point.ExpandedUncertainty, options.Logarithmic)))];
        return new SeriesPlan
        {
            Name = name,
            Label = label,
            Points = [.. points.Select(point => new DataPoint(point.Kelvin, Height(point.NaturalLogRatio, options.Logarithmic)))],
            Stroke = stroke,
            Band = options.Bands ? [.. band] : [],
            Uncertainty = [.. band.Select(edge => (edge.High - edge.Low) / 2)],
        };
    }

    /// <summary>
    /// Each run of temperatures at which a solid stands between two neighbouring boundaries, or between one and the edge. Open to the edge are
    /// the metal alone, and the highest oxide as long as no still higher one is missing for want of data.
    /// </summary>
    private static ImmutableArray<FieldPlan> Fields(GasRatioDiagram diagram, ImmutableArray<GasRatioBoundary> boundaries, ImmutableArray<SeriesPlan> series, (double Cold, double Hot) x, (double Low, double High) y, GasRatioOptions options)
    {
        Dictionary<string, List<(double Kelvin, double Lower, double Upper)>> running = [];
        List<(string Name, List<(double Kelvin, double Lower, double Upper)> Edge)> finished = [];
        foreach (IGrouping<double, (string Reduced, string Oxidised, double Height)> at in boundaries
            .SelectMany(line => line.Points.Select(point => (point.Kelvin, Names: line.Couple.Split('/'), Height: Height(point.NaturalLogRatio, options.Logarithmic))))
            .GroupBy(point => point.Kelvin, point => (point.Names[0], point.Names[^1], point.Height))
            .OrderBy(group => group.Key))
        {
            (string Reduced, string Oxidised, double Height)[] steps = [.. at.OrderByDescending(step => step.Height)];
            Dictionary<string, (double Lower, double Upper)> here = [];
            if (steps[0].Reduced == diagram.Element)
            {
                here[diagram.Element] = (steps[0].Height, y.High);
            }

            if (!DataEnds(diagram).Any(end => end.JoinsAbove ? at.Key < end.Kelvin : at.Key > end.Kelvin))
            {
                here[steps[^1].Oxidised] = (y.Low, steps[^1].Height);
            }

            foreach ((int i, (string _, string oxidised, double height)) in steps[..^1].Index())
            {
                if (oxidised == steps[i + 1].Reduced)
                {
                    here[oxidised] = (steps[i + 1].Height, height);
                }
            }

            foreach (string gone in running.Keys.Where(name => !here.ContainsKey(name)).ToArray())
            {
                finished.Add((gone, running[gone]));
                running.Remove(gone);
            }

            foreach ((string name, (double lower, double upper)) in here)
            {
                if (!running.TryGetValue(name, out List<(double, double, double)>? run))
                {
                    running[name] = run = [];
                }

                run.Add((at.Key, lower, upper));
            }
        }

        finished.AddRange(running.Select(run => (run.Key, run.Value)));
        string[] names = [.. finished.Select(field => field.Name).Distinct()];
        return
        [
            .. finished.Where(field => field.Edge.Count > 1).OrderBy(field => field.Edge[0].Kelvin).ThenBy(field => -field.Edge[0].Upper).Select(field =>
            {
                (DataPoint place, bool isFree) = Roomiest(field.Edge, series, x, y);
                return new FieldPlan(
                    "field of " + field.Name,
                    RichText.OfChemistry(isFree ? field.Name : ""),
                    [.. field.Edge.Select(edge => new DataPoint(edge.Kelvin, edge.Upper)), .. Enumerable.Reverse(field.Edge).Select(edge => new DataPoint(edge.Kelvin, edge.Lower))],
                    ChartInks.Couples[Array.IndexOf(names, field.Name) % ChartInks.Couples.Length].At(0.09),
                    place);
            }),
        ];
    }

    private static IEnumerable<LadderInvariant> DataEnds(GasRatioDiagram diagram) => diagram.Invariants.Where(invariant => invariant.Change == LadderChange.DataEnd && invariant.Phase != diagram.Element);

    /// <summary>Where in a field a name stands clearest of every line.</summary>
    private static (DataPoint Place, bool IsFree) Roomiest(List<(double Kelvin, double Lower, double Upper)> field, ImmutableArray<SeriesPlan> series, (double Cold, double Hot) x, (double Low, double High) y)
    {
        double half = HalfLabel * (x.Hot - x.Cold);
        DataPoint best = new(field[field.Count / 2].Kelvin, 0.5 * (field[field.Count / 2].Lower + field[field.Count / 2].Upper));
        double clearest = 0;
        foreach ((double kelvin, double lower, double upper) in field.Where(edge => edge.Kelvin > x.Cold + half && edge.Kelvin < x.Hot - half))
        {
            DataPoint[] near = [.. series.SelectMany(line => line.Points).Where(point => Math.Abs(point.X - kelvin) <= half)];
            for (int part = 1; part < 10; part++)
            {
                double at = lower + ((upper - lower) * part / 10);
                double clearance = near.Select(point => Math.Abs(point.Y - at)).Append(at - y.Low).Append(y.High - at).Min();
                if (clearance > clearest)
                {
                    (clearest, best) = (clearance, new DataPoint(kelvin, at));
                }
            }
        }

        return (best, clearest > LeastClearance * (y.High - y.Low));
    }

    /// <summary>Where the gas over graphite meets a boundary: above it carbon reduces, where the line rises through.</summary>
    private static ImmutableArray<PlanCrossing> Crossings(GasRatioDiagram diagram, GasRatioOptions options)
    {
        List<PlanCrossing> found = [];
        foreach (GraphiteBoundary graphite in diagram.Graphite)
        {
            Dictionary<double, double> over = graphite.Points.ToDictionary(point => point.Kelvin, point => point.NaturalLogRatio);
            foreach (GasRatioBoundary boundary in diagram.Monoxide)
            {
                foreach ((GasRatioPoint a, GasRatioPoint b) in boundary.Points.Zip(boundary.Points.Skip(1)))
                {
                    double before = over[a.Kelvin] - a.NaturalLogRatio;
                    double after = over[b.Kelvin] - b.NaturalLogRatio;
                    if (before < 0 != after < 0)
                    {
                        double part = before / (before - after);
                        double kelvin = a.Kelvin + (part * (b.Kelvin - a.Kelvin));
                        double height = Height(a.NaturalLogRatio + (part * (b.NaturalLogRatio - a.NaturalLogRatio)), options.Logarithmic);
                        string text = $"graphite at {graphite.MonoxideAndDioxide} and {boundary.Couple}: {TemperatureAxis.Text(kelvin, options.Unit)}, carbon reduces {(after > 0 ? "above" : "below")}";
                        found.Add(new PlanCrossing(new DataPoint(kelvin, height), RichText.OfChemistry(text)));
                    }
                }
            }
        }

        return [.. found.Take(MostCrossings)];
    }

    private static IEnumerable<string> Caption(GasRatioDiagram diagram, string activities, ImmutableArray<SeriesPlan> series, GasRatioOptions options, ImmutableArray<string> sources, string databaseHash)
    {
        double[] uncertainty = [.. options.Gases.SelectMany(gas => Of(diagram, gas)).SelectMany(line => line.Points).Select(point => Math.Exp(point.ExpandedUncertainty))];
        yield return $"Basis: ratio of the two gases, whatever else is in the gas and at any total pressure; {activities}. A line parts the solid that stands above it from the one below."
            + (options.Gases.Length > 1 ? $" Solid lines and fields: {Mixture(options.Gases[0])}; dashed lines: {Mixture(options.Gases[1])}." : "");
        yield return $"Uncertainty of a gas ratio: expanded, k = 2, a factor {Printed.Fixed(uncertainty.Min(), 2)} to {Printed.Fixed(uncertainty.Max(), 2)}{(options.Bands ? ", shown as bands" : "")}."
            + (options.Gases.Contains("CO") && !diagram.Graphite.IsEmpty ? " Graphite line: at p(CO) + p(CO2) as written; above it CO drops soot." : "");
        foreach (string words in TemperatureAxis.WindowWords(options))
        {
            yield return words;
        }

        yield return "Equilibrium, not rate: carbon comes out and oxides react at their own pace. Carbides are left out: a metal that forms one takes carbon before it is bare.";
        string[] hidden = options.Logarithmic ? [] : [.. series.Where(line => line.Points.All(point => IsAtEdge(point.Y))).Select(line => line.Name).Distinct()];
        if (hidden.Length > 0)
        {
            yield return $"Within 1 % of the edge, so hardly seen and not named there: {string.Join(", ", hidden)}; a logarithmic axis shows them.";
        }

        LadderInvariant[] ends = [.. DataEnds(diagram)];
        if (ends.Length > 0)
        {
            yield return $"Data end ({string.Join(", ", ends.Select(end => $"{end.Phase} {TemperatureAxis.Text(end.Kelvin, options.Unit)}"))}): beyond, the field at the oxidising edge is left white.";
        }

        yield return "Sources: " + string.Join("; ", sources) + ".";
        if (options.Frame != FrameKind.Document)
        {
            yield return $"Database {databaseHash[..Math.Min(12, databaseHash.Length)]}, RedoxFurnace {options.Version}.";
        }
    }

    private static string Describe(GasRatioDiagram diagram, GasRatioOptions options, ImmutableArray<FieldPlan> fields, ImmutableArray<PlanCrossing> crossings, double cold, double hot)
        => $"{(options.Logarithmic ? "Logarithm of the gas ratio" : "Share of the reducing gas")} in {string.Join(" and ", options.Gases.Select(Mixture))} against temperature from {TemperatureAxis.Text(cold, options.Unit)} to {TemperatureAxis.Text(hot, options.Unit)}: fields of {string.Join(", ", fields.Select(field => field.Name["field of ".Length..]).Distinct())}. "
            + $"Boundaries: {string.Join(", ", Of(diagram, options.Gases[0]).Select(line => line.Couple).Distinct())}."
            + (crossings.IsEmpty ? "" : " " + string.Join("; ", crossings.Select(crossing => crossing.Text.Plain)) + ".");
}
