using System.Collections.Immutable;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Charges;

/// <summary>What a charge becomes at each temperature and pressure, in numbers and in words. A pure function of request and database.</summary>
public static class ChargeReckoning
{
    private const double Trace = 1e-6;
    private const double ScanKelvin = 25;
    private const double LowestKelvin = 500;
    private const double HighestKelvin = 2500;

    private static readonly HashSet<string> Nonmetals = ["O", "C", "N", "H", "Ar", "He", "S", "P", "F", "Cl"];

    /// <summary>Reckons it.</summary>
    /// <param name="request">What is asked.</param>
    /// <param name="database">Data.</param>
    /// <returns>The result.</returns>
    /// <exception cref="NoAnswerException">No data, or no convergence.</exception>
    public static ChargeResult Of(ChargeRequest request, SubstanceDatabase database)
    {
        Dictionary<string, double> moles = Moles(request);
        ChargeEquilibrium equilibrium = new(database, moles.Keys);
        ImmutableArray<ChargePoint> points =
        [
            .. request.Totals.SelectMany(total => request.At.Select(at =>
            {
                ChargeState state = equilibrium.Solve(moles, at, total);
                return new ChargePoint(state, Heat(request, state), [.. Metals(moles).Select(metal => Yield(metal, moles[metal], state))]);
            })),
        ];
        string[] products = [.. points.SelectMany(point => point.State.Condensed).Select(phase => phase.Substance).Where(substance => Kind(substance) is "metal" or "carbide" or "nitride" && request.Charge.All(item => item.Substance.Id != substance.Id)).Select(substance => substance.Id).Concat(Metals(moles).Where(metal => request.Charge.All(item => item.Substance.Id != metal)))
            .Distinct()];
        ImmutableArray<ProductOnset> onsets = [.. request.Totals.SelectMany(total => products.Select(product => Onset(product, total, request, moles, equilibrium)))];
        return new ChargeResult(
            request,
            points,
            onsets,
            Headline(request, points, onsets),
            ["everything in equilibrium at the temperature and total pressure; ideal gas, pure condensed phases, wustite as one phase of three members", "heat from everything at 25 C; + must be supplied", "equilibrium, not rate: slow solids and gas that does not meet the charge are not counted"],
            [.. Notes(points, moles)],
            Sources(points, request, database));
    }

    /// <summary>Moles of each element in charge and gas.</summary>
    /// <param name="request">The request.</param>
    /// <returns>By symbol.</returns>
    public static Dictionary<string, double> Moles(ChargeRequest request)
    {
        Dictionary<string, double> moles = [];
        foreach ((Substance substance, double number) in request.Charge.Concat(request.Gas))
        {
            foreach ((string element, double atoms) in substance.Formula.Atoms)
            {
                moles[element] = moles.GetValueOrDefault(element) + (number * atoms);
            }
        }

        return moles;
    }

    private static IEnumerable<string> Metals(Dictionary<string, double> moles) => moles.Keys.Where(element => !Nonmetals.Contains(element)).Order(StringComparer.Ordinal);

    private static string Kind(Substance substance)
    {
        Formula formula = substance.Formula;
        return formula.Of("O") > 0 ? "oxide"
            : formula.Atoms.Count == 1 ? Nonmetals.Contains(formula.Atoms.Keys.First()) ? "element" : "metal"
            : formula.Of("C") > 0 ? "carbide"
            : formula.Of("N") > 0 ? "nitride" : "other";
    }

    private static MetalYield Yield(string metal, double all, ChargeState state)
    {
        double Share(string kind) => state.Condensed.Where(phase => Kind(phase.Substance) == kind).Sum(phase => phase.Moles * phase.Substance.Formula.Of(metal)) / all;
        double gas = state.Gas.Sum(share => share.Fraction * state.GasMoles * share.Substance.Formula.Of(metal)) / all;
        return new MetalYield(metal, Share("metal"), Share("carbide"), Share("nitride"), Share("oxide"), gas);
    }

    private static double? Heat(ChargeRequest request, ChargeState state)
    {
        double heat = 0;
        foreach ((Substance substance, double moles) in request.Charge.Concat(request.Gas))
        {
            if (!substance.TryGibbs(PhysicalConstants.ReferenceKelvin, out _) || !substance.KnowsHeating(PhysicalConstants.ReferenceKelvin))
            {
                return null;
            }

            heat -= moles * substance.At(PhysicalConstants.ReferenceKelvin).Enthalpy;
        }

        foreach ((Substance substance, double moles) in state.Condensed.Select(phase => (phase.Substance, phase.Moles)).Concat(state.Gas.Where(share => share.Fraction > 0).Select(share => (share.Substance, share.Fraction * state.GasMoles))))
        {
            if (!substance.KnowsHeating(state.At.Kelvin))
            {
                return null;
            }

            heat += moles * substance.At(state.At.Kelvin).Enthalpy;
        }

        return heat;
    }

