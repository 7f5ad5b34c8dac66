using System.Collections.Immutable;
using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Kinds;

/// <summary>
/// The colours of lines: members of two published sets made for colour-blind readers (Okabe and Ito 2008; Tol 2021), those with a
/// contrast of 3:1 or more on white, in an order of our own. Couples are cool, reductants warm.
/// </summary>
internal static class ChartInks
{
    /// <summary>For couples.</summary>
    public static ImmutableArray<Ink> Couples { get; } =
        [Ink.Of("#0072B2"), Ink.Of("#117733"), Ink.Of("#332288"), Ink.Of("#AA4499"), Ink.Of("#009E73"), Ink.Of("#882255"), Ink.Of("#4477AA"), Ink.Of("#666666")];

    /// <summary>For reductants.</summary>
    public static ImmutableArray<Ink> Reductants { get; } = [Ink.Of("#CC3311"), Ink.Of("#D55E00"), Ink.Of("#EE3377"), Ink.Of("#994455")];

    /// <summary>Dashes that tell couples of one colour apart.</summary>
    public static ImmutableArray<ImmutableArray<double>> Dashes { get; } = [[], [2.4, 0.9], [0.8, 0.8], [3, 0.8, 0.6, 0.8]];

    /// <summary>Symbols that tell reductants apart.</summary>
    public static ImmutableArray<MarkShape> Symbols { get; } = [MarkShape.Square, MarkShape.Diamond, MarkShape.OpenSquare, MarkShape.OpenDiamond];
}
