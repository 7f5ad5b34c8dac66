using System.Collections.Immutable;
using System.CommandLine;
using RedoxFurnace.Cli.Presentation;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Cli.Commands;

/// <summary><c>rank OXIDE --at T</c>: which reductants take the oxygen off.</summary>
internal static class RankCommand
{
    public static Command Create(Screen screen, CommonOptions common)
    {
        Options options = new();
        Command command = new("rank", "rank reductants against an oxide charge") { options.Oxide };
        foreach (Option option in options.All)
        {
            command.Options.Add(option);
        }

        command.SetAction(parsed =>
        {
            SubstanceDatabase database = common.Database(parsed);
            TemperatureSeries series = TemperatureSeries.Parse(parsed.GetValue(options.At)!, "--at");
            ImmutableArray<RankResult> results = [.. options.Requests(parsed, series, database).SelectMany(request => ReductantRanking.Rank(request, database))];
            if (parsed.GetValue(options.Uncertainty) is { } sampling)
            {
                int draws = RankSampling.Parse(sampling);
                long start = System.Diagnostics.Stopwatch.GetTimestamp();
                results = [.. results.Select(result => RankSampling.Of(result, draws, database, stage =>
                {
                    if (System.Diagnostics.Stopwatch.GetElapsedTime(start).TotalSeconds > 0.5)
                    {
                        screen.Error.WriteLine($"redoxfurnace: {stage} ...");
                    }
                }))];
            }

            Answer answer = RankPresenter.Present(results, series.Unit, parsed.GetValue(options.Steps), common.UsUnits(parsed), database);
            return screen.Show(answer, common.Form(parsed));
        });
        return command;
    }

    private sealed class Options
    {
        public Argument<string> Oxide { get; } = new("OXIDE") { Description = "the oxide charged, such as Cr2O3" };

        public Option<string> At { get; } = new("--at") { Description = "temperatures: 1400C, 700C,800C or 800C..1200C/50C", Required = true, HelpName = "T" };

        public Option<bool> Steps { get; } = new("--steps") { Description = "show each step of the oxide's ladder" };

        public Option<string> Uncertainty { get; } = new("--uncertainty") { Description = "sample=10000: draw errors with their covariance; probability of each verdict, percentiles of crossovers", HelpName = "sample=N" };

        private Option<string> Metal { get; } = new("--metal") { Description = "the metal wanted from an oxide of several (each in turn)", HelpName = "ELEMENT" };

        private Option<string> With { get; } = new("--with") { Description = "reductants, such as C,H2,Al (all of the list)", HelpName = "LIST" };

        private Option<string> By { get; } = new("--by") { Description = "order within each verdict (margin)", HelpName = "margin|crossover|mass|heat" };

        private Option<string> Activity { get; } = new("--activity") { Description = "activities, such as Cr=0.2,Cr2O3=0.5", HelpName = "LIST" };

        private Option<string> Pressure { get; } = new("--pressure") { Description = "total pressure shared by the gases of the reaction: 1bar, 1mbar,1bar or 10Pa..10kPa", HelpName = "P" };

        private Option<string> Monoxide { get; } = new("--pco") { Description = "fixed pressure of CO over graphite", HelpName = "P" };

        private Option<string> GasRatio { get; } = new("--gas-ratio") { Description = "pH2/pH2O and pCO/pCO2 (100)", HelpName = "RATIO" };

        private Option<string> Frost { get; } = new("--frost") { Description = "frost point of the hydrogen at the total pressure, in place of its ratio", HelpName = "T" };

        private Option<string> Flux { get; } = new("--flux") { Description = "a flux charged in excess, such as CaO: what the whole charge becomes counts it", HelpName = "FORMULA" };

        private Option<string> Nitrogen { get; } = new("--nitrogen") { Description = "nitrogen pressure, to look for nitrides", HelpName = "P" };

        public IEnumerable<Option> All => [At, With, Metal, By, Activity, Pressure, Monoxide, GasRatio, Frost, Nitrogen, Flux, Uncertainty, Steps];

        public IEnumerable<RankRequest> Requests(ParseResult parsed, TemperatureSeries series, SubstanceDatabase database)
        {
            RankOrder order = Order(parsed.GetValue(By));
            RankConditions conditions = Conditions(parsed, database);
            Pressure?[] totals = parsed.GetValue(Pressure) is { } text ? [.. PressureSeries.Parse(text, "--pressure").Points.Select(point => (Pressure?)point)] : [null];
            ImmutableArray<string> with = parsed.GetValue(With)?.Split(',', StringSplitOptions.TrimEntries | StringSplitOptions.RemoveEmptyEntries).ToImmutableArray() ?? [];
            foreach (Pressure? total in totals)
            {
                RankConditions own = conditions with { Total = total, HydrogenRatioOfFrost = Ratio(parsed.GetValue(Frost), total) };
                foreach (Temperature at in series.Points)
                {
                    yield return new RankRequest(parsed.GetValue(Oxide)!, parsed.GetValue(Metal), at, with, own, order);
                }
            }
        }

        private RankConditions Conditions(ParseResult parsed, SubstanceDatabase database)
        {
            double ratio = parsed.GetValue(GasRatio) is { } text ? NumberWithUnit.ParsePlain(text, "--gas-ratio") : RankConditions.UsualGasRatio;
            return ratio > 0
                ? new RankConditions
                {
                    GasRatio = ratio,
                    Monoxide = parsed.GetValue(Monoxide) is { } pco ? Quantities.Pressure.Parse(pco, "--pco") : null,
                    Nitrogen = parsed.GetValue(Nitrogen) is { } nitrogen ? Quantities.Pressure.Parse(nitrogen, "--nitrogen") : null,
                    Flux = parsed.GetValue(Flux) is { } flux ? database.Get(flux).Id : null,
                    Activities = Activities.Parse(parsed.GetValue(Activity), database),
                }
                : throw new RequestException($"--gas-ratio '{parsed.GetValue(GasRatio)}' is out of range; a ratio must be above 0");
        }

        private static RankOrder Order(string? word) => word switch
        {
            null or "margin" => RankOrder.Margin,
            "crossover" => RankOrder.Crossover,
            "mass" => RankOrder.Mass,
            "heat" => RankOrder.Heat,
            _ => throw RequestException.UnknownWord("--by", word, ["margin", "crossover", "mass", "heat"]),
        };

        /// <summary>pH2/pH2O of hydrogen at the total pressure (1 bar unless given) with a frost point; above 0.01 C a dew point.</summary>
        private static double? Ratio(string? frost, Pressure? total)
        {
            if (frost is null)
            {
                return null;
            }

            Temperature point = Temperature.Parse(frost, "--frost");
            double log = point.Kelvin < WaterVapour.TriplePointKelvin
                ? WaterVapour.LogSaturationPressureOverIce(point.Kelvin)
                : WaterVapour.LogSaturationPressureOverLiquid(point.Kelvin);
            double water = Math.Exp(log);
            double all = total?.Bar ?? 1;
            return water < all
                ? (all - water) / water
                : throw new RequestException($"--frost '{frost}' gives more water than the total pressure of {total ?? Quantities.Pressure.Standard}; give a lower one");
        }
    }
}
