using Drypeak.Service.Field;

namespace Drypeak.Service.Pages.FieldDensity;

/// <summary>A limit of the specification, as the form offers it.</summary>
/// <param name="Field">The field.</param>
/// <param name="Quantity">The requirement's quantity.</param>
/// <param name="IsMinimum">Whether it is the lower limit.</param>
internal sealed record LimitField(FormField Field, string Quantity, bool IsMinimum);

/// <summary>A method of the form, with its readings.</summary>
/// <param name="Code">Its code.</param>
/// <param name="Label">Its name.</param>
/// <param name="Readings">Its fields.</param>
public sealed record MethodFields(string Code, string Label, IReadOnlyList<FormField> Readings);

/// <summary>The fields of the field form, each with the place of the request that it fills.</summary>
internal static class FieldTestFields
{
    public static readonly FormField Reference = new("reference", "Reference", "/reference");
    public static readonly FormField Method = new("method", "Method", "/method", FieldMethodNames.SandCone);
    public static readonly FormField MassUnit = new("mass-unit", "Masses in", "/units/mass", "g");
    public static readonly FormField VolumeUnit = new("volume-unit", "Volumes in", "/units/volume", "cm3");
    public static readonly FormField DensityUnit = new("density-unit", "Densities in", "/units/density", "Mg/m3");
    public static readonly FormField LengthUnit = new("length-unit", "Lengths in", "/units/length", "mm");
    public static readonly FormField DecimalMark = new("decimal-mark", "Decimal mark", "", "found");

    public static readonly FormField SoilWet = new("soil-wet", "Wet soil out of the hole", "/soil/wet");
    public static readonly FormField SoilFull = new("soil-full", "Container and wet soil", "/soil/containerAndWet");
    public static readonly FormField SoilContainer = new("soil-container", "Empty container", "/soil/container");
    public static readonly FormField Particle = new("largest-particle", "Largest particle", "/largestParticle");

    public static readonly FormField Water = new("water-content", "Water content", "/waterContent");
    public static readonly FormField Tin = new("tin", "Tin", "/tins/0/tin");
    public static readonly FormField TinWet = new("tin-wet", "Tin and wet soil", "/tins/0/wet");
    public static readonly FormField TinDry = new("tin-dry", "Tin and dry soil", "/tins/0/dry");
    public static readonly FormField Gravity = new("specific-gravity", "Specific gravity", "/specificGravity/value");
    public static readonly FormField Determined = new("determined", "How it is known", "/specificGravity/determined", "assumed");

    public static readonly FormField Maximum = new("maximum-dry-density", "Maximum dry density", "/laboratory/maximumDryDensity");
    public static readonly FormField Optimum = new("optimum-water-content", "Optimum water content", "/laboratory/optimumWaterContent");
    public static readonly FormField Minimum = new("minimum-dry-density", "Minimum dry density", "/laboratory/minimumDryDensity");
    public static readonly FormField MaximumUncertainty = new("maximum-uncertainty", "± maximum dry density", "/laboratory/uncertainty/maximumDryDensity");
    public static readonly FormField OptimumUncertainty = new("optimum-uncertainty", "± optimum water content", "/laboratory/uncertainty/optimumWaterContent");
    public static readonly FormField DryUncertainty = new("dry-uncertainty", "± field dry density", "/uncertainty/dryDensity");
    public static readonly FormField WaterUncertainty = new("water-uncertainty", "± field water content", "/uncertainty/waterContent");

    public static readonly FormField OversizePercent = new("oversize-percent", "Share of the dry mass", "/oversize/percent");
    public static readonly FormField OversizeGravity = new("oversize-gravity", "Gs of the particles, bulk", "/oversize/specificGravity");
    public static readonly FormField OversizeWater = new("oversize-water", "Their water content", "/oversize/waterContent");
    public static readonly FormField OversizeApply = new("oversize-apply", "Corrected is", "/oversize/apply", FieldDensityMapping.ToLaboratory);

