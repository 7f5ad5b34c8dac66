using System.Collections.Immutable;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charges;

/// <summary>A batch that heats itself.</summary>
/// <param name="Charge">Everything in it, fluxes and inert matter too, moles.</param>
/// <param name="Start">Temperature it starts from, -40 C or more.</param>
/// <param name="Moisture">Free water as a mass share of the charge, or null where it is not known.</param>
/// <param name="Total">Total pressure.</param>
/// <param name="Reach">A temperature the batch is to reach, or null.</param>
public sealed record BatchHeatRequest(ImmutableArray<(Substance Substance, double Moles)> Charge, Temperature Start, double? Moisture, Pressure Total, Temperature? Reach);
