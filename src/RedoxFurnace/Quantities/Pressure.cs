using System.Globalization;

namespace RedoxFurnace.Quantities;

/// <summary>Absolute pressure, above 0, carried as the natural logarithm of its value in bar so that 1e-200 bar keeps its digits.</summary>
/// <remarks><c>default</c> is 1 bar, the standard pressure.</remarks>
public readonly record struct Pressure : IComparable<Pressure>
{
    private const string Allowed = "a number with bar, mbar, Pa, kPa, MPa, atm, Torr, um(Hg) or psi (absolute), barg or psig, such as 10Pa";

    private Pressure(double naturalLogBar) => NaturalLogBar = naturalLogBar;

    /// <summary>ln(p / 1 bar).</summary>
    public double NaturalLogBar { get; }

    /// <summary>log10(p / 1 bar).</summary>
    public double Log10Bar => NaturalLogBar / Math.Log(10);

    /// <summary>Bar; 0 where the value underflows.</summary>
    public double Bar => Math.Exp(NaturalLogBar);

    /// <summary>Pascal; 0 where the value underflows.</summary>
    public double Pascal => Bar * 1e5;

    /// <summary>1 bar.</summary>
    public static Pressure Standard => default;

    /// <summary>From bar.</summary>
    /// <param name="bar">Above 0, finite.</param>
    /// <returns>The pressure.</returns>
    /// <exception cref="RequestException">Not above 0.</exception>
    public static Pressure FromBar(double bar)
        => double.IsFinite(bar) && bar > 0
            ? new Pressure(Math.Log(bar))
            : throw RequestException.OutOfRange("pressure", $"{Printed.Brief(bar)} bar", "it must be above 0 (absolute)");

    /// <summary>From ln(p / 1 bar).</summary>
    /// <param name="naturalLogBar">Any finite number.</param>
    /// <returns>The pressure.</returns>
    public static Pressure FromNaturalLogBar(double naturalLogBar)
        => double.IsFinite(naturalLogBar)
            ? new Pressure(naturalLogBar)
            : throw RequestException.OutOfRange("ln pressure", Printed.Brief(naturalLogBar), "it must be a finite number");

    /// <summary>Reads <c>10Pa</c>, <c>1e-4 mbar</c>, <c>6bar(g)</c>, <c>760 Torr</c>; gauge readings are taken against 1 atm.</summary>
    /// <param name="text">Number and unit; the unit is required.</param>
    /// <param name="what">What is being read, for the message.</param>
    /// <returns>The absolute pressure.</returns>
    /// <exception cref="RequestException">Not a pressure with a unit, or not above 0.</exception>
    public static Pressure Parse(string text, string what = "pressure")
    {
        (double value, string unit) = NumberWithUnit.Parse(text, what, Allowed);
        (double bar, bool gauge) = BarPerUnit(unit, what, text);
        double absolute = (value * bar) + (gauge ? PhysicalConstants.AtmosphereInBar : 0);
        return absolute > 0
            ? FromBar(absolute)
            : throw RequestException.OutOfRange(what, text, "an absolute pressure must be above 0");
    }

    /// <summary>Whether the unit says absolute or gauge, as a line pressure must.</summary>
    /// <param name="text">A pressure as written.</param>
    /// <returns>True for bara, barg, bar(a), bar(g), psia, psig.</returns>
    public static bool SaysAbsoluteOrGauge(string text)
    {
        string unit = text.Trim().TrimStart('+', '-', '.', '0', '1', '2', '3', '4', '5', '6', '7', '8', '9', 'e', 'E').Trim();
        return unit is "bara" or "barg" or "bar(a)" or "bar(g)" or "psia" or "psig" or "psi(a)" or "psi(g)";
    }

    private static (double Bar, bool Gauge) BarPerUnit(string unit, string what, string text) => unit switch
    {
        "bar" or "bara" or "bar(a)" => (1, false),
        "barg" or "bar(g)" => (1, true),
        "mbar" => (1e-3, false),
        "Pa" => (1e-5, false),
        "kPa" => (1e-2, false),
        "MPa" => (10, false),
        "hPa" => (1e-3, false),
        "atm" => (PhysicalConstants.AtmosphereInBar, false),
        "Torr" or "torr" or "mmHg" => (PhysicalConstants.AtmosphereInBar / 760, false),
        "um(Hg)" or "µm(Hg)" or "umHg" or "micron" => (PhysicalConstants.AtmosphereInBar / 760_000, false),
        "psi" or "psia" or "psi(a)" => (0.0689475729, false),
        "psig" or "psi(g)" => (0.0689475729, true),
        _ => throw RequestException.UnknownUnit(what, text, unit, "bar, mbar, Pa, kPa, MPa, atm, Torr, um(Hg), psi, barg, psig, bara, psia"),
    };

    /// <summary>Printed in the unit that gives an easy number: bar from 0.1 bar up, mbar from 0.1 mbar, else Pa.</summary>
    /// <returns>Number, space, unit.</returns>
    public override string ToString()
    {
        double bar = Bar;
        (double value, string unit) = bar >= 0.1 ? (bar, "bar") : bar >= 1e-4 ? (bar * 1e3, "mbar") : (bar * 1e5, "Pa");
        return string.Create(CultureInfo.InvariantCulture, $"{value:G4} {unit}");
    }

    /// <inheritdoc/>
    public int CompareTo(Pressure other) => NaturalLogBar.CompareTo(other.NaturalLogBar);

    /// <summary>Lower than.</summary>
    public static bool operator <(Pressure left, Pressure right) => left.NaturalLogBar < right.NaturalLogBar;

    /// <summary>Higher than.</summary>
    public static bool operator >(Pressure left, Pressure right) => left.NaturalLogBar > right.NaturalLogBar;

    /// <summary>Not higher than.</summary>
    public static bool operator <=(Pressure left, Pressure right) => left.NaturalLogBar <= right.NaturalLogBar;

    /// <summary>Not lower than.</summary>
    public static bool operator >=(Pressure left, Pressure right) => left.NaturalLogBar >= right.NaturalLogBar;
}
