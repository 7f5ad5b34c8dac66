using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>What readings mean, and whether they can be of one gas.</summary>
/// <param name="Request">What was asked.</param>
/// <param name="At">Temperature the oxygen pressures are given at; null where none was known.</param>
/// <param name="Waters">Every meaning of every moisture reading.</param>
/// <param name="Comparisons">One for each meaning; empty without a temperature.</param>
/// <param name="Headline">The answer in words.</param>
/// <param name="Decided">False where the meanings, or the readings, lead to different verdicts.</param>
/// <param name="Assumptions">What was assumed.</param>
/// <param name="Notes">Remarks.</param>
/// <param name="Ask">Open questions.</param>
public sealed record ReadingResult(
    ReadingRequest Request,
    Temperature? At,
    ImmutableArray<WaterConversion> Waters,
    ImmutableArray<ReadingComparison> Comparisons,
    string Headline,
    bool Decided,
    ImmutableArray<string> Assumptions,
    ImmutableArray<string> Notes,
    ImmutableArray<string> Ask);
