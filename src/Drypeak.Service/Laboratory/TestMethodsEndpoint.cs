using Drypeak.Service.Hosting;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Service.Laboratory;

/// <summary>A test method of the catalogue. Each value says where it comes from; what was not read there is from memory.</summary>
/// <param name="Code" example="astm-d698-a">Its code, as in a request.</param>
/// <param name="Title" example="ASTM D698, method A">Its name.</param>
/// <param name="Summary" example="Standard effort, 101.6 mm mold, soil passing 4.75 mm">What it is.</param>
/// <param name="Standard" example="ASTM D698">The standard.</param>
/// <param name="Clause" example="Method A">Clause or method in it.</param>
/// <param name="MoldVolume">Volume of the mold, cm³.</param>
/// <param name="MoldDiameter">Inside diameter of the mold, mm.</param>
/// <param name="MoldHeight">Inside height of the mold, mm.</param>
/// <param name="RammerMass">Mass of the rammer, kg.</param>
/// <param name="Drop">Height of fall, mm.</param>
/// <param name="Layers">Number of layers.</param>
/// <param name="BlowsPerLayer">Blows on each layer.</param>
/// <param name="VibrationPerLayer">Vibration of each layer, s.</param>
/// <param name="ComputedEffort" example="593.5">Compactive effort from rammer, drop, layers, blows and volume, kJ/m³.</param>
/// <param name="NominalEffort">Compactive effort as published, kJ/m³.</param>
/// <param name="LargestParticle">Largest particle, mm.</param>
/// <param name="OversizeSieve">Sieve that parts the oversize, mm.</param>
/// <param name="OversizeLimit">Largest share of oversize, % of dry mass.</param>
/// <param name="MinimumSpecimens">Fewest specimens.</param>
/// <param name="RecommendedSpacing">Spacing of water contents, percentage points.</param>
/// <param name="GreatestSpacing">Greatest spacing of water contents, percentage points.</param>
/// <param name="Reporting">How the result is rounded; null where the method says nothing that is at hand.</param>
public sealed record TestMethodAnswer(
    string Code, string Title, string Summary, string Standard, string Clause,
    CatalogueValue MoldVolume, CatalogueValue? MoldDiameter, CatalogueValue? MoldHeight,
    CatalogueValue? RammerMass, CatalogueValue? Drop, CatalogueValue Layers, CatalogueValue? BlowsPerLayer, CatalogueValue? VibrationPerLayer,
    double? ComputedEffort, CatalogueValue? NominalEffort,
    CatalogueValue? LargestParticle, CatalogueValue? OversizeSieve, CatalogueValue? OversizeLimit,
    CatalogueValue? MinimumSpecimens, CatalogueValue? RecommendedSpacing, CatalogueValue? GreatestSpacing,
    CatalogueReporting? Reporting)
{
    internal static TestMethodAnswer Of(TestMethod method) => new(
        method.Code, method.Title, method.Summary, method.Standard, method.Clause,
        CatalogueValue.Of(method.MoldVolume, volume => volume.In(VolumeUnit.CubicCentimeter), "cm³"),
        method.MoldDiameter is { } diameter ? CatalogueValue.Of(diameter, InMillimeters, "mm") : null,
        method.MoldHeight is { } height ? CatalogueValue.Of(height, InMillimeters, "mm") : null,
        method.RammerMass is { } rammer ? CatalogueValue.Of(rammer, mass => mass.Kilograms, "kg") : null,
        method.Drop is { } drop ? CatalogueValue.Of(drop, InMillimeters, "mm") : null,
        CatalogueValue.Of(method.Layers, Same, ""),
        method.BlowsPerLayer is { } blows ? CatalogueValue.Of(blows, Same, "") : null,
        method.VibrationSecondsPerLayer is { } seconds ? CatalogueValue.Of(seconds, Same, "s") : null,
        method.Effort?.KilojoulesPerCubicMeter,
        method.NominalEffort is { } effort ? CatalogueValue.Of(effort, value => value.KilojoulesPerCubicMeter, "kJ/m³") : null,
        method.LargestParticleMillimeters is { } particle ? CatalogueValue.Of(particle, Same, "mm") : null,
        method.OversizeSieveMillimeters is { } sieve ? CatalogueValue.Of(sieve, Same, "mm") : null,
        method.OversizeLimitPercent is { } limit ? CatalogueValue.Of(limit, Same, "%") : null,
        method.MinimumSpecimens is { } fewest ? CatalogueValue.Of(fewest, Same, "") : null,
        method.RecommendedSpacingPercent is { } spacing ? CatalogueValue.Of(spacing, Same, "%") : null,
        method.GreatestSpacingPercent is { } greatest ? CatalogueValue.Of(greatest, Same, "%") : null,
        method.Reporting is { } rule ? CatalogueReporting.Of(rule) : null);

    private static double InMillimeters(Length length) => length.In(LengthUnit.Millimeter);

    private static double Same(int value) => value;

    private static double Same(double value) => value;
}

