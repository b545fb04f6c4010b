using System.Net;
using System.Net.Sockets;
using System.Text;
using System.Text.Json;
using Drypeak.Service.Hosting;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

public sealed class HttpTests : IAsyncLifetime
{
    private const string Good = """{"portions":[{"label":"1","wet":152.4,"dry":141.0}],"balance":31.2}""";

    private TestService service = null!;

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    public async ValueTask InitializeAsync() => service = await TestService.StartAsync();

    public ValueTask DisposeAsync() => service.DisposeAsync();

    [Theory]
    [InlineData("application/json", 200)]
    [InlineData("application/json; charset=utf-8", 200)]
    [InlineData("Application/JSON; charset=\"UTF-8\"", 200)]
    [InlineData("application/ld+json", 200)]
    [InlineData("application/json; charset=iso-8859-1", 415)]
    [InlineData("application/json; charset=utf-16", 415)]
    [InlineData("application/x-ndjson", 415)]
    [InlineData("application/jsonp", 415)]
    [InlineData("text/json", 415)]
    [InlineData("text/plain", 415)]
    [InlineData("json", 415)]
    [InlineData("", 415)]
    [InlineData(null, 415)]
    public async Task Only_JSON_in_UTF_8_is_read(string? contentType, int status)
    {
        using var request = Post(Encoding.UTF8.GetBytes(Good), contentType);
        using var response = await service.Client.SendAsync(request, Stop);
        Assert.Equal(status, (int)response.StatusCode);
        if (status == 415)
        {
            await AssertProblem(response, ProblemKind.UnsupportedMediaType);
            Assert.Equal("application/json", Assert.Single(response.Headers.GetValues("Accept")));
        }
    }

    [Theory]
    [InlineData("gzip")]
    [InlineData("identity")]
    [InlineData("br")]
    public async Task An_encoded_body_is_415(string encoding)
    {
        using var request = Post(Encoding.UTF8.GetBytes(Good), "application/json");
        request.Content!.Headers.ContentEncoding.Add(encoding);
        using var response = await service.Client.SendAsync(request, Stop);
        await AssertProblem(response, ProblemKind.UnsupportedMediaType);
        Assert.Equal("identity", Assert.Single(response.Headers.GetValues("Accept-Encoding")));
    }

    [Theory]
    [InlineData(TestService.MaximumBytes, false, 200)]
    [InlineData(TestService.MaximumBytes + 1, false, 413)]
    [InlineData(TestService.MaximumBytes, true, 200)]
    [InlineData(TestService.MaximumBytes + 1, true, 413)]
    [InlineData(3_000_000, false, 413)]
    [InlineData(3_000_000, true, 413)]
    public async Task A_body_may_be_as_long_as_the_bound_and_no_longer(int length, bool chunked, int status)
    {
        using var request = Post(Encoding.UTF8.GetBytes(Good.PadRight(length)), "application/json");
        request.Headers.TransferEncodingChunked = chunked;
        using var response = await service.Client.SendAsync(request, Stop);
        Assert.Equal(status, (int)response.StatusCode);
        if (status == 413)
        {
            await AssertProblem(response, ProblemKind.TooLarge);
        }
    }

    [Theory]
    [InlineData("", 400, " empty-body")]
    [InlineData("{", 400, " syntax")]
    [InlineData("{\"portions\":[],\"balance\":1}", 422, "/portions empty-list")]
    [InlineData("{\"portions\":[],\"balance\":\"1\"}", 400, "/portions empty-list,/balance wrong-type")]
    public async Task A_bad_body_is_a_problem_with_all_faults(string body, int status, string expected)
    {
        using var response = await service.Client.SendAsync(Post(Encoding.UTF8.GetBytes(body), "application/json"), Stop);
        var problem = await AssertProblem(response, status == 400 ? ProblemKind.InvalidForm : ProblemKind.InvalidValues);
        var faults = problem.GetProperty("errors").EnumerateArray().Select(fault => $"{fault.GetProperty("pointer")} {fault.GetProperty("code")}");
        Assert.Equal(expected, string.Join(',', faults));
    }

