namespace RedoxFurnace.Charts.Scenes;

/// <summary>Shapes of marks, told apart without colour.</summary>
public enum MarkShape
{
    /// <summary>Disc.</summary>
    Disc,

    /// <summary>Ring.</summary>
    Ring,

    /// <summary>Filled triangle, point up.</summary>
    Up,

    /// <summary>Open triangle, point up.</summary>
    OpenUp,

    /// <summary>Filled triangle, point down.</summary>
    Down,

    /// <summary>Filled square.</summary>
    Square,

    /// <summary>Open square.</summary>
    OpenSquare,

    /// <summary>Filled diamond.</summary>
    Diamond,

    /// <summary>Open diamond.</summary>
    OpenDiamond,

    /// <summary>Short bar across the line.</summary>
    Bar,

    /// <summary>Cross of two strokes.</summary>
    Cross,
}
