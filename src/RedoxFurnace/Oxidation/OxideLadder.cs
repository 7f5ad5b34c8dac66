using System.Collections.Immutable;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>Which oxides of a system are stable at one temperature, in order from the metal upwards, and the steps between neighbours.</summary>
public sealed class OxideLadder
{
    private readonly ImmutableArray<Substance> _oxides;
    private ImmutableArray<Substance> _unstable;

    private OxideLadder(double kelvin, ImmutableArray<LadderRung> rungs, ImmutableArray<LadderStep> steps, ImmutableArray<Substance> oxides, ImmutableArray<Substance> withoutData)
    {
        Kelvin = kelvin;
        Rungs = rungs;
        Steps = steps;
        WithoutData = withoutData;
        _oxides = oxides;
    }

    /// <summary>Temperature, K.</summary>
    public double Kelvin { get; }

    /// <summary>From the metal upwards.</summary>
    public ImmutableArray<LadderRung> Rungs { get; }

    /// <summary>Step i leads from rung i to rung i + 1; oxygen potentials rise.</summary>
    public ImmutableArray<LadderStep> Steps { get; }

    /// <summary>Oxides with data that are not stable here.</summary>
    public ImmutableArray<Substance> Unstable => _unstable.IsDefault ? _unstable = FindUnstable() : _unstable;

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

    /// <summary>Puts a hull into rungs and steps.</summary>
    /// <param name="kelvin">K.</param>
    /// <param name="hull">Vertices from the metal upwards with their Gibbs energies, J per unit of the system, activities and vapour pressure included.</param>
    /// <param name="oxides">All oxides considered.</param>
    /// <param name="withoutData">Those without data.</param>
    /// <param name="oxygen">O2.</param>
    internal static OxideLadder Build(
        double kelvin,
        IReadOnlyList<(Assemblage Assemblage, double Gibbs)> hull,
        ImmutableArray<Substance> oxides,
        ImmutableArray<Substance> withoutData,
        Substance oxygen)
    {
        double oxygenGibbs = oxygen.Gibbs(kelvin);
        ImmutableArray<LadderRung>.Builder rungs = ImmutableArray.CreateBuilder<LadderRung>(hull.Count);
        ImmutableArray<LadderStep>.Builder steps = ImmutableArray.CreateBuilder<LadderStep>(hull.Count);
        int start = 0;
        for (int i = 1; i <= hull.Count; i++)
        {
            if (i < hull.Count && hull[i].Assemblage.PhaseNames == hull[start].Assemblage.PhaseNames)
            {
                continue;
            }

            rungs.Add(new LadderRung([.. hull.Skip(start).Take(i - start).Select(vertex => vertex.Assemblage)]));
            if (i < hull.Count)
            {
                OxidationCouple couple = new(hull[i - 1].Assemblage, hull[i].Assemblage, oxygen);
                double potential = ((hull[i].Gibbs - hull[i - 1].Gibbs) * couple.UnitsPerMoleO2) - oxygenGibbs;
                steps.Add(new LadderStep(couple, kelvin, potential, GapAbove(rungs[^1], withoutData, kelvin)));
            }

            start = i;
        }

        return new OxideLadder(kelvin, rungs.ToImmutable(), steps.ToImmutable(), oxides, withoutData);
    }

    private ImmutableArray<Substance> FindUnstable()
    {
        HashSet<Substance> stable = [.. Rungs.SelectMany(rung => rung.Members).SelectMany(assemblage => assemblage.Parts.Select(part => part.Substance))];
        HashSet<string> groups = [.. stable.Select(substance => substance.Group).OfType<string>()];
        return [.. _oxides.Where(oxide => !stable.Contains(oxide) && !WithoutData.Contains(oxide) && (oxide.Group is null || !groups.Contains(oxide.Group)))];
    }

    /// <summary>Above the melting point of wustite only one member has data, so the composition that meets magnetite is not known.</summary>
    private static string? GapAbove(LadderRung rung, ImmutableArray<Substance> withoutData, double kelvin)
    {
        string? group = rung.Highest.Parts.Select(part => part.Substance.Group).FirstOrDefault(name => name is not null);
        Substance? missing = group is null ? null : withoutData.FirstOrDefault(substance => substance.Group == group);
        return missing is null ? null : FormattableString.Invariant($"no data: {group} has one composition above {missing.HighestKelvin:0} K here, at {kelvin:0} K its oxygen-rich end is not known");
    }
}
