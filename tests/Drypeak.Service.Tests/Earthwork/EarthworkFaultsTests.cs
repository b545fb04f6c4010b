using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Earthwork;

/// <summary>Bad bodies of the six jobs: each has the status, the place and the code of its fault, and no other.</summary>
public sealed class EarthworkFaultsTests(RunningService service)
{
    [Theory]
    // Form: 400.
    [InlineData("/portions/0/wetMass", Body.Absent, 400, "/portions/0/wetMass missing-member")]
    [InlineData("/portions/0/wetMass", "\"2200\"", 400, "/portions/0/wetMass wrong-type")]
    [InlineData("/portions/0", "null", 400, "/portions/0 null-not-allowed")]
    [InlineData("/portions", "{}", 400, "/portions wrong-type")]
    [InlineData("/portion", "[]", 400, "/portion unknown-member")]
    [InlineData("/units/liquids", "\"L\"", 400, "/units/liquids unknown-member")]
    // Values: 422.
    [InlineData("/portions", "[]", 422, "/portions empty-list")]
    [InlineData("/portions", Body.Absent, 422, "/portions not-enough-data")]
    [InlineData("/portions/0/wetMass", "0", 422, "/portions/0/wetMass not-positive")]
    [InlineData("/portions/0/waterContent", "-1", 422, "/portions/0/waterContent out-of-range")]
    [InlineData("/portions/0/waterContent", Body.Absent, 422, "/portions/0/waterContent not-enough-data")]
    [InlineData("/portions/0/wetBasis", "20", 422, "/portions/0/wetBasis contradiction")]
    [InlineData("/portions/0/tins", """[{"tin":30,"wet":100,"dry":110}]""", 422, "/portions/0/tins/0/dry dry-over-wet")]
    [InlineData("/portions/0/target", Body.Absent, 422, "/portions/0/target not-enough-data")]
    [InlineData("/portions/0/target", "1001", 422, "/portions/0/target out-of-range")]
    [InlineData("/portions/1/label", "\"a\"", 422, "/portions/1/label repeated-label")]
    [InlineData("/portions/1/label", "\" \"", 422, "/portions/1/label blank")]
    [InlineData("/wetMass", "2000", 422, "/wetMass not-with-portions")]
    [InlineData("/targets", "[12]", 422, "/targets not-with-portions")]
    [InlineData("/expected", """{"plasticLimit":18}""", 422, "/expected given-twice")]
    [InlineData("/units/mass", "\"oz\"", 422, "/units/mass unknown-unit")]
    [InlineData("/units/liquid", "\"pint\"", 422, "/units/liquid unknown-unit")]
    [InlineData("/waterTemperature", "60", 422, "/waterTemperature out-of-range")]
    [InlineData("/waterDensity", "0.5", 422, "/waterDensity out-of-range")]
    public async Task Bad_bodies_of_the_water_for_specimens(string place, string json, int status, string fault) =>
        await AssertRefusedAsync(EarthworkJobs.SpecimenWater, status, fault, (place, json));

    [Theory]
    [InlineData("""{"wetMass":2000,"waterContent":8}""", "/targets not-enough-data")]
    [InlineData("""{"wetMass":2000,"targets":[10]}""", "/waterContent not-enough-data")]
    [InlineData("""{"wetMass":2000,"waterContent":8,"targets":[]}""", "/targets empty-list")]
    [InlineData("""{"wetMass":2000,"waterContent":8,"targets":[10,-2]}""", "/targets/1 out-of-range")]
    [InlineData("""{"wetMass":2000,"waterContent":8,"expected":{}}""", "/expected/optimumWaterContent not-enough-data")]
    [InlineData("""{"wetMass":2000,"waterContent":8,"expected":{"optimumWaterContent":12,"plasticLimit":15}}""", "/expected/plasticLimit given-twice")]
    [InlineData("""{"wetMass":2000,"waterContent":8,"expected":{"plasticLimit":0}}""", "/expected/plasticLimit out-of-range")]
    [InlineData("""{"wetMass":2000,"waterContent":8,"expected":{"plasticLimit":18,"count":21}}""", "/expected/count out-of-range")]
    [InlineData("""{"wetMass":2000,"waterContent":8,"targets":[10],"expected":{"plasticLimit":18}}""", "/expected given-twice")]
    [InlineData("""{"portions":[{"wetMass":2000,"waterContent":8}],"expected":{"plasticLimit":18,"count":3}}""", "/expected/count not-with-portions")]
    public async Task Bad_bodies_of_equal_portions(string body, string fault) => await AssertRefusedAsync(EarthworkJobs.SpecimenWater, body, 422, fault);

