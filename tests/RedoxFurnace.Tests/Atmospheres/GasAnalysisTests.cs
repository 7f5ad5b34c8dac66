using RedoxFurnace.Atmospheres;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Tests.Atmospheres;

public class GasAnalysisTests
{
    [Fact]
    public void Shares_are_of_the_dry_gas_and_the_reading_comes_on_top()
    {
        GasMixture gas = GasSamples.Parse("H2 30%, Ar 70%, frost -45C");
        Assert.Equal(71.1e-6, gas[GasSpecies.H2O], 0.5e-6);
        Assert.Equal(0.3 / 0.7, gas[GasSpecies.H2] / gas[GasSpecies.Ar], 12);
    }

    [Fact]
    public void Shares_near_100_percent_are_normalised_with_a_note()
    {
        GasAnalysis analysis = GasAnalysis.Parse("H2 10%, N2 88.5%", GasSamples.Atmosphere);
        Assert.Equal(10 / 98.5, analysis.Meanings[0].Mixture[GasSpecies.H2], 12);
        Assert.Contains(analysis.Notes, note => note.Contains("98.5 %", StringComparison.Ordinal));
    }

    [Fact]
    public void Exact_shares_need_no_note() => Assert.Empty(GasAnalysis.Parse("H2 30%, Ar 70%", GasSamples.Atmosphere).Notes);

    [Fact]
    public void A_large_rest_is_nitrogen_with_a_note_and_a_question()
    {
        GasAnalysis analysis = GasAnalysis.Parse("CO 20%, CO2 0.4%, H2 40%", GasSamples.Atmosphere);
        Assert.Equal(0.396, analysis.Meanings[0].Mixture[GasSpecies.N2], 12);
        Assert.Single(analysis.Notes);
        Assert.Single(analysis.Ask);
    }

    [Fact]
    public void The_balance_takes_the_rest()
    {
        GasMixture gas = GasSamples.Parse("Ar, O2 5ppm, H2O 10ppm");
        Assert.Equal(1 - 15e-6, gas[GasSpecies.Ar], 12);
        AssertSame(gas, GasSamples.Parse("balance Ar, O2 5ppm, H2O 10ppm"));
        AssertSame(gas, GasSamples.Parse("O2 5ppm, Ar balance, H2O 10ppm"));
    }

    [Fact]
    public void Order_and_style_of_writing_change_nothing()
        => AssertSame(GasSamples.Parse("H2 30%, Ar 70%, frost -45C"), GasSamples.Parse("frost -45C, 70% Ar, H2=30%"));

    [Fact]
    public void A_later_text_overrides_what_it_speaks_of()
    {
        GasMixture gas = GasSamples.Parse(GeneratorGas.Get("endo", GasSamples.Database).Analysis, "CO 18%, dew -5C");
        Assert.Equal(0.18, gas[GasSpecies.CO] / (1 - gas[GasSpecies.H2O]), 9);
        Assert.True(gas[GasSpecies.H2O] < 0.005);
    }

    [Fact]
    public void A_ratio_sets_the_gas_that_was_not_given()
        => Assert.Equal(0.01, GasSamples.Parse("CO 20%, CO/CO2 20, N2 balance")[GasSpecies.CO2], 12);

    [Theory]
    [InlineData("H2 60%, N2 70%", "130 %")]
    [InlineData("H2 130%", "100%")]
    [InlineData("H2 -3%", "100%")]
    [InlineData("H2 30%, Ar 70%, frost -45C, H2O 0.5%", "water is given twice")]
    [InlineData("H2 30%, N2 balance, frost -45C, dew +3C", "water is given twice")]
    [InlineData("H2 30%, H2 20%", "H2 is given twice")]
    [InlineData("Hh 30%", "did you mean")]
    [InlineData("H2 30", "no unit")]
    [InlineData("H2, N2", "balance")]
    [InlineData("", "empty")]
    [InlineData("CO 20%, CO2 1%, CO/CO2 99, N2 balance", "contradicts")]
    [InlineData("N2 balance, H2O/H2 0.1", "hydrogen")]
    [InlineData("5 30%", "not known")]
    public void A_wrong_analysis_is_refused_in_one_line(string text, string said)
    {
        RequestException refusal = Assert.Throws<RequestException>(() => GasAnalysis.Parse(text, GasSamples.Atmosphere));
        Assert.Contains(said, refusal.Message, StringComparison.Ordinal);
        Assert.DoesNotContain("\n", refusal.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Water_given_twice_that_agrees_is_taken_once()
        => Assert.Equal(71.1e-6, GasSamples.Parse("H2 30%, Ar 70%, frost -45C, H2O 71ppm")[GasSpecies.H2O], 0.5e-6);

    [Fact]
    public void Every_generator_gas_reads_and_cites_its_source()
    {
        Assert.All(GeneratorGas.All(GasSamples.Database), gas =>
        {
            Assert.NotEmpty(gas.Source);
            Assert.NotEmpty(gas.Typical);
            Assert.Contains(gas.Provenance, new[] { "memory", "retrieved" });
            Assert.Equal(1, GasSamples.Parse(gas.Analysis).Fractions.Sum(), 12);
        });
        Assert.Equal("endothermic", GeneratorGas.Get("endogas", GasSamples.Database).Id);
        Assert.Throws<RequestException>(() => GeneratorGas.Get("endothermal", GasSamples.Database));
    }

    [Fact]
    public void Dissociated_ammonia_is_three_parts_hydrogen_to_one_of_nitrogen()
    {
        GasMixture gas = GasSamples.Parse(GeneratorGas.Get("dissociated-ammonia", GasSamples.Database).Analysis);
        Assert.Equal(3, gas[GasSpecies.H2] / gas[GasSpecies.N2], 9);
        Assert.True(gas[GasSpecies.NH3] > 0);
    }

    private static void AssertSame(GasMixture one, GasMixture two)
        => Assert.All(one.Fractions.Zip(two.Fractions), pair => Assert.Equal(pair.First, pair.Second, 15));
}
