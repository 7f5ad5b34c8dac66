namespace RedoxFurnace.Safety;

/// <summary>A piece of furnace work as the caller knows it, before its circumstances are derived.</summary>
/// <remarks>Formulas are written as everywhere else: <c>Fe2O3</c>, <c>Mg(g)</c> for a vapour, <c>C</c> for graphite.</remarks>
public sealed record HazardWork
{
    /// <summary>What is charged: oxides, ores, fluxes, parts.</summary>
    public IReadOnlyList<string> Charge { get; init; } = [];

    /// <summary>What takes the oxygen off, gases included.</summary>
    public IReadOnlyList<string> Reductants { get; init; } = [];

    /// <summary>What is made, side products and vapours included.</summary>
    public IReadOnlyList<string> Products { get; init; } = [];

    /// <summary>The furnace atmosphere and purge gases.</summary>
    public IReadOnlyList<string> Gases { get; init; } = [];

    /// <summary>Lowest temperature in K, or null if unknown.</summary>
    public double? LowestKelvin { get; init; }

    /// <summary>Highest temperature in K, or null if unknown.</summary>
    public double? HighestKelvin { get; init; }

    /// <summary>True when the work is done under vacuum.</summary>
    public bool Vacuum { get; init; }

    /// <summary>Circumstances the caller knows of, see <see cref="HazardTags"/>.</summary>
    public IReadOnlyList<string> Tags { get; init; } = [];
}
