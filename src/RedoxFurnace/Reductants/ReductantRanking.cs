using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>Ranks reductants against a charge oxide. A pure function of request and database; it always answers where the oxide has data.</summary>
public static class ReductantRanking
{
    /// <summary>Ranks for the wanted metal, or for each metal of the oxide in turn.</summary>
    /// <param name="request">What is asked.</param>
    /// <param name="database">Data.</param>
    /// <returns>One result per metal.</returns>
    /// <exception cref="RequestException">Unknown oxide, metal or reductant.</exception>
    /// <exception cref="NoAnswerException">The oxide has no data at the temperature.</exception>
    public static ImmutableArray<RankResult> Rank(RankRequest request, SubstanceDatabase database)
    {
        Substance oxide = database.Get(request.Oxide);
        ImmutableArray<string> metals = [.. oxide.Formula.Atoms.Keys.Where(element => element != "O")];
        if (oxide.IsGas || oxide.Formula.Of("O") <= 0 || metals.IsEmpty)
        {
            throw new RequestException($"'{oxide.Id}' is not a condensed oxide; give one such as Cr2O3");
        }

        if (request.Metal is { } wanted && !metals.Contains(wanted))
        {
            throw new RequestException($"--metal '{wanted}' is not in {oxide.Id}; it holds {string.Join(" and ", metals)}");
        }

        ReductantCatalogue catalogue = ReductantCatalogue.Of(database);
        ImmutableArray<Reductant> reductants = request.With.IsEmpty
            ? [.. catalogue.Listed.Where(reductant => !IsOwnMetal(reductant, metals))]
            : [.. request.With.Select(catalogue.Get)];
        return [.. (request.Metal is { } one ? [one] : metals).Select(metal => RankFor(oxide, metal, reductants, request, database))];
    }

    private static bool IsOwnMetal(Reductant reductant, ImmutableArray<string> metals)
        => metals.Length == 1 && reductant.Metal == metals[0];

    private static RankResult RankFor(Substance oxide, string metal, ImmutableArray<Reductant> reductants, RankRequest request, SubstanceDatabase database)
    {
        OxidePath charge = new(oxide, metal, database, request.Conditions.Activities);
        double kelvin = request.At.Kelvin;
        OxideDescent descent = charge.At(kelvin, request.Conditions.Total?.NaturalLogBar ?? 0);
        RowBuilder builder = new(charge, request.Conditions, database, kelvin);
        ImmutableArray<RankedReductant> rows = RankSorting.Sort([.. reductants.Select(builder.Build).Select(row => ChargeOutcome.Judge(row, oxide, metal, kelvin, request.Conditions, database))], request.Order);
        LadderStep hardest = descent.Hardest;
        return new RankResult
        {
            Oxide = oxide.Id,
            Metal = metal,
            At = request.At,
            Conditions = request.Conditions,
            Hardest = new HardestStep(
                hardest.Couple.Formation.Text,
                hardest.StandardGibbs,
                hardest.OxygenPotential!.Value,
                ReactionUncertainty.OfGibbs(hardest.Couple.Formation, kelvin, database.Covariance)),
            Rows = rows,
            Headline = RankWords.Headline(oxide.Id, metal, request.At, rows),
            Assumptions = RankWords.Assumptions(request.Conditions, descent, request.At),
            Sources = builder.Sources(),
            DataRange = (charge.LowestKelvin, charge.HighestKelvin),
            Notes = RankWords.Notes(charge, descent, reductants, builder.OverlayEntries()),
            Ask = [],
        };
    }
}
