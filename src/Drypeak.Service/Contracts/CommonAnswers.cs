using System.Security.Cryptography;
using System.Text.Json;
using System.Text.Json.Serialization;
using Drypeak.Service.Hosting;

namespace Drypeak.Service.Contracts;

/// <summary>What a careful reviewer says.</summary>
/// <param name="Code" example="optimum-at-edge">Stable code; /v1/findings explains each.</param>
/// <param name="Severity" example="warning">error, warning or note.</param>
/// <param name="Message" example="The chance that the peak lies outside the tested range is 27 %.">A sentence with the numbers, and what to do.</param>
/// <param name="Place" example="/specimens">JSON pointer to the place in the request; empty for the whole.</param>
/// <param name="Basis" example="Chance of a peak outside the tested range over 0.15">The rule and its source.</param>
public sealed record FindingContract(
    string Code, string Severity, string Message, [property: JsonPropertyName("pointer")] string Place, string Basis)
{
    /// <summary>The finding as it is answered; each is counted.</summary>
    internal static FindingContract Of(Finding finding)
    {
        var severity = finding.Severity.ToString().ToLowerInvariant();
        Meters.Finding(finding.Code, severity);
        return new(finding.Code, severity, finding.Message, finding.Place, finding.Basis);
    }
}

/// <summary>Where the answer came from.</summary>
/// <param name="Version" example="0.1.0">Version of the service.</param>
/// <param name="InputDigest" example="sha256:6f1c…">SHA-256 of the request as it was read: the same test has the same digest.</param>
public sealed record ProvenanceContract(string Version, string InputDigest)
{
    /// <summary>The digest is over the request as it was read, so that white space and the order of members do not matter.</summary>
    internal static ProvenanceContract Of<TRequest>(TRequest request) => new(
        ServiceVersion.Text,
        "sha256:" + Convert.ToHexStringLower(SHA256.HashData(JsonSerializer.SerializeToUtf8Bytes(request, ServiceJson.Of<TRequest>()))));
}

/// <summary>Addresses of the pictures; each holds all that the picture shows. A member is absent where the address would be too long.</summary>
public sealed record LinksContract
{
    /// <summary>The chart as SVG.</summary>
    /// <example>/v1/charts/moisture-density.svg?d=…</example>
    public string? Svg { get; init; }

    /// <summary>The chart as PNG.</summary>
    /// <example>/v1/charts/moisture-density.png?d=…</example>
    public string? Png { get; init; }

    /// <summary>The chart as PDF.</summary>
    /// <example>/v1/charts/moisture-density.pdf?d=…</example>
    public string? Pdf { get; init; }

    /// <summary>The report as PDF, of a job that has one. It holds the request, and gives the numbers again.</summary>
    /// <example>/v1/reports/moisture-density.pdf?d=…</example>
    public string? Report { get; init; }
}
