namespace RedoxFurnace.Substances;

/// <summary>What gives one phase its properties over one range of temperature.</summary>
internal abstract class PhaseModel(TemperatureRange range)
{
    public TemperatureRange Range { get; } = range;

    /// <summary>Whether heating from one temperature to another is known: false where only a reaction line or no data stand behind it.</summary>
    public virtual bool KnowsHeating => true;

    /// <summary>Expanded uncertainty (k = 2) of the reaction that defines the phase, J per mol of this substance; null where the substance carries its own.</summary>
    public virtual double? ExpandedUncertaintyOfLine => null;

    /// <summary>Apparent Gibbs energy, J/mol.</summary>
    public abstract double Gibbs(double kelvin);

    public abstract ThermalState At(double kelvin);
}