    [Theory]
    [InlineData("/dryDensity", Body.Absent, 400, "/dryDensity missing-member")]
    [InlineData("/target", Body.Absent, 400, "/target missing-member")]
    [InlineData("/target", "null", 400, "/target null-not-allowed")]
    [InlineData("/evaporation", """{"hours":3}""", 400, "/evaporation/rate missing-member; /evaporationAllowance given-twice")]
    [InlineData("/dryDensity", "-1.8", 422, "/dryDensity not-positive")]
    [InlineData("/area", Body.Absent, 422, "/area incomplete")]
    [InlineData("/thickness", Body.Absent, 422, "/thickness incomplete")]
    [InlineData("/thickness", "0", 422, "/thickness not-positive")]
    [InlineData("/volume", "110", 422, "/volume contradiction")]
    [InlineData("/volume", "0", 422, "/volume not-positive")]
    [InlineData("/waterContent", Body.Absent, 422, "/waterContent not-enough-data")]
    [InlineData("/carbide", """{"reading":20}""", 422, "/carbide contradiction")]
    [InlineData("/evaporationAllowance", "-0.5", 422, "/evaporationAllowance out-of-range")]
    [InlineData("/evaporation", """{"rate":0.0005,"hours":3}""", 422, "/evaporationAllowance given-twice")]
    [InlineData("/tanker", "0", 422, "/tanker not-positive")]
    [InlineData("/uncertainty", """{"waterContent":-0.4}""", 422, "/uncertainty/waterContent out-of-range")]
    [InlineData("/units/bulkVolume", "\"cm3\"", 422, "/units/bulkVolume unknown-unit")]
    [InlineData("/units/area", "\"km2\"", 422, "/units/area unknown-unit")]
    public async Task Bad_bodies_of_the_water_for_a_lift(string place, string json, int status, string fault) =>
        await AssertRefusedAsync(EarthworkJobs.LiftWater, status, fault, (place, json));

    [Fact]
    public async Task A_rate_of_evaporation_needs_the_surface() =>
        await AssertRefusedAsync(EarthworkJobs.LiftWater, """{"volume":100,"dryDensity":1.8,"waterContent":9,"target":12,"evaporation":{"rate":0.5,"hours":3}}""", 422, "/area not-enough-data");

    [Theory]
    [InlineData("/fill", Body.Absent, 400, "/fill missing-member")]
    [InlineData("/fill/volume", Body.Absent, 400, "/fill/volume missing-member")]
    [InlineData("/fill/wetDensity", "2", 400, "/fill/wetDensity unknown-member")]
    [InlineData("/fleet/loadingTime", Body.Absent, 400, "/fleet/loadingTime missing-member")]
    [InlineData("/fleet/trucks", "2.5", 400, "/fleet/trucks wrong-type")]
    [InlineData("/borrow", Body.Absent, 422, "/borrow not-enough-data")]
    [InlineData("/fill/volume", "-1", 422, "/fill/volume not-positive")]
    [InlineData("/fill/volume", "1e13", 422, "/fill/volume out-of-range")]
    [InlineData("/fill/dryDensity", "0", 422, "/fill/dryDensity not-positive")]
    [InlineData("/borrow/dryDensity", Body.Absent, 422, "/borrow/dryDensity not-enough-data")]
    [InlineData("/borrow/waterContent", Body.Absent, 422, "/borrow/waterContent not-enough-data")]
    [InlineData("/borrow/wetDensity", "1.8", 422, "/borrow/wetDensity contradiction")]
    [InlineData("/loose", "{}", 422, "/loose/swell not-enough-data")]
    [InlineData("/loose/swell", "-1", 422, "/loose/swell out-of-range")]
    [InlineData("/loose/dryDensity", "1.3", 422, "/loose/swell contradiction")]
    [InlineData("/truck", "{}", 422, "/truck/volume not-enough-data")]
    [InlineData("/truck/mass", "0", 422, "/truck/mass not-positive")]
    [InlineData("/fleet/distance", Body.Absent, 422, "/fleet/distance not-enough-data")]
    [InlineData("/fleet/haulSpeed", "0", 422, "/fleet/haulSpeed not-positive")]
    [InlineData("/fleet/efficiency", "50", 422, "/fleet/efficiency out-of-range")]
    [InlineData("/fleet/trucks", "0", 422, "/fleet/trucks out-of-range")]
    [InlineData("/borrowAreas", """[{"dryDensity":1.5,"waterContent":10}]""", 422, "/borrow given-twice")]
    [InlineData("/units/speed", "\"kn\"", 422, "/units/speed unknown-unit")]
    public async Task Bad_bodies_of_quantities(string place, string json, int status, string fault) =>
        await AssertRefusedAsync(EarthworkJobs.Quantities, status, fault, (place, json));

