using Drypeak.Service.Contracts;
using Drypeak.Soil.Curves;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;

namespace Drypeak.Service.Laboratory;

/// <summary>From the contract's numbers to the domain's quantities. Call with requests that passed the rules.</summary>
internal static class MoistureDensityMapping
{
    public const string CustomMethod = "custom";
    private const string Auto = "auto";

    private static readonly IReadOnlyDictionary<string, CurveModel> Models =
        Enum.GetValues<CurveModel>().ToDictionary(model => model.Name());

    public static IEnumerable<string> ModelNames => Models.Keys.Prepend(Auto);

    /// <summary>A model's name in the interface.</summary>
    public static string Name(this CurveModel model) => model.ToString().ToLowerInvariant();

    /// <summary>A specimen's label, or its position.</summary>
    public static string LabelOr(this SpecimenContract specimen, int index) =>
        specimen.Label ?? (index + 1).ToString(System.Globalization.CultureInfo.InvariantCulture);

    public static MoistureDensityTest ToTest(this MoistureDensityRequest request)
    {
        var units = request.Units.ToUnitSet();
        return new MoistureDensityTest
        {
            Method = request.Method is { } code ? TestMethodCatalogue.Find(code) : null,
            CustomEffort = request.Effort is { RammerMass: { } rammer, Drop: { } drop, Layers: { } layers, Blows: { } blows }
                ? new CustomEffort(Mass.From(rammer, units.Mass), Length.From(drop, units.Length), layers, blows)
                : null,
            IsCustomMethod = request.Method == CustomMethod,
            Mold = request.Mold.ToMold(units),
            SpecificGravity = request.SpecificGravity is { Value: { } value } gravity
                ? new SpecificGravity(value, gravity.Determined == "measured")
                : null,
            WaterDensity = request.Water(),
            WaterTemperature = request.Temperature(),
            Specimens = [.. request.Specimens!.Select((specimen, i) => specimen.ToMeasurement(i, units))],
            Oversize = request.Oversize?.ToOversize(),
            ParticlesAbove = request.ParticlesAbove is { Sieve: { } sieve, Percent: { } above } ? new ParticlesAbove(sieve, above / 100) : null,
            Model = request.Curve?.Model is { } name && name != Auto ? Models[name] : null,
            Adopted = request.Curve?.Adopted is { WaterContent: { } w, MaximumDryDensity: { } density, Reason: { } reason }
                ? new AdoptedPeak(WaterContent.FromPercent(w), Density.From(density, units.Density), reason)
                : null,
            Uncertainty = request.Uncertainty?.ToUncertainty(units),
            Units = units,
        };
    }

    public static SpecimenMeasurement ToMeasurement(this SpecimenContract specimen, int index, UnitSet units)
    {
        var water = specimen.ToMeasuredWater(units);
        return new SpecimenMeasurement
        {
            Label = specimen.LabelOr(index),
            MoldAndWetSoil = specimen.MoldAndWetSoil is { } full ? Mass.From(full, units.Mass) : null,
            WetMass = specimen.WetMass is { } wet ? Mass.From(wet, units.Mass) : null,
            WetDensity = specimen.WetDensity is { } wetDensity ? Density.From(wetDensity, units.Density) : null,
            DryDensity = specimen.DryDensity is { } dryDensity ? Density.From(dryDensity, units.Density) : null,
            Mold = specimen.Mold.ToMold(units),
            DepthBelowRim = ToLength(specimen.DepthBelowRim, specimen.DepthsBelowRim, units),
            Tins = water.Tins,
            WaterContent = water.Given,
            WaterContentFromWetBasis = water.FromWetBasis,
            WaterContentFromCarbide = water.FromCarbide,
            SetAside = specimen.SetAside,
        };
    }

    public static Mold? ToMold(this MoldContract? mold, UnitSet units) => mold is null ? null : new Mold
    {
        Mass = mold.Mass is { } mass ? Mass.From(mass, units.Mass) : null,
        Volume = mold.Volume is { } volume ? Volume.From(volume, units.Volume) : null,
        Diameter = ToLength(mold.Diameter, mold.Diameters, units),
        Height = ToLength(mold.Height, mold.Heights, units),
        WaterFilling = mold is { Empty: { } empty, WithWater: { } full }
            ? new WaterFilling(
                Mass.From(empty, units.Mass),
                Mass.From(full, units.Mass),
                mold.Plate is { } plate ? Mass.From(plate, units.Mass) : null,
                WaterDensity.At(mold.WaterTemperature ?? WaterDensity.DefaultTemperature))
            : null,
    };

    public static Oversize? ToOversize(this OversizeContract oversize) => oversize.Percent is { } percent
        ? new Oversize(percent / 100, oversize.SpecificGravity, WaterContent.FromPercent(oversize.WaterContent ?? 0), oversize.Sieve)
        : null;

    private static MeasuredLength? ToLength(double? given, IReadOnlyList<double>? readings, UnitSet units) => given is null && readings is null ? null : new MeasuredLength
    {
        Given = given is { } value ? Length.From(value, units.Length) : null,
        Readings = [.. (readings ?? []).Select(reading => Length.From(reading, units.Length))],
    };

    private static MeasurementUncertainty ToUncertainty(this UncertaintyRequest uncertainty, UnitSet units) => new()
    {
        Mass = uncertainty.Mass is { } mass ? Mass.From(mass, units.Mass) : null,
        TinMass = uncertainty.TinMass is { } tinMass ? Mass.From(tinMass, units.TinMass) : null,
        Volume = uncertainty.Volume is { } volume ? Volume.From(volume, units.Volume) : null,
        WaterContent = uncertainty.WaterContent is { } w ? WaterContent.FromPercent(w) : null,
        DryDensity = uncertainty.DryDensity is { } dryDensity ? Density.From(dryDensity, units.Density) : null,
        SpecificGravity = uncertainty.SpecificGravity,
    };
}
