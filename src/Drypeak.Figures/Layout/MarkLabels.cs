using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout;

/// <summary>Candidate places of the labels of marks, the best first.</summary>
internal static class MarkLabels
{
    private static readonly (double X, double Y)[] Directions =
        [(1, 0), (-1, 0), (0, -1), (0, 1), (0.75, -0.75), (-0.75, -0.75), (0.75, 0.75), (-0.75, 0.75)];

    /// <summary>Around a mark, at every side: touching it or nearly so.</summary>
    public static IEnumerable<TextRun> Around(Place center, double radius, string text, double size, ColorRole color, double widest) =>
        At([radius + 3, radius + (0.8 * size)], center, text, size, color, widest);

    /// <summary>The same a line further off, for a label whose color says whose it is.</summary>
    public static IEnumerable<TextRun> FurtherAround(Place center, double radius, string text, double size, ColorRole color, double widest) =>
        At([radius + (1.7 * size)], center, text, size, color, widest);

    private static IEnumerable<TextRun> At(double[] reaches, Place center, string text, double size, ColorRole color, double widest)
    {
        var shown = PlainText.Elide(text, EmbeddedFont.Regular, size, widest);
        foreach (var reach in reaches)
        {
            foreach (var (x, y) in Directions)
            {
                // The middle of small letters stands level with the mark; above and below, the letters keep clear of it.
                var at = new Place(center.X + (x * reach), center.Y + (y * (reach + (0.35 * size))) + (0.3 * size));
                yield return Label(shown, at, size, color, AnchorOf(x));
            }
        }
    }

    /// <summary>Over a tick that stands inside the plot, at the axis of water content.</summary>
    public static IEnumerable<TextRun> Over(Place top, string text, double size, ColorRole color)
    {
        foreach (var up in (double[])[0.45, 1.5, 2.6])
        {
            foreach (var anchor in (TextAnchor[])[TextAnchor.Middle, TextAnchor.Start, TextAnchor.End])
            {
                yield return Label(text, top with { Y = top.Y - (up * size) }, size, color, anchor);
            }
        }
    }

    private static TextRun Label(string text, Place at, double size, ColorRole color, TextAnchor anchor) =>
        new(text, at, size, EmbeddedFont.Regular, color, anchor) { Halo = true };

    private static TextAnchor AnchorOf(double x) => x switch { > 0 => TextAnchor.Start, < 0 => TextAnchor.End, _ => TextAnchor.Middle };
}
