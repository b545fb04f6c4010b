using System.Globalization;
using Drypeak.Figures;
using Drypeak.Service.Laboratory;
using Drypeak.Soil.Curves;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Charts;

/// <summary>Something that may be asked of a picture in its address.</summary>
/// <param name="Name">Its name in the query.</param>
/// <param name="Type">Of its value.</param>
/// <param name="Description">What it takes, with its bounds.</param>
/// <param name="Example">A value.</param>
/// <param name="Read">The options with it; a fault in words where the text says nothing that can be drawn.</param>
internal sealed record ChartParameter(string Name, Type Type, string Description, string Example, Func<ChartOptions, string, ReadParameter> Read);

/// <summary>What a parameter's text came to: options, or a fault's code and message.</summary>
internal readonly record struct ReadParameter(ChartOptions? Options, string Code, string Message)
{
    public static ReadParameter Of(ChartOptions options) => new(options, "", "");

    public static ReadParameter Fault(string code, string message) => new(null, code, message);
}

/// <summary>The parameters that there are, each with its bounds.</summary>
internal static class ChartParameters
{
    private const string NoLines = "none";

    private static readonly string[] LineKinds = [.. PhaseLineKindNames.All.Select(kind => kind.Name())];

    private static readonly string[] ModelNames = [.. Enum.GetValues<CurveModel>().Select(model => model.Name())];

    private static readonly ChartParameter Width = Whole("width", "Width", FigureSize.Smallest, FigureSize.Largest, "960",
        (figure, value) => figure with { Size = figure.Size with { Width = value } });

    private static readonly ChartParameter Height = Whole("height", "Height", FigureSize.Smallest, FigureSize.Largest, "640",
        (figure, value) => figure with { Size = figure.Size with { Height = value } });

    private static readonly ChartParameter Looks = Choice("theme", Theme.All, theme => theme.Name, "Ink on paper, the same on a dark ground, or black on white for printers.",
        Theme.Light, (figure, theme) => figure with { Theme = theme });

    private static readonly ChartParameter Locale = Choice("locale", Language.All, language => language.Code, "Language and decimal mark.",
        Language.English, (figure, language) => figure with { Language = language });

    private static readonly ChartParameter SecondUnit = Choice("secondUnit", SecondAxis.All, axis => axis.Name, "A unit for a second axis of density at the right, or the void ratio there.",
        new SecondAxis(DensityUnit.PoundPerCubicFoot), (figure, axis) => figure with { Second = axis });

    private static readonly ChartParameter Models = new("models", typeof(string),
        $"Other models whose curves are drawn thin, of those that the chart carries, parted by commas: {string.Join(", ", ModelNames)}.", "parabola,spline", ReadModels);

    private static readonly ChartParameter Title = new("title", typeof(string),
        $"A title in place of the result, which then stands under it: up to {FigureOptions.LongestTitle} characters.", "Borrow area 7", ReadTitle);

    private static readonly ChartParameter Lines = new("lines", typeof(string),
        $"The kinds of lines that are drawn, of those that the chart has, parted by commas: {string.Join(", ", LineKinds)}; or {NoLines}.", string.Join(',', LineKinds), ReadLines);

    /// <summary>Pixels for each px; of PNG only.</summary>
    public static ChartParameter Scale { get; } = new("scale", typeof(double),
        $"Pixels for each px of a PNG: {PngWriter.SmallestScale} to {PngWriter.LargestScale}.", "1", ReadScale);

    /// <summary>Of every picture.</summary>
    public static IReadOnlyList<ChartParameter> OfAny { get; } = [Width, Height, Looks, Title];

    /// <summary>Of a picture of dry density against water content.</summary>
    public static IReadOnlyList<ChartParameter> OfCompaction { get; } = [.. OfAny, Locale, SecondUnit, Lines, Models];

    private static ChartParameter Whole(string name, string what, int least, int greatest, string example, Func<FigureOptions, int, FigureOptions> set) =>
        new(name, typeof(int), $"{what}, px: {least} to {greatest}.", example, (options, text) =>
            int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out var value) && value >= least && value <= greatest
                ? ReadParameter.Of(options with { Figure = set(options.Figure, value) })
                : OutOfRange("a whole number", least, greatest, text));

    private static ChartParameter Choice<T>(string name, IReadOnlyList<T> choices, Func<T, string> nameOf, string what, T example, Func<FigureOptions, T, FigureOptions> set)
    {
        var names = string.Join(", ", choices.Select(nameOf));
        return new ChartParameter(name, typeof(string), $"{what} One of {names}.", nameOf(example), (options, text) =>
        {
            foreach (var choice in choices)
            {
                if (nameOf(choice) == text)
                {
                    return ReadParameter.Of(options with { Figure = set(options.Figure, choice) });
                }
            }

            return ReadParameter.Fault("unknown-choice", $"It must be one of {names}; \"{ChartOptions.Shortened(text)}\" was received.");
        });
    }

    private static ReadParameter ReadScale(ChartOptions options, string text) =>
        double.TryParse(text, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out var value) && value is >= PngWriter.SmallestScale and <= PngWriter.LargestScale
            ? ReadParameter.Of(options with { Scale = value })
            : OutOfRange("a number", PngWriter.SmallestScale, PngWriter.LargestScale, text);

    private static ReadParameter ReadTitle(ChartOptions options, string text) =>
        string.IsNullOrWhiteSpace(text) || text.Length > FigureOptions.LongestTitle
            ? ReadParameter.Fault("out-of-range", $"It must have 1 to {FigureOptions.LongestTitle} characters; {text.Length} were received. Leave it out to have the result for a title.")
            : ReadParameter.Of(options with { Figure = options.Figure with { Title = text } });

    private static ReadParameter ReadLines(ChartOptions options, string text)
    {
        var names = text == NoLines ? [] : text.Split(',');
        return names.Distinct().Count() < names.Length || names.Except(LineKinds).Any()
            ? ReadParameter.Fault("unknown-choice", $"It must be {NoLines}, or some of {string.Join(", ", LineKinds)}, each once, parted by commas; \"{ChartOptions.Shortened(text)}\" was received.")
            : ReadParameter.Of(options with { Figure = options.Figure with { Lines = [.. PhaseLineKindNames.All.Where(kind => names.Contains(kind.Name()))] } });
    }

    private static ReadParameter ReadModels(ChartOptions options, string text)
    {
        var names = text.Split(',');
        return names.Distinct().Count() < names.Length || names.Except(ModelNames).Any()
            ? ReadParameter.Fault("unknown-choice", $"It must be some of {string.Join(", ", ModelNames)}, each once, parted by commas; \"{ChartOptions.Shortened(text)}\" was received.")
            : ReadParameter.Of(options with { Figure = options.Figure with { Models = names } });
    }

    private static ReadParameter OutOfRange(string kind, double least, double greatest, string text) =>
        ReadParameter.Fault("out-of-range", string.Create(CultureInfo.InvariantCulture, $"It must be {kind} from {least} to {greatest}; \"{ChartOptions.Shortened(text)}\" was received."));
}
