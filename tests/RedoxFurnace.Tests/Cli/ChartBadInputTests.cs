namespace RedoxFurnace.Tests.Cli;

/// <summary>Charts asked for wrongly, or that cannot be drawn: one line that says what would do, the right exit code, no file left behind.</summary>
public class ChartBadInputTests
{
    private const int Wrong = 2;
    private const int Unanswerable = 1;

    [Theory]
    [InlineData("chart.gif")]
    [InlineData("chart")]
    [InlineData("chart.svgz")]
    public void An_unknown_file_type_is_refused_with_those_that_do(string name)
    {
        using ScratchFolder scratch = new();
        ProgramRun.OfWords(["chart", "--of", "Cr", "--to", scratch[name]]).IsRefused(Wrong, name, ".svg, .png, .pdf");
        Assert.Empty(Directory.EnumerateFileSystemEntries(scratch.Folder));
    }

    [Fact]
    public void An_existing_file_is_kept_without_force_and_replaced_with_it()
    {
        using ScratchFolder scratch = new();
        string file = scratch.Write("there.svg", "mine");
        ProgramRun.OfWords(["chart", "--of", "Cr", "--to", file]).IsRefused(Unanswerable, "there.svg", "exists already", "--force");
        Assert.Equal("mine", File.ReadAllText(file));
        Assert.Equal(0, ProgramRun.OfWords(["chart", "--of", "Cr", "--to", file, "--force"]).ExitCode);
        Assert.Contains("<svg", File.ReadAllText(file), StringComparison.Ordinal);
        Assert.Single(Directory.EnumerateFileSystemEntries(scratch.Folder));
    }

    [Fact]
    public void A_target_that_cannot_be_written_is_named()
    {
        using ScratchFolder scratch = new();
        ProgramRun.OfWords(["chart", "--of", "Cr", "--to", Path.Combine(scratch.Folder, "no", "such", "a.svg")]).IsRefused(Unanswerable, "a.svg", "make it first");
        Directory.CreateDirectory(scratch["folder.svg"]);
        ProgramRun.OfWords(["chart", "--of", "Cr", "--to", scratch["folder.svg"]]).IsRefused(Unanswerable, "is a folder");
    }

    [Theory]
    [InlineData("", Wrong, "no lines", "--of Cr,Fe,Si")]
    [InlineData("--of ,", Wrong, "no lines")]
    [InlineData("--of Cr2O4", Wrong, "'Cr2O4'", "did you mean 'Cr2O3'?")]
    [InlineData("--of Cr --with Cc", Wrong, "'Cc'", "did you mean 'C'?")]
    [InlineData("--of Cr --range 1800C..200C", Wrong, "reversed", "200C..1800C")]
    [InlineData("--of Cr --range 800C..800C", Wrong, "empty")]
    [InlineData("--of Cr --range 800..1200", Wrong, "'800'", "no unit")]
    [InlineData("--of Cr --range 800C", Wrong, "not a range")]
    [InlineData("--of Cr --range 9000C..9500C", Unanswerable, "no line has data", "Cr")]
    [InlineData("--of Cr --window 1100C..1000C", Wrong, "reversed", "1000C..1100C")]
    [InlineData("--of Cr --size A9", Wrong, "'A9'", "Letter")]
    [InlineData("--of Cr --size 10mmx10mm", Wrong, "out of range")]
    [InlineData("--of Cr --size 90mmx90mm", Unanswerable, "no room", "--frame none")]
    [InlineData("--of Cr --frame box", Wrong, "'box'", "document")]
    [InlineData("--of Cr --scales pH", Wrong, "'pH'", "H2/H2O")]
    [InlineData("--of Cr --highlight Fe", Wrong, "'Fe'", "Cr/Cr2O3")]
    [InlineData("--of Cr --unit R", Wrong, "'R'")]
    [InlineData("--of Cr --gas-ratio 0 --with H2", Wrong, "'0'", "above 0")]
    [InlineData("--of Cr --kind pie", Wrong, "'pie'", "margins")]
    [InlineData("--kind van-t-hoff", Wrong, "no reaction")]
    [InlineData("--kind van-t-hoff --equations \"C + O2 = CO\"", Wrong, "does not balance")]
    [InlineData("--kind van-t-hoff --equations \"2 C + O2 = 2 CO\" --points 900C", Wrong, "'900C'", "900C 0.5")]
    [InlineData("--kind van-t-hoff --equations \"2 C + O2 = 2 CO\" --range 1200C..600C", Wrong, "reversed")]
    [InlineData("--kind margins --of Cr2O3", Wrong, "needs a temperature")]
    [InlineData("--kind margins --of Cr2O3,Fe2O3 --at 900C", Wrong, "one oxide")]
    [InlineData("--kind oxygen-pressure --of Cr --ratios CO/H2", Wrong, "'CO/H2'", "CO/CO2")]
    public void What_cannot_be_drawn_is_refused_and_leaves_no_file(string options, int code, params string[] parts)
    {
        using ScratchFolder scratch = new();
        ProgramRun.Of($"chart {options} --to \"{scratch["a.svg"]}\"").IsRefused(code, parts);
        Assert.Empty(Directory.EnumerateFileSystemEntries(scratch.Folder));
    }

