using System.Globalization;

namespace RedoxFurnace.Tests.Cli;

/// <summary>Wrong requests: one line on standard error that quotes the word, the right exit code, nothing on standard output.</summary>
public class BadInputTests
{
    private const int Wrong = 2;
    private const int Unanswerable = 1;

    [Theory]
    [InlineData("rank Cr2O4 --at 1400C", "'Cr2O4'", "did you mean 'Cr2O3'?")]
    [InlineData("rank Cr2O3 --at 1400C --with Cc", "'Cc'", "did you mean 'C'?")]
    [InlineData("rank Cr2O3 --at 1400C --with FeSi57", "'FeSi57'", "did you mean 'FeSi75'?")]
    [InlineData("rank Cr --at 1400C", "'Cr'", "not a condensed oxide")]
    [InlineData("rank CO2 --at 1400C", "'CO2'", "not a condensed oxide")]
    [InlineData("rank FeCr2O4 --at 1400C --metal Ni", "'Ni'", "Cr and Fe")]
    [InlineData("ladder Xq --at 1000C", "'Xq'")]
    [InlineData("oxides show SiO3 --at 25C", "'SiO3'")]
    public void An_unknown_substance_is_named_and_the_nearest_offered(string line, params string[] parts) => ProgramRun.Of(line).IsRefused(Wrong, parts);

    [Theory]
    [InlineData("rank Cr2O3 --at 1400", "'1400'", "no unit", "1400C")]
    [InlineData("rank Cr2O3 --at 1400C --pressure 10", "'10'", "no unit", "10Pa")]
    [InlineData("atmosphere Cr2O3 --at 1400", "'1400'", "no unit")]
    [InlineData("rank Cr2O3 --at 1400C --frost -50", "'-50'", "no unit")]
    public void A_missing_unit_is_refused_with_an_example(string line, params string[] parts) => ProgramRun.Of(line).IsRefused(Wrong, parts);

    [Theory]
    [InlineData("rank Cr2O3 --at 1400C..1000C/50C", "reversed", "1000C..1400C/50C")]
    [InlineData("rank Cr2O3 --at 1000C..1400C", "no step", "1000C..1400C/50C")]
    [InlineData("rank Cr2O3 --at 1000C..1400C/0C", "--at")]
    [InlineData("rank Cr2O3 --at 1000C..1400C/-50C", "--at")]
    public void A_range_that_leads_nowhere_is_refused_with_the_right_spelling(string line, params string[] parts) => ProgramRun.Of(line).IsRefused(Wrong, parts);

    [Theory]
    [InlineData("rank Cr2O3 --at 1400C --activity Cr=0", "'Cr=0'", "above 0")]
    [InlineData("rank Cr2O3 --at 1400C --activity Cr=-0.2", "'Cr=-0.2'", "above 0")]
    [InlineData("rank Cr2O3 --at 1400C --activity Cr=0.2,Ni=8%", "mixes activities and mass percents")]
    [InlineData("rank Cr2O3 --at 1400C --gas-ratio -3", "'-3'", "above 0")]
    [InlineData("atmosphere Cr2O3 --at 1000C --hydrogen 120%", "'120%'", "0 to 100%")]
    [InlineData("rank Cr2O3 --at -300C", "absolute zero")]
    public void A_quantity_out_of_range_is_refused(string line, params string[] parts) => ProgramRun.Of(line).IsRefused(Wrong, parts);

    [Theory]
    [InlineData("rank Cr2O3 --at NaNC")]
    [InlineData("rank Cr2O3 --at nanC")]
    [InlineData("rank Cr2O3 --at InfinityC")]
    [InlineData("rank Cr2O3 --at 1e999C")]
    [InlineData("rank Cr2O3 --at 1400C --activity Cr=NaN")]
    [InlineData("rank Cr2O3 --at 1400C --activity Cr=1e999")]
    [InlineData("rank Cr2O3 --at 1400C --pressure NaNbar")]
    [InlineData("rank Cr2O3 --at 1400C --pressure 0bar")]
    [InlineData("rank Cr2O3 --at 1400C --gas-ratio NaN")]
    [InlineData("rank Cr2O3 --at 1400C --pco Infinitybar")]
    [InlineData("atmosphere Cr2O3 --at 1000C --hydrogen NaN%")]
    public void What_is_no_finite_number_is_refused(string line) => ProgramRun.Of(line).IsRefused(Wrong);

