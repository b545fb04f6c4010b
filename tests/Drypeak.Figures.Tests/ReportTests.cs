using System.Text;
using CsCheck;
using Drypeak.Figures.Drawing;
using Xunit;

namespace Drypeak.Figures.Tests;

public sealed class ReportTests
{
    private static Report Ternmarsh { get; } = new()
    {
        Kind = "Laboratory compaction test",
        Reference = "Ternmarsh, borrow area 7, sample 3",
        Result = "Maximum dry density 1.83 Mg/m³ at 14.1 % water content",
        Support = "95 % interval 1.81 to 1.84 Mg/m³ and 13.6 to 14.6 %",
        Identification = [new("project", "Ternmarsh flood embankment"), new("sampled at", "borrow area 7, 1.2 m deep"), new("soil", "brown sandy clay")],
        Method = [new("Method", "ASTM D698, method A"), new("Specific gravity", "2.68, measured")],
        Table = new("Specimens", ["Specimen", "Water (%)", "Dry (Mg/m³)"], [.. Charts.Full.Specimens.Select(specimen => (IReadOnlyList<string>)[specimen.Label!, $"{specimen.WaterContent:0.0}", $"{specimen.DryDensity:0.000}"])], ["6 set aside: mold not full"]),
        Picture = options => CompactionFigure.Draw(Charts.Full, options),
        Results = [new("Saturation at the optimum", "86 %")],
        Findings = [new("warning", "Specimen 6 stands far off the curve. Look at its weighings.", "Leave-one-out error over 3 standard deviations")],
        Cautions = ["This is arithmetic on the data given."],
        Provenance = "Drypeak, input sha256:6f1c",
        Address = "/v1/reports/moisture-density.pdf?d=" + new string('a', 400),
    };

    public static TheoryData<string> Papers => [.. Paper.All.Select(paper => paper.Name)];

    [Theory]
    [MemberData(nameof(Papers))]
    public void A_usual_report_is_one_page_that_says_everything(string paper)
    {
        var page = Assert.Single(ReportFigure.Draw(Ternmarsh, Of(paper), Theme.Light));
        var picture = SvgPicture.Read(SvgWriter.Write(page));
        picture.AssertReadable(Of(paper).Size);
        var all = string.Join(' ', picture.Texts);
        foreach (var text in (string[])
        [
            Ternmarsh.Kind, Ternmarsh.Reference!, Ternmarsh.Result, Ternmarsh.Support!, "Ternmarsh flood embankment", "brown sandy clay", "ASTM D698, method A", "1.826", "6 set aside: mold not full",
            "Saturation at the optimum", "warning", "Look at its weighings.", "Leave-one-out error", "This is arithmetic", "Tested by, date", "Approved by, date", "sha256:6f1c", "page 1 of 1",
        ])
        {
            Assert.Contains(text, all, StringComparison.Ordinal);
        }

        Assert.Equal(400 + "/v1/reports/moisture-density.pdf?d=".Length, picture.Texts.SkipWhile(text => !text.StartsWith("/v1/", StringComparison.Ordinal)).TakeWhile(text => !text.StartsWith("Drypeak", StringComparison.Ordinal)).Sum(text => text.Length));
        Assert.Equal(6, picture.OfClass("specimen").Count());
    }

    [Fact]
    public void The_picture_does_not_say_again_what_the_report_says()
    {
        var texts = SvgPicture.Read(SvgWriter.Write(ReportFigure.Draw(Ternmarsh, Paper.A4, Theme.Light)[0])).Texts;
        Assert.DoesNotContain(texts, text => text.StartsWith("Adopted maximum", StringComparison.Ordinal));
    }

    [Fact]
    public void Working_begins_a_page_of_its_own_and_goes_on_as_far_as_it_needs()
    {
        var report = Ternmarsh with { Working = [.. Enumerable.Range(1, 120).Select(i => new ReportStep($"quantity {i}", "w = m/n", $"{i}/7", $"{i / 7.0:0.000} %", "ASTM D2216"))] };
        var pages = ReportFigure.Draw(report, Paper.A4, Theme.Print);
        Assert.True(pages.Count > 2);
        Assert.DoesNotContain("quantity 1", Texts(pages[0]));
        Assert.Contains("quantity 1", Texts(pages[1]));
        Assert.Contains("quantity 120", Texts(pages[^1]));
        Assert.All(pages, (page, i) => Assert.Contains($"page {i + 1} of {pages.Count}", Texts(page)));
    }

