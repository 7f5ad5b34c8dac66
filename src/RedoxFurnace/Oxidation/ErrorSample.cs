using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>
/// Errors of substances drawn together: those an assessment weighed with their whole covariance, the others and each reaction line on their own. The same
/// seed gives the same draws. THEORY.md, section 5.
/// </summary>
internal sealed class ErrorSample
{
    private readonly int _draws;
    private readonly int _seed;
    private readonly EnthalpyCovariance? _covariance;
    private readonly Dictionary<string, (double[] Enthalpy, double[] Entropy)> _substances = [];
    private readonly Dictionary<ReactionLine, double[]> _lines = [];
    private int _own;

    public ErrorSample(int draws, int seed, EnthalpyCovariance? covariance)
    {
        _draws = draws;
        _seed = seed;
        _covariance = covariance;
        if (covariance is not null)
        {
            DrawTogether(covariance);
        }
    }

    public int Draws => _draws;

    /// <summary>Adds the error of a reaction's Gibbs energy to each draw.</summary>
    /// <param name="reaction">The reaction.</param>
    /// <param name="kelvin">K.</param>
    /// <param name="times">Weight.</param>
    /// <param name="errors">One for each draw, J.</param>
    public void Add(Reaction reaction, double kelvin, double times, double[] errors)
    {
        (List<(Substance Substance, double Number)> substances, List<(ReactionLine Line, double Number)> lines) = ReactionUncertainty.Expand(reaction, kelvin);
        foreach ((Substance substance, double number) in substances)
        {
            (double[] enthalpy, double[] entropy) = Of(substance);
            double weight = times * number;
            double cold = weight * kelvin;
            for (int i = 0; i < errors.Length; i++)
            {
                errors[i] += (weight * enthalpy[i]) - (cold * entropy[i]);
            }
        }

        foreach ((ReactionLine line, double number) in lines)
        {
            if (!_lines.TryGetValue(line, out double[]? own))
            {
                own = Normal(line.ExpandedUncertaintyOfLine!.Value / 2);
                _lines.Add(line, own);
            }

            for (int i = 0; i < errors.Length; i++)
            {
                errors[i] += times * number * own[i];
            }
        }
    }

    private (double[] Enthalpy, double[] Entropy) Of(Substance substance)
    {
        if (!_substances.TryGetValue(substance.Id, out (double[] Enthalpy, double[] Entropy) drawn))
        {
            drawn = (Normal(substance.Uncertainty.EnthalpyJoules / 2), Normal(substance.Uncertainty.EntropyJoulesPerKelvin / 2));
            _substances.Add(substance.Id, drawn);
        }

        return drawn;
    }

    private double[] Normal(double standard)
    {
        double[] values = new double[_draws];
        if (standard > 0)
        {
            Random random = new(_seed + (7919 * ++_own));
            for (int i = 0; i < _draws; i++)
            {
                values[i] = standard * Gauss(random);
            }
        }

        return values;
    }

    /// <summary>Symmetric root of the covariance by its eigenvectors, so that rounding below zero does no harm.</summary>
    private void DrawTogether(EnthalpyCovariance covariance)
    {
        int size = 2 * covariance.Substances.Length;
        // Enthalpies are near 1e3 J, entropies near 1 J/K: each is scaled by its own error first.
        double[] scale = new double[size];
        double[,] matrix = new double[size, size];
        for (int i = 0; i < size; i++)
        {
            scale[i] = Math.Sqrt(Math.Max(covariance.Entry(i, i), 0));
        }

        for (int i = 0; i < size; i++)
        {
            for (int j = 0; j < size; j++)
            {
                matrix[i, j] = scale[i] > 0 && scale[j] > 0 ? covariance.Entry(i, j) / (scale[i] * scale[j]) : i == j ? 1 : 0;
            }
        }

        MathNet.Numerics.LinearAlgebra.Factorization.Evd<double> parts = MathNet.Numerics.LinearAlgebra.Matrix<double>.Build.DenseOfArray(matrix).Evd(MathNet.Numerics.LinearAlgebra.Symmetricity.Symmetric);
        double[][] drawn = [.. Enumerable.Range(0, size).Select(_ => new double[_draws])];
        double[] direction = new double[_draws];
        for (int k = 0; k < size; k++)
        {
            double root = Math.Sqrt(Math.Max(0, parts.EigenValues[k].Real));
            if (root < 1e-9)
            {
                continue;
            }

            Random random = new(_seed + (104729 * (k + 1)));
            for (int i = 0; i < _draws; i++)
            {
                direction[i] = root * Gauss(random);
            }

            for (int row = 0; row < size; row++)
            {
                double weight = parts.EigenVectors[row, k] * scale[row];
                if (weight == 0)
                {
                    continue;
                }

                double[] target = drawn[row];
                for (int i = 0; i < _draws; i++)
                {
                    target[i] += weight * direction[i];
                }
            }
        }

        int half = size / 2;
        for (int i = 0; i < half; i++)
        {
            _substances[covariance.Substances[i]] = (drawn[i], drawn[i + half]);
        }
    }

    /// <summary>Box and Muller 1958.</summary>
    private static double Gauss(Random random) => Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
}
