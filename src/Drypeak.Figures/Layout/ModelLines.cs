using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>Curves of other models, where they are asked for: thin, each with its name in it or in the key.</summary>
internal sealed class ModelLines(CompactionChart chart, FigureOptions options, Wording wording, Plot plot, TypeScale type)
{
    private readonly List<(ChartModel Model, Course Course)> _drawn =
    [
        .. (chart.Models ?? []).Where(model => options.Models.Contains(model.Name))
            .SelectMany(model => Course.Clipped([.. model.Curve.Select(plot.At)], plot.Area).Select(course => (model, course))),
    ];

    private Stroke Stroke => StrokeOf(type);

    public static Stroke StrokeOf(TypeScale type) => new(ColorRole.Water, 0.9 * type.Unit, type.Dash([9, 2, 2, 2]));

    public void Block(LabelSpace space) => _drawn.ForEach(drawn => space.Block(Barriers.PhaseLines, drawn.Course.Whole(), drawn.Model));

    public FigurePart DrawLabeled(LabelSpace space, IReadOnlySet<object> keyed, ISet<object> nameless) => new("models", _drawn.ConvertAll(drawn =>
    {
        IReadOnlyList<IReadOnlyList<Place>>? parted = null;
        if (!keyed.Contains(drawn.Model))
        {
            parted = LineLabels.Place([wording.Model(drawn.Model.Name)], drawn.Model, drawn.Course, type.Label, Stroke.Color, space);
            if (parted is null)
            {
                nameless.Add(drawn.Model);
            }
        }

        return (Shape)new Lines(parted ?? [drawn.Course.Whole()], Stroke) { Name = "model " + drawn.Model.Name };
    }));
}
