using System.Collections.Immutable;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charges;

/// <summary>
/// What a charge becomes: the least Gibbs energy of an ideal gas and every pure condensed phase of its elements at a temperature and total pressure.
/// </summary>
/// <remarks>
/// Element potentials (White, Johnson and Dantzig 1958; NASA RP-1311, Gordon and McBride 1994): a linear programme with gas mixtures added as
/// columns finds which phases stand; Newton's method on the potentials left free by the condensed phases finishes it. Traces are carried as logarithms.
/// Derived in THEORY.md, section 10. Safe to use from several threads.
/// </remarks>
public sealed class ChargeEquilibrium
{
    /// <summary>Largest violation of an optimality condition in an answer, in units of RT.</summary>
    public const double ViolationWithin = 1e-8;

    /// <summary>Largest imbalance of an element in an answer, as a share of it.</summary>
    public const double ImbalanceWithin = 1e-9;

    private const int MostExchanges = 80;

    private readonly ImmutableArray<string> _elements;
    private readonly Substance[] _substances;

    /// <summary>Every substance of some elements.</summary>
    /// <param name="database">Data.</param>
    /// <param name="elements">At least one.</param>
    /// <exception cref="NoAnswerException">The database has no substance of them.</exception>
    public ChargeEquilibrium(SubstanceDatabase database, IEnumerable<string> elements)
    {
        _elements = [.. elements.Distinct().Order(StringComparer.Ordinal)];
        _substances = [.. database.MadeOf(_elements.ToHashSet())];
        if (_substances.Length == 0)
        {
            throw new NoAnswerException($"the database has no substance of {string.Join(", ", _elements)}");
        }
    }

    /// <summary>The elements, in the order of the amounts.</summary>
    public ImmutableArray<string> Elements => _elements;

    /// <summary>Finds the equilibrium.</summary>
    /// <param name="moles">Moles of each element, 0 or more, at least one above 0.</param>
    /// <param name="at">Temperature.</param>
    /// <param name="total">Total pressure; the gas stands at it, or there is none.</param>
    /// <returns>A converged state.</returns>
    /// <exception cref="NoAnswerException">An element has no data at the temperature, or it does not converge: an unconverged answer is never given.</exception>
    public ChargeState Solve(IReadOnlyDictionary<string, double> moles, Temperature at, Pressure total)
    {
        ArgumentNullException.ThrowIfNull(moles);
        double kelvin = at.Kelvin;
        double rt = PhysicalConstants.GasConstant * kelvin;
        string[] elements = [.. _elements.Where(element => moles.TryGetValue(element, out double amount) && amount > 0)];
        if (elements.Length == 0)
        {
            throw new NoAnswerException("the charge holds nothing");
        }

        double[] amounts = [.. elements.Select(element => moles[element])];
        double scale = amounts.Max();
        for (int i = 0; i < amounts.Length; i++)
        {
            amounts[i] /= scale;
        }

        List<Column> condensed = [];
        List<Column> gas = [];
        List<string> without = [];
        foreach (Substance substance in _substances.Where(substance => substance.Formula.Atoms.Keys.All(elements.Contains)))
        {
            if (!substance.TryGibbs(kelvin, out double gibbs))
            {
                without.Add(substance.Id);
                continue;
            }

            Column column = new(substance, [.. elements.Select(substance.Formula.Of)], gibbs / rt);
            (substance.IsGas ? gas : condensed).Add(column);
        }

        foreach (string element in elements)
        {
            if (!condensed.Concat(gas).Any(column => column.Substance.Formula.Of(element) > 0))
            {
                throw new NoAnswerException($"no substance of {element} has data at {at}");
            }
        }

        Work work = new(elements, amounts, condensed, gas, total.NaturalLogBar);
        work.FindPhases();
        for (int exchange = 0; exchange < MostExchanges; exchange++)
        {
            if (work.Refine() && !work.Exchange())
            {
                return work.ToState(at, total, scale, [.. without]);
            }
        }

        throw new NoAnswerException($"the equilibrium of this charge at {at} and {total} did not converge; ask at a slightly different temperature or pressure");
    }

    private sealed record Column(Substance Substance, double[] Atoms, double Cost);

