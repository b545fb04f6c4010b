using System.Globalization;
using System.Net;
using System.Net.Http.Headers;
using System.Text;
using System.Text.Json;
using CsCheck;
using Drypeak.Service.Exchange.Csv;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Exchange;

public sealed class CsvTests(RunningService service)
{
    private const string Laboratory = "/v1/exchange/csv?job=moisture-density";
    private const string Field = "/v1/exchange/csv?job=field-density";

    private const string Weighed =
        "reference,method,label,moldMass [g],moldVolume [cm3],moldAndWetSoil [g],tin [g],tinAndWet [g],tinAndDry [g],specificGravity\r\n"
        + "A,astm-d698-a,1,4250,943,6064.2,30,140,130,2.7\r\n"
        + "A,,2,,,6173.3,31,143,131,\r\n"
        + "A,,3,,,6250.6,32,146,132,\r\n"
        + ",,4,,,6251.8,33,149,133,\r\n"
        + "A,,5,,,6219.5,34,152,134,\r\n";

    private const string Densities = "reference,waterContent [%],dryDensity [Mg/m3]\r\nB,10,1.75\r\nB,12,1.82\r\nB,14,1.86\r\nB,16,1.83\r\nB,18,1.77\r\n";

    private static CancellationToken Stop => TestContext.Current.CancellationToken;

    [Fact]
    public async Task Rows_with_one_reference_are_one_test_and_give_what_the_single_request_gives()
    {
        var file = await JsonAsync(Laboratory, Weighed);
        var test = Assert.Single(file.At("/tests").EnumerateArray());
        var single = await service.AnswerAsync(Body.With(("/reference", "\"A\""), ("/specificGravity", """{"value":2.7}""")));
        Assert.Equal(single.Number("/optimum/waterContent"), test.Number("/optimum/waterContent"), 1e-12);
        Assert.Equal(single.Number("/optimum/maximumDryDensity"), test.Number("/optimum/maximumDryDensity"), 1e-12);
        Assert.Equal(["1", "2", "3", "4", "5"], test.At("/specimens").EnumerateArray().Select(specimen => specimen.Text("/label")!));
        Assert.Empty(file.At("/findings").EnumerateArray());
    }

    [Fact]
    public async Task Tests_keep_the_order_of_their_first_rows_though_their_rows_are_mixed()
    {
        var rows = new[] { "reference,waterContent [%],dryDensity [Mg/m3]", "B,10,1.75", "A,9,1.7", "B,12,1.82", "A,11,1.8", "B,14,1.86", "A,13,1.83", "B,16,1.83" };
        var answer = await JsonAsync(Laboratory, string.Join('\n', rows));
        Assert.Equal(["B", "A"], answer.At("/tests").EnumerateArray().Select(test => test.Text("/reference")!));
        Assert.Equal([4, 3], answer.At("/tests").EnumerateArray().Select(test => test.At("/specimens").GetArrayLength()));
    }

    [Fact]
    public async Task The_answer_may_be_one_test_a_line()
    {
        using var response = await PostAsync(Laboratory, Weighed, "application/x-ndjson");
        Assert.Equal("application/x-ndjson", response.Content.Headers.ContentType?.MediaType);
        var line = Assert.Single((await RunningService.TextOf(response)).Split('\n')[..^1]);
        Assert.Equal((await JsonAsync(Laboratory, Weighed)).At("/tests/0").GetRawText(), line);
    }

