using System.Collections.Immutable;
using System.Globalization;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Substances;

/// <summary>A chemical equation as written: names with stoichiometric numbers, reactants left of <c>=</c>.</summary>
/// <param name="Text">As written.</param>
/// <param name="Terms">Names with signed numbers: negative for reactants.</param>
public sealed record ReactionEquation(string Text, ImmutableArray<(string Name, double Number)> Terms)
{
    /// <summary>Reads <c>4 Ag + O2 = 2 Ag2O</c>; numbers may be decimals or fractions such as <c>2/3</c>, and may be left out.</summary>
    /// <param name="text">The equation.</param>
    /// <returns>The terms in the order written.</returns>
    /// <exception cref="RequestException">Not an equation.</exception>
    public static ReactionEquation Parse(string text)
    {
        string[] sides = text.Split('=', StringSplitOptions.TrimEntries);
        if (sides.Length != 2 || sides[0].Length == 0 || sides[1].Length == 0)
        {
            throw Bad(text);
        }

        return new ReactionEquation(text, [.. Side(sides[0], -1, text), .. Side(sides[1], +1, text)]);
    }

    /// <summary>Largest imbalance of any element, in atoms.</summary>
    /// <param name="formulaOf">Formula of each name.</param>
    /// <returns>0 for a balanced equation.</returns>
    public double LargestImbalance(Func<string, Formula> formulaOf)
    {
        Dictionary<string, double> sums = new(StringComparer.Ordinal);
        foreach ((string name, double number) in Terms)
        {
            foreach ((string element, double count) in formulaOf(name).Atoms)
            {
                sums[element] = sums.GetValueOrDefault(element) + (number * count);
            }
        }

        return sums.Values.Select(Math.Abs).DefaultIfEmpty(0).Max();
    }

    private static IEnumerable<(string Name, double Number)> Side(string side, int sign, string text)
    {
        foreach (string term in side.Split(" + ", StringSplitOptions.TrimEntries))
        {
            int space = term.LastIndexOf(' ');
            string name = space < 0 ? term : term[(space + 1)..];
            double number = space < 0 ? 1 : ReadNumber(term[..space].Trim(), text);
            if (name.Length == 0)
            {
                throw Bad(text);
            }

            yield return (name, sign * number);
        }
    }

    private static double ReadNumber(string text, string whole)
    {
        string[] parts = text.Split('/');
        if (parts.Length <= 2
            && double.TryParse(parts[0], NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out double top)
            && (parts.Length == 1 || double.TryParse(parts[1], NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out _)))
        {
            double bottom = parts.Length == 1 ? 1 : double.Parse(parts[1], NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture);
            if (top > 0 && bottom > 0)
            {
                return top / bottom;
            }
        }

        throw Bad(whole);
    }

    private static RequestException Bad(string text)
        => RequestException.NotAQuantity("equation", text, "such as '4 Ag + O2 = 2 Ag2O' with spaces around + and =");
}
