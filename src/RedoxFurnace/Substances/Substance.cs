using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Substances;

/// <summary>A pure substance with the phases the database knows; at each temperature it is the phase of lowest Gibbs energy among those whose range holds the temperature.</summary>
/// <remarks>Identified by <see cref="Id"/>. A vapour such as <c>Mg(g)</c> is a substance of its own.</remarks>
public sealed class Substance
{
    private readonly double[] _lows;
    private readonly double[] _highs;
    private readonly PhaseModel[] _models;
    private readonly Phase[] _phaseOfModel;

    internal Substance(
        Formula formula,
        string? name,
        ImmutableArray<string> otherNames,
        SubstanceClass kind,
        string? group,
        ExpandedUncertainty uncertainty,
        Assessment? assessment,
        ImmutableArray<Phase> phases,
        bool isFromOverlay,
        SourceMark at)
    {
        Formula = formula;
        Name = name;
        OtherNames = otherNames;
        Class = kind;
        Group = group;
        Uncertainty = uncertainty;
        Assessment = assessment;
        Phases = phases;
        IsFromOverlay = isFromOverlay;
        EntryMark = at;
        var all = phases.SelectMany(phase => phase.Models.Select(model => (phase, model))).OrderBy(pair => pair.model.Range.LowKelvin).ToArray();
        _lows = [.. all.Select(pair => pair.model.Range.LowKelvin)];
        _highs = [.. all.Select(pair => pair.model.Range.HighKelvin)];
        _models = [.. all.Select(pair => pair.model)];
        _phaseOfModel = [.. all.Select(pair => pair.phase)];
        LowestKelvin = _lows.Min();
        HighestKelvin = _highs.Max();
        Breaks = [.. _lows.Concat(_highs).Distinct().Order()];
    }

    /// <summary>The formula text, unique in a database.</summary>
    public string Id => Formula.Text;

    /// <summary>Formula.</summary>
    public Formula Formula { get; }

    /// <summary>Mineral or trade name, or null.</summary>
    public string? Name { get; }

    /// <summary>Further names accepted in requests.</summary>
    public ImmutableArray<string> OtherNames { get; }

    /// <summary>Kind of substance.</summary>
    public SubstanceClass Class { get; }

    /// <summary>Name of the one phase this substance is a member of (wustite), or null.</summary>
    public string? Group { get; }

    /// <summary>Expanded uncertainty (k = 2) at 298.15 K.</summary>
    public ExpandedUncertainty Uncertainty { get; }

    /// <summary>What an assessment did, or null.</summary>
    public Assessment? Assessment { get; }

    /// <summary>Phases in the order of the file.</summary>
    public ImmutableArray<Phase> Phases { get; }

    /// <summary>Whether the entry came from a user's own folder.</summary>
    public bool IsFromOverlay { get; }

    /// <summary>Where the entry stands.</summary>
    public SourceMark EntryMark { get; }

    /// <summary>Lowest temperature with data, K.</summary>
    public double LowestKelvin { get; }

    /// <summary>Highest temperature with data, K.</summary>
    public double HighestKelvin { get; }

    /// <summary>Whether the substance is a gas.</summary>
    public bool IsGas => Phases[0].State == MatterState.Gas;

    /// <summary>Temperatures at which a piece of data starts or ends, K, rising.</summary>
    public ImmutableArray<double> Breaks { get; }

    /// <summary>Apparent Gibbs energy of the stable phase, or no.</summary>
    /// <param name="kelvin">K.</param>
    /// <param name="gibbs">J/mol.</param>
    /// <returns>Whether there are data at the temperature.</returns>
    public bool TryGibbs(double kelvin, out double gibbs)
    {
        gibbs = double.PositiveInfinity;
        double[] lows = _lows;
        for (int i = 0; i < lows.Length && lows[i] <= kelvin; i++)
        {
            if (kelvin <= _highs[i])
            {
                double value = _models[i].Gibbs(kelvin);
                if (value < gibbs)
                {
                    gibbs = value;
                }
            }
        }

        return gibbs < double.PositiveInfinity;
    }

    /// <summary>Apparent Gibbs energy of the stable phase.</summary>
    /// <param name="kelvin">Inside the data.</param>
    /// <returns>J/mol.</returns>
    /// <exception cref="OutsideDataException">No data at the temperature.</exception>
    public double Gibbs(double kelvin) => TryGibbs(kelvin, out double gibbs) ? gibbs : throw OutsideDataException.Of(this, kelvin);

    /// <summary>H, S and Cp of the stable phase.</summary>
    /// <param name="kelvin">Inside the data.</param>
    /// <returns>Molar properties.</returns>
    /// <exception cref="OutsideDataException">No data at the temperature.</exception>
    public ThermalState At(double kelvin) => ModelAt(kelvin) is { } found ? found.Model.At(kelvin) : throw OutsideDataException.Of(this, kelvin);

    /// <summary>The stable phase at a temperature, or null without data.</summary>
    /// <param name="kelvin">K.</param>
    /// <returns>Phase or null.</returns>
    public Phase? PhaseAt(double kelvin) => ModelAt(kelvin)?.Phase;

    /// <summary>Whether heating this substance is known at a temperature (false where only a reaction line without heat data stands behind it).</summary>
    /// <param name="kelvin">K.</param>
    /// <returns>True when enthalpy differences between temperatures may be used.</returns>
    public bool KnowsHeating(double kelvin) => ModelAt(kelvin)?.Model.KnowsHeating ?? false;

    /// <summary>Temperatures at which the stable phase changes (transition, melting), K, rising.</summary>
    /// <returns>Temperature with the phase below and the phase above.</returns>
    public IEnumerable<(double Kelvin, Phase Below, Phase Above)> PhaseChanges()
    {
        foreach (double kelvin in Breaks)
        {
            Phase? below = PhaseAt(kelvin * (1 - 1e-12));
            Phase? above = PhaseAt(kelvin * (1 + 1e-12));
            if (below is not null && above is not null && !ReferenceEquals(below, above))
            {
                yield return (kelvin, below, above);
            }
        }
    }

    /// <inheritdoc/>
    public override string ToString() => Id;

    internal (PhaseModel Model, Phase Phase)? ModelAt(double kelvin)
    {
        int best = -1;
        double lowest = double.PositiveInfinity;
        for (int i = 0; i < _lows.Length && _lows[i] <= kelvin; i++)
        {
            if (kelvin <= _highs[i])
            {
                double gibbs = _models[i].Gibbs(kelvin);
                if (gibbs < lowest)
                {
                    (best, lowest) = (i, gibbs);
                }
            }
        }

        return best < 0 ? null : (_models[best], _phaseOfModel[best]);
    }
}
