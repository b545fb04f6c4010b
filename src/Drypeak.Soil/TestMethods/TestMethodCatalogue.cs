using System.Collections.Frozen;
using System.Collections.Immutable;

namespace Drypeak.Soil.TestMethods;

/// <summary>
/// The published test methods that the service knows, read once from the embedded <c>test-methods.json</c>. The caller's own method
/// (<c>custom</c>) is no row here: its apparatus comes with the request. Immutable, safe on any thread.
/// </summary>
public static class TestMethodCatalogue
{
    private static readonly FrozenDictionary<string, TestMethod> ByCode;

    static TestMethodCatalogue()
    {
        All = CatalogueFile.Read();
        Codes = [.. All.Select(method => method.Code)];
        ByCode = All.ToFrozenDictionary(method => method.Code, StringComparer.Ordinal);
    }

    /// <summary>Every method, in the order of the file: by standard, then by letter or clause.</summary>
    public static ImmutableArray<TestMethod> All { get; }

    /// <summary>The codes, in the order of <see cref="All"/>.</summary>
    public static ImmutableArray<string> Codes { get; }

    /// <summary>The method of that code, in its exact case; null where there is none.</summary>
    public static TestMethod? Find(string code) => ByCode.GetValueOrDefault(code);
}
