using System.Collections.Immutable;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Charges;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Campaigns;

/// <summary>Judges a campaign: the verdict, the ruling reason, every stage. A pure function of sheet and database, quick enough to be asked again for each input that is moved.</summary>
internal sealed class CampaignJudge(SubstanceDatabase database)
{

    private readonly GasEquilibrium _equilibrium = new(database);
    private readonly GasReactions _reactions = new(database);
    private readonly MetalsInGas _metals = new(database);
    private readonly LiningChecker _linings = new(database);

    public static CampaignKind KindOf(CampaignSheet sheet)
    {
        bool oxides = sheet.Oxides.Any();
        bool gas = sheet.Gas is not null || sheet.Programme.Any(stage => stage.Gas is not null);
        if (!oxides)
        {
            return sheet.Furnace.Crucible is not null && !gas ? CampaignKind.Melt : CampaignKind.Parts;
        }

        if (sheet.Reductants.IsEmpty && gas)
        {
            return CampaignKind.GasReduction;
        }

        bool vacuum = sheet.SoakPressure.Bar < 0.5;
        return vacuum && sheet.Product is { } product && IsVolatile(product.Metal) && !sheet.Reductants.IsEmpty ? CampaignKind.Retort : CampaignKind.SolidReduction;
    }

    public CampaignFacts Judge(CampaignSheet sheet) => KindOf(sheet) switch
    {
        CampaignKind.Parts => Parts(sheet),
        CampaignKind.GasReduction => GasReduction(sheet),
        CampaignKind.Retort => Retort(sheet),
        CampaignKind.Melt => Melt(sheet),
        _ => SolidReduction(sheet),
    };

    private static bool IsVolatile(string metal) => metal is "Mg" or "Ca" or "Zn" or "Na" or "K" or "Li" or "Rb" or "Cs" or "Cd" or "Sr" or "Ba";

    private StageGas? GasOf(CampaignSheet sheet, StageSheet stage, Pressure total)
        => stage.Gas is { } text ? StageGas.Parse(text, database, total) : StageGas.Of(sheet.Gas, database, total);

    private static Pressure PressureOf(CampaignSheet sheet, StageSheet stage) => stage.Pressure ?? sheet.Furnace.Pressure ?? Pressure.FromBar(PhysicalConstants.AtmosphereInBar);

    private CampaignFacts Parts(CampaignSheet sheet)
    {
        PartsSheet parts = sheet.Parts ?? throw new NoAnswerException("the charge holds no oxide and there are no parts: nothing to judge");
        Alloy? alloy = parts.Alloy is { } text ? Alloy.Parse(text, parts.Coefficients, database) : null;
        SteelComposition? steel = parts.Steel is { } written ? SteelComposition.Parse(written) : null;
        List<StageJudgement> stages = [];
        List<GasPoint> soakGas = [];
        ImmutableArray<CarbonRange> soot = [];
        List<string> ask = [];
        StageSheet soak = sheet.Soak!;
        foreach (StageSheet stage in sheet.Programme)
        {
            Pressure total = PressureOf(sheet, stage);
            if (GasOf(sheet, stage, total) is not { } gas)
            {
                stages.Add(new StageJudgement(stage, total, "no gas given", "not-decidable", null, null, "kJ/mol O2", "no gas is given for this stage"));
                continue;
            }

            GasPoint[] points = [.. gas.Mixtures(soak.At, _reactions).Select(pair => Point(pair.Meaning, pair.Mixture, stage.At, total, alloy, steel))];
            if (ReferenceEquals(stage, soak))
            {
                soakGas.AddRange(points);
                ask.AddRange(gas.Analysis.Ask);
                soot = points[0].Answer.Mixture[GasSpecies.CO] > 0 ? SootOnCooling.Ranges(points[0].Answer.Mixture, total, _equilibrium, GasEquilibrium.LowestKelvin, Math.Max(1473.15, stage.At.Kelvin)) : [];
            }

            stages.Add(PartsStage(sheet, stage, total, gas, points, alloy, steel, parts));
        }

        Judgement judgement = PartsVerdict(sheet, stages, soakGas, parts, alloy, steel, soot) with { Ask = [.. ask] };
        return new CampaignFacts { Sheet = sheet, Kind = CampaignKind.Parts, Judgement = judgement, SoakGas = [.. soakGas], Soot = soot, Linings = _linings.Check(sheet, soakGas.FirstOrDefault()) };
    }

