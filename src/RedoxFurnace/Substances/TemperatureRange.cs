namespace RedoxFurnace.Substances;

/// <summary>A closed range of temperature in kelvin, low below high.</summary>
public readonly record struct TemperatureRange
{
    /// <summary>A range.</summary>
    /// <param name="lowKelvin">Above 0.</param>
    /// <param name="highKelvin">Above the low end.</param>
    /// <exception cref="ArgumentException">Reversed, empty or not finite.</exception>
    public TemperatureRange(double lowKelvin, double highKelvin)
    {
        if (!(lowKelvin > 0) || !(highKelvin > lowKelvin) || !double.IsFinite(highKelvin))
        {
            throw new ArgumentException("a temperature range needs 0 < low < high");
        }

        LowKelvin = lowKelvin;
        HighKelvin = highKelvin;
    }

    /// <summary>Low end, K.</summary>
    public double LowKelvin { get; }

    /// <summary>High end, K.</summary>
    public double HighKelvin { get; }

    /// <summary>Whether a temperature lies inside or on an end.</summary>
    /// <param name="kelvin">K.</param>
    /// <returns>True when it does.</returns>
    public bool Holds(double kelvin) => kelvin >= LowKelvin && kelvin <= HighKelvin;

    /// <inheritdoc/>
    public override string ToString() => FormattableString.Invariant($"{LowKelvin:0.##} to {HighKelvin:0.##} K");
}
