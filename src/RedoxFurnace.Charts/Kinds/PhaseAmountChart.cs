using System.Collections.Immutable;
using RedoxFurnace.Charges;
using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Charts.Kinds;

/// <summary>What a charge becomes against temperature: kilograms of each condensed phase and of the gas.</summary>
public static class PhaseAmountChart
{
    private const double Least = 1e-3;

    /// <summary>The plan.</summary>
    /// <param name="states">Equilibria at rising temperatures, one pressure.</param>
    /// <param name="charge">The charge as written.</param>
    /// <param name="options">Choices.</param>
    /// <param name="sources">Citations in full.</param>
    /// <param name="databaseHash">SHA-256 of the database.</param>
    /// <returns>The plan.</returns>
    public static ChartPlan Plan(IReadOnlyList<ChargeState> states, string charge, ChartOptions options, ImmutableArray<string> sources, string databaseHash)
    {
        double low = states[0].At.Kelvin;
        double high = states[^1].At.Kelvin;
        double total = states.Max(state => Math.Max(GasKilograms(state), state.Condensed.Select(phase => phase.Kilograms).DefaultIfEmpty(0).Max()));
        string[] names = [.. states.SelectMany(state => state.Condensed).GroupBy(phase => phase.Name).Where(group => group.Max(phase => phase.Kilograms) > Least * total).Select(group => group.Key).Order(StringComparer.Ordinal)];
        List<SeriesPlan> series = [];
        foreach ((int i, string name) in names.Index())
        {
            Stroke stroke = new(ChartInks.Couples[i % ChartInks.Couples.Length], 0.45, ChartInks.Dashes[i / ChartInks.Couples.Length % ChartInks.Dashes.Length]);
            series.AddRange(Pieces(states, state => state.Condensed.Where(phase => phase.Name == name).Sum(phase => phase.Kilograms), name, RichText.OfChemistry(name), stroke, null));
        }

        series.AddRange(Pieces(states, GasKilograms, "gas", RichText.Of("gas"), new Stroke(ChartInks.Reductants[0], 0.6), ChartInks.Symbols[0]));
        string pressure = states[0].Total.ToString();
        return new ChartPlan
        {
            Title = RichText.OfChemistry(options.Title ?? $"What {charge} becomes at {pressure}"),
            Description = $"Mass of each condensed phase and of the gas against temperature for the charge {charge} at {pressure}. Phases: {string.Join(", ", names)}.",
            X = TemperatureAxis.Of(options.Unit, low, high),
            Top = TemperatureAxis.Beside(options.Unit, low, high),
            Y = AxisPlan.Round(RichText.Of("mass, kg"), 0, total * 1.05),
            Series = [.. series],
            Windows = [.. TemperatureAxis.Window(options)],
            Frame = new FramePlan(
                options.Frame,
                [
                    $"Basis: charge {charge}, total pressure {pressure}, everything in equilibrium; ideal gas, pure condensed phases, wustite as one phase. Steps are real: at fixed pressure a phase comes or goes at one temperature where no freedom is left.",
                    "Equilibrium, not rate. Silicides have no data.",
                    "Sources: " + string.Join("; ", sources) + ".",
                    $"Database {databaseHash[..Math.Min(12, databaseHash.Length)]}, RedoxFurnace {options.Version}.",
                ],
                options.Safety,
                options.Document.Fields(databaseHash, options.Version)),
            Page = options.Page,
            ValueNames = ("temperature_K", "kg"),
            Information = options.Document.Information(),
        };
    }

    private static double GasKilograms(ChargeState state) => state.Gas.Sum(share => share.Fraction * state.GasMoles * share.Substance.Formula.MolarMass) / 1000;

    /// <summary>A phase is drawn where it stands; each stretch is a line of its own, and only the longest carries the name.</summary>
    private static IEnumerable<SeriesPlan> Pieces(IReadOnlyList<ChargeState> states, Func<ChargeState, double> mass, string name, RichText label, Stroke stroke, MarkShape? symbol)
    {
        List<List<DataPoint>> pieces = [];
        List<DataPoint>? open = null;
        for (int i = 0; i < states.Count; i++)
        {
            double kilograms = mass(states[i]);
            if (kilograms > 0)
            {
                if (open is null)
                {
                    open = i > 0 ? [new DataPoint(states[i].At.Kelvin, 0)] : [];
                    pieces.Add(open);
                }

                open.Add(new DataPoint(states[i].At.Kelvin, kilograms));
            }
            else if (open is not null)
            {
                open.Add(new DataPoint(states[i - 1].At.Kelvin, 0));
                open = null;
            }
        }

        List<DataPoint>? longest = pieces.MaxBy(piece => piece[^1].X - piece[0].X);
        return pieces.Where(piece => piece.Count > 1).Select((piece, i) => new SeriesPlan
        {
            Name = pieces.Count > 1 ? FormattableString.Invariant($"{name}, stretch {i + 1}") : name,
            Label = ReferenceEquals(piece, longest) ? label : RichText.Of(""),
            Points = [.. piece],
            Stroke = stroke,
            Symbol = symbol,
        });
    }
}
