namespace RedoxFurnace.Assessments;

/// <summary>The largest difference of one substance or couple from one published table; database less published.</summary>
/// <param name="Name">Formula or couple.</param>
/// <param name="Published">Against what.</param>
/// <param name="Points">Temperatures compared.</param>
/// <param name="LargestKilojoules">Signed; kJ per mol of formula, or per mole of O2 for a couple.</param>
/// <param name="Kelvin">Where, K.</param>
/// <param name="StatedKilojoules">Stated error there (k = 2): of the database's formation energy, or of the measurement.</param>
/// <param name="Reason">Why it exceeds the stated error, or null where it does not.</param>
public sealed record PublishedDifference(string Name, string Published, int Points, double LargestKilojoules, double Kelvin, double StatedKilojoules, string? Reason)
{
    /// <summary>Whether the difference is larger than the stated error.</summary>
    public bool Exceeds => Math.Abs(LargestKilojoules) > StatedKilojoules;
}
