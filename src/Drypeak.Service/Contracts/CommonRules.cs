using Drypeak.Soil.Phases;
using FluentValidation;

namespace Drypeak.Service.Contracts;

internal sealed class UnitsRules : AbstractValidator<UnitsContract>
{
    public UnitsRules()
    {
        RuleFor(units => units.Mass).OneOf(UnitNames.Mass.Keys, "unknown-unit");
        RuleFor(units => units.TinMass).OneOf(UnitNames.Mass.Keys, "unknown-unit");
        RuleFor(units => units.Volume).OneOf(UnitNames.Volume.Keys, "unknown-unit");
        RuleFor(units => units.Density).OneOf(UnitNames.Density.Keys, "unknown-unit");
        RuleFor(units => units.Length).OneOf(UnitNames.Length.Keys, "unknown-unit");
    }
}

internal sealed class SpecificGravityRules : AbstractValidator<SpecificGravityContract>
{
    /// <summary>The densest element is osmium, 22.6.</summary>
    public const double Greatest = 25;

    public SpecificGravityRules()
    {
        RuleFor(gravity => gravity.Value).Needed().Within(0.1, Greatest);
        RuleFor(gravity => gravity.Determined).OneOf(["measured", "assumed"], "unknown-word");
    }
}

internal sealed class TinRules : AbstractValidator<TinContract>
{
    public TinRules()
    {
        RuleFor(tin => tin.Tin).Needed().NotNegative();
        RuleFor(tin => tin.Wet).Needed().Positive();
        RuleFor(tin => tin.Dry).Needed().Positive();
        // One fault a tin: a mass that is impossible by itself is not held against the others, nor one too heavy against the tin.
        RuleFor(tin => tin.Dry).Must((tin, dry) => !(tin.Wet > 0 && dry > tin.Wet))
            .WithErrorCode("dry-over-wet")
            .WithMessage((tin, dry) => $"Tin and dry soil, {RuleWords.Text(dry)}, are heavier than tin and wet soil, {RuleWords.Text(tin.Wet)}. Were the two exchanged?");
        RuleFor(tin => tin.Dry).Must((tin, dry) => !(dry > 0 && dry <= tin.Tin && dry <= tin.Wet))
            .WithErrorCode("dry-not-over-tin")
            .WithMessage((tin, dry) => $"Tin and dry soil, {RuleWords.Text(dry)}, are not heavier than the empty tin, {RuleWords.Text(tin.Tin)}. Give the masses with the tin.");
    }
}

internal sealed class CarbideRules : AbstractValidator<CarbideContract>
{
    public CarbideRules()
    {
        RuleFor(carbide => carbide.Reading).Needed();
        RuleFor(carbide => carbide.Reading).PercentBelow100().When(carbide => carbide.HalfSample is not true);
        RuleFor(carbide => carbide.Reading).Must(reading => reading is null or (>= 0 and < 50)).When(carbide => carbide.HalfSample is true)
            .WithErrorCode("out-of-range")
            .WithMessage((_, reading) => $"A half sample's reading counts twice: it must lie from 0 to below 50 %; {RuleWords.Text(reading)} was received.");
    }
}

internal sealed class MoldRules : AbstractValidator<MoldContract>
{
    /// <summary>Readings of one length.</summary>
    public const int MostReadings = 20;

    public MoldRules()
    {
        RuleFor(mold => mold.Mass).NotNegative();
        RuleFor(mold => mold.Volume).Positive();
        RuleFor(mold => mold.Diameter).Positive();
        RuleFor(mold => mold.Diameters).Counted(MostReadings);
        RuleForEach(mold => mold.Diameters).Positive();
        RuleFor(mold => mold.Height).Positive();
        RuleFor(mold => mold.Heights).Counted(MostReadings);
        RuleForEach(mold => mold.Heights).Positive();
        RuleFor(mold => mold.Height).NotNull().When(mold => (mold.Diameter is { } || mold.Diameters is { }) && mold.Heights is null)
            .WithErrorCode("incomplete").WithMessage("A diameter needs a height: give both, or the volume.");
        RuleFor(mold => mold.Diameter).NotNull().When(mold => (mold.Height is { } || mold.Heights is { }) && mold.Diameters is null)
            .WithErrorCode("incomplete").WithMessage("A height needs a diameter: give both, or the volume.");

        RuleFor(mold => mold.Empty).Positive();
        RuleFor(mold => mold.WithWater).Positive();
        RuleFor(mold => mold.Plate).Positive();
        RuleFor(mold => mold.WithWater).NotNull().When(mold => mold.Empty is { } || mold.Plate is { })
            .WithErrorCode("incomplete").WithMessage("A volume by water needs both masses: give empty and withWater.");
        RuleFor(mold => mold.Empty).NotNull().When(mold => mold.WithWater is { } || mold.Plate is { })
            .WithErrorCode("incomplete").WithMessage("A volume by water needs both masses: give empty and withWater.");
        RuleFor(mold => mold.WithWater).Must((mold, full) => !(full > 0 && full <= mold.Empty))
            .WithErrorCode("water-not-over-empty")
            .WithMessage((mold, full) => $"The mold full of water, {RuleWords.Text(full)}, is not heavier than empty, {RuleWords.Text(mold.Empty)}.");
        RuleFor(mold => mold.Plate).Must((mold, plate) => !(mold.Empty > 0 && plate >= mold.Empty))
            .WithErrorCode("plate-over-empty")
            .WithMessage((mold, plate) => $"The plate, {RuleWords.Text(plate)}, is not lighter than the empty mold with it, {RuleWords.Text(mold.Empty)}. Weigh the plate in both, or in neither.");
        RuleFor(mold => mold.WaterTemperature).Within(WaterDensity.LowestTemperature, WaterDensity.HighestTemperature, " °C");
    }
}

internal sealed class OversizeRules : AbstractValidator<OversizeContract>
{
    public OversizeRules()
    {
        RuleFor(oversize => oversize.Percent).Needed().PercentBelow100();
        RuleFor(oversize => oversize.SpecificGravity).Within(0.1, SpecificGravityRules.Greatest);
        RuleFor(oversize => oversize.WaterContent).Within(0, 1000, " %");
        RuleFor(oversize => oversize.Sieve).Positive();
    }
}

/// <summary>Rules of lines in the plane of water content and dry density.</summary>
internal static class LineRules
{
    public static IRuleBuilderOptions<T, IReadOnlyList<double>?> LinesOfAKind<T>(this IRuleBuilder<T, IReadOnlyList<double>?> rule, int greatest) =>
        rule.Must(list => list is null || list.Count <= greatest)
            .WithErrorCode("too-many").WithMessage((_, list) => $"There may be up to {greatest} lines of a kind; there are {list!.Count}.");

    public static IRuleBuilderOptions<T, double> Saturation<T>(this IRuleBuilder<T, double> rule) =>
        rule.Must(value => value is > 0 and <= 100)
            .WithErrorCode("out-of-range").WithMessage((_, value) => $"A degree of saturation lies over 0 and up to 100 %; {RuleWords.Text(value)} was received.");

    public static IRuleBuilderOptions<T, double> AirVoids<T>(this IRuleBuilder<T, double> rule) =>
        rule.Must(value => value is >= 0 and < 100)
            .WithErrorCode("out-of-range").WithMessage((_, value) => $"Air voids lie from 0 to below 100 %; {RuleWords.Text(value)} was received.");
}
