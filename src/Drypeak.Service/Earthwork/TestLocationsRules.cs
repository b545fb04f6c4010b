using Drypeak.Service.Contracts;
using Drypeak.Service.Hosting;
using FluentValidation;

namespace Drypeak.Service.Earthwork;

/// <summary>All that a test programme must keep.</summary>
internal sealed class TestLocationsRules : EarthworkRules<TestLocationsRequest>
{
    private const int MostLifts = 1_000_000;

    private readonly Limits _limits;

    public TestLocationsRules(Limits limits)
        : base(limits)
    {
        _limits = limits;
        RuleFor(request => request.Seed).Needed();
        RuleFor(request => request.Area).Needed();
        RuleFor(request => request.Area!).SetValidator(new AreaRules(limits)).When(request => request.Area is { });
        RuleFor(request => request.Lifts).Needed().Whole(MostLifts);
        RuleFor(request => request.PerLift).Whole(limits.Locations);
        RuleFor(request => request.PerLift).NotNull().When(request => request.Frequency is null)
            .WithErrorCode("not-enough-data").WithMessage("Nothing says how many tests there are. Give perLift, or frequency.");
        RuleFor(request => request.PerLift).Null().When(request => request.Frequency is { Volume: { } } or { Area: { } } or { PerShift: { } })
            .WithErrorCode("given-twice").WithMessage("The number of tests is given, and a frequency that it follows from. Leave one out.");
        RuleFor(request => request.Frequency!).SetValidator(new FrequencyRules(limits)).When(request => request.Frequency is { });
        RuleFor(request => request.LiftThickness).Positive();
        RuleFor(request => request.LiftThickness).NotNull().When(request => request.Frequency?.Volume is { })
            .WithErrorCode("not-enough-data").WithMessage("A frequency by volume needs the thickness of a lift. Give liftThickness.");
        RuleFor(request => request.LiftsPerShift).Within(0.001, 1000);
        RuleFor(request => request.LiftsPerShift).NotNull().When(request => request.Frequency?.PerShift is { })
            .WithErrorCode("not-enough-data").WithMessage("Tests per shift need the lifts that a shift places. Give liftsPerShift.");
    }

    protected override void CheckTogether(TestLocationsRequest request, List<Fault> faults)
    {
        var area = request.ToArea();
        if (area.Outline.CrossesItself)
        {
            faults.Add(new Fault("/area/outline", "crosses-itself", "The outline crosses or touches itself. Give its corners in order, once round."));
        }

        foreach (var (i, zone) in area.Exclusions.Index().Where(item => item.Item.CrossesItself))
        {
            faults.Add(new Fault($"/area/exclusions/{i}/outline", "crosses-itself", "The outline crosses or touches itself. Give its corners in order, once round."));
        }

        if (faults.Count == 0 && !(area.SquareMeters > 0))
        {
            faults.Add(new Fault("/area", "no-open-area", "No area is open to tests: the outline has none, or the exclusions cover it. Check the corners."));
        }

        if (faults.Count == 0 && request.TestsWanted(area) is var tests && tests > _limits.Locations)
        {
            faults.Add(new Fault(request.PerLift is { } ? "/perLift" : "/frequency", "too-many",
                $"The programme would have {RuleWords.Text(tests)} locations; up to {_limits.Locations} are given at once. Ask for fewer lifts, or for fewer tests."));
        }
    }

    private sealed class AreaRules : AbstractValidator<TestAreaContract>
    {
        private const int MostExclusions = 20;
        private const int MostCorners = 200;

