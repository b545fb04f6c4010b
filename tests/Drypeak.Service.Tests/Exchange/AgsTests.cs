using System.Globalization;
using System.Net;
using System.Net.Http.Headers;
using System.Text;
using System.Text.Json;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Exchange;

public sealed class AgsTests(RunningService service)
{
    private const string Address = "/v1/exchange/ags4";
    private const string Test = "\"DATA\",\"TP07\",\"0.60\",\"3\",\"LB\",\"S-71\",\"\",\"0.60\",\"1\",\"Brown";
    private const string Results = "\"2.68\",\"\",\"\",\"\"";
    private const string FirstPoint = "\"1\",\"9.8\",\"1.742\"";

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    [Fact]
    public async Task A_file_is_found_and_computed()
    {
        var answer = await AnswerAsync(AgsTexts.Sound);
        Assert.Equal("4.1.1", answer.Text("/edition"));
        Assert.Equal(["PROJ 1", "TRAN 1", "TYPE 11", "UNIT 4", "ABBR 4", "LOCA 2", "SAMP 1", "CMPG 1", "CMPT 5", "IDEN 2"],
            answer.At("/groups").EnumerateArray().Select(group => $"{group.Text("/group")} {group.Number("/rows")}"));
        Assert.Empty(answer.Findings());

        var test = Assert.Single(answer.At("/tests").EnumerateArray());
        Assert.Equal(
            """{"LOCA_ID":"TP07","SAMP_TOP":"0.60","SAMP_REF":"3","SAMP_TYPE":"LB","SAMP_ID":"S-71","SPEC_REF":"","SPEC_DPTH":"0.60","CMPG_TESN":"1"}""",
            test.At("/key").GetRawText());
        Assert.Equal(["1", "2", "3", "4", "5"], test.At("/answer/specimens").EnumerateArray().Select(specimen => specimen.Text("/label")!));
    }

    [Fact]
    public async Task A_test_gives_what_the_single_request_gives()
    {
        // The density of water at 20 °C: 998.2067 kg/m³ (Tanaka and others 2001).
        const double gravity = 2.68 / 0.9982067;
        var single = await service.AnswerAsync(Body.With(
            ("/method", "\"bs-1377-4-3.3\""), ("/mold", Body.Absent), ("/units", Body.Absent),
            ("/specificGravity", string.Create(CultureInfo.InvariantCulture, $$"""{"value":{{gravity:R}},"determined":"measured"}""")),
            ("/specimens", "[" + string.Join(',', new[] { (9.8, 1.742), (11.9, 1.812), (14.1, 1.855), (16.0, 1.831), (18.2, 1.764) }.Select(Body.Point)) + "]")));
        var answer = (await AnswerAsync(AgsTexts.Sound)).At("/tests/0/answer");
        Assert.Equal(single.Number("/optimum/waterContent"), answer.Number("/optimum/waterContent"), 1e-6);
        Assert.Equal(single.Number("/optimum/maximumDryDensity"), answer.Number("/optimum/maximumDryDensity"), 1e-6);
        Assert.Equal((gravity * 0.9982067 / 1.742) - 1, answer.Number("/specimens/0/voidRatio"), 1e-6);
        Assert.Equal("bs-1377-4-3.3", answer.Text("/method/code"));
    }

    [Theory]
    [InlineData("2.68", false)]
    [InlineData("2.68#", true)]
    [InlineData("#2.68", true)]
    [InlineData("# 2.68", true)]
    public async Task A_hash_before_or_behind_a_particle_density_says_that_it_was_assumed(string written, bool assumed) =>
        Assert.Equal(assumed, (await AnswerAsync(AgsTexts.With("\"2.68\"", $"\"{written}\""))).At("/tests/0/answer").Findings().Contains("specific-gravity-assumed"));

