using System.Xml.Linq;
using CsCheck;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.Tests.Published;
using Xunit;
using static Drypeak.Soil.Tests.Laboratory.Ternmarsh;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>The working can be followed by hand: each substitution, typed into a calculator, gives the value beside it.</summary>
public class WorkingTests
{
    private static readonly XNamespace MathMl = "http://www.w3.org/1998/Math/MathML";
    private static readonly Mold ByWater = new() { WaterFilling = new WaterFilling(Grams(4246 + 310), Grams(4246 + 310 + 941.3), Grams(310), new Density(998.2)) };

    private static readonly Mold Read = new() { Mass = Grams(4246), Diameter = Readings(101.58, 101.63, 101.6), Height = Readings(116.4, 116.5, 116.2) };

    /// <summary>Tests that between them take every way to a step.</summary>
    public static TheoryData<string, MoistureDensityTest> Tests
    {
        get
        {
            var data = new TheoryData<string, MoistureDensityTest>
            {
                { "weighed", Weighed },
                { "weighed, in pounds and feet", Weighed with { Units = new UnitSet(MassUnit.Pound, MassUnit.Gram, VolumeUnit.CubicFoot, DensityUnit.PoundPerCubicFoot, LengthUnit.Inch) } },
                { "weighed, in kilograms, liters and unit weights", Weighed with { Units = new UnitSet(MassUnit.Kilogram, MassUnit.Pound, VolumeUnit.Liter, DensityUnit.KilonewtonPerCubicMeter, LengthUnit.Meter) } },
                { "two tins", Weighed.WithEach(specimen => specimen with { Tins = [specimen.Tins[0], specimen.Tins[0]] }) },
                { "dry densities", Clay },
                { "wet and dry densities", Clay.WithEach(specimen => specimen with { WaterContent = null, WetDensity = new Density(specimen.DryDensity!.Value.KilogramsPerCubicMeter * 1.12) }).With(0, specimen => specimen with { WaterContent = WaterContent.FromPercent(12) }) },
                { "wet masses and a mold by its dimensions", Weighed.WithEach(specimen => specimen with { WetMass = specimen.MoldAndWetSoil - Grams(4246), MoldAndWetSoil = null }) with { Mold = new Mold { Diameter = new Length(0.1016), Height = new Length(0.11632) } } },
                { "readings of a mold", Weighed with { Mold = Read, Units = new UnitSet(Volume: VolumeUnit.CubicInch, Length: LengthUnit.Inch) } },
                { "a mold below whose rim the soil ends", Weighed.WithEach(specimen => specimen with { DepthBelowRim = Readings(2.1, 2.4, 1.8) }).With(1, specimen => specimen with { DepthBelowRim = new Length(0.003) }) with { Mold = Read } },
                { "a mold of known volume below whose rim the soil ends", Weighed.With(1, specimen => specimen with { DepthBelowRim = Readings(3.1) }) with { Mold = Read with { Volume = Volume.From(943, VolumeUnit.CubicCentimeter) } } },
                { "a mold by water", Weighed with { Mold = ByWater, Units = new UnitSet(Mass: MassUnit.Pound, Volume: VolumeUnit.CubicInch) } },
                { "a specimen's own mold", Weighed.With(2, specimen => specimen with { Mold = ByWater }) },
                { "wet basis and carbide", Clay.WithEach(specimen => specimen with { WaterContent = null, WaterContentFromWetBasis = specimen.WaterContent }).With(1, specimen => specimen with { WaterContentFromWetBasis = null, WaterContentFromCarbide = specimen.WaterContentFromWetBasis }) },
                { "oversize", Clay with { Oversize = new Oversize(0.094, 2.65, new WaterContent(0.012), 4.75) } },
                { "oversize of an adopted peak", Clay with { Adopted = new AdoptedPeak(WaterContent.FromPercent(14), new Density(1860), "by hand"), Oversize = new Oversize(0.094, 2.65, new WaterContent(0.012), 4.75) } },
                { "a method of one's own", Weighed with { Method = null, IsCustomMethod = true, CustomEffort = new CustomEffort(new Mass(2.5), new Length(0.305), 3, 25) } },
                { "a given density of water, no specific gravity", Clay with { WaterTemperature = null, SpecificGravity = null } },
            };
            foreach (var id in PublishedTests.All)
            {
                data.Add(id, PublishedTests.Of(id));
            }

            return data;
        }
    }

    [Theory]
    [MemberData(nameof(Tests))]
    public void Each_substitution_gives_its_value(string name, MoistureDensityTest test)
    {
        Assert.NotEmpty(name);
        var steps = Working.Of(test, Bench.Analyze(test));
        Assert.All(steps.Where(step => step.Substitution is not null), Follows);
        Assert.All(steps.Where(step => step.Substitution is null), step => Assert.Contains(step.Quantity, new[] { "optimum water content", "maximum dry density" }));
    }

    [Fact]
    public void Each_substitution_gives_its_value_whatever_the_numbers() =>
        AnyTest.Likely.Sample(test => Assert.All(Working.Of(test, Bench.Analyze(test)).Where(step => step.Substitution is not null), Follows), iter: 30);

