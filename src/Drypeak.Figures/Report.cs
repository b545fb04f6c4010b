namespace Drypeak.Figures;

/// <summary>
/// What a report says, in the reader's units and words: one test on one page, its working on further pages. Texts may be of any length and
/// in any language; none is cut, what does not fit on a page goes on the next. Immutable, safe on any thread.
/// </summary>
public sealed record Report
{
    /// <summary>What was tested: <c>Laboratory compaction test</c>.</summary>
    public required string Kind { get; init; }

    /// <summary>The one-line name; null: none.</summary>
    public string? Reference { get; init; }

    /// <summary>The result in one sentence, large.</summary>
    public required string Result { get; init; }

    /// <summary>How sure it is, or what it rests on; null: nothing.</summary>
    public string? Support { get; init; }

    /// <summary>The caller's own labels.</summary>
    public IReadOnlyList<ReportFact> Identification { get; init; } = [];

    /// <summary>The method and what belongs to it.</summary>
    public IReadOnlyList<ReportFact> Method { get; init; } = [];

    /// <summary>What was measured.</summary>
    public ReportTable? Table { get; init; }

    /// <summary>Draws the picture in a size and theme; null: none.</summary>
    public Func<FigureOptions, Figure>? Picture { get; init; }

    /// <summary>What came out besides the result.</summary>
    public IReadOnlyList<ReportFact> Results { get; init; } = [];

    /// <summary>What a reviewer says, worst first.</summary>
    public IReadOnlyList<ReportFinding> Findings { get; init; } = [];

    /// <summary>What to bear in mind.</summary>
    public IReadOnlyList<string> Cautions { get; init; } = [];

    /// <summary>The arithmetic, a step each; empty where it is not asked for.</summary>
    public IReadOnlyList<ReportStep> Working { get; init; } = [];

    /// <summary>Version of the service, and the digest of what it was given.</summary>
    public required string Provenance { get; init; }

    /// <summary>The address that gives this report again; null where it would be too long.</summary>
    public string? Address { get; init; }
}

/// <summary>A label with its text.</summary>
public sealed record ReportFact(string Label, string Text);

/// <summary>A table: first column to the left, numbers to the right.</summary>
/// <param name="Title">What it shows.</param>
/// <param name="Columns">Heads, with units.</param>
/// <param name="Rows">A cell a column.</param>
/// <param name="Notes">What is said of a row, such as why it was set aside; under the table.</param>
public sealed record ReportTable(string Title, IReadOnlyList<string> Columns, IReadOnlyList<IReadOnlyList<string>> Rows, IReadOnlyList<string> Notes);

/// <summary>A finding.</summary>
/// <param name="Severity">As a word.</param>
/// <param name="Message">What is the matter and what to do.</param>
/// <param name="Basis">The rule and its source.</param>
public sealed record ReportFinding(string Severity, string Message, string Basis);

/// <summary>A step of the arithmetic.</summary>
/// <param name="Quantity">What is computed.</param>
/// <param name="Formula">In symbols.</param>
/// <param name="Substitution">With the numbers put in; null where there is none.</param>
/// <param name="Value">With its unit.</param>
/// <param name="Source">Where the formula comes from.</param>
public sealed record ReportStep(string Quantity, string Formula, string? Substitution, string Value, string Source);

/// <summary>A size of paper.</summary>
/// <param name="Name">Its name in an address.</param>
/// <param name="Size">Upright, at 96 px to the inch.</param>
public sealed record Paper(string Name, FigureSize Size)
{
    /// <summary>210 mm by 297 mm (ISO 216).</summary>
    public static Paper A4 { get; } = new("a4", new(794, 1123));

    /// <summary>8½ by 11 inches.</summary>
    public static Paper Letter { get; } = new("letter", new(816, 1056));

    /// <summary>Every size, the usual one first.</summary>
    public static IReadOnlyList<Paper> All { get; } = [A4, Letter];
}
