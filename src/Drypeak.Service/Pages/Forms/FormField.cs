using System.Text.Json.Nodes;
using Drypeak.Service.Pages.Tables;

namespace Drypeak.Service.Pages.Forms;

/// <summary>A field of a form, and the place of the request that it fills. Immutable, safe on any thread.</summary>
/// <param name="Name">Its name in the posted form, and its identifier in the page.</param>
/// <param name="Label">What it is called.</param>
/// <param name="Place">
/// JSON pointer of the member of the request that it fills; empty where it fills none. A step <c>[member=text]</c> is the item of a list
/// in which that member has that text; it is made by the first field that is filled: <c>/specification/requirements/[quantity=airVoids]/maximum</c>.
/// </param>
public abstract record FormField(string Name, string Label, string Place)
{
    /// <summary>What it holds before anything is typed or chosen.</summary>
    public string Otherwise { get; init; } = "";

    /// <summary>A line below it.</summary>
    public string? Hint { get; init; }

    /// <summary>Names of fields of which one must be filled for this to count: the choice of a rule says nothing without a limit. Empty: it always counts.</summary>
    public IReadOnlyList<string> OnlyWith { get; init; } = [];

    /// <summary>Identifier of the sentence that says what is wrong with it.</summary>
    public string FaultId => Name + "-fault";

    /// <summary>Identifier of the hint below it.</summary>
    public string HintId => Name + "-hint";
}

/// <summary>A line of text.</summary>
public sealed record TextField(string Name, string Label, string Place) : FormField(Name, Label, Place);

/// <summary>A number, with a decimal point or comma.</summary>
public sealed record NumberField(string Name, string Label, string Place) : FormField(Name, Label, Place)
{
    /// <summary>Its unit, such as %; null where it has none or the form's.</summary>
    public string? Unit { get; init; }

    /// <summary>A choice of units or the like that stands right beside it.</summary>
    public ChoiceField? Beside { get; init; }

    /// <summary>The choice elsewhere in the form that says its unit.</summary>
    public ChoiceField? UnitOf { get; init; }
}

/// <summary>Several numbers, with spaces or semicolons between them: a list.</summary>
public sealed record NumbersField(string Name, string Label, string Place) : FormField(Name, Label, Place)
{
    /// <summary>Their unit; null where they have none or the form's.</summary>
    public string? Unit { get; init; }

    /// <summary>The choice elsewhere in the form that says their unit.</summary>
    public ChoiceField? UnitOf { get; init; }
}

/// <summary>One of the values that a choice offers.</summary>
/// <param name="Value">As in the request; empty: the member is left out.</param>
/// <param name="Text">As on the page.</param>
/// <param name="Group">Heading that it stands under, or null.</param>
public sealed record Choice(string Value, string Text, string? Group = null)
{
    /// <summary>What the member is where it is true or false and no text; null: the value.</summary>
    public bool? Flag { get; init; }
}

/// <summary>A choice among few. The first is chosen where <see cref="FormField.Otherwise"/> names none.</summary>
public sealed record ChoiceField : FormField
{
    public ChoiceField(string name, string label, string place, IReadOnlyList<Choice> choices)
        : base(name, label, place) => (Choices, Otherwise) = (choices, choices.Count > 0 ? choices[0].Value : "");

    /// <summary>What may be chosen.</summary>
    public IReadOnlyList<Choice> Choices { get; }
}

/// <summary>A box to tick: true in the request, or the list's item alone where the place ends in one.</summary>
public sealed record CheckField(string Name, string Label, string Place) : FormField(Name, Label, Place)
{
    /// <summary>What a ticked box posts.</summary>
    public const string Ticked = "yes";
}

/// <summary>A pasted table: a list with an object for each row, or a list for each row where its columns' members are 0, 1, …</summary>
public sealed record TableField(string Name, string Label, string Place, IReadOnlyList<ColumnKind> Columns) : FormField(Name, Label, Place)
{
    /// <summary>Lines that it shows.</summary>
    public int Lines { get; init; } = 6;

    /// <summary>What stands in it while it is empty; null: the names of its columns.</summary>
    public string? Example { get; init; }

    /// <summary>What one of its rows is called.</summary>
    public string Row { get; init; } = "Row";

    /// <summary>The column whose text is an item's name: rows that repeat it, or leave it empty, belong to one item, and the other columns' members begin with the list in it, such as <c>points/+/0</c>.</summary>
    public ColumnKind? GroupedBy { get; init; }
}

/// <summary>A part of the request typed or pasted as a whole: JSON, or anything that <paramref name="Read"/> makes JSON of.</summary>
/// <param name="Name">See <see cref="FormField"/>.</param>
/// <param name="Label">See <see cref="FormField"/>.</param>
/// <param name="Place">See <see cref="FormField"/>.</param>
/// <param name="Read">The part, or a sentence on why it cannot be read.</param>
public sealed record DocumentField(string Name, string Label, string Place, Func<string, (JsonNode? Part, string? Advice)> Read) : FormField(Name, Label, Place);
