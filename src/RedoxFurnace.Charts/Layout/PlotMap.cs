using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Charts.Scenes;

namespace RedoxFurnace.Charts.Layout;

/// <summary>The only bridge between data and page.</summary>
internal sealed record PlotMap(PageBox Plot, double XLow, double XHigh, double YLow, double YHigh)
{
    public double X(double data) => Plot.Left + ((data - XLow) / (XHigh - XLow) * Plot.Width);

    public double Y(double data) => Plot.Bottom - ((data - YLow) / (YHigh - YLow) * Plot.Height);

    public PagePoint At(DataPoint point) => new(X(point.X), Y(point.Y));

    public double DataX(double page) => XLow + ((page - Plot.Left) / Plot.Width * (XHigh - XLow));

    public double DataY(double page) => YLow + ((Plot.Bottom - page) / Plot.Height * (YHigh - YLow));
}
