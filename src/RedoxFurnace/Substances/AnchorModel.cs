namespace RedoxFurnace.Substances;

/// <summary>An element without data of its own: G = H = 0 at every temperature. Reactions at one temperature in which it appears only with its own reaction lines come out right, because its value cancels.</summary>
internal sealed class AnchorModel(TemperatureRange range) : PhaseModel(range)
{
    public override bool KnowsHeating => false;

    public override double Gibbs(double kelvin) => 0;

    public override ThermalState At(double kelvin) => new(0, 0, 0, kelvin);
}
