using Drypeak.Service.Contracts;
using Drypeak.Soil.Earthwork;
using Drypeak.Soil.Quantities;

namespace Drypeak.Service.Earthwork;

/// <summary>From the contract's numbers to the domain's programme. Call with requests whose single values are sound.</summary>
internal static class TestLocationsMapping
{
    /// <summary>The plan of a lift.</summary>
    public static TestArea ToArea(this TestLocationsRequest request)
    {
        var (area, unit) = (request.Area!, request.Units.ToUnits().Length);
        double Meters(double number) => Length.From(number, unit).Meters;
        Outline OutlineOf(IReadOnlyList<IReadOnlyList<double>> corners) => new([.. corners.Select(corner => new PlanPoint(Meters(corner[0]), Meters(corner[1])))]);
        return new TestArea(
            area.Outline is { } outline ? OutlineOf(outline) : Outline.Rectangle(Meters(area.StartStation ?? 0), Meters(area.Length!.Value), Meters(area.Width!.Value)),
            [.. (area.Exclusions ?? []).Select(zone => OutlineOf(zone.Outline!))]);
    }

    /// <summary>What the tests of a lift are counted by; null where their number is given.</summary>
    public static (string Name, double OfLift, double Each)? CountedBy(this TestLocationsRequest request, TestArea area)
    {
        var units = request.Units.ToUnits();
        return request.Frequency switch
        {
            { Volume: { } volume } => ("volume", new Volume(area.SquareMeters * Length.From(request.LiftThickness!.Value, units.Length).Meters).In(units.BulkVolume), volume),
            { Area: { } each } => ("area", new Area(area.SquareMeters).In(units.Area), each),
            { PerShift: { } tests } => ("shift", tests, request.LiftsPerShift!.Value),
            _ => null,
        };
    }

    /// <summary>Tests of all lifts: may be too many for a programme.</summary>
    public static double TestsWanted(this TestLocationsRequest request, TestArea area) =>
        PerLift(request, area) * Count.RoundedUp((double)request.Lifts!.Value / EveryLifts(request));

    /// <summary>The programme; call where its tests are not too many.</summary>
    public static TestProgramme ToProgramme(this TestLocationsRequest request, TestArea area) =>
        new(area, request.Lifts!.Value, (int)PerLift(request, area), EveryLifts(request), request.Seed!.Value);

    /// <summary>How the number and the places were found, for readers.</summary>
    public static string Basis(this TestLocationsRequest request, TestProgramme programme)
    {
        var units = request.Units.ToUnits();
        var every = EveryLifts(request) is > 1 and var lifts ? $"in every {Ordinal(lifts)} lift and in the last" : "in each lift";
        var number = request.Frequency switch
        {
            { Volume: { } volume } => $"One test in {RuleWords.Text(volume)} {units.BulkVolume.Symbol()}, rounded up to {programme.PerLift} a lift, {every}.",
            { Area: { } area } => $"One test in {RuleWords.Text(area)} {units.Area.Symbol()}, rounded up to {programme.PerLift} a lift, {every}.",
            { PerShift: { } tests } => $"{tests} tests a shift of {RuleWords.Text(request.LiftsPerShift)} lifts, rounded up to {programme.PerLift} a lift, {every}.",
            _ => $"{programme.PerLift} a lift, {every}.",
        };
        return $"{number} Stratified random sampling (ASTM D3665, from memory): each lift is cut along the work into {programme.PerLift} strata of equal area, with one location in each, uniform over it. Random numbers: SplitMix64 from seed {programme.Seed}, two for each location in order.";
    }

    private static double PerLift(TestLocationsRequest request, TestArea area) => request.CountedBy(area) is { } counted
        ? Math.Max(1, Count.RoundedUp(counted.OfLift / counted.Each))
        : request.PerLift ?? 1;

    private static int EveryLifts(TestLocationsRequest request) => request.Frequency?.Lifts ?? 1;

    private static string Ordinal(int number) => number + ((number % 100) is 11 or 12 or 13 ? "th" : (number % 10) switch { 1 => "st", 2 => "nd", 3 => "rd", _ => "th" });
}
