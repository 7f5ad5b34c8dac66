namespace RedoxFurnace.Atmospheres;

/// <summary>A nitride or carbide of a metal at the nitrogen pressure or carbon activity of a gas.</summary>
/// <param name="Formula">The compound with the largest drive, for example <c>Cr2N</c>.</param>
/// <param name="Reaction">Per mole of N2 or C.</param>
/// <param name="Driving">J per mole of N2 or C; positive where it forms.</param>
/// <param name="Uncertainty">Expanded (k = 2), J per mole of N2 or C.</param>
/// <param name="Forms">True, false, or null where the drive is smaller than its uncertainty.</param>
public sealed record CompoundInGas(string Formula, string Reaction, double Driving, double Uncertainty, bool? Forms);
