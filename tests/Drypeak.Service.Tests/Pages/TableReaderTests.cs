using System.Globalization;
using System.Text.Json;
using System.Text.Json.Serialization;
using CsCheck;
using Drypeak.Service.Pages.Tables;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Service.Tests.Pages;

/// <summary>What a pasted table is read as. The form's units are g, cm³ and Mg/m³.</summary>
public class TableReaderTests
{
    private static readonly JsonSerializerOptions Shown = new()
    {
        PropertyNamingPolicy = JsonNamingPolicy.CamelCase,
        DefaultIgnoreCondition = JsonIgnoreCondition.WhenWritingNull,
        Encoder = System.Text.Encodings.Web.JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    };

    private const string TwoWeighed = """
        [{"label":"1","moldAndWetSoil":6027,"tins":[{"tin":29.42,"wet":138.8,"dry":129.06}]},{"label":"2","moldAndWetSoil":6137.5,"tins":[{"tin":33.51,"wet":180.2,"dry":164.53}]}]
        """;

    private const string TwoTins = """
        [{"label":"1","moldAndWetSoil":6027,"tins":[{"tin":29.42,"wet":138.8,"dry":129.06},{"tin":28.93,"wet":136.5,"dry":126.92}]}]
        """;

    private const string TwoReduced = """
        [{"label":"A","dryDensity":1.702,"waterContent":10.4},{"label":"B","dryDensity":1.833,"waterContent":13.9}]
        """;

