namespace RedoxFurnace.Atmospheres;

/// <summary>What a gas does to a metal.</summary>
public enum BrightVerdict
{
    /// <summary>The gas lies below the oxide by more than the uncertainty: the metal stays bright.</summary>
    Bright,

    /// <summary>The margin is smaller than its expanded uncertainty.</summary>
    Borderline,

    /// <summary>The gas lies above the oxide by more than the uncertainty.</summary>
    Oxidises,

    /// <summary>No verdict: no data at the temperature, or a gas without an oxygen pressure.</summary>
    NotDecidable,
}
