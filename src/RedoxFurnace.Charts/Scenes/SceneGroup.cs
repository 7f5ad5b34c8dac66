using System.Collections.Immutable;

namespace RedoxFurnace.Charts.Scenes;

/// <summary>Things drawn together, under a name a reader of the file can search for.</summary>
/// <param name="Name">Such as <c>grid</c> or the name of a couple.</param>
/// <param name="Items">In the order drawn.</param>
public sealed record SceneGroup(string Name, ImmutableArray<SceneItem> Items);
