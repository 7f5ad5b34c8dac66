using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>One or several readings of one gas.</summary>
/// <param name="Readings">At least one.</param>
/// <param name="Gas">What is known of the gas beside them; null where nothing is.</param>
/// <param name="Furnace">Pressure in the furnace, to which readings are carried.</param>
public sealed record ReadingRequest(ImmutableArray<FurnaceReading> Readings, GasAnalysis? Gas, Pressure Furnace)
{
    /// <summary>Pressure of the sampling line, where a reading may have been taken.</summary>
    public Pressure? Line { get; init; }

    /// <summary>Furnace temperature; null where it was not given, then a probe's own temperature counts.</summary>
    public Temperature? At { get; init; }
}
