namespace RedoxFurnace.Reductants;

/// <summary>What happens at a marked point of a stability line.</summary>
public enum StabilityMarkKind
{
    /// <summary>The metal or reductant changes its crystal form.</summary>
    MetalTransition,

    /// <summary>The metal or reductant melts.</summary>
    MetalMelts,

    /// <summary>The metal boils at 1 bar.</summary>
    MetalBoils,

    /// <summary>An oxide changes its crystal form.</summary>
    OxideTransition,

    /// <summary>An oxide melts.</summary>
    OxideMelts,

    /// <summary>An oxide joins or leaves the ladder: three phases coexist and the couple ends or begins.</summary>
    LadderChange,

    /// <summary>The data end.</summary>
    DataEnd,
}
