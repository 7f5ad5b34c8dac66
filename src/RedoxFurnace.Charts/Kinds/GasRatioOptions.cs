using System.Collections.Immutable;

namespace RedoxFurnace.Charts.Kinds;

/// <summary>Choices of the gas-ratio chart.</summary>
public sealed record GasRatioOptions : ChartOptions
{
    /// <summary><c>CO</c>, <c>H2</c> or both; the first has its fields tinted and named, the other is dashed.</summary>
    public ImmutableArray<string> Gases { get; init; } = ["CO"];

    /// <summary>log10 of the ratio instead of the share: every boundary can be seen, however close to pure gas.</summary>
    public bool Logarithmic { get; init; }

    /// <summary>Bands of expanded uncertainty.</summary>
    public bool Bands { get; init; }
}