    [Fact]
    public async Task The_file_comes_back_with_the_computed_columns_filled()
    {
        var table = await TableAsync(Laboratory, Weighed);
        var answer = (await JsonAsync(Laboratory, Weighed)).At("/tests/0");
        Assert.Equal(
            ["reference", "method", "label", "moldMass [g]", "moldVolume [cm3]", "moldAndWetSoil [g]", "tin [g]", "tinAndWet [g]", "tinAndDry [g]", "wetMass [g]", "wetDensity [Mg/m3]", "dryDensity [Mg/m3]",
             "waterContent [%]", "specificGravity", "setAside", "optimumWaterContent [%]", "maximumDryDensity [Mg/m3]", "model", "findings"],
            table[0]);
        Assert.Equal(6, table.Count);
        string Cell(int row, string column) => table[row][table[0].ToList().IndexOf(column)];
        Assert.Equal(answer.Number("/specimens/0/dryDensity"), double.Parse(Cell(1, "dryDensity [Mg/m3]"), CultureInfo.InvariantCulture));
        Assert.Equal(answer.Number("/specimens/4/waterContent"), double.Parse(Cell(5, "waterContent [%]"), CultureInfo.InvariantCulture));
        Assert.Equal(answer.Number("/optimum/waterContent"), double.Parse(Cell(1, "optimumWaterContent [%]"), CultureInfo.InvariantCulture));
        Assert.Equal(answer.Text("/curve/model"), Cell(1, "model"));
        Assert.Equal(string.Join(' ', answer.Findings()), Cell(1, "findings"));
        Assert.All(Enumerable.Range(2, 4), row => Assert.Equal(("", "", ""), (Cell(row, "optimumWaterContent [%]"), Cell(row, "model"), Cell(row, "findings"))));
    }

    [Fact]
    public async Task A_computed_column_that_says_otherwise_is_computed_anew_and_said()
    {
        var own = Join(await TableAsync(Laboratory, Weighed));
        Assert.Empty((await JsonAsync(Laboratory, own)).At("/findings").EnumerateArray());
        const string stale = "reference,waterContent [%],dryDensity [Mg/m3],optimumWaterContent [%],maximumDryDensity [Mg/m3],model\nB,10,1.75,12.0,1.9,guess\nB,12,1.82,,,\nB,14,1.86,,,\nB,16,1.83,,,\n";
        var answer = await JsonAsync(Laboratory, stale);
        Assert.Equal(["2 computed-anew", "2 computed-anew"], answer.At("/findings").EnumerateArray().Select(finding => $"{finding.Number("/line")} {finding.Text("/code")}"));
        Assert.InRange(answer.Number("/tests/0/optimum/waterContent"), 13, 15);

        var field = await JsonAsync(Field, "label,dryDensity,maximumDryDensity,relativeCompaction [%]\n1,1.8,1.9,99\n2,1.9,1.9,100\n");
        Assert.Equal(2, Assert.Single(field.At("/findings").EnumerateArray()).Number("/line"));
    }

    [Fact]
    public async Task A_file_of_field_tests_has_one_row_a_test()
    {
        const string file = "label,wetDensity [Mg/m3],waterContent [%],dryDensity [Mg/m3],maximumDryDensity [Mg/m3],optimumWaterContent [%],minimumRelativeCompaction [%]\n"
            + "1,2.03,11.8,,1.9,12.1,95\n2,,12.4,1.72,1.9,12.1,95\n3,,,1.85,,,\n4,2.0,10,,1.9,,\n";
        var table = await TableAsync(Field, file);
        Assert.Equal(
            ["label", "method", "wetDensity [Mg/m3]", "waterContent [%]", "dryDensity [Mg/m3]", "maximumDryDensity [Mg/m3]", "optimumWaterContent [%]", "minimumRelativeCompaction [%]",
             "relativeCompaction [%]", "waterContentFromOptimum [%]", "outcome"], table[0]);
        Assert.Equal(["direct", "direct", "direct", "direct"], table.Skip(1).Select(row => row[1]));
        Assert.Equal(["accepted", "rejected", "", ""], table.Skip(1).Select(row => row[10]));
        Assert.Equal(2.03 / 1.118 / 1.9 * 100, double.Parse(table[1][8], CultureInfo.InvariantCulture), 1e-9);
        Assert.Equal(0.3, double.Parse(table[2][9], CultureInfo.InvariantCulture), 1e-9);
        Assert.Equal(1.72 * 1.124, double.Parse(table[2][2], CultureInfo.InvariantCulture), 1e-12);
        Assert.Equal(["", ""], table[3].Skip(8).Take(2));
        Assert.Equal(table, await TableAsync(Field, Join(table)));
        Assert.Equal(4, (await JsonAsync(Field, file)).At("/tests").GetArrayLength());
    }

