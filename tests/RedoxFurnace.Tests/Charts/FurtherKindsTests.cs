using System.Collections.Immutable;
using System.Text;
using RedoxFurnace.Charts.Kinds;
using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Charts.Sheets;
using RedoxFurnace.Charts.Writing;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Charts;

/// <summary>Oxygen-pressure chart, van 't Hoff chart and margin bars: their values are those of the calculations behind them.</summary>
public class FurtherKindsTests
{
    private const double R = 8.314462618;

    [Theory]
    [InlineData(false)]
    [InlineData(true)]
    public void Oxygen_pressure_is_the_potential_over_RT(bool inverse)
    {
        OxideSystem chromium = OxideSystem.OfMetal("Cr", SubstanceDatabase.Bundled, Activities.AllOne);
        SeriesPlan line = Pressure(new OxygenPressureOptions { Inverse = inverse }).Series.Single(series => series.Name == "Cr/Cr2O3");
        foreach (DataPoint point in line.Points)
        {
            double kelvin = inverse ? 1000 / point.X : point.X;
            double potential = chromium.LadderAt(kelvin).Steps.Single(step => step.Couple.Name == "Cr/Cr2O3").OxygenPotential!.Value;
            Assert.Equal(potential / (R * kelvin * Math.Log(10)), point.Y, 1e-6);
        }

        Assert.Equal(line.Points.Select(point => point.X).Order(), line.Points.Select(point => point.X));
    }

    /// <summary>On a line of equal ratio 2 H2 + O2 = 2 H2O is in balance at that ratio: log pO2 = dG0/(RT ln 10) - 2 log(H2/H2O).</summary>
    [Fact]
    public void Lines_of_equal_ratio_and_frost_point_obey_the_equilibrium_of_water()
    {
        ChartPlan plan = Pressure(new OxygenPressureOptions { Ratios = ["H2/H2O"], Frost = (1, RedoxFurnace.Quantities.Pressure.Standard) });
        Reaction water = new GasReactions(SubstanceDatabase.Bundled).HydrogenOxidation;
        SeriesPlan ratio = plan.Series.First(series => series.Name.StartsWith("H2/H2O 1e", StringComparison.Ordinal));
        int exponent = int.Parse(ratio.Name["H2/H2O 1e".Length..], System.Globalization.CultureInfo.InvariantCulture);
        foreach (DataPoint point in ratio.Points)
        {
            Assert.Equal((water.StandardGibbs(point.X) / (R * point.X * Math.Log(10))) - (2 * exponent), point.Y, 1e-9);
        }

        // Over ice at -40 C water has 12.84 Pa (IAPWS R14-08(2011), sublimation equation; rounded, from memory), so H2/H2O is 7788 in hydrogen of 1 bar.
        SeriesPlan frost = plan.Series.Single(series => series.Name == "frost point -40 C");
        DataPoint first = frost.Points[0];
        double expected = (water.StandardGibbs(first.X) / (R * first.X * Math.Log(10))) - (2 * Math.Log10(1e5 / 12.84));
        Assert.Equal(expected, first.Y, 0.002);
    }

    /// <summary>Exact points of ln K = 5 - 12000/T give back 12000 R; a scattered set gives the textbook slope and standard error.</summary>
    [Fact]
    public void The_slope_gives_the_enthalpy()
    {
        MeasuredPoint[] exact = [.. new[] { 900.0, 1000, 1200, 1500 }.Select(kelvin => new MeasuredPoint(kelvin, 5 - (12000 / kelvin)))];
        VantHoffLine line = VantHoffLine.Through(exact)!;
        Assert.Equal(12000 * R, line.Enthalpy, 1e-4);
        Assert.Equal(5, line.Intercept, 1e-9);
        Assert.Equal(0, line.EnthalpyUncertainty!.Value, 0.01);

        // x = 1, 2, 3, 4 and y = 1, 3, 2, 5 (per 1000/T): slope 1.1, residual sum of squares 2.7, standard error sqrt(2.7/2/5) = 0.5196, worked by hand.
        MeasuredPoint[] scattered = [.. new[] { (1.0, 1.0), (2, 3), (3, 2), (4, 5) }.Select(pair => new MeasuredPoint(1000 / pair.Item1, pair.Item2))];
        VantHoffLine fitted = VantHoffLine.Through(scattered)!;
        Assert.Equal(1100, fitted.Slope, 1e-6);
        Assert.Equal(2 * 519.615, fitted.SlopeUncertainty!.Value, 0.01);
        Assert.Null(VantHoffLine.Through([exact[0]]));
        Assert.Null(VantHoffLine.Through([exact[0], exact[1]])!.SlopeUncertainty);
    }

