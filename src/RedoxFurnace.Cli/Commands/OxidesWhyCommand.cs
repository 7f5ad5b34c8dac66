using System.CommandLine;
using System.Text.Json;
using RedoxFurnace.Assessments;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>oxides why SUBSTANCE</c>: the trail of each number.</summary>
internal static class OxidesWhyCommand
{
    public static Command Create(Screen screen, CommonOptions common)
    {
        Argument<string> name = new("SUBSTANCE") { Description = "formula or name, such as Fe2O3 or magnetite" };
        Command command = new("why", "where each number of a substance comes from: source, changes, measurements that pull on it, uncertainty") { name };
        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            Substance substance = database.Get(parsed.GetValue(name)!);
            AssessmentResult result = OxideAssessment.Of(MeasurementTable.Of(database), database);
            return screen.Show(Present(substance, result, database), common.Form(parsed));
        });
        return command;
    }

    private static Answer Present(Substance substance, AssessmentResult result, SubstanceDatabase database)
    {
        AssessedMeasurement[] pulling = [.. result.Measurements.Where(item => item.Measurement.Product == substance.Id || item.Measurement.Reactant == substance.Id || item.Measurement.Phases.Contains(substance.Id) || substance.Assessment?.Measurements.Contains(item.Measurement.Id) == true)];
        AssessedQuantity[] quantities = [.. result.Quantities.Where(quantity => quantity.Substance == substance.Id)];
        string headline = FormattableString.Invariant($"{substance.Id}: {(substance.Assessment is null ? "as its source has it" : quantities.Any(quantity => quantity.IsFree) || substance.Assessment.EnthalpyKilojoules?.Shift != 0 ? "assessed" : "looked at and kept")}, {pulling.Length} measurements bear on it; entry at {substance.EntryMark}{(substance.IsFromOverlay ? ", from your own folder" : string.Empty)}.");
        string[] notes = [.. Notes(substance, quantities, database)];
        string[] sources = [.. Citations.Of([substance], database).Concat(pulling.Select(item => $"{item.Measurement.Id}: {item.Measurement.Source}{(item.Measurement.Provenance == "memory" ? " [recalled]" : string.Empty)}"))];
        return new Answer
        {
            Headline = headline,
            CallsForSafety = false,
            Tables =
            [
                new AnswerTable(
                    "Numbers",
                    [new Column("number", "number", false), new Column("source", "source", false), new Column("known", "provenance", false), new Column("from K", "t_min_K"), new Column("to K", "t_max_K"), new Column("origin", "note", false) { IsProse = true }],
                    [.. substance.Phases.Select(phase => (IReadOnlyList<Cell>)[Cell.Word(phase.Label), Cell.Word(phase.SourceKey), Cell.Word(Provenance(phase, database)), Cell.Of(phase.Range.LowKelvin, 2), Cell.Of(phase.Range.HighKelvin, 2), Cell.Word(phase.Note)])]),
                new AnswerTable(
                    "Measurements that pull on it",
                    [new Column("id", "id", false), new Column("couple", "couple", false), new Column("use", "use", false), new Column("pull", "pull"), new Column("largest\nkJ/mol O2", "largest_kJ_per_mol_O2"), new Column("known", "provenance", false)],
                    [.. pulling.Select(item => (IReadOnlyList<Cell>)[Cell.Word(item.Measurement.Id), Cell.Word(item.Measurement.Couple), Cell.Word(item.Measurement.IsFit ? "fit" : "evidence"), Cell.Of(item.Pull, 2), Cell.Of(item.LargestAfterJoules / 1000, 2), Cell.Word(item.Measurement.Provenance)])]),
            ],
            Notes = notes,
            Assumptions = ["pull is measured less calculated over half the stated error, positive where a measurement would raise the oxygen potential of its couple"],
            Sources = sources,
            Json = writer => Write(writer, substance, pulling, headline, notes, sources, database),
        };
    }

    private static string Provenance(Phase phase, SubstanceDatabase database) => phase.Provenance ?? database.Sources[phase.SourceKey].Provenance;

    /// <summary>Expanded uncertainty of the enthalpy from the covariance, kJ/mol, or null where the substance is not in it.</summary>
    private static double? Joint(Substance substance, SubstanceDatabase database)
        => database.Covariance is { } covariance && covariance.Has(substance.Id) ? 2 * Math.Sqrt(covariance.Of(substance.Id, substance.Id)) / 1000 : null;

    private static IEnumerable<string> Notes(Substance substance, AssessedQuantity[] quantities, SubstanceDatabase database)
    {
        if (substance.Assessment is { } assessment)
        {
            foreach ((string what, AssessedValue? value, string unit) in new[] { ("enthalpy", assessment.EnthalpyKilojoules, "kJ/mol"), ("entropy", assessment.EntropyJoules, "J/(mol K)") })
            {
                if (value is not null)
                {
                    yield return FormattableString.Invariant($"{what} at 298.15 K: source {value.Raw:0.00}, used {value.Value:0.00} {unit}{(value.Shift == 0 ? " (kept)" : FormattableString.Invariant($", changed by {value.Shift:+0.00;-0.00}"))}; {assessment.Provenance}");
                }
            }

            yield return "reason: " + assessment.Reason;
        }

        foreach (AssessedQuantity quantity in quantities.Where(quantity => quantity.Published is not null))
        {
            yield return FormattableString.Invariant($"published {(quantity.IsEntropy ? "entropy" : "enthalpy")} {quantity.Published:0.00}{(quantity.PublishedError is { } error ? FormattableString.Invariant($" ± {error:0.0}") : string.Empty)}; {quantity.Treatment}");
        }

        ExpandedUncertainty uncertainty = substance.Uncertainty;
        yield return FormattableString.Invariant($"uncertainty (k = 2): enthalpy ± {uncertainty.EnthalpyJoules / 1000:0.##} kJ/mol ({(uncertainty.EnthalpyIsClassDefault ? "class default" : uncertainty.SourceKey)}), entropy ± {uncertainty.EntropyJoulesPerKelvin:0.##} J/(mol K)");
        if (Joint(substance, database) is { } joint)
        {
            yield return FormattableString.Invariant($"its couples use the covariance with {database.Covariance!.Substances.Length - 1} other oxides instead (covariance.yaml); the enthalpy alone is ± {joint:0.0} kJ/mol there, its couples are known better");
        }
    }

    private static void Write(Utf8JsonWriter writer, Substance substance, AssessedMeasurement[] pulling, string headline, string[] notes, string[] sources, SubstanceDatabase database)
    {
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/why/1");
        writer.WriteString("headline", headline);
        writer.WriteString("formula", substance.Id);
        writer.WriteString("entry", substance.EntryMark.ToString());
        writer.WriteBoolean("own_entry", substance.IsFromOverlay);
        writer.Number("enthalpy_source_kJ_per_mol", substance.Assessment?.EnthalpyKilojoules?.Raw);
        writer.Number("enthalpy_used_kJ_per_mol", substance.Assessment?.EnthalpyKilojoules?.Value);
        writer.Number("entropy_source_J_per_mol_K", substance.Assessment?.EntropyJoules?.Raw);
        writer.Number("entropy_used_J_per_mol_K", substance.Assessment?.EntropyJoules?.Value);
        writer.WriteString("reason", substance.Assessment?.Reason);
        writer.Number("uncertainty_kJ_per_mol", substance.Uncertainty.EnthalpyJoules / 1000);
        writer.Number("uncertainty_from_covariance_kJ_per_mol", Joint(substance, database));
        writer.WriteStartArray("phases");
        foreach (Phase phase in substance.Phases)
        {
            writer.WriteStartObject();
            writer.WriteString("label", phase.Label);
            writer.WriteString("source", phase.SourceKey);
            writer.WriteString("provenance", Provenance(phase, database));
            writer.WriteString("note", phase.Note);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteStartArray("measurements");
        foreach (AssessedMeasurement item in pulling)
        {
            writer.WriteStartObject();
            writer.WriteString("id", item.Measurement.Id);
            writer.WriteString("couple", item.Measurement.Couple);
            writer.WriteString("use", item.Measurement.IsFit ? "fit" : "evidence");
            writer.Number("pull", item.Pull);
            writer.WriteString("source", item.Measurement.Source);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Common([], sources, (substance.LowestKelvin, substance.HighestKelvin), notes, [], []);
        writer.WriteEndObject();
    }
}
