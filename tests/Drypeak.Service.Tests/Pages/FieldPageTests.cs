using System.Net;
using AngleSharp.Dom;
using AngleSharp.Html.Parser;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Pages;

/// <summary>The page of the field test, as a browser without scripts meets it.</summary>
public sealed class FieldPageTests(RunningService service)
{
    private const string Address = "/field";

    [Theory]
    [InlineData("accepted", "Accepted")]
    [InlineData("rejected", "Rejected")]
    [InlineData("undecided", "Undecided")]
    public async Task A_demonstration_is_one_click_away_and_its_outcome_is_a_word_a_shape_a_reason_and_a_next_step(string name, string word)
    {
        var first = await OpenAsync(Address);
        var link = first.QuerySelectorAll(".demos a").Single(link => link.GetAttribute("href")!.Contains(name, StringComparison.Ordinal)).GetAttribute("href")!;
        var page = await OpenAsync(link.Split('#')[0]);
        var outcome = page.QuerySelector("#answer h2")!;
        Assert.Equal(word, outcome.TextContent.Trim());
        Assert.NotNull(outcome.QuerySelector("svg[aria-hidden=true]"));
        Assert.Matches(@"The relative compaction is \d+\.\d %", page.QuerySelector("#answer .sure")!.TextContent);
        Assert.StartsWith("Next:", page.QuerySelector("#answer .corrected")!.TextContent, StringComparison.Ordinal);
        Assert.StartsWith(word, page.Title, StringComparison.Ordinal);
        Assert.NotEmpty(page.QuerySelectorAll("#answer .cautions li"));
    }

    [Fact]
    public async Task Each_method_is_a_link_and_asks_for_its_own_readings_with_labels()
    {
        var first = await OpenAsync(Address);
        var methods = first.QuerySelectorAll(".variants a").Select(link => link.GetAttribute("href")!).ToList();
        Assert.Equal(6, methods.Count);
        foreach (var method in methods)
        {
            var page = await OpenAsync(method);
            Assert.Equal(method, page.QuerySelector(".variants [aria-current=page]")!.GetAttribute("href"));
            Assert.All(page.QuerySelectorAll("form input[type=text], form select"), control =>
                Assert.True(control.HasAttribute("aria-label") || page.QuerySelector($"label[for='{control.Id}']") is not null, control.Id));
            Assert.Equal(page.QuerySelectorAll("[id]").Length, page.QuerySelectorAll("[id]").Select(element => element.Id).Distinct().Count());
        }
    }

    [Fact]
    public async Task A_posted_form_is_computed_as_a_program_s_request_is()
    {
        var (status, page) = await PostAsync(("method", "sand-cone"), ("sand-before", "6420"), ("sand-after", "2710"), ("sand-cone", "1530"), ("sand-density", "1,42"),
            ("soil-wet", "3120,5"), ("water-content", "12"), ("maximum-dry-density", "1,90"), ("least-compaction", "95"), ("working", "yes"));
        Assert.Equal(HttpStatusCode.OK, status);
        // 3120.5/(2180/1.42)/1.12 = 1.8148 Mg/m³, 95.5 % of 1.90.
        Assert.Contains("1.815 Mg/m³", page.QuerySelector("#answer")!.TextContent, StringComparison.Ordinal);
        Assert.Equal("Accepted", page.QuerySelector("#answer h2")!.TextContent.Trim());
        Assert.NotEmpty(page.QuerySelectorAll("#answer .working math"));
        Assert.Equal("1,42", page.QuerySelector("#sand-density")!.GetAttribute("value"));
    }

    [Theory]
    [InlineData(HttpStatusCode.BadRequest, "sand-density", "1.4x")]
    [InlineData(HttpStatusCode.UnprocessableEntity, "sand-density", "-1")]
    [InlineData(HttpStatusCode.UnprocessableEntity, "soil-wet", "0")]
    [InlineData(HttpStatusCode.UnprocessableEntity, "water-content", "-5")]
    [InlineData(HttpStatusCode.UnprocessableEntity, "tins", "31 100 152")]
    [InlineData(HttpStatusCode.BadRequest, "tins", "31 1O0 90")]
    [InlineData(HttpStatusCode.BadRequest, "laboratory-test", "{\"specimens\":")]
    [InlineData(HttpStatusCode.BadRequest, "laboratory-test", "https://ternmarsh.example/?test=cut")]
    [InlineData(HttpStatusCode.UnprocessableEntity, "least-compaction", "2000")]
    [InlineData(HttpStatusCode.UnprocessableEntity, "risk", "2")]
    public async Task A_fault_stands_in_the_summary_and_at_its_field_and_what_was_typed_stays(HttpStatusCode expected, string field, string text)
    {
        (string, string)[] sound =
        [
            ("method", "sand-cone"), ("sand-before", "6420"), ("sand-after", "2710"), ("sand-cone", "1530"), ("sand-density", "1.42"), ("soil-wet", "3120.5"),
            ("water-content", "12"), ("least-compaction", "95"), ("rule", "guarded"), ("risk", "0.05"),
        ];
        var (status, page) = await PostAsync([.. sound.Where(item => item.Item1 != field), (field, text)]);
        Assert.Equal(expected, status);
        Assert.StartsWith("Error:", page.Title, StringComparison.Ordinal);
        var summary = page.QuerySelector("[role=alert]")!;
        Assert.All(summary.QuerySelectorAll("a"), link => Assert.NotNull(page.QuerySelector(link.GetAttribute("href")!)));
        Assert.Contains(summary.QuerySelectorAll("a"), link => link.GetAttribute("href") == "#" + field);
        var control = page.QuerySelectorAll("[aria-invalid=true]")[0];
        Assert.NotNull(page.QuerySelector("#" + control.GetAttribute("aria-describedby")!.Split(' ')[0]));
        var typed = page.QuerySelector("#" + field)!;
        Assert.Equal(text, typed.GetAttribute("value") ?? typed.TextContent);
        Assert.Null(page.QuerySelector("#answer"));
    }

    [Fact]
    public async Task What_is_typed_is_text_and_never_markup()
    {
        var (_, page) = await PostAsync(("method", "direct"), ("direct-dry", "1.8"), ("reference", "<script>alert(1)</script>"));
        Assert.Single(page.QuerySelectorAll("script"));
        Assert.Equal("<script>alert(1)</script>", page.QuerySelector("#answer .reference")!.TextContent);
    }

    private async Task<IDocument> OpenAsync(string address)
    {
        using var response = await service.GetAsync(address);
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        return new HtmlParser().ParseDocument(await RunningService.TextOf(response));
    }

    private async Task<(HttpStatusCode Status, IDocument Page)> PostAsync(params (string Name, string Text)[] fields)
    {
        using var form = new FormUrlEncodedContent(fields.Select(field => KeyValuePair.Create(field.Name, field.Text)));
        using var response = await service.Client.PostAsync(new Uri(Address, UriKind.Relative), form, TestContext.Current.CancellationToken);
        return (response.StatusCode, new HtmlParser().ParseDocument(await RunningService.TextOf(response)));
    }
}
