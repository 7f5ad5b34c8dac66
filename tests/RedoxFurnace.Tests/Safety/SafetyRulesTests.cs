using RedoxFurnace.Safety;
using RedoxFurnace.Tests.Published;

namespace RedoxFurnace.Tests.Safety;

public class SafetyRulesTests
{
    private static readonly PublishedTable Facts = PublishedTable.Load("safety-facts.csv");

    /// <summary>Every rule that comes with the library.</summary>
    public static TheoryData<string> RuleIds => [.. SafetyRules.Bundled.Rules.Select(rule => rule.Id)];

    /// <summary>Every fact of every rule.</summary>
    public static TheoryData<string, string> FactRows
    {
        get
        {
            TheoryData<string, string> rows = [];
            foreach (SafetyRule rule in SafetyRules.Bundled.Rules)
            {
                foreach (SafetyFact fact in rule.Facts)
                {
                    rows.Add(rule.Id, fact.Row);
                }
            }

            return rows;
        }
    }

    [Theory, MemberData(nameof(RuleIds))]
    public void A_rule_speaks_where_it_fits_and_is_silent_where_it_does_not(string id)
    {
        (HazardWork fitting, HazardWork plain) = SafetySamples.For(id);
        Assert.Contains(id, IdsFor(fitting));
        Assert.DoesNotContain(id, IdsFor(plain));
    }

    [Fact]
    public void Every_sample_belongs_to_a_rule() =>
        Assert.Empty(SafetySamples.Ids.Except(SafetyRules.Bundled.Rules.Select(rule => rule.Id)));

    [Fact]
    public void A_harmless_piece_of_work_calls_for_no_note() =>
        Assert.Empty(IdsFor(new HazardWork { Charge = ["Bi2O3"], LowestKelvin = 300, HighestKelvin = 400 }));

    [Fact]
    public void Ids_are_unique() =>
        Assert.Equal(SafetyRules.Bundled.Rules.Count, SafetyRules.Bundled.Rules.Select(rule => rule.Id).Distinct().Count());

    [Theory, MemberData(nameof(FactRows))]
    public void A_fact_is_the_published_one(string id, string row)
    {
        SafetyFact fact = SafetyRules.Bundled.Rules.Single(rule => rule.Id == id).Facts.First(fact => fact.Row == row);
        PublishedRow published = Facts[row];
        Assert.Equal(published["value"], fact.Value);
        Assert.StartsWith(fact.Unit, published["unit"], StringComparison.Ordinal);
        Assert.Equal(published["provenance"] == "retrieved", fact.Retrieved);
        Assert.NotEqual("", fact.Authority);
    }

    [Fact]
    public void Every_published_fact_is_used() => Assert.Empty(
        Facts.Rows.Select(row => row["id"]).Except(SafetyRules.Bundled.Rules.SelectMany(rule => rule.Facts).Select(fact => fact.Row)));

    [Fact]
    public void Notes_come_gravest_first_then_by_id()
    {
        IReadOnlyList<HazardNote> notes = SafetyRules.Bundled.For(HazardContextBuilder.Build(new HazardWork
        {
            Charge = ["Cr2O3", "MnO", "SiO2"],
            Reductants = ["Al", "H2"],
            Gases = ["Ar"],
            Tags = [HazardTags.LiningWork],
        }));
        Assert.True(notes.Select(note => note.Severity).Distinct().Count() == 3, "the sample shows all three severities");
        Assert.Equal(notes.OrderBy(note => note.Severity).ThenBy(note => note.Id, StringComparer.Ordinal), notes);
    }

    [Fact]
    public void A_note_names_its_limits_strictest_first_and_asks_for_the_current_edition()
    {
        string text = SafetyRules.Bundled.For(new HazardContext(["CO"], [])).First(note => note.Id == "carbon-monoxide").Text;
        int strict = text.IndexOf("8 h mean 20 ppm (EU, Directive (EU) 2017/164)", StringComparison.Ordinal);
        int loose = text.IndexOf("8 h mean 50 ppm (OSHA PEL, 29 CFR 1910.1000 Table Z-1)", StringComparison.Ordinal);
        Assert.True(strict > 0 && loose > strict, text);
        Assert.EndsWith("Check the current editions.", text, StringComparison.Ordinal);
        Assert.Contains("10.9 % v/v (IEC 60079-20-1, edition not stated, from memory)", text, StringComparison.Ordinal);
    }

    [Fact]
    public void The_closing_line_puts_site_rules_first_and_calls_itself_a_calculation()
    {
        Assert.StartsWith("Site rules, local codes and licensed practitioners come first", SafetyRules.ClosingLine, StringComparison.Ordinal);
        Assert.Contains("a calculation, not an approval", SafetyRules.ClosingLine, StringComparison.Ordinal);
    }

    [Fact]
    public void An_unknown_temperature_does_not_silence_a_rule()
    {
        HazardContext cold = new(["Mg"], [], 290, 300);
        HazardContext unknown = new(["Mg"], []);
        Assert.DoesNotContain("magnesium-vapour", SafetyRules.Bundled.For(cold).Select(note => note.Id));
        Assert.Contains("magnesium-vapour", SafetyRules.Bundled.For(unknown).Select(note => note.Id));
    }

    private static IEnumerable<string> IdsFor(HazardWork work) =>
        SafetyRules.Bundled.For(HazardContextBuilder.Build(work)).Select(note => note.Id);
}
