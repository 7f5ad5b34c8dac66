using System.Collections.Immutable;
using RedoxFurnace.Charts.Plans;
using RedoxFurnace.Charts.Scenes;
using RedoxFurnace.Charts.Writing;
using RedoxFurnace.Quantities;

namespace RedoxFurnace.Charts.Layout;

/// <summary>Lays a plan out on its page: measures, gives everything its place, and hands over a finished scene.</summary>
public static class ChartLayout
{
    /// <summary>The drawing, from the back to the front.</summary>
    private static readonly ImmutableArray<Action<Sheet>> Steps =
    [
        sheet => sheet.Heading(),
        sheet => sheet.Windows(),
        sheet => sheet.Grid(),
        sheet => sheet.Fields(),
        sheet => sheet.Bands(),
        sheet => sheet.Lines(),
        sheet => sheet.Axes(),
        sheet => sheet.Rulers(),
        sheet => sheet.Marks(),
        sheet => sheet.Crossings(),
        sheet => sheet.Labels(),
        sheet => sheet.Foot(),
    ];

    /// <summary>How many labelled lines a page holds without crowding.</summary>
    /// <param name="plan">The plan.</param>
    /// <returns>0 where the page has no room for a plot at all.</returns>
    public static int LinesThatFit(ChartPlan plan)
    {
        Sheet sheet = new(plan);
        return sheet.HasRoom ? Math.Max(1, (int)(sheet.Plot.Height / (sheet.Sizes.Small * 1.45))) : 0;
    }

    /// <summary>Lays a plan out.</summary>
    /// <param name="plan">The plan.</param>
    /// <returns>The scene, the same for the same plan.</returns>
    /// <exception cref="NoAnswerException">The page has no room for the plot.</exception>
    public static Scene Lay(ChartPlan plan)
    {
        ArgumentNullException.ThrowIfNull(plan);
        Sheet sheet = new(plan);
        if (!sheet.HasRoom)
        {
            throw new NoAnswerException(FormattableString.Invariant($"a page of {plan.Page.Width:0.#} x {plan.Page.Height:0.#} mm has no room for this plot beside its caption; take a larger --size, fewer lines, or --frame none"));
        }

        foreach (Action<Sheet> step in Steps)
        {
            step(sheet);
        }

        return sheet.Finish();
    }

    /// <summary>A chart on its page while it is being laid out.</summary>
    private sealed class Sheet
    {
        private const double Margin = 7;
        private const double LeastPlotWidth = 40;
        private const double LeastPlotHeight = 28;
        private const double LeastPlotAboveFlats = 55;
        private const double LeastRulerPitch = 17;
        private const double RulerScaleWidth = 4;
        private const double MarkSize = 2;
        private const double SymbolPitch = 24;
        private const double Rim = 0.3;

        private readonly ChartPlan _plan;
        private readonly PlotMap _map;
        private readonly List<SceneGroup> _groups = [];
        private readonly List<PageBox> _obstacles = [];
        private readonly Dictionary<SeriesPlan, ImmutableArray<ImmutableArray<PagePoint>>> _visible = [];
        private readonly double _columnLeft;
        private readonly List<(IReadOnlyList<(RichText Text, MarkShape? Shape)> Entries, int Columns)> _lists = [];
        private readonly ImmutableArray<string> _caption;
        private readonly double _blockHeight;
        private readonly double _footTop;
        private readonly double _rulerPitch;
        private readonly bool _hasFlats;
        private int _numbered;