    private static ProductOnset Onset(string product, Pressure total, ChargeRequest request, Dictionary<string, double> moles, ChargeEquilibrium equilibrium)
    {
        double top = Math.Min(HighestKelvin, request.At.Max().Kelvin + 500);
        double? from = null;
        double before = LowestKelvin;
        for (double kelvin = LowestKelvin; kelvin <= top; kelvin += ScanKelvin)
        {
            if (Stands(product, kelvin, total.NaturalLogBar) == true)
            {
                from = kelvin == LowestKelvin ? kelvin : Edge(before, kelvin, at => Stands(product, at, total.NaturalLogBar) != true, 1);
                break;
            }

            before = kelvin;
        }

        double hottest = request.At.Max().Kelvin;
        double? up = null;
        const double step = 1.15;
        double above = Math.Log(100);
        for (double log = above; log > Math.Log(1e-9); log -= step)
        {
            if (Stands(product, hottest, log) == true)
            {
                up = log == above ? null : Math.Exp(Edge(above, log, at => Stands(product, hottest, at) != true, 0.02));
                break;
            }

            above = log;
        }

        return new ProductOnset(product, total.Bar, from, up);

        bool? Stands(string formula, double kelvin, double logBar)
        {
            try
            {
                ChargeState state = equilibrium.Solve(moles, Temperature.FromKelvin(kelvin), Pressure.FromNaturalLogBar(logBar));
                return state.Condensed.Any(phase => phase.Substance.Id == formula);
            }
            catch (NoAnswerException)
            {
                return null;
            }
        }

        static double Edge(double same, double other, Func<double, bool> isSame, double within)
        {
            while (Math.Abs(other - same) > within)
            {
                double middle = 0.5 * (same + other);
                (same, other) = isSame(middle) ? (middle, other) : (same, middle);
            }

            return other;
        }
    }

    private static string Headline(ChargeRequest request, ImmutableArray<ChargePoint> points, ImmutableArray<ProductOnset> onsets)
    {
        ChargePoint last = points[request.At.Length - 1];
        ChargeState state = last.State;
        string place = $"at {state.At} and {state.Total}";
        string phases = state.Condensed.IsEmpty ? "all of it gas" : string.Join(", ", state.Condensed.GroupBy(phase => phase.Name).Select(group => $"{group.Key} {Mass(group.Sum(phase => phase.Kilograms))}").Take(5));
        string gas = state.GasMoles > 0 ? $", gas {Printed.Brief(state.NormalCubicMetres)} Nm3 ({string.Join(", ", state.Gas.Where(share => share.Fraction > 0.01).Take(3).Select(share => $"{share.Substance.Id} {Printed.Fixed(100 * share.Fraction, 0)} %"))})" : "";
        List<string> words = [];
        foreach (MetalYield yield in last.Yields)
        {
            ProductOnset? metal = onsets.FirstOrDefault(onset => onset.Product == yield.Metal);
            string from = metal?.FromKelvin is { } kelvin ? $": {yield.Metal} metal only above {Printed.Fixed(kelvin - 273.15, 0)} C at {state.Total}" : metal is not null ? $": no {yield.Metal} metal up to {Printed.Fixed(Math.Min(HighestKelvin, request.At.Max().Kelvin + 500) - 273.15, 0)} C" : "";
            if (yield.AsCarbide > 0.5 && yield.AsMetal < 0.5)
            {
                words.Add($"{yield.Metal} as carbide, not metal{from}");
            }
            else if (yield.AsNitride > 0.5)
            {
                words.Add($"{yield.Metal} as nitride");
            }
            else if (yield.AsGas > 0.5)
            {
                words.Add($"{Printed.Fixed(100 * yield.AsGas, 0)} % of the {yield.Metal} leaves as gas");
            }
            else if (yield.AsMetal > 0.5)
            {
                words.Add($"{Printed.Fixed(100 * yield.AsMetal, 0)} % of the {yield.Metal} is metal");
            }
            else if (yield.AsOxide is > 0.2 and < 0.95)
            {
                words.Add($"{Printed.Fixed(100 * yield.AsOxide, 0)} % of the {yield.Metal} stays bound in {string.Join(", ", state.Condensed.Where(phase => Kind(phase.Substance) == "oxide" && phase.Substance.Formula.Of(yield.Metal) > 0).Select(phase => phase.Name).Distinct())}");
            }
        }

        string told = words.Count > 0 ? " " + string.Join("; ", words) + "." : "";
        return $"The charge becomes {phases}{gas} {place}.{told}";
    }

    private static string Mass(double kilograms) => kilograms switch { >= 0.1 => Printed.Brief(kilograms) + " kg", _ => Printed.Brief(kilograms * 1000) + " g" };

    private static IEnumerable<string> Notes(ImmutableArray<ChargePoint> points, Dictionary<string, double> moles)
    {
        if (moles.ContainsKey("Si"))
        {
            yield return "silicides have no data: silicon taken up by a metal is not counted";
        }

        string[] without = [.. points.SelectMany(point => point.State.WithoutData).Distinct()];
        if (without.Length > 0)
        {
            yield return $"left out at one temperature or another for want of data there: {string.Join(", ", without.Take(20))}{(without.Length > 20 ? $" and {without.Length - 20} more" : "")}";
        }

        foreach (string reason in points.Select(point => point.State.NoOxygenReason).OfType<string>().Distinct())
        {
            yield return "no oxygen pressure where " + reason;
        }

        if (points.Any(point => point.HeatJoules is null))
        {
            yield return "no heat where a substance's heating between 25 C and the temperature is not known";
        }
    }

    private static ImmutableArray<string> Sources(ImmutableArray<ChargePoint> points, ChargeRequest request, SubstanceDatabase database)
        => [.. points.SelectMany(point => point.State.Condensed.Select(phase => phase.Substance).Concat(point.State.Gas.Where(share => share.Fraction > Trace).Select(share => share.Substance)))
            .Concat(request.Charge.Select(item => item.Substance)).Distinct()
            .SelectMany(substance => substance.Phases.Select(phase => phase.SourceKey)).Distinct().Order(StringComparer.Ordinal).Select(key => database.Sources[key].Text)];
}
