using System.Net;
using System.Text.Json;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Pages;

/// <summary>Tables pasted into a form of the kit: here the family of the page of one point, whose rows belong together in groups.</summary>
public sealed class PastedTableTests(PageService service) : IClassFixture<PageService>
{
    private const string Address = "/one-point";

    /// <summary>The same family in many hands: separators, marks, units, names, order, and rows that go on where the curve's name is left out or repeated.</summary>
    [Theory]
    [InlineData("A 11.8 1.93\nB 13.9 1.83\nC 16.6 1.73")]
    [InlineData("A;11,8;1,93\nB;13,9;1,83\nC;16,6;1,73")]
    [InlineData("A\t11.8\t1.93\r\n\r\nB\t13.9\t1.83\r\nC\t16.6\t1.73\r\n")]
    [InlineData("Maximum dry density [kg/m3]\tCurve\tOptimum water content [%]\n1930\tA\t11.8\n1830\tB\t13.9\n1730\tC\t16.6")]
    [InlineData("curve, maximumDryDensity, optimumWaterContent\nA, 1.93, 11.8\nB, 1.83, 13.9\nC, 1.73, 16.6")]
    [InlineData("Curve  Optimum moisture content  Maximum dry density\nA 11.8 1.93\nB 13.9 1.83\nC 16.6 1.73")]
    [InlineData("\"A\";11.8;1.93\n\"B\";13.9;1.83\n\"C\";16.6;1.73")]
    public async Task One_family_is_read_the_same_however_it_was_pasted(string family)
    {
        var (response, page) = await PostAsync(family);
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        using var body = RunningService.Json("""
            {"family":[{"label":"A","optimumWaterContent":11.8,"maximumDryDensity":1.93},{"label":"B","optimumWaterContent":13.9,"maximumDryDensity":1.83},{"label":"C","optimumWaterContent":16.6,"maximumDryDensity":1.73}],
             "point":{"waterContent":12.9,"wetDensity":2.0}}
            """);
        using var request = new HttpRequestMessage(HttpMethod.Post, "/v1/one-point") { Content = body };
        request.Headers.Accept.ParseAdd("application/json");
        using var answered = await service.Client.SendAsync(request, TestContext.Current.CancellationToken);
        var byProgram = JsonElement.Parse(await RunningService.TextOf(answered));
        var link = page.QuerySelectorAll(".away a").Single(link => link.TextContent == "Answer as JSON").GetAttribute("href")!;
        var byPage = JsonElement.Parse(await service.Client.GetStringAsync(link, TestContext.Current.CancellationToken));
        Assert.Equal(byProgram.At("/optimum").GetRawText(), byPage.At("/optimum").GetRawText());
        Assert.NotNull(page.QuerySelector(".readback table"));
    }

    [Theory]
    [InlineData("Curve\tWater content\tDry density\nA\t8\t1.83\n\t10\t1.90\n\t11.8\t1.93\n\t13.5\t1.90\nB\t9.8\t1.74\n\t12\t1.805\n\t14\t1.83\n\t16\t1.80\nC\t12.5\t1.66\n\t14.6\t1.712\n\t16.6\t1.73\n\t18.8\t1.70")]
    [InlineData("Curve\tWater content\tDry density\nA\t8\t1.83\nA\t10\t1.90\nA\t11.8\t1.93\nA\t13.5\t1.90\nB\t9.8\t1.74\nB\t12\t1.805\nB\t14\t1.83\nB\t16\t1.80\nC\t12.5\t1.66\nC\t14.6\t1.712\nC\t16.6\t1.73\nC\t18.8\t1.70")]
    public async Task Rows_of_one_curve_are_its_points(string family)
    {
        var (_, page) = await PostAsync(family);
        var link = page.QuerySelectorAll(".away a").Single(link => link.TextContent == "Request as JSON").GetAttribute("href")!;
        var request = JsonElement.Parse(await service.Client.GetStringAsync(link, TestContext.Current.CancellationToken));
        Assert.Equal(["A", "B", "C"], request.At("/family").EnumerateArray().Select(curve => curve.Text("/label")!));
        Assert.All(request.At("/family").EnumerateArray(), curve => Assert.Equal(4, curve.At("/points").GetArrayLength()));
        Assert.Equal([12, 1.805], request.At("/family/1/points/1").EnumerateArray().Select(number => number.GetDouble()));
    }

