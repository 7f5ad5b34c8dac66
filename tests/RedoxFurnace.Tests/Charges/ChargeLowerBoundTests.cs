using System.Globalization;
using RedoxFurnace.Charges;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Charges;

/// <summary>The charge minimiser against a second method that shares no step with it, and against published onsets.</summary>
public class ChargeLowerBoundTests
{
    private static readonly SubstanceDatabase Database = SubstanceDatabase.Bundled;

    /// <summary>
    /// The least Gibbs energy is also the greatest b . lambda over potentials that leave nothing to form (duality of convex programmes). The ellipsoid method
    /// (Shor 1977, Yudin and Nemirovski 1976) climbs there by cuts alone. Every feasible point it visits is a bound from below, the answer one from above:
    /// where the two meet, the answer is the minimum.
    /// </summary>
    [Theory]
    [InlineData("C 3, O 1", 600, 1)]
    [InlineData("C 1, O 2, H 2", 830, 1)]
    [InlineData("Cr 2, O 3, C 3", 1050, 1)]
    [InlineData("Cr 2, O 3, C 3", 1300, 1)]
    [InlineData("Cr 2, O 3, C 3", 1750, 1)]
    [InlineData("Cr 2, O 3, C 3", 1200, 1e-3)]
    [InlineData("Fe 1, O 1.2", 900, 1)]
    [InlineData("Fe 1, O 1.05, H 3", 800, 1)]
    [InlineData("Mg 1, O 1, C 1", 1400, 1e-3)]
    [InlineData("Mg 2, Ca 2, O 4, Si 1", 1200, 1e-4)]
    [InlineData("Mg 2, Ca 2, O 4, Si 1", 1200, 1)]
    [InlineData("Si 1, O 2, C 3", 1650, 1)]
    [InlineData("W 1, O 3, H 20", 800, 1)]
    [InlineData("Zn 1, O 1, C 1", 1000, 1)]
    [InlineData("Ti 1, O 2, C 3, N 4", 1400, 1)]
    public void The_answer_meets_a_bound_found_by_cuts(string charge, double celsius, double bar)
    {
        Dictionary<string, double> moles = Read(charge);
        ChargeState state = Solve(moles, celsius, bar);
        double answer = Gibbs(state);
        double bound = BoundByCuts(moles, state.At.Kelvin, state.Total.NaturalLogBar);
        double atoms = moles.Values.Sum();
        Assert.InRange((answer - bound) / atoms, -1e-9, 1e-6);
    }

    /// <summary>Chromia with stoichiometric carbon: carbide from 1105 to 1130 C at 1 bar (common practice, no source).</summary>
    [Fact]
    public void Chromium_carbide_starts_where_practice_has_it()
        => Assert.InRange(Onset("Cr 2, O 3, C 3", 1, 900, 1400, state => state.Condensed.Any(IsChromiumCarbide)), 1105 - 10, 1130 + 10);

    /// <summary>Chromium metal about 1700 ± 60 C at 1 bar and about 1170 C at 1 mbar, to the same width (common practice, no source).</summary>
    [Theory]
    [InlineData(1, 1700)]
    [InlineData(1e-3, 1170)]
    public void Chromium_metal_starts_where_practice_has_it(double bar, double celsius)
        => Assert.InRange(Onset("Cr 2, O 3, C 3", bar, celsius - 300, celsius + 300, state => state.Has("Cr")), celsius - 60, celsius + 60);

    /// <summary>
    /// MgO + C = Mg + CO at 100 Pa, 50 Pa each: 2 Mg(g) + O2 = 2 MgO is -1428800 + 387.4 T and 2 C + O2 = 2 CO is -223400 - 175.3 T J
    /// (handbook straight lines, from memory), which meet at about 1205 C; 30 C is the width of such a crossing.
    /// </summary>
    [Fact]
    public void Magnesia_and_carbon_go_off_in_vacuum_where_handbook_lines_cross()
    {
        double logShare = Math.Log(0.5e-3);
        double expected = ((1428800 - 223400) / 2.0 / (((387.4 + 175.3) / 2) - (PhysicalConstants.GasConstant * 2 * logShare))) - 273.15;
        double found = Onset("Mg 1, O 1, C 1", 1e-3, 900, 1600, state => state.GasMoles > 1);
        Assert.InRange(found, expected - 30, expected + 30);
    }

