using CsCheck;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;
using RedoxFurnace.Tests.Published;

namespace RedoxFurnace.Tests.Oxidation;

/// <summary>What must hold whatever the numbers are, on seeded random input.</summary>
public class OxidationIdentityTests
{
    private const string Seed = "0000KWrg9MH2";

    private static readonly string[] Couples =
    [
        "4/3 Al + O2 = 2/3 Al2O3", "2 Mg + O2 = 2 MgO", "2 Ca + O2 = 2 CaO", "Si + O2 = SiO2", "4/3 Cr + O2 = 2/3 Cr2O3", "2 Mn + O2 = 2 MnO",
        "2 Ni + O2 = 2 NiO", "2 Co + O2 = 2 CoO", "4 Cu + O2 = 2 Cu2O", "Mo + O2 = MoO2", "W + O2 = WO2", "Zr + O2 = ZrO2", "Ti + O2 = TiO2",
        "2 C + O2 = 2 CO", "2 H2 + O2 = 2 H2O", "2 CO + O2 = 2 CO2", "1.894 Fe + O2 = 2 Fe0.947O", "4 Fe3O4 + O2 = 6 Fe2O3",
    ];

    private static readonly GasReactions Gases = new(SubstanceDatabase.Bundled);

    private static readonly Gen<string> AnyCouple = Gen.Int[0, Couples.Length - 1].Select(i => Couples[i]);

    private static readonly Gen<double> AnyKelvin = Gen.Double[400, 1300];

    /// <summary>Every change of phase in the database.</summary>
    public static TheoryData<string, double> PhaseChanges
    {
        get
        {
            TheoryData<string, double> changes = [];
            foreach (Substance substance in SubstanceDatabase.Bundled.All)
            {
                foreach ((double kelvin, Phase _, Phase _) in substance.PhaseChanges())
                {
                    changes.Add(substance.Id, kelvin);
                }
            }

            return changes;
        }
    }

    [Fact]
    public void A_closed_cycle_of_reductions_sums_to_zero() => Gen.Select(AnyCouple, AnyCouple, AnyCouple, AnyKelvin).Sample(
        (first, second, third, kelvin) =>
        {
            Reaction a = PublishedEquation.Parse(first), b = PublishedEquation.Parse(second), c = PublishedEquation.Parse(third);
            double sum = a.Plus(1, b, -1).StandardGibbs(kelvin) + b.Plus(1, c, -1).StandardGibbs(kelvin) + c.Plus(1, a, -1).StandardGibbs(kelvin);
            return Math.Abs(sum) < 1e-6;
        },
        seed: Seed);

    [Fact]
    public void Carbon_gases_and_hydrogen_gases_of_one_gas_give_one_oxygen_pressure() => Gen.Select(AnyKelvin, Gen.Double[-12, 12]).Sample(
        (kelvin, logMonoxideRatio) =>
        {
            // The hydrogen ratio follows from the water-gas reaction alone: CO + H2O = CO2 + H2.
            double logConstant = -PublishedEquation.StandardGibbs("CO + H2O = CO2 + H2", kelvin) / (PhysicalConstants.GasConstant * kelvin);
            double logHydrogenRatio = logMonoxideRatio + logConstant;
            double carbon = GasReactions.PotentialOfRatio(Gases.CarbonMonoxideOxidation, kelvin, logMonoxideRatio);
            double hydrogen = GasReactions.PotentialOfRatio(Gases.HydrogenOxidation, kelvin, logHydrogenRatio);
            return Math.Abs(carbon - hydrogen) < 1e-6;
        },
        seed: Seed);

    [Fact]
    public void A_gas_ratio_returns_from_its_oxygen_potential() => Gen.Select(AnyKelvin, Gen.Double[-30, 30]).Sample(
        (kelvin, logRatio) => Math.Abs(GasReactions.RatioOfPotential(
            Gases.HydrogenOxidation, kelvin, GasReactions.PotentialOfRatio(Gases.HydrogenOxidation, kelvin, logRatio)) - logRatio) < 1e-9,
        seed: Seed);

