using System.Text.Json;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Cli.Plans;

/// <summary>
/// The folder a plan is written to. A new folder is made beside its place and moved there whole. An existing one is touched only with --force, and
/// only if every file in it stands in the plan.json of an earlier plan; anything foreign is left alone and the plan is refused.
/// </summary>
internal static class PlanFolder
{
    private const string Index = "plan.json";

    /// <summary>Refuses a place that cannot take a plan, before any work is done.</summary>
    public static void Check(string folder, bool force)
    {
        string full = Path.GetFullPath(folder);
        if (File.Exists(full))
        {
            throw new NoAnswerException($"'{folder}' is a file; give a folder for the plan with --to");
        }

        string parent = Path.GetDirectoryName(full) ?? throw new RequestException($"--to '{folder}' is no folder a plan can be written to");
        if (!Directory.Exists(parent))
        {
            throw new NoAnswerException($"the folder that is to hold '{folder}' does not exist; make it first");
        }

        if (Directory.Exists(full))
        {
            CheckOwn(folder, full, force);
        }
    }

    public static void Write(string folder, IReadOnlyList<(string Name, byte[] Content)> files, bool force)
    {
        Check(folder, force);
        string full = Path.GetFullPath(folder);
        string beside = full.TrimEnd(Path.DirectorySeparatorChar) + ".part";
        try
        {
            if (Directory.Exists(beside))
            {
                Directory.Delete(beside, recursive: true);
            }

            foreach ((string name, byte[] content) in files)
            {
                string target = Path.Combine(beside, name);
                Directory.CreateDirectory(Path.GetDirectoryName(target)!);
                File.WriteAllBytes(target, content);
            }

            if (Directory.Exists(full))
            {
                Directory.Delete(full, recursive: true);
            }

            Directory.Move(beside, full);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            if (Directory.Exists(beside))
            {
                Directory.Delete(beside, recursive: true);
            }

            throw new NoAnswerException($"cannot write '{folder}': {fault.Message}");
        }
    }

    private static void CheckOwn(string folder, string full, bool force)
    {
        string[] there = [.. Directory.EnumerateFiles(full, "*", SearchOption.AllDirectories).Select(file => Path.GetRelativePath(full, file).Replace(Path.DirectorySeparatorChar, '/'))];
        if (there.Length == 0)
        {
            return;
        }

        HashSet<string> own = Listed(Path.Combine(full, Index));
        if (there.FirstOrDefault(file => !own.Contains(file)) is { } foreign)
        {
            throw new NoAnswerException($"'{folder}' holds '{foreign}', which is not of a plan; choose another folder with --to");
        }

        if (!force)
        {
            throw new NoAnswerException($"'{folder}' holds an earlier plan; add --force to replace it, or choose another folder with --to");
        }
    }

    private static HashSet<string> Listed(string index)
    {
        if (!File.Exists(index))
        {
            return [];
        }

        try
        {
            using JsonDocument plan = JsonDocument.Parse(File.ReadAllText(index));
            return plan.RootElement.GetProperty("schema").GetString() == PlanJson.Schema
                ? [.. plan.RootElement.GetProperty("files").EnumerateArray().Select(file => file.GetString()!)]
                : [];
        }
        catch (Exception fault) when (fault is JsonException or KeyNotFoundException or InvalidOperationException)
        {
            return [];
        }
    }
}
