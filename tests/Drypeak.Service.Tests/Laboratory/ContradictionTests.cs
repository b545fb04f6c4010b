using System.Globalization;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary>What is given twice must agree: densities, masses and volumes to 0.2 %, water contents to 0.1 percentage points, both inclusive.</summary>
public sealed class ContradictionTests(RunningService service)
{
    /// <summary>A specimen at 10 % and 2.0 Mg/m³ wet, in a mold of 1000 cm³ and 5000 g, with one value given twice.</summary>
    [Theory]
    [InlineData("\"wetDensity\":{0}", 2.0 * 1.002, 2.0 * 1.0021, "wetDensity", "0.21 %")]
    [InlineData("\"wetDensity\":{0}", 2.0 * 0.998, 2.0 * 0.9979, "wetDensity", "0.21 %")]
    [InlineData("\"wetMass\":{0}", 2000 * 1.002, 2000 * 1.0021, "wetMass", "0.21 %")]
    [InlineData("\"dryDensity\":{0}", 2.0 / 1.1 * 1.002, 2.0 / 1.1 * 1.0021, "dryDensity", "0.21 %")]
    [InlineData("\"tins\":[{{\"tin\":0,\"wet\":{0},\"dry\":100}}]", 110.1, 110.11, "waterContent", "0.11 percentage points")]
    [InlineData("\"wetBasis\":{0}", 100 * 0.101 / 1.101, 100 * 0.1011 / 1.1011, "wetBasis", "0.11 percentage points")]
    [InlineData("\"carbide\":{{\"reading\":{0}}}", 100 * 0.099 / 1.099, 100 * 0.0989 / 1.0989, "carbide", "0.11 percentage points")]
    [InlineData("\"carbide\":{{\"reading\":{0},\"halfSample\":true}}", 50 * 0.101 / 1.101, 50 * 0.1011 / 1.1011, "carbide", "0.11 percentage points")]
    public async Task Two_values_of_one_quantity_agree_within_the_tolerance_and_no_further(
        string format, double atTheLimit, double beyond, string member, string apart)
    {
        string With(double value)
        {
            var twice = string.Format(CultureInfo.InvariantCulture, format, value.ToString("R", CultureInfo.InvariantCulture));
            return Body.With(("/mold", """{"mass":5000,"volume":1000}"""), ("/specimens", $$"""[{"moldAndWetSoil":7000,"waterContent":10,{{twice}}}]"""));
        }

        await service.AnswerAsync(With(atTheLimit));
        var refusal = await service.RefusalAsync(With(beyond));
        Assert.Equal(422, refusal.Status);
        Assert.Equal([$"/specimens/0/{member} contradiction"], refusal.Faults);
        Assert.Contains(apart + " apart", refusal.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("""{"mass":4250,"volume":1000,"diameter":100,"height":128}""", "0.53 %")]
    [InlineData("""{"volume":943,"empty":4250,"withWater":5200}""", "0.92 %")]
    [InlineData("""{"empty":4250,"withWater":5198,"diameter":101.6,"height":116.4}""", "0.63 %")]
    public async Task The_ways_to_a_molds_volume_must_agree_and_are_complained_of_once(string mold, string apart)
    {
        var refusal = await service.RefusalAsync(Body.With("/mold", mold));
        Assert.Equal(422, refusal.Status);
        Assert.Equal(["/mold contradiction"], refusal.Faults);
        Assert.Contains(apart + " apart", refusal.Message, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_specimens_own_mold_is_held_against_itself_at_its_own_place()
    {
        var refusal = await service.RefusalAsync(Body.With("/specimens/2/mold", """{"volume":943,"diameter":101.6,"height":120}"""));
        Assert.Equal(["/specimens/2/mold contradiction"], refusal.Faults);
    }

    /// <summary>998.2067 kg/m³ at 20 °C: Tanaka et al. 2001 (CIPM), table.</summary>
    [Theory]
    [InlineData(0.9982067 * 1.0019, true)]
    [InlineData(0.9982067 * 1.0025, false)]
    public async Task A_density_of_water_must_agree_with_its_temperature(double density, bool agrees)
    {
        var body = Body.With(("/waterTemperature", "20"), ("/waterDensity", density.ToString("R", CultureInfo.InvariantCulture)));
        if (agrees)
        {
            await service.AnswerAsync(body);
            return;
        }

        var refusal = await service.RefusalAsync(body);
        Assert.Equal(["/waterDensity contradiction"], refusal.Faults);
        Assert.Contains("0.25 % apart", refusal.Message, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("""{"wetDensity":1.7,"dryDensity":1.8}""", "/specimens/0/dryDensity")]
    [InlineData("""{"moldAndWetSoil":4250,"waterContent":10}""", "/specimens/0/moldAndWetSoil")]
    [InlineData("""{"moldAndWetSoil":6.0642,"waterContent":10}""", "/specimens/0/moldAndWetSoil")]
    public async Task What_leaves_no_water_or_no_soil_is_a_contradiction(string specimen, string expected)
    {
        var refusal = await service.RefusalAsync(Body.WithSpecimens(specimen));
        Assert.Equal(422, refusal.Status);
        Assert.Equal([$"{expected} contradiction"], refusal.Faults);
    }

    [Fact]
    public async Task All_contradictions_of_a_test_are_told_at_once()
    {
        var refusal = await service.RefusalAsync(Body.With(
            ("/specimens/0/waterContent", "11"), ("/specimens/1/wetDensity", "1.9"), ("/specimens/2/wetMass", "1900"), ("/specimens/4/dryDensity", "1.9")));
        Assert.Equal(422, refusal.Status);
        Assert.Equal(
            ["/specimens/0/waterContent contradiction", "/specimens/1/wetDensity contradiction", "/specimens/2/wetMass contradiction", "/specimens/4/dryDensity contradiction"],
            refusal.Faults);
    }
}
