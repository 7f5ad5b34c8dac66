using System.Text.Json;
using RedoxFurnace.Safety;

namespace RedoxFurnace.Cli.Presentation;

/// <summary>An answer ready to be written in any form. The same result record stands behind its words, tables and JSON.</summary>
internal sealed record Answer
{
    /// <summary>The answer in words, first.</summary>
    public required string Headline { get; init; }

    /// <summary>The first is the main one, which CSV writes.</summary>
    public required IReadOnlyList<AnswerTable> Tables { get; init; }

    /// <summary>Remarks below the tables.</summary>
    public IReadOnlyList<string> Notes { get; init; } = [];

    /// <summary>What was assumed.</summary>
    public IReadOnlyList<string> Assumptions { get; init; } = [];

    /// <summary>Hazards, worst first.</summary>
    public IReadOnlyList<HazardNote> Hazards { get; init; } = [];

    /// <summary>Citations in full.</summary>
    public IReadOnlyList<string> Sources { get; init; } = [];

    /// <summary>Questions whose answer would change the verdict.</summary>
    public IReadOnlyList<string> Ask { get; init; } = [];

    /// <summary>Whether the closing safety line is printed; listings of the database do without.</summary>
    public bool CallsForSafety { get; init; } = true;

    /// <summary>Writes the whole JSON object.</summary>
    public required Action<Utf8JsonWriter> Json { get; init; }
}
