namespace Drypeak.Service.Contracts;

/// <summary>How much a request may hold. What concerns the host (bytes, time, concurrency) is configuration: see Hosting.</summary>
internal static class Bounds
{
    public const int Specimens = 500;
    public const int TinsPerSpecimen = 20;
    public const int LinesOfAKind = 20;
    public const int IdentificationLabels = 30;

    /// <summary>Of a reference or a label.</summary>
    public const int NameCharacters = 200;

    /// <summary>Of a reason or another text.</summary>
    public const int TextCharacters = 1000;
}
