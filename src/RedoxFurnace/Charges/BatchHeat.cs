using System.Collections.Immutable;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charges;

/// <summary>Heat and adiabatic temperature of a batch at full equilibrium, melting and boiling counted. A pure function of request and database.</summary>
/// <remarks>THEORY.md, section 10. It says how hot a batch becomes; it never says how to make it hotter or how to light it.</remarks>
public static class BatchHeat
{
    /// <summary>More free water than this share of the mass is refused: common practice, no source; site limits may be stricter.</summary>
    public const double MostMoisture = 0.001;

    private const double Hottest = 5500;
    private const double FoundWithin = 0.02;
    private const double ColdestStart = 233.15;

    private static readonly HashSet<string> Powders = ["Al", "Mg", "Ca", "Si", "Ti", "Zr", "Mn", "Na", "K", "Li", "Fe", "Zn"];

    /// <summary>Reckons it.</summary>
    /// <param name="request">What is asked.</param>
    /// <param name="database">Data.</param>
    /// <returns>The result; the temperature is left out with its reason where the data do not reach.</returns>
    /// <exception cref="RequestException">A start below -40 C, or a substance without heat data.</exception>
    public static BatchHeatResult Of(BatchHeatRequest request, SubstanceDatabase database)
    {
        if (request.Start.Kelvin < ColdestStart || request.Start.Kelvin > 2000)
        {
            throw new RequestException($"--from '{request.Start}' is out of range; -40 C to 1727 C is allowed");
        }

        Dictionary<string, double> moles = [];
        double kilograms = 0;
        foreach ((Substance substance, double number) in request.Charge)
        {
            if (!substance.TryGibbs(PhysicalConstants.ReferenceKelvin, out _) || !substance.KnowsHeating(PhysicalConstants.ReferenceKelvin))
            {
                throw new RequestException($"'{substance.Id}' has no heat data at 25 C; leave it out or add an entry with --oxides");
            }

            kilograms += number * substance.Formula.MolarMass / 1000;
            foreach ((string element, double atoms) in substance.Formula.Atoms)
            {
                moles[element] = moles.GetValueOrDefault(element) + (number * atoms);
            }
        }

        double start = Enthalpy(request.Charge, request.Start.Kelvin);
        double reference = Enthalpy(request.Charge, PhysicalConstants.ReferenceKelvin);
        ChargeEquilibrium equilibrium = new(database, moles.Keys);
        double heat = Products(equilibrium, moles, PhysicalConstants.ReferenceKelvin, request.Total).Enthalpy - reference;
        (Temperature? adiabatic, string? reason, string? plateau, ChargeState? state, (double Moles, double Kilograms) gas) = Adiabatic(equilibrium, moles, request, start);
        Temperature? preheat = request.Reach is { } wanted ? Preheat(equilibrium, moles, request, wanted) : null;
        double gasMass = gas.Kilograms;
        double metal = state?.Condensed.Where(phase => phase.Substance.Formula.Atoms.Count == 1 && phase.Substance.Id != "C").Sum(phase => phase.Kilograms) ?? 0;
        bool powder = request.Charge.Any(item => Powders.Contains(item.Substance.Id));
        (string verdict, string words, ImmutableArray<string> ask) = Moisture(request, powder);
        double? water = request.Moisture is { } share2 ? share2 / 18.015e-3 * PhysicalConstants.NormalCubicMetrePerMole * 1000 : null;
        List<string> notes =
        [
            "full equilibrium without loss to crucible and air: a real batch stays cooler, a large one less so than a small one",
            "how fast it burns, and whether it throws, is not reckoned: the site's procedure and tested batch size count",
        ];
        if (request.Start.Kelvin < PhysicalConstants.ReferenceKelvin)
        {
            notes.Add("below 25 C heat capacities are those at 25 C");
        }

        if (moles.ContainsKey("Si"))
        {
            notes.Add("silicides have no data: silicon taken up by a metal is not counted");
        }

        if (plateau is not null)
        {
            notes.Add(plateau);
        }

        string hot = adiabatic is { } found ? $"Adiabatic temperature {found} ({Printed.Fixed(found.Kelvin, 0)} K) from {request.Start}" : $"No adiabatic temperature: {reason}";
        string gives = heat < 0 ? $"gives {Printed.Fixed(-heat / kilograms / 1000, 0)} kJ per kg of charge at 25 C" : $"takes {Printed.Fixed(heat / kilograms / 1000, 0)} kJ per kg of charge at 25 C";
        string vapour = gasMass / kilograms > 0.001 ? $"; {Printed.Fixed(100 * gasMass / kilograms, 1)} % of the mass becomes gas" : "";
        return new BatchHeatResult(
            request,
            kilograms,
            metal,
            heat,
            adiabatic,
            reason,
            plateau,
            state,
            gasMass / kilograms,
            gas.Moles,
            preheat,
            water,
            powder ? water : 0,
            verdict,
            $"{words}{hot}; the batch {gives}{vapour}.",
            ask,
            [.. notes]);
    }

