using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Atmospheres;

/// <summary>The parts in the furnace: elements with activities, or with mass percents that give mole-fraction activities.</summary>
public sealed class Alloy
{
    private const double SumTolerance = 1e-6;

    private Alloy(ImmutableArray<AlloyElement> elements, Activities activities, ImmutableArray<string> notes)
    {
        Elements = elements;
        Activities = activities;
        Notes = notes;
    }

    /// <summary>In the order written; a balance that was assumed stands last.</summary>
    public ImmutableArray<AlloyElement> Elements { get; }

    /// <summary>Their activities.</summary>
    public Activities Activities { get; }

    /// <summary>What was assumed.</summary>
    public ImmutableArray<string> Notes { get; }

    /// <summary>Reads <c>Cr=0.13,Fe,V=0.01</c> (activities, 1 where none is written) or <c>Cr=18%,Ni=9%,Fe</c> (mass percents, one element without a number as the balance).</summary>
    /// <param name="text">As written.</param>
    /// <param name="coefficients">Activity coefficients against mole fraction, as <c>Cr=1.2,Mn=0.9</c>, for mass percents only; null for none.</param>
    /// <param name="database">To check the elements against.</param>
    /// <returns>The alloy.</returns>
    /// <exception cref="RequestException">Unknown element, activities and percents mixed, more than 100 %, or given twice.</exception>
    public static Alloy Parse(string text, string? coefficients, SubstanceDatabase database)
    {
        (string Symbol, string? Value)[] parts = [.. text.Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries).Select(Split)];
        if (parts.Length == 0)
        {
            throw new RequestException("--over is empty; write elements such as Cr=0.13,Fe or Cr=18%,Ni=9%,Fe");
        }

        foreach ((string symbol, _) in parts)
        {
            CheckElement(symbol, database);
            if (parts.Count(part => part.Symbol == symbol) > 1)
            {
                throw new RequestException($"--over gives {symbol} twice; keep one");
            }
        }

