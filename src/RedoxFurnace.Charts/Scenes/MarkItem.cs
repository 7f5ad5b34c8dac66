namespace RedoxFurnace.Charts.Scenes;

/// <summary>A mark.</summary>
/// <param name="Center">Its middle.</param>
/// <param name="Shape">Its shape.</param>
/// <param name="Size">Across, mm.</param>
/// <param name="Ink">Colour; open shapes are filled with white.</param>
public sealed record MarkItem(PagePoint Center, MarkShape Shape, double Size, Ink Ink) : SceneItem
{
    /// <summary>The square it takes up.</summary>
    public PageBox Box => new(Center.X - (Size / 2), Center.Y - (Size / 2), Size, Size);
}
