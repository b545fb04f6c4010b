using System.ComponentModel.DataAnnotations;

namespace Drypeak.Service.Hosting;

/// <summary>
/// Every bound of the service, each inclusive. They are read once at the start from the section <c>Limits</c> of the
/// configuration (<c>Limits__BodyBytes=2097152</c> as an environment variable); a value outside its range ends the start.
/// </summary>
public sealed record Limits
{
    public const string Section = "Limits";

    /// <summary>Bytes of a request's body. Default 1 MiB.</summary>
    [Range(1024, 1 << 30)]
    public int BodyBytes { get; init; } = 1 << 20;

    /// <summary>Bytes of the body of a lot. Default 8 MiB.</summary>
    [Range(1024, 1 << 30)]
    public int LotBodyBytes { get; init; } = 8 << 20;

    /// <summary>Bytes of one line of a batch, without its line break; the batch itself has no bound. Default 64 KiB.</summary>
    [Range(1024, 1 << 30)]
    public int BatchLineBytes { get; init; } = 64 << 10;

    /// <summary>Bytes of an address with its query. Default 8,000, so that a request line of 8 KiB holds it with method and version.</summary>
    [Range(256, 8_000)]
    public int AddressBytes { get; init; } = 8_000;

    /// <summary>Bytes that the data in a chart's address may have when unpacked. Default 256 KiB.</summary>
    [Range(1024, 1 << 26)]
    public int UnpackedAddressBytes { get; init; } = 256 << 10;

    /// <summary>Specimens of a test. Default 500.</summary>
    [Range(1, 100_000)]
    public int Specimens { get; init; } = 500;

    /// <summary>Tins of a specimen. Default 20.</summary>
    [Range(1, 1_000)]
    public int TinsPerSpecimen { get; init; } = 20;

    /// <summary>Tests in a lot. Default 20,000.</summary>
    [Range(1, 1_000_000)]
    public int LotTests { get; init; } = 20_000;

    /// <summary>Whole laboratory tests that the tests of a lot may bring. Default 100.</summary>
    [Range(1, 100_000)]
    public int LotLaboratoryTests { get; init; } = 100;

    /// <summary>Lines of one kind (saturation, air voids) in a chart. Default 20.</summary>
    [Range(1, 1_000)]
    public int LinesOfAKind { get; init; } = 20;

    /// <summary>Points of a line. Default 1,000.</summary>
    [Range(2, 100_000)]
    public int PointsPerLine { get; init; } = 1_000;

    /// <summary>Locations of a test programme. Default 10,000.</summary>
    [Range(1, 1_000_000)]
    public int Locations { get; init; } = 10_000;

    /// <summary>Letters of a reference or a label. Default 200.</summary>
    [Range(1, 10_000)]
    public int NameCharacters { get; init; } = 200;

    /// <summary>Letters of a reason or another text. Default 1,000.</summary>
    [Range(1, 100_000)]
    public int TextCharacters { get; init; } = 1_000;

    /// <summary>Labels in an identification. Default 30.</summary>
    [Range(1, 1_000)]
    public int IdentificationLabels { get; init; } = 30;

    /// <summary>Connections open at once, or 0 for as many as the system gives. Default 0.</summary>
    [Range(0, 1_000_000)]
    public int Connections { get; init; }

    /// <summary>Seconds that requests already begun are given when the service is told to stop. Default 8.</summary>
    [Range(1, 300)]
    public int ShutdownSeconds { get; init; } = 8;

    /// <summary>The limits of a configuration.</summary>
    /// <exception cref="ValidationException">A value lies outside its range.</exception>
    /// <exception cref="InvalidOperationException">A value is no number, or the section has a name that is no limit.</exception>
    public static Limits From(IConfiguration configuration)
    {
        var limits = configuration.GetSection(Section).Get<Limits>(binder => binder.ErrorOnUnknownConfiguration = true) ?? new Limits();
        Validator.ValidateObject(limits, new ValidationContext(limits), validateAllProperties: true);
        return limits;
    }
}
