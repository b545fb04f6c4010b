using System.Text;
using CsCheck;
using Drypeak.Service.Hosting;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

public sealed class JsonReadingTests
{
    private const string Good = """{"portions":[{"label":"1","wet":152.4,"dry":141.0},{"label":"2","wet":2,"dry":1}],"balance":31.2}""";

    private static Read<Weighing> Read(string text) => Read(Encoding.UTF8.GetBytes(text));

    private static Read<Weighing> Read(byte[] bytes) => JsonReading.Read(bytes, WeighingContract.Json, WeighingRules.Check);

    private static string[] Faults(Read<Weighing> read) => [.. read.Problem!.Errors.Select(fault => $"{fault.Place} {fault.Code}")];

    [Fact]
    public void A_right_request_is_read()
    {
        var weighing = Read(Good).Value!;
        Assert.Equal(31.2, weighing.Balance);
        Assert.Equal(["1", "2"], weighing.Portions.Select(portion => portion.Label));
    }

    [Fact]
    public void A_byte_order_mark_white_space_escapes_and_optional_nulls_are_read()
    {
        var text = Good.Replace("\"label\"", "\"l\\u0061bel\"", StringComparison.Ordinal).Replace("\"balance\"", "\"reference\" : null, \"readings\": [1,null],\r\n\t\"balance\"", StringComparison.Ordinal);
        var weighing = Read("\uFEFF \n" + text + "\n").Value!;
        Assert.Null(weighing.Reference);
        Assert.Equal([1, null], weighing.Readings!);
        Assert.Equal("1", weighing.Portions[0].Label);
    }

    /// <summary>What follows a right beginning, and the one fault it brings.</summary>
    [Theory]
    [InlineData("\"colour\":1", "/colour unknown-member")]
    [InlineData("\"Reference\":\"a\"", "/Reference unknown-member")]
    [InlineData("\"a/b~c\":1", "/a~1b~0c unknown-member")]
    [InlineData("\"\":1", "/ unknown-member")]
    [InlineData("\"$type\":\"x\"", "/$type unknown-member")]
    [InlineData("\"balance\":1", "/balance repeated-member")]
    [InlineData("\"b\\u0061lance\":1", "/balance repeated-member")]
    [InlineData("\"reference\":12", "/reference wrong-type")]
    [InlineData("\"reference\":true", "/reference wrong-type")]
    [InlineData("\"reference\":[]", "/reference wrong-type")]
    [InlineData("\"trace\":\"true\"", "/trace wrong-type")]
    [InlineData("\"trace\":0", "/trace wrong-type")]
    [InlineData("\"layers\":3.0", "/layers wrong-type")]
    [InlineData("\"layers\":3e0", "/layers wrong-type")]
    [InlineData("\"layers\":\"3\"", "/layers wrong-type")]
    [InlineData("\"layers\":2147483648", "/layers number-out-of-range")]
    [InlineData("\"serial\":9223372036854775808", "/serial number-out-of-range")]
    [InlineData("\"ring\":5", "/ring wrong-type")]
    [InlineData("\"ring\":[]", "/ring wrong-type")]
    [InlineData("\"ring\":{\"volume\":\"943.3\"}", "/ring/volume wrong-type")]
    [InlineData("\"ring\":{\"volume\":\"NaN\"}", "/ring/volume wrong-type")]
    [InlineData("\"ring\":{\"volume\":1e999}", "/ring/volume number-out-of-range")]
    [InlineData("\"ring\":{\"volume\":-1e999}", "/ring/volume number-out-of-range")]
    [InlineData("\"ring\":{\"volume\":{}}", "/ring/volume wrong-type")]
    [InlineData("\"ring\":{\"volume\":1,\"volume\":1}", "/ring/volume repeated-member")]
    [InlineData("\"ring\":{\"vol\":1,\"height\":1}", "/ring/vol unknown-member")]
    [InlineData("\"curve\":{}", "/curve wrong-type")]
    [InlineData("\"curve\":[1]", "/curve/0 wrong-type")]
    [InlineData("\"curve\":[null]", "/curve/0 null-not-allowed")]
    [InlineData("\"curve\":[[1,2],[1,null]]", "/curve/1/1 null-not-allowed")]
    [InlineData("\"curve\":[[1,2],[1,\"2\"]]", "/curve/1/1 wrong-type")]
    [InlineData("\"readings\":[1,null,\"2\"]", "/readings/2 wrong-type")]
    [InlineData("\"identification\":[]", "/identification wrong-type")]
    [InlineData("\"identification\":{\"project\":1}", "/identification/project wrong-type")]
    [InlineData("\"identification\":{\"project\":null}", "/identification/project null-not-allowed")]
    [InlineData("\"identification\":{\"a\":\"1\",\"a\":\"2\"}", "/identification/a repeated-member")]
    public void A_fault_of_form_is_400_with_its_place_and_code(string member, string expected)
    {
        var read = Read($"{Good[..^1]},{member}}}");
        Assert.Equal(400, read.Problem!.Status);
        Assert.Equal(ProblemKind.InvalidForm.Uri, read.Problem.Type);
        Assert.Equal([expected], Faults(read));
    }

