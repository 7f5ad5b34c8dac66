using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>Propagates the uncertainty of substances through a reaction: var(dG) = sum (n u(H))^2 + T^2 sum (n u(S))^2, with the covariance of what an assessment weighed together, and with one independent term for each reaction line.</summary>
/// <remarks>THEORY.md, section 5.</remarks>
public static class ReactionUncertainty
{
    /// <summary>Expanded uncertainty (k = 2) of the Gibbs energy of reaction.</summary>
    /// <param name="reaction">The reaction.</param>
    /// <param name="kelvin">Temperature, K.</param>
    /// <param name="covariance">Covariance of assessed enthalpies and entropies, or null.</param>
    /// <returns>J for the reaction as written.</returns>
    public static double OfGibbs(Reaction reaction, double kelvin, EnthalpyCovariance? covariance)
        => 2 * Math.Sqrt(Variance(Expand(reaction, kelvin), kelvin, covariance, substance => substance.Uncertainty.EnthalpyJoules));

    /// <summary>Expanded uncertainty (k = 2) of the enthalpy of reaction.</summary>
    /// <param name="reaction">The reaction.</param>
    /// <param name="kelvin">Temperature, K.</param>
    /// <returns>J for the reaction as written.</returns>
    public static double OfEnthalpy(Reaction reaction, double kelvin)
        => 2 * Math.Sqrt(Variance(Expand(reaction, kelvin), 0, null, substance => substance.Uncertainty.HeatJoules));

    /// <summary>Expanded uncertainty (k = 2) of the entropy of reaction; the whole error of a reaction line may lie in its slope, so it counts over T.</summary>
    /// <param name="reaction">The reaction.</param>
    /// <param name="kelvin">Temperature, K.</param>
    /// <param name="covariance">Covariance of assessed enthalpies and entropies, or null.</param>
    /// <returns>J/K for the reaction as written.</returns>
    public static double OfEntropy(Reaction reaction, double kelvin, EnthalpyCovariance? covariance)
    {
        (List<(Substance Substance, double Number)> substances, List<(ReactionLine Line, double Number)> lines) = Expand(reaction, kelvin);
        double sum = covariance?.EntropyVariance(substances) ?? 0;
        foreach ((Substance substance, double number) in substances.Where(term => covariance?.Has(term.Substance.Id) != true))
        {
            double own = number * substance.Uncertainty.EntropyJoulesPerKelvin / 2;
            sum += own * own;
        }

        foreach ((ReactionLine line, double number) in lines)
        {
            double own = number * line.ExpandedUncertaintyOfLine!.Value / 2 / kelvin;
            sum += own * own;
        }

        return 2 * Math.Sqrt(sum);
    }

    /// <summary>Whether the uncertainty of any partner is a class default, so that the output must mark it.</summary>
    /// <param name="reaction">The reaction.</param>
    /// <returns>Formulas of those partners.</returns>
    public static IReadOnlyList<string> ClassDefaulted(Reaction reaction)
        => [.. reaction.Terms.Where(term => term.Substance.Uncertainty.EnthalpyIsClassDefault && term.Substance.Uncertainty.EnthalpyJoules > 0).Select(term => term.Substance.Id)];

    /// <summary>The substances and reaction lines whose errors a reaction feels, with their numbers.</summary>
    internal static (List<(Substance Substance, double Number)> Substances, List<(ReactionLine Line, double Number)> Lines) Expand(Reaction reaction, double kelvin)
    {
        List<(Substance Substance, double Number)> substances = [];
        List<(ReactionLine Line, double Number)> lines = [];
        foreach ((Substance substance, double number) in reaction.Terms)
        {
            Expand(substance, number, kelvin, substances, lines, 0);
        }

        return (substances, lines);
    }

    private static void Expand(Substance substance, double number, double kelvin, List<(Substance Substance, double Number)> substances, List<(ReactionLine Line, double Number)> lines, int depth)
    {
        if (depth < 4 && substance.ModelAt(kelvin)?.Model is ReactionLine line)
        {
            AddTo(lines, line, number);
            foreach (LinePartner partner in line.Partners)
            {
                Expand(partner.Substance, number * partner.Weight, kelvin, substances, lines, depth + 1);
            }
        }
        else
        {
            AddTo(substances, substance, number);
        }
    }

    private static void AddTo<T>(List<(T Item, double Number)> list, T item, double number)
        where T : class
    {
        for (int i = 0; i < list.Count; i++)
        {
            if (ReferenceEquals(list[i].Item, item))
            {
                list[i] = (item, list[i].Number + number);
                return;
            }
        }

        list.Add((item, number));
    }

    private static double Variance(
        (List<(Substance Substance, double Number)> Substances, List<(ReactionLine Line, double Number)> Lines) parts,
        double kelvin,
        EnthalpyCovariance? covariance,
        Func<Substance, double> expandedEnthalpy)
    {
        double sum = 0;
        foreach ((Substance substance, double number) in parts.Substances)
        {
            double enthalpy = number * expandedEnthalpy(substance) / 2;
            double entropy = number * substance.Uncertainty.EntropyJoulesPerKelvin / 2 * kelvin;
            bool known = covariance is not null && covariance.Has(substance.Id);
            sum += known ? 0 : (enthalpy * enthalpy) + (entropy * entropy);
        }

        foreach ((ReactionLine line, double number) in parts.Lines)
        {
            double own = number * line.ExpandedUncertaintyOfLine!.Value / 2;
            sum += own * own;
        }

        return sum + (covariance?.Variance(parts.Substances, kelvin) ?? 0);
    }
}
