using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;
using CsCheck;
using Drypeak.Figures.Drawing;
using SkiaSharp;
using Xunit;

namespace Drypeak.Figures.Tests;

/// <summary>Letters that the main font lacks.</summary>
public sealed partial class OtherScriptsTests
{
    /// <summary>The same words, "flood embankment" or nearly so, in scripts that the fallbacks cover.</summary>
    public static TheoryData<string, string> Covered => new()
    {
        { "Arabic", "سد الفيضان" },
        { "Hebrew", "סוללת הצפה" },
        { "Devanagari", "बाढ़ तटबंध" },
        { "Thai", "คันกั้นน้ำ" },
        { "Han", "防洪堤" },
        { "Han", "ため池の堤" },
    };

    [Theory]
    [MemberData(nameof(Covered))]
    public void A_text_in_another_script_is_set_in_the_font_for_it_with_every_letter(string script, string text)
    {
        var pieces = SetText.Of(text, EmbeddedFont.Regular);
        Assert.All(pieces.Where(piece => piece.Text.Any(char.IsLetter)), piece => Assert.Contains(script, Name(piece), StringComparison.Ordinal));
        Assert.All(pieces.Select(piece => piece.Shaped).OfType<ShapedText>(), shaped => Assert.DoesNotContain((ushort)0, shaped.Glyphs));
        Assert.True(SetText.IsCovered(text, EmbeddedFont.Regular));
        Assert.Equal(pieces.Sum(piece => piece.Width) * 20, EmbeddedFont.Regular.Measure(text, 20), 1e-9);

        static string Name(TextPiece piece) => piece.Face!.Typeface.FamilyName.Replace(" SC", " Han", StringComparison.Ordinal);
    }

    /// <summary>Joined letters have forms of their own: a word is other glyphs than its letters apart.</summary>
    [Fact]
    public void Arabic_letters_are_joined_and_stand_from_the_right()
    {
        var word = Assert.Single(SetText.Of("سلام", EmbeddedFont.Regular)).Shaped!;
        var apart = "سلام".SelectMany(letter => SetText.Of(letter.ToString(), EmbeddedFont.Regular)[0].Shaped!.Glyphs).ToList();
        Assert.True(word.Glyphs.Except(apart).Count() >= 2, "The letters stand apart.");
        Assert.True(word.Places[0].X < word.Places[^1].X);
        Assert.Equal(SetText.Of("م", EmbeddedFont.Regular)[0].Shaped!.Glyphs, word.Glyphs[..1]);
    }

    [Theory]
    [InlineData("abc", "abc")]
    [InlineData("abc אבג def", "abc |<אבג| def")]
    [InlineData("אבג 12 דהו", "< דהו|12|<אבג ")]
    [InlineData("lift 4, אבג 1+240 m", "lift 4, |1+240|<אבג | m")]
    [InlineData("سد 1.83 Mg", "1.83|<سد | Mg")]
    [InlineData("(אבג)", "(|<אבג|)")]
    [InlineData("", "")]
    public void Runs_stand_from_left_to_right_as_a_reader_of_both_directions_expects(string text, string expected) =>
        Assert.Equal(expected, string.Join('|', ReadingOrder.Of(text).Select(run => (run.RightToLeft ? "<" : "") + run.Text)));

    [Fact]
    public void No_letter_is_lost_whatever_the_order()
    {
        Gen.String[Gen.OneOf(Gen.Char, Gen.Char['\u0590', '\u06FF'], Gen.Char[' ', '~'])].Sample(text =>
        {
            var clean = PlainText.Clean(text);
            var runs = ReadingOrder.Of(clean);
            Assert.Equal(clean.EnumerateRunes().Order(), runs.SelectMany(run => run.Text.EnumerateRunes()).Order());
        }, iter: 500);
    }

    [Theory]
    [InlineData("한", "U+D55C")]
    [InlineData("😀", "U+1F600")]
    [InlineData("Lot ᚠ 7", "Lot U+16A0 7")]
    public void A_letter_that_no_embedded_font_has_is_written_as_its_code(string text, string expected)
    {
        Assert.False(SetText.IsCovered(text, EmbeddedFont.Regular));
        Assert.Equal(expected, string.Concat(SetText.Of(text, EmbeddedFont.Regular).Select(piece => piece.Text)));
        var figure = CompactionFigure.Draw(Charts.Ternmarsh with { Reference = text }, FigureSize.Default);
        Assert.Contains(SvgPicture.Read(SvgWriter.Write(figure)).Texts, written => written.Contains(text, StringComparison.Ordinal));
    }

    [Theory]
    [MemberData(nameof(Covered))]
    public void In_PNG_it_is_inked_within_the_room_that_the_layout_gave_it(string script, string text)
    {
        var run = new TextRun(text, new Place(40, 60), 32, EmbeddedFont.Regular, ColorRole.Ink);
        var figure = new Figure(new FigureSize(480, 240), script, script, Palette.Light, [new FigurePart("text", [run])]);
        using var picture = SKBitmap.Decode(PngWriter.Write(figure));
        var ink = Enumerable.Range(0, 480).Where(x => Enumerable.Range(0, 240).Any(y => picture.GetPixel(x, y).Red < 128)).ToList();
        Assert.InRange(ink[0], 37, 48);
        Assert.InRange(ink[^1], 40 + run.Width - 12, 40 + run.Width + 3);
    }

    [Theory]
    [MemberData(nameof(Covered))]
    public void In_PDF_its_font_is_embedded(string script, string text)
    {
        var pdf = Encoding.Latin1.GetString(PdfWriter.Write(CompactionFigure.Draw(Charts.Ternmarsh with { Reference = text }, FigureSize.Default)));
        var name = script == "Han" ? "NotoSansSC" : "NotoSans" + script;
        Assert.Contains(FontName().Matches(pdf), match => match.Groups[1].Value.StartsWith(name, StringComparison.Ordinal));
        Assert.DoesNotContain("/Type3", pdf, StringComparison.Ordinal);
    }

    [Fact]
    public void Texts_are_shaped_alike_on_many_threads_at_once()
    {
        var texts = Covered.Select(row => row.Data.Item2).ToArray();
        var expected = texts.Select(text => EmbeddedFont.Regular.Measure(text, 10).ToString(CultureInfo.InvariantCulture)).ToArray();
        Parallel.For(0, 400, i => Assert.Equal(expected[i % texts.Length], EmbeddedFont.Regular.Measure(texts[i % texts.Length], 10).ToString(CultureInfo.InvariantCulture)));
    }

    [GeneratedRegex(@"/FontName /[A-Z]{6}\+([\w-]+)")]
    private static partial Regex FontName();
}
