using Drypeak.Service.Contracts;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Phases;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Earthwork;

/// <summary>From the contract's numbers to the domain's quantities. Call with requests whose single values are sound.</summary>
internal static class QuantitiesMapping
{
    private const double SecondsPerMinute = 60;

    /// <summary>The quantities of a request; what contradicts itself is added to the faults.</summary>
    public static EarthQuantities ToQuantities(this QuantitiesRequest request, ICollection<Fault> faults)
    {
        var units = request.Units.ToUnits();
        var fill = new Fill(
            Volume.From(request.Fill!.Volume!.Value, units.BulkVolume),
            Density.From(request.Fill.DryDensity!.Value, units.Density),
            request.Fill.WaterContentOf(units, "/fill", faults));
        var areas = request.BorrowAreas is { } several
            ? several.Select((area, i) => ToArea(area, area, $"{i + 1}", $"/borrowAreas/{i}", units, faults)).ToList()
            : [ToArea(request.Borrow!, null, "borrow", "/borrow", units, faults)];
        var loose = request.Loose is { } given ? ToLoose(given, areas, units, faults) : null;
        var truck = request.Truck is { } each
            ? new Truck(
                each.Volume is { } volume ? Volume.From(volume, units.BulkVolume) : null,
                each.Mass is { } mass ? Mass.From(mass, units.Mass) : null)
            : null;
        var draws = BorrowPlan.Draw(fill.DryMass, areas, loose, out var missing);
        return new EarthQuantities(fill, draws, missing, truck, request.Water());
    }

    /// <summary>The fleet, and how far it runs from each area.</summary>
    public static (Fleet Fleet, Func<BorrowArea, Length> Distance) ToFleet(this FleetContract fleet, EarthworkUnits units)
    {
        Length? distance = fleet.Distance is { } given ? Length.From(given, units.Distance) : null;
        return (
            new Fleet(
                fleet.LoadingTime!.Value * SecondsPerMinute,
                fleet.DumpTime!.Value * SecondsPerMinute,
                Speed.From(fleet.HaulSpeed!.Value, units.Speed),
                Speed.From(fleet.ReturnSpeed!.Value, units.Speed),
                fleet.Trucks,
                fleet.Efficiency ?? 1),
            area => area.HaulDistance ?? distance!.Value);
    }

    private static BorrowArea ToArea(BorrowContract soil, BorrowAreaContract? area, string position, string place, EarthworkUnits units, ICollection<Fault> faults)
    {
        var w = soil.WaterContentOf(units, place, faults)!.Value;
        Density? dry = soil.DryDensity is { } given ? Density.From(given, units.Density) : null;
        Density? fromWet = soil.WetDensity is { } wet ? PhaseRelations.DryDensity(Density.From(wet, units.Density), w) : null;
        if (dry is { } taken && fromWet is { } other)
        {
            faults.RefuseApart(taken.KilogramsPerCubicMeter, other.KilogramsPerCubicMeter, place + "/wetDensity", "the wet density", "dry density and water content");
        }

        return new BorrowArea(
            area?.Label ?? position,
            dry ?? fromWet!.Value,
            w,
            area?.Capacity is { } capacity ? Volume.From(capacity, units.BulkVolume) : null,
            area?.HaulDistance is { } distance ? Length.From(distance, units.Distance) : null,
            area?.Share / 100);
    }

    private static LooseSoil ToLoose(LooseContract loose, List<BorrowArea> areas, EarthworkUnits units, ICollection<Fault> faults)
    {
        var w = loose.WaterContentOf(units, "/loose", faults);
        LooseSoil[] ways =
        [
            .. loose.DryDensity is { } dry ? [new LooseSoil(Density.From(dry, units.Density), null, null, w)] : Array.Empty<LooseSoil>(),
            .. loose.WetDensity is { } wet ? [new LooseSoil(null, Density.From(wet, units.Density), null, w)] : Array.Empty<LooseSoil>(),
            .. loose.Swell is { } swell ? [new LooseSoil(null, null, swell / 100, w)] : Array.Empty<LooseSoil>(),
        ];
        foreach (var other in ways.Skip(1))
        {
            faults.RefuseApart(
                ways[0].DryDensityOf(areas[0]).KilogramsPerCubicMeter, other.DryDensityOf(areas[0]).KilogramsPerCubicMeter,
                other.Swell is { } ? "/loose/swell" : "/loose/wetDensity", other.Swell is { } ? "the swell" : "the loose wet density",
                ways[0].DryDensity is { } ? "the loose dry density" : "the loose wet density");
        }

        return ways[0];
    }
}
