namespace RedoxFurnace.Charts.Scenes;

/// <summary>A piece of text on one level.</summary>
/// <param name="Text">Characters.</param>
/// <param name="Level">0 on the line, -1 subscript, 1 superscript.</param>
public readonly record struct TextRun(string Text, int Level);
