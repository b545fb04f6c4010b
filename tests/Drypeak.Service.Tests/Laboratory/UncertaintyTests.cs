using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

public sealed class UncertaintyTests(RunningService service)
{
    private const string All = """{"mass":0.5,"tinMass":0.02,"volume":1.5,"waterContent":0.15,"dryDensity":0.005,"specificGravity":0.02}""";

    [Fact]
    public async Task Stated_uncertainties_leave_the_optimum_alone_and_widen_its_interval()
    {
        var (without, with) = (await service.AnswerAsync(Body.Sound), await service.AnswerAsync(Body.With("/uncertainty", All)));
        foreach (var quantity in new[] { "waterContent", "maximumDryDensity" })
        {
            Assert.Equal(without.Number($"/optimum/{quantity}"), with.Number($"/optimum/{quantity}"));
            var (narrow, wide) = (without.At($"/optimum/uncertainty/{quantity}"), with.At($"/optimum/uncertainty/{quantity}"));
            Assert.True(wide.Number("/standard") > narrow.Number("/standard"));
            Assert.True(wide.Number("/interval/0") < narrow.Number("/interval/0"));
            Assert.True(wide.Number("/interval/1") > narrow.Number("/interval/1"));
        }
    }

    [Fact]
    public async Task Each_stated_uncertainty_has_its_share_and_the_shares_sum_to_one()
    {
        var optimum = (await service.AnswerAsync(Body.With("/uncertainty", All))).At("/optimum/uncertainty");
        var contributions = optimum.At("/contributions").EnumerateArray().ToList();
        Assert.Equal(
            ["dryDensity", "mass", "specificGravity", "tinMass", "volume", "waterContent"],
            contributions.Select(part => part.Text("/quantity")).Order(StringComparer.Ordinal));
        Assert.Equal(1, contributions.Sum(part => part.Number("/share")), 1e-9);
        Assert.Equal(contributions.Select(part => part.Number("/share")).OrderDescending(), contributions.Select(part => part.Number("/share")));
        Assert.True(optimum.Number("/trials") >= 200);
    }

    [Fact]
    public async Task Without_stated_uncertainties_there_are_neither_trials_nor_contributions()
    {
        var uncertainty = (await service.AnswerAsync(Body.Sound)).At("/optimum/uncertainty");
        Assert.False(uncertainty.Has("trials"));
        Assert.False(uncertainty.Has("contributions"));
    }

    /// <summary>A volume that is wrong by u lifts or lowers every point alike: the maximum by u/V of itself, the optimum hardly.</summary>
    [Fact]
    public async Task The_molds_volume_is_one_quantity_for_all_specimens()
    {
        var answer = await service.AnswerAsync(Body.With(("/uncertainty", """{"volume":9.43}"""), ("/curve", """{"model":"parabola"}""")));
        var without = await service.AnswerAsync(Body.With("/curve", """{"model":"parabola"}"""));
        double Added(string quantity) => Math.Sqrt(
            Math.Pow(answer.Number($"/optimum/uncertainty/{quantity}/standard"), 2) - Math.Pow(without.Number($"/optimum/uncertainty/{quantity}/standard"), 2));
        var expected = 0.01 * without.Number("/optimum/maximumDryDensity");
        Assert.InRange(Added("maximumDryDensity"), expected * 0.9, expected * 1.1);
        Assert.Equal(0, Added("waterContent"), 1e-6);
        Assert.Equal(1, answer.Number("/optimum/uncertainty/contributions/0/share"), 1e-9);
    }

    [Fact]
    public async Task Uncertainties_are_read_in_the_units_of_the_request()
    {
        var liters = await service.AnswerAsync(Body.With(("/units/volume", "\"L\""), ("/mold/volume", "0.943"), ("/uncertainty", """{"volume":0.0015}""")));
        var cubicCentimeters = await service.AnswerAsync(Body.With("/uncertainty", """{"volume":1.5}"""));
        Assert.Equal(
            cubicCentimeters.Number("/optimum/uncertainty/maximumDryDensity/standard"), liters.Number("/optimum/uncertainty/maximumDryDensity/standard"), 1e-9);
    }
}
