using System.Xml.Linq;
using Xunit;

namespace Drypeak.Service.Tests.Laboratory;

public sealed class TraceTests(RunningService service)
{
    /// <summary>Bodies that go every way through the arithmetic, in units that all need conversion.</summary>
    public static TheoryData<string> Ways =>
    [
        Body.With("/trace", "true"),
        Body.With(("/trace", "true"), ("/oversize", """{"percent":9.4,"specificGravity":2.7,"waterContent":1}""")),
        Body.With(("/trace", "true"), ("/oversize", """{"percent":9.4,"specificGravity":2.7}"""), ("/curve", """{"adopted":{"waterContent":14,"maximumDryDensity":1.85,"reason":"by hand"}}""")),
        Body.With(("/trace", "true"), ("/method", "\"custom\""), ("/effort", """{"rammerMass":2495,"drop":305,"layers":3,"blows":25}""")),
        Body.With(("/trace", "true"), ("/mold", """{"mass":4250,"diameter":101.6,"height":116.4}""")),
        Body.With(
            ("/trace", "true"), ("/units/length", "\"in\""), ("/mold", """{"mass":4250,"diameters":[3.999,4.001,4.002],"heights":[4.58,4.59]}"""),
            ("/specimens/1/depthBelowRim", "0.12"), ("/specimens/2/depthsBelowRim", "[0.11,0.13,0.1]")),
        Body.With(("/trace", "true"), ("/mold", """{"empty":4550,"withWater":5491.6,"plate":300,"waterTemperature":24}""")),
        Body.With(("/trace", "true"), ("/waterDensity", "0.9975")),
        Body.With(
            ("/trace", "true"),
            ("/units", """{"mass":"lb","tinMass":"g","volume":"ft3","density":"lb/ft3","length":"in"}"""),
            ("/mold", """{"mass":9.37,"volume":0.0333}"""),
            ("/specimens", """
                [
                  {"moldAndWetSoil":13.37,"tins":[{"tin":30,"wet":140,"dry":130},{"tin":31,"wet":141.2,"dry":131}]},
                  {"wetMass":4.24,"wetBasis":10.7},
                  {"wetMass":4.41,"carbide":{"reading":6.1,"halfSample":true}},
                  {"wetDensity":132.5,"dryDensity":114.2},
                  {"dryDensity":110.5,"waterContent":18},
                  {"moldAndWetSoil":9.1,"mold":{"mass":4.9,"diameter":4,"height":4.58},"waterContent":17}
                ]
                """)),
    ];

    [Theory]
    [MemberData(nameof(Ways))]
    public async Task Every_step_of_the_working_gives_its_value_when_worked_out_by_hand(string body)
    {
        var answer = await service.AnswerAsync(body);
        var trace = answer.At("/trace").EnumerateArray().ToList();
        Assert.NotEmpty(trace);
        Assert.All(trace, step =>
        {
            var value = step.Number("/value");
            if (step.Text("/substitution") is { } substitution)
            {
                Assert.Matches(@"^[0-9.+\-*/^() ]+$", substitution);
                Assert.Equal(value, Arithmetic.Value(substitution), Math.Abs(value) * 1e-9);
            }
            else
            {
                Assert.Matches("maximum of the .* curve", step.Text("/formula"));
            }

            Assert.NotEqual("", step.Text("/quantity"));
            Assert.NotEqual("", step.Text("/source"));
            Assert.Equal("http://www.w3.org/1998/Math/MathML", XElement.Parse(step.Text("/mathml")!).Name.NamespaceName);
        });
    }

    [Theory]
    [InlineData(Body.Absent)]
    [InlineData("false")]
    [InlineData("null")]
    public async Task The_working_comes_only_where_it_is_asked_for(string trace) =>
        Assert.False((await service.AnswerAsync(Body.With("/trace", trace))).Has("trace"));

    [Fact]
    public async Task The_working_ends_in_the_numbers_of_the_answer()
    {
        var answer = await service.AnswerAsync(Body.With(("/trace", "true"), ("/oversize", """{"percent":9.4,"specificGravity":2.7}""")));
        var values = answer.At("/trace").EnumerateArray().ToDictionary(step => step.Text("/quantity")!, step => step.Number("/value"));
        Assert.Equal(answer.Number("/optimum/waterContent"), values["optimum water content"]);
        Assert.Equal(answer.Number("/optimum/maximumDryDensity"), values["maximum dry density"]);
        Assert.Equal(answer.Number("/optimum/saturation"), values["saturation at the optimum"]);
        Assert.Equal(answer.Number("/corrected/maximumDryDensity"), values["maximum dry density of the total material"]);
        Assert.Equal(answer.Number("/corrected/waterContent"), values["optimum water content of the total material"]);
        Assert.Equal(answer.Number("/method/effort/computed"), values["compactive effort"]);
        Assert.All(answer.At("/specimens").EnumerateArray(), specimen =>
        {
            var of = $" of specimen {specimen.Text("/label")}";
            Assert.Equal(specimen.Number("/waterContent"), values["water content" + of]);
            Assert.Equal(specimen.Number("/wetDensity"), values["wet density" + of]);
            Assert.Equal(specimen.Number("/dryDensity"), values["dry density" + of]);
            Assert.Equal(specimen.Number("/voidRatio"), values["void ratio" + of]);
            Assert.Equal(specimen.Number("/porosity"), values["porosity" + of]);
            Assert.Equal(specimen.Number("/saturation"), values["saturation" + of]);
            Assert.Equal(specimen.Number("/airVoids"), values["air voids" + of]);
        });
    }
}
