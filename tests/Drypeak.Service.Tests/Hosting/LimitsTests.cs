using System.ComponentModel.DataAnnotations;
using Drypeak.Service.Hosting;
using Microsoft.Extensions.Configuration;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

public sealed class LimitsTests
{
    [Fact]
    public void Without_configuration_the_documented_defaults_hold()
    {
        var limits = Of();
        Assert.Equal(new Limits(), limits);
        Assert.Equal((1 << 20, 8 << 20, 64 << 10), (limits.BodyBytes, limits.LotBodyBytes, limits.BatchLineBytes));
        Assert.Equal((500, 20, 20_000), (limits.Specimens, limits.TinsPerSpecimen, limits.LotTests));
    }

    [Fact]
    public void A_configured_limit_takes_the_place_of_its_default() =>
        Assert.Equal(new Limits { Specimens = 7 }, Of(("Limits:Specimens", "7")));

    [Theory]
    [InlineData("Limits:Specimens", "0")]
    [InlineData("Limits:BodyBytes", "-1")]
    [InlineData("Limits:AddressBytes", "9000")]
    public void A_limit_out_of_range_ends_the_start(string name, string value) =>
        Assert.Contains(name.Split(':')[1], Assert.Throws<ValidationException>(() => Of((name, value))).Message, StringComparison.Ordinal);

    [Theory]
    [InlineData("Limits:Specimens", "many")]
    [InlineData("Limits:Speciments", "7")]
    public void A_limit_that_is_no_number_or_has_no_such_name_ends_the_start(string name, string value) =>
        Assert.Throws<InvalidOperationException>(() => Of((name, value)));

    private static Limits Of(params (string Name, string Value)[] entries) => Limits.From(
        new ConfigurationBuilder().AddInMemoryCollection(entries.ToDictionary(entry => entry.Name, entry => (string?)entry.Value)).Build());
}
