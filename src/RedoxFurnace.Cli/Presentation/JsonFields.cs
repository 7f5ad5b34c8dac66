using System.Text.Json;
using RedoxFurnace.Safety;

namespace RedoxFurnace.Cli.Presentation;

/// <summary>Fields that every JSON object carries, and numbers that may be missing.</summary>
internal static class JsonFields
{
    /// <summary>A number, or null where it is missing or not finite.</summary>
    public static void Number(this Utf8JsonWriter writer, string key, double? value)
    {
        if (value is { } number && double.IsFinite(number))
        {
            writer.WriteNumber(key, number);
        }
        else
        {
            writer.WriteNull(key);
        }
    }

    /// <summary>A list of texts.</summary>
    public static void Texts(this Utf8JsonWriter writer, string key, IEnumerable<string> texts)
    {
        writer.WriteStartArray(key);
        foreach (string text in texts)
        {
            writer.WriteStringValue(text);
        }

        writer.WriteEndArray();
    }

    /// <summary>A pair [low, high], or null.</summary>
    public static void Range(this Utf8JsonWriter writer, string key, (double Low, double High)? range)
    {
        if (range is not { } ends)
        {
            writer.WriteNull(key);
            return;
        }

        writer.WriteStartArray(key);
        writer.WriteNumberValue(ends.Low);
        writer.WriteNumberValue(ends.High);
        writer.WriteEndArray();
    }

    /// <summary>assumptions, sources, data_range_K, notes, ask, hazards.</summary>
    public static void Common(
        this Utf8JsonWriter writer,
        IEnumerable<string> assumptions,
        IEnumerable<string> sources,
        (double Low, double High)? dataRange,
        IEnumerable<string> notes,
        IEnumerable<string> ask,
        IEnumerable<HazardNote> hazards)
    {
        writer.Texts("assumptions", assumptions);
        writer.Texts("sources", sources);
        writer.Range("data_range_K", dataRange);
        writer.Texts("notes", notes);
        writer.Texts("ask", ask);
        writer.WriteStartArray("hazards");
        foreach (HazardNote hazard in hazards)
        {
            writer.WriteStartObject();
            writer.WriteString("id", hazard.Id);
            writer.WriteString("severity", hazard.Severity.ToString().ToLowerInvariant());
            writer.WriteString("text", hazard.Text);
            writer.WriteString("source", hazard.Source);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
    }
}
