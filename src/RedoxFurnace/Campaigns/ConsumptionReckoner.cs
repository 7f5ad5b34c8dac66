using RedoxFurnace.Atmospheres;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Campaigns;

/// <summary>Masses, gas, heat and cost of a campaign.</summary>
internal static class ConsumptionReckoner
{
    private const double JoulesPerKilowattHour = 3.6e6;
    private const double AirOxygen = PhysicalConstants.OxygenInAir;

    public static IEnumerable<ConsumptionLine> Of(CampaignFacts facts, SubstanceDatabase database)
    {
        CampaignSheet sheet = facts.Sheet;
        if (facts.Kind == CampaignKind.GasReduction && facts.Utilisation is { } used)
        {
            return Gas(sheet, used, facts);
        }

        return facts.Planned is { } row ? Solid(sheet, row) : facts.Kind == CampaignKind.Retort ? Retort(sheet, facts) : Flow(sheet);
    }

    /// <summary>Metal in what is charged, kg of it per kg of oxide.</summary>
    private static double MetalShare(ChargeItem item, string metal) => item.Purity * item.Substance.Formula.Of(metal) * AtomicWeights.Of(metal) / item.Substance.Formula.MolarMass;

    private static IEnumerable<ConsumptionLine> Solid(CampaignSheet sheet, RankedReductant row)
    {
        ReductantOffer offer = sheet.Reductants.First(candidate => candidate.Name == row.Reductant.Id);
        double? perTonne = row.KgPerKgMetal * 1000;
        yield return new ConsumptionLine($"{row.Reductant.Id}, stoichiometric", perTonne, "kg", perTonne, perTonne * offer.PricePerKilogram, row.BalanceReaction ?? "");
        double kgOxidePerTonne = row.KgPerKgMetal > 0 && row.KgPerKgOxide > 0 ? 1000 * row.KgPerKgMetal.Value / row.KgPerKgOxide.Value : 0;
        if (row.DutyJoulesPerKgOxide is { } duty)
        {
            double kilowattHours = duty * kgOxidePerTonne / JoulesPerKilowattHour;
            yield return new ConsumptionLine("heat from 25 C to products at the soak; + must be supplied", kilowattHours, "kWh", kilowattHours, kilowattHours > 0 ? kilowattHours * sheet.Prices.EnergyPerKilowattHour : null, row.BalanceReaction ?? "");
        }

        if (offer.MassKilograms is { } given && sheet.Oxides.FirstOrDefault()?.MassKilograms is { } charge)
        {
            double need = charge * sheet.Oxides.First().Purity * (row.KgPerKgOxide ?? 0);
            yield return new ConsumptionLine($"{row.Reductant.Id} given against the need of the batch", given, FormattableString.Invariant($"kg, {given / need * 100:0} % of the need"), null, null, "mass given over stoichiometric mass");
        }
    }

    private static IEnumerable<ConsumptionLine> Gas(CampaignSheet sheet, GasUtilisation used, CampaignFacts facts)
    {
        ChargeItem item = sheet.Oxides.First();
        string metal = sheet.Product?.Metal ?? item.Substance.Formula.Atoms.Keys.First(element => element != "O");
        double tonnesPerHour = item.KilogramsPerHour!.Value * MetalShare(item, metal) / 1000;
        double flow = sheet.Gas!.FlowNormalCubicMetres!.Value;
        yield return new ConsumptionLine("gas fed", flow, "Nm3/h", flow / tonnesPerHour, flow / tonnesPerHour * sheet.Gas.PricePerNormalCubicMetre, "flow over metal made");
        yield return new ConsumptionLine($"{used.Reducing} used up by the oxygen", used.Stoichiometric, "Nm3/h", used.Stoichiometric / tonnesPerHour, null, "one mole for each mole of O");
        if (used.Reducing == "H2")
        {
            double water = used.OxygenMolesPerHour * 18.015e-3;
            yield return new ConsumptionLine("water made", water, "kg/h", water / tonnesPerHour, null, "one mole for each mole of O");
        }

        if (facts.Ranking?.Rows.FirstOrDefault() is { HeatJoulesPerKgOxide: { } heat } row)
        {
            double perHour = heat * item.KilogramsPerHour.Value * item.Purity / JoulesPerKilowattHour;
            yield return new ConsumptionLine("heat of reduction at the soak; + must be supplied", perHour, "kW", perHour / tonnesPerHour, perHour > 0 ? perHour / tonnesPerHour * sheet.Prices.EnergyPerKilowattHour : null, row.BalanceReaction ?? "");
            double brought = GasHeat(flow, sheet.Soak!.At.Kelvin);
            yield return new ConsumptionLine("heat to bring the gas from 25 C to the soak", brought, "kW", brought / tonnesPerHour, brought / tonnesPerHour * sheet.Prices.EnergyPerKilowattHour, "29.6 J/(mol K), a mean of H2, N2 and Ar mixtures (common practice, no source)");
        }
    }

    private static double GasHeat(double flow, double kelvin) => flow / PhysicalConstants.NormalCubicMetrePerMole * 29.6 * (kelvin - PhysicalConstants.ReferenceKelvin) / JoulesPerKilowattHour;

    private static IEnumerable<ConsumptionLine> Retort(CampaignSheet sheet, CampaignFacts facts)
    {
        string metal = sheet.Product!.Metal;
        double most = sheet.Charge.Where(item => item.Substance.Formula.Of(metal) > 0).Sum(item => (item.MassKilograms ?? 0) * MetalShare(item, metal));
        ReductantOffer offer = sheet.Reductants[0];
        yield return new ConsumptionLine($"{metal} in the charge: the ceiling", most, "kg a batch", null, null, "assay");
        if (offer.MassKilograms is { } mass)
        {
            yield return new ConsumptionLine(offer.Name, mass, "kg a batch", mass / most * 1000, mass / most * 1000 * offer.PricePerKilogram, "given");
        }

        if (sheet.Furnace.LeakNormalCubicMetres is { } leak)
        {
            double burnt = leak / PhysicalConstants.NormalCubicMetrePerMole * ((AirOxygen * 2) + ((1 - AirOxygen) * (metal is "Mg" or "Ca" ? 3 : 0))) * AtomicWeights.Of(metal) / 1000;
            yield return new ConsumptionLine($"{metal} the leak can burn or nitride, at most", burnt, "kg/h", null, null, "2 Mg + O2 = 2 MgO and 3 Mg + N2 = Mg3N2, or their like, with all the air of the leak");
        }
    }

    private static IEnumerable<ConsumptionLine> Flow(CampaignSheet sheet)
    {
        if (sheet.Gas?.FlowNormalCubicMetres is { } flow)
        {
            yield return new ConsumptionLine("gas fed", flow, "Nm3/h", null, null, "as given");
            if (sheet.Gas.PricePerNormalCubicMetre is { } price)
            {
                yield return new ConsumptionLine("cost of the gas", flow * price, sheet.Prices.Currency + "/h", null, null, "flow times price");
            }
        }
    }
}
