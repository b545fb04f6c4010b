using System.Text.RegularExpressions;
using CsCheck;
using Drypeak.Soil.Curves;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Quantities;
using Xunit;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>What holds for every laboratory test, from end to end: order, units and scale do not matter, and the same test gives the same answer.</summary>
public partial class LawTests
{
    private const int Tests = 40;

    private static readonly Gen<UnitSet> Units = Gen.Select(
        Gen.Enum<MassUnit>(), Gen.Enum<MassUnit>(), Gen.Enum<VolumeUnit>(), Gen.Enum<DensityUnit>(), Gen.Enum<LengthUnit>(),
        (mass, tin, volume, density, length) => new UnitSet(mass, tin, volume, density, length));

    [Fact]
    public void The_order_of_the_specimens_changes_nothing() =>
        Gen.Select(AnyTest.Likely, Gen.Int[0, 1_000_000]).Sample((test, seed) =>
        {
            var order = Enumerable.Range(0, test.Specimens.Count).ToArray();
            new Random(seed).Shuffle(order);
            var shuffled = test with { Specimens = [.. order.Select(i => test.Specimens[i])] };
            var (one, other) = (Bench.Analyze(test), Bench.Analyze(shuffled));
            Same(ByLabel(one), ByLabel(other), 1e-9);
            Assert.Equal(FindingsByLabel(one, whole: true), FindingsByLabel(other, whole: true));
        }, iter: Tests);

    [Fact]
    public void The_order_changes_nothing_either_where_specimens_share_a_water_content()
    {
        var test = Ternmarsh.Points((10, 1750), (12, 1815), (12, 1825), (14, 1850), (14, 1846), (20, 1700));
        var reversed = test with { Specimens = [.. test.Specimens.Reverse()] };
        var (one, other) = (Bench.Analyze(test), Bench.Analyze(reversed));
        Same(ByLabel(one), ByLabel(other), 1e-9);
        Assert.Equal(FindingsByLabel(one, whole: true), FindingsByLabel(other, whole: true));
    }

    [Fact]
    public void The_units_of_the_request_change_nothing() =>
        Gen.Select(AnyTest.Likely, Units).Sample((test, units) =>
        {
            var (one, other) = (Bench.Analyze(test), Bench.Analyze(Spoken(test, units)));
            Same(NumbersWithin.Of(one.Specimens), NumbersWithin.Of(other.Specimens), 1e-12);
            Same(Answers(one), Answers(other), 1e-9);
            Assert.Equal(FindingsByLabel(one, whole: false), FindingsByLabel(other, whole: false));
        }, iter: Tests);

    [Fact]
    public void All_masses_and_volumes_greater_together_change_no_density() =>
        Gen.Select(AnyTest.Likely, Gen.Double[0.2, 5]).Sample((test, scale) =>
        {
            Mass Mass(Mass mass) => new(mass.Kilograms * scale);
            var scaled = test.WithEach(specimen => specimen with
            {
                MoldAndWetSoil = Mass(specimen.MoldAndWetSoil!.Value),
                Tins = [.. specimen.Tins.Select(tin => new MoistureTin(Mass(tin.Tin), Mass(tin.TinAndWetSoil), Mass(tin.TinAndDrySoil)))],
            }) with
            {
                Mold = new Mold { Mass = Mass(test.Mold!.Mass!.Value), Volume = new Volume(test.Mold.Volume!.Value.CubicMeters * scale) },
            };
            var (one, other) = (Bench.Analyze(test), Bench.Analyze(scaled));
            Same(Answers(one), Answers(other), 1e-9);
            Assert.All(one.Specimens.Zip(other.Specimens), pair =>
                Assert.Equal(pair.First.DryDensity.KilogramsPerCubicMeter, pair.Second.DryDensity.KilogramsPerCubicMeter, 2000 * 1e-12));
        }, iter: Tests);

    [Fact]
    public void A_point_set_aside_changes_nothing_but_itself() =>
        Gen.Select(AnyTest.Likely, Gen.Double[0.01, 0.4], Gen.Double[900, 2600], Gen.Int[0, 7]).Sample((test, w, dry, place) =>
        {
            var aside = new SpecimenMeasurement { Label = "aside", WaterContent = new WaterContent(w), DryDensity = new Density(dry), SetAside = "mold not full" };
            var specimens = test.Specimens.ToList();
            specimens.Insert(Math.Min(place, specimens.Count), aside);
            var (without, with) = (Bench.Analyze(test), Bench.Analyze(test with { Specimens = specimens }));

            Same(ByLabel(without), ByLabel(with with { Specimens = [.. with.Specimens.Where(specimen => specimen.SetAside is null)] }), 0);
            Assert.Equal(dry, Assert.Single(with.Specimens, specimen => specimen.SetAside is not null).DryDensity.KilogramsPerCubicMeter);
            Assert.Equal(
                FindingsByLabel(without, whole: true),
                FindingsByLabel(with, whole: true).Where(finding => !finding.Contains("specimen-set-aside", StringComparison.Ordinal)));
            Assert.Single(with.Findings, finding => finding.Code == "specimen-set-aside");
        }, iter: Tests);

