using System.Collections.Immutable;
using RedoxFurnace.Charts.Kinds;
using RedoxFurnace.Charts.Layout;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charts.Sheets;

/// <summary>Settings to van 't Hoff chart.</summary>
internal static class VantHoffDrawing
{
    private const double Balanced = 1e-9;

    private static readonly (Temperature Low, Temperature High) UsualRange = (Temperature.FromCelsius(400), Temperature.FromCelsius(1400));

    public static DrawnChart Draw(ChartSettings settings, SubstanceDatabase database, string version)
    {
        ImmutableArray<(string Text, Reaction Reaction)> reactions = settings.Read<ImmutableArray<(string, Reaction)>>("equations", (text, what) => [.. Parts(text).Select(part => Equation(part, what, database))], []);
        if (reactions.IsEmpty)
        {
            throw new RequestException("the van-t-hoff chart has no reaction; write --equations \"2 C + O2 = 2 CO\" (or equations: in the sheet)");
        }

        (Temperature Low, Temperature High) range = settings.Read("range", ChartDrawing.Range, UsualRange);
        ImmutableArray<MeasuredPoint> points = settings.Read<ImmutableArray<MeasuredPoint>>("points", (text, what) => [.. Parts(text).Select(part => Point(part, what))], []);
        Substance[] used = [.. reactions.SelectMany(item => item.Reaction.Terms.Select(term => term.Substance)).Distinct()];
        ImmutableArray<string> sources = [.. used.SelectMany(substance => substance.Phases.Select(phase => phase.SourceKey).Append(substance.Uncertainty.SourceKey).OfType<string>()).Distinct().Order(StringComparer.Ordinal).Select(key => database.Sources[key].Text)];
        ImmutableArray<HazardNote> hazards = ChartDrawing.Hazards(database, new HazardWork
        {
            Charge = [.. used.Where(substance => !substance.IsGas).Select(substance => substance.Id)],
            Gases = [.. used.Where(substance => substance.IsGas).Select(substance => substance.Id)],
            LowestKelvin = range.Low.Kelvin,
            HighestKelvin = range.High.Kelvin,
        });
        ChartOptions options = ChartDrawing.Common(new ChartOptions(), settings, hazards, version);
        return new DrawnChart(
            [ChartLayout.Lay(VantHoffChart.Plan(reactions, points, range, options, sources, database.Hash, database.Covariance))],
            $"ln K against 1/T of {string.Join("; ", reactions.Select(item => item.Text))}",
            [],
            hazards,
            sources);
    }

    private static string[] Parts(string text) => text.Split(';', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries);

    private static (string Text, Reaction Reaction) Equation(string text, string what, SubstanceDatabase database)
    {
        ReactionEquation equation = ReactionEquation.Parse(text);
        Reaction reaction = Reaction.Of(equation.Terms.Select(term => (database.Get(term.Name), term.Number)));
        return reaction.LargestImbalance() <= Balanced
            ? (text, reaction)
            : throw new RequestException($"{what} '{text}' does not balance; check the numbers");
    }

    private static MeasuredPoint Point(string text, string what)
    {
        string[] words = text.Split(' ', StringSplitOptions.RemoveEmptyEntries);
        return words.Length == 2
            ? new MeasuredPoint(Temperature.Parse(words[0], what).Kelvin, NumberWithUnit.ParsePlain(words[1], what) * Math.Log(10))
            : throw new RequestException($"{what} '{text}' is not understood; write a temperature and log10 K, such as 900C 0.5");
    }
}
