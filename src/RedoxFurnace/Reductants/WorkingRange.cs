namespace RedoxFurnace.Reductants;

/// <summary>Where along temperature a reduction works.</summary>
public enum WorkingRange
{
    /// <summary>Above a floor temperature.</summary>
    Above,

    /// <summary>Below a ceiling temperature.</summary>
    Below,

    /// <summary>In one or more bands.</summary>
    Bands,

    /// <summary>Over the whole range searched.</summary>
    Always,

    /// <summary>Nowhere in the range searched.</summary>
    Never,
}
