using RedoxFurnace.Atmospheres;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Campaigns;

/// <summary>A mistake plans are known to fall into. One class a trap, so that each can be tested to fire and to keep silent.</summary>
internal abstract class Trap
{
    /// <summary>Every trap.</summary>
    public static IReadOnlyList<Trap> All { get; } =
    [
        new FrostOrDew(), new LinePressure(), new InletReading(), new SoakOnly(), new CarbideNotMetal(), new NitrideInNitrogen(), new HydrideFormer(), new VapourLoss(), new LiningUnderVacuum(),
        new CopperWithOxygen(), new Carbonyl(), new SootOnTheWay(), new UtilisationForgotten(), new MoistureInBatch(), new DataRange(), new WustiteLimit(), new SilicateOrSpinel(), new ScaleOrPlaceMissing(), new VacuumIsNotZero(), new MillivoltsAsCarbon(),
    ];

    public abstract string Id { get; }

    /// <summary>The finding, or null where the plan is clear of it.</summary>
    public abstract TrapFinding? Find(CampaignFacts facts);

    protected TrapFinding Warn(string text) => new(Id, false, text);

    protected TrapFinding Grave(string text) => new(Id, true, text);

    protected static IEnumerable<ReadingSheet> Moistures(CampaignFacts facts) => (facts.Sheet.Gas?.Readings ?? []).Where(reading => reading.Kind is "frost" or "dew" or "moisture");

    protected static string Degrees(double kelvin) => Printed.Fixed(kelvin - PhysicalConstants.ZeroCelsiusInKelvin, 0) + " C";

    private sealed class FrostOrDew : Trap
    {
        public override string Id => "frost-or-dew";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            ReadingSheet? reading = Moistures(facts).FirstOrDefault(reading => reading.Kind == "dew" && Below(reading.Value));
            bool inGas = facts.Sheet.Gas?.Analysis is { } text && text.Split(',').Any(part => part.Trim().StartsWith("dew -", StringComparison.Ordinal));
            return reading is not null || inGas
                ? Warn($"a dew point below 0 C ({reading?.Value ?? facts.Sheet.Gas!.Analysis}) is taken over supercooled water; if the instrument shows the frost point under that name the gas is drier: about 127 against 187 ppm at -40 C")
                : null;
        }

