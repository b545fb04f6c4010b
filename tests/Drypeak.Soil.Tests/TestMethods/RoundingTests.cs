using System.Globalization;
using CsCheck;
using Drypeak.Soil.TestMethods;
using Xunit;

namespace Drypeak.Soil.Tests.TestMethods;

public class RoundingTests
{
    /// <summary>
    /// The rounding method of ASTM E29 (the standard itself from memory), in printed examples of documents that apply it. 45.x: a field
    /// sampling and testing manual, "Rounding procedures for determining significant digits", which cites E29; 1.861: Iowa DOT,
    /// Materials I.M. 202; 21.x, 56.748, 2.146: a college's rules for rounding off, which are the same rules.
    /// </summary>
    [Theory]
    [InlineData(45.74, 0.1, "45.7")]
    [InlineData(45.76, 0.1, "45.8")]
    [InlineData(45.7500, 0.1, "45.8")]
    [InlineData(45.4500, 0.1, "45.4")]
    [InlineData(45.45001, 0.1, "45.5")]
    [InlineData(45.45099, 0.1, "45.5")]
    [InlineData(1.861, 0.01, "1.86")]
    [InlineData(56.748, 0.1, "56.7")]
    [InlineData(2.146, 0.01, "2.15")]
    [InlineData(21.4501, 0.1, "21.5")]
    [InlineData(21.350, 0.1, "21.4")]
    [InlineData(21.45, 0.1, "21.4")]
    public void Halves_go_to_the_even_digit_as_in_printed_examples(double value, double step, string expected) =>
        Assert.Equal(expected, Rounding.ToStep((decimal)step).Apply(value));

    [Theory]
    [InlineData(2.675, "0.01", "2.68")] // the double lies below 2.675
    [InlineData(1.005, "0.01", "1.00")] // the double lies below 1.005
    [InlineData(1.015, "0.01", "1.02")] // the double lies below 1.015
    [InlineData(1.825, "0.01", "1.82")] // the double is above 1.825 by less than 1e-16
    [InlineData(1.835, "0.01", "1.84")]
    [InlineData(0.125, "0.01", "0.12")] // an exact half
    [InlineData(0.375, "0.01", "0.38")] // an exact half
    [InlineData(0.05, "0.1", "0.0")]
    [InlineData(0.15, "0.1", "0.2")]
    [InlineData(0.25, "0.1", "0.2")]
    [InlineData(114.25, "0.1", "114.2")]
    [InlineData(114.35, "0.1", "114.4")]
    [InlineData(1825, "10", "1820")]
    [InlineData(1835, "10", "1840")]
    [InlineData(1835.1, "10", "1840")]
    [InlineData(4, "10", "0")]
    [InlineData(13, "0.5", "13.0")]
    [InlineData(13.25, "0.5", "13.0")]
    [InlineData(13.75, "0.5", "14.0")]
    [InlineData(1.83, "0.010", "1.830")] // the step's own decimals
    public void A_half_is_the_decimal_half_and_not_what_binary_makes_of_it(double value, string step, string expected) =>
        Assert.Equal(expected, Rounding.ToStep(Decimal(step)).Apply(value));

    /// <summary>Contract: within 1e-9 of itself a value counts as the half; 1.825 is a half that goes down, 1.835 one that goes up.</summary>
    [Theory]
    [InlineData(1.825 * (1 + 0.9e-9), "1.82")]
    [InlineData(1.825 * (1 + 1.1e-9), "1.83")]
    [InlineData(1.825 * (1 - 1.1e-9), "1.82")]
    [InlineData(1.835 * (1 - 0.9e-9), "1.84")]
    [InlineData(1.835 * (1 - 1.1e-9), "1.83")]
    [InlineData(1.835 * (1 + 1.1e-9), "1.84")]
    public void A_value_within_a_billionth_of_a_half_counts_as_the_half(double value, string expected) =>
        Assert.Equal(expected, Rounding.ToStep(0.01m).Apply(value));

    [Theory]
    [InlineData(-0.0, "0.0")]
    [InlineData(-0.04, "0.0")]
    [InlineData(-0.05, "0.0")]
    [InlineData(-0.06, "-0.1")]
    [InlineData(-1.25, "-1.2")]
    [InlineData(-1e-300, "0.0")]
    public void Zero_has_no_sign(double value, string expected) => Assert.Equal(expected, Rounding.ToStep(0.1m).Apply(value));

    [Theory]
    [InlineData(1e22, "10000000000000000000000.0")]
    [InlineData(9007199254740993.0, "9007199254740992.0")] // the nearest double of 2^53 + 1
    [InlineData(123456789.05, "123456789.0")]
    [InlineData(987654321.2, "987654321.2")]
    [InlineData(987654321.12, "987654321.1")] // a billionth of it is many steps: it must not be drawn to a half
    [InlineData(double.Epsilon, "0.0")]
    public void Large_and_tiny_values_are_exact(double value, string expected) => Assert.Equal(expected, Rounding.ToStep(0.1m).Apply(value));

    [Fact]
    public void The_largest_double_is_written_in_full()
    {
        var text = Rounding.ToStep(1m).Apply(double.MaxValue);
        Assert.Equal(309, text.Length);
        Assert.Equal(double.MaxValue, double.Parse(text, CultureInfo.InvariantCulture));
    }