/// <summary>A value of the catalogue with its source.</summary>
/// <param name="Value" example="943">The value.</param>
/// <param name="Tolerance" example="14">Plus and minus; null where the source gives none.</param>
/// <param name="Unit" example="cm³">Its unit; empty for a count.</param>
/// <param name="Source" example="ASTM D698">Where it comes from.</param>
/// <param name="Read" example="false">Whether it was read there; else it is from memory.</param>
public sealed record CatalogueValue(double Value, double? Tolerance, string Unit, string Source, bool Read)
{
    /// <summary>The catalogue's numbers are short; decimals beyond these are what a change of unit adds.</summary>
    private const int Decimals = 9;

    internal static CatalogueValue Of<T>(Sourced<T> sourced, Func<T, double> inUnit, string unit)
        where T : struct =>
        new(Math.Round(inUnit(sourced.Value), Decimals), sourced.Tolerance is { } tolerance ? Math.Round(inUnit(tolerance), Decimals) : null, unit, sourced.Source.Origin, sourced.Source.Read);
}

/// <summary>How a method rounds its result, halves to the even digit.</summary>
/// <param name="WaterContent" example="to 0.1 %">Optimum water content.</param>
/// <param name="DryDensity" example="to 0.1 lb/ft³">Maximum dry density.</param>
/// <param name="Source" example="ASTM D698">Where it comes from.</param>
/// <param name="Read" example="true">Whether it was read there; else it is from memory.</param>
public sealed record CatalogueReporting(string WaterContent, string DryDensity, string Source, bool Read)
{
    internal static CatalogueReporting Of(ReportingRule rule) => new(
        rule.WaterContent.Describe("%"), rule.DryDensity.Describe(rule.DryDensityUnit.Symbol()), rule.Source.Origin, rule.Source.Read);
}

/// <summary><c>GET /v1/test-methods</c> and <c>/v1/test-methods/{code}</c>.</summary>
internal static class TestMethodsEndpoint
{
    internal static IReadOnlyList<TestMethodAnswer> Methods { get; } = [.. TestMethodCatalogue.All.Select(TestMethodAnswer.Of)];

    public static void MapTestMethods(this IEndpointRouteBuilder app)
    {
        app.MapMethods("/v1/test-methods", EndpointDescription.Reading, () => Results.Json(Methods, ServiceJson.Of<IReadOnlyList<TestMethodAnswer>>()))
            .WithTags("Catalogues")
            .WithName("test-methods")
            .WithSummary("Every test method")
            .WithDescription("The catalogue: mold, rammer, effort, particles, specimens, each value with its source.")
            .Gives<IReadOnlyList<TestMethodAnswer>>("application/json");
        app.MapMethods("/v1/test-methods/{code}", EndpointDescription.Reading, Find)
            .WithTags("Catalogues")
            .WithName("test-method")
            .WithSummary("One test method")
            .Gives<TestMethodAnswer>("application/json")
            .Refuses(404);
    }

    /// <summary>The method of a code.</summary>
    /// <param name="code" example="astm-d698-a">Its code.</param>
    private static IResult Find(string code) =>
        Methods.FirstOrDefault(method => method.Code == code) is { } found
            ? Results.Json(found, ServiceJson.Of<TestMethodAnswer>())
            : Problems.NotFound("There is no test method of this code; /v1/test-methods lists them.");
}