        public Sheet(ChartPlan plan)
        {
            _plan = plan;
            Sizes = TypeSizes.For(plan.Page);
            double labels = plan.Series.Where(IsPlacedHere).Select(series => ChartFont.Width(series.Label, LabelSize(series, Sizes.Label))).DefaultIfEmpty(0).Max();
            double left = Margin + (2.6 * Sizes.Label) + plan.Y.Ticks.Select(tick => ChartFont.Width(RichText.Of(tick.Text), Sizes.Label)).DefaultIfEmpty(0).Max();
            _rulerPitch = Math.Max(LeastRulerPitch, plan.Rulers.Select(ruler => ChartFont.Width(ruler.Label, Sizes.Small)).DefaultIfEmpty(0).Max() + 3);
            double right = plan.Page.Width - Margin - (_rulerPitch * plan.Rulers.Length) - (labels > 0 ? labels + 3.5 : 2);
            double top = Margin + Sizes.Title + (plan.Subtitle is null ? 0 : Sizes.Label * 1.5) + (plan.Top is null ? 2.5 : 3.4 * Sizes.Label) + 1;
            _caption = Wrap(plan.Frame.Caption, plan.Frame.Safety, plan.Page.Width - (2 * Margin));
            _blockHeight = plan.Frame.Kind == FrameKind.Document ? BlockRows() * Sizes.Small * 2.9 : 0;
            AddList([.. plan.Key.Select(entry => (RichText.OfChemistry(entry.Text), (MarkShape?)entry.Shape))]);
            AddList(ListedCrossings());
            double foot = (_lists.Sum(list => Rows(list)) * Sizes.Small * 1.45) + (_lists.Count * 1.2)
                + (_caption.Length * Sizes.Small * 1.35) + (_caption.Length > 0 ? 1.5 : 0) + _blockHeight;
            double bottom = plan.Page.Height - Margin - foot - (3.6 * Sizes.Label);
            double flats = FlatRulers(plan) * FlatPitch;
            _hasFlats = flats > 0 && bottom - flats - top >= LeastPlotAboveFlats;
            bottom -= _hasFlats ? flats : 0;
            HasRoom = right - left >= LeastPlotWidth && bottom - top >= LeastPlotHeight;
            Plot = new PageBox(left, top, Math.Max(1, right - left), Math.Max(1, bottom - top));
            _map = new PlotMap(Plot, plan.X.Low, plan.X.High, plan.Y.Low, plan.Y.High);
            _columnLeft = Plot.Right + 2;
            _footTop = Plot.Bottom + (3.6 * Sizes.Label) + (_hasFlats ? flats : 0);
        }

        public TypeSizes Sizes { get; }

        /// <summary>Height of the part of a side scale that runs below the plot.</summary>
        private double FlatPitch => (2.1 * Sizes.Small) + 1.2;

        public PageBox Plot { get; }

        public bool HasRoom { get; }

        public Scene Finish() => new(
            _plan.Page.Width,
            _plan.Page.Height,
            _plan.Title.Plain,
            _plan.Description,
            [.. _groups],
            [.. _plan.Series.Where(series => !series.Points.IsEmpty).Select(Values)],
            _plan.Information);

        public void Heading()
        {
            (RichText title, double size) = FittedTitle();
            List<SceneItem> items = [Text(Margin, Margin + (0.8 * Sizes.Title), title, size, bold: true)];
            if (_plan.Subtitle is { } subtitle)
            {
                items.Add(Text(Margin, Margin + Sizes.Title + (1.3 * Sizes.Label), subtitle, Sizes.Label, Ink.Quiet));
            }

            Add("title", items);
        }

        /// <summary>A long title is set smaller, down to the size of the labels, then cut at a word.</summary>
        private (RichText Title, double Size) FittedTitle()
        {
            double room = _plan.Page.Width - (2 * Margin);
            double size = Math.Clamp(Sizes.Title * room / Math.Max(room, ChartFont.Width(_plan.Title, Sizes.Title, bold: true)), Sizes.Label, Sizes.Title);
            string plain = _plan.Title.Plain;
            RichText title = _plan.Title;
            while (ChartFont.Width(title, size, bold: true) > room && plain.Length > 1)
            {
                int space = plain.LastIndexOf(' ');
                plain = plain[..(space > 0 ? space : plain.Length - 1)];
                title = RichText.OfChemistry(plain + " …");
            }

            return (title, size);
        }

