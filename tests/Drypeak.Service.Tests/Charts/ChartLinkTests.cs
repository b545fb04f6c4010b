using System.Net;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Charts;

/// <summary>A link is given only where the service answers it, with what a post of the test itself draws.</summary>
public sealed class ChartLinkTests(RunningService service)
{
    private const string Adopted = """{"adopted":{"waterContent":14.5,"maximumDryDensity":1.87,"reason":"by hand"}}""";

    public static TheoryData<string> Tests =>
    [
        Body.With("/curve", Adopted),
        Body.With("/oversize", """{"percent":20,"specificGravity":2.65}"""),
        Body.With(("/curve", Adopted), ("/oversize", """{"percent":20,"specificGravity":2.65}"""), ("/lines", """{"saturation":[100,90],"airVoids":[0,5]}""")),
        Body.With("/curve", """{"model":"spline"}"""),
        Body.With("/specificGravity", Body.Absent),
        Body.With("/reference", Body.Absent),
        Body.With("/units/density", "\"kN/m3\""),
        Body.With("/specimens/4/setAside", "\"mold not full\""),
        Body.WithPoints((12, 1.8)),
        Body.WithPoints((8, 1.7), (10, 1.75), (12, 1.8)),
        Body.WithSpecimens("""{"waterContent":12,"dryDensity":1.8,"setAside":"torn"}"""),
    ];

    [Theory]
    [MemberData(nameof(Tests))]
    public async Task A_tests_link_gives_the_bytes_of_its_post(string body)
    {
        var link = (await service.AnswerAsync(body)).Text("/links/svg")!;
        using var posted = await service.PostAsync(body, accept: "image/svg+xml");
        using var linked = await service.GetAsync(link);
        var text = await RunningService.TextOf(linked);
        Assert.True(linked.StatusCode == HttpStatusCode.OK, text);
        Assert.Equal(await RunningService.TextOf(posted), text);
    }

    [Fact]
    public async Task What_cannot_be_drawn_is_answered_without_links_and_refused_as_a_picture()
    {
        var body = Body.With(("/units/density", "\"kg/m3\""), ("/specimens", """[{"waterContent":10,"wetMass":5500,"mold":{"volume":1e-3}}]"""));
        var answer = await service.AnswerAsync(body);
        Assert.Equal(System.Text.Json.JsonValueKind.Null, answer.At("/links/svg").ValueKind);
        Assert.Contains("cannot be drawn", answer.Finding("no-chart-address").Text("/message"), StringComparison.Ordinal);
        using var response = await service.PostAsync(body, accept: "image/png");
        var refusal = await Refusal.Of(response);
        Assert.Equal(422, refusal.Status);
        Assert.Equal([" not-drawable"], refusal.Faults);
    }
}
