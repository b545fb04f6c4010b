using System.Net;
using System.Text;
using Drypeak.Service.Tests.Charts;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Reports;

/// <summary>Reports by POST and by their address.</summary>
public sealed class ReportTests(RunningService service)
{
    private const string Laboratory = "/v1/reports/moisture-density.pdf";
    private const string Field = "/v1/reports/field-density.pdf";

    private const string FieldTest = """
        {
          "reference": "Ternmarsh, lift 4, 1+240", "method": "direct", "direct": { "dryDensity": 1.82 }, "waterContent": 12.6,
          "laboratory": { "maximumDryDensity": 1.90, "optimumWaterContent": 13.1 },
          "specification": { "requirements": [ { "quantity": "relativeCompaction", "minimum": 95 } ] }
        }
        """;

    public static TheoryData<string, string, string> Reports => new()
    {
        { RunningService.MoistureDensity, Laboratory, Body.Sound },
        { "/v1/field-density", Field, FieldTest },
    };

    [Theory]
    [MemberData(nameof(Reports))]
    public async Task The_answers_link_gives_the_bytes_of_the_post_and_so_does_each_option(string job, string address, string body)
    {
        var link = (await service.AnswerAsync(job, body)).Text("/links/report")!;
        Assert.StartsWith(address + "?d=", link, StringComparison.Ordinal);
        foreach (var options in (string[])["", "paper=letter", "theme=print&paper=a4", "working=true"])
        {
            using var posted = await service.PostAsync(body, address: options.Length == 0 ? address : $"{address}?{options}");
            using var linked = await service.GetAsync(options.Length == 0 ? link : $"{link}&{options}");
            Assert.Equal((HttpStatusCode.OK, HttpStatusCode.OK), (posted.StatusCode, linked.StatusCode));
            Assert.Equal("application/pdf", linked.Content.Headers.ContentType?.MediaType);
            Assert.NotNull(linked.Headers.ETag);
            var bytes = await BytesOf(posted);
            Assert.StartsWith("%PDF-", Encoding.Latin1.GetString(bytes), StringComparison.Ordinal);
            Assert.Equal(bytes, await BytesOf(linked));
        }
    }

    /// <summary>The address in the report is the one that gives it, options and all.</summary>
    [Fact]
    public async Task A_report_names_the_address_that_gives_it_again()
    {
        using var posted = await service.PostAsync(Body.Sound, address: Laboratory + "?paper=letter&working=true");
        var bytes = await BytesOf(posted);
        var text = Encoding.Latin1.GetString(bytes);
        var start = text.IndexOf("/URI (", StringComparison.Ordinal) + 6;
        var address = text[start..text.IndexOf(')', start)];
        Assert.EndsWith("&paper=letter&working=true", address, StringComparison.Ordinal);
        Assert.Equal(bytes, await service.BytesAsync(address));
    }

    [Fact]
    public async Task The_address_holds_the_request_without_what_was_not_given()
    {
        var link = (await service.AnswerAsync(Body.Sound)).Text("/links/report")!;
        var request = ChartLink.Unpack(ChartLink.Data(link));
        Assert.Equal(["mold", "reference", "specificGravity", "specimens", "units"], request.Select(member => member.Key).Where(key => key is not ("method" or "lines")).Order());
        Assert.DoesNotContain("null", request.ToJsonString(), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("", "/d missing-parameter")]
    [InlineData("?d=*", "/d not-readable")]
    [InlineData("?d=AAAA&d=AAAA", "/d repeated-parameter")]
    [InlineData("?paper=a5", "/paper unknown-choice", "/d missing-parameter")]
    [InlineData("?theme=dark", "/theme unknown-choice", "/d missing-parameter")]
    [InlineData("?working=yes&page=2", "/page unknown-parameter", "/working unknown-choice", "/d missing-parameter")]
    public async Task An_address_that_says_nothing_readable_is_refused(string query, params string[] expected)
    {
        foreach (var address in (string[])[Laboratory, Field])
        {
            using var response = await service.GetAsync(address + query);
            var refusal = await Refusal.Of(response);
            Assert.Equal(400, refusal.Status);
            Assert.Equal(expected, refusal.Faults);
        }
    }

    [Theory]
    [InlineData("""{"specimens":[]}""", "/specimens")]
    [InlineData("""{"specimens":[{"waterContent":-1,"dryDensity":1.8}]}""", "/specimens/0/waterContent")]
    [InlineData("""{"speciments":[]}""", "/speciments")]
    [InlineData("[]", "of the request")]
    public async Task A_forged_request_in_an_address_is_refused_with_its_faults(string json, string place)
    {
        using var response = await service.GetAsync($"{Laboratory}?d={ChartLink.Pack(json)}");
        var refusal = await Refusal.Of(response);
        Assert.Equal(400, refusal.Status);
        Assert.All(refusal.Errors, fault => Assert.Equal("/d", fault.Place));
        Assert.Contains(refusal.Errors, fault => fault.Message.Contains(place, StringComparison.Ordinal));
    }

    [Fact]
    public async Task A_post_is_refused_like_the_job_itself()
    {
        var refusal = await service.RefusalAsync(Laboratory, Body.With("/specimens", "[]"));
        Assert.Equal(422, refusal.Status);
        Assert.Equal((await service.RefusalAsync(Body.With("/specimens", "[]"))).Faults, refusal.Faults);
        using var response = await service.PostAsync(Body.Sound, accept: "image/png", address: Laboratory);
        Assert.Equal(HttpStatusCode.NotAcceptable, response.StatusCode);
    }

    [Fact]
    public async Task What_cannot_be_fitted_is_reported_and_what_is_too_long_for_an_address_too()
    {
        using var without = await service.PostAsync(Body.WithPoints((8, 1.7), (10, 1.75), (12, 1.8)), address: Laboratory);
        Assert.Equal(HttpStatusCode.OK, without.StatusCode);
        var many = Body.WithSpecimens(Enumerable.Range(0, 500).Select(i => $$"""{"label":"{{Convert.ToBase64String(System.Security.Cryptography.SHA256.HashData([(byte)i, (byte)(i >> 8)]))}}","waterContent":{{5 + (i * 0.031)}},"dryDensity":{{1.7 + (i * 7919 % 1009 * 1e-4)}}}"""));
        Assert.Null((await service.AnswerAsync(many)).Text("/links/report"));
        using var long500 = await service.PostAsync(many, address: Laboratory);
        Assert.Equal(HttpStatusCode.OK, long500.StatusCode);
    }

    private static Task<byte[]> BytesOf(HttpResponseMessage response) => response.Content.ReadAsByteArrayAsync(TestContext.Current.CancellationToken);
}
