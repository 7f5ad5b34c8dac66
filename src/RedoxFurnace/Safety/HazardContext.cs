using System.Collections.Frozen;

namespace RedoxFurnace.Safety;

/// <summary>What the safety rules look at: the substances of a piece of work, its circumstances, its temperatures.</summary>
public sealed record HazardContext
{
    private const string GasSuffix = "(g)";

    /// <summary>Gathers and checks a context. A vapour such as <c>Mg(g)</c> also counts as <c>Mg</c>.</summary>
    /// <param name="formulas">Everything present: charge, reductants, products, gases, vapours.</param>
    /// <param name="tags">Circumstances, for example <c>thermite</c>, <c>vacuum</c>, <c>cooling</c>.</param>
    /// <param name="lowestKelvin">Lowest temperature in K, above 0; null if unknown.</param>
    /// <param name="highestKelvin">Highest temperature in K, not below the lowest; null if unknown.</param>
    /// <exception cref="ArgumentOutOfRangeException">A temperature is not finite, not above 0 K, or the two are reversed.</exception>
    public HazardContext(IEnumerable<string> formulas, IEnumerable<string> tags, double? lowestKelvin = null, double? highestKelvin = null)
    {
        ArgumentNullException.ThrowIfNull(formulas);
        ArgumentNullException.ThrowIfNull(tags);
        CheckTemperature(lowestKelvin, nameof(lowestKelvin));
        CheckTemperature(highestKelvin, nameof(highestKelvin));
        if (lowestKelvin > highestKelvin)
        {
            throw new ArgumentOutOfRangeException(nameof(lowestKelvin), lowestKelvin, "The lowest temperature lies above the highest.");
        }

        Formulas = formulas.SelectMany(WithAndWithoutSuffix).ToFrozenSet(StringComparer.Ordinal);
        Elements = Formulas.SelectMany(ElementsOf).ToFrozenSet(StringComparer.Ordinal);
        Tags = tags.ToFrozenSet(StringComparer.Ordinal);
        LowestKelvin = lowestKelvin;
        HighestKelvin = highestKelvin;
    }

    /// <summary>Formulas of everything present; a vapour stands both with and without its <c>(g)</c>.</summary>
    public IReadOnlySet<string> Formulas { get; }

    /// <summary>Symbols of all elements in <see cref="Formulas"/>.</summary>
    public IReadOnlySet<string> Elements { get; }

    /// <summary>Circumstances of the work.</summary>
    public IReadOnlySet<string> Tags { get; }

    /// <summary>Lowest temperature of the work in K, or null if unknown.</summary>
    public double? LowestKelvin { get; }

    /// <summary>Highest temperature of the work in K, or null if unknown.</summary>
    public double? HighestKelvin { get; }

    /// <summary>Element symbols in a formula, in order of appearance; read by capital letters, so a made-up grade name gives the symbols it is made of.</summary>
    internal static IEnumerable<string> ElementsOf(string formula)
    {
        for (int i = 0; i < formula.Length; i++)
        {
            if (char.IsAsciiLetterUpper(formula[i]))
            {
                bool two = i + 1 < formula.Length && char.IsAsciiLetterLower(formula[i + 1]);
                yield return formula.Substring(i, two ? 2 : 1);
            }
        }
    }

    /// <summary>A formula without its mark of a vapour.</summary>
    internal static string WithoutSuffix(string formula) =>
        formula.EndsWith(GasSuffix, StringComparison.Ordinal) ? formula[..^GasSuffix.Length] : formula;

    private static IEnumerable<string> WithAndWithoutSuffix(string formula) =>
        formula.EndsWith(GasSuffix, StringComparison.Ordinal) ? [formula, WithoutSuffix(formula)] : [formula];

    private static void CheckTemperature(double? kelvin, string name)
    {
        if (kelvin is { } value && (!double.IsFinite(value) || value <= 0))
        {
            throw new ArgumentOutOfRangeException(name, value, "A temperature must be finite and above 0 K.");
        }
    }
}
