using System.Diagnostics;
using System.Globalization;
using System.Net.Http.Headers;
using System.Net.Sockets;
using System.Text;
using System.Text.Json.Nodes;
using Drypeak.Service;

namespace Drypeak.Benchmarks;

/// <summary>
/// Tests a second through the batch address and by single requests, against a service that runs elsewhere. Its client sends and
/// takes at the same time and looks at nothing but line breaks, so that the service and not the client is measured.
/// </summary>
internal static class BatchMeasurement
{
    private const string Single = "/v1/moisture-density";
    private const string Batch = "/v1/moisture-density/batch?summary=true";

    /// <summary>Connections that send single requests at once, each its next after the answer to the last.</summary>
    private static readonly int[] Callers = [1, 8];

    /// <summary>Measures and prints: single requests by one caller and by eight, then the batch.</summary>
    /// <param name="service">Where the service runs.</param>
    /// <param name="processId">Its process, whose memory is looked at.</param>
    /// <param name="tests">Lines of the batch.</param>
    /// <param name="singles">Single requests for each number of callers.</param>
    public static async Task RunAsync(Uri service, int processId, int tests, int singles)
    {
        var lines = DifferentTests();
        using var client = new HttpClient { BaseAddress = service };
        foreach (var callers in Callers)
        {
            var watch = Stopwatch.StartNew();
            await Task.WhenAll(Enumerable.Range(0, callers).Select(caller => SendSinglesAsync(client, lines, singles / callers)));
            if (singles > 0)
            {
                Report($"single requests, {callers} at once", singles / callers * callers, watch.Elapsed);
            }
        }

        var batch = Stopwatch.StartNew();
        await SendBatchAsync(service, lines, tests);
        Report("batch", tests, batch.Elapsed);
        Console.WriteLine($"peak memory of the service after {tests} lines: {PeakMegabytes(processId):0.0} MB");
    }

    /// <summary>A thousand tests of five specimens, the numbers of each its own.</summary>
    private static byte[][] DifferentTests()
    {
        var random = new Random(11);
        return [.. Enumerable.Range(0, 1000).Select(i =>
        {
            var test = JsonNode.Parse(Examples.MoistureDensityRequest)!;
            test["reference"] = $"Ternmarsh, borrow area {i % 9}, sample {i}";
            foreach (var specimen in test["specimens"]!.AsArray().Where(specimen => specimen!["moldAndWetSoil"] is not null))
            {
                specimen!["moldAndWetSoil"] = Math.Round(specimen["moldAndWetSoil"]!.GetValue<double>() + (random.NextDouble() * 10), 1);
            }

            return Encoding.UTF8.GetBytes(test.ToJsonString());
        })];
    }

    private static async Task SendSinglesAsync(HttpClient client, byte[][] lines, int count)
    {
        for (var i = 0; i < count; i++)
        {
            using var body = new ByteArrayContent(lines[i % lines.Length]) { Headers = { ContentType = new MediaTypeHeaderValue("application/json") } };
            using var answer = await client.PostAsync(new Uri(Single, UriKind.Relative), body);
            answer.EnsureSuccessStatusCode();
            await answer.Content.ReadAsByteArrayAsync();
        }
    }

    private static async Task SendBatchAsync(Uri service, byte[][] lines, int count)
    {
        using var socket = new TcpClient(service.Host, service.Port);
        await using var stream = socket.GetStream();
        await stream.WriteAsync(Encoding.ASCII.GetBytes($"POST {Batch} HTTP/1.1\r\nHost: {service.Authority}\r\nContent-Type: application/x-ndjson\r\nTransfer-Encoding: chunked\r\nConnection: close\r\n\r\n"));
        var sending = Task.Run(() => SendAsync(stream, lines, count));
        var answered = await CountLinesAsync(stream);
        await sending;
        // The summary is a line too.
        if (answered != count + 1)
        {
            throw new InvalidOperationException($"{count} lines were sent, {answered - 1} answered.");
        }
    }

    private static async Task SendAsync(NetworkStream stream, byte[][] lines, int count)
    {
        // Not disposed: it would close the connection whose answers are still awaited.
        var buffered = new BufferedStream(stream, 64 << 10);
        for (var i = 0; i < count; i++)
        {
            var line = lines[i % lines.Length];
            buffered.Write(Encoding.ASCII.GetBytes(string.Create(CultureInfo.InvariantCulture, $"{line.Length + 1:x}\r\n")));
            buffered.Write(line);
            buffered.Write("\n\r\n"u8);
        }

        buffered.Write("0\r\n\r\n"u8);
        await buffered.FlushAsync();
    }

    /// <summary>Line feeds that no carriage return stands before: those of the body, not of its chunks or of the header.</summary>
    private static async Task<int> CountLinesAsync(NetworkStream stream)
    {
        var buffer = new byte[256 << 10];
        var (count, last) = (0, (byte)0);
        for (int read; (read = await stream.ReadAsync(buffer)) > 0;)
        {
            count += LinesIn(buffer.AsSpan(0, read), last);
            last = buffer[read - 1];
        }

        return count;
    }

    private static int LinesIn(ReadOnlySpan<byte> bytes, byte before)
    {
        var count = 0;
        for (var i = bytes.IndexOf((byte)'\n'); i >= 0;)
        {
            count += (i == 0 ? before : bytes[i - 1]) == '\r' ? 0 : 1;
            var next = bytes[(i + 1)..].IndexOf((byte)'\n');
            i = next < 0 ? -1 : i + 1 + next;
        }

        return count;
    }

    private static double PeakMegabytes(int processId) => File.ReadLines($"/proc/{processId}/status")
        .Where(line => line.StartsWith("VmHWM:", StringComparison.Ordinal))
        .Select(line => double.Parse(line.Split(' ', StringSplitOptions.RemoveEmptyEntries)[1], CultureInfo.InvariantCulture) / 1024)
        .Single();

    private static void Report(string what, int tests, TimeSpan time) =>
        Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{what}: {tests} tests in {time.TotalSeconds:0.0} s, {tests / time.TotalSeconds:0} tests/s"));
}
