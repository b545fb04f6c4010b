using Drypeak.Service.Contracts;
using Drypeak.Service.Laboratory;
using Drypeak.Soil.FieldDensity;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Field;

/// <summary>From the contract's numbers to the domain's quantities. Call with requests that passed the rules.</summary>
internal static class FieldDensityMapping
{
    public const string ToLaboratory = "laboratory";
    public const string ToField = "field";

    /// <summary>The field test, held against the values of its laboratory.</summary>
    public static FieldTest ToTest(this FieldDensityRequest request)
    {
        var units = request.Units.ToUnitSet();
        return new FieldTest
        {
            Method = request.ToMethod(units),
            Soil = request.Soil is { } soil ? new SoilWeighed(MassOf(soil.ContainerAndWet), MassOf(soil.Container), MassOf(soil.Wet), MassOf(soil.Dry)) : null,
            Water = request.ToMeasuredWater(units),
            SpecificGravity = request.SpecificGravity is { Value: { } value } gravity ? new SpecificGravity(value, gravity.Determined == "measured") : null,
            WaterDensity = request.Water(),
            LargestParticleMillimeters = request.LargestParticle,
            Oversize = request.Oversize?.ToOversize(),
            OnFines = request.Oversize?.Apply == ToField,
            Reference = request.Laboratory.ToReference(units),
            Uncertainty = request.Uncertainty.ToUncertainty(request.Laboratory, units),
            Requirements = request.Specification.ToRequirements(units),
            Decision = request.Specification.ToDecision(),
            Units = units,
        };

        Mass? MassOf(double? mass) => mass is { } given ? Mass.From(given, units.Mass) : null;
    }

    /// <summary>The values of a laboratory, without the test that it may bring in their place.</summary>
    public static ReferenceValues ToReference(this LaboratoryContract? laboratory, UnitSet units) => new()
    {
        MaximumDryDensity = DensityOf(laboratory?.MaximumDryDensity, units),
        OptimumWaterContent = WaterOf(laboratory?.OptimumWaterContent),
        MinimumDryDensity = DensityOf(laboratory?.MinimumDryDensity, units),
    };

    /// <summary>The standard uncertainties of field and laboratory.</summary>
    public static FieldUncertainty ToUncertainty(this FieldUncertaintyContract? field, LaboratoryContract? laboratory, UnitSet units) => new()
    {
        DryDensity = DensityOf(field?.DryDensity, units),
        WaterContent = WaterOf(field?.WaterContent),
        SpecificGravity = field?.SpecificGravity,
        MaximumDryDensity = DensityOf(laboratory?.Uncertainty?.MaximumDryDensity, units),
        OptimumWaterContent = WaterOf(laboratory?.Uncertainty?.OptimumWaterContent),
    };

    private static Density? DensityOf(double? density, UnitSet units) => density is { } given ? Density.From(given, units.Density) : null;

    private static WaterContent? WaterOf(double? percent) => percent is { } given ? WaterContent.FromPercent(given) : null;

    /// <summary>The field test, held against a laboratory test: its adopted peak before the fitted one, and corrected for the oversize of its own where the field names none.</summary>
    public static FieldTest Against(this FieldTest field, MoistureDensityTest test, MoistureDensityResult result)
    {
        var (w, density) = test.Adopted is { } adopted ? (adopted.WaterContent, adopted.MaximumDryDensity)
            : result.Optimum is { } optimum ? (new WaterContent(optimum.WaterContent.Value), new Density(optimum.MaximumDryDensity.Value))
            : ((WaterContent?)null, (Density?)null);
        var corrected = field.Oversize is null ? result.Corrected : null;
        var fitted = test.Adopted is null ? result.Optimum : null;
        return field with
        {
            SpecificGravity = field.SpecificGravity ?? test.SpecificGravity,
            Reference = field.Reference with
            {
                OptimumWaterContent = corrected?.WaterContent ?? w,
                MaximumDryDensity = corrected?.DryDensity ?? density,
                CorrectedForOversize = corrected is { },
            },
            Uncertainty = field.Uncertainty with
            {
                OptimumWaterContent = fitted?.WaterContent.StandardUncertainty is { } ofWater ? new WaterContent(ofWater) : null,
                MaximumDryDensity = fitted?.MaximumDryDensity.StandardUncertainty is { } ofDensity ? new Density(ofDensity) : null,
            },
        };
    }

    private static FieldMethod ToMethod(this FieldDensityRequest request, UnitSet units)
    {
        Volume VolumeOf(double? volume) => Volume.From(volume!.Value, units.Volume);
        return request switch
        {
            { SandCone: { } cone } => cone.ToSandCone(units),
            { RubberBalloon: { } balloon } => new RubberBalloon(VolumeOf(balloon.InitialReading), VolumeOf(balloon.FinalReading)),
            { DriveCylinder: { } cylinder } => new DriveCylinder(
                cylinder.Volume is { } volume ? Volume.From(volume, units.Volume) : null,
                cylinder.Diameter is { } diameter ? Length.From(diameter, units.Length) : null,
                cylinder.Height is { } height ? Length.From(height, units.Length) : null),
            { WaterReplacement: { } pit } => new WaterReplacement(VolumeOf(pit.WithHole), VolumeOf(pit.TemplateOnly)),
            { NuclearGauge: { } gauge } => new NuclearGauge
            {
                WetDensity = [.. gauge.WetDensity!.Select(density => Density.From(density, units.Density))],
                WaterContent = [.. (gauge.WaterContent ?? []).Select(WaterContent.FromPercent)],
                WaterDensity = [.. (gauge.WaterDensity ?? []).Select(density => Density.From(density, units.Density))],
                OvenPairs = [.. (gauge.OvenPairs ?? []).Select(pair => new OvenPair(WaterContent.FromPercent(pair.Gauge!.Value), WaterContent.FromPercent(pair.Oven!.Value)))],
            },
            { Direct: { } direct } => new DirectDensity(
                direct.WetDensity is { } wet ? Density.From(wet, units.Density) : null,
                direct.DryDensity is { } dry ? Density.From(dry, units.Density) : null),
            _ => throw new ArgumentException("The request has no method's block.", nameof(request)),
        };
    }

    private static SandCone ToSandCone(this SandConeContract cone, UnitSet units)
    {
        return new SandCone
        {
            SandInHole = MassOf(cone.SandInHole),
            Poured = Poured(cone.Before, cone.After, cone.ConeAndPlate),
            ConeVolume = VolumeOf(cone.ConeVolume),
            ReleasedVolume = VolumeOf(cone.ReleasedVolume),
            SandDensity = cone.SandDensity is { } density ? Density.From(density, units.Density) : null,
            Calibration = cone.Calibration is { ContainerVolume: { } container } calibration
                ? new SandCalibration(
                    Volume.From(container, units.Volume), MassOf(calibration.SandMass), Poured(calibration.Before, calibration.After, calibration.ConeAndPlate))
                : null,
        };

        Mass? MassOf(double? mass) => mass is { } given ? Mass.From(given, units.Mass) : null;
        Volume? VolumeOf(double? volume) => volume is { } given ? Volume.From(given, units.Volume) : null;
        SandPoured? Poured(double? before, double? after, double? coneAndPlate) => MassOf(before) is { } first && MassOf(after) is { } second
            ? new SandPoured(first, second, MassOf(coneAndPlate))
            : null;
    }
}
