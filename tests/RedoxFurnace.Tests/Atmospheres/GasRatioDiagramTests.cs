using RedoxFurnace.Atmospheres;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Tests.Atmospheres;

public class GasRatioDiagramTests
{
    private static GasRatioDiagram Diagram(string element) => GasRatioDiagram.Of(
        element, Temperature.FromCelsius(400), Temperature.FromCelsius(1200), 25, [Pressure.Standard, Pressure.FromBar(0.1)], Activities.AllOne, GasSamples.Database);

    [Theory]
    [InlineData("Fe")]
    [InlineData("Co")]
    [InlineData("Mn")]
    [InlineData("V")]
    public void Boundaries_are_the_ladder_s_numbers(string element)
    {
        GasRatioDiagram diagram = Diagram(element);
        OxideSystem system = OxideSystem.OfMetal(element, GasSamples.Database, Activities.AllOne);
        foreach ((GasRatioBoundary boundary, Reaction oxidation) in diagram.Monoxide.Select(line => (line, GasSamples.Reactions.CarbonMonoxideOxidation))
            .Concat(diagram.Hydrogen.Select(line => (line, GasSamples.Reactions.HydrogenOxidation))))
        {
            foreach (GasRatioPoint point in boundary.Points)
            {
                LadderStep step = system.LadderAt(point.Kelvin, null).Steps.Single(one => one.Couple.Name == boundary.Couple);
                Assert.Equal(step.OxygenPotential!.Value, GasReactions.PotentialOfRatio(oxidation, point.Kelvin, point.NaturalLogRatio), 1e-6);
            }
        }
    }

    [Fact]
    public void Iron_magnetite_and_wustite_meet_near_570_C()
    {
        GasRatioDiagram iron = Diagram("Fe");
        double end = iron.Monoxide.Single(line => line.Couple == "Fe/Fe3O4").Points[^1].Kelvin;
        double start = iron.Monoxide.Single(line => line.Couple == "Fe/wustite").Points[0].Kelvin;
        Assert.Equal(end, start, 0.02);
        Assert.InRange(end - 273.15, 555, 585);
        Assert.Contains(iron.Invariants, invariant => Math.Abs(invariant.Kelvin - end) < 0.02);
    }

    [Fact]
    public void Graphite_crosses_iron_and_wustite_at_the_published_temperature()
    {
        // 685 C at 1 atm of CO + CO2 (row G2-087 of check-values.csv); band of 30 C.
        GasRatioDiagram iron = Diagram("Fe");
        GraphiteBoundary graphite = iron.Graphite[0];
        GasRatioBoundary wustite = iron.Monoxide.Single(line => line.Couple == "Fe/wustite");
        double crossing = wustite.Points.First(point => graphite.Points.Single(other => other.Kelvin == point.Kelvin).Share > point.Share).Kelvin;
        Assert.Equal(685, crossing - 273.15, 30.0);
    }

    /// <summary>The emf cells of Cr/Cr2O3 (Holzheid and O'Neill 1995) repeat to better than 1 kJ/mol O2; the calorimetric error of Cr2O3, 8.4 kJ/mol (Robie and Hemingway 1995), alone makes 5.6.</summary>
    [Fact]
    public void A_boundary_is_known_as_well_as_its_couple_was_measured_not_as_its_oxide_by_itself()
    {
        GasRatioBoundary chromia = Diagram("Cr").Hydrogen.Single(line => line.Couple == "Cr/Cr2O3");
        foreach (GasRatioPoint point in chromia.Points.Where(point => point.Kelvin is > 1100 and < 1400))
        {
            Assert.InRange(point.ExpandedUncertainty * 2 * PhysicalConstants.GasConstant * point.Kelvin / 1000, 0.5, 3);
        }
    }

    /// <summary>FeO stands above about 570 C only, and near 850 C one pass can use only about one third of H2 or CO (common practice, no source).</summary>
    [Fact]
    public void One_pass_over_wustite_uses_about_a_third_of_the_gas()
    {
        GasRatioDiagram iron = Diagram("Fe");
        foreach (GasRatioBoundary boundary in new[] { iron.Monoxide.Single(line => line.Couple == "Fe/wustite"), iron.Hydrogen.Single(line => line.Couple == "Fe/wustite") })
        {
            double share = boundary.Points.Single(point => Math.Abs(point.Kelvin - 273.15 - 850) < 0.01).Share;
            Assert.Equal(1.0 / 3, 1 - share, 0.05);
        }
    }

    [Fact]
    public void Monoxide_and_hydrogen_read_alike_where_the_water_gas_constant_is_one()
    {
        // Near 820 C; the published constants 1.44 at 1000 K and 0.729 at 1200 K (NIST-JANAF, from memory) put K = 1 at 1092 to 1100 K.
        GasRatioDiagram iron = Diagram("Fe");
        GasRatioPoint[] monoxide = [.. iron.Monoxide.Single(line => line.Couple == "Fe/wustite").Points];
        double alike = monoxide.Zip(iron.Hydrogen.Single(line => line.Couple == "Fe/wustite").Points).MinBy(pair => Math.Abs(pair.First.Share - pair.Second.Share)).First.Kelvin;
        Assert.InRange(alike - 273.15, 800, 840);
    }

    [Fact]
    public void A_reversed_range_is_refused() => Assert.Throws<RequestException>(() =>
        GasRatioDiagram.Of("Fe", Temperature.FromCelsius(900), Temperature.FromCelsius(400), 25, [], Activities.AllOne, GasSamples.Database));
}
