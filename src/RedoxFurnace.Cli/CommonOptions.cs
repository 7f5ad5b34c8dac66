using System.CommandLine;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli;

/// <summary>Options every command takes.</summary>
internal sealed class CommonOptions
{
    private readonly Option<bool> _json = new("--json") { Description = "write one JSON object and nothing else", Recursive = true };
    private readonly Option<bool> _csv = new("--csv") { Description = "write the main table as CSV", Recursive = true };
    private readonly Option<string> _units = new("--units") { Description = "si (default) or us: F, Torr, scf and lb beside", Recursive = true, HelpName = "si|us" };
    private readonly Option<string> _oxides = new("--oxides") { Description = "a folder with your own database entries, laid over the built-in ones", Recursive = true, HelpName = "FOLDER" };

    public void AddTo(Command root)
    {
        root.Options.Add(_json);
        root.Options.Add(_csv);
        root.Options.Add(_units);
        root.Options.Add(_oxides);
    }

    /// <summary>How the answer is to be written.</summary>
    public OutputForm Form(ParseResult parsed)
    {
        bool json = parsed.GetValue(_json);
        bool csv = parsed.GetValue(_csv);
        return json && csv
            ? throw new RequestException("--json and --csv exclude each other; give one")
            : json ? OutputForm.Json : csv ? OutputForm.Csv : OutputForm.Text;
    }

    /// <summary>Whether units of the United States are printed beside.</summary>
    public bool UsUnits(ParseResult parsed) => parsed.GetValue(_units) switch
    {
        null or "si" => false,
        "us" => true,
        { } other => throw RequestException.UnknownWord("--units", other, ["si", "us"]),
    };

    /// <summary>The database, with the user's folder laid over it where one is given.</summary>
    public SubstanceDatabase Database(ParseResult parsed)
        => parsed.GetValue(_oxides) is { } folder ? SubstanceDatabase.WithOverlay(OverlayFiles(parsed)!) : SubstanceDatabase.Bundled;

    /// <summary>The files of the user's folder, or null.</summary>
    public IReadOnlyList<DatabaseFile>? OverlayFiles(ParseResult parsed)
    {
        if (parsed.GetValue(_oxides) is not { } folder)
        {
            return null;
        }

        if (!Directory.Exists(folder))
        {
            throw new RequestException($"--oxides '{folder}' is not a folder; give one that holds .yaml files");
        }

        string[] files = [.. Directory.EnumerateFiles(folder, "*.yaml").Order(StringComparer.Ordinal)];
        return files.Length > 0
            ? [.. files.Select(file => new DatabaseFile(Path.GetFileName(file), File.ReadAllText(file)))]
            : throw new RequestException($"--oxides '{folder}' holds no .yaml file");
    }
}