    [Theory]
    [InlineData("comma", "reference,waterContent [%],dryDensity [Mg/m3]\nB,10.5,1.75\nB,12,1.82\nB,14,1.86\nB,16,1.83\n")]
    [InlineData("semicolon, byte order mark, decimal comma, CRLF", "\uFEFFreference;waterContent [%];dryDensity [Mg/m3]\r\nB;10,5;1,75\r\nB;12;1,82\r\nB;14;1,86\r\nB;16;1,83\r\n")]
    [InlineData("tab, decimal comma", "reference\twaterContent [%]\tdryDensity [Mg/m3]\nB\t10,5\t1,75\nB\t12\t1,82\nB\t14\t1,86\nB\t16\t1,83\n")]
    [InlineData("quoted decimal commas", "reference,waterContent [%],dryDensity [Mg/m3]\n\"B\",\"10,5\",\"1,75\"\nB,12,\"1,82\"\nB,14,\"1,86\"\nB,16,\"1,83\"\n")]
    [InlineData("units in a second row", "reference,waterContent,dryDensity\n,%,Mg/m3\nB,10.5,1.75\nB,12,1.82\nB,14,1.86\nB,16,1.83\n")]
    [InlineData("the trade's words", "Sample,Moisture content (%),Dry density (t/m³)\nB,10.5,1.75\nB,12,1.82\nB,14,1.86\nB,16,1.83\n")]
    [InlineData("other order, other case", "Dry Density [g/cm3];Reference;WATER CONTENT [%]\n1.75;B;10.5\n1.82;B;12\n1.86;B;14\n1.83;B;16\n")]
    [InlineData("other units", "reference,waterContent [%],dryDensity [kg/m3]\nB,10.5,1750\nB,12,1820\nB,14,1860\nB,16,1830\n")]
    [InlineData("exponents", "reference,waterContent [%],dryDensity [Mg/m3]\nB,1.05E+01,1.75E0\nB,12,1.82\nB,14,1.86\nB,1.6e1,1.83\n")]
    [InlineData("empty rows and cells at the end", "reference,waterContent [%],dryDensity [Mg/m3]\n\nB,10.5,1.75,,\nB,12,1.82\n,,\nB,14,1.86\nB,16,1.83\n,,,,\n\n")]
    [InlineData("spaces around cells", "reference , waterContent [%] , dryDensity [Mg/m3]\nB , 10.5 , 1.75\nB, 12, 1.82\nB, 14, 1.86\nB, 16, 1.83")]
    public async Task Spreadsheets_exports_give_the_same_test(string what, string file)
    {
        var optimum = (await JsonAsync(Laboratory, "reference,waterContent [%],dryDensity [Mg/m3]\nB,10.5,1.75\nB,12,1.82\nB,14,1.86\nB,16,1.83\n")).At("/tests/0/optimum");
        var test = (await JsonAsync(Laboratory, file)).At("/tests/0");
        Assert.True(test.Text("/reference") == "B", what);
        Assert.Equal(optimum.Number("/waterContent"), test.Number("/optimum/waterContent"), 1e-9);
    }

    [Fact]
    public async Task A_line_break_in_a_reference_becomes_a_space_and_lines_are_counted_on()
    {
        const string file = "reference,waterContent [%],dryDensity [Mg/m3]\n\"Ternmarsh,\r\npit 2\",10,1.75\n,12,1.82\n,x,1.86\n";
        var fault = Assert.Single(await FaultsAsync(Laboratory, file));
        Assert.Equal((5, 2, "not-a-number"), fault);
        var answer = await JsonAsync(Laboratory, file.Replace("x,", "14,", StringComparison.Ordinal));
        Assert.Equal("Ternmarsh, pit 2", answer.Text("/tests/0/reference"));
    }

