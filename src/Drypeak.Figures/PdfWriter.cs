using SkiaSharp;

namespace Drypeak.Figures;

/// <summary>
/// Writes figures as a PDF, a page each, with embedded fonts and real text. Equal figures give equal bytes, in every process. A file holds
/// the cut fonts; the whole one comes in only for a text with letters beyond European languages' Latin and Greek.
/// </summary>
public static class PdfWriter
{
    /// <summary>Points (1/72 inch) to a px (1/96 inch).</summary>
    private const float PointsPerPixel = 0.75f;

    /// <summary>A picture has no date of its own: the same for all, so that the same figure is the same file.</summary>
    private static readonly DateTime FixedDate = new(2000, 1, 1, 0, 0, 0, DateTimeKind.Utc);

    /// <summary>The figure as a PDF file of one page, in its true size.</summary>
    public static byte[] Write(Figure figure) => Write([figure]);

    /// <summary>Figures as a PDF file, a page each; the first gives title and subject.</summary>
    public static byte[] Write(IReadOnlyList<Figure> pages)
    {
        var metadata = new SKDocumentPdfMetadata
        {
            Title = pages[0].Title,
            Subject = pages[0].Description,
            Creator = "Drypeak",
            Creation = FixedDate,
            Modified = FixedDate,
        };

        using var stream = new MemoryStream();
        using (var document = SKDocument.CreatePdf(stream, metadata))
        {
            foreach (var figure in pages)
            {
                var page = document.BeginPage(figure.Size.Width * PointsPerPixel, figure.Size.Height * PointsPerPixel);
                page.Scale(PointsPerPixel);
                using (var canvas = new SkiaCanvas(page, figure.Palette, holdsFonts: true))
                {
                    figure.DrawOn(canvas);
                }

                document.EndPage();
            }

            document.Close();
        }

        return stream.ToArray();
    }
}