    /// <summary>One solution in progress, everything in units of RT and of the largest element amount.</summary>
    private sealed class Work(string[] elements, double[] amounts, List<Column> condensed, List<Column> gas, double logPressure)
    {
        private const double Zero = 1e-12;
        private const int MostPivots = 4000;
        private const int MostMixtures = 400;
        private const double MixtureWithin = 1e-3;
        private const int MostSteps = 600;

        private readonly int _rows = elements.Length;
        private readonly double[] _lambda = new double[elements.Length];
        private readonly List<int> _present = [];
        private double[] _condensedMoles = [];
        private double[] _logGas = new double[gas.Count];
        private double _gasMoles;
        private bool _hasGas;

        /// <summary>Linear programme over condensed phases and gas mixtures; a mixture that would lower the Gibbs energy is added as a column until none does.</summary>
        public void FindPhases()
        {
            List<(double[] Atoms, double Cost, int Condensed)> columns = [.. condensed.Select((column, i) => (column.Atoms, column.Cost, i)), .. gas.Select(column => (column.Atoms, column.Cost + logPressure, -1))];
            double dear = 1e3 + (20 * columns.Select(column => Math.Abs(column.Cost)).DefaultIfEmpty(1).Max());
            double[,] inverse = new double[_rows, _rows];
            double[] right = new double[_rows];
            int[] basis = new int[_rows];
            double[] cost = new double[_rows];
            for (int i = 0; i < _rows; i++)
            {
                inverse[i, i] = 1;
                right[i] = 1;
                basis[i] = -1 - i;
                cost[i] = dear;
            }

            // Rows are scaled by the amounts, so that a scarce element weighs as much as the others.
            double[] Scaled(double[] atoms) => [.. atoms.Select((number, i) => number / amounts[i])];
            for (int mixture = 0; mixture < MostMixtures; mixture++)
            {
                Optimise(columns, Scaled, inverse, right, basis, cost);
                Potentials(inverse, cost);
                if (gas.Count == 0)
                {
                    break;
                }

                (double[] atoms, double reduced, double price) = Mixture();
                // With a gas Newton's method finishes; without one the programme itself must be exact.
                bool some = Enumerable.Range(0, _rows).Any(i => basis[i] >= 0 && columns[basis[i]].Condensed < 0 && right[i] > 1e-9 * Weight(columns[basis[i]].Atoms));
                if (reduced > (some ? -MixtureWithin : -ViolationWithin / 10))
                {
                    break;
                }

                columns.Add((atoms, price, -1));
            }

            _present.Clear();
            double inGas = 0;
            List<double> moles = [];
            for (int i = 0; i < _rows; i++)
            {
                if (basis[i] >= 0 && right[i] > 1e-9 * Weight(columns[basis[i]].Atoms))
                {
                    if (columns[basis[i]].Condensed is >= 0 and var index)
                    {
                        if (!_present.Contains(index))
                        {
                            _present.Add(index);
                            moles.Add(right[i]);
                        }
                    }
                    else
                    {
                        inGas += right[i];
                    }
                }
            }

            _condensedMoles = [.. moles];
            _hasGas = inGas > 0;
            _gasMoles = inGas;
            FillGas();

            // A phase's moles are large or small against the scarcest element it holds.
            double Weight(double[] atoms) => atoms.Select((number, i) => number > 0 ? amounts[i] / number : double.PositiveInfinity).Min();
        }

