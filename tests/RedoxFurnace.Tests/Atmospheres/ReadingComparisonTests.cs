using System.Collections.Immutable;
using CsCheck;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Tests.Atmospheres;

public class ReadingComparisonTests
{
    private static readonly Temperature At = Temperature.FromCelsius(900);

    [Fact]
    public void Readings_of_one_equilibrated_gas_agree_on_one_oxygen_pressure()
    {
        (GasMixture gas, GasState state) = Endothermic();
        ReadingComparison found = Compare(gas, Dew(state), Dioxide(state), Probe(state, 900));
        Assert.Equal(ReadingVerdict.Agree, found.Verdict);
        Assert.All(found.Implied, one => Assert.Equal(state.Log10Oxygen!.Value, one.Log10Bar!.Value, 1e-6));
        Assert.All(found.Implied, one => Assert.Equal(state.CarbonActivity!.Value, one.CarbonActivity!.Value, 1e-6));
    }

    [Fact]
    public void A_wet_sampling_line_stands_apart_and_the_cause_is_named()
    {
        (GasMixture gas, GasState state) = Endothermic();
        ReadingComparison found = Compare(gas, FurnaceReading.OfWater(WaterReading.Parse("dew", "+22C")), Dioxide(state), Probe(state, 900));
        Assert.Equal(ReadingVerdict.SomeStandApart, found.Verdict);
        Assert.Equal(ReadingKind.Water, Assert.Single(found.Apart).Reading.Kind);
        Assert.Contains("line", found.Cause, StringComparison.Ordinal);
    }

    [Fact]
    public void Two_drawn_readings_against_the_probe_share_the_line_or_the_probe_is_out()
    {
        (GasMixture gas, GasState state) = Endothermic();
        ReadingComparison found = Compare(gas, Dew(state), Dioxide(state), FurnaceReading.OfProbe(1000, new OxygenProbe(At)));
        Assert.Equal(ReadingVerdict.SomeStandApart, found.Verdict);
        Assert.Contains("sensor", found.Cause, StringComparison.Ordinal);
    }

    [Fact]
    public void Two_readings_that_differ_are_not_decidable()
    {
        (GasMixture gas, GasState state) = Endothermic();
        ReadingComparison found = Compare(gas, Dew(state), FurnaceReading.OfProbe(1000, new OxygenProbe(At)));
        Assert.Equal(ReadingVerdict.NotDecidable, found.Verdict);
        Assert.Null(found.Log10Oxygen);
        Assert.NotEmpty(found.Next);
    }

    [Fact]
    public void One_reading_has_nothing_to_be_compared_with() => Assert.Equal(
        ReadingVerdict.NothingToCompare,
        Compare(Endothermic().Gas, FurnaceReading.OfProbe(1100, new OxygenProbe(At))).Verdict);

    [Fact]
    public void A_hot_cell_in_gas_that_burns_says_nothing_of_free_oxygen()
    {
        ReadingComparison found = Compare(Endothermic().Gas, FurnaceReading.OfFreeOxygen(5e-6));
        Assert.Null(found.Implied[0].Log10Bar);
        Assert.Contains("burn", found.Implied[0].Note, StringComparison.Ordinal);
    }

    [Fact]
    public void An_open_scale_is_compared_both_ways()
    {
        GasMixture gas = GasSamples.Parse("H2 5%, N2 95%");
        ImmutableArray<ReadingComparison> both = ReadingComparison.Of(
            [FurnaceReading.OfWater(WaterReading.Parse("moisture", "-40C")), FurnaceReading.OfLogOxygen(-20)], gas, At, GasSamples.Atmosphere, null, GasSamples.Reactions);
        Assert.Equal(2, both.Length);
        Assert.NotEqual(both[0].Implied[0].Log10Bar, both[1].Implied[0].Log10Bar);
    }

    [Fact]
    public void Probe_voltage_returns_to_its_start() => Gen.Select(Gen.Double[700, 1600], Gen.Double[-200, 1500], Gen.Double[0.15, 0.22]).Sample((kelvin, millivolts, air) =>
    {
        OxygenProbe probe = new(Temperature.FromKelvin(kelvin), air);
        Assert.Equal(millivolts, probe.Millivolts(probe.NaturalLogOxygen(millivolts)), 1e-8);
    });

    [Fact]
    public void A_probe_elsewhere_is_carried_to_the_furnace_through_the_gas()
    {
        (GasMixture gas, GasState state) = Endothermic();
        Temperature cooler = Temperature.FromCelsius(800);
        double potential = PhysicalConstants.GasConstant * cooler.Kelvin * ColderOxygen(state, cooler);
        double millivolts = new OxygenProbe(cooler).Millivolts(potential / (PhysicalConstants.GasConstant * cooler.Kelvin));
        ImpliedOxygen found = Compare(gas, FurnaceReading.OfProbe(millivolts, new OxygenProbe(cooler))).Implied[0];
        Assert.Equal(state.Log10Oxygen!.Value, found.Log10Bar!.Value, 1e-6);
    }

    private static double ColderOxygen(GasState state, Temperature at)
    {
        double ratio = state.NaturalLogPressure(GasSpecies.H2) - state.NaturalLogPressure(GasSpecies.H2O);
        return GasReactions.PotentialOfRatio(GasSamples.Reactions.HydrogenOxidation, at.Kelvin, ratio) / (PhysicalConstants.GasConstant * at.Kelvin);
    }

    private static (GasMixture Gas, GasState State) Endothermic()
    {
        GasState state = GasSamples.Equilibrium.AsAnalysed(GasSamples.Endothermic("+6C", 900), At, GasSamples.Atmosphere);
        return (state.ToMixture(), state);
    }

    private static FurnaceReading Dew(GasState state)
    {
        double kelvin = WaterContent.OfPressure(state.NaturalLogPressure(GasSpecies.H2O), GasSamples.Atmosphere).DewPointKelvin!.Value;
        return FurnaceReading.OfWater(WaterReading.Parse("dew", Printed.Exact(kelvin) + "K"));
    }

    private static FurnaceReading Dioxide(GasState state) => FurnaceReading.OfDioxide(state.Fraction(GasSpecies.CO2));

    private static FurnaceReading Probe(GasState state, double celsius)
    {
        OxygenProbe probe = new(Temperature.FromCelsius(celsius));
        return FurnaceReading.OfProbe(probe.Millivolts(state.NaturalLogOxygen!.Value), probe);
    }

    private static ReadingComparison Compare(GasMixture gas, params FurnaceReading[] readings)
        => ReadingComparison.Of(readings, gas, At, GasSamples.Atmosphere, null, GasSamples.Reactions).Single();
}