        private static bool Below(string value) => Temperature.Parse(value.Split(" at ")[0]).Celsius < 0;
    }

    private sealed class LinePressure : Trap
    {
        public override string Id => "line-pressure";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            ReadingSheet? reading = Moistures(facts).FirstOrDefault(reading => reading.Pressure is { } line && Math.Abs(line.NaturalLogBar - facts.Sheet.SoakPressure.NaturalLogBar) > 0.05);
            if (reading is null)
            {
                return null;
            }

            WaterContent there = WaterReading.Parse(reading.Kind, reading.Value).Meanings(reading.Pressure!.Value)[0].Content;
            WaterContent here = there.At(facts.Sheet.SoakPressure);
            string point = here.FrostPointKelvin is { } frost ? "frost point " + Degrees(frost) : "dew point " + Degrees(here.DewPointKelvin ?? 0);
            return Warn($"{reading.Kind} {reading.Value} was read at {reading.Pressure}: at the {facts.Sheet.SoakPressure} of the furnace the same gas has a {point}");
        }
    }

    private sealed class InletReading : Trap
    {
        public override string Id => "inlet-reading";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            bool inlet = (facts.Sheet.Gas?.Readings ?? []).Any(reading => reading.Place == "inlet");
            bool inside = (facts.Sheet.Gas?.Readings ?? []).Any(reading => reading.Place is "furnace" or "exit");
            return inlet && !inside ? Warn("the only readings are of the inlet: water is made inside by leaks, trapped air, belt, brick and powder, so the hot zone is wetter than that") : null;
        }
    }

    private sealed class SoakOnly : Trap
    {
        public override string Id => "soak-only";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            if (facts.Kind != CampaignKind.Parts || facts.SoakGas.IsEmpty)
            {
                return null;
            }

            if (facts.Sheet.Programme.All(stage => stage.Kind != "cool"))
            {
                return Warn("the programme has no cooling stage: a gas that is bright at the soak can oxidise on the way down; add the stage");
            }

            MetalInGas? first = facts.SoakGas[0].Metals.Where(metal => metal.Verdict == BrightVerdict.Bright && metal.OxidisesBelowKelvin is not null).MaxBy(metal => metal.OxidisesBelowKelvin);
            return first is null ? null : Warn($"on cooling in the soak gas {first.Element.Symbol} oxidises below {Degrees(first.OxidisesBelowKelvin!.Value)}");
        }
    }

    private sealed class CarbideNotMetal : Trap
    {
        public override string Id => "carbide-not-metal";

        public override TrapFinding? Find(CampaignFacts facts)
            => facts.Planned?.Carbide is { MetalMargin: < 0 } carbide
                ? Grave($"carbon gives {carbide.First}{(carbide.CarbideFloorKelvin is { } from ? " from " + Degrees(from) : "")} before any metal; metal only {(carbide.MetalFloorKelvin is { } metal ? "from " + Degrees(metal) : "beyond the data")}")
                : null;
    }

    private sealed class NitrideInNitrogen : Trap
    {
        public override string Id => "nitride";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            string[] formed = [.. facts.SoakGas.Take(1).SelectMany(point => point.Metals).Where(metal => metal.Nitride?.Forms == true).Select(metal => $"{metal.Nitride!.Formula} with {metal.Element.Symbol}")];
            return formed.Length > 0 ? Warn($"nitrogen is not inert here: {string.Join(", ", formed)} can form at the soak, and most uptake comes on cooling") : null;
        }
    }

    private sealed class HydrideFormer : Trap
    {
        public override string Id => "hydride-former";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            bool hydrogen = facts.SoakGas.Any(point => point.Answer.Mixture[GasSpecies.H2] + point.Answer.Mixture[GasSpecies.NH3] > 1e-3);
            string[] found = [.. facts.SoakGas.Take(1).SelectMany(point => point.Metals).Select(metal => metal.Element.Symbol).Where(symbol => symbol is "Ti" or "Zr" or "Ta" or "Nb" or "Hf").Concat(facts.Sheet.Furnace.Fixtures.Where(fixture => fixture is "Ti" or "Zr" or "Ta" or "Nb"))];
            return hydrogen && found.Length > 0 ? Grave($"{string.Join(", ", found.Distinct())} in hydrogen: no oxide comes off and the metal turns brittle; use argon or vacuum") : null;
        }
    }

    private sealed class VapourLoss : Trap
    {
        private const double MatterBar = 1e-4;

        public override string Id => "vapour-loss";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            SideProduct? vapour = facts.Planned?.SideProducts.Where(side => side.PressureBar > MatterBar && side.Formula.EndsWith("(g)", StringComparison.Ordinal)).MaxBy(side => side.PressureBar);
            return vapour is null ? null : Warn($"{vapour.Text}: it leaves with the gas and condenses in cool corners");
        }
    }

    private sealed class LiningUnderVacuum : Trap
    {
        public override string Id => "lining-under-vacuum";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            LiningCheck? attacked = facts.Linings.Where(check => check.Verdict == "attacked").MaxBy(check => check.Margin);
            return attacked is null ? null : Grave($"{attacked.Material} ({attacked.Use}) is attacked by {attacked.Against}: {attacked.Reaction}{(facts.Sheet.SoakPressure.Bar < 0.1 ? "; vacuum draws the vapour off and drives it on" : "")}");
        }
    }

    private sealed class CopperWithOxygen : Trap
    {
        public override string Id => "copper-with-oxygen";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            bool copper = facts.Sheet.Parts?.Alloy is { } alloy && alloy.Split(',').Any(part => part.Trim().Split('=')[0] == "Cu");
            bool hydrogen = facts.SoakGas.Any(point => point.Answer.Mixture[GasSpecies.H2] > 1e-3);
            return copper && hydrogen && facts.Sheet.Parts!.CopperHoldsOxygen != false
                ? Grave("copper that holds oxygen cracks in hydrogen: the gas reduces the Cu2O inside and the steam bursts the grains; say copper-holds-oxygen: false only for oxygen-free or deoxidised copper")
                : null;
        }
    }

    private sealed class Carbonyl : Trap
    {
        public override string Id => "carbonyl";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            bool monoxide = facts.SoakGas.Any(point => point.Answer.AtEquilibrium.Fraction(GasSpecies.CO) > 1e-3);
            bool nickel = facts.Sheet.Charge.Any(item => item.Substance.Formula.Of("Ni") > 0) || facts.Sheet.Product?.Metal == "Ni";
            return monoxide && nickel ? Grave("nickel with CO below about 200 C gives nickel carbonyl, deadly in traces: replace the CO by nitrogen before the metal cools to 200 C (common practice, no source; site rules may be stricter)") : null;
        }
    }

    private sealed class SootOnTheWay : Trap
    {
        public override string Id => "soot";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            CarbonRange? range = facts.Soot.FirstOrDefault();
            return range is null ? null : Warn($"the gas can deposit soot between {(range.LowIsOpen ? "the cold end" : Degrees(range.LowKelvin))} and {(range.HighIsOpen ? "the hot end" : Degrees(range.HighKelvin))}; from 430 to 650 C it dusts alloys (common practice, no source)");
        }
    }

    private sealed class UtilisationForgotten : Trap
    {
        public override string Id => "utilisation";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            if (facts.Utilisation is not { } used)
            {
                return null;
            }

            double multiple = used.ReducingFlow / used.Stoichiometric;
            double needed = used.LeastFlow / (facts.Sheet.Gas!.FlowNormalCubicMetres!.Value / used.ReducingFlow) / used.Stoichiometric;
            return multiple < needed ? Grave($"{Printed.Fixed(multiple, 1)} times stoichiometric is not enough: the balance uses only a share of the gas, {Printed.Fixed(needed, 1)} times is the least") : null;
        }
    }

    private sealed class MoistureInBatch : Trap
    {
        private const double Allowed = 0.001;

        public override string Id => "moisture-in-batch";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            bool metallic = facts.Sheet.Reductants.Any(offer => offer.Name is "Al" or "Mg" or "Ca" or "Si" or "FeSi75" or "Ti" or "Zr" or "Na" or "CaC2");
            if (!metallic || facts.Kind is not (CampaignKind.SolidReduction or CampaignKind.Retort))
            {
                return null;
            }

            ChargeItem? wet = facts.Sheet.Charge.FirstOrDefault(item => item.Moisture > Allowed);
            return wet is not null
                ? Grave($"dry first, do not fire: {wet.Substance.Id} holds {Printed.Brief(wet.Moisture!.Value * 100)} % water, above 0.1 % (common practice, no source; site limits may be stricter)")
                : facts.Sheet.Charge.Any(item => item.Moisture is null)
                    ? Grave("dry first, do not fire: the moisture of the charge is not stated, and metal reductants make hydrogen and steam of it; measure the loss on drying (common practice, no source)")
                    : null;
        }
    }

    private sealed class DataRange : Trap
    {
        public override string Id => "data-range";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            string[] missing = [.. (facts.Ranking?.Rows ?? []).Where(row => row.Verdict == Verdict.NoData).Select(row => row.Reason), .. facts.Judgement.Stages.Where(stage => stage.Text.StartsWith("no data", StringComparison.Ordinal)).Select(stage => stage.Text)];
            return missing.Length > 0 ? Warn($"data end here: {string.Join("; ", missing.Distinct().Take(3))}; nothing is extrapolated") : null;
        }
    }

    private sealed class WustiteLimit : Trap
    {
        private const double LowKelvin = 843.15;

        public override string Id => "wustite-limit";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            bool iron = facts.Sheet.Oxides.Any(item => item.Substance.Formula.Of("Fe") > 0 && item.Substance.Formula.Atoms.Count == 2);
            return iron && facts.Sheet.Soak!.At.Kelvin < LowKelvin + 60
                ? Warn($"wustite exists only above about 570 C: at {facts.Sheet.Soak.At} magnetite goes straight to iron below that, and one ladder does not stand for both sides")
                : null;
        }
    }

    private sealed class SilicateOrSpinel : Trap
    {
        public override string Id => "silicate-or-spinel";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            string[] bound = [.. facts.Vapour.SelectMany(point => point.Phases).Where(phase => phase.Contains("Si", StringComparison.Ordinal) && phase.Contains('O', StringComparison.Ordinal) && phase.Contains(facts.Sheet.Product?.Metal ?? "?", StringComparison.Ordinal)).Distinct()];
            return bound.Length > 0 ? Grave($"part of the {facts.Sheet.Product!.Metal} stays bound as {string.Join(", ", bound)}: without enough lime about half of it is lost to the silicate") : null;
        }
    }

    private sealed class ScaleOrPlaceMissing : Trap
    {
        public override string Id => "scale-or-place-missing";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            bool scale = Moistures(facts).Any(reading => reading.Kind == "moisture") || facts.SoakGas.Select(point => point.Meaning).Distinct().Count() > 1;
            bool place = (facts.Sheet.Gas?.Readings ?? []).Any(reading => reading.Place.Length == 0);
            return scale || place ? Warn($"a reading has no {(scale && place ? "scale and no place" : scale ? "scale (frost or dew)" : "place (inlet, furnace, exit, line)")}: it is computed every way it can be meant") : null;
        }
    }

    private sealed class VacuumIsNotZero : Trap
    {
        public override string Id => "vacuum-is-not-zero";

        public override TrapFinding? Find(CampaignFacts facts)
        {
            if (facts.Sheet.SoakPressure.Bar >= 0.01 || facts.Sheet.Furnace.LeakUpPascalCubicMetresPerSecond is not { } leak)
            {
                return null;
            }

            double hours = facts.Sheet.Programme.Sum(stage => stage.HoldHours ?? 0);
            double moles = leak * hours * 3600 / (PhysicalConstants.GasConstant * 293.15);
            string area = facts.Sheet.Furnace.WorkArea is { } square ? $", {Printed.Brief(moles * 2 * PhysicalConstants.OxygenInAir * 15.999 / square)} g O and {Printed.Brief(moles * 2 * (1 - PhysicalConstants.OxygenInAir) * 14.007 / square)} g N per m2 of work" : "";
            return Warn($"a leak-up of {Printed.Brief(leak)} Pa m3/s brings {Printed.Brief(moles * 2 * PhysicalConstants.OxygenInAir * 15.999)} g of oxygen over {Printed.Brief(hours)} h of holds{area}: a dose, not equilibrium");
        }
    }

    private sealed class MillivoltsAsCarbon : Trap
    {
        public override string Id => "millivolts-as-carbon";

        public override TrapFinding? Find(CampaignFacts facts)
            => facts.Sheet.Parts?.Steel is not null && (facts.Sheet.Gas?.Readings ?? []).Any(reading => reading.Kind == "probe")
                ? Warn("millivolts give oxygen, not carbon: carbon needs the true CO of the gas; if it is 17 % where 20 % is taken, a probe over-reads carbon activity by 18 %, CO2 by 38 %")
                : null;
    }
}
