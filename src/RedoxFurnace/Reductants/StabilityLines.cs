using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>Calculates the lines of a stability chart: oxygen potential of couples and reductants against temperature.</summary>
public static class StabilityLines
{
    private const double StepKelvin = 20;
    private const double BesideBreak = 0.01;

    /// <summary>All lines and crossings.</summary>
    /// <param name="request">What is asked.</param>
    /// <param name="database">Data.</param>
    /// <returns>Lines; a metal or reductant without data in the range is a note.</returns>
    /// <exception cref="RequestException">Empty or unknown selection, or a reversed range.</exception>
    /// <exception cref="NoAnswerException">No line has data in the range.</exception>
    public static StabilityResult Of(StabilityRequest request, SubstanceDatabase database)
    {
        if (request.Of.IsEmpty && request.With.IsEmpty)
        {
            throw new RequestException("the chart has no lines; name metals or oxides, such as --of Cr,Fe,Si");
        }

        if (!(request.High > request.Low))
        {
            throw new RequestException($"the temperature range {request.Low} to {request.High} is empty or reversed; the higher one goes last");
        }

        List<string> notes = [];
        List<StabilityLine> couples = [];
        foreach (string name in request.Of.Distinct())
        {
            couples.AddRange(request.Direct ? Direct(name, request, database, notes) : Ladder(name, request, database, notes));
        }

        couples = [.. couples.DistinctBy(line => (line.Id, line.Points[0].Kelvin))];
        List<StabilityLine> reductants = [.. request.With.Distinct().SelectMany(name => Reductants(name, request, database, notes))];
        if (couples.Count + reductants.Count == 0)
        {
            throw new NoAnswerException($"no line has data between {request.Low} and {request.High}: {string.Join("; ", notes)}");
        }

        ImmutableArray<StabilityLine> lines = [.. couples, .. reductants];
        return new StabilityResult(
            request,
            lines,
            [.. couples.SelectMany(couple => reductants.Where(reductant => reductant.Element != couple.Element).SelectMany(reductant => Crossings(couple, reductant)))],
            [.. notes.Distinct()],
            SourcesOf(lines, database),
            database.Hash);
    }

    /// <summary>Citations in full of lines.</summary>
    internal static ImmutableArray<string> SourcesOf(IEnumerable<StabilityLine> lines, SubstanceDatabase database)
        => [.. lines.SelectMany(line => line.Substances).Distinct()
            .SelectMany(substance => substance.Phases.Select(phase => phase.SourceKey).Append(substance.Uncertainty.SourceKey).OfType<string>())
            .Distinct().Order(StringComparer.Ordinal).Select(key => database.Sources[key].Text)];

    private static IEnumerable<StabilityLine> Ladder(string name, StabilityRequest request, SubstanceDatabase database, List<string> notes)
    {
        (OxideSystem system, Substance? only) = SystemOf(name, request, database);
        double low = Math.Max(request.Low.Kelvin, system.Elements.Max(element => element.LowestKelvin));
        double high = Math.Min(request.High.Kelvin, system.Elements.Min(element => element.HighestKelvin));
        if (!(high > low))
        {
            notes.Add($"no data for {name} between {request.Low} and {request.High}");
            return [];
        }

        ImmutableArray<LadderInvariant> changes = LadderInvariants.Between(system, low, high);
        IEnumerable<double> breaks = system.Oxides.Concat(system.Elements).SelectMany(substance => substance.Breaks).Concat(changes.Select(change => change.Kelvin));
        Dictionary<string, Builder> open = [];
        List<Builder> built = [];
        foreach (double kelvin in Grid(low, high, breaks))
        {
            OxideLadder ladder = system.LadderAt(kelvin);
            HashSet<string> here = [];
            foreach (LadderStep step in ladder.Steps)
            {
                string id = Plain(step.Couple.Name);
                if (step.OxygenPotential is not { } potential || (only is not null && !Holds(step.Couple, only)))
                {
                    continue;
                }

                here.Add(id);
                if (!open.TryGetValue(id, out Builder? line))
                {
                    line = new Builder(id, database.Covariance);
                    open.Add(id, line);
                    built.Add(line);
                }

                line.Add(kelvin, potential, step.Couple);
            }

            foreach (string gone in open.Keys.Where(id => !here.Contains(id)).ToList())
            {
                open.Remove(gone);
            }
        }

        if (built.Count == 0)
        {
            notes.Add($"no data for an oxide of {name} between {request.Low} and {request.High}");
        }

        return built.Where(line => line.Count > 1).Select(line => line.Build(Element(system), low, high, request, changes));
    }

