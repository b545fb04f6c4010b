using Drypeak.Figures;
using Drypeak.Service.Charts;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Reports;

/// <summary>How a report is asked for in an address's query: each name is optional, and none other is taken.</summary>
/// <param name="Paper">Size of the pages.</param>
/// <param name="Theme">How it is dressed.</param>
/// <param name="Working">Whether the arithmetic follows on further pages.</param>
internal sealed record ReportOptions(Paper Paper, Theme Theme, bool Working)
{
    private const string PaperName = "paper", ThemeName = "theme", WorkingName = "working";

    private static readonly string[] Papers = [.. Paper.All.Select(paper => paper.Name)];
    private static readonly Theme[] Themes = [Theme.Light, Theme.Print];
    private static readonly string[] ThemeNames = [.. Themes.Select(theme => theme.Name)];
    private static readonly string[] YesOrNo = ["false", "true"];
    private static readonly string[] Known = [PaperName, ThemeName, WorkingName];

    /// <summary>The options as they stand in an address behind other parameters; empty where all are the usual ones.</summary>
    public string Query => string.Concat(
        Paper == Paper.All[0] ? "" : $"&{PaperName}={Paper.Name}",
        Theme == Themes[0] ? "" : $"&{ThemeName}={Theme.Name}",
        Working ? $"&{WorkingName}=true" : "");

    /// <summary>Says in the API description what <see cref="Read"/> takes.</summary>
    public static RouteHandlerBuilder Describe(RouteHandlerBuilder endpoint) => endpoint
        .TakesQuery<string>(PaperName, $"Size of the pages: {string.Join(" or ", Papers)}.", Paper.A4.Name)
        .TakesQuery<string>(ThemeName, $"{string.Join(" or ", ThemeNames)}: in color, or black on white for printers and photocopies.", Theme.Light.Name)
        .TakesQuery<bool>(WorkingName, "true: the arithmetic follows on further pages, step by step with its numbers.", "true");

    /// <summary>Reads a query.</summary>
    /// <param name="query">The query.</param>
    /// <param name="further">Names that the endpoint reads itself.</param>
    /// <param name="faults">Receives each unknown, repeated or impossible parameter.</param>
    public static ReportOptions Read(IQueryCollection query, ReadOnlySpan<string> further, ICollection<Fault> faults)
    {
        foreach (var name in query.Keys)
        {
            if (!Known.Contains(name) && !further.Contains(name))
            {
                faults.Add(new Fault("/" + ChartOptions.Shortened(name), "unknown-parameter", $"There is no such parameter here. Those are: {string.Join(", ", [.. further, .. Known])}."));
            }
            else if (query[name].Count > 1)
            {
                faults.Add(new Fault("/" + name, "repeated-parameter", "The parameter stands in the address more than once. Give it once."));
            }
        }

        return new ReportOptions(Paper.All[Choice(PaperName, Papers)], Themes[Choice(ThemeName, ThemeNames)], Choice(WorkingName, YesOrNo) == 1);

        int Choice(string name, string[] choices)
        {
            if (query[name] is not [{ } text])
            {
                return 0;
            }

            var chosen = Array.IndexOf(choices, text);
            if (chosen < 0)
            {
                faults.Add(new Fault("/" + name, "unknown-choice", $"It must be one of {string.Join(", ", choices)}; \"{ChartOptions.Shortened(text)}\" was received."));
            }

            return Math.Max(0, chosen);
        }
    }
}
