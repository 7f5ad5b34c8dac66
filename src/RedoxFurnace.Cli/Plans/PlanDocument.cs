using RedoxFurnace.Campaigns;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Safety;

namespace RedoxFurnace.Cli.Plans;

/// <summary>A plan put into sections in the order a furnace team reads them.</summary>
internal static class PlanDocument
{
    public static IReadOnlyList<PlanSection> Of(CampaignPlan plan) =>
    [
        Verdict(plan), Stages(plan), SetPoints(plan), Assumed(plan), Product(plan), Consumption(plan), Oxygen(plan), Linings(plan), Alternatives(plan), Traps(plan), Hazards(plan), Uncertainty(plan), Origin(plan),
    ];

    private static List<PlanParagraph> Numbered(int section, IEnumerable<(string Text, string Trail)> texts)
        => [.. texts.Select((text, i) => new PlanParagraph(FormattableString.Invariant($"{section}.{i + 1}"), text.Text, text.Trail))];

    private static List<PlanParagraph> Numbered(int section, IEnumerable<string> texts) => Numbered(section, texts.Select(text => (text, "")));

    private static PlanSection Verdict(CampaignPlan plan)
    {
        List<string> texts = [plan.Headline];
        if (plan.Judgement.Margin is { } margin)
        {
            string uncertainty = plan.Judgement.Uncertainty is { } k ? $" ± {Printed.Fixed(k, 2)}" : "";
            texts.Add($"Ruling margin {Printed.Fixed(margin, 2)}{uncertainty} {plan.Judgement.MarginUnit}; positive works.");
        }

        texts.AddRange(plan.Ask.Select(question => "To be answered first: " + question + "."));
        return new PlanSection(1, "Verdict", Numbered(1, texts), null, "verdict");
    }

    private static PlanSection Stages(CampaignPlan plan) => new(2, "Stages, each at its own temperature, gas and pressure", [], new AnswerTable(
        null,
        [
            new Column("stage", "stage", false), new Column("T C", "temperature_C"), new Column("T K", "temperature_K"), new Column("T F", "temperature_F"), new Column("pressure", "pressure", false), new Column("verdict", "verdict", false),
            new Column("margin", "margin"), new Column("±", "uncertainty"), new Column("unit", "unit", false), new Column("what rules", "text", false) { IsProse = true },
        ],
        [.. plan.Judgement.Stages.Select(stage => (IReadOnlyList<Cell>)[
            Cell.Word(stage.Stage.Kind),
            Cell.Of(stage.Stage.At.Celsius, 0),
            Cell.Of(stage.Stage.At.Kelvin, 2),
            Cell.Of(stage.Stage.At.Fahrenheit, 0),
            Cell.Word(stage.Pressure.ToString()),
            Cell.Word(stage.Verdict),
            Cell.Of(stage.Margin, 2),
            Cell.Of(stage.Uncertainty, 2),
            Cell.Word(stage.MarginUnit.Length > 0 ? stage.MarginUnit : null),
            Cell.Word(stage.Text),
        ])]), "stages");

    private static PlanSection SetPoints(CampaignPlan plan) => new(3, "Set-points and limits", Numbered(3, plan.SetPoints.Select(point => ($"{Capital(point.What)}: {point.Value}.", point.Trail))), null, "set-points");

    private static PlanSection Assumed(CampaignPlan plan) => new(4, "Assumed", Numbered(4, plan.Assumptions.Concat(plan.Notes).Select(text => Capital(text) + ".")), null, "assumed");

    private static PlanSection Product(CampaignPlan plan) => new(5, "Product", [], new AnswerTable(
        null,
        [new Column("what", "what", false), new Column("limit", "limit", false), new Column("found", "found", false) { IsProse = true }, new Column("verdict", "verdict", false)],
        [.. plan.Product.Select(check => (IReadOnlyList<Cell>)[Cell.Word(check.What), Cell.Word(check.Limit), Cell.Word(check.Found), Cell.Word(check.Verdict)])]), "product");

    private static PlanSection Consumption(CampaignPlan plan) => new(6, "Consumption, heat and cost", [], new AnswerTable(
        null,
        [new Column("what", "what", false), new Column("amount", "amount"), new Column("unit", "unit", false), new Column("per t of metal", "per_t_metal"), new Column($"{plan.Sheet.Prices.Currency} per t", "cost_per_t_metal"), new Column("reckoned from", "trail", false) { IsProse = true }],
        [.. plan.Consumption.Select(line => (IReadOnlyList<Cell>)[Cell.Word(line.What), Cell.Significant(line.Amount, 4), Cell.Word(line.Unit), Cell.Significant(line.PerTonne, 4), Cell.Of(line.CostPerTonne, 0), Cell.Word(line.Trail)])]), "consumption");

