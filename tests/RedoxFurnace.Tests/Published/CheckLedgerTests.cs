namespace RedoxFurnace.Tests.Published;

public class CheckLedgerTests
{
    // Subjects a theory stands behind: CheckEquationTests, CheckValueTests, WaterVapourTests, PublishedGasPracticeTests.
    private static readonly string[] SubjectsWithTests =
    [
        "equation lines", "gas ratios", "buffers", "graphite", "carbothermic onset", "silicothermic magnesium", "water vapour", "probe", "thermite heat", "thermite temperature", "furnace practice", "metals in a gas",
    ];

    private static readonly string[] SubjectsToCome = ["campaign"];

    [Fact]
    public void The_ledger_lists_every_published_check_once_and_no_other() => Assert.Equal(
        CheckLedger.Values.Rows.Select(row => row["id"]).Order(StringComparer.Ordinal),
        CheckLedger.Ledger.Rows.Select(row => row["id"]).Order(StringComparer.Ordinal));

    [Fact]
    public void Every_entry_is_tested_or_waits_for_something_or_has_its_reason() => Assert.All(CheckLedger.Ledger.Rows, row =>
    {
        Assert.Contains(row["status"], new[] { "tested", "fitted", "later", "miss" });
        Assert.Contains(row["subject"], row["status"] == "later" ? SubjectsToCome : SubjectsWithTests);
        Assert.True(row["status"] is "tested" or "later" || row["reason"].Length > 15, row["id"]);
    });

    [Fact]
    public void What_the_assessment_was_fitted_to_is_not_counted_as_evidence() => Assert.Empty(
        PublishedTable.Load("measured-couples.csv").Rows.Where(row => row["use"] == "fit").Select(row => row["id"])
            .Intersect(CheckLedger.Ledger.Rows.Where(row => row["status"] == "tested").Select(row => row["id"])));

    [Fact]
    public void Most_of_the_published_checks_are_tested_and_few_are_missed()
    {
        ILookup<string, string> byStatus = CheckLedger.Ledger.Rows.ToLookup(row => row["status"], row => row["id"]);
        Assert.Equal(CheckLedger.Values.Rows.Count, byStatus["tested"].Count() + byStatus["fitted"].Count() + byStatus["later"].Count() + byStatus["miss"].Count());
        Assert.True(byStatus["tested"].Count() > 220, $"{byStatus["tested"].Count()} tested");
        Assert.True(byStatus["miss"].Count() < 35, $"{byStatus["miss"].Count()} missed");
    }
}
