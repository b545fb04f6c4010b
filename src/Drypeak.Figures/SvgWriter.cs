using System.Globalization;
using System.Text;
using Drypeak.Figures.Drawing;

namespace Drypeak.Figures;

/// <summary>
/// Writes a figure as SVG 1.1: real text, presentation attributes only, no style, script or outside reference, so that it can stand inline
/// under a strict content security policy. Equal figures give equal bytes.
/// </summary>
public static class SvgWriter
{
    /// <summary>The figure as an SVG document, UTF-8 without byte order mark.</summary>
    public static byte[] Write(Figure figure)
    {
        var canvas = new SvgCanvas(figure);
        figure.DrawOn(canvas);
        return Encoding.UTF8.GetBytes(canvas.Finish());
    }

    private sealed class SvgCanvas : ICanvas
    {
        private readonly Palette _palette;
        private readonly StringBuilder _svg = new(8192);

        public SvgCanvas(Figure figure)
        {
            _palette = figure.Palette;

            // Several figures may stand in one page: their identifiers must differ, and be the same each time.
            var id = Digest(figure.Title + figure.Description + _palette.Paper.Hex).ToString("x8", CultureInfo.InvariantCulture);
            var (width, height) = (figure.Size.Width, figure.Size.Height);
            _svg.Append(CultureInfo.InvariantCulture, $"<svg xmlns=\"http://www.w3.org/2000/svg\" viewBox=\"0 0 {width} {height}\" width=\"{width}\" height=\"{height}\"");
            _svg.Append(CultureInfo.InvariantCulture, $" role=\"img\" aria-labelledby=\"title-{id} desc-{id}\" font-family=\"'{FontFace.Family}', 'Liberation Sans', Arial, sans-serif\">\n");
            _svg.Append(CultureInfo.InvariantCulture, $"<title id=\"title-{id}\">{Escaped(figure.Title)}</title>\n");
            _svg.Append(CultureInfo.InvariantCulture, $"<desc id=\"desc-{id}\">{Escaped(figure.Description)}</desc>\n");
            _svg.Append(CultureInfo.InvariantCulture, $"<rect class=\"paper\" width=\"{width}\" height=\"{height}\" fill=\"{_palette.Paper.Hex}\"/>\n");
        }

        public string Finish() => _svg.Append("</svg>\n").ToString();

        public void Begin(string part) => _svg.Append("<g class=\"").Append(part).Append("\">\n");

        public void End() => _svg.Append("</g>\n");

        public void Draw(Lines lines)
        {
            Open("path", lines.Name);
            _svg.Append(" d=\"");
            foreach (var run in lines.Runs)
            {
                AppendRun(run);
            }

            _svg.Append("\" fill=\"none\"");
            AppendJoinedStroke(lines.Stroke);
            Close(lines);
        }

        public void Draw(Disc disc)
        {
            Open("circle", disc.Name);
            Append("cx", disc.Center.X);
            Append("cy", disc.Center.Y);
            Append("r", disc.Radius);
            _svg.Append(" fill=\"").Append(disc.Fill is { } fill ? _palette[fill].Hex : "none").Append('"');
            if (disc.Stroke is { } stroke)
            {
                AppendStroke(stroke);
            }

            Close(disc);
        }

        public void Draw(Polygon polygon)
        {
            Open("path", polygon.Name);
            _svg.Append(" d=\"");
            AppendRun(polygon.Corners);
            _svg.Append("Z\" fill=\"").Append(polygon.Fill is { } fill ? _palette[fill].Hex : "none").Append('"');
            if (polygon.Opacity < 1)
            {
                Append("fill-opacity", polygon.Opacity);
            }

            if (polygon.Edge is { } edge)
            {
                AppendJoinedStroke(edge);
            }

            Close(polygon);
        }

