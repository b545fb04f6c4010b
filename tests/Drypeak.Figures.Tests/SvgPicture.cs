using System.Globalization;
using System.Text;
using System.Xml.Linq;
using SkiaSharp;
using Xunit;

namespace Drypeak.Figures.Tests;

/// <summary>
/// A written SVG read back with what a reader of SVG knows, and nothing of the layout: texts are measured by the drawing library itself.
/// </summary>
internal sealed class SvgPicture
{
    private static readonly XNamespace Svg = "http://www.w3.org/2000/svg";
    private static readonly SKFont Regular = Font(EmbeddedFont.Regular.File);
    private static readonly SKFont SemiBold = Font(EmbeddedFont.SemiBold.File);

    private SvgPicture(XElement root) => Root = root;

    public XElement Root { get; }

    public static SvgPicture Of(CompactionChart chart, FigureSize size) => Read(SvgWriter.Write(CompactionFigure.Draw(chart, size)));

    public static SvgPicture Read(byte[] svg) => new(XDocument.Parse(Encoding.UTF8.GetString(svg)).Root!);

    public IEnumerable<XElement> All(string element) => Root.Descendants(Svg + element);

    public IEnumerable<XElement> OfClass(string name) => Root.Descendants().Where(element => ((string?)element.Attribute("class"))?.Split(' ').Contains(name) == true);

    public IEnumerable<string> Texts => All("text").Select(text => text.Value);

    public IEnumerable<TextBox> TextBoxes => All("text").Select(Box);

    /// <summary>Texts are large enough, keep apart, and stay in the picture.</summary>
    public void AssertReadable(FigureSize size)
    {
        var boxes = TextBoxes.ToList();
        for (var i = 0; i < boxes.Count; i++)
        {
            var box = boxes[i];
            Assert.True(box.Size >= 9, $"{box} is too small.");
            Assert.True(box.Left >= 0 && box.Top >= 0 && box.Right <= size.Width && box.Bottom <= size.Height, $"{box} leaves {size}.");
            var other = boxes.Skip(i + 1).FirstOrDefault(box.Overlaps);
            Assert.True(other is null, $"{box} overlaps {other}.");
        }
    }

    public static double Number(XElement element, string attribute) => double.Parse(element.Attribute(attribute)!.Value, CultureInfo.InvariantCulture);

    /// <summary>The upright box about a line of text, from the font's ascent to its descent.</summary>
    private static TextBox Box(XElement text)
    {
        var font = (string?)text.Attribute("font-weight") == "600" ? SemiBold : Regular;
        var size = Number(text, "font-size");

        // Letters that the font lacks come from others, and the reader's own take the room that the text asks for.
        var isOwn = text.Value.EnumerateRunes().All(rune => font.ContainsGlyph(rune.Value));
        var width = !isOwn && text.Attribute("textLength") is { } ? Number(text, "textLength") : font.MeasureText(text.Value) / font.Size * size;
        var left = (string?)text.Attribute("text-anchor") switch { "middle" => -width / 2, "end" => -width, _ => 0 };
        var (top, bottom) = (font.Metrics.Ascent / font.Size * size, font.Metrics.Descent / font.Size * size);
        var angle = Angle(text) * Math.PI / 180;
        var (x, y) = (Number(text, "x"), Number(text, "y"));
        var corners = new[] { (left, top), (left + width, top), (left, bottom), (left + width, bottom) }
            .Select(corner => (X: x + (corner.Item1 * Math.Cos(angle)) - (corner.Item2 * Math.Sin(angle)), Y: y + (corner.Item1 * Math.Sin(angle)) + (corner.Item2 * Math.Cos(angle))))
            .ToList();
        return new TextBox(text.Value, size, corners.Min(c => c.X), corners.Min(c => c.Y), corners.Max(c => c.X), corners.Max(c => c.Y));
    }

    private static double Angle(XElement text) =>
        (string?)text.Attribute("transform") is { } transform
            ? double.Parse(transform["rotate(".Length..transform.IndexOf(' ', StringComparison.Ordinal)], CultureInfo.InvariantCulture)
            : 0;

    private static SKFont Font(ReadOnlyMemory<byte> file) => new(SKTypeface.FromData(SKData.CreateCopy(file.Span)), 1000) { Hinting = SKFontHinting.None, LinearMetrics = true, Subpixel = true };
}

internal sealed record TextBox(string Text, double Size, double Left, double Top, double Right, double Bottom)
{
    /// <summary>Whether both share more than what writing coordinates with two decimals can bring about.</summary>
    public bool Overlaps(TextBox other)
    {
        const double rounding = 0.05;
        return Math.Min(Right, other.Right) - Math.Max(Left, other.Left) > rounding && Math.Min(Bottom, other.Bottom) - Math.Max(Top, other.Top) > rounding;
    }
}