    private GasPoint Point(string meaning, GasMixture mixture, Temperature at, Pressure total, Alloy? alloy, SteelComposition? steel)
    {
        GasAnswer answer = _equilibrium.Of(mixture, at, total);
        GasState gas = answer.AsAnalysed;
        OxygenProbe probe = new(at);
        double water = gas.NaturalLogPressure(GasSpecies.H2O);
        return new GasPoint(
            meaning,
            at,
            answer,
            double.IsNegativeInfinity(water) ? null : WaterContent.OfPressure(Math.Min(water, total.NaturalLogBar), total),
            gas.NaturalLogOxygen is { } oxygen ? probe.Millivolts(oxygen) : null,
            alloy is null ? [] : _metals.Judge(alloy, gas, mixture),
            steel is null ? null : SteelInGas.Of(steel, gas, _reactions, probe));
    }

    private static IEnumerable<MetalInGas> ToStayBright(GasPoint point, PartsSheet parts)
        => point.Metals.Where(metal => parts.KeepBright.IsEmpty ? !parts.KeepOxidised.Contains(metal.Element.Symbol) : parts.KeepBright.Contains(metal.Element.Symbol));

    private static StageJudgement PartsStage(CampaignSheet sheet, StageSheet stage, Pressure total, StageGas gas, GasPoint[] points, Alloy? alloy, SteelComposition? steel, PartsSheet parts)
    {
        string text = points[0].Answer.Mixture.Describe();
        if (alloy is not null && points[0].Metals.Length > 0)
        {
            MetalInGas[] bright = [.. ToStayBright(points[0], parts)];
            string[] verdicts = [.. points.Select(point => GasReckoning.Word(GasReckoning.Verdict([.. ToStayBright(point, parts)]))).Distinct()];
            MetalInGas worst = bright.Length > 0 ? bright[0] : points[0].Metals[0];
            if (verdicts.Length > 1)
            {
                return new StageJudgement(stage, total, text, "not-decidable", worst.Margin / 1000, worst.Uncertainty / 1000, "kJ/mol O2", $"{worst.Element.Symbol} is {string.Join(" or ", verdicts)}, according to the meaning of the moisture reading");
            }

            string words = $"{worst.Element.Symbol}{(worst.Oxide is null ? "" : " against " + worst.Oxide)} rules"
                + (worst.LimitWater is { } limit ? $"; it needs a frost point below {Frost(limit)}" : "")
                + (points[0].Answer.AsAnalysed.CarbonActivity > 1 ? $"; carbon activity {Printed.Brief(points[0].Answer.AsAnalysed.CarbonActivity!.Value)}: soot" : "");
            return new StageJudgement(stage, total, text, verdicts[0], worst.Margin / 1000, worst.Uncertainty / 1000, "kJ/mol O2", words);
        }

        double? activity = points[0].Answer.AsAnalysed.CarbonActivity;
        if (steel is not null && points[0].Steel is { Carbon: { } carbon } found)
        {
            (double low, double high) = Band(parts, steel);
            string verdict = carbon >= low && carbon <= high ? "works" : carbon + found.Uncertainty >= low && carbon - found.Uncertainty <= high ? "borderline" : "does-not-work";
            return new StageJudgement(stage, total, text, verdict, carbon - steel.Carbon, found.Uncertainty, "% C", $"the gas brings the steel to {Printed.Fixed(carbon, 2)} % C");
        }

        return activity > 1
            ? new StageJudgement(stage, total, text, "soots", null, null, "", $"carbon activity {Printed.Brief(activity.Value)} as analysed, {Printed.Brief(points[0].Answer.Homogeneous.CarbonActivity ?? 0)} at equilibrium: the gas deposits soot here and attacks brick and alloy")
            : new StageJudgement(stage, total, text, "works", null, null, "", points[0].Steel?.Reason ?? "no limit here");
    }

    private static (double Low, double High) Band(PartsSheet parts, SteelComposition steel)
        => parts.CarbonBand ?? ((steel.Carbon ?? 0) * 0.95, (steel.Carbon ?? 0) * 1.05);

