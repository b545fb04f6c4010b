using System.Text.Json.Nodes;
using Microsoft.OpenApi;
using Swashbuckle.AspNetCore.SwaggerGen;

namespace Drypeak.Service.Hosting;

/// <summary>Describes the service: the OpenAPI document, the page that explains it, the export to a file.</summary>
public static class ApiReference
{
    /// <summary>The page; everything it needs is in the program.</summary>
    public const string Address = "/reference";

    private const string StyleSheetAddress = Address + "/drypeak.css";

    /// <summary>There is one document: no bar to choose it from.</summary>
    private static readonly byte[] StyleSheet = ".swagger-ui .topbar { display: none; }\n"u8.ToArray();

    internal static void AddApiDescription(this IServiceCollection services)
    {
        services.AddEndpointsApiExplorer();
        services.AddSingleton<ApiDescription>();
        services.AddSwaggerGen(Describe);
        services.ConfigureHttpJsonOptions(http => StrictJson.Configure(http.SerializerOptions, http.SerializerOptions.TypeInfoResolver!));
    }

    internal static void Use(WebApplication app)
    {
        app.MapMethods(ApiDescription.Address, EndpointDescription.Reading, Document).AllowAnonymous().WithTags("Description").WithName("description")
            .Gives<JsonObject>("application/json", """{ "openapi": "3.1.1" }""");
        app.MapMethods(StyleSheetAddress, EndpointDescription.Reading, () => new CachedBytes(StyleSheet, "text/css") { CacheControl = CachedBytes.Revalidated })
            .ExcludeFromDescription();
        app.UseSwaggerUI(page =>
        {
            page.RoutePrefix = Address.TrimStart('/');
            page.DocumentTitle = "Drypeak: API reference";
            page.SwaggerEndpoint(ApiDescription.Address, "Drypeak v1");
            page.InjectStylesheet(StyleSheetAddress);
            page.EnableDeepLinking();
            page.DefaultModelsExpandDepth(0);
        });
    }

    /// <summary>
    /// Writes the document to a file, byte for byte as it is served. The application is started for a moment on a free
    /// local port, since the addresses are only complete then.
    /// </summary>
    public static async Task ExportOpenApiAsync(this WebApplication app, string path)
    {
        app.Urls.Clear();
        app.Urls.Add("http://127.0.0.1:0");
        await app.StartAsync();
        await File.WriteAllBytesAsync(path, await app.Services.GetRequiredService<ApiDescription>().JsonAsync);
        await app.StopAsync();
    }

    /// <summary>This description: OpenAPI 3.1.</summary>
    private static async Task<IResult> Document(ApiDescription description) =>
        new CachedBytes(await description.JsonAsync, "application/json") { CacheControl = CachedBytes.Revalidated };

    private static void Describe(SwaggerGenOptions options)
    {
        options.SwaggerDoc(ApiDescription.Name, new OpenApiInfo
        {
            Title = "Drypeak",
            Version = "v1",
            Description = "Soil compaction tests: dry density against water content, from weighings to a checked curve. The service keeps nothing.",
            License = new OpenApiLicense { Name = "MIT", Identifier = "MIT" },
        });
        options.AddServer(new OpenApiServer { Url = "/", Description = "Where this document came from" });
        options.SupportNonNullableReferenceTypes();
        options.NonNullableReferenceTypesAsRequired();
        options.UseAllOfToExtendReferenceSchemas();
        options.MapType<JsonObject>(() => new OpenApiSchema { Type = JsonSchemaType.Object });
        // HEAD is GET without the body (RFC 9110, section 9.3.2): describing it would say everything twice.
        options.DocInclusionPredicate((_, api) => api.HttpMethod != HttpMethods.Head);
        options.OperationFilter<DescribedOperation>();
        options.DocumentFilter<NullableReferences>();
        options.DocumentFilter<TagsAndSecurity>();
        options.IncludeXmlComments(typeof(ApiReference).Assembly);
        options.IncludeXmlComments(typeof(Fault).Assembly);
    }
}