    [Theory]
    [InlineData("{}", "/portions missing-member", "/balance missing-member")]
    [InlineData("{\"balance\":null,\"portions\":null}", "/balance null-not-allowed", "/portions null-not-allowed")]
    [InlineData("{\"balance\":1,\"portions\":[null]}", "/portions/0 null-not-allowed")]
    [InlineData("{\"balance\":1,\"portions\":{}}", "/portions wrong-type")]
    [InlineData("{\"balance\":1,\"portions\":[{}]}", "/portions/0/label missing-member", "/portions/0/wet missing-member", "/portions/0/dry missing-member")]
    [InlineData("{\"balance\":1,\"portions\":[{\"label\":null,\"wet\":null,\"dry\":1}]}", "/portions/0/label null-not-allowed", "/portions/0/wet null-not-allowed")]
    [InlineData("{\"balance\":1,\"portions\":[{\"label\":\"1\",\"wet\":\"2\",\"dry\":141}]}", "/portions/0/wet wrong-type")]
    [InlineData("null", " wrong-type")]
    [InlineData("[]", " wrong-type")]
    [InlineData("\"text\"", " wrong-type")]
    [InlineData("12", " wrong-type")]
    public void Required_members_and_the_whole_are_checked_without_faults_that_only_follow(string text, params string[] expected)
    {
        var read = Read(text);
        Assert.Equal(400, read.Problem!.Status);
        Assert.Equal(expected, Faults(read));
    }

    [Fact]
    public void All_faults_come_at_once_in_the_order_of_the_document_broken_rules_among_them()
    {
        var read = Read("""
            {
              "referense": "x",
              "portions": [
                { "label": "1", "wet": 1, "dry": 2 },
                { "label": 2, "wet": 3, "rings": [ { "volume": 0 }, { "volume": "1" } ] },
                { "label": "1", "wet": 1, "dry": 1 }
              ],
              "balance": -1,
              "ring": { "diametre": 10 }
            }
            """);
        Assert.Equal(400, read.Problem!.Status);
        Assert.Equal(
            [
                "/referense unknown-member",
                "/portions/0/dry dry-over-wet",
                "/portions/1/label wrong-type",
                "/portions/1/rings/0/volume not-positive",
                "/portions/1/rings/1/volume wrong-type",
                "/portions/1/dry missing-member",
                "/portions/2/label repeated-label",
                "/balance negative",
                "/ring/diametre unknown-member",
                "/ring/height height-missing",

            ],
            Faults(read));
    }

    [Fact]
    public void Broken_rules_alone_are_422_in_the_order_of_the_document()
    {
        var read = Read("""{"ring":{"volume":-1},"portions":[{"label":"1","wet":1,"dry":2},{"label":"1","wet":2,"dry":1}],"balance":-5}""");
        Assert.Equal(422, read.Problem!.Status);
        Assert.Equal(ProblemKind.InvalidValues.Uri, read.Problem.Type);
        Assert.Equal(["/ring/volume not-positive", "/portions/0/dry dry-over-wet", "/portions/1/label repeated-label", "/balance negative"], Faults(read));
    }