    private static Judgement PartsVerdict(CampaignSheet sheet, List<StageJudgement> stages, List<GasPoint> soakGas, PartsSheet parts, Alloy? alloy, SteelComposition? steel, ImmutableArray<CarbonRange> soot)
    {
        StageJudgement soak = stages.First(stage => ReferenceEquals(stage.Stage, sheet.Soak));
        if (soakGas.Count == 0)
        {
            return new Judgement(JobVerdict.NotDecidable, "the furnace gas", "no gas is given for the soak", null, null, "", [.. stages]);
        }

        List<string> conditions = [];
        List<string> reasons = [];
        JobVerdict verdict = JobVerdict.Works;
        (double? Margin, double? Uncertainty, string Unit) ruling = (soak.Margin, soak.Uncertainty, soak.MarginUnit);
        if (alloy is not null)
        {
            MetalInGas[] bright = [.. ToStayBright(soakGas[0], parts)];
            MetalInGas[] oxidised = [.. bright.Where(metal => metal.Verdict == BrightVerdict.Oxidises)];
            MetalInGas? worst = bright.FirstOrDefault();
            if (soak.Verdict == "not-decidable")
            {
                return new Judgement(JobVerdict.NotDecidable, "scale and place of the moisture reading", soak.Text, soak.Margin, soak.Uncertainty, soak.MarginUnit, [.. stages]);
            }

            if (oxidised.Length > 0)
            {
                string names = string.Join(", ", oxidised.Select(metal => metal.Element.Symbol));
                string limit = worst!.LimitWater is { } water ? $"{worst.Element.Symbol} needs a frost point below {Frost(water)} at {soak.Stage.At}" : $"{worst.Element.Symbol} needs log10 pO2 below {Printed.Fixed(worst.LimitLogOxygen!.Value / Math.Log(10), 1)} bar";
                reasons.Add($"{names} of the alloy oxidises at the soak: {limit}");
                verdict = steel is not null ? JobVerdict.WorksIf : JobVerdict.DoesNotWork;
                if (steel is not null)
                {
                    conditions.Add("the alloy parts go to a line that can keep them bright");
                }
            }
            else if (bright.Any(metal => metal.Verdict == BrightVerdict.Borderline))
            {
                verdict = JobVerdict.WorksIf;
                conditions.Add($"the gas is made drier: the margin of {worst!.Element.Symbol} is smaller than its uncertainty");
                reasons.Add($"{worst.Element.Symbol} is borderline at the soak");
            }
            else if (worst is not null)
            {
                MetalInGas first = bright.Where(metal => metal.OxidisesBelowKelvin is not null).MaxBy(metal => metal.OxidisesBelowKelvin) ?? worst;
                reasons.Add($"{worst.Element.Symbol} stays bright at the soak with {Printed.Fixed(worst.Margin!.Value / 1000, 0)} ± {Printed.Fixed(worst.Uncertainty!.Value / 1000, 0)} kJ/mol O2 in hand");
                if (first.OxidisesBelowKelvin is { } below && below > FilmKelvin)
                {
                    verdict = JobVerdict.WorksIf;
                    conditions.Add($"the parts pass quickly from {Degrees(below)} down to 400 C: below {Degrees(below)} this gas oxidises {first.Element.Symbol}");
                }
            }
        }

        if (steel is not null && soakGas[0].Steel is { } carbon)
        {
            if (carbon.Carbon is not { } found)
            {
                return new Judgement(JobVerdict.NotDecidable, "a gas that fixes the carbon", carbon.Reason ?? "no carbon answer", null, null, "% C", [.. stages]);
            }

            (double low, double high) = Band(parts, steel);
            ruling = alloy is null || verdict == JobVerdict.Works || conditions.Count == 0 ? (found - steel.Carbon, carbon.Uncertainty, "% C") : ruling;
            if (found < low || found > high)
            {
                verdict = verdict == JobVerdict.DoesNotWork ? verdict : JobVerdict.WorksIf;
                string set = carbon.Neutral is { } neutral
                    ? $"the gas is re-set to {(neutral.Water?.DewPointKelvin is { } dew ? "dew point " + Degrees(dew) + ", " : "")}{Printed.Fixed(neutral.DioxideShare * 100, 2)} % CO2, {Printed.Fixed(neutral.ProbeMillivolts, 0)} mV"
                    : "a gas with CO is used";
                conditions.Insert(0, set);
                reasons.Insert(0, $"as set the gas {(found > high ? "carburises" : "decarburises")}: it brings the steel to {Printed.Fixed(found, 2)} ± {Printed.Fixed(carbon.Uncertainty!.Value, 2)} % C");
            }
            else
            {
                reasons.Insert(0, $"the gas holds the steel at {Printed.Fixed(found, 2)} ± {Printed.Fixed(carbon.Uncertainty!.Value, 2)} % C");
            }
        }

        foreach (StageJudgement stage in stages.Where(stage => stage.Verdict == "soots" && !ReferenceEquals(stage, soak)))
        {
            verdict = verdict == JobVerdict.Works ? JobVerdict.WorksIf : verdict;
            conditions.Add($"the {stage.Stage.Kind} at {stage.Stage.At} is run on nitrogen: this gas soots there");
        }

        foreach (StageJudgement stage in stages.Where(stage => stage.Verdict is "oxidises" or "not-decidable" && stage.Stage.Kind is "heat" && alloy is not null && verdict == JobVerdict.Works))
        {
            // Heating up through an oxidising range costs a film that the soak takes off again while it stays bright.
            conditions.Add($"the film grown while heating ({stage.Stage.At}) is given time to reduce at the soak");
            verdict = JobVerdict.WorksIf;
        }

        return new Judgement(verdict, string.Join("; and ", conditions), string.Join("; ", reasons), ruling.Margin, ruling.Uncertainty, ruling.Unit, [.. stages]);
    }

