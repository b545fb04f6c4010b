using CsCheck;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Soil.Tests.Quantities;

/// <summary>
/// The sizes of the units against exact decimal arithmetic from the definitions: pound 0.45359237 kg and yard 0.9144 m (international yard and
/// pound agreement, 1959), standard gravity 9.80665 m/s² (3rd CGPM, 1901), US gallon 231 in³, acre 4840 yd², mile 1760 yd, short ton 2000 lb. From memory.
/// </summary>
public class UnitTests
{
    private const decimal Inch = 0.0254m, Foot = 0.3048m, Yard = 0.9144m, Pound = 0.45359237m, Gravity = 9.80665m;

    [Theory]
    [InlineData(MassUnit.Gram, "g", 0.001)]
    [InlineData(MassUnit.Kilogram, "kg", 1)]
    [InlineData(MassUnit.Pound, "lb", 0.45359237)]
    [InlineData(MassUnit.Tonne, "t", 1000)]
    [InlineData(MassUnit.ShortTon, "short-ton", 907.18474)]
    public void A_unit_of_mass_is_so_many_kilograms(MassUnit unit, string code, double kilograms)
    {
        Exactly((decimal)kilograms, unit.InKilograms());
        Assert.Equal(code, unit.Code());
    }

    [Theory]
    [InlineData(LengthUnit.Millimeter, "mm", 0.001)]
    [InlineData(LengthUnit.Centimeter, "cm", 0.01)]
    [InlineData(LengthUnit.Meter, "m", 1)]
    [InlineData(LengthUnit.Inch, "in", 0.0254)]
    [InlineData(LengthUnit.Foot, "ft", 0.3048)]
    [InlineData(LengthUnit.Kilometer, "km", 1000)]
    [InlineData(LengthUnit.Mile, "mi", 1609.344)]
    public void A_unit_of_length_is_so_many_meters(LengthUnit unit, string code, double meters)
    {
        Exactly((decimal)meters, unit.InMeters());
        Assert.Equal(code, unit.Code());
    }

    public static TheoryData<VolumeUnit, string, string, decimal> Volumes => new()
    {
        { VolumeUnit.CubicCentimeter, "cm3", "cm³", 0.000001m },
        { VolumeUnit.Liter, "L", "L", 0.001m },
        { VolumeUnit.CubicMeter, "m3", "m³", 1 },
        { VolumeUnit.CubicInch, "in3", "in³", Inch * Inch * Inch },
        { VolumeUnit.CubicFoot, "ft3", "ft³", Foot * Foot * Foot },
        { VolumeUnit.CubicYard, "yd3", "yd³", Yard * Yard * Yard },
        { VolumeUnit.Gallon, "gal", "gal", 231 * Inch * Inch * Inch },
        { VolumeUnit.AcreFoot, "acre-ft", "acre-ft", 4840 * Yard * Yard * Foot },
    };

    [Theory]
    [InlineData(AreaUnit.SquareMeter, "m2", "m²", 1)]
    [InlineData(AreaUnit.Hectare, "ha", "ha", 10_000)]
    [InlineData(AreaUnit.SquareFoot, "ft2", "ft²", 0.09290304)]
    [InlineData(AreaUnit.SquareYard, "yd2", "yd²", 0.83612736)]
    [InlineData(AreaUnit.Acre, "acre", "acre", 4046.8564224)]
    public void A_unit_of_area_is_so_many_square_meters(AreaUnit unit, string code, string symbol, double squareMeters)
    {
        Exactly((decimal)squareMeters, unit.InSquareMeters());
        Assert.Equal(code, unit.Code());
        Assert.Equal(symbol, unit.Symbol());
    }

    [Theory]
    [InlineData(SpeedUnit.KilometerPerHour, "km/h", 3.6)]
    [InlineData(SpeedUnit.MilePerHour, "mph", 2.2369362920544025)] // 3600/1609.344
    public void A_meter_a_second_is_so_many_of_a_unit_of_speed(SpeedUnit unit, string code, double number)
    {
        Assert.Equal(number, new Speed(1).In(unit), number * 1e-15);
        Assert.Equal(code, unit.Code());
    }

    [Theory]
    [MemberData(nameof(Volumes))]
    public void A_unit_of_volume_is_so_many_cubic_meters(VolumeUnit unit, string code, string symbol, decimal cubicMeters)
    {
        Exactly(cubicMeters, unit.InCubicMeters());
        Assert.Equal(code, unit.Code());
        Assert.Equal(symbol, unit.Symbol());
    }

