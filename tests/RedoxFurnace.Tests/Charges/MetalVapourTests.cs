using System.Collections.Immutable;
using RedoxFurnace.Charges;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Charges;

/// <summary>Magnesium over a silicothermic charge.</summary>
public class MetalVapourTests
{
    /// <summary>
    /// 2 CaO + 2 MgO + Si: 1.4, 2.7, 5.0 and 8.9 kPa at 1100 to 1250 C within a factor 1.5 (Pidgeon and King 1948 as collected; from memory).
    /// </summary>
    [Theory]
    [InlineData(1100, 1.4)]
    [InlineData(1150, 2.7)]
    [InlineData(1200, 5.0)]
    [InlineData(1250, 8.9)]
    public void Over_dolime_and_silicon_magnesium_has_the_published_pressure(double celsius, double kilopascal)
    {
        Dictionary<string, double> charge = new() { ["Mg"] = 2, ["Ca"] = 2, ["O"] = 4, ["Si"] = 1 };
        double found = Math.Exp(Along(charge, celsius, 0)[0].NaturalLogBar) * 100;
        Assert.InRange(found, kilopascal / 1.5, kilopascal * 1.5);
    }

    /// <summary>Without lime half the magnesium stays as forsterite: about 230 Pa at first, about 2 Pa once the magnesia is used up (common practice, no source).</summary>
    [Fact]
    public void Without_lime_the_pressure_falls_when_forsterite_is_all_that_is_left()
    {
        Dictionary<string, double> charge = new() { ["Mg"] = 2, ["O"] = 2, ["Si"] = 1 };
        ImmutableArray<MetalVapourOverCharge> along = Along(charge, 1200, 0, 0.4, 0.6);
        Assert.InRange(Math.Exp(along[0].NaturalLogBar) * 1e5, 150, 350);
        Assert.InRange(Math.Exp(along[1].NaturalLogBar) * 1e5, 150, 350);
        Assert.InRange(Math.Exp(along[2].NaturalLogBar) * 1e5, 1, 4);
        Assert.Contains("Mg2SiO4", along[1].Phases);
    }

    private static ImmutableArray<MetalVapourOverCharge> Along(Dictionary<string, double> charge, double celsius, params double[] drawn)
        => MetalVapourOverCharge.Along(charge, "Mg", celsius + 273.15, drawn, SubstanceDatabase.Bundled);
}
