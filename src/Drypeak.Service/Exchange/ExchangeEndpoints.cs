using Drypeak.Service.Exchange.Ags;
using Drypeak.Service.Exchange.Batch;
using Drypeak.Service.Exchange.Csv;

namespace Drypeak.Service.Exchange;

/// <summary>Batches and files.</summary>
internal static class ExchangeEndpoints
{
    public static IServiceCollection AddExchangeJobs(this IServiceCollection services) => services.AddSingleton<ExchangeJobs>().AddSingleton<AgsJob>();

    public static void MapExchange(this IEndpointRouteBuilder app)
    {
        app.MapBatches();
        app.MapCsv();
        app.MapAgs();
    }
}
