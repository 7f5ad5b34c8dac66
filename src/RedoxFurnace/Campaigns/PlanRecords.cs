using System.Collections.Immutable;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Safety;

namespace RedoxFurnace.Campaigns;

/// <summary>What a campaign is about: decides which calculation rules.</summary>
internal enum CampaignKind
{
    /// <summary>Parts in a gas.</summary>
    Parts,

    /// <summary>An oxide reduced by a gas that flows.</summary>
    GasReduction,

    /// <summary>An oxide reduced by a solid or liquid reductant.</summary>
    SolidReduction,

    /// <summary>A metal drawn off as vapour.</summary>
    Retort,

    /// <summary>A melt in its crucible.</summary>
    Melt,
}

/// <summary>The verdict on a campaign, with the number that rules it.</summary>
/// <param name="Verdict">works, works-if, does-not-work, not-decidable.</param>
/// <param name="Condition">After 'works if' or 'not decidable: measure'; empty for the others.</param>
/// <param name="Reason">The ruling reason in one sentence.</param>
/// <param name="Margin">The ruling margin in <paramref name="MarginUnit"/>; positive works.</param>
/// <param name="Uncertainty">Expanded, same unit.</param>
/// <param name="MarginUnit">For example kJ/mol O2.</param>
/// <param name="Stages">Every stage.</param>
internal sealed record Judgement(JobVerdict Verdict, string Condition, string Reason, double? Margin, double? Uncertainty, string MarginUnit, ImmutableArray<StageJudgement> Stages)
{
    public ImmutableArray<string> Ask { get; init; } = [];

    public ImmutableArray<string> Notes { get; init; } = [];
}

/// <summary>One stage of the programme judged at its own temperature, gas and pressure.</summary>
internal sealed record StageJudgement(StageSheet Stage, Pressure Pressure, string Gas, string Verdict, double? Margin, double? Uncertainty, string MarginUnit, string Text)
{
    /// <summary>Higher is worse; the worst stage rules.</summary>
    public int Gravity => Verdict switch { "does-not-work" or "oxidises" or "soots" => 3, "not-decidable" => 2, "borderline" or "works-if" => 1, _ => 0 };
}

/// <summary>A figure to write on the set-point sheet.</summary>
/// <param name="What">Quantity and instrument.</param>
/// <param name="Value">With unit; in both unit systems where the trade uses both.</param>
/// <param name="Trail">Equation, entries, sources, uncertainty.</param>
internal sealed record SetPoint(string What, string Value, string Trail);

/// <summary>A check of the product against its limits or of what becomes of it.</summary>
internal sealed record ProductCheck(string What, string Limit, string Found, string Verdict);

/// <summary>A line of consumption, heat or cost.</summary>
internal sealed record ConsumptionLine(string What, double? Amount, string Unit, double? PerTonne, double? CostPerTonne, string Trail);

/// <summary>A material against what touches it.</summary>
internal sealed record LiningCheck(string Material, string Use, string Against, string Reaction, double? Margin, double? Uncertainty, string Verdict);

/// <summary>A reductant that could be used instead.</summary>
internal sealed record Alternative(string Reductant, string Verdict, string Reason, double? Margin, double? Uncertainty, double? KilogramsPerKilogramMetal, double? CostPerKilogramMetal, bool IsPlanned);

/// <summary>A trap the plan stands in, or comes near.</summary>
internal sealed record TrapFinding(string Id, bool IsGrave, string Text);

/// <summary>How far one input moves the ruling margin.</summary>
internal sealed record SensitivityRow(string Input, string Change, double? Margin, string Verdict, bool TurnsVerdict, double Moves);

/// <summary>Oxygen into and out of the gas, g/h of O.</summary>
internal sealed record OxygenBalance(ImmutableArray<(string What, double GramsPerHour)> In, double? WaterPpmExit, double? ExitDewCelsius, ImmutableArray<string> AgainstReadings, string Next);

/// <summary>The whole plan.</summary>
internal sealed record CampaignPlan
{
    public required CampaignSheet Sheet { get; init; }

    public required CampaignKind Kind { get; init; }

    public required Judgement Judgement { get; init; }

    public required string Headline { get; init; }

    public ImmutableArray<SetPoint> SetPoints { get; init; } = [];

    public ImmutableArray<ProductCheck> Product { get; init; } = [];

    public ImmutableArray<ConsumptionLine> Consumption { get; init; } = [];

    public ImmutableArray<LiningCheck> Linings { get; init; } = [];

    public ImmutableArray<Alternative> Alternatives { get; init; } = [];

    public ImmutableArray<TrapFinding> Traps { get; init; } = [];

    public OxygenBalance? Oxygen { get; init; }

    public ImmutableArray<SensitivityRow> Sensitivity { get; init; } = [];

    public string NextMeasurement { get; init; } = "";

    public ImmutableArray<HazardNote> Hazards { get; init; } = [];

    public ImmutableArray<string> Assumptions { get; init; } = [];

    public ImmutableArray<string> Notes { get; init; } = [];

    public ImmutableArray<string> Ask { get; init; } = [];

    public ImmutableArray<string> Sources { get; init; } = [];

    /// <summary>Settings of the charts that go with it: file name without its ending, and chart settings.</summary>
    public ImmutableArray<(string File, ImmutableArray<(string Key, string Text)> Settings)> Charts { get; init; } = [];

    public required string DatabaseHash { get; init; }

    public required string SheetHash { get; init; }

    public required string Version { get; init; }

    public required string Date { get; init; }

    /// <summary>Results the traps look at.</summary>
    public required CampaignFacts Facts { get; init; }
}

/// <summary>What was reckoned on the way, for traps and reports.</summary>
internal sealed record CampaignFacts
{
    public required CampaignSheet Sheet { get; init; }

    public required CampaignKind Kind { get; init; }

    public required Judgement Judgement { get; init; }

    /// <summary>The campaign's gas at the soak, every meaning.</summary>
    public ImmutableArray<GasPoint> SoakGas { get; init; } = [];

    /// <summary>Soot ranges of the soak gas on its way down.</summary>
    public ImmutableArray<CarbonRange> Soot { get; init; } = [];

    public RankResult? Ranking { get; init; }

    /// <summary>The row of the planned reductant.</summary>
    public RankedReductant? Planned { get; init; }

    public GasUtilisation? Utilisation { get; init; }

    public ImmutableArray<LiningCheck> Linings { get; init; } = [];

    /// <summary>Phases left beside a retort's vapour at half and at nine tenths of the metal.</summary>
    public ImmutableArray<Charges.MetalVapourOverCharge> Vapour { get; init; } = [];
}
