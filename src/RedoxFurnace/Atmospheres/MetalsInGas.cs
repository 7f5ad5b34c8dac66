using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Atmospheres;

/// <summary>Holds the elements of the parts against a gas.</summary>
/// <remarks>THEORY.md, 'Metals in a gas'. Oxygen, carbon and nitrogen of the gas as analysed count: methane and ammonia decompose slowly on most metals.</remarks>
public sealed class MetalsInGas
{
    private const double ScanKelvin = 25;
    private const double FoundWithin = 0.05;

    private static readonly HashSet<string> HydrideFormers = ["Ti", "Zr", "Ta", "Nb", "V", "Hf"];

    private readonly SubstanceDatabase _database;
    private readonly GasReactions _reactions;
    private readonly GasEquilibrium _equilibrium;
    private readonly EnthalpyCovariance? _covariance;
    private readonly Substance _nitrogen;

    /// <summary>Takes what it needs from a database.</summary>
    /// <param name="database">Data.</param>
    public MetalsInGas(SubstanceDatabase database)
    {
        _database = database;
        _reactions = new GasReactions(database);
        _equilibrium = new GasEquilibrium(database);
        _covariance = database.Covariance;
        _nitrogen = database.Get("N2");
    }

    /// <summary>Every element's verdict, the most demanding first; none is left out.</summary>
    /// <param name="alloy">The parts.</param>
    /// <param name="gas">As analysed, at temperature and pressure.</param>
    /// <param name="mixture">The gas, to follow it on cooling.</param>
    /// <returns>By rising margin, elements without a verdict last.</returns>
    public ImmutableArray<MetalInGas> Judge(Alloy alloy, GasState gas, GasMixture mixture)
        => [.. alloy.Elements
            .Where(element => element.Symbol is not ("C" or "N"))
            .Select(element => Judge(element, alloy.Activities, gas, mixture))
            .OrderBy(metal => metal.Margin ?? double.PositiveInfinity)];

    private MetalInGas Judge(AlloyElement element, Activities activities, GasState gas, GasMixture mixture)
    {
        List<string> notes = [.. Warnings(element.Symbol, gas)];
        OxideSystem? system = _database.OxidesOf(element.Symbol).Count > 0 ? OxideSystem.OfMetal(element.Symbol, _database, activities) : null;
        OxidationCouple? couple = system is null ? null : FirstCouple(system, gas.Kelvin, notes);
        if (couple is null)
        {
            if (system is null)
            {
                notes.Add($"no data: the database has no condensed oxide of {element.Symbol}");
            }

            return Build(element, null, null, null, null, BrightVerdict.NotDecidable, null, null, null, null, gas, activities, notes);
        }

        double potential = couple.OxygenPotential(gas.Kelvin, activities);
        double logLimit = potential / (PhysicalConstants.GasConstant * gas.Kelvin);
        if (gas.OxygenPotential is not { } own)
        {
            notes.Add("no verdict: " + gas.NoOxygenReason);
            return Build(element, couple.Oxidised.PhaseNames, couple.Formation.Text, null, null, BrightVerdict.NotDecidable, logLimit, LimitWater(potential, gas), null, null, gas, activities, notes);
        }

        double margin = potential - own;
        double uncertainty = ReactionUncertainty.OfGibbs(Against(couple.Formation, gas), gas.Kelvin, _covariance);
        BrightVerdict verdict = Math.Abs(margin) < uncertainty ? BrightVerdict.Borderline : margin > 0 ? BrightVerdict.Bright : BrightVerdict.Oxidises;
        (double? below, double? above) = Turning(system!, activities, gas, mixture, margin);
        return Build(element, couple.Oxidised.PhaseNames, couple.Formation.Text, margin, uncertainty, verdict, logLimit, LimitWater(potential, gas), below, above, gas, activities, notes);
    }

    private MetalInGas Build(
        AlloyElement element, string? oxide, string? reaction, double? margin, double? uncertainty, BrightVerdict verdict, double? logLimit, WaterContent? water, double? below, double? above, GasState gas, Activities activities, List<string> notes)
    {
        CompoundInGas? nitride = Compound(element.Symbol, "N", _nitrogen, 2, gas.NaturalLogPressure(GasSpecies.N2), gas.Kelvin, activities);
        CompoundInGas? carbide = gas.NaturalLogCarbonActivity is { } carbon ? Compound(element.Symbol, "C", _reactions.Graphite, 1, carbon, gas.Kelvin, activities) : null;
        return new MetalInGas(element, oxide, reaction, margin, uncertainty, verdict, logLimit, water, below, above, nitride, carbide, [.. notes]);
    }

    private static OxidationCouple? FirstCouple(OxideSystem system, double kelvin, List<string> notes)
    {
        try
        {
            OxideLadder ladder = system.LadderAt(kelvin, null);
            if (ladder.Steps.Length > 0 && ladder.Steps[0].OxygenPotential is not null)
            {
                return ladder.Steps[0].Couple;
            }

            notes.Add(ladder.Steps.Length > 0 ? ladder.Steps[0].Gap! : FormattableString.Invariant($"no data: no oxide of {system.Elements[0].Id} has data at {kelvin:0} K"));
        }
        catch (OutsideDataException fault)
        {
            notes.Add("no data: " + fault.Message);
        }

        return null;
    }