    [Fact]
    public void The_same_test_twice_gives_the_same_answer_to_the_last_bit() =>
        AnyTest.Likely.Sample(test =>
        {
            var (one, other) = (Bench.Analyze(test), Bench.Analyze(test));
            Assert.Equal(NumbersWithin.Of(one), NumbersWithin.Of(other));
            Assert.Equal(one.Findings, other.Findings);
        }, iter: Tests);

    /// <summary>The numbers that a reader acts on.</summary>
    private static IEnumerable<(string Path, double Value)> Answers(MoistureDensityResult result) =>
        NumbersWithin.Of(new { result.Optimum, result.Corrected, result.Curve!.Next, result.Curve.Chosen.ChanceOfPeakOutside });

    /// <summary>The whole result, with what belongs to specimens in the order of their labels.</summary>
    private static IEnumerable<(string Path, double Value)> ByLabel(MoistureDensityResult result)
    {
        var kept = result.Specimens.Where(specimen => specimen.SetAside is null).Select((specimen, i) => (specimen.Label, i))
            .OrderBy(item => item.Label, StringComparer.Ordinal).Select(item => item.i).ToArray();
        FittedCurve Ordered(FittedCurve curve) => curve with
        {
            Fitted = curve.Fitted.Count == 0 ? [] : [.. kept.Select(i => curve.Fitted[i])],
            Predictions = curve.Predictions.Count == 0 ? [] : [.. kept.Select(i => curve.Predictions[i])],
        };
        return NumbersWithin.Of(result with
        {
            Specimens = [.. result.Specimens.OrderBy(specimen => specimen.Label, StringComparer.Ordinal)],
            Curve = result.Curve! with { Chosen = Ordered(result.Curve.Chosen), Alternatives = [.. result.Curve.Alternatives.Select(Ordered)] },
        });
    }

    /// <summary>The findings as a set, with a specimen's label for its position.</summary>
    private static IEnumerable<string> FindingsByLabel(MoistureDensityResult result, bool whole) => result.Findings
        .Select(finding => $"{finding.Severity} {finding.Code} {Position().Replace(finding.Place, match => result.Specimens[int.Parse(match.Groups[1].ValueSpan, System.Globalization.CultureInfo.InvariantCulture)].Label)} {(whole ? finding.Message : "")}")
        .Order(StringComparer.Ordinal);

    /// <summary>The test with every number written in these units and read again.</summary>
    private static MoistureDensityTest Spoken(MoistureDensityTest test, UnitSet units)
    {
        Mass Body(Mass mass) => Mass.From(mass.In(units.Mass), units.Mass);
        Mass Small(Mass mass) => Mass.From(mass.In(units.TinMass), units.TinMass);
        Volume Held(Volume volume) => Volume.From(volume.In(units.Volume), units.Volume);
        return test.WithEach(specimen => specimen with
        {
            MoldAndWetSoil = Body(specimen.MoldAndWetSoil!.Value),
            Tins = [.. specimen.Tins.Select(tin => new MoistureTin(Small(tin.Tin), Small(tin.TinAndWetSoil), Small(tin.TinAndDrySoil)))],
        }) with
        {
            Units = units,
            Mold = new Mold { Mass = Body(test.Mold!.Mass!.Value), Volume = Held(test.Mold.Volume!.Value) },
            WaterDensity = Density.From(test.WaterDensity.In(units.Density), units.Density),
        };
    }

    private static void Same(IEnumerable<(string Path, double Value)> expected, IEnumerable<(string Path, double Value)> actual, double tolerance)
    {
        var (one, other) = (expected.ToList(), actual.ToList());
        Assert.Equal(one.Select(number => number.Path), other.Select(number => number.Path));
        Assert.All(one.Zip(other), pair => Assert.True(
            Math.Abs(pair.First.Value - pair.Second.Value) <= tolerance * Math.Max(Math.Abs(pair.First.Value), Math.Abs(pair.Second.Value)),
            $"{pair.First.Path}: {pair.First.Value:R} and {pair.Second.Value:R}"));
    }

    [GeneratedRegex(@"(?<=/specimens/)(\d+)")]
    private static partial Regex Position();
}
