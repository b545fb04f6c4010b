using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;
using Xunit;

namespace Drypeak.Soil.Tests.TestMethods;

public class ReportingTests
{
    [Theory]
    [InlineData(null, 13.94, "13.9 %")]
    [InlineData(null, 13.95, "14.0 %")]
    [InlineData(null, 13.85, "13.8 %")]
    [InlineData("astm-d698-a", 13.94, "13.9 %")]
    [InlineData("is-2720-7-small", 8.05, "8.0 %")]
    [InlineData("bs-1377-4-3.3", 13.94, "14 %")] // two significant figures: from memory
    [InlineData("bs-1377-4-3.3", 9.44, "9.4 %")]
    [InlineData("bs-1377-4-3.7", 9.97, "10 %")]
    [InlineData("nbr-7182", 21.96, "22.0 %")]
    public void A_water_content_is_reported_as_the_method_says_else_to_a_tenth(string? method, double percent, string expected) =>
        Assert.Equal(expected, Reporting.WaterContent(Find(method), WaterContent.FromPercent(percent)));

    [Theory]
    [InlineData(null, 1.834, DensityUnit.MegagramPerCubicMeter, "1.83 Mg/m³")]
    [InlineData(null, 1.8, DensityUnit.GramPerCubicCentimeter, "1.80 g/cm³")]
    [InlineData(null, 1834, DensityUnit.KilogramPerCubicMeter, "1830 kg/m³")]
    [InlineData(null, 114.24, DensityUnit.PoundPerCubicFoot, "114.2 lb/ft³")]
    [InlineData(null, 17.985, DensityUnit.KilonewtonPerCubicMeter, "17.98 kN/m³")]
    [InlineData("astm-d698-a", 114.25, DensityUnit.PoundPerCubicFoot, "114.2 lb/ft³")]
    [InlineData("astm-d698-a", 1.835, DensityUnit.MegagramPerCubicMeter, "1.84 Mg/m³")]
    [InlineData("is-2720-8-large", 1.825, DensityUnit.GramPerCubicCentimeter, "1.82 g/cm³")]
    [InlineData("bs-1377-4-3.3", 1.996, DensityUnit.MegagramPerCubicMeter, "2.00 Mg/m³")]
    [InlineData("bs-1377-4-3.3", 1996, DensityUnit.KilogramPerCubicMeter, "2000 kg/m³")]
    public void A_dry_density_is_reported_as_the_method_says_else_by_the_unit(string? method, double value, DensityUnit unit, string expected) =>
        Assert.Equal(expected, Reporting.DryDensity(Find(method), Density.From(value, unit), unit));

    /// <summary>Only these say how to round: a rule added to the file shows here, and is then tested above.</summary>
    [Fact]
    public void The_methods_with_a_rule_of_their_own_are_these() =>
        Assert.Equal(
            ["ASTM D698", "BS 1377-4", "IS 2720-7", "IS 2720-8"],
            TestMethodCatalogue.All.Where(method => method.Reporting is not null).Select(method => method.Standard).Distinct());

    [Fact]
    public void A_rule_says_where_it_comes_from_and_for_which_unit()
    {
        var rule = Find("bs-1377-4-3.3")!.Reporting!;
        Assert.Equal(
            new ReportingRule(
                Rounding.ToSignificantFigures(2),
                Rounding.ToStep(0.01m),
                DensityUnit.MegagramPerCubicMeter,
                new ValueSource("BS 1377-4", Read: false)),
            rule);
    }

    [Fact]
    public void A_reported_value_is_number_space_unit() =>
        Assert.Equal("95.3 %", ReportedValue.Of(95.2500002, Rounding.ToStep(0.1m), "%"));

    private static TestMethod? Find(string? code) => code is null ? null : TestMethodCatalogue.Find(code);
}
