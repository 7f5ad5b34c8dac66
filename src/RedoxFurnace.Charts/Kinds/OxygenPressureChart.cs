using System.Collections.Immutable;
using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charts.Kinds;

/// <summary>Oxygen pressure of couples and reductants against temperature or its reciprocal, over lines of equal gas ratio and of equal frost point.</summary>
/// <remarks>THEORY.md, section 12.</remarks>
public static class OxygenPressureChart
{
    private const int MostIsoLines = 9;
    private const int IsoPoints = 60;

    private static readonly ImmutableArray<double> IsoDashes = [1.2, 0.9];

    private static readonly ImmutableArray<double> FrostDashes = [0.5, 0.7];

    /// <summary>The plan.</summary>
    /// <param name="result">The lines.</param>
    /// <param name="options">Choices.</param>
    /// <param name="database">For the gas reactions.</param>
    /// <returns>The plan.</returns>
    /// <exception cref="RequestException">An unknown ratio.</exception>
    public static ChartPlan Plan(StabilityResult result, OxygenPressureOptions options, SubstanceDatabase database)
    {
        StabilityRequest request = result.Request;
        (double low, double high) = (request.Low.Kelvin, request.High.Kelvin);
        (double bottom, double top) = Extent(result);
        ChartPlan stability = StabilityChart.Plan(result, new StabilityChartOptions { Bands = options.Bands, Unit = options.Unit, Page = options.Page, Frame = options.Frame, Document = options.Document, Window = options.Window, Safety = options.Safety, Version = options.Version, Highlight = options.Highlight }, database);
        GasReactions gases = new(database);
        SeriesPlan[] iso = [.. options.Ratios.SelectMany(name => Ratios(name, gases, low, high, bottom, top, options.Inverse)), .. options.Frost is { } frost ? Frost(frost, gases, low, high, bottom, top, options.Inverse) : []];
        return stability with
        {
            Title = RichText.OfChemistry(options.Title ?? "Oxygen pressure of " + string.Join(", ", request.Of.Concat(request.With))),
            Description = Describe(result, options),
            X = Across(options, low, high),
            Top = Above(options, low, high),
            Y = AxisPlan.Round(RichText.Of("log_{10} p(O_{2}), bar"), bottom, top, about: 9),
            Series = [.. iso, .. stability.Series.Select(series => Converted(series, options.Inverse))],
            Windows = [.. stability.Windows.Select(window => window with { Low = options.Inverse ? Place(window.High, true) : window.Low, High = options.Inverse ? Place(window.Low, true) : window.High })],
            Crossings = [.. stability.Crossings.Select(crossing => crossing with { At = Converted(crossing.At, options.Inverse) })],
            Rulers = [],
            Frame = stability.Frame with { Caption = [.. stability.Frame.Caption.Select((line, i) => i == 0 ? line + Iso(options) : line)] },
            ValueNames = (options.Inverse ? "thousand_over_temperature_per_K" : "temperature_K", "log10_pO2_bar"),
        };
    }

    private static string Iso(OxygenPressureOptions options)
        => (options.Ratios.IsEmpty ? "" : $" Grey dashed lines: gas of equal {string.Join(" and ", options.Ratios)}, whatever its total pressure.")
            + (options.Frost is { } frost ? $" Grey dotted lines: equal frost or dew point of a gas with {Printed.Brief(frost.HydrogenShare * 100)} % H2 at {frost.Total}." : "");

    private static double Place(double kelvin, bool inverse) => inverse ? 1000 / kelvin : kelvin;

    /// <summary>kJ per mole of O2 at a temperature to log10 bar.</summary>
    private static DataPoint Converted(DataPoint point, bool inverse)
        => new(Place(point.X, inverse), OxygenPotentialReadings.Log10Bar(point.Y * 1000, point.X));

    private static SeriesPlan Converted(SeriesPlan series, bool inverse)
    {
        IEnumerable<int> order = inverse ? Enumerable.Range(0, series.Points.Length).Reverse() : Enumerable.Range(0, series.Points.Length);
        double Log(int i, double value) => OxygenPotentialReadings.Log10Bar(value * 1000, series.Points[i].X);
        return series with
        {
            Points = [.. order.Select(i => Converted(series.Points[i], inverse))],
            Band = series.Band.IsEmpty ? [] : [.. order.Select(i => (Log(i, series.Band[i].Low), Log(i, series.Band[i].High)))],
            Marks = [.. series.Marks.Select(mark => mark with { At = Converted(mark.At, inverse) })],
            Uncertainty = series.Uncertainty.IsEmpty ? [] : [.. order.Select(i => Log(i, series.Uncertainty[i]))],
        };
    }

    private static (double Bottom, double Top) Extent(StabilityResult result)
    {
        double[] values = [.. result.Lines.SelectMany(line => line.Points).Select(point => OxygenPotentialReadings.Log10Bar(point.OxygenPotential, point.Kelvin))];
        double step = values.Max() - values.Min() > 30 ? 5 : 2;
        return (Math.Floor((values.Min() / step) - 0.02) * step, Math.Ceiling((values.Max() / step) + 0.02) * step);
    }