        private void Optimise(List<(double[] Atoms, double Cost, int Condensed)> columns, Func<double[], double[]> scaled, double[,] inverse, double[] right, int[] basis, double[] cost)
        {
            for (int pivot = 0; pivot < MostPivots; pivot++)
            {
                double[] price = new double[_rows];
                for (int i = 0; i < _rows; i++)
                {
                    for (int k = 0; k < _rows; k++)
                    {
                        price[i] += cost[k] * inverse[k, i];
                    }
                }

                int enter = -1;
                double lowest = -1e-9;
                for (int j = 0; j < columns.Count; j++)
                {
                    double[] atoms = columns[j].Atoms;
                    double reduced = columns[j].Cost;
                    double size = 0;
                    for (int i = 0; i < _rows; i++)
                    {
                        reduced -= price[i] * atoms[i] / amounts[i];
                        size += atoms[i];
                    }

                    reduced /= Math.Max(1, size);
                    if (reduced < lowest)
                    {
                        lowest = reduced;
                        enter = j;
                    }
                }

                if (enter < 0)
                {
                    return;
                }

                double[] column = scaled(columns[enter].Atoms);
                double[] direction = new double[_rows];
                double largest = 0;
                for (int i = 0; i < _rows; i++)
                {
                    for (int k = 0; k < _rows; k++)
                    {
                        direction[i] += inverse[i, k] * column[k];
                    }

                    largest = Math.Max(largest, Math.Abs(direction[i]));
                }

                int leave = -1;
                double least = double.PositiveInfinity;
                for (int i = 0; i < _rows; i++)
                {
                    if (direction[i] > 1e-10 * largest)
                    {
                        double ratio = Math.Max(0, right[i]) / direction[i];
                        if (ratio < least * (1 - 1e-12) || (ratio <= least * (1 + 1e-12) && leave >= 0 && basis[i] < basis[leave]))
                        {
                            least = ratio;
                            leave = i;
                        }
                    }
                }

                if (leave < 0)
                {
                    return;
                }

                for (int i = 0; i < _rows; i++)
                {
                    if (i == leave)
                    {
                        continue;
                    }

                    double times = direction[i] / direction[leave];
                    right[i] -= times * right[leave];
                    for (int k = 0; k < _rows; k++)
                    {
                        inverse[i, k] -= times * inverse[leave, k];
                    }
                }

                right[leave] /= direction[leave];
                for (int k = 0; k < _rows; k++)
                {
                    inverse[leave, k] /= direction[leave];
                }

                basis[leave] = enter;
                cost[leave] = columns[enter].Cost;
            }
        }

        private void Potentials(double[,] inverse, double[] cost)
        {
            for (int i = 0; i < _rows; i++)
            {
                double price = 0;
                for (int k = 0; k < _rows; k++)
                {
                    price += cost[k] * inverse[k, i];
                }

                _lambda[i] = price / amounts[i];
            }
        }

        /// <summary>The gas that would form at these potentials: its make-up, by how much it lowers the Gibbs energy a mole, and its price.</summary>
        private (double[] Atoms, double Reduced, double Price) Mixture()
        {
            FillGas();
            double top = _logGas.Max();
            double sum = _logGas.Sum(log => Math.Exp(log - top));
            double logSum = top + Math.Log(sum);
            double[] atoms = new double[_rows];
            double price = 0;
            for (int j = 0; j < gas.Count; j++)
            {
                double share = Math.Exp(_logGas[j] - logSum);
                if (share < 1e-16)
                {
                    continue;
                }

                price += share * (gas[j].Cost + logPressure + Math.Log(share));
                for (int i = 0; i < _rows; i++)
                {
                    atoms[i] += share * gas[j].Atoms[i];
                }
            }

            return (atoms, -logSum, price);
        }

        /// <summary>ln of each species' share of the gas at the present potentials.</summary>
        private void FillGas()
        {
            for (int j = 0; j < gas.Count; j++)
            {
                double log = -gas[j].Cost - logPressure;
                double[] atoms = gas[j].Atoms;
                for (int i = 0; i < _rows; i++)
                {
                    log += atoms[i] * _lambda[i];
                }

                _logGas[j] = log;
            }
        }

