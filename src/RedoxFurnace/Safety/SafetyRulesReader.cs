using System.Globalization;
using System.Text.RegularExpressions;
using YamlDotNet.Core;
using YamlDotNet.Core.Events;

namespace RedoxFurnace.Safety;

/// <summary>Reads the rules file event by event, so that every fault is found with its line and column.</summary>
internal sealed partial class SafetyRulesReader
{
    private static readonly string[] FileKeys = ["rules"];
    private static readonly string[] RuleKeys = ["id", "severity", "when", "text", "facts", "source"];
    private static readonly string[] ConditionKeys = ["species", "elements", "all_of", "tags", "above_c", "below_c"];
    private static readonly string[] RequiredFactKeys = ["what", "value", "unit", "authority", "provenance", "row"];
    private static readonly string[] FactKeys = [.. RequiredFactKeys, "stricter"];

    private readonly string fileName;
    private readonly Parser parser;

    internal SafetyRulesReader(string text, string fileName)
    {
        this.fileName = fileName;
        parser = new Parser(new StringReader(text));
    }

    internal IReadOnlyList<SafetyRule> Read()
    {
        try
        {
            Advance();
            Expect<StreamStart>("a YAML file");
            Expect<DocumentStart>("a list of rules");
            IReadOnlyList<SafetyRule> rules = [];
            ReadMapping(FileKeys, FileKeys, _ => rules = ReadRules());
            Expect<DocumentEnd>("the end of the file");
            Expect<StreamEnd>("one YAML document only");
            return rules;
        }
        catch (YamlException fault)
        {
            throw SafetyRulesException.Unreadable(fileName, fault.Start.Line, fault.Start.Column, fault);
        }
    }

    private List<SafetyRule> ReadRules()
    {
        HashSet<string> ids = new(StringComparer.Ordinal);
        return ReadSequence(() => ReadRule(ids));
    }

    private SafetyRule ReadRule(HashSet<string> ids)
    {
        string id = "", text = "", source = "";
        HazardSeverity severity = default;
        IReadOnlyList<SafetyCondition> when = [];
        IReadOnlyList<SafetyFact> facts = [];
        ReadMapping(RuleKeys, RuleKeys, key =>
        {
            switch (key)
            {
                case "id": id = ReadId(ids); break;
                case "severity": severity = ReadSeverity(); break;
                case "when": when = ReadConditions(); break;
                case "text": text = ReadText(); break;
                case "facts": facts = ReadFacts(); break;
                default: source = ReadText(); break;
            }
        });
        return new SafetyRule(id, severity, when, text, facts, source);
    }

    private string ReadId(HashSet<string> ids)
    {
        YamlPlace at = Here;
        string id = ReadText();
        if (!KebabCase().IsMatch(id))
        {
            throw SafetyRulesException.BadId(at, id);
        }

        return ids.Add(id) ? id : throw SafetyRulesException.DuplicateId(at, id);
    }

    private HazardSeverity ReadSeverity() => ReadWord("severity", ["danger", "warning", "caution"]) switch
    {
        "danger" => HazardSeverity.Danger,
        "warning" => HazardSeverity.Warning,
        _ => HazardSeverity.Caution,
    };

    private List<SafetyCondition> ReadConditions()
    {
        YamlPlace at = Here;
        List<SafetyCondition> conditions = ReadSequence(ReadCondition);
        return conditions.Count > 0 ? conditions : throw SafetyRulesException.NoCondition(at);
    }

    private SafetyCondition ReadCondition()
    {
        SafetyCondition condition = new();
        SafetyCondition empty = condition;
        YamlPlace at = Here;
        ReadMapping(ConditionKeys, [], key => condition = key switch
        {
            "species" => condition with { Species = ReadList() },
            "elements" => condition with { Elements = ReadList() },
            "all_of" => condition with { AllOf = ReadSequence(ReadList) },
            "tags" => condition with { Tags = ReadSequence(() => ReadWord("tag", [.. HazardTags.All.Order(StringComparer.Ordinal)])) },
            "above_c" => condition with { AboveCelsius = ReadNumber() },
            _ => condition with { BelowCelsius = ReadNumber() },
        });
        return condition != empty ? condition : throw SafetyRulesException.NoCondition(at);
    }

