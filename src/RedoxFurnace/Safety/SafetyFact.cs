using System.Globalization;

namespace RedoxFurnace.Safety;

/// <summary>One published limit or classification a rule rests on.</summary>
/// <param name="What">What is limited, for example <c>8 h mean</c>.</param>
/// <param name="Value">The figure, or a list of hazard codes, as published.</param>
/// <param name="Unit">Its unit.</param>
/// <param name="Authority">Who says so, with the edition as far as known.</param>
/// <param name="Retrieved">True if the figure was read in the source or a quotation of it; false if recalled.</param>
/// <param name="Row">Row of the table of published facts the tests hold it against.</param>
/// <param name="HigherIsStricter">True where the larger value is the stricter one.</param>
public sealed record SafetyFact(string What, string Value, string Unit, string Authority, bool Retrieved, string Row, bool HigherIsStricter)
{
    /// <summary>The value as a number, or null where it is a list of codes.</summary>
    public double? Number => double.TryParse(Value, NumberStyles.Float, CultureInfo.InvariantCulture, out double number) ? number : null;

    /// <summary>As printed: what, value, unit and authority.</summary>
    public override string ToString() => $"{What} {Value}{(Unit.Length == 0 ? "" : " ")}{Unit} ({Authority}{(Retrieved ? "" : ", from memory")})";
}