        public void Draw(TextRun text)
        {
            Open("text", text.Name);
            Append("x", text.At.X);
            Append("y", text.At.Y);
            Append("font-size", text.Size);
            if (text.Face.Weight != EmbeddedFont.Regular.Weight)
            {
                Append("font-weight", text.Face.Weight);
            }

            _svg.Append(" fill=\"").Append(_palette[text.Color].Hex).Append('"');
            if (text.Halo)
            {
                AppendStroke(new Stroke(ColorRole.Paper, text.HaloWidth));
                _svg.Append(" stroke-linejoin=\"round\" paint-order=\"stroke\"");
            }

            if (text.Anchor != TextAnchor.Start)
            {
                _svg.Append(" text-anchor=\"").Append(text.Anchor == TextAnchor.Middle ? "middle" : "end").Append('"');
            }

            if (text.Angle != 0)
            {
                AppendNumbers(" transform=\"rotate(", [text.Angle, text.At.X, text.At.Y], ")\"");
            }

            // Where the reader lacks the font, another takes the same room, so that nothing comes to overlap.
            if (text.Face.Covers(text.Text) || SetText.IsCovered(text.Text, text.Face))
            {
                Append("textLength", text.Width);
                _svg.Append(" lengthAdjust=\"spacingAndGlyphs\"");
            }

            _svg.Append('>').Append(Escaped(text.Text)).Append("</text>\n");
        }

        private void Open(string element, string? name)
        {
            _svg.Append('<').Append(element);
            if (name is not null)
            {
                _svg.Append(" class=\"").Append(name).Append('"');
            }
        }

        private void Close(Shape shape)
        {
            if (shape.Data is { } data)
            {
                _svg.Append(CultureInfo.InvariantCulture, $" data-x=\"{data.X:R}\" data-y=\"{data.Y:R}\"");
            }

            _svg.Append("/>\n");
        }

        private void AppendRun(IReadOnlyList<Place> run)
        {
            var command = 'M';
            foreach (var place in run)
            {
                _svg.Append(command);
                AppendNumber(place.X);
                _svg.Append(' ');
                AppendNumber(place.Y);
                command = 'L';
            }
        }

        private void AppendJoinedStroke(Stroke stroke)
        {
            AppendStroke(stroke);
            if (stroke.Dash.Count > 0)
            {
                AppendNumbers(" stroke-dasharray=\"", stroke.Dash, "\"");
            }

            _svg.Append(" stroke-linejoin=\"round\"");
        }

        private void Append(string attribute, double value)
        {
            _svg.Append(' ').Append(attribute).Append("=\"");
            AppendNumber(value);
            _svg.Append('"');
        }

        private void AppendNumbers(string before, IReadOnlyList<double> values, string after)
        {
            _svg.Append(before);
            for (var i = 0; i < values.Count; i++)
            {
                _svg.Append(i > 0 ? " " : "");
                AppendNumber(values[i]);
            }

            _svg.Append(after);
        }

        private void AppendStroke(Stroke stroke)
        {
            _svg.Append(" stroke=\"").Append(_palette[stroke.Color].Hex).Append('"');
            Append("stroke-width", stroke.Width);
        }

        /// <summary>A number with up to two decimals: a hundredth of a px cannot be seen. By whole hundredths, which is ten times as fast as a format string.</summary>
        private void AppendNumber(double value)
        {
            var hundredths = (long)Math.Round(value * 100, MidpointRounding.AwayFromZero);
            if (hundredths < 0)
            {
                _svg.Append('-');
                hundredths = -hundredths;
            }

            var (whole, fraction) = Math.DivRem(hundredths, 100);
            _svg.Append(whole);
            if (fraction > 0)
            {
                _svg.Append('.').Append((char)('0' + (fraction / 10)));
                if (fraction % 10 > 0)
                {
                    _svg.Append((char)('0' + (fraction % 10)));
                }
            }
        }

        private static string Escaped(string text) =>
            text.Replace("&", "&amp;", StringComparison.Ordinal)
                .Replace("<", "&lt;", StringComparison.Ordinal)
                .Replace(">", "&gt;", StringComparison.Ordinal)
                .Replace("\"", "&quot;", StringComparison.Ordinal);

        /// <summary>FNV-1a, 32 bit: the same in every process, as the runtime's own hash of a string is not.</summary>
        private static uint Digest(string text)
        {
            var digest = 2166136261u;
            foreach (var unit in text)
            {
                digest = (digest ^ unit) * 16777619u;
            }

            return digest;
        }
    }
}
