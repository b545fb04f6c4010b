using System.Globalization;
using System.Text;
using Drypeak.Service.Tests.Laboratory;
using Xunit;

namespace Drypeak.Service.Tests.Earthwork;

public sealed class TestLocationsTests(RunningService service, SecondInstance second)
{
    /// <summary>200 m × 12 m × 0.25 m are 600 m³ a lift: four tests at one in 150 m³.</summary>
    [Theory]
    [InlineData("""{"volume":150}""", 4)]
    [InlineData("""{"volume":200.0000000001}""", 3)]
    [InlineData("""{"volume":199.99}""", 4)]
    [InlineData("""{"volume":1000}""", 1)]
    [InlineData("""{"area":800}""", 3)]
    [InlineData("""{"area":799}""", 4)]
    [InlineData("""{"perShift":3}""", 2)]
    [InlineData("""{"lifts":1}""", 1)]
    public async Task Counts_of_a_lift_are_rounded_up(string frequency, int perLift)
    {
        var answer = await service.AnswerAsync(EarthworkJobs.TestLocations, EarthworkJobs.With(EarthworkJobs.TestLocations, ("/frequency", frequency), ("/liftsPerShift", "2")));
        Assert.Equal((perLift, perLift * 3), (answer.Number("/perLift"), answer.Number("/count")));
        Assert.Equal(perLift * 3, answer.GetProperty("locations").GetArrayLength());
        Assert.Contains("ASTM D3665", answer.Text("/basis"), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("""{"lifts":2}""", "null", new[] { 2, 4, 5 }, 1)]
    [InlineData("""{"lifts":2}""", "3", new[] { 2, 4, 5 }, 3)]
    [InlineData("""{"lifts":3,"volume":150}""", "null", new[] { 3, 5 }, 4)]
    public async Task Every_so_manyth_lift_is_tested(string frequency, string perLift, int[] lifts, int tests)
    {
        var answer = await service.AnswerAsync(EarthworkJobs.TestLocations, EarthworkJobs.With(EarthworkJobs.TestLocations, ("/lifts", "5"), ("/frequency", frequency), ("/perLift", perLift)));
        Assert.Equal(lifts.SelectMany(lift => Enumerable.Repeat((double)lift, tests)), answer.Numbers("/locations", "lift"));
        Assert.Equal(lifts.Length, answer.Number("/liftsTested"));
    }

    [Fact]
    public async Task Each_stratum_of_a_rectangle_holds_one_location()
    {
        var answer = await service.AnswerAsync(EarthworkJobs.TestLocations, EarthworkJobs.Sound(EarthworkJobs.TestLocations));
        Assert.Equal([1050.0, 1100, 1150], answer.GetProperty("stratumStations").EnumerateArray().Select(station => Math.Round(station.GetDouble(), 9)));
        foreach (var (i, location) in answer.GetProperty("locations").EnumerateArray().Index())
        {
            Assert.Equal(i % 4, (int)Math.Floor((location.Number("/station") - 1000) / 50));
            Assert.InRange(location.Number("/offset"), 0, 12);
            Assert.Equal($"L{(i / 4) + 1}-{(i % 4) + 1}", location.Text("/label"));
        }
    }

    [Fact]
    public async Task A_seed_gives_the_same_bytes_in_another_process_and_another_seed_other_locations()
    {
        var body = EarthworkJobs.Sound(EarthworkJobs.TestLocations);
        using var one = await service.PostAsync(body, address: EarthworkJobs.TestLocations);
        using var other = await second.PostAsync(body, address: EarthworkJobs.TestLocations);
        Assert.Equal(await RunningService.TextOf(one), await RunningService.TextOf(other));
        var (seven, eight) = (await service.AnswerAsync(EarthworkJobs.TestLocations, body), await service.AnswerAsync(EarthworkJobs.TestLocations, EarthworkJobs.With(EarthworkJobs.TestLocations, ("/seed", "8"))));
        Assert.NotEqual(seven.At("/locations").GetRawText(), eight.At("/locations").GetRawText());
    }

    [Fact]
    public async Task No_location_lies_in_a_zone_without_tests()
    {
        var answer = await service.AnswerAsync(EarthworkJobs.TestLocations, EarthworkJobs.With(EarthworkJobs.TestLocations,
            ("/area/exclusions", """[{"label":"culvert","outline":[[1090,-5],[1110,-5],[1110,20],[1090,20]]}]"""), ("/frequency", Body.Absent), ("/perLift", "300")));
        Assert.Equal(2160, answer.Number("/openArea"), 1e-9);
        Assert.DoesNotContain(answer.Numbers("/locations", "station"), station => station is > 1090 and < 1110);
        Assert.Equal(900, answer.Number("/count"));
    }

    [Fact]
    public async Task As_many_locations_as_the_limit_are_given_at_once_and_no_more()
    {
        var most = await service.AnswerAsync(EarthworkJobs.TestLocations, EarthworkJobs.With(EarthworkJobs.TestLocations, ("/frequency", Body.Absent), ("/perLift", "2500"), ("/lifts", "4")));
        Assert.Equal(10_000, most.GetProperty("locations").GetArrayLength());
        Assert.Contains("no-chart-address", most.Findings());
        Assert.True(most.IsNull("/links/svg"));
        var refusal = await service.RefusalAsync(EarthworkJobs.TestLocations, EarthworkJobs.With(EarthworkJobs.TestLocations, ("/frequency", Body.Absent), ("/perLift", "2501"), ("/lifts", "4")));
        Assert.Equal((422, "/perLift too-many"), (refusal.Status, Assert.Single(refusal.Faults)));
    }

    [Fact]
    public async Task The_locations_are_a_table_for_who_asks_for_one()
    {
        var body = EarthworkJobs.Sound(EarthworkJobs.TestLocations);
        using var response = await service.PostAsync(body, "text/csv", EarthworkJobs.TestLocations);
        Assert.Equal("text/csv; charset=utf-8; header=present", response.Content.Headers.ContentType?.ToString());
        var lines = (await RunningService.TextOf(response)).Split("\r\n");
        Assert.Equal("label,lift,station [m],offset [m]", lines[0]);
        Assert.Equal("", lines[^1]);
        var answer = await service.AnswerAsync(EarthworkJobs.TestLocations, body);
        var expected = answer.GetProperty("locations").EnumerateArray().Select(location => string.Create(CultureInfo.InvariantCulture,
            $"{location.Text("/label")},{location.Number("/lift")},{location.Number("/station"):R},{location.Number("/offset"):R}"));
        Assert.Equal(expected, lines[1..^1]);
    }

    [Theory]
    [InlineData(EarthworkJobs.TestLocations, 12)]
    [InlineData(EarthworkJobs.TestStrip, 12)]
    public async Task The_picture_is_the_links_and_shows_every_mark(string address, int marks)
    {
        var body = EarthworkJobs.Sound(address);
        var answer = await service.AnswerAsync(address, body);
        var linked = await service.BytesAsync(answer.Text("/links/svg")!);
        using var posted = await service.PostAsync(body, "image/svg+xml", address);
        var picture = await posted.Content.ReadAsByteArrayAsync(TestContext.Current.CancellationToken);
        Assert.Equal(linked, picture);
        Assert.Equal(marks, Encoding.UTF8.GetString(picture).Split("data-x=").Length - 1);
        foreach (var (link, start) in new[] { ("/links/png", "\u0089PNG"), ("/links/pdf", "%PDF") })
        {
            Assert.StartsWith(start, Encoding.Latin1.GetString(await service.BytesAsync(answer.Text(link)!)), StringComparison.Ordinal);
        }
    }

    [Fact]
    public async Task A_plan_of_sixty_locations_still_fits_into_an_address()
    {
        var answer = await service.AnswerAsync(EarthworkJobs.TestLocations, EarthworkJobs.With(EarthworkJobs.TestLocations, ("/frequency", Body.Absent), ("/perLift", "20")));
        Assert.False(answer.IsNull("/links/svg"));
    }

    [Fact]
    public async Task A_strip_without_a_curve_is_drawn_as_far_as_it_goes()
    {
        using var picture = await service.PostAsync("""{"leastGain":0.01,"readings":[{"passes":2,"dryDensity":[1.7,1.72]}]}""", "image/svg+xml", EarthworkJobs.TestStrip);
        Assert.True(picture.IsSuccessStatusCode);
        Assert.Contains("no growth curve", await RunningService.TextOf(picture), StringComparison.Ordinal);
    }
}
