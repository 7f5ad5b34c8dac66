using System.Collections.Immutable;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Campaigns;

/// <summary>A furnace campaign as its sheet tells it, checked; every part but the title and one of charge or parts may be missing.</summary>
internal sealed record CampaignSheet
{
    public required string Title { get; init; }

    public CampaignDocument Document { get; init; } = new();

    public ImmutableArray<ChargeItem> Charge { get; init; } = [];

    public PartsSheet? Parts { get; init; }

    public ProductSheet? Product { get; init; }

    public ImmutableArray<ReductantOffer> Reductants { get; init; } = [];

    public GasSheet? Gas { get; init; }

    public FurnaceSheet Furnace { get; init; } = new();

    public ImmutableArray<StageSheet> Programme { get; init; } = [];

    public SiteLimits Limits { get; init; } = new();

    public PriceSheet Prices { get; init; } = new();

    /// <summary>The stage that does the work: the one called soak, else the hottest.</summary>
    public StageSheet? Soak => Programme.FirstOrDefault(stage => stage.Kind == "soak") ?? Programme.MaxBy(stage => stage.At.Kelvin);

    /// <summary>Total pressure at the soak: of the stage, else of the furnace, else 1 atm.</summary>
    public Pressure SoakPressure => Soak?.Pressure ?? Furnace.Pressure ?? Pressure.FromBar(PhysicalConstants.AtmosphereInBar);

    /// <summary>Oxides of the charge.</summary>
    public IEnumerable<ChargeItem> Oxides => Charge.Where(item => item.IsOxide);
}

/// <summary>Title block of the plan.</summary>
internal sealed record CampaignDocument(string Number = "", string Revision = "", string Date = "", string Prepared = "", string Checked = "", string Approved = "", string Purpose = "");

/// <summary>One substance charged. Mass in kg a batch, or rate in kg an hour; one of the two, or neither.</summary>
internal sealed record ChargeItem(Substance Substance, double? MassKilograms, double? KilogramsPerHour, double Purity, double? Moisture, double? Activity, SourceMark At)
{
    public bool IsOxide => Substance.Formula.Of("O") > 0 && Substance.Formula.Atoms.Count > 1 && !Substance.IsGas;

    /// <summary>Whatever amount is given, in kg (a batch or an hour).</summary>
    public double? Amount => MassKilograms ?? KilogramsPerHour;
}

/// <summary>Parts in the furnace.</summary>
internal sealed record PartsSheet(string? Alloy, string? Coefficients, ImmutableArray<string> KeepBright, ImmutableArray<string> KeepOxidised, string? Steel, (double Low, double High)? CarbonBand, bool? CopperHoldsOxygen, SourceMark At);

/// <summary>What is wanted, with its limits in mass percent.</summary>
internal sealed record ProductSheet(string Metal, double? CarbonAtMost, double? OxygenAtMost, double? NitrogenAtMost, double? ResidualOxideAtMost);

/// <summary>A reductant that could be used.</summary>
internal sealed record ReductantOffer(string Name, double? PricePerKilogram, double? MassKilograms, SourceMark At);

/// <summary>The furnace gas.</summary>
internal sealed record GasSheet(string? Preset, string? Analysis, double? FlowNormalCubicMetres, double? PricePerNormalCubicMetre, ImmutableArray<ReadingSheet> Readings, SourceMark At);

/// <summary>A reading with its place.</summary>
/// <param name="Kind">frost, dew, moisture, water, probe, co2.</param>
/// <param name="Value">As written, unit and all.</param>
/// <param name="Place">inlet, furnace, exit or line; empty where not told.</param>
/// <param name="Pressure">Where a line pressure counts.</param>
/// <param name="ProbeAt">Temperature of a probe.</param>
/// <param name="At">Where it stands in the sheet.</param>
internal sealed record ReadingSheet(string Kind, string Value, string Place, Pressure? Pressure, Temperature? ProbeAt, SourceMark At);

/// <summary>The furnace.</summary>
internal sealed record FurnaceSheet
{
    public Pressure? Pressure { get; init; }

    /// <summary>Air drawn in, Nm3 an hour.</summary>
    public double? LeakNormalCubicMetres { get; init; }

    /// <summary>Rise of pressure when shut off, Pa m3/s.</summary>
    public double? LeakUpPascalCubicMetresPerSecond { get; init; }

    /// <summary>Surface of the work, m2.</summary>
    public double? WorkArea { get; init; }

    public ImmutableArray<string> Lining { get; init; } = [];

    public string? Crucible { get; init; }

    public ImmutableArray<string> Fixtures { get; init; } = [];
}

/// <summary>One stage of the programme.</summary>
/// <param name="Kind">purge, heat, soak, cool, unload.</param>
/// <param name="At">Temperature at its end.</param>
/// <param name="HoldHours">Hold, or null.</param>
/// <param name="KelvinPerHour">Rate, or null.</param>
/// <param name="Gas">Analysis or preset of its own, or null for the campaign's gas.</param>
/// <param name="Pressure">Of its own, or null.</param>
/// <param name="Mark">Where it stands in the sheet.</param>
internal sealed record StageSheet(string Kind, Temperature At, double? HoldHours, double? KelvinPerHour, string? Gas, Pressure? Pressure, SourceMark Mark);

/// <summary>What the site allows.</summary>
internal sealed record SiteLimits(Temperature? Highest = null, Pressure? LeastPressure = null, double? MostFlow = null);

/// <summary>Prices.</summary>
internal sealed record PriceSheet(string Currency = "EUR", double? EnergyPerKilowattHour = null);
