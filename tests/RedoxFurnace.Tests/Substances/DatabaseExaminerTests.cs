using System.Globalization;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Substances;

/// <summary>One broken entry a rule: the examiner names it, and is silent on the sound one.</summary>
public class DatabaseExaminerTests
{
    private const string Sources = """
        sources:
          - { key: plant-book, citation: "Handbook of an invented plant", licence: "own data", taken: "invented figures", provenance: memory }
        """;

    /// <summary>An invented oxide of bismuth that melts at 1000 K: H and S of the liquid are worked out by hand so that G meets there and S rises by 10 J/(mol K).</summary>
    private const string Sound = """
        substances:
          - formula: Bi4O
            class: oxide
            uncertainty: { enthalpy_kj_per_mol: 5, source: plant-book }
            phases:
              - label: solid
                state: solid
                model: heat-capacity
                source: plant-book
                range_k: [298.15, 1000]
                enthalpy_298_kj_per_mol: -100
                entropy_298_j_per_mol_k: 80
                cp_j_per_mol_k: { a: 60 }
              - label: liquid
                state: liquid
                model: heat-capacity
                source: plant-book
                range_k: [1000, 1500]
                enthalpy_298_kj_per_mol: -90
                entropy_298_j_per_mol_k: 90
                cp_j_per_mol_k: { a: 60 }
        """;

    [Fact]
    public void A_sound_entry_raises_nothing() => Assert.DoesNotContain(Findings(Sound), finding => finding.Severity != FindingSeverity.Notice);

    [Theory]
    [InlineData("range-gap", FindingSeverity.Error, "range_k: [1000, 1500]", "range_k: [1010, 1500]")]
    [InlineData("declared-gap", FindingSeverity.Warning, "range_k: [298.15, 1000]", "gap_after: true\n        range_k: [298.15, 990]")]
    [InlineData("range-overlap", FindingSeverity.Warning, "range_k: [1000, 1500]", "range_k: [990, 1500]")]
    [InlineData("gibbs-step", FindingSeverity.Error, "enthalpy_298_kj_per_mol: -90", "enthalpy_298_kj_per_mol: -89.97")]
    [InlineData("entropy-falls", FindingSeverity.Error, "enthalpy_298_kj_per_mol: -90\n        entropy_298_j_per_mol_k: 90", "enthalpy_298_kj_per_mol: -101\n        entropy_298_j_per_mol_k: 79")]
    [InlineData("heat-capacity", FindingSeverity.Error, "{ a: 60 }\n      - label", "{ a: 60, c: -9000000 }\n      - label")]
    [InlineData("duplicate-label", FindingSeverity.Error, "label: liquid", "label: solid")]
    [InlineData("unreadable", FindingSeverity.Error, "        source: plant-book\n        range_k: [1000", "        range_k: [1000")]
    [InlineData("class-default", FindingSeverity.Notice, "    uncertainty: { enthalpy_kj_per_mol: 5, source: plant-book }\n", "")]
    public void A_broken_entry_is_found_with_file_and_line(string id, FindingSeverity severity, string from, string to)
    {
        string sound = Sound.ReplaceLineEndings("\n");
        string broken = sound.Replace(from, to, StringComparison.Ordinal);
        Assert.NotEqual(sound, broken);
        DatabaseFinding finding = Findings(broken).First(finding => finding.Id == id && (finding.At.File == "ours.yaml" || id == "class-default"));
        Assert.Equal(severity, finding.Severity);
        Assert.InRange(finding.At.Line, 1, broken.Split('\n').Length + (id == "class-default" ? 10000 : 0));
        Assert.DoesNotContain(Findings(sound), other => other.Id == id && other.At.File == "ours.yaml");
    }

    /// <summary>G may step by 20 J/mol where phases meet and no more.</summary>
    [Theory]
    [InlineData(19.9, false)]
    [InlineData(20.1, true)]
    public void The_step_allowed_at_a_phase_change_is_twenty_joule(double joule, bool found)
    {
        string text = Sound.Replace("enthalpy_298_kj_per_mol: -90", "enthalpy_298_kj_per_mol: " + (-90 + (joule / 1000)).ToString(CultureInfo.InvariantCulture), StringComparison.Ordinal);
        Assert.Equal(found, Findings(text).Any(finding => finding.Id == "gibbs-step"));
    }

    [Fact]
    public void The_database_that_comes_with_the_tool_has_neither_error_nor_warning()
        => Assert.DoesNotContain(DatabaseExaminer.Examine(SubstanceDatabase.Bundled), finding => finding.Severity != FindingSeverity.Notice);

    [Fact]
    public void Every_phase_cites_a_source_in_full()
    {
        foreach (Phase phase in SubstanceDatabase.Bundled.All.SelectMany(substance => substance.Phases))
        {
            Assert.NotEqual("", SubstanceDatabase.Bundled.Sources[phase.SourceKey].Text);
        }
    }

    /// <summary>The elements the tool promises, each with an oxide or as a gas.</summary>
    [Fact]
    public void The_elements_promised_are_covered()
    {
        string[] metals = "Ag Al B Ba Be Ca Cd Ce Co Cr Cs Cu Fe Ga Ge Hf Hg In K La Li Mg Mn Mo Na Nb Nd Ni P Pb Pd Rb Sc Si Sn Sr Ta Th Ti V W Y Zn Zr".Split(' ');
        Assert.Equal([], metals.Where(metal => SubstanceDatabase.Bundled.OxidesOf(metal).Count == 0));
        string[] furnace = "C H2 H2O CO CO2 CH4 N2 NH3 Ar He O2".Split(' ');
        Assert.Equal([], furnace.Where(gas => SubstanceDatabase.Bundled.TryGet(gas) is null));
    }

    private static System.Collections.Immutable.ImmutableArray<DatabaseFinding> Findings(string text)
        => DatabaseExaminer.ExamineOverlay([new DatabaseFile("ours.yaml", text), new DatabaseFile("sources.yaml", Sources)]);
}
