using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>Builds the row of each reductant against one charge at one temperature.</summary>
internal sealed class RowBuilder(OxidePath charge, RankConditions conditions, SubstanceDatabase database, double kelvin)
{
    private readonly GasReactions _gases = new(database);
    private readonly HashSet<Substance> _used = [];
    private SideProductFinder? _finder;

    private SideProductFinder Finder => _finder ??= new(database, _gases, conditions);

    /// <summary>The row of one reductant.</summary>
    public RankedReductant Build(Reductant reductant)
    {
        double[] activities = Activities(reductant);
        RankedReductant row = Judge(reductant, activities[0], out ReductionPair? pair);
        if (activities.Length > 1 && row.Margin is not null && pair is not null)
        {
            RankedReductant spent = Judge(reductant, activities[1], out _);
            row = WithSpent(row, spent, activities);
        }

        return row;
    }

    /// <summary>Citations of everything the rows rest on.</summary>
    public ImmutableArray<string> Sources()
        => [.. _used.SelectMany(substance => substance.Phases.Where(phase => phase.Range.Holds(kelvin)).Select(phase => phase.SourceKey).Append(substance.Uncertainty.SourceKey).OfType<string>())
            .Distinct()
            .Order(StringComparer.Ordinal)
            .Select(key => database.Sources[key].Text)];

    /// <summary>Entries of the user's own folder that the rows rest on.</summary>
    public ImmutableArray<string> OverlayEntries() => [.. _used.Where(substance => substance.IsFromOverlay).Select(substance => substance.Id).Order(StringComparer.Ordinal)];

    private double[] Activities(Reductant reductant)
    {
        if (reductant.Metal is null || conditions.Activities.Has(database.Get(reductant.Metal)))
        {
            return [double.NaN];
        }

        return [.. reductant.JudgedActivities];
    }

    private RankedReductant Judge(Reductant reductant, double activity, out ReductionPair? pair)
    {
        Activities activities = double.IsNaN(activity) || activity == 1
            ? conditions.Activities
            : conditions.Activities.With(database.Get(reductant.Metal!), activity);
        pair = null;
        try
        {
            pair = new ReductionPair(charge, ReductantModel.Of(reductant, database, _gases, conditions, activities), conditions);
            return Row(reductant, pair, pair.At(kelvin));
        }
        catch (NoAnswerException missing)
        {
            return new RankedReductant { Reductant = reductant, Verdict = Verdict.NoData, Job = JobVerdict.NotDecidable, Reason = missing.Message };
        }
    }

    private RankedReductant Row(Reductant reductant, ReductionPair pair, ReductionPoint point)
    {
        Reaction reaction = point.Reaction;
        Use(reaction);
        double expanded = point.ExpandedUncertainty(database.Covariance);
        Verdict verdict = VerdictOf(point.Margin, expanded);
        Crossovers crossovers = Crossovers.Find(pair.TryMargin, Math.Min(pair.LowestKelvin, kelvin), Math.Max(pair.HighestKelvin, kelvin), pair.Charge.Breaks.Concat(pair.Reductant.Breaks));
        ReductionBalance balance = ReductionBalance.Of(pair, point);
        CarbideCheck? carbide = reductant.Kind == ReductantKind.Graphite ? Finder.CheckCarbide(pair, kelvin) : null;
        RankedReductant row = new()
        {
            Reductant = reductant,
            Verdict = verdict,
            Job = JobVerdict.Works,
            Reason = string.Empty,
            Product = point.Reductant[0].Product,
            Reaction = reaction.Text,
            Margin = point.Margin,
            ExpandedUncertainty = expanded,
            ClassDefaults = [.. ReactionUncertainty.ClassDefaulted(reaction)],
            Crossovers = crossovers,
            BalanceReaction = balance.Reaction.Text,
            FurthestProduct = point.Furthest.Product,
            KgPerKgOxide = balance.KgPerKgOxide,
            KgPerKgMetal = balance.KgPerKgMetal,
            HeatJoulesPerKgOxide = balance.HeatJoulesPerKgOxide,
            DutyJoulesPerKgOxide = balance.DutyJoulesPerKgOxide,
            SideProducts = [.. SideProducts(reductant, point)],
            Carbide = carbide,
            Steps = [.. point.Charge.Steps.Select(step => StepRow(step, point))],
            MetalVapourLogPressure = point.Charge.VapourPerO2 > 0 ? point.VapourLogPressure : null,
        };
        row = reductant.Kind == ReductantKind.Gas ? WithGas(row, point, balance) : row with { NormalCubicMetresPerKgOxide = balance.NormalCubicMetresPerKgOxide };
        row = row with { Help = RankHelp.For(row, pair, kelvin, conditions), Notes = [.. NotesOf(row)] };
        return RankJudgement.Judge(row, charge.Metal, kelvin, conditions);
    }

    private void Use(Reaction reaction)
    {
        foreach ((Substance substance, _) in reaction.Terms)
        {
            _used.Add(substance);
        }
    }

    private static Verdict VerdictOf(double margin, double expanded)
        => Math.Abs(margin) < expanded ? Verdict.Borderline : margin > 0 ? Verdict.Reduces : Verdict.DoesNotReduce;

