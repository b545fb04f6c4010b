using System.Text;
using System.Text.Json;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Pages.Forms;

/// <summary>A worked example, one click away. It stands on the Ternmarsh embankment, an invented site.</summary>
/// <param name="Name">Its name in the address.</param>
/// <param name="Label">What it shows.</param>
/// <param name="Texts">The form filled: field and text.</param>
public sealed record FormDemonstration(string Name, string Label, params IReadOnlyList<(FormField Field, string Text)> Texts);

/// <summary>A page with a form: what it asks for, and how that is answered. Everything else is the same for all of them.</summary>
public abstract class FormPage
{
    private readonly Lazy<IReadOnlyList<FormField>> _fields;

    protected FormPage() => _fields = new(() =>
    [
        .. Parts!.SelectMany(part => part.Fields).SelectMany(field => field is NumberField { Beside: { } beside } ? new[] { field, beside } : [field])
            .Concat([Variant ?? FormFields.DecimalMark, FormFields.DecimalMark, FormFields.Working]).DistinctBy(field => field.Name),
    ]);

    /// <summary>Its address, such as <c>/rapid-method</c>.</summary>
    public required string Address { get; init; }

    /// <summary>Its heading.</summary>
    public required string Heading { get; init; }

    /// <summary>One sentence under the heading: from what to what.</summary>
    public required string Lead { get; init; }

    /// <summary>What the button says.</summary>
    public string Action { get; init; } = "Compute";

    /// <summary>What comes out, in a sentence or two, for who sees the page for the first time.</summary>
    public required string WhatComesOut { get; init; }

    /// <summary>The fields.</summary>
    public required IReadOnlyList<FormPart> Parts { get; init; }

    /// <summary>A choice that decides which parts are asked for. It stands above the form as links, so that it works without scripts.</summary>
    public ChoiceField? Variant { get; init; }

    /// <summary>Whether the working can be asked for (<c>trace</c>).</summary>
    public bool HasWorking { get; init; } = true;

    /// <summary>Worked examples, the most usual first.</summary>
    public required IReadOnlyList<FormDemonstration> Demonstrations { get; init; }

    /// <summary>The component that shows the answer: it has a parameter <c>Answer</c> of the answer's type and a parameter <c>Submission</c>, and is an <see cref="AnswerLayout"/> with what is particular put in.</summary>
    public required Type View { get; init; }

    /// <summary>A component below the form that helps to fill it; null: none.</summary>
    public Type? Help { get; init; }

    /// <summary>Files that an answer can be taken away in beside those of every page.</summary>
    internal IReadOnlyList<FormFile> MoreFiles { get; init; } = [];

    /// <summary>Every file that an answer can be taken away in.</summary>
    internal IEnumerable<FormFile> Files => FormFile.All.Concat(MoreFiles);

    /// <summary>Every field that the form may have.</summary>
    public IReadOnlyList<FormField> Fields => _fields.Value;

    /// <summary>Stem of the names of the files that an answer is taken away in.</summary>
    public string FileStem => Address.Trim('/').Replace('/', '-');

    /// <summary>The parts that belong to a form as it is filled.</summary>
    public IEnumerable<FormPart> PartsOf(FormTexts texts) => Parts.Where(part => part.When is null || part.When(texts));

    /// <summary>Reads, checks and computes a form, by the way that a program's request goes.</summary>
    internal abstract FormSubmission Submit(FormTexts texts);
}

/// <summary>A page of one job.</summary>
/// <typeparam name="TRequest">The job's request.</typeparam>
/// <typeparam name="TAnswer">The job's answer.</typeparam>
public sealed class FormPage<TRequest, TAnswer> : FormPage
    where TRequest : class
    where TAnswer : class
{
    /// <summary>Every broken rule of a request.</summary>
    public required Func<TRequest, IReadOnlyList<Fault>> Check { get; init; }

    /// <summary>The answer to a request without broken rules, see <see cref="FormAnswer"/>.</summary>
    public required Func<TRequest, FormAnswer<TAnswer>> Compute { get; init; }

    /// <summary>The answer in a few words, for the page's title.</summary>
    public required Func<TAnswer, string> Headline { get; init; }

    internal override FormSubmission Submit(FormTexts texts)
    {
        var reading = FormReading.Of(this, texts);
        var request = Encoding.UTF8.GetBytes(reading.Request.ToJsonString());
        var read = JsonReading.Read(request, ServiceJson.Of<TRequest>(), Check);
        var faults = reading.AllFaults(read.Problem?.Errors ?? []);
        if (faults.Count > 0)
        {
            return new FormSubmission(this, texts, reading)
            {
                Faults = faults,
                Status = reading.Unreadable.Count > 0 ? StatusCodes.Status400BadRequest : StatusCodes.Status422UnprocessableEntity,
            };
        }

        var computed = Compute(read.Value!);
        var (answer, draw) = computed;
        return new FormSubmission(this, texts, reading)
        {
            Answer = answer,
            Draw = draw,
            Further = computed.Further ?? [],
            Headline = Headline(answer),
            RequestFile = request,
            AnswerFile = JsonSerializer.SerializeToUtf8Bytes(answer, ServiceJson.Of<TAnswer>()),
        };
    }
}
