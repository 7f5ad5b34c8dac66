namespace RedoxFurnace.Atmospheres;

/// <summary>The gases an atmosphere is reckoned with, in the order they are printed.</summary>
public enum GasSpecies
{
    /// <summary>Hydrogen.</summary>
    H2,

    /// <summary>Water vapour.</summary>
    H2O,

    /// <summary>Carbon monoxide.</summary>
    CO,

    /// <summary>Carbon dioxide.</summary>
    CO2,

    /// <summary>Methane.</summary>
    CH4,

    /// <summary>Oxygen.</summary>
    O2,

    /// <summary>Nitrogen.</summary>
    N2,

    /// <summary>Ammonia.</summary>
    NH3,

    /// <summary>Argon.</summary>
    Ar,

    /// <summary>Helium.</summary>
    He,
}
