using System.Text.Json;
using Drypeak.Service.Exchange.Csv;
using Drypeak.Service.Laboratory;

namespace Drypeak.Service.Pages.Laboratory;

/// <summary>A test taken away as a file.</summary>
/// <param name="Name">The name that it is saved under.</param>
/// <param name="Label">What it is called on the page.</param>
/// <param name="MediaType">Its Content-Type.</param>
/// <param name="Write">Its bytes.</param>
internal sealed record TestFile(string Name, string Label, string MediaType, Func<MoistureDensityRequest, MoistureDensityAnswer, byte[]> Write)
{
    public static readonly TestFile Answer = new("compaction-test-answer.json", "Answer as JSON", "application/json",
        (_, answer) => JsonSerializer.SerializeToUtf8Bytes(answer, ServiceJson.Of<MoistureDensityAnswer>()));

    public static readonly TestFile Table = new("compaction-test.csv", "Table as CSV", "text/csv; charset=utf-8",
        (request, answer) => LaboratoryCsv.Write([(request, answer)]));

    public static readonly TestFile Request = new("compaction-test-request.json", "Request as JSON", "application/json",
        (request, _) => JsonSerializer.SerializeToUtf8Bytes(request, ServiceJson.Of<MoistureDensityRequest>()));

    public static IReadOnlyList<TestFile> All { get; } = [Answer, Table, Request];

    /// <summary>Where it is had: with the test in the query, or by posting the form.</summary>
    public string Address => "/files/" + Name;
}
