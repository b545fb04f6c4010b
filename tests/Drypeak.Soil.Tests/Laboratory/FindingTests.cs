using System.Text.RegularExpressions;
using Drypeak.Soil.Curves;
using Drypeak.Soil.Laboratory;
using Drypeak.Soil.Laboratory.Review;
using Drypeak.Soil.Quantities;
using Drypeak.Soil.TestMethods;
using Xunit;
using static Drypeak.Soil.Tests.Laboratory.Ternmarsh;

namespace Drypeak.Soil.Tests.Laboratory;

/// <summary>Each kind of finding: a test that provokes it, where it points, and a twin that differs in that one thing and does not.</summary>
public class FindingTests
{
    private static readonly Oversize Coarse = new(0.094, 2.65, new WaterContent(0.01), 4.75);
    private static readonly MoistureDensityTest SixPoints = Points((8, 1752), (10, 1812), (12, 1853), (14, 1838), (16, 1787), (18, 1731));


    /// <summary>A method without a tolerance on its mold and without a procedure for oversize.</summary>
    private static readonly TestMethod OneLiter = TestMethodCatalogue.Find("bs-1377-4-3.3")!;

    private static readonly Provocation[] Table =
    [
        new("mixed-units", Severity.Error, "/specimens/3", Clay.With(3, specimen => specimen with { DryDensity = new Density(1.829) }), Clay),
        new("mixed-units", Severity.Error, "/specimens/0", Clay.With(0, specimen => specimen with { DryDensity = new Density(1742 * 62.428) }), Clay),
        new("mixed-units", Severity.Error, "/specimens/1", Clay.With(1, specimen => specimen with { DryDensity = new Density(1815 * 453.6) }), Clay),
        new("fractions-for-percent", Severity.Error, "/specimens", Points((0.098, 1742), (0.119, 1815), (0.14, 1858), (0.159, 1829), (0.181, 1765)), Clay),
        new("impossible-density", Severity.Error, "/specimens/2", Clay.With(2, specimen => specimen with { DryDensity = new Density(2801) }), Clay.With(2, specimen => specimen with { DryDensity = new Density(2799) })),
        new("impossible-density", Severity.Error, "/specimens/2", Clay.With(2, specimen => specimen with { DryDensity = new Density(299) }), Clay.With(2, specimen => specimen with { DryDensity = new Density(301) })),
        new("density-above-solids", Severity.Error, "/specimens/2", Clay.With(2, specimen => specimen with { DryDensity = new Density(2.7 * 998.21) }), Clay.With(2, specimen => specimen with { DryDensity = new Density(2.7 * 998.20) })),
        new("above-zero-air-voids", Severity.Error, "/specimens/4", Clay.With(4, specimen => specimen with { DryDensity = new Density(1820) }), Clay.With(4, specimen => specimen with { DryDensity = new Density(1805) })),
        new("above-zero-air-voids", Severity.Warning, "/specimens/4", Clay.With(4, specimen => specimen with { DryDensity = new Density(1820) }) with { SpecificGravity = new(2.70, Measured: false) }, Clay with { SpecificGravity = new(2.70, Measured: false) }),
        new("two-peaks", Severity.Error, "/specimens", Clay.With(2, specimen => specimen with { DryDensity = new Density(1770) }), Clay),
        new("no-optimum", Severity.Error, "/specimens", Points((8, 1700), (10, 1760), (12, 1820), (14, 1870)), Clay),
        new("no-optimum", Severity.Error, "/specimens", Points((8, 1950), (10, 1900), (12, 1850), (14, 1800)), Clay),
        new("no-optimum", Severity.Error, "/specimens", Points((12, 1820), (14, 1858)), Clay),
        new("no-optimum", Severity.Error, "/specimens", Clay.WithEach(specimen => specimen with { SetAside = "all spilled" }), Clay),
        new("optimum-at-edge", Severity.Warning, "/specimens", Points((10, 1700), (12, 1765), (14, 1820), (16, 1825)), Clay),
        new("too-few-specimens", Severity.Warning, "/specimens", Points((11.9, 1815), (14, 1858), (15.9, 1829)), Points((11.9, 1815), (14, 1858), (15.9, 1829), (18.1, 1765))),
        new("too-few-specimens", Severity.Error, "/specimens", Points((11.9, 1815), (14, 1858)), Clay),
        new("few-on-a-side", Severity.Warning, "/specimens", Points((13.0, 1845), (14.9, 1857), (16.8, 1806), (18.7, 1750)), Clay),
        new("wide-spacing", Severity.Warning, "/specimens/3", Points((9.8, 1742), (11.9, 1815), (14, 1858), (18.1, 1765)), Clay),
        new("wide-spacing", Severity.Note, "/specimens/3", Points((9.8, 1742), (11.9, 1815), (14, 1858), (18.1, 1765)) with { Method = null }, Clay),
        new("point-far-off", Severity.Warning, "/specimens/2", Clay.With(2, specimen => specimen with { DryDensity = new Density(1940) }), Clay),
        new("point-far-off", Severity.Warning, "/specimens/4", SixPoints.With(4, specimen => specimen with { DryDensity = new Density(1670) }), SixPoints),
        new("tins-disagree", Severity.Warning, "/specimens/0/tins", Weighed.With(0, specimen => specimen with { Tins = [.. specimen.Tins, Tin(24, 135.2, 124)] }), Weighed.With(0, specimen => specimen with { Tins = [.. specimen.Tins, Tin(24, 134.7, 124)] })),
        new("repeated-values", Severity.Warning, "/specimens/1/tins/0", Weighed.With(1, specimen => specimen with { Tins = Weighed.Specimens[0].Tins }), Weighed),
        new("repeated-values", Severity.Note, "/specimens/3", Weighed.With(3, specimen => specimen with { MoldAndWetSoil = Weighed.Specimens[2].MoldAndWetSoil }), Weighed),
        new("specific-gravity-unusual", Severity.Warning, "/specificGravity/value", Clay with { SpecificGravity = new(3.21, Measured: true) }, Clay with { SpecificGravity = new(3.2, Measured: true) }),
        new("specific-gravity-unusual", Severity.Warning, "/specificGravity/value", Clay with { SpecificGravity = new(2.19, Measured: true) }, Clay with { SpecificGravity = new(2.2, Measured: true) }),
        new("mold-outside-tolerance", Severity.Warning, "/mold", Weighed with { Mold = Weighed.Mold! with { Volume = Volume.From(958.5, VolumeUnit.CubicCentimeter) } }, Weighed with { Mold = Weighed.Mold! with { Volume = Volume.From(956.5, VolumeUnit.CubicCentimeter) } }),
        new("mold-outside-tolerance", Severity.Warning, "/specimens/2/mold", Weighed.With(2, specimen => specimen with { Mold = new Mold { Volume = Volume.From(928, VolumeUnit.CubicCentimeter) } }), Weighed.With(2, specimen => specimen with { Mold = new Mold { Volume = Volume.From(930, VolumeUnit.CubicCentimeter) } })),
        new("mold-outside-tolerance", Severity.Warning, "/mold/diameter", InMold(new Length(0.10201), new Length(0.1164)), InMold(new Length(0.1020), new Length(0.1164))),
        new("mold-outside-tolerance", Severity.Warning, "/mold/heights", InMold(new Length(0.1016), Readings(0.1171, 0.1168)), InMold(new Length(0.1016), Readings(0.1169, 0.1168))),
        new("mold-outside-tolerance", Severity.Warning, "/specimens/1/mold/diameter", InMold(new Length(0.1016), new Length(0.1164)).With(1, specimen => specimen with { Mold = new Mold { Diameter = new Length(0.1011), Height = new Length(0.1164) } }), InMold(new Length(0.1016), new Length(0.1164))),
        new("mold-outside-tolerance", Severity.Note, "/mold", Weighed with { Method = OneLiter, Mold = Weighed.Mold! with { Volume = Volume.From(979.9, VolumeUnit.CubicCentimeter) } }, Weighed with { Method = OneLiter, Mold = Weighed.Mold! with { Volume = Volume.From(980, VolumeUnit.CubicCentimeter) } }),
        new("particles-above-limit", Severity.Warning, "/particlesAbove", Clay with { ParticlesAbove = new(4.75, 0.26) }, Clay with { ParticlesAbove = new(4.75, 0.25) }),
        new("oversize-above-limit", Severity.Warning, "/oversize/percent", Clay with { Oversize = Coarse with { Fraction = 0.26 } }, Clay with { Oversize = Coarse with { Fraction = 0.25 } }),
        new("oversize-above-limit", Severity.Warning, "/oversize/percent", Clay with { Method = null, Oversize = Coarse with { Fraction = 0.41 } }, Clay with { Method = null, Oversize = Coarse with { Fraction = 0.40 } }),
        new("oversize-above-limit", Severity.Warning, "/oversize/percent", Clay with { Method = null, Oversize = Coarse with { Fraction = 0.31, SieveMillimeters = 19 } }, Clay with { Method = null, Oversize = Coarse with { Fraction = 0.30, SieveMillimeters = 19 } }),
        new("oversize-outside-method", Severity.Note, "/oversize", Clay with { Method = OneLiter, Oversize = Coarse }, Clay with { Oversize = Coarse }),
        new("oversize-outside-method", Severity.Warning, "/oversize/sieve", Clay with { Oversize = Coarse with { SieveMillimeters = 19 } }, Clay with { Oversize = Coarse with { SieveMillimeters = 4.76 } }),
        new("oversize-not-corrected", Severity.Warning, "/oversize", Clay with { Oversize = Coarse with { SpecificGravity = null } }, Clay with { Oversize = Coarse with { SpecificGravity = null, Fraction = 0.05 } }),
        new("oversize-small", Severity.Note, "/oversize/percent", Clay with { Oversize = Coarse with { Fraction = 0.05 } }, Clay with { Oversize = Coarse with { Fraction = 0.0501 } }),
        new("wet-leg-not-parallel", Severity.Note, "/specimens/4", Clay.With(4, specimen => specimen with { DryDensity = new Density(1590) }), Clay),
        new("saturation-at-optimum-unusual", Severity.Note, "/specificGravity", Clay with { SpecificGravity = new(2.95, Measured: true) }, Clay),
        new("models-disagree", Severity.Note, "/curve/model", Points((8, 1600), (10, 1750), (12, 1900), (14, 1850), (16, 1800)), Clay),
        new("peak-adopted", Severity.Note, "/curve/adopted", Clay with { Adopted = new(WaterContent.FromPercent(14.2), new Density(1858), "drawn by hand") }, Clay),
        new("peak-adopted", Severity.Warning, "/curve/adopted", Clay with { Adopted = new(WaterContent.FromPercent(14.2), new Density(1990), "drawn by hand") }, Clay),
        new("specific-gravity-assumed", Severity.Note, "/specificGravity", Clay with { SpecificGravity = new(2.70, Measured: false) }, Clay),
        new("specific-gravity-missing", Severity.Note, "", Clay with { SpecificGravity = null }, Clay),
        new("specimen-set-aside", Severity.Note, "/specimens/4/setAside", Clay.With(4, specimen => specimen with { SetAside = "mold not full" }), Clay),
        new("method-not-given", Severity.Note, "", Clay with { Method = null }, Clay with { Method = null, IsCustomMethod = true }),
    ];

