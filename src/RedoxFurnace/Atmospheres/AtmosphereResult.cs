using System.Collections.Immutable;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Atmospheres;

/// <summary>The atmospheres of an oxide against temperature.</summary>
/// <param name="Oxide">Formula.</param>
/// <param name="Metal">Symbol.</param>
/// <param name="Request">As asked.</param>
/// <param name="Rows">By temperature as asked, then from the metal upwards.</param>
/// <param name="Headline">The answer in words.</param>
/// <param name="Notes">Remarks, among them the reason of every missing value.</param>
/// <param name="Assumptions">What was assumed.</param>
/// <param name="Used">Substances the rows rest on.</param>
/// <param name="DataRange">K.</param>
public sealed record AtmosphereResult(
    string Oxide,
    string Metal,
    AtmosphereRequest Request,
    ImmutableArray<AtmosphereRow> Rows,
    string Headline,
    ImmutableArray<string> Notes,
    ImmutableArray<string> Assumptions,
    ImmutableArray<Substance> Used,
    (double Low, double High) DataRange);
