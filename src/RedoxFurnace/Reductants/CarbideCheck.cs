namespace RedoxFurnace.Reductants;

/// <summary>What carbon does to the product: the carbide that stands in the way of the metal.</summary>
/// <param name="First">Carbide that forms first beside graphite, for example Cr3C2.</param>
/// <param name="Last">Carbide that coexists with the metal and must be decarburised last, for example Cr23C6.</param>
/// <param name="MetalMargin">Margin for the metal from its last carbide and the oxide, J per mole of O2.</param>
/// <param name="MetalFloorKelvin">Temperature above which that margin is positive, or null where there is none.</param>
/// <param name="CarbideFloorKelvin">Temperature above which oxide and carbon make the first carbide, or null.</param>
/// <param name="Certain">Whether the carbide's stability exceeds its uncertainty.</param>
public sealed record CarbideCheck(string First, string Last, double MetalMargin, double? MetalFloorKelvin, double? CarbideFloorKelvin, bool Certain);
