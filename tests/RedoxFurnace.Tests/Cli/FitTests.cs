using System.Globalization;
using System.Text.Json;

namespace RedoxFurnace.Tests.Cli;

/// <summary>A user's points of one couple, and the trail of a substance's numbers.</summary>
public class FitTests
{
    private const string Couple = "2 Ni + O2 = 2 NiO";

    // Points on a line reckoned by hand: mu = -470000 + 172 T J/mol O2, as pO2.
    private static string OnLine(double off = 0) => "temperature_K,log10_pO2_bar\n" + string.Concat(new[] { 900, 1000, 1100, 1200, 1300, 1400 }
        .Select(kelvin => string.Create(CultureInfo.InvariantCulture, $"{kelvin},{(-470000 + (172 * kelvin) + (kelvin == 1100 ? off : 50 * Math.Sin(kelvin))) / (8.314462618 * kelvin * Math.Log(10)):R}\n")));

    [Fact]
    public void A_line_is_found_again()
    {
        JsonElement values = Fit(OnLine()).Json().GetProperty("values");
        Assert.InRange(Value(values, "line_constant"), -470.3, -469.7);
        Assert.InRange(Value(values, "line_slope"), 171.7, 172.3);
    }

    // Slope, intercept and limits by the textbook formulas for y = 1, 3, 2, 5 at x = 1, 2, 3, 4: b = 1.1, a = 0, s^2 = 1.35; t(95 %, 2) = 4.3027 (tables of Student's t).
    [Fact]
    public void Limits_are_those_of_the_textbook()
    {
        string text = "temperature_K,log10_pO2_bar\n" + string.Concat(new[] { (1000, 1.0), (2000, 3.0), (3000, 2.0), (4000, 5.0) }
            .Select(pair => string.Create(CultureInfo.InvariantCulture, $"{pair.Item1},{pair.Item2 * 1000 / (8.314462618 * pair.Item1 * Math.Log(10)):R}\n")));
        JsonElement values = Fit(text).Json().GetProperty("values");
        Assert.Equal(1.1, Value(values, "line_slope"), 6);
        Assert.Equal(0, Value(values, "line_constant"), 6);
        Assert.Equal(4.3027 * Math.Sqrt(1.35 / 5), Limit(values, "line_slope"), 3);
        Assert.Equal(4.3027 * Math.Sqrt(1.35 * ((1 / 4.0) + (2.5 * 2.5 / 5))), Limit(values, "line_constant"), 3);
    }

    // The emf line of Ni/NiO, O'Neill and Pownceby 1993 (abstract): mu = -478967 + 248.514 T - 9.7961 T ln T; dH298 of NiO -239.3 +- 0.4 (Robie and Hemingway 1995), twice that per O2.
    [Fact]
    public void The_third_law_gives_the_calorimetric_enthalpy()
    {
        string text = "temperature_K,emf_mV\n" + string.Concat(new[] { 800, 900, 1000, 1100, 1200 }.Select(kelvin =>
        {
            double potential = -478967 + (248.514 * kelvin) - (9.7961 * kelvin * Math.Log(kelvin));
            double air = 8.314462618 * kelvin * Math.Log(0.2095 * 1.01325);
            return string.Create(CultureInfo.InvariantCulture, $"{kelvin},{(air - potential) / (4 * 96.48533212):R}\n");
        }));
        JsonElement values = Fit(text).Json().GetProperty("values");
        Assert.InRange(Value(values, "third_law_dH298"), -480.5, -477.5);
        Assert.InRange(Value(values, "second_law_dS298"), -192, -186);
    }

    [Fact]
    public void An_outlier_is_named_with_its_pull()
    {
        JsonElement answer = Fit(OnLine(off: 9000)).Json();
        Assert.Equal("line 4", answer.GetProperty("points").EnumerateArray().Single(point => point.GetProperty("outlier").GetBoolean()).GetProperty("point").GetString());
        Assert.Contains(answer.GetProperty("notes").EnumerateArray(), note => note.GetString()!.Contains("line 4 (1100 K) is an outlier: pull +", StringComparison.Ordinal));
    }

