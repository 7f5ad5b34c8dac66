using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Safety;

/// <summary>A bad rules file is refused with file, line and column.</summary>
public class SafetyRulesFileTests
{
    private const string Good = """
        rules:
          - id: hot-metal
            severity: danger
            when:
              - tags: [molten-metal]
            text: Stand back.
            facts:
              - { what: distance, value: "5", unit: m, authority: site rule, provenance: memory, row: X-1 }
            source: invented
        """;

    [Fact]
    public void A_good_file_is_read_whole()
    {
        SafetyRule rule = Assert.Single(SafetyRules.Parse(Good, "mine.yaml").Rules);
        Assert.Equal(("hot-metal", HazardSeverity.Danger, "Stand back.", "invented"), (rule.Id, rule.Severity, rule.Advice, rule.Source));
        Assert.Equal("Stand back. Figures, strictest first: distance 5 m (site rule, from memory). Check the current editions.", rule.ToNote().Text);
    }

    [Theory]
    [InlineData("severity: danger", "severty: danger", 3, 5, "unknown key 'severty'; did you mean 'severity'?")]
    [InlineData("severity: danger", "severity: dangerous", 3, 15, "severity 'dangerous' is not allowed; did you mean 'danger'?")]
    [InlineData("id: hot-metal", "id: Hot Metal", 2, 9, "lower-case letters")]
    [InlineData("    source: invented", "", 2, 5, "the key 'source' is missing")]
    [InlineData("[molten-metal]", "[molten-metall]", 5, 16, "tag 'molten-metall' is not allowed; did you mean 'molten-metal'?")]
    [InlineData("tags: [molten-metal]", "above_c: warm", 5, 18, "number 'warm' is not allowed")]
    [InlineData("tags: [molten-metal]", "above_c: NaN", 5, 18, "number 'NaN' is not allowed")]
    [InlineData("- tags: [molten-metal]", "- {}", 5, 9, "an empty condition would always hold")]
    [InlineData("text: Stand back.", "text: Stand back.\n    text: Run.", 7, 5, "the key 'text' stands twice")]
    [InlineData("text: Stand back.", "text: [a]", 6, 11, "expected a single value, found a list")]
    [InlineData("text: Stand back.", "text: &a Stand back.", 6, 11, "anchors and aliases")]
    [InlineData("text: Stand back.", "text: *a", 6, 11, "anchors and aliases")]
    [InlineData("provenance: memory", "provenance: rumour", 8, 82, "provenance 'rumour' is not allowed")]
    [InlineData("text: Stand back.", "text: \"Stand back.", 6, 11, "not well-formed YAML")]
    public void A_fault_is_named_with_its_place(string good, string bad, int line, int column, string message)
    {
        DocumentException fault = Assert.Throws<DocumentException>(
            () => SafetyRules.Parse(Good.Replace(good, bad, StringComparison.Ordinal) + "\n", "mine.yaml"));
        Assert.Contains(message, fault.Message, StringComparison.Ordinal);
        Assert.StartsWith($"mine.yaml:{line}:{column}: ", fault.Message, StringComparison.Ordinal);
        Assert.Equal(("mine.yaml", line, column), (fault.At.File, (int)fault.At.Line, (int)fault.At.Column));
        Assert.DoesNotContain('\n', fault.Message);
    }

    [Fact]
    public void The_same_id_twice_is_refused()
    {
        string twice = Good + "\n" + Good.Split('\n', 2)[1];
        DocumentException fault = Assert.Throws<DocumentException>(() => SafetyRules.Parse(twice, "mine.yaml"));
        Assert.StartsWith("mine.yaml:10:9: a rule 'hot-metal' stands above already", fault.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("lower", "4", true)]
    [InlineData("lower", "6", false)]
    [InlineData("higher", "6", true)]
    [InlineData("higher", "4", false)]
    public void A_laxer_limit_before_a_stricter_one_is_refused(string stricter, string second, bool refused)
    {
        string first = Good.Split('\n')[7];
        string next = first.Replace("\"5\"", $"\"{second}\"", StringComparison.Ordinal).Replace("row: X-1", $"row: X-2, stricter: {stricter}", StringComparison.Ordinal);
        string text = Good.Replace(first, first + "\n" + next, StringComparison.Ordinal);
        if (refused)
        {
            DocumentException fault = Assert.Throws<DocumentException>(() => SafetyRules.Parse(text, "mine.yaml"));
            Assert.StartsWith("mine.yaml:9:9: 'distance'", fault.Message, StringComparison.Ordinal);
        }
        else
        {
            Assert.Equal(2, SafetyRules.Parse(text, "mine.yaml").Rules[0].Facts.Count);
        }
    }

    [Fact]
    public void An_empty_file_is_refused() =>
        Assert.StartsWith("mine.yaml:", Assert.Throws<DocumentException>(() => SafetyRules.Parse("", "mine.yaml")).Message, StringComparison.Ordinal);

    [Fact]
    public void A_users_own_rules_stand_in_place_of_the_built_in_ones()
    {
        SubstanceDatabase database = SubstanceDatabase.WithOverlay([new DatabaseFile("safety.yaml", Good)]);
        Assert.Equal("hot-metal", Assert.Single(SafetyRules.Of(database).Rules).Id);
    }
}
