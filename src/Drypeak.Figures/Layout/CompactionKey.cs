namespace Drypeak.Figures.Layout;

/// <summary>The key of a compaction figure: the lines and the zone that found no room for their names.</summary>
internal static class CompactionKey
{
    public static IReadOnlyList<KeyEntry> Of(CompactionChart chart, PhaseLines lines, Wording wording, IReadOnlySet<object> keyed, TypeScale type, Theme theme) => keyed.Count == 0 ? [] :
    [
        .. (chart.Models ?? []).Where(keyed.Contains).Select(model => KeyEntry.Line(wording.Model(model.Name), ModelLines.StrokeOf(type), type)),
        .. lines.All.Where(keyed.Contains).Select(line => KeyEntry.Line(line.Labels[0], line.Stroke(type, theme), type)),
        .. chart.Zone is { Label: { } label } zone && keyed.Contains(zone) ? (KeyEntry[])[KeyEntry.Zone(label, PlotAreaRole.Accepted, type)] : [],
    ];
}
