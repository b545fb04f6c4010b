using System.Net;
using System.Text;
using System.Text.Json;
using System.Text.Json.Nodes;
using AngleSharp.Dom;
using AngleSharp.Html.Dom;
using Xunit;

namespace Drypeak.Service.Tests.Pages;

/// <summary>The laboratory page over real HTTP, without scripts.</summary>
public sealed class LaboratoryPageTests(PageService service) : IClassFixture<PageService>
{
    private const string Table = "Specimen\tMold + wet soil\tTin\tTin + wet soil\tTin + dry soil\n"
        + "1\t6027\t29.42\t138.80\t129.06\n2\t6137\t33.51\t180.20\t164.53\n3\t6212\t29.04\t142.42\t128.82\n4\t6218\t32.80\t152.84\t136.50\n5\t6186\t33.28\t149.91\t132.18";

    private static readonly (string, string)[] Weighed =
    [
        ("reference", "Ternmarsh, pit 2"), ("mold-mass", "4250"), ("mold-volume", "943.3"), ("specific-gravity", "2.68"), ("determined", "measured"), ("table", Table),
    ];

    [Fact]
    public async Task The_first_sight_states_the_job_and_offers_a_demo_and_an_empty_form()
    {
        var (response, page) = await service.GetAsync("/");
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        Assert.Single(page.QuerySelectorAll("h1"));
        Assert.Equal("#main", page.QuerySelector("body > a")!.GetAttribute("href"));
        Assert.Contains(page.QuerySelectorAll("a"), link => link.GetAttribute("href") == "/?demo=weighings#answer");
        Assert.Single(page.QuerySelectorAll("textarea"));
        Assert.Empty(page.QuerySelectorAll("[role=alert]"));
        Assert.Null(page.GetElementById("answer"));
    }

    [Fact]
    public async Task Every_control_has_a_label()
    {
        var (_, page) = await service.GetAsync("/");
        foreach (var control in page.QuerySelectorAll("input:not([type=hidden]), select, textarea"))
        {
            Assert.True(control.HasAttribute("aria-label") || page.QuerySelector($"label[for={control.Id}]") is not null || control.Closest("label") is not null, control.OuterHtml);
        }
    }

    [Fact]
    public async Task Nothing_stands_in_the_page_that_the_content_security_policy_forbids_and_nothing_is_fetched_from_elsewhere()
    {
        var (response, page) = await service.GetAsync("/?demo=weighings");
        Assert.Empty(page.QuerySelectorAll("[style], style, script:not([src])"));
        Assert.DoesNotContain(page.All.SelectMany(element => element.Attributes), attribute => attribute.Name.StartsWith("on", StringComparison.Ordinal));
        Assert.All(page.QuerySelectorAll("[src], link[href]"), element => Assert.StartsWith("/", element.GetAttribute("src") ?? element.GetAttribute("href"), StringComparison.Ordinal));
        Assert.False(response.Headers.Contains("Set-Cookie"));
    }

    [Fact]
    public async Task A_posted_table_is_answered_by_the_values_of_the_api()
    {
        var (response, page) = await service.PostAsync("/", Weighed);
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);