        /// <summary>
        /// Newton's method at a fixed set of condensed phases. They tie as many potentials as they are; the others are free, and the balances along
        /// them hold the gas alone, so that a trace of it is never the difference of two large amounts.
        /// </summary>
        /// <returns>False where the set changed on the way and another round is due.</returns>
        public bool Refine()
        {
            if (!Reduce(out int[] tied, out int[] free, out double[,] transfer))
            {
                return false;
            }

            if (!_hasGas)
            {
                return true;
            }

            int unknowns = free.Length;
            double[][] reduced = [.. gas.Select(column => Reduced(column.Atoms, tied, free, transfer))];
            double[] target = Reduced(amounts, tied, free, transfer, 0);
            double[] roughness = new double[unknowns];
            for (int r = 0; r < unknowns; r++)
            {
                roughness[r] = amounts[free[r]];
                for (int k = 0; k < tied.Length; k++)
                {
                    roughness[r] = Math.Max(roughness[r], Math.Abs(transfer[r, k] * amounts[tied[k]]));
                }

                if (Math.Abs(target[r]) < 1e-13 * roughness[r])
                {
                    target[r] = 0;
                }
            }

            double logMoles = Math.Log(Math.Max(_gasMoles, 1e-300));
            Start(tied, free, reduced, target, logMoles);
            for (int step = 0; step < MostSteps; step++)
            {
                Tie(tied, free);
                FillGas();
                double[,] jacobian = new double[unknowns + 1, unknowns + 1];
                double[] residual = new double[unknowns + 1];
                double[] weight = new double[unknowns + 1];
                double moles = Math.Exp(logMoles);
                double sum = 0;
                for (int r = 0; r < unknowns; r++)
                {
                    residual[r] = -target[r];
                    weight[r] = Math.Abs(target[r]);
                }

                for (int j = 0; j < gas.Count; j++)
                {
                    double share = Math.Exp(Math.Min(300, _logGas[j]));
                    sum += share;
                    double amount = share * moles;
                    double[] z = reduced[j];
                    for (int r = 0; r < unknowns; r++)
                    {
                        if (z[r] == 0)
                        {
                            continue;
                        }

                        residual[r] += amount * z[r];
                        weight[r] += amount * Math.Abs(z[r]);
                        for (int c = 0; c < unknowns; c++)
                        {
                            jacobian[r, c] += amount * z[r] * z[c];
                        }

                        jacobian[r, unknowns] += amount * z[r];
                        jacobian[unknowns, r] += share * z[r];
                    }
                }

                residual[unknowns] = Math.Log(sum);
                for (int c = 0; c < unknowns; c++)
                {
                    jacobian[unknowns, c] /= sum;
                }

                bool converged = Math.Abs(residual[unknowns]) < 1e-11;
                for (int r = 0; r < unknowns; r++)
                {
                    double own = weight[r] > 0 ? weight[r] : 1;
                    converged &= Math.Abs(residual[r]) <= 1e-12 * own;
                    residual[r] /= own;
                    for (int c = 0; c <= unknowns; c++)
                    {
                        jacobian[r, c] /= own;
                    }
                }

                if (converged)
                {
                    _gasMoles = moles;
                    return Amounts();
                }

                double[] change = LeastNorm(jacobian, residual);
                double largest = change.Select(Math.Abs).Max();
                if (!double.IsFinite(largest))
                {
                    return false;
                }

                double damp = Math.Min(1, 3 / Math.Max(largest, 1e-300));
                for (int r = 0; r < unknowns; r++)
                {
                    _lambda[free[r]] -= damp * change[r];
                }

                logMoles -= damp * change[unknowns];
                if (logMoles < -700 || logMoles > 700)
                {
                    _hasGas = logMoles > 0;
                    return false;
                }
            }

            return false;
        }

        /// <summary>
        /// The programme prices a scarce element coarsely: where the gas at its potential would hold far too little or far too much of it, Newton's
        /// method would start where every slope is nothing. Its potential is first set so that its most willing species holds the amount.
        /// </summary>
        private void Start(int[] tied, int[] free, double[][] reduced, double[] target, double logMoles)
        {
            const double far = 12;
            for (int round = 0; round < 3; round++)
            {
                bool moved = false;
                for (int r = 0; r < free.Length; r++)
                {
                    if (!(target[r] > 0))
                    {
                        continue;
                    }

                    Tie(tied, free);
                    FillGas();
                    double shift = double.PositiveInfinity;
                    for (int j = 0; j < gas.Count; j++)
                    {
                        double z = reduced[j][r];
                        if (z > 0)
                        {
                            shift = Math.Min(shift, (Math.Log(target[r] / z) - logMoles - _logGas[j]) / z);
                        }
                    }

                    if (double.IsFinite(shift) && Math.Abs(shift) > far)
                    {
                        _lambda[free[r]] += shift;
                        moved = true;
                    }
                }

                if (!moved)
                {
                    return;
                }
            }
        }

