using System.Text;
using System.Text.Json;
using Drypeak.Figures;
using Xunit;

namespace Drypeak.Browser.Tests.Figures;

/// <summary>Texts of figures as a real browser sets them, in whatever font it has.</summary>
public sealed class FigureTextTests(Browser browser)
{
    /// <summary>Corners of each text's box, turned as the text is.</summary>
    private const string Boxes = """
        [...document.querySelectorAll('svg text')].map(text => {
            const box = text.getBBox(), matrix = text.getCTM();
            const at = (x, y) => [matrix.a * x + matrix.c * y + matrix.e, matrix.b * x + matrix.d * y + matrix.f];
            return { text: text.textContent, corners: [at(box.x, box.y), at(box.x + box.width, box.y), at(box.x + box.width, box.y + box.height), at(box.x, box.y + box.height)] };
        })
        """;

    [Fact]
    public async Task On_sixty_figures_no_two_texts_share_over_a_fiftieth_of_the_smaller_and_none_leaves_its_picture()
    {
        Assert.Equal(60, VariedFigures.All.Count);
        await using var visit = await browser.OpenAsync(1940);
        var faults = new List<string>();
        foreach (var (name, figure) in VariedFigures.All)
        {
            await visit.Page.SetContentAsync($"<!doctype html><body style=\"margin:0\">{Encoding.UTF8.GetString(SvgWriter.Write(figure))}</body>");
            var texts = (await visit.Page.EvaluateAsync<JsonElement>(Boxes)).EnumerateArray()
                .Select(text => (Text: text.GetProperty("text").GetString()!, Quad: Quad.Of(text.GetProperty("corners")))).ToList();
            Assert.True(texts.Count > 5, $"{name} has hardly a text.");
            faults.AddRange(texts.Where(text => !text.Quad.LiesIn(figure.Size)).Select(text => $"{name}: \"{text.Text}\" leaves the picture."));
            for (var i = 0; i < texts.Count; i++)
            {
                for (var j = i + 1; j < texts.Count; j++)
                {
                    var share = texts[i].Quad.AreaSharedWith(texts[j].Quad) / Math.Min(texts[i].Quad.Area, texts[j].Quad.Area);
                    if (share > 0.02)
                    {
                        faults.Add($"{name}: \"{texts[i].Text}\" and \"{texts[j].Text}\" share {share:P1}.");
                    }
                }
            }
        }

        Assert.True(faults.Count == 0, string.Join('\n', faults));
    }

    [Fact]
    public void Boxes_that_share_half_are_found_so()
    {
        var one = new Quad([(0, 0), (10, 0), (10, 4), (0, 4)]);
        Assert.Equal(20, one.AreaSharedWith(new Quad([(5, 0), (15, 0), (15, 4), (5, 4)])), 1e-9);
        Assert.Equal(0, one.AreaSharedWith(new Quad([(11, 0), (15, 0), (15, 4), (11, 4)])), 1e-9);
        Assert.Equal(2, one.AreaSharedWith(new Quad([(5, 3), (6, 4), (5, 5), (4, 4)])) + 1, 1e-9);
    }

    /// <summary>A convex box with its corners in turn.</summary>
    private sealed record Quad(IReadOnlyList<(double X, double Y)> Corners)
    {
        public double Area => AreaOf(Corners);

        public static Quad Of(JsonElement corners) => new([.. corners.EnumerateArray().Select(corner => (corner[0].GetDouble(), corner[1].GetDouble()))]);

        /// <summary>Of a box the letters fill the middle: a px of it may stand over the edge.</summary>
        public bool LiesIn(FigureSize size) => Corners.All(corner => corner.X > -1 && corner.Y > -1 && corner.X < size.Width + 1 && corner.Y < size.Height + 1);

        /// <summary>Cut by each side of the other in turn.</summary>
        public double AreaSharedWith(Quad other)
        {
            var shared = Corners.ToList();
            for (var i = 0; i < other.Corners.Count && shared.Count > 0; i++)
            {
                var (a, b) = (other.Corners[i], other.Corners[(i + 1) % other.Corners.Count]);
                double Inside((double X, double Y) p) => ((b.X - a.X) * (p.Y - a.Y)) - ((b.Y - a.Y) * (p.X - a.X));
                var kept = new List<(double X, double Y)>();
                for (var j = 0; j < shared.Count; j++)
                {
                    var (from, to) = (shared[j], shared[(j + 1) % shared.Count]);
                    var (before, after) = (Inside(from), Inside(to));
                    if (before >= 0)
                    {
                        kept.Add(from);
                    }

                    if (before >= 0 != after >= 0)
                    {
                        var t = before / (before - after);
                        kept.Add((from.X + (t * (to.X - from.X)), from.Y + (t * (to.Y - from.Y))));
                    }
                }

                shared = kept;
            }

            return AreaOf(shared);
        }

        private static double AreaOf(IReadOnlyList<(double X, double Y)> corners) =>
            Math.Abs(corners.Select((corner, i) => (corner, next: corners[(i + 1) % corners.Count])).Sum(side => (side.corner.X * side.next.Y) - (side.next.X * side.corner.Y))) / 2;
    }
}