    [Theory]
    [InlineData(400, "Curve\tColor\nA\tred", "Column 2, “Color”, is not one that is used here")]
    [InlineData(400, "Curve\tOptimum water content\tOptimum water content\nA\t1\t2", "stands twice")]
    [InlineData(400, "Curve\tMaximum dry density [stone]\nA\t1.9", "The unit “stone” of column 2")]
    [InlineData(400, "Curve\tMaximum dry density\nA\t1.9\t3", "Row 1: it has 3 cells, but the table has 2 columns")]
    [InlineData(400, "Curve;Maximum dry density\n\"A;1.9", "A quotation mark is opened in line 2")]
    [InlineData(400, "Curve\tMaximum dry density", "a header and nothing below it")]
    [InlineData(400, "1 2 3 4 5 6", "has no header and 6 columns")]
    [InlineData(400, "A 11.8 1.93\nB 13.9 1.8O\nC 16.6 1.73", "Row 2, Maximum dry density: “1.8O” is not a number")]
    [InlineData(400, "A 11.8 1.93\nB 13,9 1.83\nC 16.6 1.73", "Row 2, Optimum water content: “13,9” has a comma where the decimal mark is a point")]
    [InlineData(400, "A 11.8 1.93\nA 11.9 1.93\nB 13.9 1.83", "“11.9” stands in row 2 and “11.8” in row 1 of the same curve")]
    [InlineData(422, "A 11.8 1.93\nB 13.9 -1\nC 16.6 1.73", "Row 2, Maximum dry density: it must be greater than 0")]
    [InlineData(422, "Curve\tOptimum water content\nA\t11.8\nB\t13.9", "Row 1: An optimum is a water content and a density")]
    public async Task A_fault_marks_the_table_and_names_its_row(int status, string family, string message)
    {
        var (response, page) = await PostAsync(family);
        var said = page.QuerySelector("[role=alert]")?.TextContent ?? "nothing";
        Assert.True(status == (int)response.StatusCode, said);
        Assert.Contains(message, said, StringComparison.Ordinal);
        Assert.All(page.QuerySelectorAll("[role=alert] a"), link => Assert.Equal("#family", link.GetAttribute("href")));
        var table = page.GetElementById("family")!;
        Assert.Equal("true", table.GetAttribute("aria-invalid"));
        Assert.Contains(message, page.GetElementById("family-fault")!.TextContent, StringComparison.Ordinal);
        Assert.Equal(family, table.TextContent);
    }

    [Theory]
    [InlineData("/?demo=weighings\n/?demo=stones\n{\"specimens\":[{\"waterContent\":14,\"dryDensity\":1.6},{\"waterContent\":16,\"dryDensity\":1.66},{\"waterContent\":18,\"dryDensity\":1.7},{\"waterContent\":20,\"dryDensity\":1.67},{\"waterContent\":22,\"dryDensity\":1.6}]}", 200, "")]
    [InlineData("/?demo=weighings\nhttps://ternmarsh.example/?test=cut", 400, "Line 2: It is neither the link")]
    [InlineData("{\"specimens\":[]", 400, "It is not JSON")]
    [InlineData("{\"optimum\":null,\"provenance\":{}}", 400, "This is the answer to a laboratory test")]
    [InlineData("{\"specimens\":[{\"waterContent\":-1,\"dryDensity\":1.6}]}", 422, "0 and 1000 %")]
    public async Task A_family_may_be_the_links_of_laboratory_tests(string tests, int status, string message)
    {
        var (response, page) = await service.PostAsync(Address, ("family-given", "tests"), ("water-content", "12.5"), ("dry-density", "1.80"), ("family-tests", tests));
        Assert.True(status == (int)response.StatusCode, page.QuerySelector("[role=alert]")?.TextContent);
        if (status == 200)
        {
            Assert.Contains("Maximum dry density", page.QuerySelector("#answer h2")!.TextContent, StringComparison.Ordinal);
        }
        else
        {
            Assert.Contains(message, page.QuerySelector("[role=alert]")!.TextContent, StringComparison.Ordinal);
            Assert.Equal("true", page.GetElementById("family-tests")!.GetAttribute("aria-invalid"));
        }
    }

    private Task<(HttpResponseMessage Response, AngleSharp.Html.Dom.IHtmlDocument Page)> PostAsync(string family) =>
        service.PostAsync(Address, ("water-content", "12.9"), ("wet-density", "2.0"), ("family", family));
}
