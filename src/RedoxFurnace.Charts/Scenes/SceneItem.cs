namespace RedoxFurnace.Charts.Scenes;

/// <summary>One thing drawn: a line, an area, a mark or a text.</summary>
public abstract record SceneItem;