    [Theory]
    [InlineData("unknown column", "reference,colour,waterContent\nB,red,10\n", 400, 1, 2, "unknown-column")]
    [InlineData("column without a name", "reference,,waterContent\nB,red,10\n", 400, 1, 2, "unknown-column")]
    [InlineData("column twice", "waterContent,dryDensity,Water content\n10,1.75,10\n", 400, 1, 3, "repeated-column")]
    [InlineData("unknown unit", "waterContent [%],dryDensity [t/ft3]\n10,1.75\n", 400, 1, 2, "unknown-unit")]
    [InlineData("unit of a text", "label [g],dryDensity\n10,1.75\n", 400, 1, 1, "unknown-unit")]
    [InlineData("unknown unit in a second row", "waterContent,dryDensity\n%,%\n10,1.75\n", 400, 2, 2, "unknown-unit")]
    [InlineData("no number", "waterContent,dryDensity\n10,1.75\n12,abc\n", 400, 3, 2, "not-a-number")]
    [InlineData("no number at all", "waterContent,dryDensity\n10,NaN\n", 400, 2, 2, "not-a-number")]
    [InlineData("infinite", "waterContent,dryDensity\n10,Infinity\n", 400, 2, 2, "not-a-number")]
    [InlineData("grouped thousands", "waterContent;dryDensity [kg/m3]\n10.5;1,750.0\n", 400, 2, 2, "not-a-number")]
    [InlineData("grouped by a space", "waterContent;dryDensity [kg/m3]\n10.5;1 750.5\n", 400, 2, 2, "not-a-number")]
    [InlineData("ambiguous comma", "waterContent;moldAndWetSoil [g]\n10;6,021\n", 400, 2, 2, "not-a-number")]
    [InlineData("two decimal marks", "waterContent;dryDensity\n10.5;1.75\n12,5;1.82\n", 400, 3, 1, "not-a-number")]
    [InlineData("too many cells", "waterContent,dryDensity\n10,5,1,75\n", 400, 2, 3, "too-many-cells")]
    [InlineData("unclosed quotation", "reference,waterContent\nB,10\n\"C,12\nD,13\n", 400, 3, 1, "unclosed-quotation")]
    [InlineData("unclosed quotation after a closed one", "reference,waterContent\n\"B\"\"\n1\",\"10\n", 400, 3, 2, "unclosed-quotation")]
    [InlineData("stray quotation", "reference,waterContent\nB 2\" pipe,10\n", 400, 2, 1, "stray-quotation")]
    [InlineData("empty", "", 400, 1, 1, "empty-file")]
    [InlineData("header only", "waterContent,dryDensity\n", 400, 1, 1, "empty-file")]
    [InlineData("impossible value", "reference,waterContent,dryDensity\nB,10,1.75\nB,-12,1.82\n", 422, 3, 2, "out-of-range")]
    [InlineData("dry over wet in a tin", "dryDensity,tin,tinAndWet,tinAndDry\n1.75,30,140,150\n", 422, 2, 4, "dry-over-wet")]
    [InlineData("unknown method", "method,waterContent,dryDensity\nproctor,10,1.75\n", 422, 2, 1, "unknown-method")]
    [InlineData("two methods in one test", "reference,method,waterContent,dryDensity\nB,astm-d698-a,10,1.75\nB,astm-d698-b,12,1.8\n", 422, 3, 2, "contradiction")]
    [InlineData("mold missing", "reference,waterContent,moldAndWetSoil\nB,10,6000\n", 422, 2, 1, "not-enough-data")]
    [InlineData("mold of no volume", "waterContent,moldAndWetSoil,moldMass,moldVolume\n10,6000,4250,0\n12,6100,,\n", 422, 2, 4, "not-positive")]
    [InlineData("given twice, apart", "waterContent,wetDensity,dryDensity\n10,2.0,1.7\n", 422, 2, 3, "contradiction")]
    [InlineData("label twice", "label,waterContent,dryDensity\n1,10,1.7\n1,12,1.8\n", 422, 3, 1, "repeated-label")]
    public async Task A_fault_is_named_by_line_and_column(string what, string file, int status, int line, int column, string code)
    {
        using var response = await PostAsync(Laboratory, file);
        Assert.True(status == (int)response.StatusCode, what + ": " + await RunningService.TextOf(response));
        Assert.Contains((line, column, code), await FaultsAsync(Laboratory, file));
    }

    [Fact]
    public async Task All_faults_are_found_at_once()
    {
        const string file = "reference,waterContent,dryDensity\nB,x,1.75\nB,12,y\nC,10,-1\n";
        Assert.Equal([(2, 2, "not-a-number"), (3, 3, "not-a-number"), (4, 3, "not-positive")], await FaultsAsync(Laboratory, file));
    }

