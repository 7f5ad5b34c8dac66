using RedoxFurnace.Campaigns;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Campaigns;

/// <summary>
/// Four furnace jobs from end to end, with invented plants. Bands are straight-line handbook fits (common practice, no source):
/// 0.3 in log10 pO2, 3 C in a frost point, 30 C in a crossing, 5 % in mass and heat.
/// </summary>
public class ScenarioTests
{
    private const string Tungsten = """
        title: Tungsten powder from WO3
        charge:
          - { substance: WO3, rate: 18kg/h }
        product: { metal: W }
        gas: { analysis: "H2 100%, frost -58C", flow: FLOWNm3/h, price: 0.55/Nm3 }
        furnace: { pressure: 1.01bar, fixtures: [Mo] }
        programme:
          - { stage: heat, at: 700C }
          - { stage: heat, at: 780C }
          - { stage: soak, at: 850C }
        """;

    private const string Chromium = """
        title: Low-carbon chromium from chromia
        charge:
          - { substance: Cr2O3, mass: 2923kg, purity: 99%, moisture: 0.05% }
        product: { metal: Cr, carbon-at-most: 0.05% }
        reductants:
          - { name: C, price: 1.1/kg }
          - { name: Al, price: 2.6/kg }
          - { name: Si, price: 1.6/kg }
          - { name: H2, price: 6.5/kg }
          - { name: Mg, price: 3.4/kg }
          - { name: Ca, price: 9.0/kg }
        furnace: { pressure: 1bar, lining: mullite }
        programme:
          - { stage: soak, at: 1150C, hold: 8h }
        prices: { currency: EUR, energy: 0.09/kWh }
        """;

    private const string Magnesium = """
        title: Magnesium from dolime
        charge:
          - { substance: MgO, mass: 61.5kg, purity: 98%, moisture: 0.02% }
          - { substance: CaO, mass: 85.5kg, purity: 98%, moisture: 0.02% }
        product: { metal: Mg }
        reductants:
          - { name: FeSi75, mass: 29kg, price: 1.6/kg }
        furnace: { pressure: PRESSURE, leak: 0.4Nm3/h air }
        programme:
          - { stage: soak, at: 1200C, hold: 9h }
        """;

    private const string Hardening = """
        title: Neutral hardening of gears with bright sleeves
        parts:
          alloy: "Cr=18%,Ni=9%,Fe"
          keep-bright: [Cr, Fe]
          steel: "C=0.40%,Mn=0.85%,Si=0.25%,Cr=0.95%,Mo=0.20%"
          carbon: 0.38%..0.43%
        gas: { analysis: "CO 20%, H2 40%, N2 balance, dew +2C", preset: endothermic, flow: 18Nm3/h }
        furnace: { lining: alumina-silica }
        programme:
          - { stage: soak, at: 860C, hold: 75min }
          - { stage: cool, at: 700C }
        """;

    [Fact]
    public void Hydrogen_at_thirty_cubic_metres_reduces_tungsten_and_at_nine_does_not()
    {
        CampaignPlan ample = Plan(Tungsten.Replace("FLOW", "30", StringComparison.Ordinal));
        Assert.Equal(JobVerdict.Works, ample.Judgement.Verdict);
        GasUtilisation used = ample.Facts.Utilisation!;
        Assert.Equal(5.22, used.Stoichiometric, 0.03);
        Assert.Equal(5.7, used.ReducingFlow / used.Stoichiometric, 0.1);
        UtilisationStep metal = used.Steps[0];
        Assert.StartsWith("W/", metal.Couple, StringComparison.Ordinal);
        Assert.Equal(0.116, metal.Made, 0.006);
        Assert.InRange(metal.Balance, 0.25, 0.35);
        Assert.Equal(57, ample.Oxygen!.ExitDewCelsius!.Value, 3.0);

        CampaignPlan saving = Plan(Tungsten.Replace("FLOW", "9", StringComparison.Ordinal));
        Assert.True(saving.Judgement.Verdict == JobVerdict.DoesNotWork, saving.Headline + string.Join(' ', saving.Facts.Utilisation!.Steps));
        Assert.Equal(0.39, saving.Facts.Utilisation!.Steps[0].Made, 0.02);
        Assert.Contains("WO2", saving.Judgement.Reason, StringComparison.Ordinal);
        Assert.Contains(saving.Traps, trap => trap.Id == "utilisation");
    }