    /// <summary>CO + H2O = CO2 + H2 is 1 near 1100 K (JANAF formation constants, from memory: 0.99).</summary>
    [Fact]
    public void Water_gas_shift_is_even_near_1100_kelvin()
    {
        ChargeState state = Solve(Read("C 1, O 2.2, H 2"), 1100 - 273.15, 1);
        double constant = state.MolesOf("CO2") * state.MolesOf("H2") / (state.MolesOf("CO") * state.MolesOf("H2O"));
        Assert.InRange(constant, 0.93, 1.07);
    }

    /// <summary>A thousandfold charge gives a thousandfold answer; the order of writing changes nothing.</summary>
    [Theory]
    [InlineData("Cr 2, O 3, C 3", 1300, 1)]
    [InlineData("Fe 1, O 1.05, H 3", 800, 1)]
    [InlineData("Si 1, O 2, C 3", 1650, 0.1)]
    public void Scale_and_order_change_nothing(string charge, double celsius, double bar)
    {
        Dictionary<string, double> moles = Read(charge);
        ChargeState one = Solve(moles, celsius, bar);
        ChargeState other = Solve(moles.Reverse().ToDictionary(pair => pair.Key, pair => pair.Value * 1000), celsius, bar);
        Assert.Equal(one.Condensed.Select(phase => phase.Substance.Id).Order(StringComparer.Ordinal), other.Condensed.Select(phase => phase.Substance.Id).Order(StringComparer.Ordinal));
        foreach (ChargePhase phase in one.Condensed)
        {
            Assert.Equal(phase.Moles, other.MolesOf(phase.Substance.Id) / 1000, 1e-7);
        }

        Assert.Equal(one.GasMoles, other.GasMoles / 1000, 1e-7);
    }

    /// <summary>Pressing on 2 CO = C + CO2 turns it to the side of less gas (Le Chatelier).</summary>
    [Fact]
    public void More_pressure_makes_less_gas_over_graphite()
    {
        double[] gas = [.. new[] { 0.01, 0.1, 1, 10, 100 }.Select(bar => Solve(Read("C 3, O 1"), 800, bar).GasMoles)];
        Assert.All(gas.Zip(gas.Skip(1)), pair => Assert.True(pair.First > pair.Second));
    }

    /// <summary>Argon beside a gas, with the total raised so that the others keep their partial pressures, leaves the solids alone.</summary>
    [Fact]
    public void An_inert_at_unchanged_partial_pressures_changes_nothing()
    {
        ChargeState bare = Solve(Read("Fe 1, O 1.05, H 3"), 800, 1);
        Dictionary<string, double> with = Read("Fe 1, O 1.05, H 3");
        with["Ar"] = bare.GasMoles;
        ChargeState diluted = Solve(with, 800, 2);
        Assert.Equal(bare.MolesOf("Fe"), diluted.MolesOf("Fe"), 1e-7);
        Assert.Equal(bare.Log10Oxygen!.Value, diluted.Log10Oxygen!.Value, 1e-7);
    }

    private static bool IsChromiumCarbide(ChargePhase phase) => phase.Substance.Formula.Of("Cr") > 0 && phase.Substance.Formula.Of("C") > 0 && phase.Substance.Formula.Of("O") <= 0;

    private static double Onset(string charge, double bar, double cold, double hot, Func<ChargeState, bool> stands)
    {
        Dictionary<string, double> moles = Read(charge);
        Assert.False(stands(Solve(moles, cold, bar)));
        Assert.True(stands(Solve(moles, hot, bar)));
        while (hot - cold > 0.5)
        {
            double middle = 0.5 * (cold + hot);
            (cold, hot) = stands(Solve(moles, middle, bar)) ? (cold, middle) : (middle, hot);
        }

        return hot;
    }

