using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Published;

/// <summary>One row of measured-couples.csv against the database, as a difference in the unit of its error.</summary>
internal static class MeasuredCouple
{
    private const double OxygenInMoistAirBar = 0.2123;

    private static readonly GasReactions Gases = new(SubstanceDatabase.Bundled);

    /// <summary>How far the database lies from the measurement, and how far it may: 1 kJ/mol O2, or twice the stated error.</summary>
    public static (double Difference, double Allowed) Compare(PublishedRow row, double kelvin)
    {
        string unit = row["unit"];
        return unit.StartsWith("K in air", StringComparison.Ordinal) || unit.StartsWith("K at pO2", StringComparison.Ordinal) || unit.StartsWith("K in 1 bar", StringComparison.Ordinal)
            ? CompareTemperature(row)
            : unit.StartsWith("K, Fe", StringComparison.Ordinal)
                ? CompareWustiteLimit(row)
                : ComparePotential(row, kelvin);
    }

    private static (double Difference, double Allowed) ComparePotential(PublishedRow row, double kelvin)
    {
        string equation = Equation(row);
        double rt = PhysicalConstants.GasConstant * kelvin / 1000;
        double kilojoules = PublishedEquation.StandardGibbs(equation, kelvin) / 1000;
        double error = row.Number("error");
        return row["unit"] switch
        {
            "J/mol O2" => (kilojoules - (PublishedExpression.Evaluate(row["mu_O2"], kelvin) / 1000), Math.Max(1, 2 * error)),
            "J/mol NiO, dG0f" or "J/mol Fe0.947O, dG0f" => (kilojoules - (2 * row.Number("mu_O2") / 1000), Math.Max(1, 2 * error)),
            "pH2O/pH2" => Ratio(Gases.HydrogenOxidation),
            "pCO2/pCO" => Ratio(Gases.CarbonMonoxideOxidation),
            "kJ/mol O2, dH at 298.15 K" => ((PublishedEquation.Parse(equation).Enthalpy(298.15) / 1000) - row.Number("mu_O2"), Math.Max(1, 2 * error)),
            string other => throw new InvalidDataException(other),
        };

        (double, double) Ratio(Reaction oxidation) => (
            kilojoules - (oxidation.StandardGibbs(kelvin) / 1000) - (2 * rt * Math.Log(row.Number("mu_O2"))),
            Math.Max(1, 2 * 2 * rt * error / 100));
    }

    private static (double Difference, double Allowed) CompareTemperature(PublishedRow row)
    {
        string unit = row["unit"];
        double bar = unit.Contains("0.2123", StringComparison.Ordinal) ? OxygenInMoistAirBar : unit.Contains("0.52 bar", StringComparison.Ordinal) ? 0.52 : 1;
        string equation = Equation(row);
        double published = row.Number("mu_O2");
        double Excess(double kelvin) => PublishedEquation.StandardGibbs(equation, kelvin) - (PhysicalConstants.GasConstant * kelvin * Math.Log(bar));
        Reaction reaction = PublishedEquation.Parse(equation);
        double low = 500, high = reaction.Terms.Min(term => term.Substance.HighestKelvin);
        double found = PublishedEquation.Root(Excess, low, high);
        double slopeKilojoules = (Excess(found + 1) - Excess(found - 1)) / 2000;
        return (found - published, Math.Max(1 / slopeKilojoules, 2 * row.Number("error")));
    }

    private static (double Difference, double Allowed) CompareWustiteLimit(PublishedRow row)
    {
        double found = PublishedEquation.Root(
            kelvin => PublishedEquation.StandardGibbs("Fe/wustite", kelvin) - PublishedEquation.StandardGibbs("1.5 Fe + O2 = 0.5 Fe3O4", kelvin), 700, 1000);
        return (found - row.Number("mu_O2"), 2 * row.Number("error"));
    }

    private static string Equation(PublishedRow row) => row["couple"] switch
    {
        "Fe/Fe0.947O" => "Fe/wustite",
        "Fe0.947O/Fe3O4" => "wustite/Fe3O4",
        _ => Balanced(row["reactant"], row["product"]),
    };

    /// <summary>a reactant + O2 = b product, balanced in the one metal.</summary>
    private static string Balanced(string reactant, string product)
    {
        Formula lower = SubstanceDatabase.Bundled.Get(reactant).Formula;
        Formula upper = SubstanceDatabase.Bundled.Get(product).Formula;
        string metal = upper.Atoms.Keys.Single(element => element != "O");
        double perReactant = upper.Of("O") * lower.Of(metal) / upper.Of(metal);
        double a = 2 / (perReactant - lower.Of("O"));
        return FormattableString.Invariant($"{a:R} {reactant} + O2 = {a * lower.Of(metal) / upper.Of(metal):R} {product}");
    }
}
