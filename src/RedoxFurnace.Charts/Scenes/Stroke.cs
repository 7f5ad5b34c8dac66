using System.Collections.Immutable;

namespace RedoxFurnace.Charts.Scenes;

/// <summary>How a line is drawn.</summary>
/// <param name="Ink">Colour.</param>
/// <param name="Width">mm.</param>
/// <param name="Dashes">Lengths drawn and left out by turns, mm; empty for a solid line.</param>
public sealed record Stroke(Ink Ink, double Width, ImmutableArray<double> Dashes)
{
    /// <summary>A solid line.</summary>
    /// <param name="ink">Colour.</param>
    /// <param name="width">mm.</param>
    public Stroke(Ink ink, double width)
        : this(ink, width, [])
    {
    }
}
