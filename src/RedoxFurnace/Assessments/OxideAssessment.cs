using System.Collections.Immutable;
using MathNet.Numerics.LinearAlgebra;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Assessments;

/// <summary>Adjusts enthalpies (and a few entropies) at 298.15 K to measured couples and calorimetric values by weighted least squares.</summary>
/// <remarks>THEORY.md, section 11.</remarks>
public static class OxideAssessment
{
    private const int MostRounds = 40;
    private const double SettledJoules = 1e-4;

    /// <summary>Median of chi-squared with one degree of freedom: (0.67449)^2, the square of the normal distribution's upper quartile.</summary>
    private const double MedianOfChiSquared = 0.454936;

    /// <summary>Standard error of an entropy nothing but the couples fixes, J/(mol K): wide enough to say nothing.</summary>
    private const double OpenEntropy = 10;

    /// <summary>Standard error of an enthalpy nothing but the couples fixes, J/mol.</summary>
    private const double OpenEnthalpy = 100_000;

    /// <summary>Runs the adjustment.</summary>
    /// <param name="table">Measurements and priors.</param>
    /// <param name="database">Where the search starts and what is held.</param>
    /// <returns>Assessed values, differences, chi-squared, covariance.</returns>
    /// <exception cref="NoAnswerException">Fewer observations than free values, or measurements that do not fix them.</exception>
    public static AssessmentResult Of(MeasurementTable table, SubstanceDatabase database)
    {
        CoupleModel model = new(database);
        ImmutableArray<MeasurementPrior> priors = [.. table.Priors, .. NewPriors(table, database)];
        MeasurementPrior[] free = [.. priors.Where(prior => prior.IsFree)];
        Weighed[] weighed = [.. table.Measurements.Where(measurement => measurement.IsFit).SelectMany(measurement => Weigh(measurement, model, table.Slopes))];
        int coupleObservations = table.Measurements.Where(measurement => measurement.IsFit).Sum(measurement => Math.Min(2, measurement.FitKelvin.Length));
        int priorObservations = priors.Count(prior => prior.Value is not null && prior.ExpandedError is not null);
        if (coupleObservations + priorObservations < free.Length)
        {
            throw new NoAnswerException($"{coupleObservations + priorObservations} observations cannot fix {free.Length} values; add measurements or hold some");
        }

        double[] shifts = Solve(free, priors, weighed, model, database, out double[] errors);
        Dictionary<string, CoupleModel.Shift> after = Gather(free, shifts);
        (Dictionary<string, CoupleModel.Shift> before, HashSet<string> leftOut) = Raw(priors, database);
        double chi = weighed.Sum(point => Square(model.Of(point.Measurement, point.Kelvin, after).Joules / point.Sigma));
        double chiRaw = weighed.Sum(point => Square(model.Of(point.Measurement, point.Kelvin, before, leftOut).Joules / point.Sigma));
        ImmutableArray<AssessedQuantity>.Builder quantities = ImmutableArray.CreateBuilder<AssessedQuantity>(priors.Length);
        foreach (MeasurementPrior prior in priors)
        {
            int at = Array.IndexOf(free, prior);
            AssessedQuantity quantity = Quantity(prior, database, at < 0 ? 0 : shifts[at], at < 0 ? null : errors[at]);
            quantities.Add(quantity);
            if (prior is { Value: { } value, ExpandedError: { } error })
            {
                chi += Square((quantity.Assessed - value) / (error / 2));
                chiRaw += Square((quantity.Raw - value) / (error / 2));
            }
        }

        ImmutableArray<AssessedMeasurement> compared = [.. table.Measurements.Select(measurement => Compare(measurement, model, table.Slopes, after, before, leftOut))];
        double between = BetweenSources(compared);
        return new AssessmentResult(
            quantities.MoveToImmutable(),
            compared,
            chi,
            chiRaw,
            coupleObservations,
            priorObservations,
            free.Length,
            between,
            CovarianceOf(priors, weighed, between, model, database, after));
    }