    private static string Element(OxideSystem system) => string.Join("-", system.Elements.Select(element => element.Id));

    private static (OxideSystem System, Substance? Only) SystemOf(string name, StabilityRequest request, SubstanceDatabase database)
    {
        if (AtomicWeights.Has(name))
        {
            return (OxideSystem.OfMetal(name, database, request.Activities), null);
        }

        Substance oxide = database.Get(name);
        return (OxideSystem.OfOxide(oxide, database, request.Activities), oxide);
    }

    private static bool Holds(OxidationCouple couple, Substance oxide)
        => couple.Reduced.Parts.Concat(couple.Oxidised.Parts).Any(part => ReferenceEquals(part.Substance, oxide) || (oxide.Group is not null && part.Substance.Group == oxide.Group));

    /// <summary>A couple keeps its name when its metal boils.</summary>
    private static string Plain(string couple) => couple.Replace("(g)", "", StringComparison.Ordinal);

    private static IEnumerable<StabilityLine> Direct(string name, StabilityRequest request, SubstanceDatabase database, List<string> notes)
    {
        (OxideSystem system, Substance? only) = SystemOf(name, request, database);
        if (system.Elements.Length != 1)
        {
            throw new RequestException($"--direct draws metal to one oxide; '{name}' holds {system.Elements.Length} metals");
        }

        double middle = 0.5 * (Math.Max(request.Low.Kelvin, system.Elements[0].LowestKelvin) + Math.Min(request.High.Kelvin, system.Elements[0].HighestKelvin));
        Substance oxide = only ?? system.LadderAt(middle).Rungs.Select(rung => rung.Lowest).Skip(1).FirstOrDefault()?.Parts[0].Substance ?? system.Oxides[0];
        string metal = system.Elements[0].Id;
        double perMetal = oxide.Formula.Of(metal);
        OxidationCouple Couple(Substance reduced) => new(new Assemblage([(reduced, 1)]), new Assemblage([(oxide, 1 / perMetal)]), system.Oxygen);
        OxidationCouple condensed = Couple(system.Elements[0]);
        OxidationCouple? vapour = system.Vapours[0] is { } gas ? Couple(gas) : null;
        Builder line = new(Plain(condensed.Name), database.Covariance);
        foreach (double kelvin in Grid(request.Low.Kelvin, request.High.Kelvin, oxide.Breaks.Concat(system.Elements[0].Breaks)))
        {
            double? asLiquid = condensed.Formation.HasData(kelvin) ? condensed.OxygenPotential(kelvin, request.Activities) : null;
            double? asVapour = vapour?.Formation.HasData(kelvin) == true ? vapour.OxygenPotential(kelvin, request.Activities) : null;
            if (asLiquid is not null || asVapour is not null)
            {
                // The form of lower Gibbs energy binds less oxygen: its couple lies higher.
                bool boiled = asVapour > (asLiquid ?? double.NegativeInfinity);
                line.Add(kelvin, boiled ? asVapour!.Value : asLiquid!.Value, boiled ? vapour! : condensed);
            }
        }

        if (line.Count < 2)
        {
            notes.Add($"no data for {line.Id} between {request.Low} and {request.High}");
            return [];
        }

        return [line.Build(metal, request.Low.Kelvin, request.High.Kelvin, request, [])];
    }

