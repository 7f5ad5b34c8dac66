using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using System.Xml;
using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Writing;

/// <summary>Writes a scene as SVG 1.1 with real text, one unit of the drawing a millimetre.</summary>
public static class SvgWriter
{
    private const string Svg = "http://www.w3.org/2000/svg";
    private const string Values = "urn:redoxfurnace:values";

    /// <summary>A whole SVG file.</summary>
    /// <param name="scene">The scene.</param>
    /// <returns>UTF-8 bytes, the same for the same scene.</returns>
    public static byte[] Write(Scene scene) => Encoding.UTF8.GetBytes(Text(scene, declaration: true));

    /// <summary>The svg element alone, to stand inside a page.</summary>
    /// <param name="scene">The scene.</param>
    /// <returns>Text without the XML declaration.</returns>
    public static string Inline(Scene scene) => Text(scene, declaration: false);

    private static string Text(Scene scene, bool declaration)
    {
        StringBuilder text = new();
        XmlWriterSettings settings = new() { Indent = true, IndentChars = " ", NewLineChars = "\n", OmitXmlDeclaration = true };
        if (declaration)
        {
            text.Append("<?xml version=\"1.0\" encoding=\"UTF-8\"?>\n");
        }

        using (XmlWriter xml = XmlWriter.Create(text, settings))
        {
            xml.WriteStartElement("svg", Svg);
            xml.WriteAttributeString("version", "1.1");
            xml.WriteAttributeString("width", Number(scene.Width) + "mm");
            xml.WriteAttributeString("height", Number(scene.Height) + "mm");
            xml.WriteAttributeString("viewBox", $"0 0 {Number(scene.Width)} {Number(scene.Height)}");
            xml.WriteAttributeString("role", "img");
            xml.WriteAttributeString("font-family", ChartFont.Family);
            xml.WriteElementString("title", Svg, scene.Title);
            xml.WriteElementString("desc", Svg, scene.Description);
            Metadata(xml, scene);
            xml.WriteStartElement("rect", Svg);
            xml.WriteAttributeString("width", Number(scene.Width));
            xml.WriteAttributeString("height", Number(scene.Height));
            xml.WriteAttributeString("fill", "#FFFFFF");
            xml.WriteEndElement();
            foreach ((int index, SceneGroup group) in scene.Groups.Index())
            {
                Group(xml, group, index);
            }

            xml.WriteEndElement();
        }

        return text.Append('\n').ToString();
    }

    private static void Metadata(XmlWriter xml, Scene scene)
    {
        if (scene.Values.IsEmpty)
        {
            return;
        }

        xml.WriteStartElement("metadata", Svg);
        xml.WriteStartElement("values", Values);
        foreach (ValueTable table in scene.Values)
        {
            xml.WriteStartElement("line", Values);
            xml.WriteAttributeString("name", table.Name);
            xml.WriteAttributeString("columns", string.Join(' ', table.Columns));
            xml.WriteString(string.Join(';', table.Rows.Select(row => string.Join(' ', row.Select(value => value.ToString("0.###", CultureInfo.InvariantCulture))))));
            xml.WriteEndElement();
        }

        xml.WriteEndElement();
        xml.WriteEndElement();
    }

    private static void Group(XmlWriter xml, SceneGroup group, int index)
    {
        xml.WriteStartElement("g", Svg);
        xml.WriteAttributeString("id", Identifier(group.Name, index));
        xml.WriteElementString("title", Svg, group.Name);
        foreach (SceneItem item in group.Items)
        {
            switch (item)
            {
                case LineItem line:
                    Line(xml, line);
                    break;
                case AreaItem area:
                    xml.WriteStartElement("path", Svg);
                    xml.WriteAttributeString("d", Path(area.Points) + "Z");
                    Fill(xml, area.Fill);
                    xml.WriteEndElement();
                    break;
                case MarkItem mark:
                    Mark(xml, mark);
                    break;
                case TextItem words:
                    Words(xml, words);
                    break;
            }
        }

        xml.WriteEndElement();
    }

    private static void Line(XmlWriter xml, LineItem line)
    {
        xml.WriteStartElement("path", Svg);
        xml.WriteAttributeString("d", Path(line.Points));
        xml.WriteAttributeString("fill", "none");
        StrokeOf(xml, line.Stroke);
        xml.WriteAttributeString("stroke-linejoin", "round");
        if (!line.Stroke.Dashes.IsEmpty)
        {
            xml.WriteAttributeString("stroke-dasharray", string.Join(' ', line.Stroke.Dashes.Select(Number)));
        }

        xml.WriteEndElement();
    }

