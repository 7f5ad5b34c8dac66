using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charges;

/// <summary>The pressure of a metal's vapour over a condensed charge while the metal is drawn off.</summary>
/// <param name="Drawn">Share of the metal drawn off so far, 0 to 1.</param>
/// <param name="NaturalLogBar">ln(p/bar) of the metal's vapour.</param>
/// <param name="Reaction">What makes it there, per mole of vapour.</param>
/// <param name="ExpandedUncertainty">k = 2, of ln p.</param>
/// <param name="Phases">Condensed phases beside it.</param>
internal sealed record MetalVapourOverCharge(double Drawn, double NaturalLogBar, string Reaction, double ExpandedUncertainty, ImmutableArray<string> Phases)
{
    private const double Step = 1e-6;

    /// <summary>Pressures at several shares drawn off.</summary>
    /// <param name="amounts">Moles of each element in the charge.</param>
    /// <param name="metal">The metal.</param>
    /// <param name="kelvin">K.</param>
    /// <param name="drawn">Shares, 0 to below 1.</param>
    /// <param name="database">Data.</param>
    /// <returns>One for each share up to the most that leaves as metal: from there on only oxygen would hold it back, so the list ends.</returns>
    /// <exception cref="NoAnswerException">No data.</exception>
    public static ImmutableArray<MetalVapourOverCharge> Along(IReadOnlyDictionary<string, double> amounts, string metal, double kelvin, IEnumerable<double> drawn, SubstanceDatabase database)
    {
        Substance vapour = database.Vapour(metal) ?? throw new NoAnswerException($"the database has no vapour of {metal}");
        HashSet<string> elements = [.. amounts.Keys];
        // The metal itself is left out as a condensed phase: it is to leave as vapour.
        Substance[] candidates = [.. database.MadeOf(elements).Where(substance => !substance.IsGas && substance.TryGibbs(kelvin, out _) && substance.Id != metal)];
        ImmutableArray<MetalVapourOverCharge>.Builder along = ImmutableArray.CreateBuilder<MetalVapourOverCharge>();
        foreach (double share in drawn)
        {
            Dictionary<string, double> left = new(amounts) { [metal] = amounts[metal] * (1 - share - Step) };
            try
            {
                CondensedMinimum minimum = CondensedMinimum.Of(left, candidates, kelvin);
                double potential = minimum.Potentials[minimum.Elements.IndexOf(metal)];
                Oxidation.Reaction reaction = Making(vapour, minimum);
                along.Add(new MetalVapourOverCharge(
                    share,
                    (potential - vapour.Gibbs(kelvin)) / (PhysicalConstants.GasConstant * kelvin),
                    reaction.Text,
                    ReactionUncertainty.OfGibbs(reaction, kelvin, database.Covariance) / (PhysicalConstants.GasConstant * kelvin),
                    [.. minimum.Phases.Select(phase => phase.Phase.Group ?? phase.Phase.Id).Distinct()]));
            }
            catch (NoAnswerException)
            {
                break;
            }
        }

        return along.ToImmutable();
    }

    /// <summary>The reaction among the phases of the basis that makes one mole of vapour.</summary>
    private static Oxidation.Reaction Making(Substance vapour, CondensedMinimum minimum)
    {
        int size = minimum.Elements.Length;
        double[,] matrix = new double[size, minimum.Basis.Length];
        double[] right = new double[size];
        for (int i = 0; i < size; i++)
        {
            right[i] = vapour.Formula.Of(minimum.Elements[i]);
            for (int j = 0; j < minimum.Basis.Length; j++)
            {
                matrix[i, j] = minimum.Basis[j].Formula.Of(minimum.Elements[i]);
            }
        }

        MathNet.Numerics.LinearAlgebra.Vector<double> numbers = MathNet.Numerics.LinearAlgebra.Matrix<double>.Build.DenseOfArray(matrix).QR().Solve(MathNet.Numerics.LinearAlgebra.Vector<double>.Build.Dense(right));
        return Oxidation.Reaction.Of(minimum.Basis.Select((phase, j) => (phase, -numbers[j])).Where(term => Math.Abs(term.Item2) > 1e-9).Append((vapour, 1.0)));
    }
}