    private static PlanSection Oxygen(CampaignPlan plan)
    {
        if (plan.Oxygen is not { } balance)
        {
            return new PlanSection(7, "Oxygen balance of the gas", [], null, "oxygen-balance");
        }

        List<string> texts = [.. balance.AgainstReadings.Select(text => Capital(text) + ".")];
        if (balance.ExitDewCelsius is { } dew)
        {
            texts.Insert(0, $"The exit gas should hold {Printed.Brief(balance.WaterPpmExit!.Value)} ppm of water, a {(dew < 0 ? "frost or dew" : "dew")} point of {SetPointFinder.Both(dew + PhysicalConstants.ZeroCelsiusInKelvin)}.");
        }

        if (balance.Next.Length > 0)
        {
            texts.Add("To tell them apart: " + balance.Next + ".");
        }

        return new PlanSection(7, "Oxygen balance of the gas", Numbered(7, texts), new AnswerTable(
            null,
            [new Column("oxygen in", "what", false), new Column("g/h of O", "oxygen_g_per_h")],
            [.. balance.In.Select(line => (IReadOnlyList<Cell>)[Cell.Word(line.What), Cell.Significant(line.GramsPerHour, 4)])]), "oxygen-balance");
    }

    private static PlanSection Linings(CampaignPlan plan) => new(8, "Lining, crucible and fixtures", [], new AnswerTable(
        null,
        [new Column("material", "material", false), new Column("use", "use", false), new Column("against", "against", false), new Column("verdict", "verdict", false), new Column("drive of the attack\nkJ/mol O2", "drive_kJ_per_mol_O2"), new Column("±", "uncertainty_kJ_per_mol_O2"), new Column("reaction", "reaction", false) { IsProse = true }],
        [.. plan.Linings.Select(check => (IReadOnlyList<Cell>)[Cell.Word(check.Material), Cell.Word(check.Use), Cell.Word(check.Against), Cell.Word(check.Verdict), Cell.Of(check.Margin, 1), Cell.Of(check.Uncertainty, 1), Cell.Word(check.Reaction)])]), "linings");

    private static PlanSection Alternatives(CampaignPlan plan) => new(9, "Alternatives; what fails a limit stands below what meets it, whatever its price", [], new AnswerTable(
        null,
        [
            new Column("reductant", "reductant", false), new Column("verdict", "verdict", false), new Column("margin\nkJ/mol O2", "margin_kJ_per_mol_O2"), new Column("±", "uncertainty_kJ_per_mol_O2"), new Column("kg per kg\nmetal", "kg_per_kg_metal"),
            new Column($"{plan.Sheet.Prices.Currency} per kg\nmetal", "cost_per_kg_metal"), new Column("reason", "reason", false) { IsProse = true },
        ],
        [.. plan.Alternatives.Select(row => (IReadOnlyList<Cell>)[Cell.Word(row.Reductant + (row.IsPlanned ? " (planned)" : "")), Cell.Word(row.Verdict), Cell.Of(row.Margin, 1), Cell.Of(row.Uncertainty, 1), Cell.Of(row.KilogramsPerKilogramMetal, 3), Cell.Of(row.CostPerKilogramMetal, 2), Cell.Word(row.Reason)])]), "alternatives");

    private static PlanSection Traps(CampaignPlan plan) => new(10, "Traps looked for and found", Numbered(10, plan.Traps.Select(trap => ($"{(trap.IsGrave ? "GRAVE. " : "")}{Capital(trap.Text)}.", trap.Id))), null, "traps");

    private static PlanSection Hazards(CampaignPlan plan) => new(11, "Hazards", Numbered(11, plan.Hazards.Select(hazard => ($"{hazard.Severity.ToString().ToUpperInvariant()}: {hazard.Text}", hazard.Source)).Append((SafetyRules.ClosingLine, ""))), null, "hazards");

    private static PlanSection Uncertainty(CampaignPlan plan) => new(12, "What moves the verdict", Numbered(12, plan.NextMeasurement.Length > 0 ? ["Measure next. " + Capital(plan.NextMeasurement) + "."] : []), new AnswerTable(
        null,
        [new Column("input", "input", false), new Column("change", "change", false), new Column("margin then", "margin"), new Column("moves by", "moves"), new Column("verdict then", "verdict", false), new Column("turns it", "turns", false)],
        [.. plan.Sensitivity.Select(row => (IReadOnlyList<Cell>)[Cell.Word(row.Input), Cell.Word(row.Change), Cell.Of(row.Margin, 2), Cell.Of(row.Moves, 2), Cell.Word(row.Verdict), Cell.Word(row.TurnsVerdict ? "yes" : "no")])]), "sensitivity");

    private static PlanSection Origin(CampaignPlan plan) => new(13, "Where it comes from", Numbered(13,
    [
        $"RedoxFurnace {plan.Version}; database {plan.DatabaseHash}; sheet {plan.SheetHash}.",
        "Equilibrium, not rate: what can go need not go soon, and a yes is no promise of time.",
        .. plan.Sources,
    ]), null, "sources");

    private static string Capital(string text) => text.Length > 0 ? char.ToUpperInvariant(text[0]) + text[1..] : text;
}
