namespace RedoxFurnace.Atmospheres;

/// <summary>A range of temperature in which a gas kept as analysed has a carbon activity above 1.</summary>
/// <param name="LowKelvin">K.</param>
/// <param name="HighKelvin">K.</param>
/// <param name="LowIsOpen">Whether it reaches down to the end of the search.</param>
/// <param name="HighIsOpen">Whether it reaches up to the end of the search.</param>
public sealed record CarbonRange(double LowKelvin, double HighKelvin, bool LowIsOpen, bool HighIsOpen);
