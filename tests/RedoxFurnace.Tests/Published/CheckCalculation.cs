using System.Globalization;
using System.Text.RegularExpressions;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Published;

/// <summary>Calculates, in the unit of the row, what a single-valued row of check-values.csv publishes.</summary>
internal static partial class CheckCalculation
{
    private const double BarPerMillimetreMercury = 133.322387415e-5;
    private const double JoulesPerCalorie = 4.184;

    private static readonly GasReactions Gases = new(SubstanceDatabase.Bundled);

    private static readonly Dictionary<string, string> Couples = new()
    {
        ["Fe + wustite"] = "Fe/wustite",
        ["Fe-wustite"] = "Fe/wustite",
        ["wustite + Fe3O4"] = "wustite/Fe3O4",
        ["wustite-Fe3O4"] = "wustite/Fe3O4",
        ["Co + CoO"] = "2 Co + O2 = 2 CoO",
        ["Co-CoO"] = "2 Co + O2 = 2 CoO",
        ["Ni + NiO"] = "2 Ni + O2 = 2 NiO",
        ["Ni-NiO"] = "2 Ni + O2 = 2 NiO",
        ["Cu-Cu2O"] = "4 Cu + O2 = 2 Cu2O",
        ["Mo-MoO2"] = "Mo + O2 = MoO2",
        ["Cr-Cr2O3"] = "4/3 Cr + O2 = 2/3 Cr2O3",
        ["Cr + Cr2O3"] = "4/3 Cr + O2 = 2/3 Cr2O3",
        ["Fe3O4-Fe2O3"] = "4 Fe3O4 + O2 = 6 Fe2O3",
        ["quartz-iron-fayalite"] = "2 Fe + SiO2 + O2 = Fe2SiO4",
        ["fayalite-magnetite-quartz"] = "3 Fe2SiO4 + O2 = 2 Fe3O4 + 3 SiO2",
    };

    public static double Found(PublishedRow row) => row["group"].Split(' ')[0].Trim('"') switch
    {
        "2a" => GasOverCouple(row),
        "2b" => Buffer(row),
        "2c" => Graphite(row),
        "2d" => Onset(row),
        "2e" => MagnesiumPressure(row),
        "4" => Probe(row),
        "5" => ThermiteHeat(row),
        "6" => DewPoint(row),
        string other => throw new InvalidDataException($"no calculation for group {other}"),
    };

    private static double GasOverCouple(PublishedRow row)
    {
        double kelvin = KelvinOf(row["conditions"]);
        double potential = PotentialOf(row["quantity"].Split(" over ")[1], kelvin);
        double hydrogen = Math.Exp(GasReactions.RatioOfPotential(Gases.HydrogenOxidation, kelvin, potential));
        double monoxide = Math.Exp(GasReactions.RatioOfPotential(Gases.CarbonMonoxideOxidation, kelvin, potential));
        return row["quantity"].Split(' ')[0] switch
        {
            "pH2O/pH2" => 1 / hydrogen,
            "pCO2/pCO" => 1 / monoxide,
            "%H2" => 100 * hydrogen / (1 + hydrogen),
            "%CO" => 100 * monoxide / (1 + monoxide),
            "pO2" => Math.Exp(potential / (PhysicalConstants.GasConstant * kelvin)) / BarPerMillimetreMercury,
            string other => throw new InvalidDataException(other),
        };
    }

    private static double Buffer(PublishedRow row)
    {
        double kelvin = KelvinOf(row["conditions"]);
        string quantity = row["quantity"];
        return quantity.StartsWith("dG0f of ", StringComparison.Ordinal)
            ? PublishedEquation.StandardGibbs(quantity[8..] == "NiO" ? "Ni + 0.5 O2 = NiO" : "0.947 Fe + 0.5 O2 = Fe0.947O", kelvin)
            : OxygenPotentialReadings.Log10Bar(PotentialOf(quantity.Split(" of ")[1], kelvin), kelvin);
    }

    private static double Graphite(PublishedRow row)
    {
        double bar = row["conditions"].Contains("atm", StringComparison.Ordinal) ? PhysicalConstants.AtmosphereInBar : 1;
        return row["quantity"] switch
        {
            "wustite eutectoid temperature" => WustiteLimit() - 273.15,
            "T of Fe + wustite + C + gas" => MeetsGraphite("Fe/wustite", bar) - 273.15,
            "T of wustite + Fe3O4 + C + gas" => MeetsGraphite("wustite/Fe3O4", bar) - 273.15,
            "CO fraction, C + CO + CO2" => Gases.AboveGraphite(KelvinOf(row["conditions"]), Math.Log(bar)).MonoxideShare,
            "%CO, C + CO + CO2" => 100 * Gases.AboveGraphite(KelvinOf(row["conditions"]), Math.Log(bar)).MonoxideShare,
            "T where Kp of C+CO2=2CO is 1" => PublishedEquation.Root(kelvin => PublishedEquation.StandardGibbs("C + CO2 = 2 CO", kelvin), 600, 1500) - 273.15,
            "pO2 over graphite + 1 atm CO" => OxygenOverGraphite(KelvinOf(row["conditions"])),
            string other => throw new InvalidDataException(other),
        };
    }

