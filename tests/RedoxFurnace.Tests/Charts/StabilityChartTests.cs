using System.Collections.Immutable;
using System.Text;
using System.Xml.Linq;
using RedoxFurnace.Charts.Kinds;
using RedoxFurnace.Charts.Layout;
using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Charts.Writing;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Charts;

/// <summary>The stability chart: its values are the ladder's, its labels stay apart, its files are sound.</summary>
public class StabilityChartTests
{
    private static readonly XNamespace Svg = "http://www.w3.org/2000/svg";
    private static readonly string[] Metals = "Ag Al B Ba Be Ca Cd Co Cr Cs Cu Fe Ga Ge In K Li Mg Mn Mo Na Nb Ni Pb Pd Rb Sc Si Sn Sr Ta Th Ti V W Zn Zr".Split(' ');

    [Fact]
    public void A_line_is_the_ladders_own_oxygen_potential()
    {
        StabilityResult result = Lines("Cr,Fe", "C");
        OxideSystem iron = OxideSystem.OfMetal("Fe", SubstanceDatabase.Bundled, Activities.AllOne);
        foreach (double kelvin in new[] { 400.0, 900, 1300, 1600 })
        {
            foreach (LadderStep step in iron.LadderAt(kelvin).Steps.Where(step => step.OxygenPotential is not null))
            {
                StabilityLine line = result.Lines.Single(line => line.Id == step.Couple.Name);
                Assert.Equal(step.OxygenPotential!.Value, line.At(kelvin)!.Value, 5.0);
            }
        }
    }

    /// <summary>Where the chart says carbon takes over, the ranking says so too.</summary>
    [Fact]
    public void Crossovers_are_those_of_the_ranking()
    {
        StabilityCrossing crossing = Lines("Cr", "C").Crossings.Single();
        double ranked = ReductantRanking.Rank(new RankRequest("Cr2O3", null, Temperature.FromKelvin(1500), ["C"], new RankConditions(), default), SubstanceDatabase.Bundled).Single().Rows[0].Crossovers!.Kelvin.Single();
        Assert.Equal(ranked, crossing.Kelvin, 0.05);
        Assert.True(crossing.ReducesAbove);
    }

    [Fact]
    public void Wustite_begins_where_the_ladder_changes()
    {
        StabilityLine line = Lines("Fe", "").Lines.Single(line => line.Id == "Fe/wustite");
        StabilityMark start = line.Marks.First(mark => mark.Kind == StabilityMarkKind.LadderChange);
        LadderInvariant invariant = LadderInvariants.Between(OxideSystem.OfMetal("Fe", SubstanceDatabase.Bundled, Activities.AllOne), 700, 1000).First();
        Assert.Equal(invariant.Kelvin, start.Kelvin, 0.05);
    }

