using System.Globalization;
using Drypeak.Service.Contracts;
using Drypeak.Service.Field;
using Drypeak.Service.Hosting;
using Drypeak.Service.Laboratory;
using FluentValidation;

namespace Drypeak.Service.Acceptance;

/// <summary>All that a lot must keep to be computed.</summary>
internal sealed class LotAcceptanceRules(MoistureDensityJob laboratory, FieldDensityJob field, Limits limits)
{
    private readonly RequestRules _values = new(limits);
    private readonly LotTestRules _test = new(limits);

    /// <summary>Every broken rule; empty where the lot can be computed. What contradicts itself is looked for once the single values are sound.</summary>
    public IReadOnlyList<Fault> Check(LotAcceptanceRequest request)
    {
        List<Fault> faults = [.. _values.Validate(request).ToFaults(), .. Identification.Check(request.Identification, limits), .. Laboratory(request.Laboratory, "/laboratory")];
        var tests = request.Tests ?? [];
        if (tests.Count <= limits.LotTests)
        {
            for (var i = 0; i < tests.Count; i++)
            {
                faults.AddRange(tests[i] is { } test ? OfTest(test, $"/tests/{i}") : [new Fault($"/tests/{i}", "missing-member", "It is missing. Give a test.")]);
            }

            faults.AddRange(LotLabels.Check(tests));
            var laboratories = tests.Count(test => test is { Laboratory.Test: { } } or { FieldDensity.Laboratory.Test: { } });
            if (laboratories > limits.LotLaboratoryTests)
            {
                faults.Add(new Fault("/tests", "too-many", $"The tests of a lot may bring up to {limits.LotLaboratoryTests} whole laboratory tests; they bring {laboratories}. Give the laboratory's values in place of its test, or once for the lot."));
            }

            faults.AddRange(LotTimes.Check(tests));
        }

        if (faults.Count == 0)
        {
            LotMapping.ToLot(request, faults);
        }

        return faults;
    }

    private IEnumerable<Fault> OfTest(LotTestContract test, string place) =>
    [
        .. _test.Validate(test).ToFaults().Select(fault => fault with { Place = place + fault.Place }),
        .. Laboratory(test.Laboratory, place + "/laboratory"),
        .. test.FieldDensity is { } whole ? field.Check(whole).Select(fault => fault with { Place = place + "/fieldDensity" + fault.Place }) : [],
    ];

    private IEnumerable<Fault> Laboratory(LaboratoryContract? values, string place) =>
        values?.Test is { } test ? laboratory.Check(test).Select(fault => fault with { Place = place + "/test" + fault.Place }) : [];

    private sealed class RequestRules : AbstractValidator<LotAcceptanceRequest>
    {
        private const int MostRules = 20;

        public RequestRules(Limits limits)
        {
            RuleFor(request => request.Reference).AtMost(limits.NameCharacters);
            RuleFor(request => request.Units!).SetValidator(new UnitsRules()).When(request => request.Units is { });
            RuleFor(request => request.Laboratory!).SetValidator(new FieldDensityRules.LaboratoryRules()).When(request => request.Laboratory is { });
            RuleFor(request => request.SpecificGravity!).SetValidator(new SpecificGravityRules()).When(request => request.SpecificGravity is { });
            Include(new WaterRules());
            RuleFor(request => request.Uncertainty!).SetValidator(new FieldDensityRules.UncertaintyRules()).When(request => request.Uncertainty is { });
            RuleFor(request => request.Specification!).SetValidator(new SpecificationRules()).When(request => request.Specification is { });
            RuleFor(request => request.LotRules).Counted(MostRules);
            RuleForEach(request => request.LotRules).Needed().SetValidator(new LotRuleRules(forPlan: false, limits.LotTests));
            RuleForEach(request => request.LotRules)
                .Must((request, rule) => rule is null || !rule.LooksAtOutcomes() || rule.Rule != LotRuleNames.EveryTest || request.Specification is { } || request.Tests?.Any(test => test?.FieldDensity?.Specification is { }) is true)
                .WithErrorCode("not-enough-data").WithMessage("The rule \"every-test\" needs something that a test can meet: give specification, or quantity with minimum or maximum here.");
            RuleFor(request => request.Tests).Needed().Counted(limits.LotTests);
            RuleFor(request => request.ControlChart!).SetValidator(new ControlChartRules()).When(request => request.ControlChart is { });
            RuleFor(request => request.Window!).SetValidator(new WindowRules()).When(request => request.Window is { });
            RuleFor(request => request.ToleranceInterval!).SetValidator(new ToleranceIntervalRules()).When(request => request.ToleranceInterval is { });
        }
    }

