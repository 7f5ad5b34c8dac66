using System.Collections.Immutable;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Assessments;

/// <summary>Result of the weighted least squares over measured couples and calorimetric priors.</summary>
/// <param name="Quantities">In the order of the priors.</param>
/// <param name="Measurements">In the order of the table.</param>
/// <param name="ChiSquared">Sum of squared differences over their standard errors.</param>
/// <param name="ChiSquaredRaw">The same with the raw enthalpies, over the points raw data describe.</param>
/// <param name="CoupleObservations">An equation counts as two.</param>
/// <param name="PriorObservations">Calorimetric values.</param>
/// <param name="FreeValues">Adjusted quantities.</param>
/// <param name="BetweenSourcesJoules">How far sources of one couple differ beyond their errors, k = 1, J/mol O2, from the measurements kept out.</param>
/// <param name="Covariance">Of the assessed enthalpies and entropies (THEORY.md, section 11).</param>
public sealed record AssessmentResult(
    ImmutableArray<AssessedQuantity> Quantities,
    ImmutableArray<AssessedMeasurement> Measurements,
    double ChiSquared,
    double ChiSquaredRaw,
    int CoupleObservations,
    int PriorObservations,
    int FreeValues,
    double BetweenSourcesJoules,
    EnthalpyCovariance Covariance)
{
    /// <summary>Observations less free values.</summary>
    public int DegreesOfFreedom => CoupleObservations + PriorObservations - FreeValues;

    /// <summary>Root mean square difference of a couple, J/mol O2; heats and temperatures of three phases are left out.</summary>
    /// <param name="couple">Such as <c>Ni/NiO</c>.</param>
    /// <param name="fitted">Weighed points; otherwise those kept out.</param>
    /// <param name="before">With raw enthalpies.</param>
    /// <returns>Null where there is no such point.</returns>
    public double? RootMeanSquare(string couple, bool fitted, bool before)
    {
        double[] values =
        [
            .. Measurements.Where(item => item.Measurement.Couple == couple && item.Measurement.Kind is not (MeasurementKind.ReactionEnthalpy or MeasurementKind.InvariantTemperature))
                .SelectMany(item => item.Points).Where(point => point.IsFit == fitted)
                .Select(point => before ? point.BeforeJoules : point.AfterJoules).OfType<double>(),
        ];
        return values.Length == 0 ? null : Math.Sqrt(values.Average(value => value * value));
    }
}
