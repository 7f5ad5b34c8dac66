using System.Collections.Immutable;
using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Campaigns;

/// <summary>From a campaign sheet to a plan a furnace team can act on. A pure function of sheet, database, version and date.</summary>
internal static class CampaignPlanning
{
    private static readonly string[] Always = ["O2", "CO", "CO2", "H2", "H2O", "C"];

    /// <summary>Plans a campaign.</summary>
    /// <param name="yaml">The sheet.</param>
    /// <param name="file">Its name, for messages.</param>
    /// <param name="database">Data.</param>
    /// <param name="version">Of the tool.</param>
    /// <param name="date">Given by the user; the sheet's own counts where this is null.</param>
    /// <param name="progress">Told the stage at work.</param>
    /// <exception cref="DocumentException">The sheet is wrong.</exception>
    public static CampaignPlan Of(string yaml, string file, SubstanceDatabase database, string version, string? date, Action<string>? progress = null)
    {
        progress?.Invoke("reading the sheet");
        CampaignSheet sheet = new CampaignSheetReader(database).Read(yaml, file);
        CampaignJudge judge = new(database);
        progress?.Invoke("judging each stage");
        CampaignFacts facts = judge.Judge(sheet);
        TrapFinding[] traps = [.. Trap.All.Select(trap => trap.Find(facts)).OfType<TrapFinding>().OrderByDescending(trap => trap.IsGrave)];
        Judgement judgement = WithTraps(facts.Judgement, traps, facts);
        facts = facts with { Judgement = judgement };
        progress?.Invoke("moving each input");
        ImmutableArray<SensitivityRow> sensitivity = SensitivityFinder.Of(sheet, facts.Judgement, judge);
        progress?.Invoke("set-points, consumption, hazards");
        HazardNote[] hazards = [.. SafetyRules.Of(database).For(HazardContextBuilder.Build(Work(sheet, facts)))];
        string hash = Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(yaml.ReplaceLineEndings("\n"))));
        return new CampaignPlan
        {
            Sheet = sheet,
            Kind = facts.Kind,
            Judgement = judgement,
            Headline = Headline(judgement),
            SetPoints = [.. SetPointFinder.Of(facts, database)],
            Product = [.. Product(facts)],
            Consumption = [.. ConsumptionReckoner.Of(facts, database)],
            Linings = facts.Linings,
            Alternatives = [.. Alternatives(facts)],
            Traps = [.. traps],
            Oxygen = OxygenBalancing.Of(facts),
            Sensitivity = sensitivity,
            NextMeasurement = SensitivityFinder.Next(sensitivity, judgement),
            Hazards = [.. hazards],
            Assumptions = [.. Assumptions(sheet, facts)],
            Notes = [.. judgement.Notes, .. Missing(sheet, facts)],
            Ask = [.. judgement.Ask.Distinct()],
            Sources = Sources(sheet, facts, database),
            Charts = [.. Charts(sheet, facts)],
            DatabaseHash = database.Hash,
            SheetHash = hash,
            Version = version,
            Date = date ?? sheet.Document.Date,
            Facts = facts,
        };
    }

    /// <summary>Some traps rule the verdict: a wet or unmeasured metal charge, copper with oxygen, a hydride former in hydrogen.</summary>
    private static Judgement WithTraps(Judgement own, TrapFinding[] traps, CampaignFacts facts)
    {
        if (traps.FirstOrDefault(trap => trap.Id == "moisture-in-batch") is { } wet)
        {
            bool unknown = facts.Sheet.Charge.All(item => item.Moisture is null or <= 0.001);
            return unknown
                ? own with { Verdict = own.Verdict == JobVerdict.DoesNotWork ? own.Verdict : JobVerdict.NotDecidable, Condition = own.Verdict == JobVerdict.DoesNotWork ? own.Condition : "the moisture of the charge", Reason = own.Verdict == JobVerdict.DoesNotWork ? own.Reason : wet.Text + "; apart from that: " + own.Reason, Ask = own.Ask.Add("what is the loss on drying of each substance charged?") }
                : own with { Verdict = JobVerdict.DoesNotWork, Reason = wet.Text };
        }

        if (traps.FirstOrDefault(trap => trap.Id is "copper-with-oxygen" or "hydride-former") is { } grave)
        {
            return own with { Verdict = JobVerdict.DoesNotWork, Condition = "", Reason = grave.Text };
        }

        return own;
    }

    private static string Headline(Judgement judgement) => judgement.Verdict switch
    {
        JobVerdict.Works => $"Works: {judgement.Reason}.",
        JobVerdict.WorksIf => $"Works if {judgement.Condition}: {judgement.Reason}.",
        JobVerdict.DoesNotWork => $"Does not work: {judgement.Reason}.",
        _ => $"Not decidable: measure {judgement.Condition} next. {Capital(judgement.Reason)}.",
    };

    private static string Capital(string text) => text.Length > 0 ? char.ToUpperInvariant(text[0]) + text[1..] : text;

    private static IEnumerable<ProductCheck> Product(CampaignFacts facts)
    {
        ProductSheet? product = facts.Sheet.Product;
        if (facts.Planned is { } row)
        {
            string carbonLimit = product?.CarbonAtMost is { } most ? $"C at most {Printed.Brief(most)} %" : "no limit given";
            if (row.Carbide is { } carbide)
            {
                yield return carbide.MetalMargin < 0
                    ? new ProductCheck("carbide", carbonLimit, $"{carbide.First}, then {carbide.Last}: carbide, not metal", product?.CarbonAtMost is null ? "borderline" : "fails")
                    : new ProductCheck("carbide", carbonLimit, $"metal is stable beside {carbide.Last}; dissolved carbon is not known without activities", "not-decidable");
            }

            foreach (SideProduct side in row.SideProducts)
            {
                yield return new ProductCheck(side.Kind, "-", side.Text, side.Kind == "nitride" && product?.NitrogenAtMost is not null ? "fails" : "told");
            }

            if (row.FurthestProduct is { } oxide && row.Reductant.Kind is not (ReductantKind.Graphite or ReductantKind.Gas))
            {
                yield return new ProductCheck("what the reductant leaves", product?.ResidualOxideAtMost is { } residue ? $"residual oxide at most {Printed.Brief(residue)} %" : "-", $"{oxide}: to be fluxed or leached; what of {row.Reductant.Id} dissolves in the metal is not known without activities", "told");
            }
        }

        if (facts.Utilisation is { } used)
        {
            bool done = used.Steps.All(step => step.Made <= step.Balance);
            yield return new ProductCheck("residual oxide", product?.ResidualOxideAtMost is { } most2 ? $"at most {Printed.Brief(most2)} %" : product?.OxygenAtMost is { } oxygen ? $"O at most {Printed.Brief(oxygen)} %" : "-", done ? "the balance leaves none; what stays is a matter of time and bed" : $"{used.Steps.First(step => step.Made > step.Balance).Couple.Split('/')[^1]} stays", done ? "not-decidable" : "fails");
        }

        foreach (MetalInGas metal in facts.SoakGas.Take(1).SelectMany(point => point.Metals))
        {
            PartsSheet parts = facts.Sheet.Parts!;
            string symbol = metal.Element.Symbol;
            string found = GasReckoning.Word(metal.Verdict) + (metal.Oxide is null ? "" : $" (against {metal.Oxide})");
            bool oxidises = metal.Verdict == BrightVerdict.Oxidises;
            string verdict = metal.Verdict is BrightVerdict.Borderline or BrightVerdict.NotDecidable ? GasReckoning.Word(metal.Verdict) : oxidises ? "fails" : "meets";
            yield return parts.KeepOxidised.Contains(symbol)
                ? new ProductCheck(symbol + " surface", "stays oxidised", found, oxidises ? "meets" : "fails")
                : parts.KeepBright.IsEmpty || parts.KeepBright.Contains(symbol)
                    ? new ProductCheck(symbol + " surface", "bright", found, verdict)
                    : new ProductCheck(symbol + " surface", "not asked", found, "told");
        }

        if (facts.SoakGas.FirstOrDefault()?.Steel is { Carbon: { } carbon } steel)
        {
            string limit = facts.Sheet.Parts!.CarbonBand is { } band ? $"{Printed.Fixed(band.Low, 2)} to {Printed.Fixed(band.High, 2)} % C" : "as the steel";
            bool inside = facts.Sheet.Parts.CarbonBand is not { } own || (carbon >= own.Low && carbon <= own.High);
            yield return new ProductCheck("surface carbon", limit, $"{Printed.Fixed(carbon, 2)} ± {Printed.Fixed(steel.Uncertainty!.Value, 2)} % C as set", inside ? "meets" : "fails");
        }
    }

    private static IEnumerable<Alternative> Alternatives(CampaignFacts facts)
    {
        if (facts.Ranking is not { } ranking || facts.Kind != CampaignKind.SolidReduction)
        {
            return [];
        }

        double? Price(string name) => facts.Sheet.Reductants.FirstOrDefault(offer => offer.Name == name)?.PricePerKilogram;
        return ranking.Rows.Select(row =>
        {
            bool carbide = row.Carbide is { MetalMargin: < 0 };
            JobVerdict job = carbide ? JobVerdict.DoesNotWork : row.Job;
            string reason = carbide ? $"carbide, not metal{(row.Carbide!.MetalFloorKelvin is { } from ? $": metal only from {Printed.Fixed(from - 273.15, 0)} C" : "")}" : row.Reason;
            return new Alternative(row.Reductant.Id, CampaignJudge.Word(job), reason, row.Margin / 1000, row.ExpandedUncertainty / 1000, row.KgPerKgMetal, row.KgPerKgMetal * Price(row.Reductant.Id), ReferenceEquals(row, facts.Planned));
        }).OrderBy(row => row.Verdict switch { "works" => 0, "works-if" => 1, "not-decidable" => 2, _ => 3 }).ThenBy(row => row.CostPerKilogramMetal ?? double.PositiveInfinity).ThenByDescending(row => row.Margin);
    }

    private static HazardWork Work(CampaignSheet sheet, CampaignFacts facts)
    {
        GasMixture? gas = facts.SoakGas.FirstOrDefault()?.Answer.Mixture;
        List<string> tags = [];
        if (sheet.Programme.Any(stage => stage.Kind == "cool"))
        {
            tags.Add(HazardTags.Cooling);
        }

        if (sheet.Furnace.Lining.Length > 0)
        {
            tags.Add(HazardTags.LiningWork);
        }

        if (sheet.Charge.Any(item => item.Moisture is null) && !sheet.Reductants.IsEmpty)
        {
            tags.Add(HazardTags.MoistureUnknown);
        }

        return new HazardWork
        {
            Charge = [.. sheet.Charge.Select(item => item.Substance.Id), .. sheet.Furnace.Crucible is { } crucible ? [crucible] : Array.Empty<string>()],
            Reductants = [.. sheet.Reductants.Select(offer => offer.Name), .. facts.Utilisation is { } used ? [used.Reducing] : Array.Empty<string>()],
            Products = [.. sheet.Product is { } product ? [product.Metal, product.Metal + "(g)"] : Array.Empty<string>(), .. facts.Planned?.SideProducts.Select(side => side.Formula) ?? [], .. facts.SoakGas.Take(1).SelectMany(point => point.Metals).Select(metal => metal.Element.Symbol)],
            Gases = gas is null ? [] : [.. Enum.GetValues<GasSpecies>().Where(species => gas[species] > 1e-3).Select(species => species.ToString())],
            LowestKelvin = sheet.Programme.Min(stage => stage.At.Kelvin),
            HighestKelvin = sheet.Programme.Max(stage => stage.At.Kelvin),
            Vacuum = sheet.SoakPressure.Bar < 0.1,
            Tags = tags,
        };
    }

    private static IEnumerable<string> Assumptions(CampaignSheet sheet, CampaignFacts facts)
    {
        yield return $"soak {sheet.Soak!.At} ({Printed.Fixed(sheet.Soak.At.Kelvin, 2)} K), total pressure {sheet.SoakPressure}";
        foreach (GasPoint point in facts.SoakGas)
        {
            yield return $"gas at the soak{(point.Meaning.Length > 0 ? " (" + point.Meaning + ")" : "")}: {point.Answer.Mixture.Describe()}";
        }

        if (sheet.Parts?.Alloy is { } alloy && alloy.Contains('%', StringComparison.Ordinal))
        {
            yield return sheet.Parts.Coefficients is null ? "activities of the alloy are its mole fractions (no coefficients given): real solutions differ" : "activities are mole fractions times the coefficients given";
        }

        foreach (ChargeItem item in sheet.Charge.Where(item => item.Activity is not null))
        {
            yield return $"activity of {item.Substance.Id} {Printed.Brief(item.Activity!.Value)}";
        }

        if (facts.Kind is CampaignKind.SolidReduction)
        {
            foreach (string assumption in facts.Ranking?.Assumptions ?? [])
            {
                yield return assumption;
            }
        }

        if (facts.Kind == CampaignKind.GasReduction)
        {
            yield return "gas and charge in counter-current: the gas meets the metal first; each step held against the balance at the temperature of its stage";
        }

        if (facts.Kind == CampaignKind.Retort)
        {
            yield return $"{sheet.Product!.Metal} leaves as vapour; condensed phases pure; silicides have no data";
        }

        yield return "equilibrium, not rate; uncertainties are expanded (k = 2)";
    }

    private static IEnumerable<string> Missing(CampaignSheet sheet, CampaignFacts facts)
    {
        if (sheet.Furnace.Lining.IsEmpty && sheet.Furnace.Crucible is null)
        {
            yield return "no lining and no crucible given: nothing is checked against them";
        }

        if (sheet.Reductants.Any(offer => offer.Name is "Si" or "FeSi75" or "SiC"))
        {
            yield return "silicides have no data: silicon taken up by the metal is not counted";
        }

        if (facts.Linings.Any(check => check.Verdict == "no data"))
        {
            yield return $"no data for {string.Join(", ", facts.Linings.Where(check => check.Verdict == "no data").Select(check => check.Material).Distinct())}: judge it by its maker's word";
        }
    }

    private static ImmutableArray<string> Sources(CampaignSheet sheet, CampaignFacts facts, SubstanceDatabase database)
    {
        HashSet<string> keys = [];
        IEnumerable<Substance> used = sheet.Charge.Select(item => item.Substance)
            .Concat(Always.Select(database.Get))
            .Concat(facts.SoakGas.Take(1).SelectMany(point => point.Metals).SelectMany(metal => database.OxidesOf(metal.Element.Symbol)));
        foreach (Substance substance in used)
        {
            keys.UnionWith(substance.Phases.Select(phase => phase.SourceKey));
            if (substance.Uncertainty.SourceKey is { } key)
            {
                keys.Add(key);
            }
        }

        return [.. keys.Order(StringComparer.Ordinal).Select(key => database.Sources[key].Text).Concat(facts.Ranking?.Sources ?? []).Distinct()];
    }

    private static IEnumerable<(string File, ImmutableArray<(string Key, string Text)> Settings)> Charts(CampaignSheet sheet, CampaignFacts facts)
    {
        string window = $"{Exact(sheet.Programme.Where(stage => stage.Kind is "soak" or "heat").Select(stage => stage.At.Celsius).DefaultIfEmpty(sheet.Soak!.At.Celsius - 30).Min())}C..{Exact(sheet.Soak!.At.Celsius + 1)}C";
        string range = $"25C..{Exact(Math.Max(1400, sheet.Soak.At.Celsius + 300))}C";
        if (facts.Kind is CampaignKind.SolidReduction or CampaignKind.Retort or CampaignKind.GasReduction)
        {
            string of = string.Join(",", sheet.Oxides.SelectMany(item => item.Substance.Formula.Atoms.Keys).Where(element => element != "O").Distinct());
            string with = facts.Kind == CampaignKind.GasReduction ? facts.Utilisation?.Reducing ?? "H2" : string.Join(",", sheet.Reductants.Select(offer => offer.Name).Distinct().Take(6));
            yield return ("stability", [("of", of), ("with", with), ("range", range), ("window", window), ("title", sheet.Title + ": stability")]);
        }

        if (facts.Kind is CampaignKind.Parts or CampaignKind.Melt && sheet.Parts?.Alloy is { } alloy)
        {
            string of = string.Join(",", alloy.Split(',').Select(part => part.Trim().Split('=')[0].Split(' ')[0]).Where(name => AtomicWeights.Has(name) && name is not ("C" or "N")).Distinct());
            yield return ("stability", [("of", of), ("range", range), ("window", window), ("title", sheet.Title + ": stability of the parts"), .. facts.SoakGas.IsEmpty ? Array.Empty<(string, string)>() : [("with", "H2"), ("gas-ratio", Exact(Math.Max(1e-6, facts.SoakGas[0].Answer.AsAnalysed is { } gas && double.IsFinite(gas.NaturalLogPressure(GasSpecies.H2) - gas.NaturalLogPressure(GasSpecies.H2O)) ? Math.Round(Math.Exp(gas.NaturalLogPressure(GasSpecies.H2) - gas.NaturalLogPressure(GasSpecies.H2O)), 2) : 100)))]]);
        }

        if (facts.Kind == CampaignKind.Parts && sheet.Parts?.Alloy is null && !facts.SoakGas.IsEmpty)
        {
            GasState gas = facts.SoakGas[0].Answer.AsAnalysed;
            double ratio = gas.NaturalLogPressure(GasSpecies.CO) - gas.NaturalLogPressure(GasSpecies.CO2);
            yield return ("stability", [("of", "Fe,Cr,Mn,Si"), ("range", range), ("window", window), ("title", sheet.Title + ": the gas against the metals of the steel"), .. double.IsFinite(ratio) ? [("with", "CO"), ("gas-ratio", Exact(Math.Exp(ratio)))] : Array.Empty<(string, string)>()]);
        }

        if (facts.Kind == CampaignKind.SolidReduction && facts.Ranking is not null)
        {
            yield return ("margins", [("kind", "margins"), ("of", sheet.Oxides.First().Substance.Id), ("with", string.Join(",", sheet.Reductants.Select(offer => offer.Name).Distinct())), ("at", Exact(sheet.Soak.At.Celsius) + "C"), ("title", sheet.Title + ": margins at the soak")]);
        }
    }

    private static string Exact(double value) => Math.Round(value, 2).ToString(CultureInfo.InvariantCulture);
}
