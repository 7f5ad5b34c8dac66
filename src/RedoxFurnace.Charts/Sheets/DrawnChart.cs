using System.Collections.Immutable;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Safety;

namespace RedoxFurnace.Charts.Sheets;

/// <summary>A chart ready to be written, with what is to be said about it.</summary>
/// <param name="Scenes">One page each; several where the lines would crowd one.</param>
/// <param name="Headline">What the chart shows, in words.</param>
/// <param name="Notes">Remarks.</param>
/// <param name="Hazards">Safety notes, worst first.</param>
/// <param name="Sources">Citations in full.</param>
public sealed record DrawnChart(
    ImmutableArray<Scene> Scenes,
    string Headline,
    ImmutableArray<string> Notes,
    ImmutableArray<HazardNote> Hazards,
    ImmutableArray<string> Sources);
