using System.IO.Compression;
using System.Net;
using System.Net.Http.Headers;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using Drypeak.Service.Tests.Field;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Exchange;

public sealed class BatchTests(RunningService service)
{
    private const string Laboratory = "/v1/moisture-density/batch";
    private const string InPlace = "/v1/field-density/batch";

    private static readonly string Line = BatchClient.OneLine;

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    [Fact]
    public async Task A_line_gives_the_bytes_of_a_single_request()
    {
        using var single = await service.PostAsync(Line);
        Assert.Equal(await RunningService.TextOf(single) + "\n", await AnswerAsync(Laboratory, Line + "\n"));

        var inPlace = JsonNode.Parse(FieldJobs.Sound)!.ToJsonString();
        using var singleInPlace = await service.PostAsync(inPlace, address: FieldJobs.FieldDensity);
        Assert.Equal(await RunningService.TextOf(singleInPlace) + "\n", await AnswerAsync(InPlace, inPlace));
    }

    [Fact]
    public async Task The_answers_keep_the_order_of_the_lines()
    {
        // Between them tests that take long and tests that take no time.
        var lines = Enumerable.Range(0, 300).Select(i => i % 3 == 0 ? Named($"{i}") : $"{{\"reference\":\"{i}\"}}");
        var answers = await AnswersAsync(Laboratory, string.Join('\n', lines));
        Assert.Equal(300, answers.Count);
        Assert.All(answers.Index(), answer =>
        {
            if (answer.Index % 3 == 0)
            {
                Assert.Equal($"{answer.Index}", answer.Item.Text("/reference"));
            }
            else
            {
                Assert.Equal(answer.Index + 1, answer.Item.Number("/line"));
            }
        });
    }

    [Theory]
    [InlineData("{", 400, "", "syntax")]
    [InlineData("""{"specimens":[],"sample":1}""", 400, "/sample", "unknown-member")]
    [InlineData("""{"specimens":[]}""", 422, "/specimens", "empty-list")]
    [InlineData("[]", 400, "", "wrong-type")]
    [InlineData("NaN", 400, "", "syntax")]
    public async Task A_broken_line_is_answered_in_its_place_by_its_problem_and_the_others_go_on(string broken, int status, string place, string code)
    {
        var answers = await AnswersAsync(Laboratory, $"{Named("a")}\n{broken}\n{Named("b")}\n");
        Assert.Equal("a", answers[0].Text("/reference"));
        Assert.Equal("b", answers[2].Text("/reference"));
        var problem = answers[1];
        Assert.Equal((status, 2), (problem.GetProperty("status").GetInt32(), problem.GetProperty("line").GetInt32()));
        Assert.StartsWith("urn:drypeak:problem:", problem.Text("/type"), StringComparison.Ordinal);
        Assert.Contains(problem.GetProperty("errors").EnumerateArray(), error => error.Text("/pointer") == place && error.Text("/code") == code);
    }

    [Fact]
    public async Task A_line_that_is_not_UTF_8_is_refused_in_its_place()
    {
        byte[] body = [.. Encoding.UTF8.GetBytes(Named("a")), (byte)'\n', .. "{\"reference\":\""u8, 0xE9, .. "\"}\n"u8, .. Encoding.UTF8.GetBytes(Named("b"))];
        var answers = Parse(await TextAsync(Laboratory, body));
        Assert.Equal(3, answers.Count);
        Assert.Equal("invalid-utf-8", answers[1].Text("/errors/0/code"));
    }

    [Fact]
    public async Task Blank_lines_have_no_answer_and_are_counted()
    {
        var answers = await AnswersAsync(Laboratory, $"\n{Named("a")}\r\n  \t\r\n\n{{}}\r\n");
        Assert.Equal(2, answers.Count);
        Assert.Equal("a", answers[0].Text("/reference"));
        Assert.Equal(5, answers[1].Number("/line"));
    }

    [Theory]
    [InlineData("\n")]
    [InlineData("\r\n")]
    public async Task The_last_line_break_is_optional(string lineBreak) =>
        Assert.Equal(await AnswerAsync(Laboratory, Line + lineBreak + Line), await AnswerAsync(Laboratory, Line + lineBreak + Line + lineBreak));

