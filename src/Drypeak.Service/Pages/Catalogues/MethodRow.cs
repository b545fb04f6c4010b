using Drypeak.Service.Laboratory;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Pages.Catalogues;

/// <summary>A value of a method as the catalogue's page shows it.</summary>
/// <param name="Text">With its unit and tolerance.</param>
/// <param name="Read">Whether it was read in its source; else it is from memory.</param>
internal sealed record MethodCell(string Text, bool Read);

/// <summary>A row of the catalogue's tables: one quantity of every method.</summary>
/// <param name="Label">Its name.</param>
/// <param name="Cell">What a method says; null where it says nothing.</param>
internal sealed record MethodRow(string Label, Func<TestMethodAnswer, MethodCell?> Cell)
{
    /// <summary>The rows, from the soil to the report.</summary>
    public static IReadOnlyList<MethodRow> All { get; } =
    [
        new("What it is", method => new MethodCell(method.Summary, true)),
        Of("Soil passing", method => method.LargestParticle),
        Of("Mold, volume", method => method.MoldVolume),
        Of("Mold, diameter", method => method.MoldDiameter),
        Of("Mold, height", method => method.MoldHeight),
        Of("Rammer", method => method.RammerMass),
        Of("Drop", method => method.Drop),
        Of("Layers", method => method.Layers),
        Of("Blows on each layer", method => method.BlowsPerLayer),
        Of("Vibration of each layer", method => method.VibrationPerLayer),
        new("Effort, computed", method => method.ComputedEffort is { } effort ? new MethodCell($"{ReaderText.Fixed(effort, 0)} kJ/m³{Against(effort, method.NominalEffort)}", true) : null),
        Of("Effort, nominal", method => method.NominalEffort),
        Of("Oversize, up to", method => method.OversizeLimit),
        Of("Oversize, counted on", method => method.OversizeSieve),
        Of("Specimens, at least", method => method.MinimumSpecimens),
        Of("Water contents, about", method => method.RecommendedSpacing, " apart"),
        Of("Water contents, at most", method => method.GreatestSpacing, " apart"),
        new("Report, optimum", method => method.Reporting is { } rule ? new MethodCell(rule.WaterContent, rule.Read) : null),
        new("Report, maximum", method => method.Reporting is { } rule ? new MethodCell(rule.DryDensity, rule.Read) : null),
    ];

    /// <summary>Every document that a value of these methods comes from, each once.</summary>
    public static IEnumerable<string> SourcesOf(IEnumerable<TestMethodAnswer> methods) => methods
        .SelectMany(method => new[]
        {
            method.MoldVolume, method.MoldDiameter, method.MoldHeight, method.RammerMass, method.Drop, method.Layers, method.BlowsPerLayer, method.VibrationPerLayer,
            method.NominalEffort, method.LargestParticle, method.OversizeSieve, method.OversizeLimit, method.MinimumSpecimens, method.RecommendedSpacing, method.GreatestSpacing,
        }
        .Select(value => value?.Source).Append(method.Reporting?.Source))
        .OfType<string>().Distinct().Order(StringComparer.Ordinal);

    private static MethodRow Of(string label, Func<TestMethodAnswer, CatalogueValue?> value, string suffix = "") =>
        new(label, method => value(method) is { } known ? new MethodCell(Text(known) + suffix, known.Read) : null);

    private static string Text(CatalogueValue value)
    {
        var unit = value.Unit.Length > 0 ? " " + value.Unit : "";
        return ReaderText.Significant(value.Value) + (value.Tolerance is { } tolerance ? $" ± {ReaderText.Significant(tolerance)}" : "") + unit;
    }

    /// <summary>How far the computed effort is from the printed one.</summary>
    private static string Against(double effort, CatalogueValue? nominal) => nominal is null ? ""
        : $" ({(effort < nominal.Value ? "" : "+")}{ReaderText.Percent((effort / nominal.Value) - 1)})";
}