    /// <summary>Products a user's measurements speak of that no prior names: free, with the database's own value and uncertainty as prior.</summary>
    private static IEnumerable<MeasurementPrior> NewPriors(MeasurementTable table, SubstanceDatabase database)
        => table.Measurements.Where(measurement => measurement.IsFit).Select(measurement => database.Get(measurement.Product)).Distinct()
            .Where(substance => !table.Priors.Any(prior => prior.Substance == substance.Id))
            .Select(substance => new MeasurementPrior(
                substance.Id,
                false,
                Enthalpy298(substance) / 1000,
                Math.Max(substance.Uncertainty.EnthalpyJoules / 1000, 0.01),
                "the database before the adjustment",
                true,
                "free, prior from the database"));

    private static IEnumerable<Weighed> Weigh(Measurement measurement, CoupleModel model, ImmutableDictionary<string, double> slopes)
    {
        int points = measurement.FitKelvin.Length;
        double spread = points > 2 ? Math.Sqrt(points / 2.0) : 1;
        return measurement.FitKelvin.Select(kelvin => new Weighed(measurement, kelvin, spread, spread * model.StandardError(measurement, kelvin, Slope(measurement, slopes))));
    }

    private static double? Slope(Measurement measurement, ImmutableDictionary<string, double> slopes)
        => measurement.Kind == MeasurementKind.TemperatureAtPressure && slopes.TryGetValue(measurement.Product, out double slope) ? slope : null;

    /// <summary>Gauss-Newton: linear but for the choice of the wustite member that meets iron or magnetite, so a few rounds settle it.</summary>
    private static double[] Solve(MeasurementPrior[] free, ImmutableArray<MeasurementPrior> priors, Weighed[] weighed, CoupleModel model, SubstanceDatabase database, out double[] errors)
    {
        double[] shifts = new double[free.Length];
        errors = new double[free.Length];
        if (free.Length == 0)
        {
            return shifts;
        }

        for (int round = 0; round < MostRounds; round++)
        {
            Dictionary<string, CoupleModel.Shift> current = Gather(free, shifts);
            List<double[]> rows = [];
            List<double> wanted = [];
            foreach (Weighed point in weighed)
            {
                CoupleModel.Difference difference = model.Of(point.Measurement, point.Kelvin, current);
                rows.Add([.. free.Select(prior => Sensitivity(prior, difference, point.Kelvin) / point.Sigma)]);
                wanted.Add(-difference.Joules / point.Sigma);
            }

            for (int i = 0; i < free.Length; i++)
            {
                if (free[i] is { Value: { } value, ExpandedError: { } error })
                {
                    double[] row = new double[free.Length];
                    row[i] = 2 / error;
                    rows.Add(row);
                    wanted.Add((value - InDatabase(free[i], database) - shifts[i]) * 2 / error);
                }
            }

            Matrix<double> matrix = Matrix<double>.Build.DenseOfRowArrays(rows);
            Matrix<double> normal = matrix.TransposeThisAndMultiply(matrix);
            for (int i = 0; i < free.Length; i++)
            {
                if (normal[i, i] <= 0)
                {
                    throw new NoAnswerException($"no measurement and no published value fixes the {(free[i].IsEntropy ? "entropy" : "enthalpy")} of {free[i].Substance}; add one or hold it");
                }
            }

            Vector<double> step = matrix.QR().Solve(Vector<double>.Build.DenseOfEnumerable(wanted));
            if (step.Any(value => !double.IsFinite(value)))
            {
                throw new NoAnswerException("the measurements do not fix all free values; hold some or add measurements");
            }

            for (int i = 0; i < free.Length; i++)
            {
                shifts[i] += step[i];
            }

            if (step.Max(Math.Abs) < SettledJoules)
            {
                Matrix<double> inverse = normal.Inverse();
                errors = [.. Enumerable.Range(0, free.Length).Select(i => Math.Sqrt(inverse[i, i]))];
                return shifts;
            }
        }

        throw new NoAnswerException($"the adjustment did not settle in {MostRounds} rounds; a measurement contradicts the others too strongly");
    }

    /// <summary>d(difference)/d(value), the value in kJ/mol or J/(mol K).</summary>
    private static double Sensitivity(MeasurementPrior prior, CoupleModel.Difference difference, double kelvin)
    {
        double number = difference.Reaction.Terms.FirstOrDefault(term => term.Substance.Id == prior.Substance).Number;
        return prior.IsEntropy ? difference.HasEntropy ? -kelvin * number : 0 : 1000 * number;
    }

