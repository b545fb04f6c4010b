using CsCheck;
using Drypeak.Figures.Layout;
using Xunit;

namespace Drypeak.Figures.Tests;

public sealed class TicksTests
{
    [Theory]
    [InlineData(9.3, 17.8, 10, "10 11 12 13 14 15 16 17")]
    [InlineData(1.70, 1.84, 8, "1.70 1.72 1.74 1.76 1.78 1.80 1.82 1.84")]
    [InlineData(0, 1, 4, "0.00 0.25 0.50 0.75 1.00")]
    [InlineData(-3, 3, 3, "−2 0 2")]
    [InlineData(29900, 31200, 5, "30000 30500 31000")]
    public void Ticks_are_round_numbers_written_with_the_decimals_of_their_step(double from, double to, double most, string expected)
    {
        var ticks = Ticks.Within(new Interval(from, to), most);
        Assert.Equal(expected, string.Join(' ', ticks.Values.Select(ticks.Label)));
    }

    [Fact]
    public void Ticks_lie_within_the_range_are_no_more_than_asked_and_never_look_alike()
    {
        Gen.Select(Gen.Double[-1e6, 1e6], Gen.Double[1e-3, 1e6], Gen.Double[1, 20]).Sample((from, span, most) =>
        {
            var range = new Interval(from, from + span);
            var ticks = Ticks.Within(range, most);
            var values = ticks.Values.ToList();
            Assert.InRange(values.Count, 0, (int)most + 1);
            Assert.True(span / ticks.Step > most / 2.5 / 1.0001, "A finer step would have done.");
            Assert.All(values, value => Assert.InRange(value, from - (span * 1e-8), from + (span * (1 + 1e-8))));
            Assert.Equal(values.Count, values.Select(ticks.Label).Distinct().Count());
        });
    }
}
