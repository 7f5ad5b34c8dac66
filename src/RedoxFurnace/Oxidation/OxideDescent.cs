using System.Collections.Immutable;

namespace RedoxFurnace.Oxidation;

/// <summary>The steps of a charge oxide at one temperature.</summary>
/// <param name="Ladder">The whole ladder.</param>
/// <param name="Steps">From the metal up to the oxide.</param>
/// <param name="Bottom">What is left when all steps are done.</param>
/// <param name="OxideIsStable">Whether the oxide itself stands on the ladder at this temperature.</param>
internal sealed record OxideDescent(OxideLadder Ladder, ImmutableArray<LadderStep> Steps, Assemblage Bottom, bool OxideIsStable)
{
    /// <summary>The step of lowest oxygen potential: the one that decides.</summary>
    public LadderStep Hardest { get; } = Steps.Where(step => step.OxygenPotential is not null).MinBy(step => step.OxygenPotential!.Value)!;

    /// <summary>Moles of metal vapour set free per mole of O2 in the hardest step.</summary>
    public double VapourPerO2 => Hardest.Couple.Formation.Terms.Where(term => term.Number < 0 && term.Substance.IsGas && term.Substance.Id != "O2").Sum(term => -term.Number);
}
