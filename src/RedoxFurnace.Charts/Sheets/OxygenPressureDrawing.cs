using System.Collections.Immutable;
using RedoxFurnace.Charts.Kinds;
using RedoxFurnace.Charts.Layout;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charts.Sheets;

/// <summary>Settings to oxygen-pressure chart.</summary>
internal static class OxygenPressureDrawing
{
    private static readonly (Temperature Low, Temperature High) UsualRange = (Temperature.FromCelsius(600), Temperature.FromCelsius(1600));

    public static DrawnChart Draw(ChartSettings settings, SubstanceDatabase database, string version)
    {
        StabilityResult result = StabilityLines.Of(StabilityDrawing.Request(settings, database, UsualRange), database);
        ImmutableArray<HazardNote> hazards = StabilityDrawing.Hazards(result, database);
        OxygenPressureOptions options = ChartDrawing.Common(
            new OxygenPressureOptions
            {
                Inverse = settings.Truth("inverse"),
                Bands = settings.Truth("bands"),
                Highlight = settings.Text("highlight"),
                Ratios = [.. settings.List("ratios")],
                Frost = settings.Read<(double, Pressure)?>("frost", (text, what) => (Share.Parse(text, what), settings.Read("pressure", Pressure.Parse, Pressure.Standard)), null),
            },
            settings,
            hazards,
            version);
        return new DrawnChart(
            [ChartLayout.Lay(OxygenPressureChart.Plan(result, options, database))],
            FormattableString.Invariant($"oxygen pressure of {result.Lines.Length} lines from {ChartDrawing.Celsius(result.Request.Low.Kelvin)} to {ChartDrawing.Celsius(result.Request.High.Kelvin)}"),
            result.Notes,
            hazards,
            result.Sources);
    }
}