    /// <summary>Below this a film grows too slowly to be seen in the minutes of a cooling zone: common practice, no source.</summary>
    private const double FilmKelvin = 673.15;

    private static string Frost(WaterContent water) => water.FrostPointKelvin is { } frost ? Degrees(frost) : water.DewPointKelvin is { } dew ? "dew point " + Degrees(dew) : Printed.Brief(water.Ppm) + " ppm";

    private static string Degrees(double kelvin) => Printed.Fixed(kelvin - PhysicalConstants.ZeroCelsiusInKelvin, 0) + " C";

    private CampaignFacts GasReduction(CampaignSheet sheet)
    {
        StageSheet soak = sheet.Soak!;
        ChargeItem item = sheet.Oxides.First();
        Pressure total = PressureOf(sheet, soak);
        StageGas? gas = GasOf(sheet, soak, total);
        string metal = sheet.Product?.Metal ?? item.Substance.Formula.Atoms.Keys.First(element => element != "O");
        List<StageJudgement> stages = [];
        if (gas is null)
        {
            return Undecided(sheet, CampaignKind.GasReduction, "the furnace gas", "no gas is given for the soak");
        }

        GasMixture mixture = gas.Mixtures(soak.At, _reactions).First().Mixture;
        ImmutableArray<GasPoint> points = [.. gas.Mixtures(soak.At, _reactions).Select(pair => Point(pair.Meaning, pair.Mixture, soak.At, total, null, null))];
        RankResult? ranking = Ranked(item, metal, sheet, mixture[GasSpecies.H2] >= mixture[GasSpecies.CO] ? ["H2"] : ["CO"], soak.At, null);
        if (item.KilogramsPerHour is not { } rate || sheet.Gas?.FlowNormalCubicMetres is not { } flow)
        {
            return Undecided(sheet, CampaignKind.GasReduction, "charge rate and gas flow", "a gas reduction is judged by the share of the gas that can be used: give the rate of the charge (kg/h) and the flow of the gas (Nm3/h)") with { SoakGas = points, Ranking = ranking };
        }

        Activities activities = ActivitiesOf(sheet);
        GasUtilisation? main = null;
        foreach (StageSheet stage in sheet.Programme)
        {
            Pressure here = PressureOf(sheet, stage);
            StageGas? own = GasOf(sheet, stage, here);
            if (stage.Kind is not ("soak" or "heat") || own is null)
            {
                string words = own is null ? "no gas given" : "no reduction asked of this stage";
                stages.Add(new StageJudgement(stage, here, own?.Text ?? "-", "works", null, null, "", words));
                continue;
            }

            try
            {
                GasUtilisation used = GasUtilisation.Of(item.Substance, metal, rate * item.Purity, own.Mixtures(stage.At, _reactions).First().Mixture, flow, stage.At.Kelvin, activities, database);
                UtilisationStep ruling = used.Steps.MinBy(step => step.Balance - step.Made)!;
                bool reduces = ReferenceEquals(stage, soak);
                main = reduces ? used : main;
                // A heating zone need not finish the metal step: it is told what it can do.
                string verdict = ruling.Made <= ruling.BalanceLow ? "works" : ruling.Made <= ruling.BalanceHigh ? "borderline" : reduces ? "does-not-work" : "works";
                stages.Add(new StageJudgement(stage, here, own.Text, verdict, 100 * (ruling.Balance - ruling.Made), 100 * (ruling.BalanceHigh - ruling.BalanceLow) / 2, "% of the gas", reduces || ruling.Made <= ruling.Balance
                    ? $"{ruling.Couple}: {Percent(ruling.Made)} oxidised gas of {Percent(ruling.Balance)} the balance allows"
                    : $"{ruling.Couple} does not run in this zone yet ({Percent(ruling.Made)} against {Percent(ruling.Balance)}); the steps before it do"));
            }
            catch (NoAnswerException missing)
            {
                stages.Add(new StageJudgement(stage, here, own.Text, "not-decidable", null, null, "", missing.Message));
            }
        }

        Judgement judgement = main is null
            ? new Judgement(JobVerdict.NotDecidable, "data for the soak", stages.First(stage => ReferenceEquals(stage.Stage, soak)).Text, null, null, "", [.. stages])
            : GasVerdict(main, stages, flow, soak);
        return new CampaignFacts { Sheet = sheet, Kind = CampaignKind.GasReduction, Judgement = judgement with { Ask = [.. gas.Analysis.Ask] }, SoakGas = points, Utilisation = main, Ranking = ranking, Linings = _linings.Check(sheet, points[0]) };
    }

