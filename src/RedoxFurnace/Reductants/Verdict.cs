namespace RedoxFurnace.Reductants;

/// <summary>Whether a reductant takes the oxygen off.</summary>
public enum Verdict
{
    /// <summary>The margin exceeds its expanded uncertainty.</summary>
    Reduces,

    /// <summary>The margin is smaller than its expanded uncertainty.</summary>
    Borderline,

    /// <summary>The margin is negative by more than its expanded uncertainty.</summary>
    DoesNotReduce,

    /// <summary>No data at the temperature.</summary>
    NoData,
}
