using System.Collections.Immutable;
using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charts.Kinds;

/// <summary>ln K of reactions against reciprocal temperature (van 't Hoff); the slope of a line is -dH0/R.</summary>
/// <remarks>THEORY.md, section 12.</remarks>
public static class VantHoffChart
{
    private const int Samples = 120;

    /// <summary>The plan.</summary>
    /// <param name="reactions">As written by the user, with the balanced reaction.</param>
    /// <param name="points">Measured points of the first reaction; may be empty.</param>
    /// <param name="range">Temperatures.</param>
    /// <param name="options">Choices.</param>
    /// <param name="sources">Citations in full.</param>
    /// <param name="databaseHash">SHA-256 of the database.</param>
    /// <param name="covariance">Of the database, or null.</param>
    /// <returns>The plan.</returns>
    /// <exception cref="NoAnswerException">No reaction has data in the range.</exception>
    public static ChartPlan Plan(
        ImmutableArray<(string Text, Reaction Reaction)> reactions,
        ImmutableArray<MeasuredPoint> points,
        (Temperature Low, Temperature High) range,
        ChartOptions options,
        ImmutableArray<string> sources,
        string databaseHash,
        EnthalpyCovariance? covariance)
    {
        (double low, double high) = (range.Low.Kelvin, range.High.Kelvin);
        (SeriesPlan Series, string Words)[] lines = [.. reactions.Select((item, i) => Line(item.Text, item.Reaction, low, high, i, covariance)).OfType<(SeriesPlan, string)>()];
        if (lines.Length == 0)
        {
            throw new NoAnswerException($"no reaction has data between {range.Low} and {range.High}; choose another range");
        }

        (SeriesPlan[] measured, string[] fitted) = Measured(points, low, high);
        double[] values = [.. lines.Select(line => line.Series).Concat(measured).SelectMany(series => series.Points.Concat(series.Marks.Select(mark => mark.At))).Select(point => point.Y)];
        double span = Math.Max(values.Max() - values.Min(), 1);
        AxisPlan temperatures = TemperatureAxis.Of(options.Unit, low, high, about: 8);
        return new ChartPlan
        {
            Title = RichText.OfChemistry(options.Title ?? "Equilibrium constants: " + string.Join("; ", reactions.Select(item => item.Text))),
            Description = $"Natural logarithm of equilibrium constants against reciprocal temperature from {TemperatureAxis.Text(low, options.Unit)} to {TemperatureAxis.Text(high, options.Unit)}. {string.Join(" ", lines.Select(line => line.Words))} {string.Join(" ", fitted)}".TrimEnd(),
            X = AxisPlan.Round(RichText.Of("1000 K / T"), 1000 / high, 1000 / low, about: 9),
            Top = temperatures with { Low = 1000 / high, High = 1000 / low, Ticks = [.. temperatures.Ticks.Select(tick => new AxisTick(1000 / tick.At, tick.Text)).OrderBy(tick => tick.At)] },
            Y = AxisPlan.Round(RichText.Of("ln K"), values.Min() - (0.04 * span), values.Max() + (0.04 * span), about: 8),
            Series = [.. lines.Select(line => line.Series), .. measured],
            Windows = [.. TemperatureAxis.Window(options).Select(window => window with { Low = 1000 / window.High, High = 1000 / window.Low })],
            Key = points.IsEmpty ? [] : [new KeyEntry(MarkShape.Ring, "measured")],
            Frame = new FramePlan(
                options.Frame,
                [
                    "Basis: all partners pure, gases at 1 bar; slope of a line = \u2212\u0394H°/R. " + string.Join(" ", lines.Select(line => line.Words).Concat(fitted)),
                    .. TemperatureAxis.WindowWords(options),
                    "Sources: " + string.Join("; ", sources) + ".",
                    .. options.Frame == FrameKind.Document ? Array.Empty<string>() : [$"Database {databaseHash[..Math.Min(12, databaseHash.Length)]}, RedoxFurnace {options.Version}."],
                ],
                options.Safety,
                options.Document.Fields(databaseHash, options.Version)),
            Page = options.Page,
            ValueNames = ("thousand_over_temperature_per_K", "ln_K"),
            Information = options.Document.Information(),
        };
    }

    /// <summary>One reaction where all its partners have data, with the enthalpy of its mean slope in words.</summary>
    private static (SeriesPlan Series, string Words)? Line(string text, Reaction reaction, double low, double high, int index, EnthalpyCovariance? covariance)
    {
        MeasuredPoint[] at = [.. Enumerable.Range(0, Samples + 1).Select(i => low + ((high - low) * i / Samples)).Where(reaction.HasData)
            .Select(kelvin => new MeasuredPoint(kelvin, -reaction.StandardGibbs(kelvin) / (PhysicalConstants.GasConstant * kelvin)))];
        if (VantHoffLine.Through(at) is not { } mean)
        {
            return null;
        }

        double[] uncertainty = [.. at.Reverse().Select(point => ReactionUncertainty.OfGibbs(reaction, point.Kelvin, covariance) / (PhysicalConstants.GasConstant * point.Kelvin))];
        DataPoint[] points = [.. at.Reverse().Select(point => new DataPoint(1000 / point.Kelvin, point.NaturalLog))];
        SeriesPlan series = new()
        {
            Name = text,
            Label = RichText.OfChemistry(text),
            Points = [.. points],
            Stroke = new Stroke(ChartInks.Couples[index % ChartInks.Couples.Length], 0.4, ChartInks.Dashes[index / ChartInks.Couples.Length % ChartInks.Dashes.Length]),
            Band = [.. points.Select((point, i) => (point.Y - uncertainty[i], point.Y + uncertainty[i]))],
            Uncertainty = [.. uncertainty],
        };
        return (series, $"{text}: \u0394H° {RoundTicks.Number(mean.Enthalpy / 1000, 0.1)} kJ from the mean slope.");
    }

    /// <summary>Measured points as rings with the line through them.</summary>
    private static (SeriesPlan[] Series, string[] Words) Measured(ImmutableArray<MeasuredPoint> points, double low, double high)
    {
        if (points.IsEmpty)
        {
            return ([], []);
        }

        VantHoffLine? line = VantHoffLine.Through(points);
        double[] ends = [1000 / Math.Min(high, points.Max(point => point.Kelvin)), 1000 / Math.Max(low, points.Min(point => point.Kelvin))];
        SeriesPlan series = new()
        {
            Name = "measured",
            Label = RichText.Of(line is null ? "" : "measured"),
            Points = line is null ? [] : [.. ends.Select(x => new DataPoint(x, line.Intercept + (line.Slope * x / 1000)))],
            Stroke = new Stroke(ChartInks.Reductants[0], 0.35, [1.6, 0.9]),
            Marks = [.. points.Select(point => new PlanMark(new DataPoint(1000 / point.Kelvin, point.NaturalLog), MarkShape.Ring))],
        };
        string words = line is null
            ? "One temperature measured: no slope."
            : $"Measured ({points.Length} points): \u0394H° {RoundTicks.Number(line.Enthalpy / 1000, 0.1)}"
                + (line.EnthalpyUncertainty is { } expanded ? $" ± {RoundTicks.Number(expanded / 1000, 0.1)} kJ (twice the standard error of the slope)." : " kJ (two points, no uncertainty).");
        return ([series], [words]);
    }
}