    private static IEnumerable<StabilityLine> Reductants(string name, StabilityRequest request, SubstanceDatabase database, List<string> notes)
    {
        Reductant info = ReductantCatalogue.Of(database).Get(name);
        GasReactions gases = new(database);
        IEnumerable<(RankConditions Conditions, string Suffix)> variants = info.Kind switch
        {
            ReductantKind.Graphite when request.Monoxide.IsEmpty => [(new RankConditions(), " (CO + CO2 1 bar)")],
            ReductantKind.Graphite => request.Monoxide.Select(pressure => (new RankConditions { Monoxide = pressure }, $" (CO {pressure})")),
            ReductantKind.Gas => request.GasRatios.Select(ratio => (new RankConditions { GasRatio = ratio }, $" ({info.Id}/{info.Oxidised} {Printed.Brief(ratio)})")),
            _ => [(new RankConditions(), "")],
        };
        foreach ((RankConditions conditions, string suffix) in variants)
        {
            ReductantModel model = ReductantModel.Of(info, database, gases, conditions, request.Activities);
            Builder line = new(info.Id + suffix, database.Covariance);
            foreach (double kelvin in Grid(request.Low.Kelvin, request.High.Kelvin, model.Breaks))
            {
                if (TryStep(model, kelvin) is { } step)
                {
                    line.Add(kelvin, step.OxygenPotential, step.Formation);
                }
            }

            if (line.Count < 2)
            {
                notes.Add($"no data for {info.Id} between {request.Low} and {request.High}");
                continue;
            }

            yield return line.Build(info.Id, request.Low.Kelvin, request.High.Kelvin, request, []) with { IsReductant = true };
        }
    }

    private static ReductantStep? TryStep(ReductantModel model, double kelvin)
    {
        try
        {
            return model.StepsAt(kelvin, null)[0];
        }
        catch (NoAnswerException)
        {
            return null;
        }
    }

    private static SortedSet<double> Grid(double low, double high, IEnumerable<double> breaks)
    {
        SortedSet<double> grid = [low, high];
        for (double kelvin = low; kelvin < high; kelvin += StepKelvin)
        {
            grid.Add(kelvin);
        }

        foreach (double kelvin in breaks.SelectMany(at => new[] { at - BesideBreak, at + BesideBreak }).Where(at => at > low && at < high))
        {
            grid.Add(kelvin);
        }

        return grid;
    }

    private static IEnumerable<StabilityCrossing> Crossings(StabilityLine couple, StabilityLine reductant)
    {
        double[] grid = [.. couple.Points.Concat(reductant.Points).Select(point => point.Kelvin).Distinct().Order()];
        (double Kelvin, double Margin)? before = null;
        foreach (double kelvin in grid)
        {
            if (couple.At(kelvin) - reductant.At(kelvin) is not { } margin)
            {
                continue;
            }

            if (before is { } last && (last.Margin > 0) != (margin > 0))
            {
                double at = last.Kelvin + ((kelvin - last.Kelvin) * last.Margin / (last.Margin - margin));
                yield return new StabilityCrossing(couple.Id, reductant.Id, at, couple.At(at)!.Value, margin > 0);
            }

            before = (kelvin, margin);
        }
    }

    /// <summary>Gathers the points of one line and finds its marks.</summary>
    private sealed class Builder(string id, EnthalpyCovariance? covariance)
    {
        private readonly List<(double Kelvin, double Potential, Reaction Reaction)> _points = [];

        public string Id => id;

        public int Count => _points.Count;

        public void Add(double kelvin, double potential, OxidationCouple couple) => Add(kelvin, potential, couple.Formation);

        public void Add(double kelvin, double potential, Reaction reaction) => _points.Add((kelvin, potential, reaction));