        public void Windows()
        {
            List<SceneItem> items = [];
            foreach (WindowPlan window in _plan.Windows)
            {
                double left = Math.Max(Plot.Left, _map.X(window.Low));
                double right = Math.Min(Plot.Right, _map.X(window.High));
                if (right <= left)
                {
                    continue;
                }

                items.Add(new AreaItem([new(left, Plot.Top), new(right, Plot.Top), new(right, Plot.Bottom), new(left, Plot.Bottom)], Ink.Of("#0072B2").At(0.10)));
                foreach (double edge in new[] { left, right })
                {
                    items.Add(new LineItem([new(edge, Plot.Top), new(edge, Plot.Bottom)], new Stroke(Ink.Of("#0072B2"), 0.18, [1.2, 0.8])));
                }

                RichText words = ChartFont.Width(window.Label, Sizes.Small) < right - left - 1 ? window.Label : window.Narrow;
                double width = ChartFont.Width(words, Sizes.Small);
                double middle = Math.Clamp(0.5 * (left + right), Plot.Left + (width / 2) + 0.5, Plot.Right - (width / 2) - 0.5);
                TextItem label = Text(middle, Plot.Top + (1.2 * Sizes.Small), words, Sizes.Small, Ink.Of("#00568A"), TextAnchor.Middle);
                items.Add(label);
                _obstacles.Add(ChartFont.Box(label).Grown(Rim));
            }

            Add("operating window", items);
        }

        public void Fields()
        {
            foreach (FieldPlan field in _plan.Fields)
            {
                ImmutableArray<PagePoint> area = PolylineClip.Area([.. field.Outline.Select(_map.At)], Plot);
                if (area.Length < 3)
                {
                    continue;
                }

                List<SceneItem> items = [new AreaItem(area, field.Fill)];
                PagePoint at = _map.At(field.LabelAt);
                if (field.Label.Runs.Length > 0 && Plot.Holds(at))
                {
                    TextItem label = Text(at.X, at.Y + (0.35 * Sizes.Label), field.Label, Sizes.Label, Ink.Black, TextAnchor.Middle);
                    PageBox box = ChartFont.Box(label).Grown(Rim);
                    if (!_obstacles.Any(box.Overlaps) && box.Left >= Plot.Left && box.Right <= Plot.Right)
                    {
                        items.Add(label);
                        _obstacles.Add(box);
                    }
                }

                Add(field.Name, items);
            }
        }

        public void Grid()
        {
            Stroke thin = new(Ink.Faint, 0.12);
            Add("grid",
            [
                .. _plan.X.Ticks.Where(tick => tick.Text.Length > 0).Select(tick => _map.X(tick.At)).Where(x => x > Plot.Left + 0.1 && x < Plot.Right - 0.1).Select(x => new LineItem([new(x, Plot.Top), new(x, Plot.Bottom)], thin)),
                .. _plan.Y.Ticks.Where(tick => tick.Text.Length > 0 && !_plan.Y.IsNames).Select(tick => _map.Y(tick.At)).Where(y => y > Plot.Top + 0.1 && y < Plot.Bottom - 0.1).Select(y => new LineItem([new(Plot.Left, y), new(Plot.Right, y)], thin)),
            ]);
        }

        public void Bands()
        {
            foreach (SeriesPlan series in _plan.Series.Where(series => !series.Band.IsEmpty))
            {
                IEnumerable<DataPoint> upper = series.Points.Select((point, i) => new DataPoint(point.X, series.Band[i].High));
                IEnumerable<DataPoint> lower = series.Points.Select((point, i) => new DataPoint(point.X, series.Band[i].Low)).Reverse();
                ImmutableArray<PagePoint> area = PolylineClip.Area([.. upper.Concat(lower).Select(_map.At)], Plot);
                if (area.Length > 2)
                {
                    Add(series.Name + ", uncertainty", [new AreaItem(area, series.Stroke.Ink.At(0.16))]);
                }
            }
        }

        public void Lines()
        {
            foreach (SeriesPlan series in _plan.Series)
            {
                ImmutableArray<ImmutableArray<PagePoint>> pieces = [.. PolylineClip.Inside([.. series.Points.Select(_map.At)], Plot)];
                _visible[series] = pieces;
                List<SceneItem> items = [.. pieces.Select(piece => new LineItem(piece, series.Stroke))];
                if (series.Symbol is { } shape)
                {
                    foreach (PagePoint at in pieces.SelectMany(Spread))
                    {
                        MarkItem mark = new(at, shape, MarkSize, series.Stroke.Ink);
                        items.Add(mark);
                        _obstacles.Add(mark.Box);
                    }
                }

                if (items.Count > 0)
                {
                    Add(series.Name, items);
                }
            }
        }

