using System.Collections.Immutable;

namespace RedoxFurnace.Substances;

/// <summary>Covariance of the enthalpies and entropies at 298.15 K that an assessment weighed together.</summary>
/// <remarks>THEORY.md, sections 5 and 11.</remarks>
public sealed class EnthalpyCovariance
{
    private readonly ImmutableDictionary<string, int> _index;
    private readonly double[,] _covariance;
    private readonly int _count;

    /// <summary>A covariance of n substances.</summary>
    /// <param name="substances">Formulas.</param>
    /// <param name="covariance">2n by 2n: first the enthalpies (J/mol), then the entropies (J/(mol K)), k = 1.</param>
    internal EnthalpyCovariance(ImmutableArray<string> substances, double[,] covariance)
    {
        Substances = substances;
        _index = substances.Select((id, i) => KeyValuePair.Create(id, i)).ToImmutableDictionary(StringComparer.Ordinal);
        _covariance = covariance;
        _count = substances.Length;
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

    /// <summary>Covariance of two Gibbs energies at one temperature.</summary>
    /// <param name="first">Formula in the matrix.</param>
    /// <param name="second">Formula in the matrix.</param>
    /// <param name="kelvin">K; 0 gives that of the enthalpies.</param>
    /// <returns>(J/mol)^2 at k = 1.</returns>
    public double OfGibbs(string first, string second, double kelvin) => OfGibbs(_index[first], _index[second], kelvin);

    /// <summary>Without some substances; the others keep their covariance.</summary>
    /// <param name="ids">Formulas to leave out.</param>
    /// <returns>The rest, or null when nothing is left.</returns>
    internal EnthalpyCovariance? Without(IReadOnlySet<string> ids)
    {
        int[] kept = [.. Enumerable.Range(0, _count).Where(i => !ids.Contains(Substances[i]))];
        if (kept.Length == 0)
        {
            return null;
        }

        int[] places = [.. kept, .. kept.Select(i => i + _count)];
        double[,] rest = new double[places.Length, places.Length];
        for (int i = 0; i < places.Length; i++)
        {
            for (int j = 0; j < places.Length; j++)
            {
                rest[i, j] = _covariance[places[i], places[j]];
            }
        }

        return new EnthalpyCovariance([.. kept.Select(i => Substances[i])], rest);
    }

    /// <summary>An entry of the whole matrix, enthalpies first.</summary>
    internal double Entry(int row, int column) => _covariance[row, column];

    /// <summary>Variance of a weighted sum of Gibbs energies; substances outside the matrix count nothing.</summary>
    /// <param name="terms">Substances with their weights.</param>
    /// <param name="kelvin">K; 0 gives the variance of the enthalpies.</param>
    /// <returns>J^2 at k = 1, not below 0.</returns>
    internal double Variance(IReadOnlyList<(Substance Substance, double Number)> terms, double kelvin)
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
                    sum += firstNumber * secondNumber * OfGibbs(i, j, kelvin);
                }
            }
        }

        return Math.Max(0, sum);
    }

    private double OfGibbs(int i, int j, double kelvin)
        => _covariance[i, j] - (kelvin * (_covariance[i, j + _count] + _covariance[i + _count, j])) + (kelvin * kelvin * _covariance[i + _count, j + _count]);
}
