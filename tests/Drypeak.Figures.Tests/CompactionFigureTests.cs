using CsCheck;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Figures.Tests;

public sealed class CompactionFigureTests
{
    [Fact]
    public void Marks_stand_where_one_scale_an_axis_puts_their_numbers()
    {
        Gen.Select(Charts.Any, Charts.Size).Sample((chart, size) =>
        {
            var marks = SvgPicture.Of(chart, size).OfClass("specimen").ToList();
            Assert.Equal(chart.Specimens.Count, marks.Count);
            AssertLinear([.. marks.Select(mark => (SvgPicture.Number(mark, "data-x"), SvgPicture.Number(mark, "cx")))], rising: true);
            AssertLinear([.. marks.Select(mark => (SvgPicture.Number(mark, "data-y"), SvgPicture.Number(mark, "cy")))], rising: false);
        }, iter: 300);
    }

    [Fact]
    public void Marks_carry_the_numbers_in_full_precision()
    {
        var marks = SvgPicture.Of(Charts.Full, FigureSize.Default).OfClass("specimen");
        Assert.Equal(
            Charts.Full.Specimens.Select(specimen => (specimen.WaterContent, specimen.DryDensity)).Order(),
            marks.Select(mark => (SvgPicture.Number(mark, "data-x"), SvgPicture.Number(mark, "data-y"))).Order());
    }

    [Fact]
    public void Only_specimens_that_are_set_aside_are_hollow()
    {
        var marks = SvgPicture.Of(Charts.Full, FigureSize.Default).OfClass("specimen").ToList();
        var hollow = Assert.Single(marks, mark => (string?)mark.Attribute("fill") == "none");
        Assert.Equal(12.6, SvgPicture.Number(hollow, "data-x"));
    }

    [Theory]
    [InlineData(960, 640)]
    [InlineData(240, 240)]
    [InlineData(320, 240)]
    [InlineData(2400, 2400)]
    public void Both_reported_numbers_and_the_units_of_both_axes_are_drawn_at_any_size(int width, int height)
    {
        var texts = SvgPicture.Of(Charts.Ternmarsh, new FigureSize(width, height)).Texts.ToList();
        Assert.Contains(texts, text => text.Contains("1.83 Mg/m³", StringComparison.Ordinal));
        Assert.Contains(texts, text => text.Contains("14.1 %", StringComparison.Ordinal));
        Assert.Contains("Dry density (Mg/m³)", texts);
        Assert.Contains("Water content (%)", texts);
    }

    [Fact]
    public void The_values_at_the_ends_of_the_leader_lines_stand_level_with_the_optimum()
    {
        var picture = SvgPicture.Of(Charts.Ternmarsh, FigureSize.Default);
        var (density, water) = (picture.TextBoxes.Single(box => box.Text == "1.83"), picture.TextBoxes.Single(box => box.Text == "14.1"));
        var marks = picture.OfClass("specimen").OrderBy(mark => SvgPicture.Number(mark, "cx")).ToList();
        var (first, last) = (marks[0], marks[^1]);

        double Between(string data, string place, double value)
        {
            var (from, to) = (SvgPicture.Number(first, data), SvgPicture.Number(last, data));
            var (start, end) = (SvgPicture.Number(first, place), SvgPicture.Number(last, place));
            return start + ((value - from) / (to - from) * (end - start));
        }

        Assert.Equal(Between("data-x", "cx", 14.1), (water.Left + water.Right) / 2, 0.1);
        Assert.InRange(Between("data-y", "cy", 1.826), density.Top, density.Bottom);
    }

    [Fact]
    public void The_title_says_the_result()
    {
        Assert.Equal("Maximum dry density 1.83 Mg/m³ at 14.1 % water", Title(Charts.Ternmarsh));
        Assert.Equal("Adopted maximum dry density 1.84 Mg/m³ at 13.7 % water", Title(Charts.Full));
        Assert.Equal("No optimum within the tested range", Title(Charts.WithoutOptimum));

        static string Title(CompactionChart chart)
        {
            var figure = CompactionFigure.Draw(chart, FigureSize.Default);
            Assert.Contains(figure.Title, SvgPicture.Read(SvgWriter.Write(figure)).Texts);
            return figure.Title;
        }
    }