        public void Axes()
        {
            Stroke axis = new(Ink.Black, 0.2);
            List<SceneItem> items =
            [
                new LineItem([new(Plot.Left, Plot.Top), new(Plot.Left, Plot.Bottom), new(Plot.Right, Plot.Bottom)], axis),
            ];
            double size = Sizes.Label;
            foreach (AxisTick tick in Spaced(_plan.X.Ticks, size))
            {
                double x = _map.X(tick.At);
                items.Add(new LineItem([new(x, Plot.Bottom), new(x, Plot.Bottom + (tick.Text.Length > 0 ? 1.2 : 0.7))], axis));
                items.Add(Text(x, Plot.Bottom + 1.6 + (0.85 * size), RichText.Of(tick.Text), size, anchor: TextAnchor.Middle));
            }

            items.Add(Text(0.5 * (Plot.Left + Plot.Right), Plot.Bottom + 2 + (2.1 * size), _plan.X.Label, size, anchor: TextAnchor.Middle));
            foreach (AxisTick tick in _plan.Y.Ticks)
            {
                double y = _map.Y(tick.At);
                items.Add(new LineItem([new(Plot.Left - (tick.Text.Length > 0 ? 1.2 : 0.7), y), new(Plot.Left, y)], axis));
                items.Add(Text(Plot.Left - 1.7, y + (0.35 * size), RichText.Of(tick.Text), size, anchor: TextAnchor.End));
            }

            double upright = Math.Min(size, size * (Plot.Height + (2 * size)) / ChartFont.Width(_plan.Y.Label, size));
            items.Add(new TextItem(new PagePoint(Margin + (0.8 * size), 0.5 * (Plot.Top + Plot.Bottom)), _plan.Y.Label, upright, TextAnchor.Middle, Ink.Black, false, 90));
            if (_plan.Top is { } top)
            {
                items.Add(new LineItem([new(Plot.Left, Plot.Top), new(Plot.Right, Plot.Top)], axis));
                foreach (AxisTick tick in Spaced(top.Ticks, size))
                {
                    double x = _map.X(tick.At);
                    items.Add(new LineItem([new(x, Plot.Top), new(x, Plot.Top - (tick.Text.Length > 0 ? 1.2 : 0.7))], axis));
                    items.Add(Text(x, Plot.Top - 1.8, RichText.Of(tick.Text), size, anchor: TextAnchor.Middle));
                }

                items.Add(Text(0.5 * (Plot.Left + Plot.Right), Plot.Top - 2.2 - size, top.Label, size, anchor: TextAnchor.Middle));
            }

            Add("axes", items.Where(item => item is not TextItem { Text.Runs.IsEmpty: true }));
        }

        /// <summary>Every second, third... number keeps its text where all would touch; the others stay as small ticks.</summary>
        private IEnumerable<AxisTick> Spaced(ImmutableArray<AxisTick> ticks, double size)
        {
            AxisTick[] written = [.. ticks.Where(tick => tick.Text.Length > 0)];
            int stride = 1;
            while (stride < written.Length && Touch(stride))
            {
                stride++;
            }

            HashSet<double> kept = [.. written.Where((_, i) => i % stride == 0).Select(tick => tick.At)];
            return ticks.Select(tick => kept.Contains(tick.At) ? tick : tick with { Text = "" });

            bool Touch(int every)
            {
                double free = double.NegativeInfinity;
                for (int i = 0; i < written.Length; i += every)
                {
                    double half = ChartFont.Width(written[i].Text, size) / 2;
                    double x = _map.X(written[i].At);
                    if (x - half < free)
                    {
                        return true;
                    }

                    free = x + half + (0.5 * size);
                }

                return false;
            }
        }

        /// <summary>Scales with values whose rays leave the plot at its foot; a scale of frost points has none so dry.</summary>
        private static int FlatRulers(ChartPlan plan) => plan.Rulers.Count(ruler => RunsOn(plan, ruler));

        private static bool RunsOn(ChartPlan plan, RulerPlan ruler) => ruler.Slopes.Any(tick => ruler.Pivot.Y + (tick.Slope * (plan.X.High - ruler.Pivot.X)) < plan.Y.Low);

