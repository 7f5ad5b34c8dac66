using System.Text.Json;

namespace RedoxFurnace.Tests.Cli;

/// <summary>A user's own folder of entries: what it changes, and what is refused with file, line and column.</summary>
public class OverlayTests
{
    private const string Sources = """
        sources:
          - { key: plant-book, citation: "Handbook of an invented plant", licence: "own data", taken: "invented figures", provenance: memory }
        """;

    private const string Line = """
        substances:
          - formula: MgCr2O4
            class: compound-oxide
            phases:
              - label: solid
                state: solid
                model: line
                source: plant-book
                provenance: memory
                pieces:
                  - { range_k: [1000, 1800], reaction: "MgO + Cr2O3 = MgCr2O4", gibbs_j: [-40000, 5.0], uncertainty_kj: 6 }
        """;

    [Fact]
    public void An_entry_of_the_users_own_is_used_and_said()
    {
        using ScratchFolder folder = new();
        folder.Write("sources.yaml", Sources);
        folder.Write("ours.yaml", Line);
        JsonElement shown = ProgramRun.OfWords(["oxides", "show", "MgCr2O4", "--at", "1200C", "--json", "--oxides", folder.Folder]).Json();
        JsonElement magnesia = ProgramRun.Of("oxides show MgO --at 1200C --json").Json();
        JsonElement chromia = ProgramRun.Of("oxides show Cr2O3 --at 1200C --json").Json();
        // The line as written: -40000 + 5 T J at 1473.15 K, on top of its two partners.
        double expected = Formation(magnesia) + Formation(chromia) - 40 + (0.005 * 1473.15);
        Assert.Equal(expected, Formation(shown), 6);
        ProgramRun ranked = ProgramRun.OfWords(["rank", "MgCr2O4", "--at", "1200C", "--with", "Al", "--oxides", folder.Folder]);
        Assert.Equal(0, ranked.ExitCode);
        Assert.Contains("from your own folder", ranked.Output, StringComparison.Ordinal);
        Assert.Contains("Handbook of an invented plant", ranked.Output, StringComparison.Ordinal);

        static double Formation(JsonElement answer) => answer.GetProperty("rows")[0].GetProperty("dGf_kJ_per_mol").GetDouble();
    }

    [Theory]
    [InlineData("  - formula: MgCr2O4", "  - formla: MgCr2O4", 2, 5, "formla", "formula")]
    [InlineData("    class: compound-oxide", "    class: compound-oxid", 3, 12, "compound-oxid", "compound-oxide")]
    [InlineData("MgO + Cr2O3 = MgCr2O4", "2 MgO + Cr2O3 = MgCr2O4", 11, null, "balance")]
    [InlineData("        source: plant-book\n", "", 5, null, "source")]
    [InlineData("source: plant-book", "source: plant-bok", 8, 17, "plant-bok", "add it to sources.yaml")]
    [InlineData("gibbs_j: [-40000, 5.0]", "gibbs_j: [-40000, NaN]", 11, null, "NaN")]
    [InlineData("gibbs_j: [-40000, 5.0]", "gibbs_j: [\"-40000,0\", 5.0]", 11, null, "-40000,0")]
    [InlineData("range_k: [1000, 1800]", "range_k: [1800, 1000]", 11, null, "range")]
    [InlineData("uncertainty_kj: 6", "uncertainty_kj: -6", 11, null, "uncertainty_kj")]
    [InlineData("    class: compound-oxide", "    class: compound-oxide\n    class: compound-oxide", 4, null, "class")]
    [InlineData("formula: MgCr2O4", "formula: Mg(Cr2O4", 2, null, "Mg(Cr2O4")]
    [InlineData("formula: MgCr2O4", "formula: &a MgCr2O4", 2, null, "")]
    public void A_wrong_entry_is_refused_with_file_line_and_column(string from, string to, int line, int? column, params string[] parts)
    {
        using ScratchFolder folder = new();
        folder.Write("sources.yaml", Sources);
        string text = Line.ReplaceLineEndings("\n").Replace(from, to, StringComparison.Ordinal);
        Assert.NotEqual(Line.ReplaceLineEndings("\n"), text);
        folder.Write("ours.yaml", text);
        ProgramRun run = ProgramRun.OfWords(["rank", "MgCr2O4", "--at", "1200C", "--oxides", folder.Folder]);
        run.IsRefused(2, [column is { } place ? $"ours.yaml:{line}:{place}" : $"ours.yaml:{line}:", .. parts]);
    }

    [Fact]
    public void A_file_that_is_no_yaml_is_refused_with_its_place()
    {
        using ScratchFolder folder = new();
        folder.Write("ours.yaml", "substances:\n  - formula: [MgO\n");
        ProgramRun.OfWords(["rank", "Cr2O3", "--at", "1200C", "--oxides", folder.Folder]).IsRefused(2, "ours.yaml:");
    }

    [Fact]
    public void An_empty_folder_is_refused()
    {
        using ScratchFolder folder = new();
        ProgramRun.OfWords(["rank", "Cr2O3", "--at", "1200C", "--oxides", folder.Folder]).IsRefused(2, "holds no .yaml file");
    }
}
