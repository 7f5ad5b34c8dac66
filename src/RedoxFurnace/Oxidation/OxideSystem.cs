using System.Collections.Concurrent;
using System.Collections.Immutable;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>One metal, or several in fixed proportions, with every condensed oxide the database has of them.</summary>
/// <remarks>The ladder at a temperature is the lower convex hull of Gibbs energy against oxygen content (THEORY.md, section 4).</remarks>
public sealed class OxideSystem
{
    private const double HullTolerance = 1e-9;

    private readonly ImmutableArray<(string Element, double Amount)> _metals;
    private readonly Activities _activities;
    private readonly ConcurrentDictionary<Substance, Assemblage> _single = new();

    private OxideSystem(ImmutableArray<(string Element, double Amount)> metals, ImmutableArray<Substance> elements, ImmutableArray<Substance?> vapours, ImmutableArray<Substance> oxides, Substance oxygen, Activities activities)
    {
        _metals = metals;
        Elements = elements;
        Vapours = vapours;
        Oxides = oxides;
        Oxygen = oxygen;
        _activities = activities;
    }

    /// <summary>The condensed metals.</summary>
    public ImmutableArray<Substance> Elements { get; }

    /// <summary>Their vapours, null where the database has none.</summary>
    public ImmutableArray<Substance?> Vapours { get; }

    /// <summary>All condensed oxides considered.</summary>
    public ImmutableArray<Substance> Oxides { get; }

    /// <summary>O2.</summary>
    public Substance Oxygen { get; }

    /// <summary>The activities of condensed phases.</summary>
    public Activities Activities => _activities;

    /// <summary>The system of one metal, one mole of it.</summary>
    /// <param name="element">Symbol.</param>
    /// <param name="database">Data.</param>
    /// <param name="activities">Of condensed phases.</param>
    /// <returns>The system.</returns>
    /// <exception cref="RequestException">No such metal, or no oxide of it.</exception>
    public static OxideSystem OfMetal(string element, SubstanceDatabase database, Activities activities)
    {
        IReadOnlyList<Substance> oxides = database.OxidesOf(element);
        return oxides.Count > 0
            ? new OxideSystem([(element, 1)], [Metal(element, database)], [database.Vapour(element)], [.. oxides], database.Get("O2"), activities)
            : throw new RequestException($"'{element}' has no condensed oxide in the database; 'oxides list' shows what there is");
    }

    /// <summary>The system of the metals of an oxide, in the proportions of its formula.</summary>
    /// <param name="oxide">A simple or compound oxide.</param>
    /// <param name="database">Data.</param>
    /// <param name="activities">Of condensed phases.</param>
    /// <returns>The system; its unit is one formula of the oxide, or one mole of metal for a simple oxide.</returns>
    /// <exception cref="RequestException">Not an oxide.</exception>
    public static OxideSystem OfOxide(Substance oxide, SubstanceDatabase database, Activities activities)
    {
        if (oxide.Formula.Of("O") <= 0 || oxide.Formula.Atoms.Count < 2)
        {
            throw new RequestException($"'{oxide.Id}' is not an oxide; give an oxide such as Cr2O3");
        }

        ImmutableArray<string> metals = [.. oxide.Formula.Atoms.Keys.Where(element => element != "O")];
        if (metals.Length == 1)
        {
            return OfMetal(metals[0], database, activities);
        }

        HashSet<string> elements = [.. metals, "O"];
        return new OxideSystem(
            [.. metals.Select(metal => (metal, oxide.Formula.Of(metal)))],
            [.. metals.Select(metal => Metal(metal, database))],
            [.. metals.Select(database.Vapour)],
            [.. database.MadeOf(elements).Where(substance => !substance.IsGas && substance.Formula.Of("O") > 0)],
            database.Get("O2"),
            activities);
    }

    /// <summary>The ladder at a temperature.</summary>
    /// <param name="kelvin">K.</param>
    /// <param name="vapourLogPressure">ln(p/bar) at which metal vapours compete with the condensed metal; null leaves vapours out.</param>
    /// <param name="boundElement">An element whose metal is bound in another phase (a carbide), or null.</param>
    /// <param name="boundGibbs">Gibbs energy of binding, J per mole of that element, below 0.</param>
    /// <returns>Stable rungs from the metal upwards.</returns>
    /// <exception cref="OutsideDataException">A metal has no data at the temperature.</exception>
    public OxideLadder LadderAt(double kelvin, double? vapourLogPressure = 0, string? boundElement = null, double boundGibbs = 0)
    {
        List<Candidate> candidates = CandidatesAt(kelvin, vapourLogPressure, boundElement, boundGibbs, out ImmutableArray<Substance> withoutData);
        List<Vertex> vertices = _metals.Length == 1 ? SingleMetal(candidates) : SeveralMetals(candidates);
        List<Vertex> hull = LowerHull(vertices);
        return OxideLadder.Build(kelvin, [.. hull.Select(vertex => (vertex.Assemblage, vertex.Gibbs))], Oxides, withoutData, Oxygen);
    }

    private static Substance Metal(string element, SubstanceDatabase database)
        => database.Metal(element) ?? throw new RequestException($"'{element}' has no condensed metal in the database; 'oxides list' shows what there is");