    [Theory]
    [InlineData("\"refrence\":\"x\"", "There is no member \"refrence\" here. Did you mean \"reference\"?")]
    [InlineData("\"Layers\":3", "There is no member \"Layers\" here. Did you mean \"layers\"?")]
    [InlineData("\"ring\":{\"x\":1,\"height\":1}", "There is no member \"x\" here. The members here are volume, diameter, height.")]
    [InlineData("\"trace\":\"yes\"", "Expected true or false, received the text \"yes\".")]
    [InlineData("\"layers\":2.5", "Expected a whole number, received the number 2.5.")]
    [InlineData("\"ring\":{\"volume\":\"943,3\"}", "Expected a number, received the text \"943,3\". Write it without quotes, with a decimal point.")]
    [InlineData("\"ring\":false", "Expected an object, received false.")]
    [InlineData("\"curve\":\"\"", "Expected a list, received the text \"\".")]
    [InlineData("\"ring\":{\"volume\":1e999}", "Received the number 1e999. Numbers may have a magnitude of up to 1.7e308.")]
    public void A_message_says_what_was_expected_what_was_received_and_what_to_do(string member, string expected) =>
        Assert.Equal(expected, Assert.Single(Read($"{Good[..^1]},{member}}}").Problem!.Errors).Message);

    [Theory]
    [InlineData("{\"a\": NaN}", "/a syntax", "The text is not JSON at line 1, column 7: NaN cannot stand there. A number is written with digits, as in 0.5 or -12; there is no NaN and no Infinity.")]
    [InlineData("{\n  \"mold\": {\n    \"mass\": 'x' } }", "/mold/mass syntax", "The text is not JSON at line 3, column 13: 'x' cannot stand there. Texts and names stand in double quotes.")]
    [InlineData("{\"a\":[1,2,]}", "/a/2 syntax", "The text is not JSON at line 1, column 11: ] cannot stand there. Look for a comma too many, or a bracket of the other kind.")]
    [InlineData("{\"é\": \"éé\" \"b\": 1}", " syntax", "The text is not JSON at line 1, column 12: \"b\" cannot stand there. Look for a comma or a colon too few before it.")]
    [InlineData("{\"a\":{\"b\":[{\"c\":", "/a/b/0/c syntax", "The text is not JSON at line 1, column 17: it ends too early. Close what is open: a text, a list or an object.")]
    [InlineData("{\"a\": 1,85}", " syntax", "The text is not JSON at line 1, column 9: 85 cannot stand there. The decimal mark is a point, a number has no leading zeros and no spaces.")]
    [InlineData("{} {}", " syntax", "The text is not JSON at line 1, column 4: { cannot stand there. Look for a comma or a colon too few before it.")]
    public void A_fault_of_syntax_names_place_line_and_column(string text, string expected, string message)
    {
        var read = Read(text);
        Assert.Equal(400, read.Problem!.Status);
        Assert.Equal([expected], Faults(read));
        Assert.Equal(message, read.Problem.Errors[0].Message);
    }

    [Theory]
    [InlineData("", " empty-body")]
    [InlineData(" \r\n", " empty-body")]
    [InlineData("\uFEFF", " empty-body")]
    [InlineData("{\"reference\":\"\\ud800\"}", "/reference lone-surrogate")]
    [InlineData("{\"reference\":\"\\udc00\\ud800\"}", "/reference lone-surrogate")]
    [InlineData("{\"ring\":{\"\\ud800\":1}}", "/ring lone-surrogate")]
    [InlineData("{\"identification\":{\"\\uDBFF\":\"1\"}}", "/identification lone-surrogate")]
    public void What_is_no_text_is_refused(string text, string expected) => Assert.Equal([expected], Faults(Read(text)));

