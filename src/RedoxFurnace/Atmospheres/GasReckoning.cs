using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Atmospheres;

/// <summary>Reckons a furnace gas: equilibrium, readings, parts, steel, soot. A pure function of request and database.</summary>
public static class GasReckoning
{
    /// <summary>Oxygen beside fuel above this share is called an explosive mixture to be; below it is a trace a supplier states.</summary>
    private const double OxygenThatMatters = 1e-3;
    private const double FuelThatMatters = 1e-2;
    private const double SootHighest = 1473.15;

    /// <summary>Reckons the gas at every temperature and in every meaning.</summary>
    /// <param name="request">What is asked.</param>
    /// <param name="database">Data.</param>
    /// <returns>The result.</returns>
    /// <exception cref="NoAnswerException">Outside 300 to 2500 K or 1e-9 to 100 bar.</exception>
    public static GasResult Of(GasRequest request, SubstanceDatabase database)
    {
        GasEquilibrium equilibrium = new(database);
        GasReactions reactions = new(database);
        MetalsInGas metals = new(database);
        Temperature hottest = request.At.Max();
        List<GasPoint> points = [];
        List<GasMixture> mixtures = [];
        foreach (GasMeaning meaning in request.Analysis.Meanings)
        {
            GasMixture mixture = request.Following switch
            {
                GasSpecies.CO2 => WaterGasShift.DioxideFromWater(meaning.Mixture, hottest, reactions),
                GasSpecies.H2O => WaterGasShift.WaterFromDioxide(meaning.Mixture, hottest, reactions),
                _ => meaning.Mixture,
            };
            mixtures.Add(mixture);
            points.AddRange(request.At.Select(at => Point(meaning.Meaning, mixture, at, request, equilibrium, reactions, metals)));
        }

        GasMixture first = mixtures[0];
        bool explosive = first[GasSpecies.O2] >= OxygenThatMatters && first.Fuel >= FuelThatMatters;
        bool mayCarry = first[GasSpecies.CO] > 0;
        ImmutableArray<CarbonRange> soot = mayCarry && !explosive
            ? SootOnCooling.Ranges(first, request.Total, equilibrium, GasEquilibrium.LowestKelvin, Math.Max(SootHighest, hottest.Kelvin))
            : [];
        return new GasResult(
            request,
            [.. points],
            soot,
            Headline(points, explosive, request),
            explosive,
            [.. Assumptions(request, first)],
            [.. Notes(request, points, soot, first)],
            [.. Ask(request, points)]);
    }

    private static GasPoint Point(string meaning, GasMixture mixture, Temperature at, GasRequest request, GasEquilibrium equilibrium, GasReactions reactions, MetalsInGas metals)
    {
        GasAnswer answer = equilibrium.Of(mixture, at, request.Total);
        GasState gas = answer.AsAnalysed;
        OxygenProbe probe = new(request.ProbeAt ?? at);
        return new GasPoint(
            meaning,
            at,
            answer,
            double.IsNegativeInfinity(gas.NaturalLogPressure(GasSpecies.H2O)) ? null : WaterContent.OfPressure(Math.Min(gas.NaturalLogPressure(GasSpecies.H2O), request.Total.NaturalLogBar), request.Total),
            gas.NaturalLogOxygen is { } oxygen ? ProbeReading(oxygen, probe, at, mixture, request.Total, equilibrium) : null,
            request.Parts is { } parts ? metals.Judge(parts, gas, mixture) : [],
            request.Steel is { } steel ? SteelInGas.Of(steel, gas, reactions, probe) : null);
    }

    /// <summary>A probe held at a temperature of its own sees the same gas come to equilibrium there.</summary>
    private static double? ProbeReading(double logOxygen, OxygenProbe probe, Temperature at, GasMixture mixture, Pressure total, GasEquilibrium equilibrium)
    {
        double? seen = Math.Abs(probe.At.Kelvin - at.Kelvin) < 0.5 ? logOxygen : equilibrium.AsAnalysed(mixture, probe.At, total).NaturalLogOxygen;
        return seen is { } log ? probe.Millivolts(log) : null;
    }

