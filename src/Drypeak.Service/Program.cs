using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;
using Drypeak.Service.Pages;

var builder = WebApplication.CreateBuilder(args).AddDrypeakHosting();
builder.Services.AddSingleton<MoistureDensityJob>().AddSingleton<ComparisonJob>().AddSingleton<FieldDensityJob>();

var app = builder.Build();
app.UseDrypeakHosting(PageEndpoints.NotFound);
app.MapMoistureDensity();
app.MapComparison();
EffortSeriesJob.Map(app);
app.MapSaturationLines();
app.MapOversizeCorrection();
FieldDensityJob.Map(app);
RelativeDensityJob.Map(app);
OnePointJob.Map(app);
RapidMethodJob.Map(app);
app.MapTestMethods();
app.MapFindingKinds();
app.MapSpecimenSheet();
app.MapPages();

if (args is ["openapi", var path])
{
    await app.ExportOpenApiAsync(path);
    return;
}

await app.RunAsync();
