using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Published;

/// <summary>Reads an equation of the check tables into a reaction of the database, and the two boundaries of wustite by name.</summary>
internal static class PublishedEquation
{
    private static readonly string[] WustiteMembers = ["Fe0.947O", "Fe0.90O", "Fe0.86O"];

    public static Reaction Parse(string equation) => Reaction.Of(
        ReactionEquation.Parse(equation).Terms.Select(term => (SubstanceDatabase.Bundled.Get(term.Name), term.Number)));

    /// <summary>Standard Gibbs energy in J of the equation, or of <c>Fe/wustite</c> and <c>wustite/Fe3O4</c> per mole O2.</summary>
    /// <remarks>Of the members of wustite the one with the lowest potential stands beside iron, and the one with the highest beside magnetite.</remarks>
    public static double StandardGibbs(string equation, double kelvin) => equation switch
    {
        "Fe/wustite" => WustiteMembers.Min(member => BesideIron(member).StandardGibbs(kelvin)),
        "wustite/Fe3O4" => WustiteMembers.Max(member => BesideMagnetite(member).StandardGibbs(kelvin)),
        _ => Parse(equation).StandardGibbs(kelvin),
    };

    /// <summary>log10 of pO2 in bar over a couple written with one O2 on the left.</summary>
    public static double Log10Bar(string equation, double kelvin) =>
        StandardGibbs(equation, kelvin) / (PhysicalConstants.GasConstant * kelvin * Math.Log(10));

    /// <summary>The temperature in K at which a function changes sign, between two temperatures with data.</summary>
    public static double Root(Func<double, double> of, double low, double high)
    {
        bool rising = of(high) > 0;
        if (rising == of(low) > 0)
        {
            throw new InvalidDataException(FormattableString.Invariant($"no change of sign between {low} and {high} K"));
        }

        while (high - low > 1e-6)
        {
            double middle = 0.5 * (low + high);
            (low, high) = (of(middle) > 0) == rising ? (low, middle) : (middle, high);
        }

        return 0.5 * (low + high);
    }

    private static Reaction BesideIron(string member)
    {
        double iron = SubstanceDatabase.Bundled.Get(member).Formula.Of("Fe");
        return Of([("Fe", -2 * iron), ("O2", -1), (member, 2)]);
    }

    private static Reaction BesideMagnetite(string member)
    {
        // a FexO + O2 = b Fe3O4 with a x = 3 b and a + 2 = 4 b.
        double iron = SubstanceDatabase.Bundled.Get(member).Formula.Of("Fe");
        double b = 2 / (4 - (3 / iron));
        return Of([(member, -3 * b / iron), ("O2", -1), ("Fe3O4", b)]);
    }

    private static Reaction Of(ImmutableArray<(string Name, double Number)> terms) =>
        Reaction.Of(terms.Select(term => (SubstanceDatabase.Bundled.Get(term.Name), term.Number)));
}
