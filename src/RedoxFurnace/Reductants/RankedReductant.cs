using System.Collections.Immutable;

namespace RedoxFurnace.Reductants;

/// <summary>One row of a ranking.</summary>
public sealed record RankedReductant
{
    /// <summary>The reductant.</summary>
    public required Reductant Reductant { get; init; }

    /// <summary>Whether it takes the oxygen off.</summary>
    public required Verdict Verdict { get; init; }

    /// <summary>Whether the job works.</summary>
    public required JobVerdict Job { get; init; }

    /// <summary>The reason in one line.</summary>
    public required string Reason { get; init; }

    /// <summary>What it turns into at first, or null without data.</summary>
    public string? Product { get; init; }

    /// <summary>Reaction of the hardest step per mole of O2, or null.</summary>
    public string? Reaction { get; init; }

    /// <summary>Couple of the oxide less couple of the reductant, J per mole of O2.</summary>
    public double? Margin { get; init; }

    /// <summary>Expanded uncertainty (k = 2) of the margin, J per mole of O2.</summary>
    public double? ExpandedUncertainty { get; init; }

    /// <summary>Partners whose uncertainty is a class default.</summary>
    public ImmutableArray<string> ClassDefaults { get; init; } = [];

    /// <summary>Where it works along temperature, or null without data.</summary>
    public Crossovers? Crossovers { get; init; }

    /// <summary>Whole reaction the masses and heats stand for.</summary>
    public string? BalanceReaction { get; init; }

    /// <summary>The furthest oxide of the reductant that still reduces the charge.</summary>
    public string? FurthestProduct { get; init; }

    /// <summary>Stoichiometric, of the grade.</summary>
    public double? KgPerKgOxide { get; init; }

    /// <summary>Stoichiometric, of the grade.</summary>
    public double? KgPerKgMetal { get; init; }

    /// <summary>For a gas: Nm3 per kg of oxide that must pass at the usable share.</summary>
    public double? NormalCubicMetresPerKgOxide { get; init; }

    /// <summary>J per kg of oxide, everything at temperature; positive must be supplied.</summary>
    public double? HeatJoulesPerKgOxide { get; init; }

    /// <summary>J per kg of oxide from 25 C; positive must be supplied.</summary>
    public double? DutyJoulesPerKgOxide { get; init; }

    /// <summary>pH2/pH2O or pCO/pCO2 it is judged at; null for others.</summary>
    public double? GasRatioAssumed { get; init; }

    /// <summary>The least ratio that works; null for others.</summary>
    public double? GasRatioLeast { get; init; }

    /// <summary>Share of dry reducing gas that can react before equilibrium.</summary>
    public double? UsableShare { get; init; }

    /// <summary>Carbon activity of the gas where it is richer than graphite allows.</summary>
    public double? CarbonActivity { get; init; }

    /// <summary>Carbides, nitrides, vapours.</summary>
    public ImmutableArray<SideProduct> SideProducts { get; init; } = [];

    /// <summary>What carbon does to the product, or null.</summary>
    public CarbideCheck? Carbide { get; init; }

    /// <summary>Each step of the charge.</summary>
    public ImmutableArray<RankedStep> Steps { get; init; } = [];

    /// <summary>Pressure of the metal vapour taken, ln(p/bar), where the metal comes as vapour.</summary>
    public double? MetalVapourLogPressure { get; init; }

    /// <summary>What would help where it does not work, or null.</summary>
    public string? Help { get; init; }

    /// <summary>Further remarks.</summary>
    public ImmutableArray<string> Notes { get; init; } = [];

    /// <summary>Probability, 0 to 1, that it reduces, from sampled errors; null unless asked for.</summary>
    public double? ProbabilityReduces { get; init; }

    /// <summary>5th, 50th and 95th percentile of the first crossover, K, from sampled errors; empty unless asked for or where fewer than nineteen of twenty samples have one.</summary>
    public ImmutableArray<double> CrossoverPercentiles { get; init; } = [];
}
