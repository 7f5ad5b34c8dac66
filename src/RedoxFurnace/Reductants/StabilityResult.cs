using System.Collections.Immutable;

namespace RedoxFurnace.Reductants;

/// <summary>The lines of a stability chart.</summary>
/// <param name="Request">What was asked.</param>
/// <param name="Lines">Couples in the order asked, then reductants.</param>
/// <param name="Crossings">By couple, then temperature.</param>
/// <param name="Notes">What has no data, and the like.</param>
/// <param name="Sources">Citations in full.</param>
/// <param name="DatabaseHash">SHA-256 of the database files.</param>
public sealed record StabilityResult(
    StabilityRequest Request,
    ImmutableArray<StabilityLine> Lines,
    ImmutableArray<StabilityCrossing> Crossings,
    ImmutableArray<string> Notes,
    ImmutableArray<string> Sources,
    string DatabaseHash);