    /// <summary>Fifty seeded selections of 1 to 25 lines: labels overlap neither one another nor marks nor numbers, and stay on the page.</summary>
    [Fact]
    public void Labels_keep_clear_of_one_another_and_of_marks()
    {
        Random random = new(20260801);
        for (int round = 0; round < 50; round++)
        {
            string[] chosen = [.. Metals.OrderBy(_ => random.Next()).Take(1 + random.Next(14))];
            string with = random.Next(3) switch { 0 => "", 1 => "C", _ => "C,H2,CO" };
            StabilityResult result = Lines(string.Join(',', chosen), with);
            result = result with { Lines = [.. result.Lines.Take(25)] };
            PageSize page = random.Next(2) == 0 ? PageSize.A4 : PageSize.A5;
            StabilityChartOptions options = new() { Page = page, Scales = random.Next(2) == 0 ? [] : ["pO2", "CO/CO2", "H2/H2O"], Window = (Temperature.FromCelsius(1000), Temperature.FromCelsius(1150)) };
            // What passes a page's room is spread over several pages by the drawing; here it is left out.
            int fit = ChartLayout.LinesThatFit(StabilityChart.Plan(result, options, SubstanceDatabase.Bundled));
            result = result with { Lines = [.. result.Lines.Take(fit)] };
            Scene scene = ChartLayout.Lay(StabilityChart.Plan(result, options, SubstanceDatabase.Bundled));
            PageBox[] labels = [.. Texts(scene, "labels")];
            PageBox[] marks = [.. scene.Groups.SelectMany(group => group.Items).OfType<MarkItem>().Where(mark => scene.Groups.First(group => group.Items.Contains(mark)).Name != "key").Select(mark => mark.Box)];
            PageBox[] others = [.. Texts(scene, "crossovers"), .. Texts(scene, "operating window"), .. scene.Groups.Where(group => group.Name.StartsWith("scale", StringComparison.Ordinal)).SelectMany(group => Texts(scene, group.Name))];
            for (int i = 0; i < labels.Length; i++)
            {
                string where = $"round {round}: {string.Join(',', chosen)}";
                Assert.True(labels[i].Left >= 0 && labels[i].Right <= scene.Width && labels[i].Top >= 0 && labels[i].Bottom <= scene.Height, where);
                Assert.False(labels[(i + 1)..].Any(other => other.Grown(-0.1).Overlaps(labels[i].Grown(-0.1))), where + ", labels");
                Assert.False(marks.Any(mark => mark.Grown(-0.1).Overlaps(labels[i].Grown(-0.1))), where + ", marks");
                Assert.False(others.Any(other => other.Grown(-0.1).Overlaps(labels[i].Grown(-0.1))), where + ", others");
            }
        }
    }

    /// <summary>A ruler from each pivot through 50 seeded points reads the calculated value within 1 % of the axis.</summary>
    [Theory]
    [InlineData("pO2")]
    [InlineData("CO/CO2")]
    [InlineData("H2/H2O")]
    public void A_ruler_from_the_pivot_reads_the_calculated_value(string scale)
    {
        GasReactions gases = new(SubstanceDatabase.Bundled);
        const double low = 298.15;
        const double high = 2073.15;
        const double axis = 1200;
        RulerPlan ruler = SideScales.Of(scale, gases, low, high, 1e-3);
        Random random = new(7);
        const double place = 2400;
        for (int i = 0; i < 50; i++)
        {
            double kelvin = low + ((high - low) * random.NextDouble());
            double potential = -200 - (800 * random.NextDouble());
            double atRuler = ruler.Pivot.Y + ((potential - ruler.Pivot.Y) / (kelvin - ruler.Pivot.X) * place);
            // The value calculated at the point, placed on the scale by the slope of its ray.
            double slope = scale switch
            {
                "pO2" => PhysicalConstants.GasConstant * Math.Log(10) * OxygenPotentialReadings.Log10Bar(potential * 1000, kelvin) / 1000,
                "CO/CO2" => Ray(gases.CarbonMonoxideOxidation, kelvin, potential, ruler, low, high),
                _ => Ray(gases.HydrogenOxidation, kelvin, potential, ruler, low, high),
            };
            Assert.Equal(ruler.Pivot.Y + (slope * place), atRuler, 0.01 * axis);
        }

        static double Ray(Reaction reaction, double kelvin, double potential, RulerPlan ruler, double low, double high)
        {
            double ratio = GasReactions.RatioOfPotential(reaction, kelvin, potential * 1000) / Math.Log(10);
            // Between two neighbouring powers of ten of the scale itself.
            (RichText Text, double Slope)[] ticks = [.. ruler.Slopes.OrderBy(tick => -tick.Slope)];
            double first = ticks[0].Slope;
            double step = ticks[1].Slope - ticks[0].Slope;
            return first + ((ratio + 14) * step);
        }
    }

