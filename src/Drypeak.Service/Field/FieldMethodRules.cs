using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using FluentValidation;

namespace Drypeak.Service.Field;

/// <summary>The names of the methods in the interface.</summary>
internal static class FieldMethodNames
{
    public const string SandCone = "sand-cone";
    public const string RubberBalloon = "rubber-balloon";
    public const string DriveCylinder = "drive-cylinder";
    public const string WaterReplacement = "water-replacement";
    public const string NuclearGauge = "nuclear-gauge";
    public const string Direct = "direct";

    public static IReadOnlyList<string> All { get; } = [SandCone, RubberBalloon, DriveCylinder, WaterReplacement, NuclearGauge, Direct];

    /// <summary>Whether the method finds a volume, so that the soil out of it is weighed.</summary>
    public static bool WeighsSoil(string? method) => method is SandCone or RubberBalloon or DriveCylinder or WaterReplacement;

    /// <summary>The member that holds the method's readings: <c>sandCone</c>.</summary>
    public static string MemberOf(string method)
    {
        var words = method.Split('-');
        return words[0] + string.Concat(words.Skip(1).Select(word => char.ToUpperInvariant(word[0]) + word[1..]));
    }
}

internal sealed class SandConeRules : AbstractValidator<SandConeContract>
{
    public SandConeRules()
    {
        RuleFor(cone => cone.SandInHole).Positive();
        RuleFor(cone => cone.Before).Positive();
        RuleFor(cone => cone.After).NotNegative();
        RuleFor(cone => cone.ConeAndPlate).Positive();
        RuleFor(cone => cone.SandDensity).Positive();
        RuleFor(cone => cone.ReleasedVolume).Positive();
        RuleFor(cone => cone.ConeVolume).Positive();
        RuleFor(cone => cone.Calibration!).SetValidator(new CalibrationRules()).When(cone => cone.Calibration is { });

        RuleFor(cone => cone.After).NotNull().When(cone => cone.Before is { })
            .WithErrorCode("not-enough-data").WithMessage("The jar was weighed before, and not after. Give after.");
        RuleFor(cone => cone.Before).NotNull().When(cone => cone.After is { })
            .WithErrorCode("not-enough-data").WithMessage("The jar was weighed after, and not before. Give before.");
        RuleFor(cone => cone.ConeAndPlate).NotNull().When(cone => cone is { Before: { }, After: { }, ConeVolume: null })
            .WithErrorCode("not-enough-data").WithMessage("The sand in cone and plate is missing. Give coneAndPlate, or coneVolume.");
        RuleFor(cone => cone.ConeVolume).NotNull().When(cone => cone.ReleasedVolume is { })
            .WithErrorCode("not-enough-data").WithMessage("By volumes, the cone's must be taken off. Give coneVolume.");
        RuleFor(cone => cone.SandDensity).NotNull().When(cone => (cone.Before is { } || cone.SandInHole is { }) && cone.Calibration is null && cone.ReleasedVolume is null)
            .WithErrorCode("not-enough-data").WithMessage("Masses of sand need its density. Give sandDensity, or calibration.");
        RuleFor(cone => cone.SandInHole).NotNull().When(cone => cone is { Before: null, After: null, ReleasedVolume: null })
            .WithErrorCode("not-enough-data").WithMessage("Nothing gives the volume: give sandInHole; or before, after and coneAndPlate; or releasedVolume and coneVolume.");
    }

    private sealed class CalibrationRules : AbstractValidator<SandCalibrationContract>
    {
        public CalibrationRules()
        {
            RuleFor(calibration => calibration.ContainerVolume).Needed().Positive();
            RuleFor(calibration => calibration.SandMass).Positive();
            RuleFor(calibration => calibration.Before).Positive();
            RuleFor(calibration => calibration.After).NotNegative();
            RuleFor(calibration => calibration.ConeAndPlate).Positive();
            RuleFor(calibration => calibration.SandMass).NotNull().When(calibration => calibration is { Before: null, After: null, ConeAndPlate: null })
                .WithErrorCode("not-enough-data").WithMessage("The sand in the container is missing. Give sandMass, or before, after and coneAndPlate.");
            RuleFor(calibration => calibration.Before).NotNull().When(calibration => calibration.After is { } || calibration.ConeAndPlate is { })
                .WithErrorCode("not-enough-data").WithMessage("before, after and coneAndPlate go together: give all three, or sandMass.");
            RuleFor(calibration => calibration.After).NotNull().When(calibration => calibration.Before is { } || calibration.ConeAndPlate is { })
                .WithErrorCode("not-enough-data").WithMessage("before, after and coneAndPlate go together: give all three, or sandMass.");
            RuleFor(calibration => calibration.ConeAndPlate).NotNull().When(calibration => calibration.Before is { } || calibration.After is { })
                .WithErrorCode("not-enough-data").WithMessage("before, after and coneAndPlate go together: give all three, or sandMass.");
        }
    }
}

