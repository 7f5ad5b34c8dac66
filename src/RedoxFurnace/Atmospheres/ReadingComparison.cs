using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>Several readings of one gas, held against one another through the oxygen pressure each implies at furnace temperature.</summary>
/// <param name="Meaning">How the moisture reading was taken; empty where it is clear.</param>
/// <param name="Implied">Each reading, in the order given.</param>
/// <param name="Verdict">Whether they agree.</param>
/// <param name="Apart">The readings that stand apart from the majority.</param>
/// <param name="Log10Oxygen">Mean log10(pO2/bar) of the agreeing readings, weighted by their tolerances; null without an agreement.</param>
/// <param name="LargestGap">Largest difference between two readings, log10 units.</param>
/// <param name="Cause">What they share that would explain it, in words; empty when they agree.</param>
/// <param name="Next">What to measure next.</param>
public sealed record ReadingComparison(
    string Meaning,
    ImmutableArray<ImpliedOxygen> Implied,
    ReadingVerdict Verdict,
    ImmutableArray<ImpliedOxygen> Apart,
    double? Log10Oxygen,
    double LargestGap,
    string Cause,
    string Next)
{
    private static readonly double Log10OfE = 1 / Math.Log(10);

    /// <summary>Compares readings, once for every meaning the moisture readings can have.</summary>
    /// <param name="readings">At least one.</param>
    /// <param name="gas">The gas otherwise known: its H2 and CO shares count.</param>
    /// <param name="at">Furnace temperature.</param>
    /// <param name="total">Furnace pressure.</param>
    /// <param name="line">Pressure of the sampling line, where one is known.</param>
    /// <param name="reactions">CO, H2 and graphite with oxygen.</param>
    /// <returns>One comparison for each meaning.</returns>
    /// <exception cref="RequestException">A reading cannot be.</exception>
    public static ImmutableArray<ReadingComparison> Of(IReadOnlyList<FurnaceReading> readings, GasMixture gas, Temperature at, Pressure total, Pressure? line, GasReactions reactions)
    {
        double hydrogen = gas[GasSpecies.H2];
        ImmutableArray<WaterMeaning>[] meanings = [.. readings.Select(reading => reading.Water is { } water ? water.Meanings(total, line, hydrogen > 0 ? hydrogen : null) : [])];
        int count = Math.Max(1, meanings.Max(list => list.Length));
        return
        [
            .. Enumerable.Range(0, count).Select(i =>
            {
                ImmutableArray<ImpliedOxygen> implied =
                    [.. readings.Select((reading, k) => Imply(reading, meanings[k].IsEmpty ? null : meanings[k][Math.Min(i, meanings[k].Length - 1)].Content, gas, at, total, reactions))];
                string meaning = count == 1 ? "" : meanings.First(list => list.Length == count)[i].Meaning;
                return Compare(meaning, implied);
            }),
        ];
    }

    private static ImpliedOxygen Imply(FurnaceReading reading, WaterContent? water, GasMixture gas, Temperature at, Pressure total, GasReactions reactions)
    {
        double hydrogen = gas[GasSpecies.H2];
        double monoxide = gas[GasSpecies.CO];
        double kelvin = at.Kelvin;
        switch (reading.Kind)
        {
            case ReadingKind.Water when hydrogen > 0:
                return WithCarbon(reading, OfRatio(reactions.HydrogenOxidation, Math.Log(hydrogen) - Math.Log(water!.Value.Share)), WaterTolerance(reading, water.Value), "through H2/H2O");
            case ReadingKind.Water:
                return Silent("water says nothing about oxygen pressure without the H2 share; give the gas");
            case ReadingKind.Dioxide when monoxide > 0:
                return WithCarbon(reading, OfRatio(reactions.CarbonMonoxideOxidation, Math.Log(monoxide / reading.Value)), 2 * Log10OfE * reading.Tolerance, "through CO/CO2");
            case ReadingKind.Dioxide:
                return Silent("CO2 says nothing about oxygen pressure without the CO share; give the gas");
            case ReadingKind.MonoxideRatio:
                return WithCarbon(reading, OfRatio(reactions.CarbonMonoxideOxidation, Math.Log(reading.Value)), 2 * Log10OfE * reading.Tolerance, "through CO/CO2");
            case ReadingKind.Probe:
                return OfProbe();
            case ReadingKind.LogOxygen:
                return WithCarbon(reading, reading.Value, reading.Tolerance, "as given");
            default:
                return gas.Fuel > 0
                    ? Silent("a free-oxygen reading cannot be compared in a gas that burns: a hot cell shows what is left after burning, a cold one oxygen that has not reacted yet")
                    : WithCarbon(reading, Math.Log10(reading.Value) + total.Log10Bar, Log10OfE * reading.Tolerance, "free oxygen");
        }

        double OfRatio(Reaction reaction, double logRatio) => OxygenPotentialReadings.Log10Bar(GasReactions.PotentialOfRatio(reaction, kelvin, logRatio), kelvin);

        ImpliedOxygen Silent(string why) => new(reading, null, 0, null, why);

        ImpliedOxygen OfProbe()
        {
            OxygenProbe probe = reading.Probe!;
            double potential = PhysicalConstants.GasConstant * probe.At.Kelvin * probe.NaturalLogOxygen(reading.Value);
            double tolerance = Log10OfE * reading.Tolerance / 1000 * 4 * PhysicalConstants.Faraday / (PhysicalConstants.GasConstant * probe.At.Kelvin);
            if (Math.Abs(probe.At.Kelvin - kelvin) < 0.5)
            {
                return WithCarbon(reading, OxygenPotentialReadings.Log10Bar(potential, probe.At.Kelvin), tolerance, "at its own temperature, which is the furnace's");
            }

            Reaction carrier = hydrogen > 0 ? reactions.HydrogenOxidation : reactions.CarbonMonoxideOxidation;
            double ratio = GasReactions.RatioOfPotential(carrier, probe.At.Kelvin, potential);
            return WithCarbon(reading, OfRatio(carrier, ratio), tolerance, FormattableString.Invariant($"carried from {probe.At} to {at} at constant {(hydrogen > 0 ? "H2/H2O" : "CO/CO2")}"));
        }

        ImpliedOxygen WithCarbon(FurnaceReading own, double log10, double tolerance, string note)
        {
            double? carbon = monoxide > 0
                ? Math.Exp(Math.Log(monoxide) + total.NaturalLogBar + (reactions.GraphiteToMonoxide.StandardGibbs(kelvin) / (2 * PhysicalConstants.GasConstant * kelvin)) - (0.5 * log10 / Log10OfE))
                : null;
            return new ImpliedOxygen(own, log10, tolerance, carbon, note);
        }
    }

    /// <summary>Tolerance in log10 pO2: twice that of log10 pH2O.</summary>
    private static double WaterTolerance(FurnaceReading reading, WaterContent water)
    {
        if (reading.Water!.Scale is not (WaterScale.FrostPoint or WaterScale.DewPoint or WaterScale.FrostOrDewPoint))
        {
            return 2 * Log10OfE * reading.Tolerance;
        }

        double kelvin = (water.FrostPointKelvin ?? water.DewPointKelvin)!.Value;
        double colder = kelvin - reading.Tolerance;
        double change = kelvin <= WaterVapour.TriplePointKelvin
            ? WaterVapour.LogSaturationPressureOverIce(kelvin) - WaterVapour.LogSaturationPressureOverIce(colder)
            : WaterVapour.LogSaturationPressureOverLiquid(kelvin + reading.Tolerance) - WaterVapour.LogSaturationPressureOverLiquid(kelvin);
        return 2 * Log10OfE * change;
    }

    private static ReadingComparison Compare(string meaning, ImmutableArray<ImpliedOxygen> implied)
    {
        ImpliedOxygen[] speaking = [.. implied.Where(one => one.Log10Bar is not null)];
        if (speaking.Length < 2)
        {
            return new ReadingComparison(meaning, implied, ReadingVerdict.NothingToCompare, [], speaking.FirstOrDefault()?.Log10Bar, 0, "", "take a second reading of another kind: a probe beside a frost point, or CO2 beside a probe");
        }

        double gap = speaking.Max(one => one.Log10Bar!.Value) - speaking.Min(one => one.Log10Bar!.Value);
        (ImpliedOxygen[] largest, bool isAlone) = LargestAgreement(speaking);
        if (largest.Length == speaking.Length)
        {
            return new ReadingComparison(meaning, implied, ReadingVerdict.Agree, [], Mean(largest), gap, "", "nothing more: the readings agree within their tolerances");
        }

        bool majority = isAlone && largest.Length >= 2 && largest.Length > speaking.Length - largest.Length;
        ImmutableArray<ImpliedOxygen> apart = majority ? [.. speaking.Except(largest)] : [];
        return majority
            ? new ReadingComparison(meaning, implied, ReadingVerdict.SomeStandApart, apart, Mean(largest), gap, CauseOf(apart, Mean(largest)), NextFor(apart))
            : new ReadingComparison(meaning, implied, ReadingVerdict.NotDecidable, [], null, gap, CauseOfTwo(speaking), NextFor([.. speaking]));
    }

    /// <summary>The largest set in which every two agree, and whether no other set is as large. Few readings, so all sets are tried.</summary>
    private static (ImpliedOxygen[] Largest, bool IsAlone) LargestAgreement(ImpliedOxygen[] all)
    {
        ImpliedOxygen[] best = [];
        bool alone = true;
        for (int mask = 1; mask < 1 << Math.Min(all.Length, 16); mask++)
        {
            ImpliedOxygen[] set = [.. all.Where((_, i) => (mask >> i & 1) == 1)];
            if (set.Length < best.Length || !set.All(one => set.All(two => Agree(one, two))))
            {
                continue;
            }

            alone = set.Length > best.Length;
            best = set;
        }

        return (best, alone);
    }

    private static bool Agree(ImpliedOxygen one, ImpliedOxygen two)
        => Math.Abs(one.Log10Bar!.Value - two.Log10Bar!.Value) <= Math.Sqrt((one.Tolerance * one.Tolerance) + (two.Tolerance * two.Tolerance));

    private static double Mean(ImpliedOxygen[] set)
    {
        double weights = set.Sum(one => 1 / Math.Max(1e-12, one.Tolerance * one.Tolerance));
        return set.Sum(one => one.Log10Bar!.Value / Math.Max(1e-12, one.Tolerance * one.Tolerance)) / weights;
    }

    private static bool IsDrawn(ImpliedOxygen one) => one.Reading.Kind is ReadingKind.Water or ReadingKind.Dioxide or ReadingKind.MonoxideRatio or ReadingKind.FreeOxygen;

    private static string CauseOf(ImmutableArray<ImpliedOxygen> apart, double mean)
    {
        bool above = apart.All(one => one.Log10Bar > mean);
        if (apart.Length > 1 && apart.All(IsDrawn))
        {
            return above
                ? "they share the sampling line: a leak or a wet filter in it makes all of them read too oxidising"
                : "they share the sampling line: gas that shifted, or water that condensed on the way, makes all of them read too reducing";
        }

        return apart[0].Reading.Kind switch
        {
            ReadingKind.Water when above => "place: a leak or damp in the sampling line, or gas drawn where it is wetter than at the work",
            ReadingKind.Water => "place: an inlet reading, or water lost on the way; water is made in the furnace by leaks and by oxide on belt and charge",
            ReadingKind.Probe when above => "sensor: reference air short of oxygen reads low, so does a cracked sheath or a probe in a cold or stagnant corner",
            ReadingKind.Probe => "sensor: a sooted probe reads high; burn it off and read again",
            _ => above ? "place or leak: air drawn into the sample" : "place: the gas shifted or was taken upstream of the work",
        };
    }

    private static string CauseOfTwo(ImpliedOxygen[] speaking)
        => speaking.All(IsDrawn)
            ? "all readings share the sampling line (place, leak); none stands in the furnace itself"
            : "the readings alone do not tell place, leak and sensor apart";

    private static string NextFor(ImmutableArray<ImpliedOxygen> apart)
    {
        bool probe = apart.Any(one => one.Reading.Kind == ReadingKind.Probe);
        bool drawn = apart.Any(IsDrawn);
        return (probe, drawn) switch
        {
            (true, true) => "a third kind of reading that shares neither the probe nor the line: a shim or coupon at the work, or CO2 beside a dew point",
            (true, false) => "burn off the probe, check its reference air and its resistance, and read again; then a shim at the work",
            _ => "draw dry nitrogen through the line (it must read what the bottle says), then sample at the work through a short hot line",
        };
    }
}
