namespace RedoxFurnace.Safety;

/// <summary>One rule of the safety file: when it speaks and what it says.</summary>
/// <param name="Id">Stable name, lower case with hyphens.</param>
/// <param name="Severity">How grave it is.</param>
/// <param name="When">The rule speaks when any of these holds; never empty.</param>
/// <param name="Advice">What to do, in the imperative.</param>
/// <param name="Facts">Limits it names; of facts on the same matter the strictest stands first.</param>
/// <param name="Source">Where the rule comes from.</param>
public sealed record SafetyRule(
    string Id,
    HazardSeverity Severity,
    IReadOnlyList<SafetyCondition> When,
    string Advice,
    IReadOnlyList<SafetyFact> Facts,
    string Source)
{
    /// <summary>Whether the rule speaks in this context.</summary>
    public bool AppliesTo(HazardContext context) => When.Any(condition => condition.Holds(context));

    /// <summary>The note as printed: the advice, then the limits with a word on their editions.</summary>
    public HazardNote ToNote() => new(Id, Severity, Advice, [.. Facts.Select(fact => fact.ToString())], Source);
}
