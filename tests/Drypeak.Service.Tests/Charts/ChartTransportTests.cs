using System.Net;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Charts;

/// <summary>Charts over HTTP: links, media types, caches, sizes.</summary>
public sealed class ChartTransportTests(RunningService service, SecondInstance another)
{
    [Theory]
    [InlineData("svg", "image/svg+xml", "<svg ")]
    [InlineData("png", "image/png", "\u0089PNG\r\n\u001a\n")]
    [InlineData("pdf", "application/pdf", "%PDF-")]
    public async Task Each_link_gives_its_picture_and_a_post_that_accepts_it_the_same_bytes(string format, string mediaType, string magic)
    {
        var link = await ChartLink.OfSoundTest(service, format);
        using var linked = await service.GetAsync(link);
        Assert.Equal(HttpStatusCode.OK, linked.StatusCode);
        Assert.Equal(mediaType, linked.Content.Headers.ContentType?.ToString());
        var bytes = await BytesOf(linked);
        Assert.StartsWith(magic, System.Text.Encoding.Latin1.GetString(bytes), StringComparison.Ordinal);

        using var posted = await service.PostAsync(Body.Sound, accept: mediaType);
        Assert.Equal(HttpStatusCode.OK, posted.StatusCode);
        Assert.Equal(mediaType, posted.Content.Headers.ContentType?.ToString());
        Assert.Equal(bytes, await BytesOf(posted));
        Assert.Equal("Accept", posted.Headers.Vary.ToString());
    }

    [Theory]
    [InlineData("svg")]
    [InlineData("png")]
    [InlineData("pdf")]
    public async Task Two_instances_draw_the_same_bytes(string format)
    {
        var link = await ChartLink.OfSoundTest(another, format);
        Assert.Equal(link, await ChartLink.OfSoundTest(service, format));
        Assert.Equal(await service.BytesAsync(link), await another.BytesAsync(link));
    }

    [Fact]
    public async Task A_picture_is_kept_for_ever_under_a_strong_tag()
    {
        var link = await ChartLink.OfSoundTest(service);
        using var first = await service.GetAsync(link);
        using var second = await service.GetAsync(link);
        Assert.False(first.Headers.ETag!.IsWeak);
        Assert.Equal(first.Headers.ETag, second.Headers.ETag);
        Assert.Equal("public, max-age=31536000, immutable", string.Join(", ", first.Headers.GetValues("Cache-Control")));
        using var narrow = await service.GetAsync(link + "&width=480");
        Assert.NotEqual(first.Headers.ETag, narrow.Headers.ETag);
    }

    [Theory]
    [InlineData("{0}", true)]
    [InlineData("W/{0}", true)]
    [InlineData("\"other\", {0}", true)]
    [InlineData("*", true)]
    [InlineData("\"other\"", false)]
    public async Task Who_has_the_picture_already_is_told_so_without_it(string format, bool known)
    {
        var link = await ChartLink.OfSoundTest(service);
        using var first = await service.GetAsync(link);
        using var request = new HttpRequestMessage(HttpMethod.Get, link);
        request.Headers.TryAddWithoutValidation("If-None-Match", string.Format(null, format, first.Headers.ETag));
        using var again = await Send(request);
        Assert.Equal(known ? HttpStatusCode.NotModified : HttpStatusCode.OK, again.StatusCode);
        Assert.Equal(first.Headers.ETag, again.Headers.ETag);
        Assert.Equal(first.Headers.CacheControl, again.Headers.CacheControl);
        Assert.Equal(known, (await BytesOf(again)).Length == 0);
    }

    [Theory]
    [InlineData("svg")]
    [InlineData("png")]
    [InlineData("pdf")]
    public async Task Head_gives_the_header_of_get_and_no_body(string format)
    {
        var link = await ChartLink.OfSoundTest(service, format);
        using var got = await service.GetAsync(link);
        using var request = new HttpRequestMessage(HttpMethod.Head, link);
        using var head = await Send(request);
        Assert.Equal(HttpStatusCode.OK, head.StatusCode);
        Assert.Equal(got.Headers.ETag, head.Headers.ETag);
        Assert.Equal(got.Content.Headers.ContentType, head.Content.Headers.ContentType);
        Assert.Equal((await BytesOf(got)).Length, head.Content.Headers.ContentLength);
        Assert.Empty(await BytesOf(head));
    }

    [Theory]
    [InlineData("application/json", "application/json")]
    [InlineData("*/*", "application/json")]
    [InlineData("image/*", "image/svg+xml")]
    [InlineData("image/png;q=0.5, image/svg+xml;q=0.4", "image/png")]
    [InlineData("application/json;q=0.1, application/pdf", "application/pdf")]
    [InlineData("image/*;q=0.9, image/svg+xml;q=0.2", "image/png")]
    [InlineData("text/html, application/xhtml+xml, */*;q=0.8", "application/json")]
    [InlineData("IMAGE/SVG+XML", "image/svg+xml")]
    public async Task A_post_answers_in_the_media_type_that_is_preferred(string accept, string mediaType)
    {
        using var response = await service.PostAsync(Body.Sound, accept);
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        Assert.Equal(mediaType, response.Content.Headers.ContentType?.MediaType);
    }