        /// <summary>Chooses the elements whose potentials the condensed phases tie, by elimination; a phase that depends on the others leaves.</summary>
        private bool Reduce(out int[] tied, out int[] free, out double[,] transfer)
        {
            List<int> rows = [];
            double[,] table = new double[_present.Count, _rows];
            for (int s = 0; s < _present.Count; s++)
            {
                for (int i = 0; i < _rows; i++)
                {
                    table[s, i] = condensed[_present[s]].Atoms[i];
                }
            }

            for (int s = 0; s < _present.Count; s++)
            {
                int best = -1;
                for (int i = 0; i < _rows; i++)
                {
                    if (!rows.Contains(i) && (best < 0 || Math.Abs(table[s, i]) > Math.Abs(table[s, best]) * 1.0001))
                    {
                        best = i;
                    }
                }

                if (best < 0 || Math.Abs(table[s, best]) < 1e-9)
                {
                    _present.RemoveAt(s);
                    _condensedMoles = [];
                    (tied, free, transfer) = ([], [], new double[0, 0]);
                    return false;
                }

                rows.Add(best);
                for (int t = s + 1; t < _present.Count; t++)
                {
                    double times = table[t, best] / table[s, best];
                    for (int i = 0; i < _rows; i++)
                    {
                        table[t, i] -= times * table[s, i];
                    }
                }
            }

            tied = [.. rows];
            int[] chosen = tied;
            free = [.. Enumerable.Range(0, _rows).Where(i => !chosen.Contains(i))];
            // transfer = A_F (A_P)^-1: what of the free rows the phases account for through the tied ones.
            transfer = new double[free.Length, tied.Length];
            for (int r = 0; r < free.Length; r++)
            {
                double[,] matrix = new double[tied.Length, tied.Length];
                double[] right = new double[tied.Length];
                for (int s = 0; s < tied.Length; s++)
                {
                    right[s] = condensed[_present[s]].Atoms[free[r]];
                    for (int k = 0; k < tied.Length; k++)
                    {
                        matrix[s, k] = condensed[_present[s]].Atoms[tied[k]];
                    }
                }

                double[] solved = LeastNorm(matrix, right);
                for (int k = 0; k < tied.Length; k++)
                {
                    transfer[r, k] = Math.Abs(solved[k]) < 1e-12 ? 0 : solved[k];
                }
            }

            return true;
        }

        private static double[] Reduced(double[] atoms, int[] tied, int[] free, double[,] transfer, double nothing = 1e-11)
        {
            double[] reduced = new double[free.Length];
            for (int r = 0; r < free.Length; r++)
            {
                double value = atoms[free[r]];
                for (int k = 0; k < tied.Length; k++)
                {
                    value -= transfer[r, k] * atoms[tied[k]];
                }

                reduced[r] = Math.Abs(value) < nothing ? 0 : value;
            }

            return reduced;
        }

        /// <summary>Sets the tied potentials so that every condensed phase present is in balance.</summary>
        private void Tie(int[] tied, int[] free)
        {
            if (tied.Length == 0)
            {
                return;
            }

            double[,] matrix = new double[tied.Length, tied.Length];
            double[] right = new double[tied.Length];
            for (int s = 0; s < tied.Length; s++)
            {
                Column phase = condensed[_present[s]];
                right[s] = phase.Cost;
                foreach (int i in free)
                {
                    right[s] -= phase.Atoms[i] * _lambda[i];
                }

                for (int k = 0; k < tied.Length; k++)
                {
                    matrix[s, k] = phase.Atoms[tied[k]];
                }
            }

            double[] solved = LeastNorm(matrix, right);
            for (int k = 0; k < tied.Length; k++)
            {
                _lambda[tied[k]] = solved[k];
            }
        }

        /// <summary>Moles of the condensed phases from what the gas leaves; a phase whose moles come out below nothing leaves the set.</summary>
        private bool Amounts()
        {
            double[] left = [.. amounts];
            for (int j = 0; j < gas.Count; j++)
            {
                double amount = Math.Exp(_logGas[j]) * _gasMoles;
                for (int i = 0; i < _rows; i++)
                {
                    left[i] -= amount * gas[j].Atoms[i];
                }
            }

            if (_present.Count == 0)
            {
                _condensedMoles = [];
                return true;
            }

            // Rows and columns are weighed by the amounts, so that a scarce element balances as closely as a plentiful one.
            double[,] matrix = new double[_rows, _present.Count];
            double[] unit = [.. _present.Select(index => condensed[index].Atoms.Select((number, i) => number / amounts[i]).Max())];
            for (int i = 0; i < _rows; i++)
            {
                left[i] /= amounts[i];
                for (int s = 0; s < _present.Count; s++)
                {
                    matrix[i, s] = condensed[_present[s]].Atoms[i] / amounts[i] / unit[s];
                }
            }

            double[] relative = LeastNorm(matrix, left);
            _condensedMoles = [.. relative.Select((value, s) => value / unit[s])];
            int worst = Array.IndexOf(relative, relative.Min());
            if (relative[worst] < -1e-11)
            {
                _present.RemoveAt(worst);
                return false;
            }

            return true;
        }

