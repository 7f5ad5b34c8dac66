using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Atmospheres;

/// <summary>How much water a gas holds, carried as ln of its partial pressure, and what every instrument would show at the same total pressure.</summary>
/// <remarks>No enhancement factor: ideal gas. Every conversion returns to its start within 1e-9. THEORY.md, 'Readings'.</remarks>
public readonly record struct WaterContent
{
    private static readonly double GramsPerMole = AtomicWeights.Of("O") + (2 * AtomicWeights.Of("H"));

    private WaterContent(double naturalLogBar, double logTotal)
    {
        NaturalLogBar = naturalLogBar;
        NaturalLogTotalBar = logTotal;
    }

    /// <summary>ln(pH2O/bar).</summary>
    public double NaturalLogBar { get; }

    /// <summary>ln of total pressure in bar.</summary>
    public double NaturalLogTotalBar { get; }

    /// <summary>Share of the moist gas by volume, 0 to 1.</summary>
    public double Share => Math.Exp(NaturalLogBar - NaturalLogTotalBar);

    /// <summary>Parts per million by volume of the moist gas.</summary>
    public double Ppm => 1e6 * Share;

    /// <summary>Grams per Nm3 (0 C, 101325 Pa) of the moist gas.</summary>
    public double GramsPerNm3 => Share * GramsPerMole / PhysicalConstants.NormalCubicMetrePerMole;

    /// <summary>Partial pressure in mbar.</summary>
    public double Millibar => 1e3 * Math.Exp(NaturalLogBar);

    /// <summary>Partial pressure in Torr.</summary>
    public double Torr => Math.Exp(NaturalLogBar) * 760 / PhysicalConstants.AtmosphereInBar;

    /// <summary>Frost point over ice, K; null above the triple point of water or below 50 K.</summary>
    public double? FrostPointKelvin => WaterVapour.FrostPointOverIce(NaturalLogBar);

    /// <summary>Dew point, K: over liquid from 0.01 C up, over supercooled water below; null below 123 K or above the critical point.</summary>
    public double? DewPointKelvin => WaterVapour.DewPointOverLiquid(NaturalLogBar) ?? WaterVapour.DewPointOverSupercooled(NaturalLogBar);

    /// <summary>Water of a partial pressure.</summary>
    /// <param name="naturalLogBar">ln(pH2O/bar).</param>
    /// <param name="total">Total pressure.</param>
    /// <returns>The content.</returns>
    /// <exception cref="RequestException">More water than gas.</exception>
    public static WaterContent OfPressure(double naturalLogBar, Pressure total)
        => naturalLogBar <= total.NaturalLogBar + 1e-12
            ? new WaterContent(naturalLogBar, total.NaturalLogBar)
            : throw new RequestException($"water at {Pressure.FromNaturalLogBar(naturalLogBar)} is more than the total pressure {total}; check the reading or give the pressure at which it was taken");

    /// <summary>Water of a share by volume.</summary>
    /// <param name="share">Above 0, at most 1.</param>
    /// <param name="total">Total pressure.</param>
    /// <returns>The content.</returns>
    public static WaterContent OfShare(double share, Pressure total) => OfPressure(Math.Log(share) + total.NaturalLogBar, total);

    /// <summary>Water of a mass per normal volume.</summary>
    /// <param name="grams">Grams per Nm3 of moist gas, above 0.</param>
    /// <param name="total">Total pressure.</param>
    /// <returns>The content.</returns>
    public static WaterContent OfGramsPerNm3(double grams, Pressure total) => OfShare(grams / GramsPerMole * PhysicalConstants.NormalCubicMetrePerMole, total);

    /// <summary>Water at a frost point.</summary>
    /// <param name="frostPoint">-223.15 to 0.01 C.</param>
    /// <param name="total">Total pressure where it was read.</param>
    /// <returns>The content.</returns>
    /// <exception cref="RequestException">No frost forms there.</exception>
    public static WaterContent OfFrostPoint(Temperature frostPoint, Pressure total)
        => frostPoint.Kelvin >= WaterVapour.IceLowestKelvin && frostPoint.Kelvin <= WaterVapour.TriplePointKelvin
            ? OfPressure(WaterVapour.LogSaturationPressureOverIce(frostPoint.Kelvin), total)
            : throw RequestException.OutOfRange("frost point", frostPoint.ToString(), "frost forms from -223.15 to 0.01 C; above, write it as a dew point");

    /// <summary>Water at a dew point: over liquid from 0.01 C up, over supercooled water below.</summary>
    /// <param name="dewPoint">-150.15 to 373.946 C.</param>
    /// <param name="total">Total pressure where it was read.</param>
    /// <returns>The content.</returns>
    /// <exception cref="RequestException">Outside that range.</exception>
    public static WaterContent OfDewPoint(Temperature dewPoint, Pressure total)
    {
        if (dewPoint.Kelvin < WaterVapour.SupercooledLowestKelvin || dewPoint.Kelvin > WaterVapour.CriticalKelvin)
        {
            throw RequestException.OutOfRange("dew point", dewPoint.ToString(), "-150.15 to 373.946 C is allowed");
        }

        return OfPressure(
            dewPoint.Kelvin >= WaterVapour.TriplePointKelvin
                ? WaterVapour.LogSaturationPressureOverLiquid(dewPoint.Kelvin)
                : WaterVapour.LogSaturationPressureOverSupercooled(dewPoint.Kelvin),
            total);
    }

    /// <summary>The same gas at another total pressure: its share of water stays, its frost and dew point move.</summary>
    /// <param name="total">The new total pressure.</param>
    /// <returns>The content there; more than saturation is not condensed here.</returns>
    public WaterContent At(Pressure total) => new(NaturalLogBar - NaturalLogTotalBar + total.NaturalLogBar, total.NaturalLogBar);
}
