namespace RedoxFurnace.Atmospheres;

/// <summary>One gas at one temperature and pressure, reckoned in the ways that matter in a furnace.</summary>
/// <param name="Mixture">As analysed.</param>
/// <param name="AsAnalysed">CO, CO2, H2, H2O and O2 in equilibrium with one another; methane and ammonia untouched, no graphite.</param>
/// <param name="WithoutGraphite">Every gas in equilibrium, no graphite, even where its activity passes 1; null where the gas cannot be without it.</param>
/// <param name="AtEquilibrium">Every gas in equilibrium, graphite where its activity would pass 1.</param>
public sealed record GasAnswer(GasMixture Mixture, GasState AsAnalysed, GasState? WithoutGraphite, GasState AtEquilibrium)
{
    /// <summary>The gas without graphite where there is one, else with it.</summary>
    public GasState Homogeneous => WithoutGraphite ?? AtEquilibrium;
}