    /// <summary>Gibbs energy of an answer over RT.</summary>
    private static double Gibbs(ChargeState state)
    {
        double rt = PhysicalConstants.GasConstant * state.At.Kelvin;
        double solids = state.Condensed.Sum(phase => phase.Moles * phase.Substance.Gibbs(state.At.Kelvin) / rt);
        double gas = state.Gas.Where(share => share.Fraction > 0).Sum(share => share.Fraction * ((share.Substance.Gibbs(state.At.Kelvin) / rt) + share.NaturalLogFraction + state.Total.NaturalLogBar));
        return solids + (state.GasMoles * gas);
    }

    /// <summary>Greatest b . lambda met among feasible centres of shrinking ellipsoids.</summary>
    private static double BoundByCuts(Dictionary<string, double> moles, double kelvin, double logBar)
    {
        string[] elements = [.. moles.Keys];
        int n = elements.Length;
        double[] wanted = [.. elements.Select(element => moles[element])];
        (double[] Atoms, double Cost, bool IsGas)[] columns =
        [
            .. Database.MadeOf(elements.ToHashSet())
                .Where(substance => substance.TryGibbs(kelvin, out _))
                .Select(substance => (elements.Select(substance.Formula.Of).ToArray(), substance.Gibbs(kelvin) / (PhysicalConstants.GasConstant * kelvin), substance.IsGas)),
        ];
        double[] best = new double[n];
        double bound = double.NegativeInfinity;

        // A flat ellipsoid loses its digits: each round starts afresh from a ball about the best point so far. A round that misses only leaves the bound lower.
        for (double radius = 3000; radius > 1e-7; radius /= 4)
        {
            double[] centre = [.. best];
            double[,] shape = new double[n, n];
            for (int i = 0; i < n; i++)
            {
                shape[i, i] = radius * radius;
            }

            for (int step = 0; step < 60 * n * n; step++)
            {
                double[]? cut = Violated(columns, centre, logBar);
                if (cut is null)
                {
                    double value = Dot(wanted, centre);
                    if (value > bound)
                    {
                        (bound, best) = (value, [.. centre]);
                    }

                    cut = [.. wanted.Select(amount => -amount)];
                }

                double[] along = [.. Enumerable.Range(0, n).Select(i => Enumerable.Range(0, n).Sum(j => shape[i, j] * cut[j]))];
                double square = Dot(cut, along);
                if (!(square > 0))
                {
                    break;
                }

                for (int i = 0; i < n; i++)
                {
                    centre[i] -= along[i] / Math.Sqrt(square) / (n + 1);
                    for (int j = 0; j < n; j++)
                    {
                        shape[i, j] = n * n / ((double)(n * n) - 1) * (shape[i, j] - (2.0 / (n + 1) * along[i] * along[j] / square));
                    }
                }
            }
        }

        return bound;
    }

    /// <summary>Outward direction of the worst broken condition, or null where nothing wants to form.</summary>
    private static double[]? Violated((double[] Atoms, double Cost, bool IsGas)[] columns, double[] potentials, double logBar)
    {
        double worst = 0;
        double[]? cut = null;
        foreach ((double[] atoms, double cost, bool isGas) in columns)
        {
            double drive = Dot(atoms, potentials) - cost - (isGas ? logBar : 0);
            if (drive > worst)
            {
                (worst, cut) = (drive, atoms);
            }
        }

        if (cut is not null)
        {
            return cut;
        }

        (double[] Atoms, double Share)[] shares = [.. columns.Where(column => column.IsGas).Select(column => (column.Atoms, Math.Exp(Dot(column.Atoms, potentials) - column.Cost - logBar)))];
        return shares.Sum(share => share.Share) > 1
            ? [.. Enumerable.Range(0, potentials.Length).Select(i => shares.Sum(share => share.Share * share.Atoms[i]))]
            : null;
    }

    private static double Dot(double[] one, double[] other)
    {
        double sum = 0;
        for (int i = 0; i < one.Length; i++)
        {
            sum += one[i] * other[i];
        }

        return sum;
    }

    private static ChargeState Solve(Dictionary<string, double> moles, double celsius, double bar)
        => new ChargeEquilibrium(Database, moles.Keys).Solve(moles, Temperature.FromCelsius(celsius), Pressure.FromBar(bar));

    private static Dictionary<string, double> Read(string charge)
        => charge.Split(", ").Select(part => part.Split(' ')).ToDictionary(part => part[0], part => double.Parse(part[1], CultureInfo.InvariantCulture));
}
