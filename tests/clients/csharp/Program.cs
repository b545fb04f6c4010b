// A laboratory test of Ternmarsh sent with the generated types: a name that the service does not have would not compile.
using System.Text.Json;
using Drypeak.Client;
using Drypeak.Client.Models;
using Microsoft.Kiota.Abstractions.Authentication;
using Microsoft.Kiota.Http.HttpClientLibrary;

var client = new DrypeakClient(new HttpClientRequestAdapter(new AnonymousAuthenticationProvider()) { BaseUrl = args[0] });
var test = new MoistureDensityRequest
{
    Reference = "Ternmarsh, pit 2",
    Units = new UnitsContract { Density = "Mg/m3" },
    Specimens = [.. new[] { (10, 1.75), (12, 1.82), (14, 1.86), (16, 1.83), (18, 1.77) }.Select(point => new SpecimenContract { WaterContent = point.Item1, DryDensity = point.Item2 })],
};
var answer = await client.V1.MoistureDensity.PostAsync(test);

string[] refused;
try
{
    await client.V1.MoistureDensity.PostAsync(new MoistureDensityRequest { Specimens = [] });
    refused = [];
}
catch (Problem problem)
{
    refused = [.. problem.Errors!.Select(fault => $"{fault.Pointer} {fault.Code}")];
}

Console.WriteLine(JsonSerializer.Serialize(new { reference = answer!.Reference, maximumDryDensity = answer.Optimum!.MaximumDryDensity, refused }));
