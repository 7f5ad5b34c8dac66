using RedoxFurnace.Charts.Scenes;
using SkiaSharp;

namespace RedoxFurnace.Charts.Writing;

/// <summary>Paints a scene on a Skia canvas whose unit has been set to a millimetre.</summary>
internal static class SkiaPainter
{
    private const double LetteringSize = 100;

    public static void Paint(SKCanvas canvas, Scene scene)
    {
        foreach (SceneItem item in scene.Groups.SelectMany(group => group.Items))
        {
            switch (item)
            {
                case LineItem line:
                    Line(canvas, line);
                    break;
                case AreaItem area:
                    using (SKPath path = Path(area.Points, closed: true))
                    using (SKPaint paint = Fill(area.Fill))
                    {
                        canvas.DrawPath(path, paint);
                    }

                    break;
                case MarkItem mark:
                    Mark(canvas, mark);
                    break;
                case TextItem words:
                    Words(canvas, words);
                    break;
            }
        }
    }

    private static void Line(SKCanvas canvas, LineItem line)
    {
        using SKPath path = Path(line.Points, closed: false);
        using SKPaint paint = StrokePaint(line.Stroke.Ink, line.Stroke.Width);
        paint.StrokeJoin = SKStrokeJoin.Round;
        if (!line.Stroke.Dashes.IsEmpty)
        {
            using SKPathEffect dashes = SKPathEffect.CreateDash([.. line.Stroke.Dashes.Select(dash => (float)dash)], 0);
            paint.PathEffect = dashes;
            canvas.DrawPath(path, paint);
            return;
        }

        canvas.DrawPath(path, paint);
    }

    private static void Mark(SKCanvas canvas, MarkItem mark)
    {
        using SKPaint edge = StrokePaint(mark.Ink, mark.Size * MarkOutline.Edge);
        if (MarkOutline.IsStrokes(mark.Shape))
        {
            foreach ((PagePoint from, PagePoint to) in MarkOutline.Strokes(mark))
            {
                canvas.DrawLine((float)from.X, (float)from.Y, (float)to.X, (float)to.Y, edge);
            }

            return;
        }

        bool open = MarkOutline.IsOpen(mark.Shape);
        using SKPaint fill = Fill(open ? Ink.White : mark.Ink);
        if (MarkOutline.IsRound(mark.Shape))
        {
            canvas.DrawCircle((float)mark.Center.X, (float)mark.Center.Y, (float)(mark.Size * 0.42), fill);
            if (open)
            {
                canvas.DrawCircle((float)mark.Center.X, (float)mark.Center.Y, (float)(mark.Size * 0.42), edge);
            }

            return;
        }

        using SKPath path = Path(MarkOutline.Corners(mark), closed: true);
        canvas.DrawPath(path, fill);
        if (open)
        {
            canvas.DrawPath(path, edge);
        }
    }

    private static void Words(SKCanvas canvas, TextItem item)
    {
        canvas.Save();
        canvas.Translate((float)item.Place.X, (float)item.Place.Y);
        canvas.RotateDegrees((float)-item.Turned);

        // Advances are kept in 64ths of a unit: at 2 units a letter that is a millimetre over a long line, at 100 nothing.
        canvas.Scale((float)(item.Size / LetteringSize));
        double width = ChartFont.Width(item.Text, LetteringSize, item.IsBold);
        double x = item.Anchor switch { TextAnchor.Start => 0, TextAnchor.Middle => -width / 2, _ => -width };
        using SKPaint paint = Fill(item.Ink);
        foreach (TextRun run in item.Text.Runs)
        {
            double size = run.Level == 0 ? LetteringSize : LetteringSize * RichText.SmallScale;
            double y = run.Level switch { < 0 => ChartFont.Drop * LetteringSize, > 0 => -ChartFont.Rise * LetteringSize, _ => 0 };
            using SKFont font = ChartFont.Font(item.IsBold, (float)size);
            canvas.DrawText(run.Text, (float)x, (float)y, SKTextAlign.Left, font, paint);
            x += ChartFont.Width(run.Text, size, item.IsBold);
        }

        canvas.Restore();
    }

    private static SKPath Path(IEnumerable<PagePoint> points, bool closed)
    {
        SKPathBuilder path = new();
        bool first = true;
        foreach (PagePoint point in points)
        {
            if (first)
            {
                path.MoveTo((float)point.X, (float)point.Y);
                first = false;
            }
            else
            {
                path.LineTo((float)point.X, (float)point.Y);
            }
        }

        if (closed)
        {
            path.Close();
        }

        return path.Detach();
    }

    private static SKPaint Fill(Ink ink) => new() { Color = Color(ink), IsAntialias = true, Style = SKPaintStyle.Fill };

    private static SKPaint StrokePaint(Ink ink, double width) => new() { Color = Color(ink), IsAntialias = true, Style = SKPaintStyle.Stroke, StrokeWidth = (float)width };

    private static SKColor Color(Ink ink) => new(ink.Red, ink.Green, ink.Blue, (byte)Math.Round(255 * ink.Opacity));
}
