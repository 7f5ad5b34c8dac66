namespace RedoxFurnace.Substances;

/// <summary>A partner in a reaction line, weighed per mole of the substance the line defines.</summary>
/// <param name="Substance">The partner.</param>
/// <param name="Weight">Its stoichiometric number, signed, so that G(target) = line/n + sum of weight x G(partner).</param>
internal sealed record LinePartner(Substance Substance, double Weight);
