using RedoxFurnace.Campaigns;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Tests.Campaigns;

/// <summary>Every trap with a sheet that makes it speak and one that does not.</summary>
public class TrapTests
{
    private const string Bright = """
        title: Parts
        parts: { alloy: "Cr=18%,Ni=9%,Fe", keep-bright: [Cr, Fe, Ni] }
        gas: { analysis: "H2 100%, frost -60C" }
        programme:
          - { stage: soak, at: 1050C }
          - { stage: cool, at: 1000C }
        """;

    private const string Reduction = """
        title: Powder
        charge:
          - { substance: NiO, rate: 10kg/h }
        product: { metal: Ni }
        gas: { analysis: "H2 75%, N2 25%, frost -50C", flow: 20Nm3/h }
        programme:
          - { stage: soak, at: 600C }
        """;

    private const string Solid = """
        title: Metal
        charge:
          - { substance: Cr2O3, mass: 100kg, moisture: 0.02% }
        product: { metal: Cr }
        reductants:
          - { name: Al }
        furnace: { lining: magnesia }
        programme:
          - { stage: soak, at: 1200C }
        """;

    private const string Retort = """
        title: Retort
        charge:
          - { substance: MgO, mass: 60kg, moisture: 0.02% }
          - { substance: CaO, mass: 84kg, moisture: 0.02% }
        product: { metal: Mg }
        reductants:
          - { name: Si, mass: 21kg }
        furnace: { pressure: 10Pa }
        programme:
          - { stage: soak, at: 1200C, hold: 9h }
        """;

    private const string Steel = """
        title: Hardening
        parts: { steel: "C=0.4%" }
        gas: { preset: endothermic, analysis: "dew +15C" }
        programme:
          - { stage: soak, at: 860C }
        """;

    /// <summary>Trap, the sheet that stands in it, the sheet that is clear of it.</summary>
    public static TheoryData<string, string, string> Cases => new()
    {
        { "frost-or-dew", With(Bright, "frost -60C", "dew -60C"), Bright },
        { "line-pressure", With(Bright, "frost -60C\"", "frost -60C\", readings: [ { frost: -60C, place: line, pressure: 6bara } ]"), With(Bright, "frost -60C\"", "frost -60C\", readings: [ { frost: -60C, place: furnace } ]") },
        { "inlet-reading", With(Bright, "frost -60C\"", "frost -60C\", readings: [ { frost: -60C, place: inlet } ]"), With(Bright, "frost -60C\"", "frost -60C\", readings: [ { frost: -60C, place: inlet }, { frost: -52C, place: exit } ]") },
        { "soak-only", With(Bright, "\n  - { stage: cool, at: 1000C }", ""), With(With(Bright, "Cr=18%,Ni=9%,Fe", "Ni=1"), "[Cr, Fe, Ni]", "[Ni]") },
        { "carbide-not-metal", With(Solid, "name: Al", "name: C"), Solid },
        { "nitride", With(With(Bright, "H2 100%", "H2 75%, N2 25%"), "Cr=18%,Ni=9%,Fe", "Ti=1"), With(Bright, "Cr=18%,Ni=9%,Fe", "Ti=1") },
        { "hydride-former", With(With(Bright, "Cr=18%,Ni=9%,Fe", "Ti=1"), "[Cr, Fe, Ni]", "[Ti]"), Bright },
        { "vapour-loss", With(Solid, "name: Al", "name: Mg"), With(Solid, "1200C", "700C") },
        { "lining-under-vacuum", With(With(Solid, "name: Al", "name: Ca"), "lining: magnesia", "lining: silica"), Solid },
        { "copper-with-oxygen", With(With(Bright, "Cr=18%,Ni=9%,Fe", "Cu=1"), "keep-bright: [Cr, Fe, Ni]", "keep-bright: [Cu]"), With(With(Bright, "Cr=18%,Ni=9%,Fe", "Cu=1"), "keep-bright: [Cr, Fe, Ni]", "keep-bright: [Cu], copper-holds-oxygen: false") },
        { "carbonyl", With(Reduction, "H2 75%, N2 25%, frost -50C", "CO 75%, N2 24%, CO2 1%"), Reduction },
        { "soot", With(Steel, "dew +15C", "dew +2C"), Bright },
        { "utilisation", With(With(Reduction, "NiO", "WO3"), "metal: Ni", "metal: W"), Reduction },
        { "moisture-in-batch", With(Solid, ", moisture: 0.02%", ""), Solid },
        { "data-range", With(With(Solid, "name: Al", "name: CaC2"), "1200C", "1550C"), Solid },
        { "wustite-limit", With(With(With(Reduction, "NiO", "Fe2O3"), "metal: Ni", "metal: Fe"), "600C", "560C"), With(With(With(Reduction, "NiO", "Fe2O3"), "metal: Ni", "metal: Fe"), "600C", "900C") },
        { "silicate-or-spinel", With(Retort, "  - { substance: CaO, mass: 84kg, moisture: 0.02% }\n", ""), Retort },
        { "scale-or-place-missing", With(Bright, "frost -60C\"", "frost -60C\", readings: [ { moisture: -60C, place: furnace } ]"), With(Bright, "frost -60C\"", "frost -60C\", readings: [ { frost: -60C, place: furnace } ]") },
        { "vacuum-is-not-zero", With(Retort, "pressure: 10Pa", "pressure: 10Pa, leak-up: 0.01mbar.l/s"), Retort },
        { "millivolts-as-carbon", With(Steel, "\"dew +15C\"", "\"dew +15C\", readings: [ { probe: 1100mV, probe-temperature: 860C, place: furnace } ]"), Steel },
    };