    public static TheoryData<Provocation> Provoked => [.. Table];

    [Theory]
    [MemberData(nameof(Provoked))]
    public void A_test_provokes_the_finding_at_its_place_and_its_twin_does_not(Provocation row)
    {
        Assert.Contains(Bench.Analyze(row.Provoking).Findings, row.Expects);
        Assert.DoesNotContain(Bench.Analyze(row.Clean).Findings, finding => finding.Code == row.Code);
    }

    [Theory]
    [MemberData(nameof(Provoked))]
    public void A_finding_has_numbers_in_its_message_and_says_on_what_it_stands(Provocation row)
    {
        var finding = Bench.Analyze(row.Provoking).Findings.First(finding => row.Expects(finding));
        // What was not given has no number to show.
        Assert.True(Regex.IsMatch(finding.Message, @"\d") || row.Code is "specific-gravity-missing" or "method-not-given", finding.Message);
        Assert.EndsWith(".", finding.Message, StringComparison.Ordinal);
        Assert.NotEmpty(finding.Basis);
    }

    /// <summary>One kind is about a series of tests, not about one.</summary>
    [Fact]
    public void Every_kind_on_a_single_test_is_provoked_here() =>
        Assert.Equal(
            FindingKinds.All.Except([FindingKinds.EffortOutsideRange]).Select(kind => kind.Code).Order(StringComparer.Ordinal),
            Table.Select(row => row.Code).Distinct().Order(StringComparer.Ordinal));

