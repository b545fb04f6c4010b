using System.Diagnostics;
using System.Net;
using System.Text;
using System.Text.Json;
using System.Threading.Channels;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

/// <summary>The program as it is run: its log, its end, and what it leaves on the disk.</summary>
public sealed class ProcessTests : IDisposable
{
    private readonly string home = Directory.CreateTempSubdirectory("drypeak-").FullName;

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    public void Dispose() => Directory.Delete(home, recursive: true);

    [Fact]
    public async Task The_program_logs_one_line_a_request_ends_with_0_on_SIGTERM_and_leaves_no_file()
    {
        using var process = Start("--urls", "http://127.0.0.1:0");
        var log = Channel.CreateUnbounded<JsonElement>();
        process.OutputDataReceived += (_, line) => _ = line.Data is null ? log.Writer.TryComplete() : log.Writer.TryWrite(JsonSerializer.Deserialize<JsonElement>(line.Data));
        process.BeginOutputReadLine();
        var address = await FirstAsync(log.Reader, line => line.TryGetProperty("address", out _));

        using var client = new HttpClient { BaseAddress = new Uri(address.GetProperty("address").GetString()!) };
        using var body = new StringContent("{\"private\":1}", Encoding.UTF8, "application/json");
        using var upload = new MultipartFormDataContent { { new ByteArrayContent(new byte[500_000]), "file", "upload.txt" } };
        Assert.Equal(HttpStatusCode.NotFound, (await client.PostAsync("/nothing?token=private", body, Stop)).StatusCode);
        Assert.Equal(HttpStatusCode.NotFound, (await client.PostAsync("/upload", upload, Stop)).StatusCode);

        var line = await FirstAsync(log.Reader, line => line.TryGetProperty("RequestPath", out _));
        Assert.Equal("POST", line.GetProperty("RequestMethod").GetString());
        Assert.Equal("/nothing", line.GetProperty("RequestPath").GetString());
        Assert.Equal(404, line.GetProperty("StatusCode").GetInt32());
        Assert.Equal(13, line.GetProperty("RequestBytes").GetInt32());
        Assert.InRange(line.GetProperty("ResponseBytes").GetInt32(), 100, 1000);
        Assert.InRange(line.GetProperty("Elapsed").GetDouble(), 0, 60_000);
        Assert.Equal(32, line.GetProperty("TraceIdentifier").GetString()!.Length);
        Assert.DoesNotContain("private", line.GetRawText(), StringComparison.Ordinal);

        using var signal = Process.Start("kill", ["-TERM", process.Id.ToString(System.Globalization.CultureInfo.InvariantCulture)]);
        await process.WaitForExitAsync(Stop).WaitAsync(TimeSpan.FromSeconds(10), Stop);
        Assert.Equal(0, process.ExitCode);
        Assert.Empty(Directory.GetFileSystemEntries(home));
    }

    [Fact]
    public async Task The_description_is_exported_by_a_command()
    {
        var path = Path.Combine(home, "v1.json");
        using var process = Start("openapi", path);
        await process.StandardOutput.ReadToEndAsync(Stop);
        await process.WaitForExitAsync(Stop);
        Assert.Equal(0, process.ExitCode);
        var text = await File.ReadAllTextAsync(path, Stop);
        Assert.StartsWith("{\n", text, StringComparison.Ordinal);
        Assert.EndsWith("}\n", text, StringComparison.Ordinal);
        Assert.DoesNotContain('\r', text);
    }

    private static async Task<JsonElement> FirstAsync(ChannelReader<JsonElement> log, Func<JsonElement, bool> wanted)
    {
        await foreach (var line in log.ReadAllAsync(Stop))
        {
            if (wanted(line))
            {
                return line;
            }
        }

        throw new InvalidOperationException("The program ended before it wrote the line.");
    }

    private Process Start(params string[] arguments)
    {
        var start = new ProcessStartInfo("dotnet", [typeof(Drypeak.Service.Hosting.Limits).Assembly.Location, .. arguments]) { RedirectStandardOutput = true, WorkingDirectory = home };
        // The runtime's own diagnostic sockets would lie in the temporary folder.
        foreach (var (name, value) in new[] { ("HOME", home), ("TMPDIR", home), ("DOTNET_EnableDiagnostics", "0"), ("ASPNETCORE_ENVIRONMENT", "Production") })
        {
            start.Environment[name] = value;
        }

        return Process.Start(start)!;
    }
}