        var answer = await AnswerOfApiAsync("""
            {"reference":"Ternmarsh, pit 2","mold":{"mass":4250,"volume":943.3},"specificGravity":{"value":2.68,"determined":"measured"},"specimens":[
            {"label":"1","moldAndWetSoil":6027,"tins":[{"tin":29.42,"wet":138.80,"dry":129.06}]},{"label":"2","moldAndWetSoil":6137,"tins":[{"tin":33.51,"wet":180.20,"dry":164.53}]},
            {"label":"3","moldAndWetSoil":6212,"tins":[{"tin":29.04,"wet":142.42,"dry":128.82}]},{"label":"4","moldAndWetSoil":6218,"tins":[{"tin":32.80,"wet":152.84,"dry":136.50}]},
            {"label":"5","moldAndWetSoil":6186,"tins":[{"tin":33.28,"wet":149.91,"dry":132.18}]}]}
            """);
        var reported = answer["optimum"]!["reported"]!;
        var sentence = page.QuerySelector("#answer h2")!.TextContent;
        Assert.Equal($"Maximum dry density {reported["maximumDryDensity"]} at {reported["waterContent"]} water", sentence);
        Assert.Contains((string)reported["maximumDryDensity"]!, page.Title, StringComparison.Ordinal);
        Assert.Equal(5, page.QuerySelectorAll("#answer .wide svg [data-x]").Length);
        Assert.Equal(answer["findings"]!.AsArray().Select(finding => (string)finding!["message"]!), page.QuerySelectorAll(".finding > div > p:first-child").Select(p => p.TextContent));
        Assert.Contains("5 specimens, parted by tabs, decimal point", page.QuerySelector(".readback summary")!.TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public async Task The_grid_gives_the_same_answer_as_the_table()
    {
        var cells = Table.Split('\n').Skip(1).SelectMany((row, r) => row.Split('\t').Select((text, c) => ($"cell-{(2 * r) + 1}-{c}", text)));
        var (_, fromGrid) = await service.PostAsync("/", [.. Weighed.Where(field => field.Item1 != "table"), .. cells]);
        var (_, fromTable) = await service.PostAsync("/", Weighed);
        Assert.Equal(fromTable.QuerySelector(".specimens table")!.TextContent, fromGrid.QuerySelector(".specimens table")!.TextContent);
        Assert.Equal(fromTable.QuerySelector("#answer h2")!.TextContent, fromGrid.QuerySelector("#answer h2")!.TextContent);
        Assert.Equal("6212", ((IHtmlInputElement)fromGrid.GetElementById("cell-5-1")!).Value);
        Assert.True(fromGrid.QuerySelector("details.grid")!.HasAttribute("open"));
    }

    [Fact]
    public async Task All_that_is_wrong_is_said_at_once_beside_its_field_and_in_one_summary()
    {
        var (response, page) = await service.PostAsync("/",
            ("reference", "Ternmarsh <b>&\"pit\""), ("mold-mass", "4250 g"), ("mold-volume", "-3"), ("specific-gravity", "2.68"),
            ("table", "Specimen;Water content;Dry density\nA;10,4;1,70\nB;oops;1,80\nC;13,9;-1,8"));
        Assert.Equal(HttpStatusCode.BadRequest, response.StatusCode);
        Assert.StartsWith("Error:", page.Title, StringComparison.Ordinal);

        var summary = Assert.Single(page.QuerySelectorAll("[role=alert]"));
        var links = summary.QuerySelectorAll("a").ToList();
        Assert.Equal(["#mold-mass", "#mold-volume", "#table", "#table"], links.Select(link => link.GetAttribute("href")!));
        Assert.Contains("Specimen B, Water content", links[2].TextContent, StringComparison.Ordinal);
        Assert.Contains("Specimen C, Dry density", links[3].TextContent, StringComparison.Ordinal);
        foreach (var id in new[] { "mold-mass", "mold-volume", "table" })
        {
            var field = page.GetElementById(id)!;
            Assert.Equal("true", field.GetAttribute("aria-invalid"));
            Assert.All(field.GetAttribute("aria-describedby")!.Split(' '), described => Assert.NotNull(page.GetElementById(described)));
        }

        Assert.False(page.GetElementById("specific-gravity")!.HasAttribute("aria-invalid"));
        Assert.Equal("Ternmarsh <b>&\"pit\"", ((IHtmlInputElement)page.GetElementById("reference")!).Value);
        Assert.Equal("4250 g", ((IHtmlInputElement)page.GetElementById("mold-mass")!).Value);
        Assert.Contains("B;oops;1,80", ((IHtmlTextAreaElement)page.QuerySelector("textarea")!).Value, StringComparison.Ordinal);
        Assert.Null(page.GetElementById("answer"));
    }

    public static TheoryData<string, int, string, (string, string)[]> Faults => new()
    {
        { "nothing typed", 422, "table", [] },
        { "specimens twice", 422, "table", [.. Weighed, ("cell-0-5", "10")] },
        { "the mold's mass is missing", 422, "mold-mass", [.. Without("mold-mass")] },
        { "the mold's volume is missing", 422, "mold-volume", [.. Without("mold-volume")] },
        { "a mold of no mass unit", 422, "mass-unit", [.. Weighed, ("mass-unit", "stone")] },
        { "an unknown method", 422, "method", [.. Weighed, ("method", "by eye")] },
        { "an unknown curve", 422, "curve-model", [.. Weighed, ("curve-model", "freehand")] },
        { "ice", 422, "water-temperature", [.. Weighed, ("water-temperature", "-4")] },
        { "a word for a temperature", 400, "water-temperature", [.. Weighed, ("water-temperature", "warm")] },
        { "a field's comma that may group", 400, "mold-volume", [.. Without("mold-volume"), ("mold-volume", "1,000")] },
        { "two lines or one", 400, "saturation-lines", [.. Weighed, ("saturation-lines", "90,80")] },
        { "a line beyond saturation", 422, "saturation-lines", [.. Weighed, ("saturation-lines", "90 120")] },
        { "an oversize without its share", 422, "oversize-percent", [.. Weighed, ("oversize-gravity", "2.65")] },
        { "a peak without a reason", 422, "adopted-reason", [.. Weighed, ("adopted-water", "14"), ("adopted-density", "1.83")] },
        { "a diameter without a height", 422, "mold-height", [.. Weighed, ("mold-diameter", "101.6")] },
        { "a mold of two volumes", 422, "mold-mass", [.. Weighed, ("mold-diameter", "101.6"), ("mold-height", "130")] },
    };

    private static IEnumerable<(string, string)> Without(string name) => Weighed.Where(field => field.Item1 != name);

    [Theory]
    [MemberData(nameof(Faults))]
    public async Task A_fault_is_marked_at_its_field(string what, int status, string control, (string, string)[] fields)
    {
        var (response, page) = await service.PostAsync("/", fields);
        var links = page.QuerySelectorAll("[role=alert] a").Select(link => link.GetAttribute("href") + " " + link.TextContent).ToList();
        Assert.True((int)response.StatusCode == status, $"{what}: {(int)response.StatusCode}, {string.Join("; ", links)}");
        Assert.StartsWith($"#{control} ", Assert.Single(links), StringComparison.Ordinal);
        Assert.Equal("true", page.GetElementById(control)!.GetAttribute("aria-invalid"));
        Assert.All(page.GetElementById(control)!.Ancestors<IHtmlDetailsElement>(), details => Assert.True(details.IsOpen, what));
    }

    [Theory]
    [InlineData("943,3")]
    [InlineData("943.3")]
    [InlineData(" 943.30 ")]
    public async Task A_field_takes_a_decimal_comma_or_point(string volume)
    {
        var (response, page) = await service.PostAsync("/", [.. Without("mold-volume"), ("mold-volume", volume)]);
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        Assert.Contains("943.3 cm³", page.QuerySelector("#answer .basis")!.TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_fault_in_the_grid_stands_in_its_own_cell()
    {
        var (_, page) = await service.PostAsync("/", ("cell-0-5", "10.4"), ("cell-0-7", "1.70"), ("cell-3-5", "ten"), ("cell-3-7", "1.75"));
        Assert.Equal("#cell-3-5", Assert.Single(page.QuerySelectorAll("[role=alert] a")).GetAttribute("href"));
        var cell = page.GetElementById("cell-3-5")!;
        Assert.Equal("true", cell.GetAttribute("aria-invalid"));
        Assert.Contains("Specimen 2, Water content", page.GetElementById(cell.GetAttribute("aria-describedby")!)!.TextContent, StringComparison.Ordinal);
    }

    [Fact]
    public async Task What_is_wrong_is_said_in_the_words_of_the_form_and_not_in_those_of_the_contract()
    {
        (string, string)[][] forms =
        [
            [("mold-mass", "4250"), ("mold-volume", "943.3"), ("cell-0-1", "6027")],
            [("cell-0-5", "10.4")],
            [("mold-volume", "943.3"), ("mold-diameter", "101.6"), ("cell-0-1", "6027"), ("cell-0-5", "10.4")],
            [("mold-mass", "4250"), ("mold-volume", "943.3"), ("cell-0-1", "4000"), ("cell-0-5", "10.4"), ("cell-1-6", "1.7"), ("cell-1-7", "1.8")],
            [("table", "Specimen Tin Tin + wet soil Tin + dry soil\nA 30 20 25")],
        ];
        foreach (var form in forms)
        {
            var (response, page) = await service.PostAsync("/", form);
            Assert.NotEqual(HttpStatusCode.OK, response.StatusCode);
            Assert.DoesNotMatch(@"\b[a-z]+[A-Z]|[a-z]\.[a-z]|carbide", page.QuerySelector("[role=alert]")!.TextContent);
        }
    }

    [Fact]
    public async Task Without_an_optimum_the_page_says_so_and_what_to_do()
    {
        var (_, page) = await service.GetAsync("/?demo=still-rising");
        Assert.Equal("No optimum within the tested range", page.QuerySelector("#answer h2")!.TextContent);
        Assert.Contains("Compact another specimen at", page.QuerySelector("#answer .sure")!.TextContent, StringComparison.Ordinal);
        Assert.Equal("Error", page.QuerySelector(".finding .severity")!.TextContent);
    }

    [Fact]
    public async Task Every_demo_is_answered_and_its_link_gives_the_same_page()
    {
        var (_, first) = await service.GetAsync("/");
        var demos = first.QuerySelectorAll(".demos a").Select(link => link.GetAttribute("href")!.Split('#')[0]).ToList();
        Assert.Equal(3, demos.Count);
        foreach (var demo in demos)
        {
            var (response, page) = await service.GetAsync(demo);
            Assert.Equal(HttpStatusCode.OK, response.StatusCode);
            var (_, again) = await service.GetAsync(page.QuerySelector(".away a")!.GetAttribute("href")!.Split('#')[0]);
            Assert.Equal(page.Body!.InnerHtml, again.Body!.InnerHtml);
        }
    }

    [Fact]
    public async Task The_files_hold_what_the_page_shows()
    {
        var (_, page) = await service.PostAsync("/", Weighed);
        string Link(string label) => page.QuerySelectorAll(".away a").Single(link => link.TextContent == label).GetAttribute("href")!;

        using var request = await service.Client.GetAsync(Link("Request as JSON"), TestContext.Current.CancellationToken);
        var fromApi = await AnswerOfApiAsync(await request.Content.ReadAsStringAsync(TestContext.Current.CancellationToken));
        using var answer = await service.Client.GetAsync(Link("Answer as JSON"), TestContext.Current.CancellationToken);
        Assert.Equal("application/json", answer.Content.Headers.ContentType!.MediaType);
        Assert.Equal(fromApi.ToJsonString(), JsonNode.Parse(await answer.Content.ReadAsStringAsync(TestContext.Current.CancellationToken))!.ToJsonString());

        using var table = await service.Client.GetAsync(Link("Table as CSV"), TestContext.Current.CancellationToken);
        var lines = (await table.Content.ReadAsStringAsync(TestContext.Current.CancellationToken)).Split("\r\n");
        Assert.StartsWith("reference,method,label,moldMass [g],moldVolume [cm3],moldAndWetSoil [g],", lines[0], StringComparison.Ordinal);
        Assert.StartsWith("\"Ternmarsh, pit 2\",,1,4250,943.3,6027,", lines[1], StringComparison.Ordinal);
        Assert.Equal(7, lines.Length);

        foreach (var picture in new[] { "Chart as SVG", "Chart as PNG", "Chart as PDF" })
        {
            using var drawn = await service.Client.GetAsync(Link(picture), TestContext.Current.CancellationToken);
            Assert.Equal(HttpStatusCode.OK, drawn.StatusCode);
        }
    }

    [Fact]
    public async Task A_text_that_a_spreadsheet_would_run_is_made_a_text()
    {
        var (response, _) = await service.PostAsync("/files/compaction-test.csv", ("table", "Specimen\tWater content\tDry density\n=1+1\t10.4\t1.70\n2\t12.0\t1.75"));
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        Assert.Contains(",'=1+1,", await response.Content.ReadAsStringAsync(TestContext.Current.CancellationToken), StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_test_too_long_for_a_link_says_so_and_is_saved_by_posting_it_again()
    {
        // Digits of a fixed pseudo-random sequence: they do not compress.
        var random = new Random(20);
        var rows = Enumerable.Range(1, 400).Select(i => FormattableString.Invariant($"{i} {8 + (random.NextDouble() * 8):R} {1.6 + (random.NextDouble() * 0.2):R}"));
        var table = "Specimen   Water content   Dry density\n" + string.Join('\n', rows);
        var (response, page) = await service.PostAsync("/", ("table", table));
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        Assert.Contains("too long for a link", page.QuerySelector(".away")!.TextContent, StringComparison.Ordinal);

        var form = (IHtmlFormElement)page.QuerySelector(".away form")!;
        var fields = form.QuerySelectorAll<IHtmlInputElement>("input[type=hidden]").Select(input => (input.Name!, input.Value)).ToArray();
        var button = form.QuerySelectorAll("button").Single(button => button.TextContent == "Request as JSON");
        var (saved, _) = await service.PostAsync(button.GetAttribute("formaction")!, fields);
        var request = JsonNode.Parse(await saved.Content.ReadAsStringAsync(TestContext.Current.CancellationToken))!;
        Assert.Equal(400, request["specimens"]!.AsArray().Count);
        Assert.Equal("attachment", saved.Content.Headers.ContentDisposition!.DispositionType);
    }

    [Theory]
    [InlineData("/?test=%21%21%21")]
    [InlineData("/?test=AAAA")]
    [InlineData("/?test=")]
    [InlineData("/files/compaction-test.csv?test=AAAA")]
    [InlineData("/files/compaction-test.csv")]
    public async Task A_damaged_link_is_a_page_that_says_so(string address)
    {
        var (response, page) = await service.GetAsync(address);
        Assert.Equal(HttpStatusCode.BadRequest, response.StatusCode);
        Assert.StartsWith("Error:", page.Title, StringComparison.Ordinal);
        Assert.Contains("damaged", page.QuerySelector("[role=alert]")!.TextContent, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("/?demo=no-such")]
    [InlineData("/no/such/page")]
    [InlineData("/assets/pages.000000000000.css")]
    public async Task An_unknown_address_is_a_page_of_its_own(string address)
    {
        var (response, page) = await service.GetAsync(address);
        Assert.Equal(HttpStatusCode.NotFound, response.StatusCode);
        Assert.Equal("text/html", response.Content.Headers.ContentType!.MediaType);
        Assert.Single(page.QuerySelectorAll("h1"));
    }

    [Fact]
    public async Task What_a_page_loads_has_a_name_for_its_bytes_and_is_kept_for_ever()
    {
        var (_, page) = await service.GetAsync("/?demo=weighings");
        var addresses = page.QuerySelectorAll("link[href], script[src]").Select(element => element.GetAttribute("href") ?? element.GetAttribute("src")!).ToList();
        var transferred = 0L;
        foreach (var address in addresses)
        {
            using var file = await service.Client.GetAsync(address, TestContext.Current.CancellationToken);
            Assert.Equal(HttpStatusCode.OK, file.StatusCode);
            Assert.Contains("immutable", file.Headers.CacheControl!.ToString(), StringComparison.Ordinal);
            if (address.EndsWith(".css", StringComparison.Ordinal) || address.EndsWith(".js", StringComparison.Ordinal))
            {
                transferred += (await file.Content.ReadAsByteArrayAsync(TestContext.Current.CancellationToken)).Length;
            }
        }

        Assert.InRange(transferred, 1, 40_000);
    }

    [Theory]
    [InlineData("/")]
    [InlineData("/?demo=weighings")]
    [InlineData("/?demo=still-rising")]
    [InlineData("/?demo=stones")]
    public async Task A_page_is_under_60_kB_uncompressed(string address)
    {
        var bytes = await service.Client.GetByteArrayAsync(address, TestContext.Current.CancellationToken);
        Assert.InRange(bytes.Length, 1, 60_000);
    }

    [Fact]
    public async Task No_two_elements_of_an_answer_have_the_same_identifier()
    {
        foreach (var address in new[] { "/", "/?demo=weighings", "/?demo=still-rising", "/?demo=stones" })
        {
            var (_, page) = await service.GetAsync(address);
            Assert.Empty(page.QuerySelectorAll("[id]").GroupBy(element => element.Id).Where(group => group.Count() > 1).Select(group => group.Key));
        }
    }

    [Fact]
    public async Task More_rows_are_added_without_computing()
    {
        var (response, page) = await service.PostAsync("/", ("cell-0-5", "not yet"), ("more-rows", "yes"));
        Assert.Equal(HttpStatusCode.OK, response.StatusCode);
        Assert.Equal(12, page.QuerySelectorAll(".cells tbody tr").Length);
        Assert.Equal("not yet", ((IHtmlInputElement)page.GetElementById("cell-0-5")!).Value);
        Assert.Empty(page.QuerySelectorAll("[role=alert]"));
    }

    [Fact]
    public async Task A_first_line_break_in_the_table_is_kept()
    {
        var (_, page) = await service.PostAsync("/", ("table", "\n" + Table));
        Assert.Equal("\n" + Table, ((IHtmlTextAreaElement)page.QuerySelector("textarea")!).Value.ReplaceLineEndings("\n"));
    }

    [Fact]
    public async Task A_post_of_another_media_type_is_415_and_one_too_large_413()
    {
        using var json = new StringContent("{}", Encoding.UTF8, "application/json");
        using var unsupported = await service.Client.PostAsync("/", json, TestContext.Current.CancellationToken);
        Assert.Equal(HttpStatusCode.UnsupportedMediaType, unsupported.StatusCode);

        using var large = new FormUrlEncodedContent([KeyValuePair.Create("table", new string('1', 2_000_000))]);
        using var refused = await service.Client.PostAsync("/", large, TestContext.Current.CancellationToken);
        Assert.Equal(HttpStatusCode.RequestEntityTooLarge, refused.StatusCode);
    }

    private async Task<JsonNode> AnswerOfApiAsync(string request)
    {
        using var message = new HttpRequestMessage(HttpMethod.Post, "/v1/moisture-density") { Content = new StringContent(request, Encoding.UTF8, "application/json") };
        message.Headers.Accept.ParseAdd("application/json");
        using var response = await service.Client.SendAsync(message, TestContext.Current.CancellationToken);
        var text = await response.Content.ReadAsStringAsync(TestContext.Current.CancellationToken);
        Assert.True(response.StatusCode == HttpStatusCode.OK, text);
        return JsonSerializer.Deserialize<JsonNode>(text)!;
    }
}
