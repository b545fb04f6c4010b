using Drypeak.Figures.Drawing;

namespace Drypeak.Figures.Layout.Plots;

/// <summary>How the roles of lines and areas look.</summary>
internal static class PlotStyles
{
    /// <summary>Of a tinted area: a mixture that the table of colors of a PNG holds.</summary>
    public const double Tint = 1.0 / 7;

    private static readonly double[] LimitDash = [12, 4];

    public static Stroke Of(PlotLineRole role, PlotDash dash, TypeScale type, Theme theme)
    {
        var (color, width, usual) = role switch
        {
            PlotLineRole.Result => (ColorRole.Water, 2.0, []),
            PlotLineRole.Reference => (ColorRole.Ink, 1.25, theme.ReferenceDash),
            PlotLineRole.Quiet => (ColorRole.Quiet, 1.0, []),
            PlotLineRole.Limit => (ColorRole.Clay, 1.25, LimitDash),
            _ => throw new ArgumentOutOfRangeException(nameof(role)),
        };
        return new Stroke(color, width * type.Unit, type.Dash(dash switch
        {
            PlotDash.Dashed => [7, 4],
            PlotDash.Dotted => [1.5, 3.5],
            _ => usual,
        }));
    }

    public static Polygon Of(PlotAreaRole role, IReadOnlyList<Place> corners, TypeScale type) => role switch
    {
        PlotAreaRole.Accepted => new Polygon(corners, ColorRole.Moss, Tint, new Stroke(ColorRole.Moss, 0.9 * type.Unit)) { Name = "accepted" },
        PlotAreaRole.Band => new Polygon(corners, ColorRole.Water, Tint, new Stroke(ColorRole.Water, 0.4 * type.Unit)) { Name = "band" },
        PlotAreaRole.Bar => new Polygon(corners, ColorRole.Quiet, 2 * Tint, new Stroke(ColorRole.Quiet, 0.9 * type.Unit)) { Name = "bar" },
        _ => throw new ArgumentOutOfRangeException(nameof(role)),
    };

    public static ColorRole LabelColor(PlotAreaRole role) => role == PlotAreaRole.Accepted ? ColorRole.Moss : ColorRole.Quiet;

    public static string Name(PlotLineRole role) => role switch
    {
        PlotLineRole.Result => "result",
        PlotLineRole.Reference => "reference",
        PlotLineRole.Quiet => "quiet",
        PlotLineRole.Limit => "limit",
        _ => throw new ArgumentOutOfRangeException(nameof(role)),
    };
}
