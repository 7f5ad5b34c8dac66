namespace RedoxFurnace.Quantities;

/// <summary>Reads shares of a whole: <c>75%</c>, <c>20ppm</c>, <c>0.75</c>.</summary>
public static class Share
{
    /// <summary>Reads a share between 0 and 1.</summary>
    /// <param name="text">A percentage, a number of ppm, or a plain fraction.</param>
    /// <param name="what">What is being read, for the message.</param>
    /// <returns>0 to 1.</returns>
    /// <exception cref="RequestException">Not a share, negative, or above the whole.</exception>
    public static double Parse(string text, string what)
    {
        (double value, string unit) = NumberWithUnit.Split(text, what, "a share such as 75%, 200ppm or 0.75");
        double share = unit switch
        {
            "%" => value / 100,
            "ppm" or "ppmv" => value * 1e-6,
            "" => value,
            _ => throw RequestException.UnknownUnit(what, text, unit, "%, ppm, or no unit for a fraction"),
        };
        return share is >= 0 and <= 1
            ? share
            : throw RequestException.OutOfRange(what, text, "0 to 100% (0 to 1 as a fraction) is allowed");
    }
}
