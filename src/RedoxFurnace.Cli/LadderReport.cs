using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli;

/// <summary>What <c>ladder</c> answers: ladders at each temperature and the changes between the lowest and the highest.</summary>
internal sealed record LadderReport(
    string Metal,
    ImmutableArray<OxideLadder> Ladders,
    ImmutableArray<LadderInvariant> Invariants,
    ImmutableArray<string> Notes,
    ImmutableArray<string> Assumptions,
    ImmutableArray<string> Sources,
    (double Low, double High) DataRange,
    EnthalpyCovariance? Covariance)
{
    public static LadderReport Of(string metal, TemperatureSeries series, Activities activities, Pressure vapour, SubstanceDatabase database)
    {
        if (!AtomicWeights.Has(metal))
        {
            throw RequestException.UnknownWord("metal", metal, AtomicWeights.Symbols);
        }

        OxideSystem system = OxideSystem.OfMetal(metal, database, activities);
        ImmutableArray<OxideLadder> ladders = [.. series.Points.Select(at => system.LadderAt(at.Kelvin, vapour.NaturalLogBar))];
        double low = series.Points.Min().Kelvin;
        double high = series.Points.Max().Kelvin;
        ImmutableArray<LadderInvariant> changes = high > low ? LadderInvariants.Between(system, low, high, vapour.NaturalLogBar) : [];
        return new LadderReport(
            metal,
            ladders,
            changes,
            [.. NotesOf(ladders)],
            [$"metal vapour competes at {vapour}", activities.Describe(), "pO2 is that of coexistence of two neighbours; uncertainties are expanded (k = 2)", "pure phases of fixed composition, wustite as one phase of three members; equilibrium, not rate"],
            Citations.Of(system.Elements.Concat(system.Oxides).Append(system.Oxygen), database),
            (system.Elements[0].LowestKelvin, system.Elements[0].HighestKelvin),
            database.Covariance);
    }

    public double? Expanded(LadderStep step, double kelvin) => step.Gap is null ? ReactionUncertainty.OfGibbs(step.Couple.Formation, kelvin, Covariance) : null;

    private static IEnumerable<string> NotesOf(ImmutableArray<OxideLadder> ladders)
    {
        IEnumerable<string> gaps = ladders.SelectMany(ladder => ladder.Steps.Select(step => step.Gap)).OfType<string>();
        IEnumerable<string> unstable = ladders.SelectMany(ladder => ladder.Unstable.Select(oxide => oxide.Group ?? oxide.Id)).Distinct()
            .Select(name => $"{name} is not stable at {string.Join(", ", ladders.Where(ladder => ladder.Unstable.Any(oxide => (oxide.Group ?? oxide.Id) == name)).Select(ladder => Temperature.FromKelvin(ladder.Kelvin).ToString()))}");
        IEnumerable<string> missing = ladders.SelectMany(ladder => ladder.WithoutData).Distinct().Where(oxide => oxide.Group is null)
            .Select(oxide => FormattableString.Invariant($"{oxide.Id} has data from {oxide.LowestKelvin:0.##} to {oxide.HighestKelvin:0.##} K only"));
        IEnumerable<string> overlay = ladders.SelectMany(ladder => ladder.Rungs).SelectMany(rung => rung.Members).SelectMany(member => member.Parts)
            .Where(part => part.Substance.IsFromOverlay).Select(part => $"{part.Substance.Id} is from your own folder").Distinct();
        return gaps.Distinct().Concat(unstable).Concat(missing).Concat(overlay);
    }
}
