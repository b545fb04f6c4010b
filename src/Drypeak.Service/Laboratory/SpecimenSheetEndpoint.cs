using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Laboratory;

/// <summary><c>GET /v1/reports/specimen-sheet.pdf</c> and <c>.svg</c>: a laboratory sheet to be printed and filled in by hand.</summary>
internal static class SpecimenSheetEndpoint
{
    private static readonly ChartFormat[] Formats = [ChartFormat.Pdf, ChartFormat.Svg];

    public static void MapSpecimenSheet(this IEndpointRouteBuilder app)
    {
        foreach (var format in Formats)
        {
            app.MapMethods(AddressOf(format), EndpointDescription.Reading, (HttpContext context, Limits limits) => Draw(context.Request.Query, limits, format))
                .WithTags("Laboratory")
                .WithName($"specimen-sheet-{format.Suffix}")
                .WithSummary($"A laboratory sheet with blanks as {format.Suffix.ToUpperInvariant()}")
                .WithDescription("One page of A4 for a test method and the water contents aimed at: lines for labels, and rows for the masses of mold, soil and tins.")
                .TakesQuery<string>(SpecimenSheetQuery.Method, "Code of the test method, as listed at /v1/test-methods; without it the lines for its apparatus are blank.", "astm-d698-a")
                .TakesQuery<string>(SpecimenSheetQuery.WaterContents, $"The water contents aimed at, %, up to {LaboratorySheet.MostSpecimens}: a column each.", "10,12,14,16,18")
                .TakesQuery<int>(SpecimenSheetQuery.Specimens, $"Columns, 1 to {LaboratorySheet.MostSpecimens}; those beyond the water contents are blank. Default: one for each, or five and no fewer than the method asks for.", "6")
                .TakesQuery<string>(SpecimenSheetQuery.MassUnit, "Mold and soil are weighed in g, kg or lb. Default g; tins are weighed in g.", "g")
                .TakesQuery<string>(SpecimenSheetQuery.Reference, "What names the test.", "Ternmarsh, borrow area 7, sample 3")
                .Gives<byte[]>(format.MediaType)
                .Refuses(400);
        }
    }

    /// <summary>Where a sheet is had in a format, without its query.</summary>
    public static string AddressOf(ChartFormat format) => $"/v1/reports/specimen-sheet.{format.Suffix}";

    private static IResult Draw(IQueryCollection query, Limits limits, ChartFormat format)
    {
        var faults = new List<Fault>();
        var sheet = SpecimenSheetQuery.Read(query, limits, faults);
        return faults.Count > 0
            ? Problems.InvalidQuery(faults)
            : new CachedBytes(format.Write(LaboratorySheetFigure.Draw(sheet), 1), format.MediaType) { CacheControl = CachedBytes.Revalidated };
    }
}
