using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Field;

/// <summary>Bad bodies of the four jobs: each has the status, the place and the code of its fault, and no other.</summary>
public sealed class FieldFaultsTests(RunningService service)
{
    [Theory]
    // Form: 400.
    [InlineData("/method", Body.Absent, 400, "/method missing-member")]
    [InlineData("/method", "null", 400, "/method null-not-allowed")]
    [InlineData("/methods", "\"direct\"", 400, "/methods unknown-member")]
    [InlineData("/sandCone/before", "\"6420\"", 400, "/sandCone/before wrong-type")]
    [InlineData("/sandCone/weight", "1", 400, "/sandCone/weight unknown-member")]
    [InlineData("/soil", "[]", 400, "/soil wrong-type")]
    [InlineData("/tins", "[null]", 400, "/tins/0 null-not-allowed")]
    [InlineData("/tins", """[{"tin":30,"wet":150}]""", 400, "/tins/0/dry missing-member")]
    [InlineData("/specification/requirements/0/quantity", Body.Absent, 400, "/specification/requirements/0/quantity missing-member")]
    [InlineData("/specification/requirements", Body.Absent, 400, "/specification/requirements missing-member")]
    [InlineData("/specification/decision", "{}", 400, "/specification/decision/rule missing-member")]
    [InlineData("/oversize", "{}", 400, "/oversize/percent missing-member")]
    [InlineData("/laboratory", """{"test":{}}""", 400, "/laboratory/test/specimens missing-member")]
    // Values: 422.
    [InlineData("/method", "\"sandcone\"", 422, "/method unknown-method")]
    [InlineData("/sandCone", Body.Absent, 422, "/sandCone not-enough-data")]
    [InlineData("/direct", """{"dryDensity":1.8}""", 422, "/direct not-for-this-method")]
    [InlineData("/nuclearGauge", """{"wetDensity":[1.8]}""", 422, "/nuclearGauge not-for-this-method")]
    [InlineData("/units/mass", "\"oz\"", 422, "/units/mass unknown-unit")]
    [InlineData("/sandCone/before", "-1", 422, "/sandCone/before not-positive")]
    [InlineData("/sandCone/sandDensity", "0", 422, "/sandCone/sandDensity not-positive")]
    [InlineData("/sandCone/sandDensity", Body.Absent, 422, "/sandCone/sandDensity not-enough-data")]
    [InlineData("/sandCone/after", Body.Absent, 422, "/sandCone/after not-enough-data")]
    [InlineData("/sandCone/before", Body.Absent, 422, "/sandCone/before not-enough-data")]
    [InlineData("/sandCone/coneAndPlate", Body.Absent, 422, "/sandCone/coneAndPlate not-enough-data")]
    [InlineData("/sandCone", """{"releasedVolume":2000}""", 422, "/sandCone/coneVolume not-enough-data")]
    [InlineData("/sandCone", "{}", 422, "/sandCone/sandInHole not-enough-data")]
    [InlineData("/sandCone/sandInHole", "2000", 422, "/sandCone/sandInHole contradiction")]
    [InlineData("/sandCone/calibration", """{"containerVolume":2000,"sandMass":2900}""", 422, "/sandCone/sandDensity contradiction")]
    [InlineData("/sandCone/calibration", """{"containerVolume":2000}""", 422, "/sandCone/calibration/sandMass not-enough-data")]
    [InlineData("/sandCone/calibration", """{"containerVolume":0,"sandMass":2900}""", 422, "/sandCone/calibration/containerVolume not-positive")]
    [InlineData("/soil", Body.Absent, 422, "/soil not-enough-data")]
    [InlineData("/soil", "{}", 422, "/soil/wet not-enough-data")]
    [InlineData("/soil/wet", "0", 422, "/soil/wet not-positive")]
    [InlineData("/soil", """{"containerAndWet":3000}""", 422, "/soil/container incomplete")]
    [InlineData("/soil", """{"containerAndWet":200,"container":300}""", 422, "/soil/containerAndWet contradiction")]
    [InlineData("/soil/dry", "4000", 422, "/soil/dry contradiction")]
    [InlineData("/soil/dry", "2700", 422, "/soil/dry contradiction")]
    [InlineData("/waterContent", "-1", 422, "/waterContent out-of-range")]
    [InlineData("/wetBasis", "100", 422, "/wetBasis out-of-range")]
    [InlineData("/wetBasis", "12", 422, "/wetBasis contradiction")]
    [InlineData("/carbide", """{"reading":50,"halfSample":true}""", 422, "/carbide/reading out-of-range")]
    [InlineData("/tins", "[]", 422, "/tins empty-list")]
    [InlineData("/tins", """[{"tin":30,"wet":130,"dry":150}]""", 422, "/tins/0/dry dry-over-wet")]
    [InlineData("/waterTemperature", "41", 422, "/waterTemperature out-of-range")]
    [InlineData("/waterDensity", "2", 422, "/waterDensity out-of-range")]
    [InlineData("/specificGravity/value", "0", 422, "/specificGravity/value out-of-range")]
    [InlineData("/largestParticle", "0", 422, "/largestParticle not-positive")]
    [InlineData("/oversize", """{"percent":100}""", 422, "/oversize/percent out-of-range")]
    [InlineData("/oversize", """{"percent":10,"apply":"both"}""", 422, "/oversize/apply unknown-word")]
    [InlineData("/oversize", """{"percent":90,"specificGravity":1.0,"apply":"field"}""", 422, "/oversize oversize-fills-all")]
    [InlineData("/laboratory/maximumDryDensity", "0", 422, "/laboratory/maximumDryDensity not-positive")]
    [InlineData("/laboratory/minimumDryDensity", "1.9", 422, "/laboratory/minimumDryDensity limits-exchanged")]
    [InlineData("/laboratory/uncertainty/optimumWaterContent", "-1", 422, "/laboratory/uncertainty/optimumWaterContent out-of-range")]
    [InlineData("/laboratory", """{"test":{"specimens":[]}}""", 422, "/laboratory/test/specimens empty-list")]
    [InlineData("/laboratory", """{"maximumDryDensity":1.9,"test":{"specimens":[{"waterContent":10,"dryDensity":1.8}]}}""", 422, "/laboratory/maximumDryDensity not-with-test")]
    [InlineData("/uncertainty/dryDensity", "-0.1", 422, "/uncertainty/dryDensity negative")]
    [InlineData("/specification/requirements", "[]", 422, "/specification/requirements empty-list")]
    [InlineData("/specification/requirements/0", """{"quantity":"density","minimum":1}""", 422, "/specification/requirements/0/quantity unknown-quantity")]
    [InlineData("/specification/requirements/0", """{"quantity":"airVoids"}""", 422, "/specification/requirements/0/minimum not-enough-data")]
    [InlineData("/specification/requirements/0", """{"quantity":"airVoids","minimum":101}""", 422, "/specification/requirements/0/minimum out-of-range")]
    [InlineData("/specification/requirements/0", """{"quantity":"waterContent","minimum":5,"maximum":4}""", 422, "/specification/requirements/0/maximum limits-exchanged")]
    [InlineData("/specification/decision", """{"rule":"strict"}""", 422, "/specification/decision/rule unknown-word")]
    [InlineData("/specification/decision", """{"rule":"guarded"}""", 422, "/specification/decision/risk not-enough-data")]
    [InlineData("/specification/decision", """{"rule":"guarded","risk":0}""", 422, "/specification/decision/risk out-of-range")]
    [InlineData("/specification/decision", """{"rule":"guarded","risk":0.6}""", 422, "/specification/decision/risk out-of-range")]
    [InlineData("/specification/decision", """{"rule":"simple","risk":0.05}""", 422, "/specification/decision/risk not-for-this-rule")]
    public async Task A_bad_field_test_is_refused_at_its_place(string place, string json, int status, string fault) =>
        await AssertRefusedAsync(FieldJobs.FieldDensity, FieldJobs.With((place, json)), status, fault);