    [Fact]
    public void A_unit_of_weight_is_called_a_unit_weight()
    {
        var chart = Charts.Ternmarsh with { DensityUnit = DensityUnit.KilonewtonPerCubicMeter, Optimum = null };
        Assert.Contains("Dry unit weight (kN/m³)", SvgPicture.Of(chart, FigureSize.Default).Texts);
    }

    [Fact]
    public void The_description_states_the_result_in_words()
    {
        Assert.Equal(
            "Dry density against water content of 6 specimens, 1 of them set aside: 9.8 to 17.3 % water, 1.70 to 1.83 Mg/m³. "
            + "The adopted maximum dry density is 1.84 Mg/m³ at an optimum water content of 13.7 %. The band about the curve is its 95 % interval at each water content. "
            + "The fitted curve has its maximum of 1.83 Mg/m³ at 14.1 %. Corrected for oversize: 1.88 Mg/m³ at 12.9 %. "
            + "Lines: zero air voids, saturation 90 %, saturation 80 %, air voids 5 %, air voids 10 %. Suggested next specimen: 14.5 % water.",
            CompactionFigure.Draw(Charts.Full, FigureSize.Default).Description);
    }

    [Fact]
    public void The_zero_air_voids_line_is_drawn_where_the_solids_are_known_and_every_point_of_it_is_saturated()
    {
        var chart = Charts.Ternmarsh with { Saturation = [], AirVoids = [] };
        Assert.Empty(SvgPicture.Of(chart with { SpecificGravity = null }, FigureSize.Default).OfClass("zero-air-voids"));

        var picture = SvgPicture.Of(chart, FigureSize.Default);
        var line = Assert.Single(picture.OfClass("zero-air-voids"));
        var marks = picture.OfClass("specimen").ToList();
        var places = Places(line);
        Assert.True(places.Count >= 4);
        foreach (var place in places)
        {
            var water = WaterContent.FromPercent(Unscaled(marks, "cx", "data-x", place[0]));
            var density = new Density(Unscaled(marks, "cy", "data-y", place[1]) * 1000);
            var saturation = PhaseRelations.Saturation(water, PhaseRelations.VoidRatio(density, 2.68, new Density(998.2)), 2.68);
            Assert.Equal(1, saturation, 1e-3);
        }
    }

    [Fact]
    public void Error_bars_reach_as_far_as_their_numbers_to_both_sides_of_the_mark()
    {
        var chart = Charts.Ternmarsh with { Specimens = [.. Charts.Ternmarsh.Specimens.Select((specimen, i) => i == 2 ? specimen with { WaterContentPlusMinus = 0.25, DryDensityPlusMinus = 0.02 } : specimen)] };
        var picture = SvgPicture.Of(chart, FigureSize.Default);
        var marks = picture.OfClass("specimen").ToList();
        var places = Places(Assert.Single(picture.OfClass("error-bars")));
        Assert.Equal(4, places.Count);
        Assert.Equal([12.95, 13.45], places.Take(2).Select(place => Math.Round(Unscaled(marks, "cx", "data-x", place[0]), 3)));
        Assert.Equal([1.806, 1.846], places.Skip(2).Select(place => Math.Round(Unscaled(marks, "cy", "data-y", place[1]), 4)));
        Assert.Contains(picture.Texts, text => text.Contains("bars: 95 % of each measurement", StringComparison.Ordinal));
    }

    [Fact]
    public void An_error_bar_that_its_mark_hides_is_not_drawn_and_one_beyond_the_plot_ends_at_its_edge()
    {
        CompactionChart With(double plusMinus) => Charts.Ternmarsh with { Specimens = [.. Charts.Ternmarsh.Specimens.Select(specimen => specimen with { WaterContentPlusMinus = plusMinus })] };
        Assert.Empty(SvgPicture.Of(With(0.001), FigureSize.Default).OfClass("error-bars"));
        var bars = Places(SvgPicture.Of(With(1e6), FigureSize.Default).OfClass("error-bars").Single());
        Assert.All(bars, place => Assert.InRange(place[0], 0, 960));
    }

