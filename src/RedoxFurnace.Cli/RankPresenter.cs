using System.Collections.Immutable;
using System.Text.Json;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli;

/// <summary>Words, tables and JSON of a ranking.</summary>
internal static class RankPresenter
{
    public static Answer Present(ImmutableArray<RankResult> results, TemperatureUnit unit, bool steps, bool us, SubstanceDatabase database)
    {
        TemperatureColumns temperatures = new(unit, us);
        IReadOnlyList<HazardNote> hazards = RankHazards.For(results, SafetyRules.Of(database));
        bool one = results.Length == 1;
        return new Answer
        {
            Headline = string.Join("\n", results.Take(1).Select(result => result.Headline)) + (one ? string.Empty : $" ({results.Length} points in all.)"),
            Tables = [.. one ? Single(results[0], us) : Several(results, temperatures), .. steps ? StepTables(results, temperatures) : [], .. SampleTables(results, temperatures)],
            Notes = [.. results.SelectMany(result => result.Notes.Concat(result.Rows.SelectMany(row => row.Notes.Select(note => $"{row.Reductant.Id}: {note}")))).Distinct()],
            Assumptions = [.. results.SelectMany(result => result.Assumptions).Distinct().Take(one ? 20 : 12)],
            Hazards = hazards,
            Sources = [.. results.SelectMany(result => result.Sources).Distinct().Order(StringComparer.Ordinal)],
            Ask = [.. results.SelectMany(result => result.Ask).Distinct()],
            Json = writer => RankJson.Write(writer, results, hazards),
        };
    }

    private static IEnumerable<AnswerTable> Single(RankResult result, bool us)
    {
        yield return new AnswerTable(
            null,
            [
                new Column("reductant", "reductant", false), new Column("gives", "product", false), new Column("margin\nkJ/mol O2", "margin_kJ_per_mol_O2"), new Column("±", "uncertainty_kJ_per_mol_O2"),
                new Column("verdict", "verdict", false), new Column("job", "job_verdict", false), new Column("works", "works", false), new Column("kg per\nkg oxide", "reductant_kg_per_kg_oxide"),
                new Column("kg per\nkg metal", "reductant_kg_per_kg_metal"), new Column("heat at T\nkJ/kg oxide", "heat_kJ_per_kg_oxide"), new Column("from 25 C\nkJ/kg oxide", "duty_from_25C_kJ_per_kg_oxide"),
                new Column(us ? "gas\nscf/lb oxide" : "gas\nNm3/kg oxide", us ? "gas_scf_per_lb_oxide" : "gas_Nm3_per_kg_oxide"),
            ],
            [.. result.Rows.Select(row => MainRow(row, us))]);
        yield return new AnswerTable(
            "Why not, and what would help",
            [new Column("reductant", "reductant", false), new Column("reason", "reason", false) { IsProse = true }, new Column("what would help", "help", false) { IsProse = true }],
            [.. result.Rows.Where(row => row.Job != JobVerdict.Works || row.Reductant.Kind == ReductantKind.Gas).Select(row => (IReadOnlyList<Cell>)[Cell.Word(row.Reductant.Id), Cell.Word(row.Reason), Cell.Word(row.Help)])]);
        yield return new AnswerTable(
            "Side products",
            [new Column("with", "reductant", false) { IsProse = true }, new Column("from the data", "side_products", false) { IsProse = true }],
            [.. result.Rows.SelectMany(row => row.SideProducts.Select(product => (row.Reductant.Id, product.Text)))
                .GroupBy(entry => entry.Text)
                .Select(group => (IReadOnlyList<Cell>)[Cell.Word(string.Join(", ", group.Select(entry => entry.Id))), Cell.Word(group.Key)])]);
    }

    private static IReadOnlyList<Cell> MainRow(RankedReductant row, bool us) =>
    [
        Cell.Word(row.Reductant.Id),
        Cell.Word(row.Product ?? "no data"),
        Cell.Of(row.Margin / 1000, 1),
        Cell.Of(row.ExpandedUncertainty / 1000, 1),
        Cell.Word(RankWords.Of(row.Verdict)),
        Cell.Word(RankWords.Of(row.Job)),
        Cell.Word(row.Crossovers is { } crossovers ? Where(crossovers) : null),
        Cell.Of(row.KgPerKgOxide, 3),
        Cell.Of(row.KgPerKgMetal, 3),
        Cell.Of(row.HeatJoulesPerKgOxide / 1000, 0),
        Cell.Of(row.DutyJoulesPerKgOxide / 1000, 0),
        Cell.Significant(us ? row.NormalCubicMetresPerKgOxide * ScfPerLbOfNm3PerKg : row.NormalCubicMetresPerKgOxide),
    ];

