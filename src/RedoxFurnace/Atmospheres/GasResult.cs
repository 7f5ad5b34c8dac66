using System.Collections.Immutable;

namespace RedoxFurnace.Atmospheres;

/// <summary>What a furnace gas does.</summary>
/// <param name="Request">What was asked.</param>
/// <param name="Points">By meaning, then temperature in the order asked.</param>
/// <param name="Soot">Ranges in which the gas as analysed would deposit carbon on its way down, for the first meaning.</param>
/// <param name="Headline">The answer in words.</param>
/// <param name="IsExplosive">Oxygen stands together with gas that burns.</param>
/// <param name="Assumptions">What was assumed.</param>
/// <param name="Notes">Remarks.</param>
/// <param name="Ask">Open questions.</param>
public sealed record GasResult(
    GasRequest Request,
    ImmutableArray<GasPoint> Points,
    ImmutableArray<CarbonRange> Soot,
    string Headline,
    bool IsExplosive,
    ImmutableArray<string> Assumptions,
    ImmutableArray<string> Notes,
    ImmutableArray<string> Ask);
