using System.Runtime.CompilerServices;

namespace RedoxFurnace.Tests;

/// <summary>The checked-out tree the tests were built from, for tests over files as they stand in it.</summary>
internal static class Repository
{
    public static string Root { get; } = Find();

    private static string Find([CallerFilePath] string here = "")
    {
        // A deterministic build maps source paths to "/_/": then the tree is found from where the tests run.
        DirectoryInfo? folder = new(File.Exists(here) ? Path.GetDirectoryName(here)! : AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "RedoxFurnace.sln")))
        {
            folder = folder.Parent;
        }

        return folder?.FullName ?? throw new InvalidOperationException("RedoxFurnace.sln is in no folder above the tests");
    }
}
