using System.Globalization;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

public sealed class UnitsTests(RunningService service)
{
    private const double Pound = 453.59237;
    private const double CubicFoot = 28316.846592;

    /// <summary>One in each unit, in g, cm³ and Mg/m³. The pound, the foot and standard gravity are exact by definition.</summary>
    private static readonly Dictionary<string, double> InTheUsual = new()
    {
        ["g"] = 1,
        ["kg"] = 1000,
        ["lb"] = Pound,
        ["cm3"] = 1,
        ["L"] = 1000,
        ["m3"] = 1e6,
        ["in3"] = 16.387064,
        ["ft3"] = CubicFoot,
        ["yd3"] = 27 * CubicFoot,
        ["Mg/m3"] = 1,
        ["g/cm3"] = 1,
        ["kg/m3"] = 1e-3,
        ["lb/ft3"] = Pound / CubicFoot,
        ["kN/m3"] = 1 / 9.80665,
    };

    [Theory]
    [InlineData("lb", "g", "ft3", "lb/ft3")]
    [InlineData("kg", "g", "L", "kg/m3")]
    [InlineData("g", "lb", "in3", "g/cm3")]
    [InlineData("kg", "kg", "m3", "kN/m3")]
    [InlineData("lb", "kg", "yd3", "Mg/m3")]
    public async Task The_same_test_in_other_units_is_the_same_test(string mass, string tinMass, string volume, string density)
    {
        var usual = await service.AnswerAsync(Body.Sound);
        var other = await service.AnswerAsync(InUnits(mass, tinMass, volume, density));
        var factor = InTheUsual[density];
        for (var i = 0; i < 5; i++)
        {
            AssertSame(usual.Number($"/specimens/{i}/waterContent"), other.Number($"/specimens/{i}/waterContent"));
            AssertSame(usual.Number($"/specimens/{i}/dryDensity"), other.Number($"/specimens/{i}/dryDensity") * factor);
            AssertSame(usual.Number($"/specimens/{i}/wetDensity"), other.Number($"/specimens/{i}/wetDensity") * factor);
            AssertSame(usual.Number($"/specimens/{i}/saturation"), other.Number($"/specimens/{i}/saturation"), 1e-11);
        }

        AssertSame(usual.Number("/optimum/waterContent"), other.Number("/optimum/waterContent"));
        AssertSame(usual.Number("/optimum/maximumDryDensity"), other.Number("/optimum/maximumDryDensity") * factor);
        AssertSame(usual.Number("/optimum/uncertainty/maximumDryDensity/standard"), other.Number("/optimum/uncertainty/maximumDryDensity/standard") * factor, 1e-9);
        Assert.Equal(usual.Findings(), other.Findings());
    }

    [Fact]
    public async Task The_answer_repeats_all_units_defaults_among_them()
    {
        var none = (await service.AnswerAsync(Body.With("/units", Body.Absent))).At("/units");
        Assert.Equal("""{"mass":"g","tinMass":"g","volume":"cm3","density":"Mg/m3","length":"mm"}""", none.GetRawText());
    }

    [Fact]
    public async Task Tins_are_weighed_in_the_unit_of_the_molds_where_they_have_none_of_their_own()
    {
        var units = (await service.AnswerAsync(Body.With(("/units", """{"mass":"kg"}"""), ("/specimens", """[{"wetMass":1.8,"waterContent":10}]""")))).At("/units");
        Assert.Equal("kg", units.Text("/tinMass"));
    }

    [Theory]
    [InlineData("mm", 101.6, 116.4)]
    [InlineData("cm", 10.16, 11.64)]
    [InlineData("m", 0.1016, 0.1164)]
    [InlineData("in", 4, 116.4 / 25.4)]
    [InlineData("ft", 4.0 / 12, 116.4 / 304.8)]
    public async Task A_mold_is_measured_in_the_unit_of_length(string unit, double diameter, double height)
    {
        var answer = await service.AnswerAsync(Body.With(
            ("/units/length", $"\"{unit}\""),
            ("/mold", string.Create(CultureInfo.InvariantCulture, $$"""{"mass":4250,"diameter":{{diameter:R}},"height":{{height:R}}}"""))));
        AssertSame((6064.2 - 4250) / (Math.PI * 10.16 * 10.16 / 4 * 11.64), answer.Number("/specimens/0/wetDensity"));
    }

    /// <summary>γ = ρ·9.80665.</summary>
    [Fact]
    public async Task A_unit_weight_is_a_density_times_standard_gravity()
    {
        var answer = await service.AnswerAsync(Body.With("/units/density", "\"kN/m3\""));
        AssertSame(1814.2 / 943 * 9.80665, answer.Number("/specimens/0/wetDensity"));
        Assert.EndsWith(" kN/m³", answer.Text("/optimum/reported/maximumDryDensity"), StringComparison.Ordinal);
    }

    private static void AssertSame(double expected, double actual, double relative = 1e-12) => Assert.Equal(expected, actual, Math.Abs(expected) * relative);

    private static string InUnits(string mass, string tinMass, string volume, string density)
    {
        static string In(double value, string unit) => (value / InTheUsual[unit]).ToString("R", CultureInfo.InvariantCulture);
        double[] full = [6064.2, 6173.3, 6250.6, 6251.8, 6219.5];
        var edits = new List<(string, string)>
        {
            ("/units", $$"""{"mass":"{{mass}}","tinMass":"{{tinMass}}","volume":"{{volume}}","density":"{{density}}"}"""),
            ("/mold/mass", In(4250, mass)),
            ("/mold/volume", In(943, volume)),
        };
        for (var i = 0; i < full.Length; i++)
        {
            edits.Add(($"/specimens/{i}/moldAndWetSoil", In(full[i], mass)));
            edits.Add(($"/specimens/{i}/tins/0", $$"""{"tin":{{In(30 + i, tinMass)}},"wet":{{In(140 + (3 * i), tinMass)}},"dry":{{In(130 + i, tinMass)}}}"""));
        }

        return Body.With([.. edits]);
    }

    /// <summary>The parabola's coefficients in the caller's unit give the fitted densities in that unit.</summary>
    [Theory]
    [InlineData("kg/m3", "kg/m³")]
    [InlineData("lb/ft3", "lb/ft³")]
    [InlineData("kN/m3", "kN/m³")]
    public async Task Parameters_of_the_curve_are_in_the_unit_of_density_per_percent(string unit, string symbol)
    {
        var answer = await service.AnswerAsync(Body.With(("/units/density", $"\"{unit}\""), ("/curve", """{"model":"parabola"}""")));
        var parameters = answer.At("/curve/parameters");
        Assert.Equal([symbol, symbol + " per %", symbol + " per %²"], new[] { "constant", "linear", "quadratic" }.Select(name => parameters.GetProperty(name).Text("/unit")));
        double Value(string name) => parameters.GetProperty(name).Number("/value");
        Assert.All(answer.At("/curve/residuals").EnumerateArray().Zip(answer.Numbers("/specimens", "waterContent")), pair =>
            Assert.Equal(pair.First.Number("/fitted"), Value("constant") + (pair.Second * (Value("linear") + (pair.Second * Value("quadratic")))), 1e-9 * pair.First.Number("/fitted")));
        Assert.All(parameters.EnumerateObject(), parameter => Assert.True(parameter.Value.Number("/standardError") > 0));
    }
}
