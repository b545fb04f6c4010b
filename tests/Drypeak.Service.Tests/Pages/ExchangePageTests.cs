using System.Net;
using System.Text;
using AngleSharp.Html.Dom;
using AngleSharp.Html.Parser;
using Drypeak.Service.Tests.Exchange;
using Xunit;

namespace Drypeak.Service.Tests.Pages;

public sealed class ExchangePageTests(PageService service) : IClassFixture<PageService>
{
    private const string Csv = "reference,waterContent [%],dryDensity [Mg/m3]\nB,10,1.75\nB,12,1.82\nB,14,1.86\nB,16,1.83\nB,18,1.77\n";

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    [Fact]
    public async Task The_page_asks_for_a_file_and_shows_two_worked_ones()
    {
        var (response, page) = await service.GetAsync("/exchange");
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        Assert.Equal("Files of tests", page.QuerySelector("h1")!.TextContent);
        Assert.All(page.QuerySelectorAll("input:not([type=checkbox]), select, textarea"), control => Assert.NotNull(page.QuerySelector($"label[for={control.Id}]")));
        var demos = page.QuerySelectorAll(".demos a").Select(link => link.GetAttribute("href")!.Split('#')[0]).ToList();
        Assert.Equal(2, demos.Count);
        foreach (var demo in demos)
        {
            var (answered, shown) = await service.GetAsync(demo);
            Assert.Equal(HttpStatusCode.OK, answered.StatusCode);
            Assert.NotNull(shown.QuerySelector("#answer table"));
        }

        Assert.Equal(HttpStatusCode.NotFound, (await service.GetAsync("/exchange?demo=none")).Response.StatusCode);
    }

    [Fact]
    public async Task An_uploaded_CSV_file_is_computed_and_taken_away_with_its_results()
    {
        var (response, page) = await PostAsync("csv-laboratory", file: Csv);
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        Assert.Equal("1 compaction test computed.", page.QuerySelector("#answer h2")!.TextContent);
        Assert.Equal("B", page.QuerySelector("#answer tbody th")!.TextContent);
        Assert.Contains("1.86 Mg/m³", page.QuerySelector("#answer tbody")!.TextContent, StringComparison.Ordinal);
        Assert.StartsWith("reference,method,label,", TakenAway(page, "computed.csv"), StringComparison.Ordinal);
        Assert.Equal(Csv, ((IHtmlTextAreaElement)page.QuerySelector("#text")!).Value.Replace("\r\n", "\n", StringComparison.Ordinal));
    }

    [Fact]
    public async Task A_pasted_file_counts_where_none_was_chosen()
    {
        var (_, page) = await PostAsync("csv-field", text: "label,dryDensity,maximumDryDensity,minimumRelativeCompaction\n1,1.9,1.9,95\n2,1.7,1.9,95\n");
        Assert.Equal("2 field density tests computed: 1 accepted, 1 rejected.", page.QuerySelector("#answer h2")!.TextContent);
    }

    [Fact]
    public async Task An_AGS4_file_shows_what_was_found_and_computed()
    {
        var (response, page) = await PostAsync("ags4", file: AgsTexts.Without("TRAN"), maximum: "1,86");
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        Assert.Equal("1 compaction test and 2 field density tests computed.", page.QuerySelector("#answer h2")!.TextContent);
        Assert.Contains("CMPT 5", page.QuerySelector("#answer")!.TextContent, StringComparison.Ordinal);
        Assert.Contains("The file has no group TRAN", page.QuerySelector(".finding")!.TextContent, StringComparison.Ordinal);
        Assert.Equal(2, page.QuerySelectorAll("#answer table").Length);
        Assert.Matches("\"2.68\",\"1.8[0-9]\",\"1[0-9]\",\"\"", TakenAway(page, "computed.ags"));
    }

    [Theory]
    [InlineData("csv-laboratory", "waterContent,colour\n10,red\n", 400, "Line 1, column 2")]
    [InlineData("csv-laboratory", "", 400, "Line 1, column 1")]
    [InlineData("csv-field", "label,dryDensity\n1,0\n", 422, "Line 2, column 2")]
    [InlineData("ags4", "\"GROUP\",CMPT\r\n", 422, "Line 1")]
    public async Task A_fault_stands_in_a_summary_and_at_the_text_which_stays(string kind, string text, int status, string place)
    {
        var (response, page) = await PostAsync(kind, text: text);
        Assert.Equal(status, (int)response.StatusCode);
        Assert.StartsWith("Error:", page.Title, StringComparison.Ordinal);
        var link = page.QuerySelector("[role=alert] a")!;
        Assert.StartsWith(place, link.TextContent, StringComparison.Ordinal);
        var area = (IHtmlTextAreaElement)page.QuerySelector(link.GetAttribute("href")!)!;
        Assert.Equal("true", area.GetAttribute("aria-invalid"));
        Assert.StartsWith(place, page.GetElementById(area.GetAttribute("aria-describedby")!.Split(' ')[0])!.TextContent, StringComparison.Ordinal);
        Assert.Equal(text.ReplaceLineEndings("\n"), area.Value.ReplaceLineEndings("\n"));
    }

    [Fact]
    public async Task A_density_that_is_none_is_said_at_its_field()
    {
        var (response, page) = await PostAsync("ags4", text: AgsTexts.Sound, maximum: "dense");
        Assert.Equal(HttpStatusCode.UnprocessableEntity, response.StatusCode);
        var field = page.QuerySelector(page.QuerySelector("[role=alert] a")!.GetAttribute("href")!)!;
        Assert.Equal(("true", "dense"), (field.GetAttribute("aria-invalid"), field.GetAttribute("value")));
    }

    [Fact]
    public async Task A_file_over_the_bound_is_413_and_another_form_415()
    {
        var (tooLarge, _) = await PostAsync("ags4", file: new string('x', 3 << 20));
        Assert.Equal(HttpStatusCode.RequestEntityTooLarge, tooLarge.StatusCode);
        Assert.Equal(HttpStatusCode.UnsupportedMediaType, (await service.PostAsync("/exchange", ("text", Csv))).Response.StatusCode);
    }

    private static string TakenAway(IHtmlDocument page, string name)
    {
        var link = page.QuerySelector($"#answer a[download='{name}']")!.GetAttribute("href")!;
        return Encoding.UTF8.GetString(Convert.FromBase64String(link[(link.IndexOf(',', StringComparison.Ordinal) + 1)..]));
    }

    private async Task<(HttpResponseMessage Response, IHtmlDocument Page)> PostAsync(string kind, string? file = null, string text = "", string maximum = "")
    {
        using var form = new MultipartFormDataContent
        {
            { new StringContent(kind), "kind" },
            { new ByteArrayContent(Encoding.UTF8.GetBytes(file ?? "")), "file", "file.txt" },
            { new StringContent(text), "text" },
            { new StringContent(maximum), "maximumDryDensity" },
        };
        var response = await service.Client.PostAsync("/exchange", form, Stop);
        return (response, new HtmlParser().ParseDocument(await response.Content.ReadAsStringAsync(Stop)));
    }
}
