namespace RedoxFurnace.Tests.Cli;

/// <summary>A folder of its own for one test, removed afterwards.</summary>
internal sealed class ScratchFolder : IDisposable
{
    public ScratchFolder() => Folder = Directory.CreateTempSubdirectory("redoxfurnace-test-").FullName;

    public string Folder { get; }

    public string this[string name] => Path.Combine(Folder, name);

    public string Write(string name, string text)
    {
        File.WriteAllText(this[name], text);
        return this[name];
    }

    public void Dispose() => Directory.Delete(Folder, recursive: true);
}
