using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>The gas reactions every oxygen potential is read through: 2 CO + O2 = 2 CO2, 2 H2 + O2 = 2 H2O, and graphite with CO and CO2.</summary>
public sealed class GasReactions
{
    /// <summary>Takes the gases and graphite from a database.</summary>
    /// <param name="database">Data.</param>
    public GasReactions(SubstanceDatabase database)
    {
        Oxygen = database.Get("O2");
        CarbonMonoxide = database.Get("CO");
        CarbonDioxide = database.Get("CO2");
        Hydrogen = database.Get("H2");
        Water = database.Get("H2O");
        Graphite = database.Get("C");
        CarbonMonoxideOxidation = Reaction.Of([(CarbonMonoxide, -2), (Oxygen, -1), (CarbonDioxide, 2)]);
        HydrogenOxidation = Reaction.Of([(Hydrogen, -2), (Oxygen, -1), (Water, 2)]);
        GraphiteToMonoxide = Reaction.Of([(Graphite, -2), (Oxygen, -1), (CarbonMonoxide, 2)]);
        GraphiteToDioxide = Reaction.Of([(Graphite, -1), (Oxygen, -1), (CarbonDioxide, 1)]);
    }

    /// <summary>O2.</summary>
    public Substance Oxygen { get; }

    /// <summary>CO.</summary>
    public Substance CarbonMonoxide { get; }

    /// <summary>CO2.</summary>
    public Substance CarbonDioxide { get; }

    /// <summary>H2.</summary>
    public Substance Hydrogen { get; }

    /// <summary>H2O as a gas.</summary>
    public Substance Water { get; }

    /// <summary>Graphite.</summary>
    public Substance Graphite { get; }

    /// <summary>2 CO + O2 = 2 CO2.</summary>
    public Reaction CarbonMonoxideOxidation { get; }

    /// <summary>2 H2 + O2 = 2 H2O.</summary>
    public Reaction HydrogenOxidation { get; }

    /// <summary>2 C + O2 = 2 CO.</summary>
    public Reaction GraphiteToMonoxide { get; }

    /// <summary>C + O2 = CO2.</summary>
    public Reaction GraphiteToDioxide { get; }

    /// <summary>Oxygen potential of a gas with a ratio pCO/pCO2 or pH2/pH2O.</summary>
    /// <param name="oxidation">2 CO + O2 = 2 CO2 or 2 H2 + O2 = 2 H2O.</param>
    /// <param name="kelvin">K.</param>
    /// <param name="naturalLogRatio">ln of reducing over oxidised gas.</param>
    /// <returns>J per mole of O2.</returns>
    /// <remarks>THEORY.md, equation 7.</remarks>
    public static double PotentialOfRatio(Reaction oxidation, double kelvin, double naturalLogRatio)
        => oxidation.StandardGibbs(kelvin) - (2 * PhysicalConstants.GasConstant * kelvin * naturalLogRatio);

    /// <summary>ln of the ratio pCO/pCO2 or pH2/pH2O that stands in equilibrium with an oxygen potential.</summary>
    /// <param name="oxidation">2 CO + O2 = 2 CO2 or 2 H2 + O2 = 2 H2O.</param>
    /// <param name="kelvin">K.</param>
    /// <param name="oxygenPotential">J per mole of O2.</param>
    /// <returns>Natural logarithm of the ratio.</returns>
    /// <remarks>THEORY.md, equation 7.</remarks>
    public static double RatioOfPotential(Reaction oxidation, double kelvin, double oxygenPotential)
        => (oxidation.StandardGibbs(kelvin) - oxygenPotential) / (2 * PhysicalConstants.GasConstant * kelvin);

    /// <summary>CO + CO2 in equilibrium with graphite at a total pressure of the two (Boudouard equilibrium).</summary>
    /// <param name="kelvin">K.</param>
    /// <param name="logPressure">ln(pCO + pCO2) in bar.</param>
    /// <returns>Share of CO, and the oxygen potential in J per mole of O2.</returns>
    /// <remarks>
    /// THEORY.md, equation 9. With K = pCO^2/pCO2 and P the sum, pCO^2/K + pCO = P; the root is written as 2P/(1 + sqrt(1 + 4P/K)),
    /// which keeps its digits when K is very large or very small.
    /// </remarks>
    public (double MonoxideShare, double OxygenPotential) AboveGraphite(double kelvin, double logPressure)
    {
        double rt = PhysicalConstants.GasConstant * kelvin;
        double monoxide = GraphiteToMonoxide.StandardGibbs(kelvin);
        double dioxide = GraphiteToDioxide.StandardGibbs(kelvin);
        double logK = (dioxide - monoxide) / rt;
        double ratio = 4 * Math.Exp(logPressure - logK);
        double logShare = double.IsInfinity(ratio)
            ? Math.Log(2) - (0.5 * (Math.Log(4) + logPressure - logK))
            : Math.Log(2 / (1 + Math.Sqrt(1 + ratio)));
        return (Math.Exp(logShare), monoxide + (2 * rt * (logShare + logPressure)));
    }
}