    [Theory]
    [InlineData("GET", "/nothing", 404)]
    [InlineData("POST", "/nothing", 404)]
    [InlineData("GET", "/weighings", 405)]
    [InlineData("DELETE", "/kept", 405)]
    [InlineData("GET", "/failure", 500)]
    [InlineData("GET", "/health/live", 200)]
    [InlineData("GET", "/health/ready", 200)]
    [InlineData("HEAD", "/health/ready", 200)]
    [InlineData("HEAD", "/openapi/v1.json", 200)]
    [InlineData("GET", "/kept", 200)]
    [InlineData("GET", "/openapi/v1.json", 200)]
    [InlineData("GET", "/reference/index.html", 200)]
    [InlineData("GET", "/reference/swagger-ui-bundle.js", 200)]
    [InlineData("GET", "/reference", 301)]
    public async Task Every_answer_has_the_security_headers_no_cookie_and_no_banner(string method, string address, int status)
    {
        using var request = new HttpRequestMessage(new HttpMethod(method), address);
        using var response = await service.Client.SendAsync(request, Stop);
        Assert.Equal(status, (int)response.StatusCode);
        Assert.Equal("nosniff", Header(response, "X-Content-Type-Options"));
        Assert.Equal("no-referrer", Header(response, "Referrer-Policy"));
        var policy = Header(response, "Content-Security-Policy")!;
        Assert.All(["default-src 'none'", "base-uri 'none'", "form-action 'self'", "frame-ancestors 'none'"], directive => Assert.Contains(directive, policy, StringComparison.Ordinal));
        Assert.DoesNotContain("unsafe", policy, StringComparison.Ordinal);
        Assert.Null(Header(response, "Server"));
        Assert.Null(Header(response, "Set-Cookie"));
        if (status is >= 400)
        {
            await AssertProblem(response, ProblemKind.OfStatus(status));
        }
    }

    [Fact]
    public async Task A_wrong_method_is_told_the_right_ones()
    {
        using var response = await service.Client.GetAsync("/weighings", Stop);
        Assert.Equal(["POST"], response.Content.Headers.Allow);
    }

    [Theory]
    [InlineData("text/html,application/xhtml+xml,application/xml;q=0.9,*/*;q=0.8", "text/html")]
    [InlineData("text/html", "text/html")]
    [InlineData("application/json", Problem.MediaType)]
    [InlineData("application/problem+json, text/html", Problem.MediaType)]
    [InlineData("*/*", Problem.MediaType)]
    [InlineData("text/html;q=0", Problem.MediaType)]
    [InlineData(null, Problem.MediaType)]
    public async Task An_unknown_address_is_a_page_to_a_browser_and_a_problem_to_a_program(string? accept, string mediaType)
    {
        using var request = new HttpRequestMessage(HttpMethod.Get, "/nothing");
        request.Headers.TryAddWithoutValidation("Accept", accept);
        using var response = await service.Client.SendAsync(request, Stop);
        Assert.Equal(HttpStatusCode.NotFound, response.StatusCode);
        Assert.Equal(mediaType, response.Content.Headers.ContentType?.MediaType);
        Assert.Equal("Accept", Header(response, "Vary"));
    }

