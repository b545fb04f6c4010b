namespace Drypeak.Service.Pages.Forms;

/// <summary>Fields that stand together under one heading.</summary>
/// <param name="Heading">The heading; empty for fields that need none.</param>
/// <param name="Fields">The fields, in order.</param>
public sealed record FormPart(string Heading, IReadOnlyList<FormField> Fields)
{
    /// <summary>Whether it stands with what is asked for less often, folded away until it is used.</summary>
    public bool UnderMore { get; init; }

    /// <summary>Fields beside each other where there is room.</summary>
    public int Columns { get; init; } = 2;

    /// <summary>A line below the heading.</summary>
    public string? Note { get; init; }

    /// <summary>When it belongs to the form: a part that does not is neither shown nor read. Null: always.</summary>
    public Func<FormTexts, bool>? When { get; init; }
}
