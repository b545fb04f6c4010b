using Drypeak.Figures;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Charts;

/// <summary>How a picture is asked for in an address's query: each name is optional, and none other is taken.</summary>
/// <param name="Figure">How the figure is drawn.</param>
/// <param name="Scale">Pixels of the PNG for each px; 1 in other formats.</param>
internal sealed record ChartOptions(FigureOptions Figure, double Scale)
{
    /// <summary>Says in the API description what <see cref="Read"/> takes.</summary>
    public static void Describe(RouteHandlerBuilder endpoint, IReadOnlyList<ChartParameter> parameters, IReadOnlyList<ChartFormat> formats)
    {
        foreach (var parameter in formats.SelectMany(format => Of(parameters, format)).Distinct())
        {
            endpoint.WithMetadata(new EndpointDescription.Query(parameter.Name, parameter.Type, parameter.Description, () => parameter.Example, Required: false));
        }
    }

    /// <summary>Reads a query.</summary>
    /// <param name="query">The query.</param>
    /// <param name="parameters">What may be asked of the picture.</param>
    /// <param name="format">The format drawn, which adds its own.</param>
    /// <param name="limits">The bound on pixels.</param>
    /// <param name="further">Names that the endpoint reads itself.</param>
    /// <param name="faults">Receives each unknown, repeated or impossible parameter.</param>
    public static ChartOptions Read(IQueryCollection query, IReadOnlyList<ChartParameter> parameters, ChartFormat format, Limits limits, ReadOnlySpan<string> further, ICollection<Fault> faults)
    {
        var known = Of(parameters, format).ToList();
        foreach (var name in query.Keys)
        {
            if (!known.Exists(parameter => parameter.Name == name) && !further.Contains(name))
            {
                faults.Add(new Fault("/" + Shortened(name), "unknown-parameter", $"There is no such parameter here. Those are: {string.Join(", ", [.. further, .. known.Select(parameter => parameter.Name)])}."));
            }
            else if (query[name].Count > 1)
            {
                faults.Add(new Fault("/" + name, "repeated-parameter", "The parameter stands in the address more than once. Give it once."));
            }
        }

        var options = new ChartOptions(new FigureOptions(), 1);
        foreach (var parameter in known)
        {
            if (query[parameter.Name] is not [{ } text])
            {
                continue;
            }

            var read = parameter.Read(options, text);
            if (read.Options is { } with)
            {
                options = with;
            }
            else
            {
                faults.Add(new Fault("/" + parameter.Name, read.Code, read.Message));
            }
        }

        if (format == ChartFormat.Png && PngWriter.Refusal(options.Figure.Size, options.Scale, limits.PicturePixels) is { } tooLarge)
        {
            faults.Add(new Fault("/" + ChartParameters.Scale.Name, "out-of-range", tooLarge));
        }

        return options;
    }

    /// <summary>A text of the caller's, short enough for a message.</summary>
    public static string Shortened(string text) => text.Length > 40 ? text[..40] + "…" : text;

    private static IEnumerable<ChartParameter> Of(IReadOnlyList<ChartParameter> parameters, ChartFormat format) =>
        format == ChartFormat.Png ? parameters.Append(ChartParameters.Scale) : parameters;
}
