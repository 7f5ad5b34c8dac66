using System.Collections.Immutable;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Charts.Kinds;
using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Charts.Sheets;
using RedoxFurnace.Charts.Writing;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;
using RedoxFurnace.Tests.Cli;

namespace RedoxFurnace.Tests.Charts;

/// <summary>The gas-ratio chart: its boundaries are the ladder's, its fields the solids the ladder names at a place of the plot.</summary>
public class GasRatioChartTests
{
    private static readonly SubstanceDatabase Database = SubstanceDatabase.Bundled;

    private static readonly GasReactions Gases = new(Database);

    [Theory]
    [InlineData("Fe", false)]
    [InlineData("Fe", true)]
    [InlineData("Mn", true)]
    [InlineData("V", true)]
    [InlineData("Co", false)]
    public void A_field_bears_the_name_of_the_solid_that_is_stable_in_it(string element, bool logarithmic)
    {
        ChartPlan plan = Plan(element, logarithmic, "CO");
        OxideSystem system = OxideSystem.OfMetal(element, Database, Activities.AllOne);
        int checkedPlaces = 0;
        foreach (FieldPlan field in plan.Fields)
        {
            int half = field.Outline.Length / 2;
            for (int i = 1; i < half - 1; i += 7)
            {
                (DataPoint upper, DataPoint lower) = (field.Outline[i], field.Outline[^(i + 1)]);
                Assert.Equal(upper.X, lower.X);
                if (upper.Y - lower.Y < 1e-3)
                {
                    continue;
                }

                double middle = 0.5 * (upper.Y + lower.Y);
                double logRatio = logarithmic ? middle * Math.Log(10) : Math.Log(middle / (100 - middle));
                double potential = GasReactions.PotentialOfRatio(Gases.CarbonMonoxideOxidation, upper.X, logRatio);
                Assert.Equal(field.Name, "field of " + StableAt(system, upper.X, potential));
                checkedPlaces++;
            }
        }

        Assert.True(checkedPlaces > 20);
    }

    /// <summary>Carbon takes the oxygen of wustite above 685 C and of magnetite above 650 C at 1 atm (Findlay, after Baur and Glaessner 1903; textbook charts): bands of 30 C.</summary>
    [Fact]
    public void Graphite_meets_wustite_and_magnetite_at_the_published_temperatures()
    {
        ChartPlan plan = Plan("Fe", false, "CO");
        Assert.Equal(2, plan.Crossings.Length);
        Assert.Equal(685, Crossing("Fe/wustite") - 273.15, 30.0);
        Assert.Equal(650, Crossing("wustite/Fe3O4") - 273.15, 30.0);
        Assert.All(plan.Crossings, crossing => Assert.Contains("carbon reduces above", crossing.Text.Plain, StringComparison.Ordinal));

        double Crossing(string couple) => plan.Crossings.Single(crossing => crossing.Text.Plain.Contains(couple, StringComparison.Ordinal)).At.X;
    }

    [Fact]
    public void The_graphite_line_is_the_share_of_the_two_gas_formula()
    {
        SeriesPlan graphite = Plan("Fe", false, "CO").Series.Single(line => line.Name.StartsWith("graphite", StringComparison.Ordinal));
        foreach (DataPoint point in graphite.Points)
        {
            // K of C + CO2 = 2 CO from the two reactions with oxygen, then y^2/(1 - y) = K at 1 bar.
            double rt = PhysicalConstants.GasConstant * point.X;
            double constant = Math.Exp((Gases.CarbonMonoxideOxidation.StandardGibbs(point.X) - Gases.GraphiteToMonoxide.StandardGibbs(point.X)) / (2 * rt));
            double share = point.Y / 100;
            Assert.Equal(Math.Log(constant), Math.Log(share * share / (1 - share)), 1e-6);
        }
    }

    /// <summary>Where the data of a higher oxide end, nobody knows what stands at the oxidising edge: it stays white.</summary>
    [Fact]
    public void No_field_is_claimed_where_the_data_of_a_higher_oxide_end()
    {
        ChartPlan plan = Plan("Mn", true, "H2");
        double bottom = plan.Y.Low;
        double end = plan.Fields.Where(field => field.Outline.Any(corner => corner.Y == bottom)).SelectMany(field => field.Outline).Where(corner => corner.Y == bottom).Max(corner => corner.X);
        double data = Database.Get("MnO2").Phases.Max(phase => phase.Range.HighKelvin);
        Assert.Equal(data, end, 0.1);
        Assert.Contains(plan.Frame.Caption, line => line.Contains("MnO2", StringComparison.Ordinal) && line.Contains("left white", StringComparison.Ordinal));
    }

