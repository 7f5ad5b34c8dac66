using System.Text.Json;

namespace RedoxFurnace.Tests.Cli;

/// <summary>OUTPUT.md against what the program writes: every key stands in both.</summary>
public class OutputDocumentTests
{
    private const string CommonHeading = "Every object";
    private static readonly Dictionary<string, Section> Sections = Read();

    /// <summary>Every shape with a command under its heading.</summary>
    public static TheoryData<string> Shapes => [.. Sections.Keys.Where(key => key != CommonHeading)];

    [Theory, MemberData(nameof(Shapes))]
    public void Every_key_written_is_described_and_every_key_described_is_written(string shape)
    {
        Section section = Sections[shape];
        Assert.NotNull(section.Command);
        // OUT stands for a place to write to, DATA for a file of measured points.
        using ScratchFolder scratch = new();
        File.WriteAllText(scratch["data.csv"], "temperature_C,emf_mV\n800,730\n900,690\n1000,645\n1100,605\n");
        ProgramRun run = ProgramRun.Of(section.Command["redoxfurnace ".Length..].Replace("OUT", scratch["out"], StringComparison.Ordinal).Replace("DATA", scratch["data.csv"], StringComparison.Ordinal).Replace("charts/campaigns/", Path.Combine(Repository.Root, "charts", "campaigns") + "/", StringComparison.Ordinal));
        JsonElement answer = run.Json();
        Assert.Equal(shape, answer.GetProperty("schema").GetString());
        SortedSet<string> written = new(StringComparer.Ordinal);
        Collect(answer, "", written);
        string[] hazardKeys = [.. Sections[CommonHeading].Keys.Where(key => key.StartsWith("hazards[]", StringComparison.Ordinal))];
        string[] described = [.. section.Keys.Concat(Sections[CommonHeading].Keys)];
        Assert.Equal([], written.Except(described));
        Assert.Equal([], described.Except(written).Except(hazardKeys));
    }

    [Fact]
    public void Every_shape_of_the_program_has_its_section()
    {
        string sources = Path.Combine(Repository.Root, "src", "RedoxFurnace.Cli");
        string[] written = [.. Directory.EnumerateFiles(sources, "*.cs", SearchOption.AllDirectories)
            .Where(file => !file.Contains(Path.DirectorySeparatorChar + "obj" + Path.DirectorySeparatorChar, StringComparison.Ordinal))
            .SelectMany(file => File.ReadAllText(file).Split('"'))
            .Where(text => text.StartsWith("redoxfurnace/", StringComparison.Ordinal) && !text.Contains("-set/", StringComparison.Ordinal))
            .Distinct()];
        Assert.NotEmpty(written);
        Assert.Equal([], written.Except(Sections.Keys));
    }

    private static void Collect(JsonElement element, string path, SortedSet<string> keys)
    {
        switch (element.ValueKind)
        {
            case JsonValueKind.Object:
                foreach (JsonProperty property in element.EnumerateObject())
                {
                    string key = path.Length == 0 ? property.Name : path + "." + property.Name;
                    keys.Add(key);
                    Collect(property.Value, key, keys);
                }

                break;
            case JsonValueKind.Array:
                foreach (JsonElement member in element.EnumerateArray())
                {
                    Collect(member, path + "[]", keys);
                }

                break;
            default:
                break;
        }
    }

    private static Dictionary<string, Section> Read()
    {
        Dictionary<string, Section> sections = [];
        Section? current = null;
        foreach (string line in File.ReadLines(Path.Combine(Repository.Root, "src", "RedoxFurnace.Cli", "OUTPUT.md")))
        {
            if (line.StartsWith("## ", StringComparison.Ordinal))
            {
                current = new Section();
                sections.Add(line[3..].Trim(), current);
            }
            else if (line.StartsWith("    redoxfurnace ", StringComparison.Ordinal))
            {
                current!.Command = line.Trim();
            }
            else if (line.StartsWith("| `", StringComparison.Ordinal))
            {
                current!.Keys.Add(line.Split('`')[1]);
            }
        }

        return sections;
    }

    private sealed class Section
    {
        public string? Command { get; set; }

        public List<string> Keys { get; } = [];
    }
}
