using Drypeak.Service.Charts;
using Drypeak.Service.Exchange;
using Drypeak.Service.Exchange.Ags;
using Drypeak.Service.Exchange.Batch;
using Drypeak.Service.Exchange.Csv;
using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;
using Drypeak.Service.Pages;

var builder = WebApplication.CreateBuilder(args).AddDrypeakHosting();
builder.Services.AddSingleton<ChartRules>().AddSingleton<MoistureDensityJob>().AddSingleton<ComparisonJob>().AddSingleton<FieldDensityJob>().AddSingleton<ExchangeJobs>().AddSingleton<AgsJob>();

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
app.MapBatches();
app.MapCsv();
app.MapAgs();
app.MapTestMethods();
app.MapFindingKinds();
app.MapSpecimenSheet();
app.MapCharts();
app.MapPages();

if (args is ["openapi", var path])
{
    await app.ExportOpenApiAsync(path);
    return;
}

await app.RunAsync();