    [Theory]
    [InlineData("")]
    [InlineData("\n\n  \n")]
    public async Task A_body_without_lines_has_an_empty_answer(string body) => Assert.Equal("", await AnswerAsync(Laboratory, body));

    [Theory]
    [InlineData(65_536, "\n", false)]
    [InlineData(65_536, "\r\n", false)]
    [InlineData(65_536, "", false)]
    [InlineData(65_537, "\n", true)]
    [InlineData(65_537, "\r\n", true)]
    [InlineData(65_537, "", true)]
    [InlineData(3_000_000, "\n", true)]
    public async Task A_line_may_have_64_KiB_without_its_line_break_and_no_more(int bytes, string lineBreak, bool refused)
    {
        var answers = await AnswersAsync(Laboratory, Named("a") + "\n" + Line.PadRight(bytes) + lineBreak + (lineBreak == "" ? "" : Named("b")));
        Assert.Equal(lineBreak == "" ? 2 : 3, answers.Count);
        if (refused)
        {
            Assert.Equal((413, 2), (answers[1].GetProperty("status").GetInt32(), answers[1].GetProperty("line").GetInt32()));
        }
        else
        {
            Assert.False(answers[1].Has("status"));
        }
    }

    [Fact]
    public async Task The_whole_body_has_no_bound()
    {
        // Over 2 MiB, where a single body may have 1.
        var body = string.Concat(Enumerable.Repeat("{}".PadRight(60_000) + "\n", 40));
        Assert.Equal(40, (await AnswersAsync(Laboratory, body)).Count);
    }

    [Fact]
    public async Task A_summary_stands_last_where_it_is_asked_for()
    {
        var answers = await AnswersAsync(Laboratory + "?summary=true", $"{Line}\n\n{{}}\n{Line}\n");
        Assert.Equal(4, answers.Count);
        Assert.Equal(
            """{"summary":{"complete":true,"lines":4,"blank":1,"answered":2,"refused":1,"withErrors":0,"withWarnings":0}}""",
            answers[3].GetRawText());
        Assert.Equal(3, (await AnswersAsync(Laboratory + "?summary=false", $"{Line}\n\n{{}}\n{Line}\n")).Count);
    }

    [Theory]
    [InlineData("application/json", null, 415)]
    [InlineData("text/plain", null, 415)]
    [InlineData(null, null, 415)]
    [InlineData("application/x-ndjson; charset=utf-16", null, 415)]
    [InlineData("application/x-ndjson", "application/json", 406)]
    [InlineData("application/x-ndjson; charset=utf-8", "*/*", 200)]
    [InlineData("application/x-ndjson", "application/x-ndjson", 200)]
    public async Task Only_lines_of_JSON_are_taken_and_given(string? contentType, string? accept, int status)
    {
        using var request = Post(Laboratory, Encoding.UTF8.GetBytes(Line), contentType);
        request.Headers.TryAddWithoutValidation("Accept", accept);
        using var response = await service.Client.SendAsync(request, Stop);
        Assert.Equal(status, (int)response.StatusCode);
        Assert.Equal(status == 200 ? "application/x-ndjson" : "application/problem+json", response.Content.Headers.ContentType?.MediaType);
    }

    [Theory]
    [InlineData("?summary=yes", "/summary invalid-parameter")]
    [InlineData("?summary=true&summary=true", "/summary invalid-parameter")]
    [InlineData("?Summary=true", "/Summary unknown-parameter")]
    [InlineData("?format=csv", "/format unknown-parameter")]
    public async Task An_unknown_parameter_is_400(string query, string fault)
    {
        using var request = Post(Laboratory + query, Encoding.UTF8.GetBytes(Line));
        using var response = await service.Client.SendAsync(request, Stop);
        Assert.Equal([fault], (await Refusal.Of(response)).Faults);
    }

    [Theory]
    [InlineData("gzip")]
    [InlineData("br")]
    [InlineData("GZIP")]
    [InlineData("x-gzip")]
    [InlineData("identity")]
    public async Task A_compressed_body_is_read(string coding)
    {
        var body = string.Concat(Enumerable.Range(0, 50).Select(i => Named($"{i}") + "\n"));
        using var request = Post(Laboratory, Compressed(body, coding));
        request.Content!.Headers.ContentEncoding.Add(coding);
        using var response = await service.Client.SendAsync(request, Stop);
        Assert.Equal(await AnswerAsync(Laboratory, body), await RunningService.TextOf(response));
    }

