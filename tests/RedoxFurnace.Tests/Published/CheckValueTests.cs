using RedoxFurnace.Quantities;

namespace RedoxFurnace.Tests.Published;

/// <summary>Single published values of check-values.csv against the database; each row names its source.</summary>
public class CheckValueTests
{
    private static readonly string[] Subjects =
        ["gas ratios", "buffers", "graphite", "carbothermic onset", "silicothermic magnesium", "probe", "thermite heat", "thermite temperature", "furnace practice"];

    /// <summary>Rows nothing was fitted to.</summary>
    public static TheoryData<string> Tested => CheckLedger.Of("tested", Subjects);

    /// <summary>Rows the assessment used.</summary>
    public static TheoryData<string> Fitted => CheckLedger.Of("fitted", Subjects);

    /// <summary>Rows known to disagree.</summary>
    public static TheoryData<string> Misses => CheckLedger.Of("miss", Subjects);

    [Theory, MemberData(nameof(Tested))]
    public void A_published_value_is_met(string id) => AssertMet(id);

    // No evidence: these rows evaluate measurements the assessment was fitted to.
    [Theory, MemberData(nameof(Fitted))]
    public void A_value_the_assessment_used_is_met(string id) => AssertMet(id);

    [Theory, MemberData(nameof(Misses))]
    public void A_known_miss_is_still_a_miss(string id)
    {
        PublishedRow row = CheckLedger.Values[id];
        (double low, double high) = Tolerance.Band(row.Number("value"), row["tolerance"]);
        Assert.NotInRange(CheckCalculation.Found(row), low, high);
    }

    // dG0 = dH0 - T dS0 and K = exp(-dG0/RT): 55.8 kJ/mol and -0.081 kJ/(mol K) at 298.15 K give +80 kJ/mol and 1.0e-14. Common practice, no source.
    [Fact]
    public void The_ion_product_of_water_follows_from_its_heat_and_entropy()
    {
        double gibbs = 55800 - (298.15 * -81);
        Assert.Equal(80, gibbs / 1000, 0.1);
        Assert.Equal(1.0e-14, Math.Exp(-gibbs / (PhysicalConstants.GasConstant * 298.15)), 0.05e-14);
    }

    private static void AssertMet(string id)
    {
        PublishedRow row = CheckLedger.Values[id];
        Tolerance.AssertWithin(row.Number("value"), row["tolerance"], CheckCalculation.Found(row));
    }
}
