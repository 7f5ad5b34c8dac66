using RedoxFurnace.Assessments;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Assessments;

/// <summary>The adjustment against the entries of the database and against figures reckoned apart from this program.</summary>
public class OxideAssessmentTests
{
    private static readonly AssessmentResult Result = OxideAssessment.Of(MeasurementTable.Of(SubstanceDatabase.Bundled), SubstanceDatabase.Bundled);

    [Fact]
    public void The_database_holds_what_the_measurements_give()
    {
        Assert.All(Result.Quantities, quantity => Assert.True(
            Math.Abs(quantity.OffDatabase) <= 0.05, FormattableString.Invariant($"{quantity.Substance} {(quantity.IsEntropy ? "S" : "H")}: database {quantity.InDatabase:0.000}, assessed {quantity.Assessed:0.000}")));
        Assert.Equal(15, Result.Quantities.Count(quantity => quantity.IsFree));
    }

    // An independent recomputation of the same adjustment found 74 observations, 59 degrees of freedom and chi-squared 60.1.
    [Fact]
    public void Chi_squared_is_that_of_an_independent_recomputation()
    {
        Assert.Equal(55, Result.CoupleObservations);
        Assert.Equal(19, Result.PriorObservations);
        Assert.Equal(59, Result.DegreesOfFreedom);
        Assert.InRange(Result.ChiSquared, 59.6, 60.6);
    }

    // Root mean squares in kJ/mol O2 of the same recomputation, one decimal: fitted before and after, kept out before and after.
    // CoO/Co3O4 is not among them: its raw heat capacities were replaced with their rows.
    [Theory]
    [InlineData("Fe/Fe3O4", 1.5, 0.8, 1.5, 0.8)]
    [InlineData("Fe3O4/Fe2O3", 19.5, 3.3, 21.1, 2.7)]
    [InlineData("Fe0.947O/Fe3O4", 17.9, 0.6, 14.4, 2.2)]
    [InlineData("Cr/Cr2O3", 7.7, 0.8, 7.3, 0.8)]
    [InlineData("Nb/NbO", 26.6, 0.1, 25.1, 2.0)]
    [InlineData("Nb/NbO2", 2.6, 0.2, 2.6, 2.3)]
    [InlineData("PbO/Pb3O4", 20.5, 2.3, 22.0, 3.5)]
    public void Differences_are_those_of_an_independent_recomputation(string couple, double fittedBefore, double fittedAfter, double outBefore, double outAfter)
    {
        (double Expected, double? Found)[] pairs =
        [
            (fittedBefore, Result.RootMeanSquare(couple, true, true)), (fittedAfter, Result.RootMeanSquare(couple, true, false)),
            (outBefore, Result.RootMeanSquare(couple, false, true)), (outAfter, Result.RootMeanSquare(couple, false, false)),
        ];
        Assert.All(pairs, pair => Assert.InRange(pair.Found!.Value / 1000, pair.Expected - 0.15, pair.Expected + 0.15));
    }
}