        public StabilityLine Build(string element, double low, double high, StabilityRequest request, ImmutableArray<LadderInvariant> changes)
        {
            ImmutableArray<StabilityPoint> points = [.. _points.Select(point => new StabilityPoint(point.Kelvin, point.Potential, ReactionUncertainty.OfGibbs(point.Reaction, point.Kelvin, covariance)))];
            ImmutableArray<Substance> substances = [.. _points.SelectMany(point => point.Reaction.Terms.Select(term => term.Substance)).Distinct()];
            StabilityLine bare = new(id, id, element, false, _points[_points.Count / 2].Reaction.Text, points, [], substances);
            return bare with { Marks = [.. Changes(bare, substances).Concat(Boiling(bare)).Concat(Ends(bare, low, high, request, changes)).OrderBy(mark => mark.Kelvin)] };
        }

        private IEnumerable<StabilityMark> Changes(StabilityLine line, IEnumerable<Substance> substances)
        {
            foreach (Substance substance in substances.Where(substance => !substance.IsGas))
            {
                bool oxide = substance.Formula.Of("O") > 0;
                foreach ((double kelvin, Phase below, Phase above) in substance.PhaseChanges())
                {
                    bool takesPart = _points.Any(point => Math.Abs(point.Kelvin - kelvin) < StepKelvin && point.Reaction.NumberOf(substance) != 0);
                    if (takesPart && line.At(kelvin) is { } potential)
                    {
                        bool melts = below.State == MatterState.Solid && above.State == MatterState.Liquid;
                        yield return new StabilityMark(kelvin, potential, (oxide, melts) switch
                        {
                            (true, true) => StabilityMarkKind.OxideMelts,
                            (true, false) => StabilityMarkKind.OxideTransition,
                            (false, true) => StabilityMarkKind.MetalMelts,
                            _ => StabilityMarkKind.MetalTransition,
                        }, substance.Group ?? substance.Id);
                    }
                }
            }
        }

        /// <summary>Where a condensed metal gives way to its vapour, between two points.</summary>
        private IEnumerable<StabilityMark> Boiling(StabilityLine line)
        {
            for (int i = 1; i < _points.Count; i++)
            {
                Substance? gas = MetalVapour(_points[i].Reaction);
                if (gas is not null && MetalVapour(_points[i - 1].Reaction) is null)
                {
                    double kelvin = 0.5 * (_points[i].Kelvin + _points[i - 1].Kelvin);
                    yield return new StabilityMark(kelvin, line.At(kelvin)!.Value, StabilityMarkKind.MetalBoils, gas.Id);
                }
            }
        }

        private static Substance? MetalVapour(Reaction reaction)
            => reaction.Terms.Where(term => term.Number < 0 && term.Substance.IsGas && term.Substance.Formula.Atoms.Count == 1 && !term.Substance.Formula.Atoms.ContainsKey("O") && !term.Substance.Formula.Atoms.ContainsKey("H"))
                .Select(term => term.Substance).FirstOrDefault();

        private static IEnumerable<StabilityMark> Ends(StabilityLine line, double low, double high, StabilityRequest request, ImmutableArray<LadderInvariant> changes)
        {
            (StabilityPoint first, StabilityPoint last) = (line.Points[0], line.Points[^1]);
            if (first.Kelvin > low + 1 || (first.Kelvin > request.Low.Kelvin + 1 && low > request.Low.Kelvin))
            {
                yield return new StabilityMark(first.Kelvin, first.OxygenPotential, EndKind(first.Kelvin, changes), "");
            }

            if (last.Kelvin < high - 1 || (last.Kelvin < request.High.Kelvin - 1 && high < request.High.Kelvin))
            {
                yield return new StabilityMark(last.Kelvin, last.OxygenPotential, EndKind(last.Kelvin, changes), "");
            }
        }

        private static StabilityMarkKind EndKind(double kelvin, ImmutableArray<LadderInvariant> changes)
            => changes.Any(change => change.Change == Oxidation.LadderChange.Invariant && Math.Abs(change.Kelvin - kelvin) < 1)
                ? StabilityMarkKind.LadderChange
                : StabilityMarkKind.DataEnd;
    }
}
