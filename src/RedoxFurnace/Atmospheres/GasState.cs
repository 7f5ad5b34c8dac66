using System.Collections.Immutable;

namespace RedoxFurnace.Atmospheres;

/// <summary>A gas at temperature and total pressure, with the activities its equilibrium fixes.</summary>
public sealed record GasState
{
    internal GasState(
        double kelvin,
        double logTotalPressure,
        ImmutableArray<double> naturalLogPressures,
        double? naturalLogOxygen,
        double? naturalLogCarbonActivity,
        double graphite,
        double moles,
        double largestImbalance,
        string? noOxygenReason)
    {
        Kelvin = kelvin;
        NaturalLogTotalPressure = logTotalPressure;
        NaturalLogPressures = naturalLogPressures;
        NaturalLogOxygen = naturalLogOxygen;
        NaturalLogCarbonActivity = naturalLogCarbonActivity;
        GraphiteMoles = graphite;
        Moles = moles;
        LargestImbalance = largestImbalance;
        NoOxygenReason = noOxygenReason;
    }

    /// <summary>Temperature, K.</summary>
    public double Kelvin { get; }

    /// <summary>ln of the total pressure in bar.</summary>
    public double NaturalLogTotalPressure { get; }

    /// <summary>ln of each partial pressure in bar, in the order of <see cref="GasSpecies"/>; minus infinity where a species is absent.</summary>
    public ImmutableArray<double> NaturalLogPressures { get; }

    /// <summary>ln(pO2/bar), or null where the gas fixes none (<see cref="NoOxygenReason"/>).</summary>
    public double? NaturalLogOxygen { get; }

    /// <summary>ln of the carbon activity against graphite, or null where the gas fixes none.</summary>
    public double? NaturalLogCarbonActivity { get; }

    /// <summary>Moles of graphite per mole of gas as analysed; 0 where none stands beside the gas.</summary>
    public double GraphiteMoles { get; }

    /// <summary>Moles of gas per mole of gas as analysed.</summary>
    public double Moles { get; }

    /// <summary>Largest imbalance of an element, as a share of the element.</summary>
    public double LargestImbalance { get; }

    /// <summary>Why there is no oxygen pressure, or null.</summary>
    public string? NoOxygenReason { get; }

    /// <summary>Carbon activity against graphite, or null; infinite where it leaves the range of a double.</summary>
    public double? CarbonActivity => NaturalLogCarbonActivity is { } log ? Math.Exp(log) : null;

    /// <summary>log10(pO2/bar), or null.</summary>
    public double? Log10Oxygen => NaturalLogOxygen is { } log ? log / Math.Log(10) : null;

    /// <summary>RT ln pO2 in J per mole of O2, or null.</summary>
    public double? OxygenPotential => NaturalLogOxygen is { } log ? Quantities.PhysicalConstants.GasConstant * Kelvin * log : null;

    /// <summary>ln(p/bar) of one species.</summary>
    /// <param name="species">The species.</param>
    /// <returns>Minus infinity where absent.</returns>
    public double NaturalLogPressure(GasSpecies species) => NaturalLogPressures[(int)species];

    /// <summary>Mole fraction of one species in the gas.</summary>
    /// <param name="species">The species.</param>
    /// <returns>0 to 1.</returns>
    public double Fraction(GasSpecies species) => Math.Exp(NaturalLogPressures[(int)species] - NaturalLogTotalPressure);

    /// <summary>The gas as a mixture of its own, graphite left behind.</summary>
    /// <returns>Fractions as they stand here.</returns>
    public GasMixture ToMixture()
    {
        double[] amounts = [.. NaturalLogPressures.Select(log => Math.Exp(log - NaturalLogTotalPressure))];
        return GasMixture.OfAmounts(amounts);
    }
}