    [Fact]
    public void A_probe_voltage_returns_from_its_oxygen_potential() => Gen.Select(AnyKelvin, Gen.Double[-100, 1500]).Sample(
        (kelvin, millivolts) => Math.Abs(OxygenPotentialReadings.ProbeMillivolts(OxygenPotentialReadings.OfProbe(millivolts, kelvin), kelvin) - millivolts) < 1e-8,
        seed: Seed);

    [Fact]
    public void Gas_over_graphite_satisfies_both_of_its_reactions() => Gen.Select(AnyKelvin, Gen.Double[-15, 5]).Sample(
        (kelvin, logPressure) =>
        {
            (double share, double potential) = Gases.AboveGraphite(kelvin, logPressure);
            double rt = PhysicalConstants.GasConstant * kelvin;
            double fromDioxide = Gases.GraphiteToDioxide.StandardGibbs(kelvin) + (rt * (Math.Log(1 - share) + logPressure));
            return share > 1 - 1e-9 || Math.Abs(fromDioxide - potential) < 1e-3 * rt;
        },
        seed: Seed);

    // ln K against 1/T has the slope -dH/R; a central difference of 0.01 K stands inside one polynomial except next to a break.
    [Fact]
    public void The_slope_of_the_equilibrium_constant_is_the_heat_of_reaction() => Gen.Select(AnyCouple, AnyKelvin).Sample(
        (equation, kelvin) =>
        {
            Reaction reaction = PublishedEquation.Parse(equation);
            const double step = 0.01;
            if (reaction.Terms.Any(term => term.Substance.Breaks.Any(at => Math.Abs(at - kelvin) < 2 * step)))
            {
                return true;
            }

            double LogK(double t) => -reaction.StandardGibbs(t) / (PhysicalConstants.GasConstant * t);
            double slope = (LogK(kelvin + step) - LogK(kelvin - step)) / ((1 / (kelvin + step)) - (1 / (kelvin - step)));
            return Math.Abs((-PhysicalConstants.GasConstant * slope) - reaction.Enthalpy(kelvin)) < 20;
        },
        seed: Seed);

    [Theory]
    [InlineData("Cr", "Cr=1,Cr2O3=1")]
    [InlineData("Fe", "Fe=1,wustite=1,Fe3O4=1")]
    [InlineData("Ti", "TiO2=1")]
    public void An_activity_of_one_changes_nothing(string metal, string activities) => AnyKelvin.Sample(
        kelvin =>
        {
            SubstanceDatabase database = SubstanceDatabase.Bundled;
            OxideLadder plain = OxideSystem.OfMetal(metal, database, Activities.AllOne).LadderAt(kelvin);
            OxideLadder given = OxideSystem.OfMetal(metal, database, Activities.Parse(activities, database)).LadderAt(kelvin);
            return plain.Steps.Select(step => step.OxygenPotential).SequenceEqual(given.Steps.Select(step => step.OxygenPotential));
        },
        seed: Seed,
        iter: 50);

    [Fact]
    public void Scaling_a_reaction_scales_its_energy_and_nothing_else() => Gen.Select(AnyCouple, AnyKelvin, Gen.Double[0.1, 10]).Sample(
        (equation, kelvin, factor) =>
        {
            Reaction reaction = PublishedEquation.Parse(equation);
            double once = reaction.StandardGibbs(kelvin);
            return Math.Abs(reaction.Times(factor).StandardGibbs(kelvin) - (factor * once)) < 1e-9 * Math.Abs(factor * once);
        },
        seed: Seed);

    // 20 J/mol where phases have their own data; 1 kJ where a printed reaction line takes over.
    [Theory, MemberData(nameof(PhaseChanges))]
    public void Gibbs_energy_is_continuous_at_a_phase_change(string formula, double kelvin)
    {
        Substance substance = SubstanceDatabase.Bundled.Get(formula);
        double below = substance.Gibbs(kelvin * (1 - 1e-9)), above = substance.Gibbs(kelvin * (1 + 1e-9));
        Assert.Equal(below, above, substance.KnowsHeating(kelvin) ? 20.0 : 1000.0);
    }
}
