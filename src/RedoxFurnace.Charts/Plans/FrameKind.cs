namespace RedoxFurnace.Charts.Plans;

/// <summary>What stands round the plot.</summary>
public enum FrameKind
{
    /// <summary>Title and plot alone.</summary>
    None,

    /// <summary>Basis, sources, uncertainty and safety line below.</summary>
    Caption,

    /// <summary>The caption and a title block for a controlled document.</summary>
    Document,
}