    [Fact]
    public void A_tables_heads_stand_again_where_it_goes_on()
    {
        var report = Ternmarsh with { Table = Ternmarsh.Table! with { Rows = [.. Enumerable.Range(1, 200).Select(i => (IReadOnlyList<string>)[$"S{i}", "1", "2"])] } };
        var pages = ReportFigure.Draw(report, Paper.Letter, Theme.Light).Where(page => Texts(page).Any(text => text.StartsWith('S') && text.Length < 5)).ToList();
        Assert.True(pages.Count > 2);
        Assert.All(pages, page => Assert.Contains("Water (%)", Texts(page)));
    }

    /// <summary>Spaces at line breaks apart, every letter that is given is on some page.</summary>
    [Fact]
    public void No_text_is_cut_whatever_its_length_and_nothing_overlaps()
    {
        var text = Gen.Select(Gen.OneOf("lorem", "Überhöhung", "W", "a/b-c", new string('M', 90)).Array[0, 120], words => string.Join(' ', words));
        var facts = Gen.Select(Gen.OneOf("project", "soil", "when"), text, (label, value) => new ReportFact(label, value)).Array[0, 30];
        Gen.Select(text, facts, Gen.Select(text, text, (message, basis) => new ReportFinding("note", message, basis)).Array[0, 30], text.Array[0, 12], Gen.Bool).Sample((support, identification, findings, cautions, letter) =>
        {
            var paper = letter ? Paper.Letter : Paper.A4;
            var pages = ReportFigure.Draw(Ternmarsh with { Support = support, Identification = identification, Findings = findings, Cautions = cautions }, paper, Theme.Light);
            Assert.All(pages, page => SvgPicture.Read(SvgWriter.Write(page)).AssertReadable(paper.Size));
            var written = Squeezed(string.Concat(pages.SelectMany(Texts)));
            Assert.Contains(Squeezed(support), written, StringComparison.Ordinal);
            foreach (var said in identification.Where(fact => Squeezed(fact.Text).Length < 30).Select(fact => fact.Text).Concat(cautions))
            {
                Assert.Contains(Squeezed(said), written, StringComparison.Ordinal);
            }

            var letters = written.Length;
            Assert.True(letters >= new[] { support }.Concat(identification.Select(fact => fact.Text)).Concat(findings.SelectMany(finding => new[] { finding.Message, finding.Basis })).Concat(cautions).Sum(said => Squeezed(said).Length));
        }, iter: 60);
    }

    [Fact]
    public void A_wrapped_text_has_all_its_words_and_no_line_is_wider_than_asked()
    {
        Gen.Select(Gen.String[Gen.OneOf(Gen.Char['a', 'z'], Gen.Const(' '), Gen.Char['A', 'Ω']), 0, 200], Gen.Double[20, 400]).Sample((text, width) =>
        {
            var lines = PlainText.Wrap(text, EmbeddedFont.Regular, 12, width);
            Assert.Equal(Squeezed(text), Squeezed(string.Concat(lines)));
            Assert.All(lines, line => Assert.True(EmbeddedFont.Regular.Measure(line, 12) <= width || new System.Globalization.StringInfo(line).LengthInTextElements == 1));
        }, iter: 500);
    }

    [Fact]
    public void The_same_report_is_the_same_bytes_and_its_address_leads_there()
    {
        var pdf = PdfWriter.Write(ReportFigure.Draw(Ternmarsh, Paper.A4, Theme.Light));
        Assert.Equal(pdf, PdfWriter.Write(ReportFigure.Draw(Ternmarsh with { }, Paper.A4, Theme.Light)));
        Assert.InRange(pdf.Length, 1, 100_000);
        var text = Encoding.Latin1.GetString(pdf);
        Assert.Contains("/URI (/v1/reports/moisture-density.pdf?d=aaa", text, StringComparison.Ordinal);
        Assert.Contains("/MediaBox [0 0 596 842]", text, StringComparison.Ordinal);
    }

    private static Paper Of(string name) => Paper.All.Single(paper => paper.Name == name);

    private static List<string> Texts(Figure page) => [.. SvgPicture.Read(SvgWriter.Write(page)).Texts];

    private static string Squeezed(string text) => text.Replace(" ", "", StringComparison.Ordinal);
}
