using Drypeak.Figures;

namespace Drypeak.Service.Pages.Forms;

/// <summary>A form with what came of it: an answer, or all that is wrong. Immutable, safe on any thread.</summary>
/// <param name="Page">The page whose form it is.</param>
/// <param name="Texts">As it was typed.</param>
/// <param name="Reading">What was understood; null for a form that was only opened.</param>
public sealed record FormSubmission(FormPage Page, FormTexts Texts, FormReading? Reading) : IFilledForm
{
    /// <inheritdoc/>
    public IReadOnlyList<FormFault> Faults { get; init; } = [];

    /// <summary>The answer, or null.</summary>
    public object? Answer { get; init; }

    /// <summary>Draws the answer's figure in a size; null where there is none.</summary>
    public Func<FigureSize, Figure>? Draw { get; init; }

    /// <summary>Further figures of the answer, each with its name.</summary>
    public IReadOnlyList<(string Name, Func<FigureSize, Figure> Draw)> Further { get; init; } = [];

    /// <summary>The answer in a few words, or null.</summary>
    public string? Headline { get; init; }

    /// <summary>HTTP status: 200, 400 where a text could not be read, 422 where values cannot be computed.</summary>
    public int Status { get; init; } = StatusCodes.Status200OK;

    /// <summary>The request as a program would post it; empty where there is no answer.</summary>
    public ReadOnlyMemory<byte> RequestFile { get; init; }

    /// <summary>The answer as a program would have it; empty where there is none.</summary>
    public ReadOnlyMemory<byte> AnswerFile { get; init; }

    /// <summary>The query that brings form and answer back, without its question mark; null where there is no answer or it would be too long for an address.</summary>
    public string? Query { get; init; }

    /// <inheritdoc/>
    public string TextOf(FormField field) => Texts[field];

    /// <summary>A form that is shown and not computed.</summary>
    public static FormSubmission Opened(FormPage page, FormTexts texts) => new(page, texts, null);

    /// <summary>An empty form with something that is wrong with what it should have been filled from.</summary>
    public static FormSubmission Refused(FormPage page, string source, string advice)
    {
        var field = page.PartsOf(FormTexts.Empty).First().Fields[0];
        return Opened(page, FormTexts.Empty) with
        {
            Faults = [new FormFault(field.Name, field, source, advice)],
            Status = StatusCodes.Status400BadRequest,
        };
    }
}
