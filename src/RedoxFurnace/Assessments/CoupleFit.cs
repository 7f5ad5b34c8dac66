using System.Collections.Immutable;
using MathNet.Numerics.Distributions;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Assessments;

/// <summary>Fits a user's measured points of one couple: a line, and a second- and a third-law evaluation.</summary>
/// <remarks>THEORY.md, section 11.</remarks>
public static class CoupleFit
{
    private const int FewestPoints = 3;
    private const double Confidence = 0.95;
    private const double OncePerSets = 0.05;
    private const double RoundingJoules = 1e-6;

    /// <summary>Fits.</summary>
    /// <param name="formation">The couple, per mole of O2.</param>
    /// <param name="points">At least three, at two or more temperatures, all with errors or none.</param>
    /// <returns>The fit.</returns>
    /// <exception cref="RequestException">Fewer points than a line with limits needs, or all at one temperature.</exception>
    public static CoupleFitResult Of(Reaction formation, ImmutableArray<MeasuredPotential> points)
    {
        if (points.Length < FewestPoints)
        {
            throw new RequestException($"{points.Length} point{(points.Length == 1 ? string.Empty : "s")} cannot fix the two values of a line and their limits; give at least {FewestPoints}");
        }

        if (points.Max(point => point.Kelvin) - points.Min(point => point.Kelvin) < 1)
        {
            throw new RequestException(FormattableString.Invariant($"all points stand at {points[0].Kelvin:0.##} K, so no slope can be found; give points at two temperatures or more"));
        }

        double[] x = [.. points.Select(point => point.Kelvin)];
        double[] weights = [.. points.Select(point => point.StandardError is { } error ? 1 / (error * error) : 1)];
        bool knownErrors = points.All(point => point.StandardError is not null);
        Line line = Line.Through(x, [.. points.Select(point => point.Joules)], weights, knownErrors);
        List<string> notes = [];
        double limit = x.Max(line.LimitAt);
        (Line? second, Line? trend, double[]? third) = Laws(formation, points, weights, knownErrors, notes);
        bool heats = second is not null;
        return new CoupleFitResult(
            formation,
            [.. points.Select((point, i) => Judge(point, i, line, x, weights, points, knownErrors, formation))],
            new FittedValue(line.Constant, line.ConstantLimit),
            new FittedValue(line.Slope, line.SlopeLimit),
            limit,
            second is { } law ? new FittedValue(law.Constant, law.ConstantLimit) : null,
            second is { } same ? new FittedValue(-same.Slope, same.SlopeLimit) : null,
            third is null ? null : Mean(third, weights, knownErrors),
            trend is { } slope ? new FittedValue(slope.Slope, slope.SlopeLimit) : null,
            heats ? formation.Enthalpy(PhysicalConstants.ReferenceKelvin) : null,
            heats ? formation.Entropy(PhysicalConstants.ReferenceKelvin) : null,
            [.. notes]);
    }

    /// <summary>dG less the database's heat-capacity part is dH298 - T dS298: a line gives both (second law); with the database's dS298, each point gives dH298 (third law).</summary>
    private static (Line? Second, Line? Trend, double[]? Third) Laws(Reaction formation, ImmutableArray<MeasuredPotential> points, double[] weights, bool knownErrors, List<string> notes)
    {
        const double reference = PhysicalConstants.ReferenceKelvin;
        double[] needed = [reference, .. points.Select(point => point.Kelvin)];
        foreach (Substance substance in formation.Terms.Select(term => term.Substance))
        {
            if (needed.Any(kelvin => !substance.TryGibbs(kelvin, out _) || !substance.KnowsHeating(kelvin)))
            {
                double bad = needed.First(kelvin => !substance.TryGibbs(kelvin, out _) || !substance.KnowsHeating(kelvin));
                notes.Add("no second or third law: " + (substance.TryGibbs(bad, out _) ? $"{substance.Id} has no heat data" : OutsideDataException.Describe(substance, bad)));
                return (null, null, null);
            }
        }

        double enthalpy = formation.Enthalpy(reference);
        double entropy = formation.Entropy(reference);
        double[] x = [.. points.Select(point => point.Kelvin)];
        double[] reduced = [.. points.Select(point => point.Joules - (formation.StandardGibbs(point.Kelvin) - enthalpy + (point.Kelvin * entropy)))];
        double[] third = [.. reduced.Select((value, i) => value + (x[i] * entropy))];
        return (Line.Through(x, reduced, weights, knownErrors), Line.Through(x, third, weights, knownErrors), third);
    }

