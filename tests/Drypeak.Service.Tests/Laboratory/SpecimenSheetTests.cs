using System.Net;
using System.Text;
using System.Xml.Linq;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary><c>GET /v1/reports/specimen-sheet.pdf</c> and <c>.svg</c>: a sheet to fill in by hand.</summary>
public sealed class SpecimenSheetTests(RunningService service)
{
    private const string Pdf = "/v1/reports/specimen-sheet.pdf";
    private const string Svg = "/v1/reports/specimen-sheet.svg";

    [Fact]
    public async Task As_pdf_it_is_one_page_that_may_be_kept_and_asked_about()
    {
        using var response = await service.GetAsync(Pdf + "?method=astm-d698-a&waterContents=10,12,14");
        Assert.Equal("application/pdf", response.Content.Headers.ContentType?.MediaType);
        Assert.True(response.Headers.CacheControl is { Public: true, NoCache: true });
        Assert.False(response.Headers.ETag!.IsWeak);
        var pdf = Encoding.Latin1.GetString(await response.Content.ReadAsByteArrayAsync(TestContext.Current.CancellationToken));
        Assert.StartsWith("%PDF-1.", pdf, StringComparison.Ordinal);
        Assert.Contains("/Count 1", pdf, StringComparison.Ordinal);
        Assert.Equal(await service.BytesAsync(Pdf + "?method=astm-d698-a&waterContents=10,12,14"), await service.BytesAsync(Pdf + "?waterContents=10%2012%2014&method=astm-d698-a"));
    }

    /// <summary>A comma parts the numbers, or is the decimal mark where something else parts them.</summary>
    [Theory]
    [InlineData("10,12,14", "10", "12", "14")]
    [InlineData("10, 12, 14", "10", "12", "14")]
    [InlineData("10;12;14", "10", "12", "14")]
    [InlineData("10 12.5 14", "10", "12.5", "14")]
    [InlineData("10 12,5 14", "10", "12.5", "14")]
    [InlineData("9,5;11,5", "9.5", "11.5")]
    [InlineData("12", "12")]
    [InlineData(" 8\n10\t", "8", "10")]
    public async Task Water_contents_are_read_however_they_are_parted(string text, params string[] percents)
    {
        var texts = await TextsAsync("?waterContents=" + Uri.EscapeDataString(text));
        var at = texts.IndexOf("Water content aimed at, %");
        Assert.Equal(percents, texts.Skip(at + 1).Take(percents.Length));
        Assert.Equal("Water added, g", texts[at + 1 + percents.Length]);
    }

    [Theory]
    [InlineData("", 5)]
    [InlineData("?method=jis-a-1210-a", 6)]
    [InlineData("?method=astm-d698-a", 5)]
    [InlineData("?specimens=3", 3)]
    [InlineData("?specimens=8&waterContents=10,12", 8)]
    [InlineData("?method=&specimens=&waterContents=&mass=&reference=", 5)]
    public async Task There_are_as_many_columns_as_are_asked_for_or_as_the_method_needs(string query, int specimens)
    {
        var texts = await TextsAsync(query);
        Assert.Equal(Enumerable.Range(1, specimens).Select(number => $"{number}"), texts.Skip(texts.IndexOf("Specimen") + 1).TakeWhile(text => text.Length == 1));
    }

    [Fact]
    public async Task Masses_are_in_the_unit_asked_for_and_tins_in_grams()
    {
        var texts = await TextsAsync("?mass=lb&reference=Ternmarsh");
        Assert.Superset(new HashSet<string> { "Mold + wet soil, lb", "Mass of the mold, lb", "Tin + dry soil, g", "Ternmarsh" }, texts.ToHashSet());
    }

    [Theory]
    [InlineData("?method=astm-d698", "/method unknown-method")]
    [InlineData("?method=custom", "/method unknown-method")]
    [InlineData("?waterContents=10,x", "/waterContents out-of-range")]
    [InlineData("?waterContents=10,-1", "/waterContents out-of-range")]
    [InlineData("?waterContents=1000.1", "/waterContents out-of-range")]
    [InlineData("?waterContents=1e1", "/waterContents out-of-range")]
    [InlineData("?waterContents=1,2,3,4,5,6,7,8,9", "/waterContents too-many")]
    [InlineData("?specimens=0", "/specimens out-of-range")]
    [InlineData("?specimens=9", "/specimens out-of-range")]
    [InlineData("?specimens=2&waterContents=10,12,14", "/specimens out-of-range")]
    [InlineData("?mass=oz", "/mass unknown-unit")]
    [InlineData("?waterContent=10", "/waterContent unknown-parameter")]
    [InlineData("?mass=g&mass=kg", "/mass repeated-parameter")]
    [InlineData("?mass=oz&specimens=0&method=x", "/method unknown-method", "/mass unknown-unit", "/specimens out-of-range")]
    public async Task A_parameter_that_cannot_be_is_refused_by_name(string query, params string[] faults)
    {
        foreach (var address in new[] { Pdf, Svg })
        {
            using var response = await service.GetAsync(address + query);
            Assert.Equal(HttpStatusCode.BadRequest, response.StatusCode);
            Assert.Equal(faults, (await Refusal.Of(response)).Faults);
        }
    }

    [Fact]
    public async Task A_reference_has_a_bound()
    {
        using var response = await service.GetAsync($"{Svg}?reference={new string('r', 201)}");
        Assert.Equal(["/reference too-long"], (await Refusal.Of(response)).Faults);
        Assert.Equal(HttpStatusCode.OK, (await service.GetAsync($"{Svg}?reference={new string('r', 200)}")).StatusCode);
    }

    private async Task<List<string>> TextsAsync(string query) =>
        [.. XDocument.Parse(Encoding.UTF8.GetString(await service.BytesAsync(Svg + query))).Descendants().Where(element => element.Name.LocalName == "text").Select(text => text.Value)];
}
