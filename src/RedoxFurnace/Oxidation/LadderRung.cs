using System.Collections.Immutable;

namespace RedoxFurnace.Oxidation;

/// <summary>One stable phase (or set of phases) of a ladder. Wustite's members are one rung, from its metal-rich to its oxygen-rich end.</summary>
public sealed class LadderRung
{
    internal LadderRung(ImmutableArray<Assemblage> members)
    {
        Members = members;
        Lowest = members[0];
        Highest = members[^1];
        Name = Lowest.PhaseNames;
    }

    /// <summary>Name of the phase: a formula, or <c>wustite</c>.</summary>
    public string Name { get; }

    /// <summary>The stable members, by rising oxygen; one for every phase of fixed composition.</summary>
    public ImmutableArray<Assemblage> Members { get; }

    /// <summary>The end with least oxygen, which coexists with the rung below.</summary>
    public Assemblage Lowest { get; }

    /// <summary>The end with most oxygen, which coexists with the rung above.</summary>
    public Assemblage Highest { get; }
}
