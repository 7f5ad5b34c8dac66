using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>One instrument's reading of a furnace gas, with its tolerance.</summary>
/// <remarks>Tolerances that are not given are common practice, no source.</remarks>
public sealed record FurnaceReading
{
    private FurnaceReading(ReadingKind kind, string text, double value, double tolerance, WaterReading? water, OxygenProbe? probe)
    {
        Kind = kind;
        Text = text;
        Value = value;
        Tolerance = tolerance;
        Water = water;
        Probe = probe;
    }

    /// <summary>What was read.</summary>
    public ReadingKind Kind { get; }

    /// <summary>As written.</summary>
    public string Text { get; }

    /// <summary>mV for a probe, share for CO2 and O2, a plain ratio for CO/CO2 and H2/H2O, log10(pO2/bar); 0 for water.</summary>
    public double Value { get; }

    /// <summary>Half width of the tolerance: K for a frost or dew point, mV for a probe, log10 units for pO2, a share of the value for all others.</summary>
    public double Tolerance { get; }

    /// <summary>The moisture reading, for water.</summary>
    public WaterReading? Water { get; }

    /// <summary>The probe, for millivolts.</summary>
    public OxygenProbe? Probe { get; }

    /// <summary>A moisture reading, +/- 2 K or 10 % unless told.</summary>
    /// <param name="reading">The reading.</param>
    /// <param name="tolerance">In K for temperatures, as a share of the value for all others.</param>
    /// <returns>The reading.</returns>
    public static FurnaceReading OfWater(WaterReading reading, double? tolerance = null)
    {
        bool isTemperature = reading.Scale is WaterScale.FrostPoint or WaterScale.DewPoint or WaterScale.FrostOrDewPoint;
        return new FurnaceReading(ReadingKind.Water, reading.Text, 0, tolerance ?? (isTemperature ? 2 : 0.1), reading, null);
    }

    /// <summary>A probe voltage, +/- 5 mV unless told.</summary>
    /// <param name="millivolts">mV, positive for reducing gas.</param>
    /// <param name="probe">Probe temperature and reference air.</param>
    /// <param name="tolerance">mV.</param>
    /// <returns>The reading.</returns>
    public static FurnaceReading OfProbe(double millivolts, OxygenProbe probe, double? tolerance = null)
        => millivolts is > -500 and < 2500
            ? new FurnaceReading(ReadingKind.Probe, FormattableString.Invariant($"probe {millivolts:0.###} mV at {probe.At}"), millivolts, tolerance ?? 5, null, probe)
            : throw RequestException.OutOfRange("--probe", Printed.Brief(millivolts) + " mV", "-500 to 2500 mV is possible against air");

    /// <summary>CO2 by volume, +/- 5 % of the value unless told.</summary>
    /// <param name="share">Above 0, below 1.</param>
    /// <param name="tolerance">As a share of the value.</param>
    /// <returns>The reading.</returns>
    public static FurnaceReading OfDioxide(double share, double? tolerance = null)
        => new(ReadingKind.Dioxide, $"CO2 {GasMixture.ShareText(share)}", share, tolerance ?? 0.05, null, null);

    /// <summary>CO/CO2, +/- 5 % of the value unless told.</summary>
    /// <param name="ratio">Above 0.</param>
    /// <param name="tolerance">As a share of the value.</param>
    /// <returns>The reading.</returns>
    public static FurnaceReading OfMonoxideRatio(double ratio, double? tolerance = null)
        => new(ReadingKind.MonoxideRatio, "CO/CO2 " + Printed.Brief(ratio), ratio, tolerance ?? 0.05, null, null);

    /// <summary>log10 of pO2 in bar, +/- 0.1 unless told.</summary>
    /// <param name="log10Bar">log10(pO2/bar) at furnace temperature.</param>
    /// <param name="tolerance">log10 units.</param>
    /// <returns>The reading.</returns>
    public static FurnaceReading OfLogOxygen(double log10Bar, double? tolerance = null)
        => new(ReadingKind.LogOxygen, $"log10 pO2 {Printed.Brief(log10Bar)} (bar)", log10Bar, tolerance ?? 0.1, null, null);

    /// <summary>Free oxygen by volume from a trace analyser, +/- 10 % of the value unless told.</summary>
    /// <param name="share">Above 0, at most 1.</param>
    /// <param name="tolerance">As a share of the value.</param>
    /// <returns>The reading.</returns>
    public static FurnaceReading OfFreeOxygen(double share, double? tolerance = null)
        => new(ReadingKind.FreeOxygen, $"O2 {GasMixture.ShareText(share)}", share, tolerance ?? 0.1, null, null);
}
