using System.Diagnostics;
using System.Text;
using CsCheck;
using SkiaSharp;
using Xunit;

namespace Drypeak.Figures.Tests;

public sealed class PlotFigureTests
{
    public static TheoryData<string> Names => [.. PlotCharts.ByName.Keys];

    [Fact]
    public void Marks_stand_where_one_scale_an_axis_puts_their_numbers_and_carry_them()
    {
        Gen.Select(PlotCharts.Any, Charts.Size).Sample((chart, size) =>
        {
            var marks = Draw(chart, new FigureOptions { Size = size }).OfClass("mark").ToList();
            Assert.Equal(
                chart.Marks.Select(mark => (mark.X, mark.Y)).Order(),
                marks.Select(mark => (SvgPicture.Number(mark, "data-x"), SvgPicture.Number(mark, "data-y"))).Order());
            var discs = marks.Where(mark => mark.Name.LocalName == "circle").ToList();
            AssertLinear([.. discs.Select(mark => (SvgPicture.Number(mark, "data-x"), SvgPicture.Number(mark, "cx")))], rising: true);
            AssertLinear([.. discs.Select(mark => (SvgPicture.Number(mark, "data-y"), SvgPicture.Number(mark, "cy")))], rising: false);
            Assert.All(discs, mark => Assert.True(
                SvgPicture.Number(mark, "cx") >= 0 && SvgPicture.Number(mark, "cx") <= size.Width && SvgPicture.Number(mark, "cy") >= 0 && SvgPicture.Number(mark, "cy") <= size.Height));
        }, iter: 200);
    }

