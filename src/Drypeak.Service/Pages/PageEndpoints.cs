using Drypeak.Service.Pages.Laboratory;

namespace Drypeak.Service.Pages;

/// <summary>The pages, and what they load.</summary>
internal static class PageEndpoints
{
    /// <summary>Maps every page. They are no part of the API, and stand in no description of it.</summary>
    public static void MapPages(this IEndpointRouteBuilder app)
    {
        PageFiles.Map(app);
        LaboratoryPageEndpoints.Map(app);
    }

    /// <summary>The page for an unknown address; it sets no status of its own.</summary>
    public static IResult NotFound(HttpContext _) => new PageResult<NotFoundPage>(new Dictionary<string, object?>());
}
