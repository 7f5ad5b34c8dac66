using System.Collections.Immutable;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli;

/// <summary>What <c>oxides show</c> answers: a substance at some temperatures.</summary>
internal sealed record SubstanceReport(Substance Substance, ImmutableArray<SubstanceReport.Row> Rows, ImmutableArray<string> Notes, ImmutableArray<string> Sources)
{
    public static SubstanceReport Of(string name, TemperatureSeries series, SubstanceDatabase database)
    {
        Substance substance = database.Get(name);
        List<string> notes = [];
        ImmutableArray<Row> rows = [.. series.Points.Select(at => RowAt(substance, at, database, notes))];
        if (rows.All(row => row.State is null))
        {
            throw new NoAnswerException(string.Join("; ", notes));
        }

        foreach (Phase phase in substance.Phases.Where(phase => phase.Note is not null))
        {
            notes.Add($"{phase.Label}: {phase.Note}{(phase.Provenance is { } provenance ? $" ({provenance})" : string.Empty)}");
        }

        if (substance.Assessment is { } assessment)
        {
            notes.Add($"assessed: {assessment.Reason}");
        }

        if (substance.IsFromOverlay)
        {
            notes.Add($"{substance.Id} is from your own folder ({substance.EntryMark})");
        }

        return new SubstanceReport(substance, rows, [.. notes.Distinct()], Citations.Of([substance], database));
    }

    private static Row RowAt(Substance substance, Temperature at, SubstanceDatabase database, List<string> notes)
    {
        Phase? phase = substance.PhaseAt(at.Kelvin);
        if (phase is null)
        {
            notes.Add(Describe(substance, at));
            return new Row(at, null, null, null);
        }

        ThermalState state = substance.At(at.Kelvin);
        double? formation = Formation(substance, state.Gibbs, at.Kelvin, database, out string? why);
        if (why is not null)
        {
            notes.Add(why);
        }

        return new Row(at, phase.Label, state, formation);
    }

    /// <summary>From the elements in their stable state: condensed, or vapour at 1 bar above boiling.</summary>
    private static double? Formation(Substance substance, double gibbs, double kelvin, SubstanceDatabase database, out string? why)
    {
        why = null;
        double sum = gibbs;
        foreach ((string element, double count) in substance.Formula.Atoms)
        {
            if (ElementGibbs(element, kelvin, database) is not { } own)
            {
                why = FormattableString.Invariant($"no Gibbs energy of formation at {kelvin:0.##} K: the element {element} has no data there");
                return null;
            }

            sum -= count * own;
        }

        return sum;
    }

    private static double? ElementGibbs(string element, double kelvin, SubstanceDatabase database)
    {
        double lowest = double.PositiveInfinity;
        foreach ((string name, double atoms) in new[] { (element, 1.0), (element + "(g)", 1.0), (element + "2", 2.0) })
        {
            if (database.TryGet(name) is { } form && form.Id == name && form.TryGibbs(kelvin, out double gibbs))
            {
                lowest = Math.Min(lowest, gibbs / atoms);
            }
        }

        return double.IsFinite(lowest) ? lowest : null;
    }

    private static string Describe(Substance substance, Temperature at)
    {
        try
        {
            _ = substance.At(at.Kelvin);
            return string.Empty;
        }
        catch (OutsideDataException fault)
        {
            return fault.Message;
        }
    }

    /// <summary>One temperature; everything but the temperature is null without data.</summary>
    internal sealed record Row(Temperature At, string? Phase, ThermalState? State, double? FormationGibbs);
}
