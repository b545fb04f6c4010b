using System.Globalization;
using System.Text.Json;
using Drypeak.Service.Tests.Documents;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Field;

/// <summary>
/// Every case of tests/Published/field.json that a field job answers; each names its source there. A case marked WRONG is a published wrong
/// answer, which must not come out; ROUNDING comes out only with the published rounding of a value between, so that the exact one is checked.
/// </summary>
public sealed class FieldPublishedTests(RunningService service)
{
    private static readonly JsonElement File = JsonElement.Parse(System.IO.File.ReadAllText(Repository.File("tests/Published/field.json")));

    /// <summary>Cases of other jobs: quantities, lots, test locations, roller output.</summary>
    private static readonly string[] Elsewhere = ["RN1", "ST1", "EW1", "EW2", "EW3", "EW5", "EW6", "EW9", "EW10", "EW11", "EW18"];

    private static readonly string[] Here = ["SC1", "SC3", "SC5", "CC1", "CC2", "NU1", "MC1", "NU2", "HI1", "RD1", "RD2", "RD4", "RD6"];

    [Fact]
    public void Every_case_of_the_file_is_checked_here_or_belongs_to_another_job() =>
        Assert.Equal(Here.Concat(Elsewhere).Order(StringComparer.Ordinal), File.GetProperty("cases").EnumerateArray().Select(item => item.Text("/id")!).Order(StringComparer.Ordinal));

    /// <summary>SC1: sand cone, lb and ft3, with the calibration of the sand; ROUNDING.</summary>
    [Fact]
    public async Task SC1_a_sand_cone_with_its_calibration_gives_the_exact_density_and_not_that_of_a_rounded_volume()
    {
        var (inputs, exact) = (Case("SC1", "inputs"), Case("SC1", "exact"));
        var answer = await service.AnswerAsync(FieldJobs.FieldDensity, $$"""
            {
              "units": { "mass": "lb", "volume": "ft3", "density": "lb/ft3" }, "method": "sand-cone",
              "sandCone": {
                "before": {{Of(inputs, "jug_before_lb")}}, "after": {{Of(inputs, "jug_after_lb")}}, "coneAndPlate": {{Of(inputs, "sand_in_cone_lb")}},
                "calibration": { "containerVolume": {{(1 / 30.0).ToString("R", CultureInfo.InvariantCulture)}}, "sandMass": {{Of(inputs, "sand_in_mould_lb")}} }
              },
              "soil": { "wet": {{Of(inputs, "soil_wet_lb")}} }, "waterContent": {{Of(inputs, "w_percent")}}
            }
            """);
        Assert.Equal(exact.Number("/sand_density_pcf"), answer.Number("/test/sandDensity"), 1e-9);
        Assert.Equal(exact.Number("/hole_volume_ft3"), answer.Number("/test/volume"), 5e-8);
        Assert.Equal(exact.Number("/wet_density_pcf"), answer.Number("/test/wetDensity"), 1e-3);
        Assert.Equal(exact.Number("/dry_density_pcf_exact"), answer.Number("/test/dryDensity"), 2e-3);
        Assert.NotEqual(Case("SC1", "published").Number("/dry_density_pcf"), answer.Number("/test/dryDensity"), 0.1);
    }

    /// <summary>SC3: sand cone by volumes only, without a water content.</summary>
    [Fact]
    public async Task SC3_volumes_of_sand_give_the_hole_and_its_wet_density()
    {
        var (inputs, published) = (Case("SC3", "inputs"), Case("SC3", "published"));
        var answer = await service.AnswerAsync(FieldJobs.FieldDensity, $$"""
            { "units": { "mass": "lb", "volume": "ft3", "density": "lb/ft3" }, "method": "sand-cone",
              "sandCone": { "releasedVolume": {{Of(inputs, "sand_released_ft3")}}, "coneVolume": {{Of(inputs, "cone_ft3")}} }, "soil": { "wet": {{Of(inputs, "soil_wet_lb")}} } }
            """);
        Assert.Equal(published.Number("/hole_ft3"), answer.Number("/test/volume"), 1e-9);
        Assert.Equal(published.Number("/wet_density_pcf"), answer.Number("/test/wetDensity"), 1e-9);
        Assert.True(answer.IsNull("/test/dryDensity"));
        Assert.Contains("water-content-missing", answer.Findings());
    }