    public static TheoryData<string, string, string> Tables => new()
    {
        {
            "a spreadsheet's tabs",
            "Specimen\tMold + wet soil\tTin\tTin + wet soil\tTin + dry soil\n1\t6027\t29.42\t138.80\t129.06\n2\t6137.5\t33.51\t180.20\t164.53",
            TwoWeighed
        },
        {
            "semicolons and decimal commas",
            "Specimen;Mold + wet soil;Tin;Tin + wet soil;Tin + dry soil\n1;6027,0;29,42;138,80;129,06\n2;6137,5;33,51;180,20;164,53",
            TwoWeighed
        },
        {
            "tabs and decimal commas",
            "Specimen\tMold + wet soil\tTin\tTin + wet soil\tTin + dry soil\n1\t6027\t29,42\t138,80\t129,06\n2\t6137,5\t33,51\t180,20\t164,53",
            TwoWeighed
        },
        {
            "commas, the contract's names",
            "label,moldAndWetSoil,tin,tinAndWet,tinAndDry\n1,6027,29.42,138.80,129.06\n2,6137.5,33.51,180.20,164.53",
            TwoWeighed
        },
        {
            "the contract's members of a tin",
            "label,moldAndWetSoil,tin,wet,dry\n1,6027,29.42,138.80,129.06\n2,6137.5,33.51,180.20,164.53",
            TwoWeighed
        },
        {
            "commas with spaces behind them",
            "Specimen, Mold + wet soil, Tin, Tin + wet soil, Tin + dry soil\n1, 6027, 29.42, 138.80, 129.06\n2, 6137.5, 33.51, 180.20, 164.53",
            TwoWeighed
        },
        {
            "single spaces, in the header too",
            "Specimen Mold + wet soil Tin Tin + wet soil Tin + dry soil\n1 6027 29.42 138.80 129.06\n2 6137.5 33.51 180.20 164.53",
            TwoWeighed
        },
        {
            "columns lined up by spaces",
            "Specimen   Mold + wet soil   Tin     Tin + wet soil   Tin + dry soil\n1          6027              29.42   138.80           129.06\n2          6137.5            33.51   180.20           164.53",
            TwoWeighed
        },
        {
            "spaces and decimal commas",
            "Specimen Mold + wet soil Tin Tin + wet soil Tin + dry soil\n1 6027 29,42 138,80 129,06\n2 6137,5 33,51 180,20 164,53",
            TwoWeighed
        },
        {
            "capitals, another spelling, other punctuation",
            "SPECIMEN NO.\tMass of MOULD & wet soil\tMass of tin\tTin and wet soil\ttin_dry soil\n1\t6027\t29.42\t138.80\t129.06\n2\t6137.5\t33.51\t180.20\t164.53",
            TwoWeighed
        },
        {
            "cans instead of tins",
            "No\tMold + moist soil\tCan\tCan + wet soil\tCan + dry soil\n1\t6027\t29.42\t138.80\t129.06\n2\t6137.5\t33.51\t180.20\t164.53",
            TwoWeighed
        },
        {
            "empty rows and stray spaces",
            "\n\n  Specimen \t Mold + wet soil\tTin\tTin + wet soil\tTin + dry soil \n\n 1\t 6027 \t29.42\t138.80\t129.06\n\t\t\t\t\n2\t6137.5\t33.51\t180.20\t164.53\n\n",
            TwoWeighed
        },
        {
            "CRLF and empty cells at the end",
            "Specimen\tMold + wet soil\tTin\tTin + wet soil\tTin + dry soil\t\t\r\n1\t6027\t29.42\t138.80\t129.06\t\t\r\n2\t6137.5\t33.51\t180.20\t164.53\t\t\r\n",
            TwoWeighed
        },
        {
            "the form's own units in the header",
            "Specimen\tMold + wet soil [g]\tTin [g]\tTin + wet soil (g)\tTin + dry soil, g\n1\t6027\t29.42\t138.80\t129.06\n2\t6137.5\t33.51\t180.20\t164.53",
            TwoWeighed
        },
        {
            "a mold weighed in kg, tins in g",
            "Specimen\tMold + wet soil [kg]\tTin [g]\tTin + wet soil [g]\tTin + dry soil [g]\n1\t6.027\t29.42\t138.80\t129.06\n2\t6.1375\t33.51\t180.20\t164.53",
            TwoWeighed
        },
        {
            "a row of units below the names",
            "Specimen\tMold + wet soil\tTin\tTin + wet soil\tTin + dry soil\n-\tkg\tg\tg\tg\n1\t6.027\t29.42\t138.80\t129.06\n2\t6.1375\t33.51\t180.20\t164.53",
            TwoWeighed
        },
        {
            "specimens across",
            "Specimen\t1\t2\nMold + wet soil\t6027\t6137.5\nTin\t29.42\t33.51\nTin + wet soil\t138.80\t180.20\nTin + dry soil\t129.06\t164.53",
            TwoWeighed
        },
        {
            "no header, five columns",
            "1\t6027\t29.42\t138.80\t129.06\n2\t6137.5\t33.51\t180.20\t164.53",
            TwoWeighed
        },
        {
            "no header, four columns",
            "6027 29.42 138.80 129.06",
            """[{"moldAndWetSoil":6027,"tins":[{"tin":29.42,"wet":138.8,"dry":129.06}]}]"""
        },
        {
            "no header, eight columns: two tins",
            "1;6027;29.42;138.80;129.06;28.93;136.50;126.92",
            TwoTins
        },
        {
            "no header, two columns",
            "10.4 1.702\n13.9 1.833",
            """[{"dryDensity":1.702,"waterContent":10.4},{"dryDensity":1.833,"waterContent":13.9}]"""
        },
        { "no header, three columns", "A;10.4;1.702\nB;13.9;1.833", TwoReduced },
        { "no header, spaces and decimal commas", "A 10,4 1,702\nB 13,9 1,833", TwoReduced },
        { "decimal commas before three digits, beside one that tells", "Specimen;Water content;Dry density\nA;10,4;1,702\nB;13,9;1,833", TwoReduced },
        { "quotation marks round decimal commas", "\"Specimen\",\"Water content\",\"Dry density\"\n\"A\",\"10,4\",\"1,702\"\n\"B\",\"13,9\",\"1,833\"", TwoReduced },
        {
            "a tin's columns twice",
            "Specimen\tMold + wet soil\tTin\tTin + wet soil\tTin + dry soil\tTin\tTin + wet soil\tTin + dry soil\n1\t6027\t29.42\t138.80\t129.06\t28.93\t136.50\t126.92",
            TwoTins
        },
        {
            "tins by number, grouped by weighing",
            "Specimen\tMold + wet soil\tTin 1\tTin 2\tTin 1 + wet soil\tTin 2 + wet soil\tTin 1 + dry soil\tTin 2 + dry soil\n1\t6027\t29.42\t28.93\t138.80\t136.50\t129.06\t126.92",
            TwoTins
        },
        {
            "a second tin that one specimen has not",
            "Specimen\tMold + wet soil\tTin\tTin + wet soil\tTin + dry soil\tTin 2\tTin 2 + wet soil\tTin 2 + dry soil\n1\t6027\t\t\t\t28.93\t136.50\t126.92",
            """[{"label":"1","moldAndWetSoil":6027,"tins":[{"tin":28.93,"wet":136.5,"dry":126.92}]}]"""
        },
        {
            "a specimen set aside, with its reason",
            "Specimen\tWater content\tDry density\tSet aside\nA\t10.4\t1.702\nB\t13.9\t1.833\tmold not full",
            """[{"label":"A","dryDensity":1.702,"waterContent":10.4},{"label":"B","dryDensity":1.833,"waterContent":13.9,"setAside":"mold not full"}]"""
        },
        {
            "a reason of several words between spaces",
            "Specimen Water content Dry density Set aside\nB 13.9 1.833 mold not full",
            """[{"label":"B","dryDensity":1.833,"waterContent":13.9,"setAside":"mold not full"}]"""
        },
        {
            "a quoted reason with the separator, a quotation mark and a line break",
            "Specimen,Water content,Dry density,Set aside\nB,13.9,1.833,\"not \"\"full\"\",\nrepeated\"",
            """[{"label":"B","dryDensity":1.833,"waterContent":13.9,"setAside":"not \"full\", repeated"}]"""
        },
        {
            "wet mass and water content in percent",
            "Specimen\tWet mass [g]\tMoisture content (%)\nA\t1771.4\t10.4",
            """[{"label":"A","wetMass":1771.4,"waterContent":10.4}]"""
        },
        {
            "a bare wet and dry beside no tin name no weighing",
            "Specimen\tMass of wet soil\tw\nA\t1771.4\t10.4",
            """[{"label":"A","wetMass":1771.4,"waterContent":10.4}]"""
        },
        {
            // 100 lb/ft³ = 100 · 0.45359237 / 0.3048³ kg/m³, both exact by definition (international yard and pound).
            "densities in lb/ft³ for a form in Mg/m³",
            "Water content\tDry density [pcf]\n10.4\t100",
            """[{"dryDensity":1.60184633739601,"waterContent":10.4}]"""
        },
        {
            "a mold of its own for each specimen, volume in L",
            "Specimen\tMold\tMold volume [L]\tMold + wet soil\tWater content\nA\t4250\t0.9433\t6027\t10.4",
            """[{"label":"A","moldAndWetSoil":6027,"mold":{"mass":4250,"volume":943.3},"waterContent":10.4}]"""
        },
        {
            "a depth below the rim in mm, after a comma as on the sheet with blanks",
            "Specimen\tMold + wet soil\tDepth below the rim, mm\tWater content\nA\t6027\t3.2\t10.4",
            """[{"label":"A","moldAndWetSoil":6027,"depthBelowRim":3.2,"waterContent":10.4}]"""
        },
        {
            "a depth below the rim in inches for a form in mm",
            "Mold + wet soil\tBelow rim [in]\tWater content\n6027\t0.125\t10.4",
            """[{"moldAndWetSoil":6027,"depthBelowRim":3.175,"waterContent":10.4}]"""
        },
        {
            "water content on wet mass",
            "Wet density\tWet basis\n1.88\t9.4",
            """[{"wetDensity":1.88,"wetBasis":9.4}]"""
        },
        {
            "a real minus, which the rules then refuse",
            "Water content\tDry density\n−1.5\t1.70",
            """[{"dryDensity":1.7,"waterContent":-1.5}]"""
        },
    };

