using System.Collections.Immutable;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Assessments;

/// <summary>One measured oxygen potential, gas ratio, temperature or heat of a couple.</summary>
/// <param name="Id">Unique name.</param>
/// <param name="Couple">Such as <c>Ni/NiO</c>.</param>
/// <param name="Reactant">Formula of the side poor in oxygen.</param>
/// <param name="Product">Formula of the side rich in oxygen.</param>
/// <param name="Kind">What is stated.</param>
/// <param name="Potential">A, B, C, D of A + BT + C T ln T + D T^2, J/mol O2; empty for a point.</param>
/// <param name="Value">The value of a point, in the unit of its kind.</param>
/// <param name="OxygenBar">pO2 in bar of a temperature at pO2.</param>
/// <param name="Phases">Three formulas of an invariant, by rising oxygen; else empty.</param>
/// <param name="ExpandedError">k = 2, in <paramref name="ErrorUnit"/>, above 0.</param>
/// <param name="ErrorUnit"><c>kJ/mol O2</c>, <c>%</c> or <c>K</c>.</param>
/// <param name="Provenance"><c>retrieved</c> or <c>memory</c>.</param>
/// <param name="Source">Citation.</param>
/// <param name="IsFit">Whether it is weighed; the others are kept out as evidence.</param>
/// <param name="FitKelvin">Temperatures weighed, K.</param>
/// <param name="EvidenceKelvin">Temperatures kept out, K.</param>
/// <param name="Note">Remark, or null.</param>
/// <param name="At">Where it stands.</param>
public sealed record Measurement(
    string Id,
    string Couple,
    string Reactant,
    string Product,
    MeasurementKind Kind,
    ImmutableArray<double> Potential,
    double Value,
    double OxygenBar,
    ImmutableArray<string> Phases,
    double ExpandedError,
    string ErrorUnit,
    string Provenance,
    string Source,
    bool IsFit,
    ImmutableArray<double> FitKelvin,
    ImmutableArray<double> EvidenceKelvin,
    string? Note,
    SourceMark At);
