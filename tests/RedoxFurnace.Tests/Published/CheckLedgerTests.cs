namespace RedoxFurnace.Tests.Published;

public class CheckLedgerTests
{
    [Fact]
    public void The_ledger_lists_every_published_check_once_and_no_other() => Assert.Equal(
        CheckLedger.Values.Rows.Select(row => row["id"]).Order(StringComparer.Ordinal),
        CheckLedger.Ledger.Rows.Select(row => row["id"]).Order(StringComparer.Ordinal));

    [Fact]
    public void Every_entry_has_a_status_and_a_subject_and_a_miss_its_reason() => Assert.All(CheckLedger.Ledger.Rows, row =>
    {
        Assert.Contains(row["status"], new[] { "tested", "later", "miss" });
        Assert.NotEqual("", row["subject"]);
        Assert.True(row["status"] != "miss" || row["reason"].Length > 20, row["id"]);
    });
}
