using System.Collections.Immutable;

namespace RedoxFurnace.Charts.Scenes;

/// <summary>A line through points.</summary>
/// <param name="Points">At least two.</param>
/// <param name="Stroke">How it is drawn.</param>
public sealed record LineItem(ImmutableArray<PagePoint> Points, Stroke Stroke) : SceneItem;