    [Theory]
    [InlineData("deflate")]
    [InlineData("zstd")]
    [InlineData("gzip, br")]
    public async Task Another_compression_is_415_and_says_which_are_understood(string coding)
    {
        using var request = Post(Laboratory, Encoding.UTF8.GetBytes(Line));
        request.Content!.Headers.TryAddWithoutValidation("Content-Encoding", coding);
        using var response = await service.Client.SendAsync(request, Stop);
        Assert.Equal(HttpStatusCode.UnsupportedMediaType, response.StatusCode);
        Assert.Equal(["gzip", "br"], response.Headers.GetValues("Accept-Encoding").SelectMany(value => value.Split(", ")));
    }

    [Theory]
    [InlineData("gzip", "gzip")]
    [InlineData("br", "br")]
    [InlineData("br;q=1, gzip;q=0.5", "br")]
    [InlineData("*", "gzip")]
    [InlineData("gzip;q=0", null)]
    [InlineData("identity", null)]
    [InlineData(null, null)]
    public async Task An_answer_is_compressed_as_the_caller_likes_it(string? accepted, string? coding)
    {
        using var request = Post(Laboratory, Encoding.UTF8.GetBytes(Line + "\n{}\n"));
        request.Headers.TryAddWithoutValidation("Accept-Encoding", accepted);
        using var response = await service.Client.SendAsync(request, Stop);
        Assert.Equal(coding, response.Content.Headers.ContentEncoding.SingleOrDefault());
        Assert.Contains("Accept-Encoding", response.Headers.Vary);
        await using var body = await response.Content.ReadAsStreamAsync(Stop);
        await using Stream plain = coding switch { "gzip" => new GZipStream(body, CompressionMode.Decompress), "br" => new BrotliStream(body, CompressionMode.Decompress), _ => body };
        using var reader = new StreamReader(plain);
        Assert.Equal(await AnswerAsync(Laboratory, Line + "\n{}\n"), await reader.ReadToEndAsync(Stop));
    }

    [Theory]
    [InlineData("gzip", true)]
    [InlineData("br", true)]
    [InlineData("gzip", false)]
    [InlineData("br", false)]
    public async Task A_damaged_compression_is_said_and_what_came_before_is_answered(string coding, bool cutShort)
    {
        var random = new Random(7);
        var whole = Compressed(string.Concat(Enumerable.Range(0, 2000).Select(i => Named($"{random.Next()} {i}") + "\n")), coding);
        var damaged = whole[..(whole.Length / 2)];
        if (!cutShort)
        {
            damaged = [.. damaged, .. new byte[4000]];
        }

        using var request = Post(Laboratory + "?summary=true", damaged);
        request.Content!.Headers.ContentEncoding.Add(coding);
        using var response = await service.Client.SendAsync(request, Stop);
        var answers = Parse(await RunningService.TextOf(response));
        var problem = answers[^2];
        Assert.Equal(400, problem.Number("/status"));
        Assert.Equal(answers.Count - 1, problem.Number("/line"));
        Assert.False(answers[^1].At("/summary/complete").GetBoolean());
        // Brotli gives nothing of a block that is damaged further on.
        Assert.InRange(answers.Count, cutShort ? 10 : 2, 2000);
    }

    [Theory]
    [InlineData("gzip")]
    [InlineData("br")]
    public async Task A_body_that_expands_without_end_is_cut_off(string coding)
    {
        var bomb = new MemoryStream();
        await using (Stream packer = coding == "gzip" ? new GZipStream(bomb, CompressionLevel.Optimal, leaveOpen: true) : new BrotliStream(bomb, CompressionLevel.Fastest, leaveOpen: true))
        {
            packer.Write(Encoding.UTF8.GetBytes(Line + "\n"));
            var blanks = new byte[1 << 20];
            Array.Fill(blanks, (byte)'\n');
            for (var i = 0; i < 28; i++)
            {
                packer.Write(blanks);
            }
        }

        using var request = Post(Laboratory, bomb.ToArray());
        request.Content!.Headers.ContentEncoding.Add(coding);
        using var response = await service.Client.SendAsync(request, Stop);
        var answers = Parse(await RunningService.TextOf(response));
        Assert.Equal(2, answers.Count);
        Assert.Equal(413, answers[1].Number("/status"));
        Assert.Contains("expands", answers[1].Text("/detail"), StringComparison.Ordinal);
    }