    [Theory]
    [InlineData("""[]""", "/borrowAreas empty-list")]
    [InlineData("""[{"dryDensity":1.5,"waterContent":10},{"dryDensity":1.6,"waterContent":10,"haulDistance":5}]""", "/borrowAreas/0/haulDistance not-enough-data")]
    [InlineData("""[{"dryDensity":1.5,"waterContent":10,"share":60},{"dryDensity":1.6,"waterContent":10}]""", "/borrowAreas/1/share not-enough-data")]
    [InlineData("""[{"dryDensity":1.5,"waterContent":10,"share":60},{"dryDensity":1.6,"waterContent":10,"share":30}]""", "/borrowAreas shares-not-100")]
    [InlineData("""[{"dryDensity":1.5,"waterContent":10,"share":-60},{"dryDensity":1.6,"waterContent":10,"share":100}]""", "/borrowAreas/0/share out-of-range")]
    [InlineData("""[{"label":"x","dryDensity":1.5,"waterContent":10,"share":50},{"label":"x","dryDensity":1.6,"waterContent":10,"share":50}]""", "/borrowAreas/1/label repeated-label")]
    [InlineData("""[{"dryDensity":1.5,"waterContent":10,"capacity":0}]""", "/borrowAreas/0/capacity not-positive")]
    public async Task Bad_borrow_areas(string areas, string fault) =>
        await AssertRefusedAsync(EarthworkJobs.Quantities, $$"""{"fill":{"volume":1000,"dryDensity":1.8},"borrowAreas":{{areas}}}""", 422, fault);

    [Theory]
    [InlineData("/seed", Body.Absent, 400, "/seed missing-member")]
    [InlineData("/seed", "1.5", 400, "/seed wrong-type")]
    [InlineData("/seed", "\"7\"", 400, "/seed wrong-type")]
    [InlineData("/seed", "12345678901234567890", 400, "/seed number-out-of-range")]
    [InlineData("/lifts", Body.Absent, 400, "/lifts missing-member")]
    [InlineData("/area", "[]", 400, "/area wrong-type")]
    [InlineData("/lifts", "0", 422, "/lifts out-of-range")]
    [InlineData("/area/length", Body.Absent, 422, "/area/length not-enough-data")]
    [InlineData("/area/width", "0", 422, "/area/width not-positive")]
    [InlineData("/frequency", Body.Absent, 422, "/perLift not-enough-data")]
    [InlineData("/frequency", "{}", 422, "/frequency/volume not-enough-data")]
    [InlineData("/frequency/area", "100", 422, "/frequency/area given-twice")]
    [InlineData("/frequency/perShift", "3", 422, "/frequency/perShift given-twice; /liftsPerShift not-enough-data")]
    [InlineData("/frequency/volume", "0", 422, "/frequency/volume not-positive")]
    [InlineData("/frequency/volume", "0.001", 422, "/frequency too-many")]
    [InlineData("/perLift", "4", 422, "/perLift given-twice")]
    [InlineData("/liftThickness", Body.Absent, 422, "/liftThickness not-enough-data")]
    [InlineData("/frequency", """{"perShift":3}""", 422, "/liftsPerShift not-enough-data")]
    [InlineData("/area/outline", "[[0,0],[10,0],[10,10]]", 422, "/area/length given-twice; /area/startStation given-twice; /area/width given-twice")]
    [InlineData("/area", """{"outline":[[0,0],[10,0]]}""", 422, "/area/outline wrong-count")]
    [InlineData("/area", """{"outline":[[0,0],[10,0],[10]]}""", 422, "/area/outline not-a-corner")]
    [InlineData("/area", """{"outline":[[0,0],[10,10],[10,0],[0,10]]}""", 422, "/area/outline crosses-itself")]
    [InlineData("/area", """{"outline":[[0,0],[10,0],[20,0]]}""", 422, "/area/outline crosses-itself")]
    [InlineData("/area/exclusions", """[{"outline":[[900,-1],[1300,-1],[1300,20],[900,20]]}]""", 422, "/area no-open-area")]
    [InlineData("/area/exclusions", """[{"outline":[[0,0],[10,10],[10,0],[0,10]]}]""", 422, "/area/exclusions/0/outline crosses-itself")]
    [InlineData("/area/exclusions", "[{}]", 400, "/area/exclusions/0/outline missing-member")]
    public async Task Bad_bodies_of_a_test_programme(string place, string json, int status, string fault) =>
        await AssertRefusedAsync(EarthworkJobs.TestLocations, status, fault, (place, json));

