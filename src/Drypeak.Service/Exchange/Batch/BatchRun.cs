using System.Buffers;
using System.IO.Pipelines;
using System.Text.Json;
using System.Threading.Channels;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Exchange.Batch;

/// <summary>
/// A batch under way: lines in, answers out in the same order. One reader, as many workers as there are processors, one
/// writer; between them a channel with room for a few lines, so that a caller who takes answers slowly is read slowly, and a
/// body of any length needs the same memory. HTTP and the command line run the same batch.
/// </summary>
/// <param name="job">What is done with a line.</param>
/// <param name="limits">The bound of a line.</param>
/// <param name="report">Told of exceptions that are the program's own fault, with what finds them.</param>
internal sealed class BatchRun(LineJob job, Limits limits, Action<Exception, string> report)
{
    /// <summary>Lines in work for each processor: enough that no worker waits for the writer.</summary>
    private const int LinesPerProcessor = 8;

    /// <summary>Bytes of answers that are sent together while more are ready.</summary>
    private const int BytesSentTogether = 32 << 10;

    private readonly Channel<Task<LineAnswer>> _answers = Channel.CreateBounded<Task<LineAnswer>>(LinesPerProcessor * Environment.ProcessorCount);
    private long _answered, _refused, _withErrors, _withWarnings;

    /// <summary>Told how many lines were answered, as the answers are sent.</summary>
    public Action<long>? Progress { get; init; }

    /// <summary>Runs to the end of the body, or until it breaks off.</summary>
    /// <param name="source">The lines.</param>
    /// <param name="target">The answers.</param>
    /// <param name="withSummary">Whether a summary is the last line.</param>
    /// <param name="stop">Ends the reading; what was read is answered, and a last problem says where to go on.</param>
    /// <param name="abort">Ends everything: nobody takes the answers any more.</param>
    public async Task<BatchSummary> RunAsync(PipeReader source, PipeWriter target, bool withSummary, CancellationToken stop, CancellationToken abort)
    {
        using var ended = CancellationTokenSource.CreateLinkedTokenSource(abort);
        using var reading = CancellationTokenSource.CreateLinkedTokenSource(stop, ended.Token);
        var lines = new LineReader(source, limits.BatchLineBytes);
        var read = ReadAsync(lines, reading.Token, ended.Token);
        try
        {
            await WriteAsync(target, abort);
        }
        catch
        {
            // Without its writer the reader would wait for room, or for its caller.
            await ended.CancelAsync();
            await ((Task)read).ConfigureAwait(ConfigureAwaitOptions.SuppressThrowing);
            throw;
        }

        var whyBrokenOff = await read;
        var summary = new BatchSummary(whyBrokenOff is null, lines.Lines, lines.Blank, _answered, _refused, _withErrors, _withWarnings);
        if (whyBrokenOff is not null)
        {
            WriteLine(target, LineAnswer.Refused(whyBrokenOff, lines.Lines + 1).Json);
        }

        if (withSummary)
        {
            WriteLine(target, JsonSerializer.SerializeToUtf8Bytes(new BatchSummaryLine(summary), ServiceJson.Of<BatchSummaryLine>()));
        }

        await target.FlushAsync(abort);
        return summary;
    }

    /// <returns>Null where the body was read to its end, else the problem that says why not.</returns>
    private async Task<Problem?> ReadAsync(LineReader lines, CancellationToken reading, CancellationToken ended)
    {
        try
        {
            await foreach (var line in lines.ReadAsync(reading))
            {
                await _answers.Writer.WriteAsync(Task.Run(() => job.Answer(line, limits.BatchLineBytes, report), CancellationToken.None), ended);
            }

            return null;
        }
        catch (Exception broken) when (!ended.IsCancellationRequested && WhyBrokenOff(broken) is { } problem)
        {
            return problem;
        }
        finally
        {
            _answers.Writer.Complete();
        }
    }

    private static Problem? WhyBrokenOff(Exception broken) => broken switch
    {
        OperationCanceledException => BatchProblems.Stopping(),
        ExpansionException => BatchProblems.ExpandsTooFar(),
        InvalidDataException => BatchProblems.DamagedCoding(),
        BadHttpRequestException bad => Problems.OfStatus(bad.StatusCode),
        _ => null,
    };

    private async Task WriteAsync(PipeWriter target, CancellationToken abort)
    {
        var unsent = 0;
        while (await _answers.Reader.WaitToReadAsync(abort))
        {
            while (_answers.Reader.TryRead(out var next))
            {
                if (unsent > 0 && (!next.IsCompleted || unsent >= BytesSentTogether))
                {
                    await SendAsync(target, abort);
                    unsent = 0;
                }

                var answer = await next;
                Count(answer);
                unsent += WriteLine(target, answer.Json);
            }

            await SendAsync(target, abort);
            unsent = 0;
        }
    }

    private async Task SendAsync(PipeWriter target, CancellationToken abort)
    {
        await target.FlushAsync(abort);
        Progress?.Invoke(_answered + _refused);
    }

    private void Count(LineAnswer answer)
    {
        _answered += answer.IsRefused ? 0 : 1;
        _refused += answer.IsRefused ? 1 : 0;
        _withErrors += answer.Worst is Severity.Error ? 1 : 0;
        _withWarnings += answer.Worst is Severity.Warning ? 1 : 0;
    }

    private static int WriteLine(PipeWriter target, byte[] json)
    {
        target.Write(json);
        target.Write("\n"u8);
        return json.Length + 1;
    }
}