    [Theory]
    [MemberData(nameof(Tables))]
    public void A_table_is_read_whatever_its_shape(string shape, string text, string specimens)
    {
        var reading = TableReader.Read(text, new UnitSet());
        Assert.True(reading.Faults.Count == 0, $"{shape}: {string.Join(" ", reading.Faults.Select(fault => fault.Message))}");
        Assert.Equal(specimens, JsonSerializer.Serialize(reading.Sheet!.Specimens, Shown));
    }

    public static TheoryData<string, string, string, string> Refusals => new()
    {
        { "no text at all", "  \n \t \n", "/specimens", "empty-table" },
        { "a header and nothing below", "Specimen\tWater content\tDry density", "/specimens", "empty-table" },
        { "one column", "10.4\n13.9", "/specimens", "unknown-columns" },
        { "six columns without a header", "1 2 3 4 5 6", "/specimens", "unknown-columns" },
        { "a column that is not used", "Specimen\tTin no.\tWater content\tDry density\nA\t7\t10.4\t1.702", "/specimens", "unknown-column" },
        { "a dry mass without a tin", "Specimen\tMold + wet soil\tDry soil\nA\t6027\t1600", "/specimens", "unknown-column" },
        { "a column without a name", "Specimen\t\tWater content\tDry density\nA\t7\t10.4\t1.702", "/specimens", "unknown-column" },
        { "a column twice", "Water content\tDry density\tWater content\n10.4\t1.702\t10.4", "/specimens", "repeated-column" },
        { "a tin's number twice", "Mold + wet soil\tTin 1\tTin 1\tTin + wet soil\tTin + dry soil\n6027\t1\t2\t3\t2", "/specimens", "repeated-column" },
        { "a unit that is none", "Water content\tDry density [oz/gal]\n10.4\t1.702", "/specimens", "unknown-unit" },
        { "a fraction for a percentage", "Water content [-]\tDry density\n0.104\t1.702", "/specimens", "unknown-unit" },
        { "a unit of mass for a density", "Water content\tDry density [kg]\n10.4\t1.702", "/specimens", "unknown-unit" },
        { "a quotation mark left open", "Specimen,Water content,Dry density\n\"A,10.4,1.702", "/specimens", "unclosed-quotation" },
        { "a cell too many", "Water content;Dry density\n10.4;1.702;3", "/specimens/0", "too-many-cells" },
        { "thousands grouped beside decimals", "Mold + wet soil;Water content\n6.021,4;10,4", "/specimens/0/moldAndWetSoil", "not-a-number" },
        { "thousands grouped the other way", "Mold + wet soil\tWater content\n6,021.4\t10.4", "/specimens/0/moldAndWetSoil", "not-a-number" },
        { "thousands grouped by a no-break space", "Mold + wet soil\tWater content\n6\u00a0021,4\t10,4", "/specimens/0/moldAndWetSoil", "not-a-number" },
        { "thousands grouped by an apostrophe", "Mold + wet soil\tWater content\n6'021.4\t10.4", "/specimens/0/moldAndWetSoil", "not-a-number" },
        { "a comma that may group, and nothing that tells", "Mold + wet soil\tWater content\n6,021\t10", "/specimens/0/moldAndWetSoil", "not-a-number" },
        { "a comma among points", "Water content\tDry density\n10.4\t1.702\n13,9\t1.833", "/specimens/1/waterContent", "not-a-number" },
        { "a point among commas", "Water content;Dry density\n10,4;1,75\n13,9;1.833", "/specimens/1/dryDensity", "not-a-number" },
        { "a word for a number", "Water content\tDry density\nabout ten\t1.702", "/specimens/0/waterContent", "not-a-number" },
        { "a unit in the cell", "Water content\tDry density\n10.4 %\t1.702", "/specimens/0/waterContent", "not-a-number" },
        { "an exponent", "Water content\tDry density\n1e1\t1.702", "/specimens/0/waterContent", "not-a-number" },
        { "infinity", "Water content\tDry density\nInfinity\t1.702", "/specimens/0/waterContent", "not-a-number" },
        { "a number without end", "Water content\tDry density\n" + "1234567890123456789012345678901\t1.702", "/specimens/0/waterContent", "not-a-number" },
        { "a no for a reason", "Specimen\tWater content\tDry density\tSet aside\nA\t10.4\t1.702\tno", "/specimens/0/setAside", "unclear-reason" },
    };

