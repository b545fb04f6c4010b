using System.Text.Json;
using System.Text.Json.Serialization;
using System.Text.Json.Serialization.Metadata;
using Drypeak.Service.Charts;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Reports;

/// <summary>
/// A report's address holds the request itself, packed like a chart: the weighings are the shortest that a report can be made from, and
/// whoever has the paper can have the numbers again. A GET therefore computes, which for one test is little work.
/// </summary>
internal static class ReportAddress
{
    /// <summary>Members that are not given take no room.</summary>
    private static readonly JsonSerializerOptions Brief = new(ServiceJson.Options) { DefaultIgnoreCondition = JsonIgnoreCondition.WhenWritingNull };

    /// <summary>The address of a request's report; null where it would be longer than the service takes.</summary>
    public static string? Of<TRequest>(string job, TRequest request, Limits limits, string options = "")
    {
        var data = Pack(request);
        return data.Length + ChartAddress.RoomForTheRest > limits.AddressBytes ? null : $"/v1/reports/{job}.pdf?{ChartAddress.Data}={data}{options}";
    }

    /// <summary>The request as the text of an address.</summary>
    public static string Pack<TRequest>(TRequest request) =>
        PackedText.Pack(JsonSerializer.SerializeToUtf8Bytes(request, (JsonTypeInfo<TRequest>)Brief.GetTypeInfo(typeof(TRequest))));

    /// <summary>The request in an address's text, or every fault at the place of the address.</summary>
    public static TRequest? Read<TRequest>(string data, Func<TRequest, IReadOnlyList<Fault>> check, Limits limits, ICollection<Fault> faults)
        where TRequest : class
    {
        switch (PackedText.Unpack(data, limits.UnpackedAddressBytes, out var json))
        {
            case PackedText.Outcome.TooLarge:
                faults.Add(new Fault("/d", "inflates-beyond-bound", $"The address inflates beyond {limits.UnpackedAddressBytes} bytes. Post the request itself."));
                return null;
            case PackedText.Outcome.Damaged:
                faults.Add(new Fault("/d", "not-readable", "The address is damaged or cut short: d does not unpack. Take the link as an answer gave it."));
                return null;
        }

        var read = JsonReading.Read(json, ServiceJson.Of<TRequest>(), check);
        foreach (var fault in read.Problem?.Errors ?? [])
        {
            faults.Add(fault with { Place = "/d", Message = $"At {fault.Place} of the request: {fault.Message}" });
        }

        if (!read.Succeeded && faults.Count == 0)
        {
            faults.Add(new Fault("/d", "not-readable", "The address holds no request. Take the link as an answer gave it."));
        }

        return read.Value;
    }
}
