using Drypeak.Service.Contracts;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Quantities;
using FluentValidation;

namespace Drypeak.Service.Earthwork;

/// <summary>The unit names that only sites speak, and what they mean.</summary>
internal static class EarthworkUnitNames
{
    public static readonly IReadOnlyDictionary<string, MassUnit> Mass = Enum.GetValues<MassUnit>().ToDictionary(unit => unit.Code());

    public static readonly IReadOnlyDictionary<string, VolumeUnit> Liquid =
        new[] { VolumeUnit.Liter, VolumeUnit.CubicMeter, VolumeUnit.Gallon, VolumeUnit.CubicFoot, VolumeUnit.AcreFoot }.ToDictionary(unit => unit.Code());

    public static readonly IReadOnlyDictionary<string, AreaUnit> Area = Enum.GetValues<AreaUnit>().ToDictionary(unit => unit.Code());

    public static readonly IReadOnlyDictionary<string, VolumeUnit> BulkVolume =
        new[] { VolumeUnit.CubicMeter, VolumeUnit.Liter, VolumeUnit.CubicFoot, VolumeUnit.CubicYard, VolumeUnit.AcreFoot }.ToDictionary(unit => unit.Code());

    public static readonly IReadOnlyDictionary<string, SpeedUnit> Speed = Enum.GetValues<SpeedUnit>().ToDictionary(unit => unit.Code());

    public static readonly IReadOnlyDictionary<string, LengthUnit> Distance =
        new[] { LengthUnit.Meter, LengthUnit.Kilometer, LengthUnit.Foot, LengthUnit.Mile }.ToDictionary(unit => unit.Code());

    private static readonly EarthworkUnits Default = new(new UnitSet());

    /// <summary>The units meant, each with its default; call with names that passed the rules.</summary>
    public static EarthworkUnits ToUnits(this EarthworkUnitsContract? units)
    {
        var mass = Meant(Mass, units?.Mass, Default.Mass);
        return new EarthworkUnits(
            new UnitSet(
                mass,
                Meant(UnitNames.Mass, units?.TinMass, UnitNames.Mass.Values.Contains(mass) ? mass : Default.Mass),
                Meant(UnitNames.Volume, units?.Volume, Default.Basic.Volume),
                Meant(UnitNames.Density, units?.Density, Default.Density),
                Meant(UnitNames.Length, units?.Length, Default.Length)),
            Meant(Liquid, units?.Liquid, Default.Liquid),
            Meant(Area, units?.Area, Default.Area),
            Meant(BulkVolume, units?.BulkVolume, Default.BulkVolume),
            Meant(Speed, units?.Speed, Default.Speed),
            Meant(Distance, units?.Distance, Default.Distance));
    }

    /// <summary>All the units by name, as an answer repeats them.</summary>
    public static EarthworkUnitsContract ToContract(this EarthworkUnits units) => new()
    {
        Mass = units.Mass.Code(),
        TinMass = units.Basic.TinMass.Code(),
        Volume = units.Basic.Volume.Code(),
        Density = units.Density.Code(),
        Length = units.Length.Code(),
        Liquid = units.Liquid.Code(),
        Area = units.Area.Code(),
        BulkVolume = units.BulkVolume.Code(),
        Speed = units.Speed.Code(),
        Distance = units.Distance.Code(),
    };

    /// <summary>Water in the caller's units.</summary>
    public static WaterAmountAnswer ToAnswer(this WaterAmount water, EarthworkUnits units) =>
        new(water.Mass.In(units.Mass), water.Volume.In(units.Liquid));

    private static TUnit Meant<TUnit>(IReadOnlyDictionary<string, TUnit> names, string? name, TUnit otherwise) =>
        name is null ? otherwise : names[name];
}

internal sealed class EarthworkUnitsRules : AbstractValidator<EarthworkUnitsContract>
{
    private const string UnknownUnit = "unknown-unit";

    public EarthworkUnitsRules()
    {
        RuleFor(units => units.Mass).OneOf(EarthworkUnitNames.Mass.Keys, UnknownUnit);
        RuleFor(units => units.TinMass).OneOf(UnitNames.Mass.Keys, UnknownUnit);
        RuleFor(units => units.Volume).OneOf(UnitNames.Volume.Keys, UnknownUnit);
        RuleFor(units => units.Density).OneOf(UnitNames.Density.Keys, UnknownUnit);
        RuleFor(units => units.Length).OneOf(UnitNames.Length.Keys, UnknownUnit);
        RuleFor(units => units.Liquid).OneOf(EarthworkUnitNames.Liquid.Keys, UnknownUnit);
        RuleFor(units => units.Area).OneOf(EarthworkUnitNames.Area.Keys, UnknownUnit);
        RuleFor(units => units.BulkVolume).OneOf(EarthworkUnitNames.BulkVolume.Keys, UnknownUnit);
        RuleFor(units => units.Speed).OneOf(EarthworkUnitNames.Speed.Keys, UnknownUnit);
        RuleFor(units => units.Distance).OneOf(EarthworkUnitNames.Distance.Keys, UnknownUnit);
    }
}
