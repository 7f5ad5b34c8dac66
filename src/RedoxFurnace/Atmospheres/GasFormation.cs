using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Atmospheres;

/// <summary>Formation constants of the gases from H2, O2, N2 at 1 bar and graphite.</summary>
internal sealed class GasFormation
{
    /// <summary>Species that react; argon and helium follow them in <see cref="GasSpecies"/>.</summary>
    public const int Reacting = 8;

    private readonly Substance[] _substances;
    private readonly Substance _graphite;

    public GasFormation(SubstanceDatabase database)
    {
        _substances = [.. Enum.GetNames<GasSpecies>().Take(Reacting).Select(database.Get)];
        _graphite = database.Get("C");
    }

    /// <summary>
    /// Writes ln K of c C + h H2 + o O2/2 + n N2 = species, in the order of <see cref="GasSpecies"/>.
    /// </summary>
    public void Fill(double kelvin, Span<double> logK)
    {
        double rt = PhysicalConstants.GasConstant * kelvin;
        Span<double> gibbs = stackalloc double[Reacting];
        for (int i = 0; i < Reacting; i++)
        {
            gibbs[i] = _substances[i].Gibbs(kelvin);
        }

        double graphite = _graphite.Gibbs(kelvin);
        double hydrogen = gibbs[(int)GasSpecies.H2];
        double halfOxygen = 0.5 * gibbs[(int)GasSpecies.O2];
        double nitrogen = gibbs[(int)GasSpecies.N2];
        logK[(int)GasSpecies.H2] = 0;
        logK[(int)GasSpecies.H2O] = (hydrogen + halfOxygen - gibbs[(int)GasSpecies.H2O]) / rt;
        logK[(int)GasSpecies.CO] = (graphite + halfOxygen - gibbs[(int)GasSpecies.CO]) / rt;
        logK[(int)GasSpecies.CO2] = (graphite + (2 * halfOxygen) - gibbs[(int)GasSpecies.CO2]) / rt;
        logK[(int)GasSpecies.CH4] = (graphite + (2 * hydrogen) - gibbs[(int)GasSpecies.CH4]) / rt;
        logK[(int)GasSpecies.O2] = 0;
        logK[(int)GasSpecies.N2] = 0;
        logK[(int)GasSpecies.NH3] = ((1.5 * hydrogen) + (0.5 * nitrogen) - gibbs[(int)GasSpecies.NH3]) / rt;
    }
}
