using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Atmospheres;

/// <summary>What a gas must be to take the oxygen off an oxide, or to keep its metal bare, against temperature. A pure function of request and database.</summary>
/// <remarks>THEORY.md, section 6.</remarks>
public static class AtmosphereWindow
{
    private const int Seed = 20_260_802;

    private static readonly double[] Shares = [0.05, 0.5, 0.95];

    /// <summary>Rows for each temperature and each step of the oxide down to the metal.</summary>
    /// <param name="request">What is asked.</param>
    /// <param name="database">Data.</param>
    /// <returns>The result.</returns>
    /// <exception cref="RequestException">Unknown oxide or metal, or a hydrogen share out of range.</exception>
    /// <exception cref="NoAnswerException">No temperature asked for has data.</exception>
    public static AtmosphereResult Of(AtmosphereRequest request, SubstanceDatabase database)
    {
        Substance oxide = database.Get(request.Oxide);
        string metal = MetalOf(oxide, request.Metal);
        if (!(request.HydrogenShare > 0))
        {
            throw new RequestException("--hydrogen must be above 0%; without hydrogen no frost point belongs to the gas");
        }

        OxidePath path = new(oxide, metal, database, request.Activities);
        GasReactions gases = new(database);
        ErrorSample? sample = request.Draws is { } draws ? new ErrorSample(draws, Seed, database.Covariance) : null;
        List<AtmosphereRow> rows = [];
        List<string> notes = [];
        HashSet<Substance> used = [gases.Hydrogen, gases.Water, gases.CarbonMonoxide, gases.CarbonDioxide];
        foreach (Temperature at in request.At.Points)
        {
            try
            {
                OxideDescent descent = path.At(at.Kelvin, request.Total.NaturalLogBar);
                if (!descent.OxideIsStable)
                {
                    notes.Add($"{oxide.Id} is not stable at {at}: its neighbours on the ladder are shown");
                }

                foreach (LadderStep step in descent.Steps)
                {
                    AtmosphereRow row = Row(step, ReferenceEquals(step, descent.Hardest), at.Kelvin, request, gases, database.Covariance);
                    rows.Add(sample is null ? row : Sampled(row, step, gases, sample));
                    used.UnionWith(step.Couple.Formation.Terms.Select(term => term.Substance));
                    notes.AddRange(step.Gap is { } gap ? [gap] : []);
                }
            }
            catch (NoAnswerException missing)
            {
                notes.Add(missing.Message);
            }
        }

        if (rows.Count == 0)
        {
            throw new NoAnswerException(notes[0]);
        }

        AddWaterNotes(rows, notes);
        return new AtmosphereResult(
            oxide.Id,
            metal,
            request,
            [.. rows],
            Headline(oxide.Id, metal, rows, request),
            [.. notes.Distinct()],
            Assumptions(request),
            [.. used],
            (path.LowestKelvin, path.HighestKelvin));
    }

    private static string MetalOf(Substance oxide, string? wanted)
    {
        string[] metals = [.. oxide.Formula.Atoms.Keys.Where(element => element != "O")];
        if (oxide.IsGas || oxide.Formula.Of("O") <= 0 || metals.Length == 0)
        {
            throw new RequestException($"'{oxide.Id}' is not a condensed oxide; give one such as Cr2O3");
        }

        return wanted is null
            ? metals.Length == 1 ? metals[0] : throw new RequestException($"{oxide.Id} holds {string.Join(" and ", metals)}; say which with --metal")
            : metals.Contains(wanted) ? wanted : throw new RequestException($"--metal '{wanted}' is not in {oxide.Id}; it holds {string.Join(" and ", metals)}");
    }

    private static AtmosphereRow Row(LadderStep step, bool hardest, double kelvin, AtmosphereRequest request, GasReactions gases, EnthalpyCovariance? covariance)
    {
        Reaction formation = step.Couple.Formation;
        if (step.OxygenPotential is not { } potential)
        {
            return new AtmosphereRow(kelvin, step.Couple.Name, formation.Text, false, null, null, null, null, null, null, null, null, null, null, null, null, null, null, null);
        }

        double rt = PhysicalConstants.GasConstant * kelvin;
        double expanded = ReactionUncertainty.OfGibbs(formation, kelvin, covariance);
        double expandedWithHydrogen = ReactionUncertainty.OfGibbs(formation.Times(-1).Plus(1, gases.HydrogenOxidation, 1), kelvin, covariance);
        double logHydrogen = GasReactions.RatioOfPotential(gases.HydrogenOxidation, kelvin, potential);
        double logMonoxide = GasReactions.RatioOfPotential(gases.CarbonMonoxideOxidation, kelvin, potential);
        double logWater = Math.Log(request.HydrogenShare) + request.Total.NaturalLogBar - logHydrogen;
        double logWaterUncertainty = expandedWithHydrogen / (2 * rt);
        bool fits = logWater < request.Total.NaturalLogBar;
        double? frost = fits ? FrostOrDew(logWater) : null;
        return new AtmosphereRow(
            kelvin,
            step.Couple.Name,
            formation.Text,
            hardest,
            step.StandardGibbs,
            expanded,
            potential,
            OxygenPotentialReadings.Log10Bar(potential, kelvin),
            expanded / (rt * Math.Log(10)),
            logMonoxide / Math.Log(10),
            logHydrogen / Math.Log(10),
            logWaterUncertainty / Math.Log(10),
            frost,
            frost is null ? null : FrostUncertainty(logWater, logWaterUncertainty),
            frost < WaterVapour.TriplePointKelvin ? WaterVapour.DewPointOverSupercooled(logWater) : null,
            fits ? Math.Exp(logWater - request.Total.NaturalLogBar) * 1e6 : null,
            OxygenPotentialReadings.ProbeMillivolts(potential, kelvin),
            1000 * expanded / (4 * PhysicalConstants.Faraday),
            OxygenPotentialReadings.DecompositionVolts(step.StandardGibbs));
    }