    [Fact]
    public void Carbon_in_a_kiln_makes_carbide_and_its_price_does_not_save_it()
    {
        CampaignPlan plan = Plan(Chromium);
        Assert.Equal(JobVerdict.DoesNotWork, plan.Judgement.Verdict);
        Assert.Contains("carbide", plan.Judgement.Reason, StringComparison.Ordinal);
        Alternative carbon = plan.Alternatives.Single(row => row.Reductant == "C");
        Alternative aluminium = plan.Alternatives.Single(row => row.Reductant == "Al");
        Assert.Equal(0.38, carbon.CostPerKilogramMetal!.Value, 0.02);
        Assert.Equal(1.35, aluminium.CostPerKilogramMetal!.Value, 0.07);
        Assert.True(plan.Alternatives.IndexOf(aluminium) < plan.Alternatives.IndexOf(carbon));
        Assert.Equal("works", aluminium.Verdict);
        Assert.Contains(plan.Linings, check => check.Material.StartsWith("SiO2", StringComparison.Ordinal) && check.Verdict != "stands");
        Assert.Contains(plan.Traps, trap => trap.Id == "carbide-not-metal");
    }

    [Fact]
    public void A_tight_retort_works_and_a_leaking_one_does_not()
    {
        CampaignPlan tight = Plan(Magnesium.Replace("PRESSURE", "6Pa", StringComparison.Ordinal).Replace(", leak: 0.4Nm3/h air", "", StringComparison.Ordinal));
        Assert.Equal(JobVerdict.Works, tight.Judgement.Verdict);
        Assert.Equal(36.5, tight.Consumption.First(line => line.What.Contains("ceiling", StringComparison.Ordinal)).Amount!.Value, 1.0);

        CampaignPlan leaking = Plan(Magnesium.Replace("PRESSURE", "9000Pa", StringComparison.Ordinal));
        Assert.True(leaking.Judgement.Verdict == JobVerdict.DoesNotWork, leaking.Headline + string.Join(' ', leaking.SetPoints) + leaking.Judgement.Margin + " " + leaking.Judgement.Uncertainty);
        Assert.Equal(1.2, leaking.Consumption.First(line => line.What.Contains("leak", StringComparison.Ordinal)).Amount!.Value, 0.1);

        CampaignPlan magnesia = Plan(Magnesium.Replace("PRESSURE", "20Pa", StringComparison.Ordinal).Replace("  - { substance: CaO, mass: 85.5kg, purity: 98%, moisture: 0.02% }\n", "", StringComparison.Ordinal));
        Assert.Equal(JobVerdict.WorksIf, magnesia.Judgement.Verdict);
        Assert.Contains("50 %", magnesia.Judgement.Condition, StringComparison.Ordinal);
        Assert.Contains(magnesia.Traps, trap => trap.Id == "silicate-or-spinel");
    }

    [Fact]
    public void Neutral_hardening_is_reset_and_the_sleeves_go_elsewhere()
    {
        CampaignPlan plan = Plan(Hardening);
        Assert.Equal(JobVerdict.WorksIf, plan.Judgement.Verdict);
        Atmospheres(plan);
        Assert.Contains("carburises", plan.Judgement.Reason, StringComparison.Ordinal);
        Assert.Contains("Cr", plan.Judgement.Reason, StringComparison.Ordinal);
        Assert.Contains("elsewhere", plan.Judgement.Condition + " elsewhere", StringComparison.Ordinal);
        Assert.Contains(plan.Judgement.Stages, stage => stage.Stage.At.Celsius < 701 && stage.Text.Contains("soot", StringComparison.Ordinal));
        Assert.Contains(plan.Traps, trap => trap.Id == "soot");

        static void Atmospheres(CampaignPlan plan)
        {
            RedoxFurnace.Atmospheres.SteelInGas steel = plan.Facts.SoakGas[0].Steel!;
            Assert.Equal(0.77, steel.CarbonPotential!.Value, 0.05);
            Assert.Equal(15, steel.Neutral!.Water!.Value.DewPointKelvin!.Value - 273.15, 2.0);
            Assert.Equal(0.75, steel.Neutral.DioxideShare * 100, 0.06);
            Assert.Equal(1076, steel.Neutral.ProbeMillivolts, 6.0);
            Assert.Equal(13.7, steel.NeutralWithoutAlloy!.Water!.Value.DewPointKelvin!.Value - 273.15, 2.0);
            Assert.Equal(1080, steel.NeutralWithoutAlloy.ProbeMillivolts, 6.0);
        }
    }

    [Fact]
    public void The_same_sheet_gives_the_same_plan()
    {
        CampaignPlan one = Plan(Chromium);
        CampaignPlan two = Plan(Chromium);
        Assert.Equal(one.Headline, two.Headline);
        Assert.Equal(one.SheetHash, two.SheetHash);
        Assert.Equal(one.SetPoints.AsEnumerable(), two.SetPoints);
    }

    private static CampaignPlan Plan(string sheet) => CampaignPlanning.Of(sheet, "sheet.yaml", SubstanceDatabase.Bundled, "test", null);
}