    /// <summary>2 C + O2 = 2 CO: ln K at 1000 K from JANAF's formation value of CO, -200.275 kJ/mol (Chase 1998, from memory), is 48.17.</summary>
    [Fact]
    public void Ln_K_of_carbon_monoxide_is_the_published_one()
    {
        DrawnChart drawn = Draw("kind: van-t-hoff\nequations: \"2 C + O2 = 2 CO\"\nrange: 700K..1300K\n");
        ValueTable table = drawn.Scenes[0].Values.Single();
        double[] at = [.. table.Rows.MinBy(row => Math.Abs(row[0] - 1))!];
        Assert.Equal(1, at[0], 1e-6);
        Assert.Equal(2 * 200_275 / (R * 1000), at[1], 0.05);
    }

    [Fact]
    public void Bars_are_the_margins_of_the_ranking()
    {
        Temperature at = Temperature.FromCelsius(1250);
        RankResult ranked = ReductantRanking.Rank(new RankRequest("Cr2O3", null, at, [], new RankConditions(), RankOrder.Margin), SubstanceDatabase.Bundled).Single();
        ChartPlan plan = MarginChart.Plan(ranked, new ChartOptions(), SubstanceDatabase.Bundled.Hash);
        foreach (RankedReductant row in ranked.Rows.Where(row => row.Margin is not null))
        {
            FieldPlan bar = plan.Fields.Single(field => field.Name == "bar of " + row.Reductant.Id);
            double far = bar.Outline.Select(corner => corner.X).MaxBy(Math.Abs);
            Assert.Equal(row.Margin!.Value / 1000, far, 1e-9);
            SeriesPlan whisker = plan.Series.Single(series => series.Name == row.Reductant.Id);
            Assert.Equal(2 * row.ExpandedUncertainty!.Value / 1000, whisker.Points.Max(point => point.X) - whisker.Points.Min(point => point.X), 1e-9);
            Assert.Contains(RankWords.Of(row.Verdict).Replace('-', ' '), whisker.Label.Plain, StringComparison.Ordinal);
        }
    }

    [Theory]
    [InlineData("kind: oxygen-pressure\nof: Cr,Fe\nwith: C\nratios: CO/CO2,H2/H2O\nfrost: 50%\nbands: yes\nframe: document\n")]
    [InlineData("kind: oxygen-pressure\nof: Mn\ninverse: yes\nsize: A5\n")]
    [InlineData("kind: van-t-hoff\nequations: \"3 Fe2O3 + CO = 2 Fe3O4 + CO2\"\npoints: \"500C 4.9; 700C 4.6\"\n")]
    [InlineData("kind: margins\nof: Fe2O3\nat: 900C\nsize: A5\n")]
    public void Every_kind_has_all_glyphs_legible_words_and_keeps_its_text_on_the_page(string sheet)
    {
        foreach (Scene scene in Draw(sheet).Scenes)
        {
            foreach (TextItem text in scene.Texts)
            {
                Assert.True(text.Ink.ContrastOnWhite() >= 4.5, text.Text.Plain);
                Assert.All(text.Text.Plain.EnumerateRunes(), rune => Assert.True(ChartFont.Has(rune.Value, text.IsBold), $"'{rune}' of '{text.Text.Plain}'"));
                PageBox box = ChartFont.Box(text);
                Assert.True(text.Turned != 0 || (box.Left >= 0 && box.Right <= scene.Width && box.Top >= 0 && box.Bottom <= scene.Height), text.Text.Plain);
            }
        }
    }

    private static ChartPlan Pressure(OxygenPressureOptions options) => OxygenPressureChart.Plan(
        StabilityLines.Of(new StabilityRequest(["Cr", "Fe"], [], Temperature.FromCelsius(700), Temperature.FromCelsius(1300)), SubstanceDatabase.Bundled),
        options,
        SubstanceDatabase.Bundled);

    private static DrawnChart Draw(string sheet) => ChartDrawing.Draw(ChartSettings.Parse(sheet, "sheet.yaml"), SubstanceDatabase.Bundled, "0");
}
