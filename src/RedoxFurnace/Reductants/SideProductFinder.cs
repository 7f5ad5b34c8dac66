using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>Looks in the data for carbides, nitrides and vapours beside a reduction.</summary>
/// <remarks>THEORY.md, section 8.</remarks>
internal sealed class SideProductFinder(SubstanceDatabase database, GasReactions gases, RankConditions conditions)
{
    private const double LeastPressureBar = 1e-6;
    private const double LeastShareOfTotal = 1e-4;

    private readonly Dictionary<(string Metal, string Other), IReadOnlyList<(Substance Compound, Reaction Formation)>> _compounds = [];

    /// <summary>A vapour below this counts for nothing beside the gas of the furnace.</summary>
    private double Least => Math.Max(LeastPressureBar, LeastShareOfTotal * (conditions.Total?.Bar ?? 1));

    /// <summary>Carbides of a metal that are stable beside graphite at a temperature, with their Gibbs energy of formation per mole of C.</summary>
    public IReadOnlyList<(Substance Carbide, double GibbsPerCarbon, double Expanded)> Carbides(string metal, double kelvin)
        => Binary(metal, "C", gases.Graphite, 1, kelvin, SubstanceClass.Carbide);

    /// <summary>What carbon does to the product of a charge at a temperature; null where no carbide is stable.</summary>
    public CarbideCheck? CheckCarbide(ReductionPair pair, double kelvin)
    {
        double? metalMargin = MetalMargin(pair, kelvin);
        IReadOnlyList<(Substance Carbide, double GibbsPerCarbon, double Expanded)> stable = [.. Carbides(pair.Charge.Metal, kelvin).Where(entry => entry.GibbsPerCarbon < 0)];
        if (stable.Count == 0 || metalMargin is null)
        {
            return null;
        }

        (Substance last, double gibbs, double expanded) = stable.MinBy(entry => entry.GibbsPerCarbon);
        Substance first = First(pair.Charge.MetalSubstance, stable, kelvin);
        Crossovers metal = Crossovers.Find(at => MetalMargin(pair, at), pair.LowestKelvin, pair.HighestKelvin, pair.Charge.Breaks);
        Crossovers carbide = Crossovers.Find(at => CarbideMargin(pair, first, at), pair.LowestKelvin, pair.HighestKelvin, pair.Charge.Breaks);
        return new CarbideCheck(first.Id, last.Id, metalMargin.Value, Floor(metal), Floor(carbide), -gibbs > expanded);
    }

    /// <summary>Nitrides of an element at the nitrogen pressure given.</summary>
    public IEnumerable<SideProduct> Nitrides(string element, double kelvin)
    {
        if (conditions.Nitrogen is not { } nitrogen)
        {
            yield break;
        }

        double mixing = PhysicalConstants.GasConstant * kelvin * nitrogen.NaturalLogBar;
        foreach ((Substance nitride, double gibbs, double expanded) in Binary(element, "N", database.Get("N2"), 2, kelvin, SubstanceClass.Nitride))
        {
            double driving = -(gibbs - mixing) / 1000;
            if (driving > -expanded / 1000)
            {
                bool certain = driving > expanded / 1000;
                yield return new SideProduct(
                    nitride.Id, "nitride", driving, null, certain,
                    $"{nitride.Id} {(certain ? "forms" : "may form")} in {nitrogen} N2 ({Printed.Fixed(driving, 0)} ± {Printed.Fixed(expanded / 1000, 0)} kJ/mol N2)");
            }
        }
    }

    /// <summary>Vapour pressure of an element over its condensed form, and of its gaseous oxides over element and oxide together.</summary>
    public IEnumerable<SideProduct> Vapours(string element, string kind, double kelvin, double? oxygenPotential)
    {
        Substance? metal = database.Metal(element);
        if (metal is null || !metal.TryGibbs(kelvin, out double condensed))
        {
            yield break;
        }

        double rt = PhysicalConstants.GasConstant * kelvin;
        condensed += rt * conditions.Activities.NaturalLog(metal);
        if (database.Vapour(element) is { } vapour && vapour.TryGibbs(kelvin, out double gas))
        {
            double bar = Math.Exp((condensed - gas) / rt);
            if (bar >= Least)
            {
                string over = conditions.Activities.Has(metal) ? $"{element} at the given activity" : $"pure {element}";
                yield return new SideProduct(vapour.Id, kind, null, bar, true, $"{element} vapour {PrintedPressure(bar)} over {over}");
            }
        }

        if (oxygenPotential is { } potential)
        {
            foreach (SideProduct suboxide in SubOxides(element, condensed, kelvin, potential))
            {
                yield return suboxide;
            }
        }
    }

    private IEnumerable<SideProduct> SubOxides(string element, double condensed, double kelvin, double oxygenPotential)
    {
        double rt = PhysicalConstants.GasConstant * kelvin;
        double halfOxygen = (gases.Oxygen.Gibbs(kelvin) + oxygenPotential) / 2;
        foreach (Substance oxide in database.MadeOf(new HashSet<string> { element, "O" }).Where(substance => substance.IsGas && substance.Formula.Of("O") > 0 && substance.Formula.Of(element) > 0))
        {
            if (oxide.TryGibbs(kelvin, out double gibbs))
            {
                double log = ((oxide.Formula.Of(element) * condensed) + (oxide.Formula.Of("O") * halfOxygen) - gibbs) / rt;
                double bar = Math.Exp(log);
                if (bar >= Least)
                {
                    yield return new SideProduct(oxide.Id, "sub-oxide", null, bar, true, $"{oxide.Id} {PrintedPressure(bar)} over {element} with its oxide: it carries {element} away");
                }
            }
        }
    }

