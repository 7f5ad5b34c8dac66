using RedoxFurnace.Oxidation;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>A charge oxide against a reductant at one temperature.</summary>
/// <param name="Kelvin">K.</param>
/// <param name="Charge">Steps of the oxide.</param>
/// <param name="Reductant">Steps of the reductant; the first decides.</param>
/// <param name="VapourLogPressure">ln(p/bar) of metal vapour, or null where the metal is held as condensed.</param>
/// <param name="GasLogPressure">ln(p/bar) shared by the reductant's gases, or null for 1 bar each.</param>
internal sealed record ReductionPoint(double Kelvin, OxideDescent Charge, IReadOnlyList<ReductantStep> Reductant, double? VapourLogPressure, double? GasLogPressure)
{
    /// <summary>Oxygen potential of the hardest step less that of the reductant, J per mole of O2.</summary>
    public double Margin => Charge.Hardest.OxygenPotential!.Value - Reductant[0].OxygenPotential;

    /// <summary>The reaction of the hardest step, per mole of O2 handed over.</summary>
    public Reaction Reaction => Charge.Hardest.Couple.Formation.Times(-1).Plus(1, Reductant[0].Formation, 1);

    /// <summary>The last step of the reductant that still takes oxygen from the hardest step of the charge; its first where none does.</summary>
    public ReductantStep Furthest
    {
        get
        {
            ReductantStep furthest = Reductant[0];
            foreach (ReductantStep step in Reductant)
            {
                if (step.OxygenPotential >= Charge.Hardest.OxygenPotential!.Value)
                {
                    break;
                }

                furthest = step;
            }

            return furthest;
        }
    }

    /// <summary>Expanded uncertainty (k = 2) of the margin, J per mole of O2.</summary>
    public double ExpandedUncertainty(EnthalpyCovariance? covariance) => ReactionUncertainty.OfGibbs(Reaction, Kelvin, covariance);
}
