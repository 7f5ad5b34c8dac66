using System.Collections.Immutable;

namespace RedoxFurnace.Quantities;

/// <summary>The temperatures a question is asked at, with the scale they were written in.</summary>
public sealed record TemperatureSeries
{
    /// <summary>More points than this are refused: a table of them helps nobody.</summary>
    public const int MostPoints = 2000;

    private TemperatureSeries(ImmutableArray<Temperature> points, TemperatureUnit unit)
    {
        Points = points;
        Unit = unit;
    }

    /// <summary>At least one temperature, in the order asked.</summary>
    public ImmutableArray<Temperature> Points { get; }

    /// <summary>The scale the user wrote.</summary>
    public TemperatureUnit Unit { get; }

    /// <summary>A series of given temperatures.</summary>
    /// <param name="points">At least one.</param>
    /// <param name="unit">The scale to print in.</param>
    /// <returns>The series.</returns>
    public static TemperatureSeries Of(IEnumerable<Temperature> points, TemperatureUnit unit = TemperatureUnit.Celsius)
    {
        ImmutableArray<Temperature> all = [.. points];
        return all.Length > 0 ? new TemperatureSeries(all, unit) : throw new ArgumentException("at least one temperature", nameof(points));
    }

    /// <summary>Reads one temperature, a list <c>700C,800C</c> or a range <c>800C..1200C/50C</c> whose step is required.</summary>
    /// <param name="text">As written.</param>
    /// <param name="what">What is being read, for the message.</param>
    /// <param name="mayFall">Whether a range may run downwards, as a cooling leg does.</param>
    /// <returns>The series.</returns>
    /// <exception cref="RequestException">Missing unit or step, reversed range, too many points.</exception>
    public static TemperatureSeries Parse(string text, string what = "temperature", bool mayFall = false)
    {
        if (text.Contains("..", StringComparison.Ordinal))
        {
            return ParseRange(text, what, mayFall);
        }

        string[] parts = text.Split(',', StringSplitOptions.TrimEntries);
        Temperature first = Temperature.Parse(parts[0], what, out TemperatureUnit unit);
        return Of(parts.Skip(1).Select(part => Temperature.Parse(part, what)).Prepend(first), unit);
    }

    private static TemperatureSeries ParseRange(string text, string what, bool mayFall)
    {
        int dots = text.IndexOf("..", StringComparison.Ordinal);
        int slash = text.IndexOf('/', dots);
        if (slash < 0)
        {
            throw new RequestException($"{what} range '{text}' has no step; write {text}/50C");
        }

        Temperature low = Temperature.Parse(text[..dots], what, out TemperatureUnit unit);
        Temperature high = Temperature.Parse(text[(dots + 2)..slash], what);
        (double stepValue, string stepUnit) = NumberWithUnit.Parse(text[(slash + 1)..], what + " step", "a step with C, K or F, such as 50C");
        double step = stepValue * (Temperature.ReadUnit(stepUnit, what + " step", text) == TemperatureUnit.Fahrenheit ? 1 / 1.8 : 1);
        if (step <= 0)
        {
            throw RequestException.OutOfRange(what + " step", text[(slash + 1)..], "it must be above 0");
        }

        if (low > high && !mayFall)
        {
            throw new RequestException($"{what} range '{text}' is reversed; write {text[(dots + 2)..slash]}..{text[..dots]}{text[slash..]}");
        }

        return Steps(low, high, step, unit, text, what);
    }

    private static TemperatureSeries Steps(Temperature low, Temperature high, double step, TemperatureUnit unit, string text, string what)
    {
        double span = Math.Abs(high.Kelvin - low.Kelvin);
        double signed = high < low ? -step : step;
        double count = Math.Floor((span / step) + 1e-9) + 1;
        if (count > MostPoints)
        {
            throw RequestException.OutOfRange(what + " range", text, $"it has {Printed.Brief(count)} points, at most {MostPoints} are allowed; use a larger step");
        }

        return Of(Enumerable.Range(0, (int)count).Select(i => Temperature.FromKelvin(low.Kelvin + (i * signed))), unit);
    }
}
