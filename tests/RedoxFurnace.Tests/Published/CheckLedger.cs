namespace RedoxFurnace.Tests.Published;

/// <summary>What becomes of each row of the published check values: tested, later, or a known miss.</summary>
internal static class CheckLedger
{
    public static PublishedTable Values { get; } = PublishedTable.Load("check-values.csv");

    public static PublishedTable Ledger { get; } = PublishedTable.Load("check-ledger.csv");

    /// <summary>Ids of one subject that must agree.</summary>
    public static TheoryData<string> Tested(string subject) => Ids("tested", subject);

    /// <summary>Ids of one subject that are known to disagree.</summary>
    public static TheoryData<string> Misses(string subject) => Ids("miss", subject);

    private static TheoryData<string> Ids(string status, string subject) =>
        [.. Ledger.Rows.Where(row => row["status"] == status && row["subject"] == subject).Select(row => row["id"])];
}