    private sealed class ToleranceIntervalRules : AbstractValidator<ToleranceIntervalContract>
    {
        public ToleranceIntervalRules()
        {
            RuleFor(interval => interval.Fraction).Within(0.01, 0.9999);
            RuleFor(interval => interval.Confidence).Within(0.01, 0.9999);
        }
    }
}

/// <summary>The rules of one test of a lot.</summary>
internal sealed class LotTestRules : AbstractValidator<LotTestContract>
{
    private const double MostCompaction = 1000;

    public LotTestRules(Limits limits)
    {
        RuleFor(test => test.Label).NotBlank("A label").AtMost(limits.NameCharacters);
        RuleFor(test => test.SetAside).NotBlank("A reason").AtMost(limits.TextCharacters);
        RuleFor(test => test.Station).Within(-RuleWords.Greatest, RuleWords.Greatest);
        RuleFor(test => test.Offset).Within(-RuleWords.Greatest, RuleWords.Greatest);
        RuleFor(test => test.Lift).Must(lift => lift is null or (>= -10_000 and <= 10_000))
            .WithErrorCode("out-of-range").WithMessage((_, lift) => $"A lift is numbered from −10000 to 10000; {lift} was received.");
        RuleFor(test => test.Laboratory!).SetValidator(new FieldDensityRules.LaboratoryRules()).When(test => test.Laboratory is { });
        RuleFor(test => test.SpecificGravity!).SetValidator(new SpecificGravityRules()).When(test => test.SpecificGravity is { });
        RuleFor(test => test.Uncertainty!).SetValidator(new FieldDensityRules.UncertaintyRules()).When(test => test.Uncertainty is { });
        When(test => test.FieldDensity is null, () =>
        {
            RuleFor(test => test.RelativeCompaction).Positive().Must(value => !(value > MostCompaction))
                .WithErrorCode("out-of-range").WithMessage((_, value) => $"A relative compaction is at most {RuleWords.Text(MostCompaction)} %; {RuleWords.Text(value)} was received.");
            RuleFor(test => test.DryDensity).Positive();
            RuleFor(test => test.WetDensity).Positive();
            Include(new WaterContentRules(limits));
            RuleFor(test => test.WaterContentFromOptimum).Within(-1000, 1000, " percentage points");
            RuleFor(test => test.Saturation).Within(0, 1000, " %");
            RuleFor(test => test.AirVoids).Within(-100, 100, " %");
            RuleFor(test => test.RelativeDensity).Within(-1000, 1000, " %");
            RuleFor(test => test.VoidRatio).Positive();
            RuleFor(test => test).Custom((test, context) =>
            {
                if (!HasValue(test))
                {
                    context.Fail("", "not-enough-data", "The test has no value. Give relativeCompaction, dryDensity, waterContent or another, or a whole fieldDensity.");
                }
            });
        }).Otherwise(() => RuleFor(test => test.FieldDensity).Must((test, _) => !HasValue(test) && test.SpecificGravity is null && test.Uncertainty is null && (test.Laboratory is null || test.FieldDensity?.Laboratory is null))
            .WithErrorCode("given-twice").WithMessage("A whole field test brings its values, specific gravity, uncertainty and laboratory itself. Leave them out beside it, or leave it out."));
    }

    private static bool HasValue(LotTestContract test) => test is not
    {
        RelativeCompaction: null, DryDensity: null, WetDensity: null, WaterContent: null, Tins: null, WetBasis: null, Carbide: null,
        WaterContentFromOptimum: null, Saturation: null, AirVoids: null, RelativeDensity: null, VoidRatio: null,
    };
}

/// <summary>The rules of a control chart.</summary>
internal sealed class ControlChartRules : AbstractValidator<ControlChartContract>
{
    public const string Individuals = "individuals";
    public const string Ewma = "ewma";
    public const string Cusum = "cusum";
    public const string WesternElectric = "western-electric";
    public const string Nelson = "nelson";
    public const string LimitsOnly = "limits";

