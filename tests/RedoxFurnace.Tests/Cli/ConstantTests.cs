using System.Text.Json;

namespace RedoxFurnace.Tests.Cli;

/// <summary>Constants of reactions against published values and against thermodynamic identities; refusals.</summary>
public class ConstantTests
{
    [Theory]
    [InlineData("Fe2O3 + CO = Fe + CO2", "Fe2O3 + 3 CO = 2 Fe + 3 CO2")]
    [InlineData("Al + Cr2O3 = Al2O3 + Cr", "2 Al + Cr2O3 = Al2O3 + 2 Cr")]
    [InlineData("CH4 + O2 = CO2 + H2O", "CH4 + 2 O2 = CO2 + 2 H2O")]
    [InlineData("2 Ni + O2 = 2 NiO", "2 Ni + O2 = 2 NiO")]
    [InlineData("Ni + 1/2 O2 = NiO", "Ni + 1/2 O2 = NiO")]
    public void An_equation_is_balanced(string written, string balanced)
        => Assert.Equal(balanced, ProgramRun.OfWords(["constant", written, "--at", "700C", "--json"]).Json().GetProperty("equation").GetString());

    // C + CO2 = 2 CO: log10 K = 0 near 700 C (Boudouard 1905; textbooks give 700 to 706 C), and K about 1.9 at 1000 K (NIST-JANAF, from memory).
    [Fact]
    public void The_boudouard_reaction_turns_near_700_C()
    {
        JsonElement answer = ProgramRun.OfWords(["constant", "C + CO2 = 2 CO", "--at", "1000K", "--json"]).Json();
        Assert.InRange(answer.GetProperty("turning_temperatures_K")[0].GetDouble(), 970, 985);
        Assert.Equal("floor", answer.GetProperty("turning")[0].GetProperty("kind").GetString());
        Assert.InRange(Math.Pow(10, answer.GetProperty("rows")[0].GetProperty("log10_K").GetDouble()), 1.6, 2.1);
    }

    // CaCO3 = CaO + CO2 reaches 1 bar near 890 to 900 C (textbooks; common practice, no source); a tenth of a bar lowers it.
    [Fact]
    public void A_lower_pressure_lowers_the_floor()
    {
        double Turn(params string[] more) => ProgramRun.OfWords(["constant", "CaCO3 = CaO + CO2", "--at", "800C", "--json", .. more]).Json().GetProperty("turning_temperatures_K")[0].GetDouble();
        Assert.InRange(Turn() - 273.15, 870, 910);
        Assert.InRange(Turn("--partial", "CO2=0.1bar") - Turn(), -140, -80);
    }

    [Fact]
    public void Gibbs_enthalpy_and_entropy_agree_and_driving_force_is_RT_ln_K_over_Q()
    {
        JsonElement row = ProgramRun.OfWords(["constant", "Fe2O3 + 3 H2 = 2 Fe + 3 H2O", "--at", "800C", "--partial", "H2=0.5bar,H2O=0.25bar", "--json"]).Json().GetProperty("rows")[0];
        double kelvin = row.GetProperty("temperature_K").GetDouble();
        double gibbs = row.GetProperty("dG_kJ").GetDouble();
        Assert.Equal(row.GetProperty("dH_kJ").GetDouble() - (kelvin * row.GetProperty("dS_J_per_K").GetDouble() / 1000), gibbs, 6);
        Assert.Equal(3 * Math.Log10(0.5), row.GetProperty("log10_Q").GetDouble(), 9);
        Assert.Equal(-gibbs - (8.314462618e-3 * kelvin * 3 * Math.Log(0.5)), row.GetProperty("driving_kJ").GetDouble(), 6);
    }

    [Fact]
    public void A_measured_constant_is_met_at_its_own_temperature_and_carried_by_the_enthalpy()
    {
        JsonElement rows = ProgramRun.OfWords(["constant", "CO + H2O = CO2 + H2", "--at", "900C,1000C", "--from", "1000C: 0.42", "--json"]).Json().GetProperty("rows");
        Assert.Equal(Math.Log10(0.42), rows[1].GetProperty("log10_K_from_measured").GetDouble(), 9);
        double mean = (rows[0].GetProperty("dH_kJ").GetDouble() + rows[1].GetProperty("dH_kJ").GetDouble()) / 2;
        double byHand = Math.Log10(0.42) - (mean / 8.314462618e-3 * ((1 / 1173.15) - (1 / 1273.15)) / Math.Log(10));
        Assert.Equal(byHand, rows[0].GetProperty("log10_K_from_measured").GetDouble(), 3);
    }

    [Theory]
    [InlineData(2, "Fe2O3 + CO", "700C", "'Fe2O3 + CO'", "not understood")]
    [InlineData(2, "Fe2O3 + CO = Fe = CO2", "700C", "not understood")]
    [InlineData(2, "Fe2O9 + CO = Fe + CO2", "700C", "'Fe2O9'")]
    [InlineData(2, "Fe + CO = Fe + CO2", "700C", "stands twice")]
    [InlineData(1, "Fe2O3 + C = Fe + CaO", "700C", "cannot be balanced", "stands on the")]
    [InlineData(1, "C + O2 = CO + CO2", "700C", "2 independent solutions")]
    [InlineData(1, "Fe + CO2 + O2 = Fe2O3 + CO", "700C", "independent solutions")]
    [InlineData(1, "Ni + NiO = O2", "700C", "on the other side")]
    [InlineData(1, "2 Ni + O2 = 2 NiO", "5000C", "no data")]
    [InlineData(2, "2 Ni + O2 = 2 NiO", "700", "no unit")]
    public void What_cannot_be_answered_is_said_in_one_line(int code, string equation, string at, params string[] parts)
        => ProgramRun.OfWords(["constant", equation, "--at", at]).IsRefused(code, parts);

    [Theory]
    [InlineData("--from", "1000C 0.42", "1000C: 0.42")]
    [InlineData("--from", "1000C: 0", "above 0")]
    [InlineData("--from", "1000: 1", "no unit")]
    [InlineData("--partial", "CO2=0.1bar", "no gas of")]
    [InlineData("--partial", "O2", "not understood")]
    public void A_wrong_option_is_refused(string option, string value, string part)
        => ProgramRun.OfWords(["constant", "2 Ni + O2 = 2 NiO", "--at", "1000C", option, value]).IsRefused(2, part);
}
