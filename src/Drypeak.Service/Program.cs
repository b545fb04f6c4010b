using Drypeak.Service.Charts;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;

var builder = WebApplication.CreateBuilder(args).AddDrypeakHosting();
builder.Services.AddSingleton<MoistureDensityJob>().AddSingleton<ComparisonJob>();

var app = builder.Build();
app.UseDrypeakHosting(_ => Results.Content("<!doctype html><title>Not found</title>", "text/html"));
app.MapMoistureDensity();
app.MapComparison();
app.MapFindingKinds();
app.MapCharts();

if (args is ["openapi", var path])
{
    await app.ExportOpenApiAsync(path);
    return;
}

await app.RunAsync();
