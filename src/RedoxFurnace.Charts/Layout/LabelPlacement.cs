using System.Collections.Immutable;
using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Layout;

/// <summary>
/// Finds places for the labels of lines. A line that reaches the right edge gets its label in the column beside it; one that
/// ends inside gets it beside its end or along it where nothing is in the way, else in the column with a leader.
/// Labels never overlap one another or an obstacle.
/// </summary>
internal static class LabelPlacement
{
    private const double Gap = 0.7;
    private const double Reach = 1.5;
    private const double LeaderFrom = 0.6;

    /// <summary>A label to place.</summary>
    /// <param name="Width">mm.</param>
    /// <param name="Height">mm.</param>
    /// <param name="Line">The visible line, left to right; its last point is its end.</param>
    public sealed record Wanted(double Width, double Height, ImmutableArray<PagePoint> Line);

    /// <summary>Where a label went.</summary>
    /// <param name="Box">Its place.</param>
    /// <param name="Leader">Line to it, or empty.</param>
    public sealed record Placed(PageBox Box, ImmutableArray<PagePoint> Leader);

    /// <summary>Places all labels.</summary>
    /// <param name="labels">In the order of the lines.</param>
    /// <param name="plot">The plot.</param>
    /// <param name="columnLeft">Left edge of the column beside the plot.</param>
    /// <param name="column">Top and bottom of the column.</param>
    /// <param name="obstacles">Marks, numbers, window labels.</param>
    /// <returns>One for each label.</returns>
    public static Placed[] Place(IReadOnlyList<Wanted> labels, PageBox plot, double columnLeft, (double Top, double Bottom) column, IReadOnlyList<PageBox> obstacles)
    {
        Placed?[] placed = new Placed?[labels.Count];
        List<PageBox> taken = [.. obstacles];
        List<int> inColumn = [];
        for (int i = 0; i < labels.Count; i++)
        {
            if (plot.Right - labels[i].Line[^1].X <= Reach)
            {
                inColumn.Add(i);
            }
            else if (BesideLine(labels[i], plot, taken, labels) is { } beside)
            {
                placed[i] = beside;
                taken.Add(beside.Box.Grown(Gap / 2));
            }
            else
            {
                inColumn.Add(i);
            }
        }

        Column(labels, inColumn, columnLeft, column, placed);
        return placed!;
    }

    /// <summary>Heights in the column: as near to the ends of the lines as order and room allow (pool adjacent violators).</summary>
    private static void Column(IReadOnlyList<Wanted> labels, List<int> inColumn, double left, (double Top, double Bottom) column, Placed?[] placed)
    {
        int[] order = [.. inColumn.OrderBy(i => labels[i].Line[^1].Y).ThenBy(i => labels[i].Line[^1].X).ThenBy(i => i)];
        double[] pitch = [.. order.Select(i => labels[i].Height + (Gap / 2))];
        double room = column.Bottom - column.Top;
        double squeeze = Math.Min(1, room / Math.Max(room, pitch.Sum()));
        List<(double Middle, double Height, int First, int Count)> pools = [];
        for (int k = 0; k < order.Length; k++)
        {
            double height = pitch[k] * squeeze;
            pools.Add((Clamped(labels[order[k]].Line[^1].Y, height, column), height, k, 1));
            while (pools.Count > 1 && pools[^2].Middle + (pools[^2].Height / 2) > pools[^1].Middle - (pools[^1].Height / 2))
            {
                (double Middle, double Height, int First, int Count) lower = pools[^1];
                (double Middle, double Height, int First, int Count) upper = pools[^2];
                pools.RemoveRange(pools.Count - 2, 2);
                int first = upper.First;
                int count = upper.Count + lower.Count;
                double total = upper.Height + lower.Height;
                double mean = Enumerable.Range(first, count).Average(j => labels[order[j]].Line[^1].Y);
                pools.Add((Clamped(mean, total, column), total, first, count));
            }
        }

        foreach ((double middle, double height, int first, int count) in pools)
        {
            double top = middle - (height / 2);
            for (int k = first; k < first + count; k++)
            {
                Wanted label = labels[order[k]];
                PagePoint end = label.Line[^1];
                double y = top + (pitch[k] * squeeze / 2);
                PageBox box = new(left, y - (label.Height / 2), label.Width, label.Height);
                bool needsLeader = Math.Abs(y - end.Y) > LeaderFrom || left - end.X > 6;
                placed[order[k]] = new Placed(box, needsLeader ? [end, new PagePoint(left - 0.6, y)] : []);
                top += pitch[k] * squeeze;
            }
        }
    }

    private static double Clamped(double middle, double height, (double Top, double Bottom) column)
        => Math.Max(column.Top + (height / 2), Math.Min(column.Bottom - (height / 2), middle));

