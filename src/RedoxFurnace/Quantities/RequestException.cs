namespace RedoxFurnace.Quantities;

/// <summary>A request that is wrong as written: the message is one line that says what was found, what is allowed and what to try.</summary>
/// <remarks>The command line answers it with exit code 2.</remarks>
public sealed class RequestException : Exception
{
    /// <summary>A wrong request.</summary>
    /// <param name="message">One line without a final full stop on a new line.</param>
    public RequestException(string message)
        : base(message)
    {
    }

    internal static RequestException NotAQuantity(string what, string found, string allowed)
        => new($"{what} '{found}' is not understood; write {allowed}");

    internal static RequestException MissingUnit(string what, string found, string allowed)
        => new($"{what} '{found}' has no unit; write {allowed}");

    internal static RequestException UnknownUnit(string what, string found, string unit, string allowed)
        => new($"{what} '{found}' has the unit '{unit}', which is not one of {allowed}");

    internal static RequestException OutOfRange(string what, string found, string allowed)
        => new($"{what} '{found}' is out of range; {allowed}");

    /// <summary>A word that is not one of a known set; the nearest known word is offered.</summary>
    /// <param name="what">The kind of thing, for example <c>reductant</c>.</param>
    /// <param name="found">The word as written.</param>
    /// <param name="known">All words that would do.</param>
    /// <returns>The exception to throw.</returns>
    public static RequestException UnknownWord(string what, string found, IReadOnlyCollection<string> known)
    {
        string? near = NearestSpelling.Find(found, known);
        string hint = near is not null
            ? $"did you mean '{near}'?"
            : known.Count <= 24
                ? "known: " + string.Join(", ", known)
                : $"{known.Count} are known, see 'oxides list'";
        return new RequestException($"{what} '{found}' is not known; {hint}");
    }
}