    [Theory]
    [InlineData("--dpi 20", "20", "96 to 600")]
    [InlineData("--dpi 601", "601", "96 to 600")]
    [InlineData("--dpi fine", "'fine'")]
    public void A_resolution_out_of_range_is_refused(string options, params string[] parts)
    {
        using ScratchFolder scratch = new();
        ProgramRun.Of($"chart --of Cr {options} --to \"{scratch["a.png"]}\"").IsRefused(Wrong, parts);
        Assert.Empty(Directory.EnumerateFileSystemEntries(scratch.Folder));
    }

    [Theory]
    [InlineData("of: Cr\nrnge: 200C..900C\n", "sheet.yaml:2:1", "'rnge'", "did you mean 'range'?")]
    [InlineData("of: Cr\nrange: 900C..200C\n", "sheet.yaml:2:8", "200C..900C")]
    [InlineData("of: Cr\nof: Fe\n", "sheet.yaml:2:1", "twice")]
    [InlineData("of: Cr\nbands: perhaps\n", "sheet.yaml:2:8", "yes or no")]
    [InlineData("of: {a: b}\n", "sheet.yaml:1:5", "a mapping")]
    [InlineData("", "sheet.yaml:1:1", "empty")]
    [InlineData("kind: van-t-hoff\nequations: \"C + O2 = CO\"\n", "sheet.yaml:2:12", "does not balance")]
    public void A_fault_in_a_sheet_is_named_with_line_and_column(string sheet, params string[] parts)
    {
        using ScratchFolder scratch = new();
        string file = scratch.Write("sheet.yaml", sheet);
        ProgramRun.OfWords(["chart", file, "--to", scratch["a.svg"]]).IsRefused(Wrong, parts);
        Assert.False(File.Exists(scratch["a.svg"]));
    }

    [Fact]
    public void A_missing_sheet_or_gallery_is_named()
    {
        ProgramRun.Of("chart nosuch.yaml --to a.svg").IsRefused(Wrong, "'nosuch.yaml'", "charts/sheets");
        ProgramRun.Of("chart --gallery nosuch").IsRefused(Wrong, "'nosuch'", "sheets/*.yaml");
        ProgramRun.Of("chart --of Cr").IsRefused(Wrong, "--to");
    }

    [Fact]
    public void An_existing_gallery_is_kept_whole_without_force()
    {
        using ScratchFolder scratch = new();
        Directory.CreateDirectory(scratch["sheets"]);
        scratch.Write(Path.Combine("sheets", "b.yaml"), "of: Cr\n");
        scratch.Write(Path.Combine("sheets", "a.yaml"), "of: Fe\n");
        Directory.CreateDirectory(scratch["gallery"]);
        scratch.Write(Path.Combine("gallery", "b.svg"), "mine");
        ProgramRun.OfWords(["chart", "--gallery", scratch.Folder]).IsRefused(Unanswerable, "b.svg", "--force");
        Assert.Single(Directory.EnumerateFiles(scratch["gallery"]));
        Assert.Equal(0, ProgramRun.OfWords(["chart", "--gallery", scratch.Folder, "--force"]).ExitCode);
        Assert.Equal(["README.md", "a.png", "a.svg", "b.png", "b.svg"], Directory.EnumerateFiles(scratch["gallery"]).Select(file => Path.GetFileName(file)).Order(StringComparer.Ordinal));
    }

    /// <summary>What one page cannot label is spread over several, with a note; each line stands on exactly one of them.</summary>
    [Fact]
    public void More_lines_than_a_page_can_label_are_spread_over_pages_that_stay_legible()
    {
        const string metals = "Ag,Al,B,Ba,Be,Ca,Cd,Ce,Co,Cr,Cs,Cu,Fe,Ga,Ge,Hf,In,K,La,Li,Mg,Mn,Mo,Na,Nb,Nd,Ni,P,Pb,Pd,Rb,Ru,Sc,Si,Sn,Sr,Ta,Th,Ti,U,V,W,Y,Zn,Zr";
        string ratios = string.Join(',', Enumerable.Range(1, 3).Select(i => Math.Pow(10, i)));
        using ScratchFolder scratch = new();
        ProgramRun run = ProgramRun.OfWords(["chart", "--of", metals, "--with", "C,H2", "--gas-ratio", ratios, "--to", scratch["many.svg"]]);
        Assert.Equal(0, run.ExitCode);
        Assert.Contains("spread over", run.Output, StringComparison.Ordinal);
        string[] files = [.. Directory.EnumerateFiles(scratch.Folder).Order(StringComparer.Ordinal)];
        Assert.True(files.Length > 1);
        string[] texts = [.. files.Select(File.ReadAllText)];
        Assert.Equal(1, texts.Count(text => text.Contains("<title>Cr/Cr2O3</title>", StringComparison.Ordinal)));
        Assert.Equal(1, texts.Count(text => text.Contains("<title>Zr/ZrO2</title>", StringComparison.Ordinal)));
        Assert.All(texts, text => Assert.Contains("<title>H2 (H2/H2O 100)</title>", text, StringComparison.Ordinal));

        ProgramRun pdf = ProgramRun.OfWords(["chart", "--of", metals, "--with", "C,H2", "--gas-ratio", ratios, "--to", scratch["many.pdf"]]);
        Assert.Equal(0, pdf.ExitCode);
        Assert.True(File.Exists(scratch["many.pdf"]));
    }
}
