using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;
using System.Xml.Linq;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Charts.Writing;
using RedoxFurnace.Cli;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Charts;

/// <summary>The committed gallery is what the sheets draw: the same groups, words and plotted values. Pixels are not compared.</summary>
public partial class GalleryTests
{
    private static readonly string Folder = Path.Combine(Repository.Root, "charts");

    public static TheoryData<string> SheetNames => new(ChartGallery.Sheets(Folder).Select(file => Path.GetFileNameWithoutExtension(file)!));

    [Fact]
    public void There_are_sheets_for_at_least_six_jobs() => Assert.True(ChartGallery.Sheets(Folder).Length >= 6);

    [Theory]
    [MemberData(nameof(SheetNames))]
    public void A_sheet_draws_what_the_gallery_shows(string sheet)
    {
        foreach ((string name, Scene scene) in ChartGallery.Pages(Path.Combine(Folder, "sheets", sheet + ".yaml"), SubstanceDatabase.Bundled))
        {
            string file = Path.Combine(Folder, "gallery", name + ".svg");
            Assert.True(File.Exists(file), $"{name}.svg is missing: rebuild with 'chart --gallery charts --force'");
            Assert.True(File.Exists(Path.ChangeExtension(file, ".png")), $"{name}.png is missing: rebuild with 'chart --gallery charts --force'");
            Compare(XDocument.Load(file).Root!, XDocument.Parse(Encoding.UTF8.GetString(SvgWriter.Write(scene))).Root!, name);
        }
    }

    /// <summary>The comparison itself must be able to fail: a moved value, a lost line and another word are each found.</summary>
    [Fact]
    public void A_changed_picture_is_noticed()
    {
        XElement root = XDocument.Parse(Encoding.UTF8.GetString(SvgWriter.Write(ChartGallery.Pages(Path.Combine(Folder, "sheets", "chromia-by-carbon.yaml"), SubstanceDatabase.Bundled).First().Scene))).Root!;
        Compare(root, new XElement(root), "itself");
        XElement moved = new(root);
        XElement line = moved.Descendants().First(element => element.Name.LocalName == "line");
        line.Value = Figures().Replace(line.Value, "-1.5", 1);
        Assert.ThrowsAny<Xunit.Sdk.XunitException>(() => Compare(root, moved, "moved"));
        XElement lost = new(root);
        lost.Descendants().First(element => element.Name.LocalName == "path").Remove();
        Assert.ThrowsAny<Xunit.Sdk.XunitException>(() => Compare(root, lost, "lost"));
        XElement reworded = new(root);
        reworded.Descendants().First(element => element.Name.LocalName == "text").Value = "another";
        Assert.ThrowsAny<Xunit.Sdk.XunitException>(() => Compare(root, reworded, "reworded"));
    }

    [Fact]
    public void The_readme_shows_every_picture()
    {
        string readme = File.ReadAllText(Path.Combine(Folder, "gallery", "README.md"));
        foreach (string picture in Directory.EnumerateFiles(Path.Combine(Folder, "gallery"), "*.png"))
        {
            Assert.Contains($"({Path.GetFileName(picture)})", readme, StringComparison.Ordinal);
        }
    }

    private static void Compare(XElement committed, XElement drawn, string name)
    {
        const string advice = ": the sheet no longer draws what the gallery shows; look at the change, then rebuild with 'chart --gallery charts --force'";
        Assert.True(Shape(committed) == Shape(drawn), name + advice + " (groups, lines or words)");
        foreach ((XElement old, XElement now) in Tables(committed).Zip(Tables(drawn)))
        {
            double[] before = Numbers(old);
            double[] after = Numbers(now);
            Assert.True(before.Length == after.Length, $"{name}, {old.Attribute("name")?.Value}{advice} (points)");
            foreach ((double a, double b) in before.Zip(after))
            {
                Assert.True(Math.Abs(a - b) <= 0.01 + (1e-5 * Math.Abs(a)), $"{name}, {old.Attribute("name")?.Value}{advice} ({a} was, {b} is)");
            }
        }
    }

    private static IEnumerable<XElement> Tables(XElement root) => root.Descendants().Where(element => element.Name.LocalName == "line" && element.Attribute("columns") is not null);

    private static double[] Numbers(XElement table)
        => [.. table.Value.Split([' ', ';'], StringSplitOptions.RemoveEmptyEntries).Select(text => double.Parse(text, CultureInfo.InvariantCulture))];

    /// <summary>Elements in order with their words and names; the fingerprint of the data and the version of the tool are left out.</summary>
    private static string Shape(XElement root)
    {
        StringBuilder shape = new();
        foreach (XElement element in root.DescendantsAndSelf())
        {
            shape.Append(element.Name.LocalName).Append(' ').Append(element.Attribute("id")?.Value).Append(' ').Append(element.Attribute("name")?.Value).Append(' ');
            if (element.Attribute("columns") is null && element.Name.LocalName is "text" or "title" or "desc")
            {
                shape.Append(Fingerprints().Replace(element.Value, string.Empty));
            }

            shape.Append('\n');
        }

        return shape.ToString();
    }

    [GeneratedRegex("[0-9a-f]{12,64}|RedoxFurnace [0-9.]+")]
    private static partial Regex Fingerprints();

    [GeneratedRegex("-[0-9.]+")]
    private static partial Regex Figures();
}
