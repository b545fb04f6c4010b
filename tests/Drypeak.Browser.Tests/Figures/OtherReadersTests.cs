using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;
using System.Xml.Linq;
using Drypeak.Figures;
using Drypeak.Figures.Tests;
using Microsoft.Playwright;
using SkiaSharp;
using Xunit;

namespace Drypeak.Browser.Tests.Figures;

/// <summary>Figures as other programs read them: Chromium and librsvg the SVG, qpdf and poppler the PDF.</summary>
public sealed partial class OtherReadersTests(Browser browser)
{
    /// <summary>Alone, so that no line or label of the same color comes near a mark.</summary>
    private static readonly CompactionChart Marks = Charts.Ternmarsh with
    {
        Specimens = [.. Charts.Ternmarsh.Specimens.Select(specimen => specimen with { Label = null })],
        Curve = [],
        Band = null,
        Optimum = null,
        SpecificGravity = null,
    };

    [Fact]
    public async Task Marks_stand_in_PDF_and_PNG_where_the_SVG_has_them_to_half_a_px()
    {
        var figure = CompactionFigure.Draw(Marks, FigureSize.Default);
        using var png = SKBitmap.Decode(PngWriter.Write(figure));
        using var pdf = SKBitmap.Decode((await OtherProgram.RunAsync("pdftoppm", ["-r", "96", "-png", "-singlefile", "{file}", "{root}"], PdfWriter.Write(figure))).Written);
        var circles = XDocument.Parse(Encoding.UTF8.GetString(SvgWriter.Write(figure))).Descendants().Where(element => (string?)element.Attribute("class") == "specimen").ToList();
        Assert.Equal(5, circles.Count);
        foreach (var circle in circles)
        {
            var (x, y, r) = (Number(circle, "cx"), Number(circle, "cy"), Number(circle, "r"));
            foreach (var picture in (SKBitmap[])[png, pdf])
            {
                var (seenX, seenY) = CenterOfInk(picture, x, y, r + 2);
                Assert.Equal(x, seenX, 0.5);
                Assert.Equal(y, seenY, 0.5);
            }
        }
    }

    [Fact]
    public async Task Every_PDF_passes_qpdf_and_has_all_its_fonts_embedded()
    {
        foreach (var (name, figure) in VariedFigures.All.Where((_, i) => i % 3 == 1))
        {
            var pdf = PdfWriter.Write(figure);
            Assert.Contains("No syntax or stream encoding errors found", (await OtherProgram.RunAsync("qpdf", ["--check", "{file}"], pdf)).Printed, StringComparison.Ordinal);
            var fonts = (await OtherProgram.RunAsync("pdffonts", ["{file}"], pdf)).Printed.Split('\n', StringSplitOptions.RemoveEmptyEntries)[2..];
            Assert.NotEmpty(fonts);
            Assert.All(fonts, font => Assert.True(Embedded().IsMatch(font), $"{name}: {font}"));
        }
    }

    [Fact]
    public async Task A_PDFs_text_can_be_copied_out()
    {
        var text = (await OtherProgram.RunAsync("pdftotext", ["-layout", "{file}", "-"], PdfWriter.Write(CompactionFigure.Draw(Charts.Full, FigureSize.Default)))).Printed;
        Assert.Contains("Adopted maximum dry density 1.84 Mg/m³ at 13.7 % water", text, StringComparison.Ordinal);
        Assert.Contains("Water content (%)", text, StringComparison.Ordinal);
    }

    /// <summary>Without texts, for which each has fonts of its own: shapes are to a few pixels at edges the same.</summary>
    [Theory]
    [InlineData("full 960")]
    [InlineData("field tests 960")]
    [InlineData("models 480")]
    [InlineData("window 960")]
    [InlineData("histogram 960")]
    [InlineData("passes 480")]
    public async Task Chromium_and_librsvg_render_an_SVG_the_same(string name)
    {
        var figure = VariedFigures.All.Single(varied => varied.Name == name).Figure;
        var svg = Text().Replace(Encoding.UTF8.GetString(SvgWriter.Write(figure)), "");
        await using var visit = await browser.OpenAsync(figure.Size.Width);
        await visit.Page.SetViewportSizeAsync(figure.Size.Width, figure.Size.Height);
        await visit.Page.SetContentAsync($"<!doctype html><body style=\"margin:0\">{svg.Replace("<svg ", "<svg style=\"display:block\" ", StringComparison.Ordinal)}</body>");
        using var chromium = SKBitmap.Decode(await visit.Page.ScreenshotAsync(new PageScreenshotOptions { Type = ScreenshotType.Png }));
        using var librsvg = SKBitmap.Decode((await OtherProgram.RunAsync("rsvg-convert", ["{file}", "-o", "{out}"], Encoding.UTF8.GetBytes(svg))).Written);
        Assert.Equal((librsvg.Width, librsvg.Height), (chromium.Width, chromium.Height));
        var differing = 0;
        for (var i = 0; i < chromium.Width * chromium.Height; i++)
        {
            var (one, other) = (chromium.GetPixel(i % chromium.Width, i / chromium.Width), librsvg.GetPixel(i % chromium.Width, i / chromium.Width));
            differing += Math.Abs(one.Red - other.Red) + Math.Abs(one.Green - other.Green) + Math.Abs(one.Blue - other.Blue) > 150 ? 1 : 0;
        }

        Assert.InRange(differing / (double)(chromium.Width * chromium.Height), 0, 0.001);
    }

    private static double Number(XElement element, string attribute) => double.Parse(element.Attribute(attribute)!.Value, CultureInfo.InvariantCulture);

    private static (double X, double Y) CenterOfInk(SKBitmap picture, double x, double y, double reach)
    {
        double sum = 0, sumX = 0, sumY = 0;
        for (var row = (int)(y - reach); row <= y + reach; row++)
        {
            for (var column = (int)(x - reach); column <= x + reach; column++)
            {
                var ink = 255 - picture.GetPixel(column, row).Green;
                ink = ink > 60 ? ink : 0;
                (sum, sumX, sumY) = (sum + ink, sumX + (ink * (column + 0.5)), sumY + (ink * (row + 0.5)));
            }
        }

        return (sumX / sum, sumY / sum);
    }

    [GeneratedRegex(@"\s+yes\s+(yes|no)\s+(yes|no)\s+\d+\s+\d+\s*$")]
    private static partial Regex Embedded();

    [GeneratedRegex("<text .*</text>")]
    private static partial Regex Text();
}
