using System.Collections.Immutable;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Tests.Atmospheres;

public class MetalsInGasTests
{
    [Theory]
    [InlineData(927, -40.3)]
    [InlineData(982, -35.5)]
    [InlineData(1038, -30.9)]
    [InlineData(1066, -28.7)]
    [InlineData(1149, -22.3)]
    public void Chromium_turns_bright_in_hydrogen_at_the_published_dew_points(double celsius, double published)
    {
        // Rows G6-004 to G6-009 of check-values.csv: dew point (frost scale below 0 C) of 1 atm H2 over Cr + Cr2O3; band of 3 C.
        MetalInGas chromium = Judge("H2, frost -60C", celsius, "Cr")[0];
        Assert.Equal(BrightVerdict.Bright, chromium.Verdict);
        Assert.Equal(published, chromium.LimitWater!.Value.FrostPointKelvin!.Value - 273.15, 3.0);
    }

    [Fact]
    public void Dissolved_chromium_is_easier_to_keep_bright_than_pure_by_four_thirds_of_its_activity()
    {
        double pure = Judge("H2, frost -60C", 1000, "Cr")[0].LimitLogOxygen!.Value;
        double dissolved = Judge("H2, frost -60C", 1000, "Cr=0.2")[0].LimitLogOxygen!.Value;
        Assert.Equal(-4.0 / 3 * Math.Log(0.2), dissolved - pure, 1e-9);
    }

    [Fact]
    public void Iron_bright_at_soak_blues_on_cooling()
    {
        // H2/H2O needed for iron rises from about 2.1 at 760 C to about 100 at 200 C.
        MetalInGas iron = Judge("H2 75%, N2 balance, H2O/H2 0.1", 760, "Fe")[0];
        Assert.Equal(BrightVerdict.Bright, iron.Verdict);
        Assert.NotNull(iron.OxidisesBelowKelvin);
        Assert.InRange(iron.OxidisesBelowKelvin!.Value - 273.15, 250, 450);
        double needed = 0.75 / Judge("H2 75%, N2 balance, frost -60C", 760, "Fe")[0].LimitWater!.Value.Share;
        Assert.InRange(needed, 1.9, 2.3);
    }

    [Fact]
    public void Every_element_is_listed_the_most_demanding_first()
    {
        ImmutableArray<MetalInGas> metals = Judge("H2 30%, Ar 70%, frost -45C", 950, "Cr=18%,Ni=9%,Al=0.05%,Ti=0.02%,Fe");
        Assert.Equal(["Al", "Ti", "Cr", "Fe", "Ni"], metals.Select(metal => metal.Element.Symbol));
        Assert.Equal(metals.OrderBy(metal => metal.Margin).Select(metal => metal.Element.Symbol), metals.Select(metal => metal.Element.Symbol));
    }

    [Fact]
    public void Mass_percents_become_mole_fractions_with_iron_as_the_rest_and_say_so()
    {
        Alloy alloy = Alloy.Parse("Cr=18%,Ni=9%", null, GasSamples.Database);
        Assert.Equal(1, alloy.Elements.Sum(element => element.MoleFraction!.Value), 12);
        Assert.Equal(0.191, alloy.Elements[0].Activity, 0.001);
        Assert.Contains(alloy.Notes, note => note.Contains("taken as Fe", StringComparison.Ordinal));
        Assert.Contains(alloy.Notes, note => note.Contains("mole fractions", StringComparison.Ordinal));
        Assert.Equal(2 * alloy.Elements[0].Activity, Alloy.Parse("Cr=18%,Ni=9%", "Cr=2", GasSamples.Database).Elements[0].Activity, 12);
    }

