using System.Text;
using System.Text.Json;
using System.Xml.Linq;
using RedoxFurnace.Tests.Cli;

namespace RedoxFurnace.Tests.Campaigns;

/// <summary>The plan command: what it writes, what it refuses, and that nothing foreign is touched.</summary>
public class PlanCommandTests
{
    private const string Sheet = """
        title: "Trial <b>7</b> & more | {{ title }}"
        document: { number: "A<1>", date: 2026-03-01 }
        charge:
          - { substance: NiO, rate: 10kg/h, purity: 99% }
        product: { metal: Ni }
        gas: { analysis: "H2 75%, N2 25%, frost -50C", flow: 20Nm3/h, price: 0.3/Nm3 }
        programme:
          - { stage: soak, at: 700C }
        """;

    public static TheoryData<string> Sheets => [.. Directory.EnumerateFiles(Path.Combine(Repository.Root, "charts", "campaigns"), "*.yaml").Select(file => Path.GetFileNameWithoutExtension(file)!).Order(StringComparer.Ordinal)];

    /// <summary>What each sheet's answer must be; at least two are no.</summary>
    private static readonly Dictionary<string, string> Answers = new()
    {
        ["bright-annealing"] = "works-if",
        ["tungsten-powder"] = "does-not-work",
        ["ferrochrome-carbon-or-aluminium"] = "does-not-work",
        ["magnesium-retort"] = "works",
        ["neutral-hardening"] = "works-if",
        ["crucible-vacuum-melt"] = "does-not-work",
    };

    [Theory, MemberData(nameof(Sheets))]
    public void A_sheet_that_comes_with_the_tool_gives_its_answer_and_a_whole_report(string name)
    {
        using ScratchFolder folder = new();
        ProgramRun run = ProgramRun.OfWords(["plan", Path.Combine(Repository.Root, "charts", "campaigns", name + ".yaml"), "--to", folder["plan"]]);
        Assert.Equal(0, run.ExitCode);
        using JsonDocument plan = JsonDocument.Parse(File.ReadAllText(folder["plan/plan.json"]));
        Assert.Equal(Answers[name], plan.RootElement.GetProperty("verdict").GetString());
        string headline = plan.RootElement.GetProperty("headline").GetString()!;
        Assert.StartsWith(headline[..40], run.Output, StringComparison.Ordinal);
        string[] listed = [.. plan.RootElement.GetProperty("files").EnumerateArray().Select(file => file.GetString()!)];
        string[] there = [.. Directory.EnumerateFiles(folder["plan"], "*", SearchOption.AllDirectories).Select(file => Path.GetRelativePath(folder["plan"], file).Replace('\\', '/')).Order(StringComparer.Ordinal)];
        Assert.Equal(listed.Order(StringComparer.Ordinal), there);
        Assert.Contains("plan.html", there);
        Assert.Contains("charts/stability.svg", there);
        Assert.Contains(headline[..40].Replace("'", "&#x27;", StringComparison.Ordinal), File.ReadAllText(folder["plan/plan.html"]), StringComparison.Ordinal);
        Assert.NotEmpty(plan.RootElement.GetProperty("hazards").EnumerateArray());
    }

    [Fact]
    public void The_same_sheet_gives_the_same_bytes()
    {
        using ScratchFolder folder = new();
        string sheet = folder.Write("trial.yaml", Sheet);
        foreach (string target in new[] { "one", "two" })
        {
            Assert.Equal(0, ProgramRun.OfWords(["plan", sheet, "--to", folder[target]]).ExitCode);
        }

        foreach (string file in Directory.EnumerateFiles(folder["one"], "*", SearchOption.AllDirectories))
        {
            Assert.Equal(File.ReadAllBytes(file), File.ReadAllBytes(Path.Combine(folder["two"], Path.GetRelativePath(folder["one"], file))));
        }
    }