    [Theory]
    [InlineData("""{"method":"nuclear-gauge","nuclearGauge":{"wetDensity":[]}}""", 422, "/nuclearGauge/wetDensity empty-list")]
    [InlineData("""{"method":"nuclear-gauge","nuclearGauge":{"wetDensity":[0]}}""", 422, "/nuclearGauge/wetDensity/0 not-positive")]
    [InlineData("""{"method":"nuclear-gauge","nuclearGauge":{"wetDensity":2}}""", 400, "/nuclearGauge/wetDensity wrong-type")]
    [InlineData("""{"method":"nuclear-gauge","nuclearGauge":{"wetDensity":[2],"waterContent":[-1]}}""", 422, "/nuclearGauge/waterContent/0 out-of-range")]
    [InlineData("""{"method":"nuclear-gauge","nuclearGauge":{"wetDensity":[2],"waterDensity":[2]}}""", 422, "/nuclearGauge/waterDensity contradiction")]
    [InlineData("""{"method":"nuclear-gauge","nuclearGauge":{"wetDensity":[2],"waterContent":[10],"waterDensity":[0.5]}}""", 422, "/nuclearGauge/waterDensity contradiction")]
    [InlineData("""{"method":"nuclear-gauge","nuclearGauge":{"wetDensity":[2],"waterContent":[1],"ovenPairs":[{"gauge":20,"oven":10}]}}""", 422, "/nuclearGauge/ovenPairs contradiction")]
    [InlineData("""{"method":"nuclear-gauge","nuclearGauge":{"wetDensity":[2]},"soil":{"wet":2000}}""", 422, "/soil not-for-this-method")]
    [InlineData("""{"method":"direct","direct":{}}""", 422, "/direct/wetDensity not-enough-data")]
    [InlineData("""{"method":"direct","direct":{"wetDensity":1.8,"dryDensity":1.9}}""", 422, "/direct/dryDensity contradiction")]
    [InlineData("""{"method":"direct","direct":{"wetDensity":2,"dryDensity":1.9},"waterContent":10}""", 422, "/direct/dryDensity contradiction")]
    [InlineData("""{"method":"drive-cylinder","driveCylinder":{},"soil":{"wet":1}}""", 422, "/driveCylinder/volume not-enough-data")]
    [InlineData("""{"method":"drive-cylinder","driveCylinder":{"diameter":100},"soil":{"wet":1}}""", 422, "/driveCylinder/height incomplete")]
    [InlineData("""{"method":"drive-cylinder","driveCylinder":{"diameter":100,"height":100,"volume":900},"soil":{"wet":1}}""", 422, "/driveCylinder/volume contradiction")]
    [InlineData("""{"method":"rubber-balloon","rubberBalloon":{"initialReading":-1,"finalReading":900},"soil":{"wet":1}}""", 422, "/rubberBalloon/initialReading negative")]
    [InlineData("""{"method":"rubber-balloon","rubberBalloon":{"finalReading":900},"soil":{"wet":1}}""", 400, "/rubberBalloon/initialReading missing-member")]
    public async Task A_bad_test_of_another_method_is_refused_at_its_place(string body, int status, string fault) =>
        await AssertRefusedAsync(FieldJobs.FieldDensity, body, status, fault);

