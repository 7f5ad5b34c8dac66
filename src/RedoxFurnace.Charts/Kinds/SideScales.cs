using System.Collections.Immutable;
using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Charts.Kinds;

/// <summary>The nomographic side scales of Richardson and Jeffes. THEORY.md, section 12.</summary>
public static class SideScales
{
    /// <summary>Names that can be asked for.</summary>
    public static ImmutableArray<string> Names { get; } = ["pO2", "CO/CO2", "H2/H2O"];

    private const int MostDecades = 300;

    /// <summary>A scale by name.</summary>
    /// <param name="name">One of <see cref="Names"/>.</param>
    /// <param name="gases">The gas reactions.</param>
    /// <param name="lowKelvin">Range over which the gas line is taken straight, K.</param>
    /// <param name="highKelvin">K.</param>
    /// <param name="perJoule">Unit of the vertical axis per joule.</param>
    /// <returns>The scale.</returns>
    /// <exception cref="RequestException">Unknown name.</exception>
    public static RulerPlan Of(string name, GasReactions gases, double lowKelvin, double highKelvin, double perJoule) => name switch
    {
        "pO2" => new RulerPlan("scale of pO2", RichText.Of("log_{10} p(O_{2})/bar"), "O", new DataPoint(0, 0), Decades(MostDecades, exponent => PhysicalConstants.GasConstant * Math.Log(10) * -exponent * perJoule, exponent => RichText.Of(RoundTicks.Number(-exponent, 1)))),
        "CO/CO2" => Gas("scale of CO/CO2", "CO/CO_{2}", "C", gases.CarbonMonoxideOxidation, lowKelvin, highKelvin, perJoule),
        "H2/H2O" => Gas("scale of H2/H2O", "H_{2}/H_{2}O", "H", gases.HydrogenOxidation, lowKelvin, highKelvin, perJoule),
        _ => throw new RequestException($"--scales '{name}' is not known; known: {string.Join(", ", Names)}"),
    };

    /// <summary>Frost points for a share of hydrogen at a total pressure: the scale of H2/H2O written as the moisture a meter shows.</summary>
    /// <param name="hydrogenShare">0 to 1.</param>
    /// <param name="total">Total pressure.</param>
    /// <param name="gases">The gas reactions.</param>
    /// <param name="lowKelvin">K.</param>
    /// <param name="highKelvin">K.</param>
    /// <param name="perJoule">Unit of the vertical axis per joule.</param>
    /// <returns>The scale.</returns>
    public static RulerPlan Frost(double hydrogenShare, Pressure total, GasReactions gases, double lowKelvin, double highKelvin, double perJoule)
    {
        (double intercept, double slope) = Straight(gases.HydrogenOxidation, lowKelvin, highKelvin);
        ImmutableArray<(RichText, double)>.Builder ticks = ImmutableArray.CreateBuilder<(RichText, double)>();
        for (int celsius = -110; celsius <= 90; celsius += 10)
        {
            double at = celsius + PhysicalConstants.ZeroCelsiusInKelvin;
            double water = celsius <= 0 ? WaterVapour.LogSaturationPressureOverIce(at) : WaterVapour.LogSaturationPressureOverLiquid(at);
            double ratio = Math.Log(hydrogenShare) + total.NaturalLogBar - water;
            ticks.Add((RichText.Of(RoundTicks.Number(celsius, 1)), (slope - (2 * PhysicalConstants.GasConstant * ratio)) * perJoule));
        }

        string share = RoundTicks.Number(hydrogenShare * 100, 1);
        return new RulerPlan("scale of frost points", RichText.Of($"frost °C, H_{{2}} {share} %"), "H", new DataPoint(0, intercept * perJoule), ticks.ToImmutable());
    }

    /// <summary>
    /// The gas line of a reaction as a straight one over a range: least squares of dG0/T = A/T + B, which is what the scale reads,
    /// so that a point at a low temperature, whose ray is longest, reads as well as a hot one.
    /// </summary>
    /// <param name="reaction">Per mole of O2.</param>
    /// <param name="lowKelvin">K.</param>
    /// <param name="highKelvin">K.</param>
    /// <returns>A in J, B in J/K.</returns>
    internal static (double Intercept, double Slope) Straight(Reaction reaction, double lowKelvin, double highKelvin)
    {
        const int points = 60;
        double low = Math.Max(lowKelvin, 298.15);
        double[] kelvin = [.. Enumerable.Range(0, points + 1).Select(i => low + ((highKelvin - low) * i / points))];
        (double b, double a) = MathNet.Numerics.Fit.Line([.. kelvin.Select(t => 1 / t)], [.. kelvin.Select(t => reaction.StandardGibbs(t) / t)]);
        return (a, b);
    }

    private static RulerPlan Gas(string name, string label, string pivot, Reaction reaction, double lowKelvin, double highKelvin, double perJoule)
    {
        (double intercept, double slope) = Straight(reaction, lowKelvin, highKelvin);
        return new RulerPlan(
            name,
            RichText.Of(label),
            pivot,
            new DataPoint(0, intercept * perJoule),
            [.. Enumerable.Range(-14, 75).Select(exponent => (
                exponent == 0 ? RichText.Of("1") : RichText.Of("10^{" + RoundTicks.Number(exponent, 1) + "}"),
                (slope - (2 * PhysicalConstants.GasConstant * Math.Log(10) * exponent)) * perJoule))]);
    }

    /// <summary>Powers of ten, written every one, two, five or ten, whichever leaves room.</summary>
    private static ImmutableArray<(RichText Text, double Slope)> Decades(int most, Func<int, double> slope, Func<int, RichText> text)
        => [.. Enumerable.Range(0, most + 1).Where(exponent => exponent <= 40 || exponent % 10 == 0).Select(exponent => (exponent % 2 == 0 ? text(exponent) : RichText.Of(""), slope(exponent)))];
}
