namespace RedoxFurnace.Atmospheres;

/// <summary>An element of the parts in the furnace.</summary>
/// <param name="Symbol">Element symbol.</param>
/// <param name="MassPercent">Where given by mass, else null.</param>
/// <param name="MoleFraction">Where given by mass, else null.</param>
/// <param name="Activity">Used in the calculation, above 0.</param>
/// <param name="Basis">Where the activity comes from, in words.</param>
public sealed record AlloyElement(string Symbol, double? MassPercent, double? MoleFraction, double Activity, string Basis);
