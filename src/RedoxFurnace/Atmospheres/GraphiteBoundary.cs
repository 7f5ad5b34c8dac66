using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>The CO share of CO + CO2 over graphite (Boudouard) at one pressure of the two; above it the gas deposits soot.</summary>
/// <param name="MonoxideAndDioxide">pCO + pCO2.</param>
/// <param name="Points">By rising temperature.</param>
public sealed record GraphiteBoundary(Pressure MonoxideAndDioxide, ImmutableArray<GasRatioPoint> Points);