    private static (string Verdict, string Words, ImmutableArray<string> Ask) Moisture(BatchHeatRequest request, bool powder) => (request.Moisture, powder) switch
    {
        (null, true) => ("not-decidable", "Dry first, do not fire: the moisture of this metal-powder charge is not stated. ", ["what is the loss on drying of the charge, of crucible and of tools?"]),
        ( > MostMoisture, _) => ("does-not-work", $"Dry first, do not fire: {Printed.Brief(request.Moisture!.Value * 100)} % free water is above 0.1 % (common practice, no source; site limits may be stricter). ", []),
        _ => ("works", "", []),
    };

    private static double Enthalpy(ImmutableArray<(Substance Substance, double Moles)> charge, double kelvin)
        => charge.Sum(item => item.Moles * (kelvin < PhysicalConstants.ReferenceKelvin
            ? item.Substance.At(PhysicalConstants.ReferenceKelvin).Enthalpy + (item.Substance.At(PhysicalConstants.ReferenceKelvin).HeatCapacity * (kelvin - PhysicalConstants.ReferenceKelvin))
            : item.Substance.At(kelvin).Enthalpy));

    private static (double Enthalpy, ChargeState State) Products(ChargeEquilibrium equilibrium, Dictionary<string, double> moles, double kelvin, Pressure total)
    {
        ChargeState state = equilibrium.Solve(moles, Temperature.FromKelvin(kelvin), total);
        double enthalpy = 0;
        foreach ((Substance substance, double number) in state.Condensed.Select(phase => (phase.Substance, phase.Moles)).Concat(state.Gas.Where(share => share.Fraction > 1e-12).Select(share => (share.Substance, share.Fraction * state.GasMoles))))
        {
            if (!substance.KnowsHeating(kelvin))
            {
                throw new NoAnswerException($"{substance.Id} stands at {Temperature.FromKelvin(kelvin)} and its heating is not known");
            }

            enthalpy += number * substance.At(kelvin).Enthalpy;
        }

        return (enthalpy, state);
    }

