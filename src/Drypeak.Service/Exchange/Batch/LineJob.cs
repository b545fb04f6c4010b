using System.Text.Json;
using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Exchange.Batch;

/// <summary>What a line of a batch gives.</summary>
/// <param name="Json">The answer or the problem, as one line of JSON without its line break.</param>
/// <param name="IsRefused">Whether it is a problem.</param>
/// <param name="Worst">Severity of the worst finding; null where there is none.</param>
internal readonly record struct LineAnswer(byte[] Json, bool IsRefused, Severity? Worst)
{
    public static LineAnswer Refused(Problem problem, long line) => new((problem with { Line = line }).ToJson(), IsRefused: true, Worst: null);
}

/// <summary>A job that is done line by line: the same reading, rules, arithmetic and writing as for a single request.</summary>
/// <param name="answer">The answer to the bytes of a line; it may be asked by several threads at once.</param>
internal sealed class LineJob(Func<ReadOnlyMemory<byte>, Read<LineJob.Written>> answer)
{
    /// <summary>An answer written as JSON.</summary>
    internal sealed record Written(byte[] Json, IReadOnlyList<FindingContract> Findings);

    /// <param name="check">Every broken rule of a request.</param>
    /// <param name="compute">The answer to a request without broken rules.</param>
    /// <param name="findings">The findings of an answer.</param>
    public static LineJob Of<TRequest, TAnswer>(
        Func<TRequest, IReadOnlyList<Fault>> check, Func<TRequest, TAnswer> compute, Func<TAnswer, IReadOnlyList<FindingContract>> findings)
        where TRequest : class
    {
        var (input, output) = (ServiceJson.Of<TRequest>(), ServiceJson.Of<TAnswer>());
        return new LineJob(line =>
        {
            var request = JsonReading.Read(line, input, check);
            if (!request.Succeeded)
            {
                return request.Problem;
            }

            var answer = compute(request.Value);
            return new Written(JsonSerializer.SerializeToUtf8Bytes(answer, output), findings(answer));
        });
    }

    /// <summary>The answer to a line, or its problem. It does not throw: a line that breaks the program is one problem, and the others go on.</summary>
    public LineAnswer Answer(Line line, int maximumBytes, Action<Exception, string> report)
    {
        if (line.IsTooLong)
        {
            return LineAnswer.Refused(BatchProblems.LineTooLong(maximumBytes), line.Number);
        }

        try
        {
            var read = answer(line.Bytes);
            return read.Succeeded
                ? new LineAnswer(read.Value.Json, IsRefused: false, WorstOf(read.Value.Findings))
                : LineAnswer.Refused(read.Problem, line.Number);
        }
        catch (Exception exception)
        {
            var trace = System.Diagnostics.ActivityTraceId.CreateRandom().ToHexString();
            report(exception, trace);
            return LineAnswer.Refused(Problems.OfStatus(StatusCodes.Status500InternalServerError) with { TraceId = trace }, line.Number);
        }
    }

    private static Severity? WorstOf(IReadOnlyList<FindingContract> findings) =>
        findings.Count == 0 ? null : findings.Min(finding => Enum.Parse<Severity>(finding.Severity, ignoreCase: true));
}