    /// <summary>SC5: WRONG, dry density taken as wet·(1 − w).</summary>
    [Fact]
    public async Task SC5_dry_density_is_wet_over_one_plus_w_and_not_wet_times_one_minus_w()
    {
        var (inputs, exact) = (Case("SC5", "inputs"), Case("SC5", "exact"));
        var answer = await service.AnswerAsync(FieldJobs.FieldDensity, $$"""
            { "units": { "mass": "kg", "volume": "m3", "density": "g/cm3" }, "method": "sand-cone",
              "sandCone": { "sandInHole": {{Of(inputs, "sand_in_pit_kg")}}, "sandDensity": {{Of(inputs, "sand_density_g_cm3")}} },
              "soil": { "wet": {{Of(inputs, "soil_wet_kg")}} }, "waterContent": {{Of(inputs, "w_percent")}} }
            """);
        Assert.Equal(exact.Number("/volume_m3"), answer.Number("/test/volume"), 1e-9);
        Assert.Equal(exact.Number("/wet_g_cm3"), answer.Number("/test/wetDensity"), 1e-5);
        Assert.Equal(exact.Number("/dry_correct_g_cm3"), answer.Number("/test/dryDensity"), 1e-5);
        Assert.NotEqual(Case("SC5", "published").Number("/dry_g_cm3"), answer.Number("/test/dryDensity"), 0.01);
    }

    /// <summary>CC1: core cutter with void ratio and saturation, water of 1000 kg/m³.</summary>
    [Fact]
    public async Task CC1_a_core_cutter_gives_dry_density_void_ratio_and_saturation()
    {
        var (inputs, exact) = (Case("CC1", "inputs"), Case("CC1", "exact"));
        var answer = await service.AnswerAsync(FieldJobs.FieldDensity, $$"""
            { "units": { "density": "g/cm3" }, "method": "drive-cylinder", "driveCylinder": { "volume": {{Of(inputs, "volume_cm3")}} },
              "soil": { "containerAndWet": {{Of(inputs, "cutter_plus_soil_g")}}, "container": {{Of(inputs, "cutter_g")}} },
              "waterContent": {{Of(inputs, "w_percent")}}, "waterDensity": 1, "specificGravity": { "value": {{Of(inputs, "Gs")}} } }
            """);
        Assert.Equal(exact.Number("/wet_g_cm3"), answer.Number("/test/wetDensity"), 1e-9);
        Assert.Equal(exact.Number("/dry_g_cm3"), answer.Number("/test/dryDensity"), 1e-5);
        Assert.Equal(exact.Number("/e"), answer.Number("/test/voidRatio"), 1e-5);
        Assert.Equal(exact.Number("/S_percent"), answer.Number("/test/saturation"), 1e-2);
    }

    /// <summary>CC2: WRONG, the water content taken on wet mass.</summary>
    [Fact]
    public async Task CC2_a_water_content_is_on_dry_mass_and_not_on_wet_mass()
    {
        var (inputs, exact) = (Case("CC2", "inputs"), Case("CC2", "exact"));
        var answer = await service.AnswerAsync(FieldJobs.FieldDensity, $$"""
            { "units": { "density": "g/cm3" }, "method": "drive-cylinder", "driveCylinder": { "volume": {{Of(inputs, "volume_cm3")}} },
              "soil": { "containerAndWet": {{Of(inputs, "cutter_plus_soil_g")}}, "container": {{Of(inputs, "cutter_g")}} }, "waterContent": {{Of(inputs, "w_percent")}} }
            """);
        Assert.Equal(exact.Number("/dry_correct_g_cm3"), answer.Number("/test/dryDensity"), 1e-4);
        Assert.NotEqual(Case("CC2", "published").Number("/dry_g_cm3"), answer.Number("/test/dryDensity"), 0.01);
    }

    /// <summary>NU1: nuclear gauge, wet to dry unit weight.</summary>
    [Fact]
    public async Task NU1_a_gauge_gives_the_dry_unit_weight()
    {
        var inputs = Case("NU1", "inputs");
        var answer = await service.AnswerAsync(FieldJobs.FieldDensity, $$"""
            { "units": { "density": "kN/m3" }, "method": "nuclear-gauge", "nuclearGauge": { "wetDensity": [{{Of(inputs, "wet_kN_m3")}}], "waterContent": [{{Of(inputs, "w_percent")}}] } }
            """);
        Assert.Equal(Case("NU1", "exact").Number("/dry_kN_m3"), answer.Number("/test/dryDensity"), 1e-4);
    }

    /// <summary>NU2: two gauge readings averaged, moisture by the oven (from memory in the file, arithmetic confirmed there).</summary>
    [Fact]
    public async Task NU2_readings_are_averaged_and_held_against_the_maximum()
    {
        var (inputs, exact) = (Case("NU2", "inputs"), Case("NU2", "exact"));
        var answer = await service.AnswerAsync(FieldJobs.FieldDensity, $$"""
            { "units": { "density": "lb/ft3" }, "method": "nuclear-gauge", "nuclearGauge": { "wetDensity": {{Of(inputs, "wet_readings_pcf")}} },
              "waterContent": {{Of(inputs, "w_percent")}}, "laboratory": { "maximumDryDensity": {{Of(inputs, "mdd_pcf")}} } }
            """);
        Assert.Equal(exact.Number("/mean_wet_pcf"), answer.Number("/test/wetDensity"), 1e-9);
        Assert.Equal(exact.Number("/dry_pcf"), answer.Number("/test/dryDensity"), 1e-3);
        Assert.Equal(exact.Number("/percent_compaction"), answer.Number("/relativeCompaction"), 1e-2);
    }

