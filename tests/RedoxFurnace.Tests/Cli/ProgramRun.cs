using System.Globalization;
using System.Text.Json;
using RedoxFurnace.Cli;

namespace RedoxFurnace.Tests.Cli;

/// <summary>One run of the whole program in memory: what it wrote and its exit code.</summary>
internal sealed record ProgramRun(int ExitCode, string Output, string Error)
{
    /// <summary>Runs the program with arguments as a shell would split them; double quotes hold spaces.</summary>
    public static ProgramRun Of(string line, int width = 150) => OfWords(Split(line), width);

    public static ProgramRun OfWords(string[] words, int width = 150)
    {
        using StringWriter output = new(CultureInfo.InvariantCulture) { NewLine = "\n" };
        using StringWriter error = new(CultureInfo.InvariantCulture) { NewLine = "\n" };
        int code = CommandLine.Run(words, output, error, width);
        return new ProgramRun(code, output.ToString(), error.ToString());
    }

    public string FirstLine => Output.Split('\n')[0];

    public JsonElement Json()
    {
        Assert.Equal(0, ExitCode);
        // Standard error may tell the stage at work; a refusal would not end with 0.
        using JsonDocument document = JsonDocument.Parse(Output);
        return document.RootElement.Clone();
    }

    /// <summary>Asserts a refusal: the exit code, nothing on standard output, one line on standard error that holds each part.</summary>
    public void IsRefused(int code, params string[] parts)
    {
        Assert.Equal(code, ExitCode);
        Assert.Equal("", Output);
        Assert.StartsWith("redoxfurnace: ", Error, StringComparison.Ordinal);
        Assert.Single(Error.TrimEnd('\n').Split('\n'));
        Assert.DoesNotContain("internal fault", Error, StringComparison.Ordinal);
        foreach (string part in parts)
        {
            Assert.Contains(part, Error, StringComparison.Ordinal);
        }
    }

    private static string[] Split(string line)
    {
        List<string> words = [];
        foreach ((int index, string piece) in line.Split('"').Index())
        {
            if (index % 2 == 1)
            {
                words.Add(piece);
            }
            else
            {
                words.AddRange(piece.Split(' ', StringSplitOptions.RemoveEmptyEntries));
            }
        }

        return [.. words];
    }
}
