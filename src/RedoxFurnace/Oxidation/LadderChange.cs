namespace RedoxFurnace.Oxidation;

/// <summary>What happens to a ladder at a temperature at which its rungs change.</summary>
public enum LadderChange
{
    /// <summary>Three phases coexist: an oxide joins or leaves the ladder.</summary>
    Invariant,

    /// <summary>An oxide leaves because its data end, or joins because they start.</summary>
    DataEnd,

    /// <summary>The metal boils at the vapour pressure considered.</summary>
    Boiling,
}
