using System.Collections.Immutable;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Atmospheres;

/// <summary>Equilibrium of H2, H2O, CO, CO2, CH4, O2, N2, NH3, Ar, He and graphite at a temperature and total pressure. Ideal gas.</summary>
/// <remarks>
/// 300 to 2500 K, 1e-9 to 100 bar. Elements balance within 1e-12, ln p is found within 1e-8; pressures are carried as logarithms.
/// Derived in THEORY.md, 'Gas equilibrium'. Safe to use from several threads.
/// </remarks>
public sealed class GasEquilibrium
{
    /// <summary>Lowest temperature answered, K.</summary>
    public const double LowestKelvin = 300;

    /// <summary>Highest temperature answered, K.</summary>
    public const double HighestKelvin = 2500;

    /// <summary>Lowest total pressure answered, bar.</summary>
    public const double LowestBar = 1e-9;

    /// <summary>Highest total pressure answered, bar.</summary>
    public const double HighestBar = 100;

    private const double RangeSlack = 1e-9;
    private const double BalanceWithin = 1e-12;

    private readonly GasFormation _formation;

    /// <summary>Takes the gases and graphite from a database.</summary>
    /// <param name="database">Data.</param>
    public GasEquilibrium(SubstanceDatabase database) => _formation = new GasFormation(database);

    /// <summary>The gas as analysed and at equilibrium.</summary>
    /// <param name="mixture">The analysis.</param>
    /// <param name="at">300 to 2500 K.</param>
    /// <param name="totalPressure">1e-9 to 100 bar.</param>
    /// <returns>All states.</returns>
    /// <exception cref="NoAnswerException">Outside these ranges, or not converged.</exception>
    public GasAnswer Of(GasMixture mixture, Temperature at, Pressure totalPressure)
    {
        Check(at, totalPressure);
        Span<double> logK = stackalloc double[GasFormation.Reacting];
        _formation.Fill(at.Kelvin, logK);
        GasState shifted = Shift(mixture, at.Kelvin, totalPressure.NaturalLogBar, logK);
        (GasState? without, GasState stable) = Full(mixture, at.Kelvin, totalPressure.NaturalLogBar, logK);
        return new GasAnswer(mixture, shifted, without, stable);
    }

    /// <summary>CO, CO2, H2, H2O and O2 in equilibrium with one another; methane and ammonia untouched, no graphite.</summary>
    /// <param name="mixture">The analysis.</param>
    /// <param name="at">300 to 2500 K.</param>
    /// <param name="totalPressure">1e-9 to 100 bar.</param>
    /// <returns>The state.</returns>
    /// <exception cref="NoAnswerException">Outside these ranges.</exception>
    public GasState AsAnalysed(GasMixture mixture, Temperature at, Pressure totalPressure)
    {
        Check(at, totalPressure);
        Span<double> logK = stackalloc double[GasFormation.Reacting];
        _formation.Fill(at.Kelvin, logK);
        return Shift(mixture, at.Kelvin, totalPressure.NaturalLogBar, logK);
    }

    /// <summary>Every gas in equilibrium, graphite where its activity would pass 1.</summary>
    /// <param name="mixture">The analysis.</param>
    /// <param name="at">300 to 2500 K.</param>
    /// <param name="totalPressure">1e-9 to 100 bar.</param>
    /// <returns>The state.</returns>
    /// <exception cref="NoAnswerException">Outside these ranges, or not converged.</exception>
    public GasState AtEquilibrium(GasMixture mixture, Temperature at, Pressure totalPressure)
    {
        Check(at, totalPressure);
        Span<double> logK = stackalloc double[GasFormation.Reacting];
        _formation.Fill(at.Kelvin, logK);
        return Full(mixture, at.Kelvin, totalPressure.NaturalLogBar, logK).Stable;
    }

    private static void Check(Temperature at, Pressure total)
    {
        if (at.Kelvin < LowestKelvin - RangeSlack || at.Kelvin > HighestKelvin + RangeSlack)
        {
            throw new NoAnswerException(FormattableString.Invariant(
                $"gas equilibrium at {at.Kelvin:0.#} K ({at.Celsius:0.#} C): it is reckoned from {LowestKelvin:0} to {HighestKelvin:0} K only; ask inside that range"));
        }

        if (!(total.NaturalLogBar >= Math.Log(LowestBar) - RangeSlack && total.NaturalLogBar <= Math.Log(HighestBar) + RangeSlack))
        {
            throw new NoAnswerException($"gas equilibrium at {total}: it is reckoned from 1e-9 to 100 bar only; ask inside that range");
        }
    }

