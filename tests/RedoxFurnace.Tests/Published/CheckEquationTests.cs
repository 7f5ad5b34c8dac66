using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Published;

/// <summary>Published equations in T of check-values.csv and carbide-nitride-lines.csv, at nine equal steps of their range.</summary>
public class CheckEquationTests
{
    private const int Steps = 8;
    private const double CarbonShareOfVC088 = 0.88 / 1.88;

    private static readonly PublishedTable Equations = PublishedTable.Load("check-equations.csv");

    /// <summary>Equations nothing was fitted to.</summary>
    public static TheoryData<string> Tested => CheckLedger.Of("tested", "equation lines");

    /// <summary>Equations the assessment or the database used.</summary>
    public static TheoryData<string> Fitted => CheckLedger.Of("fitted", "equation lines");

    /// <summary>Equations known to disagree.</summary>
    public static TheoryData<string> Misses => CheckLedger.Of("miss", "equation lines");

    [Theory, MemberData(nameof(Tested))]
    public void A_published_equation_is_met_over_its_range(string id) => AssertMet(id);

    // No evidence: the assessment was fitted to these, or the database took the very line.
    [Theory, MemberData(nameof(Fitted))]
    public void An_equation_the_database_used_is_met_over_its_range(string id) => AssertMet(id);

    [Theory, MemberData(nameof(Misses))]
    public void A_known_miss_is_still_a_miss(string id)
    {
        if (CheckLedger.Ledger[id]["reason"].StartsWith("no data", StringComparison.Ordinal))
        {
            Assert.ThrowsAny<Exception>(() => LargestDifference(id));
        }
        else
        {
            Assert.True(LargestDifference(id) > Allowed(id), $"{id} agrees now: move it to 'tested'");
        }
    }

    [Fact]
    public void Every_equation_of_the_ledger_has_its_spelling() => Assert.Equal(
        CheckLedger.Ledger.Rows.Where(row => row["subject"] == "equation lines").Select(row => row["id"]).Order(StringComparer.Ordinal),
        Equations.Rows.Select(row => row["id"]).Order(StringComparer.Ordinal));

    [Fact]
    public void Every_spelling_is_balanced() => Assert.All(
        Equations.Rows.Where(row => row["equation"].Contains('=', StringComparison.Ordinal)),
        row => Assert.Equal(0, ReactionEquation.Parse(row["equation"]).LargestImbalance(Formula.Parse), 1e-9));

    private static void AssertMet(string id)
    {
        double allowed = Allowed(id);
        Assert.InRange(LargestDifference(id), 0, allowed);
    }

    private static double Allowed(string id)
    {
        (double low, double high) = Tolerance.Band(0, CheckLedger.Values[id]["tolerance"]);
        return (high - low) / 2;
    }

    private static double LargestDifference(string id)
    {
        PublishedRow equation = Equations[id];
        if (equation["form"] == "zero_K")
        {
            double zero = PublishedEquation.Root(
                kelvin => PublishedEquation.StandardGibbs(equation["equation"], kelvin), equation.Number("t_min_K"), equation.Number("t_max_K"));
            return Math.Abs(zero - CheckLedger.Values[id].Number("value"));
        }

        double low = equation.Number("t_min_K"), high = equation.Number("t_max_K");
        return Enumerable.Range(0, Steps + 1).Max(i => Math.Abs(Difference(equation, CheckLedger.Values[id]["value"], low + (i * (high - low) / Steps))));
    }

    private static double Difference(PublishedRow equation, string value, double kelvin)
    {
        string text = equation["equation"];
        double moles = equation.Number("moles");
        double published = PublishedExpression.Evaluate(
            value.Replace("XC", FormattableString.Invariant($"{CarbonShareOfVC088:R}"), StringComparison.Ordinal), kelvin);
        double gibbs = PublishedEquation.StandardGibbs(text, kelvin) / (text.Contains('=', StringComparison.Ordinal) ? moles : 1);
        return equation["form"] switch
        {
            "gibbs_J" => (gibbs - (published / moles)) / 1000,
            "gibbs_kJ" => (gibbs / 1000) - (published / moles),
            "log10_bar" => PublishedEquation.Log10Bar(text, kelvin) - published,
            "log10_atm" => PublishedEquation.Log10Bar(text, kelvin) - Math.Log10(PhysicalConstants.AtmosphereInBar) - published,
            string other => throw new InvalidDataException(other),
        };
    }
}
