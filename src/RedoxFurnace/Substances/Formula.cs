using System.Collections.Immutable;
using System.Globalization;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Substances;

/// <summary>A chemical formula such as <c>Cr2O3</c>, <c>Fe0.947O</c>, <c>Al(OH)3</c> or <c>Mg(g)</c>.</summary>
/// <remarks>Compared by its text.</remarks>
public sealed class Formula : IEquatable<Formula>
{
    private Formula(string text, ImmutableSortedDictionary<string, double> atoms, string? state)
    {
        Text = text;
        Atoms = atoms;
        State = state;
        MolarMass = atoms.Sum(pair => pair.Value * AtomicWeights.Of(pair.Key));
    }

    /// <summary>The formula as written, state suffix included.</summary>
    public string Text { get; }

    /// <summary>Atoms per formula unit by element symbol, in alphabetical order.</summary>
    public ImmutableSortedDictionary<string, double> Atoms { get; }

    /// <summary>The state suffix: <c>g</c>, <c>l</c>, or null.</summary>
    public string? State { get; }

    /// <summary>g/mol, from <see cref="AtomicWeights"/>.</summary>
    public double MolarMass { get; }

    /// <summary>All atoms of the formula unit.</summary>
    public double AtomCount => Atoms.Values.Sum();

    /// <summary>Atoms of one element per formula unit, 0 when absent.</summary>
    /// <param name="element">Symbol.</param>
    /// <returns>The number.</returns>
    public double Of(string element) => Atoms.GetValueOrDefault(element);

    /// <summary>Reads a formula.</summary>
    /// <param name="text">Element symbols, numbers (decimals allowed), round brackets, optional suffix <c>(g)</c> or <c>(l)</c>.</param>
    /// <returns>The formula.</returns>
    /// <exception cref="RequestException">Not a formula.</exception>
    public static Formula Parse(string text)
        => TryParse(text, out Formula? formula)
            ? formula
            : throw RequestException.NotAQuantity("formula", text, "element symbols with numbers, such as Cr2O3 or Mg(g)");

    /// <summary>Reads a formula, or says no.</summary>
    /// <param name="text">As written.</param>
    /// <param name="formula">The formula when the answer is yes.</param>
    /// <returns>Whether the text is a formula of known elements.</returns>
    public static bool TryParse(string text, [System.Diagnostics.CodeAnalysis.NotNullWhen(true)] out Formula? formula)
    {
        formula = null;
        string body = text;
        string? state = null;
        foreach (string suffix in (string[])["g", "l"])
        {
            if (text.EndsWith($"({suffix})", StringComparison.Ordinal))
            {
                (body, state) = (text[..^3], suffix);
            }
        }

        int position = 0;
        SortedDictionary<string, double>? atoms = ReadGroup(body, ref position, 0);
        if (atoms is null || atoms.Count == 0 || position != body.Length)
        {
            return false;
        }

        formula = new Formula(text, atoms.ToImmutableSortedDictionary(StringComparer.Ordinal), state);
        return true;
    }

    /// <inheritdoc/>
    public bool Equals(Formula? other) => other is not null && other.Text == Text;

    /// <inheritdoc/>
    public override bool Equals(object? obj) => Equals(obj as Formula);

    /// <inheritdoc/>
    public override int GetHashCode() => Text.GetHashCode(StringComparison.Ordinal);

    /// <inheritdoc/>
    public override string ToString() => Text;

    private static SortedDictionary<string, double>? ReadGroup(string text, ref int position, int depth)
    {
        SortedDictionary<string, double> atoms = new(StringComparer.Ordinal);
        while (position < text.Length)
        {
            if (text[position] == ')')
            {
                return depth > 0 ? atoms : null;
            }

            SortedDictionary<string, double>? unit = text[position] == '(' ? ReadBracket(text, ref position, depth) : ReadElement(text, ref position);
            double? count = unit is null ? null : ReadCount(text, ref position);
            if (unit is null || count is null)
            {
                return null;
            }

            foreach ((string symbol, double number) in unit)
            {
                atoms[symbol] = atoms.GetValueOrDefault(symbol) + (number * count.Value);
            }
        }

        return depth == 0 ? atoms : null;
    }

    private static SortedDictionary<string, double>? ReadBracket(string text, ref int position, int depth)
    {
        position++;
        SortedDictionary<string, double>? inner = depth < 4 ? ReadGroup(text, ref position, depth + 1) : null;
        position++;
        return inner;
    }

    private static SortedDictionary<string, double>? ReadElement(string text, ref int position)
    {
        foreach (int length in (int[])[2, 1])
        {
            if (position + length <= text.Length && AtomicWeights.Has(text.Substring(position, length)))
            {
                string symbol = text.Substring(position, length);
                position += length;
                return new SortedDictionary<string, double>(StringComparer.Ordinal) { [symbol] = 1 };
            }
        }

        return null;
    }

    private static double? ReadCount(string text, ref int position)
    {
        int start = position;
        while (position < text.Length && (char.IsAsciiDigit(text[position]) || text[position] == '.'))
        {
            position++;
        }

        if (position == start)
        {
            return 1;
        }

        return double.TryParse(text.AsSpan(start, position - start), NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out double count) && count is > 0 and < 1000
            ? count
            : null;
    }
}
