using System.Text;
using System.Text.RegularExpressions;
using CsCheck;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Figures.Tests;

public sealed partial class SvgWriterTests
{
    [Fact]
    public void Any_chart_is_well_formed_without_styles_scripts_references_or_numbers_that_are_none()
    {
        Gen.Select(Charts.Any, Charts.Size).Sample((chart, size) =>
        {
            var picture = SvgPicture.Of(chart, size);
            var attributes = picture.Root.DescendantsAndSelf().SelectMany(element => element.Attributes()).ToList();
            Assert.Empty(picture.All("style").Concat(picture.All("script")));
            Assert.DoesNotContain(attributes, attribute => attribute.Name.LocalName is "style" or "href" || attribute.Name.LocalName.StartsWith("on", StringComparison.Ordinal));
            Assert.DoesNotContain(attributes, attribute => NotANumber().IsMatch(attribute.Value));
        }, iter: 300);
    }

    [Theory]
    [InlineData(1e9, 1e9)]
    [InlineData(-1e9, -1e9)]
    [InlineData(0, 0)]
    [InlineData(1e-300, 1e-300)]
    [InlineData(12, 1e9)]
    [InlineData(1e9, 1.8)]
    public void The_most_extreme_numbers_are_drawn_as_numbers(double waterContent, double dryDensity)
    {
        foreach (var gravity in (double[])[1e-300, 2.68, 1e9])
        {
            var chart = Charts.Full with
            {
                Specimens = [new(waterContent, dryDensity, "far off", false), .. Charts.Full.Specimens],
                SpecificGravity = gravity,
                Saturation = [1e-300, 100],
            };
            var picture = SvgPicture.Of(chart, new FigureSize(240, 240));
            Assert.DoesNotContain(picture.Root.DescendantsAndSelf().SelectMany(element => element.Attributes()), attribute => NotANumber().IsMatch(attribute.Value));
            Assert.Equal(7, picture.OfClass("specimen").Count());
        }
    }

    [Fact]
    public void The_title_and_the_description_name_the_picture_for_who_cannot_see_it()
    {
        var picture = SvgPicture.Of(Charts.Ternmarsh, FigureSize.Default);
        var (title, description) = (Assert.Single(picture.All("title")), Assert.Single(picture.All("desc")));
        Assert.Equal("img", (string?)picture.Root.Attribute("role"));
        Assert.Equal($"{(string?)title.Attribute("id")} {(string?)description.Attribute("id")}", (string?)picture.Root.Attribute("aria-labelledby"));
        Assert.Equal("Maximum dry density 1.83 Mg/m³ at 14.1 % water", title.Value);
    }

    [Fact]
    public void Two_different_figures_in_one_page_do_not_share_identifiers()
    {
        static string? Id(CompactionChart chart) => (string?)SvgPicture.Of(chart, FigureSize.Default).All("title").Single().Attribute("id");
        Assert.NotEqual(Id(Charts.Ternmarsh), Id(Charts.Full));
    }

    [Fact]
    public void Texts_from_outside_stay_texts()
    {
        var picture = SvgPicture.Of(Charts.Ternmarsh with { Reference = "<script>&amp;\"'\u0000\uD800" }, FigureSize.Default);
        Assert.Contains(picture.Texts, text => text.StartsWith("<script>&amp;\"'\uFFFD", StringComparison.Ordinal));
    }

    [Fact]
    public void Five_specimens_take_less_than_20_kB()
    {
        var chart = Charts.Full with { Specimens = Charts.Ternmarsh.Specimens };
        Assert.InRange(SvgWriter.Write(CompactionFigure.Draw(chart, FigureSize.Default)).Length, 1, 20_000);
    }

    /// <summary>The compaction figures of the gallery.</summary>
    internal static readonly Dictionary<string, (CompactionChart Chart, FigureOptions Options)> Reviewed = new()
    {
        ["full"] = (Charts.Full, new FigureOptions()),
        ["small"] = (Charts.Full, new FigureOptions { Size = new(320, 280) }),
        ["dark-second-unit"] = (Charts.Ternmarsh, new FigureOptions { Theme = Theme.Dark, Second = new SecondAxis(DensityUnit.PoundPerCubicFoot) }),
        ["print-french-error-bars"] = (
            Charts.Ternmarsh with { Specimens = [.. Charts.Ternmarsh.Specimens.Select(specimen => specimen with { WaterContentPlusMinus = 0.2, DryDensityPlusMinus = 0.012 })] },
            new FigureOptions { Theme = Theme.Print, Language = Language.All.Single(language => language.Code == "fr") }),
        ["models-void-ratio"] = (Charts.WithModels, new FigureOptions { Second = SecondAxis.VoidRatio, Models = ["parabola", "spline"] }),
        ["field-tests"] = (Charts.InTheField, new FigureOptions()),
        ["without-optimum-own-title-no-lines"] = (Charts.WithoutOptimum, new FigureOptions { Title = "Ternmarsh, borrow area 7", Lines = [] }),
    };

    public static TheoryData<string> ReviewedNames => [.. Reviewed.Keys];

    /// <summary>
    /// The pictures as reviewed. A change of drawing is seen here first: look at the new picture, which stands beside the tests' program, and
    /// put it in the old one's place if it is better.
    /// </summary>
    [Theory]
    [MemberData(nameof(ReviewedNames))]
    public void The_same_chart_is_the_same_bytes_in_every_process_as_reviewed(string name)
    {
        var (chart, options) = Reviewed[name];
        var written = SvgWriter.Write(CompactionFigure.Draw(chart, options));
        var reviewed = Path.Combine(AppContext.BaseDirectory, "Golden", $"{name}.svg");
        File.WriteAllBytes(Path.ChangeExtension(reviewed, ".actual.svg"), written);
        Assert.Equal(File.ReadAllText(reviewed), Encoding.UTF8.GetString(written));
        Assert.Equal(written, SvgWriter.Write(CompactionFigure.Draw(chart with { Specimens = [.. chart.Specimens] }, options with { })));
    }

    [GeneratedRegex(@"\b(NaN|Infinity|∞)\b|∞")]
    private static partial Regex NotANumber();
}
