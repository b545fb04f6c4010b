using CsCheck;
using Drypeak.Soil.Curves;
using Xunit;

namespace Drypeak.Soil.Tests.Curves;

/// <summary>Where the next specimen goes.</summary>
public sealed class SpecimenPlanTests
{
    [Fact]
    public void Rising_densities_ask_for_a_wetter_specimen() =>
        Assert.Equal(0.16, Next([8, 10, 12, 14], [1700, 1760, 1820, 1870])!.WaterContent, 12);

    [Fact]
    public void Falling_densities_ask_for_a_drier_specimen() =>
        Assert.Equal(0.06, Next([8, 10, 12, 14], [1950, 1900, 1850, 1800])!.WaterContent, 12);

    [Fact]
    public void Falling_densities_from_no_water_on_ask_for_a_wetter_specimen() =>
        Assert.Equal(0.08, Next([0, 2, 4, 6], [1950, 1900, 1850, 1800])!.WaterContent, 12);

    [Fact]
    public void One_specimen_wetter_than_the_optimum_asks_for_another_on_that_side()
    {
        var next = Next([8, 10, 12, 14], [1700, 1780, 1850, 1820])!;
        Assert.True(next.WaterContent > 0.13);
        Assert.Contains("wetter than the optimum", next.Reason, StringComparison.Ordinal);
        Assert.True(next.StandardUncertaintyAfter < next.StandardUncertaintyNow);
    }

    [Fact]
    public void One_specimen_drier_than_the_optimum_asks_for_another_on_that_side()
    {
        var next = Next([10, 12, 14, 16], [1820, 1850, 1800, 1740])!;
        Assert.True(next.WaterContent < 0.12);
        Assert.Contains("drier than the optimum", next.Reason, StringComparison.Ordinal);
    }

    [Fact]
    public void A_peak_well_bracketed_asks_for_no_more()
    {
        double[] percent = [9, 10, 11, 12, 13, 14, 15, 16, 17, 18];
        Assert.Null(Next(percent, [.. percent.Select(w => 1850 - (9 * (w - 13.5) * (w - 13.5)))]));
    }

    [Fact]
    public void It_is_a_multiple_of_half_a_percent_within_reach_and_null_only_where_the_peak_is_bracketed() =>
        Gen.Select(Gen.Double[0, 15], Gen.Double[0.5, 3], Gen.Double[1700, 2000].Array[3, 8]).Sample((first, spacing, densities) =>
        {
            double[] percent = [.. densities.Select((_, i) => first + (spacing * i))];
            var analysis = CompactionCurve.Analyze(Data(percent, densities));
            if (analysis.Next is { } next)
            {
                Assert.Equal(Math.Round(next.WaterContent * 200), next.WaterContent * 200, 9);
                Assert.InRange(next.WaterContent, 0, (percent[^1] / 100) + 0.0400001);
            }
            else
            {
                var optimum = analysis.Chosen.Optimum!.WaterContent.Value;
                Assert.True(percent.Count(w => w / 100 < optimum) >= 2 && percent.Count(w => w / 100 >= optimum) >= 2);
            }
        }, iter: 300);

    private static NextSpecimen? Next(double[] percent, double[] densities) => CompactionCurve.Analyze(Data(percent, densities)).Next;

    private static CompactionData Data(double[] percent, double[] densities) =>
        new([.. percent.Zip(densities, (w, density) => new CompactionPoint(w / 100, density))], 2.70, 998.2);
}
