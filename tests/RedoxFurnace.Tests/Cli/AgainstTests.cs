using System.Text.Json;

namespace RedoxFurnace.Tests.Cli;

/// <summary>The table of differences in oxides/README.md.</summary>
public class AgainstTests
{
    private static readonly string Tables = Path.Combine(Repository.Root, "tests", "RedoxFurnace.Tests", "Published");

    [Fact]
    public void The_table_in_the_readme_is_what_the_command_writes()
    {
        string committed = File.ReadAllText(Path.Combine(Repository.Root, "oxides", "README.md")).ReplaceLineEndings("\n");
        using ScratchFolder scratch = new();
        File.WriteAllText(scratch["README.md"], committed);
        Assert.Equal(0, ProgramRun.OfWords(["oxides", "against", "--tables", Tables, "--to", scratch["README.md"], "--force"]).ExitCode);
        Assert.Equal(committed, File.ReadAllText(scratch["README.md"]));
        Assert.Contains("| Cr2O3 | NIST-JANAF 1998 |", committed, StringComparison.Ordinal);
    }

    // NIST-JANAF, 4th ed. (Chase 1998), as copied in janaf-formation.csv: every one of its 19 substances has its row.
    [Fact]
    public void Every_substance_of_the_table_and_every_measurement_kept_out_has_its_row_and_each_excess_its_reason()
    {
        JsonElement[] rows = [.. ProgramRun.OfWords(["oxides", "against", "--tables", Tables, "--json"]).Json().GetProperty("differences").EnumerateArray()];
        Assert.Equal(19, rows.Count(row => row.GetProperty("published").GetString() == "NIST-JANAF 1998"));
        Assert.Equal(70 - 31, rows.Count(row => row.GetProperty("published").GetString() != "NIST-JANAF 1998"));
        Assert.All(rows.Where(row => row.GetProperty("exceeds").GetBoolean()), row => Assert.True(row.GetProperty("reason").GetString()!.Length > 14, row.GetProperty("name").GetString()));
    }

    [Fact]
    public void Wrong_places_are_refused()
    {
        using ScratchFolder scratch = new();
        ProgramRun.OfWords(["oxides", "against", "--tables", scratch["nothing"]]).IsRefused(2, "holds no janaf-formation.csv");
        File.WriteAllText(scratch["plain.md"], "no marks");
        ProgramRun.OfWords(["oxides", "against", "--to", scratch["plain.md"], "--force"]).IsRefused(2, "lacks the marks");
        Assert.Equal("no marks", File.ReadAllText(scratch["plain.md"]));
    }
}