    public ControlChartRules()
    {
        string[] kinds = [Individuals, Ewma, Cusum];
        RuleFor(chart => chart.Quantity).Needed().OneOf(Specification.Quantities.Keys, "unknown-quantity");
        RuleFor(chart => chart.Kind).Needed().OneOf(kinds, "unknown-word");
        RuleFor(chart => chart.Target).Within(-RuleWords.Greatest, RuleWords.Greatest);
        RuleFor(chart => chart.StandardDeviation).Positive();
        RuleFor(chart => chart.Weight).Within(1e-6, 1);
        RuleFor(chart => chart.Width).Within(1e-6, 10);
        RuleFor(chart => chart.Reference).Within(0, 10);
        RuleFor(chart => chart.Decision).Within(1e-6, 100);
        RuleFor(chart => chart.RunRules).OneOf([WesternElectric, Nelson, LimitsOnly], "unknown-word");
        Only(chart => chart.Weight, Ewma);
        Only(chart => chart.Width, Individuals, Ewma);
        Only(chart => chart.Reference, Cusum);
        Only(chart => chart.Decision, Cusum);
        Only(chart => chart.RunRules, Individuals);

        void Only<TValue>(System.Linq.Expressions.Expression<Func<ControlChartContract, TValue>> member, params string[] of) =>
            RuleFor(member).Null().When(chart => kinds.Contains(chart.Kind) && !of.Contains(chart.Kind))
                .WithErrorCode("not-for-this-kind").WithMessage(chart => $"A chart of kind \"{chart.Kind}\" does not take it. Leave it out, or choose {string.Join(" or ", of)}.");
    }
}

/// <summary>The rules of a compaction window: possible edges, the right way round, and one at least.</summary>
internal sealed class WindowRules : AbstractValidator<WindowContract>
{
    public WindowRules()
    {
        RuleFor(window => window.MinimumRelativeCompaction).Within(0, 1000, " %");
        RuleFor(window => window.MaximumRelativeCompaction).Within(0, 1000, " %").Must((window, most) => !(most < window.MinimumRelativeCompaction)).Exchanged();
        RuleFor(window => window.MinimumDryDensity).Positive();
        RuleFor(window => window.MaximumDryDensity).Positive().Must((window, most) => !(most < window.MinimumDryDensity)).Exchanged();
        RuleFor(window => window.MinimumSaturation).Within(0, 100, " %");
        RuleFor(window => window.MaximumSaturation).Within(0, 100, " %").Must((window, most) => !(most < window.MinimumSaturation)).Exchanged();
        RuleFor(window => window.MinimumAirVoids).Within(0, 100, " %");
        RuleFor(window => window.MaximumAirVoids).Within(0, 100, " %").Must((window, most) => !(most < window.MinimumAirVoids)).Exchanged();
        RuleFor(window => window.WaterContent).Must(IsRange).WithErrorCode("not-a-range").WithMessage(NotARange);
        RuleForEach(window => window.WaterContent).Must(value => value is >= 0 and <= 1000)
            .WithErrorCode("out-of-range").WithMessage((_, value) => $"A water content lies between 0 and 1000 %; {RuleWords.Text(value)} was received.");
        RuleFor(window => window.WaterContentFromOptimum).Must(IsRange).WithErrorCode("not-a-range").WithMessage(NotARange);
        RuleForEach(window => window.WaterContentFromOptimum).Must(value => value is >= -1000 and <= 1000)
            .WithErrorCode("out-of-range").WithMessage((_, value) => $"It lies between -1000 and 1000 percentage points; {RuleWords.Text(value)} was received.");
        RuleFor(window => window).Custom((window, context) =>
        {
            if (window == new WindowContract() || window == new WindowContract { WetOfLineOfOptimums = false })
            {
                context.Fail(context.PropertyChain.ToString(), "not-enough-data", "The window has no edge. Give one or more, such as minimumRelativeCompaction.");
            }
        });
    }

    private const string NotARange = "It must be two numbers, the driest and the wettest, in this order.";

    private static bool IsRange(IReadOnlyList<double>? range) => range is null || (range.Count == 2 && !(range[1] < range[0]));
}

/// <summary>The messages of edges.</summary>
internal static class WindowWords
{
    public static IRuleBuilderOptions<WindowContract, double?> Exchanged(this IRuleBuilderOptions<WindowContract, double?> rule) =>
        rule.WithErrorCode("limits-exchanged").WithMessage((_, most) => $"The maximum, {RuleWords.Text(most)}, is below the minimum. Were the two exchanged?");
}

/// <summary>Labels of a lot's tests: one test each, and retests that lead to a test.</summary>
internal static class LotLabels
{
    /// <summary>The label, or the position where there is none.</summary>
    public static string LabelOr(this LotTestContract? test, int index) => test?.Label ?? (index + 1).ToString(CultureInfo.InvariantCulture);

