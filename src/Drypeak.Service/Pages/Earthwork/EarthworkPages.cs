using Drypeak.Service.Earthwork;
using Drypeak.Service.Hosting;
using Drypeak.Service.Pages.Forms;

namespace Drypeak.Service.Pages.Earthwork;

/// <summary>The pages of planning the work: one a job, each printed as a sheet for the site.</summary>
internal static class EarthworkPages
{
    public static void Map(IEndpointRouteBuilder app)
    {
        var (services, limits) = (app.ServiceProvider, app.ServiceProvider.GetRequiredService<Limits>());
        FormPage[] pages =
        [
            SpecimenWaterPage.Of(limits),
            LiftWaterPage.Of(limits),
            QuantitiesPage.Of(limits),
            TestLocationsPage.Of(services.GetRequiredService<TestLocationsJob>()),
            RollerOutputPage.Of(limits),
            TestStripPage.Of(services.GetRequiredService<TestStripJob>()),
        ];
        foreach (var page in pages)
        {
            app.MapForm(page);
        }
    }
}
