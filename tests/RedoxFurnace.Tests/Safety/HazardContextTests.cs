using RedoxFurnace.Safety;

namespace RedoxFurnace.Tests.Safety;

public class HazardContextTests
{
    [Fact]
    public void A_vapour_counts_with_and_without_its_mark()
    {
        HazardContext context = new(["Mg(g)", "Ca(OH)2"], []);
        Assert.Equal(["Ca(OH)2", "Mg", "Mg(g)"], context.Formulas.Order(StringComparer.Ordinal));
        Assert.Equal(["Ca", "H", "Mg", "O"], context.Elements.Order(StringComparer.Ordinal));
    }

    [Theory]
    [InlineData(500.0, 400.0)]
    [InlineData(0.0, 400.0)]
    [InlineData(double.NaN, 400.0)]
    [InlineData(300.0, double.PositiveInfinity)]
    public void An_impossible_temperature_range_is_refused(double lowest, double highest) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => new HazardContext([], [], lowest, highest));

    [Theory]
    [InlineData("Cr2O3", "Al", HazardTags.Thermite, true)]
    [InlineData("Cr2O3", "Al", HazardTags.Powder, true)]
    [InlineData("Cr2O3", "Al", HazardTags.MoltenMetal, true)]
    [InlineData("MgO", "FeSi75", HazardTags.Thermite, true)]
    [InlineData("Cr2O3", "H2", HazardTags.Thermite, false)]
    [InlineData("Cr2O3", "H2", HazardTags.FlammableGas, true)]
    [InlineData("Cr2O3", "C", HazardTags.FlammableGas, true)]
    [InlineData("H2O", "Al", HazardTags.Thermite, false)]
    [InlineData("CO2", "Mg", HazardTags.Thermite, false)]
    [InlineData("P2O5", "Al", HazardTags.Thermite, true)]
    [InlineData("Cr", "Al", HazardTags.Thermite, false)]
    [InlineData("WO3", "H2", HazardTags.FreshMetal, true)]
    [InlineData("WO3", "H2", HazardTags.MoltenMetal, false)]
    public void Circumstances_follow_from_the_work(string charge, string reductant, string tag, bool expected)
    {
        HazardContext context = HazardContextBuilder.Build(new HazardWork
        {
            Charge = [charge],
            Reductants = [reductant],
            LowestKelvin = 298,
            HighestKelvin = 900,
        });
        Assert.Equal(expected, context.Tags.Contains(tag));
    }

    [Fact]
    public void Carbon_against_an_oxide_makes_carbon_monoxide()
    {
        Assert.Contains("CO", HazardContextBuilder.Build(new HazardWork { Charge = ["FeO"], Reductants = ["C"] }).Formulas);
        Assert.DoesNotContain("CO", HazardContextBuilder.Build(new HazardWork { Charge = ["Fe"], Reductants = ["C"] }).Formulas);
    }

    [Theory]
    [InlineData(900, false)]
    [InlineData(1000, true)]
    public void A_metal_counts_as_molten_above_its_melting_point(double kelvin, bool molten) => Assert.Equal(
        molten, HazardContextBuilder.Build(new HazardWork { Products = ["Al"], HighestKelvin = kelvin }).Tags.Contains(HazardTags.MoltenMetal));

    [Fact]
    public void Vacuum_and_given_tags_are_kept()
    {
        HazardContext context = HazardContextBuilder.Build(new HazardWork { Vacuum = true, Tags = [HazardTags.Cooling] });
        Assert.Equal([HazardTags.Cooling, HazardTags.Vacuum], context.Tags.Order(StringComparer.Ordinal));
    }
}
