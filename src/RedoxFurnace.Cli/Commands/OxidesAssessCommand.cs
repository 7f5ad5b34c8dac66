using System.CommandLine;
using System.Text;
using System.Text.Json;
using RedoxFurnace.Assessments;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>oxides assess</c>: how the adjusted entries were found, reckoned again from the measurements.</summary>
internal static class OxidesAssessCommand
{
    private const double Agreement = 0.05;
    private const double StrongPull = 2;

    public static Command Create(Screen screen, CommonOptions common)
    {
        Option<string> with = new("--with") { Description = "your own measurements, in the shape of oxides/measurements.yaml", HelpName = "FILE" };
        Option<string> to = new("--to") { Description = "write the covariance that every uncertainty uses", HelpName = "FILE" };
        Option<bool> force = new("--force") { Description = "replace an existing file" };
        Command command = new("assess", "adjust the oxides to the measured couples again: values, pulls, differences, chi-squared") { with, to, force };
        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            MeasurementTable table = MeasurementTable.Of(database);
            string? own = parsed.GetValue(with);
            if (own is not null)
            {
                table = table.With(MeasurementTable.Read(DocumentNode.Parse(Read(own), Path.GetFileName(own)), database));
            }

            AssessmentResult result = OxideAssessment.Of(table, database);
            if (parsed.GetValue(to) is { } target)
            {
                OutputFile.Write(target, Encoding.UTF8.GetBytes(result.Covariance.Write()), parsed.GetValue(force));
            }

            return screen.Show(Present(result, database, own, parsed.GetValue(to)), common.Form(parsed));
        });
        return command;
    }

    private static string Read(string file)
        => File.Exists(file) ? File.ReadAllText(file) : throw new RequestException($"--with '{file}' does not exist; give a file in the shape of measurements.yaml");

    private static Answer Present(AssessmentResult result, SubstanceDatabase database, string? own, string? written)
    {
        AssessedQuantity[] moved = [.. result.Quantities.Where(quantity => Math.Abs(quantity.OffDatabase) > Agreement)];
        string headline = FormattableString.Invariant(
            $"{(moved.Length == 0 ? "The database holds what the measurements give" : $"{moved.Length} value{(moved.Length == 1 ? string.Empty : "s")} would move")}: chi-squared {result.ChiSquared:0.0} for {result.DegreesOfFreedom} degrees of freedom (raw {result.ChiSquaredRaw:0}).");
        string[] notes = [.. Notes(result, database, moved, own, written)];
        string[] assumptions =
        [
            "an equation counts as two observations, level and slope; a point as one; published enthalpies as one each",
            "differences are calculated less measured; pull is measured less calculated over half the stated error, mean over the temperatures",
            "metals and gases stay as they are",
            FormattableString.Invariant($"sources of one couple differ beyond their errors by {result.BetweenSourcesJoules / 1000:0.00} kJ/mol O2 (k = 1, from the measurements kept out); the covariance adds it to every measurement"),
        ];
        string[] sources = [.. result.Measurements.Select(item => item.Measurement).Select(measurement => measurement.Source + (measurement.Provenance == "memory" ? " [recalled]" : string.Empty)).Distinct()];
        return new Answer
        {
            Headline = headline,
            CallsForSafety = false,
            Tables = [Quantities(result), Couples(result), Pulls(result)],
            Notes = notes,
            Assumptions = assumptions,
            Sources = sources,
            Json = writer => Write(writer, result, headline, notes, assumptions, sources),
        };
    }

    private static IEnumerable<string> Notes(AssessmentResult result, SubstanceDatabase database, AssessedQuantity[] moved, string? own, string? written)
    {
        foreach (AssessedMeasurement strong in result.Measurements.Where(item => item.Measurement.IsFit && Math.Abs(item.Pull) > StrongPull).OrderByDescending(item => Math.Abs(item.Pull)))
        {
            yield return FormattableString.Invariant($"{strong.Measurement.Id} ({strong.Measurement.Couple}) pulls by {strong.Pull:+0.0;-0.0} standard errors: an outlier among the rest, or its error is too small");
        }

        foreach (AssessedQuantity quantity in moved)
        {
            string key = quantity.IsEntropy ? "entropy_298_j_per_mol_k" : "enthalpy_298_kj_per_mol";
            string where = database.Get(quantity.Substance).EntryMark.ToString();
            yield return FormattableString.Invariant($"for a folder of your own: copy the entry of {quantity.Substance} ({where}) and set under 'assessed'  {key}: {{ raw: {quantity.Raw:0.0###}, value: {quantity.Assessed:0.00} }}  (now {quantity.InDatabase:0.00})");
        }

        if (own is not null && moved.Length == 0)
        {
            yield return FormattableString.Invariant($"your measurements move nothing by more than {Agreement} kJ/mol");
        }

        if (written is not null)
        {
            yield return $"covariance written to {written}";
        }
    }

    private static string Unit(AssessedQuantity quantity) => quantity.IsEntropy ? "J/(mol K)" : "kJ/mol";

    private static AnswerTable Quantities(AssessmentResult result) => new(
        null,
        [
            new Column("substance", "substance", false), new Column("quantity", "quantity", false), new Column("unit", "unit", false), new Column("raw", "raw"), new Column("assessed", "assessed"), new Column("±", "uncertainty"),
            new Column("in database", "in_database"), new Column("published", "published"), new Column("±", "published_uncertainty"), new Column("treatment", "treatment", false),
        ],
        [.. result.Quantities.Select(quantity => (IReadOnlyList<Cell>)[
            Cell.Word(quantity.Substance), Cell.Word(quantity.IsEntropy ? "S298" : "H298"), Cell.Word(Unit(quantity)), Cell.Of(quantity.Raw, 2), Cell.Of(quantity.Assessed, 2), Cell.Of(2 * quantity.StandardError, 2),
            Cell.Of(quantity.InDatabase, 2), Cell.Of(quantity.Published, 2), Cell.Of(quantity.PublishedError, 2), Cell.Word(quantity.IsFree ? "free" : "held"),
        ])]);

    private static AnswerTable Couples(AssessmentResult result) => new(
        "Differences, root mean square, kJ/mol O2 (raw, assessed)",
        [
            new Column("couple", "couple", false), new Column("fitted raw", "fitted_raw_kJ_per_mol_O2"), new Column("fitted", "fitted_kJ_per_mol_O2"),
            new Column("kept out raw", "kept_out_raw_kJ_per_mol_O2"), new Column("kept out", "kept_out_kJ_per_mol_O2"),
        ],
        [.. CouplesOf(result).Select(couple => (IReadOnlyList<Cell>)[
            Cell.Word(couple), Cell.Of(result.RootMeanSquare(couple, true, true) / 1000, 2), Cell.Of(result.RootMeanSquare(couple, true, false) / 1000, 2),
            Cell.Of(result.RootMeanSquare(couple, false, true) / 1000, 2), Cell.Of(result.RootMeanSquare(couple, false, false) / 1000, 2),
        ])]);

    private static IEnumerable<string> CouplesOf(AssessmentResult result) => result.Measurements.Select(item => item.Measurement.Couple).Distinct();

    private static AnswerTable Pulls(AssessmentResult result) => new(
        "Pull of each measurement",
        [
            new Column("id", "id", false), new Column("couple", "couple", false), new Column("use", "use", false), new Column("pull", "pull"),
            new Column("largest\nkJ/mol O2", "largest_kJ_per_mol_O2"), new Column("± stated", "error"), new Column("unit", "error_unit", false), new Column("known", "provenance", false),
        ],
        [.. result.Measurements.Select(item => (IReadOnlyList<Cell>)[
            Cell.Word(item.Measurement.Id), Cell.Word(item.Measurement.Couple), Cell.Word(item.Measurement.IsFit ? "fit" : "evidence"), Cell.Of(item.Pull, 2),
            Cell.Of(item.LargestAfterJoules / 1000, 2), Cell.Significant(item.Measurement.ExpandedError), Cell.Word(item.Measurement.ErrorUnit), Cell.Word(item.Measurement.Provenance),
        ])]);

    private static void Write(Utf8JsonWriter writer, AssessmentResult result, string headline, string[] notes, string[] assumptions, string[] sources)
    {
        writer.WriteStartObject();
        writer.WriteString("schema", "redoxfurnace/assessment/1");
        writer.WriteString("headline", headline);
        writer.Number("chi_squared", result.ChiSquared);
        writer.Number("chi_squared_raw", result.ChiSquaredRaw);
        writer.WriteNumber("degrees_of_freedom", result.DegreesOfFreedom);
        writer.WriteNumber("couple_observations", result.CoupleObservations);
        writer.WriteNumber("prior_observations", result.PriorObservations);
        writer.WriteNumber("free_values", result.FreeValues);
        writer.Number("between_sources_kJ_per_mol_O2", result.BetweenSourcesJoules / 1000);
        writer.WriteStartArray("quantities");
        foreach (AssessedQuantity quantity in result.Quantities)
        {
            writer.WriteStartObject();
            writer.WriteString("substance", quantity.Substance);
            writer.WriteString("quantity", quantity.IsEntropy ? "S298" : "H298");
            writer.WriteString("unit", Unit(quantity));
            writer.Number("raw", quantity.Raw);
            writer.Number("assessed", quantity.Assessed);
            writer.Number("uncertainty", 2 * quantity.StandardError);
            writer.Number("in_database", quantity.InDatabase);
            writer.Number("published", quantity.Published);
            writer.Number("published_uncertainty", quantity.PublishedError);
            writer.WriteBoolean("free", quantity.IsFree);
            writer.WriteString("treatment", quantity.Treatment);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteStartArray("couples");
        foreach (string couple in CouplesOf(result))
        {
            writer.WriteStartObject();
            writer.WriteString("couple", couple);
            writer.Number("fitted_raw_kJ_per_mol_O2", result.RootMeanSquare(couple, true, true) / 1000);
            writer.Number("fitted_kJ_per_mol_O2", result.RootMeanSquare(couple, true, false) / 1000);
            writer.Number("kept_out_raw_kJ_per_mol_O2", result.RootMeanSquare(couple, false, true) / 1000);
            writer.Number("kept_out_kJ_per_mol_O2", result.RootMeanSquare(couple, false, false) / 1000);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.WriteStartArray("measurements");
        foreach (AssessedMeasurement item in result.Measurements)
        {
            writer.WriteStartObject();
            writer.WriteString("id", item.Measurement.Id);
            writer.WriteString("couple", item.Measurement.Couple);
            writer.WriteString("use", item.Measurement.IsFit ? "fit" : "evidence");
            writer.Number("pull", item.Pull);
            writer.WriteString("provenance", item.Measurement.Provenance);
            writer.WriteString("source", item.Measurement.Source);
            writer.WriteStartArray("points");
            foreach (AssessedPoint point in item.Points)
            {
                writer.WriteStartObject();
                writer.WriteNumber("temperature_K", point.Kelvin);
                writer.WriteBoolean("fitted", point.IsFit);
                writer.Number("raw_kJ_per_mol_O2", point.BeforeJoules / 1000);
                writer.Number("assessed_kJ_per_mol_O2", point.AfterJoules / 1000);
                writer.Number("standard_error_kJ_per_mol_O2", point.SigmaJoules / 1000);
                writer.WriteEndObject();
            }

            writer.WriteEndArray();
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
        writer.Common(assumptions, sources, null, notes, [], []);
        writer.WriteEndObject();
    }
}
