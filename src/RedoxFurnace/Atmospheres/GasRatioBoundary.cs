using System.Collections.Immutable;

namespace RedoxFurnace.Atmospheres;

/// <summary>A boundary between two fields of a gas-ratio chart.</summary>
/// <param name="Couple">The two phases, the reduced one first: <c>Fe/wustite</c>.</param>
/// <param name="Reduced">Stable at more CO or H2.</param>
/// <param name="Oxidised">Stable at less.</param>
/// <param name="Points">By rising temperature, without gaps.</param>
public sealed record GasRatioBoundary(string Couple, string Reduced, string Oxidised, ImmutableArray<GasRatioPoint> Points);