    [Theory]
    [InlineData("label,wetDensity,waterContent\n1,0,11\n", 2, 2, "not-positive")]
    [InlineData("label,waterContent\n1,11\n", 2, 1, "not-enough-data")]
    [InlineData("label,method,wetDensity,waterContent\n1,sand-cone,2.0,11\n", 2, 2, "not-by-csv")]
    [InlineData("label,wetDensity,waterContent,dryDensity\n1,2.0,11,1.9\n", 2, 4, "contradiction")]
    public async Task A_fault_of_a_field_test_is_named_by_line_and_column(string file, int line, int column, string code)
    {
        var faults = await FaultsAsync(Field, file);
        Assert.Contains(faults, fault => fault == (line, column, code));
    }

    [Theory]
    [InlineData("/v1/exchange/csv", "/job missing-parameter")]
    [InlineData("/v1/exchange/csv?job=proctor", "/job invalid-parameter")]
    [InlineData("/v1/exchange/csv?job=field-density&units=g", "/units unknown-parameter")]
    public async Task The_address_says_which_job(string address, string fault)
    {
        using var response = await PostAsync(address, Densities);
        Assert.Equal(HttpStatusCode.BadRequest, response.StatusCode);
        Assert.Equal([fault], (await Refusal.Of(response)).Faults);
    }

    [Theory]
    [InlineData("application/json", null, 415)]
    [InlineData("text/plain", null, 415)]
    [InlineData("text/csv; charset=iso-8859-1", null, 415)]
    [InlineData("text/csv", "image/png", 406)]
    [InlineData("text/csv; charset=utf-8; header=present", "*/*", 200)]
    public async Task Only_CSV_is_taken(string contentType, string? accept, int status)
    {
        using var response = await PostAsync(Laboratory, Densities, accept ?? "text/csv", contentType);
        Assert.Equal(status, (int)response.StatusCode);
    }

    [Fact]
    public async Task A_file_over_the_bound_of_a_body_is_413()
    {
        using var response = await PostAsync(Laboratory, Densities + new string('\n', 1 << 20));
        Assert.Equal(HttpStatusCode.RequestEntityTooLarge, response.StatusCode);
    }

    [Fact]
    public async Task Bytes_that_are_no_UTF_8_are_refused_at_their_line()
    {
        using var request = new HttpRequestMessage(HttpMethod.Post, Laboratory) { Content = new ByteArrayContent([.. "reference,waterContent,dryDensity\nDr"u8, 0xE4, .. "ge,10,1.7\n"u8]) };
        request.Content.Headers.ContentType = MediaTypeHeaderValue.Parse("text/csv");
        using var response = await service.Client.SendAsync(request, Stop);
        Assert.Equal(HttpStatusCode.BadRequest, response.StatusCode);
        Assert.Equal((2, "invalid-utf-8"), (FaultsOf(await RunningService.TextOf(response))[0].Line, FaultsOf(await RunningService.TextOf(response))[0].Code));
    }

    [Theory]
    [InlineData("=1+1")]
    [InlineData("+A")]
    [InlineData("-1+240")]
    [InlineData("@SUM(A1)")]
    [InlineData("'=1+1")]
    [InlineData("'quoted'")]
    [InlineData("a, \"b\"; c")]
    [InlineData(" edged ")]
    public async Task A_text_comes_back_as_it_was_and_never_runs_as_a_formula(string text)
    {
        var given = "reference,waterContent [%],dryDensity [Mg/m3]\n" + Quoted(CsvText.Guarded(text)!) + ",10,1.75\n,12,1.82\n,14,1.8\n";
        Assert.Equal(text, (await JsonAsync(Laboratory, given)).Text("/tests/0/reference"));
        var table = await TableAsync(Laboratory, given);
        Assert.DoesNotMatch(@"\A[=+\-@\t\r]", table[1][0]);
        Assert.Equal(text, (await JsonAsync(Laboratory, Join(table))).Text("/tests/0/reference"));
    }

