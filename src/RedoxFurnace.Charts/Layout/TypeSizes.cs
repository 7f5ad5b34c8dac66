using RedoxFurnace.Charts.Plans;

namespace RedoxFurnace.Charts.Layout;

/// <summary>The three sizes of the one type family, mm: never below 6 points.</summary>
internal sealed record TypeSizes(double Title, double Label, double Small)
{
    private const double SixPoints = 6 * 25.4 / 72;

    public static TypeSizes For(PageSize page)
    {
        double scale = Math.Sqrt(page.Width * page.Height / (297.0 * 210.0));
        return new TypeSizes(Math.Max(3.4, 4.4 * scale), Math.Max(2.4, 2.9 * scale), Math.Max(SixPoints, 2.25 * scale));
    }
}
