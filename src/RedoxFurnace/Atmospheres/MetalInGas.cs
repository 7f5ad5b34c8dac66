using System.Collections.Immutable;

namespace RedoxFurnace.Atmospheres;

/// <summary>What a gas does to one element of the parts.</summary>
/// <param name="Element">The element with its activity.</param>
/// <param name="Oxide">The oxide that forms first, or null without data.</param>
/// <param name="Reaction">Its couple, per mole of O2.</param>
/// <param name="Margin">Couple less gas, J per mole of O2: positive where the metal stays bright; null where there is no verdict.</param>
/// <param name="Uncertainty">Expanded (k = 2), J per mole of O2.</param>
/// <param name="Verdict">Bright, borderline, oxidises or not decidable.</param>
/// <param name="LimitLogOxygen">ln(pO2/bar) at which metal and oxide coexist; null without data.</param>
/// <param name="LimitWater">Water at the limit with the hydrogen of this gas; null without hydrogen or where it would pass the total pressure.</param>
/// <param name="OxidisesBelowKelvin">On cooling in the same gas, the temperature below which it oxidises, K; null where it does not down to 300 K, or oxidises already.</param>
/// <param name="BrightAboveKelvin">Where it oxidises now, the temperature above which the same gas would leave it bright, K; null where there is none in the data.</param>
/// <param name="Nitride">At the nitrogen pressure of the gas, or null without nitrogen or data.</param>
/// <param name="Carbide">At the carbon activity of the gas, or null without carbon or data.</param>
/// <param name="Notes">Warnings of its own.</param>
public sealed record MetalInGas(
    AlloyElement Element,
    string? Oxide,
    string? Reaction,
    double? Margin,
    double? Uncertainty,
    BrightVerdict Verdict,
    double? LimitLogOxygen,
    WaterContent? LimitWater,
    double? OxidisesBelowKelvin,
    double? BrightAboveKelvin,
    CompoundInGas? Nitride,
    CompoundInGas? Carbide,
    ImmutableArray<string> Notes);