    /// <summary>
    /// On the page as laid out: a straight edge from the pivot through a point of known pO2 meets the tick that bears that value, on the upright part of the
    /// scale or below the plot, within 1 % of the axis.
    /// </summary>
    [Fact]
    public void A_straight_edge_on_the_page_meets_the_tick_of_the_value()
    {
        Scene scene = Draw("Al,Ca,Cr,Fe", "", new StabilityChartOptions { Scales = ["pO2", "CO/CO2", "H2/H2O"] });
        ImmutableArray<PagePoint> axes = scene.Groups.Single(group => group.Name == "axes").Items.OfType<LineItem>().First().Points;
        PageBox plot = new(axes[0].X, axes[0].Y, axes[2].X - axes[0].X, axes[1].Y - axes[0].Y);
        ChartPlan plan = StabilityChart.Plan(Lines("Al,Ca,Cr,Fe", ""), new StabilityChartOptions { Scales = ["pO2", "CO/CO2", "H2/H2O"] }, SubstanceDatabase.Bundled);
        ImmutableArray<SceneItem> items = scene.Groups.Single(group => group.Name == "scale of pO2").Items;
        PagePoint pivot = items.OfType<MarkItem>().Single().Center;
        const double kelvin = 900;
        int upright = 0;
        int flat = 0;
        for (int i = 1; i < items.Length; i++)
        {
            if (items[i] is not TextItem text || items[i - 1] is not LineItem { Points.Length: 2 } tick || !double.TryParse(text.Text.Plain.Replace('\u2212', '-'), System.Globalization.CultureInfo.InvariantCulture, out double log))
            {
                continue;
            }

            double potential = PhysicalConstants.GasConstant * kelvin * Math.Log(10) * log / 1000;
            PagePoint through = new(
                plot.Left + ((kelvin - plan.X.Low) / (plan.X.High - plan.X.Low) * plot.Width),
                plot.Bottom - ((potential - plan.Y.Low) / (plan.Y.High - plan.Y.Low) * plot.Height));
            PagePoint at = tick.Points[0];
            double slope = (through.Y - pivot.Y) / (through.X - pivot.X);
            bool below = tick.Points[1].X == at.X;
            double off = below ? at.X - (pivot.X + ((at.Y - pivot.Y) / slope)) : at.Y - (pivot.Y + (slope * (at.X - pivot.X)));
            Assert.True(Math.Abs(off) <= 0.01 * (below ? plot.Width : plot.Height), $"log pO2 {log}: {off} mm off");
            (upright, flat) = below ? (upright, flat + 1) : (upright + 1, flat);
        }

        Assert.True(upright > 5 && flat > 5, $"{upright} values beside and {flat} below the plot");
    }

    [Fact]
    public void Every_character_drawn_has_a_glyph_and_all_text_stands_out_from_the_paper()
    {
        Scene scene = Draw("Al,Ca,Cr,Fe,Mg,Mn,Si,Ti,Nb,W", "C,H2,CO,Al", new StabilityChartOptions { Frame = FrameKind.Document, Scales = ["pO2", "CO/CO2", "H2/H2O"], Frost = (0.75, Pressure.Standard), Safety = "Site rules come first.", Document = new DocumentBlock { Number = "MX-17", Prepared = "A. Example" } });
        foreach (TextItem text in scene.Texts)
        {
            Assert.True(text.Ink.ContrastOnWhite() >= 4.5, text.Text.Plain);
            foreach (Rune rune in text.Text.Plain.EnumerateRunes())
            {
                Assert.True(ChartFont.Has(rune.Value, text.IsBold), $"'{rune}' of '{text.Text.Plain}'");
            }
        }

        Assert.All(scene.Groups.Where(group => group.Name.Contains('/', StringComparison.Ordinal)).SelectMany(group => group.Items).OfType<LineItem>(), line => Assert.True(line.Stroke.Ink.ContrastOnWhite() >= 3));
    }

    /// <summary>Contrast of two known pairs: black on white is 21, and #777777 is 4.48 (WCAG 2.1, definition of contrast ratio).</summary>
    [Theory]
    [InlineData("#000000", 21)]
    [InlineData("#777777", 4.48)]
    public void Contrast_is_the_published_one(string ink, double contrast) => Assert.Equal(contrast, Ink.Of(ink).ContrastOnWhite(), 0.005);