    [Fact]
    public void A_file_written_here_is_read_as_it_was_written() =>
        Gen.String.Array[1, 4].Array[1, 5].Sample(rows =>
        {
            // The separator is known by the first row, so that it is a plain one here.
            var width = rows.Max(row => row.Length);
            List<IEnumerable<string?>> written = [Enumerable.Range(0, width).Select(i => $"c{i}"), .. rows.Select(row => row.Select(cell => CsvText.Guarded(Possible(cell))))];
            var faults = new List<Drypeak.Service.Exchange.Files.FileFault>();
            var read = CsvText.Read(CsvText.Write(written), faults);
            Assert.Empty(faults);
            var kept = rows.Select(row => row.Select(Possible).ToArray()).Where(row => row.Any(cell => cell.Length > 0)).ToList();
            Assert.Equal(kept, read.Skip(1).Select(row => row.Cells.ToArray()));

            // Half of a pair is no letter, and a cell of spaces is an empty one.
            static string Possible(string cell)
            {
                var whole = Encoding.UTF8.GetString(Encoding.UTF8.GetBytes(cell)).Replace("\0", "", StringComparison.Ordinal);
                return string.IsNullOrWhiteSpace(whole) ? "" : whole;
            }
        });

    [Fact]
    public void A_number_keeps_its_value_without_an_exponent() =>
        Gen.Double.Where(double.IsFinite).Sample(value =>
        {
            var text = CsvText.Number(value);
            Assert.DoesNotContain('E', text);
            Assert.Equal(value, double.Parse(text, CultureInfo.InvariantCulture));
        });

    [Fact]
    public void What_is_written_is_read_and_written_again_as_it_was() =>
        Gen.Select(Gen.Double[0.5, 4], Gen.Double[8, 12], Gen.Double[1.6, 1.9], Gen.Int[0, 5], (step, driest, densest, form) => (step, driest, densest, form)).Sample(test =>
        {
            var header = test.form switch
            {
                0 => "waterContent [%],dryDensity [Mg/m3]",
                1 => "waterContent [%],wetDensity [kg/m3]",
                2 => "dryDensity [lb/ft3],wetDensity [lb/ft3]",
                3 => "waterContent [%],moldAndWetSoil [lb],moldMass [lb],moldVolume [ft3]",
                4 => "tin [g],tinAndWet [g],tinAndDry [g],moldAndWetSoil [kg],moldMass [kg],moldVolume [L]",
                _ => "dryDensity [kN/m3],wetDensity [kN/m3],waterContent [%]",
            };
            var rows = Enumerable.Range(0, 5).Select(i =>
            {
                var w = test.driest + (i * test.step);
                var dry = test.densest - (0.02 * (i - 2) * (i - 2));
                var wet = dry * (1 + (w / 100));
                return string.Join(',', (test.form switch
                {
                    0 => new[] { w, dry },
                    1 => [w, wet * 1000],
                    2 => [dry * 62.428, wet * 62.428],
                    3 => [w, 9.37 + (wet * 62.428 * 0.0333), 9.37, 0.0333],
                    4 => [31.2, 31.2 + 100 + w, 131.2, 4.25 + (wet * 0.9433), 4.25, 0.9433],
                    _ => [dry * 9.80665, wet * 9.80665, w],
                }).Select(CsvText.Number));
            });
            var job = Drypeak.Service.Exchange.ExchangeJobs.Under(new Drypeak.Service.Hosting.Limits()).Laboratory;
            byte[] Computed(byte[] file)
            {
                var outcome = LaboratoryCsv.Compute(file, job);
                Assert.True(outcome.File is not null, outcome.Refusal is null ? "" : Encoding.UTF8.GetString(outcome.Refusal.ToJson()));
                return outcome.File.Write();
            }

            var once = Computed(Encoding.UTF8.GetBytes(header + "\r\n" + string.Join("\r\n", rows)));
            AssertSame(CsvText.Read(once, []), CsvText.Read(Computed(once), []));
        }, iter: 60);

    [Theory]
    [InlineData("moisture-density")]
    [InlineData("field-density")]
    public async Task The_columns_are_described_as_W3C_metadata_that_the_answer_links_to(string job)
    {
        using var response = await PostAsync("/v1/exchange/csv?job=" + job, job == "moisture-density" ? Densities : "label,dryDensity\n1,1.8\n");
        var link = Assert.Single(response.Headers.GetValues("Link"));
        Assert.Contains("rel=\"describedby\"; type=\"application/csvm+json\"", link, StringComparison.Ordinal);
        using var metadata = await service.GetAsync(link[1..link.IndexOf('>', StringComparison.Ordinal)]);
        Assert.Equal("application/csvm+json", metadata.Content.Headers.ContentType?.MediaType);
        var described = JsonElement.Parse(await RunningService.TextOf(metadata));
        Assert.Equal("http://www.w3.org/ns/csvw", described.Text("/@context"));
        var titles = described.At("/tableSchema/columns").EnumerateArray().SelectMany(column => column.At("/titles").EnumerateArray().Select(title => title.GetString()!)).ToHashSet();
        Assert.All(CsvText.Read(Encoding.UTF8.GetBytes(await RunningService.TextOf(response)), [])[0].Cells, cell => Assert.Contains(cell, titles));
    }

