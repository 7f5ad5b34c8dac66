namespace RedoxFurnace.Substances;

/// <summary>The kinds of substance the class defaults of uncertainty are given for.</summary>
public enum SubstanceClass
{
    /// <summary>An element in a condensed phase.</summary>
    Element,

    /// <summary>A condensed oxide of one element.</summary>
    Oxide,

    /// <summary>A condensed oxide of two or more elements.</summary>
    CompoundOxide,

    /// <summary>A carbide.</summary>
    Carbide,

    /// <summary>A nitride.</summary>
    Nitride,

    /// <summary>A gas.</summary>
    Gas,

    /// <summary>Sulfides, carbonates, hydroxides, fluorides, borides.</summary>
    Other,
}
