using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service.Pages.Preparation;

/// <summary>The page of the blank sheet. The form is sent by GET, so that a sheet has an address of its own.</summary>
internal static class SpecimenSheetPageEndpoint
{
    /// <summary>Typed here: what generates the endpoint's call does not see pages, which are generated too.</summary>
    private const string Address = SpecimenSheetPage.Address;

    public static void Map(IEndpointRouteBuilder app) =>
        app.MapMethods(Address, [HttpMethods.Get, HttpMethods.Head], IResult (HttpContext context, Limits limits) => Open(context.Request.Query, limits)).ExcludeFromDescription();

    private static PageResult<SpecimenSheetPage> Open(IQueryCollection query, Limits limits)
    {
        var faults = new List<Fault>();
        var sheet = SpecimenSheetQuery.Read(query, limits, faults);
        return new PageResult<SpecimenSheetPage>(new Dictionary<string, object?>
        {
            [nameof(SpecimenSheetPage.Form)] = sheet,
            [nameof(SpecimenSheetPage.Faults)] = faults,
            [nameof(SpecimenSheetPage.Typed)] = query,
        })
        {
            Status = faults.Count > 0 ? StatusCodes.Status400BadRequest : null,
        };
    }
}