    private static (Temperature? At, string? Reason, string? Plateau, ChargeState? State, (double Moles, double Kilograms) Gas) Adiabatic(ChargeEquilibrium equilibrium, Dictionary<string, double> moles, BatchHeatRequest request, double start)
    {
        double low = Math.Max(request.Start.Kelvin, PhysicalConstants.ReferenceKelvin);
        try
        {
            if (Products(equilibrium, moles, low, request.Total).Enthalpy >= start - (1e-6 * Math.Abs(start)))
            {
                return (null, "the batch takes heat: it does not warm itself", null, null, default);
            }

            // Upwards until the products hold more heat than the batch gives; where data end on the way, nothing is extrapolated.
            double high = low;
            double step = 200;
            while (true)
            {
                double next = Math.Min(Hottest, high + step);
                double? held;
                try
                {
                    held = Products(equilibrium, moles, next, request.Total).Enthalpy;
                }
                catch (NoAnswerException fault) when (step > 5)
                {
                    step /= 2;
                    if (step <= 5)
                    {
                        return (null, $"the data end near {Temperature.FromKelvin(next)}: {fault.Message}", null, null, default);
                    }

                    continue;
                }

                if (held >= start)
                {
                    high = next;
                    break;
                }

                low = high = next;
                if (next >= Hottest)
                {
                    return (null, $"hotter than {Temperature.FromKelvin(Hottest)}, above the data", null, null, default);
                }
            }

            while (high - low > FoundWithin)
            {
                double middle = 0.5 * (low + high);
                if (Products(equilibrium, moles, middle, request.Total).Enthalpy < start)
                {
                    low = middle;
                }
                else
                {
                    high = middle;
                }
            }

            (double cold, ChargeState below) = Products(equilibrium, moles, low, request.Total);
            (double hot, ChargeState above) = Products(equilibrium, moles, high, request.Total);
            double span = hot - cold;
            // A jump of the enthalpy within hundredths of a kelvin is a phase change that holds the temperature.
            double ordinary = Math.Abs(start) * 1e-4;
            string? plateau = span > Math.Max(ordinary, 50 * moles.Values.Sum())
                ? $"held at {Temperature.FromKelvin(high)} by a phase change ({Difference(below, above)}), {Printed.Fixed(100 * (start - cold) / span, 0)} % of it done"
                : null;
            double done = Math.Clamp((start - cold) / span, 0, 1);
            return (
                Temperature.FromKelvin(0.5 * (low + high)),
                null,
                plateau,
                done > 0.5 ? above : below,
                (Between(below.GasMoles, above.GasMoles, done), Between(GasMass(below), GasMass(above), done)));
        }
        catch (NoAnswerException fault)
        {
            return (null, fault.Message, null, null, default);
        }
    }

    private static double Between(double low, double high, double share) => low + (share * (high - low));

    private static double GasMass(ChargeState state) => state.Gas.Sum(share => share.Fraction * state.GasMoles * share.Substance.Formula.MolarMass) / 1000;

    private static string Difference(ChargeState below, ChargeState above)
    {
        List<string> changes = [];
        foreach (ChargePhase phase in below.Condensed)
        {
            double left = above.Condensed.Where(other => other.Substance.Id == phase.Substance.Id).Sum(other => other.Moles);
            MatterState before = phase.Substance.PhaseAt(below.At.Kelvin)!.State;
            MatterState after = phase.Substance.PhaseAt(above.At.Kelvin)?.State ?? before;
            if (left < 0.02 * phase.Moles)
            {
                changes.Add($"{phase.Name} boils or reacts away");
            }
            else if (before != after)
            {
                changes.Add($"{phase.Name} melts");
            }
        }

        return changes.Count > 0 ? string.Join(", ", changes)
            : Math.Abs(above.GasMoles - below.GasMoles) > 0.01 * Math.Max(above.GasMoles, below.GasMoles) ? "part of the charge boils"
            : "a change of crystal form or of phases";
    }

    private static Temperature? Preheat(ChargeEquilibrium equilibrium, Dictionary<string, double> moles, BatchHeatRequest request, Temperature wanted)
    {
        try
        {
            double needed = Products(equilibrium, moles, wanted.Kelvin, request.Total).Enthalpy;
            double low = ColdestStart;
            double high = Math.Min(2000, request.Charge.Min(item => item.Substance.HighestKelvin) - 1);
            if (Enthalpy(request.Charge, low) >= needed || Enthalpy(request.Charge, high) < needed)
            {
                return null;
            }

            while (high - low > 0.1)
            {
                double middle = 0.5 * (low + high);
                (low, high) = Enthalpy(request.Charge, middle) < needed ? (middle, high) : (low, middle);
            }

            return Temperature.FromKelvin(high);
        }
        catch (NoAnswerException)
        {
            return null;
        }
    }
}