    private async Task<HttpResponseMessage> PostAsync(string address, string file, string accept = "text/csv", string contentType = "text/csv")
    {
        using var request = new HttpRequestMessage(HttpMethod.Post, address) { Content = new ByteArrayContent(Encoding.UTF8.GetBytes(file)) };
        request.Content.Headers.ContentType = MediaTypeHeaderValue.Parse(contentType);
        request.Headers.TryAddWithoutValidation("Accept", accept);
        return await service.Client.SendAsync(request, Stop);
    }

    private async Task<JsonElement> JsonAsync(string address, string file)
    {
        using var response = await PostAsync(address, file, "application/json");
        var text = await RunningService.TextOf(response);
        Assert.True(response.StatusCode == HttpStatusCode.OK, text);
        return JsonElement.Parse(text);
    }

    private async Task<IReadOnlyList<IReadOnlyList<string>>> TableAsync(string address, string file)
    {
        using var response = await PostAsync(address, file);
        var bytes = await response.Content.ReadAsByteArrayAsync(Stop);
        Assert.True(response.StatusCode == HttpStatusCode.OK, Encoding.UTF8.GetString(bytes));
        Assert.Equal("text/csv; charset=utf-8; header=present", response.Content.Headers.ContentType?.ToString());
        Assert.EndsWith("\r\n", Encoding.UTF8.GetString(bytes), StringComparison.Ordinal);

        // The apostrophes before would-be formulas stay, as a spreadsheet would see them.
        using var parser = new CsvHelper.CsvParser(new StringReader(Encoding.UTF8.GetString(bytes)), CultureInfo.InvariantCulture);
        var rows = new List<IReadOnlyList<string>>();
        while (parser.Read())
        {
            rows.Add(parser.Record!);
        }

        return rows;
    }

    private async Task<IReadOnlyList<(int Line, int Column, string Code)>> FaultsAsync(string address, string file)
    {
        using var response = await PostAsync(address, file);
        Assert.InRange((int)response.StatusCode, 400, 422);
        Assert.Equal("application/problem+json", response.Content.Headers.ContentType?.MediaType);
        return FaultsOf(await RunningService.TextOf(response));
    }

    private static IReadOnlyList<(int Line, int Column, string Code)> FaultsOf(string problem) =>
        [.. JsonElement.Parse(problem).At("/errors").EnumerateArray().Select(error => ((int)error.Number("/line"), (int)error.Number("/column"), error.Text("/code")!))];

    /// <summary>Cells are the same texts; a peak found anew may differ in the last digit where units are converted.</summary>
    private static void AssertSame(IReadOnlyList<CsvRow> expected, IReadOnlyList<CsvRow> actual)
    {
        Assert.Equal(expected.Count, actual.Count);
        foreach (var (before, after) in expected.Zip(actual))
        {
            Assert.Equal(before.Cells.Count, after.Cells.Count);
            Assert.All(before.Cells.Zip(after.Cells).Index(), cells => Assert.True(
                cells.Item.First == cells.Item.Second || (expected[0].Cells[cells.Index].Contains("imum", StringComparison.Ordinal)
                    && Math.Abs((double.Parse(cells.Item.First, CultureInfo.InvariantCulture) / double.Parse(cells.Item.Second, CultureInfo.InvariantCulture)) - 1) < 1e-12),
                $"{expected[0].Cells[cells.Index]}: {cells.Item.First}, then {cells.Item.Second}"));
        }
    }

    private static string Quoted(string cell) => $"\"{cell.Replace("\"", "\"\"", StringComparison.Ordinal)}\"";

    private static string Join(IEnumerable<IReadOnlyList<string>> table) => string.Join("\r\n", table.Select(row => string.Join(',', row.Select(Quoted)))) + "\r\n";
}
