using Microsoft.OpenApi;
using Swashbuckle.AspNetCore.SwaggerGen;

namespace Drypeak.Service.Hosting;

/// <summary>
/// Gives members that may be null and whose type is a component their null back. The generator writes them as
/// <c>type: null</c> together with <c>allOf</c>, which nothing satisfies; right is <c>anyOf</c> of the component and null.
/// </summary>
internal sealed class NullableReferences : IDocumentFilter
{
    public void Apply(OpenApiDocument swaggerDoc, DocumentFilterContext context)
    {
        var members = swaggerDoc.Components?.Schemas?.Values
            .SelectMany(schema => schema.Properties?.Values ?? [])
            .OfType<OpenApiSchema>()
            .Where(member => member.AllOf is [OpenApiSchemaReference] && member.Type?.HasFlag(JsonSchemaType.Null) == true);
        foreach (var member in members ?? [])
        {
            member.AnyOf = [member.AllOf![0], new OpenApiSchema { Type = JsonSchemaType.Null }];
            member.AllOf = null;
            member.Type = null;
        }
    }
}