    private static Judgement GasVerdict(GasUtilisation used, List<StageJudgement> stages, double flow, StageSheet soak)
    {
        UtilisationStep ruling = used.Steps.MinBy(step => step.Balance - step.Made)!;
        double multiple = used.ReducingFlow / used.Stoichiometric;
        string made = $"at {Printed.Brief(flow)} Nm3/h the {ruling.Couple} step leaves {Percent(ruling.Made)} oxidised gas where the balance at {soak.At} allows {Percent(ruling.BalanceLow)} to {Percent(ruling.BalanceHigh)}";
        (JobVerdict verdict, string condition) = ruling.Made <= ruling.BalanceLow
            ? (JobVerdict.Works, "")
            : ruling.Made <= ruling.Balance
                ? (JobVerdict.WorksIf, $"the flow is raised well above {Printed.Fixed(used.LeastFlow, 1)} Nm3/h: the margin is smaller than its uncertainty")
                : (JobVerdict.DoesNotWork, "");
        string within = verdict == JobVerdict.DoesNotWork && ruling.Made <= ruling.BalanceHigh ? ", by less than its uncertainty: count on no" : "";
        string stays = verdict == JobVerdict.DoesNotWork ? $"; {ruling.Couple.Split('/')[^1]} stays{within}; the least flow is {Printed.Fixed(used.LeastFlow, 1)} Nm3/h" : "";
        return new Judgement(
            verdict,
            condition,
            $"{made} ({Printed.Fixed(multiple, 1)} times stoichiometric){stays}",
            100 * (ruling.Balance - ruling.Made),
            100 * (ruling.BalanceHigh - ruling.BalanceLow) / 2,
            "% of the gas",
            [.. stages]);
    }

    private static string Percent(double share) => Printed.Fixed(100 * share, 1) + " %";

    private RankResult? Ranked(ChargeItem item, string metal, CampaignSheet sheet, ImmutableArray<string> with, Temperature at, Pressure? total)
    {
        try
        {
            return ReductantRanking.Rank(new RankRequest(item.Substance.Id, item.Substance.Formula.Of(metal) > 0 ? metal : null, at, with, new RankConditions { Total = total, Activities = ActivitiesOf(sheet) }, RankOrder.Margin), database)[0];
        }
        catch (NoAnswerException)
        {
            return null;
        }
    }

    private Activities ActivitiesOf(CampaignSheet sheet)
    {
        Activities activities = Activities.AllOne;
        foreach (ChargeItem item in sheet.Charge.Where(item => item.Activity is not null))
        {
            activities = activities.With(item.Substance, item.Activity!.Value);
        }

        return activities;
    }