    [Fact]
    public void Kinds_have_codes_of_their_own_and_say_what_why_and_what_to_do()
    {
        Assert.Equal(FindingKinds.All.Count, FindingKinds.All.Select(kind => kind.Code).Distinct().Count());
        Assert.All(FindingKinds.All, kind =>
        {
            Assert.Matches("^[a-z]+(-[a-z]+)*$", kind.Code);
            Assert.All(new[] { kind.Meaning, kind.Why, kind.Remedy }, text => Assert.EndsWith(".", text, StringComparison.Ordinal));
            Assert.NotEmpty(kind.Basis);
        });
    }

    [Fact]
    public void Sound_tests_pass_without_a_word()
    {
        Assert.Empty(Bench.Analyze(Weighed).Findings);
        Assert.Empty(Bench.Analyze(Clay).Findings);
        Assert.Empty(Bench.Analyze(SixPoints).Findings);
    }

    [Fact]
    public void Findings_come_worst_first()
    {
        var severities = Bench.Analyze(Clay.With(4, specimen => specimen with { DryDensity = new Density(1820) }) with { Method = null, SpecificGravity = new(3.3, Measured: false) })
            .Findings.Select(finding => finding.Severity).ToList();
        Assert.True(severities.Distinct().Count() > 1);
        Assert.Equal(severities.Order(), severities);
    }