    private static GasState Shift(GasMixture mixture, double kelvin, double logPressure, ReadOnlySpan<double> logK)
    {
        double carbon = mixture[GasSpecies.CO] + mixture[GasSpecies.CO2];
        double hydrogen = mixture[GasSpecies.H2] + mixture[GasSpecies.H2O];
        double oxygen = mixture[GasSpecies.O2];
        double bound = mixture[GasSpecies.CO2] + mixture[GasSpecies.H2O] + (2 * oxygen);
        double others = mixture.Fractions.Sum() - oxygen;
        double[] logs = new double[GasMixture.SpeciesCount];
        for (int i = 0; i < logs.Length; i++)
        {
            logs[i] = Math.Log(mixture.Fractions[i]) + logPressure;
        }

        if (bound == 0 || carbon + hydrogen == 0)
        {
            return new GasState(kelvin, logPressure, [.. logs], oxygen > 0 ? Math.Log(oxygen) + logPressure : null, null, 0, 1, 0, oxygen > 0 ? null : NoOxygen(mixture));
        }

        double burnt = (2 * oxygen) - mixture[GasSpecies.CO] - mixture[GasSpecies.H2];
        double carbonSplit = logK[(int)GasSpecies.CO2] - logK[(int)GasSpecies.CO];
        double hydrogenSplit = logK[(int)GasSpecies.H2O];
        GasShift shift = new(carbon, hydrogen, bound, burnt, others, logPressure, carbonSplit, hydrogenSplit);
        double v = shift.Solve();
        double u = shift.HalfLogOxygen(v);
        double moles = others + Math.Exp(v);
        double toPressure = logPressure - Math.Log(moles);
        for (int i = 0; i < logs.Length; i++)
        {
            logs[i] = Math.Log(mixture.Fractions[i]) + toPressure;
        }

        logs[(int)GasSpecies.CO] = Math.Log(carbon) - GasShift.Softplus(carbonSplit + u) + toPressure;
        logs[(int)GasSpecies.CO2] = Math.Log(carbon) - GasShift.Softplus(-carbonSplit - u) + toPressure;
        logs[(int)GasSpecies.H2] = Math.Log(hydrogen) - GasShift.Softplus(hydrogenSplit + u) + toPressure;
        logs[(int)GasSpecies.H2O] = Math.Log(hydrogen) - GasShift.Softplus(-hydrogenSplit - u) + toPressure;
        logs[(int)GasSpecies.O2] = 2 * u;
        double? activity = carbon > 0 ? logs[(int)GasSpecies.CO] - logK[(int)GasSpecies.CO] - u : null;
        return new GasState(kelvin, logPressure, [.. logs], 2 * u, activity, 0, moles, Imbalance(mixture, logs, toPressure, 0), null);
    }

    private static string NoOxygen(GasMixture mixture) => mixture.Fuel > 0
        ? "the analysis holds no H2O, CO2 or O2, so nothing fixes the oxygen pressure; give a frost point or the CO2"
        : "the analysis holds no oxygen in any form, so nothing fixes the oxygen pressure; give the ppm of O2 or H2O, no gas is free of them";

    private static (GasState? WithoutGraphite, GasState Stable) Full(GasMixture mixture, double kelvin, double logPressure, ReadOnlySpan<double> logK)
    {
        ReadOnlySpan<double> moles = mixture.Fractions.AsSpan();
        Span<double> amounts = stackalloc double[GasBalances.Count];
        for (int balance = 0; balance < amounts.Length; balance++)
        {
            amounts[balance] = GasBalances.Amount(balance, moles);
        }

        Problem problem = new(mixture, kelvin, logPressure, logK, amounts);
        Span<double> x = stackalloc double[GasNewton.Unknowns];
        if (amounts[GasBalances.Carbon] == 0)
        {
            GasState only = problem.Solve(graphite: false, x, guess: false);
            return (only, only);
        }

        // The gas cannot be without graphite where it holds carbon and no oxygen or hydrogen beyond CO and CH4.
        if (amounts[GasBalances.CarbonSlack] == 0)
        {
            return (null, problem.Solve(graphite: true, x, guess: false));
        }

        bool richInOxygen = amounts[GasBalances.BeyondMonoxide] > 0.02 * amounts[GasBalances.Carbon];
        if (richInOxygen && problem.TrySolve(graphite: false, x, guess: false) is { } first)
        {
            return first.NaturalLogCarbonActivity <= 0 ? (first, first) : (first, problem.Solve(graphite: true, x, guess: false));
        }

        GasState beside = problem.Solve(graphite: true, x, guess: false);
        if (problem.TrySolve(graphite: false, x, guess: true) is { } without)
        {
            return (without, beside.GraphiteMoles > 0 && without.NaturalLogCarbonActivity > 0 ? beside : without);
        }

        return beside.GraphiteMoles > 0 ? (null, beside) : throw problem.NotConverged();
    }

