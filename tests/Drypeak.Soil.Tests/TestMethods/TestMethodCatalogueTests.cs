using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;
using Xunit;

namespace Drypeak.Soil.Tests.TestMethods;

public class TestMethodCatalogueTests
{
    /// <summary>The codes of the interface, <c>custom</c> aside, which brings its apparatus with the request.</summary>
    private static readonly string[] CodesOfTheInterface =
    [
        "astm-d698-a", "astm-d698-b", "astm-d698-c",
        "astm-d1557-a", "astm-d1557-b", "astm-d1557-c",
        "aashto-t99-a", "aashto-t99-b", "aashto-t99-c", "aashto-t99-d",
        "aashto-t180-a", "aashto-t180-b", "aashto-t180-c", "aashto-t180-d",
        "bs-1377-4-3.3", "bs-1377-4-3.4", "bs-1377-4-3.5", "bs-1377-4-3.6", "bs-1377-4-3.7",
        "en-13286-2-standard-a", "en-13286-2-standard-b", "en-13286-2-modified-a", "en-13286-2-modified-b",
        "as-1289-5.1.1-a", "as-1289-5.1.1-b", "as-1289-5.2.1-a", "as-1289-5.2.1-b",
        "is-2720-7-small", "is-2720-7-large", "is-2720-8-small", "is-2720-8-large",
        "jis-a-1210-a", "jis-a-1210-b", "jis-a-1210-c", "jis-a-1210-d", "jis-a-1210-e",
        "nf-p94-093-normal", "nf-p94-093-modified", "nf-p94-093-normal-cbr", "nf-p94-093-modified-cbr",
        "nbr-7182",
        "tex-114-e-1", "tex-114-e-2", "tex-114-e-3", "tex-113-e",
    ];

    public static TheoryData<string> EveryCode => [.. TestMethodCatalogue.Codes];

    public static TheoryData<string> EveryCodeWithMoldDimensions =>
        [.. TestMethodCatalogue.All.Where(method => method is { MoldDiameter: not null, MoldHeight: not null }).Select(method => method.Code)];

    [Fact]
    public void Every_code_of_the_interface_is_there_once_and_no_other() =>
        Assert.Equal(CodesOfTheInterface, TestMethodCatalogue.Codes);

    [Theory]
    [MemberData(nameof(EveryCode))]
    public void A_method_is_found_by_its_code(string code) => Assert.Equal(code, TestMethodCatalogue.Find(code)?.Code);

    [Theory]
    [InlineData("custom")]
    [InlineData("")]
    [InlineData("ASTM-D698-A")]
    [InlineData("astm-d698-d")]
    public void A_code_that_is_not_in_the_catalogue_finds_nothing(string code) => Assert.Null(TestMethodCatalogue.Find(code));

    [Fact]
    public void No_two_methods_share_a_title()
    {
        Assert.Distinct(TestMethodCatalogue.All.Select(method => method.Title));
        Assert.Equal("ASTM D698, method A", Method("astm-d698-a").Title);
    }

    /// <summary>A mistyped dimension shows here: the printed volumes agree with the printed dimensions to 0.1 %.</summary>
    [Theory]
    [MemberData(nameof(EveryCodeWithMoldDimensions))]
    public void A_mold_holds_what_its_dimensions_give(string code)
    {
        var method = Method(code);
        var ofDimensions = Volume.OfCylinder(method.MoldDiameter!.Value, method.MoldHeight!.Value).CubicMeters;
        Assert.InRange(method.MoldVolume.Value.CubicMeters / ofDimensions, 0.999, 1.001);
    }

    [Theory]
    [InlineData("en-13286-2-standard-a", 942.48)]
    [InlineData("nf-p94-093-normal-cbr", 2113.99)]
    [InlineData("tex-113-e", 3706.67)]
    public void A_volume_that_the_method_does_not_print_comes_from_diameter_and_height(string code, double cubicCentimeters)
    {
        var volume = Method(code).MoldVolume;
        Assert.Equal(cubicCentimeters, volume.Value.In(VolumeUnit.CubicCentimeter), 0.005);
        Assert.EndsWith("from diameter and height", volume.Source.Origin, StringComparison.Ordinal);
        Assert.Null(volume.Tolerance);
    }