    [Fact]
    public void A_point_within_rounding_of_the_zero_air_voids_line_is_a_note_not_an_error()
    {
        var limit = Drypeak.Soil.Phases.PhaseRelations.OnZeroAirVoidsLine(WaterContent.FromPercent(18.1), 2.70, Clay.WaterDensity).KilogramsPerCubicMeter;
        Severity? At(double share) => Bench.Analyze(Clay.With(4, specimen => specimen with { DryDensity = new Density(limit * share) }))
            .Findings.SingleOrDefault(finding => finding.Code == "above-zero-air-voids")?.Severity;
        Assert.Null(At(1));
        Assert.Equal(Severity.Note, At(1.0019));
        Assert.Equal(Severity.Error, At(1.0021));
    }

    [Fact]
    public void An_assumed_specific_gravity_below_the_points_is_told_the_smallest_that_fits_them()
    {
        // 1/Gs = ρw/ρd − w = 998.2/1820 − 0.181: 2.7213.
        var finding = Assert.Single(
            Bench.Analyze(Clay.With(4, specimen => specimen with { DryDensity = new Density(1820) }) with { SpecificGravity = new(2.60, Measured: false) }).Findings,
            finding => finding.Code == "above-zero-air-voids");
        Assert.Contains("fit from 2.7213 on", finding.Message, StringComparison.Ordinal);
    }

    /// <summary>What was read in the standard is cited as it stands; what was not says so.</summary>
    [Fact]
    public void A_finding_on_the_method_cites_the_method_and_says_what_is_from_memory()
    {
        string BasisOf(string code, MoistureDensityTest test) => Bench.Analyze(test).Findings.First(finding => finding.Code == code).Basis;
        Assert.Equal("ASTM D698, method A (from memory)", BasisOf("mold-outside-tolerance", Weighed with { Mold = Weighed.Mold! with { Volume = Volume.From(960, VolumeUnit.CubicCentimeter) } }));
        Assert.Equal("AASHTO T 99, method A", BasisOf("mold-outside-tolerance", InMold(new Length(0.103), new Length(0.1164))));
        Assert.Equal("ASTM D698, method A", BasisOf("particles-above-limit", Clay with { ParticlesAbove = new(4.75, 0.3) }));
        Assert.Equal("ASTM D698, method A", BasisOf("oversize-above-limit", Clay with { Oversize = Coarse with { Fraction = 0.3 } }));
        Assert.Equal("ASTM D698, method A", BasisOf("oversize-outside-method", Clay with { Oversize = Coarse with { SieveMillimeters = 19 } }));
        Assert.Equal("ASTM D698, method A (from memory)", BasisOf("wide-spacing", Points((9.8, 1742), (11.9, 1815), (14, 1858), (18.1, 1765))));
        Assert.Equal("JIS A 1210, method A", BasisOf("too-few-specimens", Clay with { Method = TestMethodCatalogue.Find("jis-a-1210-a") }));
    }

    [Fact]
    public void A_method_asks_for_its_own_number_of_specimens()
    {
        var strict = TestMethodCatalogue.Find("jis-a-1210-a")!;
        Assert.Equal(6, strict.MinimumSpecimens!.Value);
        var finding = Assert.Single(Bench.Analyze(Clay with { Method = strict }).Findings, finding => finding.Code == "too-few-specimens");
        Assert.Contains($"{strict.Title} asks for at least 6 specimens; 5 are kept", finding.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void The_saturation_model_without_specific_gravity_is_no_optimum_and_says_what_is_missing()
    {
        var result = Bench.Analyze(Clay with { SpecificGravity = null, Model = CurveModel.Saturation });
        Assert.Null(result.Optimum);
        Assert.Superset(new HashSet<string> { "no-optimum", "specific-gravity-missing" }, result.Findings.Select(finding => finding.Code).ToHashSet());
    }

    /// <summary>The weighed test by AASHTO T 99, method A, which has tolerances on both dimensions of its mold (as read).</summary>
    private static MoistureDensityTest InMold(MeasuredLength diameter, MeasuredLength height) => Weighed with
    {
        Method = TestMethodCatalogue.Find("aashto-t99-a"),
        Mold = new Mold { Mass = Weighed.Mold!.Mass, Diameter = diameter, Height = height },
    };

    private static MeasuredLength Readings(params double[] meters) => new() { Readings = [.. meters.Select(meter => new Length(meter))] };

    /// <summary>A finding that a test provokes, and the twin that does not.</summary>
    public sealed record Provocation(string Code, Severity Severity, string Place, MoistureDensityTest Provoking, MoistureDensityTest Clean)
    {
        public bool Expects(Finding finding) => (finding.Code, finding.Severity, finding.Place) == (Code, Severity, Place);

        public override string ToString() => $"{Severity} {Code} at {(Place.Length > 0 ? Place : "the whole")}";
    }
}
