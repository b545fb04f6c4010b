using System.Text.Json;
using Drypeak.Service.Hosting;
using Microsoft.AspNetCore.Builder;
using Microsoft.AspNetCore.Http;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

public sealed class ApiDescriptionTests : IAsyncLifetime
{
    private TestService service = null!;
    private JsonElement document;

    public async ValueTask InitializeAsync()
    {
        service = await TestService.StartAsync(app => app
            .MapPost("/described", (HttpContext context) => context.Request.Method)
            .Takes<Weighing>("application/json", """{ "balance": 31.2 }""")
            .Gives<Portion>("application/json", """{ "label": "1" }""")
            .Gives<byte[]>("image/png")
            .TakesQuery<int>("width", "Width, px.", "960")
            .Refuses(400, 415));
        document = JsonSerializer.Deserialize<JsonElement>(await service.Client.GetStringAsync(ApiDescription.Address, TestContext.Current.CancellationToken));
    }

    public ValueTask DisposeAsync() => service.DisposeAsync();

    [Fact]
    public void It_is_OpenAPI_3_1_and_lists_health_and_itself()
    {
        Assert.StartsWith("3.1.", document.GetProperty("openapi").GetString(), StringComparison.Ordinal);
        var addresses = document.GetProperty("paths").EnumerateObject().Select(path => path.Name).ToArray();
        Assert.All(["/health/live", "/health/ready", "/openapi/v1.json"], address => Assert.Contains(address, addresses));
    }

    [Fact]
    public void An_operation_has_what_its_endpoint_says()
    {
        var operation = document.GetProperty("paths").GetProperty("/described").GetProperty("post");
        var request = operation.GetProperty("requestBody").GetProperty("content").GetProperty("application/json");
        Assert.Equal(31.2, request.GetProperty("example").GetProperty("balance").GetDouble());
        Assert.Equal("#/components/schemas/Weighing", request.GetProperty("schema").GetProperty("$ref").GetString());

        var responses = operation.GetProperty("responses");
        var answer = responses.GetProperty("200").GetProperty("content");
        Assert.Equal("1", answer.GetProperty("application/json").GetProperty("example").GetProperty("label").GetString());
        Assert.True(answer.TryGetProperty("image/png", out _));
        Assert.Equal(ProblemKind.UnsupportedMediaType.Title, responses.GetProperty("415").GetProperty("description").GetString());
        Assert.True(responses.GetProperty("400").GetProperty("content").TryGetProperty(Problem.MediaType, out _));

        var query = Assert.Single(operation.GetProperty("parameters").EnumerateArray());
        Assert.Equal(("width", "query", 960), (query.GetProperty("name").GetString(), query.GetProperty("in").GetString(), query.GetProperty("example").GetInt32()));
    }

    [Fact]
    public void A_contract_is_closed_names_what_it_requires_and_lets_optional_components_be_null()
    {
        var schema = document.GetProperty("components").GetProperty("schemas").GetProperty("Weighing");
        Assert.False(schema.GetProperty("additionalProperties").GetBoolean());
        Assert.Equal(["balance", "portions"], schema.GetProperty("required").EnumerateArray().Select(name => name.GetString()).Order());

        var ring = schema.GetProperty("properties").GetProperty("ring");
        Assert.False(ring.TryGetProperty("allOf", out _));
        Assert.Equal(
            ["#/components/schemas/Ring", "null"],
            ring.GetProperty("anyOf").EnumerateArray().Select(each => each.TryGetProperty("$ref", out var component) ? component.GetString() : each.GetProperty("type").GetString()));
        Assert.Equal(["integer", "null"], schema.GetProperty("properties").GetProperty("layers").GetProperty("type").EnumerateArray().Select(type => type.GetString()).Order());
    }
}