        /// <summary>
        /// Each side scale runs down beside the plot and on below it, so that the steep rays of strong oxides, which leave the plot
        /// at its foot, are read too. The outermost is the lowest.
        /// </summary>
        public void Rulers()
        {
            int flat = 0;
            foreach ((int index, RulerPlan ruler) in _plan.Rulers.Index())
            {
                double x = _plan.Page.Width - Margin - (_rulerPitch * (_plan.Rulers.Length - index)) + RulerScaleWidth;
                bool runsOn = _hasFlats && RunsOn(_plan, ruler);
                double foot = runsOn ? Plot.Bottom + (3.3 * Sizes.Label) + (flat++ * FlatPitch) : Plot.Bottom;
                List<SceneItem> items = [new LineItem(runsOn ? [new(x, Plot.Top), new(x, foot), new(Plot.Left, foot)] : [new(x, Plot.Top), new(x, foot)], new Stroke(Ink.Quiet, 0.2))];
                items.AddRange(UprightTicks(ruler, x, foot));
                if (runsOn)
                {
                    items.AddRange(FlatTicks(ruler, x, foot));
                }

                items.Add(Text(x - (RulerScaleWidth / 2), Plot.Top - 1.4, ruler.Label, Sizes.Small, Ink.Black));
                if (runsOn && ChartFont.Width(ruler.Label, Sizes.Small) < Plot.Left - Margin - 1.7)
                {
                    items.Add(Text(Plot.Left - 1.7, foot + (0.35 * Sizes.Small), ruler.Label, Sizes.Small, Ink.Black, TextAnchor.End));
                }

                PagePoint pivot = _map.At(ruler.Pivot);
                if (Plot.Grown(0.5).Holds(pivot))
                {
                    items.Add(new MarkItem(pivot, MarkShape.Cross, MarkSize, Ink.Black));
                    TextItem letter = Text(pivot.X + 1.6, pivot.Y - 0.8, RichText.Of(ruler.PivotLabel), Sizes.Label, bold: true);
                    items.Add(letter);
                    _obstacles.Add(ChartFont.Box(letter).Grown(Rim));
                }

                Add(ruler.Name, items);
            }
        }

        private IEnumerable<SceneItem> UprightTicks(RulerPlan ruler, double x, double foot)
        {
            double run = _map.DataX(x) - ruler.Pivot.X;
            Stroke line = new(Ink.Quiet, 0.2);
            double lastText = double.NegativeInfinity;
            foreach ((RichText text, double slope) in ruler.Slopes.OrderBy(tick => _map.Y(ruler.Pivot.Y + (tick.Slope * run))))
            {
                double y = _map.Y(ruler.Pivot.Y + (slope * run));
                if (y < Plot.Top - 1e-6 || y > foot + 1e-6)
                {
                    continue;
                }

                bool written = text.Runs.Length > 0 && y - lastText > Sizes.Small * 1.15 && y < foot - (0.6 * Sizes.Small);
                yield return new LineItem([new(x, y), new(x + (written ? 1.3 : 0.7), y)], line);
                if (written)
                {
                    yield return Text(x + 1.8, y + (0.35 * Sizes.Small), text, Sizes.Small, Ink.Quiet);
                    lastText = y;
                }
            }
        }

        /// <summary>From the corner to the left, where values crowd: small ticks end where they would touch.</summary>
        private IEnumerable<SceneItem> FlatTicks(RulerPlan ruler, double right, double y)
        {
            double fall = _map.DataY(y) - ruler.Pivot.Y;
            Stroke line = new(Ink.Quiet, 0.2);
            double lastText = right;
            double lastTick = right;
            foreach ((RichText text, double slope) in ruler.Slopes.Where(tick => tick.Slope < 0).OrderByDescending(tick => tick.Slope))
            {
                double x = _map.X(ruler.Pivot.X + (fall / slope));
                double half = ChartFont.Width(text, Sizes.Small) / 2;
                bool written = text.Runs.Length > 0 && x + half < lastText - 1 && x - half > Plot.Left;
                if (x > right || x < Plot.Left || (!written && lastTick - x < 0.8))
                {
                    continue;
                }

                lastTick = x;
                yield return new LineItem([new(x, y), new(x, y + (written ? 1.0 : 0.6))], line);
                if (written)
                {
                    yield return Text(x, y + 1.2 + (0.85 * Sizes.Small), text, Sizes.Small, Ink.Quiet, TextAnchor.Middle);
                    lastText = x - half;
                }
            }
        }

