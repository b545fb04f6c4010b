using Drypeak.Figures.Drawing;
using Drypeak.Figures.Layout.Plots;

namespace Drypeak.Figures.Layout;

/// <summary>The fitted curve with its band, as far as they run within the plot.</summary>
internal sealed class CurveLine(CompactionChart chart, Plot plot, TypeScale type)
{
    private readonly List<IReadOnlyList<Place>> _runs = [.. Course.Clipped([.. chart.Curve.Select(plot.At)], plot.Area).Select(course => course.Whole())];

    public void Block(LabelSpace space) => _runs.ForEach(run => space.Block(Barriers.Curve, run));

    public FigurePart Draw() => new("curve", _runs.Count == 0 ? [] : [new Lines(_runs, new Stroke(ColorRole.Water, 2 * type.Unit))]);

    public FigurePart DrawBand()
    {
        if (chart.Band is not { Count: > 1 } band)
        {
            return new FigurePart("band", []);
        }

        IReadOnlyList<Place> Edge(Func<ChartBandPoint, double> of) => new Course([.. band.Select(point => plot.At(new ChartPoint(point.WaterContent, of(point))))]).Whole();
        var outline = plot.Area.Clip([.. Edge(point => point.Upper), .. Edge(point => point.Lower).Reverse()]);
        return new FigurePart("band", outline.Count < 3 ? [] : [PlotStyles.Of(PlotAreaRole.Band, outline, type)]);
    }
}
