namespace RedoxFurnace.Tests.Published;

/// <summary>One row of a table of published figures, by column name.</summary>
internal sealed class PublishedRow(IReadOnlyDictionary<string, string> cells)
{
    public string this[string column] => cells[column];

    public double Number(string column) => PublishedTable.Number(cells[column]);
}
