using System.Collections.Immutable;

namespace RedoxFurnace.Quantities;

/// <summary>The total pressures a question is asked at.</summary>
public sealed record PressureSeries
{
    private const int PointsPerDecade = 5;

    private PressureSeries(ImmutableArray<Pressure> points) => Points = points;

    /// <summary>At least one pressure, in the order asked.</summary>
    public ImmutableArray<Pressure> Points { get; }

    /// <summary>Reads one pressure, a list <c>1bar,1mbar</c>, or a range <c>10Pa..10kPa</c>, logarithmic with five points a decade unless <c>/N</c> gives another number.</summary>
    /// <param name="text">As written.</param>
    /// <param name="what">What is being read, for the message.</param>
    /// <returns>The series.</returns>
    /// <exception cref="RequestException">Missing unit, reversed range, too many points.</exception>
    public static PressureSeries Parse(string text, string what = "pressure")
    {
        int dots = text.IndexOf("..", StringComparison.Ordinal);
        return dots >= 0
            ? ParseRange(text, dots, what)
            : new PressureSeries([.. text.Split(',', StringSplitOptions.TrimEntries).Select(part => Pressure.Parse(part, what))]);
    }

    private static PressureSeries ParseRange(string text, int dots, string what)
    {
        int slash = text.IndexOf('/', dots);
        string highText = slash < 0 ? text[(dots + 2)..] : text[(dots + 2)..slash];
        double perDecade = slash < 0 ? PointsPerDecade : NumberWithUnit.ParsePlain(text[(slash + 1)..], what + " points per decade");
        Pressure low = Pressure.Parse(text[..dots], what);
        Pressure high = Pressure.Parse(highText, what);
        if (low > high)
        {
            throw new RequestException($"{what} range '{text}' is reversed; write {highText}..{text[..dots]}");
        }

        double decades = high.Log10Bar - low.Log10Bar;
        if (perDecade <= 0 || decades * perDecade > TemperatureSeries.MostPoints)
        {
            throw RequestException.OutOfRange(what + " range", text, $"1 to {TemperatureSeries.MostPoints} points are allowed");
        }

        int steps = Math.Max(1, (int)Math.Round(decades * perDecade));
        double each = (high.NaturalLogBar - low.NaturalLogBar) / steps;
        return new PressureSeries([.. Enumerable.Range(0, steps + 1).Select(i => Pressure.FromNaturalLogBar(low.NaturalLogBar + (i * each)))]);
    }
}
