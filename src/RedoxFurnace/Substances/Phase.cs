using System.Collections.Immutable;

namespace RedoxFurnace.Substances;

/// <summary>One phase of a substance: a crystal form, the liquid, or the gas.</summary>
public sealed class Phase
{
    internal Phase(string label, MatterState state, ImmutableArray<PhaseModel> models, string sourceKey, string? note, string? provenance, bool gapAfter, SourceMark at)
    {
        Label = label;
        State = state;
        Models = models;
        SourceKey = sourceKey;
        Note = note;
        Provenance = provenance;
        HasDeclaredGapAfter = gapAfter;
        At = at;
        Range = new TemperatureRange(models[0].Range.LowKelvin, models[^1].Range.HighKelvin);
    }

    /// <summary>In words: alpha, quartz, liquid, gas.</summary>
    public string Label { get; }

    /// <summary>State of matter.</summary>
    public MatterState State { get; }

    /// <summary>From the first to the last temperature with data.</summary>
    public TemperatureRange Range { get; }

    /// <summary>Key of the citation in <c>sources.yaml</c>.</summary>
    public string SourceKey { get; }

    /// <summary>Origin of the data inside the source, or what was changed.</summary>
    public string? Note { get; }

    /// <summary><c>memory</c>, <c>retrieved</c>, or null where the source states it once for all.</summary>
    public string? Provenance { get; }

    /// <summary>Whether the file says that no data stand between this phase and the next.</summary>
    public bool HasDeclaredGapAfter { get; }

    /// <summary>Where the entry stands.</summary>
    public SourceMark At { get; }

    internal ImmutableArray<PhaseModel> Models { get; }
}
