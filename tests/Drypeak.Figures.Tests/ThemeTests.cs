using Drypeak.Figures.Drawing;
using Drypeak.Figures.Layout;
using Drypeak.Figures.Layout.Plots;
using Xunit;

namespace Drypeak.Figures.Tests;

public sealed class ThemeTests
{
    /// <summary>ΔE*ab from which two lines are taken for different by their color alone.</summary>
    private const double Apart = 20;

    public static TheoryData<string> Names => [.. Theme.All.Select(theme => theme.Name)];

    /// <summary>WCAG 2.2, success criterion 1.4.3: text 4.5:1.</summary>
    [Theory]
    [MemberData(nameof(Names))]
    public void Every_text_stands_out_from_its_ground(string theme)
    {
        var figure = Draw(theme);
        var texts = figure.Parts.SelectMany(part => part.Shapes).OfType<TextRun>().ToList();
        Assert.NotEmpty(texts);
        Assert.All(texts, text => Assert.True(Color.Contrast(figure.Palette[text.Color], figure.Palette.Paper) >= 4.5, text.Text));
    }

    /// <summary>WCAG 2.2, success criterion 1.4.11: graphical objects 3:1. The grid only helps to read what can be read without it.</summary>
    [Theory]
    [MemberData(nameof(Names))]
    public void Every_line_and_mark_stands_out_from_its_ground(string theme)
    {
        var figure = Draw(theme);
        var shapes = figure.Parts.Where(part => part.Name != "grid").SelectMany(part => part.Shapes).ToList();
        var roles = shapes.OfType<Lines>().Select(lines => lines.Stroke.Color)
            .Concat(shapes.OfType<Disc>().Select(disc => disc.Fill ?? disc.Stroke!.Color)).Distinct().ToList();
        Assert.True(roles.Count >= 4);
        Assert.All(roles, role => Assert.True(Color.Contrast(figure.Palette[role], figure.Palette.Paper) >= 3, role.ToString()));
    }

    /// <summary>By color, by dash, or by a width that differs by half.</summary>
    [Theory]
    [MemberData(nameof(Names))]
    public void No_two_kinds_of_lines_are_alike_to_any_eye_or_in_grey(string theme)
    {
        var figure = Draw(theme);
        var kinds = figure.Parts.Where(part => part.Name is "lines" or "curve" or "leaders")
            .SelectMany(part => part.Shapes.OfType<Lines>().Select(lines => (Kind: lines.Name ?? part.Name, lines.Stroke)))
            .DistinctBy(line => line.Kind).ToList();
        Assert.Equal(["zero-air-voids", "saturation", "air-voids", "curve", "leaders", "interval"], kinds.Select(line => line.Kind));

        foreach (var vision in Enum.GetValues<Vision>())
        {
            foreach (var (one, other) in kinds.SelectMany((one, i) => kinds.Skip(i + 1).Select(other => (one, other))))
            {
                var (thin, wide) = (Math.Min(one.Stroke.Width, other.Stroke.Width), Math.Max(one.Stroke.Width, other.Stroke.Width));
                Assert.True(
                    !one.Stroke.Dash.SequenceEqual(other.Stroke.Dash)
                        || wide / thin >= 1.5
                        || vision.Difference(figure.Palette[one.Stroke.Color], figure.Palette[other.Stroke.Color]) >= Apart,
                    $"{one.Kind} and {other.Kind} look alike: {vision}.");
            }
        }
    }

    /// <summary>The same within a zone, a band or a bar: there the ground is the tint.</summary>
    [Theory]
    [MemberData(nameof(Names))]
    public void Every_text_stands_out_from_a_tinted_ground(string theme)
    {
        var palette = Of(theme).Palette;
        (PlotAreaRole Area, ColorRole[] Texts)[] grounds =
        [
            (PlotAreaRole.Accepted, [ColorRole.Ink, ColorRole.Quiet, ColorRole.Clay, ColorRole.Moss]),
            (PlotAreaRole.Band, [ColorRole.Ink, ColorRole.Quiet, ColorRole.Clay]),
        ];
        var type = new TypeScale(FigureSize.Default);
        foreach (var (area, texts) in grounds)
        {
            var shape = PlotStyles.Of(area, [new(0, 0), new(1, 0), new(1, 1)], type);
            var ground = Mixed(palette.Paper, palette[shape.Fill!.Value], shape.Opacity);
            Assert.All(texts, text => Assert.True(Color.Contrast(palette[text], ground) >= 4.5, $"{text} on {area}: {Color.Contrast(palette[text], ground):0.00}"));
        }
    }