        public AreaRules(Limits limits)
        {
            RuleFor(area => area.Length).Positive();
            RuleFor(area => area.Width).Positive();
            RuleFor(area => area.StartStation).Within(-RuleWords.Greatest, RuleWords.Greatest);
            RuleFor(area => area.Length).NotNull().When(area => area.Outline is null)
                .WithErrorCode("not-enough-data").WithMessage("The area has no length. Give length and width, or an outline.");
            RuleFor(area => area.Width).NotNull().When(area => area.Outline is null)
                .WithErrorCode("not-enough-data").WithMessage("The area has no width. Give length and width, or an outline.");
            RuleFor(area => area.Length).Null().When(area => area.Outline is { })
                .WithErrorCode("given-twice").WithMessage("An outline has its own length. Leave one out.");
            RuleFor(area => area.Width).Null().When(area => area.Outline is { })
                .WithErrorCode("given-twice").WithMessage("An outline has its own width. Leave one out.");
            RuleFor(area => area.StartStation).Null().When(area => area.Outline is { })
                .WithErrorCode("given-twice").WithMessage("The corners of an outline have their own stations. Leave startStation out.");
            RuleFor(area => area.Outline).Corners();
            RuleFor(area => area.Exclusions).Counted(MostExclusions);
            RuleForEach(area => area.Exclusions).Needed().SetValidator(new ExclusionRules(limits));
            RuleFor(area => area.Exclusions).Must(exclusions => !(exclusions?.Sum(zone => zone?.Outline?.Count) > MostCorners))
                .WithErrorCode("too-many").WithMessage($"The exclusions may have up to {MostCorners} corners together. Join or simplify them.");
        }
    }

    private sealed class ExclusionRules : AbstractValidator<ExclusionContract>
    {
        public ExclusionRules(Limits limits)
        {
            RuleFor(zone => zone.Label).NotBlank("A label").AtMost(limits.NameCharacters);
            RuleFor(zone => zone.Outline).Needed().Corners();
        }
    }

    private sealed class FrequencyRules : AbstractValidator<FrequencyContract>
    {
        public FrequencyRules(Limits limits)
        {
            RuleFor(frequency => frequency.Volume).VolumeOfEarth();
            RuleFor(frequency => frequency.Area).Positive();
            RuleFor(frequency => frequency.Lifts).Whole(MostLifts);
            RuleFor(frequency => frequency.PerShift).Whole(limits.Locations);
            RuleFor(frequency => frequency.Volume).NotNull().When(frequency => frequency is { Area: null, Lifts: null, PerShift: null })
                .WithErrorCode("not-enough-data").WithMessage("Nothing says how often is tested. Give volume, area, lifts or perShift.");
            RuleFor(frequency => frequency.Area).Null().When(frequency => frequency.Volume is { })
                .WithErrorCode("given-twice").WithMessage("A frequency by volume is given, and one by area. Leave one out.");
            RuleFor(frequency => frequency.PerShift).Null().When(frequency => frequency.Volume is { } || frequency.Area is { })
                .WithErrorCode("given-twice").WithMessage("A frequency by volume or area is given, and one by shift. Leave one out.");
        }
    }
}

/// <summary>Rules of outlines.</summary>
internal static class OutlineRuleWords
{
    private const int Fewest = 3;
    private const int Most = 100;

    public static IRuleBuilderOptions<T, IReadOnlyList<IReadOnlyList<double>>?> Corners<T>(this IRuleBuilder<T, IReadOnlyList<IReadOnlyList<double>>?> rule) =>
        rule.Must(corners => corners is null or { Count: >= Fewest and <= Most }).WithErrorCode("wrong-count")
            .WithMessage((_, corners) => $"An outline has {Fewest} to {Most} corners; {corners!.Count} were received.")
            .Must(corners => corners is null || corners.All(corner => corner is { Count: 2 })).WithErrorCode("not-a-corner")
            .WithMessage("Each corner is a pair of numbers: [station, offset].")
            .Must(corners => corners is null || corners.All(corner => corner is null || corner.All(number => Math.Abs(number) <= RuleWords.Greatest))).WithErrorCode("out-of-range")
            .WithMessage($"Stations and offsets lie within {RuleWords.Text(RuleWords.Greatest)} of 0. Check the corners and units.length.");
}
