using System.Text.Json;
using System.Text.RegularExpressions;
using Drypeak.Service.Tests.Documents;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

/// <summary>What is no JSON is 400 with a place, whatever it is; what is JSON but no request is refused too, and nothing is ever a failure.</summary>
public sealed partial class MalformedDocumentsTests(RunningService service)
{
    /// <summary>None of these can stand for a value in JSON (RFC 8259).</summary>
    private static readonly string[] NoValues =
    [
        // Numbers.
        "+1", "01", "-01", "00", "1.", ".5", "-.5", "-", "--1", "+-1", "1e", "1e+", "1E-", "1.e3", "1e1.5", "1..2", "1ee2", "0.1.2", "1,85", "1 000", "1_000", "1'000",
        "0x10", "0b1", "0o7", "1d", "1f", "1L", "1%", "$1", "½", "١", "１", "∞", "NaN", "nan", "-NaN", "Infinity", "-Infinity", "+Infinity", "Inf", "1/2", "2^3", "1e400x",
        // Words.
        "True", "TRUE", "FALSE", "None", "nil", "undefined", "NULL", "nul", "tru", "falsee", "yes", "no", "on", "x", "wet", "null null", "true,false",
        // Texts.
        "'x'", "`x`", "\u201cx\u201d", "\"x", "x\"", "\"x\"\"", "\"x\" \"y\"", "\"\\\"", "\"\\x41\"", "\"\\u12\"", "\"\\uZZZZ\"", "\"\\U00000041\"", "\"\\'\"", "\"a\tb\"", "\"a\nb\"", "\"a\0b\"", "\"\u001f\"",
        // Objects.
        "{", "}", "{1}", "{\"a\"}", "{\"a\":}", "{\"a\",1}", "{\"a\":1,}", "{,\"a\":1}", "{\"a\":1 \"b\":2}", "{\"a\"::1}", "{\"a\"=1}", "{\"a\"=>1}", "{a:1}", "{'a':1}", "{1:2}", "{null:1}", "{\"a\":1]", "{\"a\":1;}", "{]",
        // Lists.
        "[", "]", "[1,,2]", "[,1]", "[1,]", "[1 2]", "[1;2]", "[1:2]", "[1", "[1}", "[)", "(1)", "[1 \"a\"]", "[\"a\" 1]", "[1,2", "[...]", "[1..5]",
        // What other languages have.
        "/* c */ 1", "1 // c", "# 1", "-- 1", "<a/>", "<!-- 1 -->", "---", "~", "*", "@", "&a 1", "!!int 1", "?", ",", ":", ";", "\\", "function(){}", "new Date()", "1=1", "\u00a01", "\ufeff1", "\u20281",
    ];

    private static readonly string[] NoDocuments =
    [
        "{\"specimens\":[]}}", "{\"specimens\":[]}]", "{\"specimens\":[]},", "{\"specimens\":[]}x", "{\"specimens\":[]}\0", "{\"specimens\"", "{\"specimens\":[", "{\"specimens\":[{", "{\"specimens\":[{\"label\":\"",
        "\ufeff\ufeff{}", "label,wet,dry\n1,140,130", "label;wet;dry", "<test/>", "%PDF-1.7", "PK\u0003\u0004", "GET / HTTP/1.1", "specimens: []", "[specimens]", "specimens=[]", "--boundary\r\n",
    ];

    [Fact]
    public async Task No_text_that_is_no_JSON_is_taken_and_each_is_refused_at_its_place()
    {
        string[] documents = [.. NoValues.Select(value => $"{{\n  \"waterTemperature\": {value}\n}}"), .. NoDocuments];
        Assert.True(documents.Distinct().Count() >= 100);
        var wrong = new List<string>();
        foreach (var document in documents)
        {
            using var response = await service.PostAsync(document);
            var faults = JsonElement.Parse(await RunningService.TextOf(response)).GetProperty("errors").EnumerateArray().ToList();
            if ((int)response.StatusCode != 400 || faults is not [var fault] || !LineAndColumn().IsMatch(fault.GetProperty("message").GetString()!))
            {
                wrong.Add($"{document}: {(int)response.StatusCode} {string.Join("; ", faults)}");
            }
        }

        Assert.Equal("", string.Join("\n", wrong));
    }

    /// <summary>The public JSON parsing test suite; its source and licence stand beside the files, which lie beside this project.</summary>
    [Theory]
    [InlineData("/v1/moisture-density")]
    [InlineData("/v1/field-density")]
    [InlineData("/v1/saturation-lines")]
    public async Task Every_text_of_the_parsing_suite_is_refused_and_bad_JSON_by_400_with_a_place(string address)
    {
        var folder = Repository.File("../shared/json-suite/test_parsing");
        Assert.SkipUnless(Directory.Exists(folder), $"The parsing suite is not at {folder}.");
        var files = Directory.GetFiles(folder);
        Assert.True(files.Length >= 300);
        var wrong = new List<string>();
        foreach (var file in files)
        {
            using var body = new ByteArrayContent(await File.ReadAllBytesAsync(file, TestContext.Current.CancellationToken));
            body.Headers.ContentType = new("application/json");
            using var response = await service.Client.PostAsync(new Uri(address, UriKind.Relative), body, TestContext.Current.CancellationToken);
            var refusal = await Refusal.Of(response);
            if (Path.GetFileName(file).StartsWith("n_", StringComparison.Ordinal) && (refusal.Status != 400 || refusal.Errors.Count == 0))
            {
                wrong.Add($"{Path.GetFileName(file)}: {refusal.Status} {string.Join("; ", refusal.Faults)}");
            }
        }

        Assert.Equal("", string.Join("\n", wrong));
    }

    [GeneratedRegex("line [0-9]+, column [0-9]+")]
    private static partial Regex LineAndColumn();
}
