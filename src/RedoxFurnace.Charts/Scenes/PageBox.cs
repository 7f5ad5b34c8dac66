namespace RedoxFurnace.Charts.Scenes;

/// <summary>A rectangle on the page, mm.</summary>
/// <param name="Left">mm from the left of the page.</param>
/// <param name="Top">mm from the top of the page.</param>
/// <param name="Width">mm.</param>
/// <param name="Height">mm.</param>
public readonly record struct PageBox(double Left, double Top, double Width, double Height)
{
    /// <summary>Right edge, mm.</summary>
    public double Right => Left + Width;

    /// <summary>Bottom edge, mm.</summary>
    public double Bottom => Top + Height;

    /// <summary>Whether two boxes share more than an edge.</summary>
    /// <param name="other">The other.</param>
    /// <returns>True if they overlap.</returns>
    public bool Overlaps(PageBox other) => Left < other.Right && other.Left < Right && Top < other.Bottom && other.Top < Bottom;

    /// <summary>Whether a point lies inside, edges included.</summary>
    /// <param name="point">The point.</param>
    /// <returns>True if inside.</returns>
    public bool Holds(PagePoint point) => point.X >= Left && point.X <= Right && point.Y >= Top && point.Y <= Bottom;

    /// <summary>The box with a rim added on every side (taken off for a negative one).</summary>
    /// <param name="rim">mm.</param>
    /// <returns>The new box.</returns>
    public PageBox Grown(double rim) => new(Left - rim, Top - rim, Width + (2 * rim), Height + (2 * rim));
}
