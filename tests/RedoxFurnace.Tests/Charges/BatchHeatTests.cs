using RedoxFurnace.Charges;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;
using RedoxFurnace.Tests.Cli;

namespace RedoxFurnace.Tests.Charges;

/// <summary>Batches: moisture rules first, heat and temperature against identities; published thermites stand in the ledger of check values.</summary>
public class BatchHeatTests
{
    [Theory]
    [InlineData("batch-heat \"Fe2O3 320kg, Al 108kg\"", "Dry first, do not fire: the moisture of this metal-powder charge is not stated", "not-decidable")]
    [InlineData("batch-heat \"Fe2O3 320kg, Al 108kg\" --moisture 0.2%", "Dry first, do not fire: 0.2 % free water is above 0.1 %", "does-not-work")]
    [InlineData("batch-heat \"Fe2O3 320kg, Al 108kg\" --moisture 0.05%", "Adiabatic temperature", "works")]
    public void Moisture_speaks_first(string line, string start, string verdict)
    {
        Assert.StartsWith(start, ProgramRun.Of(line).Output, StringComparison.Ordinal);
        Assert.Equal(verdict, ProgramRun.Of(line + " --json").Json().GetProperty("verdict").GetString());
    }

    /// <summary>1 kg with 1 g of water: 22.414 L a mole over 18.015 g/mol.</summary>
    [Fact]
    public void Steam_follows_from_the_mass_of_water()
        => Assert.Equal(22.414 / 18.015, Of("Fe2O3 320kg, Al 108kg", moisture: 0.001).WaterLitresPerKilogram!.Value, 1e-3);

    /// <summary>Inert mass takes heat: less hot; a warmer start: hotter; preheat to the temperature reached from 400 C is 400 C.</summary>
    [Fact]
    public void Inert_mass_cools_and_a_warm_start_heats()
    {
        BatchHeatResult plain = Of("Cr2O3 152kg, Al 54kg");
        Assert.True(Of("Cr2O3 152kg, Al 54kg, MgO 40kg").Adiabatic < plain.Adiabatic);
        BatchHeatResult warm = BatchHeat.Of(Request("Cr2O3 152kg, Al 54kg", 0) with { Start = Temperature.FromCelsius(400) }, SubstanceDatabase.Bundled);
        Assert.True(warm.Adiabatic > plain.Adiabatic);
        Assert.Equal(plain.HeatAtReference, warm.HeatAtReference);
        BatchHeatResult asked = BatchHeat.Of(Request("Cr2O3 152kg, Al 54kg", 0) with { Reach = warm.Adiabatic }, SubstanceDatabase.Bundled);
        Assert.Equal(673.15, asked.Preheat!.Value.Kelvin, 2.0);
    }

    [Fact]
    public void A_batch_that_takes_heat_has_no_adiabatic_temperature_and_says_why()
        => Assert.Contains("takes heat", Of("Cr2O3 152kg, C 36kg").AdiabaticReason, StringComparison.Ordinal);

    /// <summary>Never a way to boost or to light a charge.</summary>
    [Fact]
    public void Nothing_tells_how_to_light_it()
    {
        string text = ProgramRun.Of("batch-heat \"Fe2O3 320kg, Al 108kg\" --moisture 0.05%").Output;
        foreach (string word in new[] { "ignite with", "fuse", "booster", "peroxide", "chlorate" })
        {
            Assert.DoesNotContain(word, text, StringComparison.OrdinalIgnoreCase);
        }
    }

    /// <summary>Scaling a charge scales its heat, and the order of input changes nothing.</summary>
    [Fact]
    public void Scaling_and_order_change_nothing_but_the_size()
    {
        BatchHeatResult once = Of("Fe2O3 320kg, Al 108kg, CaO 20kg");
        BatchHeatResult twice = Of("CaO 40kg, Al 216kg, Fe2O3 640kg");
        Assert.Equal(2 * once.HeatAtReference, twice.HeatAtReference, Math.Abs(once.HeatAtReference) * 1e-9);
        Assert.Equal(once.Adiabatic!.Value.Kelvin, twice.Adiabatic!.Value.Kelvin, 0.1);
    }

    private static BatchHeatResult Of(string charge, double moisture = 0) => BatchHeat.Of(Request(charge, moisture), SubstanceDatabase.Bundled);

    private static BatchHeatRequest Request(string charge, double moisture)
        => new(ChargeText.Parse(charge, SubstanceDatabase.Bundled), Temperature.FromKelvin(298.15), moisture, Pressure.FromBar(PhysicalConstants.AtmosphereInBar), null);
}
