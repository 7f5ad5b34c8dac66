using System.Collections.Immutable;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Campaigns;

/// <summary>The figures to write on the set-point sheet, in the instruments of the trade and in both unit systems.</summary>
internal static class SetPointFinder
{
    public static IEnumerable<SetPoint> Of(CampaignFacts facts, SubstanceDatabase database) => facts.Kind switch
    {
        CampaignKind.Parts => Parts(facts),
        CampaignKind.GasReduction => Gas(facts),
        CampaignKind.Retort => Retort(facts),
        _ => Solid(facts),
    };

    /// <summary>A frost or dew point in both units.</summary>
    public static string Both(double kelvin) => $"{Printed.Fixed(kelvin - PhysicalConstants.ZeroCelsiusInKelvin, 1)} C ({Printed.Fixed(((kelvin - PhysicalConstants.ZeroCelsiusInKelvin) * 1.8) + 32, 1)} F)";

    private static IEnumerable<SetPoint> Parts(CampaignFacts facts)
    {
        if (facts.SoakGas.IsEmpty)
        {
            yield break;
        }

        GasPoint soak = facts.SoakGas[0];
        string total = Pressure.FromNaturalLogBar(soak.Answer.AsAnalysed.NaturalLogTotalPressure).ToString();
        PartsSheet parts = facts.Sheet.Parts!;
        MetalInGas? worst = soak.Metals.FirstOrDefault(metal => (parts.KeepBright.IsEmpty && !parts.KeepOxidised.Contains(metal.Element.Symbol)) || parts.KeepBright.Contains(metal.Element.Symbol));
        if (worst?.LimitLogOxygen is { } limit)
        {
            string trail = $"{worst.Reaction}, activity {Printed.Brief(worst.Element.Activity)} ({worst.Element.Basis}); expanded uncertainty {Printed.Fixed((worst.Uncertainty ?? 0) / 1000, 1)} kJ/mol O2";
            if (worst.LimitWater is { } water)
            {
                if (water.FrostPointKelvin is { } frost)
                {
                    yield return new SetPoint($"frost point at the work, at most, at {total}", Both(frost), trail);
                    yield return new SetPoint($"the same as dew point over supercooled water", Both(water.DewPointKelvin!.Value), trail);
                }
                else if (water.DewPointKelvin is { } dew)
                {
                    yield return new SetPoint($"dew point at the work, at most, at {total}", Both(dew), trail);
                }

                yield return new SetPoint("water, at most", $"{Printed.Brief(water.Ppm)} ppm by volume, {Printed.Brief(water.Share * 100)} %, {Printed.Brief(water.Millibar)} mbar, {Printed.Brief(water.Torr)} Torr", trail);
            }

            yield return new SetPoint("oxygen pressure, at most", $"log10 {Printed.Fixed(limit / Math.Log(10), 2)} bar, {Printed.Fixed((limit / Math.Log(10)) - Math.Log10(PhysicalConstants.AtmosphereInBar), 2)} atm", trail);
            yield return new SetPoint($"oxygen probe at {soak.At} against air, at least", $"{Printed.Fixed(new OxygenProbe(soak.At).Millivolts(limit), 0)} mV", trail);
        }

        if (soak.Steel is { } steel)
        {
            foreach ((string name, NeutralSetPoint? point) in new[] { ("neutral with the alloy terms", steel.Neutral), ("neutral without them", steel.NeutralWithoutAlloy) })
            {
                if (point is not null)
                {
                    string trail = "2 C + O2 = 2 CO with the CO of the gas; austenite by Ellis, Davidson and Bodsworth 1963, alloy terms by Gunnarson 1967 (both from memory); ±8 % of the carbon, at least ±0.03 % C";
                    string dew = point.Water?.DewPointKelvin is { } kelvin ? $"dew point {Both(kelvin)}, " : "";
                    yield return new SetPoint(name, $"{dew}{Printed.Fixed(point.DioxideShare * 100, 2)} % CO2, probe {Printed.Fixed(point.ProbeMillivolts, 0)} mV at {soak.At}", trail);
                }
            }
        }
    }

