namespace Drypeak.Service.Earthwork;

/// <summary>The six addresses of planning the work.</summary>
internal static class EarthworkEndpoints
{
    /// <summary>The jobs that others ask for as well: pages, and the kinds of their charts.</summary>
    public static IServiceCollection AddEarthworkJobs(this IServiceCollection services) =>
        services.AddSingleton<TestLocationsJob>().AddSingleton<TestStripJob>();

    /// <summary>Maps <c>/v1/earthwork/…</c>.</summary>
    public static void MapEarthwork(this IEndpointRouteBuilder app)
    {
        SpecimenWaterJob.Map(app);
        LiftWaterJob.Map(app);
        QuantitiesJob.Map(app);
        TestLocationsJob.Map(app);
        RollerOutputJob.Map(app);
        TestStripJob.Map(app);
    }
}
