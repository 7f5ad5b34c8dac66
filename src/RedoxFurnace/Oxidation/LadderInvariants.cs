using System.Collections.Immutable;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>Finds the temperatures at which the rungs of a ladder change.</summary>
public static class LadderInvariants
{
    private const double ScanKelvin = 5;
    private const double FoundWithin = 0.004;

    /// <summary>All changes of the rungs between two temperatures, by bisection to 0.01 K.</summary>
    /// <param name="system">The system.</param>
    /// <param name="lowKelvin">K, inside the metal's data.</param>
    /// <param name="highKelvin">K, above the low end.</param>
    /// <param name="vapourLogPressure">ln(p/bar) of metal vapour.</param>
    /// <returns>By rising temperature.</returns>
    public static ImmutableArray<LadderInvariant> Between(OxideSystem system, double lowKelvin, double highKelvin, double? vapourLogPressure = 0)
    {
        List<LadderInvariant> found = [];
        double[] grid = Grid(system, lowKelvin, highKelvin);
        OxideLadder below = system.LadderAt(grid[0], vapourLogPressure);
        for (int i = 1; i < grid.Length; i++)
        {
            OxideLadder above = system.LadderAt(grid[i], vapourLogPressure);
            Search(system, below, above, vapourLogPressure, found);
            below = above;
        }

        return [.. found];
    }

    /// <summary>Scan points; each end of data is straddled, so that it is met as a change of its own.</summary>
    private static double[] Grid(OxideSystem system, double low, double high)
    {
        SortedSet<double> grid = [low, high];
        for (double kelvin = low; kelvin < high; kelvin += ScanKelvin)
        {
            grid.Add(kelvin);
        }

        foreach (double end in system.Oxides.SelectMany(oxide => new[] { oxide.LowestKelvin, oxide.HighestKelvin }))
        {
            foreach (double side in new[] { end - (FoundWithin / 4), end + (FoundWithin / 4) })
            {
                if (side > low && side < high)
                {
                    grid.Add(side);
                }
            }
        }

        return [.. grid];
    }

    private static void Search(OxideSystem system, OxideLadder below, OxideLadder above, double? vapour, List<LadderInvariant> found)
    {
        if (Signature(below) == Signature(above))
        {
            return;
        }

        if (above.Kelvin - below.Kelvin <= FoundWithin)
        {
            Describe(below, above, found);
            return;
        }

        OxideLadder middle = system.LadderAt((below.Kelvin + above.Kelvin) / 2, vapour);
        Search(system, below, middle, vapour, found);
        Search(system, middle, above, vapour, found);
    }

    private static string Signature(OxideLadder ladder) => string.Join("|", ladder.Rungs.Select(rung => rung.Name));

    private static void Describe(OxideLadder below, OxideLadder above, List<LadderInvariant> found)
    {
        double kelvin = (below.Kelvin + above.Kelvin) / 2;
        HashSet<string> lower = [.. below.Rungs.Select(rung => rung.Name)];
        HashSet<string> upper = [.. above.Rungs.Select(rung => rung.Name)];
        foreach (LadderRung rung in above.Rungs.Where(rung => !lower.Contains(rung.Name)))
        {
            found.Add(Change(kelvin, rung, above, below, joins: true));
        }

        foreach (LadderRung rung in below.Rungs.Where(rung => !upper.Contains(rung.Name)))
        {
            LadderInvariant change = Change(kelvin, rung, below, above, joins: false);
            if (change.Change != LadderChange.Boiling)
            {
                found.Add(change);
            }
        }
    }

    private static LadderInvariant Change(double kelvin, LadderRung rung, OxideLadder with, OxideLadder without, bool joins)
    {
        int at = with.Rungs.IndexOf(rung);
        if (at == 0)
        {
            string metal = rung.Lowest.Id;
            return new LadderInvariant(kelvin, LadderChange.Boiling, rung.Name, joins, $"{without.Rungs[0].Lowest.Id} = {metal}");
        }

        bool dataEnd = rung.Lowest.Parts.Any(part => without.WithoutData.Contains(part.Substance));
        if (dataEnd)
        {
            return new LadderInvariant(kelvin, LadderChange.DataEnd, rung.Name, joins, $"data of {rung.Name} {(joins ? "start" : "end")} here");
        }

        return new LadderInvariant(kelvin, LadderChange.Invariant, rung.Name, joins, ThreePhases(with, at, joins));
    }

    /// <summary>The phase against its two neighbours: middle = lower + upper, balanced in metal and oxygen.</summary>
    private static string ThreePhases(OxideLadder ladder, int at, bool joins)
    {
        Assemblage middle = ladder.Rungs[at].Lowest;
        Assemblage lower = ladder.Rungs[at - 1].Highest;
        if (at + 1 >= ladder.Rungs.Length)
        {
            return joins ? $"{middle.Id} appears above {lower.Id}" : $"{middle.Id} gives way to {lower.Id}";
        }

        Assemblage upper = ladder.Rungs[at + 1].Lowest;
        double share = (middle.Oxygen - lower.Oxygen) / (upper.Oxygen - lower.Oxygen);
        Reaction decomposition = Reaction.Of(
            middle.Parts.Select(part => (part.Substance, -part.Amount))
                .Concat(lower.Parts.Select(part => (part.Substance, part.Amount * (1 - share))))
                .Concat(upper.Parts.Select(part => (part.Substance, part.Amount * share))));
        double scale = 1 / decomposition.Terms.Where(term => term.Number < 0).Select(term => -term.Number).DefaultIfEmpty(1).First();
        return decomposition.Times(joins ? -scale : scale).Text;
    }
}
