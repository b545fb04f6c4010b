using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>
/// The optima: the fitted one a cross, an adopted one a diamond, the one corrected for oversize a triangle. Lines lead from the result to
/// its values at the axes; the others are labeled beside their marks.
/// </summary>
internal sealed class OptimumMarks(CompactionChart chart, Wording wording, Plot plot, TypeScale type, Theme theme)
{
    private const double Arm = 5.5;

    public FigurePart Draw()
    {
        var shapes = new List<Shape>();
        Add(chart.Optimum, "optimum", [[(-1, -1), (1, 1)], [(-1, 1), (1, -1)]]);
        Add(chart.Adopted, "adopted", [[(0, -1.3), (1.3, 0), (0, 1.3), (-1.3, 0), (0, -1.3)]]);
        Add(chart.Corrected, "corrected", [[(0, -1.3), (1.2, 0.8), (-1.2, 0.8), (0, -1.3)]]);
        return new FigurePart("optima", shapes);

        void Add(ChartOptimum? optimum, string name, (double X, double Y)[][] outline)
        {
            if (optimum is not null)
            {
                var (center, arm) = (plot.At(optimum.Point), Arm * type.Unit);
                var runs = outline.Select(run => run.Select(corner => new Place(center.X + (corner.X * arm), center.Y + (corner.Y * arm))).ToArray());
                shapes.Add(new Lines([.. runs], new Stroke(ColorRole.Clay, 1.75 * type.Unit)) { Name = name });
            }
        }
    }

    /// <summary>From the result to both axes, and its 95 % intervals as bars on them.</summary>
    public FigurePart Leaders()
    {
        if (wording.Result is not { } result)
        {
            return new FigurePart("leaders", []);
        }

        var shapes = new List<Shape> { new Lines(LeaderRuns(result), new Stroke(ColorRole.Clay, 0.9 * type.Unit, type.Dash(theme.LeaderDash))) };
        var bars = IntervalBars(result).ToList();
        if (bars.Count > 0)
        {
            shapes.Add(new Lines(bars, new Stroke(ColorRole.Clay, 3 * type.Unit)) { Name = "interval" });
        }

        return new FigurePart("leaders", shapes);
    }

    public void Block(LabelSpace space)
    {
        foreach (var optimum in chart.Optima)
        {
            space.BlockMark(plot.At(optimum.Point), Arm * 1.4 * type.Unit);
        }

        if (wording.Result is { } result)
        {
            foreach (var run in LeaderRuns(result))
            {
                space.Block(Barriers.Leaders, run);
            }
        }
    }

    public void Label(LabelSpace space)
    {
        Beside(chart.Corrected, wording.Corrected);
        Beside(chart.Adopted, _ => [wording.Adopted]);
        Beside(chart.Adopted is null ? null : chart.Optimum, wording.Fitted);

        void Beside(ChartOptimum? optimum, Func<ChartOptimum, IReadOnlyList<string>> words)
        {
            if (optimum is null)
            {
                return;
            }

            var (at, radius) = (plot.At(optimum.Point), Arm * 1.4 * type.Unit);
            space.PlaceFullest(words(optimum)
                .SelectMany(text => (IEnumerable<TextRun>[])
                [
                    MarkLabels.Around(at, radius, text, type.Label, ColorRole.Clay, plot.Area.Width),
                    MarkLabels.FurtherAround(at, radius, text, type.Label, ColorRole.Clay, plot.Area.Width),
                ])
                .Select(candidates => candidates.Select(candidate => candidate with { Name = "optimum-label" })));
        }
    }

    private Place[][] LeaderRuns(ChartOptimum result)
    {
        var center = plot.At(result.Point);
        return [[new(plot.Area.Left, center.Y), center, new(center.X, plot.Area.Bottom)]];
    }

    private IEnumerable<Place[]> IntervalBars(ChartOptimum result)
    {
        if (result.WaterContentInterval is [var driest, var wettest])
        {
            var (from, to) = (plot.X.At(plot.X.Range.Clamp(driest)), plot.X.At(plot.X.Range.Clamp(wettest)));
            yield return [new(from, plot.Area.Bottom), new(to, plot.Area.Bottom)];
        }

        if (result.MaximumDryDensityInterval is [var lowest, var highest])
        {
            var (from, to) = (plot.Y.At(plot.Y.Range.Clamp(lowest)), plot.Y.At(plot.Y.Range.Clamp(highest)));
            yield return [new(plot.Area.Left, from), new(plot.Area.Left, to)];
        }
    }
}
