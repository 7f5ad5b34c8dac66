using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>
/// Margins of many oxides against many reductants at many temperatures. Each oxide's hardest step and each reductant's first step is
/// evaluated once a temperature; a margin is then one subtraction. Crossovers and masses are the ranking's business.
/// </summary>
public sealed class MarginTable
{
    private readonly double[] _margins;

    private MarginTable(ImmutableArray<string> oxides, ImmutableArray<string> reductants, ImmutableArray<Temperature> at, double[] margins)
    {
        Oxides = oxides;
        Reductants = reductants;
        At = at;
        _margins = margins;
    }

    /// <summary>Simple oxides, formulas.</summary>
    public ImmutableArray<string> Oxides { get; }

    /// <summary>Reductants by name.</summary>
    public ImmutableArray<string> Reductants { get; }

    /// <summary>Temperatures.</summary>
    public ImmutableArray<Temperature> At { get; }

    /// <summary>Margin, J per mole of O2; null without data, or of an oxide against its own metal.</summary>
    /// <param name="oxide">Index of the oxide.</param>
    /// <param name="reductant">Index of the reductant.</param>
    /// <param name="at">Index of the temperature.</param>
    /// <returns>As <see cref="ReductantRanking"/> gives it, unit activities and each gas at 1 bar.</returns>
    public double? Margin(int oxide, int reductant, int at)
    {
        double margin = _margins[(((at * Oxides.Length) + oxide) * Reductants.Length) + reductant];
        return double.IsNaN(margin) ? null : margin;
    }

    /// <summary>Reckons a table.</summary>
    /// <param name="oxides">Formulas of simple oxides.</param>
    /// <param name="reductants">Names.</param>
    /// <param name="at">Temperatures.</param>
    /// <param name="conditions">Gas ratios; total pressure and CO pressure are not used here.</param>
    /// <param name="database">Data.</param>
    /// <returns>The table.</returns>
    /// <exception cref="RequestException">Unknown oxide or reductant.</exception>
    public static MarginTable Of(ImmutableArray<string> oxides, ImmutableArray<string> reductants, ImmutableArray<Temperature> at, RankConditions conditions, SubstanceDatabase database)
    {
        GasReactions gases = new(database);
        ReductantCatalogue catalogue = ReductantCatalogue.Of(database);
        ReductantModel[] models = [.. reductants.Select(name => ReductantModel.Of(catalogue.Get(name), database, gases, conditions, Activities.AllOne))];
        Substance[] substances = [.. oxides.Select(database.Get)];
        // Oxides of one metal share its ladder.
        Dictionary<string, OxideSystem> systems = [];
        string[] metals = [.. substances.Select(oxide => oxide.Formula.Atoms.Keys.Single(element => element != "O"))];
        foreach (string metal in metals.Distinct())
        {
            systems.Add(metal, OxideSystem.OfMetal(metal, database, Activities.AllOne));
        }

        double[] margins = new double[at.Length * oxides.Length * models.Length];
        double[] potentials = new double[models.Length];
        Dictionary<string, double> firstSteps = [];
        for (int t = 0; t < at.Length; t++)
        {
            double kelvin = at[t].Kelvin;
            firstSteps.Clear();
            double oxygen = gases.Oxygen.Gibbs(kelvin);
            foreach ((string metal, OxideSystem system) in systems)
            {
                firstSteps[metal] = FirstStep(system, metal, kelvin, oxygen);
            }

            for (int r = 0; r < models.Length; r++)
            {
                potentials[r] = models[r].Info.Metal is { } metal && firstSteps.TryGetValue(metal, out double known) && models[r].Info.Kind == ReductantKind.Metal ? known : Potential(models[r], kelvin);
            }

            for (int o = 0; o < substances.Length; o++)
            {
                double hardest = substances[o].TryGibbs(kelvin, out _) ? firstSteps[metals[o]] : double.NaN;
                int row = ((t * substances.Length) + o) * models.Length;
                for (int r = 0; r < models.Length; r++)
                {
                    margins[row + r] = models[r].Info.Metal == metals[o] ? double.NaN : hardest - potentials[r];
                }
            }
        }

        return new MarginTable(oxides, reductants, at, margins);
    }

    private static double Potential(ReductantModel model, double kelvin)
    {
        if (kelvin < model.LowestKelvin || kelvin > model.HighestKelvin)
        {
            return double.NaN;
        }

        try
        {
            return model.StepsAt(kelvin, null)[0].OxygenPotential;
        }
        catch (NoAnswerException)
        {
            return double.NaN;
        }
    }

    /// <summary>
    /// The first step from a metal up. Along a lower hull slopes rise, so the first step is the one of lowest oxygen potential, the hardest of every
    /// oxide of the metal; and it is the least of the slopes from the metal to any oxide, so no hull is needed.
    /// </summary>
    private static double FirstStep(OxideSystem system, string metal, double kelvin, double oxygen)
    {
        double own = system.Elements[0].TryGibbs(kelvin, out double condensed) ? condensed : double.NaN;
        if (system.Vapours[0] is { } vapour && vapour.TryGibbs(kelvin, out double gas) && !(gas >= own))
        {
            own = gas;
        }

        double least = double.NaN;
        foreach (Substance oxide in system.Oxides)
        {
            if (oxide.TryGibbs(kelvin, out double gibbs))
            {
                double slope = 2 * (gibbs - (oxide.Formula.Of(metal) * own)) / oxide.Formula.Of("O");
                if (!(slope >= least))
                {
                    least = slope;
                }
            }
        }

        return least - oxygen;
    }
}
