using Drypeak.Figures.Drawing;
using Drypeak.Figures.Layout.Plots;

namespace Drypeak.Figures.Layout;

/// <summary>Where a field test is accepted: lightly filled, with its name in it.</summary>
internal sealed class AcceptanceZone(CompactionChart chart, Plot plot, TypeScale type)
{
    private readonly ZoneShape? _shape =
        chart.Zone is { } zone && new ZoneShape([.. zone.Corners.Select(plot.At)], plot) is { IsSeen: true } seen ? seen : null;

    public FigurePart Draw() => new("zone", _shape is null ? [] : [PlotStyles.Of(PlotAreaRole.Accepted, _shape.Corners, type)]);

    public void Label(LabelSpace space, IReadOnlySet<object> keyed, ISet<object> nameless)
    {
        var text = PlainText.Clean(chart.Zone?.Label ?? "");
        if (_shape is not null && text.Length > 0 && !keyed.Contains(chart.Zone!)
            && space.Place(_shape.LabelsWithin(text, type.Label, ColorRole.Moss).Select(label => label with { Name = "zone-label" }), Barriers.All) is null)
        {
            nameless.Add(chart.Zone!);
        }
    }
}
