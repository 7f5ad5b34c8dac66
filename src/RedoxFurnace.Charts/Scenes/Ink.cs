namespace RedoxFurnace.Charts.Scenes;

/// <summary>A colour (sRGB) with its opacity.</summary>
/// <param name="Red">0 to 255.</param>
/// <param name="Green">0 to 255.</param>
/// <param name="Blue">0 to 255.</param>
/// <param name="Opacity">0 (nothing) to 1 (solid).</param>
public readonly record struct Ink(byte Red, byte Green, byte Blue, double Opacity = 1)
{
    /// <summary>Text and axes.</summary>
    public static Ink Black { get; } = new(0x1B, 0x1B, 0x1B);

    /// <summary>Quiet text: 7:1 on white.</summary>
    public static Ink Quiet { get; } = new(0x55, 0x55, 0x55);

    /// <summary>Grid.</summary>
    public static Ink Faint { get; } = new(0xDD, 0xDD, 0xDD);

    /// <summary>Paper.</summary>
    public static Ink White { get; } = new(0xFF, 0xFF, 0xFF);

    /// <summary>The one accent of hazards: amber dark enough to read, 5:1 on white.</summary>
    public static Ink Amber { get; } = new(0x8F, 0x5A, 0x00);

    /// <summary>A colour written #RRGGBB.</summary>
    /// <param name="hex">Seven characters.</param>
    /// <returns>The colour, solid.</returns>
    public static Ink Of(string hex) => new(Convert.ToByte(hex[1..3], 16), Convert.ToByte(hex[3..5], 16), Convert.ToByte(hex[5..7], 16));

    /// <summary>The same colour with another opacity.</summary>
    /// <param name="opacity">0 to 1.</param>
    /// <returns>The new ink.</returns>
    public Ink At(double opacity) => this with { Opacity = opacity };

    /// <summary>Contrast with white paper, by WCAG 2.1 (relative luminance).</summary>
    /// <returns>1 to 21.</returns>
    public double ContrastOnWhite()
    {
        static double Linear(byte channel)
        {
            double c = channel / 255.0;
            return c <= 0.04045 ? c / 12.92 : Math.Pow((c + 0.055) / 1.055, 2.4);
        }

        double luminance = (0.2126 * Linear(Red)) + (0.7152 * Linear(Green)) + (0.0722 * Linear(Blue));
        return 1.05 / (luminance + 0.05);
    }
}