    [Fact]
    public void Bytes_that_are_not_UTF_8_are_refused_with_their_position()
    {
        var read = Read([.. "{\"reference\":\n\"M"u8, 0xFC, .. "ller\"}"u8]);
        Assert.Equal([" invalid-utf-8"], Faults(read));
        Assert.Contains("line 2, column 3", read.Problem!.Errors[0].Message, StringComparison.Ordinal);
    }

    [Fact]
    public void Sixteen_levels_are_read_and_seventeen_refused()
    {
        string Nested(int levels) => $"{Good[..^1]},\"curve\":{new string('[', levels - 1)}{new string(']', levels - 1)}}}";
        Assert.Equal(["/curve/0/0 wrong-type"], Faults(Read(Nested(16))));
        Assert.Equal([$"/curve{string.Concat(Enumerable.Repeat("/0", 15))} too-deep"], Faults(Read(Nested(17))));
    }

    [Fact]
    public void Nothing_long_is_echoed_and_no_more_than_two_hundred_faults_are_listed()
    {
        var longText = new string('x', 100_000);
        var read = Read($"{Good[..^1]},\"layers\":\"{longText}\",\"trace\":{new string('9', 300)}}}");
        Assert.All(read.Problem!.Errors, fault => Assert.InRange(fault.Message.Length, 1, 200));
        Assert.Equal(2, read.Problem.Errors.Count);

        var many = Read($"{Good[..^1]},\"curve\":[{string.Join(',', Enumerable.Repeat("1", 1000))}]}}");
        Assert.Equal(200, many.Problem!.Errors.Count);
        Assert.Contains("only the first 200", many.Problem.Detail, StringComparison.Ordinal);
    }

    [Fact]
    public void A_problem_never_speaks_of_types_of_the_program()
    {
        var read = Read("""{"portions":[{"label":[],"wet":{},"dry":""}],"balance":"","x":1,"serial":1.5,"curve":[[{}]],"identification":{"a":0}}""");
        Assert.Equal(8, read.Problem!.Errors.Count);
        Assert.DoesNotContain("System", Encoding.UTF8.GetString(read.Problem.ToJson()), StringComparison.Ordinal);
        Assert.DoesNotContain(nameof(Weighing), Encoding.UTF8.GetString(read.Problem.ToJson()), StringComparison.Ordinal);
    }

    /// <summary>A right text with up to three stretches of it deleted, doubled or overwritten.</summary>
    [Fact]
    public void No_text_makes_the_reader_fail_and_what_it_refuses_has_a_fault_and_a_place()
    {
        const string Rich = """{"portions":[{"label":"1","wet":152.4,"dry":141.0,"rings":[{"volume":1e2}]}],"balance":31.2,"layers":3,"trace":true,"curve":[[1,2],[3,4]],"readings":[null,1],"identification":{"a":"\u00e9"},"ring":null}""";
        string[] scraps = ["null", "1e999", "\"", "{}", "[", "}", ",", ":", "\\ud800", "-", "true", "\u00FF"];
        var change = Gen.Select(Gen.Int[0, 2], Gen.Int[0, Rich.Length], Gen.Int[1, 12], Gen.Int[0, scraps.Length - 1]);
        change.Array[1, 3].Sample(changes =>
        {
            var text = changes.Aggregate(Rich, (text, each) => Change(text, each.Item1, each.Item2, each.Item3, scraps[each.Item4]));
            var read = Read(text);
            Assert.True(read.Succeeded || (read.Problem.Status is 400 or 422 && read.Problem.Errors.Count > 0));
            Assert.All(read.Problem?.Errors ?? [], fault => Assert.True(fault.Place.Length == 0 || fault.Place[0] == '/'));
        }, iter: 20_000);
    }

    private static string Change(string text, int kind, int position, int length, string scrap)
    {
        var start = Math.Min(position, text.Length);
        var end = Math.Min(start + length, text.Length);
        return kind switch
        {
            0 => text[..start] + text[end..],
            1 => text[..end] + text[start..],
            _ => text[..start] + scrap + text[end..],
        };
    }
}
