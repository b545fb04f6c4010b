using Drypeak.Service.Acceptance;
using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Service.Pages.Acceptance;
using Drypeak.Service.Pages.Catalogues;
using Drypeak.Service.Pages.Earthwork;
using Drypeak.Service.Pages.Exchange;
using Drypeak.Service.Pages.FieldDensity;
using Drypeak.Service.Pages.Forms;
using Drypeak.Service.Pages.Laboratory;
using Drypeak.Service.Pages.Preparation;
using Drypeak.Service.Pages.References;
using Microsoft.AspNetCore.Components;

namespace Drypeak.Service.Pages;

/// <summary>The pages, and what they load.</summary>
internal static class PageEndpoints
{
    /// <summary>Maps every page. They are no part of the API, and stand in no description of it.</summary>
    public static void MapPages(this IEndpointRouteBuilder app)
    {
        var limits = app.ServiceProvider.GetRequiredService<Limits>();
        PageFiles.Map(app);
        LaboratoryPageEndpoints.Map(app);
        app.MapForm(FieldDensityPage.Of(app.ServiceProvider.GetRequiredService<FieldDensityJob>(), limits));
        app.MapForm(RelativeDensityPage.Of(app.ServiceProvider.GetRequiredService<RelativeDensityJob>()));
        app.MapForm(OnePointPage.Of(app.ServiceProvider.GetRequiredService<OnePointJob>(), limits));
        app.MapForm(RapidMethodPage.Of(app.ServiceProvider.GetRequiredService<RapidMethodJob>()));
        app.MapForm(LotPage.Of(app.ServiceProvider.GetRequiredService<LotAcceptanceJob>()));
        app.MapForm(PlanPage.Of(app.ServiceProvider.GetRequiredService<AcceptancePlanJob>()));
        EarthworkPages.Map(app);
        ExchangePageEndpoints.Map(app);
        SpecimenSheetPageEndpoint.Map(app);
        MapStill<TestMethodsPage>(app, "/test-methods");
        MapStill<FindingsPage>(app, "/findings");
    }

    /// <summary>A page that is the same for all who ask.</summary>
    private static void MapStill<TPage>(IEndpointRouteBuilder app, string address)
        where TPage : IComponent =>
        app.MapMethods(address, [HttpMethods.Get, HttpMethods.Head], IResult () => new PageResult<TPage>(new Dictionary<string, object?>())).ExcludeFromDescription();

    /// <summary>The page for an unknown address; it sets no status of its own.</summary>
    public static IResult NotFound(HttpContext _) => new PageResult<NotFoundPage>(new Dictionary<string, object?>());
}
