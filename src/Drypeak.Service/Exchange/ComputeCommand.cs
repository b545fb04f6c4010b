using System.Globalization;
using System.IO.Pipelines;
using System.Runtime.InteropServices;
using System.Text.Json;
using Drypeak.Service.Contracts;
using Drypeak.Service.Exchange.Ags;
using Drypeak.Service.Exchange.Batch;
using Drypeak.Service.Exchange.Csv;
using Drypeak.Service.Exchange.Files;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Exchange;

/// <summary>
/// The program without its server: <c>compute &lt; tests.ndjson &gt; answers.ndjson</c>, and CSV and AGS4. Reading, rules,
/// arithmetic and writing are those of the addresses; the limits come from the environment, as the service's do.
/// </summary>
/// <param name="arguments">What is asked for.</param>
/// <param name="limits">The bounds of a line and of a test; a file has none here.</param>
/// <param name="messages">Standard error.</param>
internal sealed class ComputeCommand(ComputeArguments arguments, Limits limits, TextWriter messages)
{
    public const string Name = "compute";

    private const int NothingBeyondNotes = 0;
    private const int AWarning = 1;
    private const int AnError = 2;
    private const int Refused = 3;

    /// <summary>EX_USAGE of sysexits.h.</summary>
    private const int WrongUsage = 64;

    private readonly ExchangeJobs _jobs = ExchangeJobs.Under(limits);

    /// <summary>Told how many lines were answered; null where nobody watches.</summary>
    private Action<long>? Progress { get; init; }

    /// <summary>Runs the command on the standard streams; an interrupt ends the reading, and what was read is answered.</summary>
    public static async Task<int> RunAsync(IReadOnlyList<string> given)
    {
        using var stop = new CancellationTokenSource();
        using var interrupted = PosixSignalRegistration.Create(PosixSignal.SIGINT, Stop);
        using var terminated = PosixSignalRegistration.Create(PosixSignal.SIGTERM, Stop);
        await using var input = Console.OpenStandardInput();
        await using var output = Console.OpenStandardOutput();
        return await RunAsync(given, input, output, Console.Error, isWatched: !Console.IsErrorRedirected, stop.Token);

        void Stop(PosixSignalContext signal)
        {
            signal.Cancel = true;
            stop.Cancel();
        }
    }

    /// <summary>Runs the command.</summary>
    /// <param name="given">The arguments behind its name.</param>
    /// <param name="input">Tests.</param>
    /// <param name="output">Answers.</param>
    /// <param name="messages">What is said to people.</param>
    /// <param name="isWatched">Whether somebody reads the messages while it runs.</param>
    /// <param name="stop">Ends the reading.</param>
    /// <returns>The exit status.</returns>
    public static async Task<int> RunAsync(IReadOnlyList<string> given, Stream input, Stream output, TextWriter messages, bool isWatched, CancellationToken stop)
    {
        if (given is ["--help" or "-h"])
        {
            await messages.WriteLineAsync(ComputeArguments.Usage);
            return NothingBeyondNotes;
        }

        var (arguments, fault) = ComputeArguments.Read(given);
        if (arguments is null)
        {
            await messages.WriteLineAsync($"{fault}\n\n{ComputeArguments.Usage}");
            return WrongUsage;
        }

        var limits = Limits.From(new ConfigurationBuilder().AddEnvironmentVariables().Build());
        var command = new ComputeCommand(arguments, limits, messages)
        {
            Progress = isWatched ? answered => messages.Write(string.Create(CultureInfo.InvariantCulture, $"\r{answered} lines answered")) : null,
        };
        return arguments.Format == ComputeArguments.Lines ? await command.RunLinesAsync(input, output, stop) : await command.RunFileAsync(input, output, stop);
    }

    private async Task<int> RunLinesAsync(Stream input, Stream output, CancellationToken stop)
    {
        var run = new BatchRun(_jobs.ByLine(arguments.Job), limits, (exception, trace) => messages.WriteLine($"{trace}: {exception}")) { Progress = Progress };
        var summary = await run.RunAsync(PipeReader.Create(input), PipeWriter.Create(output), arguments.Summary, stop, CancellationToken.None);
        if (Progress is not null)
        {
            await messages.WriteLineAsync();
        }

        return !summary.Complete || summary.Refused > 0 ? Refused
            : summary.WithErrors > 0 ? AnError
            : summary.WithWarnings > 0 ? AWarning
            : NothingBeyondNotes;
    }

    private async Task<int> RunFileAsync(Stream input, Stream output, CancellationToken stop)
    {
        using var file = new MemoryStream();
        await input.CopyToAsync(file, stop);
        var (written, status, refusal) = Compute(file.ToArray());
        if (refusal is not null)
        {
            await messages.WriteLineAsync(System.Text.Encoding.UTF8.GetString(refusal.ToJson()));
        }

        await output.WriteAsync(written, CancellationToken.None);
        return status;
    }

    private (ReadOnlyMemory<byte> Written, int Status, FileProblem? Refusal) Compute(byte[] file)
    {
        if (arguments.Format == ComputeArguments.Ags4)
        {
            var outcome = new AgsJob(_jobs).Compute(file, new AgsOptions(arguments.Replace, arguments.MaximumDryDensity));
            return outcome.Answer is { } answer
                ? (arguments.To == ComputeArguments.Json ? JsonOf(answer) : outcome.File, StatusOf(answer.Tests.SelectMany(test => test.Answer.Findings), answer.Findings), null)
                : (default, Refused, outcome.Refusal);
        }

        return arguments.Job == ExchangeJobs.MoistureDensity
            ? Written(LaboratoryCsv.Compute(file, _jobs.Laboratory), answer => answer.Findings, computed => JsonOf(new LaboratoryFileAnswer(computed.Tests, computed.Findings)))
            : Written(FieldCsv.Compute(file, _jobs.Field), answer => answer.Findings, computed => JsonOf(new FieldFileAnswer(computed.Tests, computed.Findings)));
    }

    private (ReadOnlyMemory<byte> Written, int Status, FileProblem? Refusal) Written<TAnswer>(
        CsvOutcome<TAnswer> outcome, Func<TAnswer, IReadOnlyList<FindingContract>> findings, Func<CsvFile<TAnswer>, byte[]> whole) => outcome.File is { } file
        ? (arguments.To switch { ComputeArguments.Csv => file.Write(), ComputeArguments.Json => whole(file), _ => CsvEndpoint.ByLine(file.Tests) },
            StatusOf(file.Tests.SelectMany(findings), file.Findings), null)
        : (default, Refused, outcome.Refusal);

    private static byte[] JsonOf<T>(T answer) => JsonSerializer.SerializeToUtf8Bytes(answer, ServiceJson.Of<T>());

    private static int StatusOf(IEnumerable<FindingContract> ofTests, IEnumerable<FileFinding> ofFile)
    {
        var severities = ofTests.Select(finding => finding.Severity).Concat(ofFile.Select(finding => finding.Severity)).ToHashSet();
        return severities.Contains("error") ? AnError : severities.Contains("warning") ? AWarning : NothingBeyondNotes;
    }
}