    [Theory]
    [InlineData("gas \"H2 80%, N2 50%\" --at 900C", "130 %", "at most 100 %")]
    [InlineData("gas \"H2 30%, Xx 20%\" --at 900C", "'Xx'", "H2O")]
    [InlineData("gas \"H2 -3%\" --at 900C", "'-3%'", "0 to 100%")]
    [InlineData("gas \"H2 130%\" --at 900C", "'130%'", "0 to 100%")]
    [InlineData("gas \"H2 30%, Ar 70%, frost -45C, H2O 2%\" --at 900C", "water is given twice")]
    [InlineData("gas --as endothermc --at 900C", "'endothermc'", "did you mean 'endothermic'?")]
    [InlineData("gas --at 900C", "needs an analysis")]
    [InlineData("gas \"H2 100%\" --at 900C --over Qq=0.1", "'Qq'")]
    [InlineData("gas \"H2 100%\" --at 900C --over Cr=0.1,Ni=8%", "mixes activities and mass percents")]
    [InlineData("gas \"H2 100%\" --at 900C --steel C=3%", "'C=3%'")]
    [InlineData("reading --probe 1120mV", "needs --probe-temperature")]
    [InlineData("reading --probe 1120 --probe-temperature 900C", "no unit")]
    [InlineData("reading --frost -57C --at-pressure 6bar", "absolute or gauge", "6bara")]
    [InlineData("reading", "needs at least one reading")]
    [InlineData("reading --frost 20C", "frost")]
    public void A_gas_or_reading_that_cannot_be_is_refused(string line, params string[] parts) => ProgramRun.Of(line).IsRefused(Wrong, parts);

    [Theory]
    [InlineData("gas \"H2 100%, frost -40C\" --at 3000C", "300 to 2500 K")]
    [InlineData("gas \"H2 100%, frost -40C\" --at 900C --pressure 300bar", "1e-9 to 100 bar")]
    public void A_gas_outside_the_range_reckoned_is_refused_with_the_limit(string line, params string[] parts) => ProgramRun.Of(line).IsRefused(Unanswerable, parts);

    [Theory]
    [InlineData("chart --of Cr --to chart.bmp", "'chart.bmp'", ".svg, .png, .pdf")]
    [InlineData("chart --of Cr --range 1800C..200C --to chart.svg", "reversed", "200C..1800C")]
    [InlineData("chart --to chart.svg", "no lines")]
    [InlineData("chart --of Cr --size A9 --to chart.svg", "'A9'", "A4")]
    [InlineData("chart --of Cr --scales pO3 --to chart.svg", "'pO3'", "CO/CO2")]
    [InlineData("chart --of Cr --highlight Fe --to chart.svg", "'Fe'", "Cr/Cr2O3")]
    [InlineData("chart no-such-sheet.yaml --to chart.svg", "'no-such-sheet.yaml'")]
    public void A_chart_that_cannot_be_is_refused(string line, params string[] parts)
    {
        ProgramRun.Of(line).IsRefused(Wrong, parts);
        Assert.False(File.Exists("chart.svg"));
    }

    [Fact]
    public void A_target_that_cannot_be_written_or_exists_is_refused_and_left_alone()
    {
        using ScratchFolder folder = new();
        ProgramRun.OfWords(["chart", "--of", "Cr", "--to", folder["none/chart.svg"]]).IsRefused(Unanswerable, "does not exist");
        string there = folder.Write("chart.svg", "mine");
        ProgramRun.OfWords(["chart", "--of", "Cr", "--to", there]).IsRefused(Unanswerable, "exists already", "--force");
        Assert.Equal("mine", File.ReadAllText(there));
        Assert.Equal(0, ProgramRun.OfWords(["chart", "--of", "Cr", "--to", there, "--force"]).ExitCode);
        Assert.StartsWith("<?xml", File.ReadAllText(there), StringComparison.Ordinal);
        Assert.Equal(["chart.svg"], Directory.GetFiles(folder.Folder).Select(Path.GetFileName));
    }

    [Theory]
    [InlineData("of: Cr,Fe\nwth: C\n", "sheet.yaml:2:1", "'wth'", "did you mean 'with'?")]
    [InlineData("of: Cr,Fe\nrange: 1800C..200C\n", "sheet.yaml:2:8", "reversed")]
    [InlineData("of: Cr,Fe\nof: Cr\n", "sheet.yaml:2:1", "twice")]
    [InlineData("of: Cr,Qq\n", "sheet.yaml:1:5", "'Qq'")]
    public void A_wrong_chart_sheet_is_refused_with_line_and_column(string text, params string[] parts)
    {
        using ScratchFolder folder = new();
        string sheet = folder.Write("sheet.yaml", text.Replace("\\n", "\n", StringComparison.Ordinal));
        ProgramRun.OfWords(["chart", sheet, "--to", folder["chart.svg"]]).IsRefused(Wrong, parts);
    }

