using System.Text;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;
using Xunit;

namespace Drypeak.Figures.Tests;

/// <summary>The laboratory sheet: one page of A4 for every method, with what is known printed and what is measured left blank.</summary>
public sealed class LaboratorySheetTests
{
    /// <summary>15 mm of margin, less what a line's descent takes of it.</summary>
    private const double Margin = 52;

    public static TheoryData<string, int> Sheets => [.. TestMethodCatalogue.Codes.Prepend("").SelectMany(code => new[] { 1, 5, LaboratorySheet.MostSpecimens }.Select(count => (code, count)))];

    [Theory]
    [MemberData(nameof(Sheets))]
    public void No_two_texts_overlap_and_all_stand_within_the_margins(string method, int specimens)
    {
        var sheet = new LaboratorySheet
        {
            Method = TestMethodCatalogue.Find(method),
            Reference = string.Join(' ', Enumerable.Repeat("Ternmarsh", 22)),
            WaterContents = [.. Enumerable.Range(0, specimens).Select(i => (double?)(100.25 - (i * 12.5)))],
            MassUnit = MassUnit.Kilogram,
        };
        var boxes = Picture(sheet).TextBoxes.ToList();
        var (width, height) = (Paper.A4.Size.Width, Paper.A4.Size.Height);
        for (var i = 0; i < boxes.Count; i++)
        {
            Assert.True(boxes[i].Size >= 10, $"{boxes[i]} is too small to print.");
            Assert.True(boxes[i].Left >= Margin && boxes[i].Top >= Margin && boxes[i].Right <= width - Margin && boxes[i].Bottom <= height - Margin, $"{boxes[i]} leaves the page.");
            var other = boxes.Skip(i + 1).FirstOrDefault(boxes[i].Overlaps);
            Assert.True(other is null, $"{boxes[i]} overlaps {other}.");
        }
    }

    [Fact]
    public void The_method_and_the_water_contents_aimed_at_are_printed()
    {
        var texts = Picture(Ternmarsh).Texts.ToList();
        string[] expected =
        [
            "ASTM D698, method A", "Ternmarsh, sample 3", "943 cm³ ± 14 cm³†", "2.495 kg ± 0.009 kg†", "305 mm", "3 × 25", "594 kJ/m³", "4.75 mm",
            "10", "12.5", "15", "Mold + wet soil, g", "Tin + wet soil, g", "Tin + dry soil, g", "Retained on 4.75 mm, %",
        ];
        Assert.Superset(expected.ToHashSet(), texts.ToHashSet());
        Assert.Equal(2, texts.Count(text => text == "Tin, g"));
    }

    [Fact]
    public void Only_a_method_by_vibration_asks_for_the_depth_below_the_rim()
    {
        const string depth = "Depth below the rim, mm";
        Assert.DoesNotContain(depth, Picture(Ternmarsh).Texts);
        var texts = Picture(Ternmarsh with { Method = TestMethodCatalogue.Find("bs-1377-4-3.7") }).Texts.ToList();
        Assert.Contains(depth, texts);
        Assert.Contains("Vibration of each layer", texts);
    }

    [Fact]
    public void Without_a_method_its_apparatus_is_left_to_be_written()
    {
        var texts = Picture(Ternmarsh with { Method = null }).Texts.ToList();
        Assert.Superset(new HashSet<string> { "Rammer", "Drop", "Layers × blows" }, texts.ToHashSet());
        Assert.DoesNotContain("594 kJ/m³", texts);
    }

    [Fact]
    public void As_pdf_it_is_one_page_of_a4_and_the_same_bytes_each_time()
    {
        var pdf = PdfWriter.Write(LaboratorySheetFigure.Draw(Ternmarsh));
        Assert.Equal(pdf, PdfWriter.Write(LaboratorySheetFigure.Draw(Ternmarsh with { WaterContents = [10, 12.5, 15] })));
        var text = Encoding.Latin1.GetString(pdf);
        // 210 × 297 mm are 595.28 × 841.89 points (ISO 216).
        Assert.Contains("/MediaBox [0 0 596 842]", text, StringComparison.Ordinal);
        Assert.Contains("/Count 1", text, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(0)]
    [InlineData(LaboratorySheet.MostSpecimens + 1)]
    public void A_page_has_columns_for_one_to_eight_specimens(int specimens) =>
        Assert.Throws<ArgumentOutOfRangeException>(() => LaboratorySheetFigure.Draw(Ternmarsh with { WaterContents = new double?[specimens] }));

    private static LaboratorySheet Ternmarsh { get; } = new()
    {
        Method = TestMethodCatalogue.Find("astm-d698-a"),
        Reference = "Ternmarsh,\nsample 3",
        WaterContents = [10, 12.5, 15],
    };

    private static SvgPicture Picture(LaboratorySheet sheet) => SvgPicture.Read(SvgWriter.Write(LaboratorySheetFigure.Draw(sheet)));
}
