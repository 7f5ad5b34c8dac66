namespace RedoxFurnace.Atmospheres;

/// <summary>What one reading says about the oxygen pressure in the furnace.</summary>
/// <param name="Reading">The reading.</param>
/// <param name="Log10Bar">log10(pO2/bar) at furnace temperature; null where the reading says nothing about it.</param>
/// <param name="Tolerance">Its tolerance carried over, log10 units.</param>
/// <param name="CarbonActivity">With the CO of the gas, or null.</param>
/// <param name="Note">How it was carried over, or why it says nothing.</param>
public sealed record ImpliedOxygen(FurnaceReading Reading, double? Log10Bar, double Tolerance, double? CarbonActivity, string Note);
