using Drypeak.Service.Acceptance;
using Drypeak.Service.Earthwork;
using Drypeak.Service.Exchange;
using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;
using Drypeak.Service.Pages;
using Drypeak.Service.Reports;

if (args is [ComputeCommand.Name, .. var arguments])
{
    return await ComputeCommand.RunAsync(arguments);
}

var builder = WebApplication.CreateBuilder(args).AddDrypeakHosting();
builder.Services.AddSingleton<MoistureDensityJob>().AddSingleton<ComparisonJob>().AddSingleton<FieldDensityJob>()
    .AddSingleton<RelativeDensityJob>().AddSingleton<OnePointJob>().AddSingleton<RapidMethodJob>().AddEarthworkJobs().AddExchangeJobs()
    .AddSingleton<LotAcceptanceJob>().AddSingleton<AcceptancePlanJob>();

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
LotAcceptanceJob.Map(app);
AcceptancePlanJob.Map(app);
app.MapEarthwork();
app.MapExchange();
app.MapTestMethods();
app.MapFindingKinds();
app.MapSpecimenSheet();
MoistureDensityReport.Map(app);
FieldDensityReport.Map(app);
app.MapPages();

if (args is ["openapi", var path])
{
    await app.ExportOpenApiAsync(path);
    return 0;
}

await app.RunAsync();
return 0;
