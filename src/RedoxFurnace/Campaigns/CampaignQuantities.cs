using RedoxFurnace.Quantities;

namespace RedoxFurnace.Campaigns;

/// <summary>Quantities of a campaign sheet that are no temperature and no pressure: masses, rates, flows, prices, times.</summary>
internal static class CampaignQuantities
{
    private const double PoundInKilograms = 0.45359237;

    /// <summary>Standard cubic foot (60 F, 14.696 psi) in Nm3 (0 C, 101325 Pa): ideal gas.</summary>
    private const double StandardCubicFoot = 0.028316846592 * 273.15 / 288.70555555555557;

    /// <summary>Kilograms.</summary>
    public static double Mass(string text, string what)
    {
        (double value, string unit) = NumberWithUnit.Parse(text, what, "a mass with kg, g, t or lb, such as 250kg");
        return Positive(text, what, value * unit switch
        {
            "kg" => 1,
            "g" => 1e-3,
            "t" => 1e3,
            "lb" => PoundInKilograms,
            _ => throw RequestException.UnknownUnit(what, text, unit, "kg, g, t, lb"),
        });
    }

    /// <summary>Kilograms an hour.</summary>
    public static double MassRate(string text, string what)
    {
        (double value, string unit) = NumberWithUnit.Parse(text, what, "a rate with kg/h or t/h, such as 18kg/h");
        return Positive(text, what, value * unit switch
        {
            "kg/h" => 1,
            "t/h" => 1e3,
            "g/min" => 0.06,
            "lb/h" => PoundInKilograms,
            _ => throw RequestException.UnknownUnit(what, text, unit, "kg/h, t/h, g/min, lb/h"),
        });
    }

    /// <summary>Nm3 an hour.</summary>
    public static double Flow(string text, string what)
    {
        string bare = text.EndsWith(" air", StringComparison.Ordinal) ? text[..^4] : text;
        (double value, string unit) = NumberWithUnit.Parse(bare, what, "a flow with Nm3/h, such as 30Nm3/h");
        return Positive(text, what, value * unit switch
        {
            "Nm3/h" => 1,
            "Nm3/min" => 60,
            "scfh" or "scf/h" => StandardCubicFoot,
            "scfm" => 60 * StandardCubicFoot,
            _ => throw RequestException.UnknownUnit(what, text, unit, "Nm3/h, Nm3/min, scfh, scfm"),
        });
    }

    /// <summary>Pa m3/s.</summary>
    public static double LeakUp(string text, string what)
    {
        (double value, string unit) = NumberWithUnit.Parse(text, what, "a leak-up with mbar.l/s or Pa.m3/s, such as 0.02mbar.l/s");
        return Positive(text, what, value * unit switch
        {
            "Pa.m3/s" => 1,
            "mbar.l/s" or "mbar.L/s" => 0.1,
            "Torr.l/s" or "Torr.L/s" => 0.133322,
            _ => throw RequestException.UnknownUnit(what, text, unit, "mbar.l/s, Pa.m3/s, Torr.l/s"),
        });
    }

    /// <summary>Money for one unit: <c>1.10/kg</c>, <c>0.55/Nm3</c>, <c>0.09/kWh</c>.</summary>
    public static double Price(string text, string what, string per)
    {
        (double value, string unit) = NumberWithUnit.Parse(text, what, $"a price such as 1.20/{per}");
        return unit == "/" + per
            ? value >= 0 ? value : throw RequestException.OutOfRange(what, text, "a price is 0 or more")
            : unit == "/t" && per == "kg" ? value / 1000 : throw RequestException.UnknownUnit(what, text, unit, "/" + per);
    }

    /// <summary>Hours.</summary>
    public static double Hours(string text, string what)
    {
        (double value, string unit) = NumberWithUnit.Parse(text, what, "a time with h or min, such as 9h");
        return Positive(text, what, value * unit switch
        {
            "h" => 1,
            "min" => 1 / 60.0,
            "s" => 1 / 3600.0,
            _ => throw RequestException.UnknownUnit(what, text, unit, "h, min, s"),
        });
    }

    /// <summary>Kelvin an hour.</summary>
    public static double Rate(string text, string what)
    {
        (double value, string unit) = NumberWithUnit.Parse(text, what, "a rate such as 200C/h or 5C/min");
        return Positive(text, what, value * unit switch
        {
            "C/h" or "K/h" => 1,
            "C/min" or "K/min" => 60,
            "F/h" => 1 / 1.8,
            "F/min" => 60 / 1.8,
            _ => throw RequestException.UnknownUnit(what, text, unit, "C/h, C/min, K/h, K/min, F/h, F/min"),
        });
    }

    /// <summary>Square metres.</summary>
    public static double Area(string text, string what)
    {
        (double value, string unit) = NumberWithUnit.Parse(text, what, "an area such as 2.5m2");
        return unit == "m2" ? Positive(text, what, value) : throw RequestException.UnknownUnit(what, text, unit, "m2");
    }

    /// <summary>Mass percent, given with %.</summary>
    public static double Percent(string text, string what)
    {
        (double value, string unit) = NumberWithUnit.Parse(text, what, "a mass percent such as 0.05% or 120ppm");
        return (unit switch { "%" => value, "ppm" => value / 1e4, _ => throw RequestException.UnknownUnit(what, text, unit, "%, ppm") }) is >= 0 and <= 100 and var percent
            ? percent
            : throw RequestException.OutOfRange(what, text, "0 to 100% is allowed");
    }

    private static double Positive(string text, string what, double value)
        => value > 0 ? value : throw RequestException.OutOfRange(what, text, "it must be above 0");
}
