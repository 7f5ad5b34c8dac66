using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Reductants;

/// <summary>A ranking of reductants for one oxide at one temperature.</summary>
public sealed record RankResult
{
    /// <summary>Formula of the charge oxide.</summary>
    public required string Oxide { get; init; }

    /// <summary>The metal wanted.</summary>
    public required string Metal { get; init; }

    /// <summary>Temperature.</summary>
    public required Temperature At { get; init; }

    /// <summary>Conditions.</summary>
    public required RankConditions Conditions { get; init; }

    /// <summary>The step that decides, metal vapour at 1 bar or at the total pressure.</summary>
    public required HardestStep Hardest { get; init; }

    /// <summary>Rows, best first.</summary>
    public required ImmutableArray<RankedReductant> Rows { get; init; }

    /// <summary>The answer in words: the first line.</summary>
    public required string Headline { get; init; }

    /// <summary>What was assumed.</summary>
    public required ImmutableArray<string> Assumptions { get; init; }

    /// <summary>Citations in full of the data used.</summary>
    public required ImmutableArray<string> Sources { get; init; }

    /// <summary>Range of temperature over which the charge has data, K.</summary>
    public required (double Low, double High) DataRange { get; init; }

    /// <summary>Remarks on the whole.</summary>
    public required ImmutableArray<string> Notes { get; init; }

    /// <summary>Questions that would change the answer.</summary>
    public required ImmutableArray<string> Ask { get; init; }
}