    [Theory]
    [InlineData("overview --at 1200C --of FeCr2O4", "not a simple condensed oxide")]
    [InlineData("overview --at 1200C --with Qq", "'Qq'")]
    [InlineData("overview --at 1200", "no unit")]
    [InlineData("charge \"Cr2O4 1kg\" --at 1000C", "'Cr2O4'", "did you mean 'Cr2O3'?")]
    [InlineData("charge \"Cr2O3 0kg\" --at 1000C", "above 0")]
    [InlineData("charge \"Cr2O3\" --at 1000C", "not understood", "Cr2O3 1000kg")]
    [InlineData("charge \"Cr2O3 5stone\" --at 1000C", "'stone'", "kg")]
    [InlineData("charge \"\" --at 1000C", "empty")]
    [InlineData("charge \"WO3 1kg\" --gas \"H2 20kg\" --at 800C", "'kg'", "Nm3")]
    [InlineData("charge \"WO3 1kg\" --gas \"C 20Nm3\" --at 800C", "no gas")]
    [InlineData("batch-heat \"Fe2O3 1kg, Al 1kg\" --moisture 140%", "'140%'", "0 to 100%")]
    [InlineData("batch-heat \"Fe2O3 1kg, Al 1kg\" --from -80C", "-40 C")]
    [InlineData("batch-heat \"CaC2 1kg\"", "'CaC2'", "no heat data")]
    public void A_charge_that_cannot_be_is_refused(string line, params string[] parts) => ProgramRun.Of(line).IsRefused(Wrong, parts);

    [Theory]
    [InlineData("charge \"Cr2O3 1kg\" --at 8000C", "data")]
    public void A_charge_above_all_data_is_refused(string line, params string[] parts) => ProgramRun.Of(line).IsRefused(Unanswerable, parts);

    [Theory]
    [InlineData("rnk Cr2O3 --at 1400C", "'rnk'", "did you mean 'rank'?")]
    [InlineData("rank Cr2O3 --at 1400C --wth C", "'--wth'", "did you mean '--with'?")]
    [InlineData("rank Cr2O3 --at 1400C --by price", "'price'", "margin, crossover, mass, heat")]
    [InlineData("rank Cr2O3 --at 1400C --uncertainty smple=10", "'smple=10'", "sample=10000")]
    [InlineData("rank Cr2O3 --at 1400C --uncertainty sample=3", "'sample=3'", "100 to 200000")]
    [InlineData("rank Cr2O3 --at 1400C --units uk", "'uk'", "did you mean 'us'?")]
    [InlineData("rank Cr2O3 --at 1400C --json --csv", "exclude each other")]
    [InlineData("rank Cr2O3", "needs --at")]
    [InlineData("rank", "rank")]
    [InlineData("", "no command given")]
    [InlineData("@answers.txt", "'@answers.txt'")]
    public void A_wrong_word_of_the_command_line_is_quoted(string line, params string[] parts) => ProgramRun.Of(line).IsRefused(Wrong, parts);

    [Theory]
    [InlineData("atmosphere MnO --at 3000C", "MnO", "2054 K")]
    [InlineData("oxides show CaC2 --at 25C", "CaC2", "1112")]
    public void A_temperature_outside_the_data_names_the_limit(string line, params string[] parts) => ProgramRun.Of(line).IsRefused(Unanswerable, parts);

    [Fact]
    public void A_reductant_without_data_keeps_its_row_with_the_limit()
    {
        ProgramRun run = ProgramRun.Of("rank MgO --at 1600C --with Al,CaC2");
        Assert.Equal(0, run.ExitCode);
        Assert.Contains(run.Output.Split('\n'), line => line.Contains("CaC2", StringComparison.Ordinal) && line.Contains("no data", StringComparison.Ordinal));
        Assert.Contains("1757 K", run.Output, StringComparison.Ordinal);
    }

    [Fact]
    public void A_folder_that_is_none_is_refused() => ProgramRun.Of("rank Cr2O3 --at 1400C --oxides no-such-folder").IsRefused(Wrong, "'no-such-folder'", "not a folder");

    [Fact]
    public void A_locale_with_decimal_commas_changes_nothing()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            // Built from the invariant one: the program runs without the machine's culture data.
            CultureInfo german = (CultureInfo)CultureInfo.InvariantCulture.Clone();
            german.NumberFormat.NumberDecimalSeparator = ",";
            german.NumberFormat.NumberGroupSeparator = ".";
            german.NumberFormat.NegativeSign = "−";
            foreach (string line in new[] { "rank Cr2O3 --at 1400.5C --with C,Al", "rank Cr2O3 --at 1400.5C --json", "atmosphere Cr2O3 --at 1000C --activity Cr=0.2", "ladder Fe --at 600C --csv", "oxides show SiO2 --at 25C", "oxides check" })
            {
                CultureInfo.CurrentCulture = CultureInfo.InvariantCulture;
                ProgramRun plain = ProgramRun.Of(line);
                CultureInfo.CurrentCulture = german;
                Assert.Equal(plain, ProgramRun.Of(line));
                Assert.Equal(0, plain.ExitCode);
            }
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }

    [Fact]
    public void The_same_request_gives_the_same_bytes() => Assert.Equal(ProgramRun.Of("rank Cr2O3 --at 1400C"), ProgramRun.Of("rank Cr2O3 --at 1400C"));
}
