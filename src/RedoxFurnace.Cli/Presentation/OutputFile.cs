using RedoxFurnace.Quantities;

namespace RedoxFurnace.Cli.Presentation;

/// <summary>Writes files beside their final name and moves them into place, so that nothing half-written is left.</summary>
internal static class OutputFile
{
    /// <summary>Writes a file.</summary>
    /// <param name="path">Where.</param>
    /// <param name="content">What.</param>
    /// <param name="force">Whether an existing file may be replaced.</param>
    /// <exception cref="NoAnswerException">It exists, or cannot be written.</exception>
    public static void Write(string path, ReadOnlySpan<byte> content, bool force)
    {
        if (File.Exists(path) && !force)
        {
            throw new NoAnswerException($"'{path}' exists already; choose another name or add --force");
        }

        if (Directory.Exists(path))
        {
            throw new NoAnswerException($"'{path}' is a folder; give a file name");
        }

        string folder = Path.GetDirectoryName(Path.GetFullPath(path))!;
        if (!Directory.Exists(folder))
        {
            throw new NoAnswerException($"the folder of '{path}' does not exist; make it first");
        }

        string beside = path + ".part";
        try
        {
            File.WriteAllBytes(beside, content);
            File.Move(beside, path, overwrite: force);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            File.Delete(beside);
            throw new NoAnswerException($"cannot write '{path}': {fault.Message}");
        }
    }
}
