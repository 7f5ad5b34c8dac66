using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>A steel in a gas: the carbon it would take, and the set-points that leave it as it is.</summary>
/// <param name="CarbonPotential">Carbon of plain iron in this gas, mass percent; null with <paramref name="Reason"/>.</param>
/// <param name="Carbon">Carbon this steel comes to, mass percent.</param>
/// <param name="Uncertainty">Expanded uncertainty of both, mass percent.</param>
/// <param name="Neutral">Set-points for the steel's own carbon, alloy terms counted; null where no carbon is given or the gas holds no CO.</param>
/// <param name="NeutralWithoutAlloy">The same with the alloy terms left out.</param>
/// <param name="Reason">Why something is null.</param>
public sealed record SteelInGas(
    double? CarbonPotential,
    double? Carbon,
    double? Uncertainty,
    NeutralSetPoint? Neutral,
    NeutralSetPoint? NeutralWithoutAlloy,
    string? Reason)
{
    /// <summary>Judges a steel in a gas.</summary>
    /// <param name="steel">Composition.</param>
    /// <param name="gas">The gas; its carbon activity as analysed counts, because steel takes carbon from CO far faster than from methane.</param>
    /// <param name="reactions">CO, H2 and graphite with oxygen.</param>
    /// <param name="probe">The probe whose millivolts are wanted.</param>
    /// <returns>Carbon and set-points.</returns>
    public static SteelInGas Of(SteelComposition steel, GasState gas, GasReactions reactions, OxygenProbe probe)
    {
        if (gas.Kelvin is < AusteniteCarbon.LowestKelvin or > AusteniteCarbon.HighestKelvin)
        {
            return new SteelInGas(null, null, null, null, null, FormattableString.Invariant(
                $"the carbon equations hold for austenite from {AusteniteCarbon.LowestKelvin - 273.15:0} to {AusteniteCarbon.HighestKelvin - 273.15:0} C; at {gas.Kelvin - 273.15:0} C there is no answer"));
        }

        double? potential = gas.NaturalLogCarbonActivity is { } activity ? AusteniteCarbon.CarbonPotential(gas.Kelvin, activity) : null;
        bool hasMonoxide = !double.IsNegativeInfinity(gas.NaturalLogPressure(GasSpecies.CO));
        string? reason = gas.NaturalLogCarbonActivity is null
            ? "the gas fixes no carbon activity: it holds no CO with CO2, H2O or O2 beside it"
            : potential is null ? FormattableString.Invariant($"the carbon potential passes {AusteniteCarbon.MostPercent} %, where austenite ends") : null;
        return new SteelInGas(
            potential,
            potential / steel.PotentialOverCarbon,
            potential is { } value ? AusteniteCarbon.ExpandedUncertainty(value) : null,
            hasMonoxide && steel.Carbon is { } carbon ? SetPoint(carbon * steel.PotentialOverCarbon, gas, reactions, probe) : null,
            hasMonoxide && steel.Carbon is { } plain ? SetPoint(plain, gas, reactions, probe) : null,
            reason);
    }

    /// <summary>The set-point for a carbon potential, CO and H2 as they stand in the gas.</summary>
    private static NeutralSetPoint SetPoint(double carbonPotential, GasState gas, GasReactions reactions, OxygenProbe probe)
    {
        double kelvin = gas.Kelvin;
        double rt = PhysicalConstants.GasConstant * kelvin;
        double activity = AusteniteCarbon.NaturalLogActivity(kelvin, carbonPotential);

        // 2 C + O2 = 2 CO fixes the oxygen pressure, which fixes CO2 beside CO and H2O beside H2.
        double logOxygen = (reactions.GraphiteToMonoxide.StandardGibbs(kelvin) / rt) + (2 * (gas.NaturalLogPressure(GasSpecies.CO) - activity));
        double dioxide = gas.NaturalLogPressure(GasSpecies.CO) - GasReactions.RatioOfPotential(reactions.CarbonMonoxideOxidation, kelvin, rt * logOxygen);
        double hydrogen = gas.NaturalLogPressure(GasSpecies.H2);
        double water = hydrogen - GasReactions.RatioOfPotential(reactions.HydrogenOxidation, kelvin, rt * logOxygen);
        Pressure total = Pressure.FromNaturalLogBar(gas.NaturalLogTotalPressure);
        return new NeutralSetPoint(
            carbonPotential,
            Math.Exp(activity),
            logOxygen,
            Math.Exp(dioxide - gas.NaturalLogTotalPressure),
            double.IsNegativeInfinity(hydrogen) || water > total.NaturalLogBar ? null : WaterContent.OfPressure(water, total),
            probe.Millivolts(logOxygen));
    }
}