    private CampaignFacts SolidReduction(CampaignSheet sheet)
    {
        StageSheet soak = sheet.Soak!;
        ChargeItem item = sheet.Product is { } wanted ? sheet.Oxides.FirstOrDefault(oxide => oxide.Substance.Formula.Of(wanted.Metal) > 0) ?? sheet.Oxides.First() : sheet.Oxides.First();
        string metal = sheet.Product?.Metal ?? item.Substance.Formula.Atoms.Keys.First(element => element != "O");
        Pressure? total = soak.Pressure ?? sheet.Furnace.Pressure;
        ImmutableArray<string> offered = [.. sheet.Reductants.Select(offer => offer.Name).Distinct()];
        if (offered.IsEmpty)
        {
            return Undecided(sheet, CampaignKind.SolidReduction, "the reductant", "no reductant and no reducing gas are given");
        }

        if (item.Substance.Formula.Of(metal) <= 0)
        {
            return Undecided(sheet, CampaignKind.SolidReduction, "the product", $"the wanted metal {metal} is in no oxide of the charge");
        }

        RankResult? ranking = Ranked(item, metal, sheet, offered, soak.At, total);
        if (ranking is null)
        {
            return Undecided(sheet, CampaignKind.SolidReduction, "data", $"{item.Substance.Id} has no data at {soak.At}");
        }

        string planned = (sheet.Reductants.FirstOrDefault(offer => offer.MassKilograms is not null) ?? sheet.Reductants[0]).Name;
        RankedReductant row = ranking.Rows.First(candidate => candidate.Reductant.Id == planned);
        List<StageJudgement> stages = [];
        foreach (StageSheet stage in sheet.Programme)
        {
            Pressure here = PressureOf(sheet, stage);
            RankedReductant? own = stage.Kind is "soak" or "heat" ? Ranked(item, metal, sheet, [planned], stage.At, stage.Pressure ?? sheet.Furnace.Pressure)?.Rows[0] : null;
            stages.Add(own is null
                ? new StageJudgement(stage, here, stage.Gas ?? "-", "works", null, null, "", "no reduction asked of this stage")
                : new StageJudgement(stage, here, stage.Gas ?? "-", ReferenceEquals(stage, soak) ? Word(own.Job) : own.Margin > 0 ? "works" : "works", own.Margin / 1000, own.ExpandedUncertainty / 1000, "kJ/mol O2", own.Margin > 0 ? own.Reason.Length > 0 ? own.Reason : "reduces" : "not reducing yet: " + own.Reason));
        }

        (JobVerdict verdict, string reason) = SolidVerdict(row, sheet, metal);
        Judgement judgement = new(verdict, verdict == JobVerdict.WorksIf ? row.Help ?? row.Reason : "", reason, (row.Carbide is { } carbide ? Math.Min(carbide.MetalMargin, row.Margin ?? 0) : row.Margin) / 1000, row.ExpandedUncertainty / 1000, "kJ/mol O2", [.. stages]);
        return new CampaignFacts { Sheet = sheet, Kind = CampaignKind.SolidReduction, Judgement = judgement, Ranking = ranking, Planned = row, Linings = _linings.Check(sheet, null) };
    }

    /// <summary>The word of a job verdict in outputs.</summary>
    public static string Word(JobVerdict verdict) => verdict switch
    {
        JobVerdict.Works => "works",
        JobVerdict.WorksIf => "works-if",
        JobVerdict.DoesNotWork => "does-not-work",
        _ => "not-decidable",
    };

    private static (JobVerdict Verdict, string Reason) SolidVerdict(RankedReductant row, CampaignSheet sheet, string metal)
    {
        if (row.Verdict == Verdict.NoData)
        {
            return (JobVerdict.NotDecidable, row.Reason);
        }

        if (row.Carbide is { MetalMargin: < 0 } carbide)
        {
            string floor = carbide.MetalFloorKelvin is { } from ? $"{metal} metal only above {Degrees(from)} at this pressure" : "no temperature in the data gives the metal";
            string first = carbide.CarbideFloorKelvin is { } start ? $"{carbide.First} forms from {Degrees(start)}" : $"{carbide.First} forms";
            string limit = sheet.Product?.CarbonAtMost is { } most ? $"; the limit of {Printed.Brief(most)} % C cannot be met" : "";
            return (JobVerdict.DoesNotWork, $"{row.Reductant.Id} gives carbide, not metal: {first}; {floor}{limit}");
        }

        return (row.Job, row.Verdict == Verdict.Reduces
            ? $"{row.Reductant.Id} takes the oxygen off with {Printed.Fixed(row.Margin!.Value / 1000, 0)} ± {Printed.Fixed(row.ExpandedUncertainty!.Value / 1000, 0)} kJ/mol O2 in hand"
            : $"{row.Reductant.Id}: {row.Reason}");
    }

