namespace RedoxFurnace.Substances;

/// <summary>State of matter of a phase.</summary>
public enum MatterState
{
    /// <summary>Solid.</summary>
    Solid,

    /// <summary>Liquid.</summary>
    Liquid,

    /// <summary>Ideal gas at the standard pressure of 1 bar.</summary>
    Gas,
}
