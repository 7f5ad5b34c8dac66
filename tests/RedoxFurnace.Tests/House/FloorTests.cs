using System.Text.RegularExpressions;

namespace RedoxFurnace.Tests.House;

/// <summary>The house as its sources stand: floors know only the floors above, and nothing below the program prints or asks the machine.</summary>
public partial class FloorTests
{
    /// <summary>Floors from the top; each may use those before it.</summary>
    private static readonly string[] Floors = ["Quantities", "Substances", "Oxidation", "Assessments", "Atmospheres", "Charges", "Reductants", "Safety", "Campaigns"];

    private static readonly string LibraryFolder = Path.Combine(Repository.Root, "src", "RedoxFurnace");

    /// <summary>Every floor that exists.</summary>
    public static TheoryData<string> Existing => [.. Directory.EnumerateDirectories(LibraryFolder).Select(folder => Path.GetFileName(folder)!).Where(name => name is not ("bin" or "obj")).Order(StringComparer.Ordinal)];

    [Theory, MemberData(nameof(Existing))]
    public void A_floor_uses_only_the_floors_above_it(string floor)
    {
        int place = Array.IndexOf(Floors, floor);
        Assert.True(place >= 0, $"'{floor}' is no floor of the house; the floors are {string.Join(", ", Floors)}");
        string[] below = Floors[(place + 1)..];
        foreach (string file in Sources(Path.Combine(LibraryFolder, floor)))
        {
            string[] used = [.. FloorName().Matches(File.ReadAllText(file)).Select(match => match.Groups[1].Value).Distinct()];
            Assert.True(!used.Intersect(below).Any(), $"{Path.GetFileName(file)} of {floor} uses {string.Join(", ", used.Intersect(below))}");
        }
    }

    [Fact]
    public void The_namespace_of_a_file_is_its_folder()
    {
        foreach (string file in Sources(LibraryFolder))
        {
            string folder = Path.GetFileName(Path.GetDirectoryName(file)!);
            Assert.Contains($"namespace RedoxFurnace.{folder};", File.ReadAllText(file), StringComparison.Ordinal);
        }
    }

    [Fact]
    public void A_file_holds_one_public_type_of_its_own_name()
    {
        foreach (string project in new[] { "RedoxFurnace", "RedoxFurnace.Charts" })
        {
            foreach (string file in Sources(Path.Combine(Repository.Root, "src", project)))
            {
                string[] types = [.. PublicType().Matches(File.ReadAllText(file)).Select(match => match.Groups[1].Value).Distinct()];
                Assert.True(types.Length <= 1, $"{file} holds {string.Join(", ", types)}");
                Assert.True(types.Length == 0 || Path.GetFileNameWithoutExtension(file).Split('.')[0] == types[0], $"{file} holds {string.Join(", ", types)}");
            }
        }
    }

    /// <summary>What a calculation may not touch: console, clock, culture of the machine, files, unseeded chance.</summary>
    [Theory]
    [InlineData(@"\bConsole\.")]
    [InlineData(@"\bDateTime(Offset)?\.(Utc)?Now\b")]
    [InlineData(@"\bDateTime\.Today\b")]
    [InlineData(@"\bCurrent(UI)?Culture\b")]
    [InlineData(@"\bStopwatch\b")]
    [InlineData(@"\bFile\.(Read|Write|Open)")]
    [InlineData(@"\bEnvironment\.")]
    [InlineData(@"new Random\(\)|Random\.Shared")]
    [InlineData(@"Guid\.NewGuid")]
    public void The_libraries_never_ask_the_machine(string forbidden)
    {
        Regex pattern = new(forbidden);
        foreach (string project in new[] { "RedoxFurnace", "RedoxFurnace.Charts" })
        {
            foreach (string file in Sources(Path.Combine(Repository.Root, "src", project)))
            {
                Assert.False(pattern.IsMatch(File.ReadAllText(file)), $"{file} holds {forbidden}");
            }
        }
    }

    /// <summary>Only the entry point may touch the console: everything else writes where it is told.</summary>
    [Fact]
    public void Only_the_entry_point_of_the_program_touches_the_console()
    {
        string[] files = [.. Sources(Path.Combine(Repository.Root, "src", "RedoxFurnace.Cli")).Where(file => Regex.IsMatch(File.ReadAllText(file), @"(?<![\w.])Console\.(Out|Error|Write|In|Read)")).Select(file => Path.GetFileName(file)!)];
        Assert.Equal(["Program.cs"], files);
    }

    private static IEnumerable<string> Sources(string folder)
        => Directory.EnumerateFiles(folder, "*.cs", SearchOption.AllDirectories)
            .Where(file => !file.Split(Path.DirectorySeparatorChar).Any(part => part is "bin" or "obj"))
            .Order(StringComparer.Ordinal);

    [GeneratedRegex(@"RedoxFurnace\.(Quantities|Substances|Oxidation|Assessments|Atmospheres|Charges|Reductants|Safety|Campaigns)\b")]
    private static partial Regex FloorName();

    [GeneratedRegex(@"^public (?:(?:static|sealed|abstract|readonly|partial|ref) )*(?:class|record struct|record|struct|enum|interface) (\w+)", RegexOptions.Multiline)]
    private static partial Regex PublicType();
}
