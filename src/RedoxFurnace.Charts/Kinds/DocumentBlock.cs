using System.Collections.Immutable;

namespace RedoxFurnace.Charts.Kinds;

/// <summary>Fields of the title block of a controlled document. All are given by the user, never by the clock; empty ones are left to be filled by hand.</summary>
public sealed record DocumentBlock
{
    /// <summary>Title of the document.</summary>
    public string Title { get; init; } = "";

    /// <summary>Document number.</summary>
    public string Number { get; init; } = "";

    /// <summary>Revision.</summary>
    public string Revision { get; init; } = "";

    /// <summary>Date as written by the user.</summary>
    public string Date { get; init; } = "";

    /// <summary>Page, such as <c>1 of 1</c>.</summary>
    public string Page { get; init; } = "";

    /// <summary>Who prepared it.</summary>
    public string Prepared { get; init; } = "";

    /// <summary>Who checked it.</summary>
    public string Checked { get; init; } = "";

    /// <summary>Who approved it.</summary>
    public string Approved { get; init; } = "";

    /// <summary>What it is for.</summary>
    public string Purpose { get; init; } = "";

    /// <summary>The fields with the tool's own: database and version.</summary>
    /// <param name="databaseHash">SHA-256 of the database.</param>
    /// <param name="version">Of the tool.</param>
    /// <returns>Names and texts in the order of the block.</returns>
    public ImmutableArray<(string Name, string Text)> Fields(string databaseHash, string version) =>
    [
        ("document no.", Number), ("revision", Revision), ("date", Date), ("page", Page),
        ("prepared", Prepared), ("checked", Checked), ("approved", Approved), ("tool", "RedoxFurnace " + version),
        ("purpose", Purpose), ("", ""), ("", ""), ("database", databaseHash.Length > 16 ? databaseHash[..16] : databaseHash),
    ];

    /// <summary>The fields that are filled, for the file's own record.</summary>
    /// <returns>Name and text.</returns>
    public ImmutableSortedDictionary<string, string> Information()
    {
        ImmutableSortedDictionary<string, string>.Builder filled = ImmutableSortedDictionary.CreateBuilder<string, string>(StringComparer.Ordinal);
        foreach ((string name, string text) in new[] { ("author", Prepared), ("date", Date), ("document no.", Number), ("revision", Revision) })
        {
            if (text.Length > 0)
            {
                filled[name] = text;
            }
        }

        return filled.ToImmutable();
    }
}
