using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Earthwork;

/// <summary>A lift that is to be brought to its water content.</summary>
public sealed record Lift
{
    /// <summary>Its compacted volume, over 0.</summary>
    public required Volume Volume { get; init; }

    /// <summary>Its surface; null where only the volume is known.</summary>
    public Area? Area { get; init; }

    /// <summary>Dry density of the lift as the volume is counted.</summary>
    public required Density DryDensity { get; init; }

    /// <summary>Its water content now.</summary>
    public required WaterContent Present { get; init; }

    /// <summary>The water content that it is to have when it is rolled.</summary>
    public required WaterContent Target { get; init; }

    /// <summary>Water content that evaporates before rolling: added to the target.</summary>
    public WaterContent Allowance { get; init; }

    /// <summary>Water that evaporates from the surface before rolling, as a depth; needs the area.</summary>
    public Length EvaporatedDepth { get; init; }

    /// <summary>Volume of a tanker.</summary>
    public Volume? Tanker { get; init; }

    /// <summary>Standard uncertainty of the present water content.</summary>
    public WaterContent UncertaintyOfPresent { get; init; }

    /// <summary>Standard uncertainty with which the target has to be met.</summary>
    public WaterContent UncertaintyOfTarget { get; init; }

    /// <summary>Standard uncertainty of the dry density.</summary>
    public Density UncertaintyOfDryDensity { get; init; }
}

/// <summary>Water for a lift.</summary>
/// <param name="DryMass">Solids of the lift.</param>
/// <param name="Total">Water to add; negative where it is to be lost.</param>
/// <param name="PerVolume">The same for a cubic meter of the lift.</param>
/// <param name="PerArea">The same for a square meter of its surface; null without an area.</param>
/// <param name="StandardUncertainty">Standard uncertainty of the total; null where nothing uncertain was stated.</param>
/// <param name="TankerLoads">Whole tankers; 0 where water is to be lost; null without a tanker.</param>
public sealed record LiftWaterResult(
    Mass DryMass, WaterAmount Total, WaterAmount PerVolume, WaterAmount? PerArea, WaterAmount? StandardUncertainty, double? TankerLoads);

/// <summary>Water to add to a lift, or to lose from it: dry mass times the difference of water contents, and what the sun takes meanwhile.</summary>
public static class LiftWater
{
    /// <summary>Computes the water.</summary>
    /// <param name="lift">The lift.</param>
    /// <param name="water">Density of water.</param>
    public static LiftWaterResult Compute(Lift lift, Density water)
    {
        var solids = new Mass(lift.Volume.CubicMeters * lift.DryDensity.KilogramsPerCubicMeter);
        var wetted = new WaterContent(lift.Target.Fraction + lift.Allowance.Fraction);
        var total = WaterAmount.Between(solids, lift.Present, wetted, water) + Evaporated(lift, water);
        return new LiftWaterResult(
            solids,
            total,
            total * (1 / lift.Volume.CubicMeters),
            lift.Area is { } area ? total * (1 / area.SquareMeters) : null,
            UncertaintyOf(lift, wetted, water),
            lift.Tanker is not { } tanker ? null
                : total.Mass.Kilograms <= 0 || total.IsNoneIn(solids) ? 0
                : Count.RoundedUp(total.Volume.CubicMeters / tanker.CubicMeters));
    }

    /// <summary>What a careful reviewer says.</summary>
    public static IEnumerable<Finding> Review(Lift lift, LiftWaterResult result, EarthworkUnits units)
    {
        foreach (var finding in PlausibilityReview.Fractions([lift.Present, lift.Target], "")
            .Concat(PlausibilityReview.DryDensity(lift.DryDensity, "/dryDensity", units))
            .Concat(lift.Area is { } area ? PlausibilityReview.Thickness(new Length(lift.Volume.CubicMeters / area.SquareMeters), "/thickness", units) : []))
        {
            yield return finding;
        }

        if (result.Total.IsNoneIn(result.DryMass))
        {
            yield break;
        }

        if (result.Total.Mass.Kilograms < 0)
        {
            yield return EarthworkFindingKinds.WaterToLose.At("/target",
                $"The lift is at {ReaderText.Of(lift.Present)}, wetter than the {ReaderText.Of(lift.Target)} that it is to have: it has to lose {ReaderText.Of(new Mass(-result.Total.Mass.Kilograms), units.Mass)} of water. Scarify and turn it in dry weather, or mix in drier soil; add none.");
        }
        else if (result.Total.Mass.Kilograms > result.DryMass.Kilograms * PlausibilityReview.MostAtOnce * (1 + 1e-9))
        {
            yield return EarthworkFindingKinds.MuchWater.At("/target",
                $"The water comes to {ReaderText.Percent(result.Total.Mass.Kilograms / result.DryMass.Kilograms)} of the dry mass, over {ReaderText.Percent(PlausibilityReview.MostAtOnce, 0)}. Add it in several passes with mixing between, better in the borrow area, and let it soak in.");
        }
    }

