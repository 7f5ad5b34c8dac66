using System.Collections.Immutable;
using RedoxFurnace.Charts.Scenes;
using SkiaSharp;

namespace RedoxFurnace.Charts.Writing;

/// <summary>Writes scenes as PDF with real text, one page each.</summary>
public static class PdfWriter
{
    private const float PointsPerMillimetre = 72f / 25.4f;

    /// <summary>A whole PDF file.</summary>
    /// <param name="scenes">Pages.</param>
    /// <returns>Bytes, the same for the same scenes: no date is written but one that stands in the scene.</returns>
    public static byte[] Write(params ImmutableArray<Scene> scenes)
    {
        Scene first = scenes[0];
        SKDocumentPdfMetadata metadata = new()
        {
            Title = first.Title,
            Subject = first.Description,
            Author = first.Information.GetValueOrDefault("author", ""),
            Keywords = string.Join("; ", first.Information.Select(pair => $"{pair.Key}: {pair.Value}")),
            Creator = "RedoxFurnace",
            Producer = "RedoxFurnace",
            RasterDpi = 300,
            EncodingQuality = 101,
            PdfA = false,
        };
        using MemoryStream stream = new();
        using (SKDocument document = SKDocument.CreatePdf(stream, metadata))
        {
            foreach (Scene scene in scenes)
            {
                SKCanvas canvas = document.BeginPage((float)scene.Width * PointsPerMillimetre, (float)scene.Height * PointsPerMillimetre);
                canvas.Scale(PointsPerMillimetre);
                SkiaPainter.Paint(canvas, scene);
                document.EndPage();
            }

            document.Close();
        }

        return stream.ToArray();
    }
}
