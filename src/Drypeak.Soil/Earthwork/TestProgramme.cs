using Drypeak.Soil.Laboratory.Workings;
using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Earthwork;

/// <summary>A place for a field test.</summary>
/// <param name="Lift">Number of the lift, from 1.</param>
/// <param name="Stratum">Number of the stratum in its lift, from 1.</param>
/// <param name="Point">Where.</param>
public sealed record TestLocation(int Lift, int Stratum, PlanPoint Point)
{
    /// <summary>Lift and number within it: <c>L3-2</c>.</summary>
    public string Label => $"L{Lift}-{Stratum}";
}

/// <summary>
/// Field tests of a fill: how many a lift, and where. Each lift that is tested is cut along the work into strata of equal area, and each
/// stratum holds one location, uniform over it (stratified random sampling, ASTM D3665, from memory). The locations follow from the seed alone.
/// </summary>
/// <param name="Area">Plan of each lift.</param>
/// <param name="Lifts">How many lifts.</param>
/// <param name="PerLift">Tests of a lift that is tested.</param>
/// <param name="EveryLifts">Every so-manyth lift is tested, and the last.</param>
/// <param name="Seed">Of the random numbers.</param>
public sealed record TestProgramme(TestArea Area, int Lifts, int PerLift, int EveryLifts, long Seed)
{
    /// <summary>m²; a lift is larger than what one test disturbs around it.</summary>
    private const double SmallestArea = 10;

    /// <summary>Lifts that are tested: one of each group of <see cref="EveryLifts"/>, its last, so that a group that is cut short is tested too.</summary>
    public int LiftsTested => (int)Count.RoundedUp((double)Lifts / EveryLifts);

    /// <summary>Tests of all.</summary>
    public long Tests => (long)LiftsTested * PerLift;

    /// <summary>The locations, by lift and station.</summary>
    public IEnumerable<TestLocation> Locations()
    {
        var random = new SplitMix64(unchecked((ulong)Seed));
        for (var group = 1; group <= LiftsTested; group++)
        {
            var lift = (int)Math.Min((long)group * EveryLifts, Lifts);
            for (var stratum = 1; stratum <= PerLift; stratum++)
            {
                var along = (stratum - 1 + random.NextFraction()) / PerLift;
                yield return new TestLocation(lift, stratum, Area.At(along, random.NextFraction()));
            }
        }
    }

    /// <summary>Stations between the strata of a lift, m.</summary>
    public IEnumerable<double> StratumStations() => Enumerable.Range(1, PerLift - 1).Select(i => Area.StationAt((double)i / PerLift));

    /// <summary>What a careful reviewer says.</summary>
    /// <param name="liftThickness">Where it was given.</param>
    /// <param name="units">The units that texts speak.</param>
    public IEnumerable<Finding> Review(Length? liftThickness, EarthworkUnits units)
    {
        var sides = new Length(Math.Sqrt(Area.SquareMeters));
        return
        [
            .. liftThickness is { } thickness ? PlausibilityReview.Thickness(thickness, "/liftThickness", units) : [],
            .. Area.SquareMeters < SmallestArea * (1 - 1e-9)
                ? [EarthworkFindingKinds.AreaSmall.At("/area", $"The area of a lift is {ReaderText.Significant(Area.SquareMeters)} m², as a square of {ReaderText.Of(sides, units.Length)}. Check the numbers and units.length.")]
                : Array.Empty<Finding>(),
        ];
    }

    /// <summary>The working of the count, and of the first location where its area is a rectangle, in the caller's units.</summary>
    /// <param name="quantity">What the frequency counts by, in SI, and the frequency; null where the tests of a lift are given.</param>
    /// <param name="length">Length and width where the area is a rectangle without exclusions.</param>
    /// <param name="units">The caller's units.</param>
    public IReadOnlyList<WorkingStep> Working((string Name, double OfLift, double Each)? quantity, (Length Length, Length Width)? length, EarthworkUnits units)
    {
        var sheet = new EarthworkSheet(units);
        var area = new Area(Area.SquareMeters).In(units.Area);
        string Meters(double meters) => EarthworkSheet.Text(new Length(meters).In(units.Length));
        sheet.Step(EarthworkFormulas.AreaOfLift, "area of a lift",
            length is { } sides ? $"{Meters(sides.Length.Meters)}*{Meters(sides.Width.Meters)}{EarthworkSheet.Factor(units.Length.InMeters() * units.Length.InMeters() / units.Area.InSquareMeters())}" : null,
            area, units.Area.Symbol());
        if (quantity is { } counted)
        {
            sheet.Ratio(EarthworkFormulas.TestsPerLift, $"tests of a lift by {counted.Name}, before rounding up", counted.OfLift, counted.Each);
        }

        sheet.Step(EarthworkFormulas.TestsPerLift, "lifts that are tested, before rounding up", $"{Lifts}/{EveryLifts}", (double)Lifts / EveryLifts, "");
        sheet.Step(EarthworkFormulas.TestsPerLift, "tests of all lifts", $"{PerLift}*{LiftsTested}", Tests, "");
        if (length is { } rectangle && Locations().First() is { } first)
        {
            var random = new SplitMix64(unchecked((ulong)Seed));
            var (start, u, v) = (Area.Outline.Corners[0].Station, random.NextFraction(), random.NextFraction());
            sheet.Length(EarthworkFormulas.StationInStratum, $"station of {first.Label}",
                $"{Meters(start)} + (1 - 1 + {EarthworkSheet.Text(u)})*{Meters(rectangle.Length.Meters)}/{PerLift}", new Length(first.Point.Station));
            sheet.Length(EarthworkFormulas.OffsetInStratum, $"offset of {first.Label}",
                $"{EarthworkSheet.Text(v)}*{Meters(rectangle.Width.Meters)}", new Length(first.Point.Offset));
        }

        return sheet.Steps;
    }
}