    private static FittedValue Mean(double[] values, double[] weights, bool knownErrors)
    {
        double sum = weights.Sum();
        double mean = values.Select((value, i) => value * weights[i]).Sum() / sum;
        double scatter = values.Select((value, i) => weights[i] * (value - mean) * (value - mean)).Sum() / (values.Length - 1);
        double scale = knownErrors ? Math.Max(1, scatter) : scatter;
        return new FittedValue(mean, Student(values.Length - 1) * Math.Sqrt(scale / sum));
    }

    private static FittedPoint Judge(MeasuredPotential point, int index, Line line, double[] x, double[] weights, ImmutableArray<MeasuredPotential> points, bool knownErrors, Reaction formation)
    {
        double residual = point.Joules - line.At(point.Kelvin);
        double? offDatabase = formation.HasData(point.Kelvin) ? point.Joules - formation.StandardGibbs(point.Kelvin) : null;
        int[] others = [.. Enumerable.Range(0, x.Length).Where(i => i != index)];
        double[] rest = [.. others.Select(i => x[i])];
        if (others.Length < FewestPoints || rest.Max() - rest.Min() < 1)
        {
            return new FittedPoint(point, residual, null, false, offDatabase);
        }

        Line without = Line.Through(rest, [.. others.Select(i => points[i].Joules)], [.. others.Select(i => weights[i])], knownErrors);
        double variance = (without.Scale / weights[index]) + Math.Pow(without.StandardErrorAt(point.Kelvin), 2) + (RoundingJoules * RoundingJoules);
        double pull = (point.Joules - without.At(point.Kelvin)) / Math.Sqrt(variance);
        // One chance in twenty for the whole set: each point's share of it, on two sides (Bonferroni).
        double allowed = StudentT.InvCDF(0, 1, others.Length - 2, 1 - (OncePerSets / (2 * x.Length)));
        return new FittedPoint(point, residual, pull, Math.Abs(pull) > allowed, offDatabase);
    }

    private static double Student(int degrees) => StudentT.InvCDF(0, 1, degrees, (1 + Confidence) / 2);

    /// <summary>A weighted straight line; the weights are inverse variances, known or only relative.</summary>
    private sealed record Line(double Constant, double Slope, double Mean, double SumWeights, double SumSquares, double Scale, int Degrees)
    {
        public double SlopeLimit => Student(Degrees) * Math.Sqrt(Scale / SumSquares);

        public double ConstantLimit => LimitAt(0);

        public static Line Through(double[] x, double[] y, double[] weights, bool knownErrors)
        {
            double sum = weights.Sum();
            double meanX = x.Select((value, i) => value * weights[i]).Sum() / sum;
            double meanY = y.Select((value, i) => value * weights[i]).Sum() / sum;
            double squares = x.Select((value, i) => weights[i] * (value - meanX) * (value - meanX)).Sum();
            double slope = x.Select((value, i) => weights[i] * (value - meanX) * (y[i] - meanY)).Sum() / squares;
            double constant = meanY - (slope * meanX);
            double chi = x.Select((value, i) => weights[i] * Math.Pow(y[i] - constant - (slope * value), 2)).Sum();
            double scatter = chi / (x.Length - 2);
            // Stated errors count in full; scatter beyond them widens the limits, scatter below them does not narrow them.
            return new Line(constant, slope, meanX, sum, squares, knownErrors ? Math.Max(1, scatter) : scatter, x.Length - 2);
        }

        public double At(double x) => Constant + (Slope * x);

        public double StandardErrorAt(double x) => Math.Sqrt(Scale * ((1 / SumWeights) + ((x - Mean) * (x - Mean) / SumSquares)));

        public double LimitAt(double x) => Student(Degrees) * StandardErrorAt(x);
    }
}
