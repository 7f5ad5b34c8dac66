using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charges;

/// <summary>
/// The least Gibbs energy of a charge that holds no gas: which condensed phases stand beside one another, and the chemical potential of
/// each element among them. A linear programme, because pure phases have fixed potentials (THEORY.md, section 10).
/// </summary>
internal sealed class CondensedMinimum
{
    private const double Zero = 1e-11;
    private const int MostPivots = 2000;

    private CondensedMinimum(ImmutableArray<(Substance Phase, double Moles)> phases, ImmutableArray<Substance> basis, ImmutableArray<string> elements, double[] potentials)
    {
        Phases = phases;
        Basis = basis;
        Elements = elements;
        Potentials = potentials;
    }

    /// <summary>Phases present, with moles.</summary>
    public ImmutableArray<(Substance Phase, double Moles)> Phases { get; }

    /// <summary>As many phases as elements, those of no amount among them: they fix the potentials.</summary>
    public ImmutableArray<Substance> Basis { get; }

    public ImmutableArray<string> Elements { get; }

    /// <summary>J per mole of each element.</summary>
    public double[] Potentials { get; }

    /// <summary>Finds it.</summary>
    /// <param name="amounts">Moles of each element, 0 or more.</param>
    /// <param name="candidates">Condensed phases with data at the temperature.</param>
    /// <param name="kelvin">K.</param>
    /// <exception cref="NoAnswerException">No set of condensed phases holds these elements, or the programme does not end.</exception>
    public static CondensedMinimum Of(IReadOnlyDictionary<string, double> amounts, IReadOnlyList<Substance> candidates, double kelvin)
    {
        ImmutableArray<string> elements = [.. amounts.Where(pair => pair.Value > 0).Select(pair => pair.Key).Order(StringComparer.Ordinal)];
        Substance[] phases = [.. candidates.Where(phase => phase.Formula.Atoms.Keys.All(elements.Contains))];
        int rows = elements.Length;
        int columns = phases.Length;
        double scale = elements.Max(element => amounts[element]);
        // Tableau [A | I | b] with one artificial phase an element, dear enough never to stay if it can go.
        double dear = 10 * phases.Select(phase => Math.Abs(phase.Gibbs(kelvin))).DefaultIfEmpty(1e6).Max();
        double[,] table = new double[rows, columns + rows + 1];
        double[] cost = new double[columns + rows];
        int[] basis = new int[rows];
        for (int i = 0; i < rows; i++)
        {
            for (int j = 0; j < columns; j++)
            {
                table[i, j] = phases[j].Formula.Of(elements[i]);
            }

            table[i, columns + i] = 1;
            table[i, columns + rows] = amounts[elements[i]] / scale;
            basis[i] = columns + i;
            cost[columns + i] = dear;
        }

        for (int j = 0; j < columns; j++)
        {
            cost[j] = phases[j].Gibbs(kelvin);
        }

        for (int pivot = 0; ; pivot++)
        {
            if (pivot == MostPivots)
            {
                throw new NoAnswerException("the least Gibbs energy of the condensed charge was not found; ask at a slightly different temperature");
            }

            int enter = Entering(table, cost, basis, columns, rows);
            if (enter < 0)
            {
                break;
            }

            int leave = Leaving(table, enter, basis, columns, rows);
            if (leave < 0)
            {
                throw new NoAnswerException("the charge has no least Gibbs energy among condensed phases; a phase has no data");
            }

            Pivot(table, leave, enter, rows, columns + rows + 1);
            basis[leave] = enter;
        }

        double left = Enumerable.Range(0, rows).Where(i => basis[i] >= columns).Sum(i => table[i, columns + rows]);
        if (left > 1e-9)
        {
            throw new NoAnswerException($"no set of condensed phases with data at {Temperature.FromKelvin(kelvin)} holds the elements {string.Join(", ", elements)} in these amounts");
        }

        // Dual: potentials solve sum(a_ij lambda_i) = G_j over the basis; read from the artificial columns of the final tableau.
        double[] potentials = [.. Enumerable.Range(0, rows).Select(i => Enumerable.Range(0, rows).Sum(k => cost[basis[k]] * table[k, columns + i]))];
        return new CondensedMinimum(
            [.. Enumerable.Range(0, rows).Where(i => basis[i] < columns && table[i, columns + rows] > 1e-9).Select(i => (phases[basis[i]], table[i, columns + rows] * scale))],
            [.. Enumerable.Range(0, rows).Where(i => basis[i] < columns).Select(i => phases[basis[i]])],
            elements,
            potentials);
    }

    /// <summary>The most negative reduced cost; the first among equals (so that degenerate corners do not cycle, ties are broken by order).</summary>
    private static int Entering(double[,] table, double[] cost, int[] basis, int columns, int rows)
    {
        int best = -1;
        double lowest = -1e-6;
        for (int j = 0; j < columns; j++)
        {
            double reduced = cost[j];
            for (int i = 0; i < rows; i++)
            {
                reduced -= cost[basis[i]] * table[i, j];
            }

            if (reduced < lowest)
            {
                lowest = reduced;
                best = j;
            }
        }

        return best;
    }

    private static int Leaving(double[,] table, int enter, int[] basis, int columns, int rows)
    {
        int best = -1;
        double least = double.PositiveInfinity;
        for (int i = 0; i < rows; i++)
        {
            if (table[i, enter] > Zero)
            {
                double ratio = table[i, columns + rows] / table[i, enter];
                if (ratio < least - Zero || (ratio < least + Zero && best >= 0 && basis[i] > basis[best]))
                {
                    least = ratio;
                    best = i;
                }
            }
        }

        return best;
    }

    private static void Pivot(double[,] table, int row, int column, int rows, int width)
    {
        double by = table[row, column];
        for (int j = 0; j < width; j++)
        {
            table[row, j] /= by;
        }

        for (int i = 0; i < rows; i++)
        {
            double times = table[i, column];
            if (i != row && times != 0)
            {
                for (int j = 0; j < width; j++)
                {
                    table[i, j] -= times * table[row, j];
                }
            }
        }
    }
}