        public void Marks()
        {
            foreach (SeriesPlan series in _plan.Series.Where(series => !series.Marks.IsEmpty))
            {
                MarkItem[] marks = [.. series.Marks.Select(mark => new MarkItem(_map.At(mark.At), mark.Shape, MarkSize, series.Stroke.Ink)).Where(mark => Plot.Grown(0.2).Holds(mark.Center))];
                _obstacles.AddRange(marks.Select(mark => mark.Box));
                if (marks.Length > 0)
                {
                    Add(series.Name + ", marks", marks);
                }
            }
        }

        public void Crossings()
        {
            List<SceneItem> items = [];
            double size = Sizes.Small;
            foreach ((int index, PlanCrossing crossing) in _plan.Crossings.Take(_numbered).Index())
            {
                PagePoint at = _map.At(crossing.At);
                if (!Plot.Holds(at))
                {
                    continue;
                }

                MarkItem ring = new(at, MarkShape.Ring, 1.5, Ink.Black);
                items.Add(ring);
                _obstacles.Add(ring.Box);
                RichText number = RichText.Of(Number(index));
                double width = ChartFont.Width(number, size, true);
                foreach ((double dx, double dy) in new[] { (1.0, -1.0), (1.0, 1.0), (-1.0, -1.0), (-1.0, 1.0), (0, -1.6), (0, 1.6), (1.8, -1.8), (1.8, 1.8), (-1.8, -1.8), (-1.8, 1.8), (2.8, -2.8), (-2.8, 2.8), (2.8, 2.8), (-2.8, -2.8) })
                {
                    PagePoint middle = new(at.X + (dx * (1.1 + (width / 2))), at.Y + (dy * size * 0.85));
                    TextItem text = Text(middle.X, middle.Y + (0.35 * size), number, size, anchor: TextAnchor.Middle, bold: true);
                    PageBox box = ChartFont.Box(text).Grown(0.15);
                    if (!_obstacles.Any(box.Overlaps) && box.Left > Plot.Left && box.Right < Plot.Right && box.Top > Plot.Top && box.Bottom < Plot.Bottom)
                    {
                        items.Add(text);
                        _obstacles.Add(box);
                        break;
                    }
                }
            }

            if (items.Count > 0)
            {
                Add("crossovers", items);
            }
        }

        public void Labels()
        {
            List<SceneItem> texts = [.. KnownLabels()];
            SeriesPlan[] labelled = [.. _plan.Series.Where(series => IsPlacedHere(series) && _visible[series].Length > 0)];
            double usual = labelled.Length == 0 ? Sizes.Label : Math.Clamp(Plot.Height / labelled.Length / 1.25, Math.Min(Sizes.Small, Sizes.Label), Sizes.Label);
            LabelPlacement.Placed[] placed = LabelPlacement.Place(
                [.. labelled.Select(series => new LabelPlacement.Wanted(ChartFont.Width(series.Label, LabelSize(series, usual)), LabelSize(series, usual) * 1.05, _visible[series][^1]))],
                Plot,
                _columnLeft,
                (Plot.Top - usual, Plot.Bottom + usual),
                _obstacles);
            List<SceneItem> leaders = [];
            foreach ((int i, SeriesPlan series) in labelled.Index())
            {
                if (!placed[i].Leader.IsEmpty)
                {
                    leaders.Add(new LineItem(placed[i].Leader, new Stroke(series.Stroke.Ink, 0.12)));
                }

                PageBox box = placed[i].Box;
                double size = LabelSize(series, usual);
                texts.Add(Text(box.Left, box.Top + (0.82 * size), series.Label, size, Readable(series.Stroke.Ink)));
            }

            Add("leaders", leaders);
            Add("labels", texts);
        }

        /// <summary>Labels whose place the plan knows.</summary>
        private IEnumerable<TextItem> KnownLabels()
        {
            foreach (SeriesPlan series in _plan.Series.Where(series => series.LabelStart is not null && series.Label.Runs.Length > 0))
            {
                PagePoint at = _map.At(series.LabelStart!.Value);
                TextItem text = Text(at.X + 1.4, at.Y + (0.35 * Sizes.Label), series.Label, Sizes.Label);
                _obstacles.Add(ChartFont.Box(text));
                yield return text;
            }
        }

        private static bool IsPlacedHere(SeriesPlan series) => series.Label.Runs.Length > 0 && series.LabelStart is null;

