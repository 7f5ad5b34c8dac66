using System.Collections.Immutable;
using System.CommandLine;
using System.Globalization;
using System.Reflection;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Charts.Sheets;
using RedoxFurnace.Charts.Writing;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>chart --of LIST --to FILE</c> or <c>chart SHEET --to FILE</c>.</summary>
internal static class ChartCommand
{
    private const int UsualDpi = 150;
    private const long MostSheetBytes = 1_000_000;

    private static readonly string[] Formats = [".svg", ".png", ".pdf"];

    public static Command Create(Screen screen, CommonOptions common)
    {
        Argument<string?> sheet = new("SHEET") { Description = "a chart sheet (charts/sheets holds some); options add to it", Arity = ArgumentArity.ZeroOrOne };
        Option<string> to = new("--to") { Description = "file to write: .svg, .png or .pdf", HelpName = "FILE" };
        Option<string> gallery = new("--gallery") { Description = "draw every sheet of FOLDER/sheets into FOLDER/gallery, with a README", HelpName = "FOLDER" };
        Option<bool> force = new("--force") { Description = "replace an existing file" };
        Option<string> dpi = new("--dpi") { Description = "dots per inch of a PNG, 96 to 600 (150)", HelpName = "N" };
        Dictionary<string, Option> settings = ChartSettings.Keys.ToDictionary(key => key.Key, key => IsSwitch(key.Key)
            ? (Option)new Option<bool>("--" + key.Key) { Description = key.Meaning }
            : new Option<string>("--" + key.Key) { Description = key.Meaning, HelpName = "TEXT" });
        Command command = new("chart", "draw a stability chart, or what a chart sheet describes, to SVG, PNG or PDF") { sheet, to, force, dpi, gallery };
        foreach (Option option in settings.Values)
        {
            command.Options.Add(option);
        }

        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            if (parsed.GetValue(gallery) is { } folder)
            {
                return parsed.GetValue(to) is null && parsed.GetValue(sheet) is null
                    ? screen.Show(Present(ChartGallery.Write(folder, database, parsed.GetValue(force))), common.Form(parsed))
                    : throw new RequestException("--gallery draws every sheet of its folder; leave out SHEET and --to");
            }

            string target = parsed.GetValue(to) ?? throw new RequestException("'chart' needs --to: file to write, such as --to stability.svg");
            string format = Format(target);
            int dots = parsed.GetValue(dpi) is { } text ? (int)NumberWithUnit.ParsePlain(text, "--dpi") : UsualDpi;
            ChartSettings asked = ChartSettings.Of(settings.Select(pair => (pair.Key, Given(parsed, pair.Value))));
            if (parsed.GetValue(sheet) is { } file)
            {
                asked = ReadSheet(file).With(asked);
            }

            DrawnChart drawn = ChartDrawing.Draw(asked, database, Version);
            string[] files = Write(drawn.Scenes, target, format, dots, parsed.GetValue(force));
            return screen.Show(Present(drawn, files), common.Form(parsed));
        });
        return command;
    }

    /// <summary>Version of the program without its build mark.</summary>
    public static string Version { get; } = (typeof(ChartCommand).Assembly.GetCustomAttribute<AssemblyInformationalVersionAttribute>()?.InformationalVersion ?? "0").Split('+')[0];

    /// <summary>One scene in one of the formats.</summary>
    public static byte[] Encode(Scene scene, string format, int dpi) => format switch
    {
        ".svg" => SvgWriter.Write(scene),
        ".pdf" => PdfWriter.Write(scene),
        _ => PngWriter.Write(scene, dpi),
    };

    public static ChartSettings ReadSheet(string file)
    {
        if (!File.Exists(file))
        {
            throw new RequestException($"the chart sheet '{file}' does not exist; charts/sheets holds some to copy");
        }

        return new FileInfo(file).Length <= MostSheetBytes
            ? ChartSettings.Parse(File.ReadAllText(file), Path.GetFileName(file))
            : throw new RequestException($"the chart sheet '{file}' is larger than 1 MB; that is no chart sheet");
    }

    private static bool IsSwitch(string key) => key is "direct" or "bands" or "inverse";

    private static string? Given(ParseResult parsed, Option option) => option switch
    {
        Option<bool> truth => parsed.GetValue(truth) ? "yes" : null,
        Option<string> text => parsed.GetValue(text),
        _ => null,
    };

    private static string Format(string target)
    {
        string format = Path.GetExtension(target).ToLowerInvariant();
        return Formats.Contains(format)
            ? format
            : throw new RequestException($"--to '{target}' has no known file type; write a name that ends in {string.Join(", ", Formats)}");
    }

    /// <summary>Several pages go into one PDF, or into files numbered in order.</summary>
    private static string[] Write(ImmutableArray<Scene> scenes, string target, string format, int dpi, bool force)
    {
        if (scenes.Length == 1 || format == ".pdf")
        {
            OutputFile.Write(target, format == ".pdf" ? PdfWriter.Write(scenes) : Encode(scenes[0], format, dpi), force);
            return [target];
        }

        string[] files = [.. scenes.Select((_, i) => Path.ChangeExtension(target, null) + "-" + (i + 1).ToString(CultureInfo.InvariantCulture) + format)];
        if (!force && files.FirstOrDefault(File.Exists) is { } there)
        {
            throw new NoAnswerException($"'{there}' exists already; choose another name or add --force");
        }

        foreach ((int i, string file) in files.Index())
        {
            OutputFile.Write(file, Encode(scenes[i], format, dpi), force);
        }

        return files;
    }

    private static Answer Present(IReadOnlyList<string> files) => new()
    {
        Headline = $"Wrote {files.Count} files of the gallery.",
        Tables = [new AnswerTable(null, [new Column("file", "file", false)], [.. files.Select(file => (IReadOnlyList<Cell>)[Cell.Word(file)])])],
        Json = writer =>
        {
            writer.WriteStartObject();
            writer.WriteString("schema", "redoxfurnace/chart/1");
            writer.WriteString("headline", FormattableString.Invariant($"{files.Count} files of the gallery"));
            writer.Texts("files", files);
            writer.WriteStartArray("lines");
            writer.WriteEndArray();
            writer.Common([], [], null, [], [], []);
            writer.WriteEndObject();
        },
    };

    private static Answer Present(DrawnChart drawn, string[] files) => new()
    {
        Headline = $"Wrote {string.Join(", ", files)}: {drawn.Headline}.",
        Tables = [],
        Notes = drawn.Notes,
        Hazards = drawn.Hazards,
        Sources = drawn.Sources,
        Json = writer =>
        {
            writer.WriteStartObject();
            writer.WriteString("schema", "redoxfurnace/chart/1");
            writer.WriteString("headline", drawn.Headline);
            writer.Texts("files", files);
            writer.WriteStartArray("lines");
            foreach (ValueTable table in drawn.Scenes.SelectMany(scene => scene.Values))
            {
                writer.WriteStartObject();
                writer.WriteString("name", table.Name);
                writer.Texts("columns", table.Columns);
                writer.WriteStartArray("values");
                foreach (ImmutableArray<double> row in table.Rows)
                {
                    writer.WriteStartArray();
                    foreach (double value in row)
                    {
                        writer.WriteNumberValue(value);
                    }

                    writer.WriteEndArray();
                }

                writer.WriteEndArray();
                writer.WriteEndObject();
            }

            writer.WriteEndArray();
            writer.Common([], drawn.Sources, null, drawn.Notes, [], drawn.Hazards);
            writer.WriteEndObject();
        },
    };
}
