using System.Globalization;
using Drypeak.Figures;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Charts;

/// <summary>How a picture is asked for in an address's query: each name is optional, and none other is taken.</summary>
/// <param name="Figure">How the figure is drawn.</param>
/// <param name="Scale">Pixels of the PNG for each px; 1 in other formats.</param>
internal sealed record ChartOptions(FigureOptions Figure, double Scale)
{
    private const string Width = "width", Height = "height", ScaleName = "scale", ThemeName = "theme", LocaleName = "locale", TitleName = "title", LinesName = "lines", SecondUnitName = "secondUnit";
    private const string NoLines = "none";

    private static readonly string[] Themes = [.. Theme.All.Select(theme => theme.Name)];
    private static readonly string[] Locales = [.. Language.All.Select(language => language.Code)];
    private static readonly DensityUnit[] DensityUnits = Enum.GetValues<DensityUnit>();
    private static readonly string[] DensityCodes = [.. DensityUnits.Select(unit => unit.Code())];
    private static readonly string[] LineKinds = [.. PhaseLineKindNames.All.Select(kind => kind.Name())];

    /// <summary>Width and height, px.</summary>
    public FigureSize Size => Figure.Size;

    /// <summary>Says in the API description what <see cref="Read"/> takes.</summary>
    public static RouteHandlerBuilder Describe(RouteHandlerBuilder endpoint, ChartFormat format)
    {
        endpoint
            .TakesQuery<int>(Width, $"Width, px: {FigureSize.Smallest} to {FigureSize.Largest}.", "960")
            .TakesQuery<int>(Height, $"Height, px: {FigureSize.Smallest} to {FigureSize.Largest}.", "640")
            .TakesQuery<string>(ThemeName, $"One of {string.Join(", ", Themes)}: ink on paper, the same on a dark ground, or black on white for printers.", Theme.Light.Name)
            .TakesQuery<string>(LocaleName, $"Language and decimal mark: one of {string.Join(", ", Locales)}.", Language.English.Code)
            .TakesQuery<string>(TitleName, $"A title in place of the result, which then stands under it: up to {FigureOptions.LongestTitle} characters.", "Borrow area 7")
            .TakesQuery<string>(SecondUnitName, $"A unit for a second axis of density at the right: one of {string.Join(", ", DensityCodes)}.", DensityUnit.PoundPerCubicFoot.Code())
            .TakesQuery<string>(LinesName, $"The kinds of lines that are drawn, of those that the chart has, parted by commas: {string.Join(", ", LineKinds)}; or {NoLines}.", string.Join(',', LineKinds));
        return format == ChartFormat.Png
            ? endpoint.TakesQuery<double>(ScaleName, $"Pixels for each px: {PngWriter.SmallestScale} to {PngWriter.LargestScale}.", "1")
            : endpoint;
    }