    public static readonly FormField Rule = new("rule", "Decided by", "/specification/decision/rule", Specification.Simple);
    public static readonly FormField Risk = new("risk", "Risk", "/specification/decision/risk");
    public static readonly FormField Working = new("working", "Show the working", "/trace");

    public static readonly LimitField LeastCompaction = new(new("least-compaction", "Relative compaction at least", ""), "relativeCompaction", true);
    public static readonly LimitField DriestAllowed = new(new("driest", "From the optimum, not below", ""), "waterContentFromOptimum", true);
    public static readonly LimitField WettestAllowed = new(new("wettest", "From the optimum, not above", ""), "waterContentFromOptimum", false);
    public static readonly LimitField MostAirVoids = new(new("most-air-voids", "Air voids at most", ""), "airVoids", false);

    public static IReadOnlyList<LimitField> Limits { get; } = [LeastCompaction, DriestAllowed, WettestAllowed, MostAirVoids];

    public static IReadOnlyList<MethodFields> Methods { get; } =
    [
        new(FieldMethodNames.SandCone, "Sand cone",
        [
            new("sand-before", "Jar of sand before", "/sandCone/before"), new("sand-after", "Jar of sand after", "/sandCone/after"),
            new("sand-cone", "Sand in cone and plate", "/sandCone/coneAndPlate"), new("sand-density", "Density of the sand", "/sandCone/sandDensity"),
        ]),
        new(FieldMethodNames.RubberBalloon, "Rubber balloon",
            [new("balloon-initial", "Reading before the hole", "/rubberBalloon/initialReading"), new("balloon-final", "Reading in the hole", "/rubberBalloon/finalReading")]),
        new(FieldMethodNames.DriveCylinder, "Drive cylinder",
        [
            new("cylinder-volume", "Volume", "/driveCylinder/volume"), new("cylinder-diameter", "or inside diameter", "/driveCylinder/diameter"),
            new("cylinder-height", "and height", "/driveCylinder/height"),
        ]),
        new(FieldMethodNames.WaterReplacement, "Water replacement",
            [new("water-with-hole", "Water in pit and template", "/waterReplacement/withHole"), new("water-template", "Water in the template alone", "/waterReplacement/templateOnly")]),
        new(FieldMethodNames.NuclearGauge, "Nuclear gauge",
            [new("gauge-density", "Wet density, each reading", "/nuclearGauge/wetDensity"), new("gauge-water", "Water content, each reading", "/nuclearGauge/waterContent")]),
        new(FieldMethodNames.Direct, "Density known",
            [new("direct-wet", "Wet density", "/direct/wetDensity"), new("direct-dry", "or dry density", "/direct/dryDensity")]),
    ];

    /// <summary>Fields that hold a word, not a number.</summary>
    public static IReadOnlyList<FormField> Words { get; } = [Reference, Method, MassUnit, VolumeUnit, DensityUnit, LengthUnit, Determined, OversizeApply, Rule];

    /// <summary>Numbers that every method shares.</summary>
    public static IReadOnlyList<FormField> SharedNumbers { get; } =
    [
        SoilWet, SoilFull, SoilContainer, Particle, Water, Tin, TinWet, TinDry, Gravity, Maximum, Optimum, Minimum,
        MaximumUncertainty, OptimumUncertainty, DryUncertainty, WaterUncertainty, OversizePercent, OversizeGravity, OversizeWater, Risk,
    ];

    public static IReadOnlyList<FormField> All { get; } =
        [.. Words, .. Methods.SelectMany(method => method.Readings), .. SharedNumbers, DecimalMark, Working, .. Limits.Select(limit => limit.Field)];

    /// <summary>Whether a field takes several numbers.</summary>
    public static bool IsList(this FormField field) => field.Place.StartsWith("/nuclearGauge/", StringComparison.Ordinal);
}
