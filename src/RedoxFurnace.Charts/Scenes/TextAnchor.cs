namespace RedoxFurnace.Charts.Scenes;

/// <summary>Which end of a text stands at its place.</summary>
public enum TextAnchor
{
    /// <summary>Its left end.</summary>
    Start,

    /// <summary>Its middle.</summary>
    Middle,

    /// <summary>Its right end.</summary>
    End,
}