        /// <summary>Brings in the absent phase that most wants to form.</summary>
        /// <returns>True where the set changed.</returns>
        public bool Exchange()
        {
            FillGas();
            if (!_hasGas && gas.Count > 0)
            {
                double top = _logGas.Max();
                double logSum = top + Math.Log(_logGas.Sum(log => Math.Exp(log - top)));
                if (logSum > ViolationWithin)
                {
                    _hasGas = true;
                    _gasMoles = 1e-6;
                    return true;
                }
            }

            int best = -1;
            double most = ViolationWithin / 2;
            for (int j = 0; j < condensed.Count; j++)
            {
                double drive = _present.Contains(j) ? 0 : Drive(condensed[j]);
                if (drive > most)
                {
                    most = drive;
                    best = j;
                }
            }

            if (best < 0)
            {
                return false;
            }

            Admit(best);
            return true;
        }

        /// <summary>A phase that is a sum of those present takes the place of the one it uses up first.</summary>
        private void Admit(int phase)
        {
            if (_present.Count > 0)
            {
                double[,] matrix = new double[_rows, _present.Count];
                for (int i = 0; i < _rows; i++)
                {
                    for (int s = 0; s < _present.Count; s++)
                    {
                        matrix[i, s] = condensed[_present[s]].Atoms[i];
                    }
                }

                double[] parts = LeastNorm(matrix, condensed[phase].Atoms);
                double rest = 0;
                for (int i = 0; i < _rows; i++)
                {
                    double value = condensed[phase].Atoms[i];
                    for (int s = 0; s < _present.Count; s++)
                    {
                        value -= matrix[i, s] * parts[s];
                    }

                    rest = Math.Max(rest, Math.Abs(value));
                }

                if (rest < 1e-9 && _condensedMoles.Length == _present.Count)
                {
                    int leave = -1;
                    double least = double.PositiveInfinity;
                    for (int s = 0; s < _present.Count; s++)
                    {
                        if (parts[s] > 1e-9 && _condensedMoles[s] / parts[s] < least)
                        {
                            least = _condensedMoles[s] / parts[s];
                            leave = s;
                        }
                    }

                    if (leave >= 0)
                    {
                        _present.RemoveAt(leave);
                    }
                }
            }

            _present.Add(phase);
            _condensedMoles = [];
            if (!_hasGas)
            {
                FindPhases();
            }
        }

        private double Drive(Column column)
        {
            double drive = -column.Cost;
            for (int i = 0; i < _rows; i++)
            {
                drive += column.Atoms[i] * _lambda[i];
            }

            // Per atom, so that a large formula is no better than a small one.
            return drive / column.Atoms.Sum();
        }

        private static double[] LeastNorm(double[,] matrix, double[] right)
        {
            int rows = matrix.GetLength(0);
            int columns = matrix.GetLength(1);
            if (rows == columns && Gauss(matrix, right) is { } exact)
            {
                return exact;
            }

            return [.. MathNet.Numerics.LinearAlgebra.Matrix<double>.Build.DenseOfArray(matrix).Svd(true).Solve(MathNet.Numerics.LinearAlgebra.Vector<double>.Build.Dense(right))];
        }

        /// <summary>Elimination with row scaling and partial pivoting; null where a pivot vanishes.</summary>
        private static double[]? Gauss(double[,] matrix, double[] right)
        {
            int size = right.Length;
            double[,] a = (double[,])matrix.Clone();
            double[] b = (double[])right.Clone();
            for (int i = 0; i < size; i++)
            {
                double largest = 0;
                for (int j = 0; j < size; j++)
                {
                    largest = Math.Max(largest, Math.Abs(a[i, j]));
                }

                if (largest == 0)
                {
                    return null;
                }

                for (int j = 0; j < size; j++)
                {
                    a[i, j] /= largest;
                }

                b[i] /= largest;
            }

            for (int k = 0; k < size; k++)
            {
                int pivot = k;
                for (int i = k + 1; i < size; i++)
                {
                    if (Math.Abs(a[i, k]) > Math.Abs(a[pivot, k]))
                    {
                        pivot = i;
                    }
                }

                if (Math.Abs(a[pivot, k]) < 1e-14)
                {
                    return null;
                }

                if (pivot != k)
                {
                    for (int j = 0; j < size; j++)
                    {
                        (a[k, j], a[pivot, j]) = (a[pivot, j], a[k, j]);
                    }

                    (b[k], b[pivot]) = (b[pivot], b[k]);
                }

                for (int i = k + 1; i < size; i++)
                {
                    double times = a[i, k] / a[k, k];
                    if (times == 0)
                    {
                        continue;
                    }

                    for (int j = k; j < size; j++)
                    {
                        a[i, j] -= times * a[k, j];
                    }

                    b[i] -= times * b[k];
                }
            }

            for (int i = size - 1; i >= 0; i--)
            {
                for (int j = i + 1; j < size; j++)
                {
                    b[i] -= a[i, j] * b[j];
                }

                b[i] /= a[i, i];
            }

            return b;
        }

