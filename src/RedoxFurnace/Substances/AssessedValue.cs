namespace RedoxFurnace.Substances;

/// <summary>A value an assessment looked at: as the source has it, and as it is used.</summary>
/// <param name="Raw">As the source has it.</param>
/// <param name="Value">As used.</param>
public sealed record AssessedValue(double Raw, double Value)
{
    /// <summary>What the assessment adds.</summary>
    public double Shift => Value - Raw;
}