    public static TheoryData<DensityUnit, string, string, decimal> Densities => new()
    {
        { DensityUnit.KilogramPerCubicMeter, "kg/m3", "kg/m³", 1 },
        { DensityUnit.MegagramPerCubicMeter, "Mg/m3", "Mg/m³", 1000 },
        { DensityUnit.GramPerCubicCentimeter, "g/cm3", "g/cm³", 1000 },
        { DensityUnit.PoundPerCubicFoot, "lb/ft3", "lb/ft³", Pound / (Foot * Foot * Foot) },
        { DensityUnit.KilonewtonPerCubicMeter, "kN/m3", "kN/m³", 1000 / Gravity },
    };

    [Theory]
    [MemberData(nameof(Densities))]
    public void A_unit_of_density_is_so_many_kilograms_in_a_cubic_meter(DensityUnit unit, string code, string symbol, decimal kilograms)
    {
        Exactly(kilograms, unit.InKilogramsPerCubicMeter());
        Assert.Equal(code, unit.Code());
        Assert.Equal(symbol, unit.Symbol());
    }

    [Fact]
    public void Every_unit_has_its_row_here()
    {
        Assert.Equal(Enum.GetValues<VolumeUnit>(), Volumes.Select(row => row.Data.Item1));
        Assert.Equal(Enum.GetValues<DensityUnit>(), Densities.Select(row => row.Data.Item1));
        Assert.Equal(5, Enum.GetValues<MassUnit>().Length);
        Assert.Equal(7, Enum.GetValues<LengthUnit>().Length);
        Assert.Equal(5, Enum.GetValues<AreaUnit>().Length);
        Assert.Equal(2, Enum.GetValues<SpeedUnit>().Length);
    }

    [Fact]
    public void A_number_comes_back_from_its_unit() =>
        Gen.Select(Gen.Double[1e-6, 1e6], Gen.Enum<DensityUnit>(), Gen.Enum<MassUnit>(), Gen.Enum<VolumeUnit>(), Gen.Enum<LengthUnit>(), Gen.Enum<AreaUnit>(), Gen.Enum<SpeedUnit>())
            .Sample((number, density, mass, volume, length, area, speed) => Assert.All(
                new[]
                {
                    Density.From(number, density).In(density),
                    Mass.From(number, mass).In(mass),
                    Volume.From(number, volume).In(volume),
                    Length.From(number, length).In(length),
                    Area.From(number, area).In(area),
                    Speed.From(number, speed).In(speed),
                },
                back => Assert.Equal(number, back, number * 1e-15)));

    [Fact]
    public void A_unit_that_is_none_is_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => ((MassUnit)99).InKilograms());
        Assert.Throws<ArgumentOutOfRangeException>(() => ((LengthUnit)99).InMeters());
        Assert.Throws<ArgumentOutOfRangeException>(() => ((VolumeUnit)99).InCubicMeters());
        Assert.Throws<ArgumentOutOfRangeException>(() => ((DensityUnit)99).InKilogramsPerCubicMeter());
        Assert.Throws<ArgumentOutOfRangeException>(() => ((MassUnit)99).Code());
        Assert.Throws<ArgumentOutOfRangeException>(() => ((LengthUnit)99).Code());
        Assert.Throws<ArgumentOutOfRangeException>(() => ((VolumeUnit)99).Code());
        Assert.Throws<ArgumentOutOfRangeException>(() => ((DensityUnit)99).Code());
        Assert.Throws<ArgumentOutOfRangeException>(() => ((AreaUnit)99).InSquareMeters());
        Assert.Throws<ArgumentOutOfRangeException>(() => ((AreaUnit)99).Code());
        Assert.Throws<ArgumentOutOfRangeException>(() => ((SpeedUnit)99).InMetersPerSecond());
        Assert.Throws<ArgumentOutOfRangeException>(() => ((SpeedUnit)99).Code());
    }

    [Fact]
    public void A_density_in_a_unit_of_weight_is_named_as_one()
    {
        Assert.Equal("dry unit weight", DensityUnit.KilonewtonPerCubicMeter.DryDensityName());
        Assert.Equal("dry density", DensityUnit.PoundPerCubicFoot.DryDensityName());
    }

    /// <summary>Two roundings of a double at most.</summary>
    private static void Exactly(decimal expected, double actual) => Assert.Equal((double)expected, actual, (double)expected * 4.5e-16);
}