    private static double Imbalance(GasMixture mixture, ReadOnlySpan<double> logs, double toPressure, double graphite)
    {
        Span<double> moles = stackalloc double[GasMixture.SpeciesCount];
        for (int i = 0; i < moles.Length; i++)
        {
            moles[i] = Math.Exp(logs[i] - toPressure);
        }

        double worst = 0;
        foreach (int balance in (ReadOnlySpan<int>)[GasBalances.Carbon, GasBalances.Hydrogen, GasBalances.Oxygen, GasBalances.Nitrogen])
        {
            double given = GasBalances.Amount(balance, mixture.Fractions.AsSpan());
            if (given > 0)
            {
                double found = GasBalances.Amount(balance, moles) + (balance == GasBalances.Carbon ? graphite : 0);
                worst = Math.Max(worst, Math.Abs(found - given) / given);
            }
        }

        return worst;
    }

    /// <summary>One gas with its conserved amounts, solved with graphite at activity 1 or without graphite.</summary>
    private readonly ref struct Problem
    {
        private readonly GasMixture _mixture;
        private readonly double _kelvin;
        private readonly double _logPressure;
        private readonly ReadOnlySpan<double> _logK;
        private readonly ReadOnlySpan<double> _amounts;
        private readonly double _inert;

        public Problem(GasMixture mixture, double kelvin, double logPressure, ReadOnlySpan<double> logK, ReadOnlySpan<double> amounts)
        {
            _mixture = mixture;
            _kelvin = kelvin;
            _logPressure = logPressure;
            _logK = logK;
            _amounts = amounts;
            _inert = mixture[GasSpecies.Ar] + mixture[GasSpecies.He];
        }

        private bool HasCarbon => _amounts[GasBalances.Carbon] > 0;

        private bool HasHydrogen => _amounts[GasBalances.Hydrogen] > 0;

        private bool HasOxygen => _amounts[GasBalances.Oxygen] > 0;

        private bool HasNitrogen => _amounts[GasBalances.Nitrogen] > 0;

        public GasState Solve(bool graphite, Span<double> x, bool guess)
            => TrySolve(graphite, x, guess) ?? throw NotConverged();

        public NoAnswerException NotConverged() => new(FormattableString.Invariant(
            $"the equilibrium of {_mixture.Describe()} at {_kelvin:0.##} K did not converge; ask at a slightly different temperature or analysis"));

        /// <param name="graphite">Whether graphite stands beside the gas.</param>
        /// <param name="x">The unknowns: first guess where <paramref name="guess"/> says so, and the root on return.</param>
        /// <param name="guess">Whether x holds a first guess.</param>
        public GasState? TrySolve(bool graphite, Span<double> x, bool guess)
        {
            Span<int> chosen = stackalloc int[4];
            int count = GasBalances.Choose(_amounts, !graphite, chosen);
            if (HasNitrogen)
            {
                chosen[count++] = GasBalances.Nitrogen;
            }

            Span<bool> free = [HasCarbon && !graphite, HasHydrogen, HasOxygen, HasNitrogen, true];
            Span<bool> present =
            [
                HasHydrogen, HasHydrogen && HasOxygen, HasCarbon && HasOxygen, HasCarbon && HasOxygen,
                HasCarbon && HasHydrogen, HasOxygen, HasNitrogen, HasNitrogen && HasHydrogen,
            ];
            GasNewton newton = new(_logK, _amounts, chosen[..count], present, free, _inert, _logPressure);
            if (guess && newton.TrySolve(x))
            {
                return State(newton, present, graphite, x);
            }

            for (int attempt = 0; attempt < 3; attempt++)
            {
                Start(graphite, attempt, x);
                if (newton.TrySolve(x))
                {
                    return State(newton, present, graphite, x);
                }
            }

            return null;
        }

        /// <summary>
        /// First guesses: from the shift of CO, CO2, H2, H2O and O2 alone, or with every unknown as high as it can be without any one gas exceeding what there is of its elements.
        /// </summary>
        private void Start(bool graphite, int attempt, Span<double> x)
        {
            double carbon = _amounts[GasBalances.Carbon];
            double hydrogen = _amounts[GasBalances.Hydrogen];
            double oxygen = _amounts[GasBalances.Oxygen];
            double nitrogen = _amounts[GasBalances.Nitrogen];
            double moles = hydrogen + nitrogen + _inert + (graphite ? Math.Min(carbon, oxygen) : carbon) + Math.Max(0, 0.5 * _amounts[GasBalances.Burnt]);
            x.Clear();
            moles = moles > 0 ? moles : Math.Max(oxygen, 1e-300);
            x[4] = Math.Log(moles) - _logPressure;
            x[3] = HasNitrogen ? Math.Log(nitrogen) - x[4] : 0;
            if (attempt == 0 && !graphite && _amounts[GasBalances.BeyondMonoxide] > 0 && carbon + hydrogen > 0)
            {
                GasShift shift = new(
                    carbon, hydrogen, _amounts[GasBalances.BeyondMonoxide], _amounts[GasBalances.Burnt], carbon + hydrogen + nitrogen + _inert, _logPressure,
                    _logK[(int)GasSpecies.CO2] - _logK[(int)GasSpecies.CO], _logK[(int)GasSpecies.H2O]);
                double v = shift.Solve();
                double u = shift.HalfLogOxygen(v);
                x[4] = Math.Log(carbon + hydrogen + nitrogen + _inert + Math.Exp(v)) - _logPressure;
                x[2] = u;
                x[1] = HasHydrogen ? Math.Log(hydrogen) - x[4] - GasShift.Softplus(_logK[(int)GasSpecies.H2O] + u) : 0;
                x[0] = HasCarbon
                    ? Math.Log(carbon) - x[4] - GasShift.Softplus(_logK[(int)GasSpecies.CO2] - _logK[(int)GasSpecies.CO] + u) - _logK[(int)GasSpecies.CO] - u
                    : 0;
                return;
            }

            double slack = _amounts[GasBalances.CarbonSlack];
            if (attempt == 0 && !graphite && HasHydrogen && _amounts[GasBalances.BeyondMonoxide] < 0)
            {
                // Hot and short of oxygen: CO takes the oxygen, CH4 the other carbon, and H2 is what is left.
                x[1] = Math.Log(slack) - x[4];
                x[0] = Math.Log(-_amounts[GasBalances.BeyondMonoxide]) - x[4] - _logK[(int)GasSpecies.CH4] - (2 * x[1]);
                x[2] = HasOxygen ? Math.Log(oxygen) - x[4] - _logK[(int)GasSpecies.CO] - x[0] : 0;
                return;
            }

            if (HasHydrogen)
            {
                double pressure = Math.Log(hydrogen) - x[4];
                x[1] = HasCarbon && graphite ? Math.Min(pressure, 0.5 * (pressure - _logK[(int)GasSpecies.CH4])) : pressure;
            }

            if (HasOxygen)
            {
                double pressure = Math.Log(oxygen) - x[4];
                double u = 0.5 * pressure;
                if (HasHydrogen)
                {
                    u = Math.Min(u, pressure - x[1] - _logK[(int)GasSpecies.H2O]);
                }

                if (HasCarbon)
                {
                    u = Math.Min(u, Math.Min(pressure - _logK[(int)GasSpecies.CO], 0.5 * (pressure - _logK[(int)GasSpecies.CO2])));
                }

                x[2] = u - (attempt == 2 ? 5 : 0);
            }

            if (HasCarbon && !graphite)
            {
                double pressure = Math.Log(carbon) - x[4];
                x[0] = HasHydrogen ? pressure - _logK[(int)GasSpecies.CH4] - (2 * x[1]) : 0;
                if (HasOxygen)
                {
                    x[0] = Math.Min(x[0], pressure - _logK[(int)GasSpecies.CO] - x[2]);
                }
            }
        }

        private GasState? State(GasNewton newton, ReadOnlySpan<bool> present, bool graphite, ReadOnlySpan<double> x)
        {
            double[] logs = new double[GasMixture.SpeciesCount];
            Span<double> moles = stackalloc double[GasFormation.Reacting];
            double total = _inert;
            for (int i = 0; i < logs.Length; i++)
            {
                if (i >= GasFormation.Reacting)
                {
                    logs[i] = Math.Log(_mixture.Fractions[i]) - x[4];
                    continue;
                }

                double log = present[i] ? newton.LogMoles(i, x) : double.NegativeInfinity;
                moles[i] = Math.Exp(log);
                total += moles[i];
                logs[i] = log - x[4];
            }

            double deposited = graphite ? GasBalances.Graphite(_amounts, moles) : 0;

            // Below 0 the state is no answer, it only says that graphite is not stable.
            double imbalance = deposited < 0 ? 0 : Imbalance(_mixture, logs, -x[4], deposited);
            return imbalance > BalanceWithin
                ? null
                : new GasState(
                    _kelvin,
                    _logPressure,
                    ImmutableArray.Create(logs),
                    HasOxygen ? 2 * x[2] : null,
                    HasCarbon ? x[0] : null,
                    deposited,
                    total,
                    imbalance,
                    HasOxygen ? null : NoOxygen(_mixture));
        }
    }
}
