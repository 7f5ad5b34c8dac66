namespace RedoxFurnace.Substances;

/// <summary>A published source and what was taken from it.</summary>
/// <param name="Key">Short key used by the entries.</param>
/// <param name="Text">The citation in full.</param>
/// <param name="Licence">On what terms the figures stand here.</param>
/// <param name="Taken">What was taken.</param>
/// <param name="Provenance"><c>retrieved</c> (read in the source or its abstract) or <c>memory</c> (recalled).</param>
public sealed record Citation(string Key, string Text, string Licence, string Taken, string Provenance);
