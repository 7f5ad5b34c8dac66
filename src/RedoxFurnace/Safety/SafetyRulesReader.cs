using System.Text.RegularExpressions;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Safety;

/// <summary>Turns the document of a rules file into checked rules; every fault is named with file, line and column.</summary>
internal static partial class SafetyRulesReader
{
    private static readonly string[] ConditionKeys = ["species", "elements", "all_of", "tags", "above_c", "below_c"];
    private static readonly string[] Severities = ["danger", "warning", "caution"];
    private static readonly string[] Provenances = ["memory", "retrieved"];
    private static readonly string[] Senses = ["lower", "higher"];
    private static readonly string[] Tags = [.. HazardTags.All.Order(StringComparer.Ordinal)];

    internal static IReadOnlyList<SafetyRule> Read(DocumentNode root)
    {
        root.AllowOnly("rules");
        HashSet<string> ids = new(StringComparer.Ordinal);
        return [.. root.Required("rules").Items.Select(node => ReadRule(node, ids))];
    }

    private static SafetyRule ReadRule(DocumentNode node, HashSet<string> ids)
    {
        node.AllowOnly("id", "severity", "when", "text", "facts", "source");
        return new SafetyRule(
            ReadId(node.Required("id"), ids),
            (HazardSeverity)Array.IndexOf(Severities, Word(node.Required("severity"), "severity", Severities)),
            ReadConditions(node.Required("when")),
            Text(node.Required("text")),
            ReadFacts(node.Required("facts")),
            Text(node.Required("source")));
    }

    private static string ReadId(DocumentNode node, HashSet<string> ids)
    {
        string id = Text(node);
        if (!KebabCase().IsMatch(id))
        {
            throw new DocumentException(node.At, $"id '{id}' must be lower-case letters and digits joined by hyphens, such as 'carbon-monoxide'");
        }

        return ids.Add(id) ? id : throw new DocumentException(node.At, $"a rule '{id}' stands above already; give each its own id");
    }

    private static List<SafetyCondition> ReadConditions(DocumentNode node) => node.Items.Count > 0
        ? [.. node.Items.Select(ReadCondition)]
        : throw NoCondition(node);

    private static SafetyCondition ReadCondition(DocumentNode node)
    {
        node.AllowOnly(ConditionKeys);
        return node.Entries.Count == 0
            ? throw NoCondition(node)
            : new SafetyCondition
            {
                Species = Words(node.Optional("species")),
                Elements = Words(node.Optional("elements")),
                AllOf = node.Optional("all_of")?.Items.Select(group => Words(group)!).ToArray(),
                Tags = node.Optional("tags")?.Items.Select(tag => Word(tag, "tag", Tags)).ToArray(),
                AboveCelsius = node.Optional("above_c")?.Number(),
                BelowCelsius = node.Optional("below_c")?.Number(),
            };
    }

    private static List<SafetyFact> ReadFacts(DocumentNode node)
    {
        List<SafetyFact> facts = [];
        foreach (DocumentNode item in node.Items)
        {
            SafetyFact fact = ReadFact(item);
            SafetyFact? above = facts.LastOrDefault(other => other.What == fact.What && other.Unit == fact.Unit);
            if (above is not null && (fact.HigherIsStricter ? fact.Number > above.Number : fact.Number < above.Number))
            {
                throw new DocumentException(item.At, $"'{fact.What}' {fact.Value} is stricter than {above.Value} above it; list the strictest first");
            }

            facts.Add(fact);
        }

        return facts;
    }

    private static SafetyFact ReadFact(DocumentNode node)
    {
        node.AllowOnly("what", "value", "unit", "authority", "provenance", "row", "stricter");
        return new SafetyFact(
            Text(node.Required("what")),
            Text(node.Required("value")),
            Text(node.Required("unit")),
            Text(node.Required("authority")),
            Word(node.Required("provenance"), "provenance", Provenances) == "retrieved",
            Text(node.Required("row")),
            node.Optional("stricter") is { } sense && Word(sense, "stricter", Senses) == "higher");
    }

    private static string[]? Words(DocumentNode? node) => node is null ? null : [.. node.Items.Select(Text)];

    private static string Word(DocumentNode node, string what, IReadOnlyList<string> allowed)
    {
        string word = Text(node);
        if (allowed.Contains(word))
        {
            return word;
        }

        string near = NearestSpelling.Find(word, allowed) is { } found ? $"did you mean '{found}'? " : "";
        throw DocumentException.BadValue(node.At, what, word, $"{near}allowed: {string.Join(", ", allowed)}");
    }

    private static string Text(DocumentNode node)
    {
        string text = node.Text.Trim();
        return text.Length > 0 ? text : throw new DocumentException(node.At, "an empty value stands here; write some text");
    }

    private static DocumentException NoCondition(DocumentNode node) =>
        new(node.At, "an empty condition would always hold; state one of " + string.Join(", ", ConditionKeys));

    [GeneratedRegex("^[a-z0-9]+(-[a-z0-9]+)*$")]
    private static partial Regex KebabCase();
}