    [Theory]
    [InlineData("text/html")]
    [InlineData("image/gif, image/webp")]
    [InlineData("application/json;q=0")]
    public async Task A_media_type_that_cannot_be_given_is_406(string accept)
    {
        using var response = await service.PostAsync(Body.Sound, accept);
        var refusal = await Refusal.Of(response);
        Assert.Equal(406, refusal.Status);
        Assert.Contains("image/svg+xml", refusal.Detail, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_refused_test_is_a_problem_whatever_picture_was_accepted()
    {
        using var response = await service.PostAsync(Body.With("/mold/volume", "0"), accept: "image/svg+xml");
        Assert.Equal(422, (await Refusal.Of(response)).Status);
    }

    [Theory]
    [InlineData("POST", ChartLink.Svg, 405)]
    [InlineData("DELETE", ChartLink.Png, 405)]
    [InlineData("GET", RunningService.MoistureDensity, 405)]
    [InlineData("PUT", RunningService.MoistureDensity, 405)]
    [InlineData("GET", "/v1/charts/moisture-density.gif", 404)]
    [InlineData("GET", "/v1/charts/moisture-density", 404)]
    [InlineData("GET", "/v1/charts/nothing.svg", 404)]
    [InlineData("POST", "/v1/moisture-densities", 404)]
    public async Task Wrong_methods_and_unknown_addresses_are_problems(string method, string address, int status)
    {
        using var request = new HttpRequestMessage(new HttpMethod(method), address);
        using var response = await Send(request);
        Assert.Equal(status, (await Refusal.Of(response)).Status);
        Assert.Equal(status == 405, response.Content.Headers.Allow.Count > 0);
    }

    [Fact]
    public async Task An_unknown_address_is_a_page_for_who_accepts_one()
    {
        using var request = new HttpRequestMessage(HttpMethod.Get, "/v1/nothing") { Headers = { { "Accept", "text/html" } } };
        using var response = await Send(request);
        Assert.Equal(HttpStatusCode.NotFound, response.StatusCode);
        Assert.Equal("text/html", response.Content.Headers.ContentType?.MediaType);
        Assert.StartsWith("<!doctype html>", await RunningService.TextOf(response), StringComparison.OrdinalIgnoreCase);
    }

    [Theory]
    [InlineData(null, null)]
    [InlineData("text/plain", null)]
    [InlineData("application/x-www-form-urlencoded", null)]
    [InlineData("application/json; charset=iso-8859-1", null)]
    [InlineData("application/json", "gzip")]
    [InlineData("application/json", "identity")]
    public async Task A_body_of_another_kind_is_415(string? mediaType, string? encoding)
    {
        using var content = new ByteArrayContent(System.Text.Encoding.UTF8.GetBytes(Body.Sound));
        content.Headers.TryAddWithoutValidation("Content-Type", mediaType);
        content.Headers.TryAddWithoutValidation("Content-Encoding", encoding);
        using var request = new HttpRequestMessage(HttpMethod.Post, RunningService.MoistureDensity) { Content = content };
        using var response = await Send(request);
        Assert.Equal(415, (await Refusal.Of(response)).Status);
    }

    [Theory]
    [InlineData("application/json; charset=utf-8")]
    [InlineData("application/json; charset=\"UTF-8\"")]
    [InlineData("Application/JSON")]
    public async Task A_body_of_JSON_in_UTF_8_is_read_however_that_is_written(string mediaType)
    {
        using var content = new ByteArrayContent(System.Text.Encoding.UTF8.GetBytes(Body.Sound));
        content.Headers.TryAddWithoutValidation("Content-Type", mediaType);
        using var request = new HttpRequestMessage(HttpMethod.Post, RunningService.MoistureDensity) { Content = content };
        using var response = await Send(request);
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
    }

    [Fact]
    public async Task A_body_of_one_mebibyte_is_read_and_one_byte_more_is_413()
    {
        const int bound = 1 << 20;
        await service.AnswerAsync(Body.Sound.PadRight(bound));
        var refusal = await service.RefusalAsync(Body.Sound.PadRight(bound + 1));
        Assert.Equal(413, refusal.Status);
        Assert.Contains("1048576 bytes", refusal.Detail, StringComparison.Ordinal);
    }

    private Task<HttpResponseMessage> Send(HttpRequestMessage request) => service.Client.SendAsync(request, TestContext.Current.CancellationToken);

    private static Task<byte[]> BytesOf(HttpResponseMessage response) => response.Content.ReadAsByteArrayAsync(TestContext.Current.CancellationToken);
}
