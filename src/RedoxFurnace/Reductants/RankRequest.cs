using System.Collections.Immutable;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Reductants;

/// <summary>A ranking asked for one oxide at one temperature.</summary>
/// <param name="Oxide">Formula or name of the charge oxide.</param>
/// <param name="Metal">The metal wanted; needed for oxides of two metals.</param>
/// <param name="At">Temperature.</param>
/// <param name="With">Reductants by name; empty for all of the list.</param>
/// <param name="Conditions">Pressures, ratios, activities.</param>
/// <param name="Order">Sorting.</param>
public sealed record RankRequest(string Oxide, string? Metal, Temperature At, ImmutableArray<string> With, RankConditions Conditions, RankOrder Order);