    [Fact]
    public void The_entry_can_be_pasted_and_gives_the_line_again()
    {
        JsonElement answer = Fit(OnLine()).Json();
        using ScratchFolder folder = new();
        File.WriteAllText(folder["mine.yaml"], answer.GetProperty("entry").GetString());
        File.WriteAllText(folder["sources.yaml"], answer.GetProperty("entry_source").GetString());
        JsonElement row = ProgramRun.OfWords(["constant", Couple, "--at", "1250K", "--oxides", Path.GetDirectoryName(folder["mine.yaml"])!, "--json"]).Json().GetProperty("rows")[0];
        Assert.InRange(row.GetProperty("dG_kJ").GetDouble(), (-470 + (0.172 * 1250)) - 0.1, (-470 + (0.172 * 1250)) + 0.1);
    }

    [Theory]
    [InlineData("temperature_K,pO2_bar\n1000,1e-15\n1100,1e-13\n", "2 points cannot fix")]
    [InlineData("temperature_K,pO2_bar\n1000,1e-15\n1000,2e-15\n1000,3e-15\n", "all points stand at 1000 K")]
    [InlineData("temperature_K,pO2_bar,error\n1000,1e-15,0\n1100,1e-13,1e-14\n1200,1e-11,1e-12\n", ":2: error '0'", "above 0")]
    [InlineData("temperature_K,pO2_bar\n1000,-1\n", ":2: pO2_bar '-1'", "out of range")]
    [InlineData("temperature_K,pO2_bar\n1000,x\n", ":2: pO2_bar 'x' is no number")]
    [InlineData("temperature_K,pO2_bar\n1000\n", ":2: 1 cells, the heading has 2")]
    [InlineData("temperature_K,pO2bar\n1000,1\n", ":1:", "did you mean 'pO2_bar'?")]
    [InlineData("temperature_K\n1000\n", ":1:", "needs one of")]
    [InlineData("", "is empty")]
    public void Wrong_points_are_refused(string text, params string[] parts) => Fit(text).IsRefused(2, parts);

    [Theory]
    [InlineData("2 Xx + O2 = 2 XxO", "'Xx'")]
    [InlineData("2 Ni O2 = 2 NiO", "equation")]
    [InlineData("2 NiO = 2 Ni + O2", "no O2 on its left")]
    public void A_wrong_couple_is_refused(string couple, string part) => Fit(OnLine(), couple).IsRefused(2, part);

    [Fact]
    public void Points_outside_the_data_still_give_a_line_and_say_what_is_missing()
    {
        string text = "temperature_K,log10_pO2_bar\n1000,-15\n2000,-5\n9000,3\n";
        JsonElement answer = Fit(text).Json();
        Assert.Contains(answer.GetProperty("notes").EnumerateArray(), note => note.GetString()!.Contains("no second or third law: no data for", StringComparison.Ordinal));
    }

    [Fact]
    public void The_trail_of_a_number_names_change_reason_measurements_and_uncertainty()
    {
        ProgramRun run = ProgramRun.Of("oxides why hematite", 200);
        Assert.Equal(0, run.ExitCode);
        foreach (string part in new[] { "source -824.25, used -826.69", "G1-105", "Robie", "covariance.yaml", "mcbride-2002" })
        {
            Assert.Contains(part, run.Output, StringComparison.Ordinal);
        }

        ProgramRun.Of("oxides why Fe7O9").IsRefused(2, "'Fe7O9'");
    }

    private static ProgramRun Fit(string text, string couple = Couple)
    {
        using ScratchFolder scratch = new();
        File.WriteAllText(scratch["data.csv"], text);
        return ProgramRun.OfWords(["oxides", "fit", scratch["data.csv"], "--couple", couple, "--json"]);
    }

    private static JsonElement Of(JsonElement values, string name) => values.EnumerateArray().Single(value => value.GetProperty("name").GetString() == name);

    private static double Value(JsonElement values, string name) => Of(values, name).GetProperty("fitted").GetDouble();

    private static double Limit(JsonElement values, string name) => Of(values, name).GetProperty("limit_95").GetDouble();
}