    /// <summary>The couple less the gas's own reaction, whose errors partly cancel; the bare couple where the gas has neither hydrogen nor CO.</summary>
    private Reaction Against(Reaction couple, GasState gas)
        => !double.IsNegativeInfinity(gas.NaturalLogPressure(GasSpecies.H2)) ? couple.Plus(1, _reactions.HydrogenOxidation, -1)
            : !double.IsNegativeInfinity(gas.NaturalLogPressure(GasSpecies.CO)) ? couple.Plus(1, _reactions.CarbonMonoxideOxidation, -1)
            : couple;

    private WaterContent? LimitWater(double potential, GasState gas)
    {
        double hydrogen = gas.NaturalLogPressure(GasSpecies.H2);
        if (double.IsNegativeInfinity(hydrogen))
        {
            return null;
        }

        double water = hydrogen - GasReactions.RatioOfPotential(_reactions.HydrogenOxidation, gas.Kelvin, potential);
        Pressure total = Pressure.FromNaturalLogBar(gas.NaturalLogTotalPressure);
        return water < total.NaturalLogBar ? WaterContent.OfPressure(water, total) : null;
    }

    /// <summary>Follows the same gas down (or, where it oxidises now, up) to the temperature at which the verdict turns.</summary>
    private (double? OxidisesBelow, double? BrightAbove) Turning(OxideSystem system, Activities activities, GasState gas, GasMixture mixture, double margin)
    {
        Pressure total = Pressure.FromNaturalLogBar(gas.NaturalLogTotalPressure);
        bool cooling = margin > 0;
        double end = cooling ? GasEquilibrium.LowestKelvin : GasEquilibrium.HighestKelvin;
        double last = gas.Kelvin;
        while (last != end)
        {
            double next = cooling ? Math.Max(end, last - ScanKelvin) : Math.Min(end, last + ScanKelvin);
            if (MarginAt(next) is not { } found)
            {
                return (null, null);
            }

            if (found > 0 != cooling)
            {
                double at = Bisect(last, next, kelvin => (MarginAt(kelvin) ?? 0) > 0 == cooling);
                return cooling ? (at, null) : (null, at);
            }

            last = next;
        }

        return (null, null);

        double? MarginAt(double kelvin)
        {
            try
            {
                OxideLadder ladder = system.LadderAt(kelvin, null);
                double? own = _equilibrium.AsAnalysed(mixture, Temperature.FromKelvin(kelvin), total).OxygenPotential;
                return ladder.Steps.Length > 0 ? ladder.Steps[0].OxygenPotential - own : null;
            }
            catch (OutsideDataException)
            {
                return null;
            }
        }
    }

    private static double Bisect(double same, double turned, Func<double, bool> isSame)
    {
        while (Math.Abs(turned - same) > FoundWithin)
        {
            double middle = 0.5 * (same + turned);
            if (isSame(middle))
            {
                same = middle;
            }
            else
            {
                turned = middle;
            }
        }

        return 0.5 * (same + turned);
    }

    private CompoundInGas? Compound(string metal, string partner, Substance source, int atomsInSource, double logSource, double kelvin, Activities activities)
    {
        if (double.IsNegativeInfinity(logSource) || metal == partner || _database.Metal(metal) is not { } element || !element.TryGibbs(kelvin, out _))
        {
            return null;
        }

        double rt = PhysicalConstants.GasConstant * kelvin;
        CompoundInGas? best = null;
        double bestPerMetal = double.NegativeInfinity;
        HashSet<string> elements = [metal, partner];
        foreach (Substance compound in _database.MadeOf(elements).Where(substance => !substance.IsGas && substance.Formula.Atoms.Count == 2 && substance.TryGibbs(kelvin, out _)))
        {
            double metals = compound.Formula.Of(metal);
            double sources = compound.Formula.Of(partner) / atomsInSource;
            Reaction reaction = Reaction.Of([(element, -metals / sources), (source, -1), (compound, 1 / sources)]);
            double driving = -reaction.StandardGibbs(kelvin) + (rt * ((metals / sources * activities.NaturalLog(element)) + logSource));
            double perMetal = driving * sources / metals;
            if (perMetal > bestPerMetal)
            {
                double uncertainty = ReactionUncertainty.OfGibbs(reaction, kelvin, _covariance);
                best = new CompoundInGas(compound.Id, reaction.Text, driving, uncertainty, Math.Abs(driving) < uncertainty ? null : driving > 0);
                bestPerMetal = perMetal;
            }
        }

        return best;
    }

    private static IEnumerable<string> Warnings(string metal, GasState gas)
    {
        bool hydrogen = gas.Fraction(GasSpecies.H2) > 1e-6 || gas.Fraction(GasSpecies.NH3) > 1e-6;
        if (hydrogen && HydrideFormers.Contains(metal))
        {
            yield return $"{metal} takes up hydrogen: no oxide is removed and the metal turns brittle; work in argon or vacuum, and take hydrogen out again in vacuum";
        }

        if (hydrogen && metal == "Cu")
        {
            yield return "copper that holds oxygen (tough pitch, Cu2O inside) cracks in hydrogen: the gas reduces the Cu2O and the steam bursts the grains; only oxygen-free or deoxidised copper may see it";
        }
    }
}
