using System.Globalization;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Cli.Presentation;

/// <summary>One cell of a table: what people read, and what machines read.</summary>
/// <param name="Text">Printed; <c>-</c> where there is no value.</param>
/// <param name="Exact">For CSV.</param>
internal readonly record struct Cell(string Text, string Exact)
{
    public static Cell Word(string? text) => new(text ?? "-", text ?? string.Empty);

    /// <summary>A number with a fixed number of decimals.</summary>
    public static Cell Of(double? value, int decimals) => value is { } number && double.IsFinite(number)
        ? new Cell(Printed.Fixed(number, decimals), Printed.Exact(number))
        : new Cell("-", string.Empty);

    /// <summary>A number with a few significant digits, for quantities that span decades.</summary>
    public static Cell Significant(double? value, int digits = 3) => value is { } number && double.IsFinite(number)
        ? new Cell(Readable(number, digits), Printed.Exact(number))
        : new Cell("-", string.Empty);

    private static string Readable(double number, int digits)
    {
        string text = number.ToString("G" + digits.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        return text.Contains('E', StringComparison.Ordinal) && Math.Abs(number) is >= 1000 and < 1e6
            ? number.ToString("0", CultureInfo.InvariantCulture)
            : text;
    }
}
