using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;
using static Drypeak.Soil.Earthwork.EarthworkSheet;

namespace Drypeak.Soil.Earthwork;

/// <summary>The working of quantities and haulage, in the caller's units.</summary>
public static class QuantitiesWorking
{
    private const double SecondsPerMinute = 60;

    /// <summary>Every step from the fill's solids to the loads.</summary>
    /// <param name="quantities">The quantities.</param>
    /// <param name="fleet">The fleet and how far it runs from each area; null without one.</param>
    /// <param name="units">The caller's units.</param>
    public static IReadOnlyList<WorkingStep> Of(EarthQuantities quantities, (Fleet Fleet, Func<BorrowArea, Length> Distance)? fleet, EarthworkUnits units)
    {
        var sheet = new EarthworkSheet(units);
        var fill = quantities.Fill;
        sheet.Mass(EarthworkFormulas.Solids, "dry mass of the fill", $"{Text(fill.Volume.In(units.BulkVolume))}*{Text(fill.DryDensity.In(units.Density))}{sheet.VolumeTimesDensity}", fill.DryMass);
        foreach (var (draw, loads) in quantities.Draws.Zip(quantities.LoadsOfDraws).Where(item => item.First.DryMass.Kilograms > 0))
        {
            OfDraw(sheet, draw, loads, quantities, units);
            if (fleet is { } running)
            {
                OfCycle(sheet, draw.Area.Label, running.Fleet.Over(running.Distance(draw.Area)), units);
            }
        }

        OfTotals(sheet, quantities, units);
        return sheet.Steps;
    }

    private static void OfDraw(EarthworkSheet sheet, Draw draw, Truckloads? loads, EarthQuantities quantities, EarthworkUnits units)
    {
        var of = $" of {draw.Area.Label}";
        var (dry, w) = (Text(draw.DryMass.In(units.Mass)), Text(draw.Area.WaterContent));
        sheet.BulkVolume(EarthworkFormulas.VolumeOfSolids, "bank volume" + of, $"{dry}/{Text(draw.Area.DryDensity.In(units.Density))}{sheet.MassOverDensity}", draw.BankVolume);
        sheet.Mass(EarthworkFormulas.WetMass, "wet mass in the bank" + of, $"{dry}*(1 + {w}/100)", draw.WetMass);
        if (quantities.Fill.WaterContent is { } ofFill)
        {
            sheet.Mass(EarthworkFormulas.WaterToAdd, "water to add to the soil" + of, $"{dry}*({Text(ofFill)} - {w})/100", draw.ToAdd(ofFill, quantities.Water).Mass);
        }

        if (draw is { Loose: { } loose, LooseVolume: { } volume })
        {
            var density = loose.DryDensityOf(draw.Area);
            if (loose is { DryDensity: null, WetDensity: { } wet })
            {
                sheet.Density(EarthworkFormulas.DryDensity, "loose dry density" + of, $"{Text(wet.In(units.Density))}/(1 + {Text(loose.WaterContentOf(draw.Area))}/100)", density);
            }
            else if (loose is { DryDensity: null, Swell: { } swell })
            {
                sheet.Density(EarthworkFormulas.LooseDryDensity, "loose dry density" + of, $"{Text(draw.Area.DryDensity.In(units.Density))}/(1 + {Text(swell * 100)}/100)", density);
            }

            sheet.BulkVolume(EarthworkFormulas.VolumeOfSolids, "loose volume" + of, $"{dry}/{Text(density.In(units.Density))}{sheet.MassOverDensity}", volume);
        }

        if (loads?.ByVolume is { } && quantities.Truck?.Volume is { } truckVolume)
        {
            sheet.Ratio(EarthworkFormulas.Loads, "loads by volume, before rounding up," + of, draw.LooseVolume!.Value.In(units.BulkVolume), truckVolume.In(units.BulkVolume));
        }

        if (loads?.ByMass is { } && quantities.Truck?.Mass is { } truckMass)
        {
            sheet.Ratio(EarthworkFormulas.Loads, "loads by mass, before rounding up," + of, draw.HauledMass.In(units.Mass), truckMass.In(units.Mass));
        }
    }

    private static void OfCycle(EarthworkSheet sheet, string label, FleetCycle cycle, EarthworkUnits units)
    {
        var distance = Text(cycle.Distance.In(units.Distance));
        var factor = Factor(units.Distance.InMeters() / units.Speed.InMetersPerSecond() / SecondsPerMinute);
        string Minutes(double seconds) => Text(seconds / SecondsPerMinute);
        sheet.Step(EarthworkFormulas.CycleTime, $"cycle of a truck from {label}",
            $"{Minutes(cycle.Fleet.LoadingSeconds)} + {distance}/{Text(cycle.Fleet.HaulSpeed.In(units.Speed))}{factor} + {Minutes(cycle.Fleet.DumpSeconds)} + {distance}/{Text(cycle.Fleet.ReturnSpeed.In(units.Speed))}{factor}",
            cycle.Seconds / SecondsPerMinute, "min");
        sheet.Ratio(EarthworkFormulas.BalancedTrucks, $"trucks that balance one loader at {label}, before rounding up", cycle.Seconds / SecondsPerMinute, cycle.Fleet.LoadingSeconds / SecondsPerMinute);
    }

    private static void OfTotals(EarthworkSheet sheet, EarthQuantities quantities, EarthworkUnits units)
    {
        var (bank, fill) = (Text(quantities.BankVolume.In(units.BulkVolume)), Text(quantities.FillServed.In(units.BulkVolume)));
        sheet.Step(EarthworkFormulas.ShrinkageOfBorrow, "shrinkage of the bank volume", $"100*({bank} - {fill})/{bank}", 100 * quantities.ShrinkageOfBorrow, "%");
        sheet.Step(EarthworkFormulas.ShrinkageOfFill, "shrinkage over the fill volume", $"100*({bank} - {fill})/{fill}", 100 * quantities.ShrinkageOfFill, "%");
        if (quantities.LooseVolume is { } volume)
        {
            var loose = Text(volume.In(units.BulkVolume));
            sheet.Step(EarthworkFormulas.SwellOfBank, "swell of the bank volume", $"100*({loose} - {bank})/{bank}", 100 * quantities.SwellOfBank!.Value, "%");
            sheet.Step(EarthworkFormulas.SwellOfLoose, "swell over the loose volume", $"100*({loose} - {bank})/{loose}", 100 * quantities.SwellOfLoose!.Value, "%");
        }

        if (quantities.ToAdd is { } toAdd)
        {
            sheet.Liquid("water to add, by volume", toAdd, quantities.Water);
            sheet.PerBulkVolume("water to add", toAdd, quantities.BankVolume, " of bank volume");
            sheet.PerBulkVolume("water to add", toAdd, quantities.FillServed, " of fill volume");
        }
    }
}
