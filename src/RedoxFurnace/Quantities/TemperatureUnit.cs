namespace RedoxFurnace.Quantities;

/// <summary>The scales a temperature is written in.</summary>
public enum TemperatureUnit
{
    /// <summary>Degrees Celsius.</summary>
    Celsius,

    /// <summary>Kelvin.</summary>
    Kelvin,

    /// <summary>Degrees Fahrenheit.</summary>
    Fahrenheit,
}
