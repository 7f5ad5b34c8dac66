using System.Text.Json;
using RedoxFurnace.Campaigns;
using RedoxFurnace.Cli.Presentation;

namespace RedoxFurnace.Cli.Plans;

/// <summary>The plan for machines.</summary>
internal static class PlanJson
{
    public const string Schema = "redoxfurnace/plan/1";

    public static void Write(Utf8JsonWriter writer, CampaignPlan plan, IReadOnlyList<string> files)
    {
        writer.WriteStartObject();
        writer.WriteString("schema", Schema);
        writer.WriteString("title", plan.Sheet.Title);
        writer.WriteString("headline", plan.Headline);
        writer.WriteString("verdict", CampaignJudge.Word(plan.Judgement.Verdict));
        writer.WriteString("condition", plan.Judgement.Condition);
        writer.WriteString("reason", plan.Judgement.Reason);
        writer.Number("margin", plan.Judgement.Margin);
        writer.Number("margin_uncertainty", plan.Judgement.Uncertainty);
        writer.WriteString("margin_unit", plan.Judgement.MarginUnit);
        writer.WriteString("date", plan.Date);
        writer.WriteString("version", plan.Version);
        writer.WriteString("database_hash", plan.DatabaseHash);
        writer.WriteString("sheet_hash", plan.SheetHash);
        List(writer, "stages", plan.Judgement.Stages, stage =>
        {
            writer.WriteString("stage", stage.Stage.Kind);
            writer.WriteNumber("temperature_K", stage.Stage.At.Kelvin);
            writer.WriteNumber("pressure_bar", stage.Pressure.Bar);
            writer.WriteString("gas", stage.Gas);
            writer.WriteString("verdict", stage.Verdict);
            writer.Number("margin", stage.Margin);
            writer.Number("uncertainty", stage.Uncertainty);
            writer.WriteString("margin_unit", stage.MarginUnit);
            writer.WriteString("text", stage.Text);
        });
        List(writer, "set_points", plan.SetPoints, point =>
        {
            writer.WriteString("what", point.What);
            writer.WriteString("value", point.Value);
            writer.WriteString("trail", point.Trail);
        });
        List(writer, "product", plan.Product, check =>
        {
            writer.WriteString("what", check.What);
            writer.WriteString("limit", check.Limit);
            writer.WriteString("found", check.Found);
            writer.WriteString("verdict", check.Verdict);
        });
        List(writer, "consumption", plan.Consumption, line =>
        {
            writer.WriteString("what", line.What);
            writer.Number("amount", line.Amount);
            writer.WriteString("unit", line.Unit);
            writer.Number("per_t_metal", line.PerTonne);
            writer.Number("cost_per_t_metal", line.CostPerTonne);
        });
        List(writer, "linings", plan.Linings, check =>
        {
            writer.WriteString("material", check.Material);
            writer.WriteString("use", check.Use);
            writer.WriteString("against", check.Against);
            writer.WriteString("reaction", check.Reaction);
            writer.Number("drive_kJ_per_mol_O2", check.Margin);
            writer.Number("uncertainty_kJ_per_mol_O2", check.Uncertainty);
            writer.WriteString("verdict", check.Verdict);
        });
        List(writer, "alternatives", plan.Alternatives, row =>
        {
            writer.WriteString("reductant", row.Reductant);
            writer.WriteBoolean("planned", row.IsPlanned);
            writer.WriteString("verdict", row.Verdict);
            writer.WriteString("reason", row.Reason);
            writer.Number("margin_kJ_per_mol_O2", row.Margin);
            writer.Number("uncertainty_kJ_per_mol_O2", row.Uncertainty);
            writer.Number("kg_per_kg_metal", row.KilogramsPerKilogramMetal);
            writer.Number("cost_per_kg_metal", row.CostPerKilogramMetal);
        });
        List(writer, "traps", plan.Traps, trap =>
        {
            writer.WriteString("id", trap.Id);
            writer.WriteBoolean("grave", trap.IsGrave);
            writer.WriteString("text", trap.Text);
        });
        List(writer, "sensitivity", plan.Sensitivity, row =>
        {
            writer.WriteString("input", row.Input);
            writer.WriteString("change", row.Change);
            writer.Number("margin", row.Margin);
            writer.WriteString("verdict", row.Verdict);
            writer.WriteBoolean("turns_verdict", row.TurnsVerdict);
        });
        writer.WriteString("next_measurement", plan.NextMeasurement);
        writer.Texts("files", files);
        writer.Common(plan.Assumptions, plan.Sources, null, plan.Notes, plan.Ask, plan.Hazards);
        writer.WriteEndObject();
    }

    private static void List<T>(Utf8JsonWriter writer, string key, IEnumerable<T> items, Action<T> write)
    {
        writer.WriteStartArray(key);
        foreach (T item in items)
        {
            writer.WriteStartObject();
            write(item);
            writer.WriteEndObject();
        }

        writer.WriteEndArray();
    }
}
