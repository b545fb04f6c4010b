using System.Text.Json.Nodes;
using Drypeak.Service.Hosting;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Exchange.Csv;

/// <summary>The columns in words for machines: W3C Metadata Vocabulary for Tabular Data, sections 5.3 to 5.6.</summary>
internal static class CsvMetadata
{
    public const string MediaType = "application/csvm+json";

    public static string AddressOf(string job) => $"/v1/exchange/{job}.csv-metadata.json";

    public static void Map(IEndpointRouteBuilder app)
    {
        foreach (var (job, columns) in new[] { (ExchangeJobs.MoistureDensity, LaboratoryColumns.All), (ExchangeJobs.FieldDensity, FieldCsv.Columns) })
        {
            var bytes = System.Text.Encoding.UTF8.GetBytes(Of(job, columns).ToJsonString());
            app.MapMethods(AddressOf(job), EndpointDescription.Reading, () => new CachedBytes(bytes, MediaType) { CacheControl = CachedBytes.Revalidated })
                .WithTags("Exchange")
                .WithName(job + "-csv-metadata")
                .WithSummary($"The columns of {job} files")
                .WithDescription("Names, meanings, units and types of the columns, as W3C metadata for tabular data.")
                .Gives<JsonObject>(MediaType);
        }
    }

    private static JsonObject Of(string job, IReadOnlyList<CsvColumn> columns) => new()
    {
        ["@context"] = "http://www.w3.org/ns/csvw",
        ["url"] = job + ".csv",
        ["dialect"] = new JsonObject { ["delimiter"] = ",", ["header"] = true, ["encoding"] = "utf-8", ["lineTerminators"] = new JsonArray("\r\n", "\n") },
        ["tableSchema"] = new JsonObject
        {
            ["columns"] = new JsonArray([.. columns.Select(column => (JsonNode)new JsonObject
            {
                ["name"] = column.Name,
                ["titles"] = new JsonArray([.. TitlesOf(column).Select(title => (JsonNode)title)]),
                ["dc:description"] = column.Meaning,
                ["datatype"] = column.IsNumber ? "double" : "string",
                ["required"] = false,
            })]),
        },
    };

    /// <summary>The header cell with each unit that the column may have, and without.</summary>
    private static IEnumerable<string> TitlesOf(CsvColumn column) => [.. ColumnUnits.Known(column.Measure).Select(unit => $"{column.Name} [{unit}]"), column.Name];
}
