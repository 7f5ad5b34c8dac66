using System.Collections.Immutable;

namespace RedoxFurnace.Charges;

/// <summary>What a charge becomes.</summary>
/// <param name="Request">What was asked.</param>
/// <param name="Points">Pressures outside, temperatures inside.</param>
/// <param name="Onsets">Where metals, carbides and nitrides first appear.</param>
/// <param name="Headline">The answer in words.</param>
/// <param name="Assumptions">What was assumed.</param>
/// <param name="Notes">Remarks.</param>
/// <param name="Sources">Citations in full.</param>
public sealed record ChargeResult(
    ChargeRequest Request,
    ImmutableArray<ChargePoint> Points,
    ImmutableArray<ProductOnset> Onsets,
    string Headline,
    ImmutableArray<string> Assumptions,
    ImmutableArray<string> Notes,
    ImmutableArray<string> Sources);
