using System.Collections.Immutable;

namespace RedoxFurnace.Charts.Scenes;

/// <summary>The plotted values of one line, in the units of the axes.</summary>
/// <param name="Name">Of the line.</param>
/// <param name="Columns">Headings with units, such as <c>temperature_K</c>.</param>
/// <param name="Rows">Values, one for each column.</param>
public sealed record ValueTable(string Name, ImmutableArray<string> Columns, ImmutableArray<ImmutableArray<double>> Rows);
