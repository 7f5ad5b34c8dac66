using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Atmospheres;

/// <summary>Which solid stands in which CO/CO2 or H2/H2O gas, against temperature: the diagram of Baur and Glaessner for iron, and the same for any metal.</summary>
/// <remarks>THEORY.md, 'Gas-ratio diagram'. Boundaries are the steps of the ladder, read through the gas.</remarks>
public sealed record GasRatioDiagram
{
    private const double BesideInvariant = 0.005;

    private GasRatioDiagram(string element, ImmutableArray<GasRatioBoundary> monoxide, ImmutableArray<GasRatioBoundary> hydrogen, ImmutableArray<GraphiteBoundary> graphite, ImmutableArray<LadderInvariant> invariants, ImmutableArray<Substance> substances)
    {
        Element = element;
        Monoxide = monoxide;
        Hydrogen = hydrogen;
        Graphite = graphite;
        Invariants = invariants;
        Substances = substances;
    }

    /// <summary>The metal.</summary>
    public string Element { get; }

    /// <summary>Boundaries by CO share.</summary>
    public ImmutableArray<GasRatioBoundary> Monoxide { get; }

    /// <summary>Boundaries by H2 share.</summary>
    public ImmutableArray<GasRatioBoundary> Hydrogen { get; }

    /// <summary>Graphite lines, one a pressure.</summary>
    public ImmutableArray<GraphiteBoundary> Graphite { get; }

    /// <summary>Temperatures at which the fields change.</summary>
    public ImmutableArray<LadderInvariant> Invariants { get; }

    /// <summary>Every substance the boundaries rest on, in the order of their formulas.</summary>
    public ImmutableArray<Substance> Substances { get; }

    /// <summary>Reckons the boundaries.</summary>
    /// <param name="element">Symbol of the metal.</param>
    /// <param name="low">Lowest temperature.</param>
    /// <param name="high">Highest temperature, above the lowest.</param>
    /// <param name="stepKelvin">Between points, above 0.</param>
    /// <param name="graphitePressures">pCO + pCO2 of each graphite line.</param>
    /// <param name="activities">Of condensed phases.</param>
    /// <param name="database">Data.</param>
    /// <returns>The diagram.</returns>
    /// <exception cref="OutsideDataException">The metal has no data at either end.</exception>
    /// <exception cref="RequestException">No such metal, or it has no oxide, or the range is reversed or too finely cut.</exception>
    public static GasRatioDiagram Of(string element, Temperature low, Temperature high, double stepKelvin, IEnumerable<Pressure> graphitePressures, Activities activities, SubstanceDatabase database)
    {
        if (!(high > low) || !(stepKelvin > 0) || (high.Kelvin - low.Kelvin) / stepKelvin > TemperatureSeries.MostPoints)
        {
            throw new RequestException($"the range {low} to {high} is reversed or cut into more than {TemperatureSeries.MostPoints} points; write the lower temperature first and a larger step");
        }

        OxideSystem system = OxideSystem.OfMetal(element, database, activities);
        GasReactions reactions = new(database);
        ImmutableArray<LadderInvariant> invariants = LadderInvariants.Between(system, low.Kelvin, high.Kelvin, null);
        SortedSet<double> grid = [low.Kelvin, high.Kelvin];
        for (double kelvin = low.Kelvin; kelvin < high.Kelvin; kelvin += stepKelvin)
        {
            grid.Add(kelvin);
        }

        foreach (LadderInvariant invariant in invariants)
        {
            grid.Add(Math.Max(low.Kelvin, invariant.Kelvin - BesideInvariant));
            grid.Add(Math.Min(high.Kelvin, invariant.Kelvin + BesideInvariant));
        }

        OxideLadder[] ladders = [.. grid.Select(kelvin => system.LadderAt(kelvin, null))];
        return new GasRatioDiagram(
            element,
            Boundaries(ladders, reactions.CarbonMonoxideOxidation, database.Covariance),
            Boundaries(ladders, reactions.HydrogenOxidation, database.Covariance),
            [.. graphitePressures.Select(pressure => new GraphiteBoundary(pressure, [.. grid.Select(kelvin => OverGraphite(kelvin, pressure, reactions, database.Covariance))]))],
            invariants,
            [.. ladders.SelectMany(ladder => ladder.Steps).SelectMany(step => step.Couple.Formation.Terms)
                .Concat(reactions.CarbonMonoxideOxidation.Terms).Concat(reactions.HydrogenOxidation.Terms).Concat(reactions.GraphiteToMonoxide.Terms)
                .Select(term => term.Substance).Distinct().OrderBy(substance => substance.Id, StringComparer.Ordinal)]);
    }