    [Fact]
    public async Task A_failure_gives_a_trace_identifier_and_nothing_of_the_inside()
    {
        using var request = new HttpRequestMessage(HttpMethod.Get, "/failure");
        request.Headers.Add("traceparent", "00-0af7651916cd43dd8448eb211c80319c-b7ad6b7169203331-01");
        using var response = await service.Client.SendAsync(request, Stop);
        var problem = await AssertProblem(response, ProblemKind.Internal);
        Assert.Equal("0af7651916cd43dd8448eb211c80319c", problem.GetProperty("traceId").GetString());
        Assert.DoesNotContain("secret", problem.GetRawText(), StringComparison.Ordinal);
        Assert.DoesNotContain("Exception", problem.GetRawText(), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(8_000, 404)]
    [InlineData(8_001, 414)]
    [InlineData(30_000, 414)]
    public async Task An_address_may_have_eight_thousand_bytes(int length, int status)
    {
        using var response = await service.Client.GetAsync("/x?" + new string('a', length - 3), Stop);
        Assert.Equal(status, (int)response.StatusCode);
        await AssertProblem(response, ProblemKind.OfStatus(status));
    }

    [Theory]
    [InlineData(null, 200)]
    [InlineData("\"other\"", 200)]
    [InlineData("{tag}", 304)]
    [InlineData("W/{tag}", 304)]
    [InlineData("\"other\", {tag}", 304)]
    [InlineData("*", 304)]
    public async Task What_is_known_already_is_304_with_its_header_fields(string? ifNoneMatch, int status)
    {
        var tag = new CachedBytes("kept"u8.ToArray(), "text/plain").EntityTag;
        using var request = new HttpRequestMessage(HttpMethod.Get, "/kept");
        request.Headers.TryAddWithoutValidation("If-None-Match", ifNoneMatch?.Replace("{tag}", tag, StringComparison.Ordinal));
        using var response = await service.Client.SendAsync(request, Stop);
        Assert.Equal(status, (int)response.StatusCode);
        Assert.Equal(tag, response.Headers.ETag?.Tag);
        Assert.False(response.Headers.ETag!.IsWeak);
        Assert.Equal(CachedBytes.ForEver, Header(response, "Cache-Control"));
        Assert.Equal("Accept", Header(response, "Vary"));
        Assert.Equal(status == 200 ? "kept" : "", await response.Content.ReadAsStringAsync(Stop));
    }

    [Fact]
    public async Task A_body_that_breaks_the_protocol_is_a_problem_too()
    {
        using var connection = new TcpClient();
        await connection.ConnectAsync(IPAddress.Loopback, service.Client.BaseAddress!.Port, Stop);
        var stream = connection.GetStream();
        await stream.WriteAsync("POST /weighings HTTP/1.1\r\nHost: a\r\nContent-Type: application/json\r\nTransfer-Encoding: chunked\r\n\r\nno number\r\n"u8.ToArray(), Stop);
        using var reader = new StreamReader(stream);
        var answer = await reader.ReadToEndAsync(Stop);
        Assert.StartsWith("HTTP/1.1 400 ", answer, StringComparison.Ordinal);
        Assert.Contains(ProblemKind.BadRequest.Uri, answer, StringComparison.Ordinal);
    }

    private static HttpRequestMessage Post(byte[] body, string? contentType)
    {
        var request = new HttpRequestMessage(HttpMethod.Post, "/weighings") { Content = new ByteArrayContent(body) };
        if (contentType is not null)
        {
            request.Content.Headers.TryAddWithoutValidation("Content-Type", contentType);
        }

        return request;
    }

    private static async Task<JsonElement> AssertProblem(HttpResponseMessage response, ProblemKind kind)
    {
        Assert.Equal(Problem.MediaType, response.Content.Headers.ContentType?.ToString());
        var problem = JsonSerializer.Deserialize<JsonElement>(await response.Content.ReadAsStringAsync(Stop));
        Assert.Equal(kind.Uri, problem.GetProperty("type").GetString());
        Assert.True(Uri.IsWellFormedUriString(kind.Uri, UriKind.Absolute));
        Assert.Equal(kind.Title, problem.GetProperty("title").GetString());
        Assert.Equal(kind.Status, problem.GetProperty("status").GetInt32());
        Assert.Equal((int)response.StatusCode, kind.Status);
        Assert.NotEmpty(problem.GetProperty("detail").GetString()!);
        Assert.Equal(JsonValueKind.Array, problem.GetProperty("errors").ValueKind);
        return problem;
    }

    private static string? Header(HttpResponseMessage response, string name) =>
        response.Headers.TryGetValues(name, out var values) ? string.Join(", ", values) : null;
}
