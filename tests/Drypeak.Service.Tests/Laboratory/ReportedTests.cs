using System.Globalization;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary>Reported values, seen at an adopted peak: the one place where a request states the number to be rounded.</summary>
public sealed class ReportedTests(RunningService service)
{
    /// <summary>Halves go to the even digit: ASTM E29, rounding method. A value within 1e-9 of a half counts as the half.</summary>
    [Theory]
    [InlineData("Mg/m3", 13.85, "13.8 %", 1.835, "1.84 Mg/m³")]
    [InlineData("Mg/m3", 13.95, "14.0 %", 1.845, "1.84 Mg/m³")]
    [InlineData("Mg/m3", 13.850000001, "13.8 %", 1.8350000000001, "1.84 Mg/m³")]
    [InlineData("Mg/m3", 13.8501, "13.9 %", 1.84501, "1.85 Mg/m³")]
    [InlineData("Mg/m3", 14, "14.0 %", 1.8, "1.80 Mg/m³")]
    [InlineData("g/cm3", 9.05, "9.0 %", 1.8949, "1.89 g/cm³")]
    [InlineData("kg/m3", 13.94, "13.9 %", 1835, "1840 kg/m³")]
    [InlineData("kg/m3", 13.96, "14.0 %", 1845, "1840 kg/m³")]
    [InlineData("kg/m3", 0.04, "0.0 %", 1844, "1840 kg/m³")]
    [InlineData("lb/ft3", 13.25, "13.2 %", 114.25, "114.2 lb/ft³")]
    [InlineData("lb/ft3", 13.35, "13.4 %", 114.35, "114.4 lb/ft³")]
    [InlineData("kN/m3", 13.9, "13.9 %", 17.965, "17.96 kN/m³")]
    [InlineData("kN/m3", 13.9, "13.9 %", 17.975, "17.98 kN/m³")]
    public async Task A_reported_value_is_rounded_half_to_even_with_its_unit(string unit, double w, string reportedWater, double density, string reportedDensity)
    {
        var answer = await service.AnswerAsync(Adopting(unit, w, density, Body.Absent));
        Assert.Equal(reportedWater, answer.Text("/adopted/reported/waterContent"));
        Assert.Equal(reportedDensity, answer.Text("/adopted/reported/maximumDryDensity"));
    }

    /// <summary>BS 1377-4: water content to two significant figures, density to 0.01 Mg/m³ (from memory).</summary>
    [Theory]
    [InlineData(13.85, "14 %")]
    [InlineData(9.65, "9.6 %")]
    [InlineData(9.96, "10 %")]
    public async Task A_method_that_says_how_to_round_is_followed(double w, string reported)
    {
        var answer = await service.AnswerAsync(Adopting("Mg/m3", w, 1.8349, "\"bs-1377-4-3.3\""));
        Assert.Equal(reported, answer.Text("/adopted/reported/waterContent"));
        Assert.Equal("1.83 Mg/m³", answer.Text("/adopted/reported/maximumDryDensity"));
    }

    [Fact]
    public async Task The_optimum_is_reported_from_its_unrounded_numbers()
    {
        var answer = await service.AnswerAsync(Body.Sound);
        Assert.Equal(Math.Round(answer.Number("/optimum/waterContent"), 1).ToString("0.0", CultureInfo.InvariantCulture) + " %", answer.Text("/optimum/reported/waterContent"));
        Assert.Equal(Math.Round(answer.Number("/optimum/maximumDryDensity"), 2).ToString("0.00", CultureInfo.InvariantCulture) + " Mg/m³", answer.Text("/optimum/reported/maximumDryDensity"));
    }

    private static string Adopting(string unit, double w, double density, string method) => Body.With(
        ("/method", method),
        ("/units/density", $"\"{unit}\""),
        ("/specimens", $"[{Body.Point((10, density * 0.95))}]"),
        ("/specificGravity", Body.Absent),
        ("/curve", string.Create(CultureInfo.InvariantCulture, $$$"""{"adopted":{"waterContent":{{{w:R}}},"maximumDryDensity":{{{density:R}}},"reason":"to be rounded"}}""")));
}
