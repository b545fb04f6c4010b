using System.Text.Json;
using Drypeak.Service.Tests.Documents;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Exchange;

/// <summary>Clients made from <c>openapi/v1.json</c> by generators that others make: they compile, and the service answers them.</summary>
public sealed class ClientTests(RunningService service)
{
    private string Address => service.Client.BaseAddress!.ToString().TrimEnd('/');

    [Fact]
    public async Task A_client_in_CSharp_is_generated_compiled_and_answered()
    {
        Assert.SkipUnless(Directory.Exists(Path.Combine(Environment.GetFolderPath(Environment.SpecialFolder.UserProfile), ".nuget/packages/microsoft.openapi.kiota")), "Kiota is not installed; tests/run restores it.");
        const string folder = "tests/clients/csharp";
        await Commands.RunAsync(folder, "dotnet", ["kiota", "generate", "--language", "CSharp", "--openapi", "../../../openapi/v1.json", "--class-name", "DrypeakClient", "--namespace-name", "Drypeak.Client",
            "--output", "generated", "--clean-output", "--exclude-backward-compatible", "--log-level", "Error"]);
        await Commands.RunAsync(folder, "dotnet", ["build", "--configuration", "Release", "--nologo", "--verbosity", "quiet"]);
        AssertAnswered(await Commands.RunAsync(folder, "dotnet", ["bin/Release/net10.0/Client.dll", Address]));
    }

    [Fact]
    public async Task A_client_in_TypeScript_is_generated_compiled_and_answered()
    {
        const string folder = "tests/clients/typescript";
        Assert.SkipUnless(Directory.Exists(Repository.File(folder + "/node_modules")), "The generator is not installed; tests/run does it by npm ci.");
        await Commands.RunAsync(folder, "npm", ["run", "--silent", "generate"]);
        await Commands.RunAsync(folder, "npm", ["run", "--silent", "compile"]);
        AssertAnswered(await Commands.RunAsync(folder, "node", ["built/use.js", Address]));
    }

    private static void AssertAnswered(string output)
    {
        var answer = JsonElement.Parse(output.Trim().Split('\n')[^1]);
        Assert.Equal("Ternmarsh, pit 2", answer.Text("/reference"));
        Assert.InRange(answer.Number("/maximumDryDensity"), 1.8, 1.9);
        Assert.Equal("/specimens empty-list", answer.Text("/refused/0"));
    }
}
