using System.Diagnostics;
using System.Globalization;
using System.Net.Http.Headers;
using System.Text;

namespace Drypeak.Benchmarks;

/// <summary>How long lots take over HTTP: a thousand tests and ten thousand, with rules, control chart, window and places. The goal is half a second for the larger.</summary>
internal static class LotTimes
{
    private const int Rounds = 9;

    /// <summary>Posts the lots to a running service, and prints the median and the shortest time of each.</summary>
    public static async Task RunAsync(string url)
    {
        using var client = new HttpClient { BaseAddress = new Uri(url) };
        foreach (var count in new[] { 1_000, 1_000, 10_000, 10_000 })
        {
            var body = LotOf(count);
            var times = new double[Rounds];
            for (var round = 0; round < Rounds; round++)
            {
                using var content = new StringContent(body, Encoding.UTF8, new MediaTypeHeaderValue("application/json"));
                var watch = Stopwatch.StartNew();
                using var answer = await client.PostAsync("/v1/lot-acceptance", content);
                await answer.Content.ReadAsByteArrayAsync();
                times[round] = watch.Elapsed.TotalMilliseconds;
                answer.EnsureSuccessStatusCode();
            }

            Array.Sort(times);
            Console.WriteLine(string.Create(CultureInfo.InvariantCulture,
                $"{count} tests, {body.Length / 1024} KiB: median {times[Rounds / 2]:F0} ms, shortest {times[0]:F0} ms, {1000 * times[0] / count:F1} µs a test at best"));
        }
    }

    private static string LotOf(int count)
    {
        var random = new Random(12);
        var tests = Enumerable.Range(0, count).Select(i => string.Create(CultureInfo.InvariantCulture,
            $$"""{"label":"{{i}}","relativeCompaction":{{94 + (6 * random.NextDouble()):F2}},"waterContent":{{11.5 + (2 * random.NextDouble()):F2}},"station":{{2 * i}},"offset":{{8 * random.NextDouble():F1}},"lift":{{i / 500}}}"""));
        return $$"""
            {"units":{"length":"m"},"laboratory":{"maximumDryDensity":1.93,"optimumWaterContent":12.1},"specificGravity":{"value":2.68},
             "specification":{"requirements":[{"quantity":"relativeCompaction","minimum":93}]},
             "lotRules":[{"rule":"mean","quantity":"relativeCompaction","minimum":96},{"rule":"moving-mean","quantity":"relativeCompaction","count":5,"minimum":90,"floor":85},
              {"rule":"percent-within-limits","quantity":"relativeCompaction","minimum":94,"required":85},{"rule":"characteristic-value","quantity":"relativeCompaction","minimum":94,"risk":0.1,"fraction":0.9}],
             "controlChart":{"quantity":"relativeCompaction","kind":"individuals"},"window":{"minimumRelativeCompaction":95,"maximumAirVoids":10},"tests":[{{string.Join(',', tests)}}]}
            """;
    }
}
