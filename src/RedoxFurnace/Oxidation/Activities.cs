using System.Collections.Immutable;
using System.Globalization;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>Activities of substances, dimensionless, above 0; 1 where none is given.</summary>
public sealed class Activities
{
    private readonly ImmutableSortedDictionary<string, double> _naturalLogs;

    private Activities(ImmutableSortedDictionary<string, double> naturalLogs, ImmutableArray<(string Name, double Activity)> given)
    {
        _naturalLogs = naturalLogs;
        Given = given;
    }

    /// <summary>All activities are 1.</summary>
    public static Activities AllOne { get; } = new(ImmutableSortedDictionary<string, double>.Empty, []);

    /// <summary>As the user gave them, in the order written.</summary>
    public ImmutableArray<(string Name, double Activity)> Given { get; }

    /// <summary>Whether no activity differs from 1.</summary>
    public bool AreAllOne => _naturalLogs.IsEmpty;

    /// <summary>Reads <c>Cr=0.2,Cr2O3=0.5</c>. An activity of wustite goes to each of its members per formula.</summary>
    /// <param name="text">Names with activities.</param>
    /// <param name="database">To find the names in.</param>
    /// <returns>The activities.</returns>
    /// <exception cref="RequestException">Unknown name, activity not above 0, a name given twice, or activities mixed with mass percents.</exception>
    public static Activities Parse(string? text, SubstanceDatabase database)
    {
        if (string.IsNullOrWhiteSpace(text))
        {
            return AllOne;
        }

        List<(string Name, double Activity)> given = [];
        ImmutableSortedDictionary<string, double>.Builder logs = ImmutableSortedDictionary.CreateBuilder<string, double>(StringComparer.Ordinal);
        string[] parts = text.Split(',', StringSplitOptions.TrimEntries);
        RefusePercents(text, parts);
        foreach (string part in parts)
        {
            (string name, double activity) = ReadPart(part);
            Substance substance = database.Get(name);
            given.Add((name, activity));
            foreach (Substance member in Members(substance, database))
            {
                if (!logs.TryAdd(member.Id, Math.Log(activity)))
                {
                    throw new RequestException($"--activity gives {name} twice; keep one");
                }
            }
        }

        return new Activities(logs.ToImmutable(), [.. given]);
    }

    /// <summary>ln a of a substance, 0 where none is given.</summary>
    /// <param name="substance">The substance.</param>
    /// <returns>Natural logarithm.</returns>
    public double NaturalLog(Substance substance) => _naturalLogs.IsEmpty ? 0 : _naturalLogs.GetValueOrDefault(substance.Id);

    /// <summary>Whether an activity of the substance was given.</summary>
    /// <param name="substance">The substance.</param>
    /// <returns>True when it was.</returns>
    public bool Has(Substance substance) => _naturalLogs.ContainsKey(substance.Id);

    /// <summary>These activities with one more, or another in its place.</summary>
    /// <param name="substance">The substance.</param>
    /// <param name="activity">Above 0.</param>
    /// <returns>New activities.</returns>
    public Activities With(Substance substance, double activity)
        => new(_naturalLogs.SetItem(substance.Id, Math.Log(activity)), [.. Given.Where(entry => entry.Name != substance.Id), (substance.Id, activity)]);

    /// <summary>For a caption: <c>a(Cr) = 0.2, a(Cr2O3) = 0.5</c>, or that all are 1.</summary>
    /// <returns>Text.</returns>
    public string Describe()
        => Given.IsEmpty
            ? "activities 1 (pure phases)"
            : string.Join(", ", Given.Select(entry => $"a({entry.Name}) = {entry.Activity.ToString("G4", CultureInfo.InvariantCulture)}")) + ", all others 1";

    private static IEnumerable<Substance> Members(Substance substance, SubstanceDatabase database)
        => substance.Group is null
            ? [substance]
            : database.OxidesOf(substance.Formula.Atoms.Keys.First(element => element != "O")).Where(oxide => oxide.Group == substance.Group);

    private static void RefusePercents(string text, string[] parts)
    {
        int percents = parts.Count(part => part.EndsWith('%'));
        if (percents > 0 && percents < parts.Length)
        {
            throw new RequestException($"--activity '{text}' mixes activities and mass percents; give one kind");
        }

        if (percents > 0)
        {
            throw new RequestException($"--activity '{text}' gives mass percents; an activity is a plain number above 0, such as Cr=0.2");
        }
    }

    private static (string Name, double Activity) ReadPart(string part)
    {
        int equals = part.IndexOf('=');
        if (equals <= 0)
        {
            throw RequestException.NotAQuantity("--activity", part, "NAME=ACTIVITY, such as Cr=0.2");
        }

        double activity = NumberWithUnit.ParsePlain(part[(equals + 1)..], "--activity " + part[..equals]);
        return activity > 0
            ? (part[..equals].Trim(), activity)
            : throw RequestException.OutOfRange("--activity", part, "an activity must be above 0");
    }
}