    [Fact]
    public async Task Without_a_particle_density_that_of_the_same_specimen_is_used_and_said()
    {
        var file = AgsTexts.With("\"2.68\"", "\"\"") + "\r\n\"GROUP\",\"LPDN\"\r\n\"HEADING\",\"LOCA_ID\",\"SAMP_TOP\",\"SAMP_REF\",\"SAMP_TYPE\",\"SAMP_ID\",\"SPEC_REF\",\"SPEC_DPTH\",\"LPDN_PDEN\"\r\n"
            + "\"UNIT\",\"\",\"m\",\"\",\"\",\"\",\"\",\"m\",\"Mg/m3\"\r\n\"TYPE\",\"ID\",\"2DP\",\"X\",\"PA\",\"ID\",\"X\",\"2DP\",\"XN\"\r\n\"DATA\",\"TP07\",\"0.60\",\"3\",\"LB\",\"S-71\",\"\",\"0.60\",\"2.68\"\r\n";
        var answer = await AnswerAsync(file);
        Assert.Contains("particle-density-from-lpdn", answer.Findings());
        Assert.Equal((await AnswerAsync(AgsTexts.Sound)).Number("/tests/0/answer/specimens/0/voidRatio"), answer.Number("/tests/0/answer/specimens/0/voidRatio"));
    }

    [Fact]
    public async Task Field_tests_have_their_dry_density_and_their_relative_compaction_where_the_address_names_the_maximum()
    {
        var plain = (await AnswerAsync(AgsTexts.Sound)).At("/fieldTests");
        Assert.Equal(2, plain.GetArrayLength());
        Assert.Equal("""{"LOCA_ID":"LOT4-2","IDEN_DPTH":"0.15","IDEN_TESN":"7"}""", plain.At("/0/key").GetRawText());
        Assert.Equal(2.04 / 1.132, plain.Number("/0/dryDensity"), 1e-12);
        Assert.Equal(13.2, plain.Number("/0/waterContent"), 1e-12);
        Assert.True(plain.IsNull("/0/relativeCompaction"));

        var held = (await AnswerAsync(AgsTexts.Sound, "?maximumDryDensity=1.9")).At("/fieldTests");
        Assert.Equal(2.04 / 1.132 / 1.9 * 100, held.Number("/0/relativeCompaction"), 1e-9);
    }

    [Fact]
    public async Task The_file_comes_back_with_its_results_and_every_other_byte_as_it_was()
    {
        var optimum = (await AnswerAsync(AgsTexts.Sound)).At("/tests/0/answer/optimum");
        var expected = AgsTexts.With(Results, string.Create(CultureInfo.InvariantCulture,
            $"\"2.68\",\"{optimum.Number("/maximumDryDensity"):0.00}\",\"{optimum.Number("/waterContent"):0}\",\"\""));
        var written = await FileAsync(AgsTexts.Sound);
        Assert.Equal(expected, written);

        // Read, computed and written again it stays.
        Assert.Equal(written, await FileAsync(written));
        Assert.Equal(written, await FileAsync(written, "?replace=true"));
        Assert.Empty((await AnswerAsync(written)).Findings());
    }

    [Theory]
    [InlineData("\"2DP\",\"2SF\",\"X\"", "\"3DP\",\"3SF\",\"X\"", "0.000", "0.0")]
    [InlineData("\"2DP\",\"2SF\",\"X\"", "\"1DP\",\"1DP\",\"X\"", "0.0", "0.0")]
    [InlineData("\"2DP\",\"2SF\",\"X\"", "\"0DP\",\"0DP\",\"X\"", "0", "0")]
    [InlineData("\"2DP\",\"2SF\",\"X\"", "\"X\",\"X\",\"X\"", "0.00", "0")]
    public async Task Results_follow_the_files_own_types(string types, string others, string maximum, string water)
    {
        var file = AgsTexts.With("\"XN\"," + types, "\"XN\"," + others);
        var optimum = (await AnswerAsync(file)).At("/tests/0/answer/optimum");
        var invariant = CultureInfo.InvariantCulture;
        Assert.Contains($"\"2.68\",\"{optimum.Number("/maximumDryDensity").ToString(maximum, invariant)}\",\"{optimum.Number("/waterContent").ToString(water, invariant)}\",\"\"",
            await FileAsync(file), StringComparison.Ordinal);
    }

