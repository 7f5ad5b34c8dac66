namespace RedoxFurnace.Substances;

/// <summary>Uncertainty of a substance's enthalpy and entropy at 298.15 K, expanded (k = 2).</summary>
/// <param name="EnthalpyJoules">J/mol, for Gibbs energies and couples.</param>
/// <param name="EntropyJoulesPerKelvin">J/(mol K).</param>
/// <param name="HeatJoules">J/mol, for heats, where it differs from the one for Gibbs energies.</param>
/// <param name="EnthalpyIsClassDefault">Whether no source gives the enthalpy's uncertainty and the class default stands in.</param>
/// <param name="EntropyIsClassDefault">The same of the entropy.</param>
/// <param name="SourceKey">Key of the source, or null for a class default.</param>
/// <param name="Note">What the source or the reason says.</param>
public sealed record ExpandedUncertainty(
    double EnthalpyJoules,
    double EntropyJoulesPerKelvin,
    double HeatJoules,
    bool EnthalpyIsClassDefault,
    bool EntropyIsClassDefault,
    string? SourceKey,
    string? Note);
