namespace RedoxFurnace.Reductants;

/// <summary>Whether the job works: the wanted product comes out.</summary>
public enum JobVerdict
{
    /// <summary>Works.</summary>
    Works,

    /// <summary>Works under a stated condition.</summary>
    WorksIf,

    /// <summary>Does not work.</summary>
    DoesNotWork,

    /// <summary>Cannot be decided from what is known.</summary>
    NotDecidable,
}