    [Fact]
    public async Task Densities_in_another_unit_are_converted_and_results_written_in_the_files()
    {
        var file = AgsTexts.Sound
            .Replace("\"UNIT\",\"\",\"m\",\"\",\"\",\"\",\"\",\"m\",\"\",\"\",\"%\",\"Mg/m3\"", "\"UNIT\",\"\",\"m\",\"\",\"\",\"\",\"\",\"m\",\"\",\"\",\"%\",\"kg/m3\"", StringComparison.Ordinal)
            .Replace("\"X\",\"X\",\"3DP\"", "\"X\",\"X\",\"0DP\"", StringComparison.Ordinal)
            .Replace("\"Mg/m3\",\"Mg/m3\",\"%\",\"\"", "\"Mg/m3\",\"kg/m3\",\"%\",\"\"", StringComparison.Ordinal)
            .Replace("\"XN\",\"2DP\",\"2SF\",\"X\"", "\"XN\",\"0DP\",\"2SF\",\"X\"", StringComparison.Ordinal);
        foreach (var density in new[] { "1.742", "1.812", "1.855", "1.831", "1.764" })
        {
            file = file.Replace($"\"{density}\"", $"\"{density.Replace(".", "", StringComparison.Ordinal)}\"", StringComparison.Ordinal);
        }

        Assert.Equal((await AnswerAsync(AgsTexts.Sound)).Number("/tests/0/answer/optimum/maximumDryDensity"), (await AnswerAsync(file)).Number("/tests/0/answer/optimum/maximumDryDensity"), 1e-9);
        Assert.Matches("\"2.68\",\"18[0-9]{2}\",\"14\"", await FileAsync(file));
    }

    [Fact]
    public async Task A_result_that_stands_and_differs_is_kept_with_a_finding_or_replaced_where_asked()
    {
        var file = AgsTexts.With(Results, "\"2.68\",\"1.90\",\"\",\"\"");
        var computed = await FileAsync(AgsTexts.Sound);
        Assert.Contains("result-differs", (await AnswerAsync(file)).Findings());
        Assert.Contains("\"2.68\",\"1.90\",\"14\",\"\"", await FileAsync(file), StringComparison.Ordinal);
        Assert.Equal(computed, await FileAsync(file, "?replace=true"));
    }

    [Fact]
    public async Task Without_an_optimum_or_without_the_heading_nothing_is_written_and_it_is_said()
    {
        var flat = string.Join("\r\n", AgsTexts.Sound.Split("\r\n").Where(line => !line.Contains("\"16.0\"", StringComparison.Ordinal) && !line.Contains("\"18.2\"", StringComparison.Ordinal) && !line.Contains("\"14.1\"", StringComparison.Ordinal)));
        Assert.Contains("result-not-written", (await AnswerAsync(flat)).Findings());
        Assert.Equal(flat, await FileAsync(flat));

        var without = AgsTexts.Sound.Replace(",\"CMPG_MAXD\",\"CMPG_MCOP\",\"CMPG_REM\"", ",\"CMPG_REM\"", StringComparison.Ordinal)
            .Replace("\"Mg/m3\",\"Mg/m3\",\"%\",\"\"", "\"Mg/m3\",\"\"", StringComparison.Ordinal)
            .Replace("\"XN\",\"2DP\",\"2SF\",\"X\"", "\"XN\",\"X\"", StringComparison.Ordinal)
            .Replace(Results, "\"2.68\",\"\"", StringComparison.Ordinal);
        Assert.Equal(2, (await AnswerAsync(without)).Findings().Count(code => code == "result-not-written"));
        Assert.Equal(without, await FileAsync(without));
    }

