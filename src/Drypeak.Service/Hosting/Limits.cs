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

    /// <summary>Pixels of a PNG. Default 24,000,000, which takes about 120 MB while it is drawn.</summary>
    [Range(10_000, 24_000_000)]
    public int PicturePixels { get; init; } = 24_000_000;

    /// <summary>Requests that are computed at once; beyond them others wait. Default 64.</summary>
    [Range(1, 100_000)]
    public int RequestsAtOnce { get; init; } = 64;

    /// <summary>Requests that wait to be computed; beyond them the answer is 503 at once. Default 512.</summary>
    [Range(0, 1_000_000)]
    public int RequestsWaiting { get; init; } = 512;

    /// <summary>Batches that are streamed at once, beside the other requests; as many again wait. Default 256.</summary>
    [Range(1, 100_000)]
    public int BatchesAtOnce { get; init; } = 256;

    /// <summary>Bodies over 64 KiB that are received at once: with <see cref="LotBodyBytes"/> they bound the memory that senders can fill. Default 64.</summary>
    [Range(1, 100_000)]
    public int LargeBodiesAtOnce { get; init; } = 64;

    /// <summary>Seconds that a request may take to arrive and to wait for its turn. A batch has no bound. Default 30.</summary>
    [Range(1, 3_600)]
    public int RequestSeconds { get; init; } = 30;

    /// <summary>Requests a second and caller (key, else address), on average; 0 for no such bound. Default 0.</summary>
    [Range(0, 1_000_000)]
    public int RequestsPerSecond { get; init; }

    /// <summary>Requests that a caller may send in one burst, where <see cref="RequestsPerSecond"/> is set. Default 50.</summary>
    [Range(1, 1_000_000)]
    public int RequestBurst { get; init; } = 50;

    /// <summary>Bytes a second below which a body, or the reading of an answer, is cut off after <see cref="SlowSeconds"/>. Default 240.</summary>
    [Range(1, 1 << 30)]
    public int BytesPerSecond { get; init; } = 240;

    /// <summary>Seconds for which a connection may be slower than <see cref="BytesPerSecond"/>. Default 5.</summary>
    [Range(2, 300)]
    public int SlowSeconds { get; init; } = 5;

    /// <summary>Bytes of the header fields of a request. Default 32 KiB.</summary>
    [Range(1024, 1 << 20)]
    public int HeaderBytes { get; init; } = 32 << 10;

    /// <summary>Header fields of a request. Default 100.</summary>
    [Range(10, 10_000)]
    public int HeaderFields { get; init; } = 100;

    /// <summary>Seconds in which the header fields of a request must have come. Default 15.</summary>
    [Range(1, 300)]
    public int HeaderSeconds { get; init; } = 15;

    /// <summary>Seconds that a connection may be idle between two requests. Default 130, above what proxies wait.</summary>
    [Range(1, 3_600)]
    public int IdleSeconds { get; init; } = 130;

    /// <summary>Connections open at once, or 0 for as many as the system gives; one more is closed at once. Default 10,000.</summary>
    [Range(0, 1_000_000)]
    public int Connections { get; init; } = 10_000;

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