    [Fact]
    public void What_a_sheet_says_never_becomes_markup()
    {
        using ScratchFolder folder = new();
        ProgramRun.OfWords(["plan", folder.Write("trial.yaml", Sheet), "--to", folder["plan"]]);
        string html = File.ReadAllText(folder["plan/plan.html"]);
        Assert.DoesNotContain("<b>7</b>", html, StringComparison.Ordinal);
        Assert.Contains("&lt;b&gt;7&lt;/b&gt; &amp; more", html, StringComparison.Ordinal);
        Assert.DoesNotContain("<b>", File.ReadAllText(folder["plan/plan.md"]).Replace("\\<b\\>", "", StringComparison.Ordinal), StringComparison.Ordinal);
        XDocument.Parse(File.ReadAllText(folder["plan/charts/stability.svg"]));
    }

    /// <summary>One file, no network: nothing is fetched; headings, table heads and landmarks for those who use the keyboard or a reader.</summary>
    [Fact]
    public void The_page_opens_offline_and_works_by_keyboard()
    {
        using ScratchFolder folder = new();
        ProgramRun.OfWords(["plan", folder.Write("trial.yaml", Sheet), "--to", folder["plan"]]);
        string html = File.ReadAllText(folder["plan/plan.html"]);
        string outside = html.Replace("http://www.w3.org/2000/svg", "", StringComparison.Ordinal);
        Assert.DoesNotContain("http://", outside, StringComparison.Ordinal);
        Assert.DoesNotContain("https://", outside, StringComparison.Ordinal);
        Assert.DoesNotContain("<script", html, StringComparison.OrdinalIgnoreCase);
        Assert.DoesNotContain("src=", html, StringComparison.Ordinal);
        Assert.Contains("lang=\"en\"", html, StringComparison.Ordinal);
        Assert.Contains("class=\"skip\"", html, StringComparison.Ordinal);
        Assert.Contains("scope=\"col\"", html, StringComparison.Ordinal);
        Assert.Contains("<svg", html, StringComparison.Ordinal);
        Assert.Contains("prefers-color-scheme: dark", html, StringComparison.Ordinal);
    }

    [Fact]
    public void An_earlier_plan_is_replaced_only_with_force_and_a_foreign_folder_never()
    {
        using ScratchFolder folder = new();
        string sheet = folder.Write("trial.yaml", Sheet);
        string[] plain = ["plan", sheet, "--to", folder["plan"]];
        Assert.Equal(0, ProgramRun.OfWords(plain).ExitCode);
        ProgramRun.OfWords(plain).IsRefused(1, "earlier plan", "--force");
        Assert.Equal(0, ProgramRun.OfWords([.. plain, "--force"]).ExitCode);
        File.WriteAllText(folder["plan/notes.txt"], "mine");
        ProgramRun.OfWords([.. plain, "--force"]).IsRefused(1, "'notes.txt'", "not of a plan");
        Assert.Equal("mine", File.ReadAllText(folder["plan/notes.txt"]));
        Directory.CreateDirectory(folder["other"]);
        File.WriteAllText(folder["other/letter.txt"], "mine");
        ProgramRun.OfWords(["plan", sheet, "--to", folder["other"], "--force"]).IsRefused(1, "'letter.txt'");
        ProgramRun.OfWords(["plan", sheet, "--to", folder["none/plan"]]).IsRefused(1, "does not exist");
        Assert.Empty(Directory.EnumerateDirectories(folder.Folder, "*.part"));
    }

    [Fact]
    public void A_starting_sheet_of_each_kind_is_itself_a_plan()
    {
        using ScratchFolder folder = new();
        ProgramRun.OfWords(["plan", "--new", "magnesium-retort", "--to", folder["mine.yaml"]]);
        Assert.Contains("# ", File.ReadAllText(folder["mine.yaml"]), StringComparison.Ordinal);
        Assert.Equal(0, ProgramRun.OfWords(["plan", folder["mine.yaml"], "--to", folder["plan"]]).ExitCode);
        ProgramRun.OfWords(["plan", "--new", "magnesium-retrot", "--to", folder["other.yaml"]]).IsRefused(2, "did you mean 'magnesium-retort'?");
    }

