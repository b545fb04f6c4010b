using System.Globalization;
using CsCheck;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

public sealed class OptimumTests(RunningService service)
{
    /// <summary>A parabola with its peak, 1.85 Mg/m³, at 14 %.</summary>
    private static (double WaterContent, double DryDensity) OnParabola(double w) => (w, 1.85 - (0.004 * (w - 14) * (w - 14)));

    [Theory]
    [InlineData(3, "warning")]
    [InlineData(4, null)]
    public async Task Three_specimens_give_an_optimum_and_are_too_few(int count, string? severity)
    {
        var answer = await service.AnswerAsync(Body.WithPoints(Enumerable.Range(0, count).Select(i => OnParabola(12 + (2 * i)))));
        Assert.InRange(answer.Number("/optimum/waterContent"), 13, 15);
        Assert.Equal(severity is not null, answer.Findings().Contains("too-few-specimens"));
        if (severity is not null)
        {
            Assert.Equal(severity, answer.Finding("too-few-specimens").Text("/severity"));
        }
    }

    [Theory]
    [InlineData(1)]
    [InlineData(2)]
    public async Task Fewer_than_three_specimens_have_no_optimum_whatever_the_model(int count)
    {
        foreach (var model in new[] { "auto", "averaged", "saturation", "parabola", "cubic", "spline" })
        {
            var answer = await service.AnswerAsync(Body.With(
                ("/specimens", $"[{string.Join(',', Enumerable.Range(0, count).Select(i => Body.Point(OnParabola(12 + (2 * i)))))}]"), ("/curve", $$"""{"model":"{{model}}"}""")));
            Assert.True(answer.IsNull("/optimum"));
            Assert.Equal("error", answer.Finding("too-few-specimens").Text("/severity"));
            Assert.Contains("no-optimum", answer.Findings());
            Assert.Equal(0, answer.At("/curve/points").GetArrayLength());
        }
    }

    [Fact]
    public async Task A_test_with_every_specimen_set_aside_has_neither_curve_nor_optimum()
    {
        var answer = await service.AnswerAsync(Body.WithSpecimens("""{"waterContent":12,"dryDensity":1.7,"setAside":"mold not full"}"""));
        Assert.True(answer.IsNull("/optimum"));
        Assert.True(answer.IsNull("/curve"));
        Assert.Contains("specimen-set-aside", answer.Findings());
    }

    [Theory]
    [InlineData(8, 10, 12, "wetter than 12.00 %")]
    [InlineData(16, 18, 20, "drier than 16.00 %")]
    public async Task Where_density_only_rises_or_falls_there_is_no_optimum_and_the_missing_specimens_are_named(double first, double second, double third, string missing)
    {
        var answer = await service.AnswerAsync(Body.WithPoints(OnParabola(first), OnParabola(second), OnParabola(third)));
        Assert.True(answer.IsNull("/optimum"));
        var finding = answer.Finding("no-optimum");
        Assert.Equal("error", finding.Text("/severity"));
        Assert.Equal("/specimens", finding.Text("/pointer"));
        Assert.Contains($"Make specimens {missing}", finding.Text("/message"), StringComparison.Ordinal);
    }

    [Fact]
    public async Task The_saturation_model_without_a_specific_gravity_has_no_optimum()
    {
        var answer = await service.AnswerAsync(Body.With(("/specificGravity", Body.Absent), ("/curve", """{"model":"saturation"}""")));
        Assert.True(answer.IsNull("/optimum"));
        Assert.Equal("saturation", answer.Text("/curve/model"));
        Assert.Contains("specific-gravity-missing", answer.Findings());
        Assert.Contains("no-optimum", answer.Findings());
    }

    [Theory]
    [InlineData("averaged")]
    [InlineData("saturation")]
    [InlineData("parabola")]
    [InlineData("cubic")]
    [InlineData("spline")]
    public async Task A_model_asked_for_by_name_is_the_answer_that_it_is_among_the_alternatives(string model)
    {
        var auto = await service.AnswerAsync(Body.Sound);
        var named = await service.AnswerAsync(Body.With("/curve", $$"""{"model":"{{model}}"}"""));
        Assert.Equal(model, named.Text("/curve/model"));
        Assert.DoesNotContain(model, named.At("/curve/alternatives").EnumerateArray().Select(other => other.Text("/model")));
        Assert.Equal(4, named.At("/curve/alternatives").GetArrayLength());
        var among = auto.Text("/curve/model") == model ? auto.At("/optimum")
            : auto.At("/curve/alternatives").EnumerateArray().Single(other => other.Text("/model") == model).At("/optimum");
        Assert.Equal(among.GetRawText(), named.At("/optimum").GetRawText());
    }

    [Theory]
    [InlineData("averaged")]
    [InlineData("saturation")]
    [InlineData("parabola")]
    [InlineData("cubic")]
    public async Task A_model_carries_its_own_uncertainty_and_an_interval_about_its_optimum(string model)
    {
        var answer = await service.AnswerAsync(Body.With("/curve", $$"""{"model":"{{model}}"}"""));
        foreach (var quantity in new[] { "waterContent", "maximumDryDensity" })
        {
            var uncertainty = answer.At($"/optimum/uncertainty/{quantity}");
            Assert.True(uncertainty.Number("/standard") > 0);
            Assert.Equal(0.95, uncertainty.Number("/coverage"));
            Assert.InRange(answer.Number($"/optimum/{quantity}"), uncertainty.Number("/interval/0"), uncertainty.Number("/interval/1"));
        }
    }

