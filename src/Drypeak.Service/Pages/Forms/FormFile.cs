namespace Drypeak.Service.Pages.Forms;

/// <summary>An answer taken away as a file.</summary>
/// <param name="Ending">End of its name.</param>
/// <param name="Label">What it is called on the page.</param>
/// <param name="Bytes">Its bytes.</param>
/// <param name="MediaType">As in Content-Type.</param>
internal sealed record FormFile(string Ending, string Label, Func<FormSubmission, ReadOnlyMemory<byte>> Bytes, string MediaType = "application/json")
{
    /// <summary>Those of every page.</summary>
    public static IReadOnlyList<FormFile> All { get; } =
    [
        new("answer.json", "Answer as JSON", submission => submission.AnswerFile),
        new("request.json", "Request as JSON", submission => submission.RequestFile),
    ];

    /// <summary>Where it is had: with the form in the query, or by posting the form.</summary>
    public string AddressOn(FormPage page) => "/files/" + NameOn(page);

    /// <summary>The name that it is saved under.</summary>
    public string NameOn(FormPage page) => $"{page.FileStem}-{Ending}";
}
