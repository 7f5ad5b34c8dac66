using System.Collections.Immutable;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>Phases that together hold the metals of a system in their fixed proportions: one oxide, or a metal beside an oxide.</summary>
public sealed class Assemblage
{
    private string? _id;
    private string? _phaseNames;

    internal Assemblage(ImmutableArray<(Substance Substance, double Amount)> parts)
    {
        Parts = parts;
        foreach ((Substance substance, double amount) in parts)
        {
            Oxygen += amount * substance.Formula.Of("O");
        }
    }

    /// <summary>Substances with moles per unit of the system.</summary>
    public ImmutableArray<(Substance Substance, double Amount)> Parts { get; }

    /// <summary>Moles of oxygen atoms per unit of the system.</summary>
    public double Oxygen { get; }

    /// <summary>Formulas joined by plus signs.</summary>
    public string Id => _id ??= string.Join(" + ", Parts.Select(part => part.Substance.Id));

    /// <summary>Like <see cref="Id"/>, with members of one phase (wustite) under the name of the phase.</summary>
    public string PhaseNames => _phaseNames ??= string.Join(" + ", Parts.Select(part => part.Substance.Group ?? part.Substance.Id));

    /// <inheritdoc/>
    public override string ToString() => Id;
}
