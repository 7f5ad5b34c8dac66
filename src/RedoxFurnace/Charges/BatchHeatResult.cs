using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Charges;

/// <summary>What heat a batch gives, and how hot that makes it.</summary>
/// <param name="Request">What was asked.</param>
/// <param name="Kilograms">Mass of the charge, dry.</param>
/// <param name="MetalKilograms">Metal in the products at the adiabatic temperature, condensed.</param>
/// <param name="HeatAtReference">Heat at 25 C, J; + must be supplied.</param>
/// <param name="Adiabatic">Adiabatic temperature, or null with a reason.</param>
/// <param name="AdiabaticReason">Why there is none, or null.</param>
/// <param name="Plateau">A phase change that holds the temperature, with the share of it done; or null.</param>
/// <param name="State">Equilibrium at the adiabatic temperature, or null.</param>
/// <param name="VapourShare">Mass share of the products that is gas.</param>
/// <param name="GasMoles">Moles of gas, a plateau counted by the share of it that is done.</param>
/// <param name="Preheat">Start needed to reach the temperature asked for, or null.</param>
/// <param name="WaterLitresPerKilogram">Steam from the free water at 0 C and 1 atm, litres per kg of charge.</param>
/// <param name="HydrogenLitresPerKilogram">Hydrogen if the metal takes its oxygen, litres per kg of charge.</param>
/// <param name="Verdict"><c>works</c>, <c>does-not-work</c> or <c>not-decidable</c>: whether moisture allows it at all.</param>
/// <param name="Headline">The answer in words.</param>
/// <param name="Ask">Open questions.</param>
/// <param name="Notes">Remarks.</param>
public sealed record BatchHeatResult(
    BatchHeatRequest Request,
    double Kilograms,
    double MetalKilograms,
    double HeatAtReference,
    Temperature? Adiabatic,
    string? AdiabaticReason,
    string? Plateau,
    ChargeState? State,
    double VapourShare,
    double GasMoles,
    Temperature? Preheat,
    double? WaterLitresPerKilogram,
    double? HydrogenLitresPerKilogram,
    string Verdict,
    string Headline,
    ImmutableArray<string> Ask,
    ImmutableArray<string> Notes);