    [Fact]
    public void Titanium_in_hydrogen_and_tough_pitch_copper_are_warned_of()
    {
        ImmutableArray<MetalInGas> metals = Judge("H2, frost -60C", 700, "Ti,Cu,Fe");
        Assert.Contains("brittle", metals.Single(metal => metal.Element.Symbol == "Ti").Notes[0], StringComparison.Ordinal);
        Assert.Contains("tough pitch", metals.Single(metal => metal.Element.Symbol == "Cu").Notes[0], StringComparison.Ordinal);
        Assert.Empty(metals.Single(metal => metal.Element.Symbol == "Fe").Notes);
        Assert.Empty(Judge("Ar, O2 5ppm", 700, "Cu")[0].Notes);
    }

    [Fact]
    public void Vacuum_is_not_zero_oxygen()
    {
        // 1e-4 mbar of air: 2e-8 bar O2, about 250 times below 5 ppm O2 in 1 bar of argon, still some 1e40 above Ti/TiO at 700 C.
        GasMixture air = GasSamples.Parse(GeneratorGas.Get("vacuum-air", GasSamples.Database).Analysis);
        GasState state = GasSamples.Equilibrium.AsAnalysed(air, Temperature.FromCelsius(700), Pressure.Parse("1e-4mbar"));
        Assert.Equal(Math.Log10(2.1e-8), state.Log10Oxygen!.Value, 0.02);
        Assert.InRange(5e-6 / Math.Pow(10, state.Log10Oxygen.Value), 200, 300);
        MetalInGas titanium = new MetalsInGas(GasSamples.Database).Judge(Alloy.Parse("Ti", null, GasSamples.Database), state, air)[0];
        Assert.InRange(state.Log10Oxygen.Value - (titanium.LimitLogOxygen!.Value / Math.Log(10)), 38, 46);
        Assert.True(titanium.Nitride!.Forms);
    }

    [Fact]
    public void Chromium_takes_nitrogen_from_dissociated_ammonia_when_it_cools()
    {
        Assert.True(Judge("H2 75%, N2 25%, frost -60C", 800, "Cr=0.2")[0].Nitride!.Forms);
        Assert.False(Judge("H2 75%, N2 25%, frost -60C", 1200, "Cr=0.2")[0].Nitride!.Forms);
    }

    [Fact]
    public void A_gas_without_an_oxygen_pressure_gives_no_verdict_and_says_what_to_give()
    {
        MetalInGas iron = Judge("N2 50%, Ar 50%", 900, "Fe")[0];
        Assert.Equal(BrightVerdict.NotDecidable, iron.Verdict);
        Assert.Contains(iron.Notes, note => note.Contains("ppm of O2", StringComparison.Ordinal));
    }

    [Fact]
    public void The_limit_is_the_ladder_s_own_step()
    {
        OxideLadder ladder = OxideSystem.OfMetal("Mn", GasSamples.Database, Activities.AllOne).LadderAt(1200, null);
        MetalInGas manganese = Judge("H2, frost -60C", 1200 - 273.15, "Mn")[0];
        Assert.Equal(ladder.Steps[0].OxygenPotential!.Value, manganese.LimitLogOxygen!.Value * PhysicalConstants.GasConstant * 1200, 1e-3);
    }

    [Theory]
    [InlineData("Xx=0.2", "not known")]
    [InlineData("Cr=18%,Ni=0.2", "mixes")]
    [InlineData("Cr=80%,Ni=40%", "120 %")]
    [InlineData("Cr=-1", "above 0")]
    [InlineData("Cr,Cr", "twice")]
    [InlineData("", "empty")]
    [InlineData("Cr=18%,Ni,Fe", "only one can be the balance")]
    public void Wrong_parts_are_refused(string text, string said)
        => Assert.Contains(said, Assert.Throws<RequestException>(() => Alloy.Parse(text, null, GasSamples.Database)).Message, StringComparison.Ordinal);

    private static ImmutableArray<MetalInGas> Judge(string gas, double celsius, string over)
    {
        GasMixture mixture = GasSamples.Parse(gas);
        GasState state = GasSamples.Equilibrium.AsAnalysed(mixture, Temperature.FromCelsius(celsius), GasSamples.Atmosphere);
        return new MetalsInGas(GasSamples.Database).Judge(Alloy.Parse(over, null, GasSamples.Database), state, mixture);
    }
}
