using System.Collections.Immutable;
using RedoxFurnace.Quantities;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Oxidation;

/// <summary>Equilibrium constant, driving force and turning temperatures of one reaction.</summary>
public sealed class ReactionConstants
{
    private const double ScanKelvin = 10;
    private const double FoundWithin = 1e-3;

    private readonly SubstanceDatabase _database;
    private readonly Activities _activities;
    private readonly ImmutableDictionary<string, double> _logPressures;
    private readonly (double Kelvin, double NaturalLogK)? _measured;

    /// <summary>Sets a reaction up.</summary>
    /// <param name="reaction">Balanced.</param>
    /// <param name="database">Data.</param>
    /// <param name="activities">Of condensed phases.</param>
    /// <param name="logPressures">ln(p/bar) of gases by formula; the others stand at 1 bar.</param>
    /// <param name="measured">A measured K (for the reaction as balanced) at a temperature, or null.</param>
    /// <exception cref="RequestException">A pressure of what is no gas of the reaction.</exception>
    /// <exception cref="NoAnswerException">The substances have no temperature in common, or no data at the measured one.</exception>
    public ReactionConstants(Reaction reaction, SubstanceDatabase database, Activities activities, ImmutableDictionary<string, double> logPressures, (double Kelvin, double K)? measured)
    {
        foreach (string name in logPressures.Keys.Where(name => !reaction.Terms.Any(term => term.Substance.Id == name && term.Substance.IsGas)))
        {
            throw new RequestException($"'{name}' is no gas of '{reaction.Text}'; pressures are for {string.Join(", ", reaction.Terms.Where(term => term.Substance.IsGas).Select(term => term.Substance.Id).DefaultIfEmpty("none of its substances"))}");
        }

        Reaction = reaction;
        _database = database;
        _activities = activities;
        _logPressures = logPressures;
        DataRange = (reaction.Terms.Max(term => term.Substance.LowestKelvin), reaction.Terms.Min(term => term.Substance.HighestKelvin));
        if (DataRange.Low >= DataRange.High)
        {
            throw new NoAnswerException($"the substances of '{reaction.Text}' have no temperature in common: {string.Join(", ", reaction.Terms.Select(term => FormattableString.Invariant($"{term.Substance.Id} {term.Substance.LowestKelvin:0}..{term.Substance.HighestKelvin:0} K")))}");
        }

        _measured = measured is { } point ? (point.Kelvin, Math.Log(point.K)) : null;
        Offset = _measured is { } own ? own.NaturalLogK + (reaction.StandardGibbs(own.Kelvin) / (PhysicalConstants.GasConstant * own.Kelvin)) : null;
        Turning = [.. FindTurning()];
    }

    /// <summary>The reaction.</summary>
    public Reaction Reaction { get; }

    /// <summary>Temperatures at which all substances have data, K.</summary>
    public (double Low, double High) DataRange { get; }

    /// <summary>ln of the measured K over the database's K at the measured temperature, or null.</summary>
    public double? Offset { get; }

    /// <summary>Where the driving force changes sign, rising.</summary>
    public ImmutableArray<TurningTemperature> Turning { get; }

    /// <summary>ln of the quotient Q at the given activities and pressures.</summary>
    public double NaturalLogQ => Reaction.Terms.Sum(term => term.Number * (term.Substance.IsGas ? _logPressures.GetValueOrDefault(term.Substance.Id) : _activities.NaturalLog(term.Substance)));

    /// <summary>Everything at one temperature.</summary>
    /// <param name="kelvin">K.</param>
    /// <returns>A row, without values where a substance has no data.</returns>
    public ConstantRow At(double kelvin)
    {
        double log10Q = NaturalLogQ / Math.Log(10);
        if (Reaction.Terms.Select(term => term.Substance).FirstOrDefault(substance => !substance.TryGibbs(kelvin, out _)) is { } missing)
        {
            return new ConstantRow(kelvin, null, null, null, null, null, null, null, null, log10Q, null, null, OutsideDataException.Describe(missing, kelvin));
        }

        double rt = PhysicalConstants.GasConstant * kelvin;
        double gibbs = Reaction.StandardGibbs(kelvin);
        double expanded = ReactionUncertainty.OfGibbs(Reaction, kelvin, _database.Covariance);
        return new ConstantRow(
            kelvin,
            gibbs,
            expanded,
            Reaction.Enthalpy(kelvin),
            ReactionUncertainty.OfEnthalpy(Reaction, kelvin),
            Reaction.Entropy(kelvin),
            ReactionUncertainty.OfEntropy(Reaction, kelvin, _database.Covariance),
            -gibbs / rt / Math.Log(10),
            expanded / rt / Math.Log(10),
            log10Q,
            Driving(kelvin),
            Offset is { } offset ? (offset - (gibbs / rt)) / Math.Log(10) : null,
            null);
    }

    private double? Driving(double kelvin)
        => Reaction.HasData(kelvin) ? -Reaction.StandardGibbs(kelvin) - (PhysicalConstants.GasConstant * kelvin * NaturalLogQ) : null;

    private IEnumerable<TurningTemperature> FindTurning()
    {
        SortedSet<double> grid = [DataRange.Low, DataRange.High, .. Reaction.Terms.SelectMany(term => term.Substance.Breaks).Where(kelvin => kelvin > DataRange.Low && kelvin < DataRange.High)];
        for (double kelvin = DataRange.Low; kelvin < DataRange.High; kelvin += ScanKelvin)
        {
            grid.Add(kelvin);
        }

        (double Kelvin, double Driving)? before = null;
        foreach (double kelvin in grid)
        {
            if (Driving(kelvin) is not { } here)
            {
                before = null;
                continue;
            }

            if (before is { } last && (last.Driving > 0) != (here > 0))
            {
                double low = last.Kelvin, high = kelvin;
                while (high - low > FoundWithin)
                {
                    double middle = (low + high) / 2;
                    (low, high) = Driving(middle) > 0 == last.Driving > 0 ? (middle, high) : (low, middle);
                }

                double slope = Math.Abs((here - last.Driving) / (kelvin - last.Kelvin));
                yield return new TurningTemperature((low + high) / 2, here > 0, slope > 0 ? ReactionUncertainty.OfGibbs(Reaction, low, _database.Covariance) / slope : null);
            }

            before = (kelvin, here);
        }
    }
}
