namespace RedoxFurnace.Charts.Kinds;

/// <summary>A straight line ln K = Intercept + Slope/T found by least squares.</summary>
/// <param name="Intercept">At 1/T = 0.</param>
/// <param name="Slope">K.</param>
/// <param name="SlopeUncertainty">Expanded (twice the standard error), K; null for two points, where nothing is left to judge by.</param>
public sealed record VantHoffLine(double Intercept, double Slope, double? SlopeUncertainty)
{
    private const double GasConstant = Quantities.PhysicalConstants.GasConstant;

    /// <summary>Enthalpy of reaction the slope stands for, J: -R times the slope (van 't Hoff).</summary>
    public double Enthalpy => -GasConstant * Slope;

    /// <summary>Expanded uncertainty of that enthalpy, J; null for two points.</summary>
    public double? EnthalpyUncertainty => SlopeUncertainty is { } slope ? GasConstant * slope : null;

    /// <summary>The line through points.</summary>
    /// <param name="points">At least two temperatures.</param>
    /// <returns>The line, or null for fewer.</returns>
    public static VantHoffLine? Through(IReadOnlyList<MeasuredPoint> points)
    {
        if (points.Select(point => point.Kelvin).Distinct().Count() < 2)
        {
            return null;
        }

        double[] x = [.. points.Select(point => 1 / point.Kelvin)];
        double[] y = [.. points.Select(point => point.NaturalLog)];
        (double middleX, double middleY) = (x.Average(), y.Average());
        double spread = x.Sum(value => (value - middleX) * (value - middleX));
        double slope = x.Zip(y, (a, b) => (a - middleX) * (b - middleY)).Sum() / spread;
        double intercept = middleY - (slope * middleX);
        double left = x.Zip(y, (a, b) => Math.Pow(b - intercept - (slope * a), 2)).Sum();
        return new VantHoffLine(intercept, slope, points.Count > 2 ? 2 * Math.Sqrt(left / (points.Count - 2) / spread) : null);
    }
}
