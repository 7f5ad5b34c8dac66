using System.Collections.Immutable;

namespace RedoxFurnace.Substances;

/// <summary>Covariance of the enthalpies an assessment adjusted together.</summary>
/// <remarks>THEORY.md, section 5.</remarks>
public sealed class EnthalpyCovariance
{
    private readonly ImmutableDictionary<string, int> _index;
    private readonly double[,] _covariance;

    internal EnthalpyCovariance(ImmutableArray<string> substances, double[,] covariance)
    {
        Substances = substances;
        _index = substances.Select((id, i) => KeyValuePair.Create(id, i)).ToImmutableDictionary(StringComparer.Ordinal);
        _covariance = covariance;
    }

    /// <summary>Formulas in the order of the matrix.</summary>
    public ImmutableArray<string> Substances { get; }

    /// <summary>Whether a substance is in the matrix.</summary>
    /// <param name="id">Formula.</param>
    /// <returns>True when it is.</returns>
    public bool Has(string id) => _index.ContainsKey(id);

    /// <summary>Covariance of two enthalpies.</summary>
    /// <param name="first">Formula in the matrix.</param>
    /// <param name="second">Formula in the matrix.</param>
    /// <returns>(J/mol)^2 at k = 1.</returns>
    public double Of(string first, string second) => _covariance[_index[first], _index[second]];

    /// <summary>Variance of a weighted sum of enthalpies; substances outside the matrix count nothing.</summary>
    /// <param name="terms">Substances with their weights.</param>
    /// <returns>J^2 at k = 1, not below 0.</returns>
    internal double Variance(IReadOnlyList<(Substance Substance, double Number)> terms)
    {
        double sum = 0;
        foreach ((Substance first, double firstNumber) in terms)
        {
            if (!_index.TryGetValue(first.Id, out int i))
            {
                continue;
            }

            foreach ((Substance second, double secondNumber) in terms)
            {
                if (_index.TryGetValue(second.Id, out int j))
                {
                    sum += firstNumber * secondNumber * _covariance[i, j];
                }
            }
        }

        return Math.Max(0, sum);
    }
}
