using System.Globalization;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Figures.Layout;

/// <summary>What a laboratory sheet says, from its method.</summary>
internal sealed class SheetWording(LaboratorySheet sheet)
{
    public const string Heading = "Compaction test";

    public const string Foot = "† from memory, not read in the standard. The current edition of the standard comes first. Ovens and hot tins burn.";

    private const string Reading = "†";

    private readonly TestMethod? _method = sheet.Method;

    public string Method => _method?.Title ?? "";

    public string Summary => _method?.Summary ?? "";

    public string Title => _method is null ? "Laboratory sheet for a compaction test" : $"Laboratory sheet for a compaction test by {_method.Title}";

    public string Description => $"A page to be filled in by hand: {sheet.WaterContents.Count} {(sheet.WaterContents.Count == 1 ? "specimen" : "specimens")}"
        + (sheet.WaterContents.Any(percent => percent is { }) ? $", aimed at {string.Join(", ", sheet.WaterContents.OfType<double>().Select(ReaderText.Significant))} % water" : "")
        + ". Rows for the masses of mold and soil and for two tins each.";

    private string Mass => sheet.MassUnit.Code();

    private bool ByVibration => _method?.VibrationSecondsPerLayer is { };

    /// <summary>What the method asks for; what was not read in it has its mark.</summary>
    public IReadOnlyList<(string Label, string Value)> Apparatus => _method is not { } method ? [] :
    [
        ("Mold", Text(method.MoldVolume, volume => ReaderText.Of(volume, VolumeUnit.CubicCentimeter))),
        .. method is { RammerMass: { } rammer, Drop: { } drop, BlowsPerLayer: { } blows, Effort: { } effort } ?
            [
                ("Rammer", Text(rammer, mass => ReaderText.Of(mass, MassUnit.Kilogram))),
                ("Drop", Text(drop, length => ReaderText.Of(length, LengthUnit.Millimeter))),
                ("Layers × blows", $"{Count(method.Layers)} × {Count(blows)}"),
                ("Effort, computed", $"{ReaderText.Fixed(effort.KilojoulesPerCubicMeter, 0)} kJ/m³"),
            ]
            : new (string, string)[]
            {
                ("Vibration of each layer", Text(method.VibrationSecondsPerLayer!, seconds => $"{ReaderText.Significant(seconds)} s")),
                ("Layers", Count(method.Layers)),
            },
        ("Soil passing", method.LargestParticleMillimeters is { } particle ? Text(particle, Millimeters) : "not at hand"),
        ("Specimens, at least", method.MinimumSpecimens is { } fewest ? Count(fewest) : "not at hand"),
        ("Water contents apart", Spacing(method)),
    ];

    public IReadOnlyList<string> ApparatusBlanks =>
    [
        .. _method is null ? ["Rammer", "Drop", "Layers × blows"] : Array.Empty<string>(),
        "Mold no.", $"Mass of the mold, {Mass}", "Volume of the mold, cm³",
        "Balance no.", "Diameter of the mold, mm", "Height of the mold, mm",
    ];

    public IReadOnlyList<SheetRow> Rows =>
    [
        new("Specimen", [.. Enumerable.Range(1, sheet.WaterContents.Count).Select(number => number.ToString(CultureInfo.InvariantCulture))], Begins: true),
        new("Water content aimed at, %", [.. sheet.WaterContents.Select(percent => percent is { } number ? ReaderText.Significant(number) : "")]),
        Blank($"Water added, {Mass}"),
        new($"Mold + wet soil, {Mass}", [], Begins: true),
        Blank($"Wet soil, {Mass}"),
        .. ByVibration ? [Blank("Depth below the rim, mm")] : Array.Empty<SheetRow>(),
        Blank("Wet density, Mg/m³"),
        .. Tin("Tin no., top"),
        .. Tin("Tin no., bottom"),
        new("Water content, mean, %", [], Begins: true),
        Blank("Dry density, Mg/m³"),
        Blank("Set aside, and why"),
    ];

    public IReadOnlyList<string> SoilBlanks =>
    [
        "Specific gravity", "measured or assumed", "Water temperature, °C",
        OversizeSieve is { } sieve ? $"Retained on {sieve}, %" : "Oversize, %", "Its bulk specific gravity", "Its water content, %",
    ];

    public IReadOnlyList<string> Notes =>
    [
        "Wet soil = (mold + wet soil) − mold. Wet density = wet soil / volume" + (ByVibration ? " · height / (height − depth)." : "."),
        "Water content = 100 · ((tin + wet soil) − (tin + dry soil)) / ((tin + dry soil) − tin). Dry density = wet density / (1 + water content / 100).",
    ];

    private string? OversizeSieve => _method?.OversizeSieveMillimeters is { } sieve ? Millimeters(sieve.Value) : null;

    private static SheetRow Blank(string label) => new(label, []);

    private static SheetRow[] Tin(string number) =>
        [new(number, [], Begins: true), Blank("Tin, g"), Blank("Tin + wet soil, g"), Blank("Tin + dry soil, g"), Blank("Water content, %")];

    private static string Spacing(TestMethod method) => (method.RecommendedSpacingPercent, method.GreatestSpacingPercent) switch
    {
        ({ } advised, { } most) => $"about {Text(advised, Percent)}, to {Text(most, Percent)}",
        ({ } advised, null) => $"about {Text(advised, Percent)}",
        (null, { } most) => $"up to {Text(most, Percent)}",
        _ => "not at hand",
    };

    private static string Percent(double percent) => $"{ReaderText.Significant(percent)} %";

    private static string Millimeters(double millimeters) => $"{ReaderText.Significant(millimeters)} mm";

    private static string Count(Sourced<int> count) => Text(count, number => number.ToString(CultureInfo.InvariantCulture));

    private static string Text<T>(Sourced<T> sourced, Func<T, string> text)
        where T : struct =>
        text(sourced.Value) + (sourced.Tolerance is { } tolerance ? $" ± {text(tolerance)}" : "") + (sourced.Source.Read ? "" : Reading);
}
