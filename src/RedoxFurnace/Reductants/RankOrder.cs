namespace RedoxFurnace.Reductants;

/// <summary>What a ranking is sorted by within each verdict.</summary>
public enum RankOrder
{
    /// <summary>Widest margin first.</summary>
    Margin,

    /// <summary>Lowest floor temperature first.</summary>
    Crossover,

    /// <summary>Least mass of reductant first.</summary>
    Mass,

    /// <summary>Least heat to be supplied first.</summary>
    Heat,
}
