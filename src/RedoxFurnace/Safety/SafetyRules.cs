using RedoxFurnace.Substances;

namespace RedoxFurnace.Safety;

/// <summary>The safety rules, and the notes a piece of work calls for.</summary>
public sealed class SafetyRules
{
    /// <summary>The line under every list of notes.</summary>
    public const string ClosingLine =
        "Site rules, local codes and licensed practitioners come first: this is a calculation, not an approval, and the list may not be complete.";

    private const string FileName = "safety.yaml";

    private static readonly Lazy<SafetyRules> LazyBundled = new(() => Of(SubstanceDatabase.Bundled));

    private SafetyRules(IReadOnlyList<SafetyRule> rules) => Rules = rules;

    /// <summary>The rules that come with the library, read at first use.</summary>
    public static SafetyRules Bundled => LazyBundled.Value;

    /// <summary>Every rule, in the order of the file.</summary>
    public IReadOnlyList<SafetyRule> Rules { get; }

    /// <summary>Reads a rules file, strictly: unknown, duplicate and missing keys are errors.</summary>
    /// <param name="yamlText">The whole text of the file.</param>
    /// <param name="fileName">Its name, for messages only; nothing is opened.</param>
    /// <returns>The checked rules.</returns>
    /// <exception cref="DocumentException">The text is not a sound rules file; the message names file, line and column.</exception>
    public static SafetyRules Parse(string yamlText, string fileName)
    {
        ArgumentNullException.ThrowIfNull(yamlText);
        ArgumentException.ThrowIfNullOrEmpty(fileName);
        return new SafetyRules(SafetyRulesReader.Read(DocumentNode.Parse(yamlText, fileName)));
    }

    /// <summary>The rules that go with a database: a user's own <c>safety.yaml</c> stands in place of the built-in one.</summary>
    /// <exception cref="DocumentException">The file is not a sound rules file.</exception>
    public static SafetyRules Of(SubstanceDatabase database)
    {
        ArgumentNullException.ThrowIfNull(database);
        return new SafetyRules(SafetyRulesReader.Read(database.Document(FileName)));
    }

    /// <summary>The notes a context calls for, gravest first, then by id.</summary>
    public IReadOnlyList<HazardNote> For(HazardContext context)
    {
        ArgumentNullException.ThrowIfNull(context);
        return
        [
            .. Rules.Where(rule => rule.AppliesTo(context))
                .OrderBy(rule => rule.Severity)
                .ThenBy(rule => rule.Id, StringComparer.Ordinal)
                .Select(rule => rule.ToNote()),
        ];
    }
}