        public ChargeState ToState(Temperature at, Pressure total, double scale, ImmutableArray<string> without)
        {
            if (!_hasGas && _condensedMoles.Length != _present.Count)
            {
                _gasMoles = 0;
                Amounts();
            }

            double gasMoles = _hasGas ? _gasMoles : 0;
            double[] left = [.. amounts];
            double violation = 0;
            for (int s = 0; s < _present.Count; s++)
            {
                Column phase = condensed[_present[s]];
                violation = Math.Max(violation, Math.Abs(Drive(phase)));
                for (int i = 0; i < _rows; i++)
                {
                    left[i] -= _condensedMoles[s] * phase.Atoms[i];
                }
            }

            for (int j = 0; j < condensed.Count; j++)
            {
                violation = Math.Max(violation, _present.Contains(j) ? 0 : Drive(condensed[j]));
            }

            FillGas();
            double sum = _logGas.Sum(Math.Exp);
            violation = Math.Max(violation, _hasGas ? Math.Abs(Math.Log(sum)) : gas.Count > 0 ? Math.Log(Math.Max(sum, 1e-300)) : 0);
            for (int j = 0; j < gas.Count; j++)
            {
                for (int i = 0; i < _rows; i++)
                {
                    left[i] -= gasMoles * Math.Exp(_logGas[j]) * gas[j].Atoms[i];
                }
            }

            double imbalance = left.Select((value, i) => Math.Abs(value) / amounts[i]).Max();
            if (!(violation <= ViolationWithin && imbalance <= ImbalanceWithin))
            {
                throw new NoAnswerException(FormattableString.Invariant($"the equilibrium of this charge at {at} and {total} did not converge (imbalance {imbalance:G2}, violation {violation:G2} RT); ask at a slightly different temperature or pressure"));
            }

            int oxygen = gas.FindIndex(column => column.Substance.Id == "O2");
            bool fixedOxygen = oxygen >= 0 && (_hasGas || Spans(gas[oxygen].Atoms));
            return new ChargeState(
                at,
                total,
                [.. _present.Select((index, s) => new ChargePhase(condensed[index].Substance, _condensedMoles[s] * scale)).Where(phase => phase.Moles > 0).OrderByDescending(phase => phase.Kilograms)],
                _hasGas ? [.. gas.Select((column, j) => new GasShare(column.Substance, _logGas[j])).OrderByDescending(share => share.NaturalLogFraction)] : [],
                gasMoles * scale,
                fixedOxygen ? (_logGas[oxygen] + logPressure) / Math.Log(10) : null,
                fixedOxygen ? null : oxygen < 0 ? "the charge holds no oxygen" : "there is no gas, and the condensed phases alone leave the oxygen pressure open",
                imbalance,
                Math.Max(0, violation),
                without);
        }

        /// <summary>Whether a species can be written as a reaction of the condensed phases alone.</summary>
        private bool Spans(double[] atoms)
        {
            if (_present.Count == 0)
            {
                return false;
            }

            double[,] matrix = new double[_rows, _present.Count];
            for (int i = 0; i < _rows; i++)
            {
                for (int s = 0; s < _present.Count; s++)
                {
                    matrix[i, s] = condensed[_present[s]].Atoms[i];
                }
            }

            double[] parts = LeastNorm(matrix, atoms);
            for (int i = 0; i < _rows; i++)
            {
                double value = atoms[i];
                for (int s = 0; s < _present.Count; s++)
                {
                    value -= matrix[i, s] * parts[s];
                }

                if (Math.Abs(value) > 1e-9)
                {
                    return false;
                }
            }

            return true;
        }
    }
}