    [Fact]
    public async Task The_first_answer_comes_before_the_last_line_is_sent()
    {
        using var client = new BatchClient(service.Client.BaseAddress!, Laboratory);
        Assert.Contains(" 200 ", await client.StatusAsync(), StringComparison.Ordinal);
        for (var i = 0; i < 3; i++)
        {
            client.Send(Named($"{i}") + "\n");
            Assert.Equal($"{i}", (await client.NextAsync())!.Value.Text("/reference"));
        }

        // Half a line waits for its other half.
        client.Send(Line[..100]);
        client.Send(Line[100..] + "\n");
        Assert.True((await client.NextAsync())!.Value.Has("optimum"));
        client.End();
        Assert.Null(await client.NextAsync());
    }

    [Fact]
    public async Task Who_takes_no_answers_is_read_no_further_and_loses_none()
    {
        using var client = new BatchClient(service.Client.BaseAddress!, Laboratory);
        var sent = client.SendUntilStuck(Line.PadRight(60_000), TimeSpan.FromSeconds(2), most: 5_000);
        Assert.InRange(sent, 1, 4_999);

        // From here on the answers are taken, and everything that went away is answered.
        await client.StatusAsync();
        for (var i = 0; i < sent; i++)
        {
            Assert.True((await client.NextAsync())!.Value.Has("optimum"));
        }
    }

    [Fact]
    public async Task A_caller_who_goes_away_half_way_disturbs_nobody()
    {
        for (var i = 0; i < 5; i++)
        {
            using var client = new BatchClient(service.Client.BaseAddress!, Laboratory);
            client.SendUntilStuck(Line, TimeSpan.FromSeconds(5), most: 50);
        }

        Assert.Single(await AnswersAsync(Laboratory, Line));
    }

    private static string Named(string reference)
    {
        var test = JsonNode.Parse(Line)!;
        test["reference"] = reference;
        return test.ToJsonString();
    }

    private static byte[] Compressed(string text, string coding)
    {
        var packed = new MemoryStream();
        using (Stream packer = coding.ToLowerInvariant() switch
        {
            "br" => new BrotliStream(packed, CompressionLevel.Fastest, leaveOpen: true),
            "identity" => new BufferedStream(packed),
            _ => new GZipStream(packed, CompressionLevel.Fastest, leaveOpen: true),
        })
        {
            packer.Write(Encoding.UTF8.GetBytes(text));
            packer.Flush();
            return coding == "identity" ? packed.ToArray() : Closed(packer, packed);
        }

        static byte[] Closed(Stream packer, MemoryStream packed)
        {
            packer.Dispose();
            return packed.ToArray();
        }
    }

    private static HttpRequestMessage Post(string address, byte[] body, string? contentType = "application/x-ndjson")
    {
        var request = new HttpRequestMessage(HttpMethod.Post, address) { Content = new ByteArrayContent(body) };
        if (contentType is not null)
        {
            request.Content.Headers.ContentType = MediaTypeHeaderValue.Parse(contentType);
        }

        return request;
    }

    private async Task<string> TextAsync(string address, byte[] body)
    {
        using var request = Post(address, body);
        using var response = await service.Client.SendAsync(request, Stop);
        var text = await RunningService.TextOf(response);
        Assert.True(response.StatusCode == HttpStatusCode.OK, text);
        return text;
    }

    private Task<string> AnswerAsync(string address, string body) => TextAsync(address, Encoding.UTF8.GetBytes(body));

    private async Task<IReadOnlyList<JsonElement>> AnswersAsync(string address, string body) => Parse(await AnswerAsync(address, body));

    private static List<JsonElement> Parse(string answer)
    {
        Assert.EndsWith("\n", answer, StringComparison.Ordinal);
        return [.. answer.Split('\n')[..^1].Select(line => JsonElement.Parse(line))];
    }
}
