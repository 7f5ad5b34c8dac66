using System.Collections.Immutable;

namespace RedoxFurnace.Charges;

/// <summary>A charge at one temperature and pressure.</summary>
/// <param name="State">The equilibrium.</param>
/// <param name="HeatJoules">From everything at 25 C; + must be supplied. Null where a substance's heating is not known.</param>
/// <param name="Yields">Share of each metal as metal, carbide, oxide, vapour and the rest.</param>
public sealed record ChargePoint(ChargeState State, double? HeatJoules, ImmutableArray<MetalYield> Yields);
