using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Atmospheres;

/// <summary>One gas at one temperature, with what it does to parts and steel.</summary>
/// <param name="Meaning">How an open moisture reading was taken; empty where it is clear.</param>
/// <param name="At">Temperature.</param>
/// <param name="Answer">As analysed and at equilibrium.</param>
/// <param name="Water">Of the gas as analysed; null where it holds none.</param>
/// <param name="ProbeMillivolts">Of a probe in the gas as analysed, null where no oxygen pressure is fixed.</param>
/// <param name="Metals">Most demanding first; empty without parts.</param>
/// <param name="Steel">Carbon, or null without a steel.</param>
public sealed record GasPoint(
    string Meaning,
    Temperature At,
    GasAnswer Answer,
    WaterContent? Water,
    double? ProbeMillivolts,
    ImmutableArray<MetalInGas> Metals,
    SteelInGas? Steel);
