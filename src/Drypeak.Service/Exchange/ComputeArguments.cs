using System.Globalization;

namespace Drypeak.Service.Exchange;

/// <summary>What the command line asks for.</summary>
/// <param name="Format">ndjson, csv or ags4: what comes in.</param>
/// <param name="To">What goes out: as <paramref name="Format"/>, or json, or ndjson.</param>
/// <param name="Job">Which tests the lines or rows are.</param>
/// <param name="Summary">Whether a summary is the last line of ndjson.</param>
/// <param name="Replace">With ags4: whether results that differ are replaced.</param>
/// <param name="MaximumDryDensity">With ags4: what field tests are held against, Mg/m³.</param>
internal sealed record ComputeArguments(string Format, string To, string Job, bool Summary, bool Replace, double? MaximumDryDensity)
{
    public const string Lines = "ndjson";
    public const string Csv = "csv";
    public const string Ags4 = "ags4";
    public const string Json = "json";

    public const string Usage = """
        compute reads tests from standard input and writes their answers to standard output.

          --format ndjson|csv|ags4     what comes in; default ndjson, one JSON request a line
          --to csv|ags4|json|ndjson    what goes out; default as it came in
          --job moisture-density|field-density
                                       which tests the lines or rows are; default moisture-density
          --summary                    ndjson: a summary as the last line
          --replace                    ags4: put computed results in place of those that differ
          --maximum-dry-density X      ags4: hold field densities against X, Mg/m3

        The exit status is that of the worst: 0 nothing beyond notes, 1 a warning, 2 an error among the
        findings, 3 a test or the file was refused, 64 these arguments are wrong.
        """;

    private static readonly Dictionary<string, string[]> Targets = new()
    {
        [Lines] = [Lines],
        [Csv] = [Csv, Json, Lines],
        [Ags4] = [Ags4, Json],
    };

    /// <summary>Reads arguments; or says in a sentence what is wrong with them.</summary>
    public static (ComputeArguments? Arguments, string? Fault) Read(IReadOnlyList<string> given)
    {
        var options = new Dictionary<string, string>();
        for (var i = 0; i < given.Count; i++)
        {
            var name = given[i];
            var takesValue = name is "--format" or "--to" or "--job" or "--maximum-dry-density";
            if (!takesValue && name is not ("--summary" or "--replace"))
            {
                return (null, $"There is no option {name}.");
            }

            if (takesValue && i + 1 == given.Count)
            {
                return (null, $"{name} needs a value.");
            }

            if (!options.TryAdd(name, takesValue ? given[++i] : ""))
            {
                return (null, $"{name} stands twice.");
            }
        }

        var format = options.GetValueOrDefault("--format", Lines);
        var to = options.GetValueOrDefault("--to", format);
        var job = options.GetValueOrDefault("--job", ExchangeJobs.MoistureDensity);
        var density = options.GetValueOrDefault("--maximum-dry-density");
        double? maximum = double.TryParse(density, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out var number) && number is > 0.1 and < 10 ? number : null;
        return !Targets.TryGetValue(format, out var targets) ? (null, $"--format is one of {string.Join(", ", Targets.Keys)}, not {format}.")
            : !targets.Contains(to) ? (null, $"From {format} one can go to {string.Join(", ", targets)}, not to {to}.")
            : !ExchangeJobs.Names.Contains(job) ? (null, $"--job is one of {string.Join(", ", ExchangeJobs.Names)}, not {job}.")
            : density is not null && maximum is null ? (null, $"--maximum-dry-density is a density in Mg/m3 between 0.1 and 10, not {density}.")
            : (new ComputeArguments(format, to, job, options.ContainsKey("--summary"), options.ContainsKey("--replace"), maximum), null);
    }
}
