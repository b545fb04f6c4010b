using Drypeak.Service.Hosting;
using FluentValidation.Results;
using Xunit;

namespace Drypeak.Service.Tests.Hosting;

public sealed class FluentValidationFaultsTests
{
    [Theory]
    [InlineData("", "")]
    [InlineData("Reference", "/reference")]
    [InlineData("Specimens[0].Tins[1].Dry", "/specimens/0/tins/1/dry")]
    [InlineData("Lines.AirVoids[12]", "/lines/airVoids/12")]
    [InlineData("Points[3][1]", "/points/3/1")]
    [InlineData("Identification[a/b~c. d]", "/identification/a~1b~0c. d")]
    public void A_property_path_becomes_a_pointer_with_the_names_of_the_contract(string path, string place)
    {
        var result = new ValidationResult([new ValidationFailure(path, "Give more.") { ErrorCode = "too-few" }]);
        Assert.Equal([new Fault(place, "too-few", "Give more.")], result.ToFaults());
    }
}
