using RedoxFurnace.Quantities;

namespace RedoxFurnace.Substances;

/// <summary>A text file (database entry or sheet) that is wrong as written: one line with file, line and column.</summary>
/// <remarks>The command line answers it with exit code 2.</remarks>
public sealed class DocumentException : Exception
{
    /// <summary>A fault at a place.</summary>
    /// <param name="at">Where.</param>
    /// <param name="message">What was found, what is allowed, what to try; one line.</param>
    public DocumentException(SourceMark at, string message)
        : base($"{at}: {message}") => At = at;

    /// <summary>Where the fault is.</summary>
    public SourceMark At { get; }

    internal static DocumentException UnknownKey(SourceMark at, string key, IReadOnlyCollection<string> known)
    {
        string? near = NearestSpelling.Find(key, known);
        return new DocumentException(at, near is null
            ? $"unknown key '{key}'; allowed here: {string.Join(", ", known)}"
            : $"unknown key '{key}'; did you mean '{near}'?");
    }

    internal static DocumentException MissingKey(SourceMark at, string key)
        => new(at, $"the key '{key}' is missing here; add it");

    internal static DocumentException DuplicateKey(SourceMark at, string key)
        => new(at, $"the key '{key}' stands twice; keep one");

    internal static DocumentException WrongKind(SourceMark at, string expected, string found)
        => new(at, $"expected {expected}, found {found}");

    internal static DocumentException BadValue(SourceMark at, string key, string found, string allowed)
        => new(at, $"{key} '{found}' is not allowed; {allowed}");
}
