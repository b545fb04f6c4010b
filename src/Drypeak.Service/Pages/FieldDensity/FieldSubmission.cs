using System.Text;
using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Service.Pages.Laboratory;
using Microsoft.Extensions.Primitives;

namespace Drypeak.Service.Pages.FieldDensity;

/// <summary>A field form with what came of it: an answer, or all that is wrong. Immutable, safe on any thread.</summary>
public sealed class FieldSubmission : IFilledForm
{
    private readonly Dictionary<string, string> _texts;

    private FieldSubmission(Dictionary<string, string> texts) => _texts = texts;

    /// <summary>What was understood.</summary>
    public FieldReading Reading => FieldReading.Of(TextOf);

    /// <summary>All that is wrong; empty where there is an answer.</summary>
    public IReadOnlyList<FormFault> Faults { get; private init; } = [];

    /// <summary>The answer, or null.</summary>
    public FieldDensityAnswer? Answer { get; private init; }

    /// <summary>HTTP status.</summary>
    public int Status { get; private init; } = StatusCodes.Status200OK;

    /// <inheritdoc/>
    public string TextOf(FormField field) => _texts.GetValueOrDefault(field.Name, field.Otherwise);

    /// <inheritdoc/>
    public string? FaultOf(FormField field) =>
        Faults.Where(fault => fault.Field == field).Select(fault => fault.Advice).ToList() is { Count: > 0 } advice ? string.Join(" ", advice) : null;

    /// <summary>A form that is shown and not computed.</summary>
    public static FieldSubmission Opened(string? method) =>
        new(method is null ? [] : new(StringComparer.Ordinal) { [FieldTestFields.Method.Name] = method });

    /// <summary>Reads, checks and computes a form by the way that a program's request goes.</summary>
    internal static FieldSubmission Of(IEnumerable<KeyValuePair<string, StringValues>> posted, FieldDensityJob job)
    {
        var texts = posted.Where(text => FieldTestFields.All.Any(field => field.Name == text.Key) && text.Value.ToString().Length > 0)
            .ToDictionary(text => text.Key, text => text.Value.ToString(), StringComparer.Ordinal);
        var reading = FieldReading.Of(new FieldSubmission(texts).TextOf);
        var read = JsonReading.Read(Encoding.UTF8.GetBytes(reading.Request.ToJsonString()), ServiceJson.Of<FieldDensityRequest>(), job.Check);
        var unreadable = reading.Unreadable.Select(item => new FormFault(item.Field.Name, item.Field, item.Field.Label, item.Advice)).ToList();

        // What is missing only since its text could not be read is not said twice.
        List<FormFault> faults =
        [
            .. unreadable,
            .. (read.Problem?.Errors ?? []).Select(fault => Brought(fault, reading)).Where(fault => !unreadable.Exists(known => known.Field == fault.Field)),
        ];
        return faults.Count > 0
            ? new FieldSubmission(texts) { Faults = [.. faults.Distinct()], Status = unreadable.Count > 0 ? StatusCodes.Status400BadRequest : StatusCodes.Status422UnprocessableEntity }
            : new FieldSubmission(texts) { Answer = FieldDensityJob.Compute(read.Value!) };
    }

    private static FormFault Brought(Fault fault, FieldReading reading)
    {
        var field = reading.FieldOf(fault.Place);
        var advice = fault.Code is "missing-member" or "not-enough-data" or "incomplete" ? "It is missing, and the test cannot be computed without it. Give it." : fault.Message;
        return new FormFault(field.Name, field, field.Label, advice);
    }
}
