using System.Collections.Immutable;
using System.Globalization;
using System.Text;

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

    /// <summary>Reads <c>covariance.yaml</c>.</summary>
    /// <param name="root">The document.</param>
    /// <returns>The covariance.</returns>
    /// <exception cref="DocumentException">Rows of another length than the substances ask for, or a variance below 0.</exception>
    public static EnthalpyCovariance Read(DocumentNode root)
    {
        root.AllowOnly("substances", "covariance");
        ImmutableArray<string> substances = [.. root.Required("substances").Items.Select(node => node.Text)];
        DocumentNode rows = root.Required("covariance");
        int size = 2 * substances.Length;
        if (rows.Items.Count != size)
        {
            throw DocumentException.WrongKind(rows.At, FormattableString.Invariant($"{size} rows, one for each enthalpy and then each entropy"), FormattableString.Invariant($"{rows.Items.Count}"));
        }

        double[,] covariance = new double[size, size];
        for (int i = 0; i < size; i++)
        {
            double[] row = rows.Items[i].Numbers(i + 1);
            if (row[i] < 0)
            {
                throw DocumentException.BadValue(rows.Items[i].At, "variance", rows.Items[i].Items[i].Text, "a variance is not below 0");
            }

            for (int j = 0; j <= i; j++)
            {
                covariance[i, j] = covariance[j, i] = row[j];
            }
        }

        return new EnthalpyCovariance(substances, covariance);
    }

    /// <summary>The text of <c>covariance.yaml</c>; nine digits, so that the matrix stays positive and every machine writes the same.</summary>
    /// <returns>YAML.</returns>
    public string Write()
    {
        StringBuilder text = new();
        text.Append("# Generated: do not edit. Rebuild with  redoxfurnace oxides assess --to oxides/covariance.yaml --force\n");
        text.Append("# Covariance (k = 1) of what the measured couples and the calorimetric values say together. Rows 1 to n are the enthalpies at 298.15 K,\n");
        text.Append("# J/mol, rows n + 1 to 2n the entropies, J/(mol K), each in the order of the substances; a row ends at its own variance.\n");
        text.Append("substances: [").AppendJoin(", ", Substances).Append("]\ncovariance:\n");
        for (int i = 0; i < 2 * _count; i++)
        {
            text.Append("  - [").AppendJoin(", ", Enumerable.Range(0, i + 1).Select(j => Short(_covariance[i, j]))).Append("]\n");
        }

        return text.ToString();
    }

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

    /// <summary>Variance of a weighted sum of entropies, (J/K)^2 at k = 1, not below 0.</summary>
    internal double EntropyVariance(IReadOnlyList<(Substance Substance, double Number)> terms)
    {
        double sum = 0;
        foreach ((Substance first, double firstNumber) in terms)
        {
            foreach ((Substance second, double secondNumber) in terms)
            {
                if (_index.TryGetValue(first.Id, out int i) && _index.TryGetValue(second.Id, out int j))
                {
                    sum += firstNumber * secondNumber * _covariance[i + _count, j + _count];
                }
            }
        }

        return Math.Max(0, sum);
    }

    /// <summary>Correlations too small to be told from rounding are written as 0.</summary>
    private static string Short(double value) => Math.Abs(value) < 1e-7 ? "0" : value.ToString("G9", CultureInfo.InvariantCulture);

    private double OfGibbs(int i, int j, double kelvin)
        => _covariance[i, j] - (kelvin * (_covariance[i, j + _count] + _covariance[i + _count, j])) + (kelvin * kelvin * _covariance[i + _count, j + _count]);
}