    [Fact]
    public void Hydrogen_beside_monoxide_is_dashed_and_named()
    {
        ChartPlan plan = Plan("Fe", false, "CO", "H2");
        Assert.All(plan.Series.Where(line => line.Name.EndsWith("H2 + H2O", StringComparison.Ordinal)), line => Assert.NotEmpty(line.Stroke.Dashes));
        Assert.All(plan.Series.Where(line => line.Name.EndsWith("CO + CO2", StringComparison.Ordinal)), line => Assert.Empty(line.Stroke.Dashes));
        Assert.Equal(plan.Series.Count(line => line.Name.EndsWith("H2 + H2O", StringComparison.Ordinal)), plan.Series.Count(line => line.Name.EndsWith("CO + CO2", StringComparison.Ordinal)));
        Assert.Contains(plan.Frame.Caption, line => line.Contains("hardly seen", StringComparison.Ordinal) && line.Contains("Fe3O4/Fe2O3", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("kind: gas-ratio\nof: Fe\nwith: CO,H2\npco: 1bar,0.1bar\nwindow: 700C..900C\nframe: document\n")]
    [InlineData("kind: gas-ratio\nof: Mo\nwith: H2\nsize: A5\nbands: yes\n")]
    [InlineData("kind: gas-ratio\nof: V\naxis: log\nrange: 500C..1600C\nunit: F\nsize: slide\n")]
    [InlineData("kind: gas-ratio\nof: Cr\n")]
    public void It_keeps_its_words_on_the_page(string sheet)
    {
        foreach (Scene scene in ChartDrawing.Draw(ChartSettings.Parse(sheet, "sheet.yaml"), Database, "0").Scenes)
        {
            foreach (TextItem text in scene.Texts)
            {
                Assert.All(text.Text.Plain.EnumerateRunes(), rune => Assert.True(ChartFont.Has(rune.Value, text.IsBold), $"'{rune}' of '{text.Text.Plain}'"));
                PageBox box = ChartFont.Box(text);
                Assert.True(text.Turned != 0 || (box.Left >= 0 && box.Right <= scene.Width && box.Top >= 0 && box.Bottom <= scene.Height), text.Text.Plain);
            }
        }
    }

    [Theory]
    [InlineData("--kind gas-ratio", "one metal", "--of Fe")]
    [InlineData("--kind gas-ratio --of Fe,Mn", "'Fe,Mn'", "such as Fe")]
    [InlineData("--kind gas-ratio --of FeO", "'FeO'")]
    [InlineData("--kind gas-ratio --of Fe --with Al", "'Al'", "CO, H2")]
    [InlineData("--kind gas-ratio --of Fe --with CO,CO", "'CO,CO'")]
    [InlineData("--kind gas-ratio --of Fe --axis linear", "'linear'", "share")]
    [InlineData("--kind gas-ratio --of Fe --pco 1", "--pco", "unit")]
    [InlineData("--kind gas-ratio --of Ar", "Ar")]
    public void What_it_cannot_draw_is_refused(string options, params string[] parts)
    {
        using ScratchFolder folder = new();
        ProgramRun.OfWords(["chart", .. options.Split(' '), "--to", folder["chart.svg"]]).IsRefused(2, parts);
        Assert.False(File.Exists(folder["chart.svg"]));
    }

    private static ChartPlan Plan(string element, bool logarithmic, params string[] gases)
    {
        GasRatioDiagram diagram = GasRatioDiagram.Of(element, Temperature.FromCelsius(400), Temperature.FromCelsius(1200), 10, [Pressure.Standard], Activities.AllOne, Database);
        return GasRatioChart.Plan(diagram, Activities.AllOne.Describe(), new GasRatioOptions { Gases = [.. gases], Logarithmic = logarithmic }, [], Database.Hash);
    }

    /// <summary>The solid between the two steps of the ladder that enclose a potential.</summary>
    private static string StableAt(OxideSystem system, double kelvin, double potential)
    {
        LadderStep[] steps = [.. system.LadderAt(kelvin, null).Steps];
        LadderStep? above = steps.Where(step => step.OxygenPotential > potential).MinBy(step => step.OxygenPotential);
        LadderStep? below = steps.Where(step => step.OxygenPotential <= potential).MaxBy(step => step.OxygenPotential);
        return above is not null ? above.Couple.Name.Split('/')[0] : below!.Couple.Name.Split('/')[1];
    }
}
