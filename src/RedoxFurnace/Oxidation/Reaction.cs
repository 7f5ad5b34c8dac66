using System.Collections.Immutable;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>A balanced reaction between substances: signed stoichiometric numbers, negative for reactants.</summary>
public sealed class Reaction
{
    private const double Negligible = 1e-12;

    private Reaction(ImmutableArray<(Substance Substance, double Number)> terms) => Terms = terms;

    /// <summary>Substances with their signed numbers; none is zero, none stands twice.</summary>
    public ImmutableArray<(Substance Substance, double Number)> Terms { get; }

    /// <summary>The equation, with fractions where they are simple: <c>4/3 Al + O2 = 2/3 Al2O3</c>.</summary>
    public string Text => ReactionText.Write(Terms);

    /// <summary>Gathers terms; the same substance on both sides cancels.</summary>
    /// <param name="terms">Substances with signed numbers.</param>
    /// <returns>The reaction.</returns>
    public static Reaction Of(IEnumerable<(Substance Substance, double Number)> terms)
    {
        List<(Substance Substance, double Number)> gathered = [];
        foreach ((Substance substance, double number) in terms)
        {
            int at = gathered.FindIndex(term => ReferenceEquals(term.Substance, substance));
            if (at < 0)
            {
                gathered.Add((substance, number));
            }
            else
            {
                gathered[at] = (substance, gathered[at].Number + number);
            }
        }

        return new Reaction([.. gathered.Where(term => Math.Abs(term.Number) > Negligible)]);
    }

    /// <summary>This reaction and another, each taken a number of times.</summary>
    /// <param name="times">Of this one.</param>
    /// <param name="other">The other.</param>
    /// <param name="otherTimes">Of the other.</param>
    /// <returns>The sum.</returns>
    public Reaction Plus(double times, Reaction other, double otherTimes)
        => Of(Terms.Select(term => (term.Substance, term.Number * times)).Concat(other.Terms.Select(term => (term.Substance, term.Number * otherTimes))));

    /// <summary>Every number multiplied; a negative factor turns the reaction round.</summary>
    /// <param name="factor">Not 0.</param>
    /// <returns>The scaled reaction.</returns>
    public Reaction Times(double factor) => Of(Terms.Select(term => (term.Substance, term.Number * factor)));

    /// <summary>Standard Gibbs energy of reaction, all partners pure at 1 bar, in their stable phases.</summary>
    /// <param name="kelvin">Inside the data of all partners.</param>
    /// <returns>J for the reaction as written.</returns>
    /// <exception cref="OutsideDataException">A partner has no data at the temperature.</exception>
    public double StandardGibbs(double kelvin)
    {
        double sum = 0;
        foreach ((Substance substance, double number) in Terms)
        {
            sum += number * substance.Gibbs(kelvin);
        }

        return sum;
    }

    /// <summary>Enthalpy of reaction with all partners at one temperature.</summary>
    /// <param name="kelvin">Inside the data of all partners.</param>
    /// <returns>J for the reaction as written; positive where heat must be supplied.</returns>
    /// <exception cref="OutsideDataException">A partner has no data at the temperature.</exception>
    public double Enthalpy(double kelvin)
    {
        double sum = 0;
        foreach ((Substance substance, double number) in Terms)
        {
            sum += number * substance.At(kelvin).Enthalpy;
        }

        return sum;
    }

    /// <summary>Entropy of reaction with all partners at one temperature.</summary>
    /// <param name="kelvin">Inside the data of all partners.</param>
    /// <returns>J/K for the reaction as written.</returns>
    /// <exception cref="OutsideDataException">A partner has no data at the temperature.</exception>
    public double Entropy(double kelvin)
    {
        double sum = 0;
        foreach ((Substance substance, double number) in Terms)
        {
            sum += number * substance.At(kelvin).Entropy;
        }

        return sum;
    }

    /// <summary>Whether every partner has data at a temperature.</summary>
    /// <param name="kelvin">K.</param>
    /// <returns>True when they all do.</returns>
    public bool HasData(double kelvin) => Terms.All(term => term.Substance.TryGibbs(kelvin, out _));

    /// <summary>The stoichiometric number of a substance, 0 when absent.</summary>
    /// <param name="substance">The substance.</param>
    /// <returns>Signed number.</returns>
    public double NumberOf(Substance substance)
    {
        foreach ((Substance own, double number) in Terms)
        {
            if (ReferenceEquals(own, substance))
            {
                return number;
            }
        }

        return 0;
    }

    /// <summary>Largest imbalance of any element, in atoms.</summary>
    /// <returns>0 within rounding for a balanced reaction.</returns>
    public double LargestImbalance()
    {
        Dictionary<string, double> sums = new(StringComparer.Ordinal);
        foreach ((Substance substance, double number) in Terms)
        {
            foreach ((string element, double count) in substance.Formula.Atoms)
            {
                sums[element] = sums.GetValueOrDefault(element) + (number * count);
            }
        }

        return sums.Values.Select(Math.Abs).DefaultIfEmpty(0).Max();
    }

    /// <inheritdoc/>
    public override string ToString() => Text;
}
