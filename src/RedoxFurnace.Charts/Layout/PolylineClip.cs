using System.Collections.Immutable;
using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Layout;

/// <summary>Cuts lines and areas at the edge of the plot.</summary>
internal static class PolylineClip
{
    /// <summary>The pieces of a line inside a box (Liang and Barsky 1984, one segment at a time).</summary>
    public static IEnumerable<ImmutableArray<PagePoint>> Inside(ImmutableArray<PagePoint> points, PageBox box)
    {
        ImmutableArray<PagePoint>.Builder piece = ImmutableArray.CreateBuilder<PagePoint>();
        for (int i = 1; i < points.Length; i++)
        {
            if (Segment(points[i - 1], points[i], box) is not { } cut)
            {
                continue;
            }

            if (piece.Count > 0 && piece[^1] != cut.From)
            {
                yield return piece.ToImmutable();
                piece.Clear();
            }

            if (piece.Count == 0)
            {
                piece.Add(cut.From);
            }

            piece.Add(cut.To);
        }

        if (piece.Count > 1)
        {
            yield return piece.ToImmutable();
        }
    }

    /// <summary>The part of a segment inside a box, or null.</summary>
    public static (PagePoint From, PagePoint To)? Segment(PagePoint a, PagePoint b, PageBox box)
    {
        (double start, double end) = (0, 1);
        (double dx, double dy) = (b.X - a.X, b.Y - a.Y);
        foreach ((double p, double q) in new[] { (-dx, a.X - box.Left), (dx, box.Right - a.X), (-dy, a.Y - box.Top), (dy, box.Bottom - a.Y) })
        {
            if (p == 0)
            {
                if (q < 0)
                {
                    return null;
                }

                continue;
            }

            double at = q / p;
            (start, end) = p < 0 ? (Math.Max(start, at), end) : (start, Math.Min(end, at));
        }

        if (start > end)
        {
            return null;
        }

        PagePoint from = start == 0 ? a : new PagePoint(a.X + (start * dx), a.Y + (start * dy));
        PagePoint to = end == 1 ? b : new PagePoint(a.X + (end * dx), a.Y + (end * dy));
        return (from, to);
    }

    /// <summary>A closed area cut to a box, side by side (Sutherland and Hodgman 1974).</summary>
    public static ImmutableArray<PagePoint> Area(ImmutableArray<PagePoint> corners, PageBox box)
    {
        List<PagePoint> area = [.. corners];
        area = Half(area, p => p.X >= box.Left, (a, b) => Cross(a, b, (box.Left - a.X) / (b.X - a.X)));
        area = Half(area, p => p.X <= box.Right, (a, b) => Cross(a, b, (box.Right - a.X) / (b.X - a.X)));
        area = Half(area, p => p.Y >= box.Top, (a, b) => Cross(a, b, (box.Top - a.Y) / (b.Y - a.Y)));
        area = Half(area, p => p.Y <= box.Bottom, (a, b) => Cross(a, b, (box.Bottom - a.Y) / (b.Y - a.Y)));
        return [.. area];
    }

    private static PagePoint Cross(PagePoint a, PagePoint b, double share) => new(a.X + (share * (b.X - a.X)), a.Y + (share * (b.Y - a.Y)));

    private static List<PagePoint> Half(List<PagePoint> corners, Func<PagePoint, bool> inside, Func<PagePoint, PagePoint, PagePoint> cross)
    {
        List<PagePoint> kept = [];
        for (int i = 0; i < corners.Count; i++)
        {
            PagePoint here = corners[i];
            PagePoint before = corners[(i + corners.Count - 1) % corners.Count];
            if (inside(here) != inside(before))
            {
                kept.Add(cross(before, here));
            }

            if (inside(here))
            {
                kept.Add(here);
            }
        }

        return kept;
    }
}
