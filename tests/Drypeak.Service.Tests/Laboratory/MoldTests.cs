using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

/// <summary>A mold by readings of its dimensions, and soil that ends below its rim.</summary>
public sealed class MoldTests(RunningService service)
{
    private const string Read = """{"mass":4250,"diameters":[101.5,101.6,101.7],"heights":[116.3,116.4,116.5]}""";
    private const string Single = """{"mass":4250,"diameter":101.6,"height":116.4}""";

    [Fact]
    public async Task Readings_count_as_their_mean()
    {
        var (readings, single) = (await service.AnswerAsync(Body.With("/mold", Read)), await service.AnswerAsync(Body.With("/mold", Single)));
        Assert.Equal(single.Numbers("/specimens", "dryDensity"), readings.Numbers("/specimens", "dryDensity"), (one, other) => Math.Abs(one - other) < 1e-12);
    }

    /// <summary>The soil's volume is π/4·d²·(h − z): the wet density rises by h/(h − z).</summary>
    [Theory]
    [InlineData("/specimens/2/depthBelowRim", "4.4")]
    [InlineData("/specimens/2/depthsBelowRim", "[4.3,4.4,4.5]")]
    public async Task Soil_that_ends_below_the_rim_is_denser_by_what_it_does_not_fill(string place, string depth)
    {
        var (full, below) = (await service.AnswerAsync(Body.With("/mold", Single)), await service.AnswerAsync(Body.With(("/mold", Single), (place, depth))));
        Assert.Equal(full.Number("/specimens/2/wetDensity") * 116.4 / 112, below.Number("/specimens/2/wetDensity"), 1e-9);
        Assert.Equal(full.Number("/specimens/1/wetDensity"), below.Number("/specimens/1/wetDensity"), 1e-12);
    }

    [Fact]
    public async Task The_depth_is_read_in_the_unit_of_length()
    {
        var (metric, inches) = (
            await service.AnswerAsync(Body.With(("/mold", """{"mass":4250,"diameter":101.6,"height":116.84}"""), ("/specimens/0/depthBelowRim", "2.54"))),
            await service.AnswerAsync(Body.With(("/units/length", "\"in\""), ("/mold", """{"mass":4250,"diameter":4,"height":4.6}"""), ("/specimens/0/depthBelowRim", "0.1"))));
        Assert.Equal(metric.Number("/specimens/0/dryDensity"), inches.Number("/specimens/0/dryDensity"), 1e-9);
    }

    /// <summary>101.60 ± 0.40 mm and 116.40 ± 0.50 mm: AASHTO T 99, as read.</summary>
    [Theory]
    [InlineData("""{"mass":4250,"diameter":102.0,"height":116.4}""", null)]
    [InlineData("""{"mass":4250,"diameter":102.01,"height":116.4}""", "/mold/diameter")]
    [InlineData("""{"mass":4250,"diameter":101.6,"heights":[117.1,116.8]}""", "/mold/heights")]
    public async Task Dimensions_outside_the_methods_tolerance_are_found_with_its_clause(string mold, string? place)
    {
        var answer = await service.AnswerAsync(Body.With(("/method", "\"aashto-t99-a\""), ("/mold", mold)));
        var found = answer.At("/findings").EnumerateArray().Where(finding => finding.Text("/code") == "mold-outside-tolerance").ToList();
        Assert.Equal(place is null ? [] : [place], found.Select(finding => finding.Text("/pointer")));
        Assert.All(found, finding => Assert.Equal("AASHTO T 99, method A", finding.Text("/basis")));
    }

    [Theory]
    [InlineData("/mold", """{"mass":4250,"diameters":[101.6],"height":116.4,"heights":[117]}""", "/mold/heights contradiction")]
    [InlineData("/mold", """{"mass":4250,"diameter":101.6,"diameters":[102,102],"height":116.4}""", "/mold/diameters contradiction")]
    [InlineData("/mold", """{"mass":4250,"diameters":[101.6]}""", "/mold/height incomplete")]
    [InlineData("/mold", """{"mass":4250,"heights":[116.4]}""", "/mold/diameter incomplete")]
    [InlineData("/mold", """{"mass":4250,"diameters":[],"height":116.4}""", "/mold/diameters empty-list")]
    [InlineData("/mold", """{"mass":4250,"diameters":[101.6,0],"height":116.4}""", "/mold/diameters/1 not-positive")]
    [InlineData("/mold", """{"mass":4250,"diameter":101.6,"heights":[116.4,-1]}""", "/mold/heights/1 not-positive")]
    [InlineData("/mold", """{"mass":4250,"diameter":101.6,"heights":[1e10]}""", "/mold/heights/0 out-of-range")]
    [InlineData("/mold", """{"mass":4250,"diameters":[1,1,1,1,1,1,1,1,1,1,1,1,1,1,1,1,1,1,1,1,1],"height":116.4}""", "/mold/diameters too-many")]
    [InlineData("/specimens/0/depthBelowRim", "-0.1", "/specimens/0/depthBelowRim negative")]
    [InlineData("/specimens/0/depthsBelowRim", "[1,-1]", "/specimens/0/depthsBelowRim/1 negative")]
    [InlineData("/specimens/0/depthsBelowRim", "[]", "/specimens/0/depthsBelowRim empty-list")]
    [InlineData("/specimens/0/depthBelowRim", "3", "/specimens/0/depthBelowRim not-enough-data")]
    public async Task What_no_mold_has_is_refused_at_its_place(string place, string json, string fault)
    {
        var refusal = await service.RefusalAsync(Body.With(place, json));
        Assert.Equal(422, refusal.Status);
        Assert.Equal([fault], refusal.Faults);
    }

    [Theory]
    [InlineData("3", "[3.1,3.3,3.2]", null)]
    [InlineData("3", "[3.3,3.3]", "/specimens/1/depthsBelowRim contradiction")]
    [InlineData("116.4", "[116.4]", "/specimens/1/depthBelowRim contradiction")]
    public async Task A_depth_given_twice_agrees_to_a_share_of_the_molds_height_and_leaves_some_soil(string depth, string readings, string? fault)
    {
        using var response = await service.PostAsync(Body.With(("/mold", Single), ("/specimens/1/depthBelowRim", depth), ("/specimens/1/depthsBelowRim", readings)));
        Assert.Equal(fault is null ? [] : [fault], fault is null ? (response.IsSuccessStatusCode ? [] : ["refused"]) : (await Refusal.Of(response)).Faults);
    }

    [Fact]
    public async Task Oversize_of_a_method_without_a_procedure_for_it_is_corrected_with_a_note()
    {
        var answer = await service.AnswerAsync(Body.With(("/method", "\"nbr-7182\""), ("/mold/volume", "1000"), ("/oversize", """{"percent":12,"specificGravity":2.65}""")));
        Assert.Equal("note", answer.Finding("oversize-outside-method").Text("/severity"));
        Assert.False(answer.IsNull("/corrected"));
    }
}