    /// <summary>1 Mg/m³ is 62.42796 lb/ft³ (0.45359237 kg to the pound, 0.3048 m to the foot).</summary>
    [Theory]
    [InlineData(960, 640)]
    [InlineData(400, 320)]
    public void A_second_axis_marks_round_values_of_its_unit_where_the_first_has_the_same_density(int width, int height)
    {
        var figure = CompactionFigure.Draw(Charts.Ternmarsh, new FigureOptions { Size = new(width, height), Second = new SecondAxis(DensityUnit.PoundPerCubicFoot) });
        var picture = SvgPicture.Read(SvgWriter.Write(figure));
        var marks = picture.OfClass("specimen").ToList();
        var second = picture.TextBoxes.Where(box => box.Left > marks.Max(mark => SvgPicture.Number(mark, "cx"))
            && double.TryParse(box.Text, System.Globalization.CultureInfo.InvariantCulture, out var value) && value > 100).ToList();
        Assert.Contains("lb/ft³", picture.Texts);
        Assert.True(second.Count >= 3);
        foreach (var box in second)
        {
            var pounds = double.Parse(box.Text, System.Globalization.CultureInfo.InvariantCulture);
            var tick = Unscaled(marks, "cy", "data-y", (box.Top + box.Bottom) / 2);
            Assert.Equal(pounds / 62.42796, tick, 0.004);
        }
    }

    [Fact]
    public void Field_tests_are_squares_of_their_own_with_label_and_outcome_and_stand_on_the_specimens_scale()
    {
        var picture = SvgPicture.Of(Charts.InTheField, FigureSize.Default);
        Assert.Superset(new HashSet<string>(["1+240, met", "1+260, met", "1+280, not met", "1+300, undecided", "accepted", "2 of 4 field tests accepted"]), picture.Texts.ToHashSet());
        Assert.Contains(picture.Texts, text => text.StartsWith("Maximum dry density 1.83 Mg/m³ at 14.1 % water", StringComparison.Ordinal));
        Assert.Single(picture.OfClass("accepted"));

        var tests = picture.OfClass("field-test").ToList();
        Assert.Equal(
            Charts.InTheField.FieldTests.Select(test => (test.WaterContent, test.DryDensity)),
            tests.Select(test => (SvgPicture.Number(test, "data-x"), SvgPicture.Number(test, "data-y"))));
        var marks = picture.OfClass("specimen").ToList();
        foreach (var test in tests)
        {
            var corners = Places(test);
            Assert.Equal(SvgPicture.Number(test, "data-x"), Unscaled(marks, "cx", "data-x", corners.Average(corner => corner[0])), 0.01);
            Assert.Equal(SvgPicture.Number(test, "data-y"), Unscaled(marks, "cy", "data-y", corners.Average(corner => corner[1])), 0.001);
        }
    }

    [Fact]
    public void The_description_begins_with_the_statement_and_counts_the_outcomes()
    {
        var figure = CompactionFigure.Draw(Charts.InTheField, FigureSize.Default);
        Assert.Equal("2 of 4 field tests accepted", figure.Title);
        Assert.StartsWith("2 of 4 field tests accepted. Dry density against water content of 5 specimens: 9.8 to 17.3 % water, 1.71 to 1.83 Mg/m³. Field tests: 4 (2 met, 1 not met, 1 undecided). Zone: accepted. The maximum dry density is", figure.Description, StringComparison.Ordinal);
    }

    [Fact]
    public void Field_tests_alone_say_nothing_of_a_curve()
    {
        var picture = SvgPicture.Of(Charts.InTheField with { Specimens = [], Curve = [], Optimum = null }, FigureSize.Default);
        Assert.Equal(4, picture.OfClass("field-test").Count());
        Assert.DoesNotContain(picture.Texts, text => text.Contains("optimum", StringComparison.OrdinalIgnoreCase));
    }

    /// <summary>
    /// Slopes are told apart best about 45° (Cleveland, McGill and McGill, The shape parameter of a two-variable graph, JASA 83 (1988) 289–300, from
    /// memory). The ranges fill the plot with what was measured, which at the usual shapes brings a curve's mean slope near to it.
    /// </summary>
    [Theory]
    [InlineData(960, 640)]
    [InlineData(480, 360)]
    [InlineData(1920, 1200)]
    public void The_curve_rises_and_falls_at_slopes_that_can_be_read(int width, int height)
    {
        foreach (var bent in (double[])[0.002, 0.0063, 0.02])
        {
            var chart = Charts.Ternmarsh with
            {
                Specimens = [.. Charts.Ternmarsh.Specimens.Select(specimen => specimen with { DryDensity = 1.826 - (bent * (specimen.WaterContent - 14.1) * (specimen.WaterContent - 14.1)) })],
                Curve = Charts.Parabola(14.1, 1.826, bent, 9.8, 17.3),
                Band = null,
            };
            var places = Places(SvgPicture.Of(chart, new FigureSize(width, height)).OfClass("curve").Single().Elements().Single());
            var (length, slopes) = (0.0, 0.0);
            foreach (var (from, to) in places.Zip(places.Skip(1)))
            {
                var step = Math.Sqrt(((to[0] - from[0]) * (to[0] - from[0])) + ((to[1] - from[1]) * (to[1] - from[1])));
                (length, slopes) = (length + step, slopes + (step * Math.Atan2(Math.Abs(to[1] - from[1]), to[0] - from[0]) * 180 / Math.PI));
            }

            Assert.InRange(slopes / length, 20, 60);
        }
    }

