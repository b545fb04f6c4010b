using System.Diagnostics;
using System.Globalization;
using System.Net.Http.Headers;
using System.Security.Cryptography;
using System.Text;
using System.Text.Json;
using Xunit;

namespace Drypeak.Operations.Tests;

/// <summary>
/// Whatever is sent is answered: no failure of the service, no answer that takes over a second, no memory that grows. A short run stands
/// here, a long one is <c>tests/fuzz 1000000</c>. What was ever found lies in <c>Finds/</c> and is sent first each time.
/// </summary>
public sealed class FuzzTests
{
    private const int Clients = 4;
    private const int Seed = 20260;
    private const long Growth = 64 << 20;

    private static readonly int Inputs = int.Parse(Environment.GetEnvironmentVariable("DRYPEAK_FUZZ_INPUTS") ?? "4000", CultureInfo.InvariantCulture);
    private static readonly TimeSpan Longest = TimeSpan.FromSeconds(1);
    private static readonly string Finds = Repository.File("tests/Drypeak.Operations.Tests/Finds");

    private readonly List<string> _wrong = [];

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    [Fact]
    public async Task Nothing_that_is_sent_makes_the_service_fail_hang_or_grow()
    {
        using var service = await ServiceProcess.StartAsync();
        using var client = new HttpClient { BaseAddress = service.Address, Timeout = TimeSpan.FromSeconds(30) };
        var kinds = await KindsAsync(client);
        foreach (var find in Directory.Exists(Finds) ? Directory.GetFiles(Finds) : [])
        {
            if (kinds.FirstOrDefault(kind => Path.GetFileName(find).StartsWith(kind.Name + ".", StringComparison.Ordinal)) is { } kind)
            {
                await SendAsync(client, kind, await File.ReadAllBytesAsync(find, Stop));
            }
        }

        // The first quarter fills pools and compiles what is hot; after it nothing should grow.
        await RunAsync(client, kinds, Inputs / 4, Seed);
        var settled = service.Memory;
        await RunAsync(client, kinds, Inputs - (Inputs / 4), Seed + Clients);
        TestContext.Current.TestOutputHelper?.WriteLine(
            $"{Inputs} inputs of {kinds.Count} kinds ({string.Join(", ", kinds.Select(kind => kind.Name))}); memory {settled >> 20} MiB after a quarter, {service.Memory >> 20} MiB at the end; {_wrong.Count} finds");
        Assert.Empty(_wrong);
        Assert.InRange(service.Memory, 0, settled + Growth);
    }

    /// <summary>Every kind of input that the service takes: each job's example, lines of them, tables, files, addresses of charts.</summary>
    private static async Task<IReadOnlyList<InputKind>> KindsAsync(HttpClient client)
    {
        var description = JsonSerializer.Deserialize<JsonElement>(await client.GetByteArrayAsync("/openapi/v1.json", Stop)).GetProperty("paths");
        var kinds = new List<InputKind>();
        foreach (var path in description.EnumerateObject())
        {
            if (path.Value.TryGetProperty("post", out var post) && post.TryGetProperty("requestBody", out var body))
            {
                foreach (var content in body.GetProperty("content").EnumerateObject().Where(content => content.Value.TryGetProperty("example", out _)))
                {
                    var example = content.Value.GetProperty("example");
                    var text = example.ValueKind == JsonValueKind.String ? example.GetString()! : example.GetRawText();
                    kinds.Add(new InputKind(NameOf(path.Name), "POST", path.Name, content.Name, [Encoding.UTF8.GetBytes(text)]));
                }
            }
            else if (path.Name.StartsWith("/v1/charts/", StringComparison.Ordinal))
            {
                var data = path.Value.GetProperty("get").GetProperty("parameters").EnumerateArray().Single(parameter => parameter.GetProperty("name").GetString() == "d").GetProperty("example").GetString()!;
                kinds.Add(new InputKind(NameOf(path.Name), "GET", path.Name, "", [Encoding.ASCII.GetBytes($"d={data}"), Encoding.ASCII.GetBytes($"width=400&height=300&theme=dark&title=x&d={data}")]));
            }
        }

        Assert.True(kinds.Count > 5);
        return kinds;
    }

    private static string NameOf(string path) => path["/v1/".Length..].Replace('/', '-');

    private Task RunAsync(HttpClient client, IReadOnlyList<InputKind> kinds, int inputs, int seed) =>
        Task.WhenAll(Enumerable.Range(0, Clients).Select(number => Task.Run(async () =>
        {
            var mutator = new Mutator(seed + number);
            for (var i = 0; i < inputs / Clients && _wrong.Count < 20; i++)
            {
                var kind = mutator.OneOf(kinds);
                await SendAsync(client, kind, mutator.Mutate(kind));
            }
        })));

    private async Task SendAsync(HttpClient client, InputKind kind, byte[] input)
    {
        var fault = await FaultAsync(client, kind, input);
        // What was only slow may have waited for the machine: it is slow when it is so again.
        if (fault is { } && (!fault.StartsWith("slow", StringComparison.Ordinal) || await FaultAsync(client, kind, input) is { }))
        {
            Directory.CreateDirectory(Finds);
            var name = $"{kind.Name}.{Convert.ToHexStringLower(SHA256.HashData(input))[..12]}";
            await File.WriteAllBytesAsync(Path.Combine(Finds, name), input, Stop);
            lock (_wrong)
            {
                _wrong.Add($"{name}: {fault}");
            }
        }
    }

    private static async Task<string?> FaultAsync(HttpClient client, InputKind kind, byte[] input)
    {
        var began = Stopwatch.StartNew();
        try
        {
            using var request = RequestOf(kind, input);
            using var answer = await client.SendAsync(request, Stop);
            var bytes = await answer.Content.ReadAsByteArrayAsync(Stop);
            return (int)answer.StatusCode >= 500 ? $"{(int)answer.StatusCode} {Encoding.UTF8.GetString(bytes)}"
                : bytes.AsSpan().IndexOf("urn:drypeak:problem:internal"u8) >= 0 ? "a line failed: " + Encoding.UTF8.GetString(bytes)
                : began.Elapsed > Longest ? $"slow: {began.Elapsed.TotalMilliseconds:0} ms"
                : null;
        }
        catch (Exception broken) when (broken is HttpRequestException or TaskCanceledException && !Stop.IsCancellationRequested)
        {
            return $"{broken.GetType().Name}: {broken.Message}";
        }
    }

    private static HttpRequestMessage RequestOf(InputKind kind, byte[] input)
    {
        if (kind.Method == "GET")
        {
            return new HttpRequestMessage(HttpMethod.Get, $"{kind.Address}?{AsQuery(input)}");
        }

        var body = new ByteArrayContent(input);
        body.Headers.ContentType = new MediaTypeHeaderValue(kind.MediaType);
        return new HttpRequestMessage(HttpMethod.Post, kind.Address) { Content = body };
    }

    /// <summary>Bytes that may stand in an address as they are, the others by percent signs.</summary>
    private static string AsQuery(byte[] input)
    {
        var query = new StringBuilder();
        foreach (var each in input.Take(7_000))
        {
            if (each is > 0x20 and < 0x7f and not ((byte)'#' or (byte)'"' or (byte)'<' or (byte)'>' or (byte)'\\' or (byte)'^' or (byte)'`' or (byte)'{' or (byte)'|' or (byte)'}'))
            {
                query.Append((char)each);
            }
            else
            {
                query.Append(CultureInfo.InvariantCulture, $"%{each:X2}");
            }
        }

        return query.ToString();
    }
}
