using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>A reductant ready to be evaluated at any temperature.</summary>
internal abstract class ReductantModel(Reductant info)
{
    public Reductant Info { get; } = info;

    /// <summary>Substances whose data limit the temperature.</summary>
    public abstract IReadOnlyList<Substance> Limiting { get; }

    /// <summary>Whether gas of the reductant's own side depends on the total pressure.</summary>
    public abstract bool FeelsPressure { get; }

    /// <summary>Temperatures at which its data have a break, K.</summary>
    public IEnumerable<double> Breaks => Limiting.SelectMany(substance => substance.Breaks);

    /// <summary>Lowest temperature with data, K.</summary>
    public double LowestKelvin => Limiting.Max(substance => substance.LowestKelvin);

    /// <summary>Highest temperature with data, K.</summary>
    public virtual double HighestKelvin => Limiting.Min(substance => substance.HighestKelvin);

    /// <summary>Steps from the fresh reductant upwards; the first decides whether it reduces.</summary>
    /// <param name="kelvin">K.</param>
    /// <param name="logGasPressure">ln(p/bar) its gases share by stoichiometry; null puts each gas at 1 bar (CO + CO2 over graphite together).</param>
    /// <exception cref="OutsideDataException">No data.</exception>
    public abstract IReadOnlyList<ReductantStep> StepsAt(double kelvin, double? logGasPressure);

    /// <summary>Whether a substance is the reductant itself.</summary>
    public abstract bool IsFresh(Substance substance);

    /// <summary>The reductant as it lies at 25 C.</summary>
    public virtual Substance AtRoomTemperature(Substance fresh) => fresh;

    public static ReductantModel Of(Reductant info, SubstanceDatabase database, GasReactions gases, RankConditions conditions, Activities activities) => info.Kind switch
    {
        ReductantKind.Graphite => new GraphiteModel(info, gases, conditions.Monoxide),
        ReductantKind.Gas => new GasModel(info, gases, Math.Log(conditions.RatioOf(info.Id))),
        ReductantKind.Metal => new MetalModel(info, OxideSystem.OfMetal(info.Metal!, database, activities)),
        _ => new ReactionModel(info, database, activities),
    };

    private sealed class GraphiteModel(Reductant info, GasReactions gases, Pressure? monoxide) : ReductantModel(info)
    {
        private const double WrittenPure = 0.995;

        public override IReadOnlyList<Substance> Limiting => [gases.Graphite, gases.CarbonMonoxide, gases.CarbonDioxide];

        public override bool FeelsPressure => monoxide is null;

        public override bool IsFresh(Substance substance) => ReferenceEquals(substance, gases.Graphite);

        public override IReadOnlyList<ReductantStep> StepsAt(double kelvin, double? logGasPressure)
        {
            if (monoxide is { } fixedPressure)
            {
                double potential = gases.GraphiteToMonoxide.StandardGibbs(kelvin) + (2 * PhysicalConstants.GasConstant * kelvin * fixedPressure.NaturalLogBar);
                return [new ReductantStep(gases.GraphiteToMonoxide, gases.GraphiteToMonoxide, potential, "CO", 2)];
            }

            (double share, double mixed) = gases.AboveGraphite(kelvin, logGasPressure ?? 0);
            Reaction formation = Formation(share);
            string product = share >= WrittenPure ? "CO" : share <= 1 - WrittenPure ? "CO2" : "CO + CO2";
            return [new ReductantStep(formation, formation, mixed, product, 2 / (2 - share))];
        }

        private Reaction Formation(double share)
        {
            if (share >= WrittenPure)
            {
                return gases.GraphiteToMonoxide;
            }

            if (share <= 1 - WrittenPure)
            {
                return gases.GraphiteToDioxide;
            }

            double perO2 = 2 / (2 - share);
            return Reaction.Of([(gases.Graphite, -perO2), (gases.Oxygen, -1), (gases.CarbonMonoxide, perO2 * share), (gases.CarbonDioxide, perO2 * (1 - share))]);
        }
    }

    private sealed class GasModel(Reductant info, GasReactions gases, double logRatio) : ReductantModel(info)
    {
        private readonly Reaction _oxidation = info.Id == "H2" ? gases.HydrogenOxidation : gases.CarbonMonoxideOxidation;

        public override IReadOnlyList<Substance> Limiting => [.. _oxidation.Terms.Select(term => term.Substance)];

        public override bool FeelsPressure => false;

        public override bool IsFresh(Substance substance) => substance.Id == Info.Id;

        public override IReadOnlyList<ReductantStep> StepsAt(double kelvin, double? logGasPressure)
        {
            double potential = GasReactions.PotentialOfRatio(_oxidation, kelvin, logRatio);
            return [new ReductantStep(_oxidation, _oxidation, potential, Info.Oxidised ?? Info.Id, 2 * (1 + Math.Exp(logRatio)))];
        }
    }

