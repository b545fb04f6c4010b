using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Contracts;

/// <summary>The unit names of the interface, and what they mean.</summary>
internal static class UnitNames
{
    /// <summary>What a balance weighs in; what trucks carry is weighed in the earthwork's own units.</summary>
    public static readonly IReadOnlyDictionary<string, MassUnit> Mass =
        new[] { MassUnit.Gram, MassUnit.Kilogram, MassUnit.Pound }.ToDictionary(unit => unit.Code());

    /// <summary>Volumes of molds and holes.</summary>
    public static readonly IReadOnlyDictionary<string, VolumeUnit> Volume =
        new[] { VolumeUnit.CubicCentimeter, VolumeUnit.Liter, VolumeUnit.CubicMeter, VolumeUnit.CubicInch, VolumeUnit.CubicFoot, VolumeUnit.CubicYard }.ToDictionary(unit => unit.Code());

    public static readonly IReadOnlyDictionary<string, DensityUnit> Density = Enum.GetValues<DensityUnit>().ToDictionary(unit => unit.Code());

    /// <summary>Lengths that are measured by hand.</summary>
    public static readonly IReadOnlyDictionary<string, LengthUnit> Length =
        new[] { LengthUnit.Millimeter, LengthUnit.Centimeter, LengthUnit.Meter, LengthUnit.Inch, LengthUnit.Foot }.ToDictionary(unit => unit.Code());

    private static readonly UnitSet Default = new();

    /// <summary>The units meant, each with its default; call with names that passed the rules.</summary>
    public static UnitSet ToUnitSet(this UnitsContract? units)
    {
        var mass = Meant(Mass, units?.Mass, Default.Mass);
        return new UnitSet(
            mass,
            Meant(Mass, units?.TinMass, mass),
            Meant(Volume, units?.Volume, Default.Volume),
            units.DensityUnit(),
            Meant(Length, units?.Length, Default.Length));
    }

    /// <summary>The unit of density meant; call with a name that passed the rules.</summary>
    public static DensityUnit DensityUnit(this UnitsContract? units) => Meant(Density, units?.Density, Default.Density);

    /// <summary>All the units by name, as an answer repeats them.</summary>
    public static UnitsContract ToContract(this UnitSet units) => new()
    {
        Mass = units.Mass.Code(),
        TinMass = units.TinMass.Code(),
        Volume = units.Volume.Code(),
        Density = units.Density.Code(),
        Length = units.Length.Code(),
    };

    private static TUnit Meant<TUnit>(IReadOnlyDictionary<string, TUnit> names, string? name, TUnit otherwise) =>
        name is null ? otherwise : names[name];
}
