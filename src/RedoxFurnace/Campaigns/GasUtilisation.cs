using System.Collections.Immutable;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Campaigns;

/// <summary>
/// How far a reducing gas can be used up, step by step of the ladder. Gas meets the metal first and leaves over the charge (counter-current): the
/// water of each step adds to that of the steps nearer the metal, and must stay below the balance of that step. THEORY.md, section 13.
/// </summary>
/// <param name="Reducing">H2 or CO.</param>
/// <param name="Oxide">What is reduced.</param>
/// <param name="Steps">From the metal up.</param>
/// <param name="Stoichiometric">Nm3 of reducing gas an hour that the oxygen alone asks for.</param>
/// <param name="ReducingFlow">Nm3 of it an hour fed.</param>
/// <param name="LeastFlow">Nm3 of the whole gas an hour below which a step stops.</param>
/// <param name="ExitShare">Share of the oxidised gas (H2O or CO2) in the exit gas.</param>
/// <param name="InletShare">Of the oxidised gas against reducing and oxidised together at the inlet.</param>
/// <param name="OxygenMolesPerHour">Oxygen atoms taken off, mol an hour.</param>
internal sealed record GasUtilisation(
    string Reducing,
    string Oxide,
    ImmutableArray<UtilisationStep> Steps,
    double Stoichiometric,
    double ReducingFlow,
    double LeastFlow,
    double ExitShare,
    double InletShare,
    double OxygenMolesPerHour)
{
    /// <summary>Reckons it.</summary>
    /// <param name="oxide">Charged.</param>
    /// <param name="metal">Wanted.</param>
    /// <param name="kilogramsPerHour">Of pure oxide.</param>
    /// <param name="gas">The inlet gas.</param>
    /// <param name="flow">Nm3 an hour of the whole gas.</param>
    /// <param name="kelvin">Temperature of the metal step; each step is held against the balance at this temperature.</param>
    /// <param name="activities">Of condensed phases.</param>
    /// <param name="database">Data.</param>
    /// <exception cref="NoAnswerException">No data, or a gas with neither H2 nor CO.</exception>
    public static GasUtilisation Of(Substance oxide, string metal, double kilogramsPerHour, GasMixture gas, double flow, double kelvin, Activities activities, SubstanceDatabase database)
    {
        bool hydrogen = gas[GasSpecies.H2] >= gas[GasSpecies.CO];
        (GasSpecies reducing, GasSpecies oxidised) = hydrogen ? (GasSpecies.H2, GasSpecies.H2O) : (GasSpecies.CO, GasSpecies.CO2);
        double share = gas[reducing];
        if (!(share > 0))
        {
            throw new NoAnswerException("the gas holds neither hydrogen nor CO: it takes no oxygen off the charge");
        }

        GasReactions reactions = new(database);
        Reaction oxidation = hydrogen ? reactions.HydrogenOxidation : reactions.CarbonMonoxideOxidation;
        OxideDescent descent = new OxidePath(oxide, metal, database, activities).At(kelvin, 0);
        double molesPerHour = kilogramsPerHour / (oxide.Formula.MolarMass / 1000);
        double perFormula = oxide.Formula.Of(metal);
        double carrier = flow / PhysicalConstants.NormalCubicMetrePerMole * (share + gas[oxidised]);
        double inlet = gas[oxidised] / (share + gas[oxidised]);
        double running = 0;
        double least = 0;
        ImmutableArray<UtilisationStep>.Builder steps = ImmutableArray.CreateBuilder<UtilisationStep>();
        double oxygenOfCharge = oxide.Formula.Of("O") / perFormula;
        foreach (LadderStep step in descent.Steps)
        {
            double top = Math.Min(step.Couple.Oxidised.Oxygen, oxygenOfCharge);
            double oxygen = molesPerHour * perFormula * Math.Max(0, top - step.Couple.Reduced.Oxygen);
            running += oxygen;
            if (step.OxygenPotential is not { } potential)
            {
                continue;
            }

            double logRatio = GasReactions.RatioOfPotential(oxidation, kelvin, potential);
            double uncertainty = ReactionUncertainty.OfGibbs(step.Couple.Formation.Plus(1, oxidation, -1), kelvin, database.Covariance) / (2 * PhysicalConstants.GasConstant * kelvin);
            double balance = Share(logRatio);
            double needed = balance > inlet ? running / (balance - inlet) : double.PositiveInfinity;
            least = Math.Max(least, needed);
            steps.Add(new UtilisationStep(step.Couple.Name, step.Couple.Formation.Text, oxygen, inlet + (running / carrier), balance, Share(logRatio + uncertainty), Share(logRatio - uncertainty)));
        }

        double toFlow = PhysicalConstants.NormalCubicMetrePerMole / (share + gas[oxidised]);
        return new GasUtilisation(
            reducing.ToString(),
            oxide.Id,
            steps.ToImmutable(),
            running * PhysicalConstants.NormalCubicMetrePerMole,
            flow * share,
            least * toFlow,
            Math.Min(1, (inlet + (running / carrier)) * (share + gas[oxidised])),
            inlet,
            running);
    }

    private static double Share(double logRatio) => 1 / (1 + Math.Exp(logRatio));
}

/// <summary>One step of a gas reduction.</summary>
/// <param name="Couple">Its two neighbours.</param>
/// <param name="Reaction">Per mole of O2.</param>
/// <param name="OxygenMolesPerHour">Oxygen atoms it gives up.</param>
/// <param name="Made">Share of the oxidised gas after it, of reducing and oxidised together.</param>
/// <param name="Balance">Largest share the balance allows.</param>
/// <param name="BalanceLow">The same less its uncertainty.</param>
/// <param name="BalanceHigh">The same plus its uncertainty.</param>
internal sealed record UtilisationStep(string Couple, string Reaction, double OxygenMolesPerHour, double Made, double Balance, double BalanceLow, double BalanceHigh);
