namespace RedoxFurnace.Charges;

/// <summary>Where a product first appears.</summary>
/// <param name="Product">Formula of a metal, carbide or nitride.</param>
/// <param name="TotalBar">At this total pressure.</param>
/// <param name="FromKelvin">Lowest temperature at which it stands, found to 1 K; null where it never does up to the highest searched.</param>
/// <param name="UpToBar">Highest total pressure at which it still stands at the hottest temperature asked; null where it stands at none or at every one searched.</param>
public sealed record ProductOnset(string Product, double TotalBar, double? FromKelvin, double? UpToBar);
