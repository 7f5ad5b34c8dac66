namespace RedoxFurnace.Substances;

/// <summary>How grave a finding of the database examiner is.</summary>
public enum FindingSeverity
{
    /// <summary>The entry cannot be trusted.</summary>
    Error,

    /// <summary>Worth a look.</summary>
    Warning,

    /// <summary>Said so that nobody is surprised.</summary>
    Notice,
}