    [Theory]
    [MemberData(nameof(Refusals))]
    public void What_has_no_one_reading_is_refused_at_its_place(string shape, string text, string place, string code)
    {
        var fault = Assert.Single(TableReader.Read(text, new UnitSet()).Faults);
        Assert.True((fault.Place, fault.Code) == (place, code), $"{shape}: {fault.Code} at {fault.Place}: {fault.Message}");
    }

    [Fact]
    public void All_bad_cells_are_named_at_once_and_the_others_stand()
    {
        var reading = TableReader.Read("Specimen\tWater content\tDry density\nA\tx\t1.702\nB\t13.9\ty\nC\t15.4\t1.800", new UnitSet());
        Assert.Equal(["/specimens/0/waterContent", "/specimens/1/dryDensity"], reading.Faults.Select(fault => fault.Place));
        Assert.Equal(13.9, reading.Sheet!.Specimens[1].WaterContent);
        Assert.Equal(1.8, reading.Sheet.Specimens[2].DryDensity);
    }

    [Theory]
    [InlineData(DecimalMark.Comma, 6.021)]
    [InlineData(DecimalMark.Point, null)]
    public void A_chosen_mark_settles_what_may_be_either(DecimalMark mark, double? mass)
    {
        var reading = TableReader.Read("Mold + wet soil\tWater content\n6,021\t10", new UnitSet(), mark);
        Assert.Equal(mass, reading.Sheet!.Specimens[0].MoldAndWetSoil);
        Assert.Equal(mass is null, reading.Faults.Count == 1);
    }