    private static Dictionary<string, CoupleModel.Shift> Gather(IReadOnlyList<MeasurementPrior> quantities, IReadOnlyList<double> shifts)
    {
        Dictionary<string, CoupleModel.Shift> all = new(StringComparer.Ordinal);
        for (int i = 0; i < quantities.Count; i++)
        {
            CoupleModel.Shift known = all.GetValueOrDefault(quantities[i].Substance);
            all[quantities[i].Substance] = quantities[i].IsEntropy ? known with { Entropy = known.Entropy + shifts[i] } : known with { Enthalpy = known.Enthalpy + (1000 * shifts[i]) };
        }

        return all;
    }

    /// <summary>Back to the raw values; substances made for the adjustment (free without any published value) did not exist then.</summary>
    private static (Dictionary<string, CoupleModel.Shift> Shifts, HashSet<string> LeftOut) Raw(ImmutableArray<MeasurementPrior> priors, SubstanceDatabase database)
    {
        Dictionary<string, CoupleModel.Shift> shifts = new(StringComparer.Ordinal);
        foreach (Substance substance in priors.Select(prior => database.Get(prior.Substance)).Distinct())
        {
            shifts[substance.Id] = new CoupleModel.Shift(-1000 * (substance.Assessment?.EnthalpyKilojoules?.Shift ?? 0), -(substance.Assessment?.EntropyJoules?.Shift ?? 0));
        }

        return (shifts, [.. priors.Where(prior => prior is { IsFree: true, Value: null, IsEntropy: false }).Select(prior => prior.Substance)]);
    }

    private static AssessedQuantity Quantity(MeasurementPrior prior, SubstanceDatabase database, double shift, double? error)
    {
        Substance substance = database.Get(prior.Substance);
        AssessedValue? assessed = prior.IsEntropy ? substance.Assessment?.EntropyJoules : substance.Assessment?.EnthalpyKilojoules;
        double held = InDatabase(prior, database);
        return new AssessedQuantity(prior.Substance, prior.IsEntropy, held - (assessed?.Shift ?? 0), held, held + shift, error, prior.Value, prior.ExpandedError, prior.IsFree, prior.Treatment);
    }

    /// <summary>The value in use, kJ/mol or J/(mol K).</summary>
    private static double InDatabase(MeasurementPrior prior, SubstanceDatabase database)
    {
        Substance substance = database.Get(prior.Substance);
        return prior.IsEntropy
            ? substance.Assessment?.EntropyJoules?.Value ?? substance.At(PhysicalConstants.ReferenceKelvin).Entropy
            : substance.Assessment?.EnthalpyKilojoules?.Value ?? (Enthalpy298(substance) / 1000);
    }

    private static double Enthalpy298(Substance substance) => substance.At(Math.Max(PhysicalConstants.ReferenceKelvin, substance.LowestKelvin)).Enthalpy;

    private static AssessedMeasurement Compare(
        Measurement measurement,
        CoupleModel model,
        ImmutableDictionary<string, double> slopes,
        Dictionary<string, CoupleModel.Shift> after,
        Dictionary<string, CoupleModel.Shift> before,
        HashSet<string> leftOut)
    {
        double? slope = Slope(measurement, slopes);
        double spread = measurement.FitKelvin.Length > 2 ? Math.Sqrt(measurement.FitKelvin.Length / 2.0) : 1;
        ImmutableArray<AssessedPoint> points =
        [
            .. measurement.FitKelvin.Select(kelvin => (kelvin, true)).Concat(measurement.EvidenceKelvin.Select(kelvin => (kelvin, false))).OrderBy(pair => pair.kelvin)
                .Select(pair => new AssessedPoint(
                    pair.kelvin,
                    pair.Item2,
                    model.Of(measurement, pair.kelvin, before, leftOut).Joules,
                    model.Of(measurement, pair.kelvin, after).Joules,
                    spread * model.StandardError(measurement, pair.kelvin, slope))),
        ];
        return new AssessedMeasurement(measurement, points, points.Average(point => point.SigmaJoules) / spread);
    }

