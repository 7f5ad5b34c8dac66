namespace RedoxFurnace.Atmospheres;

/// <summary>What an instrument reads.</summary>
public enum ReadingKind
{
    /// <summary>Water, on any scale, in gas drawn from the furnace.</summary>
    Water,

    /// <summary>CO2 share, in gas drawn from the furnace.</summary>
    Dioxide,

    /// <summary>CO/CO2, in gas drawn from the furnace.</summary>
    MonoxideRatio,

    /// <summary>Voltage of a zirconia probe in the furnace.</summary>
    Probe,

    /// <summary>Oxygen pressure, however it was found.</summary>
    LogOxygen,

    /// <summary>Free oxygen by volume, in gas drawn from the furnace.</summary>
    FreeOxygen,
}