    [Theory]
    [MemberData(nameof(EveryCode))]
    public void A_method_compacts_by_rammer_or_by_vibration_and_never_by_both(string code)
    {
        var method = Method(code);
        var rammer = new object?[] { method.RammerMass, method.Drop, method.BlowsPerLayer };
        Assert.All(rammer, part => Assert.NotEqual(method.VibrationSecondsPerLayer is null, part is null));
        Assert.Equal(method.VibrationSecondsPerLayer is null, method.Effort is not null);
    }

    [Theory]
    [MemberData(nameof(EveryCode))]
    public void A_sieve_for_oversize_is_the_one_that_the_soil_in_the_mold_has_passed(string code)
    {
        var method = Method(code);
        Assert.True(method.OversizeSieveMillimeters is null || method.OversizeSieveMillimeters.Value == method.LargestParticleMillimeters?.Value);
        Assert.True(method.OversizeSieveMillimeters is null || method.OversizeLimitPercent is not null);
        Assert.True(method.RecommendedSpacingPercent?.Value is not { } advised || !(method.GreatestSpacingPercent?.Value < advised));
    }

    /// <summary>
    /// Rows in which letters are easily crossed: the soil goes with the letter, the mold with another. AASHTO T 99 and T 180 as read;
    /// ASTM D698 as read, the volume of its mold from memory; JIS A 1210 as read for A, B and E, the others from memory.
    /// </summary>
    [Theory]
    [InlineData("astm-d698-a", 943, 25, 4.75, 25.0)]
    [InlineData("astm-d698-b", 943, 25, 9.5, 25.0)]
    [InlineData("astm-d698-c", 2124, 56, 19, 30.0)]
    [InlineData("aashto-t99-a", 943, 25, 4.75, 40.0)]
    [InlineData("aashto-t99-b", 2124, 56, 4.75, 40.0)]
    [InlineData("aashto-t99-c", 943, 25, 19, 30.0)]
    [InlineData("aashto-t99-d", 2124, 56, 19, 30.0)]
    [InlineData("aashto-t180-b", 2124, 56, 4.75, 40.0)]
    [InlineData("aashto-t180-c", 943, 25, 19, 30.0)]
    [InlineData("as-1289-5.1.1-b", 2400, 60, 37.5, 20.0)]
    [InlineData("jis-a-1210-b", 2209, 55, 37.5, null)]
    [InlineData("jis-a-1210-c", 1000, 25, 19, null)]
    [InlineData("jis-a-1210-e", 2209, 92, 37.5, null)]
    [InlineData("nf-p94-093-modified-cbr", 2113.99, 56, 20, 30.0)]
    public void A_letter_has_its_own_mold_blows_and_soil(string code, double moldCubicCentimeters, int blows, double particle, double? oversizeLimit)
    {
        var method = Method(code);
        Assert.Equal(moldCubicCentimeters, method.MoldVolume.Value.In(VolumeUnit.CubicCentimeter), 0.005);
        Assert.Equal(blows, method.BlowsPerLayer?.Value);
        Assert.Equal(particle, method.LargestParticleMillimeters?.Value);
        Assert.Equal(oversizeLimit, method.OversizeLimitPercent?.Value);
    }

    [Fact]
    public void A_tolerance_has_the_unit_of_its_value()
    {
        var method = Method("aashto-t99-a");
        Assert.Equal(14e-6, method.MoldVolume.Tolerance!.Value.CubicMeters, 1e-18);
        Assert.Equal(0.0004, method.MoldDiameter!.Tolerance!.Value.Meters, 1e-15);
        Assert.Equal(0.009, method.RammerMass!.Tolerance!.Value.Kilograms, 1e-15);
        Assert.Equal(0.002, method.Drop!.Tolerance!.Value.Meters, 1e-15);
    }

    [Fact]
    public void A_source_says_when_its_value_is_from_memory()
    {
        var method = Method("astm-d698-a");
        Assert.Equal("ASTM D698", method.MoldDiameter!.Source.ToString());
        Assert.Equal("ASTM D698 (from memory)", method.MinimumSpecimens!.Source.ToString());
    }

    private static TestMethod Method(string code) => TestMethodCatalogue.Find(code)!;
}