    private static double OxygenOverGraphite(double kelvin)
    {
        double logBar = (Gases.GraphiteToMonoxide.StandardGibbs(kelvin) / (PhysicalConstants.GasConstant * kelvin)) + (2 * Math.Log(PhysicalConstants.AtmosphereInBar));
        return Math.Exp(logBar) / PhysicalConstants.AtmosphereInBar;
    }

    private static double WustiteLimit() => LadderInvariants.Between(OxideSystem.OfMetal("Fe", SubstanceDatabase.Bundled, Activities.AllOne), 700, 1000)
        .Single(change => change.Phase == "wustite").Kelvin;

    private static double MeetsGraphite(string couple, double bar) => PublishedEquation.Root(
        kelvin => PublishedEquation.StandardGibbs(couple, kelvin) - Gases.AboveGraphite(kelvin, Math.Log(bar)).OxygenPotential, 850, 1200);

    private static double Onset(PublishedRow row)
    {
        string equation = row["quantity"]["T of ".Length..].Split(' ')[0];
        if (equation.StartsWith("FeO", StringComparison.Ordinal))
        {
            return PublishedEquation.Root(
                kelvin => PublishedEquation.StandardGibbs("Fe/wustite", kelvin) - Gases.GraphiteToMonoxide.StandardGibbs(kelvin), 850, 1300) - 273.15;
        }

        // Two gases share the total pressure equally where one is stated; else each stands at 1 bar.
        Match total = TotalPressure().Match(row["conditions"]);
        double logGas = total.Success ? Math.Log(PublishedTable.Number(total.Groups[1].Value) / 2e5) : 0;
        Reaction reaction = PublishedEquation.Parse(Spaced(equation));
        double gases = reaction.Terms.Where(term => term.Substance.IsGas).Sum(term => term.Number);
        double kelvin = PublishedEquation.Root(
            t => reaction.StandardGibbs(t) + (gases * PhysicalConstants.GasConstant * t * logGas),
            1100,
            reaction.Terms.Min(term => term.Substance.HighestKelvin));
        return row["unit"] == "K" ? kelvin : kelvin - 273.15;
    }

    private static double MagnesiumPressure(PublishedRow row)
    {
        double kelvin = KelvinOf(row["conditions"]);
        double gibbs = PublishedEquation.StandardGibbs("2 CaO + 2 MgO + Si = Ca2SiO4 + 2 Mg(g)", kelvin);
        return Math.Exp(-gibbs / (2 * PhysicalConstants.GasConstant * kelvin)) / BarPerMillimetreMercury;
    }

    // The rows take their own oxygen shares for air (0.209, 0.206, 0.2095 at 1 atm); what differs from the program's
    // reference is taken out by the Nernst equation, so that the published tolerance can be kept.
    private static double Probe(PublishedRow row)
    {
        string quantity = row["quantity"];
        string conditions = row["conditions"];
        if (quantity.StartsWith("Nernst slope RT", StringComparison.Ordinal))
        {
            return SlopePerDecade(1000) / 1000;
        }

        if (quantity.StartsWith("Nernst slope", StringComparison.Ordinal))
        {
            return SlopePerDecade(KelvinOf(conditions));
        }

        double kelvin = KelvinOf(conditions);
        if (quantity.StartsWith("EMF ", StringComparison.Ordinal))
        {
            return OxygenPotentialReadings.ProbeMillivolts(PotentialOf(quantity[4..].Split(" against")[0], kelvin), kelvin);
        }

        double air = quantity.Contains("20.6%", StringComparison.Ordinal) ? 0.206 : 0.209;
        string[] first = conditions.Split(',')[0].Split(' ');
        double share = first[0].EndsWith('%') ? PublishedTable.Number(first[0].TrimEnd('%')) / 100 : PublishedTable.Number(first[1]);
        double shareOfProgram = share * PhysicalConstants.OxygenInAir / air;
        return OxygenPotentialReadings.ProbeMillivolts(PotentialOfOxygen(shareOfProgram * PhysicalConstants.AtmosphereInBar, kelvin), kelvin);
    }

