using System.Globalization;
using Drypeak.Figures;

namespace Drypeak.Service.Charts;

/// <summary>The size of a picture, from an address's query: <c>width</c> and <c>height</c> in px, and <c>scale</c> for PNG.</summary>
/// <param name="Size">Width and height, px.</param>
/// <param name="Scale">Pixels of the PNG for each px.</param>
internal sealed record ChartOptions(FigureSize Size, double Scale)
{
    private const string Width = "width", Height = "height", ScaleName = "scale";

    /// <summary>Reads a query.</summary>
    /// <param name="query">The query.</param>
    /// <param name="format">The format drawn: it says which names there are.</param>
    /// <param name="further">Names that the endpoint reads itself.</param>
    /// <param name="faults">Receives each unknown, repeated or impossible parameter.</param>
    public static ChartOptions Read(IQueryCollection query, ChartFormat format, ReadOnlySpan<string> further, ICollection<Fault> faults)
    {
        var known = new List<string> { Width, Height };
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
        if (format != ChartFormat.Png)
        {
            return new ChartOptions(size, 1);
        }

        var scale = Number(query, ScaleName, PngWriter.SmallestScale, PngWriter.LargestScale, 1, NumberStyles.AllowDecimalPoint, faults);
        if (PngWriter.Refusal(size, scale) is { } tooLarge)
        {
            faults.Add(new Fault("/" + ScaleName, "out-of-range", tooLarge));
        }

        return new ChartOptions(size, scale);
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

    private static string Shortened(string text) => text.Length > 40 ? text[..40] + "…" : text;
}
