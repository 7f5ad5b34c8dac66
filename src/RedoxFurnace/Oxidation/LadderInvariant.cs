namespace RedoxFurnace.Oxidation;

/// <summary>A temperature at which the rungs of a ladder change.</summary>
/// <param name="Kelvin">Found to 0.01 K.</param>
/// <param name="Change">What happens.</param>
/// <param name="Phase">The phase that joins or leaves.</param>
/// <param name="JoinsAbove">Whether it is stable above the temperature rather than below.</param>
/// <param name="Reaction">The reaction between the three phases, written in the direction of rising temperature; a sentence for a data end.</param>
public sealed record LadderInvariant(double Kelvin, LadderChange Change, string Phase, bool JoinsAbove, string Reaction);
