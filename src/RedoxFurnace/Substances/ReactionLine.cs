namespace RedoxFurnace.Substances;

/// <summary>A reaction given directly as dG = A + B T, which defines the Gibbs energy of its one substance without data of its own.</summary>
/// <remarks>THEORY.md, section 2. H and S follow with dH = A and dS = -B. Partners are found in the database when first needed.</remarks>
internal sealed class ReactionLine(TemperatureRange range, string reaction, double a, double b, double coefficient, double expandedUncertainty, Func<IReadOnlyList<LinePartner>> partners)
    : PhaseModel(range)
{
    private readonly Lazy<IReadOnlyList<LinePartner>> _partners = new(partners);

    /// <summary>The reaction as written.</summary>
    public string Reaction { get; } = reaction;

    public IReadOnlyList<LinePartner> Partners => _partners.Value;

    public override bool KnowsHeating => Partners.All(partner => partner.Substance.Phases.All(phase => phase.Models.All(model => model is not AnchorModel)));

    public override double? ExpandedUncertaintyOfLine => expandedUncertainty / Math.Abs(coefficient);

    public override double Gibbs(double kelvin)
    {
        double sum = (a + (b * kelvin)) / coefficient;
        foreach (LinePartner partner in Partners)
        {
            sum += partner.Weight * partner.Substance.Gibbs(kelvin);
        }

        return sum;
    }

    public override ThermalState At(double kelvin)
    {
        double enthalpy = a / coefficient;
        double entropy = -b / coefficient;
        double heatCapacity = 0;
        foreach (LinePartner partner in Partners)
        {
            ThermalState state = partner.Substance.At(kelvin);
            enthalpy += partner.Weight * state.Enthalpy;
            entropy += partner.Weight * state.Entropy;
            heatCapacity += partner.Weight * state.HeatCapacity;
        }

        return new ThermalState(enthalpy, entropy, heatCapacity, kelvin);
    }
}