    /// <summary>By color, by dash, or by a width that differs by half; a limit and a curve to compare with, too.</summary>
    [Theory]
    [MemberData(nameof(Names))]
    public void No_two_roles_of_a_plots_lines_are_alike_to_any_eye_or_in_grey(string theme)
    {
        var (dress, type) = (Of(theme), new TypeScale(FigureSize.Default));
        var strokes = Enum.GetValues<PlotLineRole>().Select(role => (role, PlotStyles.Of(role, PlotDash.Usual, type, dress))).ToList();
        foreach (var vision in Enum.GetValues<Vision>())
        {
            foreach (var ((one, a), (other, b)) in strokes.SelectMany((one, i) => strokes.Skip(i + 1).Select(other => (one, other))))
            {
                Assert.True(
                    !a.Dash.SequenceEqual(b.Dash) || Math.Max(a.Width, b.Width) / Math.Min(a.Width, b.Width) >= 1.5
                        || vision.Difference(dress.Palette[a.Color], dress.Palette[b.Color]) >= Apart,
                    $"{one} and {other} look alike: {vision}.");
            }
        }
    }

    [Theory]
    [InlineData("light")]
    [InlineData("dark")]
    public void The_curve_and_the_optimum_stay_apart_by_color_for_every_eye(string theme)
    {
        var palette = Of(theme).Palette;
        foreach (var vision in Enum.GetValues<Vision>().Where(vision => vision != Vision.Grey))
        {
            Assert.True(vision.Difference(palette.Water, palette.Clay) >= Apart, vision.ToString());
        }
    }

    [Fact]
    public void The_theme_for_printers_has_black_and_white_only()
    {
        string[] seen = [.. SvgPicture.Read(SvgWriter.Write(Draw("print"))).Root.Descendants().SelectMany(element => element.Attributes())
            .Where(attribute => attribute.Name.LocalName is "fill" or "stroke").Select(attribute => attribute.Value).Distinct().Order()];
        Assert.Equal(["#000000", "#FFFFFF", "none"], seen);
    }

    [Fact]
    public void Themes_differ_in_looks_only_and_not_in_places_or_texts()
    {
        static IEnumerable<(string, string?, string?, string?)> Places(string theme) => SvgPicture.Read(SvgWriter.Write(Draw(theme))).Root.Descendants()
            .Select(element => (element.Name.LocalName == "text" ? element.Value : "", (string?)element.Attribute("d"), (string?)element.Attribute("cx"), (string?)element.Attribute("x")));
        Assert.Equal(Places("light"), Places("dark"));
        Assert.Equal(Places("light"), Places("print"));
    }

    [Fact]
    public void White_is_white_to_every_eye_and_black_as_far_from_it_as_can_be()
    {
        var (white, black) = (new Color(255, 255, 255), new Color(0, 0, 0));
        Assert.All(Enum.GetValues<Vision>(), vision => Assert.Equal(100, vision.Difference(white, black), 0.2));
    }

    [Fact]
    public void Red_and_green_of_one_lightness_differ_for_who_sees_them_and_hardly_without_green_cones()
    {
        var (red, green) = (new Color(0xC0, 0x50, 0x30), new Color(0x70, 0x80, 0x20));
        Assert.True(Vision.Full.Difference(red, green) > 3 * Vision.WithoutGreenCones.Difference(red, green));
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Colors_of_a_PNG_fit_an_index_of_8_bits(string theme) => Assert.InRange(ColorTable.Of(Of(theme).Palette).Entries.Count, 1, 256);

    private static Color Mixed(Color ground, Color ink, double share)
    {
        byte Channel(byte from, byte to) => (byte)Math.Round(from + ((to - from) * share));
        return new Color(Channel(ground.Red, ink.Red), Channel(ground.Green, ink.Green), Channel(ground.Blue, ink.Blue));
    }

    private static Theme Of(string name) => Theme.All.Single(theme => theme.Name == name);

    private static Figure Draw(string theme) => CompactionFigure.Draw(
        Charts.Full with { Adopted = Charts.Ternmarsh.Optimum }, new FigureOptions { Theme = Of(theme) });
}
