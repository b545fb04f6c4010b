using System.Net.Http.Headers;
using System.Xml.Linq;
using Drypeak.Service.Tests.Charts;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Field;

/// <summary>The pictures of the field's jobs: by Accept and by links, the same bytes.</summary>
public sealed class FieldChartTests(RunningService service)
{
    private const string Family = """
        {"family":[{"label":"A","optimumWaterContent":12,"maximumDryDensity":1.9},{"label":"B","optimumWaterContent":14,"maximumDryDensity":1.8},{"label":"C","optimumWaterContent":16,"maximumDryDensity":1.7}],
         "point":{"waterContent":12,"dryDensity":1.83}}
        """;

    private const string Rapid = """{"field":{"wetDensity":2.033},"specimens":[{"waterAdded":0,"wetDensity":2.045},{"waterAdded":2,"wetDensity":2.129},{"waterAdded":4,"wetDensity":2.132}]}""";

    public static TheoryData<string, string, int> Pictures => new()
    {
        // The field test alone; then with the five specimens of its laboratory test.
        { FieldJobs.FieldDensity, FieldJobs.Sound, 1 },
        { FieldJobs.FieldDensity, FieldJobs.With(("/laboratory", $$"""{"test":{{Body.Sound}}}""")), 6 },
        { FieldJobs.OnePoint, Family, 2 },
        { FieldJobs.RapidMethod, Rapid, 4 },
    };

    [Theory]
    [MemberData(nameof(Pictures))]
    public async Task The_picture_by_Accept_has_the_bytes_of_the_link(string address, string body, int marks)
    {
        var links = (await service.AnswerAsync(address, body)).At("/links");
        foreach (var (member, mediaType) in new[] { ("svg", "image/svg+xml"), ("png", "image/png"), ("pdf", "application/pdf") })
        {
            var posted = await PictureAsync(address, body, mediaType);
            using var linked = await service.GetAsync(links.Text("/" + member)!);
            Assert.Equal(mediaType, linked.Content.Headers.ContentType!.MediaType);
            Assert.Equal(posted, await linked.Content.ReadAsByteArrayAsync(TestContext.Current.CancellationToken));
        }

        var svg = XDocument.Parse(System.Text.Encoding.UTF8.GetString(await PictureAsync(address, body, "image/svg+xml")));
        Assert.Equal(marks, svg.Descendants().Count(element => element.Attribute("data-x") is { }));
    }

    [Fact]
    public async Task The_field_test_stands_at_its_own_numbers_and_the_zone_where_it_is_accepted()
    {
        var chart = ChartLink.Unpack(ChartLink.Data((await service.AnswerAsync(FieldJobs.FieldDensity, FieldJobs.Sound)).Text("/links/svg")!));
        Assert.Equal(12, (double)chart["fieldTests"]![0]!["waterContent"]!);
        var zone = chart["zone"]!["corners"]!.AsArray();

        // ± 2 % about 12.5 %, and from 95 % of 1.90 Mg/m³ upward.
        Assert.Equal(10.5, zone.Min(corner => (double)corner!["waterContent"]!), 1e-9);
        Assert.Equal(14.5, zone.Max(corner => (double)corner!["waterContent"]!), 1e-9);
        Assert.Equal(0.95 * 1.90, zone.Min(corner => (double)corner!["dryDensity"]!), 1e-9);
    }

    /// <summary>Corrected on the field's side, the fines are held against the laboratory's curve, and so they are what is drawn.</summary>
    [Fact]
    public async Task With_the_oversize_taken_off_the_field_the_fines_are_drawn()
    {
        var answer = await service.AnswerAsync(FieldJobs.FieldDensity, FieldJobs.With(("/oversize", """{"percent":20,"specificGravity":2.65,"waterContent":1.5,"apply":"field"}""")));
        var drawn = ChartLink.Unpack(ChartLink.Data(answer.Text("/links/svg")!))["fieldTests"]![0]!;
        Assert.Equal(answer.Number("/test/fine/dryDensity"), (double)drawn["dryDensity"]!, 1e-9);
        Assert.Equal(answer.Number("/test/fine/waterContent"), (double)drawn["waterContent"]!, 1e-9);
    }

    [Fact]
    public async Task Without_a_dry_density_there_is_no_picture_and_no_link()
    {
        var body = FieldJobs.With(("/waterContent", Body.Absent));
        var answer = await service.AnswerAsync(FieldJobs.FieldDensity, body);
        Assert.True(answer.IsNull("/links/svg"));
        using var response = await SendAsync(FieldJobs.FieldDensity, body, "image/svg+xml");
        Assert.Equal(422, (int)response.StatusCode);
    }