    public static IEnumerable<Fault> Check(IReadOnlyList<LotTestContract> tests)
    {
        var first = new Dictionary<string, int>();
        for (var i = 0; i < tests.Count; i++)
        {
            if (!first.TryAdd(tests[i].LabelOr(i), i))
            {
                yield return new Fault($"/tests/{i}/label", "repeated-label",
                    $"Test {first[tests[i].LabelOr(i)] + 1} has the label \"{tests[i].LabelOr(i)}\" too{(tests[i]?.Label is null ? ", for this one is called by its position" : "")}. Give each its own.");
            }
        }

        var replacing = new Dictionary<string, int>();
        for (var i = 0; i < tests.Count; i++)
        {
            if (tests[i]?.Replaces is not { } replaced)
            {
                continue;
            }

            Fault At(string code, string message) => new($"/tests/{i}/replaces", code, message);
            if (!first.TryGetValue(replaced, out var at))
            {
                yield return At("unknown-label", $"No test of the lot has the label \"{(replaced.Length > 40 ? replaced[..40] + "…" : replaced)}\". Give the label of the test that this one replaces.");
            }
            else if (at == i)
            {
                yield return At("replaces-itself", "A test cannot replace itself. Give the label of the first test.");
            }
            else if (!replacing.TryAdd(replaced, i))
            {
                yield return At("replaced-twice", $"Test {replacing[replaced] + 1} replaces \"{replaced}\" too. A further retest replaces the retest before it.");
            }
            else if (tests[i].SetAside is { })
            {
                yield return At("retest-set-aside", "A retest that is set aside replaces nothing. Leave out replaces, or setAside.");
            }
            else if (LeadsTo(i, at))
            {
                yield return At("replaces-in-a-circle", "These tests replace each other in a circle. Let the last retest replace the one before it, and so on to the first.");
            }
        }

        // Along the retests from one test to the next; each label is replaced once, so that the way ends or closes.
        bool LeadsTo(int target, int from)
        {
            for (var (at, steps) = (from, 0); steps <= tests.Count; steps++)
            {
                if (at == target)
                {
                    return true;
                }

                if (tests[at]?.Replaces is not { } next || !first.TryGetValue(next, out at))
                {
                    return false;
                }
            }

            return false;
        }
    }
}

/// <summary>Times of a lot's tests: readable, on all of them or on none.</summary>
internal static class LotTimes
{
    private static readonly string[] Formats = ["yyyy-MM-dd", "yyyy-MM-ddTHH:mm", "yyyy-MM-ddTHH:mm:ss", "yyyy-MM-ddTHH:mmzzz", "yyyy-MM-ddTHH:mm:sszzz"];

    /// <summary>The time, or null where it cannot be read. A Z is an offset of 0; without an offset all are taken as of one place.</summary>
    public static DateTimeOffset? Read(string text)
    {
        var written = text.EndsWith('Z') ? text[..^1] + "+00:00" : text;
        return DateTimeOffset.TryParseExact(written, Formats, CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal, out var time) ? time : null;
    }

    public static IEnumerable<Fault> Check(IReadOnlyList<LotTestContract> tests)
    {
        // An empty text is no time, but asks none of the others.
        if (!tests.Any(test => test?.Time is { Length: > 0 }))
        {
            foreach (var (i, _) in tests.Index().Where(test => test.Item?.Time is { }))
            {
                yield return NotATime(i);
            }

            yield break;
        }

        bool? withOffset = null;
        for (var i = 0; i < tests.Count; i++)
        {
            Fault At(string code, string message) => new($"/tests/{i}/time", code, message);
            if (tests[i]?.Time is not { } text)
            {
                yield return At("incomplete", "Other tests have a time, and this one has none. Give it on all tests or on none, for it decides the order.");
            }
            else if (Read(text) is null)
            {
                yield return NotATime(i);
            }
            else if ((withOffset ??= HasOffset(text)) != HasOffset(text))
            {
                yield return At("mixed-offsets", "Some times have an offset and others have none, so that their order is not known. Write all with an offset, or none.");
            }
        }
    }

    private static Fault NotATime(int test) =>
        new($"/tests/{test}/time", "not-a-time", "A time is written as 2026-05-12, 2026-05-12T14:30 or 2026-05-12T14:30:00, with or without an offset such as +02:00.");

    private static bool HasOffset(string text) => text.EndsWith('Z') || text.LastIndexOfAny(['+', '-']) > "yyyy-MM-dd".Length;
}
