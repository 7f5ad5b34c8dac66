using RedoxFurnace.Quantities;

namespace RedoxFurnace.Substances;

/// <summary>A temperature at which a substance has no data. Nothing is extrapolated.</summary>
public sealed class OutsideDataException : NoAnswerException
{
    private OutsideDataException(string message)
        : base(message)
    {
    }

    internal static OutsideDataException Of(Substance substance, double kelvin) => new(Describe(substance, kelvin));

    /// <summary>The sentence used wherever a substance has no value at a temperature.</summary>
    /// <param name="substance">The substance.</param>
    /// <param name="kelvin">The temperature, K.</param>
    /// <returns>One line that names the limit.</returns>
    internal static string Describe(Substance substance, double kelvin)
    {
        string at = FormattableString.Invariant($"{kelvin:0.##} K ({kelvin - PhysicalConstants.ZeroCelsiusInKelvin:0.#} C)");
        double low = substance.LowestKelvin;
        double high = substance.HighestKelvin;
        string limit = kelvin > high
            ? FormattableString.Invariant($"its data end at {high:0.##} K ({high - PhysicalConstants.ZeroCelsiusInKelvin:0.#} C)")
            : kelvin < low
                ? FormattableString.Invariant($"its data start at {low:0.##} K ({low - PhysicalConstants.ZeroCelsiusInKelvin:0.#} C)")
                : "it lies in a gap of its data";
        return $"no data for {substance.Id} at {at}: {limit}; nothing is extrapolated";
    }
}
