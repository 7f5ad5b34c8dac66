using System.Collections.Immutable;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Campaigns;

/// <summary>Holds lining, crucible and fixtures against what touches them, by reaction equilibrium at soak temperature and pressure.</summary>
internal sealed class LiningChecker(SubstanceDatabase database)
{
    /// <summary>Trade names of linings, with the oxides they stand for here; a mixture is judged by its weakest.</summary>
    private static readonly Dictionary<string, string[]> TradeNames = new(StringComparer.OrdinalIgnoreCase)
    {
        ["alumina"] = ["Al2O3"],
        ["magnesia"] = ["MgO"],
        ["silica"] = ["SiO2"],
        ["zirconia"] = ["ZrO2"],
        ["lime"] = ["CaO"],
        ["yttria"] = ["Y2O3"],
        ["chromia"] = ["Cr2O3"],
        ["mullite"] = ["SiO2", "Al2O3"],
        ["fireclay"] = ["SiO2", "Al2O3"],
        ["alumina-silica"] = ["SiO2", "Al2O3"],
        ["spinel"] = ["MgAl2O4"],
        ["graphite"] = ["C"],
        ["dolime"] = ["MgO", "CaO"],
        ["silicon-carbide"] = ["SiC"],
    };

    public ImmutableArray<LiningCheck> Check(CampaignSheet sheet, GasPoint? gas)
    {
        List<LiningCheck> checks = [];
        foreach ((string name, string use) in sheet.Furnace.Lining.Select(lining => (lining, "lining")).Concat(sheet.Furnace.Crucible is { } crucible ? [(crucible, "crucible")] : []).Concat(sheet.Furnace.Fixtures.Select(fixture => (fixture, "fixture"))))
        {
            foreach (string material in TradeNames.GetValueOrDefault(name, [name]))
            {
                checks.AddRange(Material(material, name, use, sheet, gas));
            }
        }

        return [.. checks];
    }

    private IEnumerable<LiningCheck> Material(string formula, string name, string use, CampaignSheet sheet, GasPoint? gas)
    {
        string shown = formula == name ? formula : $"{formula} of {name}";
        if (AtomicWeights.Has(formula) && formula != "C")
        {
            return Metal(formula, shown, use, gas);
        }

        if (database.TryGet(formula) is not { } substance)
        {
            return [new LiningCheck(shown, use, "-", "", null, null, "no data")];
        }

        if (formula == "C")
        {
            return Graphite(shown, use, sheet);
        }

        if (substance.Formula.Of("O") <= 0)
        {
            return [new LiningCheck(shown, use, "-", "", null, null, "no data")];
        }

        return Oxide(substance, shown, use, sheet, gas);
    }

    /// <summary>What could take the oxygen out of an oxide: the reductants, the metals of melt and product, the gas.</summary>
    private IEnumerable<LiningCheck> Oxide(Substance oxide, string shown, string use, CampaignSheet sheet, GasPoint? gas)
    {
        StageSheet soak = sheet.Soak!;
        Pressure? total = soak.Pressure ?? sheet.Furnace.Pressure;
        Activities activities = Activities.AllOne;
        HashSet<string> against = [.. sheet.Reductants.Select(offer => offer.Name)];
        if (sheet.Product is { } product)
        {
            against.Add(product.Metal);
        }

        if (sheet.Parts?.Alloy is { } text && gas is null)
        {
            Alloy alloy = Alloy.Parse(text, sheet.Parts.Coefficients, database);
            activities = alloy.Activities;
            against.UnionWith(alloy.Elements.Select(element => element.Symbol));
        }

        against.UnionWith(sheet.Charge.Where(item => !item.IsOxide && item.Substance.Formula.Atoms.Count == 1).Select(item => item.Substance.Id));
        if (sheet.Furnace.Crucible is "graphite" or "C" && use != "crucible")
        {
            against.Add("C");
        }

        string[] own = [.. oxide.Formula.Atoms.Keys.Where(element => element != "O")];
        foreach (string reductant in against.Where(name => !own.Contains(name)).Order(StringComparer.Ordinal))
        {
            yield return Pair(oxide, shown, use, reductant, soak.At, total, activities, null);
        }

        if (gas?.Answer.AsAnalysed is { } state && state.Log10Oxygen is not null)
        {
            double hydrogen = state.NaturalLogPressure(GasSpecies.H2) - state.NaturalLogPressure(GasSpecies.H2O);
            if (double.IsFinite(hydrogen))
            {
                yield return Pair(oxide, shown, use, "H2", soak.At, null, Activities.AllOne, Math.Exp(hydrogen));
            }
        }
    }

    private LiningCheck Pair(Substance oxide, string shown, string use, string reductant, Temperature at, Pressure? total, Activities activities, double? ratio)
    {
        try
        {
            ReductantCatalogue.Of(database).Get(reductant);
            RankConditions conditions = new() { Total = total, Activities = activities, GasRatio = ratio ?? RankConditions.UsualGasRatio };
            RankedReductant row = ReductantRanking.Rank(new RankRequest(oxide.Id, null, at, [reductant], conditions, RankOrder.Margin), database)
                .Select(result => result.Rows[0]).OrderByDescending(row => row.Margin ?? double.NegativeInfinity).First();
            string verdict = row.Verdict switch { Verdict.Reduces => "attacked", Verdict.Borderline => "borderline", Verdict.DoesNotReduce => "stands", _ => "no data" };
            return new LiningCheck(shown, use, reductant, row.Reaction ?? "", row.Margin / 1000, row.ExpandedUncertainty / 1000, verdict);
        }
        catch (Exception fault) when (fault is NoAnswerException or RequestException)
        {
            return new LiningCheck(shown, use, reductant, "", null, null, "no data");
        }
    }

    /// <summary>A metal fixture in the gas: does it oxidise.</summary>
    private IEnumerable<LiningCheck> Metal(string symbol, string shown, string use, GasPoint? gas)
    {
        if (gas?.Answer is not { } answer)
        {
            return [new LiningCheck(shown, use, "-", "", null, null, "no data")];
        }

        MetalInGas found = new MetalsInGas(database).Judge(Alloy.Parse(symbol, null, database), answer.AsAnalysed, answer.Mixture).First();
        string verdict = found.Verdict switch { BrightVerdict.Bright => "stands", BrightVerdict.Borderline => "borderline", BrightVerdict.Oxidises => "attacked", _ => "no data" };
        return [new LiningCheck(shown, use, "the gas", found.Reaction ?? "", -found.Margin / 1000, found.Uncertainty / 1000, verdict)];
    }

    /// <summary>Graphite against the oxides and metals it holds: it reduces the one and carburises the other.</summary>
    private IEnumerable<LiningCheck> Graphite(string shown, string use, CampaignSheet sheet)
    {
        StageSheet soak = sheet.Soak!;
        Pressure? total = soak.Pressure ?? sheet.Furnace.Pressure;
        foreach (ChargeItem item in sheet.Oxides)
        {
            LiningCheck pair = Pair(item.Substance, item.Substance.Id, use, "C", soak.At, total, Activities.AllOne, null);
            yield return pair with { Material = shown, Against = item.Substance.Id };
        }
    }
}
