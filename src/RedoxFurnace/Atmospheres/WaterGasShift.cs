using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>Completes an analysis of a generator gas in which one of CO2 and H2O was not measured, by CO + H2O = CO2 + H2.</summary>
public static class WaterGasShift
{
    /// <summary>The gas with the CO2 that belongs to its water.</summary>
    /// <param name="gas">Holds CO, H2 and H2O; its own CO2 is replaced.</param>
    /// <param name="at">Temperature at which the gas came to equilibrium.</param>
    /// <param name="reactions">CO and H2 with oxygen.</param>
    /// <returns>The completed gas, unchanged where CO, H2 or H2O is missing.</returns>
    public static GasMixture DioxideFromWater(GasMixture gas, Temperature at, GasReactions reactions)
        => Follow(gas, GasSpecies.CO2, gas[GasSpecies.CO] * gas[GasSpecies.H2O] / gas[GasSpecies.H2] * Constant(at, reactions));

    /// <summary>The gas with the water that belongs to its CO2.</summary>
    /// <param name="gas">Holds CO, H2 and CO2; its own H2O is replaced.</param>
    /// <param name="at">Temperature at which the gas came to equilibrium.</param>
    /// <param name="reactions">CO and H2 with oxygen.</param>
    /// <returns>The completed gas, unchanged where CO, H2 or CO2 is missing.</returns>
    public static GasMixture WaterFromDioxide(GasMixture gas, Temperature at, GasReactions reactions)
        => Follow(gas, GasSpecies.H2O, gas[GasSpecies.CO2] * gas[GasSpecies.H2] / gas[GasSpecies.CO] / Constant(at, reactions));

    /// <summary>K of CO + H2O = CO2 + H2.</summary>
    /// <param name="at">Temperature.</param>
    /// <param name="reactions">CO and H2 with oxygen.</param>
    /// <returns>Dimensionless.</returns>
    public static double Constant(Temperature at, GasReactions reactions)
        => Math.Exp((reactions.HydrogenOxidation.StandardGibbs(at.Kelvin) - reactions.CarbonMonoxideOxidation.StandardGibbs(at.Kelvin)) / (2 * PhysicalConstants.GasConstant * at.Kelvin));

    /// <summary>Adds the amount to the others as they stand, so that their ratios keep what the constant asks for.</summary>
    private static GasMixture Follow(GasMixture gas, GasSpecies species, double amount)
    {
        if (!double.IsFinite(amount) || amount <= 0)
        {
            return gas;
        }

        double[] amounts = [.. gas.Fractions];
        amounts[(int)species] = amount;
        return GasMixture.OfAmounts(amounts);
    }
}
