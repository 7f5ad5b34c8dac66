using System.Globalization;

namespace RedoxFurnace.Quantities;

/// <summary>Splits <c>12.5 mbar</c> into its number and its unit, in the invariant culture.</summary>
public static class NumberWithUnit
{
    /// <summary>Reads a number followed by a unit.</summary>
    /// <param name="text">Such as <c>1400C</c>, <c>-57 °C</c>, <c>1e-3 mbar</c>, <c>75%</c>.</param>
    /// <param name="what">What is being read, for the message.</param>
    /// <param name="allowed">What would be right, for the message.</param>
    /// <returns>The finite number and the unit, which is not empty.</returns>
    /// <exception cref="RequestException">No number, a number that is not finite, or no unit.</exception>
    public static (double Value, string Unit) Parse(string text, string what, string allowed)
    {
        (double value, string unit) = Split(text, what, allowed);
        return unit.Length > 0 ? (value, unit) : throw RequestException.MissingUnit(what, text, allowed);
    }

    /// <summary>Reads a number and whatever follows it, which may be nothing.</summary>
    /// <param name="text">The text.</param>
    /// <param name="what">What is being read, for the message.</param>
    /// <param name="allowed">What would be right, for the message.</param>
    /// <returns>The finite number, and the unit or an empty string.</returns>
    /// <exception cref="RequestException">No number, or one that is not finite.</exception>
    public static (double Value, string Unit) Split(string text, string what, string allowed)
    {
        string trimmed = text.Trim().Replace('\u2212', '-');
        int end = NumberLength(trimmed);
        if (end == 0
            || !double.TryParse(trimmed.AsSpan(0, end), NumberStyles.Float, CultureInfo.InvariantCulture, out double value)
            || !double.IsFinite(value))
        {
            throw RequestException.NotAQuantity(what, text, allowed);
        }

        return (value, trimmed[end..].Trim());
    }

    /// <summary>Reads a plain number.</summary>
    /// <param name="text">The text.</param>
    /// <param name="what">What is being read, for the message.</param>
    /// <returns>The finite number.</returns>
    /// <exception cref="RequestException">Not a number, or followed by something.</exception>
    public static double ParsePlain(string text, string what)
    {
        (double value, string unit) = Split(text, what, "a plain number");
        return unit.Length == 0 ? value : throw RequestException.NotAQuantity(what, text, "a plain number");
    }

    private static int NumberLength(string text)
    {
        int i = 0;
        if (i < text.Length && text[i] is '+' or '-')
        {
            i++;
        }

        int digits = i;
        while (i < text.Length && (char.IsAsciiDigit(text[i]) || text[i] == '.'))
        {
            // Two dots open a range, and the number ends before them.
            if (text[i] == '.' && i + 1 < text.Length && text[i + 1] == '.')
            {
                break;
            }

            i++;
        }

        if (i == digits)
        {
            return 0;
        }

        if (i + 1 < text.Length && text[i] is 'e' or 'E')
        {
            int exponent = i + 1;
            if (text[exponent] is '+' or '-')
            {
                exponent++;
            }

            if (exponent < text.Length && char.IsAsciiDigit(text[exponent]))
            {
                i = exponent;
                while (i < text.Length && char.IsAsciiDigit(text[i]))
                {
                    i++;
                }
            }
        }

        return i;
    }
}