    private static AtmosphereRow Sampled(AtmosphereRow row, LadderStep step, GasReactions gases, ErrorSample sample)
    {
        if (row.OxygenPotential is not { } potential)
        {
            return row;
        }

        double kelvin = row.Kelvin;
        double rt = PhysicalConstants.GasConstant * kelvin;
        double[] oxygen = new double[sample.Draws];
        Array.Fill(oxygen, potential);
        sample.Add(step.Couple.Formation, kelvin, 1, oxygen);
        Array.Sort(oxygen);
        // ln of the water allowed is a constant less ln(H2/H2O), which is half the Gibbs energy between gas and couple over RT.
        double[] water = new double[sample.Draws];
        sample.Add(step.Couple.Formation.Times(-1).Plus(1, gases.HydrogenOxidation, 1), kelvin, -1 / (2 * rt), water);
        Array.Sort(water);
        double? logWater = row.FrostKelvin is null ? null : row.FrostKelvin < WaterVapour.TriplePointKelvin ? WaterVapour.LogSaturationPressureOverIce(row.FrostKelvin.Value) : WaterVapour.LogSaturationPressureOverLiquid(row.FrostKelvin.Value);
        double?[] frost = logWater is { } log ? [.. Shares.Select(share => FrostOrDew(log + At(water, share)))] : [];
        return row with
        {
            Log10OxygenPercentiles = [.. Shares.Select(share => OxygenPotentialReadings.Log10Bar(At(oxygen, share), kelvin))],
            FrostPercentiles = frost.Length > 0 && frost.All(value => value is not null) ? [.. frost.Select(value => value!.Value)] : [],
        };

        static double At(double[] sorted, double share) => sorted[(int)Math.Round(share * (sorted.Length - 1))];
    }

    private static double? FrostOrDew(double logWater)
        => WaterVapour.DewPointOverLiquid(logWater) is { } dew && dew >= WaterVapour.TriplePointKelvin ? dew : WaterVapour.FrostPointOverIce(logWater);

    private static double? FrostUncertainty(double logWater, double uncertainty)
        => FrostOrDew(logWater + uncertainty) - FrostOrDew(logWater - uncertainty) is { } span ? span / 2 : null;

    private static void AddWaterNotes(List<AtmosphereRow> rows, List<string> notes)
    {
        if (rows.Any(row => row.OxygenPotential is not null && row.WaterPpm is null))
        {
            notes.Add("no frost point where the water in balance would exceed the total pressure: any moisture is allowed there");
        }
        else if (rows.Any(row => row.OxygenPotential is not null && row.FrostKelvin is null))
        {
            notes.Add("no frost point where it would lie below every formula for ice (50 K): no gas is dry enough");
        }
    }

    private static string Headline(string oxide, string metal, List<AtmosphereRow> rows, AtmosphereRequest request)
    {
        AtmosphereRow[] hardest = [.. rows.Where(row => row.IsHardest)];
        AtmosphereRow first = hardest[0];
        AtmosphereRow last = hardest[^1];
        string gas = $"a gas with {Printed.Brief(request.HydrogenShare * 100)} % H2 at {request.Total}";
        string at = $"at {Temperature.FromKelvin(first.Kelvin)} {Words(first)}";
        return hardest.Length == 1
            ? $"{gas} takes the oxygen off {oxide} and keeps {metal} bare where it is drier than this: {at}."
            : $"{gas} takes the oxygen off {oxide} and keeps {metal} bare where it is drier than this: {at}, at {Temperature.FromKelvin(last.Kelvin)} {Words(last)}.";
    }

    private static string Words(AtmosphereRow row)
    {
        string ratio = $"H2/H2O {Printed.Brief(Math.Pow(10, row.Log10HydrogenRatio!.Value))}";
        return row.FrostKelvin is { } kelvin
            ? $"{(kelvin < WaterVapour.TriplePointKelvin ? "frost point" : "dew point")} {Printed.Fixed(kelvin - PhysicalConstants.ZeroCelsiusInKelvin, 0)} C ({ratio})"
            : ratio;
    }

    private static ImmutableArray<string> Assumptions(AtmosphereRequest request) =>
    [
        $"hydrogen {Printed.Brief(request.HydrogenShare * 100)} % of the gas at a total pressure of {request.Total}; the frost point is at that pressure, at the work",
        "below 0.01 C the frost point is over ice; the dew point over supercooled water, which some instruments show, stands beside it",
        request.Activities.Describe(),
        "probe millivolts against air at 1 atm, the probe at the temperature of the row",
        "uncertainties are expanded (k = 2); metal vapour competes at the total pressure",
        "left out: kinetics, solution of oxygen in the metal. Equilibrium says that it can go, not how fast; judge the cooling leg too",
    ];
}