    private static IEnumerable<SetPoint> Gas(CampaignFacts facts)
    {
        if (facts.Utilisation is not { } used)
        {
            yield break;
        }

        UtilisationStep ruling = used.Steps.MinBy(step => step.Balance - step.Made)!;
        string trail = $"{ruling.Reaction} against the gas; the balance allows {Printed.Fixed(100 * ruling.BalanceLow, 1)} to {Printed.Fixed(100 * ruling.BalanceHigh, 1)} % (k = 2)";
        yield return new SetPoint("gas flow, at least", $"{Printed.Fixed(used.LeastFlow, 1)} Nm3/h ({Printed.Fixed(used.LeastFlow / 0.028316846592 / (273.15 / 288.7055556), 0)} scfh)", trail);
        yield return new SetPoint($"{used.Reducing} the oxygen alone asks for", $"{Printed.Fixed(used.Stoichiometric, 2)} Nm3/h", "moles of oxygen in the charge");
        yield return new SetPoint("multiple of stoichiometric as planned", Printed.Fixed(used.ReducingFlow / used.Stoichiometric, 1), "flow over that need");
        if (used.Reducing == "H2" && used.ExitShare < 1)
        {
            Pressure total = facts.Sheet.SoakPressure;
            WaterContent exit = WaterContent.OfShare(used.ExitShare, total);
            yield return new SetPoint("exit gas should read, when the charge reduces", $"dew point {(exit.DewPointKelvin is { } dew ? Both(dew) : "above the boiling point")}, {Printed.Fixed(100 * used.ExitShare, 1)} % water: a dry exit means that nothing is being reduced", "inlet water and the oxygen of the charge");
        }
    }

    private static IEnumerable<SetPoint> Retort(CampaignFacts facts)
    {
        if (facts.Vapour.IsEmpty)
        {
            yield break;
        }

        Charges.MetalVapourOverCharge first = facts.Vapour[0];
        string trail = $"{first.Reaction}; a factor {Printed.Fixed(Math.Exp(first.ExpandedUncertainty), 2)} either way (k = 2)";
        Pressure pressure = Pressure.FromNaturalLogBar(first.NaturalLogBar);
        yield return new SetPoint("line pressure, well below", $"{pressure} ({Printed.Brief(pressure.Bar * 750.0617)} Torr)", trail);
        foreach (Charges.MetalVapourOverCharge point in facts.Vapour.Skip(1))
        {
            yield return new SetPoint($"after {Printed.Fixed(100 * point.Drawn, 0)} % is drawn off", $"{Pressure.FromNaturalLogBar(point.NaturalLogBar)} beside {string.Join(", ", point.Phases)}", point.Reaction);
        }
    }

    private static IEnumerable<SetPoint> Solid(CampaignFacts facts)
    {
        if (facts.Ranking is not { } ranking)
        {
            yield break;
        }

        foreach (Reductants.RankedReductant row in ranking.Rows.Where(row => row.Crossovers is not null))
        {
            string trail = $"{row.Reaction}; expanded uncertainty {Printed.Fixed((row.ExpandedUncertainty ?? 0) / 1000, 1)} kJ/mol O2";
            if (row.Carbide is { } carbide)
            {
                string from = carbide.CarbideFloorKelvin is { } start ? Both(start) : "-";
                string metal = carbide.MetalFloorKelvin is { } floor ? Both(floor) : "nowhere in the data";
                yield return new SetPoint($"{row.Reductant.Id}: {carbide.First} from, metal from", $"{from}; {metal}", trail);
            }
            else if (row.Crossovers!.Kelvin.Length > 0)
            {
                yield return new SetPoint($"{row.Reductant.Id}: crossover", string.Join("; ", row.Crossovers.Kelvin.Select(Both)), trail);
            }
        }
    }
}
