namespace RedoxFurnace.Assessments;

/// <summary>What a measurement states.</summary>
public enum MeasurementKind
{
    /// <summary>RT ln pO2 of the couple as an equation in T.</summary>
    Potential,

    /// <summary>pH2O/pH2 beside the couple.</summary>
    GasRatioHydrogen,

    /// <summary>pCO2/pCO beside the couple.</summary>
    GasRatioMonoxide,

    /// <summary>The temperature at which the couple stands at a given pO2.</summary>
    TemperatureAtPressure,

    /// <summary>The temperature at which three phases coexist.</summary>
    InvariantTemperature,

    /// <summary>Gibbs energy of formation of the product, J/mol.</summary>
    GibbsOfFormation,

    /// <summary>Enthalpy of reaction, kJ per mole of O2.</summary>
    ReactionEnthalpy,
}
