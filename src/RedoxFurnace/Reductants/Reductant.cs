using System.Collections.Immutable;
using RedoxFurnace.Substances;

namespace RedoxFurnace.Reductants;

/// <summary>An entry of <c>reductants.yaml</c>, or any metal of the database named by its symbol.</summary>
/// <param name="Id">As it is named in requests and answers.</param>
/// <param name="Name">In words.</param>
/// <param name="Kind">How it takes up oxygen.</param>
/// <param name="Oxidised">For a gas, what it turns into.</param>
/// <param name="Metal">For a metal or alloy, the element that reacts.</param>
/// <param name="MassFraction">Share of that element by mass, 1 for a pure substance.</param>
/// <param name="JudgedActivities">Activities of the element it is judged at unless one is given; one entry, 1, for a pure substance.</param>
/// <param name="Reactions">For a compound, its reactions per mole of O2.</param>
/// <param name="Note">What a user should know, or null.</param>
public sealed record Reductant(
    string Id,
    string Name,
    ReductantKind Kind,
    string? Oxidised,
    string? Metal,
    double MassFraction,
    ImmutableArray<double> JudgedActivities,
    ImmutableArray<ReactionEquation> Reactions,
    string? Note);
