using CsCheck;
using Drypeak.Soil.Acceptance;
using Drypeak.Soil.Curves;
using Drypeak.Soil.FieldDensity;
using Xunit;

namespace Drypeak.Soil.Tests.FieldDensity;

public sealed class AcceptanceZoneTests
{
    private static readonly JudgedSoil Soil = new()
    {
        DryDensity = 1800,
        WaterContent = 0.12,
        MaximumDryDensity = 1900,
        OptimumWaterContent = 0.125,
        MinimumDryDensity = 1500,
        SpecificGravity = 2.68,
        WaterDensity = 998.2,
    };

    private static readonly (CompactionPoint Lowest, CompactionPoint Highest) Plane = (new(0.02, 1000), new(0.3, 2600));

    private static readonly Gen<Requirement[]> Specifications =
        from compaction in Gen.Double[0.85, 0.97]
        from dry in Gen.Double[-0.04, -0.01]
        from wet in Gen.Double[0.01, 0.04]
        from air in Gen.Double[0.05, 0.15]
        from saturation in Gen.Double[0.4, 0.7]
        from relative in Gen.Double[0.3, 0.7]
        from taken in Gen.Int[1, 31]
        let all = new Requirement[]
        {
            new(AcceptedQuantity.RelativeCompaction, compaction, 1.03), new(AcceptedQuantity.WaterContentFromOptimum, dry, wet), new(AcceptedQuantity.AirVoids, null, air),
            new(AcceptedQuantity.Saturation, saturation, 0.95), new(AcceptedQuantity.RelativeDensity, relative, null),
        }
        select all.Where((_, i) => ((taken >> i) & 1) == 1).ToArray();

    /// <summary>What is drawn is what is decided: a point is inside exactly where every requirement is met.</summary>
    [Fact]
    public void A_soil_meets_its_specification_exactly_where_the_zone_holds_it() =>
        Gen.Select(Specifications, Gen.Double[0.05, 0.2], Gen.Double[1500, 2100]).Sample((requirements, w, dry) =>
        {
            var zone = AcceptanceZone.Of(Soil, requirements, Plane);
            var here = Soil with { WaterContent = w, DryDensity = dry };
            var margin = requirements.Min(requirement => here.ValueOf(requirement.Quantity) is { } value ? requirement.MarginOf(value) : double.NegativeInfinity);

            // A polygon of straight sides leaves a little of a curved edge to either side; beyond the zero-air-voids line there is no zone.
            if (Math.Abs(margin) > 0.002 && here.ValueOf(AcceptedQuantity.VoidRatio) is > 0 && here.ValueOf(AcceptedQuantity.Saturation) is < 0.999)
            {
                Assert.Equal(margin > 0, Contains(zone, w, dry));
            }
        });

    [Fact]
    public void Without_requirements_or_with_ones_that_cannot_meet_there_is_no_zone()
    {
        Assert.Empty(AcceptanceZone.Of(Soil, [], Plane));
        Assert.Empty(AcceptanceZone.Of(Soil, [new(AcceptedQuantity.Saturation, 0.98, null), new(AcceptedQuantity.AirVoids, 0.1, null)], Plane));
        Assert.Empty(AcceptanceZone.Of(Soil with { MaximumDryDensity = null }, [new(AcceptedQuantity.RelativeCompaction, 0.95, null)], Plane));
    }

    private static bool Contains(IReadOnlyList<CompactionPoint> corners, double x, double y)
    {
        var within = false;
        for (var i = 0; i < corners.Count; i++)
        {
            var (a, b) = (corners[i], corners[(i + 1) % corners.Count]);
            if (a.DryDensity > y != b.DryDensity > y && x < a.WaterContent + ((y - a.DryDensity) / (b.DryDensity - a.DryDensity) * (b.WaterContent - a.WaterContent)))
            {
                within = !within;
            }
        }

        return within;
    }
}