    [Fact]
    public void The_svg_is_well_formed_small_searchable_and_says_what_it_shows()
    {
        Scene scene = Draw("Al,Cr,Fe,Mg,Mn,Si,Ti", "C,H2", new StabilityChartOptions());
        byte[] bytes = SvgWriter.Write(scene);
        Assert.True(bytes.Length < 200_000, $"{bytes.Length} bytes");
        XElement root = XDocument.Parse(Encoding.UTF8.GetString(bytes)).Root!;
        Assert.Equal("img", root.Attribute("role")!.Value);
        Assert.NotEqual("", root.Element(Svg + "title")!.Value);
        Assert.Contains("Cr/Cr2O3", root.Element(Svg + "desc")!.Value, StringComparison.Ordinal);
        Assert.StartsWith("DejaVu Sans", root.Attribute("font-family")!.Value, StringComparison.Ordinal);
        Assert.Contains(root.Elements(Svg + "g"), group => group.Element(Svg + "title")!.Value == "Cr/Cr2O3");
        string[] ids = [.. root.Descendants().Attributes("id").Select(id => id.Value)];
        Assert.Equal(ids.Length, ids.Distinct().Count());
        XElement values = root.Descendants().First(element => element.Name.LocalName == "line" && element.Attribute("name")?.Value == "Cr/Cr2O3");
        Assert.StartsWith("temperature_K kJ_per_mol_O2", values.Attribute("columns")!.Value, StringComparison.Ordinal);
        Assert.Equal(bytes, SvgWriter.Write(Draw("Al,Cr,Fe,Mg,Mn,Si,Ti", "C,H2", new StabilityChartOptions())));
    }

    /// <summary>PNG specification (third edition): signature, IHDR first; width and height follow from page and resolution; pHYs holds dots per metre.</summary>
    [Fact]
    public void The_png_has_the_size_of_its_page_and_says_its_resolution()
    {
        byte[] png = PngWriter.Write(Draw("Cr,Fe", "C", new StabilityChartOptions { Page = PageSize.A5 }), 300);
        Assert.Equal([0x89, (byte)'P', (byte)'N', (byte)'G', 0x0D, 0x0A, 0x1A, 0x0A], png[..8]);
        Assert.Equal((int)Math.Round(210 / 25.4 * 300), Big(png, 16));
        Assert.Equal((int)Math.Round(148 / 25.4 * 300), Big(png, 20));
        Assert.Equal("pHYs", Encoding.ASCII.GetString(png, 37, 4));
        Assert.Equal(11811, Big(png, 41));

        static int Big(byte[] bytes, int at) => (bytes[at] << 24) | (bytes[at + 1] << 16) | (bytes[at + 2] << 8) | bytes[at + 3];
    }

    [Fact]
    public void The_pdf_holds_its_title_and_the_same_bytes_every_time()
    {
        byte[] pdf = PdfWriter.Write(Draw("Cr,Fe", "C", new StabilityChartOptions { Title = "Chromium kiln" }));
        Assert.Equal("%PDF", Encoding.ASCII.GetString(pdf, 0, 4));
        Assert.Contains("Chromium kiln", Encoding.Latin1.GetString(pdf), StringComparison.Ordinal);
        Assert.Equal(pdf, PdfWriter.Write(Draw("Cr,Fe", "C", new StabilityChartOptions { Title = "Chromium kiln" })));
    }

    private static StabilityResult Lines(string of, string with) => StabilityLines.Of(
        new StabilityRequest([.. of.Split(',', StringSplitOptions.RemoveEmptyEntries)], [.. with.Split(',', StringSplitOptions.RemoveEmptyEntries)], Temperature.FromCelsius(25), Temperature.FromCelsius(1800)),
        SubstanceDatabase.Bundled);

    private static Scene Draw(string of, string with, StabilityChartOptions options)
        => ChartLayout.Lay(StabilityChart.Plan(Lines(of, with), options, SubstanceDatabase.Bundled));

    private static IEnumerable<PageBox> Texts(Scene scene, string group)
        => scene.Groups.Where(candidate => candidate.Name == group).SelectMany(candidate => candidate.Items).OfType<TextItem>().Select(ChartFont.Box);
}