    [Theory]
    [InlineData("/passes", Body.Absent, 400, "/passes missing-member")]
    [InlineData("/passes", "6.5", 400, "/passes wrong-type")]
    [InlineData("/width", "\"2 m\"", 400, "/width wrong-type")]
    [InlineData("/passes", "0", 422, "/passes out-of-range")]
    [InlineData("/width", "0", 422, "/width not-positive")]
    [InlineData("/overlap", "2", 422, "/overlap overlap-not-below-width")]
    [InlineData("/overlap", "-0.1", 422, "/overlap negative")]
    [InlineData("/speed", "-5", 422, "/speed not-positive")]
    [InlineData("/liftThickness", "0", 422, "/liftThickness not-positive")]
    [InlineData("/efficiency", "0", 422, "/efficiency out-of-range")]
    [InlineData("/efficiency", "45", 422, "/efficiency out-of-range")]
    public async Task Bad_bodies_of_a_roller(string place, string json, int status, string fault) =>
        await AssertRefusedAsync(EarthworkJobs.RollerOutput, status, fault, (place, json));

    [Theory]
    [InlineData("/readings", Body.Absent, 400, "/readings missing-member")]
    [InlineData("/readings/0/passes", "\"2\"", 400, "/readings/0/passes wrong-type")]
    [InlineData("/readings/0/dryDensity", "1.7", 400, "/readings/0/dryDensity wrong-type")]
    [InlineData("/readings/0/dryDensity/1", "null", 400, "/readings/0/dryDensity/1 null-not-allowed")]
    [InlineData("/leastGain", Body.Absent, 400, "/leastGain missing-member")]
    [InlineData("/readings", "[]", 422, "/readings empty-list")]
    [InlineData("/readings/0/passes", "0", 422, "/readings/0/passes out-of-range")]
    [InlineData("/readings/1/passes", "2", 422, "/readings/1/passes repeated")]
    [InlineData("/readings/0/dryDensity", Body.Absent, 422, "/readings/0/dryDensity not-enough-data")]
    [InlineData("/readings/0/dryDensity", "[]", 422, "/readings/0/dryDensity empty-list")]
    [InlineData("/readings/0/dryDensity/1", "0", 422, "/readings/0/dryDensity/1 not-positive")]
    [InlineData("/readings/0/wetDensity", "[2]", 422, "/readings/0/waterContent not-enough-data; /readings/0/wetDensity given-twice")]
    [InlineData("/leastGain", "0", 422, "/leastGain not-positive")]
    public async Task Bad_bodies_of_a_trial_strip(string place, string json, int status, string fault) =>
        await AssertRefusedAsync(EarthworkJobs.TestStrip, status, fault, (place, json));

    [Fact]
    public async Task Every_fault_is_told_at_once()
    {
        var refusal = await service.RefusalAsync(EarthworkJobs.LiftWater, EarthworkJobs.With(EarthworkJobs.LiftWater,
            ("/units/liquid", "\"pint\""), ("/area", "-1"), ("/dryDensity", "0"), ("/waterContent", "2000"), ("/tanker", "-5")));
        Assert.Equal(["/area not-positive", "/dryDensity not-positive", "/tanker not-positive", "/units/liquid unknown-unit", "/waterContent out-of-range"], refusal.Faults.Order(StringComparer.Ordinal));
    }

    /// <summary>Units of sites are the earthwork's own: a balance weighs no short tons, and a mold holds no acre-feet.</summary>
    [Theory]
    [InlineData("mass", "t")]
    [InlineData("mass", "short-ton")]
    [InlineData("volume", "gal")]
    [InlineData("volume", "acre-ft")]
    [InlineData("length", "mi")]
    public async Task The_laboratory_takes_no_units_of_sites(string unit, string name)
    {
        var refusal = await service.RefusalAsync(Body.With("/units/" + unit, $"\"{name}\""));
        Assert.Equal((422, $"/units/{unit} unknown-unit"), (refusal.Status, Assert.Single(refusal.Faults)));
        Assert.Equal("/units/liquid unknown-member", Assert.Single((await service.RefusalAsync(Body.With("/units/liquid", "\"L\""))).Faults));
    }

    private Task AssertRefusedAsync(string address, int status, string fault, (string Place, string Json) edit) =>
        AssertRefusedAsync(address, EarthworkJobs.With(address, edit), status, fault);

    private async Task AssertRefusedAsync(string address, string body, int status, string fault)
    {
        var refusal = await service.RefusalAsync(address, body);
        Assert.Equal((status, fault), (refusal.Status, string.Join("; ", refusal.Faults.Order(StringComparer.Ordinal))));
    }
}
