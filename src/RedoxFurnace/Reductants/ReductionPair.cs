using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>A charge oxide against a reductant under given conditions: the margin at any temperature.</summary>
/// <remarks>THEORY.md, section 7.</remarks>
internal sealed class ReductionPair(OxidePath charge, ReductantModel reductant, RankConditions conditions)
{
    /// <summary>Hotter than this no furnace of the trade runs; crossovers are searched up to it.</summary>
    public const double HottestSearched = 3000;

    private const int MostShareRounds = 60;

    public OxidePath Charge { get; } = charge;

    public ReductantModel Reductant { get; } = reductant;

    public double LowestKelvin => Math.Max(PhysicalConstants.ReferenceKelvin, Math.Max(Charge.LowestKelvin, Reductant.LowestKelvin));

    public double HighestKelvin => Math.Min(HottestSearched, Math.Min(Charge.HighestKelvin, Reductant.HighestKelvin));

    /// <summary>Margin at a temperature.</summary>
    /// <exception cref="NoAnswerException">No data.</exception>
    public ReductionPoint At(double kelvin) => At(kelvin, conditions.Total?.NaturalLogBar);

    /// <summary>Margin for the metal bound in a carbide instead of free.</summary>
    /// <exception cref="NoAnswerException">No data.</exception>
    public ReductionPoint Bound(double kelvin, double boundGibbs) => Point(
        kelvin,
        Charge.At(kelvin, null, boundGibbs),
        Reductant.StepsAt(kelvin, conditions.Total?.NaturalLogBar),
        null,
        conditions.Total?.NaturalLogBar);

    /// <summary>Margin at a temperature and a total pressure, null for each gas at 1 bar.</summary>
    /// <exception cref="NoAnswerException">No data.</exception>
    public ReductionPoint At(double kelvin, double? totalLogPressure)
    {
        if (totalLogPressure is not { } total)
        {
            return Point(kelvin, Charge.At(kelvin, 0), Reductant.StepsAt(kelvin, null), 0, null);
        }

        // Metal held back as liquid or solid: the reductant's gas has the whole pressure.
        ReductionPoint? condensed = HasCondensedMetal(kelvin) || !Charge.HasVapour
            ? Point(kelvin, Charge.At(kelvin, null), Reductant.StepsAt(kelvin, total), null, total)
            : null;
        ReductionPoint? vapour = Charge.HasVapour ? Sharing(kelvin, total) : null;
        return condensed is null ? vapour! : vapour is not null && vapour.Margin > condensed.Margin ? vapour : condensed;
    }

    /// <summary>Margin, or null where there are no data.</summary>
    public double? TryMargin(double kelvin)
    {
        try
        {
            return At(kelvin).Margin;
        }
        catch (NoAnswerException)
        {
            return null;
        }
    }

    private bool HasCondensedMetal(double kelvin) => Charge.System.Elements.All(element => element.TryGibbs(kelvin, out _));

    /// <summary>Metal vapour and the reductant's gas share the total pressure by their numbers; both depend on the shares, so they are found by repeated substitution.</summary>
    private ReductionPoint? Sharing(double kelvin, double total)
    {
        double metalLog = conditions.Monoxide is { } fixedMonoxide ? LogOfRest(total, fixedMonoxide) : total;
        double gasLog = total;
        for (int round = 0; round < MostShareRounds; round++)
        {
            OxideDescent descent = Charge.At(kelvin, metalLog);
            double vapour = descent.VapourPerO2;
            if (vapour <= 0)
            {
                return null;
            }

            IReadOnlyList<ReductantStep> steps = Reductant.StepsAt(kelvin, gasLog);
            double gas = conditions.Monoxide is null || Reductant.Info.Kind != ReductantKind.Graphite ? steps[0].GasPerO2 : 0;
            double nextMetal = conditions.Monoxide is null || Reductant.Info.Kind != ReductantKind.Graphite
                ? total + Math.Log(vapour / (vapour + gas))
                : metalLog;
            double nextGas = gas > 0 ? total + Math.Log(gas / (vapour + gas)) : total;
            bool settled = Math.Abs(nextMetal - metalLog) < 1e-13 && Math.Abs(nextGas - gasLog) < 1e-13;
            (metalLog, gasLog) = (nextMetal, nextGas);
            if (settled)
            {
                return Point(kelvin, descent, steps, metalLog, gasLog);
            }
        }

        throw new NoAnswerException(FormattableString.Invariant(
            $"the shares of metal vapour and gas of {Charge.Oxide.Id} with {Reductant.Info.Id} do not settle at {kelvin:0.##} K; give another pressure"));
    }

    private double LogOfRest(double total, Pressure monoxide)
    {
        double rest = Math.Exp(total) - monoxide.Bar;
        return rest > 0
            ? Math.Log(rest)
            : throw new RequestException($"--pco {monoxide} leaves no room for {Charge.Metal} vapour at a total pressure of {Pressure.FromNaturalLogBar(total)}; give a lower --pco");
    }

    private static ReductionPoint Point(double kelvin, OxideDescent descent, IReadOnlyList<ReductantStep> steps, double? vapourLogPressure, double? gasLogPressure)
        => new(kelvin, descent, steps, vapourLogPressure, gasLogPressure);
}
