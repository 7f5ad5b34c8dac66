namespace RedoxFurnace.Atmospheres;

/// <summary>One gas an analysis can mean.</summary>
/// <param name="Meaning">How its moisture reading was taken, in words; empty where it is clear or there is none.</param>
/// <param name="Mixture">The gas.</param>
public sealed record GasMeaning(string Meaning, GasMixture Mixture);
