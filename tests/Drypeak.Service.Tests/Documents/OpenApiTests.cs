using System.Net.Http.Headers;
using System.Text;
using System.Text.Json.Nodes;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Documents;

/// <summary>The exported description is the running service's.</summary>
public sealed class OpenApiTests(RunningService service)
{
    [Fact]
    public async Task The_served_description_is_the_exported_file_byte_for_byte()
    {
        var served = await service.Client.GetByteArrayAsync("/openapi/v1.json", TestContext.Current.CancellationToken);
        var exported = await File.ReadAllBytesAsync(Repository.File("openapi/v1.json"), TestContext.Current.CancellationToken);
        Assert.True(served.AsSpan().SequenceEqual(exported),
            "openapi/v1.json differs from the service. Run: dotnet run --project src/Drypeak.Service -- openapi \"$PWD/openapi/v1.json\"");
    }

    [Fact]
    public async Task Every_member_of_every_contract_has_a_description_and_an_example()
    {
        var description = JsonNode.Parse(await File.ReadAllTextAsync(Repository.File("openapi/v1.json"), TestContext.Current.CancellationToken))!;
        var members = description["components"]!["schemas"]!.AsObject()
            .SelectMany(schema => (schema.Value!["properties"]?.AsObject() ?? []).Select(member => (Name: $"{schema.Key}.{member.Key}", Schema: member.Value!.AsObject())))
            .ToList();
        Assert.True(members.Count > 100);
        Assert.Empty(members.Where(member => string.IsNullOrWhiteSpace((string?)member.Schema["description"])).Select(member => member.Name));
        // What is made of members of its own shows them there.
        string[] shown = ["example", "examples", "$ref", "allOf", "anyOf", "items", "additionalProperties"];
        Assert.Empty(members.Where(member => !shown.Any(member.Schema.ContainsKey)).Select(member => member.Name));
    }

    [Fact]
    public async Task Every_example_of_a_request_is_accepted()
    {
        var description = JsonNode.Parse(await File.ReadAllTextAsync(Repository.File("openapi/v1.json"), TestContext.Current.CancellationToken))!;
        var examples = description["paths"]!.AsObject()
            .Select(path => (path.Key, Example: path.Value!["post"]?["requestBody"]?["content"]?["application/json"]?["example"]))
            .Where(path => path.Example is not null).ToList();
        Assert.NotEmpty(examples);
        foreach (var (path, example) in examples)
        {
            using var body = new StringContent(example!.ToJsonString(), Encoding.UTF8, new MediaTypeHeaderValue("application/json"));
            using var answer = await service.Client.PostAsync(path, body, TestContext.Current.CancellationToken);
            Assert.True(answer.IsSuccessStatusCode, $"{path} refuses its own example with {(int)answer.StatusCode}.");
        }
    }
}
