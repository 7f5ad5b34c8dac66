using System.Collections.Immutable;
using RedoxFurnace.Charges;
using RedoxFurnace.Charts.Kinds;
using RedoxFurnace.Charts.Layout;
using RedoxFurnace.Quantities;
using RedoxFurnace.Safety;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charts.Sheets;

/// <summary>Settings to phase-amount chart.</summary>
internal static class PhaseAmountDrawing
{
    private const double StepKelvin = 5;
    private const double Trace = 1e-6;

    private static readonly (Temperature Low, Temperature High) UsualRange = (Temperature.FromCelsius(600), Temperature.FromCelsius(1800));

    public static DrawnChart Draw(ChartSettings settings, SubstanceDatabase database, string version)
    {
        if (settings.Text("charge") is not { } written)
        {
            throw new RequestException("the phase-amount chart takes a charge; write --charge \"Cr2O3 1000kg, C 237kg\" (or charge: in the sheet)");
        }

        ImmutableArray<(Substance Substance, double Moles)> charge = settings.Read<ImmutableArray<(Substance, double)>>("charge", (text, _) => ChargeText.Parse(text, database), []);
        (Temperature low, Temperature high) = settings.Read("range", ChartDrawing.Range, UsualRange);
        Pressure total = settings.Read("pressure", Pressure.Parse, Pressure.Standard);
        Dictionary<string, double> moles = ChargeReckoning.Moles(new ChargeRequest(charge, [], [low], [total]));
        ChargeEquilibrium equilibrium = new(database, moles.Keys);
        int steps = Math.Max(2, (int)Math.Ceiling((high.Kelvin - low.Kelvin) / StepKelvin));
        List<string> notes = [];
        List<ChargeState> states = [];
        for (int i = 0; i <= steps; i++)
        {
            Temperature at = Temperature.FromKelvin(low.Kelvin + ((high.Kelvin - low.Kelvin) * i / steps));
            try
            {
                states.Add(equilibrium.Solve(moles, at, total));
            }
            catch (NoAnswerException fault)
            {
                notes.Add(fault.Message);
            }
        }

        if (states.Count < 2)
        {
            throw new NoAnswerException($"the charge has no equilibrium between {low} and {high}: {notes.FirstOrDefault()}");
        }

        Substance[] used = [.. states.SelectMany(state => state.Condensed.Select(phase => phase.Substance).Concat(state.Gas.Where(share => share.Fraction > Trace).Select(share => share.Substance))).Distinct()];
        ImmutableArray<string> sources = [.. used.SelectMany(substance => substance.Phases.Select(phase => phase.SourceKey)).Distinct().Order(StringComparer.Ordinal).Select(key => database.Sources[key].Text)];
        ImmutableArray<HazardNote> hazards = ChartDrawing.Hazards(database, new HazardWork
        {
            Charge = [.. charge.Select(item => item.Substance.Id)],
            Reductants = [.. charge.Where(item => item.Substance.Formula.Of("O") <= 0).Select(item => item.Substance.Id)],
            Products = [.. used.Select(substance => substance.Id)],
            LowestKelvin = low.Kelvin,
            HighestKelvin = high.Kelvin,
            Vacuum = total.Bar < 0.1,
        });
        ChartOptions options = ChartDrawing.Common(new ChartOptions(), settings, hazards, version);
        return new DrawnChart(
            [ChartLayout.Lay(PhaseAmountChart.Plan(states, written, options, sources, database.Hash))],
            $"what {written} becomes at {total} from {ChartDrawing.Celsius(low.Kelvin)} to {ChartDrawing.Celsius(high.Kelvin)}",
            [.. notes.Distinct().Take(3)],
            hazards,
            sources);
    }
}
