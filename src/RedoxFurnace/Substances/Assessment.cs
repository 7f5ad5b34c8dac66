using System.Collections.Immutable;

namespace RedoxFurnace.Substances;

/// <summary>What an assessment changed or kept about a substance, and why.</summary>
/// <param name="EnthalpyKilojoules">Enthalpy of formation at 298.15 K, kJ/mol, or null.</param>
/// <param name="EntropyJoules">Entropy at 298.15 K, J/(mol K), or null.</param>
/// <param name="Provenance"><c>memory</c>, <c>retrieved</c> or both in words.</param>
/// <param name="Measurements">Ids in <c>measurements.yaml</c> that pull on it.</param>
/// <param name="Reason">In one sentence.</param>
public sealed record Assessment(
    AssessedValue? EnthalpyKilojoules,
    AssessedValue? EntropyJoules,
    string? Provenance,
    ImmutableArray<string> Measurements,
    string Reason);
