using System.Globalization;

namespace Drypeak.Figures.Layout;

/// <summary>The words of one language that a compaction figure is written in. In texts, {0} and what follows stand for values.</summary>
internal sealed record Phrases
{
    /// <summary>Whether numbers have a comma before their decimals.</summary>
    public bool DecimalComma { get; init; }

    /// <summary>Dry density, and dry unit weight.</summary>
    public required TermPair DryDensity { get; init; }

    /// <summary>The maximum dry density, or dry unit weight.</summary>
    public required TermPair Maximum { get; init; }

    /// <summary>The same as an engineer adopted it.</summary>
    public required TermPair AdoptedMaximum { get; init; }

    /// <summary>Water content.</summary>
    public required string WaterContent { get; init; }

    /// <summary>{0} a water content.</summary>
    public required string AtWater { get; init; }

    /// <summary>There is none, in two halves between which a line may break.</summary>
    public required (string First, string Second) NoOptimum { get; init; }

    /// <summary>{0} a value, {1} another.</summary>
    public required string Range { get; init; }

    /// <summary>{0} one interval or two.</summary>
    public required string Interval { get; init; }

    /// <summary>{0} one text, {1} another.</summary>
    public required string And { get; init; }

    /// <summary>What the bars on the marks are.</summary>
    public required string Bars { get; init; }

    /// <summary>What the band about the curve is.</summary>
    public required string Band { get; init; }

    /// <summary>Void ratio.</summary>
    public required string VoidRatio { get; init; }

    /// <summary>The models of curves, by their names in an answer.</summary>
    public required IReadOnlyDictionary<string, string> Models { get; init; }

    /// <summary>{0} a density, {1} a water content.</summary>
    public required string DensityAtWater { get; init; }

    /// <summary>Beside the mark of the adopted optimum.</summary>
    public required string Adopted { get; init; }

    /// <summary>Beside the mark of the fitted optimum.</summary>
    public required string Fitted { get; init; }

    /// <summary>Beside the mark of the corrected optimum, in full and in brief.</summary>
    public required (string Full, string Brief) Corrected { get; init; }

    /// <summary>Of a specimen that is not fitted.</summary>
    public required string SetAside { get; init; }

    /// <summary>What a field test came to.</summary>
    public required (string Met, string NotMet, string Undecided) Outcomes { get; init; }

    /// <summary>At the next specimen's place, in full and in brief.</summary>
    public required (string Full, string Brief) Next { get; init; }

    /// <summary>The zero-air-voids line.</summary>
    public required string ZeroAirVoids { get; init; }

    /// <summary>{0} a degree of saturation; and with its symbol.</summary>
    public required (string Full, string Brief) Saturation { get; init; }

    /// <summary>{0} a share of air voids; and with its symbol.</summary>
    public required (string Full, string Brief) AirVoids { get; init; }

    /// <summary>The sentences for who cannot see the picture.</summary>
    public required Description Describe { get; init; }

    /// <summary>A number with a decimal point, or a text with such numbers, as this language writes it.</summary>
    public string Number(string text) => DecimalComma ? text.Replace('.', ',') : text;

    /// <summary>A text with its values.</summary>
    public static string Fill(string template, params object[] values) => string.Format(CultureInfo.InvariantCulture, template, values);

    /// <summary>A term for a quantity that is a mass or a weight to a volume.</summary>
    public sealed record TermPair(string Density, string UnitWeight);

    /// <summary>Sentences of a figure's description.</summary>
    /// <param name="NoSpecimens">{0} the quantity.</param>
    /// <param name="Specimens">{0} the quantity, {1} a count with its noun, {2} the water contents, {3} the densities.</param>
    /// <param name="One">One specimen.</param>
    /// <param name="Many">{0} specimens.</param>
    /// <param name="ManySetAside">{0} specimens, {1} of them set aside.</param>
    /// <param name="NoResult">There is no optimum.</param>
    /// <param name="Result">{0} the maximum as fitted or adopted, {1} its value, {2} the optimum water content.</param>
    /// <param name="Fitted">{0} the fitted maximum, {1} its water content, where another was adopted.</param>
    /// <param name="Corrected">{0} the corrected maximum, {1} its water content.</param>
    /// <param name="Bars">What the bars are.</param>
    /// <param name="Lines">{0} the lines' names.</param>
    /// <param name="Next">{0} a water content.</param>
    /// <param name="Band">What the band is.</param>
    /// <param name="FieldTests">{0} how many, {1} each outcome with how many have it; empty where none was judged.</param>
    /// <param name="Zone">{0} the zone's name.</param>
    public sealed record Description(
        string NoSpecimens, string Specimens, string One, string Many, string ManySetAside, string NoResult, string Result, string Fitted, string Corrected, string Bars, string Lines, string Next, string Band, string FieldTests, string Zone);
}
