using CsCheck;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Tests.Published;

namespace RedoxFurnace.Tests.Oxidation;

public class WaterVapourTests
{
    private const double PascalPerMillimetreMercury = 133.322387415;

    /// <summary>Published rows that must agree.</summary>
    public static TheoryData<string> Tested => CheckLedger.Of("tested", "water vapour");

    /// <summary>Published rows known to disagree.</summary>
    public static TheoryData<string> Misses => CheckLedger.Of("miss", "water vapour");

    // Murphy and Koop 2005 equations 7 and 10, IAPWS R14-08(2011), IAPWS-IF97, WMO No. 8 (Goff-Gratch 1988), a hygrometer
    // maker's table and a handbook table: each row of the table names its own source.
    [Theory, MemberData(nameof(Tested))]
    public void Saturation_pressure_agrees_with_the_published_row(string id)
    {
        PublishedRow row = CheckLedger.Values[id];
        Tolerance.AssertWithin(row.Number("value"), row["tolerance"], FoundFor(row));
    }

    [Theory, MemberData(nameof(Misses))]
    public void A_known_miss_is_still_a_miss(string id)
    {
        PublishedRow row = CheckLedger.Values[id];
        (double low, double high) = Tolerance.Band(row.Number("value"), row["tolerance"]);
        Assert.NotInRange(FoundFor(row), low, high);
    }

    // IAPWS R14-08(2011) table of check values: 8.94735 Pa at 230 K. From memory.
    [Fact]
    public void Ice_meets_the_check_value_of_its_release() =>
        Assert.Equal(8.94735, 1e5 * Math.Exp(WaterVapour.LogSaturationPressureOverIce(230)), 5);

    // Normal boiling point 373.124 K (99.974 C) and the critical point 22.064 MPa: IAPWS, from memory.
    [Theory]
    [InlineData(373.1243, 1.01325, 3e-5)]
    [InlineData(647.096, 220.64, 1e-9)]
    public void Liquid_meets_boiling_and_critical_point(double kelvin, double bar, double tolerance) =>
        Assert.Equal(bar, Math.Exp(WaterVapour.LogSaturationPressureOverLiquid(kelvin)), tolerance);

    [Fact]
    public void Ice_and_liquid_meet_at_the_triple_point() => Assert.Equal(
        WaterVapour.LogSaturationPressureOverIce(WaterVapour.TriplePointKelvin),
        WaterVapour.LogSaturationPressureOverLiquid(WaterVapour.TriplePointKelvin),
        1e-6);

    // Minus 40 C: 127 ppm of an atmosphere over ice, 187 over supercooled water; common practice, no source.
    [Fact]
    public void Supercooled_water_gives_more_vapour_than_ice_below_the_triple_point() => Gen.Double[180, 273.1].Sample(kelvin =>
        WaterVapour.LogSaturationPressureOverSupercooled(kelvin) > WaterVapour.LogSaturationPressureOverIce(kelvin), seed: "0000KWrg9MH2");

    [Fact]
    public void Frost_point_returns_the_temperature_it_came_from() => Gen.Double[50, 273.16].Sample(
        kelvin => RoundTrip(WaterVapour.FrostPointOverIce, WaterVapour.LogSaturationPressureOverIce, kelvin), seed: "0000KWrg9MH2");

    [Fact]
    public void Dew_point_returns_the_temperature_it_came_from() => Gen.Double[273.16, 640].Sample(
        kelvin => RoundTrip(WaterVapour.DewPointOverLiquid, WaterVapour.LogSaturationPressureOverLiquid, kelvin), seed: "0000KWrg9MH2");

    [Fact]
    public void Supercooled_dew_point_returns_the_temperature_it_came_from() => Gen.Double[123, 332].Sample(
        kelvin => RoundTrip(WaterVapour.DewPointOverSupercooled, WaterVapour.LogSaturationPressureOverSupercooled, kelvin), seed: "0000KWrg9MH2");

