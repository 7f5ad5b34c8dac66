namespace RedoxFurnace.Tests.Published;

/// <summary>Measured oxygen potentials of measured-couples.csv; each row names its source.</summary>
public class MeasuredCoupleTests
{
    private static readonly PublishedTable Couples = PublishedTable.Load("measured-couples.csv");
    private static readonly PublishedTable Misses = PublishedTable.Load("measured-misses.csv");

    /// <summary>Points the assessment never saw.</summary>
    public static TheoryData<string, string> Evidence => Points("t_evidence_K", missed: false);

    /// <summary>Points the assessment was fitted to.</summary>
    public static TheoryData<string, string> Fitted => Points("t_fit_K", missed: false);

    /// <summary>Kept-out points known to disagree.</summary>
    public static TheoryData<string, string> Missed => Points("t_evidence_K", missed: true);

    [Theory, MemberData(nameof(Evidence))]
    public void A_kept_out_measurement_is_met(string id, string kelvin)
    {
        (double difference, double allowed) = MeasuredCouple.Compare(Couples[id], PublishedTable.Number(kelvin));
        Assert.InRange(difference, -allowed, allowed);
    }

    // No evidence: the enthalpies were chosen to meet these. It shows that the database holds the assessment as it was made.
    [Theory, MemberData(nameof(Fitted))]
    public void A_fitted_measurement_is_met_as_the_assessment_left_it(string id, string kelvin)
    {
        (double difference, double allowed) = MeasuredCouple.Compare(Couples[id], PublishedTable.Number(kelvin));
        Assert.InRange(difference, -allowed, allowed);
    }

    [Theory, MemberData(nameof(Missed))]
    public void A_known_miss_is_still_a_miss(string id, string kelvin)
    {
        (double difference, double allowed) = MeasuredCouple.Compare(Couples[id], PublishedTable.Number(kelvin));
        Assert.NotInRange(difference, -allowed, allowed);
    }

    [Fact]
    public void Every_listed_miss_is_a_kept_out_point_with_a_reason()
    {
        Assert.Equal(Misses.Rows.Count, Missed.Count);
        Assert.All(Misses.Rows, row => Assert.True(row["reason"].Length > 20, row["id"]));
    }

    [Fact]
    public void The_table_is_whole()
    {
        Assert.Equal(70, Couples.Rows.Count);
        Assert.All(Couples.Rows, row => Assert.True(row["use"] == "fit" == row["t_fit_K"].Length > 0, row["id"]));
        Assert.All(Couples.Rows, row => Assert.NotEqual("", row["source"]));
    }

    private static TheoryData<string, string> Points(string column, bool missed)
    {
        TheoryData<string, string> points = [];
        foreach (PublishedRow row in Couples.Rows)
        {
            foreach (string kelvin in row[column].Split(' ', StringSplitOptions.RemoveEmptyEntries))
            {
                if (Misses.Rows.Any(miss => miss["id"] == row["id"] && miss["t_K"] == kelvin) == missed)
                {
                    points.Add(row["id"], kelvin);
                }
            }
        }

        return points;
    }
}
