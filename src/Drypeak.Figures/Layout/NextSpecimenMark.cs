using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>Where one more specimen would tell most: a tick that stands inside the plot on the axis of water content.</summary>
internal static class NextSpecimenMark
{
    public static FigurePart Draw(double? waterContent, Wording wording, Plot plot, TypeScale type, LabelSpace space)
    {
        if (waterContent is not { } percent)
        {
            return new FigurePart("next-specimen", []);
        }

        var foot = new Place(plot.X.At(percent), plot.Area.Bottom);
        var top = foot with { Y = foot.Y - (2 * type.TickLength) };
        space.Block(Barriers.Marks, [foot, top]);
        space.PlaceFullest(wording.Next(percent).Select(text => MarkLabels
            .Over(top, text, type.Label, ColorRole.Quiet)
            .Select(candidate => candidate with { Name = "next-specimen-label" })));
        return new FigurePart("next-specimen", [new Lines([[foot, top]], new Stroke(ColorRole.Quiet, 2 * type.Unit))]);
    }
}
