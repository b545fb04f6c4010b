using System.Reflection;
using System.Text.RegularExpressions;
using Drypeak.Figures.Layout;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Figures.Tests;

public sealed partial class LanguageTests
{
    public static TheoryData<string> Codes => [.. Language.All.Select(language => language.Code)];

    [Theory]
    [InlineData("en", "Dry density (Mg/m³)", "Water content (%)", "Adopted maximum dry density 1.84 Mg/m³ at 13.7 % water")]
    [InlineData("de", "Trockendichte (Mg/m³)", "Wassergehalt (%)", "Festgelegte größte Trockendichte 1,84 Mg/m³ bei 13,7 % Wassergehalt")]
    [InlineData("fr", "Masse volumique sèche (Mg/m³)", "Teneur en eau (%)", "Masse volumique sèche maximale retenue 1,84 Mg/m³ à 13,7 % d’eau")]
    [InlineData("es", "Densidad seca (Mg/m³)", "Humedad (%)", "Densidad seca máxima adoptada 1,84 Mg/m³ con 13,7 % de humedad")]
    [InlineData("pt", "Massa específica aparente seca (Mg/m³)", "Teor de umidade (%)", "Massa específica aparente seca máxima adotada 1,84 Mg/m³ com 13,7 % de umidade")]
    public void Axes_and_result_are_in_the_language(string code, string density, string water, string title)
    {
        var figure = Draw(Charts.Full, code);
        var texts = SvgPicture.Read(SvgWriter.Write(figure)).Texts.ToList();
        Assert.Equal(title, figure.Title);
        Assert.Contains(density, texts);
        Assert.Contains(water, texts);
    }

    [Theory]
    [MemberData(nameof(Codes))]
    public void Every_number_has_the_languages_decimal_mark(string code)
    {
        var chart = Charts.Full with { Reference = null, AirVoids = [7.5], Adopted = null };
        var figure = Draw(chart, code);
        var texts = string.Join("\n", [.. SvgPicture.Read(SvgWriter.Write(figure)).Texts, figure.Description]);
        var (point, comma) = (DecimalPoint().Count(texts), DecimalComma().Count(texts));
        Assert.True(Math.Max(point, comma) > 20);
        Assert.Equal(0, code == "en" ? comma : point);
    }

    [Theory]
    [MemberData(nameof(Codes))]
    public void A_unit_of_weight_is_called_a_unit_weight_in_every_language(string code)
    {
        static string Axis(DensityUnit unit, string code) => SvgPicture.Read(SvgWriter.Write(Draw(Charts.WithoutOptimum with { DensityUnit = unit }, code))).Texts
            .Single(text => text.EndsWith($"({unit.Symbol()})", StringComparison.Ordinal)).Split('(')[0];
        Assert.NotEqual(Axis(DensityUnit.MegagramPerCubicMeter, code), Axis(DensityUnit.KilonewtonPerCubicMeter, code));
    }

    /// <summary>A text of a translation that lacks a value, or has one too many, would lose a number or fail.</summary>
    [Theory]
    [MemberData(nameof(Codes))]
    public void A_translation_has_the_same_values_in_every_text_as_the_English_one(string code)
    {
        var (english, translated) = (Texts(Language.English.Phrases).ToList(), Texts(Of(code).Phrases).ToList());
        Assert.True(english.Count > 35);
        Assert.Equal(english.Select(Values), translated.Select(Values));
        Assert.All(translated, text => Assert.True(EmbeddedFont.SemiBold.Cut!.Covers(text) && EmbeddedFont.Regular.Cut!.Covers(text), text));

        static string Values(string text) => string.Concat(Value().Matches(text).Select(match => match.Value).Order());
    }

    [Fact]
    public void A_title_of_ones_own_stands_over_the_result_and_names_the_picture()
    {
        var figure = CompactionFigure.Draw(Charts.Ternmarsh, new FigureOptions { Title = " Borrow\tarea 7 " });
        Assert.Equal("Borrow area 7", figure.Title);
        var texts = SvgPicture.Read(SvgWriter.Write(figure)).Texts.ToList();
        Assert.Equal("Borrow area 7", texts[0]);
        Assert.StartsWith("Maximum dry density 1.83 Mg/m³ at 14.1 % water", texts[1], StringComparison.Ordinal);
    }

    [Fact]
    public void Only_the_kinds_of_lines_that_are_asked_for_are_drawn_and_described()
    {
        var figure = CompactionFigure.Draw(Charts.Ternmarsh, new FigureOptions { Lines = [PhaseLineKind.AirVoids] });
        var picture = SvgPicture.Read(SvgWriter.Write(figure));
        Assert.Equal(2, picture.OfClass("air-voids").Count());
        Assert.Empty(picture.OfClass("saturation").Concat(picture.OfClass("zero-air-voids")));
        Assert.EndsWith("Lines: air voids 5 %, air voids 10 %.", figure.Description, StringComparison.Ordinal);
        Assert.DoesNotContain("Lines", CompactionFigure.Draw(Charts.Ternmarsh, new FigureOptions { Lines = [] }).Description, StringComparison.Ordinal);
    }

    private static IEnumerable<string> Texts(object words) => words.GetType().GetProperties(BindingFlags.Public | BindingFlags.Instance)
        .SelectMany(member => member.GetValue(words) switch
        {
            string text => [text],
            Phrases.TermPair pair => [pair.Density, pair.UnitWeight],
            (string one, string other) => [one, other],
            Phrases.Description sentences => Texts(sentences),
            _ => (string[])[],
        });

    private static Language Of(string code) => Language.All.Single(language => language.Code == code);

    private static Figure Draw(CompactionChart chart, string code) => CompactionFigure.Draw(chart, new FigureOptions { Language = Of(code) });

    [GeneratedRegex(@"\d\.\d")]
    private static partial Regex DecimalPoint();

    [GeneratedRegex(@"\d,\d")]
    private static partial Regex DecimalComma();

    [GeneratedRegex(@"\{\d\}")]
    private static partial Regex Value();
}
