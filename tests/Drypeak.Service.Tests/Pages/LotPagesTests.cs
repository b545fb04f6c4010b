using System.Net;
using AngleSharp.Dom;
using AngleSharp.Html.Parser;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Pages;

/// <summary>The pages of lots and plans, as a browser without scripts meets them.</summary>
public sealed class LotPagesTests(RunningService service)
{
    private const string Table = "Test\tRelative compaction\tWater content\tReplaces\tSet aside\na\t97,2\t12,6\t\t\nb\t90,1\t12,3\t\t\nc\t96,8\t12,9\tb\t\nd\t99,0\t13,1\t\twet\ne\t96,1\t12,0\t\t";

    [Theory]
    [InlineData("/lot?demo=accepted", "Accepted")]
    [InlineData("/lot?demo=rejected", "Rejected")]
    [InlineData("/lot?demo=undecided", "Undecided")]
    [InlineData("/plan?demo=risks", "6 tests, producer’s risk 9.9 %, consumer’s risk 8.2 %")]
    [InlineData("/plan?demo=every-test", "10 tests, producer’s risk 57.7 %, consumer’s risk 0.7 %")]
    [InlineData("/plan?demo=design", "7 tests, producer’s risk 4.9 %, consumer’s risk 9.9 %")]
    public async Task A_demonstration_answers_in_one_sentence(string address, string sentence)
    {
        var page = await OpenAsync(address);
        Assert.Equal(sentence, string.Join(' ', page.QuerySelector("#answer h2")!.TextContent.Split((char[]?)null, StringSplitOptions.RemoveEmptyEntries)));
        Assert.NotEmpty(page.QuerySelectorAll("#answer .chart svg"));
        Assert.NotEmpty(page.QuerySelectorAll("#answer .cautions li"));
        Assert.Equal(page.QuerySelectorAll("[id]").Length, page.QuerySelectorAll("[id]").Select(element => element.Id).Distinct().Count());
    }

    [Theory]
    [InlineData("/lot")]
    [InlineData("/plan")]
    [InlineData("/plan?task=design")]
    public async Task Every_control_has_a_name_and_help_on_the_rules_stands_below(string address)
    {
        var page = await OpenAsync(address);
        Assert.All(page.QuerySelectorAll("form.test input[type=text], form.test select, form.test textarea"), control =>
            Assert.True(control.HasAttribute("aria-label") || page.QuerySelector($"label[for='{control.Id}']") is not null, control.Id));
        Assert.Equal(7, page.QuerySelectorAll(".help dt").Length);
        Assert.Equal(7, page.QuerySelectorAll(".help cite").Length);
    }

    [Fact]
    public async Task A_pasted_table_is_decided_by_the_rules_that_are_chosen()
    {
        var (status, page) = await PostAsync("/lot", ("tests", Table), ("mean", "96"), ("moving-mean", "96"), ("moving-mean-count", "3"), ("moving-mean-floor", "93"), ("least-compaction", "95"), ("every-test", "yes"));
        Assert.Equal(HttpStatusCode.OK, status);
        Assert.Equal("Accepted", page.QuerySelector("#answer h2")!.TextContent.Trim());
        var answer = page.QuerySelector("#answer")!.TextContent;
        Assert.Contains("The mean of 3 tests is 96.7 %", answer, StringComparison.Ordinal);
        Assert.Contains("replaced by c", answer, StringComparison.Ordinal);
        Assert.Contains("set aside: wet", answer, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(HttpStatusCode.BadRequest, "tests", "Test\tRelative compaction\na\t97.x")]
    [InlineData(HttpStatusCode.UnprocessableEntity, "tests", "Test\tRelative compaction\na\t97\na\t96")]
    [InlineData(HttpStatusCode.BadRequest, "tests", "Test\tRelative stiffness\na\t97")]
    [InlineData(HttpStatusCode.BadRequest, "mean", "x")]
    [InlineData(HttpStatusCode.UnprocessableEntity, "mean", "-1")]
    [InlineData(HttpStatusCode.UnprocessableEntity, "percent-within-limits-required", "120")]
    public async Task What_is_wrong_with_a_lot_is_said_at_its_field(HttpStatusCode status, string field, string text)
    {
        (string, string)[] all = field == "tests" ? [(field, text)] : field == "mean" ? [("tests", Table), (field, text)] : [("tests", Table), ("percent-within-limits", "95"), (field, text)];
        var (answered, page) = await PostAsync("/lot", all);
        Assert.Equal(status, answered);
        Assert.StartsWith("Error:", page.Title, StringComparison.Ordinal);
        Assert.Single(page.QuerySelectorAll("[role=alert]"));
        Assert.Equal("true", page.GetElementById(field)!.GetAttribute("aria-invalid"));
        Assert.Equal(text, page.GetElementById(field) is AngleSharp.Html.Dom.IHtmlTextAreaElement area ? area.Value.ReplaceLineEndings("\n") : page.GetElementById(field)!.GetAttribute("value"));
    }

    [Fact]
    public async Task A_design_is_asked_for_by_its_own_form()
    {
        var (status, page) = await PostAsync("/plan", ("task", "design"), ("rule", "percent-within-limits"), ("minimum", "95"), ("deviation", "1,8"), ("acceptable", "98"), ("rejectable", "95,5"));
        Assert.Equal(HttpStatusCode.OK, status);
        Assert.Contains("% required", page.QuerySelector("#answer")!.TextContent, StringComparison.Ordinal);
        Assert.Matches(@"^\s*\d+ tests, producer", page.QuerySelector("#answer h2")!.TextContent);
    }

    private async Task<IDocument> OpenAsync(string address)
    {
        using var response = await service.GetAsync(address);
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        return await ParsedAsync(response);
    }

    private async Task<(HttpStatusCode Status, IDocument Page)> PostAsync(string address, params (string Name, string Text)[] fields)
    {
        using var content = new FormUrlEncodedContent(fields.Select(field => KeyValuePair.Create(field.Name, field.Text)));
        using var response = await service.Client.PostAsync(address, content, TestContext.Current.CancellationToken);
        return (response.StatusCode, await ParsedAsync(response));
    }

    private static async Task<IDocument> ParsedAsync(HttpResponseMessage response) =>
        await new HtmlParser().ParseDocumentAsync(await response.Content.ReadAsStringAsync(TestContext.Current.CancellationToken), TestContext.Current.CancellationToken);
}