    private static void Mark(XmlWriter xml, MarkItem mark)
    {
        double edge = mark.Size * MarkOutline.Edge;
        if (MarkOutline.IsRound(mark.Shape))
        {
            xml.WriteStartElement("circle", Svg);
            xml.WriteAttributeString("cx", Number(mark.Center.X));
            xml.WriteAttributeString("cy", Number(mark.Center.Y));
            xml.WriteAttributeString("r", Number(mark.Size * 0.42));
        }
        else
        {
            xml.WriteStartElement("path", Svg);
            xml.WriteAttributeString("d", MarkOutline.IsStrokes(mark.Shape)
                ? string.Concat(MarkOutline.Strokes(mark).Select(stroke => Path([stroke.From, stroke.To])))
                : Path(MarkOutline.Corners(mark)) + "Z");
        }

        bool open = MarkOutline.IsOpen(mark.Shape);
        if (open || MarkOutline.IsStrokes(mark.Shape))
        {
            if (open)
            {
                Fill(xml, Ink.White);
            }

            StrokeOf(xml, new Stroke(mark.Ink, edge));
        }
        else
        {
            Fill(xml, mark.Ink);
        }

        xml.WriteEndElement();
    }

    private static void Words(XmlWriter xml, TextItem item)
    {
        xml.WriteStartElement("text", Svg);
        xml.WriteAttributeString("x", Number(item.Place.X));
        xml.WriteAttributeString("y", Number(item.Place.Y));
        xml.WriteAttributeString("font-size", Number(item.Size));
        if (item.IsBold)
        {
            xml.WriteAttributeString("font-weight", "bold");
        }

        if (item.Anchor != TextAnchor.Start)
        {
            xml.WriteAttributeString("text-anchor", item.Anchor == TextAnchor.Middle ? "middle" : "end");
        }

        Fill(xml, item.Ink);
        if (item.Turned != 0)
        {
            xml.WriteAttributeString("transform", $"rotate({Number(-item.Turned)} {Number(item.Place.X)} {Number(item.Place.Y)})");
        }

        xml.WriteAttributeString("xml", "space", null, "preserve");
        double shifted = 0;
        foreach (TextRun run in item.Text.Runs)
        {
            double wanted = run.Level switch { < 0 => ChartFont.Drop * item.Size, > 0 => -ChartFont.Rise * item.Size, _ => 0 };
            if (run.Level == 0 && shifted == 0)
            {
                xml.WriteString(run.Text);
                continue;
            }

            xml.WriteStartElement("tspan", Svg);
            xml.WriteAttributeString("dy", Number(wanted - shifted));
            if (run.Level != 0)
            {
                xml.WriteAttributeString("font-size", Number(item.Size * RichText.SmallScale));
            }

            xml.WriteString(run.Text);
            xml.WriteEndElement();
            shifted = wanted;
        }

        xml.WriteEndElement();
    }

    private static void Fill(XmlWriter xml, Ink ink)
    {
        xml.WriteAttributeString("fill", Hex(ink));
        if (ink.Opacity < 1)
        {
            xml.WriteAttributeString("fill-opacity", Number(ink.Opacity));
        }
    }

    private static void StrokeOf(XmlWriter xml, Stroke stroke)
    {
        xml.WriteAttributeString("stroke", Hex(stroke.Ink));
        xml.WriteAttributeString("stroke-width", Number(stroke.Width));
        if (stroke.Ink.Opacity < 1)
        {
            xml.WriteAttributeString("stroke-opacity", Number(stroke.Ink.Opacity));
        }
    }

    private static string Path(ImmutableArray<PagePoint> points)
    {
        StringBuilder path = new();
        foreach ((int index, PagePoint point) in points.Index())
        {
            path.Append(index == 0 ? 'M' : 'L').Append(Number(point.X)).Append(' ').Append(Number(point.Y));
        }

        return path.ToString();
    }

    private static string Identifier(string name, int index)
    {
        StringBuilder id = new(FormattableString.Invariant($"g{index}-"));
        foreach (char letter in name)
        {
            id.Append(char.IsAsciiLetterOrDigit(letter) || letter == '.' ? letter : '-');
        }

        return id.ToString();
    }

    private static string Hex(Ink ink) => FormattableString.Invariant($"#{ink.Red:X2}{ink.Green:X2}{ink.Blue:X2}");

    private static string Number(double value) => Math.Round(value, 3).ToString("0.###", CultureInfo.InvariantCulture);
}
