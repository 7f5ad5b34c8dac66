using RedoxFurnace.Oxidation;

namespace RedoxFurnace.Reductants;

/// <summary>One step of a reductant's oxidation at one temperature.</summary>
/// <param name="Formation">Reduced side + O2 = oxidised side, per mole of O2.</param>
/// <param name="Whole">The same from the fresh reductant, per mole of O2.</param>
/// <param name="OxygenPotential">At the conditions, J per mole of O2.</param>
/// <param name="Product">Name of what the reductant turns into.</param>
/// <param name="GasPerO2">Moles of gas of this step per mole of O2 that share the total pressure.</param>
internal sealed record ReductantStep(Reaction Formation, Reaction Whole, double OxygenPotential, string Product, double GasPerO2);
