using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>Balances an equation: the numbers are the null space of the matrix of elements by substances.</summary>
/// <remarks>THEORY.md, section 11.</remarks>
public static class ReactionBalance
{
    private const double Negligible = 1e-9;
    private const int LargestMultiple = 60;

    /// <summary>The reaction of an equation: as written where it balances, otherwise with the one set of numbers that balances it.</summary>
    /// <param name="equation">As written; numbers that do not balance are dropped.</param>
    /// <param name="database">Substances.</param>
    /// <returns>The reaction, and whether the numbers are not those written.</returns>
    /// <exception cref="RequestException">An unknown substance, or one that stands twice.</exception>
    /// <exception cref="NoAnswerException">No set of numbers balances it, or several independent ones do.</exception>
    public static (Reaction Reaction, bool Changed) Of(ReactionEquation equation, SubstanceDatabase database)
    {
        (Substance Substance, double Number)[] terms = [.. equation.Terms.Select(term => (database.Get(term.Name), term.Number))];
        if (terms.GroupBy(term => term.Substance).FirstOrDefault(group => group.Count() > 1) is { } twice)
        {
            throw new RequestException($"{twice.Key.Id} stands twice in '{equation.Text}'; write each substance once");
        }

        Reaction written = Reaction.Of(terms);
        if (written.LargestImbalance() < 1e-6)
        {
            return (written, false);
        }

        List<double[]> solutions = NullSpace(terms);
        if (solutions.Count == 0)
        {
            throw new NoAnswerException($"'{equation.Text}' cannot be balanced: {WhyNone(terms)}");
        }

        if (solutions.Count > 1)
        {
            string parts = string.Join(" and ", solutions.Select(solution => $"'{Tidy(terms, solution).Text}'"));
            throw new NoAnswerException($"'{equation.Text}' has {solutions.Count} independent solutions ({parts}), so its numbers are not fixed; write the numbers, or one reaction at a time");
        }

        double[] numbers = solutions[0];
        double turn = Math.Sign(numbers.First(number => Math.Abs(number) > Negligible)) * terms[Array.FindIndex(numbers, number => Math.Abs(number) > Negligible)].Number > 0 ? 1 : -1;
        for (int i = 0; i < terms.Length; i++)
        {
            if (Math.Abs(numbers[i]) < Negligible)
            {
                throw new NoAnswerException($"'{equation.Text}' balances only without {terms[i].Substance.Id}; drop it");
            }

            if (numbers[i] * turn * terms[i].Number < 0)
            {
                throw new NoAnswerException($"'{equation.Text}' balances only with {terms[i].Substance.Id} on the other side: '{Tidy(terms, [.. numbers.Select(number => number * turn)]).Text}'");
            }
        }

        return (Tidy(terms, [.. numbers.Select(number => number * turn)]), true);
    }

    private static string WhyNone((Substance Substance, double Number)[] terms)
    {
        foreach (string element in terms.SelectMany(term => term.Substance.Formula.Atoms.Keys).Distinct())
        {
            bool left = terms.Any(term => term.Number < 0 && term.Substance.Formula.Of(element) > 0);
            bool right = terms.Any(term => term.Number > 0 && term.Substance.Formula.Of(element) > 0);
            if (!left || !right)
            {
                return $"{element} stands on the {(left ? "left" : "right")} only; add what holds it on the other side";
            }
        }

        return "no numbers satisfy all elements at once; a substance is missing";
    }

    /// <summary>Whole numbers where there are small ones, otherwise the smallest is 1.</summary>
    private static Reaction Tidy((Substance Substance, double Number)[] terms, double[] numbers)
    {
        double smallest = numbers.Where(number => Math.Abs(number) > Negligible).Min(Math.Abs);
        double scale = 1 / smallest;
        for (int times = 1; times <= LargestMultiple; times++)
        {
            if (numbers.All(number => Math.Abs((number * times / smallest) - Math.Round(number * times / smallest)) < 1e-7))
            {
                scale = times / smallest;
                break;
            }
        }

        return Reaction.Of(terms.Select((term, i) => (term.Substance, numbers[i] * scale)));
    }

    /// <summary>Reduced row echelon form; one solution for each free column.</summary>
    private static List<double[]> NullSpace((Substance Substance, double Number)[] terms)
    {
        string[] elements = [.. terms.SelectMany(term => term.Substance.Formula.Atoms.Keys).Distinct().Order(StringComparer.Ordinal)];
        int columns = terms.Length;
        double[][] rows = [.. elements.Select(element => terms.Select(term => term.Substance.Formula.Of(element)).ToArray())];
        List<int> pivots = [];
        for (int column = 0; column < columns && pivots.Count < rows.Length; column++)
        {
            int top = pivots.Count;
            int best = Enumerable.Range(top, rows.Length - top).MaxBy(row => Math.Abs(rows[row][column]));
            if (Math.Abs(rows[best][column]) < Negligible)
            {
                continue;
            }

            (rows[top], rows[best]) = (rows[best], rows[top]);
            rows[top] = [.. rows[top].Select(value => value / rows[top][column])];
            for (int row = 0; row < rows.Length; row++)
            {
                if (row != top)
                {
                    double factor = rows[row][column];
                    rows[row] = [.. rows[row].Select((value, k) => value - (factor * rows[top][k]))];
                }
            }

            pivots.Add(column);
        }

        List<double[]> solutions = [];
        foreach (int free in Enumerable.Range(0, columns).Except(pivots))
        {
            double[] solution = new double[columns];
            solution[free] = 1;
            for (int i = 0; i < pivots.Count; i++)
            {
                solution[pivots[i]] = -rows[i][free];
            }

            solutions.Add(solution);
        }

        return solutions;
    }
}
