namespace RedoxFurnace.Atmospheres;

/// <summary>
/// What a closed gas conserves, written as sums without cancellation: carbon, hydrogen, oxygen, three further combinations of the three, and nitrogen.
/// </summary>
/// <remarks>
/// THEORY.md, 'Gas equilibrium'. C, H, O and Z = 2 O + H - 2 C have no negative weight: they are the four faces of the cone of the gases CO, CO2, CH4, H2, H2O, O2.
/// R = O - 2 C - H (with H counted as H2) is what is left over against fully burnt gas; it has O2 on one side and every fuel on the other.
/// B = O - C is what is left over against pure CO; CO and H2 have no part in it, so it keeps its digits where CO is nearly all of carbon and oxygen.
/// </remarks>
internal static class GasBalances
{
    public const int Carbon = 0;
    public const int Hydrogen = 1;
    public const int Oxygen = 2;
    public const int CarbonSlack = 3;
    public const int Burnt = 4;
    public const int BeyondMonoxide = 5;
    public const int Nitrogen = 6;
    public const int Count = 7;

    /// <summary>Combinations of carbon, hydrogen and oxygen come first, up to and with this one.</summary>
    private const int LastOfThree = BeyondMonoxide;

    /// <summary>Weights by balance, then by species in the order of <see cref="GasSpecies"/>: H2 H2O CO CO2 CH4 O2 N2 NH3.</summary>
    private static readonly double[][] Weight =
    [
        [0, 0, 1, 1, 1, 0, 0, 0],
        [1, 1, 0, 0, 2, 0, 0, 1.5],
        [0, 1, 1, 2, 0, 2, 0, 0],
        [1, 3, 0, 2, 0, 4, 0, 1.5],
        [-1, 0, -1, 0, -4, 2, 0, -1.5],
        [0, 1, 0, 1, -1, 2, 0, 0],
        [0, 0, 0, 0, 0, 0, 1, 0.5],
    ];

    /// <summary>The first six as combinations of C, H (as H2) and O.</summary>
    private static readonly double[][] InElements =
    [
        [1, 0, 0],
        [0, 1, 0],
        [0, 0, 1],
        [-2, 1, 2],
        [-2, -1, 1],
        [-1, 0, 1],
    ];

    public static double[] WeightsOf(int balance) => Weight[balance];

    /// <summary>The conserved amount in a gas of given amounts.</summary>
    public static double Amount(int balance, ReadOnlySpan<double> moles)
    {
        double sum = 0;
        double[] weights = Weight[balance];
        for (int i = 0; i < GasFormation.Reacting; i++)
        {
            sum += weights[i] * moles[i];
        }

        return sum;
    }

    /// <summary>Carbon that the gas does not hold, from whichever balance says it with the least rounding.</summary>
    /// <remarks>
    /// Carbon given less carbon found is the difference of two large numbers where nearly all carbon stays in the gas. Each combination that counts carbon
    /// gives the same amount; the one of the smallest terms gives most digits.
    /// </remarks>
    /// <param name="amounts">Conserved amounts, by balance.</param>
    /// <param name="moles">The gas beside the graphite.</param>
    /// <returns>Moles of graphite; negative where the gas lacks carbon for graphite to be stable.</returns>
    public static double Graphite(ReadOnlySpan<double> amounts, ReadOnlySpan<double> moles)
    {
        double graphite = 0;
        double least = double.PositiveInfinity;
        for (int balance = 0; balance <= LastOfThree; balance++)
        {
            double perCarbon = InElements[balance][0];
            if (perCarbon == 0)
            {
                continue;
            }

            double[] weights = Weight[balance];
            double found = 0;
            double size = Math.Abs(amounts[balance]);
            for (int i = 0; i < GasFormation.Reacting; i++)
            {
                found += weights[i] * moles[i];
                size += Math.Abs(weights[i] * moles[i]);
            }

            if (size < least * Math.Abs(perCarbon))
            {
                least = size / Math.Abs(perCarbon);
                graphite = (amounts[balance] - found) / perCarbon;
            }
        }

        return graphite;
    }

    /// <summary>
    /// Chooses as many independent balances of C, H, O as there are of these elements, scarcest first: what is scarce is then
    /// conserved by a sum of its own instead of by a small difference of large sums.
    /// </summary>
    /// <param name="amounts">Conserved amounts, by balance.</param>
    /// <param name="withCarbon">False leaves out every balance that counts carbon, as where graphite takes up the rest.</param>
    /// <param name="chosen">Receives the balances.</param>
    /// <returns>How many were chosen.</returns>
    public static int Choose(ReadOnlySpan<double> amounts, bool withCarbon, Span<int> chosen)
    {
        bool hasCarbon = amounts[Carbon] > 0 && withCarbon;
        int needed = (hasCarbon ? 1 : 0) + (amounts[Hydrogen] > 0 ? 1 : 0) + (amounts[Oxygen] > 0 ? 1 : 0);
        Span<bool> usable =
        [
            hasCarbon,
            amounts[Hydrogen] > 0,
            amounts[Oxygen] > 0,
            hasCarbon,
            amounts[Oxygen] > 0 && (hasCarbon || (amounts[Carbon] == 0 && amounts[Hydrogen] > 0)),
            hasCarbon && amounts[Oxygen] > 0,
        ];
        int count = 0;
        Span<double> basis = stackalloc double[9];
        while (count < needed)
        {
            int best = -1;
            for (int candidate = 0; candidate <= LastOfThree; candidate++)
            {
                if (usable[candidate] && (best < 0 || Math.Abs(amounts[candidate]) < Math.Abs(amounts[best])))
                {
                    best = candidate;
                }
            }

            usable[best] = false;
            if (TryExtend(basis, count, InElements[best], amounts))
            {
                chosen[count++] = best;
            }
        }

        return count;
    }

    /// <summary>Gram-Schmidt step over the elements that are present.</summary>
    private static bool TryExtend(Span<double> basis, int count, double[] vector, ReadOnlySpan<double> amounts)
    {
        Span<double> rest = basis.Slice(3 * count, 3);
        for (int i = 0; i < 3; i++)
        {
            rest[i] = amounts[i] > 0 ? vector[i] : 0;
        }

        for (int k = 0; k < count; k++)
        {
            ReadOnlySpan<double> unit = basis.Slice(3 * k, 3);
            double along = (rest[0] * unit[0]) + (rest[1] * unit[1]) + (rest[2] * unit[2]);
            for (int i = 0; i < 3; i++)
            {
                rest[i] -= along * unit[i];
            }
        }

        double length = Math.Sqrt((rest[0] * rest[0]) + (rest[1] * rest[1]) + (rest[2] * rest[2]));
        if (length < 1e-6)
        {
            return false;
        }

        for (int i = 0; i < 3; i++)
        {
            rest[i] /= length;
        }

        return true;
    }
}
