using CsCheck;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Atmospheres;

/// <summary>Gases, and random ones, that several tests share.</summary>
internal static class GasSamples
{
    public static SubstanceDatabase Database => SubstanceDatabase.Bundled;

    public static GasEquilibrium Equilibrium { get; } = new(SubstanceDatabase.Bundled);

    public static GasReactions Reactions { get; } = new(SubstanceDatabase.Bundled);

    public static Pressure Atmosphere { get; } = Pressure.FromBar(1.01325);

    /// <summary>Any mixture of the ten gases, each absent, ordinary or a trace down to 1e-15, with a temperature and pressure of the whole range.</summary>
    public static Gen<(GasMixture Gas, Temperature At, Pressure Total)> AnyGas { get; } = Gen.Select(
        Gen.Select(Gen.Int[0, 5], Gen.Double[0, 1]).Array[GasMixture.SpeciesCount],
        Gen.Double[300, 2500],
        Gen.Double[-9, 2],
        (amounts, kelvin, log10) => (Mixture(amounts), Temperature.FromKelvin(kelvin), Pressure.FromBar(Math.Pow(10, log10))));

    /// <summary>Endothermic gas with a dew point and the CO2 that belongs to it at a temperature.</summary>
    public static GasMixture Endothermic(string dew, double celsius)
    {
        GasMixture gas = Parse(GeneratorGas.Get("endothermic", Database).Analysis, "dew " + dew);
        return WaterGasShift.DioxideFromWater(gas, Temperature.FromCelsius(celsius), Reactions);
    }

    public static GasMixture Parse(params string[] texts) => GasAnalysis.Merge(texts, Atmosphere).Meanings.Single().Mixture;

    private static GasMixture Mixture((int Kind, double Size)[] amounts)
    {
        double[] moles = [.. amounts.Select(amount => amount.Kind switch
        {
            <= 2 => 0,
            3 => Math.Pow(10, -15 * amount.Size),
            _ => amount.Size,
        })];
        moles[(int)GasSpecies.N2] += moles.Sum() > 0 ? 0 : 1;
        return GasMixture.OfAmounts(moles);
    }
}