    private CampaignFacts Retort(CampaignSheet sheet)
    {
        StageSheet soak = sheet.Soak!;
        string metal = sheet.Product!.Metal;
        Pressure line = PressureOf(sheet, soak);
        Dictionary<string, double> amounts = [];
        foreach (ChargeItem item in sheet.Charge)
        {
            Add(item.Substance.Formula, item.Amount, item.Purity);
        }

        ReductantCatalogue catalogue = ReductantCatalogue.Of(database);
        List<string> notes = [];
        ReductantOffer planned = sheet.Reductants[0];
        Reductant reductant = catalogue.Get(planned.Name);
        string element = reductant.Metal ?? (reductant.Id == "FeSi75" ? "Si" : reductant.Id);
        double grade = reductant.Id == "FeSi75" ? 0.75 : 1;
        if (sheet.Charge.All(item => item.Amount is null) || planned.MassKilograms is null || !AtomicWeights.Has(element))
        {
            return Undecided(sheet, CampaignKind.Retort, "the masses", "a retort is judged by the charge as a whole: give the mass of every substance and of the reductant");
        }

        amounts[element] = amounts.GetValueOrDefault(element) + (planned.MassKilograms.Value * grade / AtomicWeights.Of(element) * 1000);
        if (reductant.Id == "FeSi75")
        {
            notes.Add("FeSi75: its silicon is taken as free silicon, its iron as inert; silicides have no data here, so the pressure is at most this");
        }

        ImmutableArray<MetalVapourOverCharge> vapour = MetalVapourOverCharge.Along(amounts, metal, soak.At.Kelvin, [0, 0.25, 0.45, 0.55, 0.75, 0.9], database);
        List<StageJudgement> stages = [];
        foreach (StageSheet stage in sheet.Programme)
        {
            Pressure here = PressureOf(sheet, stage);
            ImmutableArray<MetalVapourOverCharge> own = stage.Kind is "soak" or "heat" ? MetalVapourOverCharge.Along(amounts, metal, stage.At.Kelvin, [0], database) : [];
            if (own.IsEmpty)
            {
                stages.Add(new StageJudgement(stage, here, stage.Gas ?? "-", "works", null, null, "", "no reduction asked of this stage"));
                continue;
            }

            double margin = PhysicalConstants.GasConstant * stage.At.Kelvin * (own[0].NaturalLogBar - here.NaturalLogBar) / 1000;
            double uncertain = PhysicalConstants.GasConstant * stage.At.Kelvin * own[0].ExpandedUncertainty / 1000;
            string verdict = margin > uncertain ? "works" : margin > -uncertain ? "borderline" : "does-not-work";
            stages.Add(new StageJudgement(stage, here, stage.Gas ?? "-", ReferenceEquals(stage, soak) ? verdict : "works", margin, uncertain, $"kJ/mol {metal}", $"{metal} vapour {Pressure.FromNaturalLogBar(own[0].NaturalLogBar)} over the fresh charge against a line pressure of {here}"));
        }

        StageJudgement main = stages.First(stage => ReferenceEquals(stage.Stage, soak));
        if (vapour.IsEmpty)
        {
            return Undecided(sheet, CampaignKind.Retort, "data", $"no pressure of {metal} over this charge at {soak.At}");
        }

        string pressure = Pressure.FromNaturalLogBar(vapour[0].NaturalLogBar).ToString();
        MetalVapourOverCharge late = vapour.LastOrDefault(point => point.NaturalLogBar > line.NaturalLogBar) ?? vapour[0];
        MetalVapourOverCharge? stuck = vapour.FirstOrDefault(point => point.NaturalLogBar <= line.NaturalLogBar);
        string within = main.Verdict == "borderline" ? " by less than the uncertainty (count on no)" : "";
        (JobVerdict verdictOfAll, string condition, string reason) = main.Verdict switch
        {
            "does-not-work" or "borderline" when main.Margin < 0 => (JobVerdict.DoesNotWork, "", $"the line stands at {line}, above the {metal} pressure of the charge ({pressure} at {soak.At}){within}: no {metal} comes over; the least vacuum that drives it is below {pressure}"),
            "borderline" => (JobVerdict.WorksIf, $"the line is brought well below {pressure}", $"the line at {line} is within the uncertainty of the {metal} pressure of the charge ({pressure})"),
            _ when stuck is not null && stuck.Drawn < 0.95 => (JobVerdict.WorksIf, $"a yield near {Printed.Fixed(100 * (late.Drawn + stuck.Drawn) / 2, 0)} % is enough", $"{metal} comes over at {pressure} at first; once part is drawn off {string.Join(" and ", stuck.Phases)} hold the rest at {Pressure.FromNaturalLogBar(stuck.NaturalLogBar)}, below what the line at {line} can drive"),
            _ => (JobVerdict.Works, "", $"{metal} vapour stands at {pressure} over the charge at {soak.At}, {Printed.Brief(Math.Exp(vapour[0].NaturalLogBar - line.NaturalLogBar))} times the line pressure of {line}"),
        };
        return new CampaignFacts
        {
            Sheet = sheet,
            Kind = CampaignKind.Retort,
            Judgement = new Judgement(verdictOfAll, condition, reason, main.Margin, main.Uncertainty, main.MarginUnit, [.. stages]) { Notes = [.. notes] },
            Vapour = vapour,
            Linings = _linings.Check(sheet, null),
        };

        void Add(Formula formula, double? kilograms, double purity)
        {
            foreach ((string symbol, double number) in formula.Atoms)
            {
                amounts[symbol] = amounts.GetValueOrDefault(symbol) + ((kilograms ?? 0) * purity / formula.Atoms.Sum(atom => atom.Value * AtomicWeights.Of(atom.Key)) * 1000 * number);
            }
        }
    }

