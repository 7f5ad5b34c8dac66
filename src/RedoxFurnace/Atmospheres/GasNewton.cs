namespace RedoxFurnace.Atmospheres;

/// <summary>Newton's method on the logarithms of conserved sums, for the full equilibrium of a gas with or without graphite.</summary>
/// <remarks>
/// THEORY.md, 'Gas equilibrium'. Unknowns: ln of carbon activity, ln pH2, ln(pO2)/2, ln pN2 and ln of moles per bar. Each equation sets the logarithm
/// of a sum of positive terms against the logarithm of a given amount; such an equation is nearly linear far from the root as well as near it, so few steps serve even
/// where the first guess is wrong by hundreds of powers of ten.
/// </remarks>
internal ref struct GasNewton
{
    public const int Unknowns = 5;

    private const int MostSteps = 120;
    private const int MostDampedSteps = 400;
    private const double Within = 4e-13;

    /// <summary>Powers of the unknowns (carbon, hydrogen, root of oxygen, nitrogen) in each species.</summary>
    private static readonly double[][] Powers =
    [
        [0, 1, 0, 0],
        [0, 1, 1, 0],
        [1, 0, 1, 0],
        [1, 0, 2, 0],
        [1, 2, 0, 0],
        [0, 0, 2, 0],
        [0, 0, 0, 1],
        [0, 1.5, 0, 0.5],
    ];

    private readonly ReadOnlySpan<double> _logK;
    private readonly ReadOnlySpan<double> _amounts;
    private readonly ReadOnlySpan<int> _balances;
    private readonly ReadOnlySpan<bool> _present;
    private readonly ReadOnlySpan<bool> _free;
    private readonly double _inert;
    private readonly double _logPressure;

    /// <param name="logK">ln of formation constants.</param>
    /// <param name="amounts">Conserved amounts, in the order of <see cref="GasBalances"/>.</param>
    /// <param name="balances">The balances to hold.</param>
    /// <param name="present">Species that can be there.</param>
    /// <param name="free">Which unknowns are to be found; the others stay as given.</param>
    /// <param name="inert">Moles of argon and helium.</param>
    /// <param name="logPressure">ln of total pressure in bar.</param>
    public GasNewton(
        ReadOnlySpan<double> logK,
        ReadOnlySpan<double> amounts,
        ReadOnlySpan<int> balances,
        ReadOnlySpan<bool> present,
        ReadOnlySpan<bool> free,
        double inert,
        double logPressure)
    {
        _logK = logK;
        _amounts = amounts;
        _balances = balances;
        _present = present;
        _free = free;
        _inert = inert;
        _logPressure = logPressure;
    }

    /// <summary>ln of moles of a species.</summary>
    public readonly double LogMoles(int species, ReadOnlySpan<double> x)
    {
        double[] powers = Powers[species];
        return x[4] + _logK[species] + (powers[0] * x[0]) + (powers[1] * x[1]) + (powers[2] * x[2]) + (powers[3] * x[3]);
    }

    /// <summary>Finds the unknowns from a first guess: plain steps, and damped ones where plain steps lead nowhere.</summary>
    /// <returns>Whether they were found.</returns>
    public readonly bool TrySolve(Span<double> x)
    {
        Span<double> trial = stackalloc double[Unknowns];
        x.CopyTo(trial);
        if (TryNewton(trial))
        {
            trial.CopyTo(x);
            return true;
        }

        return TryDamped(x) && TryNewton(x);
    }

    private readonly bool TryNewton(Span<double> x)
    {
        int size = _balances.Length + 1;
        Span<double> residual = stackalloc double[Unknowns];
        Span<double> jacobian = stackalloc double[Unknowns * Unknowns];
        Span<double> trial = stackalloc double[Unknowns];
        Span<double> step = stackalloc double[Unknowns];
        double merit = Evaluate(x, residual, jacobian, size);
        for (int iteration = 0; iteration < MostSteps; iteration++)
        {
            bool isLast = merit < Within;
            residual[..size].CopyTo(step);
            if (!TryEliminate(jacobian, step, size))
            {
                return isLast;
            }

            if (isLast)
            {
                // One step more costs little and leaves only rounding, which several equations cannot add up to a visible imbalance.
                Move(x, step, 1, trial);
                if (Evaluate(trial, residual, jacobian, size) < merit)
                {
                    trial.CopyTo(x);
                }

                return true;
            }

            double length = 1;
            double found = double.PositiveInfinity;
            for (int halving = 0; halving < 8; halving++, length *= 0.5)
            {
                Move(x, step, length, trial);
                found = Evaluate(trial, residual, jacobian, size);
                if (found < merit * (1 - (1e-4 * length)) || found < Within)
                {
                    break;
                }
            }

            if (!(found < merit))
            {
                // Rounding has been reached where no step helps any more.
                return merit < 5 * Within;
            }

            trial.CopyTo(x);
            merit = found;
        }

        return false;
    }

    /// <summary>
    /// Levenberg-Marquardt steps. Where one gas rules two balances the plain matrix is singular; the damped one moves on until another gas matters.
    /// </summary>
    private readonly bool TryDamped(Span<double> x)
    {
        int size = _balances.Length + 1;
        Span<double> residual = stackalloc double[Unknowns];
        Span<double> jacobian = stackalloc double[Unknowns * Unknowns];
        Span<double> normal = stackalloc double[Unknowns * Unknowns];
        Span<double> trial = stackalloc double[Unknowns];
        Span<double> step = stackalloc double[Unknowns];
        Span<double> trialResidual = stackalloc double[Unknowns];
        Span<double> trialJacobian = stackalloc double[Unknowns * Unknowns];
        double damping = 1e-3;
        Evaluate(x, residual, jacobian, size);
        double merit = SumOfSquares(residual[..size]);
        for (int iteration = 0; iteration < MostDampedSteps && merit > 1e-8; iteration++)
        {
            for (int row = 0; row < size; row++)
            {
                step[row] = 0;
                for (int column = 0; column < size; column++)
                {
                    double sum = row == column ? damping : 0;
                    for (int k = 0; k < size; k++)
                    {
                        sum += jacobian[(k * size) + row] * jacobian[(k * size) + column];
                    }

                    normal[(row * size) + column] = sum;
                    step[row] += jacobian[(column * size) + row] * residual[column];
                }
            }

            if (!TryEliminate(normal, step, size))
            {
                return false;
            }

            Move(x, step, 1, trial);
            Evaluate(trial, trialResidual, trialJacobian, size);
            double found = SumOfSquares(trialResidual[..size]);
            if (found < merit)
            {
                trial.CopyTo(x);
                trialResidual.CopyTo(residual);
                trialJacobian.CopyTo(jacobian);
                merit = found;
                damping = Math.Max(damping * 0.2, 1e-14);
            }
            else
            {
                damping *= 5;
                if (damping > 1e12)
                {
                    return false;
                }
            }
        }

        return merit <= 1e-8;
    }

    private static double SumOfSquares(ReadOnlySpan<double> values)
    {
        double sum = 0;
        foreach (double value in values)
        {
            sum += value * value;
        }

        return double.IsFinite(sum) ? sum : double.PositiveInfinity;
    }

    private readonly void Move(ReadOnlySpan<double> x, ReadOnlySpan<double> step, double length, Span<double> trial)
    {
        for (int i = 0, k = 0; i < Unknowns; i++)
        {
            trial[i] = x[i] - (_free[i] ? length * step[k++] : 0);
        }
    }

    private readonly double Evaluate(ReadOnlySpan<double> x, Span<double> residual, Span<double> jacobian, int size)
    {
        Span<double> logs = stackalloc double[GasFormation.Reacting];
        Span<double> moles = stackalloc double[GasFormation.Reacting];
        double highest = double.NegativeInfinity;
        for (int i = 0; i < logs.Length; i++)
        {
            logs[i] = _present[i] ? LogMoles(i, x) : double.NegativeInfinity;
            highest = Math.Max(highest, logs[i]);
        }

        // Terms are scaled by a common power so that a poor guess neither overflows nor vanishes altogether.
        double shift = highest > 600 ? highest - 600 : 0;
        double scale = Math.Exp(-shift);
        for (int i = 0; i < logs.Length; i++)
        {
            moles[i] = Math.Exp(logs[i] - shift);
        }

        jacobian[..(size * size)].Clear();
        double worst = 0;
        for (int row = 0; row < size - 1; row++)
        {
            residual[row] = Row(GasBalances.WeightsOf(_balances[row]), _amounts[_balances[row]], logs, moles, shift, scale, jacobian.Slice(row * size, size));
            worst = Math.Max(worst, Math.Abs(residual[row]));
        }

        residual[size - 1] = TotalRow(x, moles, shift, scale, jacobian.Slice((size - 1) * size, size));
        return Math.Max(worst, Math.Abs(residual[size - 1]));
    }

    /// <summary>ln(positive terms + ...) - ln(negative terms + ...), with the given amount on the side that makes both positive.</summary>
    private readonly double Row(double[] weights, double amount, ReadOnlySpan<double> logs, ReadOnlySpan<double> moles, double shift, double scale, Span<double> row)
    {
        double left = amount < 0 ? -amount * scale : 0;
        double right = amount > 0 ? amount * scale : 0;
        double leftHighest = double.NegativeInfinity;
        double rightHighest = double.NegativeInfinity;
        for (int i = 0; i < weights.Length; i++)
        {
            if (weights[i] > 0)
            {
                left += weights[i] * moles[i];
                leftHighest = Math.Max(leftHighest, logs[i]);
            }
            else if (weights[i] < 0)
            {
                right -= weights[i] * moles[i];
                rightHighest = Math.Max(rightHighest, logs[i]);
            }
        }

        // A side whose every term vanishes in a double keeps its largest one by its logarithm, so that the direction is not lost.
        double leftLog = left > 0 ? Math.Log(left) : leftHighest - shift;
        double rightLog = right > 0 ? Math.Log(right) : rightHighest - shift;
        for (int i = 0; i < weights.Length; i++)
        {
            if (weights[i] != 0 && _present[i])
            {
                bool isLeft = weights[i] > 0;
                double side = isLeft ? left : right;
                double share = side > 0 ? weights[i] * moles[i] / side : logs[i] >= (isLeft ? leftHighest : rightHighest) ? Math.Sign(weights[i]) : 0;
                Add(row, i, share);
            }
        }

        return leftLog - rightLog;
    }

    private readonly double TotalRow(ReadOnlySpan<double> x, ReadOnlySpan<double> moles, double shift, double scale, Span<double> row)
    {
        double total = _inert * scale;
        for (int i = 0; i < moles.Length; i++)
        {
            total += moles[i];
        }

        for (int i = 0; i < moles.Length; i++)
        {
            if (_present[i])
            {
                Add(row, i, moles[i] / total);
            }
        }

        row[^1] -= 1;
        return Math.Log(total) + shift - (x[4] + _logPressure);
    }

    private readonly void Add(Span<double> row, int species, double share)
    {
        double[] powers = Powers[species];
        int column = 0;
        for (int k = 0; k < 4; k++)
        {
            if (_free[k])
            {
                row[column++] += share * powers[k];
            }
        }

        row[column] += share;
    }

    private static bool TryEliminate(Span<double> matrix, Span<double> right, int size)
    {
        for (int pivot = 0; pivot < size; pivot++)
        {
            int best = pivot;
            for (int row = pivot + 1; row < size; row++)
            {
                if (Math.Abs(matrix[(row * size) + pivot]) > Math.Abs(matrix[(best * size) + pivot]))
                {
                    best = row;
                }
            }

            double top = matrix[(best * size) + pivot];
            if (!(Math.Abs(top) > 1e-300))
            {
                return false;
            }

            if (best != pivot)
            {
                for (int column = 0; column < size; column++)
                {
                    (matrix[(best * size) + column], matrix[(pivot * size) + column]) = (matrix[(pivot * size) + column], matrix[(best * size) + column]);
                }

                (right[best], right[pivot]) = (right[pivot], right[best]);
            }

            for (int row = pivot + 1; row < size; row++)
            {
                double factor = matrix[(row * size) + pivot] / top;
                if (factor != 0)
                {
                    for (int column = pivot; column < size; column++)
                    {
                        matrix[(row * size) + column] -= factor * matrix[(pivot * size) + column];
                    }

                    right[row] -= factor * right[pivot];
                }
            }
        }

        for (int row = size - 1; row >= 0; row--)
        {
            double sum = right[row];
            for (int column = row + 1; column < size; column++)
            {
                sum -= matrix[(row * size) + column] * right[column];
            }

            right[row] = sum / matrix[(row * size) + row];
        }

        return true;
    }
}