    private List<Candidate> CandidatesAt(double kelvin, double? vapourLogPressure, string? boundElement, double boundGibbs, out ImmutableArray<Substance> withoutData)
    {
        double rt = PhysicalConstants.GasConstant * kelvin;
        List<Candidate> candidates = new(Oxides.Length + 2);
        for (int i = 0; i < _metals.Length; i++)
        {
            Candidate metal = MetalAt(i, kelvin, rt, vapourLogPressure);
            candidates.Add(_metals[i].Element == boundElement ? metal with { Gibbs = metal.Gibbs + boundGibbs } : metal);
        }

        List<Substance>? missing = null;
        foreach (Substance oxide in Oxides)
        {
            if (oxide.TryGibbs(kelvin, out double gibbs))
            {
                candidates.Add(new Candidate(oxide, gibbs + (rt * _activities.NaturalLog(oxide))));
            }
            else
            {
                (missing ??= []).Add(oxide);
            }
        }

        withoutData = missing is null ? [] : [.. missing];
        return candidates;
    }

    private Candidate MetalAt(int index, double kelvin, double rt, double? vapourLogPressure)
    {
        Substance metal = Elements[index];
        bool hasCondensed = metal.TryGibbs(kelvin, out double condensed);
        double condensedTotal = hasCondensed ? condensed + (rt * _activities.NaturalLog(metal)) : double.PositiveInfinity;
        if (vapourLogPressure is { } log && Vapours[index] is { } vapour && vapour.TryGibbs(kelvin, out double gas) && gas + (rt * log) < condensedTotal)
        {
            return new Candidate(vapour, gas + (rt * log));
        }

        return hasCondensed ? new Candidate(metal, condensedTotal) : throw OutsideDataException.Of(metal, kelvin);
    }

    private List<Vertex> SingleMetal(List<Candidate> candidates)
    {
        string element = _metals[0].Element;
        List<Vertex> vertices = new(candidates.Count);
        foreach (Candidate candidate in candidates)
        {
            Assemblage assemblage = _single.GetOrAdd(candidate.Substance, substance => new Assemblage([(substance, 1 / substance.Formula.Of(element))]));
            vertices.Add(new Vertex(assemblage.Oxygen, candidate.Gibbs * assemblage.Parts[0].Amount, assemblage));
        }

        return vertices;
    }

    /// <summary>Every set of as many phases as there are metals that holds them in proportion, without negative amounts.</summary>
    private List<Vertex> SeveralMetals(List<Candidate> candidates)
    {
        List<Vertex> vertices = [];
        int[] chosen = new int[_metals.Length];
        Choose(0, 0);
        return vertices;

        void Choose(int depth, int from)
        {
            if (depth == chosen.Length)
            {
                if (TrySolve([.. chosen.Select(i => candidates[i])]) is { } vertex)
                {
                    vertices.Add(vertex);
                }

                return;
            }

            for (int i = from; i < candidates.Count; i++)
            {
                chosen[depth] = i;
                Choose(depth + 1, i + 1);
            }
        }
    }

    private Vertex? TrySolve(Candidate[] phases)
    {
        int n = _metals.Length;
        double[,] matrix = new double[n, n + 1];
        for (int row = 0; row < n; row++)
        {
            for (int column = 0; column < n; column++)
            {
                matrix[row, column] = phases[column].Substance.Formula.Of(_metals[row].Element);
            }

            matrix[row, n] = _metals[row].Amount;
        }

        if (SmallLinearSystem.TrySolve(matrix) is not { } amounts || amounts.Any(amount => amount < -1e-10))
        {
            return null;
        }

        ImmutableArray<(Substance Substance, double Amount)> parts =
            [.. phases.Select((phase, i) => (phase.Substance, amounts[i])).Where(part => part.Item2 > 1e-10)];
        double gibbs = phases.Select((phase, i) => phase.Gibbs * amounts[i]).Sum();
        Assemblage assemblage = new(parts);
        return new Vertex(assemblage.Oxygen, gibbs, assemblage);
    }

    private static List<Vertex> LowerHull(List<Vertex> vertices)
    {
        vertices.Sort((a, b) => a.Oxygen != b.Oxygen ? a.Oxygen.CompareTo(b.Oxygen) : a.Gibbs.CompareTo(b.Gibbs));
        List<Vertex> hull = new(vertices.Count);
        foreach (Vertex vertex in vertices)
        {
            if (hull.Count > 0 && vertex.Oxygen - hull[^1].Oxygen < HullTolerance)
            {
                continue;
            }

            while (hull.Count >= 2 && LiesOnOrAbove(hull[^2], hull[^1], vertex))
            {
                hull.RemoveAt(hull.Count - 1);
            }

            hull.Add(vertex);
        }

        return hull;
    }

    private static bool LiesOnOrAbove(Vertex left, Vertex middle, Vertex right)
    {
        double along = (right.Gibbs - left.Gibbs) * (middle.Oxygen - left.Oxygen);
        double own = (middle.Gibbs - left.Gibbs) * (right.Oxygen - left.Oxygen);
        return own >= along - HullTolerance;
    }

    private readonly record struct Candidate(Substance Substance, double Gibbs);

    private readonly record struct Vertex(double Oxygen, double Gibbs, Assemblage Assemblage);
}
