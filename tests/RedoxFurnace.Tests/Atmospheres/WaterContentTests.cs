using CsCheck;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Tests.Atmospheres;

/// <summary>Bands from straight-line handbook fits: 3 C in frost point.</summary>
public class WaterContentTests
{
    private static readonly Pressure OneBar = Pressure.FromBar(1);

    [Fact]
    public void A_frost_point_read_as_a_dew_point_is_out_by_half()
    {
        // -40 C: 127 ppm over ice, 187 ppm over supercooled water, 1 atm (common practice, no source).
        Assert.Equal(127, WaterContent.OfFrostPoint(Temperature.FromCelsius(-40), GasSamples.Atmosphere).Ppm, 1.0);
        Assert.Equal(187, WaterContent.OfDewPoint(Temperature.FromCelsius(-40), GasSamples.Atmosphere).Ppm, 1.0);
    }

    [Theory]
    [InlineData(-60, 1, 7, -45)]
    [InlineData(-60, 7, 1, -73)]
    public void Frost_point_follows_the_pressure(double celsius, double fromBar, double toBar, double expected) => Assert.Equal(
        expected,
        WaterContent.OfFrostPoint(Temperature.FromCelsius(celsius), Pressure.FromBar(fromBar)).At(Pressure.FromBar(toBar)).FrostPointKelvin!.Value - 273.15,
        1.0);

    [Fact]
    public void Every_scale_returns_to_its_start() => Gen.Select(Gen.Double[-80, 60], Gen.Double[0.5, 20]).Sample((celsius, bar) =>
    {
        Pressure total = Pressure.FromBar(bar);
        Temperature at = Temperature.FromCelsius(celsius);
        WaterContent dew = WaterContent.OfDewPoint(at, total);
        Assert.Equal(at.Kelvin, dew.DewPointKelvin!.Value, 1e-7);
        Assert.Equal(dew.NaturalLogBar, WaterContent.OfDewPoint(Temperature.FromKelvin(dew.DewPointKelvin.Value), total).NaturalLogBar, 1e-9);
        Assert.Equal(dew.NaturalLogBar, WaterContent.OfShare(dew.Ppm / 1e6, total).NaturalLogBar, 1e-9);
        Assert.Equal(dew.NaturalLogBar, WaterContent.OfGramsPerNm3(dew.GramsPerNm3, total).NaturalLogBar, 1e-9);
        Assert.Equal(dew.NaturalLogBar, WaterContent.OfPressure(Pressure.FromBar(dew.Millibar / 1000).NaturalLogBar, total).NaturalLogBar, 1e-9);
        Assert.Equal(dew.NaturalLogBar, WaterContent.OfPressure(Pressure.Parse(Printed.Exact(dew.Torr) + "Torr").NaturalLogBar, total).NaturalLogBar, 1e-9);
        Assert.Equal(dew.NaturalLogBar, dew.At(OneBar).At(total).NaturalLogBar, 1e-9);
        if (dew.FrostPointKelvin is { } frost)
        {
            Assert.Equal(dew.NaturalLogBar, WaterContent.OfFrostPoint(Temperature.FromKelvin(frost), total).NaturalLogBar, 1e-9);
        }
    });

    [Fact]
    public void Grams_per_cubic_metre_come_from_molar_mass_and_volume()
    {
        // 18.015 g/mol over 22.414 l/mol: 1 % by volume is 8.04 g/Nm3.
        Assert.Equal(8.04, WaterContent.OfShare(0.01, OneBar).GramsPerNm3, 0.005);
    }

    [Fact]
    public void A_reading_without_scale_has_both_meanings_below_freezing_and_one_above()
    {
        Assert.Equal(2, WaterReading.Parse("moisture", "-60C").Meanings(OneBar).Length);
        Assert.Single(WaterReading.Parse("moisture", "+6C").Meanings(OneBar));
    }

    [Fact]
    public void A_reading_without_place_has_a_meaning_for_each_pressure()
    {
        Assert.Equal(2, WaterReading.Parse("frost", "-60C").Meanings(OneBar, Pressure.FromBar(6)).Length);
        Assert.Equal(4, WaterReading.Parse("moisture", "-60C").Meanings(OneBar, Pressure.FromBar(6)).Length);
        Assert.Single(WaterReading.Parse("frost", "-60C at 6bara").Meanings(OneBar, Pressure.FromBar(6)));
        Assert.Single(WaterReading.Parse("H2O", "20ppm").Meanings(OneBar, Pressure.FromBar(6)));
    }

    [Theory]
    [InlineData("frost", "-45", "no unit")]
    [InlineData("frost", "+3C", "frost forms")]
    [InlineData("frost", "-45C at 6bar", "absolute or gauge")]
    [InlineData("H2O", "3 g/m3", "g/Nm3")]
    [InlineData("H2O", "3 apples", "apples")]
    [InlineData("H2O", "120%", "100%")]
    [InlineData("H2O", "-3mbar", "above 0")]
    public void A_wrong_reading_is_refused_and_says_what_would_do(string name, string value, string said)
    {
        RequestException refusal = Assert.Throws<RequestException>(() => WaterReading.Parse(name, value).Meanings(OneBar));
        Assert.Contains(said, refusal.Message, StringComparison.Ordinal);
        Assert.DoesNotContain("\n", refusal.Message, StringComparison.Ordinal);
    }
}
