using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;
using RedoxFurnace.Tests.Published;

namespace RedoxFurnace.Tests.Oxidation;

/// <summary>The ladder of iron, the one most users know by heart, against what was measured.</summary>
public class IronLadderTests
{
    private static readonly OxideSystem Iron = OxideSystem.OfMetal("Fe", SubstanceDatabase.Bundled, Activities.AllOne);
    private static readonly GasReactions Gases = new(SubstanceDatabase.Bundled);

    // 560 to 580 C in the sources: Chaudron 1921 (580 +- 20), O'Neill 1988 and textbooks (570), from memory where not in the table.
    [Fact]
    public void Wustite_joins_the_ladder_between_560_and_580_C()
    {
        LadderInvariant limit = Assert.Single(LadderInvariants.Between(Iron, 700, 1600), change => change.Phase == "wustite");
        Assert.True(limit.JoinsAbove);
        Assert.InRange(limit.Kelvin - 273.15, 560, 580);
    }

    // Emmett and Schultz 1930, J. Am. Chem. Soc. 52, 4268: pH2O/pH2 over iron and wustite.
    [Theory]
    [InlineData(600, 0.332)]
    [InlineData(800, 0.499)]
    public void Iron_and_wustite_meet_the_gas_ratios_of_1930_within_3_percent(double celsius, double published) =>
        Assert.Equal(1, WaterRatio("Fe", celsius + 273.15) / published, 0.03);

    // Emmett and Schultz 1930: pH2O/pH2 over wustite and magnetite, kept out of the assessment.
    [Fact]
    public void Wustite_and_magnetite_meet_the_gas_ratio_of_1930_within_15_percent() =>
        Assert.Equal(1, WaterRatio("wustite", 1073.15) / 2.37, 0.15);

    // O'Neill 1988, Am. Mineral. 73, 470-486: mu(O2) of wustite and magnetite, from memory.
    [Theory]
    [InlineData(600)]
    [InlineData(700)]
    [InlineData(800)]
    [InlineData(900)]
    [InlineData(1000)]
    public void Wustite_and_magnetite_meet_the_line_of_1988_within_15_percent(double celsius)
    {
        double kelvin = celsius + 273.15;
        double line = PublishedExpression.Evaluate("-581927-65.618*T+38.7410*T*ln(T)", kelvin);
        double published = Math.Exp(-GasReactions.RatioOfPotential(Gases.HydrogenOxidation, kelvin, line));
        Assert.Equal(1, WaterRatio("wustite", kelvin) / published, 0.15);
    }

    // Hemingway 1990, Am. Mineral. 75, 781-790: 6 Fe2O3 = 4 Fe3O4 + O2.
    [Theory]
    [InlineData(1050)]
    [InlineData(1200)]
    [InlineData(1400)]
    [InlineData(1600)]
    public void Magnetite_and_hematite_meet_the_line_of_1990_within_0_2(double kelvin)
    {
        double published = -(501348 - (285.4 * kelvin)) / (PhysicalConstants.GasConstant * kelvin * Math.Log(10));
        Assert.Equal(published, OxygenPotentialReadings.Log10Bar(Potential("Fe3O4", kelvin), kelvin), 0.2);
    }

    [Theory]
    [InlineData(500, "Fe Fe3O4 Fe2O3")]
    [InlineData(570, "Fe wustite Fe3O4 Fe2O3")]
    [InlineData(800, "Fe wustite Fe3O4 Fe2O3")]
    [InlineData(1350, "Fe wustite Fe3O4 Fe2O3")]
    public void The_rungs_stand_in_order_and_wustite_is_one_of_them(double celsius, string rungs) =>
        Assert.Equal(rungs, string.Join(' ', Iron.LadderAt(celsius + 273.15).Rungs.Select(rung => rung.Name)));

    [Theory]
    [InlineData(570)]
    [InlineData(800)]
    [InlineData(1000)]
    [InlineData(1350)]
    public void The_metal_rich_end_of_wustite_stands_beside_iron(double celsius)
    {
        LadderRung wustite = Iron.LadderAt(celsius + 273.15).Rungs.Single(rung => rung.Name == "wustite");
        Assert.Equal("Fe0.947O", wustite.Lowest.Id);
    }

    [Theory]
    [InlineData(850)]
    [InlineData(1000)]
    [InlineData(1300)]
    [InlineData(1600)]
    public void The_hull_picks_the_boundaries_that_the_members_give_one_by_one(double kelvin)
    {
        Assert.Equal(PublishedEquation.StandardGibbs("Fe/wustite", kelvin), Potential("Fe", kelvin), 1e-3);
        Assert.Equal(PublishedEquation.StandardGibbs("wustite/Fe3O4", kelvin), Potential("wustite", kelvin), 1e-3);
    }

    private static double Potential(string lowerRung, double kelvin)
    {
        OxideLadder ladder = Iron.LadderAt(kelvin);
        int at = ladder.Rungs.ToList().FindIndex(rung => rung.Name == lowerRung);
        return ladder.Steps[at].OxygenPotential!.Value;
    }

    private static double WaterRatio(string lowerRung, double kelvin) =>
        Math.Exp(-GasReactions.RatioOfPotential(Gases.HydrogenOxidation, kelvin, Potential(lowerRung, kelvin)));
}
