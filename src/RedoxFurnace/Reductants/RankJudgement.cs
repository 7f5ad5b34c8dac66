using RedoxFurnace.Quantities;

namespace RedoxFurnace.Reductants;

/// <summary>From the verdict on the reaction to the verdict on the job, with the reason in one line.</summary>
internal static class RankJudgement
{
    public static RankedReductant Judge(RankedReductant row, string metal, double kelvin, RankConditions conditions)
    {
        (JobVerdict job, string reason) = row.Verdict switch
        {
            Verdict.DoesNotReduce => (JobVerdict.DoesNotWork, No(row, metal, kelvin, conditions)),
            Verdict.Borderline => (JobVerdict.WorksIf, $"the margin {RankWords.MarginWords(row)} is smaller than its uncertainty: a trial must decide"),
            _ => Yes(row, metal),
        };
        return row with { Job = job, Reason = reason };
    }

    private static (JobVerdict Job, string Reason) Yes(RankedReductant row, string metal)
    {
        if (row.Carbide is { Certain: true } carbide)
        {
            return carbide.MetalMargin > 0
                ? (JobVerdict.WorksIf, $"works if carbon is kept to the stoichiometric amount and the last carbide ({carbide.Last}) is burnt off: {MetalFloor(carbide, metal)}")
                : (JobVerdict.DoesNotWork, CarbideNotMetal(carbide, metal));
        }

        if (row.CarbonActivity > 1)
        {
            return (JobVerdict.WorksIf, $"soots: carbon activity {Printed.Brief(row.CarbonActivity.Value)} at CO/CO2 {Printed.Brief(row.GasRatioAssumed!.Value)}; works if the gas is kept from sooting");
        }

        if (row.Carbide is { Certain: false } doubtful)
        {
            return (JobVerdict.Works, $"{RankWords.RangeWords(row.Crossovers!)}; {doubtful.First} may form beside an excess of carbon");
        }

        return (JobVerdict.Works, row.Reductant.Kind == ReductantKind.Gas
            ? $"{RankWords.RangeWords(row.Crossovers!)} at {RankWords.RatioName(row)} {Printed.Brief(row.GasRatioAssumed!.Value)}; least ratio {Printed.Brief(row.GasRatioLeast!.Value)}, {RankWords.Percent(row.UsableShare!.Value)} of the dry gas can react"
            : RankWords.RangeWords(row.Crossovers!));
    }

    private static string No(RankedReductant row, string metal, double kelvin, RankConditions conditions)
    {
        if (row.Carbide is { Certain: true, CarbideFloorKelvin: { } from } carbide && from < kelvin)
        {
            return CarbideNotMetal(carbide, metal);
        }

        if (row.Reductant.Kind != ReductantKind.Gas)
        {
            return row.Crossovers!.Range == WorkingRange.Never ? "at no temperature searched" : RankWords.RangeWords(row.Crossovers);
        }

        double total = conditions.Total?.NaturalLogBar ?? 0;
        string ratio = RankWords.RatioName(row);
        string least = Printed.Brief(row.GasRatioLeast!.Value);
        return row.Reductant.Id == "H2"
            ? $"not at {ratio} {Printed.Brief(row.GasRatioAssumed!.Value)} ({RankWords.WaterWords(total - Math.Log(1 + row.GasRatioAssumed.Value))}); from {least}, drier than {RankWords.WaterWords(total - Math.Log(1 + row.GasRatioLeast.Value))}"
            : $"not at {ratio} {Printed.Brief(row.GasRatioAssumed!.Value)}; from {least}, with {RankWords.Percent(row.UsableShare!.Value)} of the gas able to react";
    }

    private static string CarbideNotMetal(CarbideCheck carbide, string metal)
        => $"carbide, not metal: {carbide.First} forms first{From(carbide.CarbideFloorKelvin)}; {MetalFloor(carbide, metal)} at this pressure";

    private static string MetalFloor(CarbideCheck carbide, string metal)
        => carbide.MetalFloorKelvin is { } from ? $"{metal} metal only from {Celsius(from)}" : $"no {metal} metal in the range searched";

    private static string From(double? kelvin) => kelvin is { } from ? $" (from {Celsius(from)})" : string.Empty;

    private static string Celsius(double kelvin) => Temperature.FromKelvin(Math.Round(kelvin)).Celsius.ToString("0", System.Globalization.CultureInfo.InvariantCulture) + " C";
}