    /// <summary>MC1: wet basis to dry basis.</summary>
    [Fact]
    public async Task MC1_a_number_on_wet_mass_is_converted()
    {
        var answer = await service.AnswerAsync(FieldJobs.FieldDensity, $$"""
            { "method": "direct", "direct": { "wetDensity": 2 }, "wetBasis": {{Of(Case("MC1", "inputs"), "wet_basis_percent")}} }
            """);
        Assert.Equal(Case("MC1", "exact").Number("/dry_basis_decimal") * 100, answer.Number("/test/waterContent"), 1e-3);
    }

    /// <summary>HI1: the rapid method's density ratio; the peak is made by three specimens symmetric about it, which are this test's own.</summary>
    [Fact]
    public async Task HI1_the_density_ratio_is_field_wet_density_over_the_peak()
    {
        var inputs = Case("HI1", "inputs");
        var peak = inputs.Number("/peak_t_m3");
        string Specimen(double z, double converted) => string.Create(CultureInfo.InvariantCulture, $$"""{"waterAdded":{{z}},"wetDensity":{{converted * (1 + (z / 100)):R}}}""");
        var answer = await service.AnswerAsync(FieldJobs.RapidMethod, $$"""
            { "field": { "wetDensity": {{Of(inputs, "field_wet_t_m3")}} }, "specimens": [{{Specimen(0, peak - 0.03)}}, {{Specimen(2, peak)}}, {{Specimen(4, peak - 0.03)}}] }
            """);
        Assert.Equal(peak, answer.Number("/peak/convertedWetDensity"), 1e-9);
        Assert.Equal(Case("HI1", "exact").Number("/ratio_percent"), answer.Number("/densityRatio"), 5e-3);
    }

    /// <summary>RD1 is right; RD2 is the same data by the linear formula: WRONG.</summary>
    [Theory]
    [InlineData("RD1")]
    [InlineData("RD2")]
    public async Task RD1_and_RD2_relative_density_is_never_linear_in_density(string id)
    {
        var inputs = Case(id, "inputs");
        var answer = await service.AnswerAsync(FieldJobs.RelativeDensity, $$"""
            { "dryDensity": {{Of(inputs, "d")}}, "minimumDryDensity": {{Of(inputs, "dmin")}}, "maximumDryDensity": {{Of(inputs, "dmax")}} }
            """);
        Assert.Equal(100 * Case("RD1", "exact").Number("/Dr"), answer.Number("/relativeDensity"), 1e-3);
        Assert.NotEqual(Case("RD2", "published").Number("/Dr_percent"), answer.Number("/relativeDensity"), 1.0);
    }

    /// <summary>RD4: relative compaction to relative density.</summary>
    [Fact]
    public async Task RD4_relative_compaction_gives_density_and_relative_density()
    {
        var (inputs, exact) = (Case("RD4", "inputs"), Case("RD4", "exact"));
        var answer = await service.AnswerAsync(FieldJobs.RelativeDensity, $$"""
            { "units": { "density": "kN/m3" }, "relativeCompaction": {{Of(inputs, "RC")}}, "minimumDryDensity": {{Of(inputs, "dmin")}}, "maximumDryDensity": {{Of(inputs, "dmax")}} }
            """);
        Assert.Equal(exact.Number("/dry"), answer.Number("/dryDensity"), 1e-3);
        Assert.Equal(exact.Number("/Dr_percent"), answer.Number("/relativeDensity"), 1e-2);
    }

    /// <summary>RD6: relative density to relative compaction (inputs of a textbook; answer computed in the file).</summary>
    [Fact]
    public async Task RD6_relative_density_gives_density_and_relative_compaction()
    {
        var (inputs, exact) = (Case("RD6", "inputs"), Case("RD6", "exact"));
        var answer = await service.AnswerAsync(FieldJobs.RelativeDensity, $$"""
            { "units": { "density": "kN/m3" }, "relativeDensity": {{Of(inputs, "Dr")}}, "minimumDryDensity": {{Of(inputs, "dmin")}}, "maximumDryDensity": {{Of(inputs, "dmax")}} }
            """);
        Assert.Equal(exact.Number("/dry"), answer.Number("/dryDensity"), 1e-4);
        Assert.Equal(exact.Number("/RC"), answer.Number("/relativeCompaction"), 1e-2);
    }

    private static JsonElement Case(string id, string part) => File.GetProperty("cases").EnumerateArray().Single(item => item.Text("/id") == id).GetProperty(part);

    private static string Of(JsonElement inputs, string name) => inputs.GetProperty(name).GetRawText();
}
