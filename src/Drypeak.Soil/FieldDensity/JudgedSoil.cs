using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.References;

namespace Drypeak.Soil.FieldDensity;

/// <summary>
/// The soil in place beside its reference, and every quantity that a specification may look at. What is unknown is null, and makes null what
/// follows from it. A value and its uncertainty come from the same formulas: the uncertainty moves the inputs.
/// </summary>
public sealed record JudgedSoil
{
    /// <summary>Dry density in place, of all the material, kg/m³.</summary>
    public double? DryDensity { get; init; }

    /// <summary>Wet density in place where no dry density is known, kg/m³.</summary>
    public double? WetDensityAlone { get; init; }

    /// <summary>Water content in place, of all the material, as a fraction.</summary>
    public double? WaterContent { get; init; }

    /// <summary>The reference's maximum dry density as the laboratory found it, kg/m³.</summary>
    public double? MaximumDryDensity { get; init; }

    /// <summary>The reference's optimum water content as the laboratory found it, as a fraction.</summary>
    public double? OptimumWaterContent { get; init; }

    /// <summary>The reference's minimum dry density, kg/m³.</summary>
    public double? MinimumDryDensity { get; init; }

    /// <summary>Specific gravity of the solids.</summary>
    public double? SpecificGravity { get; init; }

    /// <summary>Density of water, kg/m³.</summary>
    public required double WaterDensity { get; init; }

    /// <summary>Oversize with its specific gravity, or null where nothing is corrected.</summary>
    public Oversize? Oversize { get; init; }

    /// <summary>Whether the field is corrected to its fines; else the reference to the total.</summary>
    public bool OnFines { get; init; }

    /// <summary>What the spread of readings does to wet density and water content: the uncertainty of each where none was given.</summary>
    public IReadOnlyList<ReadingEffect> Effects { get; init; } = [];

    /// <summary>The fines in place; null where they are not asked for, or not possible.</summary>
    public DensityAndWater? Fines => OnFines && Oversize is { SpecificGravity: { } gravity } stones && DryDensity is { } dry && WaterContent is { } w
        ? OversizeCorrection.ToFines(new DensityAndWater(new Density(dry), new WaterContent(w)), stones.Fraction, gravity, stones.WaterContent, new Density(WaterDensity))
        : null;

    /// <summary>The reference's maximum dry density that the field is held against, kg/m³.</summary>
    public double? ReferenceDensity => DensityOfTotal(MaximumDryDensity);

    /// <summary>The reference's minimum dry density that the field is held against, kg/m³.</summary>
    public double? ReferenceMinimum => DensityOfTotal(MinimumDryDensity);

    /// <summary>The reference's optimum water content that the field is held against, as a fraction.</summary>
    public double? ReferenceWater => ReferenceIsCorrected && OptimumWaterContent is { } w
        ? ToTotal(1000, w).WaterContent.Fraction
        : OptimumWaterContent;

    /// <summary>Whether the reference is corrected to the field's oversize.</summary>
    public bool ReferenceIsCorrected => Oversize is { SpecificGravity: { } } && !OnFines;

    private bool FieldIsCorrected => Oversize is { SpecificGravity: { } } && OnFines;

    private double? ComparedDensity => FieldIsCorrected ? Fines?.DryDensity.KilogramsPerCubicMeter : DryDensity;

    private double? ComparedWater => FieldIsCorrected ? Fines?.WaterContent.Fraction : WaterContent;

    private double? VoidRatio => SpecificGravity is { } gs && DryDensity is { } dry && PhaseRelations.VoidRatio(new Density(dry), gs, new Density(WaterDensity)) is (> 0 and var e) ? e : null;

    /// <summary>The value of a quantity, in its SI unit; null where something that it needs is unknown.</summary>
    public double? ValueOf(AcceptedQuantity quantity) => quantity switch
    {
        AcceptedQuantity.RelativeCompaction => ComparedDensity / ReferenceDensity,
        AcceptedQuantity.DryDensity => DryDensity,
        AcceptedQuantity.WetDensity => WaterContent is { } w && DryDensity is { } dry ? dry * (1 + w) : WetDensityAlone,
        AcceptedQuantity.WaterContent => WaterContent,
        AcceptedQuantity.WaterContentFromOptimum => ComparedWater - ReferenceWater,
        AcceptedQuantity.Saturation => WaterContent is { } w && VoidRatio is { } e ? PhaseRelations.Saturation(new WaterContent(w), e, SpecificGravity!.Value) : null,
        AcceptedQuantity.AirVoids => WaterContent is { } w && VoidRatio is { } ? PhaseRelations.AirVoids(new WaterContent(w), new Density(DryDensity!.Value), SpecificGravity!.Value, new Density(WaterDensity)) : null,
        AcceptedQuantity.RelativeDensity => ComparedDensity is { } dry && ReferenceDensity is { } most && ReferenceMinimum is { } least && least < most
            ? DensityLimits.OfDensities(least, most).RelativeDensityAt(1 / dry)
            : null,
        AcceptedQuantity.VoidRatio => VoidRatio,
        _ => throw new ArgumentOutOfRangeException(nameof(quantity)),
    };

    /// <summary>
    /// Standard uncertainty of a quantity to first order, the inputs independent; null where none of those that matter is known. An uncertainty that
    /// was given stands for the whole of its value; dry density and water content without one take what the spread of their readings does to them.
    /// </summary>
    public double? StandardUncertaintyOf(AcceptedQuantity quantity, FieldUncertainty uncertainty) => FirstOrderUncertainty.Of(
        moved => (this with { DryDensity = moved[0], WaterContent = moved[1], MaximumDryDensity = moved[2], OptimumWaterContent = moved[3], SpecificGravity = moved[4] })
            .MovedByReadings(moved.AsSpan(5), uncertainty).ValueOf(quantity),
        [
            (DryDensity, uncertainty.DryDensity?.KilogramsPerCubicMeter),
            (WaterContent, uncertainty.WaterContent?.Fraction),
            (MaximumDryDensity, uncertainty.MaximumDryDensity?.KilogramsPerCubicMeter),
            (OptimumWaterContent, uncertainty.OptimumWaterContent?.Fraction),
            (SpecificGravity, uncertainty.SpecificGravity),
            .. Effects.Select(_ => ((double?)1, (double?)1)),
        ]);

    /// <summary>The soil with each reading's effect taken so many times more or less: 1 is the soil as it was read.</summary>
    private JudgedSoil MovedByReadings(ReadOnlySpan<double?> times, FieldUncertainty given)
    {
        var (ofWet, ofWater) = (0.0, 0.0);
        for (var i = 0; i < times.Length; i++)
        {
            ofWet += (times[i]!.Value - 1) * Effects[i].WetDensity;
            ofWater += (times[i]!.Value - 1) * Effects[i].WaterContent;
        }

        return this with
        {
            DryDensity = given.DryDensity is null && WaterContent is { } w ? ((DryDensity * (1 + w)) + ofWet) / (1 + w + ofWater) : DryDensity,
            WetDensityAlone = WetDensityAlone + ofWet,
            WaterContent = given.WaterContent is null ? WaterContent + ofWater : WaterContent,
        };
    }

    private double? DensityOfTotal(double? fines) => ReferenceIsCorrected && fines is { } density ? ToTotal(density, 0).DryDensity.KilogramsPerCubicMeter : fines;

    private DensityAndWater ToTotal(double density, double w) => OversizeCorrection.ToTotal(
        new DensityAndWater(new Density(density), new WaterContent(w)), Oversize!.Fraction, Oversize.SpecificGravity!.Value, Oversize.WaterContent, new Density(WaterDensity));
}
