using System.Text.Json.Serialization;

namespace Drypeak.Figures;

/// <summary>
/// What a figure of any two quantities shows, in the reader's units and words: curves, areas, limits, marks. Every number is finite and
/// within ±<see cref="CompactionChart.LargestNumber"/>; <see cref="PlotFigure.Refusal(PlotChart, FigureOptions)"/> says where one is not. Immutable, safe on any thread.
/// </summary>
public sealed record PlotChart
{
    /// <summary>Most marks.</summary>
    public const int MostMarks = 10_000;

    /// <summary>Most lines, most areas, and most limits.</summary>
    public const int MostOfAKind = 2_000;

    /// <summary>Most points of all lines and areas together.</summary>
    public const int MostPoints = 100_000;

    /// <summary>The result in one line: what the picture is looked at for. Not blank.</summary>
    public required string Title { get; init; }

    /// <summary>What is said more quietly under the title; null: nothing.</summary>
    public string? Subtitle { get; init; }

    /// <summary>The one-line name of the test or lot, in any language; null or blank: none.</summary>
    public string? Reference { get; init; }

    /// <summary>What the picture shows and says, in sentences, for who cannot see it. Not blank.</summary>
    public required string Description { get; init; }

    /// <summary>The axis to the right.</summary>
    public required PlotAxis X { get; init; }

    /// <summary>The axis upward.</summary>
    public required PlotAxis Y { get; init; }

    /// <summary>Whether 1 is as long on the one axis as on the other, as on a map or a plan.</summary>
    public bool SameScale { get; init; }

    /// <summary>Closed areas: zones, bands, bars. Drawn first.</summary>
    public IReadOnlyList<PlotArea> Areas { get; init; } = [];

    /// <summary>Lines, in drawing order.</summary>
    public IReadOnlyList<PlotLine> Lines { get; init; } = [];

    /// <summary>Straight lines across the whole plot.</summary>
    public IReadOnlyList<PlotLimit> Limits { get; init; } = [];

    /// <summary>Marks, in drawing order; those of results over all others.</summary>
    public IReadOnlyList<PlotMark> Marks { get; init; } = [];
}

/// <summary>An axis.</summary>
/// <param name="Title">The quantity with its unit: <c>Dry density (Mg/m³)</c>.</param>
public sealed record PlotAxis(string Title)
{
    /// <summary>Where the axis begins at the latest; null: where the data ask for. A mark or limit beyond it moves the end.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? From { get; init; }

    /// <summary>Where the axis ends; null: where the data ask for. A mark or limit beyond it moves the end.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? To { get; init; }

    /// <summary>Named places in place of numbers, as for results in order; null: numbers.</summary>
    [JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyList<PlotPosition>? Positions { get; init; }
}

/// <summary>A named place on an axis.</summary>
/// <param name="At">Where.</param>
/// <param name="Name">What is written there.</param>
public sealed record PlotPosition(double At, string Name);

/// <summary>A point of a line or a corner of an area.</summary>
/// <param name="X">Along the axis to the right.</param>
/// <param name="Y">Along the axis upward.</param>
public readonly record struct PlotPoint(double X, double Y);

/// <summary>What a line is.</summary>
public enum PlotLineRole
{
    /// <summary>The fitted or computed curve that the picture is about.</summary>
    Result,
    /// <summary>A curve to compare with.</summary>
    Reference,
    /// <summary>A curve in the background.</summary>
    Quiet,
    /// <summary>An edge that must not be crossed.</summary>
    Limit,
}

/// <summary>How a line is broken; it tells lines of one role apart.</summary>
public enum PlotDash
{
    /// <summary>As its role has it.</summary>
    Usual,
    /// <summary>Long dashes.</summary>
    Dashed,
    /// <summary>Dots.</summary>
    Dotted,
}

/// <summary>Where a line's label stands.</summary>
public enum PlotLabelPlace
{
    /// <summary>In the line, following its slope.</summary>
    Along,
    /// <summary>At its last point.</summary>
    End,
}

/// <summary>A line through points.</summary>
/// <param name="Points">In turn; two or more.</param>
/// <param name="Role">What it is.</param>
/// <param name="Label">Its name; null: none. What finds no room at the line stands in the key below the plot.</param>
public sealed record PlotLine(IReadOnlyList<PlotPoint> Points, PlotLineRole Role, string? Label = null)
{
    /// <summary>How it is broken.</summary>
    public PlotDash Dash { get; init; }

    /// <summary>Where its label stands.</summary>
    public PlotLabelPlace LabelAt { get; init; }
}

/// <summary>What an area is.</summary>
public enum PlotAreaRole
{
    /// <summary>What is accepted.</summary>
    Accepted,
    /// <summary>What is uncertain, or belongs to the result.</summary>
    Band,
    /// <summary>A bar of counts.</summary>
    Bar,
}

/// <summary>A closed area.</summary>
/// <param name="Corners">In turn; three or more. The last is joined to the first.</param>
/// <param name="Role">What it is.</param>
/// <param name="Label">Its name, written in it where there is room, else in the key; null: none.</param>
public sealed record PlotArea(IReadOnlyList<PlotPoint> Corners, PlotAreaRole Role, string? Label = null);

/// <summary>A straight line across the plot.</summary>
/// <param name="Value">Where.</param>
/// <param name="Label">What it is; null: none.</param>
/// <param name="Upright">Whether it stands on the axis to the right; else it leaves the axis upward.</param>
/// <param name="Role">What it is; <see cref="PlotLineRole.Limit"/> unless otherwise said.</param>
public sealed record PlotLimit(double Value, string? Label = null, bool Upright = false, PlotLineRole Role = PlotLineRole.Limit);

/// <summary>What a mark came to. It says the color, and how the mark's outline is filled; so no outcome is a color alone.</summary>
public enum MarkRole
{
    /// <summary>Measured or computed, and not judged: ink, full.</summary>
    Measured,
    /// <summary>Not counted: ink, hollow.</summary>
    SetAside,
    /// <summary>The result of the picture: clay, a cross.</summary>
    Result,
    /// <summary>Meets what is asked for: moss, full.</summary>
    Met,
    /// <summary>Does not meet it: clay, crossed out.</summary>
    NotMet,
    /// <summary>Cannot be decided: quiet, hollow with a dot.</summary>
    Undecided,
}

/// <summary>Outline of a mark.</summary>
public enum MarkShape
{
    /// <summary>A disc.</summary>
    Disc,
    /// <summary>A square.</summary>
    Square,
    /// <summary>A square on its corner.</summary>
    Diamond,
    /// <summary>A triangle that points up.</summary>
    Triangle,
}

/// <summary>A mark; in SVG it carries its numbers as <c>data-x</c> and <c>data-y</c>.</summary>
/// <param name="X">Along the axis to the right.</param>
/// <param name="Y">Along the axis upward.</param>
/// <param name="Role">What it came to.</param>
/// <param name="Label">Its name, written beside it where there is room; null: none.</param>
/// <param name="Shape">Its outline.</param>
public sealed record PlotMark(double X, double Y, MarkRole Role, string? Label = null, MarkShape Shape = MarkShape.Disc);
