namespace RedoxFurnace.Atmospheres;

/// <summary>One meaning of a moisture reading.</summary>
/// <param name="Reading">As written.</param>
/// <param name="Meaning">Scale and place, in words.</param>
/// <param name="AtFurnace">The water at furnace pressure.</param>
/// <param name="AtPlace">The same gas at the pressure it was read at; null where that is the furnace's.</param>
public sealed record WaterConversion(string Reading, string Meaning, WaterContent AtFurnace, WaterContent? AtPlace);
