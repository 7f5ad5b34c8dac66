using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Assessments;

/// <summary>How far the database stands from published Gibbs energies of formation and from measured couples that were kept out.</summary>
public static class PublishedComparison
{
    /// <summary>Published Gibbs energies of formation, substance by substance; temperatures without data are left out.</summary>
    /// <param name="rows">Formula, K, kJ per mol of formula.</param>
    /// <param name="reasonOf">Why a substance may differ at a temperature, or null.</param>
    /// <param name="table">Name of the table.</param>
    /// <param name="database">Data.</param>
    /// <returns>By formula.</returns>
    public static ImmutableArray<PublishedDifference> Formation(IEnumerable<(string Formula, double Kelvin, double Kilojoules)> rows, Func<string, double, string?> reasonOf, string table, SubstanceDatabase database)
        => [.. rows.GroupBy(row => row.Formula).OrderBy(group => group.Key, StringComparer.Ordinal).Select(group => Largest(group, reasonOf, table, database)).OfType<PublishedDifference>()];

    /// <summary>Measurements the adjustment never saw, couple by couple.</summary>
    /// <param name="result">The assessment.</param>
    /// <returns>In the order of the measurements.</returns>
    public static ImmutableArray<PublishedDifference> KeptOut(AssessmentResult result)
        => [.. result.Measurements.Where(item => !item.Measurement.IsFit).Select(item =>
        {
            AssessedPoint largest = item.Points.MaxBy(point => Math.Abs(point.AfterJoules))!;
            double stated = 2 * item.StandardErrorJoules / 1000;
            return new PublishedDifference(
                item.Measurement.Couple,
                item.Measurement.Id,
                item.Points.Length,
                largest.AfterJoules / 1000,
                largest.Kelvin,
                stated,
                Math.Abs(largest.AfterJoules / 1000) > stated ? Reason(item.Measurement) : null);
        })];

    /// <summary>What the file notes; where it says little, that the sources weighed were followed instead.</summary>
    private static string Reason(Measurement measurement)
    {
        const string usual = "kept out; the sources that were weighed say otherwise and were followed";
        return measurement.Note is not { } note ? usual : note.Length < 15 ? $"{note}; {usual}" : note;
    }

    private static PublishedDifference? Largest(IGrouping<string, (string Formula, double Kelvin, double Kilojoules)> rows, Func<string, double, string?> reasonOf, string table, SubstanceDatabase database)
    {
        Substance substance = database.Get(rows.Key);
        (double Kelvin, double Difference, Reaction Formation)[] all =
        [
            .. rows.Select(row => (row.Kelvin, row.Kilojoules, Formation: FormationOf(substance, row.Kelvin, database))).Where(row => row.Formation is not null)
                .Select(row => (row.Kelvin, (row.Formation!.StandardGibbs(row.Kelvin) / 1000) - row.Kilojoules, row.Formation!)),
        ];
        if (all.Length == 0)
        {
            return null;
        }

        (double kelvin, double difference, Reaction formation) = all.MaxBy(row => Math.Abs(row.Difference));
        double stated = ReactionUncertainty.OfGibbs(formation, kelvin, database.Covariance) / 1000;
        return new PublishedDifference(rows.Key, table, all.Length, difference, kelvin, stated, Math.Abs(difference) > stated ? reasonOf(rows.Key, kelvin) ?? "not explained" : null);
    }

    /// <summary>From the elements in their stable state, gas at 1 bar above boiling; null where data are missing.</summary>
    private static Reaction? FormationOf(Substance substance, double kelvin, SubstanceDatabase database)
    {
        if (!substance.TryGibbs(kelvin, out _))
        {
            return null;
        }

        List<(Substance, double)> terms = [(substance, 1)];
        foreach ((string element, double count) in substance.Formula.Atoms)
        {
            Substance? diatomic = element is "O" or "N" or "H" ? database.Get(element + "2") : null;
            Substance? state = diatomic ?? new[] { database.Metal(element), database.Vapour(element) }
                .Where(candidate => candidate is not null && candidate.TryGibbs(kelvin, out _)).MinBy(candidate => candidate!.Gibbs(kelvin));
            if (state is null)
            {
                return null;
            }

            terms.Add((state, -count / state.Formula.Of(element)));
        }

        return Reaction.Of(terms);
    }
}