    [Theory]
    [MemberData(nameof(Tests))]
    public void The_working_reaches_every_density_and_the_peak(string name, MoistureDensityTest test)
    {
        Assert.NotEmpty(name);
        var result = Bench.Analyze(test);
        var steps = Working.Of(test, result);
        double Value(string quantity) => Assert.Single(steps, step => step.Quantity == quantity).Value;

        Assert.All(result.Specimens.Zip(test.Specimens), pair =>
        {
            // Where the data begin at dry density, the working goes from it to the wet one.
            var (specimen, fromDry) = (pair.First, pair.First.MoldVolume is null && pair.Second.WetDensity is null);
            Assert.Equal(
                (fromDry ? specimen.WetDensity : specimen.DryDensity).In(test.Units.Density),
                Value($"{(fromDry ? "wet" : "dry")} density of specimen {specimen.Label}"));
        });
        if (result.Optimum is { } optimum)
        {
            Assert.Equal(optimum.WaterContent.Value * 100, Value("optimum water content"), 1e-12);
            Assert.Equal(new Density(optimum.MaximumDryDensity.Value).In(test.Units.Density), Value("maximum dry density"));
        }

        if (result.Corrected is { } corrected)
        {
            Assert.Equal(corrected.DryDensity.In(test.Units.Density), Value("maximum dry density of the total material"));
            Assert.Equal(corrected.WaterContent.Percent, Value("optimum water content of the total material"));
        }
    }

    [Theory]
    [MemberData(nameof(Tests))]
    public void Each_formula_is_well_formed_MathML_with_a_source(string name, MoistureDensityTest test)
    {
        Assert.NotEmpty(name);
        Assert.All(Working.Of(test, Bench.Analyze(test)), step =>
        {
            var math = XElement.Parse(step.MathMl);
            Assert.Equal(MathMl + "math", math.Name);
            Assert.All(math.DescendantsAndSelf(), element => Assert.Equal(MathMl, element.Name.Namespace));
            Assert.All(math.Descendants(MathMl + "mfrac"), fraction => Assert.Equal(2, fraction.Elements().Count()));
            Assert.All(math.Descendants(MathMl + "msub").Concat(math.Descendants(MathMl + "msup")), script => Assert.Equal(2, script.Elements().Count()));
            Assert.NotEmpty(step.Formula);
            Assert.NotEmpty(step.Source);
        });
    }

    [Fact]
    public void The_steps_come_in_the_order_of_the_work()
    {
        var test = Weighed with { Mold = new Mold { Mass = Grams(4246), Diameter = new Length(0.1016), Height = new Length(0.11632) }, Oversize = new Oversize(0.094, 2.65, new WaterContent(0.012), 4.75) };
        var steps = Working.Of(test, Bench.Analyze(test)).Select(step => step.Quantity).ToList();
        string[] firstAndLast =
        [
            "density of water", "compactive effort", "water content of specimen 1", "volume of the mold", "mass of wet soil of specimen 1", "wet density of specimen 1", "dry density of specimen 1",
            "void ratio of specimen 1", "porosity of specimen 1", "saturation of specimen 1", "air voids of specimen 1", "water content of specimen 2",
        ];
        Assert.Equal(firstAndLast, steps[..firstAndLast.Length]);
        Assert.Equal("optimum water content of the total material", steps[^1]);
        Assert.Single(steps, "volume of the mold");
        Assert.Equal(steps.Count, steps.Distinct().Count());
    }

    /// <summary>Exercise P17c, followed by hand: 4.01 lb in 1/30 ft³ are 120.3 lb/ft³; 14.42 g of water on 200.01 g are 7.21 %; 112.2 lb/ft³ dry.</summary>
    [Fact]
    public void A_published_exercise_can_be_followed_line_by_line()
    {
        var test = PublishedTests.Of("P17c");
        var values = Working.Of(test, Bench.Analyze(test)).Select(step => (step.Quantity, Value: Math.Round(step.Value, 2), step.Unit));
        Assert.Equal(
            [
                ("water content of specimen 1", 7.21, "%"),
                ("mass of wet soil of specimen 1", 4.01, "lb"),
                ("wet density of specimen 1", 120.30, "lb/ft³"),
                ("dry density of specimen 1", 112.21, "lb/ft³"),
            ],
            values);
    }

    [Theory]
    [InlineData("1 + 2*3", 7)]
    [InlineData("100*(2 - 0.5)/(4 - 1)", 50)]
    [InlineData("2^3^2/4 - -1", 129)]
    [InlineData("8/4/2", 1)]
    public void The_calculator_counts_as_a_hand_does(string text, double value) => Assert.Equal(value, Arithmetic.Value(text));

    [Theory]
    [InlineData("1 + ")]
    [InlineData("2*(3")]
    [InlineData("3 g")]
    [InlineData("x = 1")]
    [InlineData("1e3")]
    public void The_calculator_takes_bare_arithmetic_only(string text) => Assert.Throws<FormatException>(() => Arithmetic.Value(text));

    private static void Follows(WorkingStep step)
    {
        var value = Arithmetic.Value(step.Substitution!);
        Assert.True(
            Math.Abs(value - step.Value) <= 1e-9 * Math.Max(Math.Abs(step.Value), Math.Abs(value)),
            $"{step.Quantity}: {step.Substitution} is {value:R}, not {step.Value:R}");
    }

    private static MeasuredLength Readings(params double[] millimeters) => new() { Readings = [.. millimeters.Select(reading => Length.From(reading, LengthUnit.Millimeter))] };
}