    private sealed class MetalModel(Reductant info, OxideSystem system) : ReductantModel(info)
    {
        public override IReadOnlyList<Substance> Limiting => [system.Elements[0]];

        public override bool FeelsPressure => system.Vapours[0] is not null;

        public override double HighestKelvin
            => Math.Min(system.Elements[0].HighestKelvin, system.Oxides.Max(oxide => oxide.HighestKelvin));

        public override bool IsFresh(Substance substance) => ReferenceEquals(substance, system.Elements[0]) || ReferenceEquals(substance, system.Vapours[0]);

        public override Substance AtRoomTemperature(Substance fresh) => system.Elements[0];

        public override IReadOnlyList<ReductantStep> StepsAt(double kelvin, double? logGasPressure)
        {
            OxideLadder ladder = system.LadderAt(kelvin, logGasPressure ?? 0);
            List<ReductantStep> steps = new(ladder.Steps.Length);
            Assemblage fresh = ladder.Rungs[0].Lowest;
            for (int i = 0; i < ladder.Steps.Length; i++)
            {
                LadderStep step = ladder.Steps[i];
                if (step.OxygenPotential is not { } potential)
                {
                    break;
                }

                Reaction whole = i == 0 ? step.Couple.Formation : new OxidationCouple(fresh, ladder.Rungs[i + 1].Lowest, system.Oxygen).Formation;
                steps.Add(new ReductantStep(step.Couple.Formation, whole, potential, ladder.Rungs[i + 1].Name, 0));
            }

            return steps.Count > 0
                ? steps
                : throw OutsideDataException.Of(system.Oxides.MaxBy(oxide => oxide.HighestKelvin)!, kelvin);
        }
    }

    private sealed class ReactionModel : ReductantModel
    {
        private readonly IReadOnlyList<(Reaction Formation, string Product)> _reactions;
        private readonly Activities _activities;
        private readonly Substance _fresh;

        public ReactionModel(Reductant info, SubstanceDatabase database, Activities activities)
            : base(info)
        {
            _activities = activities;
            _fresh = database.Get(info.Id);
            _reactions = [.. info.Reactions.Select(equation => Normalised(equation, database))];
        }

        public override IReadOnlyList<Substance> Limiting => [_fresh, .. _reactions[0].Formation.Terms.Where(term => term.Number > 0).Select(term => term.Substance)];

        public override bool FeelsPressure => true;

        public override bool IsFresh(Substance substance) => ReferenceEquals(substance, _fresh);

        public override IReadOnlyList<ReductantStep> StepsAt(double kelvin, double? logGasPressure)
        {
            List<ReductantStep> steps = [.. _reactions.Select(reaction => StepOf(reaction.Formation, reaction.Product, kelvin, logGasPressure))];
            steps.Sort((a, b) => a.OxygenPotential.CompareTo(b.OxygenPotential));
            return steps;
        }

        private static (Reaction Formation, string Product) Normalised(ReactionEquation equation, SubstanceDatabase database)
        {
            Reaction reaction = Reaction.Of(equation.Terms.Select(term => (database.Get(term.Name), term.Number)));
            double oxygen = -reaction.NumberOf(database.Get("O2"));
            if (oxygen <= 0 || reaction.LargestImbalance() > 1e-9)
            {
                throw new RequestException($"the reductant reaction '{equation.Text}' must be balanced and have O2 on its left");
            }

            Reaction perO2 = reaction.Times(1 / oxygen);
            return (perO2, string.Join(" + ", perO2.Terms.Where(term => term.Number > 0).Select(term => term.Substance.Id)));
        }

        /// <summary>Gases made share the pressure by their numbers; the gaseous reductant itself stands at the whole of it.</summary>
        private ReductantStep StepOf(Reaction formation, string product, double kelvin, double? logGasPressure)
        {
            double made = formation.Terms.Where(term => term.Number > 0 && term.Substance.IsGas).Sum(term => term.Number);
            double mixing = 0;
            foreach ((Substance substance, double number) in formation.Terms)
            {
                mixing += substance.Id == "O2" ? 0 : number * LogActivity(substance, number, made, logGasPressure);
            }

            return new ReductantStep(formation, formation, formation.StandardGibbs(kelvin) + (PhysicalConstants.GasConstant * kelvin * mixing), product, made);
        }

        private double LogActivity(Substance substance, double number, double made, double? logGasPressure)
        {
            if (!substance.IsGas)
            {
                return _activities.NaturalLog(substance);
            }

            return logGasPressure is { } total ? total + (number > 0 ? Math.Log(number / made) : 0) : 0;
        }
    }
}