    private static double SlopePerDecade(double kelvin) =>
        OxygenPotentialReadings.ProbeMillivolts(PotentialOfOxygen(0.001, kelvin), kelvin) - OxygenPotentialReadings.ProbeMillivolts(PotentialOfOxygen(0.01, kelvin), kelvin);

    private static double PotentialOfOxygen(double bar, double kelvin) => PhysicalConstants.GasConstant * kelvin * Math.Log(bar);

    /// <summary>Adiabatic temperature of a stoichiometric thermite at full equilibrium, or the gas it leaves there.</summary>
    private static double ThermiteEnd(PublishedRow row)
    {
        Match names = Regex.Match(row["quantity"], @"of (Al|Mg) \+ (\w+)");
        string reductant = names.Groups[1].Value;
        Substance oxide = SubstanceDatabase.Bundled.Get(names.Groups[2].Value);
        double moles = oxide.Formula.Of("O") * (reductant == "Al" ? 2.0 / 3 : 1);
        RedoxFurnace.Charges.BatchHeatResult result = RedoxFurnace.Charges.BatchHeat.Of(
            new RedoxFurnace.Charges.BatchHeatRequest([(oxide, 1), (SubstanceDatabase.Bundled.Get(reductant), moles)], Temperature.FromKelvin(298.15), 0, Pressure.FromBar(PhysicalConstants.AtmosphereInBar), null),
            SubstanceDatabase.Bundled);
        return row["quantity"].StartsWith("gas yield", StringComparison.Ordinal)
            ? result.GasMoles / result.Kilograms
            : row["unit"] == "C" ? result.Adiabatic!.Value.Celsius : result.Adiabatic!.Value.Kelvin;
    }

    private static double ThermiteHeat(PublishedRow row)
    {
        if (row["quantity"].StartsWith("adiabatic T", StringComparison.Ordinal) || row["quantity"].StartsWith("gas yield", StringComparison.Ordinal))
        {
            return ThermiteEnd(row);
        }

        if (row["quantity"].StartsWith("dH298 of 2Al + ", StringComparison.Ordinal))
        {
            string oxide = row["quantity"].Split(" + ")[1];
            return Thermite(oxide).Enthalpy(298.15) / 1000;
        }

        Reaction reaction = Thermite(row["quantity"].Split(" with ")[1]);
        double grams = reaction.Terms.Where(term => term.Number < 0).Sum(term => -term.Number * term.Substance.Formula.MolarMass);
        return -reaction.Enthalpy(298.15) / JoulesPerCalorie / grams;
    }

    /// <summary>One mole of oxide with aluminium to metal and alumina.</summary>
    private static Reaction Thermite(string oxide)
    {
        Substance substance = SubstanceDatabase.Bundled.Get(oxide);
        double oxygen = substance.Formula.Of("O");
        string metal = substance.Formula.Atoms.Keys.Single(element => element != "O");
        return Reaction.Of(new[] { (oxide, -1.0), ("Al", -2 * oxygen / 3), ("Al2O3", oxygen / 3), (metal, substance.Formula.Of(metal)) }
            .Select(term => (SubstanceDatabase.Bundled.Get(term.Item1), term.Item2)));
    }

    private static double DewPoint(PublishedRow row)
    {
        double kelvin = KelvinOf(row["conditions"]);
        double potential = PotentialOf("Cr + Cr2O3", kelvin);
        double logWater = Math.Log(PhysicalConstants.AtmosphereInBar) - GasReactions.RatioOfPotential(Gases.HydrogenOxidation, kelvin, potential);
        return WaterVapour.FrostPointOverIce(logWater)!.Value - 273.15;
    }

    private static double PotentialOf(string couple, double kelvin) => PublishedEquation.StandardGibbs(Couples[couple], kelvin);

    private static string Spaced(string equation) => Coefficient().Replace(
        equation.Replace("=", " = ", StringComparison.Ordinal).Replace("+", " + ", StringComparison.Ordinal), "$1 $2");

    private static double KelvinOf(string conditions)
    {
        Match match = TemperatureText().Match(conditions);
        double value = double.Parse(match.Groups[1].Value, CultureInfo.InvariantCulture);
        return match.Groups[2].Value == "K" ? value : value + 273.15;
    }

    [GeneratedRegex(@"(-?[0-9.]+) (C|K)\b")]
    private static partial Regex TemperatureText();

    [GeneratedRegex(@"(?<=^| )([0-9]+)([A-Z])")]
    private static partial Regex Coefficient();

    [GeneratedRegex(@"total pressure ([0-9.]+) Pa")]
    private static partial Regex TotalPressure();
}
