using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Earthwork;

/// <summary><c>POST /v1/earthwork/quantities</c>.</summary>
internal static class QuantitiesJob
{
    private const double SecondsPerMinute = 60;

    public static void Map(IEndpointRouteBuilder app) =>
        app.MapEarthworkJob("quantities", new QuantitiesRules(app.ServiceProvider.GetRequiredService<Limits>()), Compute, Examples.QuantitiesRequest)
            .WithSummary("Bank, loose and compacted quantities, and haulage")
            .WithDescription("Solids are neither lost nor gained: from the fill to bank and loose volumes, water to add, shrinkage and swell by both definitions, truck loads by volume and by mass, and the cycle of a fleet; from one borrow or from several.");

    /// <summary>Computes a request that passed the rules.</summary>
    public static QuantitiesAnswer Compute(QuantitiesRequest request)
    {
        var units = request.Units.ToUnits();
        var quantities = request.ToQuantities([]);
        var loads = quantities.LoadsOfDraws;
        return new QuantitiesAnswer
        {
            Reference = request.Reference,
            Identification = request.Identification,
            Units = units.ToContract(),
            DryMass = quantities.Fill.DryMass.In(units.Mass),
            Borrow = new BorrowAnswer(quantities.BankVolume.In(units.BulkVolume), quantities.WetMass.In(units.Mass), quantities.WaterMass.In(units.Mass)),
            Loose = quantities.LooseVolume is { } loose ? new LooseAnswer(loose.In(units.BulkVolume), quantities.HauledMass.In(units.Mass)) : null,
            Water = WaterOf(quantities, units),
            Shrinkage = new ShrinkageAnswer(100 * quantities.ShrinkageOfBorrow, 100 * quantities.ShrinkageOfFill),
            Swell = 100 * quantities.SwellOfBank,
            SwellOfLoose = 100 * quantities.SwellOfLoose,
            Truckloads = ToAnswer(quantities.Loads),
            BorrowAreas = request.BorrowAreas is null ? null : [.. quantities.Draws.Select((draw, i) => ToAnswer(draw, loads[i], quantities, units))],
            FillNotServed = quantities.FillMissing.In(units.BulkVolume),
            Fleet = request.Fleet is { } fleet ? CyclesOf(fleet, quantities, loads, units) : null,
            Trace = EarthworkJob.TraceOf(request, () => QuantitiesWorking.Of(quantities, request.Fleet?.ToFleet(units), units)),
            Findings = quantities.Review(i => request.BorrowAreas is null ? "/borrow" : $"/borrowAreas/{i}", units).Concat(OfFleet(request.Fleet)).ToContract(request),
            Cautions = EarthworkCautions.OfQuantities.With([request.Fill, request.Borrow, request.Loose, .. request.BorrowAreas ?? []]),
            Provenance = ProvenanceContract.Of(request),
        };
    }

    private static IEnumerable<Finding> OfFleet(FleetContract? fleet) => fleet is { Efficiency: null }
        ? [EarthworkFindingKinds.EfficiencyNotGiven.At("/fleet/efficiency", "Without an efficiency loader and trucks are taken to work all of the hour. Give it: 50 minutes in the hour is 0.83.")]
        : [];

    private static FillWaterAnswer WaterOf(EarthQuantities quantities, EarthworkUnits units)
    {
        WaterAmountAnswer? Each(Volume volume) =>
            quantities.ToAdd is { } toAdd ? (toAdd * (1 / volume.In(units.BulkVolume))).ToAnswer(units) : null;
        return new FillWaterAnswer(quantities.ToAdd?.ToAnswer(units), Each(quantities.BankVolume), Each(quantities.FillServed));
    }

    private static TruckloadsAnswer? ToAnswer(Truckloads? loads) =>
        loads is null ? null : new TruckloadsAnswer(loads.ByVolume, loads.ByMass, loads.VolumeGoverns ? "volume" : "mass");

    private static BorrowAreaAnswer ToAnswer(Draw draw, Truckloads? loads, EarthQuantities quantities, EarthworkUnits units) => new(
        draw.Area.Label,
        100 * draw.DryMass.Kilograms / quantities.Fill.DryMass.Kilograms,
        draw.DryMass.In(units.Mass),
        draw.BankVolume.In(units.BulkVolume),
        draw.WetMass.In(units.Mass),
        draw.WaterMass.In(units.Mass),
        new Volume(draw.DryMass.Kilograms / quantities.Fill.DryDensity.KilogramsPerCubicMeter).In(units.BulkVolume),
        draw.LooseVolume?.In(units.BulkVolume),
        draw.CapacityLeft?.In(units.BulkVolume),
        quantities.Fill.WaterContent is { } w ? draw.ToAdd(w, quantities.Water).ToAnswer(units) : null,
        ToAnswer(loads));

    private static List<FleetCycleAnswer> CyclesOf(FleetContract fleet, EarthQuantities quantities, IReadOnlyList<Truckloads?> loads, EarthworkUnits units)
    {
        var (trucks, distance) = fleet.ToFleet(units);
        return
        [
            .. quantities.Draws.Select((draw, i) => (draw, Loads: loads[i])).Where(item => item.draw.DryMass.Kilograms > 0).Select(item =>
            {
                var cycle = trucks.Over(distance(item.draw.Area));
                return new FleetCycleAnswer(
                    item.draw.Area.Label, cycle.Distance.In(units.Distance), trucks.LoadingSeconds / SecondsPerMinute, cycle.HaulSeconds / SecondsPerMinute,
                    trucks.DumpSeconds / SecondsPerMinute, cycle.ReturnSeconds / SecondsPerMinute, cycle.Seconds / SecondsPerMinute,
                    cycle.TrucksToBalance, cycle.Trucks, cycle.Waits.ToString().ToLowerInvariant(), cycle.LoadsPerHour, item.Loads?.Needed / cycle.LoadsPerHour);
            }),
        ];
    }
}