    private static string Headline(List<GasPoint> points, bool explosive, GasRequest request)
    {
        GasPoint first = points[0];
        if (explosive)
        {
            return $"Explosive mixture: {first.Answer.Mixture.Describe()} holds oxygen together with gas that burns. Never admit it; purge and follow the site procedure. What follows is the burnt gas.";
        }

        if (request.Parts is not null && first.Metals.Length > 0)
        {
            return PartsInWords(points);
        }

        if (request.Steel is not null && first.Steel is { } steel)
        {
            return SteelInWords(points, steel, request);
        }

        GasState gas = first.Answer.AsAnalysed;
        string oxygen = gas.Log10Oxygen is { } log ? $"log10 pO2 {Printed.Fixed(log, 2)} (bar)" : gas.NoOxygenReason!;
        string carbon = gas.CarbonActivity is { } activity ? $", carbon activity {Printed.Brief(activity)}" : "";
        string soot = first.Answer.AtEquilibrium.GraphiteMoles > 0 ? $"; at full equilibrium it deposits {Printed.Brief(first.Answer.AtEquilibrium.GraphiteMoles)} mol graphite per mol of gas" : "";
        return $"{first.Answer.Mixture.Describe()} at {first.At}: {oxygen}{carbon} as analysed{soot}.";
    }

    private static string PartsInWords(List<GasPoint> points)
    {
        MetalInGas worst = points[0].Metals[0];
        string at = points[0].At.ToString();
        bool differs = points.Select(point => Verdict(point.Metals)).Distinct().Count() > 1;
        if (points.Select(point => point.Meaning).Distinct().Count() > 1 && points.GroupBy(point => point.Meaning).Select(group => Verdict(group.First().Metals)).Distinct().Count() > 1)
        {
            return $"Not decidable: the parts are {string.Join(", ", points.GroupBy(point => point.Meaning).Select(group => $"{Word(Verdict(group.First().Metals))} if the reading is a {group.Key}"))}.";
        }

        string limit = worst.LimitWater is { } water ? $"; {worst.Element.Symbol} needs a frost point below {FrostText(water)}" : "";
        string cooling = worst.OxidisesBelowKelvin is { } below ? $"; on cooling in the same gas it oxidises below {Temperature.FromKelvin(below)}" : "";
        string others = differs ? "; the verdict changes over the temperatures asked" : "";
        return Verdict(points[0].Metals) switch
        {
            BrightVerdict.Bright => $"All parts stay bright at {at}: the most demanding is {worst.Element.Symbol}, with a margin of {Kilojoules(worst)}{cooling}{others}.",
            BrightVerdict.Borderline => $"Borderline at {at}: {worst.Element.Symbol} has a margin of {Kilojoules(worst)}, less than its uncertainty{limit}{others}.",
            BrightVerdict.Oxidises => $"{string.Join(", ", points[0].Metals.Where(metal => metal.Verdict == BrightVerdict.Oxidises).Select(metal => metal.Element.Symbol))} oxidises at {at}: {worst.Element.Symbol} by {Kilojoules(worst)}{limit}{others}.",
            _ => $"Not decidable at {at}: {string.Join("; ", points[0].Metals.SelectMany(metal => metal.Notes).Distinct().Take(2))}.",
        };
    }

    /// <summary>The verdict on the whole: the worst of its elements.</summary>
    /// <param name="metals">Of one gas.</param>
    /// <returns>Oxidises before borderline before not decidable before bright.</returns>
    public static BrightVerdict Verdict(ImmutableArray<MetalInGas> metals)
        => metals.Any(metal => metal.Verdict == BrightVerdict.Oxidises) ? BrightVerdict.Oxidises
            : metals.Any(metal => metal.Verdict == BrightVerdict.Borderline) ? BrightVerdict.Borderline
            : metals.Any(metal => metal.Verdict == BrightVerdict.NotDecidable) ? BrightVerdict.NotDecidable
            : BrightVerdict.Bright;

    /// <summary>The word of a verdict in outputs.</summary>
    /// <param name="verdict">The verdict.</param>
    /// <returns>Lower case.</returns>
    public static string Word(BrightVerdict verdict) => verdict switch
    {
        BrightVerdict.Bright => "bright",
        BrightVerdict.Borderline => "borderline",
        BrightVerdict.Oxidises => "oxidises",
        _ => "not-decidable",
    };

    private static string SteelInWords(List<GasPoint> points, SteelInGas steel, GasRequest request)
    {
        string at = points[0].At.ToString();
        if (steel.Carbon is not { } carbon)
        {
            return $"No carbon answer at {at}: {steel.Reason}.";
        }

        string level = $"At {at} this gas brings the steel to {Printed.Fixed(carbon, 2)} ± {Printed.Fixed(steel.Uncertainty!.Value, 2)} % C (carbon potential {Printed.Fixed(steel.CarbonPotential!.Value, 2)} %)";
        if (request.Steel!.Carbon is not { } own)
        {
            return level + ".";
        }

        string effect = Math.Abs(carbon - own) < steel.Uncertainty ? "neutral within the uncertainty" : carbon > own ? "it carburises" : "it decarburises";
        return $"{level}: {effect} against {Printed.Fixed(own, 2)} % C.";
    }