    private RankedStep StepRow(LadderStep step, ReductionPoint point)
    {
        ReductantStep own = point.Reductant[0];
        Reaction reaction = step.Couple.Formation.Times(-1).Plus(1, own.Formation, 1);
        if (step.OxygenPotential is not { } potential)
        {
            return new RankedStep(reaction.Text, null, null, Verdict.NoData, step.Gap);
        }

        double margin = potential - own.OxygenPotential;
        double expanded = ReactionUncertainty.OfGibbs(reaction, point.Kelvin, database.Covariance);
        return new RankedStep(reaction.Text, margin, expanded, VerdictOf(margin, expanded), null);
    }

    /// <summary>For CO and H2: the least ratio, the share that can react, and soot.</summary>
    private RankedReductant WithGas(RankedReductant row, ReductionPoint point, ReductionBalance balance)
    {
        Reaction oxidation = row.Reductant.Id == "H2" ? _gases.HydrogenOxidation : _gases.CarbonMonoxideOxidation;
        double logLeast = GasReactions.RatioOfPotential(oxidation, kelvin, point.Charge.Hardest.OxygenPotential!.Value);
        double least = Math.Exp(logLeast);
        double usable = 1 / (1 + least);
        double assumed = conditions.RatioOf(row.Reductant.Id);
        return row with
        {
            GasRatioAssumed = assumed,
            GasRatioLeast = least,
            UsableShare = usable,
            NormalCubicMetresPerKgOxide = usable > 0 ? balance.NormalCubicMetresPerKgOxide / usable : null,
            CarbonActivity = row.Reductant.Id == "CO" ? CarbonActivity(assumed) : null,
        };
    }

    /// <summary>Activity of carbon, against graphite, in CO + CO2 of a ratio at the total pressure (1 bar unless given).</summary>
    private double CarbonActivity(double ratio)
    {
        double total = conditions.Total?.NaturalLogBar ?? 0;
        double logMonoxide = total + Math.Log(ratio / (1 + ratio));
        double logDioxide = total - Math.Log(1 + ratio);
        double logK = (_gases.GraphiteToDioxide.StandardGibbs(kelvin) - _gases.GraphiteToMonoxide.StandardGibbs(kelvin)) / (PhysicalConstants.GasConstant * kelvin);
        return Math.Exp((2 * logMonoxide) - logDioxide - logK);
    }

    private IEnumerable<SideProduct> SideProducts(Reductant reductant, ReductionPoint point)
    {
        if (reductant.Kind == ReductantKind.Graphite || reductant.Id is "CO" or "CH4" or "CaC2" or "SiC")
        {
            foreach ((Substance carbide, double gibbs, double expanded) in Finder.Carbides(charge.Metal, kelvin).Where(entry => entry.GibbsPerCarbon < entry.Expanded))
            {
                bool certain = -gibbs > expanded;
                yield return new SideProduct(
                    carbide.Id, "carbide", -gibbs / 1000, null, certain,
                    $"{carbide.Id} {(certain ? "forms" : "may form")} beside graphite ({Printed.Fixed(-gibbs / 1000, 0)} ± {Printed.Fixed(expanded / 1000, 0)} kJ/mol C)");
            }
        }

        foreach (SideProduct product in Finder.Nitrides(charge.Metal, kelvin).Concat(Finder.Vapours(charge.Metal, "metal-vapour", kelvin, null)))
        {
            yield return product;
        }

        if (reductant.Metal is { } own)
        {
            foreach (SideProduct product in Finder.Nitrides(own, kelvin).Concat(Finder.Vapours(own, "reductant-vapour", kelvin, point.Reductant[0].OxygenPotential)))
            {
                yield return product;
            }
        }
    }

    private static IEnumerable<string> NotesOf(RankedReductant row)
    {
        if (row.Reductant.Note is { } note)
        {
            yield return note;
        }

        if (row.Reductant.Metal == "Si" || row.Reductant.Id == "SiC")
        {
            yield return "silicides have no data here: silicon left in the metal and silicides formed are not counted";
        }

        if (row.ClassDefaults.Length > 0)
        {
            yield return $"uncertainty of {string.Join(", ", row.ClassDefaults)} is a class default";
        }

        if (row.FurthestProduct != row.Product)
        {
            yield return $"mass and heat to {row.FurthestProduct}, the furthest that still reduces; the margin is that of {row.Product}";
        }

        if (row.HeatJoulesPerKgOxide is null || row.DutyJoulesPerKgOxide is null)
        {
            yield return "no heat: a partner has no heat data between 25 C and the temperature";
        }
    }

    /// <summary>An alloy is judged fresh and nearly used up; where the two differ the row says so.</summary>
    private static RankedReductant WithSpent(RankedReductant fresh, RankedReductant spent, double[] activities)
    {
        string words = $"at a({fresh.Reductant.Metal}) = {Printed.Brief(activities[1])}: margin {RankWords.MarginWords(spent)}, {RankWords.Of(spent.Verdict)}";
        RankedReductant row = fresh with { Notes = fresh.Notes.Insert(0, $"margin shown at a({fresh.Reductant.Metal}) = {Printed.Brief(activities[0])}; {words}") };
        return spent.Verdict == fresh.Verdict
            ? row
            : row with { Job = JobVerdict.WorksIf, Reason = $"works fresh; {words}" };
    }
}
