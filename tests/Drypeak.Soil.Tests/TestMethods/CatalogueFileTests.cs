using System.Text.Json;
using Drypeak.Soil.TestMethods;
using Xunit;

namespace Drypeak.Soil.Tests.TestMethods;

/// <summary>The schema of <c>test-methods.json</c>, held against the file itself and not against the types that read it.</summary>
public class CatalogueFileTests
{
    private static readonly Dictionary<string, string[]> UnitsOfValues = new()
    {
        ["moldVolume"] = ["cm3"],
        ["moldDiameter"] = ["mm"],
        ["moldHeight"] = ["mm"],
        ["rammerMass"] = ["kg"],
        ["drop"] = ["mm"],
        ["layers"] = [],
        ["blowsPerLayer"] = [],
        ["vibrationPerLayer"] = ["s"],
        ["nominalEffort"] = ["kJ/m3", "ft.lbf/in3"],
        ["largestParticle"] = ["mm"],
        ["oversizeSieve"] = ["mm"],
        ["oversizeLimit"] = ["%"],
        ["minimumSpecimens"] = [],
        ["recommendedSpacing"] = ["%"],
        ["greatestSpacing"] = ["%"],
    };

    private static readonly string[] Names = ["code", "standard", "clause", "summary"];

    private static readonly JsonElement[] Rows = ReadRows();

    public static TheoryData<string> EveryCode => [.. Rows.Select(row => row.GetProperty("code").GetString()!)];

    [Theory]
    [MemberData(nameof(EveryCode))]
    public void A_row_is_named_in_full(string code) =>
        Assert.All(Names, name => Assert.False(string.IsNullOrWhiteSpace(Row(code).GetProperty(name).GetString())));

    [Theory]
    [MemberData(nameof(EveryCode))]
    public void Every_value_has_a_source_and_says_whether_it_was_read(string code)
    {
        foreach (var member in Row(code).EnumerateObject().Where(member => !Names.Contains(member.Name)))
        {
            Assert.False(string.IsNullOrWhiteSpace(member.Value.GetProperty("source").GetString()), member.Name);
            Assert.True(member.Value.GetProperty("read").ValueKind is JsonValueKind.True or JsonValueKind.False, member.Name);
        }
    }

    [Theory]
    [MemberData(nameof(EveryCode))]
    public void Every_value_is_positive_and_in_the_unit_of_its_kind(string code)
    {
        foreach (var member in Row(code).EnumerateObject().Where(member => !Names.Contains(member.Name) && member.Name != "reporting"))
        {
            var units = Assert.Contains(member.Name, (IDictionary<string, string[]>)UnitsOfValues);
            Assert.True(member.Value.GetProperty("value").GetDouble() > 0, member.Name);
            Assert.Equal(units.Length > 0, member.Value.TryGetProperty("unit", out var unit));
            Assert.True(units.Length == 0 || units.Contains(unit.GetString()), member.Name);
            Assert.True(!member.Value.TryGetProperty("tolerance", out var tolerance) || tolerance.GetDouble() > 0, member.Name);
        }
    }

    [Fact]
    public void A_row_of_the_file_is_a_method_of_the_catalogue() =>
        Assert.Equal(Rows.Select(row => row.GetProperty("code").GetString()), TestMethodCatalogue.Codes);

    /// <summary>A value is not read as another because a member was passed over: as many sources in the file as in the types.</summary>
    [Theory]
    [MemberData(nameof(EveryCode))]
    public void Every_value_of_the_file_reaches_the_method(string code)
    {
        var inFile = Row(code).EnumerateObject().Count(member => !Names.Contains(member.Name));
        var method = TestMethodCatalogue.Find(code)!;
        var volumeIsDerived = !Row(code).TryGetProperty("moldVolume", out _);
        var inMethod = new object?[]
        {
            method.MoldVolume, method.MoldDiameter, method.MoldHeight, method.RammerMass, method.Drop, method.Layers, method.BlowsPerLayer,
            method.VibrationSecondsPerLayer, method.NominalEffort, method.LargestParticleMillimeters, method.OversizeSieveMillimeters,
            method.OversizeLimitPercent, method.MinimumSpecimens, method.RecommendedSpacingPercent, method.GreatestSpacingPercent, method.Reporting,
        }.Count(value => value is not null);
        Assert.Equal(inFile, volumeIsDerived ? inMethod - 1 : inMethod);
    }

    private static JsonElement Row(string code) => Rows.Single(row => row.GetProperty("code").GetString() == code);

    private static JsonElement[] ReadRows()
    {
        using var file = typeof(TestMethodCatalogue).Assembly.GetManifestResourceStream("test-methods.json")!;
        using var document = JsonDocument.Parse(file);
        return [.. document.RootElement.Clone().EnumerateArray()];
    }
}
