using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout.Plots;

/// <summary>Zones, bands and bars, as far as they lie within the plot.</summary>
internal sealed class PlotAreas(PlotChart chart, Plot plot, TypeScale type)
{
    private readonly List<(PlotArea Area, ZoneShape Shape)> _seen =
        [.. chart.Areas.Select(area => (area, new ZoneShape([.. area.Corners.Select(plot.At)], plot))).Where(area => area.Item2.IsSeen)];

    public FigurePart Draw() => new("areas", _seen.ConvertAll(seen => (Shape)PlotStyles.Of(seen.Area.Role, seen.Shape.Corners, type)));

    public void Label(LabelSpace space, IReadOnlySet<object> keyed, ISet<object> nameless)
    {
        foreach (var (area, shape) in _seen)
        {
            var text = PlainText.Clean(area.Label ?? "");
            if (text.Length == 0 || keyed.Contains(area))
            {
                continue;
            }

            var color = PlotStyles.LabelColor(area.Role);
            if (space.Place(shape.LabelsWithin(text, type.Label, color).Select(label => label with { Name = "area-label" }), Barriers.All) is null)
            {
                nameless.Add(area);
            }
        }
    }
}
