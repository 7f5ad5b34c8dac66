using System.Collections.Immutable;
using System.Globalization;
using RedoxFurnace.Charts.Kinds;
using RedoxFurnace.Charts.Layout;
using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charts.Sheets;

/// <summary>From settings to a chart laid out: chooses the kind, reads what it needs, calculates, draws.</summary>
public static class ChartDrawing
{
    /// <summary>Draws what the settings ask for.</summary>
    /// <param name="settings">From a sheet, the command line, or both.</param>
    /// <param name="database">Data.</param>
    /// <param name="version">Of the tool, for the caption.</param>
    /// <returns>The chart.</returns>
    /// <exception cref="RequestException">A setting is wrong.</exception>
    /// <exception cref="DocumentException">A setting of a sheet is wrong.</exception>
    /// <exception cref="NoAnswerException">No data for what is asked.</exception>
    public static DrawnChart Draw(ChartSettings settings, SubstanceDatabase database, string version) => settings.Word("kind", "stability", "oxygen-pressure", "van-t-hoff", "margins", "gas-ratio", "phases") switch
    {
        "oxygen-pressure" => OxygenPressureDrawing.Draw(settings, database, version),
        "van-t-hoff" => VantHoffDrawing.Draw(settings, database, version),
        "margins" => MarginDrawing.Draw(settings, database, version),
        "phases" => PhaseAmountDrawing.Draw(settings, database, version),
        "gas-ratio" => GasRatioDrawing.Draw(settings, database, version),
        _ => StabilityDrawing.Draw(settings, database, version),
    };

    /// <summary>Options common to all kinds.</summary>
    internal static T Common<T>(T options, ChartSettings settings, IReadOnlyList<HazardNote> hazards, string version)
        where T : ChartOptions => options with
        {
            Title = settings.Text("title"),
            Unit = settings.Read("unit", Unit, TemperatureUnit.Celsius),
            Page = settings.Read("size", PageSize.Parse, PageSize.A4),
            Frame = settings.Word("frame", "caption", "none", "document") switch { "none" => FrameKind.None, "document" => FrameKind.Document, _ => FrameKind.Caption },
            Window = settings.Read<(Temperature, Temperature)?>("window", (text, what) => Range(text, what), null),
            Safety = SafetyLine(hazards),
            Version = version,
            Document = new DocumentBlock
            {
                Title = settings.Text("title") ?? "",
                Number = settings.Text("number") ?? "",
                Revision = settings.Text("revision") ?? "",
                Date = settings.Text("date") ?? "",
                Page = settings.Text("page") ?? "",
                Prepared = settings.Text("prepared") ?? "",
                Checked = settings.Text("checked") ?? "",
                Approved = settings.Text("approved") ?? "",
                Purpose = settings.Text("purpose") ?? "",
            },
        };

    /// <summary>Reads <c>200C..1800C</c>.</summary>
    internal static (Temperature Low, Temperature High) Range(string text, string what)
    {
        int dots = text.IndexOf("..", StringComparison.Ordinal);
        if (dots < 0)
        {
            throw new RequestException($"{what} '{text}' is not a range; write the lower and the higher temperature, such as 200C..1800C");
        }

        Temperature low = Temperature.Parse(text[..dots], what);
        Temperature high = Temperature.Parse(text[(dots + 2)..].Split('/')[0], what);
        return low < high
            ? (low, high)
            : throw new RequestException($"{what} '{text}' is reversed or empty; write {text[(dots + 2)..]}..{text[..dots]}");
    }

    internal static ImmutableArray<HazardNote> Hazards(SubstanceDatabase database, HazardWork work) => [.. SafetyRules.Of(database).For(HazardContextBuilder.Build(work))];

    internal static Activities ReadActivities(ChartSettings settings, SubstanceDatabase database)
        => settings.Read("activity", (text, _) => Activities.Parse(text, database), Activities.AllOne);

    internal static ImmutableArray<double> Ratios(ChartSettings settings)
        => settings.Read<ImmutableArray<double>>("gas-ratio", (text, what) =>
        [
            .. text.Split(',', StringSplitOptions.TrimEntries).Select(part => NumberWithUnit.ParsePlain(part, what) is > 0 and var ratio
                ? ratio
                : throw new RequestException($"{what} '{part}' is out of range; a ratio must be above 0")),
        ], [Reductants.RankConditions.UsualGasRatio]);

    private static TemperatureUnit Unit(string text, string what) => text switch
    {
        "C" => TemperatureUnit.Celsius,
        "K" => TemperatureUnit.Kelvin,
        "F" => TemperatureUnit.Fahrenheit,
        _ => throw new RequestException($"{what} '{text}' is not known; write C, K or F"),
    };

    /// <summary>The matters of the notes by name, gravest first, and the closing line.</summary>
    private static string SafetyLine(IReadOnlyList<HazardNote> hazards)
    {
        string[] names = [.. hazards.Where(note => note.Severity != HazardSeverity.Caution).Select(note => note.Id.Replace('-', ' ')).Take(8)];
        return (names.Length > 0 ? "Hazards to provide for: " + string.Join(", ", names) + ". " : "") + SafetyRules.ClosingLine;
    }

    /// <summary>A number for words.</summary>
    internal static string Celsius(double kelvin) => Math.Round(kelvin - PhysicalConstants.ZeroCelsiusInKelvin).ToString(CultureInfo.InvariantCulture) + " C";
}
