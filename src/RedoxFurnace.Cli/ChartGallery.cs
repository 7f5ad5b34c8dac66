using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Charts.Sheets;
using RedoxFurnace.Charts.Writing;
using RedoxFurnace.Cli.Commands;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli;

/// <summary>What the sheets of a folder draw: one SVG and one PNG for each page, and a README that shows them.</summary>
internal static class ChartGallery
{
    private const int Dpi = 110;

    /// <summary>The sheets of a folder in alphabetical order.</summary>
    /// <exception cref="RequestException">No such folder, or no sheet in it.</exception>
    public static string[] Sheets(string folder)
    {
        string sheets = Path.Combine(folder, "sheets");
        string[] files = Directory.Exists(sheets) ? [.. Directory.EnumerateFiles(sheets, "*.yaml").Order(StringComparer.Ordinal)] : [];
        return files.Length > 0 ? files : throw new RequestException($"--gallery '{folder}' has no sheets/*.yaml; give a folder such as charts");
    }

    /// <summary>The pages of one sheet under the names of their files, without ending.</summary>
    public static IEnumerable<(string Name, Scene Scene)> Pages(string sheet, SubstanceDatabase database)
    {
        ImmutableArray<Scene> scenes = ChartDrawing.Draw(ChartCommand.ReadSheet(sheet), database, ChartCommand.Version).Scenes;
        string name = Path.GetFileNameWithoutExtension(sheet);
        return scenes.Select((scene, i) => (scenes.Length == 1 ? name : name + "-" + (i + 1).ToString(CultureInfo.InvariantCulture), scene));
    }

    /// <summary>Draws all.</summary>
    /// <returns>The files written.</returns>
    /// <exception cref="NoAnswerException">A file is there already and may not be replaced, or cannot be written.</exception>
    public static IReadOnlyList<string> Write(string folder, SubstanceDatabase database, bool force)
    {
        string gallery = Path.Combine(folder, "gallery");
        List<(string File, byte[] Content)> drawn = [];
        StringBuilder readme = new("# Gallery\n\nWhat the sheets of this folder draw. Rebuilt by one command:\n\n    redoxfurnace chart --gallery charts --force\n");
        foreach (string sheet in Sheets(folder))
        {
            foreach ((string name, Scene scene) in Pages(sheet, database))
            {
                drawn.Add((Path.Combine(gallery, name + ".svg"), SvgWriter.Write(scene)));
                drawn.Add((Path.Combine(gallery, name + ".png"), PngWriter.Write(scene, Dpi)));
                readme.Append(CultureInfo.InvariantCulture, $"\n## {scene.Title}\n\n[{Path.GetFileName(sheet)}](../sheets/{Path.GetFileName(sheet)}) · [SVG]({name}.svg)\n\n![{scene.Title}]({name}.png)\n");
            }
        }

        drawn.Add((Path.Combine(gallery, "README.md"), Encoding.UTF8.GetBytes(readme.ToString())));
        RefuseExisting([.. drawn.Select(item => item.File)], force);
        Directory.CreateDirectory(gallery);
        foreach ((string file, byte[] content) in drawn)
        {
            OutputFile.Write(file, content, force);
        }

        return [.. drawn.Select(item => item.File)];
    }

    /// <summary>All or none: a gallery half new and half old would mislead.</summary>
    private static void RefuseExisting(string[] files, bool force)
    {
        if (!force && files.FirstOrDefault(File.Exists) is { } there)
        {
            throw new NoAnswerException($"'{there}' exists already; add --force to rebuild the gallery");
        }
    }
}
