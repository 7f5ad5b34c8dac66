using System.Buffers;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using RedoxFurnace.Safety;
using Spectre.Console;

namespace RedoxFurnace.Cli.Presentation;

/// <summary>Writes answers: words first, then tables, then assumptions, hazards and sources, quietly.</summary>
internal sealed class Screen(TextWriter output, TextWriter error, int width)
{
    private const int WidestTable = 400;

    private static readonly JsonWriterOptions JsonOptions = new() { Indented = true, Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping, NewLine = "\n" };

    /// <summary>For progress and remarks that are no part of the answer.</summary>
    public TextWriter Error { get; } = error;

    /// <summary>Writes an answer in the form asked for.</summary>
    public int Show(Answer answer, OutputForm form)
    {
        switch (form)
        {
            case OutputForm.Json:
                output.Write(ToJson(answer.Json));
                output.Write('\n');
                break;
            case OutputForm.Csv:
                output.Write(answer.Tables.Count > 0 ? ToCsv(answer.Tables[0]) : "");
                break;
            default:
                WriteText(answer);
                break;
        }

        return CommandLine.Done;
    }

    /// <summary>A JSON text from a writing action.</summary>
    public static string ToJson(Action<Utf8JsonWriter> write)
    {
        ArrayBufferWriter<byte> buffer = new();
        using (Utf8JsonWriter writer = new(buffer, JsonOptions))
        {
            write(writer);
        }

        return Encoding.UTF8.GetString(buffer.WrittenSpan);
    }

    /// <summary>A table as CSV, keys as its heading.</summary>
    public static string ToCsv(AnswerTable table)
        => string.Concat(table.Rows.Select(row => row.Select(cell => Quoted(cell.Exact))).Prepend(table.Columns.Select(column => column.Key)).Select(line => string.Join(",", line) + "\n"));

    private static string Quoted(string text)
        => text.AsSpan().IndexOfAny(",\"\n") >= 0 ? "\"" + text.Replace("\"", "\"\"", StringComparison.Ordinal) + "\"" : text;

    private void WriteText(Answer answer)
    {
        Paragraph(answer.Headline, string.Empty);
        foreach (AnswerTable table in answer.Tables.Where(table => table.Rows.Count > 0))
        {
            output.Write('\n');
            if (table.Title is { } title)
            {
                Paragraph(title, string.Empty);
            }

            output.Write(Drawn(table));
        }

        Section("To be answered first", answer.Ask);
        Section("Notes", answer.Notes);
        Section("Assumed", answer.Assumptions);
        Section("Hazards", [.. answer.Hazards.Select(hazard => $"{hazard.Severity.ToString().ToUpperInvariant()}: {hazard.Brief}")]);
        Section("Sources", answer.Sources);
        if (answer.CallsForSafety)
        {
            output.Write('\n');
            Paragraph(SafetyRules.ClosingLine, string.Empty);
        }
    }

    /// <summary>The table as lines without the blank ones and trailing blanks of its frame.</summary>
    private string Drawn(AnswerTable table)
    {
        StringWriter text = new();
        IAnsiConsole console = AnsiConsole.Create(new AnsiConsoleSettings
        {
            Ansi = AnsiSupport.No,
            ColorSystem = ColorSystemSupport.NoColors,
            Interactive = InteractionSupport.No,
            Out = new AnsiConsoleOutput(text),
        });
        // Only sentences are broken to the width: a number broken over two lines is a wrong number.
        console.Profile.Width = table.Columns.Any(column => column.IsProse) ? width : WidestTable;
        console.Write(Grid(table));
        IEnumerable<string> lines = text.ToString().ReplaceLineEndings("\n").Split('\n').Select(line => line.TrimEnd()).Where(line => line.Length > 0);
        return string.Concat(lines.Select(line => line + "\n"));
    }

    private static Table Grid(AnswerTable table)
    {
        Table grid = new Table { Border = TableBorder.Simple, ShowRowSeparators = false };
        foreach (Column column in table.Columns)
        {
            TableColumn drawn = new(Markup.Escape(column.Heading)) { Alignment = column.IsNumber ? Justify.Right : Justify.Left, NoWrap = !column.IsProse, Padding = new Padding(1, 0, 0, 0) };
            grid.AddColumn(drawn);
        }

        foreach (IReadOnlyList<Cell> row in table.Rows)
        {
            grid.AddRow([.. row.Select(cell => new Text(cell.Text))]);
        }

        return grid;
    }

    private void Section(string heading, IReadOnlyList<string> lines)
    {
        if (lines.Count == 0)
        {
            return;
        }

        output.Write($"\n{heading}\n");
        foreach (string line in lines)
        {
            Paragraph(line, "  ");
        }
    }

    /// <summary>One paragraph, broken at spaces to the width, continued lines set in.</summary>
    private void Paragraph(string text, string indent)
    {
        StringBuilder line = new(indent);
        string hanging = indent.Length > 0 ? indent + "  " : indent;
        foreach (string word in text.Split(' '))
        {
            if (line.Length + word.Length + 1 > width && line.ToString().Trim().Length > 0)
            {
                output.Write(line.ToString().TrimEnd() + "\n");
                line.Clear().Append(hanging);
            }

            line.Append(word).Append(' ');
        }

        output.Write(line.ToString().TrimEnd() + "\n");
    }
}