    [Theory]
    [InlineData("product: { metal: Ni }", "prodct: { metal: Ni }", 5, "'prodct'", "did you mean 'product'?")]
    [InlineData("rate: 10kg/h", "rate: 10kg", 4, "kg/h")]
    [InlineData("rate: 10kg/h", "rate: 10stone/h", 4, "stone/h")]
    [InlineData("substance: NiO", "substance: NiO9", 4, "'NiO9'", "did you mean 'NiO'?")]
    [InlineData("at: 700C", "at: 700", 8, "no unit")]
    [InlineData("stage: soak", "stage: sok", 8, "'sok'", "did you mean 'soak'?")]
    [InlineData("purity: 99%", "purity: 140%", 4, "140%")]
    [InlineData("flow: 20Nm3/h", "flow: -20Nm3/h", 6, "above 0")]
    [InlineData("price: 0.3/Nm3", "price: 0.3/kg", 6, "/Nm3")]
    [InlineData("frost -50C\"", "frost -50C, CO 60%\"", 6, "160")]
    [InlineData("metal: Ni }", "metal: Nx }", 5, "'Nx'")]
    [InlineData("rate: 10kg/h", "rate: 10kg/h, mass: 5kg", 4, "not both")]
    [InlineData("  - { stage: soak, at: 700C }", "  - { stage: soak, at: 700C }\nlimits: { highest-temperature: 650C }", 8, "site limit of 650 C")]
    [InlineData("title: \"Trial <b>7</b> & more | {{ title }}\"", "title: &a x", 1, "anchors")]
    public void A_wrong_sheet_is_refused_with_its_line(string from, string to, int line, params string[] parts)
    {
        using ScratchFolder folder = new();
        string text = Sheet.ReplaceLineEndings("\n").Replace(from, to, StringComparison.Ordinal);
        Assert.NotEqual(Sheet.ReplaceLineEndings("\n"), text);
        ProgramRun run = ProgramRun.OfWords(["plan", folder.Write("trial.yaml", text), "--to", folder["plan"]]);
        run.IsRefused(2, [$"trial.yaml:{line}:", .. parts]);
        Assert.False(Directory.Exists(folder["plan"]));
    }

    [Fact]
    public void A_bomb_and_a_giant_are_refused_unread()
    {
        using ScratchFolder folder = new();
        StringBuilder bomb = new("title: &a [x, x]\n");
        for (int i = 0; i < 30; i++)
        {
            bomb.Append(System.Globalization.CultureInfo.InvariantCulture, $"k{i}: &b{i} [*a, *a, *a, *a]\n");
        }

        ProgramRun.OfWords(["plan", folder.Write("bomb.yaml", bomb.ToString()), "--to", folder["plan"]]).IsRefused(2, "anchors and aliases");
        ProgramRun.OfWords(["plan", folder.Write("giant.yaml", "title: " + new string('x', 10_000_000)), "--to", folder["plan"]]).IsRefused(2, "no campaign sheet");
    }

    [Theory]
    [InlineData("title: nothing\nprogramme: [ { stage: soak, at: 700C } ]\n", "charge or parts")]
    [InlineData("title: nothing\ncharge: [ { substance: NiO } ]\n", "needs a programme")]
    [InlineData("charge: [ { substance: NiO } ]\nprogramme: [ { stage: soak, at: 700C } ]\n", "'title'")]
    public void A_sheet_without_its_bones_is_refused(string text, string part)
    {
        using ScratchFolder folder = new();
        ProgramRun.OfWords(["plan", folder.Write("trial.yaml", text.Replace("\\n", "\n", StringComparison.Ordinal)), "--to", folder["plan"]]).IsRefused(2, part);
    }

    [Fact]
    public void What_is_not_given_is_asked_for()
    {
        using ScratchFolder folder = new();
        string sheet = folder.Write("trial.yaml", Sheet.Replace(", flow: 20Nm3/h", "", StringComparison.Ordinal));
        ProgramRun run = ProgramRun.OfWords(["plan", sheet, "--to", folder["plan"]]);
        Assert.StartsWith("Not decidable: measure charge rate and gas flow next", run.Output, StringComparison.Ordinal);
    }
}
