namespace RedoxFurnace.Atmospheres;

/// <summary>Whether several readings can be of one gas.</summary>
public enum ReadingVerdict
{
    /// <summary>All agree within their tolerances.</summary>
    Agree,

    /// <summary>Most agree, the others stand apart.</summary>
    SomeStandApart,

    /// <summary>No majority: the readings alone do not tell which is right.</summary>
    NotDecidable,

    /// <summary>Fewer than two readings speak about the oxygen pressure.</summary>
    NothingToCompare,
}
