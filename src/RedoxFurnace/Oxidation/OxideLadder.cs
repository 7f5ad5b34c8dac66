using System.Collections.Immutable;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>Which oxides of a system are stable at one temperature, in order from the metal upwards, and the steps between neighbours.</summary>
public sealed class OxideLadder
{
    private OxideLadder(double kelvin, ImmutableArray<LadderRung> rungs, ImmutableArray<LadderStep> steps, ImmutableArray<Substance> unstable, ImmutableArray<Substance> withoutData)
    {
        Kelvin = kelvin;
        Rungs = rungs;
        Steps = steps;
        Unstable = unstable;
        WithoutData = withoutData;
    }

    /// <summary>Temperature, K.</summary>
    public double Kelvin { get; }

    /// <summary>From the metal upwards.</summary>
    public ImmutableArray<LadderRung> Rungs { get; }

    /// <summary>Step i leads from rung i to rung i + 1; oxygen potentials rise.</summary>
    public ImmutableArray<LadderStep> Steps { get; }

    /// <summary>Oxides with data that are not stable here.</summary>
    public ImmutableArray<Substance> Unstable { get; }

    /// <summary>Oxides without data at this temperature.</summary>
    public ImmutableArray<Substance> WithoutData { get; }

    /// <summary>The rung on which a substance stands, or -1.</summary>
    /// <param name="substance">An oxide or metal.</param>
    /// <returns>Index into <see cref="Rungs"/>.</returns>
    public int RungOf(Substance substance)
    {
        for (int i = 0; i < Rungs.Length; i++)
        {
            if (Rungs[i].Members.Any(member => member.Parts.Length == 1 && ReferenceEquals(member.Parts[0].Substance, substance)))
            {
                return i;
            }
        }

        // A member of one phase that is not itself a vertex (Fe0.90O below 610 C) still belongs to the phase's rung.
        return substance.Group is null ? -1 : Rungs.ToList().FindIndex(rung => rung.Name == substance.Group);
    }

    /// <summary>The lowest rung whose oxygen content reaches a given one: where an unstable oxide would fall to, or the rung itself.</summary>
    /// <param name="oxygen">Moles of O per unit of the system.</param>
    /// <returns>Index into <see cref="Rungs"/>; the top rung when none reaches.</returns>
    public int RungReaching(double oxygen)
    {
        for (int i = 0; i < Rungs.Length; i++)
        {
            if (Rungs[i].Highest.Oxygen >= oxygen - 1e-9)
            {
                return i;
            }
        }

        return Rungs.Length - 1;
    }

    internal static OxideLadder Build(
        double kelvin,
        ImmutableArray<Assemblage> hull,
        ImmutableArray<Substance> oxides,
        ImmutableArray<Substance> withoutData,
        Substance oxygen,
        Activities activities,
        double vapourLogPressure)
    {
        ImmutableArray<LadderRung> rungs = Gather(hull);
        ImmutableArray<LadderStep>.Builder steps = ImmutableArray.CreateBuilder<LadderStep>(Math.Max(0, rungs.Length - 1));
        for (int i = 1; i < rungs.Length; i++)
        {
            OxidationCouple couple = new(rungs[i - 1].Highest, rungs[i].Lowest, oxygen);
            string? gap = GapAbove(rungs[i - 1], withoutData, kelvin);
            steps.Add(new LadderStep(
                couple,
                couple.StandardGibbs(kelvin),
                gap is null ? couple.OxygenPotential(kelvin, activities, vapourLogPressure) : null,
                gap));
        }

        HashSet<Substance> stable = [.. hull.SelectMany(assemblage => assemblage.Parts.Select(part => part.Substance))];
        HashSet<string> groups = [.. stable.Select(substance => substance.Group).OfType<string>()];
        ImmutableArray<Substance> unstable =
            [.. oxides.Where(oxide => !stable.Contains(oxide) && !withoutData.Contains(oxide) && (oxide.Group is null || !groups.Contains(oxide.Group)))];
        return new OxideLadder(kelvin, rungs, steps.ToImmutable(), unstable, withoutData);
    }

    private static ImmutableArray<LadderRung> Gather(ImmutableArray<Assemblage> hull)
    {
        List<LadderRung> rungs = [];
        List<Assemblage> members = [];
        foreach (Assemblage assemblage in hull)
        {
            if (members.Count > 0 && members[0].PhaseNames != assemblage.PhaseNames)
            {
                rungs.Add(new LadderRung([.. members]));
                members.Clear();
            }

            members.Add(assemblage);
        }

        rungs.Add(new LadderRung([.. members]));
        return [.. rungs];
    }

    /// <summary>Above the melting point of wustite only one member has data, so the composition that meets magnetite is not known.</summary>
    private static string? GapAbove(LadderRung rung, ImmutableArray<Substance> withoutData, double kelvin)
    {
        string? group = rung.Highest.Parts.Select(part => part.Substance.Group).FirstOrDefault(name => name is not null);
        Substance? missing = group is null ? null : withoutData.FirstOrDefault(substance => substance.Group == group);
        return missing is null ? null : FormattableString.Invariant($"no data: {group} has one composition above {missing.HighestKelvin:0} K here, at {kelvin:0} K its oxygen-rich end is not known");
    }
}
