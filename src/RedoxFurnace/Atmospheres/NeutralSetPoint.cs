namespace RedoxFurnace.Atmospheres;

/// <summary>What the instruments read in a gas that neither carburises nor decarburises a steel.</summary>
/// <param name="CarbonPotential">Of the gas, mass percent carbon in plain iron.</param>
/// <param name="CarbonActivity">Against graphite.</param>
/// <param name="NaturalLogOxygen">ln(pO2/bar).</param>
/// <param name="DioxideShare">Share of CO2, 0 to 1.</param>
/// <param name="Water">Water, at the furnace pressure; null without hydrogen in the gas.</param>
/// <param name="ProbeMillivolts">Of a probe at furnace temperature.</param>
public sealed record NeutralSetPoint(double CarbonPotential, double CarbonActivity, double NaturalLogOxygen, double DioxideShare, WaterContent? Water, double ProbeMillivolts);
