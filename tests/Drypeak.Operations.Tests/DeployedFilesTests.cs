using System.Text.Json.Nodes;
using Xunit;

namespace Drypeak.Operations.Tests;

/// <summary>What is deployed is valid, by the tools that read it; and what is in it is listed.</summary>
public sealed class DeployedFilesTests
{
    [Fact]
    public async Task Each_file_passes_the_tool_that_reads_it()
    {
        var (code, output) = await Tool.RunAsync("bash", Repository.File("deploy/check"));
        TestContext.Current.TestOutputHelper?.WriteLine(output);
        Assert.True(code == 0, output);
    }

    [Fact]
    public async Task The_licence_of_each_package_that_the_program_ships_is_listed()
    {
        var listed = await File.ReadAllTextAsync(Repository.File("THIRD-PARTY.md"), TestContext.Current.CancellationToken);
        var packages = JsonNode.Parse(await File.ReadAllTextAsync(Repository.File("src/Drypeak.Service/packages.lock.json"), TestContext.Current.CancellationToken))!["dependencies"]!["net10.0"]!.AsObject()
            .Where(package => package.Value!["resolved"] is { })
            .Select(package => $"| {package.Key} | {package.Value!["resolved"]!.GetValue<string>()} |").ToList();
        Assert.NotEmpty(packages);
        Assert.All(packages, package => Assert.Contains(package, listed, StringComparison.Ordinal));
    }
}
