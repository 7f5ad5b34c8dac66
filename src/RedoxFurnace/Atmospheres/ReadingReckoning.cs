using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Atmospheres;

/// <summary>Converts readings and holds them against one another. A pure function of request and database.</summary>
public static class ReadingReckoning
{
    /// <summary>Two meanings that differ by less than this in water are the same for every purpose of a furnace.</summary>
    private const double SameWithin = 1.1;

    /// <summary>Reckons the readings.</summary>
    /// <param name="request">What is asked.</param>
    /// <param name="database">Data.</param>
    /// <returns>The result.</returns>
    /// <exception cref="RequestException">A reading cannot be, or a probe has no temperature.</exception>
    public static ReadingResult Of(ReadingRequest request, SubstanceDatabase database)
    {
        GasReactions reactions = new(database);
        GasMixture gas = request.Gas?.Meanings[0].Mixture ?? GasMixture.Of((GasSpecies.N2, 1));
        Temperature? at = request.At ?? request.Readings.Select(reading => reading.Probe?.At).FirstOrDefault(probe => probe is not null);
        ImmutableArray<WaterConversion> waters = [.. request.Readings.SelectMany(reading => Waters(reading, request, gas))];
        ImmutableArray<ReadingComparison> comparisons = at is { } temperature
            ? ReadingComparison.Of(request.Readings, gas, temperature, request.Furnace, request.Line, reactions)
            : [];
        bool open = comparisons.Select(comparison => comparison.Verdict).Distinct().Count() > 1 || comparisons.Any(comparison => comparison.Verdict == ReadingVerdict.NotDecidable);
        double spread = waters.GroupBy(water => water.Reading).Select(group => group.Max(water => water.AtFurnace.Ppm) / group.Min(water => water.AtFurnace.Ppm)).DefaultIfEmpty(1).Max();
        return new ReadingResult(
            request,
            at,
            waters,
            comparisons,
            Headline(request, waters, comparisons, spread),
            !open,
            [.. Assumptions(request, at, gas)],
            [.. Notes(request, waters, comparisons)],
            [.. Ask(request, waters, spread, open)]);
    }

    /// <summary>The word of a verdict in outputs.</summary>
    /// <param name="verdict">The verdict.</param>
    /// <returns>Lower case.</returns>
    public static string Word(ReadingVerdict verdict) => verdict switch
    {
        ReadingVerdict.Agree => "agree",
        ReadingVerdict.SomeStandApart => "some-stand-apart",
        ReadingVerdict.NotDecidable => "not-decidable",
        _ => "nothing-to-compare",
    };

    private static IEnumerable<WaterConversion> Waters(FurnaceReading reading, ReadingRequest request, GasMixture gas)
    {
        if (reading.Water is not { } water)
        {
            yield break;
        }

        double hydrogen = gas[GasSpecies.H2];
        foreach (WaterMeaning meaning in water.Meanings(request.Furnace, request.Line, hydrogen > 0 ? hydrogen : null))
        {
            Pressure? place = water.Place ?? (meaning.Meaning.Contains("in the line", StringComparison.Ordinal) ? request.Line : null);
            yield return new WaterConversion(reading.Text, meaning.Meaning, meaning.Content, place is { } there ? meaning.Content.At(there) : null);
        }
    }

