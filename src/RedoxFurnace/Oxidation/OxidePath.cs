using System.Collections.Immutable;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>The way of a charge oxide down its ladder to one of its metals.</summary>
internal sealed class OxidePath
{
    private readonly OxideSystem _system;
    private readonly double _oxygenOfOxide;

    public OxidePath(Substance oxide, string metal, SubstanceDatabase database, Activities activities)
    {
        Oxide = oxide;
        Metal = metal;
        _system = OxideSystem.OfOxide(oxide, database, activities);
        UnitsPerFormula = _system.Elements.Length == 1 ? oxide.Formula.Of(metal) : 1;
        _oxygenOfOxide = oxide.Formula.Of("O") / UnitsPerFormula;
    }

    public Substance Oxide { get; }

    public string Metal { get; }

    /// <summary>Units of the system in one formula of the oxide.</summary>
    public double UnitsPerFormula { get; }

    public OxideSystem System => _system;

    public Substance MetalSubstance => _system.Elements.First(element => element.Formula.Of(Metal) > 0);

    public bool HasVapour => _system.Vapours.Any(vapour => vapour is not null);

    public IEnumerable<double> Breaks => _system.Elements.Concat(_system.Oxides).SelectMany(substance => substance.Breaks);

    public double LowestKelvin => Math.Max(Oxide.LowestKelvin, _system.Elements.Max(element => element.LowestKelvin));

    public double HighestKelvin => Math.Min(Oxide.HighestKelvin, _system.Elements.Select((element, i) => Math.Max(element.HighestKelvin, _system.Vapours[i]?.HighestKelvin ?? 0)).Min());

    /// <summary>The steps at a temperature, from the metal up to the oxide; the metal may be bound in a carbide, which makes it easier to reach.</summary>
    /// <exception cref="OutsideDataException">The oxide or a metal has no data.</exception>
    public OxideDescent At(double kelvin, double? vapourLogPressure, double boundGibbs = 0)
    {
        if (!Oxide.TryGibbs(kelvin, out _))
        {
            throw OutsideDataException.Of(Oxide, kelvin);
        }

        OxideLadder ladder = _system.LadderAt(kelvin, vapourLogPressure, boundGibbs < 0 ? Metal : null, boundGibbs);
        int own = ladder.RungOf(Oxide);
        int top = own >= 0 ? own : ladder.RungReaching(_oxygenOfOxide);
        int bottom = Bottom(ladder, top);
        ImmutableArray<LadderStep> steps = [.. ladder.Steps.Skip(bottom).Take(top - bottom)];
        if (!steps.Any(step => step.OxygenPotential is not null))
        {
            throw new NoAnswerException(FormattableString.Invariant(
                $"{Oxide.Id} is not stable at {kelvin:0.##} K: the ladder there is {string.Join(" | ", ladder.Rungs.Select(rung => rung.Name))}, so nothing is left to reduce to {Metal}"));
        }

        return new OxideDescent(ladder, steps, ladder.Rungs[bottom].Lowest, own >= 0);
    }

    /// <summary>The highest rung below the oxide on which the wanted metal is metallic throughout.</summary>
    private int Bottom(OxideLadder ladder, int top)
    {
        int bottom = 0;
        for (int i = 0; i < top; i++)
        {
            bool metallic = ladder.Rungs[i].Lowest.Parts.All(part => part.Substance.Formula.Of(Metal) <= 0 || part.Substance.Formula.Of("O") <= 0);
            if (metallic)
            {
                bottom = i;
            }
        }

        return bottom;
    }
}
