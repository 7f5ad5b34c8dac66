using System.Globalization;

namespace RedoxFurnace.Quantities;

/// <summary>Absolute temperature, above 0 K. <c>default</c> is 0 K and is refused by every calculation.</summary>
public readonly record struct Temperature : IComparable<Temperature>
{
    private Temperature(double kelvin) => Kelvin = kelvin;

    /// <summary>Kelvin.</summary>
    public double Kelvin { get; }

    /// <summary>Degrees Celsius.</summary>
    public double Celsius => Kelvin - PhysicalConstants.ZeroCelsiusInKelvin;

    /// <summary>Degrees Fahrenheit.</summary>
    public double Fahrenheit => (Celsius * 1.8) + 32;

    /// <summary>From kelvin.</summary>
    /// <param name="kelvin">Above 0, finite.</param>
    /// <returns>The temperature.</returns>
    /// <exception cref="RequestException">Not above absolute zero, or not a number.</exception>
    public static Temperature FromKelvin(double kelvin)
        => double.IsFinite(kelvin) && kelvin > 0
            ? new Temperature(kelvin)
            : throw RequestException.OutOfRange("temperature", $"{Printed.Brief(kelvin)} K", "it must lie above absolute zero (-273.15 C)");

    /// <summary>From degrees Celsius, above -273.15.</summary>
    /// <param name="celsius">Degrees Celsius.</param>
    /// <returns>The temperature.</returns>
    public static Temperature FromCelsius(double celsius) => FromKelvin(celsius + PhysicalConstants.ZeroCelsiusInKelvin);

    /// <summary>From degrees Fahrenheit, above -459.67.</summary>
    /// <param name="fahrenheit">Degrees Fahrenheit.</param>
    /// <returns>The temperature.</returns>
    public static Temperature FromFahrenheit(double fahrenheit) => FromCelsius((fahrenheit - 32) / 1.8);

    /// <summary>From a number on a named scale.</summary>
    /// <param name="value">The number.</param>
    /// <param name="unit">Its scale.</param>
    /// <returns>The temperature.</returns>
    public static Temperature From(double value, TemperatureUnit unit) => unit switch
    {
        TemperatureUnit.Celsius => FromCelsius(value),
        TemperatureUnit.Fahrenheit => FromFahrenheit(value),
        _ => FromKelvin(value),
    };

    /// <summary>Reads <c>1400C</c>, <c>1673.15 K</c>, <c>2552F</c>, <c>-57 °C</c>.</summary>
    /// <param name="text">Number and unit; the unit is required.</param>
    /// <param name="what">What is being read, for the message.</param>
    /// <returns>The temperature.</returns>
    /// <exception cref="RequestException">Not a temperature with a unit.</exception>
    public static Temperature Parse(string text, string what = "temperature") => Parse(text, what, out _);

    /// <summary>Reads a temperature and reports the scale it was written in.</summary>
    /// <param name="text">Number and unit.</param>
    /// <param name="what">What is being read, for the message.</param>
    /// <param name="unit">The scale used.</param>
    /// <returns>The temperature.</returns>
    /// <exception cref="RequestException">Not a temperature with a unit.</exception>
    public static Temperature Parse(string text, string what, out TemperatureUnit unit)
    {
        const string allowed = "a number with C, K or F, such as 1400C";
        (double value, string unitText) = NumberWithUnit.Parse(text, what, allowed);
        unit = ReadUnit(unitText, what, text);
        return From(value, unit);
    }

    internal static TemperatureUnit ReadUnit(string unitText, string what, string text) => unitText switch
    {
        "C" or "°C" or "degC" => TemperatureUnit.Celsius,
        "K" => TemperatureUnit.Kelvin,
        "F" or "°F" or "degF" => TemperatureUnit.Fahrenheit,
        _ => throw RequestException.UnknownUnit(what, text, unitText, "C, K, F"),
    };

    /// <summary>The number on a scale.</summary>
    /// <param name="unit">The scale.</param>
    /// <returns>The number.</returns>
    public double In(TemperatureUnit unit) => unit switch
    {
        TemperatureUnit.Celsius => Celsius,
        TemperatureUnit.Fahrenheit => Fahrenheit,
        _ => Kelvin,
    };

    /// <summary>Printed on a scale, whole degrees unless the value is not whole, for example <c>1400 C</c>.</summary>
    /// <param name="unit">The scale.</param>
    /// <returns>Number, space, unit.</returns>
    public string ToString(TemperatureUnit unit)
        => string.Create(CultureInfo.InvariantCulture, $"{Math.Round(In(unit), 2):0.##} {Symbol(unit)}");

    /// <summary>The letter of a scale: C, K or F.</summary>
    /// <param name="unit">The scale.</param>
    /// <returns>One letter.</returns>
    public static string Symbol(TemperatureUnit unit) => unit switch
    {
        TemperatureUnit.Celsius => "C",
        TemperatureUnit.Fahrenheit => "F",
        _ => "K",
    };

    /// <inheritdoc/>
    public override string ToString() => ToString(TemperatureUnit.Celsius);

    /// <inheritdoc/>
    public int CompareTo(Temperature other) => Kelvin.CompareTo(other.Kelvin);

    /// <summary>Colder than.</summary>
    public static bool operator <(Temperature left, Temperature right) => left.Kelvin < right.Kelvin;

    /// <summary>Hotter than.</summary>
    public static bool operator >(Temperature left, Temperature right) => left.Kelvin > right.Kelvin;

    /// <summary>Not hotter than.</summary>
    public static bool operator <=(Temperature left, Temperature right) => left.Kelvin <= right.Kelvin;

    /// <summary>Not colder than.</summary>
    public static bool operator >=(Temperature left, Temperature right) => left.Kelvin >= right.Kelvin;
}
