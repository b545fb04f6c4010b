using System.Diagnostics;
using System.Text;
using System.Text.Json;
using Drypeak.Service.Exchange;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Exchange;

public sealed class ComputeCommandTests(RunningService service)
{
    private static readonly string Line = BatchClient.OneLine;

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    [Fact]
    public async Task Lines_give_the_bytes_that_the_address_gives()
    {
        using var single = await service.PostAsync(Line);
        var (status, output, messages) = await RunAsync(Line + "\n");
        Assert.Equal((0, await RunningService.TextOf(single) + "\n", ""), (status, output, messages));
    }

    [Theory]
    [InlineData("nothing beyond notes", 0, "")]
    [InlineData("a warning", 1, """{"specimens":[{"waterContent":10,"dryDensity":1.75},{"waterContent":12,"dryDensity":1.82},{"waterContent":14,"dryDensity":1.80}]}""")]
    [InlineData("an error", 2, """{"specimens":[{"waterContent":10,"dryDensity":1.75},{"waterContent":12,"dryDensity":1.82}]}""")]
    [InlineData("a refusal", 3, "{}")]
    public async Task The_exit_status_is_that_of_the_worst(string what, int expected, string line)
    {
        var (status, _, _) = await RunAsync($"{Line}\n{line}\n{Line}\n");
        Assert.True(expected == status, $"{what}: {status}");
    }

    [Fact]
    public async Task A_summary_stands_last_where_it_is_asked_for() =>
        Assert.EndsWith("""{"summary":{"complete":true,"lines":2,"blank":0,"answered":1,"refused":1,"withErrors":0,"withWarnings":0}}""" + "\n",
            (await RunAsync($"{Line}\n{{}}", "--summary")).Output, StringComparison.Ordinal);

    [Fact]
    public async Task CSV_and_AGS4_go_the_way_of_their_addresses()
    {
        const string csv = "reference,waterContent [%],dryDensity [Mg/m3]\nB,10,1.75\nB,12,1.82\nB,14,1.86\nB,16,1.83\nB,18,1.77\n";
        Assert.StartsWith("reference,method,label,", (await RunAsync(csv, "--format", "csv")).Output, StringComparison.Ordinal);
        Assert.Equal("B", JsonElement.Parse((await RunAsync(csv, "--format", "csv", "--to", "json")).Output).Text("/tests/0/reference"));
        Assert.Single((await RunAsync(csv, "--format", "csv", "--to", "ndjson")).Output.Split('\n')[..^1]);
        Assert.Contains(",accepted\r\n", (await RunAsync("label,dryDensity,maximumDryDensity,minimumRelativeCompaction\n1,1.9,1.9,95\n", "--format", "csv", "--job", "field-density")).Output, StringComparison.Ordinal);

        Assert.Contains("\"2.68\",\"1.8", (await RunAsync(AgsTexts.Sound, "--format", "ags4")).Output, StringComparison.Ordinal);
        var answer = JsonElement.Parse((await RunAsync(AgsTexts.Sound, "--format", "ags4", "--to", "json", "--maximum-dry-density", "1.9")).Output);
        Assert.Equal("4.1.1", answer.Text("/edition"));
        Assert.InRange(answer.Number("/fieldTests/0/relativeCompaction"), 90, 100);
    }

    [Theory]
    [InlineData("csv", "waterContent,colour\n1,2\n", "unknown-column")]
    [InlineData("ags4", "\"GROUP\",CMPG\r\n", "not-quoted")]
    public async Task A_file_that_is_refused_is_said_and_nothing_is_written(string format, string file, string code)
    {
        var (status, output, messages) = await RunAsync(file, "--format", format);
        Assert.Equal((3, ""), (status, output));
        Assert.Contains(code, messages, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("--format", "xml")]
    [InlineData("--format", "csv", "--to", "ags4")]
    [InlineData("--format")]
    [InlineData("--job", "proctor")]
    [InlineData("--summary", "--summary")]
    [InlineData("--verbose")]
    [InlineData("--maximum-dry-density", "1,9")]
    public async Task Wrong_arguments_are_said_with_the_usage(params string[] arguments)
    {
        var (status, output, messages) = await RunAsync("", arguments);
        Assert.Equal((64, ""), (status, output));
        Assert.Contains("--format ndjson|csv|ags4", messages, StringComparison.Ordinal);
    }

    [Fact]
    public async Task Progress_is_shown_to_who_watches()
    {
        using var output = new MemoryStream();
        await using var messages = new StringWriter();
        await ComputeCommand.RunAsync([], new MemoryStream(Encoding.UTF8.GetBytes($"{Line}\n{Line}\n")), output, messages, isWatched: true, Stop);
        Assert.Contains("2 lines answered", messages.ToString(), StringComparison.Ordinal);
    }

    [Fact]
    public async Task The_program_runs_it_without_a_server()
    {
        var start = new ProcessStartInfo("dotnet", [typeof(ComputeCommand).Assembly.Location, "compute", "--summary"]) { RedirectStandardInput = true, RedirectStandardOutput = true, RedirectStandardError = true };
        using var process = Process.Start(start)!;
        await process.StandardInput.WriteAsync($"{Line}\n{{}}\n");
        process.StandardInput.Close();
        var lines = (await process.StandardOutput.ReadToEndAsync(Stop)).Split('\n');
        await process.WaitForExitAsync(Stop);
        Assert.Equal(3, process.ExitCode);
        Assert.Equal(["optimum", "status", "summary"], lines[..^1].Select(line => new[] { "optimum", "status", "summary" }.Single(member => JsonElement.Parse(line).Has(member))));
        Assert.Equal("", await process.StandardError.ReadToEndAsync(Stop));
    }

    private static async Task<(int Status, string Output, string Messages)> RunAsync(string input, params string[] arguments)
    {
        using var output = new MemoryStream();
        await using var messages = new StringWriter();
        var status = await ComputeCommand.RunAsync(arguments, new MemoryStream(Encoding.UTF8.GetBytes(input)), output, messages, isWatched: false, Stop);
        return (status, Encoding.UTF8.GetString(output.ToArray()), messages.ToString());
    }
}