    /// <summary>Boudouard: ln K = ln r + ln pCO and pCO = P r/(1 + r), so ln r moves by (1 + r)/(2 + r) of ln K.</summary>
    private static GasRatioPoint OverGraphite(double kelvin, Pressure pressure, GasReactions reactions, EnthalpyCovariance? covariance)
    {
        (double share, double potential) = reactions.AboveGraphite(kelvin, pressure.NaturalLogBar);
        double ofConstant = Relative(reactions.GraphiteToMonoxide.Plus(1, reactions.CarbonMonoxideOxidation, -1), kelvin, covariance);
        return Point(kelvin, GasReactions.RatioOfPotential(reactions.CarbonMonoxideOxidation, kelvin, potential), ofConstant / (2 - share));
    }

    private static GasRatioPoint Point(double kelvin, double logRatio, double uncertainty) => new(kelvin, 1 / (1 + Math.Exp(-logRatio)), logRatio, uncertainty);

    /// <summary>Expanded uncertainty of ln of a gas ratio, from a reaction of which one mole O2 moves two moles of gas.</summary>
    private static double Relative(Reaction reaction, double kelvin, EnthalpyCovariance? covariance) => ReactionUncertainty.OfGibbs(reaction, kelvin, covariance) / (2 * PhysicalConstants.GasConstant * kelvin);

    /// <summary>One boundary for each run of neighbouring temperatures at which a couple stands on the ladder.</summary>
    private static ImmutableArray<GasRatioBoundary> Boundaries(OxideLadder[] ladders, Reaction oxidation, EnthalpyCovariance? covariance)
    {
        List<GasRatioBoundary> finished = [];
        Dictionary<string, (LadderStep Step, List<GasRatioPoint> Points)> running = new(StringComparer.Ordinal);
        foreach (OxideLadder ladder in ladders)
        {
            Dictionary<string, LadderStep> here = ladder.Steps.Where(step => step.OxygenPotential is not null).ToDictionary(step => step.Couple.Name);
            foreach (string gone in running.Keys.Where(name => !here.ContainsKey(name)).ToArray())
            {
                Finish(running[gone]);
                running.Remove(gone);
            }

            foreach ((string name, LadderStep step) in here)
            {
                if (!running.TryGetValue(name, out (LadderStep Step, List<GasRatioPoint> Points) run))
                {
                    running[name] = run = (step, []);
                }

                run.Points.Add(Point(ladder.Kelvin, GasReactions.RatioOfPotential(oxidation, ladder.Kelvin, step.OxygenPotential!.Value), Relative(step.Couple.Formation.Plus(1, oxidation, -1), ladder.Kelvin, covariance)));
            }
        }

        foreach ((LadderStep Step, List<GasRatioPoint> Points) run in running.Values)
        {
            Finish(run);
        }

        return [.. finished.OrderBy(boundary => boundary.Couple, StringComparer.Ordinal).ThenBy(boundary => boundary.Points[0].Kelvin)];

        void Finish((LadderStep Step, List<GasRatioPoint> Points) run)
            => finished.Add(new GasRatioBoundary(run.Step.Couple.Name, run.Step.Couple.Reduced.PhaseNames, run.Step.Couple.Oxidised.PhaseNames, [.. run.Points]));
    }
}
