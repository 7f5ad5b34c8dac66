using System.Collections.Immutable;
using RedoxFurnace.Oxidation;

namespace RedoxFurnace.Assessments;

/// <summary>A couple fitted to measured points; per mole of O2, limits at 95 %.</summary>
/// <param name="Formation">The couple.</param>
/// <param name="Points">With residuals.</param>
/// <param name="Constant">A of dG0 = A + B T, J.</param>
/// <param name="Slope">B, J/K.</param>
/// <param name="LineLimit">Widest confidence limit of the line over the points, J.</param>
/// <param name="SecondLawEnthalpy">dH at 298.15 K, J, or null where the database lacks heats.</param>
/// <param name="SecondLawEntropy">dS at 298.15 K, J/K, or null.</param>
/// <param name="ThirdLawEnthalpy">dH at 298.15 K with the database's entropies, J, or null.</param>
/// <param name="ThirdLawTrend">Slope of the third-law enthalpies over T, J/K: 0 within its limit where entropies and measurement agree.</param>
/// <param name="DatabaseEnthalpy">dH at 298.15 K of the database, J, or null.</param>
/// <param name="DatabaseEntropy">dS at 298.15 K of the database, J/K, or null.</param>
/// <param name="Notes">Why something is missing.</param>
public sealed record CoupleFitResult(
    Reaction Formation,
    ImmutableArray<FittedPoint> Points,
    FittedValue Constant,
    FittedValue Slope,
    double LineLimit,
    FittedValue? SecondLawEnthalpy,
    FittedValue? SecondLawEntropy,
    FittedValue? ThirdLawEnthalpy,
    FittedValue? ThirdLawTrend,
    double? DatabaseEnthalpy,
    double? DatabaseEntropy,
    ImmutableArray<string> Notes);
