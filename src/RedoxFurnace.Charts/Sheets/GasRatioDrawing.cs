using System.Collections.Immutable;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Charts.Kinds;
using RedoxFurnace.Charts.Layout;
using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charts.Sheets;

/// <summary>Settings to gas-ratio chart.</summary>
internal static class GasRatioDrawing
{
    private const double Steps = 160;

    private static readonly string[] Known = ["CO", "H2"];

    private static readonly (Temperature Low, Temperature High) UsualRange = (Temperature.FromCelsius(400), Temperature.FromCelsius(1200));

    public static DrawnChart Draw(ChartSettings settings, SubstanceDatabase database, string version)
    {
        (Temperature low, Temperature high) = settings.Read("range", ChartDrawing.Range, UsualRange);
        ImmutableArray<Pressure> graphite = settings.Read<ImmutableArray<Pressure>>("pco", (text, what) => [.. PressureSeries.Parse(text, what).Points], [Pressure.Standard]);
        Activities activities = ChartDrawing.ReadActivities(settings, database);
        ImmutableArray<string> gases = settings.Read<ImmutableArray<string>>("with", Gases, ["CO"]);
        if (settings.Text("of") is null)
        {
            throw new RequestException("the gas-ratio chart takes one metal; write --of Fe (or of: Fe)");
        }

        GasRatioDiagram diagram = settings.Read("of", (text, what) => AtomicWeights.Has(text)
            ? GasRatioDiagram.Of(text, low, high, (high.Kelvin - low.Kelvin) / Steps, graphite, activities, database)
            : throw new RequestException($"{what} '{text}' is no metal; the gas-ratio chart takes one, such as Fe"), null!);
        if (diagram.Monoxide.IsEmpty)
        {
            throw new NoAnswerException($"{diagram.Element} has no two solids with data between {low} and {high}; choose another range");
        }

        ImmutableArray<string> sources = [.. diagram.Substances.SelectMany(substance => substance.Phases.Select(phase => phase.SourceKey).Append(substance.Uncertainty.SourceKey).OfType<string>())
            .Distinct().Order(StringComparer.Ordinal).Select(key => database.Sources[key].Text)];
        ImmutableArray<HazardNote> hazards = ChartDrawing.Hazards(database, new HazardWork
        {
            Charge = [.. diagram.Substances.Where(substance => !substance.IsGas && substance.Formula.Of("O") > 0).Select(substance => substance.Id)],
            Reductants = gases,
            Gases = [.. gases, .. gases.Select(gas => gas == "CO" ? "CO2" : "H2O")],
            LowestKelvin = low.Kelvin,
            HighestKelvin = high.Kelvin,
        });
        GasRatioOptions options = ChartDrawing.Common(
            new GasRatioOptions { Gases = gases, Logarithmic = settings.Word("axis", "share", "log") == "log", Bands = settings.Truth("bands") },
            settings,
            hazards,
            version);
        ChartPlan plan = GasRatioChart.Plan(diagram, activities.Describe(), options, sources, database.Hash);
        return new DrawnChart(
            [ChartLayout.Lay(plan)],
            $"gas ratio over {diagram.Element} and its oxides from {ChartDrawing.Celsius(low.Kelvin)} to {ChartDrawing.Celsius(high.Kelvin)}" + (plan.Crossings.IsEmpty ? "" : "; " + string.Join("; ", plan.Crossings.Select(crossing => crossing.Text.Plain))),
            [.. diagram.Invariants.Select(invariant => $"at {ChartDrawing.Celsius(invariant.Kelvin)} {invariant.Phase} {(invariant.JoinsAbove ? "joins" : "leaves")} on heating: {invariant.Reaction}")],
            hazards,
            sources);
    }

    private static ImmutableArray<string> Gases(string text, string what)
    {
        string[] parts = text.Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries);
        return parts.Length > 0 && parts.FirstOrDefault(part => !Known.Contains(part)) is null && parts.Distinct().Count() == parts.Length
            ? [.. parts]
            : throw new RequestException($"{what} '{text}' is not understood; the gas-ratio chart takes CO, H2, or CO,H2");
    }
}
