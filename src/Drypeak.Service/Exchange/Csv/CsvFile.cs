using Drypeak.Service.Exchange.Files;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Exchange.Csv;

/// <summary>A CSV file computed: an answer a test, and the file with what was computed.</summary>
/// <typeparam name="TAnswer">The job's answer.</typeparam>
/// <param name="Tests">The answers, in the order of the tests' first rows.</param>
/// <param name="Findings">What there is to say about the file.</param>
/// <param name="Write">The file written back with the computed columns filled.</param>
internal sealed record CsvFile<TAnswer>(IReadOnlyList<TAnswer> Tests, IReadOnlyList<FileFinding> Findings, Func<byte[]> Write);

/// <summary>What came of reading a CSV file: the file computed, or why it was refused.</summary>
internal readonly record struct CsvOutcome<TAnswer>(CsvFile<TAnswer>? File, FileProblem? Refusal)
{
    /// <summary>400 where the form is at fault, as with JSON, else 422.</summary>
    public static CsvOutcome<TAnswer> Refused(IReadOnlyList<FileFault> ofForm, IReadOnlyList<FileFault> ofValues) =>
        new(null, FileProblem.Of(ofForm.Count > 0 ? ProblemKind.InvalidForm : ProblemKind.InvalidValues, [.. ofForm, .. ofValues]));
}
