namespace Drypeak.Service.Pages.Forms;

/// <summary>What is wrong with a field of a form.</summary>
/// <param name="Control">Identifier of the control that it is about: what a link goes to.</param>
/// <param name="Field">The field that the control belongs to; a grid's cells belong to its table.</param>
/// <param name="Where">The field's label, or row and column.</param>
/// <param name="Advice">A sentence on what is wrong and what to do.</param>
/// <param name="Row">Position of the row that it is about, from 0; −1 where it is about none.</param>
public sealed record FormFault(string Control, FormField Field, string Where, string Advice, int Row = -1)
{
    /// <summary>The whole sentence, for where the field is not in view.</summary>
    public string Message => $"{Where}: {(Advice.StartsWith("It ", StringComparison.Ordinal) ? "it " + Advice[3..] : Advice)}";

    /// <summary>What stands beside the control: without the label that is there already.</summary>
    public string AtField => Where == Field.Label ? Advice : Message;
}

/// <summary>A form as it was typed, with what is wrong with each of its fields: what the controls show.</summary>
public interface IFilledForm
{
    /// <summary>All that is wrong; empty where there is an answer.</summary>
    IReadOnlyList<FormFault> Faults { get; }

    /// <summary>What a field holds.</summary>
    string TextOf(FormField field);
}
