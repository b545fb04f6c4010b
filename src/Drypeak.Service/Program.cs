using Drypeak.Service.Hosting;

var builder = WebApplication.CreateBuilder(args).AddDrypeakHosting();
var app = builder.Build();
app.UseDrypeakHosting(_ => Results.Content("<!doctype html><title>Not found</title>", "text/html"));
if (args is ["openapi", var path])
{
    await app.ExportOpenApiAsync(path);
    return;
}

await app.RunAsync();