internal sealed class RubberBalloonRules : AbstractValidator<RubberBalloonContract>
{
    public RubberBalloonRules()
    {
        RuleFor(balloon => balloon.InitialReading).Needed().NotNegative();
        RuleFor(balloon => balloon.FinalReading).Needed().Positive();
    }
}

internal sealed class DriveCylinderRules : AbstractValidator<DriveCylinderContract>
{
    public DriveCylinderRules()
    {
        RuleFor(cylinder => cylinder.Volume).Positive();
        RuleFor(cylinder => cylinder.Diameter).Positive();
        RuleFor(cylinder => cylinder.Height).Positive();
        RuleFor(cylinder => cylinder.Volume).NotNull().When(cylinder => cylinder is { Diameter: null, Height: null })
            .WithErrorCode("not-enough-data").WithMessage("The cylinder's volume is missing. Give volume, or diameter and height.");
        RuleFor(cylinder => cylinder.Height).NotNull().When(cylinder => cylinder.Diameter is { })
            .WithErrorCode("incomplete").WithMessage("A diameter needs a height: give both, or the volume.");
        RuleFor(cylinder => cylinder.Diameter).NotNull().When(cylinder => cylinder.Height is { })
            .WithErrorCode("incomplete").WithMessage("A height needs a diameter: give both, or the volume.");
    }
}

internal sealed class WaterReplacementRules : AbstractValidator<WaterReplacementContract>
{
    public WaterReplacementRules()
    {
        RuleFor(pit => pit.WithHole).Needed().Positive();
        RuleFor(pit => pit.TemplateOnly).Needed().NotNegative();
    }
}

internal sealed class NuclearGaugeRules : AbstractValidator<NuclearGaugeContract>
{
    public NuclearGaugeRules(Limits limits)
    {
        RuleFor(gauge => gauge.WetDensity).Needed().Counted(limits.TinsPerSpecimen);
        RuleForEach(gauge => gauge.WetDensity).MeasuredDensity();
        RuleFor(gauge => gauge.WaterContent).Counted(limits.TinsPerSpecimen);
        RuleForEach(gauge => gauge.WaterContent).Must(w => w is >= 0 and <= 1000)
            .WithErrorCode("out-of-range").WithMessage((_, w) => $"It must lie between 0 and 1000 %; {RuleWords.Text(w)} was received.");
        RuleFor(gauge => gauge.WaterDensity).Counted(limits.TinsPerSpecimen);
        RuleForEach(gauge => gauge.WaterDensity).MeasuredDensity();
        RuleFor(gauge => gauge.OvenPairs).Counted(limits.TinsPerSpecimen);
        RuleForEach(gauge => gauge.OvenPairs).Needed().SetValidator(new OvenPairRules());
    }

    private sealed class OvenPairRules : AbstractValidator<OvenPairContract>
    {
        public OvenPairRules()
        {
            RuleFor(pair => pair.Gauge).Needed().Within(0, 1000, " %");
            RuleFor(pair => pair.Oven).Needed().Within(0, 1000, " %");
        }
    }
}

internal sealed class DirectRules : AbstractValidator<DirectContract>
{
    public DirectRules()
    {
        RuleFor(direct => direct.WetDensity).Positive();
        RuleFor(direct => direct.DryDensity).Positive();
        RuleFor(direct => direct.WetDensity).NotNull().When(direct => direct.DryDensity is null)
            .WithErrorCode("not-enough-data").WithMessage("A density is missing. Give wetDensity or dryDensity.");
    }
}

internal static class ReadingRules
{
    public static IRuleBuilderOptions<T, double> MeasuredDensity<T>(this IRuleBuilder<T, double> rule) =>
        rule.Must(density => density is >= RuleWords.Least and <= RuleWords.Greatest)
            .WithErrorCode("not-positive").WithMessage((_, density) => $"It must be greater than 0, and not over {RuleWords.Text(RuleWords.Greatest)}; {RuleWords.Text(density)} was received.");
}