    [Theory]
    [InlineData(13.9, 2, "14")]
    [InlineData(9.64, 2, "9.6")]
    [InlineData(9.65, 2, "9.6")]
    [InlineData(9.75, 2, "9.8")]
    [InlineData(9.96, 2, "10")]
    [InlineData(9.95, 2, "10")]
    [InlineData(10.5, 2, "10")]
    [InlineData(11.5, 2, "12")]
    [InlineData(0.0966, 2, "0.097")]
    [InlineData(0.0996, 2, "0.10")]
    [InlineData(0.9996, 2, "1.0")]
    [InlineData(99.6, 2, "100")]
    [InlineData(12345, 2, "12000")]
    [InlineData(-13.9, 2, "-14")]
    [InlineData(7, 3, "7.00")]
    [InlineData(1000, 3, "1000")]
    [InlineData(999.9999999999999, 3, "1000")]
    [InlineData(0, 2, "0.0")]
    [InlineData(43560, 2, "44000")] // printed with 43600 and 40000 in a school's rules for rounding, read
    [InlineData(43560, 3, "43600")]
    [InlineData(43560, 1, "40000")]
    [InlineData(1e23, 17, "99999999999999992000000")] // the double below the power of ten
    public void Significant_figures_are_counted_after_rounding(double value, int figures, string expected) =>
        Assert.Equal(expected, Rounding.ToSignificantFigures(figures).Apply(value));

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(double.NegativeInfinity)]
    public void What_is_no_finite_number_is_not_reported(double value)
    {
        Assert.Throws<ArgumentOutOfRangeException>(nameof(value), () => Rounding.ToStep(0.1m).Apply(value));
        Assert.Throws<ArgumentOutOfRangeException>(nameof(value), () => Rounding.ToSignificantFigures(2).Apply(value));
    }

    [Fact]
    public void A_rounding_has_a_positive_step_or_one_to_seventeen_figures()
    {
        Assert.Throws<ArgumentOutOfRangeException>("step", () => Rounding.ToStep(0m));
        Assert.Throws<ArgumentOutOfRangeException>("step", () => Rounding.ToStep(-0.1m));
        Assert.Throws<ArgumentOutOfRangeException>("figures", () => Rounding.ToSignificantFigures(0));
        Assert.Throws<ArgumentOutOfRangeException>("figures", () => Rounding.ToSignificantFigures(18));
    }

    private static readonly Gen<decimal> Steps = Gen.OneOf(0.001m, 0.01m, 0.02m, 0.1m, 0.5m, 1m, 10m, 25m);
    private static readonly Gen<double> Values = Gen.OneOf(Gen.Double[-5000, 5000], Gen.Int[-500_000, 500_000].Select(steps => steps / 200.0));

    [Fact]
    public void Rounding_twice_is_rounding_once() =>
        Gen.Select(Values, Roundings()).Sample((value, rounding) =>
        {
            var once = rounding.Apply(value);
            return rounding.Apply(double.Parse(once, CultureInfo.InvariantCulture)) == once;
        });

    /// <summary>Half a step, and the billionth of the value that counts as the half.</summary>
    [Fact]
    public void A_rounded_value_is_within_half_a_step() =>
        Gen.Select(Values, Steps).Sample((value, step) =>
        {
            var rounded = double.Parse(Rounding.ToStep(step).Apply(value), CultureInfo.InvariantCulture);
            return Math.Abs(rounded - value) <= ((double)step / 2) + (1.001e-9 * Math.Abs(value));
        });

    [Fact]
    public void A_rounded_value_is_a_multiple_of_the_step() =>
        Gen.Select(Values, Steps).Sample((value, step) => Decimal(Rounding.ToStep(step).Apply(value)) % step == 0);

    [Fact]
    public void A_value_and_its_opposite_round_to_opposites() =>
        Gen.Select(Values, Roundings()).Sample((value, rounding) =>
            Decimal(rounding.Apply(-value)) == -Decimal(rounding.Apply(value)));

    [Fact]
    public void A_greater_value_never_rounds_to_a_smaller_one() =>
        Gen.Select(Values, Values, Roundings()).Sample((first, second, rounding) =>
            Decimal(rounding.Apply(Math.Min(first, second))) <= Decimal(rounding.Apply(Math.Max(first, second))));

    /// <summary>The framework's own half-even, on numbers of three decimals, which it holds exactly.</summary>
    [Fact]
    public void On_short_decimals_it_agrees_with_decimal_arithmetic() =>
        Gen.Int[-5_000_000, 5_000_000].Sample(thousandths =>
            Decimal(Rounding.ToStep(0.01m).Apply(thousandths / 1000.0)) == Math.Round(thousandths / 1000m, 2, MidpointRounding.ToEven));

    private static Gen<Rounding> Roundings() =>
        Gen.OneOf(Steps.Select(Rounding.ToStep), Gen.Int[1, 6].Select(Rounding.ToSignificantFigures));

    private static decimal Decimal(string text) => decimal.Parse(text, CultureInfo.InvariantCulture);

    [Fact]
    public void A_rounding_says_itself_in_words()
    {
        Assert.Equal("to 0.1 lb/ft³", Rounding.ToStep(0.1m).Describe("lb/ft³"));
        Assert.Equal("to 10 kg/m³", Rounding.ToStep(10m).Describe("kg/m³"));
        Assert.Equal("to 2 significant figures", Rounding.ToSignificantFigures(2).Describe("%"));
    }
}
