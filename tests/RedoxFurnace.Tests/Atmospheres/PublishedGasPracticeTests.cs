using RedoxFurnace.Atmospheres;
using RedoxFurnace.Quantities;
using RedoxFurnace.Tests.Published;

namespace RedoxFurnace.Tests.Atmospheres;

/// <summary>Rows of check-values.csv about furnace gases that the ledger lists as tested here.</summary>
public class PublishedGasPracticeTests
{
    public static TheoryData<string> Rows => CheckLedger.Of("tested", "metals in a gas");

    [Theory]
    [MemberData(nameof(Rows))]
    public void Furnace_practice_agrees_with_the_published_row(string id)
    {
        PublishedRow row = CheckLedger.Values[id];
        switch (id)
        {
            case "G6-018":
                Assert.Contains("<3 ppmv (below -68 C)", row["value"], StringComparison.Ordinal);
                Assert.Equal(-68, WaterContent.OfShare(3e-6, GasSamples.Atmosphere).FrostPointKelvin!.Value - 273.15, 1.5);
                break;
            case "G6-019":
                Assert.Equal(BrightVerdict.Bright, Chromium($"H2, frost {row["value"]}C", 1040, 18).Verdict);
                Assert.Equal(BrightVerdict.Bright, Chromium($"H2 75%, N2 25%, frost {row["value"]}C", 1040, 18).Verdict);
                Assert.Equal(BrightVerdict.Oxidises, Chromium($"H2 75%, N2 25%, frost -20C", 1040, 18).Verdict);
                break;
            case "G6-020":
                Tolerance.AssertWithin(row.Number("value"), row["tolerance"], Chromium("H2 10%, N2 90%, frost -40C", 1120, 3).LimitLogOxygen!.Value / Math.Log(10));
                break;
            case "G6-022":
                // Above 400 C; H2O/H2 of 3 for copper and nickel, 0.3 for iron, which needs it hotter.
                Assert.Contains("0.3 (Fe)", row["conditions"], StringComparison.Ordinal);
                Assert.Equal(BrightVerdict.Bright, Element("Cu", "H2 25%, H2O 75%", 400).Verdict);
                Assert.Equal(BrightVerdict.Bright, Element("Ni", "H2 25%, H2O 75%", 400).Verdict);
                Assert.Equal(BrightVerdict.Oxidises, Element("Fe", "H2 25%, H2O 75%", 400).Verdict);
                Assert.Equal(BrightVerdict.Bright, Element("Fe", "H2 76.92%, H2O 23.08%", 700).Verdict);
                break;
            default:
                Assert.Fail($"no check is written for {id}");
                break;
        }
    }

    private static MetalInGas Chromium(string gas, double celsius, double percent)
        => Judge("Cr", FormattableString.Invariant($"Cr={percent}%,Fe"), gas, celsius);

    private static MetalInGas Element(string symbol, string gas, double celsius) => Judge(symbol, symbol + "=1", gas, celsius);

    private static MetalInGas Judge(string symbol, string parts, string gas, double celsius)
    {
        GasMixture mixture = GasSamples.Parse(gas);
        GasState state = GasSamples.Equilibrium.AsAnalysed(mixture, Temperature.FromCelsius(celsius), GasSamples.Atmosphere);
        return new MetalsInGas(GasSamples.Database)
            .Judge(Alloy.Parse(parts, null, GasSamples.Database), state, mixture)
            .Single(metal => metal.Element.Symbol == symbol);
    }
}
