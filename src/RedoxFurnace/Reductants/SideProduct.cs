namespace RedoxFurnace.Reductants;

/// <summary>Something a reduction makes besides the metal and the reductant's own oxide, as far as the data tell.</summary>
/// <param name="Formula">Formula, with <c>(g)</c> for a vapour.</param>
/// <param name="Kind"><c>carbide</c>, <c>nitride</c>, <c>metal-vapour</c>, <c>reductant-vapour</c>, <c>sub-oxide</c>.</param>
/// <param name="DrivingKilojoules">For a carbide or nitride: how far its formation lies below zero, kJ per mole of C or N2; null for a vapour.</param>
/// <param name="PressureBar">For a vapour: its pressure, bar; null otherwise.</param>
/// <param name="Certain">Whether the driving force exceeds its uncertainty.</param>
/// <param name="Text">One line in words.</param>
public sealed record SideProduct(string Formula, string Kind, double? DrivingKilojoules, double? PressureBar, bool Certain, string Text);