    /// <summary>The working, in the caller's units.</summary>
    public static IReadOnlyList<WorkingStep> Working(Lift lift, LiftWaterResult result, Density water, EarthworkUnits units)
    {
        var sheet = new EarthworkSheet(units);
        var volume = EarthworkSheet.Text(lift.Volume.In(units.BulkVolume));
        if (lift.Area is { } area)
        {
            var thickness = new Length(lift.Volume.CubicMeters / area.SquareMeters);
            sheet.BulkVolume(EarthworkFormulas.VolumeOfLift, "volume of the lift",
                $"{EarthworkSheet.Text(area.In(units.Area))}*{EarthworkSheet.Text(thickness.In(units.Length))}{EarthworkSheet.Factor(units.Area.InSquareMeters() * units.Length.InMeters() / units.BulkVolume.InCubicMeters())}", lift.Volume);
        }

        sheet.Mass(EarthworkFormulas.Solids, "dry mass of the lift", $"{volume}*{EarthworkSheet.Text(lift.DryDensity.In(units.Density))}{sheet.VolumeTimesDensity}", result.DryMass);
        var evaporated = Evaporated(lift, water);
        if (lift is { EvaporatedDepth.Meters: > 0, Area: { } surface })
        {
            var factor = units.Area.InSquareMeters() * units.Length.InMeters() * units.Density.InKilogramsPerCubicMeter() / units.Mass.InKilograms();
            sheet.Mass(EarthworkFormulas.Evaporated, "water that evaporates",
                $"{EarthworkSheet.Text(surface.In(units.Area))}*{EarthworkSheet.Text(lift.EvaporatedDepth.In(units.Length))}*{EarthworkSheet.Text(water.In(units.Density))}{EarthworkSheet.Factor(factor)}", evaporated.Mass);
        }

        sheet.Mass(EarthworkFormulas.WaterOfLift, "water to add",
            $"{EarthworkSheet.Text(result.DryMass.In(units.Mass))}*({EarthworkSheet.Text(lift.Target)} + {EarthworkSheet.Text(lift.Allowance)} - {EarthworkSheet.Text(lift.Present)})/100 + {EarthworkSheet.Text(evaporated.Mass.In(units.Mass))}", result.Total.Mass);
        sheet.Liquid("water to add, by volume", result.Total, water);
        sheet.PerBulkVolume("water to add", result.Total, lift.Volume);
        if (result.TankerLoads is > 0 && lift.Tanker is { } tanker)
        {
            sheet.Ratio(EarthworkFormulas.Loads, "tankers before rounding up", result.Total.Volume.In(units.Liquid), tanker.In(units.Liquid));
        }

        return sheet.Steps;
    }

    private static WaterAmount Evaporated(Lift lift, Density water) =>
        WaterAmount.Of((lift.Area?.SquareMeters ?? 0) * lift.EvaporatedDepth.Meters * water.KilogramsPerCubicMeter, water);

    /// <summary>To first order: the mass of water depends on both water contents through the solids, and on the dry density through the difference.</summary>
    private static WaterAmount? UncertaintyOf(Lift lift, WaterContent wetted, Density water)
    {
        var solids = lift.Volume.CubicMeters * lift.DryDensity.KilogramsPerCubicMeter;
        double[] parts =
        [
            solids * lift.UncertaintyOfPresent.Fraction,
            solids * lift.UncertaintyOfTarget.Fraction,
            lift.Volume.CubicMeters * (wetted.Fraction - lift.Present.Fraction) * lift.UncertaintyOfDryDensity.KilogramsPerCubicMeter,
        ];
        return lift is { UncertaintyOfPresent.Fraction: 0, UncertaintyOfTarget.Fraction: 0, UncertaintyOfDryDensity.KilogramsPerCubicMeter: 0 }
            ? null
            : WaterAmount.Of(Math.Sqrt(parts.Sum(part => part * part)), water);
    }
}