    [Fact]
    public void The_band_lies_about_the_curve_as_far_as_its_numbers()
    {
        var picture = SvgPicture.Of(Charts.Ternmarsh, FigureSize.Default);
        var marks = picture.OfClass("specimen").ToList();
        var outline = Places(Assert.Single(picture.OfClass("band"), shape => shape.Name.LocalName == "path"))
            .Select(place => (W: Unscaled(marks, "cx", "data-x", place[0]), Density: Unscaled(marks, "cy", "data-y", place[1]))).ToList();
        var band = Charts.Ternmarsh.Band!;
        Assert.Equal(band[0].WaterContent, outline.Min(corner => corner.W), 0.01);
        Assert.Equal(band[^1].WaterContent, outline.Max(corner => corner.W), 0.01);
        Assert.Equal(band.Max(point => point.Upper), outline.Max(corner => corner.Density), 1e-3);
        Assert.Contains(picture.Texts, text => text.Contains("band: 95 % of the curve", StringComparison.Ordinal));
        Assert.Empty(SvgPicture.Of(Charts.Ternmarsh with { Band = null }, FigureSize.Default).OfClass("band"));
    }

    [Fact]
    public void Other_models_are_drawn_where_they_are_asked_for_each_with_its_name()
    {
        SvgPicture Asked(params string[] models) => SvgPicture.Read(SvgWriter.Write(CompactionFigure.Draw(Charts.WithModels, new FigureOptions { Models = models })));
        Assert.Empty(Asked().OfClass("model"));
        Assert.Single(Asked("spline", "cubic").OfClass("model"));
        Assert.Contains("spline", Asked("spline").Texts);
        Assert.Equal(2, Asked("spline", "parabola").OfClass("model").Count());
    }

    /// <summary>e = Gs·ρw/ρd − 1.</summary>
    [Fact]
    public void An_axis_of_void_ratio_marks_round_values_where_the_density_has_them_and_needs_the_solids()
    {
        var options = new FigureOptions { Second = SecondAxis.VoidRatio };
        var picture = SvgPicture.Read(SvgWriter.Write(CompactionFigure.Draw(Charts.Ternmarsh, options)));
        var marks = picture.OfClass("specimen").ToList();
        Assert.Contains("Void ratio", picture.Texts);
        var values = picture.TextBoxes.Where(box => box.Left > marks.Max(mark => SvgPicture.Number(mark, "cx")) && box.Text.StartsWith("0.", StringComparison.Ordinal)).ToList();
        Assert.True(values.Count >= 3);
        Assert.All(values, box => Assert.Equal(
            2.68 * 0.9982 / (1 + double.Parse(box.Text, System.Globalization.CultureInfo.InvariantCulture)), Unscaled(marks, "cy", "data-y", (box.Top + box.Bottom) / 2), 0.004));
        Assert.Equal("An axis of void ratio needs the specific gravity, which the chart does not hold.", CompactionFigure.Refusal(Charts.Ternmarsh with { SpecificGravity = null }, options));
    }

    [Fact]
    public void A_line_that_finds_no_room_for_its_name_stands_in_the_key()
    {
        foreach (var size in (FigureSize[])[new(320, 280), new(240, 240), new(480, 320)])
        {
            var texts = SvgPicture.Of(Charts.Ternmarsh with { AirVoids = [5] }, size).Texts.ToList();
            foreach (var (full, brief) in ((string, string)[])[("zero air voids", "S 100 %"), ("saturation 90 %", "S 90 %"), ("saturation 80 %", "S 80 %"), ("air voids 5 %", "A 5 %")])
            {
                Assert.Contains(texts, text => text == full || text == brief);
            }
        }
    }

