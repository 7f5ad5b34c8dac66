using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Plans;

/// <summary>One entry of the key: a shape and what it means.</summary>
/// <param name="Shape">The shape.</param>
/// <param name="Text">Its meaning.</param>
public sealed record KeyEntry(MarkShape Shape, string Text);
