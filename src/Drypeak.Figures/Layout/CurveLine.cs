using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>The fitted curve, as far as it runs within the plot.</summary>
internal sealed class CurveLine(CompactionChart chart, Plot plot, TypeScale type)
{
    private readonly List<IReadOnlyList<Place>> _runs = [.. Course.Clipped([.. chart.Curve.Select(plot.At)], plot.Area).Select(course => course.Whole())];

    public void Block(LabelSpace space) => _runs.ForEach(run => space.Block(Barriers.Curve, run));

    public FigurePart Draw() => new("curve", _runs.Count == 0 ? [] : [new Lines(_runs, new Stroke(ColorRole.Water, 2 * type.Unit))]);
}
