using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>A gas by mole (volume) fractions that sum to 1. Its identity is its <see cref="Fractions"/>; two equal gases are not reference-equal.</summary>
public sealed class GasMixture
{
    /// <summary>Number of <see cref="GasSpecies"/>.</summary>
    public const int SpeciesCount = 10;

    /// <summary>Smaller shares count as nothing: in ten thousand cubic metres of gas they would not be one molecule.</summary>
    public const double SmallestShare = 1e-30;

    private const double SumTolerance = 1e-9;

    private GasMixture(ImmutableArray<double> fractions) => Fractions = fractions;

    /// <summary>Mole fraction of each species, in the order of <see cref="GasSpecies"/>; each 0 to 1, together 1.</summary>
    public ImmutableArray<double> Fractions { get; }

    /// <summary>Mole fraction of one species.</summary>
    /// <param name="species">The species.</param>
    /// <returns>0 to 1.</returns>
    public double this[GasSpecies species] => Fractions[(int)species];

    /// <summary>Moles of hydrogen atoms per mole of gas.</summary>
    public double HydrogenAtoms => 2 * (this[GasSpecies.H2] + this[GasSpecies.H2O] + (2 * this[GasSpecies.CH4]) + (1.5 * this[GasSpecies.NH3]));

    /// <summary>Moles of carbon atoms per mole of gas.</summary>
    public double CarbonAtoms => this[GasSpecies.CO] + this[GasSpecies.CO2] + this[GasSpecies.CH4];

    /// <summary>Moles of oxygen atoms per mole of gas.</summary>
    public double OxygenAtoms => this[GasSpecies.H2O] + this[GasSpecies.CO] + (2 * (this[GasSpecies.CO2] + this[GasSpecies.O2]));

    /// <summary>Moles of nitrogen atoms per mole of gas.</summary>
    public double NitrogenAtoms => (2 * this[GasSpecies.N2]) + this[GasSpecies.NH3];

    /// <summary>Share of gases that burn.</summary>
    public double Fuel => this[GasSpecies.H2] + this[GasSpecies.CO] + this[GasSpecies.CH4] + this[GasSpecies.NH3];

    /// <summary>A gas of given fractions.</summary>
    /// <param name="fractions">Species with fractions; a species named twice is added up.</param>
    /// <returns>The gas.</returns>
    /// <exception cref="ArgumentException">Negative, not finite, or not summing to 1 within 1e-9.</exception>
    public static GasMixture Of(params (GasSpecies Species, double Fraction)[] fractions)
    {
        double[] all = new double[SpeciesCount];
        foreach ((GasSpecies species, double fraction) in fractions)
        {
            all[(int)species] += fraction;
        }

        return OfFractions(all);
    }

    /// <summary>A gas of amounts in any common unit.</summary>
    /// <param name="amounts">In the order of <see cref="GasSpecies"/>; at least one above 0.</param>
    /// <returns>The gas, its fractions the amounts over their sum.</returns>
    /// <exception cref="ArgumentException">Negative, not finite, or all 0.</exception>
    public static GasMixture OfAmounts(ReadOnlySpan<double> amounts)
    {
        double sum = 0;
        foreach (double amount in amounts)
        {
            sum += amount;
        }

        double[] all = new double[SpeciesCount];
        for (int i = 0; i < SpeciesCount; i++)
        {
            all[i] = amounts[i] / sum;
        }

        return OfFractions(all);
    }

    /// <summary>This gas with another share of one species, the others keeping their proportions.</summary>
    /// <param name="species">The species.</param>
    /// <param name="fraction">0 to 1; 1 only where nothing else is in the gas.</param>
    /// <returns>The new gas.</returns>
    public GasMixture With(GasSpecies species, double fraction)
    {
        if (!(fraction >= 0 && fraction <= 1))
        {
            throw new ArgumentOutOfRangeException(nameof(fraction), fraction, "A fraction lies between 0 and 1.");
        }

        double rest = Fractions.Where((_, i) => i != (int)species).Sum();
        double[] all = new double[SpeciesCount];
        for (int i = 0; i < SpeciesCount; i++)
        {
            all[i] = i == (int)species ? fraction : Fractions[i] / rest * (1 - fraction);
        }

        return OfFractions(all);
    }

    /// <summary>For a caption: species with their shares, largest first, traces in ppm.</summary>
    /// <returns>Text such as <c>Ar 70 %, H2 30 %, H2O 71 ppm</c>.</returns>
    public string Describe()
        => string.Join(", ", Enum.GetValues<GasSpecies>()
            .Where(species => this[species] > 0)
            .OrderByDescending(species => this[species])
            .Select(species => $"{species} {ShareText(this[species])}"));

    /// <summary>A share as people write it: percent, or ppm below 0.1 %.</summary>
    /// <param name="share">0 to 1.</param>
    /// <returns>Number, space, unit.</returns>
    public static string ShareText(double share)
        => share >= 1e-3 ? Printed.Brief(share * 100) + " %" : Printed.Brief(share * 1e6) + " ppm";

    /// <inheritdoc/>
    public override string ToString() => Describe();

    private static GasMixture OfFractions(double[] fractions)
    {
        double sum = 0;
        foreach (double fraction in fractions)
        {
            if (!(fraction >= 0) || double.IsInfinity(fraction))
            {
                throw new ArgumentException("fractions of a gas are finite and not negative", nameof(fractions));
            }

            sum += fraction;
        }

        return Math.Abs(sum - 1) <= SumTolerance
            ? new GasMixture([.. fractions.Select(fraction => fraction < SmallestShare ? 0 : fraction)])
            : throw new ArgumentException("fractions of a gas sum to 1", nameof(fractions));
    }
}
