using System.Collections.Frozen;

namespace RedoxFurnace.Safety;

/// <summary>The circumstances a safety rule may ask for. A rules file with any other tag does not load.</summary>
public static class HazardTags
{
    /// <summary>A reactive metal stands against an oxide: derived.</summary>
    public const string Thermite = "thermite";

    /// <summary>A reactive metal is handled as powder, granules or turnings: derived, or given.</summary>
    public const string Powder = "powder";

    /// <summary>Metal freshly made from its oxide below its melting point, porous and ready to burn: derived.</summary>
    public const string FreshMetal = "fresh-metal";

    /// <summary>A metal is, or may become, liquid: derived.</summary>
    public const string MoltenMetal = "molten-metal";

    /// <summary>A gas that burns is fed or made: derived.</summary>
    public const string FlammableGas = "flammable-gas";

    /// <summary>A gas that displaces air without warning is fed: derived.</summary>
    public const string InertGas = "inert-gas";

    /// <summary>Work under vacuum: derived from the flag.</summary>
    public const string Vacuum = "vacuum";

    /// <summary>The moisture of charge, flux or lining is not known: given.</summary>
    public const string MoistureUnknown = "moisture-unknown";

    /// <summary>The furnace cools with its load: given.</summary>
    public const string Cooling = "cooling";

    /// <summary>A lining or insulation is built, broken out or machined: given.</summary>
    public const string LiningWork = "lining-work";

    /// <summary>Every tag there is.</summary>
    public static IReadOnlySet<string> All { get; } = new[]
    {
        Thermite, Powder, FreshMetal, MoltenMetal, FlammableGas, InertGas, Vacuum, MoistureUnknown, Cooling, LiningWork,
    }.ToFrozenSet(StringComparer.Ordinal);
}
