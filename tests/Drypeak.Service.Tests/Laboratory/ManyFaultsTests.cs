using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary>All that is wrong with a request comes at once, in the order of the document, and nothing that only follows.</summary>
public sealed class ManyFaultsTests(RunningService service)
{
    [Fact]
    public async Task Five_faults_of_form_are_told_together()
    {
        var refusal = await service.RefusalAsync(Body.With(
            ("/colour", "1"), ("/mold/volume", "\"943\""), ("/specimens/0/tins/0/dry", Body.Absent), ("/specimens/1", "null"), ("/waterTemperature", "1e999")));
        Assert.Equal(400, refusal.Status);
        Assert.Equal(
            [
                "/mold/volume wrong-type", "/specimens/0/tins/0/dry missing-member", "/specimens/1 null-not-allowed", "/colour unknown-member",
                "/waterTemperature number-out-of-range",
            ],
            refusal.Faults);
    }

    [Fact]
    public async Task Five_faults_of_value_are_told_together()
    {
        var refusal = await service.RefusalAsync(Body.With(
            ("/method", "\"astm\""), ("/units/mass", "\"oz\""), ("/specificGravity/value", "0"), ("/specimens/0/tins/0/dry", "141"), ("/specimens/3/label", "\"3\"")));
        Assert.Equal(422, refusal.Status);
        Assert.Equal(
            [
                "/method unknown-method", "/units/mass unknown-unit", "/specificGravity/value out-of-range", "/specimens/0/tins/0/dry dry-over-wet",
                "/specimens/3/label repeated-label",
            ],
            refusal.Faults);
    }

    [Fact]
    public async Task Faults_of_form_and_of_value_come_together_as_400()
    {
        var refusal = await service.RefusalAsync(Body.With(
            ("/methods", "\"astm-d698-a\""), ("/mold/volume", "-943"), ("/specimens/0/tins/0/dry", "\"130\""), ("/specimens/2/tins/0/dry", "147"), ("/specimens/4/label", "\"1\"")));
        Assert.Equal(400, refusal.Status);
        Assert.Equal(
            [
                "/mold/volume not-positive", "/specimens/0/tins/0/dry wrong-type", "/specimens/2/tins/0/dry dry-over-wet", "/specimens/4/label repeated-label",
                "/methods unknown-member",
            ],
            refusal.Faults);
    }

    [Fact]
    public async Task Contradictions_come_together_with_faults_of_form_elsewhere()
    {
        var refusal = await service.RefusalAsync(Body.With(("/trace", "1"), ("/specimens/0/waterContent", "11"), ("/specimens/1/tins/0/dry", "null")));
        Assert.Equal(400, refusal.Status);
        Assert.Equal(["/specimens/0/waterContent contradiction", "/specimens/1/tins/0/dry null-not-allowed", "/trace wrong-type"], refusal.Faults);
    }

    /// <summary>One mistake each, from which other rules would be broken if it were not known for what it is.</summary>
    [Theory]
    [InlineData("/mold", "\"943\"", "/mold wrong-type")]
    [InlineData("/mold/volume", "\"943\"", "/mold/volume wrong-type")]
    [InlineData("/mold/mass", "true", "/mold/mass wrong-type")]
    [InlineData("/mold", """{"mass":4250,"volum":943}""", "/mold/volum unknown-member")]
    [InlineData("/mold", """{"mass":4250,"diameter":101.6,"hight":116.4}""", "/mold/hight unknown-member")]
    [InlineData("/specimens/1", """{"moldAndWetSoil":6173.3,"watercontent":12}""", "/specimens/1/watercontent unknown-member")]
    [InlineData("/specimens/1/tins", "143", "/specimens/1/tins wrong-type")]
    [InlineData("/specimens/1/tins", "null", "/specimens/1 not-enough-data", 422)]
    [InlineData("/specimens", "\"1, 2, 3\"", "/specimens wrong-type")]
    [InlineData("/units/mass", "\"lbs\"", "/units/mass unknown-unit", 422)]
    [InlineData("/mold/volume", "0", "/mold/volume not-positive", 422)]
    [InlineData("/specimens/1/label", "1", "/specimens/1/label wrong-type")]
    [InlineData("/oversize", """{"percents":9}""", "/oversize/percents unknown-member,/oversize/percent missing-member")]
    public async Task One_mistake_is_one_complaint(string place, string json, string expected, int status = 400)
    {
        var refusal = await service.RefusalAsync(Body.With(place, json));
        Assert.Equal(status, refusal.Status);
        Assert.Equal(expected.Split(','), refusal.Faults);
    }

    [Fact]
    public async Task No_more_than_two_hundred_faults_are_listed_and_the_rest_are_mentioned()
    {
        var refusal = await service.RefusalAsync(Body.WithSpecimens(Enumerable.Repeat("""{"waterContent":-1}""", 300)));
        Assert.Equal(422, refusal.Status);
        Assert.Equal(200, refusal.Errors.Count);
        Assert.Contains("only the first 200", refusal.Detail, StringComparison.Ordinal);
    }

    [Fact]
    public async Task A_refusal_is_the_same_bytes_each_time()
    {
        var body = Body.With(("/colour", "1"), ("/mold/volume", "-943"));
        using var first = await service.PostAsync(body);
        using var second = await service.PostAsync(body);
        Assert.Equal(await RunningService.TextOf(first), await RunningService.TextOf(second));
    }
}