    private static string Kilojoules(MetalInGas metal) => $"{Printed.Fixed(metal.Margin!.Value / 1000, 0)} ± {Printed.Fixed(metal.Uncertainty!.Value / 1000, 0)} kJ/mol O2";

    private static string FrostText(WaterContent water) => water.FrostPointKelvin is { } frost
        ? Temperature.FromKelvin(frost).ToString()
        : water.DewPointKelvin is { } dew ? "dew point " + Temperature.FromKelvin(dew) : Printed.Brief(water.Ppm) + " ppm";

    private static IEnumerable<string> Assumptions(GasRequest request, GasMixture gas)
    {
        yield return $"gas {gas.Describe()} at {request.Total}";
        yield return "as analysed: CO, CO2, H2, H2O and O2 in balance, methane and ammonia untouched, no graphite; at equilibrium: every gas, and graphite where its activity would pass 1";
        yield return $"probe at {(request.ProbeAt is { } probe ? probe.ToString() : "furnace temperature")} against air with 20.95 % oxygen at 1 atm";
        if (request.Preset is { } preset)
        {
            yield return $"{preset.Name}: typical analysis ({preset.Typical}; {preset.Source}), overridden where you gave a figure";
        }

        if (request.Following is { } follower)
        {
            yield return $"{follower} follows from the rest through CO + H2O = CO2 + H2 at {request.At.Max()}";
        }

        if (request.Parts is { } parts)
        {
            foreach (string note in parts.Notes)
            {
                yield return note;
            }

            yield return "pure oxides of unit activity; every element given is judged, none is cut off for being small";
        }

        if (request.Steel is not null)
        {
            yield return "carbon of austenite: Ellis, Davidson and Bodsworth 1963; alloy terms: Gunnarson 1967; both recalled from memory, uncertainty 8 % of the carbon and at least 0.03 % C";
        }

        yield return "ideal gas at equilibrium, not rate";
    }

    private static IEnumerable<string> Notes(GasRequest request, List<GasPoint> points, ImmutableArray<CarbonRange> soot, GasMixture gas)
    {
        foreach (string note in request.Analysis.Notes)
        {
            yield return note;
        }

        foreach (CarbonRange range in soot)
        {
            string low = range.LowIsOpen ? "the cold end" : Temperature.FromKelvin(range.LowKelvin).ToString();
            string high = range.HighIsOpen ? "the hot end searched" : Temperature.FromKelvin(range.HighKelvin).ToString();
            string dusting = SootOnCooling.Dusting(range) is { } dust ? $"; alloys dust from {Temperature.FromKelvin(dust.LowKelvin)} to {Temperature.FromKelvin(dust.HighKelvin)} (common practice, no source)" : "";
            yield return $"soot: carried as analysed the gas can deposit carbon from {low} to {high}{dusting}";
        }

        if (gas[GasSpecies.CO] > 0 && gas[GasSpecies.H2] > 0 && gas[GasSpecies.CO] / Math.Max(1e-12, gas[GasSpecies.CO] + gas[GasSpecies.H2]) > 0 && points[0].Steel is not null)
        {
            yield return "the true CO share counts: if it is lower than taken, a probe or dew point over-reads the carbon in proportion, CO2 with its square";
        }

        foreach (string note in points.SelectMany(point => point.Metals).SelectMany(metal => metal.Notes.Select(note => metal.Element.Symbol + ": " + note)).Distinct())
        {
            yield return note;
        }

        foreach ((string metal, CompoundInGas compound, string kind) in points.SelectMany(point => point.Metals)
            .SelectMany(metal => new[] { (metal.Element.Symbol, metal.Nitride, "nitride"), (metal.Element.Symbol, metal.Carbide, "carbide") })
            .Where(item => item.Item2 is not null && item.Item2.Forms != false).Select(item => (item.Symbol, item.Item2!, item.Item3)).DistinctBy(item => (item.Item1, item.Item2.Formula)))
        {
            yield return $"{metal}: {kind} {compound.Formula} {(compound.Forms == true ? "can form" : "may form (within the uncertainty)")} at the {(kind == "nitride" ? "nitrogen pressure" : "carbon activity")} of this gas";
        }
    }

    private static IEnumerable<string> Ask(GasRequest request, List<GasPoint> points)
    {
        bool matters = points.GroupBy(point => point.Meaning).Count() > 1;
        foreach (string question in request.Analysis.Ask)
        {
            yield return question + (matters && request.Parts is not null
                ? points.GroupBy(point => point.Meaning).Select(group => Verdict(group.First().Metals)).Distinct().Count() > 1 ? ", and the verdict hangs on it" : ", but the verdict is the same either way"
                : "");
        }
    }
}