    private static Placed? BesideLine(Wanted label, PageBox plot, List<PageBox> taken, IReadOnlyList<Wanted> lines)
    {
        foreach (PageBox box in Candidates(label))
        {
            if (IsFree(box))
            {
                return new Placed(box, []);
            }
        }

        // Further off, tied to its line by a short leader.
        foreach ((PageBox box, PagePoint from) in Further(label))
        {
            PagePoint to = new(Math.Clamp(from.X, box.Left, box.Right), from.Y < box.Top ? box.Top : box.Bottom);

            // A leader through another line would name the wrong one.
            if (IsFree(box) && !lines.Any(line => !ReferenceEquals(line, label) && Meets(line.Line, from, to)))
            {
                return new Placed(box, [from, to]);
            }
        }

        return null;

        bool IsFree(PageBox box)
        {
            PageBox wide = box.Grown(0.25);
            return wide.Left >= plot.Left + 0.5 && wide.Right <= plot.Right - 0.5 && wide.Top >= plot.Top + 0.5 && wide.Bottom <= plot.Bottom - 0.5
                && !taken.Any(other => other.Overlaps(wide))
                && !lines.Any(line => Crosses(line.Line, wide));
        }
    }

    private static bool Meets(ImmutableArray<PagePoint> line, PagePoint from, PagePoint to)
    {
        for (int i = 1; i < line.Length; i++)
        {
            (PagePoint a, PagePoint b) = (line[i - 1], line[i]);
            if (Side(a, b, from) * Side(a, b, to) <= 0 && Side(from, to, a) * Side(from, to, b) <= 0)
            {
                return true;
            }
        }

        return false;

        static double Side(PagePoint a, PagePoint b, PagePoint p) => ((b.X - a.X) * (p.Y - a.Y)) - ((b.Y - a.Y) * (p.X - a.X));
    }

    private static IEnumerable<(PageBox Box, PagePoint From)> Further(Wanted label)
    {
        foreach (double away in new[] { 4.0, 6, 9, 12 })
        {
            foreach (double share in new[] { 0.9, 0.7, 0.5, 0.3, 0.1 })
            {
                PagePoint at = Along(label.Line, share);
                yield return (new PageBox(at.X + (away / 2), at.Y - label.Height - away, label.Width, label.Height), at);
                yield return (new PageBox(at.X - label.Width - (away / 2), at.Y + away, label.Width, label.Height), at);
                yield return (new PageBox(at.X - label.Width - (away / 2), at.Y - label.Height - away, label.Width, label.Height), at);
                yield return (new PageBox(at.X + (away / 2), at.Y + away, label.Width, label.Height), at);
            }
        }
    }

    private static IEnumerable<PageBox> Candidates(Wanted label)
    {
        PagePoint end = label.Line[^1];
        double half = label.Height / 2;
        yield return new PageBox(end.X + 1.6, end.Y - half, label.Width, label.Height);
        yield return new PageBox(end.X + 1.2, end.Y - label.Height - 0.4, label.Width, label.Height);
        yield return new PageBox(end.X + 1.2, end.Y + 0.4, label.Width, label.Height);
        foreach (double share in new[] { 0.95, 0.85, 0.75, 0.65, 0.5, 0.35, 0.2, 0.05 })
        {
            PagePoint at = Along(label.Line, share);
            foreach (double away in new[] { 0.7, 1.6, 2.8 })
            {
                yield return new PageBox(at.X - (label.Width / 2), at.Y - label.Height - away, label.Width, label.Height);
                yield return new PageBox(at.X - (label.Width / 2), at.Y + away, label.Width, label.Height);
                yield return new PageBox(at.X - label.Width, at.Y - label.Height - away, label.Width, label.Height);
                yield return new PageBox(at.X, at.Y + away, label.Width, label.Height);
            }
        }

        PagePoint start = label.Line[0];
        yield return new PageBox(start.X - label.Width - 1.6, start.Y - half, label.Width, label.Height);
    }

    private static PagePoint Along(ImmutableArray<PagePoint> line, double share)
    {
        double x = line[0].X + (share * (line[^1].X - line[0].X));
        for (int i = 1; i < line.Length; i++)
        {
            if (line[i].X >= x)
            {
                double run = line[i].X - line[i - 1].X;
                double part = run > 0 ? (x - line[i - 1].X) / run : 0;
                return new PagePoint(x, line[i - 1].Y + (part * (line[i].Y - line[i - 1].Y)));
            }
        }

        return line[^1];
    }

    private static bool Crosses(ImmutableArray<PagePoint> line, PageBox box)
    {
        for (int i = 1; i < line.Length; i++)
        {
            (PagePoint a, PagePoint b) = (line[i - 1], line[i]);
            bool apart = Math.Max(a.X, b.X) < box.Left || Math.Min(a.X, b.X) > box.Right || Math.Max(a.Y, b.Y) < box.Top || Math.Min(a.Y, b.Y) > box.Bottom;
            if (!apart && PolylineClip.Segment(a, b, box) is not null)
            {
                return true;
            }
        }

        return false;
    }
}
