using System.Collections.Immutable;
using RedoxFurnace.Charges;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>
/// Holds a row of the ranking against the whole charge at equilibrium: oxide, stoichiometric reductant and flux together. Line against line says
/// whether a reduction can start; this says whether the metal is what is left.
/// </summary>
internal static class ChargeOutcome
{
    private const double Half = 0.5;
    private const double Most = 0.8;
    private const double FluxPerOxide = 2;
    private const string Lime = "CaO";

    /// <summary>The row with what its charge becomes, and its job verdict lowered where that is not the metal.</summary>
    public static RankedReductant Judge(RankedReductant row, Substance oxide, string metal, double kelvin, RankConditions conditions, SubstanceDatabase database)
    {
        if (row.Verdict != Verdict.Reduces || row.KgPerKgOxide is not { } mass || row.Reductant.Kind == ReductantKind.Gas || !conditions.Activities.AreAllOne || database.TryGet(row.Reductant.Metal ?? row.Reductant.Id) is not { } reductant || reductant.IsGas)
        {
            return row;
        }

        Dictionary<string, double> moles = [];
        Add(oxide, 1000 / oxide.Formula.MolarMass);
        double reductantMoles = mass * row.Reductant.MassFraction * 1000 / reductant.Formula.MolarMass;
        Add(reductant, reductantMoles);
        double fluxMoles = FluxPerOxide * reductantMoles;
        if (conditions.Flux is { } flux)
        {
            Add(database.Get(flux), fluxMoles);
        }

        if (Outcome(moles, metal, kelvin, conditions, database) is not { } found)
        {
            return row;
        }

        RankedReductant told = row with { Notes = row.Notes.Add("whole charge at equilibrium: " + found.Words) };
        if (found.Won >= Half || row.Job != JobVerdict.Works)
        {
            return told;
        }

        if (conditions.Flux is null)
        {
            Dictionary<string, double> limed = new(moles);
            foreach ((string element, double atoms) in database.Get(Lime).Formula.Atoms)
            {
                limed[element] = limed.GetValueOrDefault(element) + (fluxMoles * atoms);
            }

            if (Outcome(limed, metal, kelvin, conditions, database) is { } fluxed && fluxed.Won > Most)
            {
                return told with { Job = JobVerdict.WorksIf, Reason = $"{metal} stays bound ({found.Words}); with lime it is free: --flux CaO" };
            }
        }

        return told with { Job = JobVerdict.DoesNotWork, Reason = $"not the metal: {found.Words}" };

        void Add(Substance substance, double number)
        {
            foreach ((string element, double atoms) in substance.Formula.Atoms)
            {
                moles[element] = moles.GetValueOrDefault(element) + (number * atoms);
            }
        }
    }

    /// <summary>Share of the metal won, condensed or as its own vapour, and the rest in words; null where the charge has no answer.</summary>
    private static (double Won, string Words)? Outcome(Dictionary<string, double> moles, string metal, double kelvin, RankConditions conditions, SubstanceDatabase database)
    {
        ChargeState state;
        try
        {
            state = new ChargeEquilibrium(database, moles.Keys).Solve(moles, Temperature.FromKelvin(kelvin), conditions.Total ?? conditions.Monoxide ?? Pressure.Standard);
        }
        catch (NoAnswerException)
        {
            return null;
        }

        double all = moles[metal];
        double asMetal = state.Condensed.Where(phase => phase.Substance.Formula.Atoms.Count == 1 && phase.Substance.Formula.Of(metal) > 0).Sum(phase => phase.Moles * phase.Substance.Formula.Of(metal)) / all;
        double asVapour = state.Gas.Where(share => share.Substance.Formula.Atoms.Count == 1 && share.Substance.Formula.Of(metal) > 0).Sum(share => share.Fraction * state.GasMoles * share.Substance.Formula.Of(metal)) / all;
        List<string> words = [];
        Say(asMetal, "as metal");
        Say(asVapour, "as vapour");
        foreach (IGrouping<string, ChargePhase> group in state.Condensed.Where(phase => phase.Substance.Formula.Atoms.Count > 1 && phase.Substance.Formula.Of(metal) > 0).GroupBy(phase => phase.Name))
        {
            Say(group.Sum(phase => phase.Moles * phase.Substance.Formula.Of(metal)) / all, "in " + group.Key);
        }

        return (asMetal + asVapour, string.Join(", ", words));

        void Say(double share, string where)
        {
            if (share > 0.005)
            {
                words.Add($"{Printed.Fixed(100 * share, 0)} % of the {metal} {where}");
            }
        }
    }
}