        int percents = parts.Count(part => part.Value?.EndsWith('%') == true);
        int numbers = parts.Count(part => part.Value is not null) - percents;
        return (percents, numbers) switch
        {
            ( > 0, > 0) => throw new RequestException($"--over '{text}' mixes activities and mass percents; give one kind"),
            ( > 0, _) => ByMass(text, parts, coefficients, database),
            _ when coefficients is not null => throw new RequestException("--coefficient goes with mass percents; an activity already holds its coefficient"),
            _ => ByActivity(parts, database),
        };
    }

    private static (string Symbol, string? Value) Split(string part)
    {
        int equals = part.IndexOf('=');
        return equals < 0 ? (part, null) : (part[..equals].Trim(), part[(equals + 1)..].Trim());
    }

    private static void CheckElement(string symbol, SubstanceDatabase database)
    {
        if (!AtomicWeights.Has(symbol))
        {
            throw RequestException.UnknownWord("element", symbol, [.. AtomicWeights.Symbols]);
        }

        if (symbol is not ("C" or "N") && database.Metal(symbol) is null)
        {
            throw new RequestException($"'{symbol}' has no condensed metal in the database; leave it out, or add it in a folder of yours");
        }
    }

    private static Alloy ByActivity((string Symbol, string? Value)[] parts, SubstanceDatabase database)
    {
        ImmutableArray<AlloyElement>.Builder elements = ImmutableArray.CreateBuilder<AlloyElement>();
        foreach ((string symbol, string? value) in parts)
        {
            double activity = value is null ? 1 : NumberWithUnit.ParsePlain(value, "--over " + symbol);
            if (!(activity > 0))
            {
                throw RequestException.OutOfRange("--over", $"{symbol}={value}", "an activity must be above 0");
            }

            elements.Add(new AlloyElement(symbol, null, null, activity, value is null ? "1, pure" : "as given"));
        }

        return Of(elements.ToImmutable(), database, []);
    }

    private static Alloy ByMass(string text, (string Symbol, string? Value)[] parts, string? coefficients, SubstanceDatabase database)
    {
        List<(string Symbol, double Percent)> masses = [];
        List<string> notes = [];
        string? balance = null;
        foreach ((string symbol, string? value) in parts)
        {
            if (value is null)
            {
                balance = balance is null ? symbol : throw new RequestException($"--over '{text}' leaves both {balance} and {symbol} without a percentage; only one can be the balance");
                continue;
            }

            double percent = 100 * Share.Parse(value, "--over " + symbol);
            masses.Add(percent > 0 ? (symbol, percent) : throw RequestException.OutOfRange("--over", $"{symbol}={value}", "a percentage must be above 0"));
        }

        double sum = masses.Sum(mass => mass.Percent);
        if (sum > 100 + SumTolerance)
        {
            throw new RequestException(FormattableString.Invariant($"--over '{text}' sums to {sum:G5} %; at most 100 % is allowed"));
        }

        if (sum < 100 - SumTolerance)
        {
            if (balance is null)
            {
                balance = masses.Any(mass => mass.Symbol == "Fe") ? masses.MaxBy(mass => mass.Percent).Symbol : "Fe";
                notes.Add(FormattableString.Invariant($"the other {100 - sum:G4} % of the alloy is taken as {balance}"));
            }

            int at = masses.FindIndex(mass => mass.Symbol == balance);
            if (at >= 0)
            {
                masses[at] = (balance, masses[at].Percent + 100 - sum);
            }
            else
            {
                masses.Add((balance, 100 - sum));
            }
        }

        return ByMoleFraction(masses, Coefficients(coefficients, masses), database, notes);
    }

    private static Alloy ByMoleFraction(List<(string Symbol, double Percent)> masses, Dictionary<string, double> coefficients, SubstanceDatabase database, List<string> notes)
    {
        double moles = masses.Sum(mass => mass.Percent / AtomicWeights.Of(mass.Symbol));
        notes.Add(coefficients.Count == 0
            ? "activities are mole fractions of the alloy (no activity coefficients): real solutions differ"
            : "activities are mole fractions times the coefficients given, and plain mole fractions for the others");
        return Of(
            [
                .. masses.Select(mass =>
                {
                    double fraction = mass.Percent / AtomicWeights.Of(mass.Symbol) / moles;
                    bool known = coefficients.TryGetValue(mass.Symbol, out double coefficient);
                    return new AlloyElement(mass.Symbol, mass.Percent, fraction, fraction * (known ? coefficient : 1), known ? "mole fraction times coefficient" : "mole fraction");
                }),
            ],
            database,
            [.. notes]);
    }

    private static Dictionary<string, double> Coefficients(string? text, List<(string Symbol, double Percent)> masses)
    {
        Dictionary<string, double> coefficients = new(StringComparer.Ordinal);
        foreach (string part in (text ?? "").Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries))
        {
            (string symbol, string? value) = Split(part);
            if (masses.All(mass => mass.Symbol != symbol))
            {
                throw RequestException.UnknownWord("--coefficient element", symbol, [.. masses.Select(mass => mass.Symbol)]);
            }

            double coefficient = NumberWithUnit.ParsePlain(value ?? "", "--coefficient " + symbol);
            coefficients[symbol] = coefficient > 0 ? coefficient : throw RequestException.OutOfRange("--coefficient", part, "a coefficient must be above 0");
        }

        return coefficients;
    }

    private static Alloy Of(ImmutableArray<AlloyElement> elements, SubstanceDatabase database, ImmutableArray<string> notes)
    {
        Activities activities = Activities.AllOne;
        foreach (AlloyElement element in elements)
        {
            if (database.Metal(element.Symbol) is { } metal)
            {
                activities = activities.With(metal, element.Activity);
            }
        }

        return new Alloy(elements, activities, notes);
    }
}
