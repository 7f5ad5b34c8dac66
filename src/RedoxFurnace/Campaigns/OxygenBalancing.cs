using System.Collections.Immutable;
using RedoxFurnace.Atmospheres;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Campaigns;

/// <summary>The oxygen balance of a flowing gas: inlet water + twice the O2 of a leak + oxygen off the charge, against each reading.</summary>
internal static class OxygenBalancing
{
    private const double GramsPerMole = 15.999;

    public static OxygenBalance? Of(CampaignFacts facts)
    {
        CampaignSheet sheet = facts.Sheet;
        if (sheet.Gas?.FlowNormalCubicMetres is not { } flow || facts.SoakGas.IsEmpty)
        {
            return null;
        }

        GasMixture gas = facts.SoakGas[0].Answer.Mixture;
        double moles = flow / PhysicalConstants.NormalCubicMetrePerMole;
        double inlet = moles * (gas[GasSpecies.H2O] + (2 * gas[GasSpecies.O2]));
        double leak = (sheet.Furnace.LeakNormalCubicMetres ?? 0) / PhysicalConstants.NormalCubicMetrePerMole * 2 * PhysicalConstants.OxygenInAir;
        double charge = facts.Utilisation?.OxygenMolesPerHour ?? 0;
        List<(string, double)> into = [("water and oxygen of the inlet gas", inlet * GramsPerMole)];
        if (leak > 0)
        {
            into.Add(("leak, as twice its O2", leak * GramsPerMole));
        }

        if (charge > 0)
        {
            into.Add(("oxygen off the charge", charge * GramsPerMole));
        }

        double share = Math.Min(0.999, (inlet + leak + charge) / moles);
        bool hydrogen = gas[GasSpecies.H2] > 0;
        WaterContent exit = WaterContent.OfShare(Math.Max(1e-12, share), sheet.SoakPressure);
        List<string> against = [];
        string next = "";
        foreach (ReadingSheet reading in sheet.Gas.Readings.Where(reading => reading.Kind is "frost" or "dew" or "moisture" or "water"))
        {
            WaterReading water = WaterReading.Parse(reading.Kind == "water" ? "H2O" : reading.Kind, reading.Value);
            foreach (WaterMeaning meaning in water.Meanings(sheet.SoakPressure, reading.Pressure))
            {
                double found = meaning.Content.Share * moles;
                string place = reading.Place.Length > 0 ? reading.Place : "place not told";
                string name = $"{reading.Kind} {reading.Value} ({place}{(meaning.Meaning.Length > 0 ? ", " + meaning.Meaning : "")})";
                double expected = reading.Place == "inlet" ? inlet : inlet + leak + charge;
                double more = found - expected;
                if (Math.Abs(more) <= 0.15 * Math.Max(found, expected))
                {
                    against.Add($"{name}: {Printed.Brief(meaning.Content.Ppm)} ppm, as the balance expects");
                }
                else if (more > 0)
                {
                    double air = more / (2 * PhysicalConstants.OxygenInAir) * PhysicalConstants.NormalCubicMetrePerMole;
                    string off = charge > 0 ? $", or {Printed.Fixed(100 * more / charge, 0)} % more oxygen off the charge than reckoned" : "";
                    against.Add($"{name}: {Printed.Brief(meaning.Content.Ppm)} ppm is {Printed.Brief(more * GramsPerMole)} g/h of oxygen more than the balance: {Printed.Brief(air)} Nm3/h of air leaking in{off}, or wet brick and belt, would explain it");
                    next = "stop the charge and hold the flow: a leak stays, oxygen of charge and brick fades; then read nitrogen in the exit gas, which only air brings";
                }
                else
                {
                    against.Add(charge > 0
                        ? $"{name}: {Printed.Brief(meaning.Content.Ppm)} ppm is {Printed.Brief(-more * GramsPerMole)} g/h of oxygen less than the balance: {Printed.Fixed(-100 * more / charge, 0)} % of the charge is not being reduced, or the reading is taken upstream"
                        : $"{name}: {Printed.Brief(meaning.Content.Ppm)} ppm is drier than the balance: the reading is taken upstream of leak and work, or the analyser is slow");
                    next = next.Length > 0 ? next : "read the dew point in the exit gas itself, through a short hot line";
                }
            }
        }

        return new OxygenBalance([.. into], hydrogen ? share * 1e6 : null, hydrogen ? (exit.DewPointKelvin ?? exit.FrostPointKelvin) - PhysicalConstants.ZeroCelsiusInKelvin : null, [.. against], next);
    }
}
