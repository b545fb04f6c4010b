using System.Net;
using System.Text.Json;
using Drypeak.Soil.TestMethods;
using Xunit;

namespace Drypeak.Service.Tests.Pages;

/// <summary>The pages of the test methods, of the findings, and of the sheet with blanks.</summary>
public sealed class CataloguePagesTests(PageService service) : IClassFixture<PageService>
{
    [Theory]
    [InlineData("/")]
    [InlineData("/test-methods")]
    [InlineData("/findings")]
    [InlineData("/specimen-sheet")]
    [InlineData("/field")]
    public async Task Every_page_leads_to_the_others_and_has_one_heading_and_the_link_past_the_head(string address)
    {
        var (response, page) = await service.GetAsync(address);
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        Assert.Single(page.QuerySelectorAll("h1"));
        Assert.Equal("#main", page.QuerySelector("body > :first-child")?.GetAttribute("href"));
        var links = page.QuerySelectorAll(".mast nav a").Select(link => link.GetAttribute("href")).ToList();
        Assert.Superset(new HashSet<string?> { "/", "/field", "/test-methods", "/findings", "/specimen-sheet", "/reference" }, links.ToHashSet());
        Assert.Equal(address, page.QuerySelector(".mast nav [aria-current=page]")!.GetAttribute("href"));
        Assert.Empty(page.QuerySelectorAll("[style], style, [onclick]"));
        Assert.Distinct(page.QuerySelectorAll("[id]").Select(element => element.Id));
    }

    [Fact]
    public async Task Every_method_has_a_column_that_an_address_leads_to()
    {
        var (_, page) = await service.GetAsync("/test-methods");
        Assert.Equal(TestMethodCatalogue.Codes.Order(StringComparer.Ordinal), page.QuerySelectorAll("thead th[id]").Select(cell => cell.Id!).Order(StringComparer.Ordinal));
        Assert.All(page.QuerySelectorAll(".standards a"), link => Assert.NotNull(page.GetElementById(link.GetAttribute("href")![1..])));
    }

    /// <summary>ASTM D698, method A: the volume from memory, the drop as read; the effort worked out by itself, 593.5 beside 600.</summary>
    [Fact]
    public async Task A_value_stands_with_its_tolerance_and_unit_and_the_mark_of_what_is_from_memory()
    {
        var (_, page) = await service.GetAsync("/test-methods");
        var table = page.GetElementById("astm-d698-a")!.Closest("table")!;
        string Cell(string row) => table.QuerySelectorAll("tbody tr").Single(line => line.QuerySelector("th")!.TextContent == row).QuerySelector("td")!.TextContent.Trim();
        Assert.Equal("943 ± 14 cm³† from memory", Cell("Mold, volume"));
        Assert.Equal("305 mm", Cell("Drop"));
        Assert.Equal("594 kJ/m³ (−1.1 %)", Cell("Effort, computed"));
        Assert.Equal("600 kJ/m³", Cell("Effort, nominal"));
        Assert.Equal("to 0.1 lb/ft³", Cell("Report, maximum"));
    }

    [Fact]
    public async Task As_many_values_are_marked_as_the_catalogue_has_from_memory()
    {
        var (_, page) = await service.GetAsync("/test-methods");
        var file = JsonElement.Parse(await service.Client.GetStringAsync(new Uri("/v1/test-methods", UriKind.Relative), TestContext.Current.CancellationToken));
        var fromMemory = file.EnumerateArray().SelectMany(method => method.EnumerateObject()).Where(member => member.Value.ValueKind == JsonValueKind.Object && !member.Value.GetProperty("read").GetBoolean());
        // A rule of reporting is one value in the file and two cells on the page.
        Assert.Equal(fromMemory.Sum(member => member.Name == "reporting" ? 2 : 1), page.QuerySelectorAll("td .memory").Length);
    }

    [Fact]
    public async Task Every_kind_of_finding_says_what_it_means_and_what_to_do_at_an_address_of_its_own()
    {
        var (_, page) = await service.GetAsync("/findings");
        var kinds = JsonElement.Parse(await service.Client.GetStringAsync(new Uri("/v1/findings", UriKind.Relative), TestContext.Current.CancellationToken)).EnumerateArray().ToList();
        Assert.Equal(kinds.Count, page.QuerySelectorAll(".kind").Length);
        Assert.All(kinds, kind =>
        {
            var shown = page.GetElementById(kind.GetProperty("code").GetString()!)!.Closest(".kind")!.TextContent;
            Assert.All(new[] { "meaning", "why", "remedy", "basis", "code" }, member => Assert.Contains(kind.GetProperty(member).GetString()!, shown, StringComparison.Ordinal));
        });
        Assert.Equal(["Errors", "Warnings", "Notes"], page.QuerySelectorAll("main h2").Select(heading => heading.TextContent));
    }

    [Fact]
    public async Task A_finding_of_an_answer_leads_to_what_it_means()
    {
        var (_, page) = await service.PostAsync("/", ("table", "10 1.75\n12 1.82\n14 1.86\n16 1.83\n18 1.77"));
        var links = page.QuerySelectorAll(".finding a[href^='/findings#']").Select(link => link.GetAttribute("href")!).ToList();
        Assert.Contains("/findings#method-not-given", links);
        var (_, findings) = await service.GetAsync("/findings");
        Assert.All(links, link => Assert.NotNull(findings.GetElementById(link[(link.IndexOf('#', StringComparison.Ordinal) + 1)..])));
    }

    [Fact]
    public async Task The_sheet_stands_on_its_page_as_it_will_be_printed_beside_its_pdf()
    {
        var (_, page) = await service.GetAsync("/specimen-sheet?method=astm-d698-a&waterContents=10+12+14&reference=Ternmarsh&mass=kg");
        Assert.Contains("Mold + wet soil, kg", page.QuerySelectorAll("svg text").Select(text => text.TextContent));
        Assert.Equal("astm-d698-a", page.QuerySelector("#method option[selected]")?.GetAttribute("value"));
        Assert.Equal("10 12 14", page.QuerySelector("#waterContents")?.GetAttribute("value"));
        Assert.All(page.QuerySelectorAll("form input, form select"), control => Assert.NotNull(page.QuerySelector($"label[for='{control.Id}']")));

        var pdf = page.QuerySelectorAll("a").Single(link => link.TextContent == "As PDF").GetAttribute("href")!;
        var response = await service.Client.GetAsync(new Uri(pdf, UriKind.Relative), TestContext.Current.CancellationToken);
        Assert.Equal("application/pdf", response.Content.Headers.ContentType?.MediaType);
    }

    [Fact]
    public async Task A_form_that_cannot_be_keeps_what_was_typed_and_says_what_to_correct()
    {
        var (response, page) = await service.GetAsync("/specimen-sheet?waterContents=ten&reference=Ternmarsh");
        Assert.Equal(HttpStatusCode.BadRequest, response.StatusCode);
        Assert.StartsWith("Error:", page.Title, StringComparison.Ordinal);
        Assert.Equal("#waterContents", page.QuerySelector("[role=alert] a")?.GetAttribute("href"));
        var input = page.QuerySelector("#waterContents")!;
        Assert.Equal(("ten", "true"), (input.GetAttribute("value"), input.GetAttribute("aria-invalid")));
        Assert.All(input.GetAttribute("aria-describedby")!.Split(' '), id => Assert.NotNull(page.GetElementById(id)));
        Assert.Equal("Ternmarsh", page.QuerySelector("#reference")?.GetAttribute("value"));
        Assert.Null(page.QuerySelector(".paper-sheet"));
    }
}