    [Theory]
    [InlineData(FieldJobs.OnePoint, Family)]
    [InlineData(FieldJobs.OnePoint, """{"family":[{"label":"A","optimumWaterContent":12,"maximumDryDensity":1.9},{"label":"B","optimumWaterContent":14,"maximumDryDensity":1.8},{"label":"C","optimumWaterContent":16,"maximumDryDensity":1.7}],"point":{"tins":[{"tin":30,"wet":142,"dry":130},{"tin":31,"wet":144,"dry":132}],"moldAndWetSoil":6150,"mold":{"mass":4200,"diameter":101.6,"height":117}}}""")]
    [InlineData(FieldJobs.OnePoint, """{"units":{"mass":"lb","volume":"ft3","density":"lb/ft3"},"family":[{"optimumWaterContent":12,"maximumDryDensity":119},{"optimumWaterContent":14,"maximumDryDensity":112},{"optimumWaterContent":16,"maximumDryDensity":106}],"point":{"carbide":{"reading":5.4,"halfSample":true},"moldAndWetSoil":13.6,"mold":{"mass":9.37,"volume":0.0333}}}""")]
    [InlineData(FieldJobs.RapidMethod, Rapid)]
    [InlineData(FieldJobs.RapidMethod, """{"units":{"density":"kN/m3"},"field":{"wetDensity":20,"waterContent":12},"specimens":[{"waterAdded":-1.5,"wetDensity":19.1},{"waterAdded":0,"wetDensity":20.3},{"waterAdded":1.5,"wetDensity":20.9},{"waterAdded":3,"wetDensity":20.8},{"waterAdded":5,"wetDensity":20.1}]}""")]
    [InlineData(FieldJobs.RapidMethod, """{"field":{"wetDensity":2.0,"waterContent":15},"specimens":[{"waterAdded":-3,"wetDensity":1.968},{"waterAdded":-1,"wetDensity":2.041},{"waterAdded":1.5,"wetDensity":2.058}]}""")]
    [InlineData(FieldJobs.RelativeDensity, """{"wetDensity":1.7,"waterContent":8,"minimumDryDensity":1.5,"maximumDryDensity":1.8}""")]
    public async Task Each_step_of_the_working_gives_its_value_again(string address, string body)
    {
        Assert.False((await service.AnswerAsync(address, body)).Has("trace"));
        var answer = await service.AnswerAsync(address, body[..body.LastIndexOf('}')] + ",\"trace\":true}");
        var steps = answer.GetProperty("trace").EnumerateArray().ToList();
        Assert.NotEmpty(steps);
        foreach (var step in steps.Where(step => !step.IsNull("/substitution")))
        {
            var value = step.Number("/value");
            Assert.Matches(@"^[0-9.+\-*/^() ]+$", step.Text("/substitution"));
            Assert.Equal(value, Arithmetic.Value(step.Text("/substitution")!), 1e-9 * Math.Max(1, Math.Abs(value)));
        }

        Assert.All(steps, step => Assert.StartsWith("<math", step.Text("/mathml"), StringComparison.Ordinal));
        Assert.All(steps, step => Assert.NotEqual("", step.Text("/source")));
        var values = steps.ToDictionary(step => step.Text("/quantity")!, step => step.Number("/value"));
        foreach (var (quantity, place) in new[]
        {
            ("optimum water content", "/optimum/waterContent"), ("maximum dry density", "/optimum/maximumDryDensity"), ("share of the optimum", "/percentOfOptimum"),
            ("density ratio", "/densityRatio"), ("relative density", "/relativeDensity"), ("relative compaction", "/relativeCompaction"),
        })
        {
            if (values.TryGetValue(quantity, out var value))
            {
                Assert.Equal(answer.Number(place), value, 1e-9 * value);
            }
        }
    }

    private async Task<byte[]> PictureAsync(string address, string body, string mediaType)
    {
        using var response = await SendAsync(address, body, mediaType);
        Assert.Equal(mediaType, response.Content.Headers.ContentType!.MediaType);
        return await response.Content.ReadAsByteArrayAsync(TestContext.Current.CancellationToken);
    }

    private async Task<HttpResponseMessage> SendAsync(string address, string body, string mediaType)
    {
        using var request = new HttpRequestMessage(HttpMethod.Post, address) { Content = RunningService.Json(body) };
        request.Headers.Accept.Add(new MediaTypeWithQualityHeaderValue(mediaType));
        return await service.Client.SendAsync(request, TestContext.Current.CancellationToken);
    }
}
