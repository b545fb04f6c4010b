using System.Diagnostics;
using System.Globalization;
using System.Text.Json;
using System.Text.Json.Nodes;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Exchange;

/// <summary>A batch whose server goes away half way: nothing that was answered is lost or doubled, and the rest can be sent again.</summary>
public sealed class BrokenBatchTests(RunningService another) : IDisposable
{
    private const string Batch = "/v1/moisture-density/batch?summary=true";

    private Process? _process;

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    public void Dispose()
    {
        _process?.Kill();
        _process?.Dispose();
    }

    [Fact]
    public async Task After_a_crash_the_lines_without_an_answer_are_sent_to_another_server()
    {
        const int lines = 400;
        var answers = new List<string>();
        using (var client = new BatchClient(await StartAsync(), Batch))
        {
            await client.StatusAsync();
            // The sender goes on until the connection breaks under it.
            var sending = Task.Run(() => SendAll(client, 0, lines), Stop);
            try
            {
                while (await client.NextAsync() is { } answer)
                {
                    answers.Add(answer.Text("/reference")!);
                    if (answers.Count == 20)
                    {
                        _process!.Kill();
                    }
                }

                Assert.Fail("The answer ended as if it were whole.");
            }
            catch (IOException)
            {
                // Broken off, and it shows: the last chunk is missing.
            }

            await sending;
        }

        Assert.InRange(answers.Count, 20, lines - 1);
        using (var client = new BatchClient(another.Client.BaseAddress!, Batch))
        {
            await client.StatusAsync();
            var sending = Task.Run(() => SendAll(client, answers.Count, lines), Stop);
            while (await client.NextAsync() is { } answer && !answer.Has("summary"))
            {
                answers.Add(answer.Text("/reference")!);
            }

            await sending;
        }

        Assert.Equal(Enumerable.Range(0, lines).Select(Name), answers);
    }

    [Fact]
    public async Task A_server_that_is_stopped_answers_what_it_has_read_says_where_to_go_on_and_ends()
    {
        using var client = new BatchClient(await StartAsync(), Batch);
        await client.StatusAsync();
        client.Send(Line(0) + "\n\n" + Line(1) + "\n");
        Assert.Equal(Name(0), (await client.NextAsync())!.Value.Text("/reference"));
        Assert.Equal(Name(1), (await client.NextAsync())!.Value.Text("/reference"));

        using var signal = Process.Start("kill", ["-TERM", _process!.Id.ToString(CultureInfo.InvariantCulture)]);
        var last = (await client.NextAsync())!.Value;
        Assert.Equal((503, 4), ((int)last.Number("/status"), (int)last.Number("/line")));
        Assert.Contains("send this one and those after it again", last.Text("/detail"), StringComparison.Ordinal);
        Assert.False((await client.NextAsync())!.Value.At("/summary/complete").GetBoolean());
        Assert.Null(await client.NextAsync());
        await _process.WaitForExitAsync(Stop).WaitAsync(TimeSpan.FromSeconds(10), Stop);
        Assert.Equal(0, _process.ExitCode);
    }

    private static string Name(int i) => $"Ternmarsh, sample {i}";

    private static string Line(int i)
    {
        var test = JsonNode.Parse(BatchClient.OneLine)!;
        test["reference"] = Name(i);
        return test.ToJsonString();
    }

    private static void SendAll(BatchClient client, int from, int to)
    {
        try
        {
            for (var i = from; i < to; i++)
            {
                client.Send(Line(i) + "\n");
            }

            client.End();
        }
        catch (IOException)
        {
            // The server is gone; who reads the answers meets it too.
        }
    }

    private async Task<Uri> StartAsync()
    {
        _process = Process.Start(new ProcessStartInfo("dotnet", [typeof(Drypeak.Service.Hosting.Limits).Assembly.Location, "--urls", "http://127.0.0.1:0"]) { RedirectStandardOutput = true })!;
        while (await _process.StandardOutput.ReadLineAsync(Stop) is { } line)
        {
            if (JsonElement.Parse(line) is var entry && entry.TryGetProperty("address", out var address))
            {
                // What it logs from here on is read and thrown away, or it would wait for a reader.
                _ = _process.StandardOutput.BaseStream.CopyToAsync(Stream.Null, CancellationToken.None);
                return new Uri(address.GetString()!);
            }
        }

        throw new InvalidOperationException("The service did not start.");
    }
}