    /// <summary>
    /// How far sources of one couple differ beyond their own errors (k = 1, J/mol O2): the t for which the median of d^2/(s^2 + t^2) over the measurements kept out is that of
    /// chi-squared with one degree of freedom; d is the mean difference of each, s its standard error. They had no part in the adjustment, so they can tell; the median,
    /// because a few of them are known to be wrong and are not followed.
    /// </summary>
    private static double BetweenSources(ImmutableArray<AssessedMeasurement> measurements)
    {
        (double Difference, double Error)[] kept =
        [
            .. measurements.Where(item => !item.Measurement.IsFit && item.Measurement.Kind is not (MeasurementKind.ReactionEnthalpy or MeasurementKind.InvariantTemperature))
                .Select(item => (item.Points.Average(point => point.AfterJoules), item.StandardErrorJoules)),
        ];
        double Excess(double between) => MathNet.Numerics.Statistics.Statistics.Median(kept.Select(item => Square(item.Difference) / (Square(item.Error) + Square(between)))) - MedianOfChiSquared;
        double low = 0, high = 20_000;
        if (kept.Length == 0 || Excess(0) <= 0)
        {
            return 0;
        }

        for (int i = 0; i < 60; i++)
        {
            double middle = (low + high) / 2;
            (low, high) = Excess(middle) > 0 ? (middle, high) : (low, middle);
        }

        return (low + high) / 2;
    }

    /// <summary>
    /// Covariance of all quantities the couples touch, the held ones at their published errors as well, and every entropy at its class default: holding a value
    /// chooses it, it does not make it certain.
    /// </summary>
    private static EnthalpyCovariance CovarianceOf(ImmutableArray<MeasurementPrior> priors, Weighed[] weighed, double between, CoupleModel model, SubstanceDatabase database, Dictionary<string, CoupleModel.Shift> after)
    {
        ImmutableArray<string> ids = [.. priors.Select(prior => prior.Substance).Distinct()];
        int n = ids.Length;
        double[] scale = [.. ids.Select(id => EnthalpySigma(id)), .. ids.Select(id => EntropySigma(id))];
        Matrix<double> normal = Matrix<double>.Build.DenseIdentity(2 * n);
        foreach (Weighed point in weighed)
        {
            CoupleModel.Difference difference = model.Of(point.Measurement, point.Kelvin, after);
            double[] row = new double[2 * n];
            double sigma = Math.Sqrt(Square(point.Sigma) + Square(between * point.Spread));
            for (int i = 0; i < n; i++)
            {
                double number = difference.Reaction.Terms.FirstOrDefault(term => term.Substance.Id == ids[i]).Number;
                row[i] = number * scale[i] / sigma;
                row[n + i] = difference.HasEntropy ? -point.Kelvin * number * scale[n + i] / sigma : 0;
            }

            for (int i = 0; i < 2 * n; i++)
            {
                for (int j = 0; row[i] != 0 && j < 2 * n; j++)
                {
                    normal[i, j] += row[i] * row[j];
                }
            }
        }

        // In units of the priors the matrix starts from identity, so it is well scaled and surely positive.
        Matrix<double> inverse = normal.Cholesky().Solve(Matrix<double>.Build.DenseIdentity(2 * n));
        double[,] full = new double[2 * n, 2 * n];
        for (int i = 0; i < 2 * n; i++)
        {
            for (int j = 0; j < 2 * n; j++)
            {
                full[i, j] = (inverse[i, j] + inverse[j, i]) / 2 * scale[i] * scale[j];
            }
        }

        return new EnthalpyCovariance(ids, full);

        double EnthalpySigma(string id) => priors.FirstOrDefault(prior => prior.Substance == id && !prior.IsEntropy)?.ExpandedError * 500 ?? OpenEnthalpy;

        double EntropySigma(string id)
        {
            Substance substance = database.Get(id);
            return priors.Any(prior => prior.Substance == id && prior is { IsEntropy: true, IsFree: true }) ? OpenEntropy : database.ClassDefaults[substance.Class].Entropy(substance.Formula) / 2;
        }
    }

    private static double Square(double value) => value * value;

    private sealed record Weighed(Measurement Measurement, double Kelvin, double Spread, double Sigma);
}