    [Theory, MemberData(nameof(Cases))]
    public void A_trap_speaks_where_the_plan_stands_in_it_and_is_silent_where_it_does_not(string id, string inIt, string clear)
    {
        Assert.NotEqual(inIt, clear);
        Assert.Contains(Found(inIt), trap => trap.Id == id);
        Assert.DoesNotContain(Found(clear), trap => trap.Id == id);
    }

    [Fact]
    public void Every_trap_has_its_case() => Assert.Equal(
        Trap.All.Select(trap => trap.Id).Order(StringComparer.Ordinal),
        ((IEnumerable<object[]>)Cases).Select(row => (string)row[0]).Order(StringComparer.Ordinal));

    [Fact]
    public void A_wet_charge_of_metal_powder_rules_the_verdict()
    {
        CampaignPlan wet = Plan(With(Solid, "moisture: 0.02%", "moisture: 0.4%"));
        Assert.StartsWith("Does not work: dry first, do not fire", wet.Headline, StringComparison.Ordinal);
        CampaignPlan unknown = Plan(With(Solid, ", moisture: 0.02%", ""));
        Assert.StartsWith("Not decidable: measure the moisture of the charge", unknown.Headline, StringComparison.Ordinal);
        Assert.Contains(unknown.Ask, question => question.Contains("loss on drying", StringComparison.Ordinal));
    }

    [Fact]
    public void A_reading_without_scale_is_taken_both_ways_and_asked_for_where_the_verdicts_differ()
    {
        // Between the frost and the dew meaning of one reading lies the limit of chromium.
        string cool = With(Bright, "soak, at: 1050C", "soak, at: 820C").Replace("cool, at: 1000C", "cool, at: 810C", StringComparison.Ordinal);
        double limit = Plan(cool).Facts.SoakGas[0].Metals.First(metal => metal.Element.Symbol == "Cr").LimitWater!.Value.FrostPointKelvin!.Value - 273.15;
        CampaignPlan plan = Plan(With(cool, "frost -60C", FormattableString.Invariant($"moisture {limit - 2:0.0}C")));
        Assert.Equal(RedoxFurnace.Reductants.JobVerdict.NotDecidable, plan.Judgement.Verdict);
        Assert.NotEmpty(plan.Ask);
    }

    private static TrapFinding[] Found(string sheet) => [.. Plan(sheet).Traps];

    private static CampaignPlan Plan(string sheet) => CampaignPlanning.Of(sheet, "sheet.yaml", SubstanceDatabase.Bundled, "test", null);

    private static string With(string sheet, string from, string to)
    {
        string plain = sheet.ReplaceLineEndings("\n");
        string changed = plain.Replace(from, to, StringComparison.Ordinal);
        return changed == plain && from != to ? throw new InvalidOperationException($"'{from}' is not in the sheet") : changed;
    }
}
