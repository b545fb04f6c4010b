using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary>A specimen's data may begin at any stage, and come to the same.</summary>
public sealed class StagesTests(RunningService service)
{
    /// <summary>Each describes a specimen of 2000 g wet in 1000 cm³ with 10 % of water.</summary>
    [Theory]
    [InlineData("""{"moldAndWetSoil":7000,"waterContent":10}""")]
    [InlineData("""{"moldAndWetSoil":7000,"tins":[{"tin":30,"wet":140,"dry":130}]}""")]
    [InlineData("""{"moldAndWetSoil":7000,"tins":[{"tin":30,"wet":139.5,"dry":130},{"tin":0,"wet":110.5,"dry":100}]}""")]
    [InlineData("""{"moldAndWetSoil":7000,"wetBasis":9.090909090909092}""")]
    [InlineData("""{"moldAndWetSoil":7000,"carbide":{"reading":9.090909090909092}}""")]
    [InlineData("""{"moldAndWetSoil":7000,"carbide":{"reading":4.545454545454546,"halfSample":true}}""")]
    [InlineData("""{"wetMass":2000,"waterContent":10}""")]
    [InlineData("""{"wetDensity":2,"waterContent":10}""")]
    [InlineData("""{"dryDensity":1.8181818181818181,"waterContent":10}""")]
    [InlineData("""{"wetDensity":2,"dryDensity":1.8181818181818181}""")]
    [InlineData("""{"moldAndWetSoil":7000,"dryDensity":1.8181818181818181}""")]
    [InlineData("""{"moldAndWetSoil":6500,"mold":{"mass":4500},"waterContent":10}""")]
    [InlineData("""{"moldAndWetSoil":9000,"mold":{"volume":2000},"waterContent":10}""")]
    [InlineData("""{"moldAndWetSoil":7500,"mold":{"mass":5500,"diameter":100,"height":127.32395447351627},"waterContent":10}""")]
    [InlineData("""{"moldAndWetSoil":7300,"mold":{"empty":5300,"withWater":6298.2067},"waterContent":10}""")]
    [InlineData("""{"moldAndWetSoil":7300,"mold":{"empty":5500,"withWater":6498.2067,"plate":200},"waterContent":10}""")]
    public async Task Every_stage_leads_to_the_same_densities(string specimen)
    {
        var reduced = (await service.AnswerAsync(Body.With(("/mold", """{"mass":5000,"volume":1000}"""), ("/specimens", $"[{specimen}]")))).At("/specimens/0");
        Assert.Equal(10, reduced.Number("/waterContent"), 1e-9);
        Assert.Equal(2, reduced.Number("/wetDensity"), 1e-6);
        Assert.Equal(2 / 1.1, reduced.Number("/dryDensity"), 1e-6);
        Assert.Equal("1", reduced.Text("/label"));
    }

    /// <summary>Density of water: 998.2067 kg/m³ at 20 °C and 997.0470 at 25 °C (Tanaka et al. 2001, table).</summary>
    [Theory]
    [InlineData("""{"empty":4250,"withWater":5191.6}""", 941.6 / 0.9982067)]
    [InlineData("""{"empty":4250,"withWater":5191.6,"waterTemperature":25}""", 941.6 / 0.9970470)]
    [InlineData("""{"empty":4550,"withWater":5491.6,"plate":300}""", 941.6 / 0.9982067)]
    public async Task A_molds_volume_by_water_is_the_waters_mass_over_its_density_at_its_temperature(string mold, double volume)
    {
        var answer = await service.AnswerAsync(Body.With("/mold", mold));
        Assert.Equal((6064.2 - 4250) / volume, answer.Number("/specimens/0/wetDensity"), 1e-7);
    }

    [Fact]
    public async Task The_tins_mean_is_the_water_content()
    {
        var answer = await service.AnswerAsync(Body.With("/specimens/0/tins", """[{"tin":0,"wet":109,"dry":100},{"tin":0,"wet":222,"dry":200},{"tin":0,"wet":110,"dry":100}]"""));
        Assert.Equal(10, answer.Number("/specimens/0/waterContent"), 1e-12);
        Assert.Equal("/specimens/0/tins", answer.Finding("tins-disagree").Text("/pointer"));
    }

    [Fact]
    public async Task A_tin_without_a_drop_of_water_is_a_water_content_of_zero()
    {
        var answer = await service.AnswerAsync(Body.With("/specimens/0/tins/0/dry", "140"));
        Assert.Equal(0, answer.Number("/specimens/0/waterContent"));
        Assert.Equal(answer.Number("/specimens/0/wetDensity"), answer.Number("/specimens/0/dryDensity"));
    }
}
