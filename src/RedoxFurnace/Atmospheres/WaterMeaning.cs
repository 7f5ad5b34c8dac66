namespace RedoxFurnace.Atmospheres;

/// <summary>One way a moisture reading can be meant.</summary>
/// <param name="Meaning">In words: scale and place.</param>
/// <param name="Content">The water it stands for, at the pressure of the furnace.</param>
public sealed record WaterMeaning(string Meaning, WaterContent Content);
