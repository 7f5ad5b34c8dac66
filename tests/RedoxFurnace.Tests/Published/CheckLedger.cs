namespace RedoxFurnace.Tests.Published;

/// <summary>What becomes of each row of the published check values: tested, later, or a known miss.</summary>
internal static class CheckLedger
{
    private static readonly PublishedTable CheckValues = PublishedTable.Load("check-values.csv");
    private static readonly PublishedTable CarbidesAndNitrides = PublishedTable.Load("carbide-nitride-lines.csv");

    public static PublishedTable Ledger { get; } = PublishedTable.Load("check-ledger.csv");

    /// <summary>The published rows of both tables.</summary>
    public static PublishedTable Values { get; } = CheckValues.With(CarbidesAndNitrides);

    /// <summary>Ids of one status and some subjects.</summary>
    public static TheoryData<string> Of(string status, params string[] subjects) =>
        [.. Ledger.Rows.Where(row => row["status"] == status && subjects.Contains(row["subject"])).Select(row => row["id"])];
}
