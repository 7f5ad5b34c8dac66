using System.Collections.Immutable;

namespace RedoxFurnace.Charts.Scenes;

/// <summary>A filled area without an edge.</summary>
/// <param name="Points">Its corners in order; it closes by itself.</param>
/// <param name="Fill">Colour.</param>
public sealed record AreaItem(ImmutableArray<PagePoint> Points, Ink Fill) : SceneItem;
