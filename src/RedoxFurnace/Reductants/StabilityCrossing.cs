namespace RedoxFurnace.Reductants;

/// <summary>Where a reductant's line meets a couple's.</summary>
/// <param name="Couple">Id of the couple's line.</param>
/// <param name="Reductant">Id of the reductant's line.</param>
/// <param name="Kelvin">K, found on lines drawn straight between points at most 20 K apart.</param>
/// <param name="OxygenPotential">J per mole of O2.</param>
/// <param name="ReducesAbove">Whether the reductant takes the oxygen above this temperature rather than below.</param>
public sealed record StabilityCrossing(string Couple, string Reductant, double Kelvin, double OxygenPotential, bool ReducesAbove);
