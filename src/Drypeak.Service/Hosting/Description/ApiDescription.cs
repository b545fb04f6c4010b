using Microsoft.OpenApi;
using Swashbuckle.AspNetCore.Swagger;

namespace Drypeak.Service.Hosting;

/// <summary>The OpenAPI document: made once, served and exported as the same bytes.</summary>
public sealed class ApiDescription(ISwaggerProvider swagger)
{
    public const string Address = "/openapi/v1.json";
    internal const string Name = "v1";

    private readonly Lazy<Task<byte[]>> json = new(() => WriteAsync(swagger));

    /// <summary>OpenAPI 3.1 as JSON in UTF-8, with LF and a last line break.</summary>
    public Task<byte[]> JsonAsync => json.Value;

    private static async Task<byte[]> WriteAsync(ISwaggerProvider swagger)
    {
        using var text = new StringWriter { NewLine = "\n" };
        swagger.GetSwagger(Name).SerializeAsV31(new OpenApiJsonWriter(text));
        await text.WriteLineAsync();
        return System.Text.Encoding.UTF8.GetBytes(text.ToString());
    }
}