    /// <summary>Metal from its last carbide and the oxide: carbon stands at the activity at which carbide and metal coexist.</summary>
    private double? MetalMargin(ReductionPair pair, double kelvin)
    {
        double? margin = pair.TryMargin(kelvin);
        if (margin is null)
        {
            return null;
        }

        double lowest = 0;
        foreach ((Substance _, Reaction formation) in CompoundsOf(pair.Charge.Metal, "C", gases.Graphite, 1, SubstanceClass.Carbide))
        {
            lowest = Math.Min(lowest, FormationPerAtom(formation, pair.Charge.Metal, kelvin) ?? 0);
        }

        return lowest < 0 ? margin + (CarbonPerO2(pair, kelvin) * lowest) : margin;
    }

    /// <summary>Oxide and carbon to a carbide: the ladder of the charge with its metal bound in the carbide beside graphite.</summary>
    private double? CarbideMargin(ReductionPair pair, Substance carbide, double kelvin)
    {
        Reaction reaction = CompoundsOf(pair.Charge.Metal, "C", gases.Graphite, 1, SubstanceClass.Carbide).First(entry => ReferenceEquals(entry.Compound, carbide)).Formation;
        if (FormationPerAtom(reaction, pair.Charge.Metal, kelvin) is not { } formation)
        {
            return null;
        }

        try
        {
            double carbonPerMetal = carbide.Formula.Of("C") / carbide.Formula.Of(pair.Charge.Metal);
            return pair.Bound(kelvin, Math.Min(-1e-9, formation * carbonPerMetal)).Margin;
        }
        catch (NoAnswerException)
        {
            return null;
        }
    }

    private double CarbonPerO2(ReductionPair pair, double kelvin)
        => -pair.At(kelvin).Reductant[0].Formation.NumberOf(gases.Graphite);

    /// <summary>Beside an excess of graphite the carbide of lowest Gibbs energy per metal atom stands last.</summary>
    private Substance First(Substance metal, IReadOnlyList<(Substance Carbide, double GibbsPerCarbon, double Expanded)> stable, double kelvin)
        => stable.MinBy(entry => entry.GibbsPerCarbon * entry.Carbide.Formula.Of("C") / entry.Carbide.Formula.Of(metal.Formula.Atoms.Keys.First())).Carbide;

    private List<(Substance Compound, double Gibbs, double Expanded)> Binary(string metal, string other, Substance otherSubstance, double otherAtoms, double kelvin, SubstanceClass kind)
    {
        List<(Substance Compound, double Gibbs, double Expanded)> found = [];
        foreach ((Substance compound, Reaction formation) in CompoundsOf(metal, other, otherSubstance, otherAtoms, kind))
        {
            if (FormationPerAtom(formation, metal, kelvin) is { } gibbs)
            {
                found.Add((compound, gibbs, ReactionUncertainty.OfGibbs(formation, kelvin, database.Covariance)));
            }
        }

        return found;
    }

    /// <summary>Gibbs energy of formation from the metal at its activity, per mole of C or N2; null without data.</summary>
    private double? FormationPerAtom(Reaction formation, string metal, double kelvin)
    {
        if (!formation.HasData(kelvin))
        {
            return null;
        }

        (Substance substance, double number) = formation.Terms.First(term => term.Substance.Id == metal);
        return formation.StandardGibbs(kelvin) + (PhysicalConstants.GasConstant * kelvin * number * conditions.Activities.NaturalLog(substance));
    }

    /// <summary>Compounds of two elements with their formation reactions, looked up once: searches over temperature ask for them hundreds of times.</summary>
    private IReadOnlyList<(Substance Compound, Reaction Formation)> CompoundsOf(string metal, string other, Substance otherSubstance, double otherAtoms, SubstanceClass kind)
    {
        if (_compounds.TryGetValue((metal, other), out IReadOnlyList<(Substance Compound, Reaction Formation)>? known))
        {
            return known;
        }

        Substance? element = database.Metal(metal);
        IReadOnlyList<(Substance Compound, Reaction Formation)> found = element is null ? [] :
            [.. database.MadeOf(new HashSet<string> { metal, other })
                .Where(compound => compound.Class == kind && compound.Formula.Of(metal) > 0 && compound.Formula.Of(other) > 0)
                .Select(compound => (compound, FormationOf(compound, element, metal, other, otherSubstance, otherAtoms)))];
        _compounds[(metal, other)] = found;
        return found;
    }

    private static Reaction FormationOf(Substance compound, Substance element, string metal, string other, Substance otherSubstance, double otherAtoms)
    {
        double per = otherAtoms / compound.Formula.Of(other);
        return Reaction.Of([(element, -per * compound.Formula.Of(metal)), (otherSubstance, -1.0), (compound, per)]);
    }

    private static double? Floor(Crossovers crossovers)
        => crossovers.Bands.Length == 0 ? null : crossovers.Bands[^1].Low;

    private static string PrintedPressure(double bar) => Pressure.FromBar(bar).ToString();
}
