using Drypeak.Service.Tests.Laboratory;
using Drypeak.Soil.References;
using Xunit;

namespace Drypeak.Service.Tests.Field;

/// <summary>Each finding on the choice of a reference: what provokes it, and a twin that comes near and does not. Invented numbers.</summary>
public sealed class ReferenceFindingTests(RunningService service)
{
    private const string A = """{"label":"A","optimumWaterContent":12,"maximumDryDensity":1.9,"points":[[9,1.8325],[10.5,1.883125],[13.5,1.883125]]}""";
    private const string B = """{"label":"B","optimumWaterContent":14,"maximumDryDensity":1.8,"points":[[10,1.74],[12,1.785],[16,1.785]]}""";
    private const string C = """{"label":"C","optimumWaterContent":16,"maximumDryDensity":1.7,"points":[[12,1.66],[14,1.69],[18,1.69]]}""";
    private const string WithoutPeak = """{"label":"X","points":[[10,1.6],[12,1.7],[14,1.8]]}""";
    private const string WithPeak = """{"label":"X","points":[[16,1.56],[18,1.6],[20,1.6],[22,1.55]]}""";
    private const string OnB = """{"waterContent":12,"dryDensity":1.785}""";

    public static TheoryData<string, string, string, string> Twins => new()
    {
        { "family-too-small", FieldJobs.OnePoint, Family(OnB, A, B), Family(OnB, A, B, C) },
        { "outside-family", FieldJobs.OnePoint, Family("""{"waterContent":11,"dryDensity":1.91}""", A, B, C), Family("""{"waterContent":11,"dryDensity":1.89}""", A, B, C) },
        { "point-too-dry", FieldJobs.OnePoint, Family("""{"waterContent":11.1,"dryDensity":1.768}""", A, B, C), Family("""{"waterContent":11.2,"dryDensity":1.7706}""", A, B, C) },
        { "point-too-wet", FieldJobs.OnePoint, Family("""{"waterContent":14.1,"dryDensity":1.7999625}""", A, B, C), Family("""{"waterContent":13.9,"dryDensity":1.7999625}""", A, B, C) },
        { "shape-assumed", FieldJobs.OnePoint, Family(OnB, A, B, """{"optimumWaterContent":16,"maximumDryDensity":1.7}"""), Family(OnB, A, B, C) },
        { "family-out-of-order", FieldJobs.OnePoint, Family(OnB, A, B, """{"label":"C","optimumWaterContent":13.9,"maximumDryDensity":1.7}"""), Family(OnB, A, B, """{"label":"C","optimumWaterContent":14,"maximumDryDensity":1.7}""") },
        { "member-without-peak", FieldJobs.OnePoint, Family(OnB, A, B, C, WithoutPeak), Family(OnB, A, B, C, WithPeak) },
        { "beyond-density-limits", FieldJobs.RelativeDensity, Relative("1.4999"), Relative("1.5") },
        { "water-content-estimated", FieldJobs.RapidMethod, Rapid(""), Rapid(""","waterContent":12""") },
    };

    [Theory]
    [MemberData(nameof(Twins))]
    public async Task A_finding_is_raised_where_it_belongs_and_not_near_it(string code, string address, string provoking, string near)
    {
        Assert.Contains(code, (await service.AnswerAsync(address, provoking)).Findings());
        Assert.DoesNotContain(code, (await service.AnswerAsync(address, near)).Findings());
    }

    [Fact]
    public void Every_kind_has_its_twins() =>
        Assert.Equal(ReferenceFindingKinds.All.Select(kind => kind.Code).Order(StringComparer.Ordinal), Twins.Select(row => row.Data.Item1).Order(StringComparer.Ordinal));

    [Theory]
    [InlineData(FieldJobs.OnePoint, 0)]
    [InlineData(FieldJobs.RelativeDensity, 7)]
    [InlineData(FieldJobs.RapidMethod, 8)]
    public async Task The_caller_s_labels_come_back_and_are_bounded(string address, int twin)
    {
        var body = Twins.ElementAt(twin).Data.Item4[1..];
        var answer = await service.AnswerAsync(address, """{"reference":"Ternmarsh","identification":{"layer/2":"clay"},""" + body);
        Assert.Equal("Ternmarsh", answer.Text("/reference"));
        Assert.Equal("clay", answer.At("/identification").GetProperty("layer/2").GetString());
        Assert.False((await service.AnswerAsync(address, "{" + body)).Has("identification"));
        var refusal = await service.RefusalAsync(address, $$"""{"identification":{"layer/2":"{{new string('x', 5000)}}"},""" + body);
        Assert.Contains(refusal.Faults, fault => fault.Contains("/identification/layer~12", StringComparison.Ordinal));
    }

    [Fact]
    public async Task A_family_may_be_given_as_optima_as_points_or_as_whole_tests()
    {
        string[] ways =
        [
            Family("""{"waterContent":11.5,"dryDensity":1.83}""", Optimum(12, 1.9), Optimum(14, 1.8), Optimum(16, 1.7)),
            Family("""{"waterContent":11.5,"dryDensity":1.83}""", Points(12, 1.9, 0.0075), Points(14, 1.8, 0.00375), Points(16, 1.7, 0.0025)),
            Family("""{"waterContent":11.5,"dryDensity":1.83}""", Test(12, 1.9, 0.0075), Test(14, 1.8, 0.00375), Test(16, 1.7, 0.0025)),
        ];
        foreach (var way in ways)
        {
            var answer = await service.AnswerAsync(FieldJobs.OnePoint, way);
            Assert.True(answer.At("/usable").GetBoolean(), way);
            Assert.Equal(["1", "2"], answer.GetProperty("between").EnumerateArray().Select(label => label.GetString()!));

            // The same three curves, so that the optimum is the same but for the shape that optima alone leave open, and the fit.
            Assert.Equal(12.9, answer.Number("/optimum/waterContent"), 0.35);
            Assert.Equal(1.855, answer.Number("/optimum/maximumDryDensity"), 0.02);
        }
    }

    private static string Optimum(double w, double most) => FormattableString.Invariant($$"""{ "optimumWaterContent": {{w}}, "maximumDryDensity": {{most}} }""");

    private static string Points(double w, double most, double fall) =>
        $$"""{"points":[{{string.Join(',', Shape(w, most, fall).Select(point => FormattableString.Invariant($"[{point.W},{point.Density}]")))}}]}""";

    private static string Test(double w, double most, double fall) =>
        $$"""{"test":{"specimens":[{{string.Join(',', Shape(w, most, fall).Select(point => FormattableString.Invariant($$"""{ "waterContent": {{point.W}}, "dryDensity": {{point.Density}} }""")))}}],"curve":{"model":"parabola"} } }""";

    private static IEnumerable<(double W, double Density)> Shape(double w, double most, double fall) =>
        new[] { -3.5, -2, -0.5, 1.2, 2.8 }.Select(from => (w + from, Math.Round(most - (fall * from * from), 6)));

    private static string Family(string point, params string[] members) => $$"""{"family":[{{string.Join(',', members)}}],"point":{{point}}}""";

    private static string Relative(string dry) => $$"""{"dryDensity":{{dry}},"minimumDryDensity":1.5,"maximumDryDensity":1.8}""";

    private static string Rapid(string water) => $$"""{"field":{"wetDensity":2.0{{water}}},"specimens":[{"waterAdded":0,"wetDensity":2.0375},{"waterAdded":2,"wetDensity":2.13945},{"waterAdded":4,"wetDensity":2.1606}]}""";
}
