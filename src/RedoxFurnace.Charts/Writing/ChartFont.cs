using RedoxFurnace.Charts.Scenes;
using SkiaSharp;

namespace RedoxFurnace.Charts.Writing;

/// <summary>The one font of all charts: measures text, and paints it for PNG and PDF. SVG names it first.</summary>
internal static class ChartFont
{
    /// <summary>The family list of SVG.</summary>
    public const string Family = "DejaVu Sans, Verdana, sans-serif";

    /// <summary>How far lowered and raised text is shifted, in ems.</summary>
    public const double Drop = 0.18;
    public const double Rise = 0.36;

    private const float MeasuringSize = 100;

    private static readonly Lazy<SKTypeface> RegularFace = new(() => Load("DejaVuSans-Subset.ttf"));
    private static readonly Lazy<SKTypeface> BoldFace = new(() => Load("DejaVuSans-Bold-Subset.ttf"));
    private static readonly Lazy<SKFont> RegularMeasure = new(() => Font(false, MeasuringSize));
    private static readonly Lazy<SKFont> BoldMeasure = new(() => Font(true, MeasuringSize));
    private static readonly Lock Measuring = new();

    public static SKFont Font(bool bold, float size) => new((bold ? BoldFace : RegularFace).Value, size)
    {
        Subpixel = true,
        LinearMetrics = true,
        Hinting = SKFontHinting.None,
        Edging = SKFontEdging.Antialias,
    };

    /// <summary>Width of a text, mm.</summary>
    public static double Width(RichText text, double size, bool bold = false)
    {
        lock (Measuring)
        {
            SKFont font = (bold ? BoldMeasure : RegularMeasure).Value;
            double ems = 0;
            foreach (TextRun run in text.Runs)
            {
                ems += font.MeasureText(run.Text) / MeasuringSize * (run.Level == 0 ? 1 : RichText.SmallScale);
            }

            return ems * size;
        }
    }

    public static double Width(string text, double size, bool bold = false) => Width(new RichText([new TextRun(text, 0)]), size, bold);

    /// <summary>The box a text takes up when it is not turned.</summary>
    public static PageBox Box(TextItem item)
    {
        double width = Width(item.Text, item.Size, item.IsBold);
        double left = item.Anchor switch
        {
            TextAnchor.Start => item.Place.X,
            TextAnchor.Middle => item.Place.X - (width / 2),
            _ => item.Place.X - width,
        };
        return new PageBox(left, item.Place.Y - (0.78 * item.Size), width, item.Size);
    }

    /// <summary>Whether the font has a glyph for a character.</summary>
    public static bool Has(int character, bool bold)
    {
        lock (Measuring)
        {
            return (bold ? BoldMeasure : RegularMeasure).Value.GetGlyph(character) != 0;
        }
    }

    private static SKTypeface Load(string name)
    {
        using Stream stream = typeof(ChartFont).Assembly.GetManifestResourceStream(name)!;
        using SKData data = SKData.Create(stream);
        return SKTypeface.FromData(data) ?? throw new InvalidOperationException($"the font {name} cannot be read");
    }
}