    [Theory]
    [InlineData(FieldJobs.RelativeDensity, """{"minimumDryDensity":1.5,"maximumDryDensity":1.8}""", " not-one-measure")]
    [InlineData(FieldJobs.RelativeDensity, """{"dryDensity":1.7,"relativeDensity":50,"minimumDryDensity":1.5,"maximumDryDensity":1.8}""", " not-one-measure")]
    [InlineData(FieldJobs.RelativeDensity, """{"dryDensity":1.7}""", " not-one-pair-of-limits")]
    [InlineData(FieldJobs.RelativeDensity, """{"dryDensity":1.7,"minimumDryDensity":1.5}""", "/maximumDryDensity incomplete")]
    [InlineData(FieldJobs.RelativeDensity, """{"dryDensity":1.7,"minimumDryDensity":1.8,"maximumDryDensity":1.8}""", "/minimumDryDensity limits-exchanged")]
    [InlineData(FieldJobs.RelativeDensity, """{"voidRatio":0.6,"minimumVoidRatio":0.8,"maximumVoidRatio":0.5}""", "/minimumVoidRatio limits-exchanged")]
    [InlineData(FieldJobs.RelativeDensity, """{"voidRatio":0.6,"minimumDryDensity":1.5,"maximumDryDensity":1.8}""", "/specificGravity not-enough-data")]
    [InlineData(FieldJobs.RelativeDensity, """{"dryDensity":1.6,"minimumVoidRatio":0.5,"maximumVoidRatio":0.8}""", "/specificGravity not-enough-data")]
    [InlineData(FieldJobs.RelativeDensity, """{"wetDensity":1.8,"minimumDryDensity":1.5,"maximumDryDensity":1.8}""", "/waterContent not-enough-data")]
    [InlineData(FieldJobs.RelativeDensity, """{"relativeDensity":1000,"minimumDryDensity":1.0,"maximumDryDensity":1.8}""", "/relativeDensity out-of-range")]
    [InlineData(FieldJobs.RelativeDensity, """{"dryDensity":0,"minimumDryDensity":1.5,"maximumDryDensity":1.8}""", "/dryDensity not-positive")]
    [InlineData(FieldJobs.OnePoint, """{"family":[],"point":{"waterContent":10,"dryDensity":1.8}}""", "/family empty-list")]
    [InlineData(FieldJobs.OnePoint, """{"family":[{}],"point":{"waterContent":10,"dryDensity":1.8}}""", "/family/0/optimumWaterContent not-enough-data")]
    [InlineData(FieldJobs.OnePoint, """{"family":[{"maximumDryDensity":1.8}],"point":{"waterContent":10,"dryDensity":1.8}}""", "/family/0/optimumWaterContent incomplete")]
    [InlineData(FieldJobs.OnePoint, """{"family":[{"points":[[1]]}],"point":{"waterContent":10,"dryDensity":1.8}}""", "/family/0/points/0 not-a-point")]
    [InlineData(FieldJobs.OnePoint, """{"family":[{"test":{"specimens":[]}}],"point":{"waterContent":10,"dryDensity":1.8}}""", "/family/0/test/specimens empty-list")]
    [InlineData(FieldJobs.OnePoint, """{"family":[{"optimumWaterContent":10,"maximumDryDensity":1.8}],"point":{}}""", "/point not-enough-data")]
    [InlineData(FieldJobs.OnePoint, """{"family":[{"optimumWaterContent":10,"maximumDryDensity":1.8}],"point":{"dryDensity":1.8}}""", "/point not-enough-data")]
    [InlineData(FieldJobs.OnePoint, """{"family":[{"optimumWaterContent":10,"maximumDryDensity":1.8}],"point":{"waterContent":10,"dryDensity":1.8,"wetDensity":2.1}}""", "/point/dryDensity contradiction")]
    [InlineData(FieldJobs.OnePoint, """{"family":[{"label":"a","optimumWaterContent":10,"maximumDryDensity":1.8},{"label":"a","optimumWaterContent":11,"maximumDryDensity":1.7}],"point":{"waterContent":10,"dryDensity":1.8}}""", "/family/1/label repeated-label")]
    [InlineData(FieldJobs.RapidMethod, """{"field":{"wetDensity":2},"specimens":[]}""", "/specimens empty-list")]
    [InlineData(FieldJobs.RapidMethod, """{"field":{"wetDensity":0},"specimens":[{"waterAdded":0,"wetDensity":2}]}""", "/field/wetDensity not-positive")]
    [InlineData(FieldJobs.RapidMethod, """{"field":{"wetDensity":2},"specimens":[{"waterAdded":-60,"wetDensity":2}]}""", "/specimens/0/waterAdded out-of-range")]
    [InlineData(FieldJobs.RapidMethod, """{"field":{"wetDensity":2,"waterContent":10,"wetBasis":20},"specimens":[{"waterAdded":0,"wetDensity":2}]}""", "/field/wetBasis contradiction")]
    public async Task A_bad_body_of_another_job_is_refused_at_its_place(string address, string body, string fault) =>
        await AssertRefusedAsync(address, body, 422, fault);

    [Fact]
    public async Task Every_fault_is_told_at_once()
    {
        var refusal = await service.RefusalAsync(FieldJobs.FieldDensity, FieldJobs.With(("/soil/wet", "-1"), ("/sandCone/sandDensity", "0"), ("/waterContent", "2000"), ("/units/mass", "\"stone\"")));
        Assert.Equal(["/units/mass unknown-unit", "/sandCone/sandDensity not-positive", "/soil/wet not-positive", "/waterContent out-of-range"], refusal.Faults);
    }

    private async Task AssertRefusedAsync(string address, string body, int status, string fault)
    {
        var refusal = await service.RefusalAsync(address, body);
        Assert.Equal((status, fault), (refusal.Status, string.Join("; ", refusal.Faults)));
    }
}
