using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>
/// The measured points: discs, rings where set aside, with error bars where they are uncertain. Those set aside lie beneath, so that no
/// fitted point is hidden, and the bars beneath all.
/// </summary>
internal sealed class SpecimenMarks(CompactionChart chart, Wording wording, Plot plot, TypeScale type)
{
    /// <summary>Above this many their labels would say nothing.</summary>
    private const int MostLabeled = 40;

    private const double EdgeWidth = 1.25;

    /// <summary>A ring looks as large as a disc where its outer edge is the same.</summary>
    private double RingRadius => type.MarkRadius - (EdgeWidth * type.Unit / 2);

    private double WidestLabel => Math.Min(140 * type.Unit, plot.Area.Width / 3);

    public FigurePart Draw() => new("specimens", [.. ErrorBars(), .. chart.Specimens.OrderBy(specimen => !specimen.SetAside).Select(Mark)]);

    public void Block(LabelSpace space)
    {
        foreach (var specimen in chart.Specimens)
        {
            space.BlockMark(plot.At(specimen.Point), type.MarkRadius);
        }

        foreach (var bar in Bars())
        {
            space.Block(Barriers.Marks, bar);
        }
    }

    public void Label(LabelSpace space)
    {
        foreach (var specimen in chart.Specimens.Count <= MostLabeled ? chart.Specimens : [])
        {
            space.PlaceFullest(wording.Specimen(specimen).Select(text => MarkLabels
                .Around(plot.At(specimen.Point), type.MarkRadius, text, type.Label, ColorRole.Quiet, WidestLabel)
                .Select(candidate => candidate with { Name = "specimen-label" })));
        }
    }

    private IEnumerable<Shape> ErrorBars()
    {
        var bars = Bars().ToList();
        return bars.Count > 0 ? [new Lines(bars, new Stroke(ColorRole.Ink, 0.9 * type.Unit)) { Name = "error-bars" }] : [];
    }

    /// <summary>As far as they lie within the plot; those that a mark hides are left out.</summary>
    private IEnumerable<IReadOnlyList<Place>> Bars() =>
        from specimen in chart.Specimens
        let water = specimen.WaterContentPlusMinus ?? 0
        let density = specimen.DryDensityPlusMinus ?? 0
        from reach in (ChartPoint[])[new(water, 0), new(0, density)]
        let ends = plot.Area.Clip(
            plot.At(new ChartPoint(specimen.WaterContent - reach.WaterContent, specimen.DryDensity - reach.DryDensity)),
            plot.At(new ChartPoint(specimen.WaterContent + reach.WaterContent, specimen.DryDensity + reach.DryDensity)))
        where ends is { } bar && bar.From.To(bar.To) > 2 * type.MarkRadius
        select (Place[])[ends.Value.From, ends.Value.To];

    private Disc Mark(ChartSpecimen specimen) => specimen.SetAside
        ? new Disc(plot.At(specimen.Point), RingRadius, null, new Stroke(ColorRole.Ink, EdgeWidth * type.Unit)) { Name = "specimen set-aside", Data = specimen.Point.Data }
        : new Disc(plot.At(specimen.Point), type.MarkRadius, ColorRole.Ink, null) { Name = "specimen", Data = specimen.Point.Data };
}
