using System.Globalization;
using CsCheck;
using Drypeak.Soil.Curves;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>Generated laboratory tests: likely ones, as a laboratory sends them, and wild ones that keep the rules of a request and nothing else.</summary>
internal static class AnyTest
{
    /// <summary>Three to seven specimens about a peak, weighed in the mold, one or two tins each.</summary>
    public static Gen<MoistureDensityTest> Likely { get; } = Gen.Select(
        Gen.Int[3, 7], Gen.Double[6, 14], Gen.Double[1.2, 2.6], Gen.Double[1600, 2100], Gen.Double[2, 9], Gen.Double[-0.4, 0.4], Gen.Double[-10, 10].Array[7], Gen.Int[1, 2],
        (count, first, step, top, bend, offset, noise, tins) => Weighed(
            [.. Enumerable.Range(0, count).Select(i =>
            {
                var fromPeak = step * (i - ((count - 1) / 2.0) + offset);
                return ((first + (step * i)) / 100, top - (bend * fromPeak * fromPeak) + noise[i]);
            })],
            tins));

    private static readonly Gen<double> WildPositive = Gen.Double[Math.Log(1e-12), Math.Log(4.5e8)].Select(Math.Exp);
    private static readonly Gen<double> UsualMass = Gen.Double[0.1, 9];
    private static readonly Gen<double> UsualVolume = Gen.Double[0.0008, 0.0024];
    private static readonly Gen<double> AnyMass = Gen.Frequency((9, UsualMass), (1, WildPositive));
    private static readonly Gen<double> AnyVolume = Gen.Frequency((9, UsualVolume), (1, WildPositive));
    private static readonly Gen<double> AnyDensity = Gen.Frequency((6, Gen.Double[1200, 2400]), (1, WildPositive.Select(value => value * 1000)));
    private static readonly Gen<double> AnyWater = Gen.Frequency((4, Gen.Double[0.01, 0.4]), (1, Gen.Double[0, 10]), (1, Gen.OneOf(Gen.Const(0.0), Gen.Const(0.1))));
    private static readonly Gen<double> AnyUncertainty = Gen.OneOf(Gen.Const(0.0), Gen.Double[0, 0.01], WildPositive);

    private static readonly Gen<MoistureTin> WildTin = Gen.Select(AnyMass, AnyMass, AnyWater, (tin, soil, w) =>
        new MoistureTin(new Mass(tin), new Mass(Math.Max((tin + soil) * (1 + (w / 2)), tin + soil)), new Mass(tin + soil)));

    private static readonly Gen<Mold> WildMold = Gen.OneOf(
        Gen.Select(AnyMass, AnyVolume, (mass, volume) => new Mold { Mass = new Mass(mass), Volume = new Volume(volume) }),
        Gen.Select(AnyMass, Gen.Double[0.01, 1], Gen.Double[0.01, 1], (mass, diameter, height) => new Mold { Mass = new Mass(mass), Diameter = new Length(diameter), Height = new Length(height) }),
        Gen.Select(AnyMass, AnyMass, (empty, water) => new Mold { WaterFilling = new WaterFilling(new Mass(empty), new Mass(empty + water), null, new Density(998)) }));

    private static readonly Gen<SpecimenMeasurement> WildSpecimen = Gen.Select(
        Gen.Int[0, 4], AnyMass, AnyDensity, AnyWater, WildTin.Array[1, 3], WildMold, Gen.Int[0, 5],
        (stage, mass, density, w, tins, mold, aside) =>
        {
            var bare = new SpecimenMeasurement { Label = "", SetAside = aside == 0 ? "spilled" : null };
            return stage switch
            {
                0 => bare with { MoldAndWetSoil = new Mass(mass + (mold.EmptyMass?.Kilograms ?? 0)), Mold = mold, Tins = tins },
                1 => bare with { WetMass = new Mass(mass), Mold = mold, WaterContent = new WaterContent(w) },
                2 => bare with { WetDensity = new Density(density), WaterContentFromCarbide = new WaterContent(w) },
                3 => bare with { DryDensity = new Density(density), Tins = tins },
                _ => bare with { WetDensity = new Density(density * (1 + w)), DryDensity = new Density(density) },
            };
        });

    /// <summary>Anything that the rules of a request let through, from one specimen to nine.</summary>
    public static Gen<MoistureDensityTest> Wild { get; } = Gen.Select(
        WildSpecimen.Array[1, 9],
        Gen.Select(Gen.Int[0, 3], Gen.Double[0.1, 25], Gen.Bool, (kind, gs, measured) => kind == 0 ? null : new SpecificGravity(kind == 1 ? gs : 2.2 + (gs / 25), measured)),
        Gen.Double[950, 1100],
        Gen.Enum<CurveModel>().Nullable(),
        Gen.Select(AnyUncertainty, AnyUncertainty, AnyUncertainty, AnyUncertainty, Gen.Double[0, 25], Gen.Int[0, 4], (mass, volume, water, density, gravity, any) => any == 0
            ? new MeasurementUncertainty
            {
                Mass = new Mass(mass),
                TinMass = new Mass(mass / 10),
                Volume = new Volume(volume),
                WaterContent = new WaterContent(Math.Min(water, 1)),
                DryDensity = new Density(density),
                SpecificGravity = gravity,
            }
            : null),
        Gen.Select(Gen.Double[0, 0.999], Gen.Double[0.1, 25], AnyWater, Gen.Int[0, 2], (share, gravity, w, kind) =>
            kind == 0 ? null : new Oversize(share, kind == 1 ? null : gravity, new WaterContent(w), null)),
        Gen.Select(AnyWater, AnyDensity, Gen.Bool, (w, density, any) => any ? new AdoptedPeak(new WaterContent(w), new Density(density), "drawn by hand") : null),
        (specimens, gravity, water, model, uncertainty, oversize, adopted) => new MoistureDensityTest
        {
            Specimens = [.. specimens.Select((specimen, i) => specimen with { Label = Name(i) })],
            SpecificGravity = gravity,
            WaterDensity = new Density(water),
            Model = model,
            Uncertainty = uncertainty,
            Oversize = oversize,
            Adopted = adopted,
        });

    /// <summary>The weighings that lead to these points: a mold of 4.2 kg and 943 cm³, tins of 25 g with 110 g of dry soil or more.</summary>
    private static MoistureDensityTest Weighed((double W, double Dry)[] points, int tins) => new()
    {
        Mold = new Mold { Mass = new Mass(4.2), Volume = new Volume(943e-6) },
        SpecificGravity = new SpecificGravity(2.7, Measured: true),
        WaterDensity = WaterDensity.At(20),
        WaterTemperature = 20,
        Oversize = new Oversize(0.08, 2.65, new WaterContent(0.01), 4.75),
        Specimens =
        [
            .. points.Select((point, i) => new SpecimenMeasurement
            {
                Label = Name(i),
                MoldAndWetSoil = new Mass(4.2 + (point.Dry * (1 + point.W) * 943e-6)),
                Tins = [.. Enumerable.Range(0, tins).Select(t => new MoistureTin(new Mass(0.025), new Mass(0.025 + (0.11 * (1 + point.W)) + (t * 1e-5)), new Mass(0.135 + (t * 1e-5))))],
            }),
        ],
    };

    private static string Name(int index) => (index + 1).ToString(CultureInfo.InvariantCulture);
}
