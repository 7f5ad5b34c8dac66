using System.Collections.Immutable;
using RedoxFurnace.Oxidation;
using RedoxFurnace.Quantities;
using RedoxFurnace.Reductants;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Campaigns;

/// <summary>Moves each input by what it is usually known to, asks for the verdict again, and says which matters most.</summary>
internal static class SensitivityFinder
{
    private const double Kelvin = 20;
    private const double FrostKelvin = 3;
    private const double PressureFactor = 2;
    private const double FlowShare = 0.1;
    private const double MassShare = 0.05;
    private const double ActivityFactor = 1.5;

    public static ImmutableArray<SensitivityRow> Of(CampaignSheet sheet, Judgement own, CampaignJudge judge)
    {
        List<SensitivityRow> rows = [];
        foreach ((string input, string change, CampaignSheet moved) in Moved(sheet))
        {
            Judgement other;
            try
            {
                other = judge.Judge(moved).Judgement;
            }
            catch (Exception fault) when (fault is NoAnswerException or RequestException)
            {
                continue;
            }

            double moves = own.Margin is { } before && other.Margin is { } after ? after - before : 0;
            rows.Add(new SensitivityRow(input, change, other.Margin, CampaignJudge.Word(other.Verdict), other.Verdict != own.Verdict, moves));
        }

        return [.. rows.OrderByDescending(row => row.TurnsVerdict).ThenByDescending(row => Math.Abs(row.Moves))];
    }

    /// <summary>What to measure next: the input whose usual error turns the verdict, else the one that moves the margin most.</summary>
    public static string Next(ImmutableArray<SensitivityRow> rows, Judgement own)
    {
        if (rows.IsEmpty)
        {
            return own.Ask.FirstOrDefault() ?? "";
        }

        SensitivityRow first = rows[0];
        string how = first.Input switch
        {
            "soak temperature" => "a second thermocouple at the work, or a survey of the hot zone",
            "moisture of the gas" => "frost point at the work, with scale and place written beside it",
            "pressure" => "an absolute gauge at the furnace, not at the pump",
            "gas flow" => "the flow against a calibrated meter at 0 C and 1 atm",
            "charge" => "mass and assay of the charge",
            _ => "the activity of the solute",
        };
        return first.TurnsVerdict ? $"{first.Input}: {first.Change} turns the verdict to {first.Verdict}; measure {how}" : $"no usual error of one input turns the verdict; {first.Input} moves the margin most: {how}";
    }

    private static IEnumerable<(string Input, string Change, CampaignSheet Moved)> Moved(CampaignSheet sheet)
    {
        foreach (double step in new[] { -Kelvin, Kelvin })
        {
            yield return ("soak temperature", $"{Sign(step)} {Printed.Fixed(Kelvin, 0)} K", sheet with { Programme = [.. sheet.Programme.Select(stage => ReferenceEquals(stage, sheet.Soak) ? stage with { At = Temperature.FromKelvin(stage.At.Kelvin + step) } : stage)] });
        }

        if (sheet.Soak?.Pressure is not null || sheet.Furnace.Pressure is not null)
        {
            foreach (double factor in new[] { 1 / PressureFactor, PressureFactor })
            {
                Pressure total = Pressure.FromNaturalLogBar(sheet.SoakPressure.NaturalLogBar + Math.Log(factor));
                if (sheet.SoakPressure.Bar < 0.5)
                {
                    yield return ("pressure", factor > 1 ? "doubled" : "halved", sheet with { Furnace = sheet.Furnace with { Pressure = total }, Programme = [.. sheet.Programme.Select(stage => stage.Pressure is null ? stage : stage with { Pressure = total })] });
                }
            }
        }

        if (sheet.Gas?.Analysis is { } analysis)
        {
            foreach (double step in new[] { -FrostKelvin, FrostKelvin })
            {
                if (Shifted(analysis, step) is { } other)
                {
                    yield return ("moisture of the gas", $"{Sign(step)} {Printed.Fixed(FrostKelvin, 0)} K of frost or dew point", sheet with { Gas = sheet.Gas with { Analysis = other } });
                }
            }
        }

        if (sheet.Gas?.FlowNormalCubicMetres is { } flow && sheet.Oxides.Any())
        {
            foreach (double share in new[] { -FlowShare, FlowShare })
            {
                yield return ("gas flow", $"{Sign(share)} 10 %", sheet with { Gas = sheet.Gas with { FlowNormalCubicMetres = flow * (1 + share) } });
            }
        }

        if (sheet.Charge.Any(item => item.Amount is not null))
        {
            foreach (double share in new[] { -MassShare, MassShare })
            {
                yield return ("charge", $"{Sign(share)} 5 %", sheet with
                {
                    Charge = [.. sheet.Charge.Select((item, i) => i == 0 ? item with { MassKilograms = item.MassKilograms * (1 + share), KilogramsPerHour = item.KilogramsPerHour * (1 + share) } : item)],
                });
            }
        }

        if (sheet.Charge.Any(item => item.Activity is not null))
        {
            foreach (double factor in new[] { 1 / ActivityFactor, ActivityFactor })
            {
                yield return ("activity", factor > 1 ? "times 1.5" : "over 1.5", sheet with { Charge = [.. sheet.Charge.Select(item => item with { Activity = item.Activity * factor })] });
            }
        }
    }

    private static string Sign(double step) => step < 0 ? "-" : "+";

    /// <summary>The analysis with its frost or dew point moved; null where it has none in degrees.</summary>
    private static string? Shifted(string analysis, double kelvin)
    {
        string[] parts = analysis.Split(',', StringSplitOptions.TrimEntries);
        for (int i = 0; i < parts.Length; i++)
        {
            string[] words = parts[i].Split(' ', 2, StringSplitOptions.TrimEntries);
            if (words.Length == 2 && words[0] is "frost" or "dew")
            {
                string[] value = words[1].Split(" at ", 2);
                Temperature moved = Temperature.FromKelvin(Temperature.Parse(value[0]).Kelvin + kelvin);
                string name = words[0] == "frost" && moved.Kelvin > WaterVapour.TriplePointKelvin ? "dew" : words[0];
                parts[i] = $"{name} {Printed.Exact(moved.Celsius)}C{(value.Length > 1 ? " at " + value[1] : "")}";
                return string.Join(", ", parts);
            }
        }

        return null;
    }
}
