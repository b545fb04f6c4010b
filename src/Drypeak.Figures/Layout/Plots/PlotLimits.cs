using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout.Plots;

/// <summary>Straight lines across the plot, with their names over them or beside them.</summary>
internal sealed class PlotLimits(PlotChart chart, Plot plot, TypeScale type, Theme theme)
{
    public FigurePart Draw() => new("limits",
        [.. chart.Limits.Select(limit => new Lines([Run(limit)], PlotStyles.Of(limit.Role, PlotDash.Usual, type, theme)) { Name = PlotStyles.Name(limit.Role) })]);

    public void Block(LabelSpace space)
    {
        foreach (var limit in chart.Limits)
        {
            space.Block(Barriers.Leaders, Run(limit), limit);
        }
    }

    public void Label(LabelSpace space, IReadOnlySet<object> keyed, ISet<object> nameless)
    {
        foreach (var limit in chart.Limits)
        {
            var text = PlainText.Clean(limit.Label ?? "");
            if (text.Length > 0 && !keyed.Contains(limit) && space.Place(limit.Upright ? Beside(limit, text) : Over(limit, text), Barriers.All) is null)
            {
                nameless.Add(limit);
            }
        }
    }

    private Place[] Run(PlotLimit limit) => limit.Upright
        ? [new(plot.X.At(limit.Value), plot.Area.Top), new(plot.X.At(limit.Value), plot.Area.Bottom)]
        : [new(plot.Area.Left, plot.Y.At(limit.Value)), new(plot.Area.Right, plot.Y.At(limit.Value))];

    /// <summary>Over a level line, or under it: from its right end on.</summary>
    private IEnumerable<TextRun> Over(PlotLimit limit, string text)
    {
        var y = plot.Y.At(limit.Value);
        foreach (var baseline in (double[])[y - (0.5 * type.Label), y + (1.15 * type.Label)])
        {
            yield return Text(limit, text, new Place(plot.Area.Right - 2, baseline), TextAnchor.End);
            yield return Text(limit, text, new Place(plot.Area.Left + (0.5 * type.Label), baseline), TextAnchor.Start);
            yield return Text(limit, text, new Place((plot.Area.Left + plot.Area.Right) / 2, baseline), TextAnchor.Middle);
        }
    }

    /// <summary>Beside an upright line, from its top down.</summary>
    private IEnumerable<TextRun> Beside(PlotLimit limit, string text)
    {
        var x = plot.X.At(limit.Value);
        for (var baseline = plot.Area.Top + type.Label; baseline < plot.Area.Bottom - type.Label; baseline += 1.4 * type.Label)
        {
            yield return Text(limit, text, new Place(x + (0.4 * type.Label), baseline), TextAnchor.Start);
            yield return Text(limit, text, new Place(x - (0.4 * type.Label), baseline), TextAnchor.End);
        }
    }

    private TextRun Text(PlotLimit limit, string text, Place at, TextAnchor anchor) =>
        new(text, at, type.Label, EmbeddedFont.Regular, PlotStyles.Of(limit.Role, PlotDash.Usual, type, theme).Color, anchor) { Name = "limit-label", Halo = true };
}
