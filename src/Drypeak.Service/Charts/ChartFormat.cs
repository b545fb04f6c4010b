using Drypeak.Figures;

namespace Drypeak.Service.Charts;

/// <summary>A format that charts are drawn in.</summary>
/// <param name="Suffix">At the end of the address, without a dot.</param>
/// <param name="MediaType">As in Accept and Content-Type.</param>
/// <param name="Write">Figure and scale to bytes.</param>
internal sealed record ChartFormat(string Suffix, string MediaType, Func<Figure, double, byte[]> Write)
{
    public static readonly ChartFormat Svg = new("svg", "image/svg+xml", (figure, _) => SvgWriter.Write(figure));
    public static readonly ChartFormat Png = new("png", "image/png", PngWriter.Write);
    public static readonly ChartFormat Pdf = new("pdf", "application/pdf", (figure, _) => PdfWriter.Write(figure));

    public static IReadOnlyList<ChartFormat> All { get; } = [Svg, Png, Pdf];
}