        /// <summary>Guides are named in small type.</summary>
        private double LabelSize(SeriesPlan series, double usual) => series.IsGuide ? Math.Min(Sizes.Small, usual) : usual;

        public void Foot()
        {
            double y = _footTop;
            foreach ((IReadOnlyList<(RichText Text, MarkShape? Shape)> entries, int columns) in _lists)
            {
                double width = (_plan.Page.Width - (2 * Margin)) / columns;
                int rows = (entries.Count + columns - 1) / columns;
                List<SceneItem> items = [];
                foreach ((int i, (RichText text, MarkShape? shape)) in entries.Index())
                {
                    double x = Margin + (i / rows * width);
                    double line = y + (((i % rows) + 0.8) * Sizes.Small * 1.45);
                    if (shape is { } mark)
                    {
                        items.Add(new MarkItem(new PagePoint(x + 1, line - (0.35 * Sizes.Small)), mark, MarkSize, Ink.Black));
                    }

                    items.Add(Text(x + (shape is null ? 0 : 3.2), line, text, Sizes.Small, Ink.Black));
                }

                Add(entries[0].Shape is null ? "crossovers listed" : "key", items);
                y += (rows * Sizes.Small * 1.45) + 1.2;
            }

            if (_caption.Length > 0)
            {
                List<SceneItem> items = [];
                y += 1.5;
                foreach (string line in _caption)
                {
                    bool safety = line.Length > 0 && line[0] == Warned;
                    items.Add(Text(Margin, y + (0.8 * Sizes.Small), RichText.OfChemistry(safety ? line[1..] : line), Sizes.Small, safety ? Ink.Amber : Ink.Quiet, bold: safety));
                    y += Sizes.Small * 1.35;
                }

                Add("caption", items);
            }

            if (_blockHeight > 0)
            {
                Block(_plan.Page.Height - Margin - _blockHeight + 1);
            }
        }

        private const char Warned = '\u0001';
        private const int BlockColumns = 4;

        private int BlockRows() => (_plan.Frame.Block.Length + BlockColumns - 1) / BlockColumns;

        /// <summary>The title block: fields between hairlines, name above text.</summary>
        private void Block(double top)
        {
            Stroke hair = new(Ink.Black, 0.15);
            double width = (_plan.Page.Width - (2 * Margin)) / BlockColumns;
            double height = Sizes.Small * 2.8;
            int rows = BlockRows();
            List<SceneItem> items = [];
            for (int row = 0; row <= rows; row++)
            {
                items.Add(new LineItem([new(Margin, top + (row * height)), new(_plan.Page.Width - Margin, top + (row * height))], hair));
            }

            foreach ((int i, (string name, string text)) in _plan.Frame.Block.Index())
            {
                double x = Margin + (i % BlockColumns * width) + 1;
                double y = top + (i / BlockColumns * height);
                items.Add(Text(x, y + (1.0 * Sizes.Small), RichText.Of(name), Sizes.Small * 0.9, Ink.Quiet));
                items.Add(Text(x, y + (2.25 * Sizes.Small), RichText.Of(Fitted(text, width - 2)), Sizes.Small, Ink.Black));
            }

            for (int column = 1; column < BlockColumns; column++)
            {
                items.Add(new LineItem([new(Margin + (column * width), top), new(Margin + (column * width), top + (rows * height))], hair));
            }

            Add("title block", items);
        }

        private string Fitted(string text, double width)
        {
            string fitted = text;
            while (fitted.Length > 1 && ChartFont.Width(fitted, Sizes.Small) > width)
            {
                fitted = fitted[..^2].TrimEnd() + "…";
            }

            return fitted;
        }

        private void AddList(IReadOnlyList<(RichText Text, MarkShape? Shape)> entries)
        {
            if (entries.Count > 0)
            {
                double widest = entries.Max(entry => ChartFont.Width(entry.Text, Sizes.Small)) + 6;
                _lists.Add((entries, Math.Clamp((int)((_plan.Page.Width - (2 * Margin)) / widest), 1, entries.Count)));
            }
        }

