using Microsoft.OpenApi;
using Swashbuckle.AspNetCore.SwaggerGen;

namespace Drypeak.Service.Hosting;

/// <summary>What the document says once for all operations: what each group of them is for, and how a key is shown where whoever runs the service asks for one.</summary>
internal sealed class TagsAndSecurity : IDocumentFilter
{
    private const string Key = "key";

    private static readonly Dictionary<string, string> Descriptions = new()
    {
        ["Laboratory"] = "Compaction tests and what belongs to them.",
        ["Exchange"] = "Files of tests: spreadsheets and AGS4.",
        ["Earthwork"] = "Planning the work: water, quantities, test programmes, rollers, trial strips.",
        ["Catalogues"] = "Test methods and findings, explained.",
        ["Charts"] = "Pictures by address.",
        ["Description"] = "The service in its own words.",
        ["Health"] = "For those who run the service.",
    };

    public void Apply(OpenApiDocument swaggerDoc, DocumentFilterContext context)
    {
        foreach (var tag in swaggerDoc.Tags ?? new HashSet<OpenApiTag>())
        {
            tag.Description = Descriptions.GetValueOrDefault(tag.Name ?? "");
        }

        swaggerDoc.Components ??= new OpenApiComponents();
        swaggerDoc.Components.SecuritySchemes = new Dictionary<string, IOpenApiSecurityScheme>
        {
            [Key] = new OpenApiSecurityScheme
            {
                Type = SecuritySchemeType.Http,
                Scheme = "bearer",
                Description = "A key, or a token of the issuer that the service trusts. Needed only where whoever runs the service has configured it; else everyone may ask.",
            },
        };
        swaggerDoc.Security = [new OpenApiSecurityRequirement(), new OpenApiSecurityRequirement { [new OpenApiSecuritySchemeReference(Key, swaggerDoc)] = [] }];
    }
}
