using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>A moisture reading as written, which may leave its scale or its place open.</summary>
public sealed record WaterReading
{
    private WaterReading(WaterScale scale, double value, Pressure? place, string text)
    {
        Scale = scale;
        Value = value;
        Place = place;
        Text = text;
    }

    /// <summary>Scale.</summary>
    public WaterScale Scale { get; }

    /// <summary>K for a frost or dew point, 0 to 1 for a share, g/Nm3, bar for a partial pressure, a plain number for a ratio.</summary>
    public double Value { get; }

    /// <summary>Absolute pressure at which it was read, where that was said.</summary>
    public Pressure? Place { get; }

    /// <summary>As written.</summary>
    public string Text { get; }

    /// <summary>Reads <c>frost -57C</c>, <c>dew +6C at 6bara</c>, <c>moisture -60C</c>, <c>H2O 200ppm</c>, <c>H2O 1.3 g/Nm3</c>, <c>H2O 0.5mbar</c>, <c>H2O/H2 0.01</c>.</summary>
    /// <param name="name">frost, dew, moisture, H2O or H2O/H2.</param>
    /// <param name="value">Number and unit, then optionally <c>at</c> and an absolute or gauge pressure.</param>
    /// <returns>The reading.</returns>
    /// <exception cref="RequestException">Not a moisture reading.</exception>
    public static WaterReading Parse(string name, string value)
    {
        string what = name + " reading";
        string[] halves = value.Split([" at ", "@"], 2, StringSplitOptions.TrimEntries);
        Pressure? place = halves.Length == 2 ? LinePressure(halves[1], "pressure of the " + what) : null;
        (WaterScale scale, double number) = name switch
        {
            "frost" => (WaterScale.FrostPoint, Temperature.Parse(halves[0], "frost point").Kelvin),
            "dew" => (WaterScale.DewPoint, Temperature.Parse(halves[0], "dew point").Kelvin),
            "H2O/H2" => (WaterScale.RatioToHydrogen, NumberWithUnit.ParsePlain(halves[0], "H2O/H2")),
            _ => ByUnit(halves[0], what),
        };
        if (!(number > 0))
        {
            throw RequestException.OutOfRange(what, value, "it must be above 0; leave it out where there is no water");
        }

        return new WaterReading(scale, number, place, $"{name} {value.Trim()}");
    }

    /// <summary>A line pressure, which must say whether it is absolute or gauge.</summary>
    /// <param name="text">Such as <c>6bara</c> or <c>5barg</c>; Pa, mbar, Torr and atm are absolute.</param>
    /// <param name="what">What is being read, for the message.</param>
    /// <returns>The absolute pressure.</returns>
    /// <exception cref="RequestException">bar, psi, MPa or kPa without saying which.</exception>
    public static Pressure LinePressure(string text, string what)
    {
        Pressure pressure = Pressure.Parse(text, what);
        string unit = NumberWithUnit.Parse(text, what, "a pressure").Unit;
        return unit is "bar" or "psi" or "MPa" or "kPa"
            ? throw new RequestException($"{what} '{text}' does not say absolute or gauge; write {text.Trim()}a or {text.Trim()}g (bara, barg, psia, psig)")
            : pressure;
    }

    /// <summary>Every way the reading can be meant.</summary>
    /// <param name="furnace">Total pressure in the furnace.</param>
    /// <param name="line">Pressure of the sampling line where one is known and the reading does not say where it was taken.</param>
    /// <param name="hydrogenShare">Share of H2, for a ratio; null where there is none.</param>
    /// <returns>One meaning, or several where scale or place is open; all at the furnace pressure.</returns>
    /// <exception cref="RequestException">The value cannot be.</exception>
    public ImmutableArray<WaterMeaning> Meanings(Pressure furnace, Pressure? line = null, double? hydrogenShare = null)
    {
        (Pressure At, string Words)[] places = Scale is WaterScale.ShareByVolume or WaterScale.GramsPerNm3 or WaterScale.RatioToHydrogen
            ? [(furnace, "")]
            : Place is { } place
                ? [(place, $" read at {place}")]
                : line is { } open && Math.Abs(open.NaturalLogBar - furnace.NaturalLogBar) > 1e-9
                    ? [(furnace, $" read at furnace pressure {furnace}"), (open, $" read in the line at {open}")]
                    : [(furnace, "")];
        return
        [
            .. places.SelectMany(place => Scales().Select(scale =>
                new WaterMeaning(scale.Words + place.Words, Content(scale.Scale, place.At, hydrogenShare).At(furnace)))),
        ];
    }

    private static (WaterScale Scale, double Value) ByUnit(string text, string what)
    {
        const string allowed = "a number with C or F (frost or dew point), ppm, %, g/Nm3, mbar or Torr";
        (double value, string unit) = NumberWithUnit.Parse(text, what, allowed);
        return unit switch
        {
            "C" or "°C" or "F" or "°F" or "K" => (WaterScale.FrostOrDewPoint, Temperature.Parse(text, what).Kelvin),
            "ppm" or "ppmv" or "%" => (WaterScale.ShareByVolume, Share.Parse(text, what)),
            "g/Nm3" or "g/Nm³" => (WaterScale.GramsPerNm3, value),
            "g/m3" or "g/m³" => throw new RequestException($"{what} '{text}' does not say at which temperature the m3 is; write g/Nm3 (0 C, 101325 Pa)"),
            "mbar" or "bar" or "Pa" or "kPa" or "Torr" or "torr" or "um(Hg)" or "atm" => (WaterScale.PartialPressure, Pressure.Parse(text, what).Bar),
            _ => throw RequestException.UnknownUnit(what, text, unit, "C, F, ppm, %, g/Nm3, mbar, Pa, Torr"),
        };
    }

    private IEnumerable<(WaterScale Scale, string Words)> Scales()
    {
        bool above = Value >= WaterVapour.TriplePointKelvin;
        return Scale switch
        {
            WaterScale.FrostPoint => [(WaterScale.FrostPoint, "frost point")],
            WaterScale.DewPoint => [(WaterScale.DewPoint, above ? "dew point" : "dew point over supercooled water")],
            WaterScale.FrostOrDewPoint when above => [(WaterScale.DewPoint, "dew point")],
            WaterScale.FrostOrDewPoint => [(WaterScale.FrostPoint, "frost point"), (WaterScale.DewPoint, "dew point over supercooled water")],
            _ => [(Scale, "water")],
        };
    }

    private WaterContent Content(WaterScale scale, Pressure at, double? hydrogenShare) => scale switch
    {
        WaterScale.FrostPoint => WaterContent.OfFrostPoint(Temperature.FromKelvin(Value), at),
        WaterScale.DewPoint => WaterContent.OfDewPoint(Temperature.FromKelvin(Value), at),
        WaterScale.GramsPerNm3 => WaterContent.OfGramsPerNm3(Value, at),
        WaterScale.PartialPressure => WaterContent.OfPressure(Math.Log(Value), at),
        WaterScale.RatioToHydrogen => hydrogenShare is > 0
            ? WaterContent.OfShare(Value * hydrogenShare.Value / (1 + (Value * hydrogenShare.Value)), at)
            : throw new RequestException("H2O/H2 needs hydrogen in the gas; give its share, such as H2 30%"),
        _ => WaterContent.OfShare(Value, at),
    };
}