    [Fact]
    public void Each_member_is_traced_to_its_cell()
    {
        var sheet = TableReader.Read("Tin\tTin + wet soil\tTin + dry soil\tDry density\n29.42\t138.8\t129.06\t1.7", new UnitSet()).Sheet!;
        Assert.Equal(new CellAt(0, 2), sheet.CellOf("/specimens/0/tins/0/dry"));
        Assert.Equal(new CellAt(0, 3), sheet.CellOf("/specimens/0/dryDensity"));
        Assert.Null(sheet.CellOf("/specimens/0/waterContent"));
    }

    [Fact]
    public void Numbers_come_back_whatever_parts_them_and_whatever_their_mark()
    {
        var shapes = new (string Separator, char Mark)[] { ("\t", '.'), ("\t", ','), (";", '.'), (";", ','), (",", '.'), (" ", '.'), (" ", ',') };
        Gen.Select(Gen.Int[0, shapes.Length - 1].Select(i => shapes[i]), Gen.Int[10, 4000].Select(Gen.Int[10, 2900], (w, d) => (Water: w / 100.0, Dry: d / 1000.0)).Array[1, 12])
            .Sample((shape, rows) =>
            {
                // Two decimals of the water content tell the mark; without decimals there is nothing to tell.
                string Written(double value, string format) => value.ToString(format, CultureInfo.InvariantCulture).Replace('.', shape.Mark);
                var text = string.Join('\n', rows.Select(row => Written(row.Water, "0.00") + shape.Separator + Written(row.Dry, "0.000")));
                var reading = TableReader.Read(text, new UnitSet());
                Assert.Empty(reading.Faults);
                Assert.Equal(rows.Select(row => (row.Water, row.Dry)), reading.Sheet!.Specimens.Select(specimen => (specimen.WaterContent!.Value, specimen.DryDensity!.Value)));
            });
    }
}
