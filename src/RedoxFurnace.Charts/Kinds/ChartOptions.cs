using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Charts.Kinds;

/// <summary>What every kind of chart lets the user choose.</summary>
public record ChartOptions
{
    /// <summary>Above the plot; null for the chart's own words.</summary>
    public string? Title { get; init; }

    /// <summary>Unit of the temperature axis below the plot.</summary>
    public TemperatureUnit Unit { get; init; } = TemperatureUnit.Celsius;

    /// <summary>The page.</summary>
    public PageSize Page { get; init; } = PageSize.A4;

    /// <summary>What stands round the plot.</summary>
    public FrameKind Frame { get; init; } = FrameKind.Caption;

    /// <summary>Fields of the title block.</summary>
    public DocumentBlock Document { get; init; } = new();

    /// <summary>An operating window of temperature, or null.</summary>
    public (Temperature Low, Temperature High)? Window { get; init; }

    /// <summary>The safety line; empty for none.</summary>
    public string Safety { get; init; } = "";

    /// <summary>Version of the tool.</summary>
    public string Version { get; init; } = "";
}
