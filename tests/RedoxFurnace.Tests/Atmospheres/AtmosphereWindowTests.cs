using System.Globalization;
using System.Text.Json;
using RedoxFurnace.Quantities;
using RedoxFurnace.Tests.Cli;
using RedoxFurnace.Tests.Published;

namespace RedoxFurnace.Tests.Atmospheres;

/// <summary>The gas in balance with an oxide, against published dew points and cell voltages and against itself.</summary>
public class AtmosphereWindowTests
{
    private static readonly PublishedTable Values = PublishedTable.Load("check-values.csv");

    /// <summary>Holzheid and O'Neill 1995, evaluated with H2O of the NASA Glenn data; the dew point over ice is the frost point.</summary>
    [Theory]
    [InlineData("G6-004", 927)]
    [InlineData("G6-005", 982)]
    [InlineData("G6-006", 1038)]
    [InlineData("G6-007", 1066)]
    [InlineData("G6-009", 1149)]
    public void The_frost_point_over_chromium_is_the_published_one(string id, double celsius)
    {
        PublishedRow row = Values[id];
        JsonElement answer = Row($"atmosphere Cr2O3 --at {celsius.ToString(CultureInfo.InvariantCulture)}C --pressure 1atm --json");
        Assert.Equal(Number(row["value"]), answer.GetProperty("frost_point_C_max").GetDouble(), Number(row["tolerance"].TrimStart('±')));
    }

    /// <summary>Ni/NiO at 1000 K and Fe/wustite at 1000 C against air of 0.2095 atm.</summary>
    [Theory]
    [InlineData("G4-047", "NiO", "1000K")]
    [InlineData("G4-048", "FeO", "1000C")]
    public void The_probe_reads_the_published_voltage(string id, string oxide, string at)
    {
        PublishedRow row = Values[id];
        Assert.Equal(Number(row["value"]), Row($"atmosphere {oxide} --at {at} --json").GetProperty("probe_mV").GetDouble(), Number(row["tolerance"].TrimStart('±')));
    }

    /// <summary>
    /// The equivalents of one oxygen pressure, each from the definition: probe E = RT/4F ln(air/pO2), V = -dG/4F,
    /// and a dilute metal of activity a shifts ln pO2 by -(4/3) ln a for Cr2O3.
    /// </summary>
    [Fact]
    public void All_columns_tell_the_same_oxygen_pressure()
    {
        const double kelvin = 1273.15;
        JsonElement pure = Row("atmosphere Cr2O3 --at 1000C --json");
        JsonElement dilute = Row("atmosphere Cr2O3 --at 1000C --activity Cr=0.2 --json");
        double logOxygen = pure.GetProperty("log10_pO2_bar").GetDouble() * Math.Log(10);
        double probe = 1000 * PhysicalConstants.GasConstant * kelvin / (4 * PhysicalConstants.Faraday) * (Math.Log(0.2095 * 1.01325) - logOxygen);
        Assert.Equal(probe, pure.GetProperty("probe_mV").GetDouble(), 1e-6);
        Assert.Equal(-pure.GetProperty("dG_kJ_per_mol_O2").GetDouble() * 1000 / (4 * PhysicalConstants.Faraday), pure.GetProperty("decomposition_V").GetDouble(), 1e-9);
        Assert.Equal(-4.0 / 3 * Math.Log10(0.2), dilute.GetProperty("log10_pO2_bar").GetDouble() - pure.GetProperty("log10_pO2_bar").GetDouble(), 1e-9);
        Assert.True(dilute.GetProperty("frost_point_C_max").GetDouble() > pure.GetProperty("frost_point_C_max").GetDouble());
    }

    /// <summary>A leaner gas of hydrogen holds as much less water: H2O = share x P / ratio, in ppm of the whole.</summary>
    [Fact]
    public void Water_follows_the_share_of_hydrogen()
    {
        JsonElement whole = Row("atmosphere Cr2O3 --at 1000C --hydrogen 100% --json");
        JsonElement part = Row("atmosphere Cr2O3 --at 1000C --hydrogen 30% --json");
        Assert.Equal(whole.GetProperty("h2_to_h2o_min").GetDouble(), part.GetProperty("h2_to_h2o_min").GetDouble(), 1e-6);
        Assert.Equal(0.3, part.GetProperty("water_ppm_max").GetDouble() / whole.GetProperty("water_ppm_max").GetDouble(), 1e-3);
    }

    /// <summary>Sampled percentiles are those of a normal error: 1.645 standard errors each way, half the expanded uncertainty each.</summary>
    [Fact]
    public void Sampled_percentiles_agree_with_linear_propagation()
    {
        JsonElement row = Row("atmosphere Cr2O3 --at 1000C --uncertainty sample=40000 --json");
        double[] oxygen = [.. row.GetProperty("log10_pO2_percentiles").EnumerateArray().Select(value => value.GetDouble())];
        double standard = row.GetProperty("log10_pO2_uncertainty").GetDouble() / 2;
        Assert.Equal(row.GetProperty("log10_pO2_bar").GetDouble(), oxygen[1], 0.05 * standard);
        Assert.Equal(1.645 * standard, oxygen[2] - oxygen[1], 0.06 * standard);
        double[] frost = [.. row.GetProperty("frost_point_percentiles_C").EnumerateArray().Select(value => value.GetDouble())];
        Assert.Equal(2 * 1.645 * row.GetProperty("frost_point_uncertainty_C").GetDouble() / 2, frost[2] - frost[0], 0.08);
    }

    private static JsonElement Row(string line) => ProgramRun.Of(line).Json().GetProperty("rows").EnumerateArray().First(row => row.GetProperty("hardest").GetBoolean());

    private static double Number(string text) => double.Parse(text, CultureInfo.InvariantCulture);
}