    [Fact]
    public async Task Groups_that_are_not_read_are_carried_through()
    {
        var file = AgsTexts.And("\"GROUP\",\"GEOL\"", "\"HEADING\",\"LOCA_ID\",\"GEOL_TOP\",\"GEOL_DESC\"", "\"UNIT\",\"\",\"m\",\"\"", "\"TYPE\",\"ID\",\"2DP\",\"X\"", "\"DATA\",\"TP07\",\"0.00\",\"Made ground\"");
        var answer = await AnswerAsync(file);
        Assert.Equal(["group-unknown"], answer.Findings());
        Assert.EndsWith(file[^200..], await FileAsync(file), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("utf-8")]
    [InlineData("windows-1252")]
    public async Task Letters_beyond_ASCII_are_kept_in_their_encoding(string encoding)
    {
        var coding = encoding == "utf-8" ? Encoding.UTF8 : CodePagesEncodingProvider.Instance.GetEncoding(1252)!;
        var file = AgsTexts.With("Brown sandy clay", "Brown clay ±2 % Ägeri");
        using var response = await PostAsync(coding.GetBytes(file), accept: "text/plain");
        var written = coding.GetString(await response.Content.ReadAsByteArrayAsync(Stop));
        Assert.Contains("Brown clay ±2 % Ägeri, \"\"stiff\"\"", written, StringComparison.Ordinal);
        Assert.Equal(file.Length + "1.8514".Length, written.Length);
        Assert.Contains("not-ascii", (await AnswerAsync(coding.GetBytes(file))).Findings());
    }

    [Fact]
    public async Task A_byte_order_mark_and_lonely_line_feeds_are_said_and_kept()
    {
        var file = "\uFEFF" + AgsTexts.Sound.Replace("\r\n", "\n", StringComparison.Ordinal);
        var answer = await AnswerAsync(file);
        Assert.Equal(["byte-order-mark", "line-ending"], answer.Findings().Order());
        var written = await FileAsync(file);
        Assert.StartsWith("\uFEFF\"GROUP\",\"PROJ\"\n", written, StringComparison.Ordinal);
        Assert.DoesNotContain('\r', written);
    }

    [Fact]
    public async Task A_file_comes_as_a_part_of_a_form_too()
    {
        using var form = new MultipartFormDataContent { { new ByteArrayContent(Encoding.UTF8.GetBytes(AgsTexts.Sound)), "file", "ternmarsh.ags" } };
        using var response = await service.Client.PostAsync(new Uri(Address, UriKind.Relative), form, Stop);
        Assert.Equal((await AnswerAsync(AgsTexts.Sound)).GetRawText(), await RunningService.TextOf(response));

        using var two = new MultipartFormDataContent { { new StringContent("a"), "a" }, { new StringContent("b"), "b" } };
        using var refused = await service.Client.PostAsync(new Uri(Address, UriKind.Relative), two, Stop);
        Assert.Equal(HttpStatusCode.BadRequest, refused.StatusCode);
    }

    [Theory]
    [InlineData("application/json", "", null, 415)]
    [InlineData("application/octet-stream", "", null, 415)]
    [InlineData("text/plain; charset=windows-1252", "", null, 200)]
    [InlineData("text/plain", "", "text/csv", 406)]
    [InlineData("text/plain", "?replace=yes", null, 400)]
    [InlineData("text/plain", "?maximumDryDensity=1,9", null, 400)]
    [InlineData("text/plain", "?maximumDryDensity=NaN", null, 400)]
    [InlineData("text/plain", "?maximumDryDensity=-1", null, 400)]
    [InlineData("text/plain", "?edition=4", null, 400)]
    [InlineData("text/plain", "?replace=true&maximumDryDensity=1.93", "text/plain", 200)]
    public async Task The_address_and_its_header_fields_are_looked_at(string contentType, string query, string? accept, int status)
    {
        using var response = await PostAsync(Encoding.UTF8.GetBytes(AgsTexts.Sound), query, accept, contentType);
        Assert.Equal(status, (int)response.StatusCode);
        Assert.Equal(status == 200 ? accept ?? "application/json" : "application/problem+json", response.Content.Headers.ContentType?.MediaType);
    }

    public static TheoryData<string, string, string, string, string> Broken()
    {
        const string none = "";
        return new()
        {
            // What the file is like, its text, and the line (by what stands on it), the group and the code of a fault.
            { "an item without quotation marks", AgsTexts.With(FirstPoint, "\"1\",9.8,\"1.742\""), "\"1\",9.8", "CMPT", "not-quoted" },
            { "an item that is not closed", AgsTexts.With(FirstPoint, "\"1\",\"9.8\",\"1.742"), "\"9.8\",\"1.742", "CMPT", "unclosed-quotation" },
            { "a quotation mark that is not doubled", AgsTexts.With("\"\"stiff\"\"", "\"stiff\""), "Brown", "CMPG", "stray-text" },
            { "a space behind a comma", AgsTexts.With(FirstPoint, "\"1\", \"9.8\",\"1.742\""), "\"1\", \"9.8\"", "CMPT", "not-quoted" },
            { "a line of another kind", AgsTexts.With(FirstPoint, FirstPoint + "\r\n\"NOTE\",\"x\""), "\"NOTE\"", "CMPT", "unknown-descriptor" },
            { "a line before any group", "\"DATA\",\"1\"\r\n" + AgsTexts.Sound, "\"DATA\",\"1\"", none, "line-order" },
            { "a group's name in small letters", AgsTexts.With("\"GROUP\",\"CMPT\"", "\"GROUP\",\"cmpt\""), "\"cmpt\"", "CMPT", "group-name" },
            { "a group twice", AgsTexts.And("\"GROUP\",\"CMPT\"", "\"HEADING\",\"LOCA_ID\"", "\"UNIT\",\"\"", "\"TYPE\",\"ID\"", "\"DATA\",\"TP07\""), "last", "CMPT", "group-repeated" },
            { "units before headings", AgsTexts.With("\"GROUP\",\"IDEN\"\r\n", "\"GROUP\",\"IDEN\"\r\n\"UNIT\",\"\"\r\n"), "\"UNIT\",\"\"\r\n\"HEADING\",\"LOCA_ID\",\"IDEN_DPTH\"", "IDEN", "line-order" },
            { "no types", AgsTexts.With("\"TYPE\",\"ID\",\"2DP\",\"X\",\"DT\",\"PA\",\"2DP\",\"X\"\r\n", none), "\"LOT4-2\",\"0.15\",\"7\"", "IDEN", "line-missing" },
            { "no rows", AgsTexts.Without("IDEN") + "\"GROUP\",\"IDEN\"\r\n\"HEADING\",\"LOCA_ID\",\"IDEN_DPTH\",\"IDEN_TESN\"\r\n\"UNIT\",\"\",\"m\",\"\"\r\n\"TYPE\",\"ID\",\"2DP\",\"X\"\r\n", "\"GROUP\",\"IDEN\"", "IDEN", "no-data" },
            { "an item too few", AgsTexts.With("\"SAND\",\"2.04\",\"13.2\"", "\"SAND\",\"2.04\""), "\"2.04\"", "IDEN", "item-count" },
            { "a heading twice", AgsTexts.With("\"CMPT_MC\",\"CMPT_DDEN\"", "\"CMPT_MC\",\"CMPT_MC\""), "\"CMPT_MC\",\"CMPT_MC\"", "CMPT", "heading-repeated" },
            { "a heading in small letters", AgsTexts.With("\"IDEN_MC\"", "\"iden_mc\""), "\"iden_mc\"", "IDEN", "heading-name" },
            { "a key heading missing", AgsTexts.With("\"CMPT_TESN\"", "\"CMPT_NUMB\""), "\"CMPT_NUMB\"", "CMPT", "key-missing" },
            { "a key twice", AgsTexts.With("\"LOT4-2\",\"0.15\",\"8\"", "\"LOT4-2\",\"0.15\",\"7\""), "\"2.01\"", "IDEN", "key-repeated" },
            { "a point without its test", AgsTexts.With("\"0.60\",\"1\",\"5\"", "\"0.60\",\"2\",\"5\""), "\"2\",\"5\"", "CMPT", "parent-missing" },
            { "too few decimals", AgsTexts.With("\"1.742\"", "\"1.74\""), "\"1.74\"", "CMPT", "type-mismatch" },
            { "a type that there is not", AgsTexts.With("\"PA\",\"2DP\",\"X\"\r\n\"DATA\",\"LOT4-2\"", "\"PA\",\"2XP\",\"X\"\r\n\"DATA\",\"LOT4-2\""), "\"2XP\"", "IDEN", "type-unknown" },
            { "a date that is none", AgsTexts.With("\"7\",\"2026-05-12\"", "\"7\",\"12/05/2026\""), "12/05/2026", "IDEN", "type-mismatch" },
            { "a water content in words", AgsTexts.With("\"9.8\"", "\"wet\""), "\"wet\"", "CMPT", "not-a-number" },
            { "a particle density in words", AgsTexts.With("\"2.68\"", "\"high\""), "\"high\"", "CMPG", "not-a-number" },
            { "a unit of no density", AgsTexts.With("\"m\",\"\",\"\",\"%\",\"Mg/m3\"", "\"m\",\"\",\"\",\"%\",\"g\""), "\"%\",\"g\"", "CMPT", "unit-unknown" },
            { "a water content that cannot be", AgsTexts.With("\"9.8\"", "\"-9.8\""), "\"-9.8\"", "CMPT", "out-of-range" },
            { "labels of points twice by key", AgsTexts.With("\"0.60\",\"1\",\"5\"", "\"0.60\",\"1\",\"4\""), "\"18.2\"", "CMPT", "key-repeated" },
            { "no text", "PK\u0003\u0004\0\0", "PK", none, "not-text" },
            { "another format", "{\"specimens\":[]}", "{", none, "not-quoted" },
            { "nothing", none, none, none, "empty-file" },
            { "a broken line above the tests", AgsTexts.With("\"DATA\",\"TP07\",\"12.40\"", "\"DATA\",\"TP07\",12.40"), "\"TP07\",12.40", "LOCA", "not-quoted" },
        };
    }

    [Theory]
    [MemberData(nameof(Broken))]
    public async Task A_rule_broken_where_it_matters_refuses_the_file_with_line_and_group(string what, string file, string on, string group, string code)
    {
        using var response = await PostAsync(Encoding.UTF8.GetBytes(file));
        var text = await RunningService.TextOf(response);
        Assert.True(response.StatusCode == HttpStatusCode.UnprocessableEntity, $"{what}: {text}");
        var line = on == "last" ? AgsTexts.LineOf(file, "\"DATA\",\"TP07\"\r\n") - 4 : on.Length == 0 ? 1 : AgsTexts.LineOf(file, on);
        var errors = JsonElement.Parse(text).At("/errors").EnumerateArray().Select(error => ((int)error.Number("/line"), error.Text("/group"), error.Text("/code"))).ToList();
        Assert.Contains((line, group, code), errors);
    }

    public static TheoryData<string, string, string, string> Odd() => new()
    {
        // What the file is like, its text, the line (by what stands on it), and the code of the finding.
        { "no transmission", AgsTexts.Without("TRAN"), "", "group-missing" },
        { "no project", AgsTexts.Without("PROJ"), "", "group-missing" },
        { "an unknown edition", AgsTexts.With("\"4.1.1\"", "\"9.9\""), "\"9.9\"", "edition-unknown" },
        { "a broken line in a group that is not read", AgsTexts.And("\"GROUP\",\"GEOL\"", "\"HEADING\",\"LOCA_ID\"", "\"UNIT\",\"\"", "\"TYPE\",\"ID\"", "\"DATA\",TP07", "\"DATA\",\"TP07\""), "\"DATA\",TP07", "not-quoted" },
        { "a unit that is not listed", AgsTexts.With("\"DATA\",\"%\",\"percentage\"\r\n", ""), "\"UNIT\",\"\",\"m\",\"\",\"\",\"\",\"\",\"m\",\"\",\"\",\"\",\"\",\"%\"", "unit-not-listed" },
        { "a type that is not listed", AgsTexts.With("\"DATA\",\"3DP\",\"Three decimal places\"\r\n", ""), "\"X\",\"X\",\"3DP\"", "type-not-listed" },
        { "a code that is not listed", AgsTexts.With("\"DATA\",\"IDEN_TYPE\",\"SAND\",\"Sand replacement\"\r\n", ""), "\"SAND\",\"2.04\"", "code-not-listed" },
        { "a sample that is missing", AgsTexts.With("\"DATA\",\"TP07\",\"0.60\",\"3\",\"LB\",\"S-71\"\r\n", "\"DATA\",\"TP07\",\"0.90\",\"3\",\"LB\",\"S-72\"\r\n"), Test, "parent-missing" },
        { "a required item that is empty", AgsTexts.With("\"Draft\"", "\"\""), "\"Ternmarsh site laboratory\"", "required-empty" },
        { "two projects", AgsTexts.With("\"Ternmarsh Drainage Board\"\r\n\r\n\"GROUP\",\"TRAN\"", "\"Ternmarsh Drainage Board\"\r\n\"DATA\",\"TM-2\",\"\",\"\",\"\"\r\n\r\n\"GROUP\",\"TRAN\""), "\"TM-2\"", "one-row-only" },
        { "an empty row", AgsTexts.With("\"DATA\",\"LOT4-2\",\"14.15\"", "\"DATA\",\"\",\"\"\r\n\"DATA\",\"LOT4-2\",\"14.15\""), "\"DATA\",\"\",\"\"", "empty-row" },
        { "a point without a density", AgsTexts.With("\"18.2\",\"1.764\"", "\"18.2\",\"\""), "\"18.2\"", "incomplete-point" },
        { "a field test without a water content", AgsTexts.With("\"2.01\",\"15.1\"", "\"2.01\",\"\""), "\"2.01\"", "incomplete-test" },
        { "a test without points", AgsTexts.Without("CMPT"), Test, "no-points" },
        { "another order of keys", AgsTexts.With("\"HEADING\",\"LOCA_ID\",\"IDEN_DPTH\"", "\"HEADING\",\"IDEN_MEMO\",\"IDEN_DPTH\"").Replace("\"IDEN_IDEN\",\"IDEN_MC\"", "\"IDEN_IDEN\",\"LOCA_ID\"", StringComparison.Ordinal), "\"IDEN_MEMO\"", "heading-order" },
        { "an own heading", AgsTexts.With("\"IDEN_TYPE\",\"IDEN_IDEN\"", "\"IDEN_TYPX\",\"IDEN_IDEN\""), "\"IDEN_TYPX\"", "heading-unknown" },
        { "another type than the dictionary's", AgsTexts.With("\"DT\",\"PA\",\"2DP\",\"X\"\r\n\"DATA\",\"LOT4-2\"", "\"DT\",\"X\",\"2DP\",\"X\"\r\n\"DATA\",\"LOT4-2\""), "\"DT\",\"X\",\"2DP\",\"X\"", "type-differs" },
        { "nothing to compute", AgsTexts.Without("CMPT").Replace("\"2.04\"", "\"\"", StringComparison.Ordinal).Replace("\"2.01\"", "\"\"", StringComparison.Ordinal), "", "nothing-to-compute" },
    };

    [Theory]
    [MemberData(nameof(Odd))]
    public async Task A_rule_broken_where_it_does_not_matter_is_a_finding_with_its_line(string what, string file, string on, string code)
    {
        var findings = (await AnswerAsync(file)).At("/findings").EnumerateArray().Select(finding => ((int)finding.Number("/line"), finding.Text("/code"))).ToList();
        Assert.True(findings.Contains((on.Length == 0 ? 1 : AgsTexts.LineOf(file, on), code)), $"{what}: {string.Join("; ", findings)}");
    }

    [Fact]
    public async Task All_faults_are_found_at_once()
    {
        var file = AgsTexts.With("\"9.8\",\"1.742\"", "9.8,\"1.742\"").Replace("\"1.831\"", "\"1.83\"", StringComparison.Ordinal).Replace("\"2.68\"", "\"high\"", StringComparison.Ordinal);
        using var response = await PostAsync(Encoding.UTF8.GetBytes(file));
        var errors = JsonElement.Parse(await RunningService.TextOf(response)).At("/errors").EnumerateArray().Select(error => error.Text("/code")!);
        Assert.Equal(["not-a-number", "not-quoted", "type-mismatch"], errors);
    }

    [Fact]
    public async Task A_file_over_the_bound_of_a_body_is_413()
    {
        using var response = await PostAsync(new byte[(1 << 20) + 1]);
        Assert.Equal(HttpStatusCode.RequestEntityTooLarge, response.StatusCode);
    }

    private async Task<HttpResponseMessage> PostAsync(byte[] file, string query = "", string? accept = null, string contentType = "text/plain")
    {
        using var request = new HttpRequestMessage(HttpMethod.Post, Address + query) { Content = new ByteArrayContent(file) };
        request.Content.Headers.ContentType = MediaTypeHeaderValue.Parse(contentType);
        request.Headers.TryAddWithoutValidation("Accept", accept);
        return await service.Client.SendAsync(request, Stop);
    }

    private Task<JsonElement> AnswerAsync(string file, string query = "") => AnswerAsync(Encoding.UTF8.GetBytes(file), query);

    private async Task<JsonElement> AnswerAsync(byte[] file, string query = "")
    {
        using var response = await PostAsync(file, query);
        var text = await RunningService.TextOf(response);
        Assert.True(response.StatusCode == HttpStatusCode.OK, text);
        return JsonElement.Parse(text);
    }

    private async Task<string> FileAsync(string file, string query = "")
    {
        using var response = await PostAsync(Encoding.UTF8.GetBytes(file), query, "text/plain");
        var bytes = await response.Content.ReadAsByteArrayAsync(Stop);
        Assert.True(response.StatusCode == HttpStatusCode.OK, Encoding.UTF8.GetString(bytes));
        return Encoding.UTF8.GetString(bytes);
    }
}