    private static string Where(Crossovers crossovers) => crossovers.Range switch
    {
        WorkingRange.Above => $"from {Celsius(crossovers.Bands[0].Low)} C",
        WorkingRange.Below => $"to {Celsius(crossovers.Bands[0].High)} C",
        WorkingRange.Bands => string.Join(", ", crossovers.Bands.Select(band => $"{Celsius(band.Low)}..{Celsius(band.High)} C")),
        WorkingRange.Always => "always",
        _ => "never",
    };

    private static string Celsius(double kelvin) => Printed.Fixed(kelvin - PhysicalConstants.ZeroCelsiusInKelvin, 0);

    /// <summary>1 Nm3 at 0 C is 37.33 scf at 60 F and the same pressure (35.3147 ft3 x 288.706/273.15); 1 kg is 2.20462 lb.</summary>
    private const double ScfPerLbOfNm3PerKg = 35.3147 * 288.706 / 273.15 / 2.20462;

    private static IEnumerable<AnswerTable> Several(ImmutableArray<RankResult> results, TemperatureColumns temperatures)
    {
        yield return new AnswerTable(
            null,
            [
                .. temperatures.Columns, new Column("P", "pressure_bar", false), new Column("metal", "metal", false), new Column("reductant", "reductant", false), new Column("gives", "product", false),
                new Column("margin kJ/mol O2", "margin_kJ_per_mol_O2"), new Column("±", "uncertainty_kJ_per_mol_O2"), new Column("verdict", "verdict", false), new Column("job", "job_verdict", false),
                new Column("reason", "reason", false) { IsProse = true },
            ],
            [.. results.SelectMany(result => result.Rows.Select(row => (IReadOnlyList<Cell>)[
                .. temperatures.Cells(result.At),
                result.Conditions.Total is { } total ? new Cell(total.ToString(), Printed.Exact(total.Bar)) : new Cell("1 bar each", string.Empty),
                Cell.Word(result.Metal),
                Cell.Word(row.Reductant.Id),
                Cell.Word(row.Product ?? "no data"),
                Cell.Of(row.Margin / 1000, 1),
                Cell.Of(row.ExpandedUncertainty / 1000, 1),
                Cell.Word(RankWords.Of(row.Verdict)),
                Cell.Word(RankWords.Of(row.Job)),
                Cell.Word(row.Reason),
            ]))]);
    }

    private static IEnumerable<AnswerTable> StepTables(ImmutableArray<RankResult> results, TemperatureColumns temperatures)
    {
        yield return new AnswerTable(
            "Step by step, the hardest first",
            [
                .. temperatures.Columns, new Column("reductant", "reductant", false), new Column("step, per mol O2", "reaction", false), new Column("margin kJ/mol O2", "margin_kJ_per_mol_O2"),
                new Column("±", "uncertainty_kJ_per_mol_O2"), new Column("verdict", "verdict", false),
            ],
            [.. results.SelectMany(result => result.Rows.SelectMany(row => row.Steps.Select(step => (IReadOnlyList<Cell>)[
                .. temperatures.Cells(result.At), Cell.Word(row.Reductant.Id), Cell.Word(step.Reaction), Cell.Of(step.Margin / 1000, 1), Cell.Of(step.ExpandedUncertainty / 1000, 1), Cell.Word(RankWords.Of(step.Verdict)),
            ])))]);
    }

    private static IEnumerable<AnswerTable> SampleTables(ImmutableArray<RankResult> results, TemperatureColumns temperatures)
    {
        if (results.Any(result => result.Rows.Any(row => row.ProbabilityReduces is not null)))
        {
            yield return new AnswerTable(
                "From sampled errors of the data: probability that it reduces, percentiles of the first crossover",
                [.. temperatures.Columns, new Column("reductant", "reductant", false), new Column("reduces\n%", "probability_reduces_percent"), new Column("5 %\nC", "crossover_p05_C"), new Column("50 %\nC", "crossover_p50_C"), new Column("95 %\nC", "crossover_p95_C")],
                [.. results.SelectMany(result => result.Rows.Where(row => row.ProbabilityReduces is not null).Select(row => (IReadOnlyList<Cell>)[
                    .. temperatures.Cells(result.At), Cell.Word(row.Reductant.Id), Cell.Of(100 * row.ProbabilityReduces, 2),
                    .. Enumerable.Range(0, 3).Select(i => Cell.Of(row.CrossoverPercentiles.Length > i ? row.CrossoverPercentiles[i] - 273.15 : null, 0)),
                ]))]);
        }
    }
}
