using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>Mass and heat of taking a whole charge oxide down to its metal with a reductant.</summary>
/// <param name="Reaction">One formula of the oxide with the reductant to the furthest oxide that still reduces.</param>
/// <param name="KgPerKgOxide">Stoichiometric reductant, of its grade.</param>
/// <param name="KgPerKgMetal">The same per kg of metal.</param>
/// <param name="NormalCubicMetresPerKgOxide">For a gas, Nm3 per kg of oxide, stoichiometric.</param>
/// <param name="HeatJoulesPerKgOxide">Everything at the temperature; positive must be supplied. Null without heat data.</param>
/// <param name="DutyJoulesPerKgOxide">From 25 C to products at the temperature; positive must be supplied. Null without heat data.</param>
internal sealed record ReductionBalance(
    Reaction Reaction,
    double KgPerKgOxide,
    double KgPerKgMetal,
    double? NormalCubicMetresPerKgOxide,
    double? HeatJoulesPerKgOxide,
    double? DutyJoulesPerKgOxide)
{
    /// <summary>Draws up the balance at a point.</summary>
    public static ReductionBalance Of(ReductionPair pair, ReductionPoint point)
    {
        OxidePath charge = pair.Charge;
        double formulas = 1 / charge.UnitsPerFormula;
        Reaction giving = Reaction.Of(
            point.Charge.Bottom.Parts.Select(part => (part.Substance, part.Amount))
                .Append((charge.Oxide, -formulas))
                .Append((charge.System.Oxygen, ((formulas * charge.Oxide.Formula.Of("O")) - point.Charge.Bottom.Oxygen) / 2)))
            .Times(charge.UnitsPerFormula);
        double oxygen = giving.NumberOf(charge.System.Oxygen);
        Reaction whole = giving.Plus(1, point.Furthest.Whole, oxygen);
        double oxideKg = charge.Oxide.Formula.MolarMass / 1000;
        double metalKg = charge.Oxide.Formula.Of(charge.Metal) * AtomicWeights.Of(charge.Metal) / 1000;
        double moles = Fresh(pair, point.Furthest.Whole.Times(oxygen)).Sum(term => -term.Number);
        double reductantKg = Fresh(pair, point.Furthest.Whole.Times(oxygen)).Sum(term => -term.Number * term.Substance.Formula.MolarMass) / 1000 / pair.Reductant.Info.MassFraction;
        return new ReductionBalance(
            whole,
            reductantKg / oxideKg,
            reductantKg / metalKg,
            pair.Reductant.Info.Kind == ReductantKind.Gas || pair.Reductant.Info.Id == "CH4" ? moles * PhysicalConstants.NormalCubicMetrePerMole / oxideKg : null,
            Heat(whole, point.Kelvin) / oxideKg,
            Duty(pair, whole, point.Kelvin) / oxideKg);
    }

    private static IEnumerable<(Substance Substance, double Number)> Fresh(ReductionPair pair, Reaction reaction)
        => reaction.Terms.Where(term => term.Number < 0 && pair.Reductant.IsFresh(term.Substance));

    private static double? Heat(Reaction reaction, double kelvin)
        => reaction.HasData(kelvin) ? reaction.Enthalpy(kelvin) : null;

    private static double? Duty(ReductionPair pair, Reaction reaction, double kelvin)
    {
        double sum = 0;
        foreach ((Substance substance, double number) in reaction.Terms)
        {
            bool reactant = number < 0;
            Substance start = reactant && pair.Reductant.IsFresh(substance) ? pair.Reductant.AtRoomTemperature(substance) : substance;
            double at = reactant ? PhysicalConstants.ReferenceKelvin : kelvin;
            if (!start.TryGibbs(at, out _) || !start.KnowsHeating(at))
            {
                return null;
            }

            sum += number * start.At(at).Enthalpy;
        }

        return sum;
    }
}