    private CampaignFacts Melt(CampaignSheet sheet)
    {
        ImmutableArray<LiningCheck> checks = _linings.Check(sheet, null);
        StageSheet soak = sheet.Soak!;
        LiningCheck[] crucible = [.. checks.Where(check => check.Use == "crucible")];
        List<string> ask = [];
        if (sheet.Parts?.Alloy is { } text && text.Contains('%', StringComparison.Ordinal) && sheet.Parts.Coefficients is null)
        {
            ask.Add("which activities or activity coefficients have the solutes of the melt at the soak? Mole fractions stand in for them here");
        }

        LiningCheck? worst = crucible.Where(check => check.Margin is not null).MaxBy(check => check.Margin);
        bool unknown = crucible.Any(check => check.Verdict == "no data") && crucible.All(check => check.Margin is null);
        JobVerdict verdict = worst is null || unknown ? JobVerdict.NotDecidable
            : worst.Verdict == "attacked" ? JobVerdict.DoesNotWork
            : worst.Verdict == "borderline" ? JobVerdict.WorksIf
            : JobVerdict.Works;
        string reason = worst is null
            ? $"no data for the crucible {sheet.Furnace.Crucible} at {soak.At}"
            : worst.Verdict switch
            {
                "attacked" => $"{worst.Against} takes oxygen out of the {worst.Material} crucible at {soak.At} and {sheet.SoakPressure}: {worst.Reaction}",
                "borderline" => $"{worst.Against} against {worst.Material} lies within its uncertainty",
                _ => $"nothing in the melt takes oxygen out of {worst.Material}: the nearest is {worst.Against}, {Printed.Fixed(-worst.Margin!.Value, 0)} ± {Printed.Fixed(worst.Uncertainty!.Value, 0)} kJ/mol O2 short",
            };
        StageJudgement[] stages = [.. sheet.Programme.Select(stage => new StageJudgement(stage, PressureOf(sheet, stage), stage.Gas ?? "-", ReferenceEquals(stage, soak) ? worst?.Verdict == "attacked" ? "does-not-work" : Word(verdict) : "works", ReferenceEquals(stage, soak) ? -worst?.Margin : null, ReferenceEquals(stage, soak) ? worst?.Uncertainty : null, "kJ/mol O2", ReferenceEquals(stage, soak) ? reason : "below the soak"))];
        return new CampaignFacts
        {
            Sheet = sheet,
            Kind = CampaignKind.Melt,
            Judgement = new Judgement(verdict, verdict == JobVerdict.WorksIf ? "a trial melt shows no pick-up: the margin is smaller than its uncertainty" : verdict == JobVerdict.NotDecidable ? "activities of the solutes, or a crucible with data" : "", reason, -worst?.Margin, worst?.Uncertainty, "kJ/mol O2", [.. stages]) { Ask = [.. ask] },
            Linings = checks,
        };
    }

    private CampaignFacts Undecided(CampaignSheet sheet, CampaignKind kind, string condition, string reason) => new()
    {
        Sheet = sheet,
        Kind = kind,
        Judgement = new Judgement(JobVerdict.NotDecidable, condition, reason, null, null, "", []) { Ask = [$"{condition}?"] },
        Linings = _linings.Check(sheet, null),
    };
}
