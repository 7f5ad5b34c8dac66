using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Assessments;

/// <summary>What the database, with some enthalpies and entropies shifted, gives for a measurement.</summary>
internal sealed class CoupleModel(SubstanceDatabase database)
{
    private readonly GasReactions _gases = new(database);

    /// <summary>Calculated less measured, J/mol O2, and its terms: the numbers of each substance whose H - TS enter.</summary>
    /// <param name="measurement">The measurement.</param>
    /// <param name="kelvin">K.</param>
    /// <param name="shifts">J/mol and J/(mol K) added to the database by formula.</param>
    /// <param name="leftOut">Members of a phase not to be used, or null.</param>
    public Difference Of(Measurement measurement, double kelvin, IReadOnlyDictionary<string, Shift> shifts, IReadOnlySet<string>? leftOut = null)
    {
        double rt = PhysicalConstants.GasConstant * kelvin;
        if (measurement.Kind == MeasurementKind.InvariantTemperature)
        {
            (double lower, Reaction first) = Potential(measurement.Phases[0], measurement.Phases[1], kelvin, shifts, leftOut);
            (double whole, Reaction second) = Potential(measurement.Phases[0], measurement.Phases[2], kelvin, shifts, leftOut);
            return new Difference(lower - whole, first.Plus(1, second, -1), true);
        }

        if (measurement.Kind == MeasurementKind.ReactionEnthalpy)
        {
            Reaction reaction = Formation(database.Get(measurement.Reactant), database.Get(measurement.Product));
            double heat = reaction.Enthalpy(kelvin) + reaction.Terms.Sum(term => term.Number * shifts.GetValueOrDefault(term.Substance.Id).Enthalpy);
            return new Difference(heat - (measurement.Value * 1000), reaction, false);
        }

        (double potential, Reaction formation) = Potential(measurement.Reactant, measurement.Product, kelvin, shifts, leftOut);
        double measured = measurement.Kind switch
        {
            MeasurementKind.Potential => measurement.Potential[0] + (measurement.Potential[1] * kelvin) + (measurement.Potential[2] * kelvin * Math.Log(kelvin)) + (measurement.Potential[3] * kelvin * kelvin),
            MeasurementKind.GasRatioHydrogen => _gases.HydrogenOxidation.StandardGibbs(kelvin) + (2 * rt * Math.Log(measurement.Value)),
            MeasurementKind.GasRatioMonoxide => _gases.CarbonMonoxideOxidation.StandardGibbs(kelvin) + (2 * rt * Math.Log(measurement.Value)),
            MeasurementKind.GibbsOfFormation => 2 * measurement.Value / database.Get(measurement.Product).Formula.Of("O"),
            _ => rt * Math.Log(measurement.OxygenBar),
        };
        return new Difference(potential - measured, formation, true);
    }

    /// <summary>Half the stated error as an energy, J/mol O2.</summary>
    public double StandardError(Measurement measurement, double kelvin, double? slope)
    {
        double half = measurement.ExpandedError / 2;
        if (measurement.ErrorUnit == "K")
        {
            return half * (slope ?? NumericSlope(measurement, kelvin));
        }

        return measurement.ErrorUnit == "%" ? 2 * PhysicalConstants.GasConstant * kelvin * half / 100 : half * 1000;
    }

    /// <summary>a reactant + O2 = b product, per mole of O2, for two substances that hold one metal in different proportions to oxygen.</summary>
    /// <exception cref="RequestException">They do not make a couple.</exception>
    public Reaction Formation(Substance reactant, Substance product)
    {
        string[] metals = [.. product.Formula.Atoms.Keys.Where(element => element != "O")];
        if (metals.Length != 1 || reactant.Formula.Of(metals[0]) <= 0 || reactant.Formula.Atoms.Keys.Any(element => element != "O" && element != metals[0]))
        {
            throw new RequestException($"{reactant.Id} and {product.Id} are no couple of one metal and its oxide; give such as Ni and NiO");
        }

        double ratio = reactant.Formula.Of(metals[0]) / product.Formula.Of(metals[0]);
        double taken = (ratio * product.Formula.Of("O")) - reactant.Formula.Of("O");
        return taken > 0
            ? Reaction.Of([(reactant, -2 / taken), (_gases.Oxygen, -1), (product, 2 * ratio / taken)])
            : throw new RequestException($"{product.Id} holds no more oxygen per metal than {reactant.Id}; give the side poor in oxygen first");
    }

    private double NumericSlope(Measurement measurement, double kelvin)
    {
        double above = Of(measurement, kelvin + 1, new Dictionary<string, Shift>()).Joules;
        double below = Of(measurement, kelvin - 1, new Dictionary<string, Shift>()).Joules;
        return Math.Abs(above - below) / 2;
    }

    /// <summary>A phase of several members meets what is poorer in oxygen at its lowest potential, what is richer at its highest: the hull does the same.</summary>
    private (double Joules, Reaction Formation) Potential(string reactant, string product, double kelvin, IReadOnlyDictionary<string, Shift> shifts, IReadOnlySet<string>? leftOut)
    {
        Substance lower = database.Get(reactant);
        Substance upper = database.Get(product);
        var all = Members(lower, leftOut).SelectMany(low => Members(upper, leftOut).Select(high => Formation(low, high)))
            .Where(reaction => reaction.HasData(kelvin))
            .Select(reaction => (Joules: Shifted(reaction, kelvin, shifts), reaction));
        (double Joules, Reaction Formation)[] sorted = [.. all.OrderBy(pair => pair.Joules)];
        if (sorted.Length == 0)
        {
            throw OutsideDataException.Of(upper.TryGibbs(kelvin, out _) ? lower : upper, kelvin);
        }

        return lower.Group is not null ? sorted[^1] : sorted[0];
    }

    private IEnumerable<Substance> Members(Substance substance, IReadOnlySet<string>? leftOut)
        => substance.Group is null
            ? [substance]
            : database.OxidesOf(substance.Formula.Atoms.Keys.Single(element => element != "O")).Where(member => member.Group == substance.Group && leftOut?.Contains(member.Id) != true);

    private static double Shifted(Reaction reaction, double kelvin, IReadOnlyDictionary<string, Shift> shifts)
    {
        double sum = reaction.StandardGibbs(kelvin);
        foreach ((Substance substance, double number) in reaction.Terms)
        {
            if (shifts.TryGetValue(substance.Id, out Shift shift))
            {
                sum += number * (shift.Enthalpy - (kelvin * shift.Entropy));
            }
        }

        return sum;
    }

    internal readonly record struct Shift(double Enthalpy, double Entropy);

    internal readonly record struct Difference(double Joules, Reaction Reaction, bool HasEntropy);
}
