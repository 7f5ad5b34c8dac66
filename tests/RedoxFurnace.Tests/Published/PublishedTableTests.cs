namespace RedoxFurnace.Tests.Published;

/// <summary>The helpers the published checks stand on must be able to fail.</summary>
public class PublishedTableTests
{
    [Theory]
    [InlineData("±3%", 100, 97, 103)]
    [InlineData("±0.05 (±0.6 at other air references)", 2, 1.95, 2.05)]
    [InlineData("±4 kJ per mol O2", -10, -14, -6)]
    [InlineData("±10%", -10, -11, -9)]
    [InlineData("x/÷2", 5, 2.5, 10)]
    public void A_tolerance_gives_its_band(string tolerance, double value, double low, double high)
    {
        (double foundLow, double foundHigh) = Tolerance.Band(value, tolerance);
        Assert.Equal(low, foundLow, 12);
        Assert.Equal(high, foundHigh, 12);
    }

    [Fact]
    public void A_value_outside_its_band_fails() =>
        Assert.Throws<Xunit.Sdk.InRangeException>(() => Tolerance.AssertWithin(100, "±3%", 103.1));

    [Fact]
    public void A_tolerance_without_a_figure_is_refused() => Assert.Throws<InvalidDataException>(() => Tolerance.Band(1, "as reported"));

    [Theory]
    [InlineData("safety-facts.csv", 90)]
    [InlineData("check-values.csv", 336)]
    [InlineData("carbide-nitride-lines.csv", 41)]
    [InlineData("measured-couples.csv", 70)]
    public void Every_table_is_headed_and_whole(string name, int rows)
    {
        PublishedTable table = PublishedTable.Load(name);
        Assert.True(table.Heading.Count >= 2, "a table says what it is and where it comes from");
        Assert.Equal(rows, table.Rows.Count);
        Assert.Equal(rows, table.Rows.Select(row => row["id"]).Distinct().Count());
        Assert.All(table.Rows, row => Assert.NotEqual("", row["source"]));
        Assert.All(table.Rows, row => Assert.Contains(row["provenance"], new[] { "memory", "retrieved" }));
    }

    [Theory]
    [InlineData("-1675100+313.2*T", 1000, -1361900)]
    [InlineData("(2+3*T)*10-4/2", 1, 48)]
    [InlineData("4.184*(-100+2*T)", 50, 0)]
    [InlineData("-5*T*ln(T)+0.1*T^2", 1, 0.1)]
    [InlineData("-26834.7/T+6.471", 1000, -20.3637)]
    public void An_expression_is_evaluated_as_printed(string text, double kelvin, double expected) =>
        Assert.Equal(expected, PublishedExpression.Evaluate(text, kelvin), 1e-9);

    [Theory]
    [InlineData("3+")]
    [InlineData("(T")]
    [InlineData("2*x")]
    [InlineData("1-2)")]
    public void What_is_no_expression_is_refused(string text) =>
        Assert.Throws<InvalidDataException>(() => PublishedExpression.Evaluate(text, 300));
}
