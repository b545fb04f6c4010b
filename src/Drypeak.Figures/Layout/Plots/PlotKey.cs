namespace Drypeak.Figures.Layout.Plots;

/// <summary>What stands in a plot's key: the outcomes of its marks as words, and what found no room for its name.</summary>
internal static class PlotKey
{
    public static IReadOnlyList<KeyEntry> Of(PlotChart chart, IReadOnlySet<object> keyed, TypeScale type, Theme theme) =>
    [
        .. Outcomes(chart, type),
        .. chart.Lines.Where(keyed.Contains).Select(line => KeyEntry.Line(line.Label!, PlotStyles.Of(line.Role, line.Dash, type, theme), type)),
        .. chart.Limits.Where(keyed.Contains).Select(limit => KeyEntry.Line(limit.Label!, PlotStyles.Of(limit.Role, PlotDash.Usual, type, theme), type)),
        .. chart.Areas.Where(keyed.Contains).Select(area => KeyEntry.Zone(area.Label!, area.Role, type)),
    ];

    /// <summary>Each role with how many marks have it, unless all are merely measured.</summary>
    private static IEnumerable<KeyEntry> Outcomes(PlotChart chart, TypeScale type)
    {
        var roles = chart.Marks.Where(mark => mark.Role != MarkRole.Result).GroupBy(mark => mark.Role).OrderBy(role => role.Key).ToList();
        return roles is [] or [{ Key: MarkRole.Measured }] ? [] : roles.Select(role =>
        {
            var outline = role.GroupBy(mark => mark.Shape).MaxBy(shape => shape.Count())!.Key;
            return new KeyEntry(
                $"{role.Count()} {Word(role.Key)}",
                at => MarkShapes.Of(outline, role.Key, at, type, "key-mark", null),
                2.6 * type.MarkRadius);
        });
    }

    private static string Word(MarkRole role) => role switch
    {
        MarkRole.Measured => "measured",
        MarkRole.SetAside => "set aside",
        MarkRole.Met => "met",
        MarkRole.NotMet => "not met",
        MarkRole.Undecided => "undecided",
        _ => throw new ArgumentOutOfRangeException(nameof(role)),
    };
}