    private List<SafetyFact> ReadFacts()
    {
        List<SafetyFact> facts = [];
        ReadSequence(() =>
        {
            YamlPlace at = Here;
            SafetyFact fact = ReadFact();
            SafetyFact? above = facts.LastOrDefault(other => other.What == fact.What && other.Unit == fact.Unit);
            if (above is not null && (fact.HigherIsStricter ? fact.Number > above.Number : fact.Number < above.Number))
            {
                throw SafetyRulesException.NotStrictestFirst(at, fact.What, fact.Value, above.Value);
            }

            facts.Add(fact);
            return fact;
        });
        return facts;
    }

    private SafetyFact ReadFact()
    {
        Dictionary<string, string> values = new(StringComparer.Ordinal);
        ReadMapping(FactKeys, RequiredFactKeys, key => values[key] = key switch
        {
            "provenance" => ReadWord("provenance", ["memory", "retrieved"]),
            "stricter" => ReadWord("sense of 'stricter'", ["lower", "higher"]),
            _ => ReadText(),
        });
        return new SafetyFact(
            values["what"],
            values["value"],
            values["unit"],
            values["authority"],
            values["provenance"] == "retrieved",
            values["row"],
            values.GetValueOrDefault("stricter") == "higher");
    }

    private List<string> ReadList() => ReadSequence(ReadText);

    private string ReadWord(string what, IReadOnlyList<string> allowed)
    {
        YamlPlace at = Here;
        string word = ReadText();
        return allowed.Contains(word) ? word : throw SafetyRulesException.UnknownWord(at, what, word, allowed);
    }

    private double ReadNumber()
    {
        YamlPlace at = Here;
        string text = ReadText();
        return double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out double number) && double.IsFinite(number)
            ? number
            : throw SafetyRulesException.Unexpected(at, $"'{text}'", "a number such as 760 or -40.5");
    }

    private string ReadText()
    {
        YamlPlace at = Here;
        string text = Expect<Scalar>("a word or a line of text").Value.Trim();
        return text.Length > 0 ? text : throw SafetyRulesException.Unexpected(at, "an empty value", "some text");
    }

    private List<T> ReadSequence<T>(Func<T> readItem)
    {
        Expect<SequenceStart>("a list");
        List<T> items = [];
        while (Current is not SequenceEnd)
        {
            items.Add(readItem());
        }

        Advance();
        return items;
    }

    private void ReadMapping(IReadOnlyList<string> allowed, IReadOnlyList<string> required, Action<string> readValue)
    {
        YamlPlace start = Here;
        Expect<MappingStart>("keys with values");
        HashSet<string> seen = new(StringComparer.Ordinal);
        while (Current is not MappingEnd)
        {
            YamlPlace at = Here;
            string key = Expect<Scalar>("a key").Value;
            if (!allowed.Contains(key))
            {
                throw SafetyRulesException.UnknownKey(at, key, allowed);
            }

            if (!seen.Add(key))
            {
                throw SafetyRulesException.DuplicateKey(at, key);
            }

            readValue(key);
        }

        Advance();
        if (required.FirstOrDefault(key => !seen.Contains(key)) is { } missing)
        {
            throw SafetyRulesException.MissingKey(start, missing, required);
        }
    }

    private YamlPlace Here => YamlPlace.Of(fileName, Current.Start);

    private ParsingEvent Current => parser.Current ?? new StreamEnd();

    private void Advance()
    {
        do
        {
            parser.MoveNext();
        }
        while (Current is Comment);
    }

    private TEvent Expect<TEvent>(string expected)
        where TEvent : ParsingEvent
    {
        if (Current is not TEvent found)
        {
            throw SafetyRulesException.Unexpected(Here, Describe(Current), expected);
        }

        // An anchor has no use here, and an alias could name itself without end.
        if (found is NodeEvent { Anchor.IsEmpty: false })
        {
            throw SafetyRulesException.Unexpected(Here, "an anchor (&)", "plain values; write the value out");
        }

        Advance();
        return found;
    }

    private static string Describe(ParsingEvent found) => found switch
    {
        Scalar scalar => $"'{scalar.Value}'",
        MappingStart => "keys with values",
        SequenceStart => "a list",
        AnchorAlias => "an alias (*)",
        StreamEnd or DocumentEnd => "the end of the file",
        _ => "the end of an entry",
    };

    [GeneratedRegex("^[a-z0-9]+(-[a-z0-9]+)*$")]
    private static partial Regex KebabCase();
}
