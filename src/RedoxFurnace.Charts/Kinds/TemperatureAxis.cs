using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Charts.Kinds;

/// <summary>Temperature axes over a plot whose coordinate is kelvin.</summary>
internal static class TemperatureAxis
{
    private const double Fahrenheit = 1.8;

    /// <summary>The axis in the unit asked for.</summary>
    public static AxisPlan Of(TemperatureUnit unit, double lowKelvin, double highKelvin, int about = 10) => unit switch
    {
        TemperatureUnit.Kelvin => AxisPlan.Round(RichText.Of("temperature, K"), lowKelvin, highKelvin, about: about),
        TemperatureUnit.Fahrenheit => AxisPlan.Round(RichText.Of("temperature, °F"), lowKelvin, highKelvin, Fahrenheit, 32 - (Fahrenheit * PhysicalConstants.ZeroCelsiusInKelvin), about),
        _ => AxisPlan.Round(RichText.Of("temperature, °C"), lowKelvin, highKelvin, 1, -PhysicalConstants.ZeroCelsiusInKelvin, about),
    };

    /// <summary>The second axis: kelvin beside Celsius and Fahrenheit, Celsius beside kelvin.</summary>
    public static AxisPlan Beside(TemperatureUnit unit, double lowKelvin, double highKelvin)
        => Of(unit == TemperatureUnit.Kelvin ? TemperatureUnit.Celsius : TemperatureUnit.Kelvin, lowKelvin, highKelvin);

    /// <summary>A temperature as the charts write it.</summary>
    public static string Text(double kelvin, TemperatureUnit unit)
        => RoundTicks.Number(Temperature.FromKelvin(kelvin).In(unit), 1) + unit switch { TemperatureUnit.Kelvin => " K", TemperatureUnit.Fahrenheit => " °F", _ => " °C" };

    /// <summary>The operating window, or nothing.</summary>
    public static WindowPlan[] Window(ChartOptions options)
        => options.Window is { } window
            ? [new WindowPlan(window.Low.Kelvin, window.High.Kelvin, RichText.Of($"operating window {Text(window.Low.Kelvin, options.Unit)} to {Text(window.High.Kelvin, options.Unit)}"), RichText.Of("window"))]
            : [];

    /// <summary>The operating window in a sentence, or nothing: the plot may have no room for the numbers.</summary>
    public static string[] WindowWords(ChartOptions options)
        => options.Window is { } window ? [$"Operating window: {Text(window.Low.Kelvin, options.Unit)} to {Text(window.High.Kelvin, options.Unit)} (tinted)."] : [];
}
