using System.Globalization;
using System.Text.Json.Nodes;
using Microsoft.AspNetCore.Authorization;
using Microsoft.AspNetCore.RateLimiting;
using Microsoft.AspNetCore.WebUtilities;
using Microsoft.OpenApi;
using Swashbuckle.AspNetCore.SwaggerGen;

namespace Drypeak.Service.Hosting;

/// <summary>Writes what <see cref="EndpointDescription"/> says into an operation: bodies, examples, refusals, parameters.</summary>
internal sealed class DescribedOperation : IOperationFilter
{
    public void Apply(OpenApiOperation operation, OperationFilterContext context)
    {
        var metadata = context.ApiDescription.ActionDescriptor.EndpointMetadata;
        IOpenApiSchema SchemaOf(Type type) => context.SchemaGenerator.GenerateSchema(type, context.SchemaRepository);
        foreach (var body in metadata.OfType<EndpointDescription.Body>())
        {
            var content = body.Status == 0 ? ContentOfRequest(operation) : ContentOfAnswer(operation, body.Status);
            content[body.MediaType] = new OpenApiMediaType
            {
                Schema = SchemaOf(body.Type),
                Example = ParseExample(body),
            };
        }

        foreach (var status in OfEveryone(metadata))
        {
            ContentOfAnswer(operation, status)[Problem.MediaType] = new OpenApiMediaType { Schema = SchemaOf(typeof(Problem)) };
        }

        foreach (var query in metadata.OfType<EndpointDescription.Query>())
        {
            (operation.Parameters ??= []).Add(new OpenApiParameter
            {
                Name = query.Name,
                In = ParameterLocation.Query,
                Required = query.Required,
                Description = query.Description,
                Schema = SchemaOf(query.Type),
                Example = query.Type == typeof(string) ? JsonValue.Create(query.Example()) : JsonNode.Parse(query.Example()),
            });
        }
    }

    /// <summary>What may be refused before an endpoint is asked: who may not, who asks too often, and everyone while the service is busy.</summary>
    private static IEnumerable<int> OfEveryone(IList<object> metadata)
    {
        int[] access = metadata.OfType<IAllowAnonymous>().Any() ? [] : [401, 403];
        int[] capacity = metadata.OfType<DisableRateLimitingAttribute>().Any() ? [] : [408, 429, 503];
        return access.Concat(capacity);
    }

    private static JsonNode? ParseExample(EndpointDescription.Body body) => body.Example is null ? null
        : body.MediaType.EndsWith("json", StringComparison.Ordinal) && !body.MediaType.EndsWith("ndjson", StringComparison.Ordinal)
            ? JsonNode.Parse(body.Example)
            : JsonValue.Create(body.Example);

    private static IDictionary<string, IOpenApiMediaType> ContentOfRequest(OpenApiOperation operation)
    {
        var body = operation.RequestBody as OpenApiRequestBody ?? new OpenApiRequestBody { Required = true };
        operation.RequestBody = body;
        return body.Content ??= new Dictionary<string, IOpenApiMediaType>();
    }

    private static IDictionary<string, IOpenApiMediaType> ContentOfAnswer(OpenApiOperation operation, int status)
    {
        var responses = operation.Responses ??= [];
        var key = status.ToString(CultureInfo.InvariantCulture);
        if (responses.GetValueOrDefault(key) is not OpenApiResponse response)
        {
            response = new OpenApiResponse();
            responses[key] = response;
        }

        response.Description = status == StatusCodes.Status200OK ? "The answer" : TitlesOf(status);
        return response.Content ??= new Dictionary<string, IOpenApiMediaType>();
    }

    private static string TitlesOf(int status)
    {
        var titles = ProblemKind.All.Where(kind => kind.Status == status).Select(kind => kind.Title);
        return string.Join("; ", titles.DefaultIfEmpty(ReasonPhrases.GetReasonPhrase(status)));
    }
}