    [Fact]
    public void The_ends_of_each_line_are_part_of_it()
    {
        Assert.Equal(273.16, WaterVapour.FrostPointOverIce(WaterVapour.LogSaturationPressureOverIce(273.16))!.Value, 1e-9);
        Assert.Equal(50, WaterVapour.FrostPointOverIce(WaterVapour.LogSaturationPressureOverIce(50))!.Value, 1e-9);
        Assert.Equal(273.16, WaterVapour.DewPointOverLiquid(WaterVapour.LogSaturationPressureOverLiquid(273.16))!.Value, 1e-9);
        Assert.Equal(647.096, WaterVapour.DewPointOverLiquid(WaterVapour.LogSaturationPressureOverLiquid(647.096))!.Value, 1e-9);
    }

    [Fact]
    public void Outside_a_line_there_is_no_answer()
    {
        Assert.Null(WaterVapour.FrostPointOverIce(Math.Log(0.0062)));
        Assert.Null(WaterVapour.FrostPointOverIce(-1000));
        Assert.Null(WaterVapour.DewPointOverLiquid(Math.Log(0.0061)));
        Assert.Null(WaterVapour.DewPointOverLiquid(Math.Log(221)));
        Assert.Null(WaterVapour.DewPointOverSupercooled(double.NaN));
    }

    [Theory]
    [InlineData(49.9)]
    [InlineData(273.17)]
    [InlineData(double.NaN)]
    public void A_temperature_off_the_ice_line_is_refused(double kelvin) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => WaterVapour.LogSaturationPressureOverIce(kelvin));

    [Fact]
    public void Pressure_rises_along_each_line()
    {
        AssertRises(WaterVapour.LogSaturationPressureOverIce, 50, 273.16);
        AssertRises(WaterVapour.LogSaturationPressureOverLiquid, 273.16, 647.096);
        AssertRises(WaterVapour.LogSaturationPressureOverSupercooled, 123, 332);
    }

    private static void AssertRises(Func<double, double> logBarAt, double low, double high)
    {
        double[] values = [.. Enumerable.Range(0, 201).Select(i => logBarAt(Math.Min(high, low + (i * (high - low) / 200))))];
        Assert.All(values.Skip(1).Zip(values), pair => Assert.True(pair.First > pair.Second));
    }

    private static bool RoundTrip(Func<double, double?> temperatureFor, Func<double, double> logBarAt, double kelvin) =>
        temperatureFor(logBarAt(kelvin)) is { } found && Math.Abs(found - kelvin) < 1e-9;

    private static double LogBarFor(string quantity, double kelvin) => quantity switch
    {
        _ when quantity.Contains("ice", StringComparison.Ordinal) || quantity.StartsWith("frost", StringComparison.Ordinal) =>
            WaterVapour.LogSaturationPressureOverIce(Math.Min(kelvin, WaterVapour.TriplePointKelvin)),
        _ when kelvin > WaterVapour.SupercooledHighestKelvin || quantity.Contains("triple", StringComparison.Ordinal) =>
            WaterVapour.LogSaturationPressureOverLiquid(kelvin),
        _ => WaterVapour.LogSaturationPressureOverSupercooled(kelvin),
    };

    private static double FoundFor(PublishedRow row)
    {
        double pascal = 1e5 * Math.Exp(LogBarFor(row["quantity"], KelvinOf(row["conditions"])));
        return row["unit"] switch
        {
            "Pa" => pascal,
            "mbar" => pascal / 100,
            "mmHg" => pascal / PascalPerMillimetreMercury,
            "ppmv (of total)" => pascal / 101325 * 1e6,
            string other => throw new InvalidDataException(other),
        };
    }

    private static double KelvinOf(string conditions)
    {
        string[] words = conditions.Split(',')[0].Split(' ');
        return words[1] == "K" ? PublishedTable.Number(words[0]) : PublishedTable.Number(words[0]) + 273.15;
    }
}
