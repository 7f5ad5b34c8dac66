using System.Collections.Immutable;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli;

/// <summary>Citations in full of substances.</summary>
internal static class Citations
{
    public static ImmutableArray<string> Of(IEnumerable<Substance> substances, SubstanceDatabase database)
        => [.. substances.SelectMany(substance => substance.Phases.Select(phase => phase.SourceKey).Append(substance.Uncertainty.SourceKey).OfType<string>())
            .Distinct()
            .Order(StringComparer.Ordinal)
            .Select(key => database.Sources[key].Text)];
}