        /// <summary>As many crossovers as a sixth of the page holds; those left out are counted, and stand in the file's description.</summary>
        private (RichText Text, MarkShape? Shape)[] ListedCrossings()
        {
            (RichText Text, MarkShape? Shape)[] all = [.. _plan.Crossings.Select((crossing, i) => (RichText.Of(Number(i) + "  ").Then(crossing.Text), (MarkShape?)null))];
            if (all.Length == 0)
            {
                return all;
            }

            double widest = all.Max(entry => ChartFont.Width(entry.Text, Sizes.Small)) + 6;
            int columns = Math.Max(1, (int)((_plan.Page.Width - (2 * Margin)) / widest));
            int room = columns * Math.Max(1, (int)(_plan.Page.Height / 6 / (Sizes.Small * 1.45)));
            _numbered = Math.Min(all.Length, room);
            return all.Length <= room
                ? all
                : [.. all.Take(room - 1), (RichText.Of(FormattableString.Invariant($"and {all.Length - room + 1} more")), null)];
        }

        private static int Rows((IReadOnlyList<(RichText Text, MarkShape? Shape)> Entries, int Columns) list) => (list.Entries.Count + list.Columns - 1) / list.Columns;

        /// <summary>Breaks the caption at spaces; lines of the safety note are marked by their first character.</summary>
        private ImmutableArray<string> Wrap(ImmutableArray<string> paragraphs, string safety, double width)
        {
            if (_plan.Frame.Kind == FrameKind.None)
            {
                return [];
            }

            ImmutableArray<string>.Builder lines = ImmutableArray.CreateBuilder<string>();
            foreach ((string paragraph, bool warned) in paragraphs.Select(text => (text, false)).Append((safety, true)).Where(pair => pair.Item1.Length > 0))
            {
                string line = "";
                foreach (string word in paragraph.Split(' '))
                {
                    string longer = line.Length == 0 ? word : line + " " + word;
                    if (ChartFont.Width(longer, Sizes.Small, warned) > width && line.Length > 0)
                    {
                        lines.Add(warned ? Warned + line : line);
                        line = word;
                    }
                    else
                    {
                        line = longer;
                    }
                }

                lines.Add(warned ? Warned + line : line);
            }

            return lines.ToImmutable();
        }

        private static string Number(int index) => (index + 1).ToString(System.Globalization.CultureInfo.InvariantCulture);

        /// <summary>Colours of lines are chosen at 3:1; text needs 4.5:1, so lighter ones are darkened for it.</summary>
        private static Ink Readable(Ink ink)
        {
            Ink dark = ink with { Opacity = 1 };
            while (dark.ContrastOnWhite() < 4.6)
            {
                dark = dark with { Red = (byte)(dark.Red * 0.93), Green = (byte)(dark.Green * 0.93), Blue = (byte)(dark.Blue * 0.93) };
            }

            return dark;
        }

        private static IEnumerable<PagePoint> Spread(ImmutableArray<PagePoint> line)
        {
            double walked = SymbolPitch / 2;
            for (int i = 1; i < line.Length; i++)
            {
                (PagePoint a, PagePoint b) = (line[i - 1], line[i]);
                double length = Math.Sqrt(((b.X - a.X) * (b.X - a.X)) + ((b.Y - a.Y) * (b.Y - a.Y)));
                while (walked <= length)
                {
                    double share = length > 0 ? walked / length : 0;
                    yield return new PagePoint(a.X + (share * (b.X - a.X)), a.Y + (share * (b.Y - a.Y)));
                    walked += SymbolPitch;
                }

                walked -= length;
            }
        }

        private ValueTable Values(SeriesPlan series) => new(
            series.Name,
            series.Uncertainty.IsEmpty ? [_plan.ValueNames.X, _plan.ValueNames.Y] : [_plan.ValueNames.X, _plan.ValueNames.Y, "uncertainty"],
            [.. series.Points.Select((point, i) => series.Uncertainty.IsEmpty ? ImmutableArray.Create(point.X, point.Y) : [point.X, point.Y, series.Uncertainty[i]])]);

        private void Add(string name, IEnumerable<SceneItem> items)
        {
            ImmutableArray<SceneItem> all = [.. items];
            if (!all.IsEmpty)
            {
                _groups.Add(new SceneGroup(name, all));
            }
        }

        private static TextItem Text(double x, double y, RichText text, double size, Ink? ink = null, TextAnchor anchor = TextAnchor.Start, bool bold = false)
            => new(new PagePoint(x, y), text, size, anchor, ink ?? Ink.Black, bold);
    }
}
