using System.Collections.Immutable;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charges;

/// <summary>A charge asked about at temperatures and pressures.</summary>
/// <param name="Charge">Condensed substances with moles.</param>
/// <param name="Gas">Gas charged with it, moles; may be empty.</param>
/// <param name="At">Temperatures.</param>
/// <param name="Totals">Total pressures.</param>
public sealed record ChargeRequest(
    ImmutableArray<(Substance Substance, double Moles)> Charge,
    ImmutableArray<(Substance Substance, double Moles)> Gas,
    ImmutableArray<Temperature> At,
    ImmutableArray<Pressure> Totals);
