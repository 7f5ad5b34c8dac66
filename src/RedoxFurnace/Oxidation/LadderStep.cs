namespace RedoxFurnace.Oxidation;

/// <summary>The step between two neighbouring rungs.</summary>
public sealed class LadderStep
{
    private readonly double _kelvin;
    private readonly double _oxygenPotential;
    private double? _standardGibbs;

    internal LadderStep(OxidationCouple couple, double kelvin, double oxygenPotential, string? gap)
    {
        Couple = couple;
        Gap = gap;
        _kelvin = kelvin;
        _oxygenPotential = oxygenPotential;
    }

    /// <summary>Lower rung's oxygen-rich end to upper rung's metal-rich end, per mole of O2.</summary>
    public OxidationCouple Couple { get; }

    /// <summary>Why there is no oxygen potential, or null.</summary>
    public string? Gap { get; }

    /// <summary>dG0 at unit activities, J per mole of O2.</summary>
    public double StandardGibbs => _standardGibbs ??= Couple.StandardGibbs(_kelvin);

    /// <summary>RT ln pO2 (bar) of coexistence at the given activities and vapour pressure, J per mole of O2; null where the data do not reach (<see cref="Gap"/>).</summary>
    public double? OxygenPotential => Gap is null ? _oxygenPotential : null;
}