    [Fact]
    public async Task A_parabola_through_three_points_has_an_optimum_and_nothing_that_supports_an_uncertainty()
    {
        var points = string.Join(',', new[] { 11.0, 13, 15 }.Select(w => Body.Point(OnParabola(w))));
        var answer = await service.AnswerAsync(Body.With(("/specimens", $"[{points}]"), ("/curve", """{"model":"parabola"}""")));
        Assert.Equal(14, answer.Number("/optimum/waterContent"), 1e-9);
        Assert.Equal(1.85, answer.Number("/optimum/maximumDryDensity"), 1e-9);
        Assert.True(answer.IsNull("/optimum/uncertainty"));
    }

    [Fact]
    public async Task An_adopted_peak_stands_beside_the_fitted_one()
    {
        var fitted = await service.AnswerAsync(Body.Sound);
        var adopted = await service.AnswerAsync(Body.With("/curve", """{"adopted":{"waterContent":14.55,"maximumDryDensity":1.885,"reason":"drawn by hand through the wet leg"}}"""));
        Assert.Equal(fitted.At("/optimum").GetRawText(), adopted.At("/optimum").GetRawText());
        Assert.Equal(14.55, adopted.Number("/adopted/waterContent"), 1e-12);
        Assert.Equal(1.885, adopted.Number("/adopted/maximumDryDensity"), 1e-12);
        Assert.Equal("drawn by hand through the wet leg", adopted.Text("/adopted/reason"));
        Assert.Equal("14.6 %", adopted.Text("/adopted/reported/waterContent"));
        Assert.Equal("1.88 Mg/m³", adopted.Text("/adopted/reported/maximumDryDensity"));
        Assert.Equal("/curve/adopted", adopted.Finding("peak-adopted").Text("/pointer"));
        Assert.False(fitted.Has("adopted"));
    }

    [Fact]
    public async Task Where_the_points_have_no_peak_an_adopted_one_still_stands()
    {
        var answer = await service.AnswerAsync(Body.With(
            ("/specimens", $"[{Body.Point(OnParabola(8))},{Body.Point(OnParabola(10))}]"), ("/curve", """{"adopted":{"waterContent":14,"maximumDryDensity":1.85,"reason":"from the neighboring sample"}}""")));
        Assert.True(answer.IsNull("/optimum"));
        Assert.Equal("14.0 %", answer.Text("/adopted/reported/waterContent"));
        Assert.Equal("warning", answer.Finding("peak-adopted").Text("/severity"));
    }

    [Fact]
    public Task The_next_specimen_is_a_multiple_of_half_a_percent_from_zero_to_four_percent_beyond_the_wettest() =>
        Gen.Select(Gen.Double[0, 25], Gen.Double[1.3, 2.1]).Array[1, 7].SampleAsync(async points =>
        {
            var answer = await service.AnswerAsync(Body.WithPoints(points));
            if (!answer.IsNull("/nextSpecimen"))
            {
                var next = answer.Number("/nextSpecimen/waterContent");
                Assert.Equal(Math.Round(next * 2) / 2, next);
                Assert.InRange(next, 0, points.Max(point => point.Item1) + 4 + 1e-9);
                Assert.NotEqual("", answer.Text("/nextSpecimen/reason"));
            }
        }, iter: 100, threads: 1);

    [Fact]
    public async Task No_further_specimen_is_asked_for_where_the_peak_is_bracketed_and_one_more_would_gain_little()
    {
        var bracketed = await service.AnswerAsync(Body.WithPoints(Enumerable.Range(0, 17).Select(i => OnParabola(12 + (0.25 * i)))));
        Assert.True(bracketed.IsNull("/nextSpecimen"));
        var oneSided = await service.AnswerAsync(Body.WithPoints(OnParabola(10), OnParabola(12), OnParabola(14), OnParabola(16)));
        Assert.True(oneSided.Number("/nextSpecimen/waterContent") > 14);
    }

    [Fact]
    public async Task A_specimen_set_aside_is_reported_and_not_fitted()
    {
        var without = await service.AnswerAsync(Body.With("/specimens/4", Body.Absent));
        var aside = await service.AnswerAsync(Body.With("/specimens/4/setAside", "\"mold not full\""));
        Assert.Equal(without.At("/optimum").GetRawText(), aside.At("/optimum").GetRawText());
        Assert.Equal("mold not full", aside.Text("/specimens/4/setAside"));
        Assert.True(aside.Number("/specimens/4/dryDensity") > 1);
        Assert.Equal("/specimens/4/setAside", aside.Finding("specimen-set-aside").Text("/pointer"));
        Assert.Equal(4, aside.At("/curve/residuals").GetArrayLength());
    }

    [Fact]
    public async Task The_curve_spans_the_tested_range_and_its_residuals_are_measured_less_fitted()
    {
        var answer = await service.AnswerAsync(Body.Sound);
        var points = answer.At("/curve/points");
        Assert.Equal(10, points[0][0].GetDouble(), 1e-9);
        Assert.Equal(18, points[points.GetArrayLength() - 1][0].GetDouble(), 1e-9);
        for (var i = 0; i < 5; i++)
        {
            var (fitted, residual) = (answer.Number($"/curve/residuals/{i}/fitted"), answer.Number($"/curve/residuals/{i}/residual"));
            Assert.Equal(answer.Number($"/specimens/{i}/dryDensity"), fitted + residual, 1e-12);
            Assert.Equal((i + 1).ToString(CultureInfo.InvariantCulture), answer.Text($"/curve/residuals/{i}/label"));
        }
    }
}