    private static AxisPlan Across(OxygenPressureOptions options, double low, double high)
        => options.Inverse
            ? AxisPlan.Round(RichText.Of("1000 K / T"), 1000 / high, 1000 / low, about: 9)
            : TemperatureAxis.Of(options.Unit, low, high);

    /// <summary>Over an axis of 1/T stand round temperatures at their places.</summary>
    private static AxisPlan Above(OxygenPressureOptions options, double low, double high)
    {
        if (!options.Inverse)
        {
            return TemperatureAxis.Beside(options.Unit, low, high);
        }

        AxisPlan straight = TemperatureAxis.Of(options.Unit, low, high, about: 9);
        return straight with { Low = 1000 / high, High = 1000 / low, Ticks = [.. straight.Ticks.Select(tick => new AxisTick(1000 / tick.At, tick.Text)).OrderBy(tick => tick.At)] };
    }

    private static IEnumerable<SeriesPlan> Ratios(string name, GasReactions gases, double low, double high, double bottom, double top, bool inverse)
    {
        (Reaction reaction, string shown) = name switch
        {
            "CO/CO2" => (gases.CarbonMonoxideOxidation, "CO/CO_{2}"),
            "H2/H2O" => (gases.HydrogenOxidation, "H_{2}/H_{2}O"),
            _ => throw RequestException.UnknownWord("ratios", name, ["CO/CO2", "H2/H2O"]),
        };
        int[] seen = [.. Enumerable.Range(-10, 31).Where(exponent => Sampled(low, high).Any(kelvin => Value(exponent, kelvin) > bottom && Value(exponent, kelvin) < top))];
        int step = Math.Max(1, (int)Math.Ceiling(seen.Length / (double)MostIsoLines));
        return seen.Where(exponent => exponent % step == 0).Select(exponent => Line(
            $"{name} 1e{exponent}",
            RichText.Of(exponent == 0 ? shown + " 1" : $"{shown} 10^{{{RoundTicks.Number(exponent, 1)}}}"),
            kelvin => Value(exponent, kelvin),
            low,
            high,
            inverse,
            IsoDashes));

        double Value(int exponent, double kelvin) => OxygenPotentialReadings.Log10Bar(GasReactions.PotentialOfRatio(reaction, kelvin, exponent * Math.Log(10)), kelvin);
    }

    private static IEnumerable<SeriesPlan> Frost((double HydrogenShare, Pressure Total) gas, GasReactions gases, double low, double high, double bottom, double top, bool inverse)
    {
        foreach (int celsius in new[] { -100, -80, -60, -40, -20, 0, 20, 40, 60 })
        {
            double kelvin = celsius + PhysicalConstants.ZeroCelsiusInKelvin;
            double water = kelvin < WaterVapour.TriplePointKelvin ? WaterVapour.LogSaturationPressureOverIce(kelvin) : WaterVapour.LogSaturationPressureOverLiquid(kelvin);
            double logRatio = Math.Log(gas.HydrogenShare) + gas.Total.NaturalLogBar - water;
            double Value(double at) => OxygenPotentialReadings.Log10Bar(GasReactions.PotentialOfRatio(gases.HydrogenOxidation, at, logRatio), at);
            if (water < gas.Total.NaturalLogBar && Sampled(low, high).Any(at => Value(at) > bottom && Value(at) < top))
            {
                yield return Line($"frost point {celsius} C", RichText.Of($"{(celsius < 0 ? "frost" : "dew")} {RoundTicks.Number(celsius, 1)} °C"), at => Value(at), low, high, inverse, FrostDashes);
            }
        }
    }

    private static IEnumerable<double> Sampled(double low, double high) => Enumerable.Range(0, IsoPoints + 1).Select(i => low + ((high - low) * i / IsoPoints));

    private static SeriesPlan Line(string name, RichText label, Func<double, double?> value, double low, double high, bool inverse, ImmutableArray<double> dashes)
    {
        IEnumerable<DataPoint> points = Sampled(low, high).Select(kelvin => (Kelvin: kelvin, Value: value(kelvin))).Where(point => point.Value is not null).Select(point => new DataPoint(Place(point.Kelvin, inverse), point.Value!.Value));
        return new SeriesPlan
        {
            Name = name,
            Label = label,
            Points = [.. inverse ? points.Reverse() : points],
            Stroke = new Stroke(Ink.Quiet, 0.16, dashes),
            IsGuide = true,
        };
    }

    private static string Describe(StabilityResult result, OxygenPressureOptions options)
        => $"Decimal logarithm of the oxygen pressure in bar against {(options.Inverse ? "reciprocal temperature" : "temperature")} from {TemperatureAxis.Text(result.Request.Low.Kelvin, options.Unit)} to {TemperatureAxis.Text(result.Request.High.Kelvin, options.Unit)}. "
            + $"Below its line the metal of a couple stays bare. Lines: {string.Join(", ", result.Lines.Select(line => line.Id).Distinct())}.";
}
