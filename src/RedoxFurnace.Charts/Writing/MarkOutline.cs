using System.Collections.Immutable;
using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Writing;

/// <summary>The corners of marks, shared by all writers.</summary>
internal static class MarkOutline
{
    /// <summary>Share of a mark's size that the edge of an open one takes.</summary>
    public const double Edge = 0.16;

    public static bool IsOpen(MarkShape shape) => shape is MarkShape.Ring or MarkShape.OpenUp or MarkShape.OpenSquare or MarkShape.OpenDiamond;

    public static bool IsRound(MarkShape shape) => shape is MarkShape.Disc or MarkShape.Ring;

    public static bool IsStrokes(MarkShape shape) => shape is MarkShape.Bar or MarkShape.Cross;

    /// <summary>Closed outline of a cornered mark.</summary>
    public static ImmutableArray<PagePoint> Corners(MarkItem mark)
    {
        double r = mark.Size / 2;
        (double x, double y) = (mark.Center.X, mark.Center.Y);
        return mark.Shape switch
        {
            MarkShape.Up or MarkShape.OpenUp => [new(x, y - r), new(x + r, y + (0.75 * r)), new(x - r, y + (0.75 * r))],
            MarkShape.Down => [new(x, y + r), new(x + r, y - (0.75 * r)), new(x - r, y - (0.75 * r))],
            MarkShape.Square or MarkShape.OpenSquare => [new(x - (0.8 * r), y - (0.8 * r)), new(x + (0.8 * r), y - (0.8 * r)), new(x + (0.8 * r), y + (0.8 * r)), new(x - (0.8 * r), y + (0.8 * r))],
            _ => [new(x, y - r), new(x + r, y), new(x, y + r), new(x - r, y)],
        };
    }

    /// <summary>Strokes of a mark made of strokes.</summary>
    public static ImmutableArray<(PagePoint From, PagePoint To)> Strokes(MarkItem mark)
    {
        double r = mark.Size / 2;
        (double x, double y) = (mark.Center.X, mark.Center.Y);
        return mark.Shape == MarkShape.Bar
            ? [(new(x, y - r), new(x, y + r))]
            : [(new(x - (0.7 * r), y - (0.7 * r)), new(x + (0.7 * r), y + (0.7 * r))), (new(x - (0.7 * r), y + (0.7 * r)), new(x + (0.7 * r), y - (0.7 * r)))];
    }
}
