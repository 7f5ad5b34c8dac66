namespace RedoxFurnace.Charts.Scenes;

/// <summary>One line of text.</summary>
/// <param name="Place">Of its anchor, on the baseline.</param>
/// <param name="Text">What it says.</param>
/// <param name="Size">Of a capital's em, mm.</param>
/// <param name="Anchor">Which end stands at the place.</param>
/// <param name="Ink">Colour.</param>
/// <param name="IsBold">Heavier weight.</param>
/// <param name="Turned">Degrees anticlockwise about the place.</param>
public sealed record TextItem(PagePoint Place, RichText Text, double Size, TextAnchor Anchor, Ink Ink, bool IsBold = false, double Turned = 0) : SceneItem;