    [Theory]
    [InlineData(239, 640)]
    [InlineData(960, 2401)]
    public void A_size_out_of_bounds_is_refused(int width, int height)
    {
        var error = Assert.Throws<ArgumentException>(() => CompactionFigure.Draw(Charts.Ternmarsh, new FigureSize(width, height)));
        Assert.Equal($"Width and height must be from 240 to 2400 px, not {width} and {height}.", error.Message);
    }

    [Fact]
    public void Numbers_that_cannot_be_drawn_are_refused_with_the_reason()
    {
        Assert.Null(CompactionFigure.Refusal(Charts.Full, FigureSize.Default));
        Refused(Charts.Full with { Specimens = [new(double.NaN, 1.8, null, false)] }, "A specimen's water content must be a number between −1e9 and 1e9, not NaN.");
        Refused(Charts.Full with { FieldTests = [new(1, double.NaN, null, MarkRole.Met)] }, "A field test's dry density must be a number between −1e9 and 1e9, not NaN.");
        Refused(Charts.Full with { FieldTests = [new(1, 1, null, MarkRole.Result)] }, "A field test is measured, set aside, met, not met or undecided, not a result.");
        Refused(Charts.Full with { Zone = new([new(1, 1), new(2, 2)], null) }, "A zone must have three corners or more.");
        Refused(Charts.Full with { Curve = [new(12, double.PositiveInfinity)] }, "The curve's dry density must be a number between −1e9 and 1e9, not Infinity.");
        Refused(Charts.Full with { NextSpecimen = 1e10 }, "The next specimen's water content must be a number between −1e9 and 1e9, not 10000000000.");
        Refused(Charts.Ternmarsh with { Optimum = Charts.Ternmarsh.Optimum! with { WaterContentInterval = [13.6] } }, "An interval must have two ends.");
        Refused(Charts.Full with { Specimens = [new(12, 1.8, null, false) { DryDensityPlusMinus = -1 }] }, "Half of an interval must be 0 or more, not -1.");
        Refused(Charts.Full with { Specimens = [new(12, 1.8, null, false) { WaterContentPlusMinus = double.NaN }] }, "Half of a specimen's interval must be a number between −1e9 and 1e9, not NaN.");
        Refused(Charts.Full with { SpecificGravity = 0 }, "The specific gravity must be over 0, not 0.");
        Refused(Charts.Full with { WaterDensity = -1 }, "The density of water must be over 0, not -1.");
        Refused(Charts.Full with { Saturation = [90, 0] }, "A saturation must be over 0 and up to 100 %, not 0.");
        Refused(Charts.Full with { AirVoids = [100] }, "Air voids must be from 0 to below 100 %, not 100.");

        static void Refused(CompactionChart chart, string reason) => Assert.Equal(reason, CompactionFigure.Refusal(chart, FigureSize.Default));
    }

    private static List<double[]> Places(System.Xml.Linq.XElement path) =>
        [.. path.Attribute("d")!.Value.Split(['M', 'L', 'Z'], StringSplitOptions.RemoveEmptyEntries)
            .Select(pair => pair.Split(' ').Select(number => double.Parse(number, System.Globalization.CultureInfo.InvariantCulture)).ToArray())];

    /// <summary>The number at a place, by the scale that the marks show.</summary>
    private static double Unscaled(IReadOnlyList<System.Xml.Linq.XElement> marks, string place, string data, double at)
    {
        var (low, high) = (marks.MinBy(mark => SvgPicture.Number(mark, place))!, marks.MaxBy(mark => SvgPicture.Number(mark, place))!);
        var (start, end) = (SvgPicture.Number(low, place), SvgPicture.Number(high, place));
        var (from, to) = (SvgPicture.Number(low, data), SvgPicture.Number(high, data));
        return from + ((at - start) / (end - start) * (to - from));
    }

    /// <summary>Every place lies on the line through the extreme ones, within what two decimals can hold.</summary>
    private static void AssertLinear(IReadOnlyList<(double Data, double Place)> pairs, bool rising)
    {
        if (pairs.Count == 0)
        {
            return;
        }

        var (low, high) = (pairs.MinBy(pair => pair.Data), pairs.MaxBy(pair => pair.Data));
        foreach (var (data, place) in pairs)
        {
            var expected = high.Data > low.Data ? low.Place + ((data - low.Data) / (high.Data - low.Data) * (high.Place - low.Place)) : low.Place;
            Assert.Equal(expected, place, 0.021);
        }

        Assert.True(rising ? high.Place >= low.Place : high.Place <= low.Place);
    }
}
