using System.Collections.Frozen;

namespace RedoxFurnace.Safety;

/// <summary>Derives from a piece of work the circumstances the safety rules ask for.</summary>
public static class HazardContextBuilder
{
    private static readonly FrozenSet<string> ReactiveMetals =
        new[] { "Al", "Mg", "Ca", "Si", "Ti", "Zr", "FeSi75", "Na", "K", "Li", "Hf", "Ba", "Sr", "La", "Ce", "Nd", "Y" }.ToFrozenSet(StringComparer.Ordinal);

    private static readonly FrozenSet<string> FlammableGases = new[] { "H2", "CO", "CH4", "NH3" }.ToFrozenSet(StringComparer.Ordinal);

    private static readonly FrozenSet<string> InertGases = new[] { "Ar", "N2", "He", "CO2" }.ToFrozenSet(StringComparer.Ordinal);

    private static readonly FrozenSet<string> CarbonReductants = new[] { "C", "CaC2", "SiC", "CH4" }.ToFrozenSet(StringComparer.Ordinal);

    private static readonly FrozenSet<string> Nonmetals =
        new[] { "H", "C", "N", "O", "F", "P", "S", "Cl", "He", "Ar", "Ne" }.ToFrozenSet(StringComparer.Ordinal);

    // Rounded melting points in degrees Celsius, handbook values from memory. They only decide whether a note is
    // shown, and a metal that is not listed counts as molten above 1500 C, so the list errs to the safe side.
    private static readonly FrozenDictionary<string, double> MeltingCelsius = new (string Metal, double Celsius)[]
    {
        ("Hg", -39), ("Cs", 28), ("Ga", 30), ("Rb", 39), ("K", 63), ("Na", 98), ("In", 157), ("Li", 181), ("Sn", 232), ("Bi", 271),
        ("Cd", 321), ("Pb", 327), ("Zn", 420), ("Sb", 631), ("Mg", 650), ("Al", 660), ("Ba", 727), ("Sr", 777), ("Ce", 795), ("Ca", 842),
        ("La", 918), ("Ge", 938), ("Ag", 962), ("Nd", 1021), ("Cu", 1085), ("FeSi75", 1200), ("Mn", 1246), ("Be", 1287), ("Si", 1414), ("Ni", 1455),
        ("Co", 1495), ("Y", 1522), ("Fe", 1538), ("Pd", 1555), ("Ti", 1668), ("Th", 1750), ("Zr", 1855), ("Cr", 1907), ("V", 1910), ("Hf", 2233),
        ("Nb", 2477), ("Mo", 2623), ("Ta", 3017), ("W", 3422),
    }.ToFrozenDictionary(entry => entry.Metal, entry => entry.Celsius, StringComparer.Ordinal);

    /// <summary>The context of a piece of work: its substances, and the tags that follow from them.</summary>
    /// <param name="work">Formulas, temperatures and what else the caller knows.</param>
    /// <returns>A context for <see cref="SafetyRules.For"/>. Carbon against an oxide brings CO into it.</returns>
    public static HazardContext Build(HazardWork work)
    {
        ArgumentNullException.ThrowIfNull(work);
        bool oxide = work.Charge.Any(IsMetalOxide);
        bool madeCarbonMonoxide = oxide && work.Reductants.Any(CarbonReductants.Contains);
        string[] gases = [.. work.Gases, .. work.Reductants, .. work.Products, .. madeCarbonMonoxide ? ["CO"] : Array.Empty<string>()];
        return new HazardContext(
            [.. work.Charge, .. gases],
            work.Tags.Concat(DerivedTags(work, gases, oxide)),
            work.LowestKelvin,
            work.HighestKelvin);
    }

    private static IEnumerable<string> DerivedTags(HazardWork work, IReadOnlyList<string> gases, bool oxide)
    {
        bool reactive = work.Reductants.Any(ReactiveMetals.Contains);
        bool thermite = oxide && reactive;
        (bool Holds, string Tag)[] rules =
        [
            (thermite, HazardTags.Thermite),
            (reactive || work.Charge.Any(ReactiveMetals.Contains), HazardTags.Powder),
            (oxide && work.Reductants.Concat(work.Gases).Any(FlammableGases.Contains), HazardTags.FreshMetal),
            (thermite || MayMelt(work), HazardTags.MoltenMetal),
            (gases.Select(HazardContext.WithoutSuffix).Any(FlammableGases.Contains), HazardTags.FlammableGas),
            (work.Gases.Select(HazardContext.WithoutSuffix).Any(InertGases.Contains), HazardTags.InertGas),
            (work.Vacuum, HazardTags.Vacuum),
        ];
        return rules.Where(rule => rule.Holds).Select(rule => rule.Tag);
    }

    private static bool MayMelt(HazardWork work)
    {
        double celsius = (work.HighestKelvin ?? double.PositiveInfinity) - 273.15;
        return work.Charge.Concat(work.Reductants).Concat(work.Products)
            .Where(IsMetal)
            .Any(metal => celsius > MeltingCelsius.GetValueOrDefault(metal, 1500));
    }

    private static bool IsMetalOxide(string formula)
    {
        HashSet<string> elements = [.. HazardContext.ElementsOf(HazardContext.WithoutSuffix(formula))];
        return elements.Contains("O") && (!elements.IsSubsetOf(Nonmetals) || elements.Contains("P"));
    }

    private static bool IsMetal(string formula) => MeltingCelsius.ContainsKey(formula)
        || (HazardContext.ElementsOf(formula).Take(2).ToArray() is [var only] && only == formula && !Nonmetals.Contains(only) && only != "B");
}
