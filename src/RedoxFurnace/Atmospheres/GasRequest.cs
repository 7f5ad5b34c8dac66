using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>A gas asked about at one or several temperatures.</summary>
/// <param name="Analysis">Every gas the analysis can mean.</param>
/// <param name="At">Temperatures.</param>
/// <param name="Total">Total pressure in the furnace.</param>
public sealed record GasRequest(GasAnalysis Analysis, ImmutableArray<Temperature> At, Pressure Total)
{
    /// <summary>The generator gas it started from, or null.</summary>
    public GeneratorGas? Preset { get; init; }

    /// <summary>Which of CO2 and H2O follows the other through the water-gas shift; null for none.</summary>
    public GasSpecies? Following { get; init; }

    /// <summary>Parts in the furnace, or null.</summary>
    public Alloy? Parts { get; init; }

    /// <summary>A steel whose carbon is asked about, or null.</summary>
    public SteelComposition? Steel { get; init; }

    /// <summary>Temperature of the probe; null for the furnace's own.</summary>
    public Temperature? ProbeAt { get; init; }
}
