using Drypeak.Service.Hosting;
using Microsoft.AspNetCore.Http;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

public sealed class NegotiationTests
{
    private const string Json = "application/json";
    private const string Svg = "image/svg+xml";
    private const string Png = "image/png";

    /// <summary>Rows after RFC 9110, section 12.5.1: quality, precedence of the more specific range, no Accept.</summary>
    [Theory]
    [InlineData(null, Json)]
    [InlineData("*/*", Json)]
    [InlineData("image/*", Svg)]
    [InlineData("image/png", Png)]
    [InlineData("IMAGE/PNG", Png)]
    [InlineData("image/png, image/svg+xml", Svg)]
    [InlineData("image/png, image/svg+xml;q=0.9", Png)]
    [InlineData("image/*;q=0.5, image/png;q=0.9, application/json;q=0.4", Png)]
    [InlineData("image/*, image/svg+xml;q=0.1", Png)]
    [InlineData("*/*;q=0.1, image/svg+xml;q=0", Json)]
    [InlineData("application/json;q=0, */*;q=0.1", Svg)]
    [InlineData("application/json;q=0.001", Json)]
    [InlineData("text/html", null)]
    [InlineData("application/json;q=0", null)]
    [InlineData("application/json;version=2", null)]
    [InlineData("nonsense", Json)]
    public void The_preferred_type_is_given_or_none(string? accept, string? expected)
    {
        var request = new DefaultHttpContext().Request;
        request.Headers.Accept = accept;
        Assert.Equal(expected, Negotiation.Choose(request, Json, Svg, Png));
    }

    [Fact]
    public void A_refusal_lists_what_there_is_and_says_that_it_depends_on_Accept()
    {
        var problem = Problems.NotAcceptable([Json, Svg]);
        Assert.Equal(406, problem.Status);
        Assert.Equal("Ask for one of these in Accept: application/json, image/svg+xml.", problem.Detail);
        Assert.Equal("Accept", problem.Headers["Vary"]);
    }
}
