namespace RedoxFurnace.Safety;

/// <summary>A safety rules file that cannot be trusted, with the place of the fault.</summary>
public sealed class SafetyRulesException : Exception
{
    private SafetyRulesException(string fileName, long line, long column, string message, Exception? inner = null)
        : base(FormattableString.Invariant($"{fileName}:{line}:{column}: {message}"), inner)
    {
        FileName = fileName;
        Line = line;
        Column = column;
    }

    /// <summary>The file as it was named by the caller.</summary>
    public string FileName { get; }

    /// <summary>Line of the fault, counted from 1.</summary>
    public long Line { get; }

    /// <summary>Column of the fault, counted from 1.</summary>
    public long Column { get; }

    internal static SafetyRulesException Unreadable(string file, long line, long column, Exception inner) =>
        new(file, line, column, $"not readable as YAML ({FirstLine(inner.Message)}); check indentation and quotes.", inner);

    internal static SafetyRulesException Unexpected(YamlPlace at, string found, string expected) =>
        new(at.FileName, at.Line, at.Column, $"found {found}, expected {expected}.");

    internal static SafetyRulesException UnknownKey(YamlPlace at, string key, IReadOnlyList<string> allowed) =>
        new(at.FileName, at.Line, at.Column, $"unknown key '{key}'; did you mean '{Spelling.Nearest(key, allowed)}'? Allowed here: {string.Join(", ", allowed)}.");

    internal static SafetyRulesException DuplicateKey(YamlPlace at, string key) =>
        new(at.FileName, at.Line, at.Column, $"key '{key}' stands here a second time; keep one.");

    internal static SafetyRulesException MissingKey(YamlPlace at, string key, IReadOnlyList<string> required) =>
        new(at.FileName, at.Line, at.Column, $"key '{key}' is missing; this entry needs {string.Join(", ", required)}.");

    internal static SafetyRulesException UnknownWord(YamlPlace at, string what, string word, IReadOnlyList<string> allowed) =>
        new(at.FileName, at.Line, at.Column, $"unknown {what} '{word}'; did you mean '{Spelling.Nearest(word, allowed)}'? Allowed: {string.Join(", ", allowed)}.");

    internal static SafetyRulesException DuplicateId(YamlPlace at, string id) =>
        new(at.FileName, at.Line, at.Column, $"a rule '{id}' stands above already; give each its own id.");

    internal static SafetyRulesException BadId(YamlPlace at, string id) =>
        new(at.FileName, at.Line, at.Column, $"id '{id}' must be lower-case letters and digits joined by hyphens, such as 'carbon-monoxide'.");

    internal static SafetyRulesException NotStrictestFirst(YamlPlace at, string what, string value, string before) =>
        new(at.FileName, at.Line, at.Column, $"'{what}' {value} is stricter than {before} above it; list the strictest first.");

    internal static SafetyRulesException NoCondition(YamlPlace at) =>
        new(at.FileName, at.Line, at.Column, "an empty condition would always hold; state species, elements, all_of, tags, above_c or below_c.");

    private static string FirstLine(string message) => message.Split('\n', 2)[0].Trim();
}
