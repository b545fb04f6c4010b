using CsCheck;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Laboratory.Workings;
using Xunit;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>Whatever keeps the rules of a request gets an answer in which every number is one.</summary>
public class WildTests
{
    [Fact]
    public void No_test_makes_the_analysis_throw_or_hold_a_number_that_is_none() =>
        AnyTest.Wild.Sample(test =>
        {
            var faults = new List<Fault>();
            var specimens = MoistureDensity.Reduce(test, faults);
            if (faults.Count > 0)
            {
                Assert.All(faults, fault => Assert.NotEmpty(fault.Message));
                return;
            }

            var result = MoistureDensity.Analyze(test, [.. specimens.Select(specimen => specimen!)]);
            Assert.All(NumbersWithin.Of(result), number => Assert.True(double.IsFinite(number.Value), number.Path));
            Assert.All(NumbersWithin.Of(Working.Of(test, result)), number => Assert.True(double.IsFinite(number.Value), number.Path));
            Assert.DoesNotContain(result.Findings, finding => finding.Message.Contains("NaN", StringComparison.Ordinal) || finding.Message.Contains('∞') || finding.Message.Contains("Infinity", StringComparison.Ordinal));
        }, iter: 150, print: Points);

    [Fact]
    public void The_walk_finds_every_number_of_a_result()
    {
        var paths = NumbersWithin.Of(Bench.Analyze(Ternmarsh.Weighed)).Select(number => number.Path).ToList();
        Assert.Contains(".Specimens[0].DryDensity.KilogramsPerCubicMeter", paths);
        Assert.Contains(".Curve.Chosen.Optimum.WaterContent.Upper", paths);
        Assert.Contains(".Curve.Alternatives[0].Curve[3].DryDensity", paths);
    }

    /// <summary>What a failing test comes down to.</summary>
    private static string Points(MoistureDensityTest test) =>
        $"Gs {test.SpecificGravity?.Value:R}, water {test.WaterDensity.KilogramsPerCubicMeter:R}, {test.Model?.ToString() ?? "auto"}: "
        + string.Join("; ", MoistureDensity.Reduce(test, []).Select(specimen =>
            specimen is null ? "none" : $"{specimen.WaterContent.Fraction:R}, {specimen.DryDensity.KilogramsPerCubicMeter:R}{(specimen.SetAside is null ? "" : " aside")}"));
}
