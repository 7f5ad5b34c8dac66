using System.Globalization;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Charts.Plans;

/// <summary>Size of the page.</summary>
/// <param name="Name">As asked for.</param>
/// <param name="Width">mm.</param>
/// <param name="Height">mm.</param>
public sealed record PageSize(string Name, double Width, double Height)
{
    private const double Least = 90;
    private const double Most = 1200;

    private static readonly PageSize[] Known =
    [
        new("A4", 297, 210), new("A5", 210, 148), new("A3", 420, 297), new("Letter", 279.4, 215.9), new("slide", 254, 142.875),
    ];

    /// <summary>A4 across.</summary>
    public static PageSize A4 => Known[0];

    /// <summary>A5 across.</summary>
    public static PageSize A5 => Known[1];

    /// <summary>Reads <c>A4</c>, <c>A5</c>, <c>A3</c>, <c>Letter</c>, <c>slide</c> (all across) or <c>180mmx120mm</c>.</summary>
    /// <param name="text">As written.</param>
    /// <param name="what">Name of the argument, for messages.</param>
    /// <returns>The size.</returns>
    /// <exception cref="RequestException">Not understood, or out of range.</exception>
    public static PageSize Parse(string text, string what = "--size")
    {
        if (Known.FirstOrDefault(size => size.Name.Equals(text, StringComparison.OrdinalIgnoreCase)) is { } known)
        {
            return known;
        }

        string[] sides = text.Split('x');
        if (sides.Length != 2 || !sides.All(side => side.EndsWith("mm", StringComparison.Ordinal))
            || !double.TryParse(sides[0][..^2], NumberStyles.Float, CultureInfo.InvariantCulture, out double width)
            || !double.TryParse(sides[1][..^2], NumberStyles.Float, CultureInfo.InvariantCulture, out double height))
        {
            throw new RequestException($"{what} '{text}' is not understood; write A4, A5, A3, Letter, slide or a size such as 180mmx120mm");
        }

        return width is >= Least and <= Most && height is >= Least and <= Most
            ? new PageSize(text, width, height)
            : throw new RequestException(FormattableString.Invariant($"{what} '{text}' is out of range; each side lies between {Least} and {Most} mm"));
    }
}
