using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Quantities;
using SkiaSharp;

namespace RedoxFurnace.Charts.Writing;

/// <summary>Writes a scene as PNG.</summary>
public static class PngWriter
{
    /// <summary>Coarsest resolution written, dots per inch.</summary>
    public const int LeastDpi = 96;

    /// <summary>Finest resolution written, dots per inch.</summary>
    public const int MostDpi = 600;

    private const double MillimetresPerInch = 25.4;
    private const long MostPixels = 150_000_000;

    /// <summary>A whole PNG file.</summary>
    /// <param name="scene">The scene.</param>
    /// <param name="dpi">Dots per inch, 96 to 600.</param>
    /// <returns>Bytes, the same for the same scene.</returns>
    /// <exception cref="RequestException">The resolution is out of range, or the picture too large.</exception>
    public static byte[] Write(Scene scene, int dpi)
    {
        if (dpi is < LeastDpi or > MostDpi)
        {
            throw new RequestException($"a resolution of {dpi} dots per inch is out of range; {LeastDpi} to {MostDpi} is allowed");
        }

        double scale = dpi / MillimetresPerInch;
        int width = (int)Math.Round(scene.Width * scale);
        int height = (int)Math.Round(scene.Height * scale);
        if ((long)width * height > MostPixels)
        {
            throw new RequestException($"a picture of {width} x {height} dots is too large; take a smaller page or a coarser resolution");
        }

        using SKBitmap bitmap = new(new SKImageInfo(width, height, SKColorType.Rgba8888, SKAlphaType.Opaque));
        using SKCanvas canvas = new(bitmap);
        canvas.Clear(SKColors.White);
        canvas.Scale((float)scale);
        SkiaPainter.Paint(canvas, scene);
        canvas.Flush();
        using SKPixmap pixels = bitmap.PeekPixels()!;
        using SKData data = pixels.Encode(new SKPngEncoderOptions(SKPngEncoderFilterFlags.None, 3))!;
        return WithResolution(data.ToArray(), dpi);
    }

    /// <summary>Adds the pHYs chunk (PNG specification, third edition, 11.3.4.3) after the header, so that the picture prints at its size.</summary>
    private static byte[] WithResolution(byte[] png, int dpi)
    {
        const int afterHeader = 8 + 25;
        uint perMetre = (uint)Math.Round(dpi / MillimetresPerInch * 1000);
        byte[] body = [(byte)'p', (byte)'H', (byte)'Y', (byte)'s', .. BigEndian(perMetre), .. BigEndian(perMetre), 1];
        byte[] chunk = [.. BigEndian(9), .. body, .. BigEndian(Crc(body))];
        return [.. png.AsSpan(0, afterHeader), .. chunk, .. png.AsSpan(afterHeader)];
    }

    /// <summary>The cyclic redundancy code of a chunk (PNG specification, annex D).</summary>
    private static uint Crc(ReadOnlySpan<byte> body)
    {
        uint code = 0xFFFFFFFF;
        foreach (byte octet in body)
        {
            code ^= octet;
            for (int bit = 0; bit < 8; bit++)
            {
                code = (code & 1) != 0 ? (code >> 1) ^ 0xEDB88320 : code >> 1;
            }
        }

        return ~code;
    }

    private static byte[] BigEndian(uint value) => [(byte)(value >> 24), (byte)(value >> 16), (byte)(value >> 8), (byte)value];
}