    private static string Headline(ReadingRequest request, ImmutableArray<WaterConversion> waters, ImmutableArray<ReadingComparison> comparisons, double spread)
    {
        if (request.Readings.Length > 1 && comparisons.Length > 0 && comparisons.Any(comparison => comparison.Verdict != ReadingVerdict.NothingToCompare))
        {
            ReadingComparison first = comparisons[0];
            string when = comparisons.Length > 1 ? $" (taken as {first.Meaning})" : "";
            string gap = Printed.Fixed(first.LargestGap, 2);
            return first.Verdict switch
            {
                ReadingVerdict.Agree => $"The readings agree{when}: log10 pO2 {Printed.Fixed(first.Log10Oxygen!.Value, 2)} (bar), {gap} apart at most.",
                ReadingVerdict.SomeStandApart => $"{string.Join(" and ", first.Apart.Select(one => one.Reading.Text))} stands apart from the others{when}, by up to {gap} in log10 pO2: {first.Cause}. Next: {first.Next}.",
                ReadingVerdict.NotDecidable => $"Not decidable{when}: the readings lie {gap} apart in log10 pO2 and none has a majority; {first.Cause}. Next: {first.Next}.",
                _ => $"Nothing to compare{when}.",
            };
        }

        if (waters.Length > 0)
        {
            WaterConversion water = waters[0];
            string matter = waters.Length > 1 && spread > SameWithin
                ? $" It can be meant {waters.Length} ways that differ by a factor {Printed.Brief(spread)} in water: it matters."
                : waters.Length > 1 ? " The ways it can be meant differ by less than 10 %: it does not matter." : "";
            string read = water.AtPlace is { } place ? $" (read at {Pressure.FromNaturalLogBar(place.NaturalLogTotalBar)})" : "";
            return $"{water.Reading}{(water.Meaning.Length > 0 ? ", a " + water.Meaning : "")}{read} is {Printed.Brief(water.AtFurnace.Ppm)} ppm of water, {Point(water.AtFurnace)} at {request.Furnace}.{matter}";
        }

        ImpliedOxygen? implied = comparisons.SelectMany(comparison => comparison.Implied).FirstOrDefault();
        return implied?.Log10Bar is { } log
            ? $"{implied.Reading.Text} means log10 pO2 {Printed.Fixed(log, 2)} ± {Printed.Fixed(implied.Tolerance, 2)} (bar){(implied.CarbonActivity is { } carbon ? $" and, with the CO of the gas, a carbon activity of {Printed.Brief(carbon)}" : "")}."
            : $"{request.Readings[0].Text}: {implied?.Note ?? "give the furnace temperature with --at to turn it into an oxygen pressure"}.";
    }

    private static string Point(WaterContent water) => water.FrostPointKelvin is { } frost
        ? $"frost point {Temperature.FromKelvin(frost)} (dew point over supercooled water {Temperature.FromKelvin(water.DewPointKelvin!.Value)})"
        : water.DewPointKelvin is { } dew ? $"dew point {Temperature.FromKelvin(dew)}" : "no dew point below the critical point of water";

    private static IEnumerable<string> Assumptions(ReadingRequest request, Temperature? at, GasMixture gas)
    {
        yield return $"furnace pressure {request.Furnace}" + (request.Line is { } line ? $", sampling line {line}" : "");
        yield return request.Gas is null ? "nothing known of the gas: water alone gives no oxygen pressure" : $"gas {gas.Describe()}";
        if (at is { } temperature)
        {
            yield return $"oxygen pressures at {temperature}; tolerances where none is given: ±2 K, ±5 mV, ±5 % of CO2, ±10 % of ppm (common practice, no source)";
        }

        yield return "saturation over ice, liquid and supercooled water: IAPWS R14-08(2011), Wagner and Pruss 1993, Murphy and Koop 2005; ideal gas";
    }

    private static IEnumerable<string> Notes(ReadingRequest request, ImmutableArray<WaterConversion> waters, ImmutableArray<ReadingComparison> comparisons)
    {
        foreach (string note in request.Gas?.Notes ?? [])
        {
            yield return note;
        }

        if (waters.Any(water => water.AtPlace is { } place && place.NaturalLogTotalBar > request.Furnace.NaturalLogBar + 1e-9))
        {
            yield return "a frost point taken in a line under pressure falls when the gas is let down: the share of water stays, its pressure does not";
        }

        foreach (string note in comparisons.SelectMany(comparison => comparison.Implied).Where(one => one.Log10Bar is null).Select(one => $"{one.Reading.Text}: {one.Note}").Distinct())
        {
            yield return note;
        }
    }

    private static IEnumerable<string> Ask(ReadingRequest request, ImmutableArray<WaterConversion> waters, double spread, bool open)
    {
        foreach (string question in request.Gas?.Ask ?? [])
        {
            yield return question;
        }

        if (waters.Length > request.Readings.Count(reading => reading.Water is not null))
        {
            yield return $"which scale and place has the moisture reading? {(spread > SameWithin ? $"The meanings differ by a factor {Printed.Brief(spread)} in water" : "It makes less than 10 % in water")}{(open ? ", and the verdict hangs on it" : "")}";
        }
    }
}
