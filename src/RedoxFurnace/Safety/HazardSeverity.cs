namespace RedoxFurnace.Safety;

/// <summary>How grave a hazard is, gravest first: the numeric order is the order of printing.</summary>
public enum HazardSeverity
{
    /// <summary>Can kill or burn a person in the next minutes.</summary>
    Danger = 0,

    /// <summary>Can do lasting harm, or turns into a danger when a step is missed.</summary>
    Warning = 1,

    /// <summary>Calls for care and for the usual protection.</summary>
    Caution = 2,
}
