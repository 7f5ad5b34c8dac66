namespace RedoxFurnace.Reductants;

/// <summary>How a reductant takes up oxygen.</summary>
public enum ReductantKind
{
    /// <summary>Graphite in equilibrium with CO and CO2.</summary>
    Graphite,

    /// <summary>CO or H2, judged at a ratio to its own oxidised gas.</summary>
    Gas,

    /// <summary>A metal or metalloid, judged on its own oxide ladder.</summary>
    Metal,

    /// <summary>A compound, judged by reactions written out.</summary>
    Reaction,
}
