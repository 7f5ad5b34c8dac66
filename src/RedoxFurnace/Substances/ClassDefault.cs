namespace RedoxFurnace.Substances;

/// <summary>Uncertainty (k = 2) taken for a class of substance where no source gives one.</summary>
/// <param name="Class">The class.</param>
/// <param name="EnthalpyJoulesPerMole">J/mol.</param>
/// <param name="EnthalpyJoulesPerAtom">J per mole of atoms, added for each atom of the formula.</param>
/// <param name="EntropyJoulesPerAtom">J/K per mole of atoms.</param>
/// <param name="Reason">Why these figures.</param>
public sealed record ClassDefault(SubstanceClass Class, double EnthalpyJoulesPerMole, double EnthalpyJoulesPerAtom, double EntropyJoulesPerAtom, string Reason)
{
    /// <summary>Expanded uncertainty of the enthalpy of a substance of this class.</summary>
    /// <param name="formula">Its formula.</param>
    /// <returns>J/mol, k = 2.</returns>
    public double Enthalpy(Formula formula) => EnthalpyJoulesPerMole + (EnthalpyJoulesPerAtom * formula.AtomCount);

    /// <summary>Expanded uncertainty of the entropy of a substance of this class.</summary>
    /// <param name="formula">Its formula.</param>
    /// <returns>J/(mol K), k = 2.</returns>
    public double Entropy(Formula formula) => EntropyJoulesPerAtom * formula.AtomCount;
}