    [Fact]
    public void No_two_texts_overlap_none_leaves_the_picture_and_no_number_is_none()
    {
        Gen.Select(PlotCharts.Any, Charts.Size).Sample((chart, size) => AssertReadable(chart, size), iter: 200);
        AssertReadable(PlotCharts.Crowd, FigureSize.Default);
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Every_name_is_written_at_its_place_or_in_the_key(string name)
    {
        var chart = PlotCharts.ByName[name];
        foreach (var size in (FigureSize[])[FigureSize.Default, new(480, 320)])
        {
            var texts = Draw(chart, new FigureOptions { Size = size }).Texts.ToList();
            var names = chart.Lines.Select(line => line.Label).Concat(chart.Areas.Select(area => area.Label)).Concat(chart.Limits.Select(limit => limit.Label)).OfType<string>();
            Assert.Superset(names.ToHashSet(), texts.ToHashSet());
            Assert.Contains(chart.X.Title, texts);
            Assert.Contains(chart.Y.Title, texts);
        }
    }

    [Fact]
    public void A_key_says_each_outcome_in_a_word_with_how_many_have_it()
    {
        var texts = Draw(PlotCharts.Window).Texts.ToList();
        Assert.Superset(new HashSet<string>(["8 met", "1 not met", "1 undecided"]), texts.ToHashSet());
        Assert.DoesNotContain(Draw(PlotCharts.Plan).Texts, text => text.EndsWith("measured", StringComparison.Ordinal));
    }

    [Fact]
    public void Outcomes_differ_in_shape_and_not_in_color_alone()
    {
        static IEnumerable<string> Shapes(MarkRole role)
        {
            var chart = PlotCharts.Plan with { Marks = [new PlotMark(1230, 12, role)] };
            var picture = Draw(chart, new FigureOptions { Theme = Theme.Print });
            return picture.OfClass("marks").Single().Elements().Select(shape => $"{shape.Name.LocalName} {(string?)shape.Attribute("fill") != "none"} {(string?)shape.Attribute("d") is { }}");
        }

        var looks = Enum.GetValues<MarkRole>().Except([MarkRole.Met]).Select(role => string.Join("; ", Shapes(role))).ToList();
        Assert.Equal(looks.Count, looks.Distinct().Count());
    }

    [Fact]
    public void On_one_scale_a_length_to_the_right_is_as_long_upward()
    {
        foreach (var size in (FigureSize[])[FigureSize.Default, new(300, 900), new(1600, 300)])
        {
            var chart = PlotCharts.Plan with { Marks = [new PlotMark(1200, 0, MarkRole.Measured), new PlotMark(1220, 20, MarkRole.Measured)] };
            var marks = Draw(chart, new FigureOptions { Size = size }).OfClass("mark").ToList();
            Assert.Equal(
                SvgPicture.Number(marks[1], "cx") - SvgPicture.Number(marks[0], "cx"),
                SvgPicture.Number(marks[0], "cy") - SvgPicture.Number(marks[1], "cy"), 0.02);
        }
    }

    [Fact]
    public void A_fixed_end_of_an_axis_holds_against_lines_but_loses_no_mark()
    {
        var inside = PlotCharts.Risk with { Marks = [], Lines = [new PlotLine([new(93, -5), new(101, 5)], PlotLineRole.Result)] };
        Assert.DoesNotContain("2", Draw(inside).Texts);
        var beyond = inside with { Marks = [new PlotMark(95, 2.2, MarkRole.Measured)] };
        Assert.Contains("2.0", Draw(beyond).Texts);
        Assert.Single(Draw(beyond).OfClass("mark"));
    }

    [Fact]
    public void Named_positions_stand_in_place_of_numbers()
    {
        var chart = PlotCharts.InOrder with { X = new PlotAxis("Test") { Positions = [new(1, "first"), new(12, "last")] } };
        var texts = Draw(chart).Texts.ToList();
        Assert.Contains("first", texts);
        Assert.Contains("last", texts);
        Assert.DoesNotContain("6", texts);
    }

    [Fact]
    public void An_own_title_stands_over_the_result()
    {
        var texts = Draw(PlotCharts.Histogram, new FigureOptions { Title = "Lot 12" }).Texts.ToList();
        Assert.Contains("Lot 12", texts);
        Assert.Contains(texts, text => text.StartsWith("92.4 % of the lot", StringComparison.Ordinal));
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Formats_agree(string name)
    {
        var figure = PlotFigure.Draw(PlotCharts.ByName[name], new FigureOptions());
        using var picture = SKBitmap.Decode(PngWriter.Write(figure));
        Assert.Equal((960, 640), (picture.Width, picture.Height));
        Assert.StartsWith("%PDF", Encoding.Latin1.GetString(PdfWriter.Write(figure)), StringComparison.Ordinal);
        foreach (var mark in SvgPicture.Read(SvgWriter.Write(figure)).OfClass("mark").Where(mark => mark.Name.LocalName == "circle" && (string?)mark.Attribute("fill") != "none"))
        {
            var fill = SKColor.Parse(mark.Attribute("fill")!.Value);
            Assert.Equal(fill, picture.GetPixel((int)SvgPicture.Number(mark, "cx"), (int)SvgPicture.Number(mark, "cy")));
        }
    }

    [Fact]
    public void Ten_thousand_marks_are_all_drawn_and_soon()
    {
        var clock = Stopwatch.StartNew();
        var svg = SvgWriter.Write(PlotFigure.Draw(PlotCharts.Crowd, new FigureOptions()));
        Assert.True(clock.Elapsed < TimeSpan.FromSeconds(3), $"It took {clock.Elapsed}.");
        Assert.Equal(PlotChart.MostMarks, SvgPicture.Read(svg).OfClass("mark").Count());
    }

    [Fact]
    public void What_is_out_of_bounds_is_refused_with_the_reason()
    {
        Assert.Null(PlotFigure.Refusal(PlotCharts.Window, FigureSize.Default));
        Refused(PlotCharts.Window with { Title = " " }, "The title must not be blank.");
        Refused(PlotCharts.Window with { Description = "" }, "The description must not be blank.");
        Refused(PlotCharts.Window with { Marks = [new(double.NaN, 1, MarkRole.Met)] }, "A mark's place must be a number between −1e9 and 1e9, not NaN.");
        Refused(PlotCharts.Window with { Lines = [new([new(1, 1)], PlotLineRole.Result)] }, "A line must have two points or more.");
        Refused(PlotCharts.Window with { Lines = [new([new(1, 1), new(1, 2e9)], PlotLineRole.Result)] }, "A line's point must be a number between −1e9 and 1e9, not 2000000000.");
        Refused(PlotCharts.Window with { Areas = [new([new(1, 1), new(1, 2)], PlotAreaRole.Band)] }, "An area must have three corners or more.");
        Refused(PlotCharts.Window with { Areas = [new([new(1, 1), new(1, 2), new(double.PositiveInfinity, 2)], PlotAreaRole.Band)] }, "An area's corner must be a number between −1e9 and 1e9, not Infinity.");
        Refused(PlotCharts.Window with { Limits = [new(double.NegativeInfinity)] }, "A limit must be a number between −1e9 and 1e9, not -Infinity.");
        Refused(PlotCharts.Window with { X = new PlotAxis("x") { From = 3, To = 3 } }, "The axis to the right must end after it begins, not at 3 after 3.");
        Refused(PlotCharts.Window with { Marks = [.. Enumerable.Repeat(new PlotMark(1, 1, MarkRole.Met), 10_001)] }, "There may be up to 10000 marks, not 10001.");

        static void Refused(PlotChart chart, string reason)
        {
            Assert.Equal(reason, PlotFigure.Refusal(chart, FigureSize.Default));
            Assert.Equal(reason, Assert.Throws<ArgumentException>(() => PlotFigure.Draw(chart, new FigureOptions())).Message);
        }
    }

    /// <summary>The pictures as reviewed: see <see cref="SvgWriterTests"/>.</summary>
    [Theory]
    [MemberData(nameof(Names))]
    public void A_plot_is_the_same_bytes_in_every_process_as_reviewed(string name)
    {
        var written = SvgWriter.Write(PlotFigure.Draw(PlotCharts.ByName[name], new FigureOptions()));
        var reviewed = Path.Combine(AppContext.BaseDirectory, "Golden", $"plot-{name}.svg");
        File.WriteAllBytes(Path.ChangeExtension(reviewed, ".actual.svg"), written);
        Assert.Equal(File.ReadAllText(reviewed), Encoding.UTF8.GetString(written));
    }

    private static SvgPicture Draw(PlotChart chart) => Draw(chart, new FigureOptions());

    private static SvgPicture Draw(PlotChart chart, FigureOptions options) => SvgPicture.Read(SvgWriter.Write(PlotFigure.Draw(chart, options)));

    private static void AssertReadable(PlotChart chart, FigureSize size)
    {
        var picture = Draw(chart, new FigureOptions { Size = size });
        picture.AssertReadable(size);
        Assert.DoesNotContain(picture.Root.DescendantsAndSelf().SelectMany(element => element.Attributes()), attribute =>
            attribute.Value.Contains("NaN", StringComparison.Ordinal) || attribute.Value.Contains('∞', StringComparison.Ordinal));
    }

    private static void AssertLinear(IReadOnlyList<(double Value, double Place)> pairs, bool rising)
    {
        if (pairs.Count < 2)
        {
            return;
        }

        var (least, greatest) = (pairs.MinBy(pair => pair.Value), pairs.MaxBy(pair => pair.Value));
        Assert.True(rising ? least.Place <= greatest.Place : least.Place >= greatest.Place);
        foreach (var (value, place) in pairs)
        {
            var span = greatest.Value - least.Value;
            Assert.Equal(span > 0 ? least.Place + ((value - least.Value) / span * (greatest.Place - least.Place)) : least.Place, place, 0.05);
        }
    }
}