    /// <summary>Reads a query.</summary>
    /// <param name="query">The query.</param>
    /// <param name="format">The format drawn: it says which names there are.</param>
    /// <param name="further">Names that the endpoint reads itself.</param>
    /// <param name="faults">Receives each unknown, repeated or impossible parameter.</param>
    public static ChartOptions Read(IQueryCollection query, ChartFormat format, ReadOnlySpan<string> further, ICollection<Fault> faults)
    {
        var known = new List<string> { Width, Height, ThemeName, LocaleName, TitleName, LinesName, SecondUnitName };
        if (format == ChartFormat.Png)
        {
            known.Add(ScaleName);
        }

        foreach (var name in query.Keys)
        {
            if (!known.Contains(name) && !further.Contains(name))
            {
                faults.Add(new Fault("/" + Shortened(name), "unknown-parameter", $"There is no such parameter here. Those are: {string.Join(", ", [.. further, .. known])}."));
            }
            else if (query[name].Count > 1)
            {
                faults.Add(new Fault("/" + name, "repeated-parameter", "The parameter stands in the address more than once. Give it once."));
            }
        }

        var size = new FigureSize(
            (int)Number(query, Width, FigureSize.Smallest, FigureSize.Largest, FigureSize.Default.Width, NumberStyles.None, faults),
            (int)Number(query, Height, FigureSize.Smallest, FigureSize.Largest, FigureSize.Default.Height, NumberStyles.None, faults));
        var figure = new FigureOptions
        {
            Size = size,
            Theme = Theme.All[Choice(query, ThemeName, Themes, faults)],
            Language = Language.All[Choice(query, LocaleName, Locales, faults)],
            Title = TitleOf(query, faults),
            SecondUnit = query[SecondUnitName].Count == 0 ? null : DensityUnits[Choice(query, SecondUnitName, DensityCodes, faults)],
            Lines = LinesOf(query, faults),
        };
        if (format != ChartFormat.Png)
        {
            return new ChartOptions(figure, 1);
        }

        var scale = Number(query, ScaleName, PngWriter.SmallestScale, PngWriter.LargestScale, 1, NumberStyles.AllowDecimalPoint, faults);
        if (PngWriter.Refusal(size, scale) is { } tooLarge)
        {
            faults.Add(new Fault("/" + ScaleName, "out-of-range", tooLarge));
        }

        return new ChartOptions(figure, scale);
    }

    private static double Number(
        IQueryCollection query, string name, double least, double greatest, double otherwise, NumberStyles style, ICollection<Fault> faults)
    {
        if (query[name] is not [{ } text])
        {
            return otherwise;
        }

        if (double.TryParse(text, style, CultureInfo.InvariantCulture, out var value) && value >= least && value <= greatest)
        {
            return value;
        }

        var kind = style == NumberStyles.None ? "a whole number" : "a number";
        faults.Add(new Fault("/" + name, "out-of-range", string.Create(CultureInfo.InvariantCulture, $"It must be {kind} from {least} to {greatest}; \"{Shortened(text)}\" was received.")));
        return otherwise;
    }

    private static string? TitleOf(IQueryCollection query, ICollection<Fault> faults)
    {
        if (query[TitleName] is not [{ } title])
        {
            return null;
        }

        if (string.IsNullOrWhiteSpace(title) || title.Length > FigureOptions.LongestTitle)
        {
            faults.Add(new Fault("/" + TitleName, "out-of-range", $"It must have 1 to {FigureOptions.LongestTitle} characters; {title.Length} were received. Leave it out to have the result for a title."));
        }

        return title;
    }

    /// <summary>All kinds where nothing is asked for.</summary>
    private static IReadOnlyList<PhaseLineKind> LinesOf(IQueryCollection query, ICollection<Fault> faults)
    {
        if (query[LinesName] is not [{ } text])
        {
            return PhaseLineKindNames.All;
        }

        var names = text == NoLines ? [] : text.Split(',');
        if (names.Distinct().Count() < names.Length || names.Except(LineKinds).Any())
        {
            faults.Add(new Fault("/" + LinesName, "unknown-choice", $"It must be {NoLines}, or some of {string.Join(", ", LineKinds)}, each once, parted by commas; \"{Shortened(text)}\" was received."));
        }

        return [.. PhaseLineKindNames.All.Where(kind => names.Contains(kind.Name()))];
    }

    /// <summary>Which of the choices is asked for; the first where none is.</summary>
    private static int Choice(IQueryCollection query, string name, string[] choices, ICollection<Fault> faults)
    {
        if (query[name] is not [{ } text])
        {
            return 0;
        }

        var chosen = Array.IndexOf(choices, text);
        if (chosen < 0)
        {
            faults.Add(new Fault("/" + name, "unknown-choice", $"It must be one of {string.Join(", ", choices)}; \"{Shortened(text)}\" was received."));
        }

        return Math.Max(0, chosen);
    }

    private static string Shortened(string text) => text.Length > 40 ? text[..40] + "…" : text;
}
