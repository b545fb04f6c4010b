using System.Text.Json.Nodes;
using AngleSharp.Html.Parser;
using Drypeak.Service.Tests.Documents;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Exchange;

/// <summary>The programs in <c>tests/samples</c> do what they show, each where its tool is on the machine.</summary>
public sealed class SampleTests(RunningService service)
{
    private const string Samples = "tests/samples";

    private string Address => service.Client.BaseAddress!.ToString().TrimEnd('/');

    [Fact]
    public async Task Curl_sends_a_test_a_batch_and_files()
    {
        Assert.SkipUnless(Commands.Has("curl"), "curl is not on this machine.");
        var output = await Commands.RunAsync(Samples, "bash", ["curl.sh", Address]);
        Assert.Contains("\"optimum\":{\"waterContent\":14.", output, StringComparison.Ordinal);
        Assert.Contains("{\"reference\":\"A\"\n{\"reference\":\"B\"\n{\"reference\":\"C\"\n\"answered\":3\n", output, StringComparison.Ordinal);
        Assert.Contains("reference,method,label,", output, StringComparison.Ordinal);
        Assert.Matches("\"2.68\",\"1.8[0-9]\",\"1[0-9]\",\"\"", output);
    }

    [Fact]
    public async Task Python_sends_a_batch_longer_than_the_sockets_hold()
    {
        Assert.SkipUnless(Commands.Has("python3"), "python3 is not on this machine.");
        var lines = Enumerable.Range(0, 600).Select(i =>
        {
            var test = JsonNode.Parse(BatchClient.OneLine)!;
            test["reference"] = $"{i}";
            return test.ToJsonString();
        });
        var output = await Commands.RunAsync(Samples, "python3", ["batch.py", Address], string.Join('\n', lines));
        Assert.Equal(Enumerable.Range(0, 600).Select(i => $"{i}"), output.Split('\n')[..^1].Select(line => JsonNode.Parse(line)!["reference"]!.GetValue<string>()));
    }

    [Fact]
    public async Task PowerShell_sends_a_test()
    {
        Assert.SkipUnless(Commands.Has("pwsh"), "PowerShell is not on this machine.");
        Assert.Contains("Ternmarsh, pit 2: 1.86 Mg/m³ at 14.", await Commands.RunAsync(Samples, "pwsh", ["-File", "Compute-Tests.ps1", Address]), StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_spreadsheet_reads_a_computed_table_from_an_address()
    {
        using var page = await service.GetAsync("/?demo=" + await DemoAsync());
        var link = new HtmlParser().ParseDocument(await RunningService.TextOf(page)).QuerySelectorAll("a").Single(a => a.TextContent == "Table as CSV").GetAttribute("href")!;
        using var table = await service.GetAsync(link);
        Assert.Equal("text/csv", table.Content.Headers.ContentType?.MediaType);
        Assert.StartsWith("reference,method,label,", await RunningService.TextOf(table), StringComparison.Ordinal);
    }

    [Fact]
    public async Task The_sample_file_is_that_of_the_API_description() =>
        Assert.Equal(AgsTexts.Sound, await File.ReadAllTextAsync(Repository.File(Samples + "/ternmarsh.ags"), TestContext.Current.CancellationToken));

    private async Task<string> DemoAsync()
    {
        using var page = await service.GetAsync("/");
        var demo = new HtmlParser().ParseDocument(await RunningService.TextOf(page)).QuerySelector(".demos a")!.GetAttribute("href")!;
        return demo.Split("demo=")[1].Split('#')[0];
    }
}
