using System.Globalization;
using System.Text;

namespace RedoxFurnace.Tests.Published;

/// <summary>A table of published figures: comma-separated, with heading lines that start with '#'.</summary>
internal sealed class PublishedTable
{
    private PublishedTable(string name, IReadOnlyList<string> heading, IReadOnlyList<string> columns, IReadOnlyList<PublishedRow> rows)
    {
        Name = name;
        Heading = heading;
        Columns = columns;
        Rows = rows;
    }

    public string Name { get; }

    public IReadOnlyList<string> Heading { get; }

    public IReadOnlyList<string> Columns { get; }

    public IReadOnlyList<PublishedRow> Rows { get; }

    public PublishedRow this[string id] => Rows.Single(row => row["id"] == id);

    /// <summary>This table and another of the same columns.</summary>
    public PublishedTable With(PublishedTable other) => Columns.SequenceEqual(other.Columns)
        ? new PublishedTable(Name, Heading, Columns, [.. Rows, .. other.Rows])
        : throw new InvalidDataException($"{Name} and {other.Name} have different columns");

    public static PublishedTable Load(string name)
    {
        string[] lines = File.ReadAllLines(Path.Combine(AppContext.BaseDirectory, "Published", name));
        string[] heading = [.. lines.TakeWhile(line => line.StartsWith('#'))];
        string[] body = [.. lines.Skip(heading.Length).Where(line => line.Length > 0)];
        string[] columns = Split(body[0]);
        return new PublishedTable(name, heading, columns, [.. body.Skip(1).Select(line => ReadRow(name, columns, line))]);
    }

    public static double Number(string text) => double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture);

    private static PublishedRow ReadRow(string name, string[] columns, string line)
    {
        string[] cells = Split(line);
        return cells.Length == columns.Length
            ? new PublishedRow(columns.Zip(cells).ToDictionary(pair => pair.First, pair => pair.Second))
            : throw new InvalidDataException($"{name}: {cells.Length} cells, expected {columns.Length}: {line}");
    }

    private static string[] Split(string line)
    {
        List<string> cells = [];
        StringBuilder cell = new();
        bool quoted = false;
        foreach (char c in line)
        {
            if (c == '"')
            {
                quoted = !quoted;
            }
            else if (c == ',' && !quoted)
            {
                cells.Add(cell.ToString());
                cell.Clear();
            }
            else
            {
                cell.Append(c);
            }
        }

        return [.. cells, cell.ToString()];
    }
}
