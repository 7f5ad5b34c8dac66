using RedoxFurnace.Safety;

namespace RedoxFurnace.Tests.Safety;

/// <summary>For each rule a piece of work it must speak in, and one close by in which it must not.</summary>
internal static class SafetySamples
{
    private static readonly Dictionary<string, (HazardWork Fitting, HazardWork Plain)> Samples = new()
    {
        ["carbon-monoxide"] = (Reduce("SnO2", "C"), Reduce("SnO2", "H2")),
        ["hydrogen"] = (Reduce("SnO2", "H2"), Reduce("SnO2", "CO")),
        ["methane"] = (Reduce("SnO2", "CH4"), Reduce("SnO2", "H2")),
        ["ammonia"] = (InGas("NH3"), InGas("N2")),
        ["flammable-gas-furnace-entry"] = (InGas("H2"), InGas("Ar")),
        ["vacuum-with-hydrogen"] = (InGas("H2") with { Vacuum = true }, InGas("H2")),
        ["asphyxiation-inert-gas"] = (InGas("Ar"), InGas("H2")),
        ["confined-space-oxygen"] = (InGas("N2"), InGas("H2O")),
        ["thermite-mixture"] = (Reduce("Cr2O3", "Al"), Reduce("Cr2O3", "H2")),
        ["metal-powder"] = (Reduce("WO3", "Mg"), Reduce("WO3", "H2")),
        ["fresh-metal-powder"] = (Reduce("WO3", "H2"), InGas("H2")),
        ["direct-reduced-iron"] = (Reduce("Fe2O3", "H2"), Reduce("WO3", "H2")),
        ["molten-metal-and-moisture"] = (Make("Cu", 1400), Make("Cu", 1300)),
        ["moisture-unknown"] = (InGas("Ar") with { Tags = [HazardTags.MoistureUnknown] }, InGas("Ar")),
        ["magnesium-vapour"] = (Make("Mg(g)", 600), Make("Mg", 600)),
        ["alkali-metal-vapour"] = (Make("Na(g)", 1200), Make("Zn(g)", 1200)),
        ["metal-fire-gases"] = (Reduce("TiO2", "Mg") with { Gases = ["N2"] }, Reduce("TiO2", "Mg") with { Gases = ["Ar"] }),
        ["carbides-with-water"] = (Make("CaC2", 2200), Make("Cr3C2", 2200)),
        ["wet-ferrosilicon"] = (Reduce("MgO", "FeSi75"), Reduce("MgO", "Si")),
        ["nickel-carbonyl"] = (Reduce("NiO", "CO"), Reduce("NiO", "H2")),
        ["nickel-compounds"] = (Reduce("NiO", "H2"), Reduce("SnO2", "CO")),
        ["chromium-six"] = (Make("Cr", 1500), Make("Cu", 1500)),
        ["lead"] = (Make("PbO", 900), Make("SnO", 900)),
        ["cadmium"] = (Make("CdO", 900), Make("CaO", 900)),
        ["beryllium"] = (Make("BeO", 900), Make("B2O3", 900)),
        ["arsenic"] = (Make("As2O3", 900), Make("Ag2O", 900)),
        ["mercury"] = (Make("HgO", 700), Make("HfO2", 700)),
        ["fluorspar-with-moisture"] = (Make("CaF2", 1500), Make("FeO", 1500)),
        ["vanadium-pentoxide"] = (Make("V2O3", 1500), Make("WO2", 1500)),
        ["manganese-fume"] = (Make("MnO", 1700), Make("MgO", 1700)),
        ["zinc-fume"] = (Make("Zn(g)", 1300), Make("ZrO2", 1300)),
        ["cobalt"] = (Make("CoO", 1300), Make("CO", 1300)),
        ["crystalline-silica"] = (Reduce("SiO2", "C"), Reduce("Cr2O3", "Si")),
        ["thorium"] = (Make("ThO2", 1300), Make("TiO2", 1300)),
        ["refractory-dust"] = (InGas("Ar") with { Tags = [HazardTags.LiningWork] }, InGas("Ar")),
    };

    public static IEnumerable<string> Ids => Samples.Keys;

    public static (HazardWork Fitting, HazardWork Plain) For(string id) => Samples.TryGetValue(id, out var pair)
        ? pair
        : throw new InvalidOperationException($"rule '{id}' has no sample: give it a piece of work it fits and one it does not.");

    private static HazardWork Reduce(string oxide, string reductant) =>
        new() { Charge = [oxide], Reductants = [reductant], LowestKelvin = 298, HighestKelvin = 1200 };

    private static HazardWork Make(string product, double highestKelvin) =>
        new() { Products = [product], LowestKelvin = 298, HighestKelvin = highestKelvin };

    private static HazardWork InGas(string gas) => new() { Gases = [gas], LowestKelvin = 298, HighestKelvin = 1200 };
}
