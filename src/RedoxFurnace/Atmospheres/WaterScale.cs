namespace RedoxFurnace.Atmospheres;

/// <summary>The scales water in a gas is read on.</summary>
public enum WaterScale
{
    /// <summary>Temperature at which frost forms (over ice).</summary>
    FrostPoint,

    /// <summary>Temperature at which dew forms (over liquid water, supercooled below 0.01 C).</summary>
    DewPoint,

    /// <summary>A temperature that may be either of the two: the reading does not say.</summary>
    FrostOrDewPoint,

    /// <summary>Share of the moist gas by volume: ppm or percent.</summary>
    ShareByVolume,

    /// <summary>Grams of water per Nm3 (0 C, 101325 Pa) of the moist gas.</summary>
    GramsPerNm3,

    /// <summary>Partial pressure in bar.</summary>
    PartialPressure,

    /// <summary>pH2O/pH2.</summary>
    RatioToHydrogen,
}
