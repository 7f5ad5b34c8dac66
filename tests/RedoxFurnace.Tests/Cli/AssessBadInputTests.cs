namespace RedoxFurnace.Tests.Cli;

/// <summary>Wrong measurements: one line with file, line and column.</summary>
public class AssessBadInputTests
{
    private const string Good = """
        measurements:
          - id: own-1
            couple: Ni/NiO
            reactant: Ni
            product: NiO
            potential_j_per_mol_o2: { constant: -475000, t: 176 }
            range_k: [900, 1300]
            error: { value: 1, unit: "kJ/mol O2" }
            provenance: retrieved
            source: "plant cell, invented"
            use: fit
            t_fit_k: [900, 1100, 1300]
        """;

    [Theory]
    [InlineData("value: 1,", "value: 0,", "error '0'", "above 0")]
    [InlineData("product: NiO", "product: NiO7", "'NiO7'", "not in the database")]
    [InlineData("t_fit_k: [900", "t_fit_k: [800", "800 K lies outside")]
    [InlineData("use: fit", "use: maybe", "'maybe'", "fit, evidence")]
    [InlineData("id: own-1", "id: G1-107", "in the database already")]
    [InlineData("range_k", "range", "unknown key 'range'", "range_k")]
    public void A_wrong_measurement_is_refused(string right, string wrong, params string[] parts)
    {
        using ScratchFolder scratch = new();
        File.WriteAllText(scratch["own.yaml"], Good.Replace(right, wrong, StringComparison.Ordinal));
        ProgramRun.OfWords(["oxides", "assess", "--with", scratch["own.yaml"]]).IsRefused(2, ["own.yaml:", .. parts]);
    }

    [Fact]
    public void An_outlier_is_named_with_its_pull_and_the_entry_is_proposed()
    {
        using ScratchFolder scratch = new();
        File.WriteAllText(scratch["own.yaml"], Good.Replace("-475000", "-495000", StringComparison.Ordinal).Replace("product: NiO", "product: CoO", StringComparison.Ordinal).Replace("reactant: Ni", "reactant: Co", StringComparison.Ordinal));
        ProgramRun run = ProgramRun.OfWords(["oxides", "assess", "--with", scratch["own.yaml"]], 400);
        Assert.Equal(0, run.ExitCode);
        Assert.Contains("own-1 (Ni/NiO) pulls by", run.Output, StringComparison.Ordinal);
        Assert.Contains("copy the entry of CoO", run.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void An_existing_file_is_kept()
    {
        using ScratchFolder scratch = new();
        File.WriteAllText(scratch["c.yaml"], "mine");
        ProgramRun.OfWords(["oxides", "assess", "--to", scratch["c.yaml"]]).IsRefused(1, "--force");
        Assert.Equal("mine", File.ReadAllText(scratch["c.yaml"]));
    }
}
